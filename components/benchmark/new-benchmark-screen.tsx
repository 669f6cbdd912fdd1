import { useQuery } from '@tanstack/react-query';
import { useRouter, type Href } from 'expo-router';
import { useState } from 'react';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { NM_PER_FOOT, NM_PER_METRE, type Nm } from '@/analysis';
import { describeError } from '@/components/forms/describe-error';
import { FormBox } from '@/components/forms/form-box';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { LengthField, lengthRefusal } from '@/components/lengths/length-field';
import { printLength } from '@/components/lengths/print-length';
import { readLength, type LengthRule } from '@/components/lengths/read-length';
import { Button } from '@/components/ui/button';
import { Column, Columns } from '@/components/ui/columns';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { ApiError } from '@/hooks/api/client';
import { jobQuery, useAddBenchmark } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import type { Job } from '@/shared/api/job-endpoints';
import type { UnitStyle } from '@/shared/quantities';
import { CutSheetCard } from './cut-sheet-card';

interface NewBenchmarkProps {
  jobId: string;
  /** Whoever came from setting up the laser goes back there. */
  roundId?: string | undefined;
}

/** A point of known elevation: as the drawing says it, or called 100 on a job without elevations. */
export function NewBenchmarkScreen({ jobId, roundId }: NewBenchmarkProps) {
  const { t } = useTranslation('setup');
  const may = useMay('benchmark.add');
  const job = useQuery(jobQuery(jobId));
  const back: Href = roundId === undefined ? `/jobs/${jobId}` : `/rounds/${roundId}/setup`;
  if (job.data && may) return <BenchmarkForm job={job.data} back={back} />;
  return (
    <Screen title={t('benchmark.title')} back={back}>
      {may ? null : <Notice kind="plain">{t('benchmark.locked')}</Notice>}
      {job.error ? <ErrorState title={describeError(job.error)} onRetry={() => void job.refetch()} /> : null}
      {may && !job.error ? <LoadingState /> : null}
    </Screen>
  );
}

/** What a job without elevations calls its benchmark: 100 ft, or 100 m. */
const roundElevation = (style: UnitStyle): Nm => 100 * (style === 'metric' ? NM_PER_METRE : NM_PER_FOOT);

interface BenchmarkTexts {
  name: string;
  elevation: string;
  note: string;
}

/** The form's state, and sending it: a name that is taken stands beside the name. */
function useBenchmarkForm(job: Job, back: Href) {
  const { t } = useTranslation(['setup', 'errors']);
  const router = useRouter();
  const form = useForm<BenchmarkTexts>({ defaultValues: { name: '', elevation: '', note: '' } });
  const adding = useAddBenchmark(job.id);
  const [refusal, setRefusal] = useState<string | null>(null);
  const rule: LengthRule = { style: job.unitStyle, sign: 'any', bareDecimal: 'feet' };
  const round = printLength(roundElevation(job.unitStyle), job.unitStyle);
  const checkElevation = (text: string): true | string =>
    text.trim() === '' ? t('benchmark.elevationNeeded', { round }) : (lengthRefusal(text, rule) ?? true);
  const submit = form.handleSubmit(async ({ name, elevation, note }) => {
    setRefusal(null);
    try {
      await adding.mutateAsync({ name: name.trim(), elevation: readLength(elevation, rule), note: note.trim() });
      router.replace(back);
    } catch (error) {
      if (error instanceof ApiError && error.code === 'name-taken') {
        form.setError('name', { type: 'server', message: t('errors:name-taken') }, { shouldFocus: true });
      } else setRefusal(placeRefusals(error, form.setError, { name: 'name', elevation: 'elevation', note: 'note' }));
    }
  });
  return { ...form, submit: () => void submit(), busy: adding.isPending, refusal, rule, round, checkElevation };
}

function BenchmarkForm({ job, back }: { job: Job; back: Href }) {
  const { t } = useTranslation('setup');
  const wide = useWide();
  const form = useBenchmarkForm(job, back);
  const { control } = form;
  const elevation = useWatch({ control, name: 'elevation' });
  return (
    <Screen
      title={t('benchmark.title')}
      subtitle={wide ? undefined : job.name}
      back={back}
      crumbs={[{ label: job.name, href: `/jobs/${job.id}` }]}
      actions={
        <Button label={t('benchmark.submit')} variant="primary" size="large" grow busy={form.busy} onPress={form.submit} />
      }
    >
      <Columns>
        <Column>
          <FormBox onSubmit={form.submit}>
            <FormTextField
              control={control}
              name="name"
              label={t('benchmark.name')}
              hint={t('benchmark.nameHint')}
              maxLength={120}
              autoComplete="off"
              autoFocus
            />
            <Controller
              control={control}
              name="elevation"
              rules={{ validate: form.checkElevation }}
              render={({ field: { ref, value, onChange, onBlur }, fieldState }) => (
                <LengthField
                  {...form.rule}
                  ref={ref}
                  label={t('benchmark.elevation')}
                  hint={t('benchmark.elevationHint')}
                  value={value}
                  onChange={onChange}
                  onBlur={onBlur}
                  error={fieldState.error?.message}
                />
              )}
            />
            <Button
              label={t('benchmark.callIt', { round: form.round })}
              variant="plain"
              onPress={() => form.setValue('elevation', form.round, { shouldDirty: true, shouldValidate: true })}
            />
            <FormTextField
              control={control}
              name="note"
              optional
              label={t('benchmark.note')}
              hint={t('benchmark.noteHint')}
              maxLength={2000}
              autoComplete="off"
            />
            <FormRefusal sentence={form.refusal} />
          </FormBox>
        </Column>
        <Column>
          <CutSheetCard elevation={elevation} style={job.unitStyle} footings={job.footings} />
        </Column>
      </Columns>
    </Screen>
  );
}
