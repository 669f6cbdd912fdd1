import { useTranslation } from 'react-i18next';
import { Button } from './button';
import { Notice } from './notice';

interface ErrorStateProps {
  /** What happened. */
  title: string;
  /** What to do about it. */
  children?: string;
  onRetry?: () => void;
}

/** What happened, what to do, and a button to try again. */
export function ErrorState({ title, children, onRetry }: ErrorStateProps) {
  const { t } = useTranslation('common');
  return (
    <Notice kind="refusal" lead={title} actions={onRetry ? <Button label={t('action.tryAgain')} onPress={onRetry} /> : undefined}>
      {children}
    </Notice>
  );
}
