import type { ReactNode } from 'react';
import { StyleSheet, Text, type StyleProp, type TextStyle } from 'react-native';
import { fonts } from '@/constants/fonts';
import { typeSize, type TokenName, type TypeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';

/** Secondary text is `ink2`, which keeps 7:1 on chalk and paper only: on a tint use `ink` or the tint's own colour. */
export type TextTone = Extract<TokenName, 'ink' | 'ink2' | 'high' | 'low' | 'on' | 'caution' | 'paper'>;

export interface WordsProps {
  children: ReactNode;
  tone?: TextTone;
  size?: TypeSize;
  align?: 'left' | 'center' | 'right';
  /** For another element's aria-labelledby or aria-describedby. */
  id?: string;
  numberOfLines?: number;
  struck?: boolean;
  style?: StyleProp<TextStyle>;
}

const leading = (size: number) => Math.round(size * (size >= 20 ? 1.15 : 1.45));

function useWordsStyle(family: string | undefined, props: WordsProps, size: TypeSize): StyleProp<TextStyle> {
  const tokens = useTokens();
  return [
    { fontFamily: family, fontSize: typeSize[size], lineHeight: leading(typeSize[size]), color: tokens[props.tone ?? 'ink'] },
    props.align ? { textAlign: props.align } : null,
    props.struck ? styles.struck : null,
    props.style,
  ];
}

/** A heading of level 1 (the screen's title) to 3. Level 1 is set at 20 unless a size says otherwise, level 2 at 17. */
export function Heading({ level = 2, ...props }: WordsProps & { level?: 1 | 2 | 3 }) {
  const style = useWordsStyle(fonts.figureBold, props, props.size ?? (level === 1 ? 'head' : 'lead'));
  return (
    <Text role="heading" aria-level={level} id={props.id} numberOfLines={props.numberOfLines} style={style}>
      {props.children}
    </Text>
  );
}

/** Running text. */
export function Body({ weight = 'regular', ...props }: WordsProps & { weight?: 'regular' | 'semibold' | 'bold' }) {
  const family = { regular: fonts.text, semibold: fonts.textSemibold, bold: fonts.textBold }[weight];
  const style = useWordsStyle(family, props, props.size ?? 'text');
  return (
    <Text id={props.id} numberOfLines={props.numberOfLines} style={style}>
      {props.children}
    </Text>
  );
}

/** Bold words inside a `Body`: takes the size and colour of the text around it. */
export function Strong({ children }: { children: ReactNode }) {
  return <Text style={{ fontFamily: fonts.textBold }}>{children}</Text>;
}

/** A short label in the narrow face: of a field, a column, a row. */
export function Label({ weight = 'medium', ...props }: WordsProps & { weight?: 'medium' | 'semibold' | 'bold' }) {
  const family = { medium: fonts.figureMedium, semibold: fonts.figure, bold: fonts.figureBold }[weight];
  const style = useWordsStyle(family, { tone: 'ink2', ...props }, props.size ?? 'small');
  return (
    <Text id={props.id} numberOfLines={props.numberOfLines} style={style}>
      {props.children}
    </Text>
  );
}

/** A number with its unit, in tabular figures so that columns line up. */
export function Figure({ weight = 'semibold', ...props }: WordsProps & { weight?: 'medium' | 'semibold' | 'bold' }) {
  const family = { medium: fonts.figureMedium, semibold: fonts.figure, bold: fonts.figureBold }[weight];
  const style = useWordsStyle(family, props, props.size ?? 'lead');
  return (
    <Text id={props.id} numberOfLines={props.numberOfLines} style={[styles.tabular, style]}>
      {props.children}
    </Text>
  );
}

const styles = StyleSheet.create({
  tabular: { fontVariant: ['tabular-nums'] },
  struck: { textDecorationLine: 'line-through' },
});
