import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { View } from 'react-native';
import type { Href } from 'expo-router';
import { accuracyWords } from '@/components/lengths/length-words';
import { printLength, printRound, printSmall } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Choice, type ChoiceOption } from '@/components/ui/choice';
import { FieldError } from '@/components/ui/field-error';
import { Notice } from '@/components/ui/notice';
import { Body, Label } from '@/components/ui/text';
import { laserCheckDue, localDay } from '@/shared/laser-check-age';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import { readingGraduation } from '@/shared/round/reading-graduation';
import type { Picked, Setup } from './use-setup';

interface InstrumentsCardProps {
  setup: Setup;
  bundle: RoundBundle;
}

/** Which laser stands there, which rod is read, and on which benchmark. */
export function InstrumentsCard({ setup, bundle }: InstrumentsCardProps) {
  const { t } = useTranslation('setup');
  const { job, round } = bundle;
  const style = job.unitStyle;
  const addBenchmark: Href = {
    pathname: '/jobs/[jobId]/benchmarks/new',
    params: { jobId: job.id, roundId: round.id },
  };
  return (
    <Card title={t('instruments.title')}>
      <Pick
        setup={setup}
        part="laserId"
        label={t('instruments.laser')}
        options={bundle.lasers.map((laser) => ({ value: laser.id, label: laser.name, note: accuracyWords(laser, style) }))}
        none={t('instruments.noLaser')}
        add={<Button label={t('instruments.enterLaser')} href="/lasers/new" />}
      />
      <LaserAge setup={setup} bundle={bundle} />
      <Pick
        setup={setup}
        part="rodId"
        label={t('instruments.rod')}
        options={bundle.rods.map((rod) => ({
          value: rod.id,
          label: rod.name,
          note: t('instruments.rodNote', {
            length: printRound(rod.length, rod.style),
            mark: printSmall(readingGraduation(job, rod), rod.style),
          }),
        }))}
        none={t('instruments.noRod')}
        add={<Button label={t('instruments.enterRod')} href="/rods/new" />}
      />
      <Pick
        setup={setup}
        part="benchmarkId"
        label={t('instruments.benchmark')}
        options={bundle.benchmarks.map((mark) => ({
          value: mark.id,
          label: mark.name,
          note: [printLength(mark.elevation, style), mark.note].filter((part) => part !== '').join(', '),
        }))}
        none={t('instruments.noBenchmark')}
        add={<Button label={t('instruments.addBenchmark')} href={addBenchmark} />}
      />
    </Card>
  );
}

interface PickProps {
  setup: Setup;
  part: keyof Picked;
  label: string;
  options: ChoiceOption<string>[];
  /** Said where there is nothing to pick from, with the button that brings it. */
  none: string;
  add: ReactNode;
}

function Pick({ setup, part, label, options, none, add }: PickProps) {
  const error = setup.refusalAt(part);
  if (options.length === 0) {
    return (
      <View style={{ gap: 8 }}>
        <Label weight="semibold">{label}</Label>
        <Body>{none}</Body>
        {add}
        <FieldError id={`${part}-none`} message={error} />
      </View>
    );
  }
  return (
    <Choice
      label={label}
      layout="rows"
      options={options}
      value={setup.picked[part]}
      onChange={(id) => setup.pick(part, id)}
      error={error}
      disabled={setup.fixed}
    />
  );
}

/** A laser that nobody checked lately may stand still and be out of level all the same. */
function LaserAge({ setup, bundle }: InstrumentsCardProps) {
  const { t } = useTranslation('setup');
  const [today] = useState(() => localDay(Date.now()));
  const laser = bundle.lasers.find(({ id }) => id === setup.picked.laserId);
  const due = laser ? laserCheckDue(laser.checkedOn, today) : null;
  if (!laser || due === null) return null;
  const lead =
    due.kind === 'never'
      ? t('instruments.neverChecked', { laser: laser.name })
      : t('instruments.checkOld', { laser: laser.name, days: due.days });
  return (
    <Notice kind="caution" lead={lead}>
      {t('instruments.checkHow')}
    </Notice>
  );
}
