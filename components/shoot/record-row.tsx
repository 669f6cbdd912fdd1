import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { space } from '@/constants/theme';
import { halfMark, type EntryRules } from './read-entry';
import type { EntryAction, ReadingEntry } from './reading-entry';
import { KeysRegion } from './keys-region';

interface RecordRowProps {
  /** What the primary button says and does. */
  label: string;
  onRecord: () => void;
  entry: ReadingEntry;
  rules: EntryRules;
  onKey: (action: EntryAction) => void;
  /** Off while the receiver is set at the grade rod: nothing is keyed then. */
  keys: boolean;
}

/** Record at the thumb, and beside it the way between fractions and digits. */
export function RecordRow({ label, onRecord, entry, rules, onKey, keys }: RecordRowProps) {
  const { t } = useTranslation('shoot');
  const finer = halfMark(rules.graduation);
  const open = entry.keypad !== null;
  return (
    <KeysRegion label={t('mode.label')} style={styles.row}>
      {keys && entry.style === 'feet-inches' ? (
        <Button
          label={t(open ? 'keypad.close' : 'keypad.open')}
          size="large"
          onPress={() => onKey({ kind: 'keypad', open: !open })}
          style={styles.keypad}
        />
      ) : null}
      {keys && entry.style === 'feet-inches' && finer !== null && !open ? (
        <Button
          label={t('halfMark')}
          spokenLabel={t('halfMarkSpoken')}
          size="large"
          variant="plain"
          onPress={() => onKey({ kind: 'half-mark', part: finer })}
        />
      ) : null}
      <View style={styles.record}>
        <Button label={label} size="large" variant="primary" onPress={onRecord} />
      </View>
    </KeysRegion>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', gap: space.s },
  keypad: { minWidth: 104 },
  record: { flex: 1, minWidth: 0 },
});
