import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FormBox } from '@/components/forms/form-box';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { Button } from '@/components/ui/button';
import { Body } from '@/components/ui/text';
import { ApiError } from '@/hooks/api/client';
import { signUp, type SignUpForm } from '@/hooks/session/session-actions';
import { emailSchema, passwordSchema } from '@/shared/api/session-endpoints';
import { AuthFrame } from './auth-frame';

const names = { company: 'company', name: 'name', email: 'email', password: 'password' } as const;
const blank: SignUpForm = { company: '', name: '', email: '', password: '' };

export function SignUpScreen() {
  const { t } = useTranslation(['auth', 'errors']);
  const { control, handleSubmit, setError, formState } = useForm<SignUpForm>({ defaultValues: blank });
  const [refusal, setRefusal] = useState<string | null>(null);
  const submit = handleSubmit(async ({ password, ...form }) => {
    setRefusal(null);
    try {
      await signUp({ company: form.company.trim(), name: form.name.trim(), email: form.email.trim(), password });
    } catch (error) {
      // A refusal of this kind can have no other cause here, so a vague sentence would hide nothing and help nobody.
      const known = error instanceof ApiError && error.code === 'sign-in-refused';
      setRefusal(known ? t('auth:signUp.known') : placeRefusals(error, setError, names));
    }
  });
  const checkEmail = (text: string) => (emailSchema.safeParse(text.trim()).success ? null : t('errors:field.email'));
  const checkPassword = (text: string) =>
    passwordSchema.safeParse(text).success
      ? null
      : t(text.length > 15 ? 'auth:signUp.passwordLong' : 'auth:signUp.passwordShort');
  return (
    <AuthFrame title={t('auth:signUp.title')}>
      <Body tone="ink2">{t('auth:signUp.allRoles')}</Body>
      <FormBox onSubmit={() => void submit()}>
        <FormTextField
          control={control}
          name="company"
          label={t('auth:signUp.company')}
          hint={t('auth:signUp.companyHint')}
          autoComplete="organization"
          maxLength={120}
        />
        <FormTextField control={control} name="name" label={t('auth:signUp.name')} autoComplete="name" maxLength={120} />
        <FormTextField
          control={control}
          name="email"
          label={t('auth:signUp.email')}
          check={checkEmail}
          inputMode="email"
          autoComplete="email"
          autoCapitalize="none"
          maxLength={200}
        />
        <FormTextField
          control={control}
          name="password"
          label={t('auth:signUp.password')}
          hint={t('auth:signUp.passwordHint')}
          check={checkPassword}
          secureTextEntry
          autoComplete="new-password"
          autoCapitalize="none"
        />
        <FormRefusal sentence={refusal} />
        <Button
          variant="primary"
          size="large"
          label={t('auth:signUp.submit')}
          busy={formState.isSubmitting}
          onPress={() => void submit()}
        />
      </FormBox>
      <Button variant="quiet" label={t('auth:signUp.toSignIn')} href="/sign-in" />
    </AuthFrame>
  );
}
