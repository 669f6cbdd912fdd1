import type { z } from 'zod';
import type { endpoints } from '@/shared/api/endpoints';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Tenant } from '../../api/handler';
import { sqlState, UNIQUE_VIOLATION } from '../../database/database';
import { FootingEntity, type FootingRow } from '../../entities/footings';
import { ApiError, nameTaken } from '../../errors';
import { findJob } from '../jobs/job-store';
import { findFooting, footingsWithShots, lockFooting, readFootingRows, runsOf, stationsWithShots } from './footing-rows';
import { viewFootings, type FootingView } from './footing-views';
import { layOutAnew, placesThatStand } from './write-stations';

type NewFooting = z.output<typeof endpoints.addFooting.body>;
type FootingChange = z.output<typeof endpoints.changeFooting.body>;

/** @throws NotFound */
export async function viewFooting(tenant: Tenant, id: string): Promise<FootingView> {
  const row = await findFooting(tenant, id);
  const [view] = await viewFootings(tenant, [row], [await findJob(tenant, row.jobId)]);
  if (view === undefined) throw new Error('one footing of one job has one view');
  return view;
}

/** @throws NotFound */
export async function readFooting(tenant: Tenant, id: string): Promise<Footing> {
  return (await viewFooting(tenant, id)).footing;
}

/** @throws NotFound; ApiError 'name-taken' */
export async function addFooting(tenant: Tenant, jobId: string, input: NewFooting): Promise<Footing> {
  await findJob(tenant, jobId);
  const { landmark, ...fields } = input;
  const { companyId, personId } = tenant.actor;
  const id = tenant.newId();
  await orNameTaken(
    tenant.manager.insert(FootingEntity, {
      companyId,
      id,
      jobId,
      ...fields,
      ...landmarkColumns(landmark),
      outlineVersion: 0,
      spacing: null,
      createdAt: tenant.now(),
      createdBy: personId,
    }),
  );
  return readFooting(tenant, id);
}

/**
 * Changes a footing; where its section or its grade changes, stations stay and their rails and grades follow.
 * @throws NotFound; ApiError 'name-taken', 'outline-has-shots' for other rails once some have been shot, 'not-possible'
 */
export async function changeFooting(tenant: Tenant, id: string, { landmark, ...change }: FootingChange): Promise<Footing> {
  const before = await lockFooting(tenant, id);
  const after: FootingRow = { ...before, ...change, ...(landmark === undefined ? {} : landmarkColumns(landmark)) };
  if (after.rails !== before.rails && (await footingsWithShots(tenant, [id])).has(id)) {
    throw new ApiError('outline-has-shots', 'The rails of this footing have been shot as they are.');
  }
  await orNameTaken(tenant.manager.update(FootingEntity, { companyId: tenant.actor.companyId, id }, after));
  const [rows] = await readFootingRows(tenant, [after]);
  if (rows !== undefined && rows.stations.length > 0) {
    const standing = { stations: rows.stations, shot: await stationsWithShots(tenant, id), runs: rows.runs };
    const laidOut = rows.stations.some(({ corner }) => corner !== null);
    await layOutAnew(tenant, after, runsOf(rows), laidOut ? placesThatStand(standing) : null, standing);
  }
  return readFooting(tenant, id);
}

function landmarkColumns(landmark: NewFooting['landmark']): Pick<FootingRow, 'landmarkName' | 'landmarkAzimuth'> {
  return { landmarkName: landmark?.name ?? null, landmarkAzimuth: landmark?.azimuth ?? null };
}

async function orNameTaken(write: Promise<unknown>): Promise<void> {
  try {
    await write;
  } catch (error) {
    throw sqlState(error) === UNIQUE_VIOLATION ? nameTaken('name') : error;
  }
}
