import { In } from 'typeorm';
import type { Footing, Run, Station } from '@/shared/api/footing-schemas';
import type { UnitStyle } from '@/shared/quantities';
import { stationName } from '@/shared/station-name';
import type { Tenant } from '../../api/handler';
import {
  FootingEntity,
  RunEntity,
  StationEntity,
  StationPoint,
  StepEntity,
  type FootingRow,
  type RunRow,
  type StationPointRow,
  type StationRow,
  type StepRow,
} from '../../entities/footings';
import { NotFound } from '../../errors';

/** A footing's own rows, runs and stations in walking order. */
export interface FootingRows {
  footing: FootingRow;
  runs: RunRow[];
  steps: StepRow[];
  stations: StationRow[];
  points: StationPointRow[];
}

/** @throws NotFound */
export async function findFooting({ manager, actor }: Tenant, id: string): Promise<FootingRow> {
  const row = await manager.findOneBy(FootingEntity, { companyId: actor.companyId, id });
  if (row === null) throw new NotFound();
  return row;
}

/** The footing, locked: outline, stations and rounds change one after the other. @throws NotFound */
export async function lockFooting({ manager, actor }: Tenant, id: string): Promise<FootingRow> {
  const where = { companyId: actor.companyId, id };
  const row = await manager.findOne(FootingEntity, { where, lock: { mode: 'pessimistic_write' } });
  if (row === null) throw new NotFound();
  return row;
}

/** Keeps outline and stations as they are until the transaction ends; others may hold them too. */
export async function holdFooting({ manager, actor }: Tenant, id: string): Promise<void> {
  const where = { companyId: actor.companyId, id };
  await manager.findOneOrFail(FootingEntity, { where, lock: { mode: 'pessimistic_read' } });
}

/** What belongs to these footings, each with its own. */
export async function readFootingRows({ manager, actor }: Tenant, footings: readonly FootingRow[]): Promise<FootingRows[]> {
  const { companyId } = actor;
  if (footings.length === 0) return [];
  const ofThese = { companyId, footingId: In(footings.map(({ id }) => id)) };
  const runs = await manager.find(RunEntity, { where: ofThese, order: { position: 'ASC' } });
  const stations = await manager.find(StationEntity, { where: ofThese, order: { position: 'ASC' } });
  const steps =
    runs.length === 0
      ? []
      : await manager.find(StepEntity, {
          where: { companyId, runId: In(runs.map(({ id }) => id)) },
          order: { at: 'ASC', id: 'ASC' },
        });
  const points =
    stations.length === 0 ? [] : await manager.findBy(StationPoint, { companyId, stationId: In(stations.map(({ id }) => id)) });
  const runsOf = groupBy(runs, (run) => run.footingId);
  const stationsOf = groupBy(stations, (station) => station.footingId);
  const stepsOf = groupBy(steps, (step) => step.runId);
  const pointsOf = groupBy(points, (point) => point.stationId);
  return footings.map((footing) => {
    const own = runsOf.get(footing.id) ?? [];
    const standing = stationsOf.get(footing.id) ?? [];
    return {
      footing,
      runs: own,
      steps: own.flatMap((run) => stepsOf.get(run.id) ?? []),
      stations: standing,
      points: standing.flatMap((station) => pointsOf.get(station.id) ?? []),
    };
  });
}

/** Which of these footings have a shot at any of their stations, struck or not. */
export async function footingsWithShots({ manager, actor }: Tenant, footingIds: readonly string[]): Promise<Set<string>> {
  if (footingIds.length === 0) return new Set();
  const rows: { id: string }[] = await manager.query(
    `select distinct station.footing_id id from stations station
     join shots shot on shot.company_id = station.company_id and shot.station_id = station.id
     where station.company_id = $1 and station.footing_id = any($2)`,
    [actor.companyId, footingIds],
  );
  return new Set(rows.map(({ id }) => id));
}

/** Which stations of a footing have been shot, struck or not. */
export async function stationsWithShots({ manager, actor }: Tenant, footingId: string): Promise<Set<string>> {
  const rows: { id: string }[] = await manager.query(
    `select distinct station.id from stations station
     join shots shot on shot.company_id = station.company_id and shot.station_id = station.id
     where station.company_id = $1 and station.footing_id = $2`,
    [actor.companyId, footingId],
  );
  return new Set(rows.map(({ id }) => id));
}

/** A footing as everybody sees it, less what follows from its rounds. */
export function footingOf(rows: FootingRows, style: UnitStyle): Omit<Footing, 'rounds' | 'stages' | 'hasShots'> {
  const { companyId: _company, createdAt: _at, createdBy: _by, landmarkName, landmarkAzimuth, ...fields } = rows.footing;
  const landmark = landmarkName === null || landmarkAzimuth === null ? null : { name: landmarkName, azimuth: landmarkAzimuth };
  return { ...fields, landmark, runs: runsOf(rows), stations: stationsOf(rows, style) };
}

export function runsOf({ runs, steps }: Pick<FootingRows, 'runs' | 'steps'>): Run[] {
  return runs.map(({ id, length, turn, width, thickness }) => ({
    id,
    length,
    turn,
    width,
    thickness,
    steps: steps.filter(({ runId }) => runId === id).map((step) => ({ id: step.id, at: step.at, by: step.by })),
  }));
}

const RAIL_ORDER = ['centre', 'outer', 'inner'];

function stationsOf({ stations, points }: FootingRows, style: UnitStyle): Station[] {
  const pointsByStation = groupBy(points, (point) => point.stationId);
  return stations.map(({ id, position, runId, at, name, corner, step, planGrade, x, y }) => ({
    id,
    position,
    runId,
    at,
    name: name ?? stationName(at, style),
    corner,
    step,
    planGrade,
    x,
    y,
    points: (pointsByStation.get(id) ?? [])
      .map((point) => ({ rail: point.rail, x: point.x, y: point.y }))
      .sort((a, b) => RAIL_ORDER.indexOf(a.rail) - RAIL_ORDER.indexOf(b.rail)),
  }));
}

export function groupBy<Row>(rows: readonly Row[], key: (row: Row) => string): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) {
    const group = groups.get(key(row));
    if (group) group.push(row);
    else groups.set(key(row), [row]);
  }
  return groups;
}
