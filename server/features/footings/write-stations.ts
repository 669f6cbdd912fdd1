import { In } from 'typeorm';
import type { Run } from '@/shared/api/footing-schemas';
import type { Tenant } from '../../api/handler';
import { StationEntity, StationPoint, type FootingRow, type StationRow } from '../../entities/footings';
import { keepStations, type KeptStation, type Standing } from './keep-stations';
import { placesBetween, runStarts, type Place } from './lay-stations';

/** Lays a footing's stations out anew and writes what has changed. `between`: see keepStations. */
export async function layOutAnew(
  tenant: Tenant,
  footing: FootingRow,
  runs: readonly Run[],
  between: readonly Place[] | null,
  standing: Standing,
): Promise<void> {
  await writeStations(tenant, footing.id, keepStations(footing, runs, between, standing), standing.stations);
}

/** The places between corners and steps where stations now stand: a change of the section moves rails, and no station along its run. */
export function placesThatStand({ stations, runs }: Standing): Place[] {
  const starts = runStarts(runs);
  return stations
    .filter(({ corner, step }) => corner === null && step === null)
    .map(({ runId, at }) => ({ runId, along: at - (starts.get(runId) ?? 0) }));
}

/** What a footing's own spacing asks for; null before any was given. */
export function placesWanted({ spacing }: Pick<FootingRow, 'spacing'>, runs: readonly Run[]): Place[] | null {
  return spacing === null || runs.length === 0 ? null : placesBetween(runs, spacing);
}

async function writeStations(
  { manager, actor, newId }: Tenant,
  footingId: string,
  kept: KeptStation[],
  before: readonly StationRow[],
): Promise<void> {
  const { companyId } = actor;
  const stays = new Set(kept.flatMap(({ was }) => (was === null ? [] : [was.id])));
  const gone = before.filter(({ id }) => !stays.has(id)).map(({ id }) => id);
  if (gone.length > 0) await manager.delete(StationEntity, { companyId, id: In(gone) });
  if (stays.size > 0) await manager.delete(StationPoint, { companyId, stationId: In([...stays]) });
  const rows = kept.map(({ laid, was, added }, position): StationRow => {
    const { points: _points, ...place } = laid;
    return { companyId, id: was?.id ?? newId(), footingId, position, name: was?.name ?? null, added, ...place };
  });
  // One by one is slow for a long walk; a station that moved is rare beside one that only has another number.
  for (const row of rows.filter(({ id }) => stays.has(id))) await manager.update(StationEntity, { companyId, id: row.id }, row);
  await insertAll(
    rows.filter(({ id }) => !stays.has(id)),
    (some) => manager.insert(StationEntity, some),
  );
  const points = rows.flatMap(({ id }, index) =>
    (kept[index]?.laid.points ?? []).map((point) => ({ companyId, stationId: id, ...point })),
  );
  await insertAll(points, (some) => manager.insert(StationPoint, some));
}

/** A statement takes 65,535 values. */
const ROWS_AT_ONCE = 2_000;

async function insertAll<Row>(rows: Row[], insert: (rows: Row[]) => Promise<unknown>): Promise<void> {
  for (let from = 0; from < rows.length; from += ROWS_AT_ONCE) await insert(rows.slice(from, from + ROWS_AT_ONCE));
}
