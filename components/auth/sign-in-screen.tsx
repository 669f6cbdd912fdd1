import { useLocalSearchParams } from 'expo-router';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { FormBox } from '@/components/forms/form-box';
import { FormRefusal } from '@/components/forms/form-refusal';
import { FormTextField } from '@/components/forms/form-text-field';
import { placeRefusals } from '@/components/forms/place-refusals';
import { Button } from '@/components/ui/button';
import { signIn, type SignInForm } from '@/hooks/session/session-actions';
import { AuthFrame } from './auth-frame';

export function SignInScreen() {
  const { t } = useTranslation('auth');
  const { next } = useLocalSearchParams<{ next?: string }>();
  const { control, handleSubmit, setError, formState } = useForm<SignInForm>({ defaultValues: { email: '', password: '' } });
  const [refusal, setRefusal] = useState<string | null>(null);
  const submit = handleSubmit(async (form) => {
    setRefusal(null);
    try {
      await signIn({ email: form.email.trim(), password: form.password });
    } catch (error) {
      setRefusal(placeRefusals(error, setError, { email: 'email', password: 'password' }));
    }
  });
  return (
    <AuthFrame title={t('signIn.title')}>
      <FormBox onSubmit={() => void submit()}>
        <FormTextField
          control={control}
          name="email"
          label={t('signIn.email')}
          inputMode="email"
          autoComplete="email"
          autoCapitalize="none"
          enterKeyHint="next"
        />
        <FormTextField
          control={control}
          name="password"
          label={t('signIn.password')}
          secureTextEntry
          autoComplete="current-password"
          autoCapitalize="none"
          enterKeyHint="go"
        />
        <FormRefusal sentence={refusal} />
        <Button
          variant="primary"
          size="large"
          label={t('signIn.submit')}
          busy={formState.isSubmitting}
          onPress={() => void submit()}
        />
      </FormBox>
      <Button
        variant="quiet"
        label={t('signIn.toSignUp')}
        href={next === undefined ? '/sign-up' : { pathname: '/sign-up', params: { next } }}
      />
    </AuthFrame>
  );
}
