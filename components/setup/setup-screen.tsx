import { useTranslation } from 'react-i18next';
import { describeError } from '@/components/forms/describe-error';
import { printLength } from '@/components/lengths/print-length';
import { Button } from '@/components/ui/button';
import { Column, Columns } from '@/components/ui/columns';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { StatusPill } from '@/components/ui/status-pill';
import { savedState } from '@/hooks/outbox/saved-state';
import { useOutbox } from '@/hooks/outbox/use-outbox';
import { useRound, type ReadyRound } from '@/hooks/round/use-round';
import { useMay } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import { BacksightCard } from './backsight-card';
import { HiCard } from './hi-card';
import { InstrumentsCard } from './instruments-card';
import { LaserCaution, TrenchCaution } from './setup-cautions';
import { StandCard } from './stand-card';
import { useRefusalInSight } from './use-refusal-in-sight';
import { useSetup } from './use-setup';

/** Laser, rod and benchmark; where the laser stands; the backsight; and from it the height of instrument. */
export function SetupScreen({ roundId }: { roundId: string }) {
  const { t } = useTranslation('setup');
  const view = useRound(roundId);
  if (view.status === 'ready') return <SettingUp roundId={roundId} view={view} />;
  return (
    <Screen title={t('title')} back="/">
      {view.status === 'failed' ? <ErrorState title={describeError(view.error)} onRetry={view.tryAgain} /> : <LoadingState />}
    </Screen>
  );
}

function SettingUp({ roundId, view }: { roundId: string; view: ReadyRound }) {
  const { t } = useTranslation('setup');
  const { bundle } = view;
  const { round, footing, job } = bundle;
  const wide = useWide();
  const setup = useSetup(roundId, view);
  useRefusalInSight(setup.refusal);
  const saved = savedState(useOutbox());
  const may = useMay(round.surface === 'top' ? 'round.shoot' : 'round.any-surface');
  const open = may && round.closedAt === null;
  const { series } = setup;
  const hi = series?.hi ?? null;
  // On a phone they come in the order of the work; beside one another the plan stands left.
  const instruments = <InstrumentsCard setup={setup} bundle={bundle} />;
  return (
    <Screen
      title={t('title')}
      subtitle={t('subtitle', {
        surface: t(`surface.${round.surface}`),
        number: round.number,
        footing: footing.name,
      })}
      back={`/footings/${footing.id}`}
      crumbs={[
        { label: job.name, href: `/jobs/${job.id}` },
        { label: footing.name, href: `/footings/${footing.id}` },
      ]}
      pill={<StatusPill {...saved} />}
      actions={
        !open ? undefined : hi === null ? (
          <Button label={t('backsight.record')} variant="primary" size="large" grow busy={setup.keeping} onPress={setup.record} />
        ) : (
          <Button label={t('action.shoot')} variant="primary" size="large" grow href={`/rounds/${roundId}/shoot`} />
        )
      }
    >
      {may ? null : <Notice kind="plain">{t('locked')}</Notice>}
      {round.closedAt === null ? null : (
        <Notice kind="plain" lead={t('closed.lead')}>
          {t('closed.how')}
        </Notice>
      )}
      {open ? (
        <Columns>
          <Column>
            {setup.fixed ? null : <Already view={view} roundId={roundId} />}
            <LaserCaution />
            {round.surface === 'dig' ? <TrenchCaution thickness={footing.thickness} style={job.unitStyle} /> : null}
            {wide ? null : instruments}
            <StandCard setup={setup} view={view} />
          </Column>
          <Column>
            {wide ? instruments : null}
            <BacksightCard setup={setup} bundle={bundle} />
            {series && hi !== null ? <HiCard setup={setup} series={series} hi={hi} view={view} /> : null}
          </Column>
        </Columns>
      ) : null}
    </Screen>
  );
}

/** The round has a setup that can be shot from: coming back here by chance must not make a second one. */
function Already({ view, roundId }: { view: ReadyRound; roundId: string }) {
  const { t } = useTranslation('setup');
  const { bundle, state } = view;
  const last = state.series.at(-1);
  if (!last || last.hi === null) return null;
  const laser = bundle.lasers.find(({ id }) => id === last.setup?.laserId)?.name ?? t('instruments.laser');
  const rod = bundle.rods.find(({ id }) => id === last.record.rodId)?.name ?? t('instruments.rod');
  return (
    <Notice
      kind="plain"
      lead={t('already.lead', { hi: printLength(last.hi, bundle.job.unitStyle) })}
      actions={<Button label={t('already.goOn')} href={`/rounds/${roundId}/shoot`} />}
    >
      {t('already.how', { laser, rod })}
    </Notice>
  );
}
