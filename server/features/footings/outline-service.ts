import { In } from 'typeorm';
import type { z } from 'zod';
import { AnalysisError, traceOutline } from '@/analysis';
import type { Footing, outlineInputSchema, Run } from '@/shared/api/footing-schemas';
import { may } from '@/shared/roles';
import type { Tenant } from '../../api/handler';
import { sqlState, UNIQUE_VIOLATION } from '../../database/database';
import { FootingEntity, RunEntity, StepEntity, type RunRow } from '../../entities/footings';
import { ApiError, notPossible } from '../../errors';
import { lockFooting, readFootingRows, stationsWithShots } from './footing-rows';
import { readFooting } from './footing-service';
import { layOutAnew, placesWanted } from './write-stations';

type OutlineInput = z.output<typeof outlineInputSchema>;

/**
 * Sets all runs at once. Stations that are still there keep their ids; where stations were laid out, they are laid out again.
 * @throws NotFound; ApiError 'out-of-date', 'outline-has-shots' for an operator once something is shot,
 *   'station-has-shots' when a shot station would be gone, 'not-possible' with what is wrong by path
 */
export async function setOutline(tenant: Tenant, footingId: string, input: OutlineInput): Promise<Footing> {
  const footing = await lockFooting(tenant, footingId);
  if (footing.outlineVersion !== input.version) throw new ApiError('out-of-date', 'Somebody changed this outline first.');
  const [before] = await readFootingRows(tenant, [footing]);
  const shot = await stationsWithShots(tenant, footingId);
  if (shot.size > 0 && !may(tenant.actor.roles, 'outline.change-after-shots')) {
    throw new ApiError('outline-has-shots', 'Stations of this outline have been shot: a super may change it.');
  }
  refuseImpossible(input.runs);
  const key = { companyId: tenant.actor.companyId, id: footingId };
  await tenant.manager.update(FootingEntity, key, { outlineVersion: footing.outlineVersion + 1 });
  const gone = await writeRuns(tenant, footingId, input.runs, before?.runs ?? []);
  const standing = { stations: before?.stations ?? [], shot, runs: before?.runs ?? [] };
  await layOutAnew(tenant, footing, input.runs, placesWanted(footing, input.runs), standing);
  await removeRuns(tenant, gone);
  return readFooting(tenant, footingId);
}

/** @throws ApiError 'not-possible' */
function refuseImpossible(runs: readonly Run[]): void {
  refuseTwice(
    runs.map(({ id }) => id),
    (index) => `runs.${index}.id`,
  );
  runs.forEach((run, index) => {
    run.steps.forEach(({ at }, place) => {
      if (at <= run.length) return;
      const path = `runs.${index}.steps.${place}.at`;
      throw notPossible(path, 'step-outside-run', 'The step lies beyond the end of its run.', { at, length: run.length });
    });
  });
  refuseTwice(
    runs.flatMap(({ steps }) => steps.map(({ id }) => id)),
    () => 'runs',
  );
  const traced = trace(runs);
  if (traced.selfCrossing) throw notPossible('runs', 'outline-crosses-itself', 'The outline crosses itself.');
}

function trace(runs: readonly Run[]): ReturnType<typeof traceOutline> {
  try {
    return traceOutline(runs.map(({ id, length, turn, steps }) => ({ id, length, turn, steps })));
  } catch (error) {
    if (error instanceof AnalysisError) throw notPossible('runs', error.code, error.message, error.details);
    throw error;
  }
}

function refuseTwice(ids: readonly string[], path: (index: number) => string): void {
  ids.forEach((id, index) => {
    if (ids.indexOf(id) !== index) throw notPossible(path(index), 'id-taken', 'Two things here have one id.');
  });
}

/** Writes the runs that are, with their steps, and answers which are no more: stations still stand on those. */
async function writeRuns(tenant: Tenant, footingId: string, runs: readonly Run[], before: readonly RunRow[]): Promise<string[]> {
  const { companyId } = tenant.actor;
  const known = new Set(before.map(({ id }) => id));
  const rows = runs.map(({ id, length, turn, width, thickness }, position): RunRow => ({
    companyId,
    id,
    footingId,
    position,
    length,
    turn,
    width,
    thickness,
  }));
  const gone = before.map(({ id }) => id).filter((id) => runs.every((run) => run.id !== id));
  try {
    if (known.size > 0) await tenant.manager.delete(StepEntity, { companyId, runId: In([...known]) });
    for (const row of rows.filter(({ id }) => known.has(id)))
      await tenant.manager.update(RunEntity, { companyId, id: row.id }, row);
    const added = rows.filter(({ id }) => !known.has(id));
    if (added.length > 0) await tenant.manager.insert(RunEntity, added);
    const steps = runs.flatMap((run) => run.steps.map(({ id, at, by }) => ({ companyId, id, runId: run.id, at, by })));
    if (steps.length > 0) await tenant.manager.insert(StepEntity, steps);
  } catch (error) {
    if (sqlState(error) === UNIQUE_VIOLATION) throw notPossible('runs', 'id-taken', 'A run or step has the id of one elsewhere.');
    throw error;
  }
  return gone;
}

/** Once no station stands on them. */
async function removeRuns({ manager, actor }: Tenant, ids: readonly string[]): Promise<void> {
  if (ids.length === 0) return;
  await manager.delete(RunEntity, { companyId: actor.companyId, id: In([...ids]) });
}
