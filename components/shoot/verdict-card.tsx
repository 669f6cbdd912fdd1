import { useTranslation } from 'react-i18next';
import { StyleSheet, Text, View } from 'react-native';
import { Icon } from '@/components/ui/icons';
import { LengthText } from '@/components/ui/length-text';
import { spokenLength } from '@/components/ui/spoken-length';
import { Body, Figure } from '@/components/ui/text';
import { fonts } from '@/constants/fonts';
import { radius, space, typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { SpokenOnly } from './spoken-only';
import { spokenVerdict, type VerdictWords } from './verdict-words';

interface VerdictCardProps {
  /** Null: nothing is keyed yet, and `waiting` says what to do. */
  words: VerdictWords | null;
  waiting: string;
  /** Why what was keyed is not recorded: stands here, beside the reading, in place of a verdict. */
  refusal: string | null;
  refusalId: string;
}

/** What to do with the rail, large enough to read from the other side of the trench; said aloud as it changes. */
export function VerdictCard({ words, waiting, refusal, refusalId }: VerdictCardProps) {
  const tokens = useTokens();
  const { t } = useTranslation('common');
  const tone = refusal !== null ? 'caution' : (words?.tone ?? null);
  const ground = tone === null ? tokens.paper : tokens[`${tone}Tint`];
  const spoken = words === null || refusal !== null ? '' : spokenVerdict(words, (length) => spokenLength(length, t));
  return (
    <View style={[styles.card, { backgroundColor: ground, borderColor: tone === null ? tokens.rule2 : tokens[tone] }]}>
      <View role="status" aria-live="polite">
        <SpokenOnly>{spoken}</SpokenOnly>
      </View>
      <View role="alert" id={refusalId} style={refusal === null ? null : styles.sentence}>
        {refusal === null ? null : <Body tone="ink">{refusal}</Body>}
      </View>
      {refusal !== null ? null : words === null ? (
        <View style={styles.sentence}>
          <Body tone="ink2">{waiting}</Body>
        </View>
      ) : (
        <Drawn words={words} />
      )}
    </View>
  );
}

function Drawn({ words }: { words: VerdictWords }) {
  const tokens = useTokens();
  const large = [styles.large, { color: tokens[words.tone] }];
  return (
    <View aria-hidden style={styles.row}>
      {words.arrow === null ? null : <Icon name={words.arrow === 'up' ? 'arrow-up' : 'arrow-down'} size={46} tone={words.tone} />}
      <View style={styles.action}>
        {words.before === '' ? null : <Text style={large}>{words.before}</Text>}
        {words.length === null ? null : <LengthText value={words.length} size="verdict" tone={words.tone} />}
        {words.after === '' ? null : <Text style={large}>{words.after}</Text>}
      </View>
      <View style={styles.side}>
        <Body size="small" tone="ink" align="right">
          {words.side}
        </Body>
        <Figure size="head" align="right">
          {words.limit}
        </Figure>
        {words.advice === null ? null : (
          <Body size="tiny" weight="bold" tone="ink" align="right">
            {words.advice}
          </Body>
        )}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  card: { borderWidth: 2, borderRadius: radius.verdict, minHeight: 76, justifyContent: 'center', paddingHorizontal: space.m },
  row: { flexDirection: 'row', alignItems: 'center', gap: space.s },
  action: { flexGrow: 1, flexShrink: 1, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.s },
  large: { fontFamily: fonts.figureBold, fontSize: typeSize.verdict, lineHeight: 40 },
  side: { flexShrink: 1, maxWidth: 130 },
  sentence: { paddingVertical: space.s },
});
