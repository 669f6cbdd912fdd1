import type { Tenant } from '../../api/handler';
import { Job, type JobRow } from '../../entities/jobs';
import { NotFound } from '../../errors';

/** @throws NotFound */
export async function findJob({ manager, actor }: Tenant, id: string): Promise<JobRow> {
  const row = await manager.findOneBy(Job, { companyId: actor.companyId, id });
  if (row === null) throw new NotFound();
  return row;
}

/** The job, locked: two who change it at once do so one after the other. @throws NotFound */
export async function lockJob({ manager, actor }: Tenant, id: string): Promise<JobRow> {
  const row = await manager.findOne(Job, { where: { companyId: actor.companyId, id }, lock: { mode: 'pessimistic_write' } });
  if (row === null) throw new NotFound();
  return row;
}

/** Every job of the company, newest first. */
export function findJobs({ manager, actor }: Tenant): Promise<JobRow[]> {
  return manager.find(Job, { where: { companyId: actor.companyId }, order: { createdAt: 'DESC', id: 'DESC' } });
}
