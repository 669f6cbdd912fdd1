import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Notice } from '@/components/ui/notice';
import { Body } from '@/components/ui/text';
import { useOutbox } from '@/hooks/outbox/use-outbox';
import { signOut } from '@/hooks/session/session-actions';

/**
 * The way out. With shots that only this phone has, it is refused until the person says to leave them here: they stay on the
 * phone under this person and company, and go out when the same person signs in here again.
 */
export function SignOutCard() {
  const { t } = useTranslation(['auth', 'account']);
  const { kept, ready } = useOutbox();
  const [busy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const leave = async () => {
    setBusy(true);
    setRefusal(null);
    try {
      await signOut();
    } catch (error) {
      setRefusal(describeError(error));
      setBusy(false);
    }
  };
  return (
    <Card title={t('auth:signOut.action')}>
      {kept.length > 0 ? (
        <Notice kind="caution" announce lead={t('auth:signOut.unsent', { count: kept.length })}>
          {t('auth:signOut.unsentHow')}
        </Notice>
      ) : (
        <Body tone="ink2">{t('account:outHow')}</Body>
      )}
      {refusal === null ? null : <Notice kind="refusal">{refusal}</Notice>}
      <Button
        variant="outline"
        size="large"
        label={kept.length > 0 ? t('auth:signOut.keepCopy') : t('auth:signOut.action')}
        disabled={!ready}
        busy={busy}
        onPress={() => void leave()}
      />
    </Card>
  );
}
