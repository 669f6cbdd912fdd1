import type { GestureResponderEvent } from 'react-native';

interface PressPlace {
  offsetX?: number;
  offsetY?: number;
  locationX?: number;
  locationY?: number;
}

/**
 * Where in the element a press was, in px. A browser's press carries offsets, a phone's native one locations. Null for a press of
 * Enter, which react-native-web sends here too and which is nowhere: its event has no native event inside.
 */
export function pressedAt(event: GestureResponderEvent): { x: number; y: number } | null {
  const native: PressPlace | undefined = event.nativeEvent;
  const x = native?.offsetX ?? native?.locationX;
  const y = native?.offsetY ?? native?.locationY;
  return x === undefined || y === undefined ? null : { x, y };
}
