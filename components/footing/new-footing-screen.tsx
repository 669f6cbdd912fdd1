import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useForm, type Control } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FieldPair } from '@/components/forms/field-pair';
import { FormBox } from '@/components/forms/form-box';
import { FormChoice } from '@/components/forms/form-choice';
import { FormLengthField } from '@/components/forms/form-length-field';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { Loaded } from '@/components/query/loaded';
import { MayNot } from '@/components/root/may-not';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { Screen } from '@/components/ui/screen';
import { useAddFooting } from '@/hooks/api/footing-queries';
import { jobQuery } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import type { Job } from '@/shared/api/job-endpoints';
import type { UnitStyle } from '@/shared/quantities';
import { blankFooting, footingRules, readFooting, SIDES, type FootingForm } from './footing-drafts';

/** The server's paths of a footing, and the form's names. */
const paths = {
  name: 'name',
  planGrade: 'planGrade',
  width: 'width',
  thickness: 'thickness',
  wallThickness: 'wallThickness',
  railOffset: 'railOffset',
  'landmark.name': 'landmark',
} as const;

export function NewFootingScreen({ jobId }: { jobId: string }) {
  const { t } = useTranslation('footing');
  const mayAdd = useMay('footing.write');
  const query = useQuery(jobQuery(jobId));
  if (!mayAdd) return <MayNot title={t('new.title')} back={{ pathname: '/jobs/[jobId]', params: { jobId } }} />;
  if (query.data) return <NewFooting job={query.data} />;
  return (
    <Screen title={t('new.title')} back={{ pathname: '/jobs/[jobId]', params: { jobId } }}>
      <Loaded query={query}>{() => null}</Loaded>
    </Screen>
  );
}

function useNewFooting({ id, unitStyle }: Job) {
  const router = useRouter();
  const addFooting = useAddFooting(id);
  const { control, handleSubmit, setError, formState } = useForm<FootingForm>({ defaultValues: blankFooting });
  const [refusal, setRefusal] = useState<string | null>(null);
  const submit = handleSubmit(async (form) => {
    setRefusal(null);
    try {
      const footing = await addFooting.mutateAsync(readFooting(form, unitStyle));
      router.replace({ pathname: '/footings/[footingId]/outline', params: { footingId: footing.id } });
    } catch (error) {
      setRefusal(placeRefusals(error, setError, paths));
    }
  });
  return { control, busy: formState.isSubmitting, refusal, submit: () => void submit() };
}

function NewFooting({ job }: { job: Job }) {
  const { t } = useTranslation(['footing', 'jobs']);
  const { control, busy, refusal, submit } = useNewFooting(job);
  const here = { pathname: '/jobs/[jobId]', params: { jobId: job.id } } as const;
  return (
    <Screen
      title={t('footing:new.title')}
      subtitle={job.name}
      back={here}
      crumbs={[
        { label: t('jobs:title'), href: '/jobs' },
        { label: job.name, href: here },
      ]}
      maxWidth={1100}
      actions={<Button variant="primary" size="large" grow label={t('footing:new.submit')} busy={busy} onPress={submit} />}
    >
      <FormBox onSubmit={submit}>
        <FormRefusal sentence={refusal} />
        <Columns>
          <Column>
            <SizeFields control={control} style={job.unitStyle} />
          </Column>
          <Column>
            <ShootingFields control={control} style={job.unitStyle} />
            <LandmarkFields control={control} />
          </Column>
        </Columns>
      </FormBox>
    </Screen>
  );
}

interface FieldsProps {
  control: Control<FootingForm>;
  style: UnitStyle;
}

function SizeFields({ control, style }: FieldsProps) {
  const { t } = useTranslation('footing');
  const rules = footingRules(style);
  return (
    <Card title={t('new.drawing')}>
      <FormTextField control={control} name="name" label={t('new.name')} hint={t('new.nameHint')} maxLength={120} />
      <FormLengthField
        control={control}
        name="planGrade"
        label={t('new.planGrade')}
        hint={t(`new.planGradeHint.${style}`)}
        {...rules.planGrade}
      />
      <FieldPair>
        <FormLengthField
          control={control}
          name="width"
          label={t('new.width')}
          hint={t(`new.widthHint.${style}`)}
          {...rules.size}
        />
        <FormLengthField
          control={control}
          name="thickness"
          label={t('new.thickness')}
          hint={t(`new.thicknessHint.${style}`)}
          {...rules.size}
        />
      </FieldPair>
      <FormLengthField
        control={control}
        name="wallThickness"
        label={t('new.wallThickness')}
        hint={t(`new.thicknessHint.${style}`)}
        {...rules.size}
      />
      <FormChoice
        control={control}
        name="measuredOn"
        label={t('new.measuredOn')}
        hint={t('new.measuredOnHint')}
        layout="rows"
        options={(['wall-face', 'footing-face', 'centre-line'] as const).map((value) => ({
          value,
          label: t(`measuredOn.${value}`),
        }))}
      />
    </Card>
  );
}

function ShootingFields({ control, style }: FieldsProps) {
  const { t } = useTranslation('footing');
  return (
    <Card title={t('new.shooting')}>
      <FormChoice
        control={control}
        name="rails"
        label={t('new.rails')}
        layout="rows"
        options={(['centre', 'both'] as const).map((value) => ({
          value,
          label: t(`rails.${value}`),
          note: t(`rails.${value}Note`),
        }))}
      />
      <FormLengthField
        control={control}
        name="railOffset"
        label={t('new.railOffset')}
        hint={t('new.railOffsetHint')}
        optional
        {...footingRules(style).railOffset}
      />
      <FormChoice
        control={control}
        name="dig"
        label={t('new.dig')}
        options={[
          { value: 'needed', label: t('new.digNeeded') },
          { value: 'not-needed', label: t('new.digNotNeeded') },
        ]}
      />
    </Card>
  );
}

function LandmarkFields({ control }: { control: Control<FootingForm> }) {
  const { t } = useTranslation('footing');
  return (
    <Card title={t('new.landmarkTitle')}>
      <FormTextField
        control={control}
        name="landmark"
        label={t('new.landmark')}
        hint={t('new.landmarkHint')}
        optional
        maxLength={120}
      />
      <FormChoice
        control={control}
        name="side"
        label={t('new.side')}
        hint={t('new.sideHint')}
        options={SIDES.map((value) => ({ value, label: t(`side.${value}`) }))}
      />
    </Card>
  );
}
