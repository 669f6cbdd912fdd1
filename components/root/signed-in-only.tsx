import { Redirect, usePathname } from 'expo-router';
import { useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { AppShell } from '@/components/shell/app-shell';
import { Brand } from '@/components/shell/brand';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Screen } from '@/components/ui/screen';
import { useOutboxRunner } from '@/hooks/outbox/use-outbox';
import { useSession } from '@/hooks/session/use-session';
import { startSession } from '@/hooks/session/use-session-start';
import { roleWords } from './role-words';

/** The door, with the address that was wanted: as it was at first, since it changes while the redirect is under way. */
function ToSignIn() {
  const pathname = usePathname();
  const [wanted] = useState(pathname);
  return <Redirect href={wanted === '/' ? '/sign-in' : { pathname: '/sign-in', params: { next: wanted } }} />;
}

/** The shell, for whoever is signed in; anybody else is asked to sign in and comes back to the address they wanted. */
export function SignedInOnly({ children }: { children: ReactNode }) {
  const session = useSession();
  const { t } = useTranslation('auth');
  useOutboxRunner();
  if (session.status === 'signed-out') {
    return <ToSignIn />;
  }
  if (session.status === 'signed-in') {
    const { me } = session;
    return (
      <AppShell signedInAs={roleWords(me.roles)} company={me.company.name}>
        {children}
      </AppShell>
    );
  }
  if (session.reached) return <LoadingState label={t('session.starting')} />;
  return (
    <Screen title={t('session.noSignal')} brand={<Brand />} withoutRail maxWidth={560}>
      <ErrorState title={t('session.notReached')} onRetry={() => void startSession()}>
        {t('session.notReachedHow')}
      </ErrorState>
    </Screen>
  );
}
