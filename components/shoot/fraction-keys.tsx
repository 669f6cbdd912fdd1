import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { NM_PER_INCH, type Graduation, type Nm } from '@/analysis';
import { spokenFraction } from '@/components/ui/spoken-length';
import { StackedFraction } from '@/components/ui/stacked-fraction';
import { fractionRows, halfMark } from './read-entry';
import { KeysRegion } from './keys-region';
import { ShootKey } from './shoot-key';

/** A part of an inch in lowest terms. */
export function lowestTerms(part: Nm): { numerator: number; denominator: number } {
  let numerator = Math.round((part / NM_PER_INCH) * 64);
  let denominator = 64;
  while (denominator > 1 && numerator % 2 === 0) {
    numerator /= 2;
    denominator /= 2;
  }
  return { numerator, denominator };
}

interface FractionKeysProps {
  graduation: Graduation;
  /** The part chosen, nm; null: none yet. */
  chosen: Nm | null;
  onPick: (part: Nm) => void;
}

/** One key for each mark of an inch, a quarter inch a row. */
export function FractionKeys({ graduation, chosen, onPick }: FractionKeysProps) {
  const { t } = useTranslation('shoot');
  const { t: common } = useTranslation('common');
  const finer = halfMark(graduation);
  // A thirty-second lights the sixteenth that it stands on; its own mark is lit beside it.
  const lit = chosen === null ? null : finer === null ? chosen : chosen - (chosen % (2 * finer));
  return (
    <KeysRegion label={t('fractions')} style={styles.grid}>
      {fractionRows(graduation).map((row) => (
        <View key={row[0]} style={styles.row}>
          {row.map((part) => {
            const { numerator, denominator } = lowestTerms(part);
            const label = part === 0 ? t('wholeInch') : spokenFraction(numerator, denominator, common);
            return (
              <ShootKey key={part} label={label} chosen={part === lit} onPress={() => onPick(part)}>
                {(tone) =>
                  part === 0 ? '0' : <StackedFraction numerator={numerator} denominator={denominator} size={24} tone={tone} />
                }
              </ShootKey>
            );
          })}
        </View>
      ))}
    </KeysRegion>
  );
}

const styles = StyleSheet.create({
  grid: { gap: 6 },
  row: { flexDirection: 'row', gap: 6 },
});
