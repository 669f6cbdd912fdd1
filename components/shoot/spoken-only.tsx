import { StyleSheet, Text } from 'react-native';
import { useTokens } from '@/hooks/use-tokens';

/** Words for a screen reader that are not drawn, because something else is drawn in their place. */
export function SpokenOnly({ children, tone = 'ink' }: { children: string; tone?: 'ink' | 'paper' }) {
  const tokens = useTokens();
  return <Text style={[styles.hidden, { color: tokens[tone] }]}>{children}</Text>;
}

const styles = StyleSheet.create({
  hidden: { position: 'absolute', width: 1, height: 1, overflow: 'hidden' },
});
