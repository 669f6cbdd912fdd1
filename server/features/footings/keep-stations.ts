import type { Nm } from '@/analysis';
import type { Run } from '@/shared/api/footing-schemas';
import type { StationRow } from '../../entities/footings';
import { ApiError } from '../../errors';
import { layStations, runStarts, type Geometry, type LaidStation, type Place } from './lay-stations';

/** A station to be: where it now stands, and the row that it was, or null for a new one. */
export interface KeptStation {
  laid: LaidStation;
  was: StationRow | null;
  added: boolean;
}

export interface Standing {
  stations: readonly StationRow[];
  /** Ids of those that have been shot. */
  shot: ReadonlySet<string>;
  /** The runs they stand on. */
  runs: readonly Pick<Run, 'id' | 'length'>[];
}

/**
 * Lays stations out anew and keeps those that are still there: a corner is the same corner however long its runs are, anything else the same
 * place along its run. One that was put by hand, or has been shot, stays even where none would be laid.
 *
 * @param between where stations are wanted between corners and steps; null lays neither those nor corners and steps
 * @throws ApiError 'station-has-shots' when one that was shot would stand on no run; 'not-possible'
 */
export function keepStations(
  geometry: Geometry,
  runs: readonly Run[],
  between: readonly Place[] | null,
  standing: Standing,
): KeptStation[] {
  const before = new Stood(standing);
  const wanted = (between ?? []).filter((place) => isOn(runs, place));
  const fixed =
    between === null
      ? []
      : layStations(geometry, runs, []).map((laid) => ({ laid, was: before.take(keyOf(laid, runs)), added: false }));
  const asked = wanted.map((place) => ({ place, was: before.take(placeKey(place)), added: false }));
  const stays = stayingOn(runs, before.rows, new Set(wanted.map(placeKey)));
  return [...fixed, ...onTheirRuns(geometry, runs, [...asked, ...stays])].sort(inWalkingOrder);
}

/** Of those for which nothing is laid, the ones that stay all the same. @throws ApiError 'station-has-shots' */
function stayingOn(runs: readonly Run[], left: Stood['rows'], taken: Set<string>): Asked[] {
  return left
    .filter(({ row, shot }) => row.added || shot)
    .flatMap(({ row, shot, place }) => {
      const key = placeKey(place);
      if (isOn(runs, place) && !taken.has(key)) {
        taken.add(key);
        return [{ place, was: row, added: true }];
      }
      if (shot) throw new ApiError('station-has-shots', `Station ${row.corner ?? row.at} has been shot, and would be gone.`);
      return [];
    });
}

interface Asked {
  place: Place;
  was: StationRow | null;
  added: boolean;
}

function onTheirRuns(geometry: Geometry, runs: readonly Run[], places: Asked[]): KeptStation[] {
  const laid = new Map(
    layStations(
      geometry,
      runs,
      places.map(({ place }) => place),
    ).map((station) => [keyOf(station, runs), station]),
  );
  return places.flatMap(({ place, was, added }) => {
    const station = laid.get(placeKey(place));
    return station === undefined ? [] : [{ laid: station, was, added: was?.added ?? added }];
  });
}

/** Strictly within a run: its ends are corners. A step there takes the place over. */
function isOn(runs: readonly Run[], { runId, along }: Place): boolean {
  const run = runs.find(({ id }) => id === runId);
  return run !== undefined && along > 0 && along < run.length && run.steps.every(({ at }) => at !== along);
}

function inWalkingOrder(a: KeptStation, b: KeptStation): number {
  return a.laid.at - b.laid.at || (a.laid.step === 'after' ? 1 : 0) - (b.laid.step === 'after' ? 1 : 0);
}

type Keyed = Pick<StationRow, 'runId' | 'at' | 'corner' | 'step'>;

function keyOf(station: Keyed, runs: readonly Pick<Run, 'id' | 'length'>[]): string {
  const along: Nm = station.at - (runStarts(runs).get(station.runId) ?? 0);
  if (station.corner === null) return `${placeKey({ runId: station.runId, along })} ${station.step ?? ''}`.trim();
  return `${station.runId} ${along === 0 ? 'start' : 'end'} ${station.step ?? ''}`.trim();
}

function placeKey({ runId, along }: Place): string {
  return `${runId} ${along}`;
}

/** The stations that were, to be taken one by one by those that will be. */
class Stood {
  readonly rows: { key: string; row: StationRow; shot: boolean; place: Place }[];

  constructor({ stations, shot, runs }: Standing) {
    const starts = runStarts(runs);
    this.rows = stations.map((row) => ({
      key: keyOf(row, runs),
      row,
      shot: shot.has(row.id),
      place: { runId: row.runId, along: row.at - (starts.get(row.runId) ?? 0) },
    }));
  }

  /** The one of this place: on the same side of a step, or, where a step has come or gone, on either. */
  take(key: string): StationRow | null {
    const plain = key.replace(/ (before|after)$/, '');
    const index = [key, plain, `${plain} before`, `${plain} after`]
      .map((wanted) => this.rows.findIndex((entry) => entry.key === wanted))
      .find((found) => found >= 0);
    if (index === undefined) return null;
    return this.rows.splice(index, 1)[0]?.row ?? null;
  }
}
