import { StyleSheet, Text } from 'react-native';

/**
 * Words for a screen reader alone, inside something whose drawn parts are `aria-hidden`. Unlike an aria-label they are part of
 * the content, so a press by voice on what is seen still finds it.
 */
export function HeardOnly({ children }: { children: string }) {
  return <Text style={styles.heard}>{children}</Text>;
}

const styles = StyleSheet.create({
  heard: { position: 'absolute', width: 1, height: 1, overflow: 'hidden', opacity: 0 },
});
