import { useTranslation } from 'react-i18next';
import { StyleSheet, Text, View } from 'react-native';
import { fonts } from '@/constants/fonts';
import { typeSize, type TypeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { spokenLength } from './spoken-length';
import { StackedFraction } from './stacked-fraction';
import type { TextTone } from './text';

interface LengthTextProps {
  /** As `formatLength` prints it: `4′ 7 3/16″`, `−3/16″`, `4.60 ft`, `1.402 m`. */
  value: string;
  /** Stacked fractions need 20 px and up; smaller sizes write 5/16. */
  size?: TypeSize;
  tone?: TextTone;
  align?: 'left' | 'center' | 'right';
}

type Piece = { words: string } | { numerator: number; denominator: number; beside: boolean };

/** Cuts a printed length into words and fractions, in order. */
function pieces(value: string): Piece[] {
  const found = /^(.*?)(\d+)\/(\d+)(.*)$/.exec(value);
  if (!found?.[2] || !found[3]) return [{ words: value }];
  const before = (found[1] ?? '').trimEnd();
  const fraction = { numerator: Number(found[2]), denominator: Number(found[3]), beside: /\d$/.test(before) };
  return [...(before ? [{ words: before }] : []), fraction, ...(found[4] ? [{ words: found[4] }] : [])];
}

/** A length drawn large, its fraction stacked as on the rod, and said in words to a screen reader. */
export function LengthText({ value, size = 'head', tone = 'ink', align = 'left' }: LengthTextProps) {
  const tokens = useTokens();
  const { t } = useTranslation('common');
  const px = typeSize[size];
  const text = { color: tokens[tone], fontSize: px, lineHeight: Math.round(px * 1.2) };
  const parts = px >= 20 ? pieces(value) : [{ words: value }];
  const justify = { left: 'flex-start', center: 'center', right: 'flex-end' } as const;
  return (
    <View role="img" aria-label={spokenLength(value, t)} style={[styles.row, { gap: px * 0.08, justifyContent: justify[align] }]}>
      {parts.map((part, at) =>
        'words' in part ? (
          <Text key={at} aria-hidden style={[styles.words, text]}>
            {part.words}
          </Text>
        ) : (
          <StackedFraction key={at} {...part} size={px} tone={tone} />
        ),
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap' },
  words: { fontFamily: fonts.figureBold, fontVariant: ['tabular-nums'] },
});
