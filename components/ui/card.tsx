import { Link, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Pressable, StyleSheet, View, type StyleProp, type ViewStyle } from 'react-native';
import { radius, space, type TokenName } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Body, Heading } from './text';

interface CardProps {
  children: ReactNode;
  title?: string;
  /** Small words at the right of the title: "heights ×1,000". */
  note?: string;
  /** Heavy: an ink border and larger radius, for the one thing that a screen is about. */
  weight?: 'thin' | 'heavy';
  /** A tint of the tokens instead of paper. */
  ground?: Extract<TokenName, 'paper' | 'onTint' | 'lowTint' | 'highTint' | 'cautionTint'>;
  /** No padding: for halves and tables that reach the edge. */
  flush?: boolean;
  /** The whole card is a link. */
  href?: Href;
  onPress?: () => void;
  /** With `href` or `onPress`: what a screen reader calls the card. */
  label?: string;
  style?: StyleProp<ViewStyle>;
}

/** Paper on chalk with a hairline. No shadow. */
export function Card({ weight = 'thin', ground = 'paper', ...props }: CardProps) {
  const tokens = useTokens();
  const heavy = weight === 'heavy';
  const box: ViewStyle = StyleSheet.flatten([
    styles.card,
    {
      backgroundColor: tokens[ground],
      borderColor: heavy ? tokens.ink : tokens.rule,
      borderWidth: heavy ? 2 : 1,
      borderRadius: heavy ? radius.verdict : radius.card,
    },
    props.flush ? styles.flush : null,
    props.style,
  ]);
  const inside = (
    <>
      {props.title ? (
        <View style={[styles.head, props.flush ? styles.flushHead : null]}>
          <Heading level={2} style={styles.title}>
            {props.title}
          </Heading>
          {props.note ? (
            <Body size="tiny" tone="ink2">
              {props.note}
            </Body>
          ) : null}
        </View>
      ) : null}
      {props.children}
    </>
  );
  if (props.href !== undefined) {
    return (
      <Link href={props.href} asChild>
        <Pressable role="link" aria-label={props.label} style={box}>
          {inside}
        </Pressable>
      </Link>
    );
  }
  if (props.onPress) {
    return (
      <Pressable role="button" aria-label={props.label} onPress={props.onPress} style={box}>
        {inside}
      </Pressable>
    );
  }
  return <View style={box}>{inside}</View>;
}

const styles = StyleSheet.create({
  card: { padding: space.l, gap: space.s },
  flush: { padding: 0, overflow: 'hidden' },
  head: { flexDirection: 'row', alignItems: 'baseline', justifyContent: 'space-between', flexWrap: 'wrap', columnGap: space.s },
  flushHead: { paddingHorizontal: space.l, paddingTop: space.m },
  title: { flexShrink: 1 },
});
