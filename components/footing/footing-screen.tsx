import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { FormRefusal } from '@/components/forms/form-refusal';
import { Loaded } from '@/components/query/loaded';
import { SavedPill } from '@/components/root/saved-pill';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Column, Columns } from '@/components/ui/columns';
import { Screen } from '@/components/ui/screen';
import { Body } from '@/components/ui/text';
import { footingQuery } from '@/hooks/api/footing-queries';
import { jobQuery } from '@/hooks/api/job-queries';
import { useSession } from '@/hooks/session/use-session';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Role } from '@/shared/roles';
import { FootingDetailsCard } from './footing-details-card';
import { FootingPlanCard } from './footing-plan-card';
import { roundInHand } from './round-in-hand';
import { nextStep, openSurfaces, type NextStep } from './next-step';
import { NextStepCard } from './next-step-card';
import { OpenRoundCard } from './open-round-card';
import { RoundsCard } from './rounds-card';
import { StagesLine } from './stages-line';
import { useOpenRoundOf } from './use-open-round-of';

/** The home of a footing: where it stands, what comes next, its picture and its rounds. */
export function FootingScreen({ footingId }: { footingId: string }) {
  const { t } = useTranslation(['footing', 'jobs']);
  const query = useQuery(footingQuery(footingId));
  const footing = query.data;
  const job = useQuery({ ...jobQuery(footing?.jobId ?? ''), enabled: footing !== undefined }).data;
  const { me } = useSession();
  const rounds = useOpenRoundOf(footingId);
  const roles = me?.roles ?? [];
  const step = footing ? nextStep(footing, roles) : null;
  const up = footing ? ({ pathname: '/jobs/[jobId]', params: { jobId: footing.jobId } } as const) : '/jobs';
  return (
    <Screen
      title={footing?.name ?? t('footing:title')}
      subtitle={job?.name}
      back={up}
      crumbs={[{ label: t('jobs:title'), href: '/jobs' }, ...(job ? [{ label: job.name, href: up }] : [])]}
      pill={<SavedPill />}
      actions={step && footing ? <NextButton step={step} footingId={footing.id} rounds={rounds} /> : undefined}
    >
      <Loaded query={query} loading={t('footing:loading')}>
        {(loaded) => <FootingHome footing={loaded} roles={roles} rounds={rounds} />}
      </Loaded>
    </Screen>
  );
}

type OpenRounds = ReturnType<typeof useOpenRoundOf>;

function FootingHome({ footing, roles, rounds }: { footing: Footing; roles: readonly Role[]; rounds: OpenRounds }) {
  const { t } = useTranslation('results');
  const step = nextStep(footing, roles);
  // The one that comes next has the button at the thumb.
  const others = openSurfaces(footing, roles).filter((surface) => step.do !== 'open-round' || surface !== step.surface);
  const surfaces = footing.stations.length > 0 ? others : [];
  return (
    <Columns>
      <Column>
        <Card>
          <StagesLine done={footing.stages.done} current={footing.stages.now} />
        </Card>
        <NextStepCard step={step} />
        <FormRefusal sentence={rounds.refusal} />
        <RoundsCard footing={footing} roles={roles} />
        {surfaces.length > 0 ? <OpenRoundCard surfaces={surfaces} busy={rounds.opening} onOpen={rounds.open} /> : null}
        {footing.rounds.length > 0 ? (
          <Body size="tiny" tone="ink2">
            {t('govern')}
          </Body>
        ) : null}
      </Column>
      <Column>
        <FootingPlanCard footing={footing} />
        <FootingDetailsCard footing={footing} />
      </Column>
    </Columns>
  );
}

/** The one primary button of the screen. */
function NextButton({ step, footingId, rounds }: { step: NextStep; footingId: string; rounds: OpenRounds }) {
  const { t } = useTranslation('footing');
  const look = { variant: 'primary', size: 'large', grow: true } as const;
  switch (step.do) {
    case 'draw-outline':
      return (
        <Button
          {...look}
          label={t('button.outline')}
          href={{ pathname: '/footings/[footingId]/outline', params: { footingId } }}
        />
      );
    case 'set-stations':
      return (
        <Button
          {...look}
          label={t('button.stations')}
          href={{ pathname: '/footings/[footingId]/stations', params: { footingId } }}
        />
      );
    case 'go-on':
      return (
        <Button {...look} label={step.round.shot === 0 ? t('button.setUp') : t('button.goOn')} href={roundInHand(step.round)} />
      );
    case 'see-results':
      return (
        <Button
          {...look}
          label={t('button.results')}
          href={{ pathname: '/rounds/[roundId]/results', params: { roundId: step.round.id } }}
        />
      );
    case 'open-round':
      return (
        <Button
          {...look}
          label={t(`next.open.${step.surface}`)}
          busy={rounds.opening}
          onPress={() => rounds.open(step.surface)}
        />
      );
    case 'wait':
      return null;
  }
}
