import { useState } from 'react';
import { useWindowDimensions, type LayoutChangeEvent } from 'react-native';

/** Nothing is drawn narrower, in px: a window may not know its size yet. */
const leastWidth = 240;

/** Width of the element that `onLayout` is given to, in px; until it is measured, what is left of the window beside its margins. */
export function useMeasuredWidth(atMost = 720): [number, (event: LayoutChangeEvent) => void] {
  const window = useWindowDimensions().width;
  const [measured, setMeasured] = useState<number | null>(null);
  return [
    measured ?? Math.max(Math.min(window - 60, atMost), leastWidth),
    ({ nativeEvent }) => setMeasured(Math.max(Math.floor(nativeEvent.layout.width), 1)),
  ];
}
