import type { Nm } from '@/analysis';
import type { Footing, Run } from '@/shared/api/footing-schemas';
import type { Tenant } from '../../api/handler';
import { FootingEntity, StationEntity, type FootingRow, type StationRow } from '../../entities/footings';
import { ApiError, NotFound, notPossible } from '../../errors';
import { lockFooting, readFootingRows, runsOf, stationsWithShots } from './footing-rows';
import { readFooting } from './footing-service';
import type { Standing } from './keep-stations';
import { placesBetween, runStarts, type Place } from './lay-stations';
import { layOutAnew, placesThatStand } from './write-stations';

interface Locked {
  footing: FootingRow;
  runs: Run[];
  standing: Standing;
}

/** Lays stations out; those put by hand and those shot stay. @throws NotFound; ApiError 'not-possible' without an outline */
export async function setStations(tenant: Tenant, footingId: string, spacing: Nm): Promise<Footing> {
  const { footing, runs, standing } = await lock(tenant, footingId);
  if (runs.length === 0) throw notPossible('spacing', 'no-outline', 'Stations stand on an outline: draw it first.');
  await tenant.manager.update(FootingEntity, { companyId: tenant.actor.companyId, id: footingId }, { spacing });
  await layOutAnew(tenant, { ...footing, spacing }, runs, placesBetween(runs, spacing), standing);
  return readFooting(tenant, footingId);
}

/** @throws NotFound; ApiError 'not-possible' off the walk, or where one stands */
export async function addStation(tenant: Tenant, footingId: string, at: Nm): Promise<Footing> {
  const locked = await lock(tenant, footingId);
  await standAt(tenant, locked, at, null);
  return readFooting(tenant, footingId);
}

/** @throws NotFound; ApiError 'station-has-shots' when it would move, 'not-possible' */
export async function changeStation(tenant: Tenant, id: string, change: { name?: string; at?: Nm }): Promise<Footing> {
  const { station, locked } = await lockStation(tenant, id);
  const key = { companyId: tenant.actor.companyId, id };
  if (change.name !== undefined) await tenant.manager.update(StationEntity, key, { name: change.name });
  if (change.at !== undefined && change.at !== station.at) {
    refuseFixed(station, locked, 'at');
    await standAt(tenant, locked, change.at, { ...station, name: change.name ?? station.name });
  }
  return readFooting(tenant, station.footingId);
}

/** @throws NotFound; ApiError 'station-has-shots', 'not-possible' for a corner or a side of a step */
export async function removeStation(tenant: Tenant, id: string): Promise<Footing> {
  const { station, locked } = await lockStation(tenant, id);
  refuseFixed(station, locked, 'stationId');
  const stations = locked.standing.stations.filter((other) => other.id !== id);
  await tenant.manager.delete(StationEntity, { companyId: tenant.actor.companyId, id });
  await renew(tenant, locked, { ...locked.standing, stations });
  return readFooting(tenant, station.footingId);
}

async function lock(tenant: Tenant, footingId: string): Promise<Locked> {
  const footing = await lockFooting(tenant, footingId);
  const [rows] = await readFootingRows(tenant, [footing]);
  if (rows === undefined) throw new NotFound();
  const standing = { stations: rows.stations, shot: await stationsWithShots(tenant, footingId), runs: rows.runs };
  return { footing, runs: runsOf(rows), standing };
}

async function lockStation(tenant: Tenant, id: string): Promise<{ station: StationRow; locked: Locked }> {
  const known = await tenant.manager.findOneBy(StationEntity, { companyId: tenant.actor.companyId, id });
  if (known === null) throw new NotFound();
  const locked = await lock(tenant, known.footingId);
  // Read again under the lock: somebody may have removed it meanwhile.
  const station = locked.standing.stations.find((row) => row.id === id);
  if (station === undefined) throw new NotFound();
  return { station, locked };
}

/** Corners and steps stand where the outline has them, and every one of them is wanted. */
function refuseFixed(station: StationRow, { standing }: Locked, path: string): void {
  if (standing.shot.has(station.id)) throw new ApiError('station-has-shots', 'Something has been shot at this station.');
  if (station.corner !== null || station.step !== null) {
    throw notPossible(path, 'station-of-outline', 'A corner or a side of a step stands where the outline has it.');
  }
}

/** Puts a station, new or moved, at a distance along the walk. */
async function standAt(tenant: Tenant, locked: Locked, at: Nm, moved: StationRow | null): Promise<void> {
  const { runs, standing } = locked;
  const place = placeOf(runs, at);
  const stays = standing.stations.filter(({ id }) => id !== moved?.id);
  if (stays.some((station) => station.at === at))
    throw notPossible('at', 'station-there', 'A station stands there already.', { at });
  const row: StationRow = {
    companyId: tenant.actor.companyId,
    id: moved?.id ?? tenant.newId(),
    footingId: locked.footing.id,
    runId: place.runId,
    position: standing.stations.length,
    at,
    name: moved?.name ?? null,
    added: true,
    corner: null,
    step: null,
    planGrade: 0,
    x: 0,
    y: 0,
  };
  if (moved === null) await tenant.manager.insert(StationEntity, row);
  await renew(tenant, locked, { ...standing, stations: [...stays, row] });
}

/** Every station where it stands, in walking order. */
async function renew(tenant: Tenant, { footing, runs }: Locked, standing: Standing): Promise<void> {
  const laidOut = standing.stations.some(({ corner }) => corner !== null);
  await layOutAnew(tenant, footing, runs, laidOut ? placesThatStand(standing) : null, standing);
}

/** @throws ApiError 'not-possible' at a distance that is on no run */
function placeOf(runs: readonly Run[], at: Nm): Place {
  const starts = runStarts(runs);
  for (const run of runs) {
    const along = at - (starts.get(run.id) ?? 0);
    if (along > 0 && along < run.length) return { runId: run.id, along };
  }
  const walk = runs.reduce((sum, { length }) => sum + length, 0);
  if (at > 0 && at < walk) throw notPossible('at', 'station-there', 'A corner stands there already.', { at });
  throw notPossible('at', 'off-the-walk', 'That is not along the walk.', { at, walk });
}
