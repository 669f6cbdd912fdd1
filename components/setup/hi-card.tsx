import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { gradeRod, type Nm } from '@/analysis';
import { toTheMark } from '@/components/lengths/job-units';
import { printLength } from '@/components/lengths/print-length';
import { Card } from '@/components/ui/card';
import { LengthText } from '@/components/ui/length-text';
import { Body, Figure, Label } from '@/components/ui/text';
import { space } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { RoundSeries } from '@/shared/round/round-state';
import type { Setup } from './use-setup';

interface HiCardProps {
  setup: Setup;
  series: RoundSeries;
  hi: Nm;
  view: ReadyRound;
}

/** The height of instrument with its working, and the grade rod of every grade of the footing. */
export function HiCard({ setup, series, hi, view }: HiCardProps) {
  const { t } = useTranslation('setup');
  const tokens = useTokens();
  const { job, benchmarks } = view.bundle;
  const style = job.unitStyle;
  const read = series.readings.find(({ record, struck }) => record.purpose === 'backsight' && !struck)?.record.point;
  const benchmark = read?.kind === 'benchmark' ? benchmarks.find(({ id }) => id === read.benchmarkId) : undefined;
  const grades = [...new Set(view.state.targets.map(({ grade }) => grade))].sort((p, q) => q - p);
  return (
    <Card title={t('hi.title')}>
      <LengthText value={printLength(hi, style)} size="title" />
      {benchmark ? (
        <>
          <Label>{t('hi.workingWords', { benchmark: benchmark.name })}</Label>
          <Figure>
            {t('hi.working', {
              elevation: printLength(benchmark.elevation, style),
              // The mean where there are several.
              backsight: printLength(hi - benchmark.elevation, setup.rules?.style ?? style),
              hi: printLength(hi, style),
            })}
          </Figure>
        </>
      ) : null}
      {grades.length > 0 ? <Label weight="semibold">{t('hi.gradeRods')}</Label> : null}
      <View role="list">
        {grades.map((grade) => (
          <View key={grade} role="listitem" style={[styles.grade, { borderTopColor: tokens.rule }]}>
            <Body tone="ink2">{t('hi.gradeOf', { grade: printLength(grade, style) })}</Body>
            <GradeRod rod={gradeRod(hi, grade)} setup={setup} style={style} />
          </View>
        ))}
      </View>
    </Card>
  );
}

/** What the rod reads at grade; where it cannot, what to do. */
function GradeRod({ rod, setup, style }: { rod: Nm; setup: Setup; style: ReadyRound['bundle']['job']['unitStyle'] }) {
  const { t } = useTranslation('setup');
  const { rules } = setup;
  const printed = rules ? toTheMark(rod, rules) : printLength(rod, style);
  return (
    <>
      <Figure size="head" weight="bold" align="right">
        {printed}
      </Figure>
      {rod < 0 ? <Body size="small">{t('hi.belowBeam')}</Body> : null}
      {rules && rod > rules.rodLength ? <Body size="small">{t('hi.beyondRod')}</Body> : null}
    </>
  );
}

const styles = StyleSheet.create({
  grade: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'baseline',
    justifyContent: 'space-between',
    columnGap: space.m,
    paddingVertical: space.s,
    borderTopWidth: 1,
  },
});
