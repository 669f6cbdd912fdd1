import { useState } from 'react';
import { formatLength, type CourseGroup, type Nm } from '@/analysis';
import { useTranslation } from 'react-i18next';
import { StyleSheet, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Choice } from '@/components/ui/choice';
import { Body } from '@/components/ui/text';
import { space } from '@/constants/theme';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import { courseAt } from '@/shared/round/course-at';
import type { WallResult } from '@/shared/round/round-results';
import { LengthField, lengthRefusal } from '../lengths/length-field';
import { printSmall } from '../lengths/print-length';
import { readLength } from '../lengths/read-length';
import { FigureRow } from './figure-row';
import { groupGrade, heightWords, rangeWords, grindLengthWords, toMark, volumeWords, windowInMarks } from './results-words';

interface CourseCardProps {
  bundle: RoundBundle;
  wall: WallResult;
  group: CourseGroup;
}

const OPTIONS = ['no-grinding', 'plan-height', 'least-material'] as const;
type OptionKind = (typeof OPTIONS)[number];

/** What a first course at a chosen height takes: its bed, shim or foam, and what must be ground. Starts where nothing is ground. */
export function CourseCard({ bundle, wall, group }: CourseCardProps) {
  const { t } = useTranslation('results');
  const { bedRule, job } = bundle;
  const grade = groupGrade(group, wall.runs);
  const optionHeight = (kind: OptionKind): Nm => {
    const exact = (group.options.find((option) => option.kind === kind)?.elevation ?? grade) - grade;
    // Up to the next mark, because a mark lower would have to be ground.
    return kind === 'no-grinding' ? Math.ceil(exact / job.graduation) * job.graduation + 0 : toMark(exact, job.graduation);
  };
  const [height, setHeight] = useState<Nm>(() => optionHeight('no-grinding'));
  const [typed, setTyped] = useState(() => printSmall(height, job.unitStyle));
  const choose = (next: Nm) => {
    setHeight(next);
    setTyped(printSmall(next, job.unitStyle));
  };
  const rule = { style: job.unitStyle, sign: 'any', graduation: job.graduation } as const;
  const course = courseAt(group, wall.runs, bedRule, grade + height);
  const range = group.window ? windowInMarks(group.window, grade, job.graduation) : null;
  const step = printSmall(job.graduation, job.unitStyle);
  const limits = { least: printSmall(bedRule.least, bedRule.style), most: printSmall(bedRule.most, bedRule.style) };
  return (
    <Card
      title={
        wall.groups.length > 1
          ? t('course.titleStep', { grade: formatLength(grade, job.unitStyle, job.graduation) })
          : t('course.title')
      }
      note={heightWords(height, bundle)}
    >
      <FigureRow large label={t('course.bottom')} value={formatLength(grade + height, job.unitStyle, job.graduation)} />
      <View style={styles.stepper}>
        <Button label={`− ${step}`} spokenLabel={t('course.lower', { step })} onPress={() => choose(height - job.graduation)} />
        <LengthField
          label={t('course.typed')}
          value={typed}
          onChange={(text: string) => {
            setTyped(text);
            if (lengthRefusal(text, rule) === null) setHeight(readLength(text, rule));
          }}
          hint=""
          boxStyle={styles.field}
          {...rule}
        />
        <Button label={`+ ${step}`} spokenLabel={t('course.raise', { step })} onPress={() => choose(height + job.graduation)} />
      </View>
      <Body tone="ink2" size="small">
        {range ? t('course.window', { ...limits, range: rangeWords(range, bundle) }) : t('course.noWindow', limits)}{' '}
        {range ? t(height >= range.from && height <= range.to ? 'course.insideWindow' : 'course.outsideWindow') : ''}
      </Body>
      <Choice<OptionKind | 'own'>
        label={t('course.ready')}
        options={OPTIONS.map((value) => ({ value, label: t(`course.option.${value}`) }))}
        value={OPTIONS.find((kind) => optionHeight(kind) === height) ?? 'own'}
        onChange={(kind) => {
          if (kind !== 'own') choose(optionHeight(kind));
        }}
      />
      <FigureRow label={t(`course.bed.${bedRule.material}`)} value={volumeWords(course.bedVolume, bundle)} />
      <FigureRow
        label={t('course.grinding')}
        value={
          course.grindLength > 0
            ? t('course.grindLength', {
                length: grindLengthWords(course.grindLength, bundle),
                volume: volumeWords(course.grindVolume, bundle),
              })
            : t('course.noGrinding')
        }
      />
      <FigureRow label={t('course.thinnest')} value={bedWords(course.leastBed)} />
      <FigureRow label={t('course.thickest')} value={bedWords(course.mostBed)} />
    </Card>
  );

  function bedWords(bed: Nm): string {
    const rounded = toMark(bed, job.graduation);
    const size = printSmall(Math.abs(rounded), job.unitStyle);
    return rounded < 0 ? t('course.into', { depth: size }) : size;
  }
}

const styles = StyleSheet.create({
  stepper: { flexDirection: 'row', alignItems: 'flex-end', gap: space.s },
  field: { flexGrow: 1, flexShrink: 1, flexBasis: 90, minWidth: 0 },
});
