import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import type { EntryAction, ReadingEntry } from './reading-entry';
import { KeysRegion } from './keys-region';
import { ShootKey } from './shoot-key';

const ROWS = [
  [1, 2, 3],
  [4, 5, 6],
  [7, 8, 9],
] as const;

/** Digits, 104 wide on a phone of 390. In feet and inches the last key goes on to the inches, then to the fractions. */
export function DigitKeys({ entry, onKey }: { entry: ReadingEntry; onKey: (action: EntryAction) => void }) {
  const { t } = useTranslation('shoot');
  const digit = (value: number) => (
    <ShootKey key={value} label={String(value)} style={styles.key} onPress={() => onKey({ kind: 'digit', digit: value })}>
      {String(value)}
    </ShootKey>
  );
  const onward = entry.keypad === 'feet' ? t('keypad.nextInches') : t('keypad.nextFraction');
  return (
    <KeysRegion label={t('keypad.digits')} style={styles.grid}>
      {ROWS.map((row) => (
        <View key={row[0]} style={styles.row}>
          {row.map(digit)}
        </View>
      ))}
      <View style={styles.row}>
        <ShootKey label={t('keypad.erase')} size="lead" style={styles.key} onPress={() => onKey({ kind: 'erase' })}>
          {t('keypad.erase')}
        </ShootKey>
        {digit(0)}
        {entry.style === 'feet-inches' ? (
          <ShootKey label={onward} size="lead" style={styles.key} onPress={() => onKey({ kind: 'next-part' })}>
            {`${onward} ›`}
          </ShootKey>
        ) : (
          <ShootKey label={t('keypad.clear')} size="lead" style={styles.key} onPress={() => onKey({ kind: 'clear' })}>
            {t('keypad.clear')}
          </ShootKey>
        )}
      </View>
    </KeysRegion>
  );
}

const styles = StyleSheet.create({
  grid: { gap: 4 },
  row: { flexDirection: 'row', gap: 6 },
  key: { minHeight: 60 },
});
