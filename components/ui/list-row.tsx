import { Link, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Pressable, StyleSheet, View, type ViewStyle } from 'react-native';
import { space, target } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Icon } from './icons';
import { Body, Figure, Label } from './text';

interface ListRowProps {
  title: ReactNode;
  note?: string;
  /** Drawn before the title, narrow: a number, a mark. A string is set small. */
  start?: ReactNode;
  /** At the right edge. A string is set as a figure. */
  end?: ReactNode;
  href?: Href;
  onPress?: () => void;
  /** With `href` or `onPress`: what a screen reader calls the row. */
  label?: string;
  /** No hairline under the last one. */
  last?: boolean;
}

/** One line of a list: what it is, a note under it, its value or a way on at the right. */
export function ListRow(props: ListRowProps) {
  const tokens = useTokens();
  const pressed = props.href !== undefined || props.onPress !== undefined;
  const box: ViewStyle = StyleSheet.flatten([
    styles.row,
    props.last ? null : { borderBottomWidth: 1, borderBottomColor: tokens.rule },
  ]);
  const inside = (
    <>
      {typeof props.start === 'string' ? (
        <Label size="tiny" style={styles.start}>
          {props.start}
        </Label>
      ) : (
        props.start
      )}
      <View style={styles.words}>
        {typeof props.title === 'string' ? <Body weight="semibold">{props.title}</Body> : props.title}
        {props.note ? (
          <Body size="small" tone="ink2">
            {props.note}
          </Body>
        ) : null}
      </View>
      {typeof props.end === 'string' ? <Figure align="right">{props.end}</Figure> : props.end}
      {pressed ? <Icon name="chevron-right" size={20} /> : null}
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
  row: { flexDirection: 'row', alignItems: 'center', gap: space.m, minHeight: target.least, paddingVertical: space.s },
  start: { minWidth: 18 },
  words: { flex: 1, minWidth: 0 },
});
