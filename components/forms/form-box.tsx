import type { ReactNode } from 'react';
import { Platform, StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';

/** The fields of a form, one under the other. Enter in a field sends it, as everywhere on the web. */
export function FormBox({ children, onSubmit, label }: { children: ReactNode; onSubmit: () => void; label: string }) {
  const onKeyDown = (event: { key: string; target: EventTarget; preventDefault(): void }) => {
    if (event.key !== 'Enter' || !(event.target instanceof HTMLInputElement)) return;
    event.preventDefault();
    onSubmit();
  };
  // Keyboard events reach the element on the web only; react-native's View has no type for them.
  const web = Platform.OS === 'web' ? { onKeyDown } : {};
  return (
    <View {...web} role="form" aria-label={label} style={styles.box}>
      {children}
    </View>
  );
}

const styles = StyleSheet.create({ box: { gap: space.l } });
