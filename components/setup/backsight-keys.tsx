import { useId } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { EntryPanel } from '@/components/shoot/entry-panel';
import { halfMark, type EntryRules } from '@/components/shoot/read-entry';
import { Button } from '@/components/ui/button';
import { FieldError } from '@/components/ui/field-error';
import { space } from '@/constants/theme';
import type { Setup } from './use-setup';

/** The keys of the shoot screen for the backsight, as wide as the screen: fractions of an inch, or digits. */
export function BacksightKeys({ setup, rules }: { setup: Setup; rules: EntryRules }) {
  const { t } = useTranslation('shoot');
  const refusalId = useId();
  const { entry, key } = setup;
  const refusal = setup.refusalAt('reading');
  const open = entry.keypad !== null;
  const finer = halfMark(rules.graduation);
  return (
    <View style={styles.keys}>
      <FieldError id={refusalId} message={refusal} />
      <EntryPanel
        entry={entry}
        rules={rules}
        onKey={key}
        onSubmit={setup.record}
        refused={refusal !== undefined}
        refusalId={refusalId}
      />
      {entry.style === 'feet-inches' ? (
        <View style={styles.row}>
          <Button label={t(open ? 'keypad.close' : 'keypad.open')} onPress={() => key({ kind: 'keypad', open: !open })} grow />
          {finer !== null && !open ? (
            <Button
              label={t('halfMark')}
              spokenLabel={t('halfMarkSpoken')}
              variant="plain"
              onPress={() => key({ kind: 'half-mark', part: finer })}
              grow
            />
          ) : null}
        </View>
      ) : null}
    </View>
  );
}

const styles = StyleSheet.create({
  keys: { gap: space.s },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
