import type { Href } from 'expo-router';
import { useTranslation } from 'react-i18next';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';

/** In place of a screen that this person's roles do not open, for whoever comes by its address. */
export function MayNot({ title, back }: { title: string; back: Href }) {
  const { t } = useTranslation('errors');
  return (
    <Screen title={title} back={back} maxWidth={640}>
      <Notice kind="caution">{t('role-refused')}</Notice>
    </Screen>
  );
}
