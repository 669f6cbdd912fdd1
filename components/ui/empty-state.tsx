import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { radius, space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Body, Heading } from './text';

/** Nothing here yet: the one next step, said in a sentence, and its button. */
export function EmptyState({ title, children, action }: { title: string; children?: string; action?: ReactNode }) {
  const tokens = useTokens();
  return (
    <View style={[styles.box, { borderColor: tokens.rule2 }]}>
      <Heading level={2}>{title}</Heading>
      {children ? <Body>{children}</Body> : null}
      {action}
    </View>
  );
}

const styles = StyleSheet.create({
  box: { borderWidth: 1, borderStyle: 'dashed', borderRadius: radius.card, padding: space.l, gap: space.m },
});
