import { useId, type Ref } from 'react';
import { useTranslation } from 'react-i18next';
import { StyleSheet, Text, TextInput, View } from 'react-native';
import { LengthText } from '@/components/ui/length-text';
import { Label } from '@/components/ui/text';
import { fonts } from '@/constants/fonts';
import { radius, space, typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { keyedText, type EntryRules } from './read-entry';
import type { ReadingEntry } from './reading-entry';

interface ReadingBoxProps {
  entry: ReadingEntry;
  rules: EntryRules;
  onType: (text: string) => void;
  onSubmit: () => void;
  refused: boolean;
  /** Id of the sentence that says why it was refused. */
  describedBy?: string;
  ref?: Ref<TextInput>;
}

const UNIT = { 'feet-inches': '', 'decimal-feet': ' ft', metric: ' m' } as const;

/** What stands in the box while it is being keyed: the text as it will be recorded, with its unit. */
function shownText(entry: ReadingEntry, rules: EntryRules): string | null {
  const text = keyedText(entry, rules);
  if (text === null) return null;
  return entry.style !== 'feet-inches' && /^\d+\.\d+$/.test(text) ? `${text}${UNIT[entry.style]}` : text;
}

/**
 * The reading, large, as it will be recorded. It is a field as well: a keyboard types into it, while a phone's own keyboard
 * stays away because the keys below are larger.
 */
export function ReadingBox({ entry, rules, onType, onSubmit, refused, describedBy, ref }: ReadingBoxProps) {
  const tokens = useTokens();
  const { t } = useTranslation('shoot');
  const id = useId();
  // What is typed with marks of its own is shown letter for letter, with its caret; everything else as it will be recorded.
  const raw = entry.typed !== null && (entry.style === 'feet-inches' || !/^\d*$/.test(entry.typed));
  const web = {
    'aria-describedby': [`${id}-reads`, describedBy].filter((part) => part !== undefined).join(' '),
    'aria-invalid': refused || undefined,
  };
  return (
    <View style={[styles.box, { backgroundColor: tokens.paper, borderColor: refused ? tokens.caution : tokens.ink }]}>
      <View style={styles.label}>
        <Label weight="semibold">{t('rod')}</Label>
      </View>
      <View id={`${id}-reads`} style={styles.reading} aria-hidden={raw}>
        {raw ? null : <Shown entry={entry} text={shownText(entry, rules)} />}
      </View>
      <TextInput
        {...web}
        ref={ref}
        aria-label={t('rodReading')}
        value={entry.typed ?? ''}
        onChangeText={onType}
        onSubmitEditing={onSubmit}
        submitBehavior="submit"
        inputMode="none"
        autoComplete="off"
        autoCapitalize="none"
        autoCorrect={false}
        spellCheck={false}
        maxLength={40}
        style={[styles.input, { color: raw ? tokens.ink : 'transparent' }]}
      />
    </View>
  );
}

function Shown({ entry, text }: { entry: ReadingEntry; text: string | null }) {
  const tokens = useTokens();
  if (text !== null) return <LengthText value={text} size="verdict" align="right" />;
  const figure = [styles.figure, { color: tokens.ink }];
  if (entry.style !== 'feet-inches') return <Text style={figure}>{`–${UNIT[entry.style]}`}</Text>;
  const part = (name: 'feet' | 'inches', mark: string) => (
    <Text style={[figure, entry.keypad === name ? { backgroundColor: tokens.cautionTint } : null]}>
      {`${entry[name] ?? '–'}${mark}`}
    </Text>
  );
  return (
    <View style={styles.parts}>
      {part('feet', '′')}
      {part('inches', '')}
      <View style={[styles.blank, { borderColor: tokens.rule2 }]} />
      <Text style={figure}>″</Text>
    </View>
  );
}

const styles = StyleSheet.create({
  box: {
    flexGrow: 1,
    flexShrink: 1,
    flexBasis: 200,
    minWidth: 0,
    minHeight: 58,
    borderWidth: 2,
    borderRadius: radius.button,
    flexDirection: 'row',
    alignItems: 'center',
  },
  label: { paddingLeft: space.m },
  reading: { flex: 1, minWidth: 0, paddingRight: space.m, alignItems: 'flex-end' },
  input: {
    position: 'absolute',
    inset: 0,
    paddingLeft: 44,
    paddingRight: space.m,
    borderRadius: radius.key,
    textAlign: 'right',
    fontFamily: fonts.figureBold,
    fontSize: typeSize.title,
  },
  parts: { flexDirection: 'row', alignItems: 'center', gap: 4 },
  blank: { width: 24, height: 34, borderWidth: 2, borderStyle: 'dashed', borderRadius: 4 },
  figure: { fontFamily: fonts.figureBold, fontVariant: ['tabular-nums'], fontSize: typeSize.verdict, lineHeight: 41 },
});
