import { useRouter } from 'expo-router';
import { useState } from 'react';
import { FormProvider, useForm, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FormBox } from '@/components/forms/form-box';
import { FormChoice } from '@/components/forms/form-choice';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { MayNot } from '@/components/root/may-not';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { Screen } from '@/components/ui/screen';
import { Body } from '@/components/ui/text';
import { useAddJob } from '@/hooks/api/job-queries';
import { useMay } from '@/hooks/session/use-session';
import { USUAL_GRADUATION, type UnitStyle } from '@/shared/quantities';
import { readyBedRule, readyToleranceRules, SURFACES, type Surface, type WallType } from '@/shared/rules';
import { BedFields } from './bed-fields';
import { graduationOptions, styleOptions, wallOptions } from './graduation-options';
import { bedDraft, readBed, readTolerances, toleranceDrafts, withUnit, type BedForm, type RulesForm } from './rule-drafts';
import { SurfaceRule } from './surface-rule';

interface NewJobForm extends RulesForm, BedForm {
  name: string;
  address: string;
  unitStyle: UnitStyle;
  graduation: string;
  wallType: WallType;
}

const ready = (unitStyle: UnitStyle, wallType: WallType) => ({
  graduation: String(USUAL_GRADUATION[unitStyle]),
  rules: toleranceDrafts(readyToleranceRules(unitStyle)),
  bed: bedDraft(readyBedRule(wallType, unitStyle)),
});
const blank: NewJobForm = {
  name: '',
  address: '',
  unitStyle: 'feet-inches',
  wallType: 'block',
  ...ready('feet-inches', 'block'),
};

const BED_LENGTHS = ['least', 'most', 'nominal', 'grindMost', 'courseHeight'] as const;
type LengthName = `rules.${Surface}.${'low' | 'high'}` | `bed.${(typeof BED_LENGTHS)[number]}`;

/** The server's paths of a job, and the form's names. */
const paths = {
  name: 'name',
  address: 'address',
  graduation: 'graduation',
  wallType: 'wallType',
  unitStyle: 'unitStyle',
} as const;

export function NewJobScreen() {
  const { t } = useTranslation('jobs');
  const mayAdd = useMay('job.write');
  return mayAdd ? <NewJob /> : <MayNot title={t('new.title')} back="/jobs" />;
}

function useNewJob() {
  const router = useRouter();
  const addJob = useAddJob();
  const form = useForm<NewJobForm>({ defaultValues: blank });
  const [refusal, setRefusal] = useState<string | null>(null);
  const submit = form.handleSubmit(async ({ rules, bed, graduation, name, address, ...job }) => {
    setRefusal(null);
    try {
      const saved = await addJob.mutateAsync({
        ...job,
        name: name.trim(),
        address: address.trim(),
        graduation: Number(graduation),
        rules: readTolerances(rules, job.unitStyle),
        bedRule: readBed(bed, job.unitStyle),
      });
      router.replace({ pathname: '/jobs/[jobId]', params: { jobId: saved.id } });
    } catch (error) {
      setRefusal(placeRefusals(error, form.setError, paths));
    }
  });
  /** Fills in what is usual for the unit and wall; what the person has changed by hand stays, with its unit written out. */
  const fillIn = (unitStyle: UnitStyle, wallType: WallType, before: UnitStyle) => {
    const usual = ready(unitStyle, wallType);
    const { dirtyFields } = form.formState;
    form.resetField('graduation', { defaultValue: usual.graduation });
    for (const surface of SURFACES) {
      // Set rather than reset: a rule whose fields are closed is not registered, and resetting passes over it.
      if (!dirtyFields.rules?.[surface]) form.setValue(`rules.${surface}`, usual.rules[surface]);
      else for (const limit of [`rules.${surface}.low`, `rules.${surface}.high`] as const) spellOut(limit, before);
    }
    if (!dirtyFields.bed) form.resetField('bed', { defaultValue: usual.bed });
    else for (const part of BED_LENGTHS) spellOut(`bed.${part}`, before);
  };
  const spellOut = (name: LengthName, before: UnitStyle) => form.setValue(name, withUnit(form.getValues(name), before));
  return { form, submit: () => void submit(), fillIn, refusal };
}

function NewJob() {
  const { t } = useTranslation('jobs');
  const { form, submit, fillIn, refusal } = useNewJob();
  const { control, formState } = form;
  // Reading it subscribes: `fillIn` asks it what was changed by hand.
  void formState.dirtyFields;
  const [style, wall] = useWatch({ control, name: ['unitStyle', 'wallType'] });
  return (
    <Screen
      title={t('new.title')}
      back="/jobs"
      crumbs={[{ label: t('title'), href: '/jobs' }]}
      maxWidth={1100}
      actions={
        <Button variant="primary" size="large" grow label={t('new.submit')} busy={formState.isSubmitting} onPress={submit} />
      }
    >
      <FormProvider {...form}>
        <FormBox onSubmit={submit}>
          <FormRefusal sentence={refusal} />
          <Columns>
            <Column>
              <FormTextField control={control} name="name" label={t('new.name')} hint={t('new.nameHint')} maxLength={120} />
              <FormTextField control={control} name="address" label={t('new.address')} optional maxLength={300} />
              <FormChoice
                control={control}
                name="unitStyle"
                label={t('new.unitStyle')}
                layout="rows"
                options={styleOptions()}
                onChosen={(chosen) => fillIn(chosen, wall, style)}
              />
              <FormChoice
                control={control}
                name="graduation"
                label={t('new.graduation')}
                hint={t('new.graduationHint')}
                options={graduationOptions(style)}
              />
              <FormChoice
                control={control}
                name="wallType"
                label={t('new.wallType')}
                layout="rows"
                options={wallOptions()}
                onChosen={(chosen) => fillIn(style, chosen, style)}
              />
            </Column>
            <Column>
              <Card title={t('rule.title')}>
                <Body size="small" tone="ink2">
                  {t('rule.ready')}
                </Body>
                {SURFACES.map((surface) => (
                  <SurfaceRule key={surface} surface={surface} style={style} />
                ))}
              </Card>
              <Card title={t('bed.title')}>
                <Body size="small" tone="ink2">
                  {t('bed.ready')}
                </Body>
                <BedFields style={style} />
              </Card>
            </Column>
          </Columns>
        </FormBox>
      </FormProvider>
    </Screen>
  );
}
