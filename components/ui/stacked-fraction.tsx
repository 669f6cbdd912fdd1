import { StyleSheet, Text, View } from 'react-native';
import { fonts } from '@/constants/fonts';
import { type TextTone } from './text';
import { useTokens } from '@/hooks/use-tokens';

interface StackedFractionProps {
  numerator: number;
  denominator: number;
  /** Size of the figures around it, in px: 20 or more. Under that a fraction is written 5/16. */
  size: number;
  /** Beside a whole number the parts are smaller than where the fraction stands by itself. */
  beside?: boolean;
  tone?: TextTone;
}

/** Height of each part, in px: at least 13, so that it can be read at arm's length. */
export const fractionPart = (size: number, beside: boolean): number => Math.max(13, Math.round(size * (beside ? 0.52 : 0.74)));

/**
 * A fraction drawn as on the rod, one figure over the other. It says nothing to a screen reader: the length, key or button that
 * holds it does.
 * @throws RangeError under 20 px, where its parts could not be read.
 */
export function StackedFraction({ numerator, denominator, size, beside = false, tone = 'ink' }: StackedFractionProps) {
  if (size < 20) throw new RangeError(`a stacked fraction needs a size of 20 px or more, not ${size}`);
  const colour = useTokens()[tone];
  const part = fractionPart(size, beside);
  const text = { color: colour, fontSize: part, lineHeight: Math.round(part * 1.08) };
  return (
    <View aria-hidden style={styles.stack}>
      <Text style={[styles.part, text]}>{numerator}</Text>
      <View style={[styles.bar, { backgroundColor: colour, height: part >= 20 ? 2 : 1.5 }]} />
      <Text style={[styles.part, text]}>{denominator}</Text>
    </View>
  );
}

const styles = StyleSheet.create({
  stack: { alignItems: 'center' },
  part: { fontFamily: fonts.figureBold, fontVariant: ['tabular-nums'], textAlign: 'center' },
  bar: { alignSelf: 'stretch', marginVertical: 1 },
});
