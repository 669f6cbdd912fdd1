import type { ErrorBoundaryProps } from 'expo-router';
import { useTranslation } from 'react-i18next';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { Body } from '@/components/ui/text';

/** A screen that failed while it was being drawn: what happened, that nothing recorded is lost, and two ways on. */
export function FaultScreen({ error, retry }: ErrorBoundaryProps) {
  const { t } = useTranslation('common');
  return (
    <Screen title={t('fault.title')} maxWidth={640}>
      <Notice
        kind="refusal"
        lead={t('fault.what')}
        actions={<Button label={t('action.tryAgain')} onPress={() => void retry()} />}
      >
        {t('fault.how')}
      </Notice>
      <Body size="small" tone="ink2">
        {t('fault.detail', { detail: error.message })}
      </Body>
      <Button variant="quiet" label={t('fault.home')} href="/" />
    </Screen>
  );
}
