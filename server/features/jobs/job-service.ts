import type { z } from 'zod';
import type { endpoints } from '@/shared/api/endpoints';
import type { Job as JobShape, JobSummary } from '@/shared/api/job-endpoints';
import { isGraduationOf } from '@/shared/quantities';
import {
  readyBedRule,
  readyToleranceRules,
  SURFACES,
  type BedRule,
  type BedRuleInput,
  type Surface,
  type ToleranceRule,
  type ToleranceRuleInput,
} from '@/shared/rules';
import type { Tenant } from '../../api/handler';
import { Job, type JobRow } from '../../entities/jobs';
import { notPossible } from '../../errors';
import { footingsOfJob, summariesByJob } from '../footings/footing-views';
import { benchmarksOfJobs } from './benchmark-service';
import { findJob, findJobs, lockJob } from './job-store';
import { addBedRule, addToleranceRule, rulesInForce } from './rule-store';

type NewJob = z.output<typeof endpoints.addJob.body>;
type JobChange = z.output<typeof endpoints.changeJob.body>;

/** Every job of the company with its footings, newest first. */
export async function listJobs(tenant: Tenant): Promise<JobSummary[]> {
  const jobs = await findJobs(tenant);
  const footings = await summariesByJob(tenant, jobs);
  return jobs.map(({ id, name, address, unitStyle }) => ({ id, name, address, unitStyle, footings: footings.get(id) ?? [] }));
}

export async function readJob(tenant: Tenant, id: string): Promise<JobShape> {
  const row = await findJob(tenant, id);
  const rules = await rulesInForce(tenant, id);
  const benchmarks = await benchmarksOfJobs(tenant, [id]);
  const footings = await footingsOfJob(tenant, row);
  return {
    id,
    name: row.name,
    address: row.address,
    unitStyle: row.unitStyle,
    graduation: row.graduation,
    wallType: row.wallType,
    createdAt: row.createdAt.toISOString(),
    toleranceRules: rules.tolerance,
    bedRule: rules.bed,
    benchmarks: benchmarks.get(id) ?? [],
    footings,
  };
}

/** A job with a rule for every surface and one for the bed: those given, and for the rest the ready ones. @throws ApiError 'not-possible' */
export async function addJob(tenant: Tenant, input: NewJob): Promise<JobShape> {
  const { rules = {}, bedRule = readyBedRule(input.wallType, input.unitStyle), ...fields } = input;
  refuseForeignMarks(fields);
  refuseBadBed(bedRule, 'bedRule.');
  const id = tenant.newId();
  const { companyId, personId } = tenant.actor;
  await tenant.manager.insert(Job, { companyId, id, ...fields, createdAt: tenant.now(), createdBy: personId });
  const ready = readyToleranceRules(input.unitStyle);
  for (const surface of SURFACES) {
    await addToleranceRule(tenant, { jobId: id, surface, after: 0 }, rules[surface] ?? ready[surface]);
  }
  await addBedRule(tenant, { jobId: id, after: 0 }, bedRule);
  return readJob(tenant, id);
}

/** @throws NotFound; ApiError 'not-possible' */
export async function changeJob(tenant: Tenant, id: string, change: JobChange): Promise<JobShape> {
  const before = await lockJob(tenant, id);
  refuseForeignMarks({ ...before, ...change });
  if (Object.keys(change).length > 0) await tenant.manager.update(Job, { companyId: tenant.actor.companyId, id }, change);
  return readJob(tenant, id);
}

/** @throws NotFound */
export async function setToleranceRule(
  tenant: Tenant,
  at: { jobId: string; surface: Surface },
  input: ToleranceRuleInput,
): Promise<ToleranceRule> {
  await lockJob(tenant, at.jobId);
  const { tolerance } = await rulesInForce(tenant, at.jobId);
  const after = tolerance.find(({ surface }) => surface === at.surface)?.version ?? 0;
  return addToleranceRule(tenant, { ...at, after }, input);
}

/** @throws NotFound; ApiError 'not-possible' */
export async function setBedRule(tenant: Tenant, jobId: string, input: BedRuleInput): Promise<BedRule> {
  refuseBadBed(input, '');
  await lockJob(tenant, jobId);
  const { bed } = await rulesInForce(tenant, jobId);
  return addBedRule(tenant, { jobId, after: bed.version }, input);
}

function refuseForeignMarks({ unitStyle, graduation }: Pick<JobRow, 'unitStyle' | 'graduation'>): void {
  if (!isGraduationOf(unitStyle, graduation)) {
    const message = 'Rods of this unit are not read to such a mark.';
    throw notPossible('graduation', 'graduation-not-of-style', message, { style: unitStyle, graduation });
  }
}

function refuseBadBed({ least, most, nominal }: BedRuleInput, at: string): void {
  if (most < least)
    throw notPossible(`${at}most`, 'bed-most-under-least', 'The thickest bed is thinner than the thinnest.', { least, most });
  if (nominal < least || nominal > most) {
    throw notPossible(`${at}nominal`, 'bed-nominal-outside', 'The nominal bed lies outside its limits.', {
      least,
      most,
      nominal,
    });
  }
}
