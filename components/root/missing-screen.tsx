import { useTranslation } from 'react-i18next';
import { Brand } from '@/components/shell/brand';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Screen } from '@/components/ui/screen';

/** For an address that leads nowhere. */
export function MissingScreen() {
  const { t } = useTranslation('common');
  return (
    <Screen title={t('missing.title')} large brand={<Brand />} withoutRail maxWidth={640}>
      <EmptyState title={t('missing.what')} action={<Button variant="primary" size="large" label={t('missing.home')} href="/" />}>
        {t('missing.how')}
      </EmptyState>
    </Screen>
  );
}
