import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { radius, space, type Tokens } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Body, Strong } from './text';

export type NoticeKind = 'caution' | 'refusal' | 'mismatch' | 'good' | 'plain';

interface NoticeProps {
  /** caution: mind this. refusal: an entry was not taken. mismatch: two things do not agree. good: it is in order. plain: to know. */
  kind: NoticeKind;
  /** The first words, in bold: "The outline misses closing by 2″." */
  lead?: string;
  children?: ReactNode;
  /** Buttons under the words. */
  actions?: ReactNode;
  /** Announced as it appears. A refusal always is. */
  announce?: boolean;
}

function colours(tokens: Tokens, kind: NoticeKind): { ground: string; edge: string } {
  if (kind === 'good') return { ground: tokens.onTint, edge: tokens.on };
  if (kind === 'mismatch') return { ground: tokens.highTint, edge: tokens.high };
  if (kind === 'plain') return { ground: tokens.paper, edge: tokens.rule2 };
  return { ground: tokens.cautionTint, edge: tokens.caution };
}

/** A sentence or two that must not be missed: what it is and what to do. `children` may be words or elements. */
export function Notice({ kind, lead, children, actions, announce = false }: NoticeProps) {
  const { ground, edge } = colours(useTokens(), kind);
  const words = typeof children === 'string' || children === undefined;
  return (
    <View
      role={kind === 'refusal' ? 'alert' : announce ? 'status' : undefined}
      style={[styles.box, kind === 'caution' ? styles.bar : styles.framed, { backgroundColor: ground, borderColor: edge }]}
    >
      {words ? (
        <Body>
          {lead ? <Strong>{lead}</Strong> : null}
          {lead && children ? ' ' : null}
          {children}
        </Body>
      ) : (
        <>
          {lead ? <Body weight="bold">{lead}</Body> : null}
          {children}
        </>
      )}
      {actions ? <View style={styles.actions}>{actions}</View> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  box: { paddingVertical: space.m, paddingHorizontal: space.l, gap: space.s },
  bar: { borderLeftWidth: 4, borderTopRightRadius: radius.card, borderBottomRightRadius: radius.card },
  framed: { borderWidth: 2, borderRadius: radius.card },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
