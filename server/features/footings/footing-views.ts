import { In } from 'typeorm';
import type { Footing, FootingSummary, RoundSummary } from '@/shared/api/footing-schemas';
import { foldRound } from '@/shared/round/fold-round';
import type { RoundState } from '@/shared/round/round-state';
import type { BedRule, ToleranceRule } from '@/shared/rules';
import { deriveStages } from '@/shared/stages';
import type { Tenant } from '../../api/handler';
import { FootingEntity, type FootingRow } from '../../entities/footings';
import type { JobRow } from '../../entities/jobs';
import { RoundEntity, type RoundRow } from '../../entities/rounds';
import { namesOf } from '../crew/crew-service';
import { listInstruments } from '../instruments/instrument-service';
import { benchmarksOfJobs } from '../jobs/benchmark-service';
import { rulesById } from '../jobs/rule-store';
import { recordsOfRounds } from '../records/stored-records';
import { footingOf, footingsWithShots, groupBy, readFootingRows, type FootingRows } from './footing-rows';

/** A round as folded now, with the very rules it was opened under. */
export interface RoundView {
  row: RoundRow;
  state: RoundState;
  summary: RoundSummary;
  toleranceRule: ToleranceRule;
  bedRule: BedRule;
}

/** A footing with everything that follows from its outline and its records; rounds oldest first. */
export interface FootingView {
  job: JobRow;
  footing: Footing;
  rounds: RoundView[];
}

/** Reads and folds footings of any jobs of the company, in the order given: a fixed number of queries however many there are. */
export async function viewFootings(tenant: Tenant, rows: readonly FootingRow[], jobs: readonly JobRow[]): Promise<FootingView[]> {
  const parts = await readFootingRows(tenant, rows);
  const ids = rows.map(({ id }) => id);
  const rounds = ids.length === 0 ? [] : await findRounds(tenant, ids);
  const gathered = await gather(tenant, rounds, jobs, ids);
  const roundsOf = groupBy(rounds, (round) => round.footingId);
  return parts.flatMap((part) => {
    const job = jobs.find(({ id }) => id === part.footing.jobId);
    return job === undefined ? [] : [viewFooting(part, job, roundsOf.get(part.footing.id) ?? [], gathered)];
  });
}

function findRounds({ manager, actor }: Tenant, footingIds: readonly string[]): Promise<RoundRow[]> {
  const where = { companyId: actor.companyId, footingId: In([...footingIds]) };
  return manager.find(RoundEntity, { where, order: { openedAt: 'ASC', id: 'ASC' } });
}

type Gathered = Awaited<ReturnType<typeof gather>>;

async function gather(tenant: Tenant, rounds: readonly RoundRow[], jobs: readonly JobRow[], footingIds: readonly string[]) {
  return {
    instruments: await listInstruments(tenant),
    benchmarks: await benchmarksOfJobs(
      tenant,
      jobs.map(({ id }) => id),
    ),
    records: await recordsOfRounds(
      tenant,
      rounds.map(({ id }) => id),
    ),
    rules: await rulesById(
      tenant,
      rounds.map(({ toleranceRuleId }) => toleranceRuleId),
      rounds.map(({ bedRuleId }) => bedRuleId),
    ),
    names: await namesOf(
      tenant,
      rounds.map(({ openedBy }) => openedBy),
    ),
    withShots: await footingsWithShots(tenant, footingIds),
  };
}

function viewFooting(rows: FootingRows, job: JobRow, rounds: readonly RoundRow[], gathered: Gathered): FootingView {
  const own = footingOf(rows, job.unitStyle);
  const hasShots = gathered.withShots.has(own.id);
  // Folding asks nothing of a footing's rounds or stages: they follow from it.
  const unfolded: Footing = { ...own, rounds: [], stages: { done: [], now: null }, hasShots };
  const views = rounds.map((row) => viewRound(row, job, unfolded, gathered));
  const stages = deriveStages(
    unfolded,
    views.map(({ row, state }) => ({ surface: row.surface, state })),
    job.graduation,
  );
  return { job, footing: { ...unfolded, stages, rounds: views.map(({ summary }) => summary) }, rounds: views };
}

function viewRound(
  row: RoundRow,
  job: JobRow,
  footing: Footing,
  { instruments, benchmarks, records, rules, names }: Gathered,
): RoundView {
  const toleranceRule = rules.tolerance.get(row.toleranceRuleId);
  const bedRule = rules.bed.get(row.bedRuleId);
  if (toleranceRule === undefined || bedRule === undefined)
    throw new Error(`round ${row.id} was opened under rules that are gone`);
  const state = foldRound(records.get(row.id) ?? [], {
    job,
    footing,
    benchmarks: benchmarks.get(job.id) ?? [],
    ...instruments,
    toleranceRule,
    surface: row.surface,
  });
  const summary: RoundSummary = {
    id: row.id,
    footingId: row.footingId,
    surface: row.surface,
    number: row.number,
    openedAt: row.openedAt.toISOString(),
    openedBy: names.get(row.openedBy) ?? '',
    closedAt: row.closedAt?.toISOString() ?? null,
    shot: state.shot,
    of: state.of,
    out: state.out,
    verdict: state.verdict,
  };
  return { row, state, summary, toleranceRule, bedRule };
}

export function summaryOf({ job, footing }: FootingView): FootingSummary {
  return {
    id: footing.id,
    jobId: job.id,
    jobName: job.name,
    name: footing.name,
    unitStyle: job.unitStyle,
    stages: footing.stages,
    stationCount: footing.stations.length,
    lastRound: footing.rounds.at(-1) ?? null,
  };
}

/** Every footing of these jobs, in the order in which they were made. */
export async function viewFootingsOfJobs(tenant: Tenant, jobs: readonly JobRow[]): Promise<FootingView[]> {
  if (jobs.length === 0) return [];
  const where = { companyId: tenant.actor.companyId, jobId: In(jobs.map(({ id }) => id)) };
  const rows = await tenant.manager.find(FootingEntity, { where, order: { createdAt: 'ASC', id: 'ASC' } });
  return viewFootings(tenant, rows, jobs);
}

export async function footingsOfJob(tenant: Tenant, job: JobRow): Promise<FootingSummary[]> {
  return (await viewFootingsOfJobs(tenant, [job])).map(summaryOf);
}

export async function summariesByJob(tenant: Tenant, jobs: readonly JobRow[]): Promise<Map<string, FootingSummary[]>> {
  return groupBy((await viewFootingsOfJobs(tenant, jobs)).map(summaryOf), (summary) => summary.jobId);
}
