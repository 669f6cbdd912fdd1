import { useTranslation } from 'react-i18next';
import { Card } from '@/components/ui/card';
import { Button } from '@/components/ui/button';
import { Column, Columns } from '@/components/ui/columns';
import { EmptyState } from '@/components/ui/empty-state';
import { ErrorState } from '@/components/ui/error-state';
import { LoadingState } from '@/components/ui/loading-state';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/ui/screen';
import { useRound } from '@/hooks/round/use-round';
import { useMay } from '@/hooks/session/use-session';
import { useWide } from '@/hooks/use-wide';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import { roundResults, type RoundResults } from '@/shared/round/round-results';
import type { RoundState } from '@/shared/round/round-state';
import { walkOf } from '@/shared/walk';
import { PlanView } from '../charts/plan-view';
import { ProfileChart } from '../charts/profile-chart';
import { describeError } from '../forms/describe-error';
import { printSmall } from '../lengths/print-length';
import { SavedPill } from '../root/saved-pill';
import { AnswersCard } from './answers-card';
import { planCorners, planStations, profileCorners, profilePoints, railsOf } from './chart-data';
import { CourseCard } from './course-card';
import { fallWords, toMark } from './results-words';
import { ShapeCard } from './shape-card';
import { StationsTable } from './stations-table';
import { StraightedgeCard } from './straightedge-card';
import { SuspectsCard } from './suspects-card';

/** What a round says: the two answers, the profile, the plan, what is wrong with it, and what a first course takes. */
export function ResultsScreen({ roundId }: { roundId: string }) {
  const { t } = useTranslation('results');
  const view = useRound(roundId);
  if (view.status === 'loading') {
    return (
      <Screen title={t('heading')}>
        <LoadingState label={t('loading')} />
      </Screen>
    );
  }
  if (view.status === 'failed') {
    return (
      <Screen title={t('heading')}>
        <ErrorState title={t('failed')} onRetry={view.tryAgain}>
          {describeError(view.error)}
        </ErrorState>
      </Screen>
    );
  }
  return <Results bundle={view.bundle} state={view.state} />;
}

interface ResultsProps {
  bundle: RoundBundle;
  state: RoundState;
}

function Results({ bundle, state }: ResultsProps) {
  const { t } = useTranslation('results');
  const anySurface = useMay('round.any-surface');
  const topOnly = useMay('round.shoot');
  const { round, footing, job } = bundle;
  const mayShoot = round.closedAt === null && (anySurface || (topOnly && round.surface === 'top'));
  const shoot = { pathname: '/rounds/[roundId]/shoot', params: { roundId: round.id } } as const;
  const home = { pathname: '/footings/[footingId]', params: { footingId: footing.id } } as const;
  return (
    <Screen
      title={t(`title.${round.surface}`, { number: round.number })}
      subtitle={t('subtitle', { footing: footing.name, count: footing.stations.length })}
      back={home}
      crumbs={[
        { label: job.name, href: { pathname: '/jobs/[jobId]', params: { jobId: job.id } } },
        { label: footing.name, href: home },
      ]}
      pill={<SavedPill />}
      actions={
        mayShoot ? (
          <>
            <Button label={t('action.footing')} href={home} grow />
            <Button label={t('action.shoot')} href={shoot} variant="primary" grow />
          </>
        ) : (
          <Button label={t('action.footing')} href={home} grow />
        )
      }
    >
      {state.shot === 0 ? (
        <EmptyState
          title={t('empty.title')}
          action={
            mayShoot ? (
              <Button label={t('action.setup')} href={{ pathname: '/rounds/[roundId]/setup', params: { roundId: round.id } }} />
            ) : undefined
          }
        >
          {t('empty.body')}
        </EmptyState>
      ) : (
        <Findings bundle={bundle} state={state} mayShoot={mayShoot} />
      )}
    </Screen>
  );
}

function Findings({ bundle, state, mayShoot }: ResultsProps & { mayShoot: boolean }) {
  const { t } = useTranslation('results');
  const wide = useWide();
  const walk = walkOf(bundle.footing);
  const results = roundResults(bundle, state, walk.closed);
  const answers = <AnswersCard bundle={bundle} state={state} results={results} />;
  const profile = <Profiles bundle={bundle} state={state} results={results} length={walk.length} />;
  const plan = <Plan bundle={bundle} state={state} results={results} closed={walk.closed} />;
  const shape = results.shape ? <ShapeCard bundle={bundle} state={state} shape={results.shape} /> : null;
  const suspects = <SuspectsCard bundle={bundle} results={results} mayShoot={mayShoot} />;
  const straightedge = <StraightedgeCard bundle={bundle} straightedge={results.straightedge} />;
  const table = <StationsTable bundle={bundle} state={state} results={results} />;
  const { wall } = results;
  const course = wall
    ? wall.groups.map((group) => <CourseCard key={group.runs.join()} bundle={bundle} wall={wall} group={group} />)
    : null;
  return (
    <>
      {answers}
      {wide ? (
        <Columns>
          <Column share={1.85}>
            {profile}
            <Columns>
              <Column>
                {plan}
                {course}
              </Column>
              <Column>
                {shape}
                {suspects}
                {straightedge}
              </Column>
            </Columns>
          </Column>
          <Column>{table}</Column>
        </Columns>
      ) : (
        <>
          {profile}
          {plan}
          {shape}
          {suspects}
          {course}
          {straightedge}
          {table}
        </>
      )}
      <Notice kind="caution">{t('govern')}</Notice>
    </>
  );
}

interface PictureProps extends ResultsProps {
  results: RoundResults;
}

function Profiles({ bundle, state, results, length }: PictureProps & { length: number }) {
  const { t } = useTranslation('results');
  const { job, toleranceRule } = bundle;
  const rails = railsOf(bundle);
  return rails.map((rail) => (
    <Card key={rail}>
      <ProfileChart
        title={
          rails.length > 1
            ? t('profile.titleRail', { rail: t(`rail.${rail === 'inner' ? 'inner' : 'outer'}`) })
            : t('profile.title')
        }
        points={profilePoints(bundle, state, results, rail)}
        corners={profileCorners(bundle)}
        length={length}
        tolerance={toleranceRule}
        units={{ style: job.unitStyle, graduation: job.graduation }}
      />
    </Card>
  ));
}

function Plan({ bundle, state, results, closed }: PictureProps & { closed: boolean }) {
  const { t } = useTranslation('results');
  const { shape } = results;
  // A tilt that reading error explains is no tilt to walk toward: the card says so, and the plan shows none.
  const toward = shape && shape.againstLaser?.beyondReading !== false ? fallWords(bundle, state, shape) : null;
  return (
    <Card title={t('plan.title')}>
      <PlanView
        corners={planCorners(bundle)}
        closed={closed}
        width={bundle.footing.width}
        stations={planStations(bundle, state, results)}
        tilt={
          shape && toward && shape.fallAzimuth !== null
            ? {
                azimuth: shape.fallAzimuth,
                text: t('tilt', { drop: printSmall(toMark(shape.drop, bundle.job.graduation), bundle.job.unitStyle), toward }),
              }
            : null
        }
      />
    </Card>
  );
}
