import type { Waiting } from '@/shared/api/job-endpoints';
import type { FootingSummary } from '@/shared/api/footing-schemas';
import { may } from '@/shared/roles';
import { outlineCloses } from '@/shared/stages';
import type { Actor, Tenant } from '../../api/handler';
import { summaryOf, viewFootingsOfJobs, type FootingView, type RoundView } from '../footings/footing-views';
import { listInstruments } from '../instruments/instrument-service';
import { findJobs } from '../jobs/job-store';

/** Most pressing first: a round half shot is a laser set up and people in a trench. */
const PRESSING: readonly Waiting['what'][] = [
  'finish-round',
  'mend-rails',
  'shoot-rails',
  'shoot-top',
  'enter-laser',
  'enter-job',
  'draw-outline',
  'set-stations',
  'see-results',
];

/** What waits for whoever asks, most pressing first, and every footing that is not behind them, newest job first. */
export async function readToday(tenant: Tenant): Promise<{ waiting: Waiting[]; footings: FootingSummary[] }> {
  const jobs = await findJobs(tenant);
  const views = await viewFootingsOfJobs(tenant, jobs);
  const { lasers } = await listInstruments(tenant);
  const { actor } = tenant;
  const inOrder = jobs.flatMap((job) => views.filter((view) => view.job.id === job.id));
  const waiting = [
    ...(lasers.length === 0 && may(actor.roles, 'laser.write') ? [nowhere('enter-laser')] : []),
    ...(jobs.length === 0 && may(actor.roles, 'job.write') ? [nowhere('enter-job')] : []),
    ...inOrder.flatMap((view) => waitingAt(view, actor)),
  ].sort((a, b) => PRESSING.indexOf(a.what) - PRESSING.indexOf(b.what));
  return { waiting, footings: inOrder.map(summaryOf).filter(({ stages }) => stages.now !== null) };
}

function nowhere(what: Waiting['what']): Waiting {
  return { what, jobId: null, jobName: null, footingId: null, footingName: null, roundId: null, shot: null, of: null };
}

function waitingAt(view: FootingView, actor: Actor): Waiting[] {
  const { footing, job } = view;
  if (!outlineCloses(footing, job.graduation)) return may(actor.roles, 'outline.change') ? [at(view, 'draw-outline')] : [];
  if (footing.stations.length === 0) return may(actor.roles, 'station.write') ? [at(view, 'set-stations')] : [];
  return [...shootingWaits(view, actor), ...decidingWaits(view, actor)];
}

/** What waits for whoever holds the rod: the rails for an operator, the top for either. */
function shootingWaits(view: FootingView, actor: Actor): Waiting[] {
  if (!may(actor.roles, 'round.shoot')) return [];
  const { done } = view.footing.stages;
  const begun = view.rounds.filter(({ row, state }) => row.closedAt === null && (state.shot < state.of || state.of === 0));
  const mine = begun.filter(({ row }) => row.surface === 'top' || may(actor.roles, 'round.any-surface'));
  if (mine.length > 0) return mine.map((round) => at(view, 'finish-round', round));
  const rails = newest(view, 'rails');
  const top = newest(view, 'top');
  if (top === undefined && rails?.state.verdict === 'not-to-grade' && may(actor.roles, 'round.any-surface')) {
    return [at(view, 'mend-rails', rails)];
  }
  if (!done.includes('rails') && !done.includes('top')) {
    return may(actor.roles, 'round.any-surface') ? [at(view, 'shoot-rails', rails)] : [];
  }
  return done.includes('top') ? [] : [at(view, 'shoot-top', top)];
}

/** What waits for whoever says whether the wall goes on: the top, once it is all shot. */
function decidingWaits(view: FootingView, actor: Actor): Waiting[] {
  const top = newest(view, 'top');
  const decides = actor.roles.some((role) => role !== 'operator');
  return decides && top !== undefined && view.footing.stages.done.includes('top') ? [at(view, 'see-results', top)] : [];
}

function newest({ rounds }: FootingView, surface: RoundView['row']['surface']): RoundView | undefined {
  return rounds.findLast(({ row, state }) => row.surface === surface && state.shot > 0);
}

function at({ job, footing }: FootingView, what: Waiting['what'], round?: RoundView): Waiting {
  return {
    what,
    jobId: job.id,
    jobName: job.name,
    footingId: footing.id,
    footingName: footing.name,
    roundId: round?.row.id ?? null,
    shot: round?.state.shot ?? null,
    of: round?.state.of ?? null,
  };
}
