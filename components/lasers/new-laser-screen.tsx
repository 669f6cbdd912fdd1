import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { z } from 'zod';
import { FieldPair } from '@/components/forms/field-pair';
import { FormBox } from '@/components/forms/form-box';
import { FormChoice } from '@/components/forms/form-choice';
import { FormLengthField } from '@/components/forms/form-length-field';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { readLength } from '@/components/lengths/read-length';
import { MayNot } from '@/components/root/may-not';
import { Button } from '@/components/ui/button';
import { Screen } from '@/components/ui/screen';
import { Body } from '@/components/ui/text';
import { useAddLaser } from '@/hooks/api/instrument-queries';
import { useMay } from '@/hooks/session/use-session';
import type { LaserInput } from '@/shared/api/instrument-endpoints';
import { localDay } from '@/shared/laser-check-age';

interface LaserForm {
  name: string;
  style: 'feet-inches' | 'metric';
  accuracy: string;
  accuracyAt: string;
  receiverFine: string;
  receiverCoarse: string;
  checkedOn: string;
}

const blank: LaserForm = {
  name: '',
  style: 'feet-inches',
  accuracy: '',
  accuracyAt: '',
  receiverFine: '',
  receiverCoarse: '',
  checkedOn: '',
};

const paths = {
  name: 'name',
  accuracy: 'accuracy',
  accuracyAt: 'accuracyAt',
  receiverFine: 'receiverFine',
  receiverCoarse: 'receiverCoarse',
  checkedOn: 'checkedOn',
} as const;

/** @throws AnalysisError of `readLength` */
function readLaser({ name, style, checkedOn, ...form }: LaserForm): LaserInput {
  return {
    name: name.trim(),
    accuracy: readLength(form.accuracy, { style }),
    accuracyAt: readLength(form.accuracyAt, { style }),
    receiverFine: readLength(form.receiverFine, { style }),
    receiverCoarse: readLength(form.receiverCoarse, { style }),
    checkedOn: checkedOn.trim() === '' ? null : checkedOn.trim(),
  };
}

export function NewLaserScreen() {
  const { t } = useTranslation('lasers');
  return useMay('laser.write') ? <NewLaser /> : <MayNot title={t('newLaser.title')} back="/lasers" />;
}

function useNewLaser() {
  const router = useRouter();
  const addLaser = useAddLaser();
  const form = useForm<LaserForm>({ defaultValues: blank });
  const [refusal, setRefusal] = useState<string | null>(null);
  const submit = form.handleSubmit(async (typed) => {
    setRefusal(null);
    try {
      await addLaser.mutateAsync(readLaser(typed));
      router.replace('/lasers');
    } catch (error) {
      setRefusal(placeRefusals(error, form.setError, paths));
    }
  });
  return { form, submit: () => void submit(), refusal };
}

function NewLaser() {
  const { t } = useTranslation('lasers');
  const { form, submit, refusal } = useNewLaser();
  const { control, formState } = form;
  const style = useWatch({ control, name: 'style' });
  const example = (key: 'accuracy' | 'accuracyAt' | 'fine' | 'coarse') => t(`newLaser.${key}Hint.${style}`);
  const checkDay = (text: string) =>
    z.iso.date().safeParse(text.trim()).success && text.trim() <= localDay(Date.now()) ? null : t('newLaser.dayRefused');
  return (
    <Screen
      title={t('newLaser.title')}
      back="/lasers"
      crumbs={[{ label: t('title'), href: '/lasers' }]}
      maxWidth={720}
      actions={
        <Button variant="primary" size="large" grow label={t('newLaser.submit')} busy={formState.isSubmitting} onPress={submit} />
      }
    >
      <Body tone="ink2">{t('newLaser.why')}</Body>
      <FormBox onSubmit={submit}>
        <FormRefusal sentence={refusal} />
        <FormTextField control={control} name="name" label={t('newLaser.name')} hint={t('newLaser.nameHint')} maxLength={120} />
        <FormChoice
          control={control}
          name="style"
          label={t('newLaser.style')}
          options={[
            { value: 'feet-inches', label: t('newLaser.inches') },
            { value: 'metric', label: t('newLaser.millimetres') },
          ]}
        />
        <FieldPair>
          <FormLengthField
            control={control}
            name="accuracy"
            label={t('newLaser.accuracy')}
            hint={example('accuracy')}
            style={style}
          />
          <FormLengthField
            control={control}
            name="accuracyAt"
            label={t('newLaser.accuracyAt')}
            hint={example('accuracyAt')}
            style={style}
          />
        </FieldPair>
        <FieldPair>
          <FormLengthField control={control} name="receiverFine" label={t('laser.fine')} hint={example('fine')} style={style} />
          <FormLengthField
            control={control}
            name="receiverCoarse"
            label={t('laser.coarse')}
            hint={example('coarse')}
            style={style}
          />
        </FieldPair>
        <FormTextField
          control={control}
          name="checkedOn"
          label={t('newLaser.checkedOn')}
          hint={t('newLaser.checkedOnHint')}
          optional
          check={checkDay}
          maxLength={10}
          figures
          end={
            <Button
              variant="quiet"
              size="small"
              label={t('newLaser.today')}
              onPress={() => form.setValue('checkedOn', localDay(Date.now()), { shouldValidate: true })}
            />
          }
        />
      </FormBox>
    </Screen>
  );
}
