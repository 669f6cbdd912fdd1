import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Screen } from '@/components/ui/screen';
import { StatusPill } from '@/components/ui/status-pill';
import { savedState } from '@/hooks/outbox/saved-state';
import { useOutbox } from '@/hooks/outbox/use-outbox';
import { useRound, type ReadyRound } from '@/hooks/round/use-round';
import { useMay } from '@/hooks/session/use-session';
import { LookingOn } from './looking-on';
import { SavedSheet } from './saved-sheet';
import { ShootBody } from './shoot-body';

interface ShootScreenProps {
  roundId: string;
  /** Key of the target to begin with: "Shoot again" leads to it. */
  at: string | null;
}

/** The shoot screen of a round: keyed in the trench by whoever may, looked at by everybody else. */
export function ShootScreen({ roundId, at }: ShootScreenProps) {
  const view = useRound(roundId);
  const { t } = useTranslation('shoot');
  if (view.status === 'loading') return <LoadingState />;
  if (view.status === 'failed') {
    return (
      <Screen title={t('strip')}>
        <ErrorState title={describeError(view.error)} onRetry={view.tryAgain} />
      </Screen>
    );
  }
  return <ReadyShootScreen roundId={roundId} view={view} at={at} />;
}

function ReadyShootScreen({ roundId, view, at }: ShootScreenProps & { view: ReadyRound }) {
  const { t } = useTranslation('shoot');
  const [showSaved, setShowSaved] = useState(false);
  const saved = savedState(useOutbox());
  const mayAny = useMay('round.any-surface');
  const mayTop = useMay('round.shoot');
  const { bundle, state } = view;
  const { round, footing, job } = bundle;
  const may = mayAny || (mayTop && round.surface === 'top');
  const { lap } = state;
  const counts = { footing: footing.name, shot: lap.shot, of: lap.of, lap: lap.number };
  return (
    <Screen
      title={t(`title.${round.surface}`, { number: round.number })}
      subtitle={t(lap.number > 1 ? 'progressLap' : 'progress', counts)}
      back={{ pathname: '/footings/[footingId]', params: { footingId: footing.id } }}
      crumbs={[
        { label: job.name, href: { pathname: '/jobs/[jobId]', params: { jobId: job.id } } },
        { label: footing.name, href: { pathname: '/footings/[footingId]', params: { footingId: footing.id } } },
      ]}
      pill={<StatusPill {...saved} onPress={() => setShowSaved(true)} />}
    >
      {may && round.closedAt === null ? (
        <ShootBody roundId={roundId} view={view} at={at} />
      ) : (
        <LookingOn view={view} may={may} installer={mayTop} />
      )}
      {showSaved ? <SavedSheet onClose={() => setShowSaved(false)} /> : null}
    </Screen>
  );
}
