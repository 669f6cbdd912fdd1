import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/constants/theme';
import { useWide } from '@/hooks/use-wide';

/** Columns beside one another from 900 px, one under the other below it, in the same order. */
export function Columns({ children }: { children: ReactNode }) {
  return <View style={useWide() ? styles.beside : styles.under}>{children}</View>;
}

/** One column; `share` of the width among its neighbours. */
export function Column({ children, share = 1 }: { children: ReactNode; share?: number }) {
  const wide = useWide();
  return (
    <View style={[styles.column, wide ? { flexGrow: share, flexShrink: 1, flexBasis: 0, minWidth: 0 } : null]}>{children}</View>
  );
}

const styles = StyleSheet.create({
  beside: { flexDirection: 'row', alignItems: 'flex-start', gap: space.l },
  under: { gap: space.m },
  column: { gap: space.m },
});
