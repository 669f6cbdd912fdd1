import { may } from '@/shared/roles';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { Surface } from '@/shared/rules';
import type { Actor, Tenant } from '../../api/handler';
import { RoundEntity, type RoundRow } from '../../entities/rounds';
import { ApiError, NotFound, notPossible } from '../../errors';
import { lockFooting } from '../footings/footing-rows';
import { viewFooting } from '../footings/footing-service';
import { listInstruments } from '../instruments/instrument-service';
import { benchmarksOfJobs } from '../jobs/benchmark-service';
import { rulesInForce } from '../jobs/rule-store';

/** An installer shoots the top and nothing under it. */
export function mayShoot({ roles }: Pick<Actor, 'roles'>, surface: Surface): boolean {
  return may(roles, 'round.shoot') && (surface === 'top' || may(roles, 'round.any-surface'));
}

/**
 * Opens a round of a surface under the rules now in force. Asked again with the id, it answers the round that is there.
 * @throws NotFound; ApiError 'role-refused' for an installer under the top, 'not-possible' without stations or with another round's id
 */
export async function openRound(
  tenant: Tenant,
  footingId: string,
  input: { id: string; surface: Surface },
): Promise<RoundBundle> {
  refuseSurface(tenant.actor, input.surface);
  const footing = await lockFooting(tenant, footingId);
  const { manager, actor } = tenant;
  const { companyId } = actor;
  const there = await manager.findOneBy(RoundEntity, { companyId, id: input.id });
  if (there !== null) {
    if (there.footingId === footingId && there.surface === input.surface) return readRound(tenant, there.id);
    throw notPossible('id', 'id-taken', 'Another round has this id.');
  }
  const { footing: seen } = await viewFooting(tenant, footingId);
  if (seen.stations.length === 0) throw notPossible('surface', 'no-stations', 'There is no station to shoot.');
  const rules = await rulesInForce(tenant, footing.jobId);
  const tolerance = rules.tolerance.find(({ surface }) => surface === input.surface);
  if (tolerance === undefined) throw new Error(`job ${footing.jobId} has no rule for ${input.surface}`);
  const earlier = seen.rounds.filter(({ surface }) => surface === input.surface).length;
  await manager.insert(RoundEntity, {
    companyId,
    id: input.id,
    footingId,
    surface: input.surface,
    number: earlier + 1,
    openedAt: tenant.now(),
    openedBy: actor.personId,
    closedAt: null,
    toleranceRuleId: tolerance.id,
    bedRuleId: rules.bed.id,
    lastSequence: 0,
  });
  return readRound(tenant, input.id);
}

/** @throws NotFound */
export async function findRound({ manager, actor }: Tenant, id: string): Promise<RoundRow> {
  const row = await manager.findOneBy(RoundEntity, { companyId: actor.companyId, id });
  if (row === null) throw new NotFound();
  return row;
}

/** The round, locked: its records take their places one after the other. @throws NotFound */
export async function lockRound({ manager, actor }: Tenant, id: string): Promise<RoundRow> {
  const where = { companyId: actor.companyId, id };
  const row = await manager.findOne(RoundEntity, { where, lock: { mode: 'pessimistic_write' } });
  if (row === null) throw new NotFound();
  return row;
}

/** @throws NotFound */
export async function readRound(tenant: Tenant, id: string): Promise<RoundBundle> {
  const row = await findRound(tenant, id);
  const view = await viewFooting(tenant, row.footingId);
  const round = view.rounds.find((other) => other.row.id === id);
  if (round === undefined) throw new NotFound();
  const { job, footing } = view;
  return {
    round: round.summary,
    job: { id: job.id, name: job.name, unitStyle: job.unitStyle, graduation: job.graduation, wallType: job.wallType },
    footing,
    benchmarks: (await benchmarksOfJobs(tenant, [job.id])).get(job.id) ?? [],
    ...(await listInstruments(tenant)),
    toleranceRule: round.toleranceRule,
    bedRule: round.bedRule,
  };
}

/** Closes a round, or opens it again; what it already is, it stays since when it is. @throws NotFound; ApiError 'role-refused' */
export async function changeRound(tenant: Tenant, id: string, closed: boolean): Promise<RoundBundle> {
  const row = await lockRound(tenant, id);
  refuseSurface(tenant.actor, row.surface);
  if (closed !== (row.closedAt !== null)) {
    await tenant.manager.update(RoundEntity, { companyId: row.companyId, id }, { closedAt: closed ? tenant.now() : null });
  }
  return readRound(tenant, id);
}

function refuseSurface(actor: Actor, surface: Surface): void {
  if (!mayShoot(actor, surface))
    throw new ApiError('role-refused', `Nobody in the role of ${actor.roles.join(', ')} shoots ${surface}.`);
}
