import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Card } from '@/components/ui/card';
import { Body, Heading, Strong, type TextTone } from '@/components/ui/text';
import { radius, space, type TokenName } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { useWide } from '@/hooks/use-wide';
import type { RoundVerdict } from '@/shared/api/footing-schemas';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundResults, WallAnswer } from '@/shared/round/round-results';
import type { RoundState } from '@/shared/round/round-state';
import { offGradeWords } from '../lengths/length-words';
import { placeWords } from './place-words';
import { gradeWords, toMark, wallWords } from './results-words';

interface AnswersCardProps {
  bundle: RoundBundle;
  state: RoundState;
  results: RoundResults;
}

const wallLook: Record<WallAnswer, { tone: TextTone; ground: TokenName }> = {
  'can-be-set': { tone: 'on', ground: 'onTint' },
  'after-grinding': { tone: 'caution', ground: 'cautionTint' },
  'cannot-be-set': { tone: 'high', ground: 'highTint' },
  'not-yet': { tone: 'ink', ground: 'paper' },
  'cannot-tell': { tone: 'caution', ground: 'cautionTint' },
};

const gradeTone: Record<RoundVerdict, TextTone> = {
  'to-grade': 'on',
  'not-to-grade': 'low',
  'too-close-to-call': 'caution',
  'cannot-tell': 'caution',
  'not-yet': 'ink',
};

/** Two answers first, a sentence each: can the wall be set, and is it to grade. Dig and rails have the second alone. */
export function AnswersCard({ bundle, state, results }: AnswersCardProps) {
  const tokens = useTokens();
  const wide = useWide();
  const { t } = useTranslation('results');
  const { wall } = results;
  return (
    <Card weight="heavy" flush>
      <View role="region" aria-label={t('answers')} style={wide && wall ? styles.beside : null}>
        {wall ? (
          <View
            style={[
              styles.half,
              wide ? styles.grow : { borderBottomWidth: 2, borderBottomColor: tokens.ink },
              wide ? null : styles.top,
              { backgroundColor: wide ? tokens.paper : tokens[wallLook[wall.answer].ground] },
            ]}
          >
            <Heading level={2} size="title" tone={wallLook[wall.answer].tone}>
              {t(`wall.${wall.answer}`)}
            </Heading>
            <Body>{wallWords(bundle, state, wall)}</Body>
          </View>
        ) : null}
        <View style={[styles.half, wide ? styles.grow : null]}>
          <GradeAnswer bundle={bundle} state={state} results={results} />
        </View>
      </View>
    </Card>
  );
}

function GradeAnswer({ bundle, state, results }: AnswersCardProps) {
  const { t } = useTranslation('results');
  const { verdict } = state;
  const { surface } = bundle.round;
  const { before, after } = gradeWords(bundle, state);
  const worst = results.grade.worst;
  const said = verdict === 'not-to-grade' || verdict === 'not-yet' || verdict === 'cannot-tell' ? state.out > 0 : false;
  const title =
    verdict === 'to-grade' || verdict === 'not-to-grade'
      ? t(`grade.${verdict}.${surface}`)
      : verdict === 'not-yet'
        ? t('grade.not-yet', { shot: state.shot, of: state.of })
        : t(`grade.${verdict}`);
  return (
    <>
      <Heading level={2} size="title" tone={gradeTone[verdict]}>
        {title}
      </Heading>
      <Body>
        {before}
        {said && worst?.deciding?.deviation != null ? (
          <>
            {` ${t('grade.worst')} `}
            <Strong>{`${placeWords(bundle.footing, worst)}, ${offGradeWords(toMark(worst.deciding.deviation, bundle.job.graduation), bundle.job.unitStyle)}`}</Strong>
            {'.'}
          </>
        ) : null}
        {after ? ` ${after}` : ''}
      </Body>
    </>
  );
}

const styles = StyleSheet.create({
  beside: { flexDirection: 'row' },
  half: { paddingVertical: space.m, paddingHorizontal: space.l, gap: space.xs },
  top: { borderTopLeftRadius: radius.verdict - 2, borderTopRightRadius: radius.verdict - 2 },
  grow: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
});
