import type { Ref } from 'react';
import { StyleSheet, View, type TextInput } from 'react-native';
import { space } from '@/constants/theme';
import { DigitKeys } from './digit-keys';
import { FractionKeys } from './fraction-keys';
import { InchStepper } from './inch-stepper';
import type { EntryRules } from './read-entry';
import { ReadingBox } from './reading-box';
import type { EntryAction, ReadingEntry } from './reading-entry';

interface EntryPanelProps {
  entry: ReadingEntry;
  rules: EntryRules;
  onKey: (action: EntryAction) => void;
  onSubmit: () => void;
  refused: boolean;
  refusalId: string;
  ref?: Ref<TextInput>;
}

/** The reading and the keys that make it: fractions of an inch, or digits. */
export function EntryPanel({ entry, rules, onKey, onSubmit, refused, refusalId, ref }: EntryPanelProps) {
  const fractions = entry.style === 'feet-inches' && entry.keypad === null;
  return (
    <View style={styles.panel}>
      <View style={styles.row}>
        <ReadingBox
          ref={ref}
          entry={entry}
          rules={rules}
          onType={(text) => onKey({ kind: 'type', text })}
          onSubmit={onSubmit}
          refused={refused}
          describedBy={refusalId}
        />
        {fractions ? <InchStepper inches={entry.inches} onStep={(by) => onKey({ kind: 'inch', by })} /> : null}
      </View>
      {fractions ? (
        <FractionKeys
          graduation={rules.graduation}
          chosen={entry.typed === null ? entry.fraction : null}
          onPick={(part) => onKey({ kind: 'fraction', part })}
        />
      ) : (
        <DigitKeys entry={entry} onKey={onKey} />
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  panel: { gap: space.s },
  // On the narrowest phones the stepper goes under the reading.
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: space.s },
});
