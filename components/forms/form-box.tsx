import type { ReactNode } from 'react';
import { Platform, StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';

interface KeyPress {
  key: string;
  target: EventTarget;
  preventDefault(): void;
  stopPropagation(): void;
}

/** The fields of a form, one under the other. Enter in a field sends it, as everywhere on the web. */
export function FormBox({ children, onSubmit }: { children: ReactNode; onSubmit: () => void }) {
  // On its way down: react-native-web's inputs let no key event out again.
  const onKeyDownCapture = (event: KeyPress) => {
    if (event.key !== 'Enter' || !(event.target instanceof HTMLInputElement)) return;
    event.preventDefault();
    event.stopPropagation();
    onSubmit();
  };
  // Keyboard events reach the element on the web only; react-native's View has no type for them.
  const web = Platform.OS === 'web' ? { onKeyDownCapture } : {};
  return (
    <View {...web} role="form" style={styles.box}>
      {children}
    </View>
  );
}

const styles = StyleSheet.create({ box: { gap: space.l } });
