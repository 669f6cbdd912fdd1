import { useState, type ReactNode } from 'react';
import { FormProvider, useForm, type DefaultValues, type FieldValues } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { FieldPair } from '@/components/forms/field-pair';
import { FormBox } from '@/components/forms/form-box';
import { FormRefusal } from '@/components/forms/form-refusal';
import { Button } from '@/components/ui/button';
import { Body } from '@/components/ui/text';

interface RuleEditorProps<Values extends FieldValues> {
  defaultValues: DefaultValues<Values>;
  /** Sends a new version. */
  save: (values: Values) => Promise<unknown>;
  onClose: () => void;
  children: ReactNode;
}

/** The form of one rule of a job. Saving makes a new version; rounds keep the one that they were opened under. */
export function RuleEditor<Values extends FieldValues>({ defaultValues, save, onClose, children }: RuleEditorProps<Values>) {
  const { t } = useTranslation(['jobs', 'common']);
  const form = useForm<Values>({ defaultValues });
  const [refusal, setRefusal] = useState<string | null>(null);
  const submit = form.handleSubmit(async (values) => {
    setRefusal(null);
    try {
      await save(values);
      onClose();
    } catch (error) {
      setRefusal(describeError(error));
    }
  });
  return (
    <FormProvider {...form}>
      <FormBox onSubmit={() => void submit()}>
        {children}
        <Body size="small" tone="ink2">
          {t('jobs:rule.newVersion')}
        </Body>
        <FormRefusal sentence={refusal} />
        <FieldPair>
          <Button label={t('common:action.cancel')} variant="plain" onPress={onClose} />
          <Button label={t('common:action.save')} busy={form.formState.isSubmitting} onPress={() => void submit()} />
        </FieldPair>
      </FormBox>
    </FormProvider>
  );
}
