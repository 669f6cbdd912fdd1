import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';

/**
 * Keys that do not take the focus when they are pressed by finger or mouse, so that Enter goes on meaning Record. By the Tab key
 * they are reached as any button.
 */
export function KeysRegion({ label, children, style }: { label: string; children: ReactNode; style?: StyleProp<ViewStyle> }) {
  // Only the web moves focus on a press; react-native's types do not know the event.
  const web = { onMouseDown: (event: { preventDefault(): void }) => event.preventDefault() };
  return (
    <View {...web} role="group" aria-label={label} style={style}>
      {children}
    </View>
  );
}
