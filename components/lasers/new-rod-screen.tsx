import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FormBox } from '@/components/forms/form-box';
import { FormChoice } from '@/components/forms/form-choice';
import { FormLengthField } from '@/components/forms/form-length-field';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { graduationOptions, styleOptions } from '@/components/jobs/graduation-options';
import { readLength } from '@/components/lengths/read-length';
import { MayNot } from '@/components/root/may-not';
import { Button } from '@/components/ui/button';
import { Screen } from '@/components/ui/screen';
import { useAddRod } from '@/hooks/api/instrument-queries';
import { useMay } from '@/hooks/session/use-session';
import { USUAL_GRADUATION, type UnitStyle } from '@/shared/quantities';

interface RodForm {
  name: string;
  style: UnitStyle;
  graduation: string;
  length: string;
}

const blank: RodForm = { name: '', style: 'feet-inches', graduation: String(USUAL_GRADUATION['feet-inches']), length: '' };
const paths = { name: 'name', graduation: 'graduation', length: 'length' } as const;

export function NewRodScreen() {
  const { t } = useTranslation('lasers');
  return useMay('laser.write') ? <NewRod /> : <MayNot title={t('newRod.title')} back="/lasers" />;
}

function NewRod() {
  const { t } = useTranslation(['lasers', 'jobs']);
  const router = useRouter();
  const addRod = useAddRod();
  const { control, handleSubmit, setError, setValue, formState } = useForm<RodForm>({ defaultValues: blank });
  const [refusal, setRefusal] = useState<string | null>(null);
  const style = useWatch({ control, name: 'style' });
  const submit = handleSubmit(async (form) => {
    setRefusal(null);
    try {
      const length = readLength(form.length, { style: form.style });
      await addRod.mutateAsync({ name: form.name.trim(), style: form.style, graduation: Number(form.graduation), length });
      router.replace('/lasers');
    } catch (error) {
      setRefusal(placeRefusals(error, setError, paths));
    }
  });
  return (
    <Screen
      title={t('lasers:newRod.title')}
      back="/lasers"
      crumbs={[{ label: t('lasers:title'), href: '/lasers' }]}
      maxWidth={720}
      actions={
        <Button
          variant="primary"
          size="large"
          grow
          label={t('lasers:newRod.submit')}
          busy={formState.isSubmitting}
          onPress={() => void submit()}
        />
      }
    >
      <FormBox onSubmit={() => void submit()}>
        <FormRefusal sentence={refusal} />
        <FormTextField
          control={control}
          name="name"
          label={t('lasers:newRod.name')}
          hint={t('lasers:newRod.nameHint')}
          maxLength={120}
        />
        <FormChoice
          control={control}
          name="style"
          label={t('lasers:newRod.style')}
          layout="rows"
          options={styleOptions()}
          onChosen={(chosen) => setValue('graduation', String(USUAL_GRADUATION[chosen]))}
        />
        <FormChoice
          control={control}
          name="graduation"
          label={t('lasers:newRod.graduation')}
          hint={t('lasers:newRod.graduationHint')}
          options={graduationOptions(style)}
        />
        <FormLengthField
          control={control}
          name="length"
          label={t('lasers:newRod.length')}
          hint={t(`lasers:newRod.lengthHint.${style}`)}
          style={style}
        />
      </FormBox>
    </Screen>
  );
}
