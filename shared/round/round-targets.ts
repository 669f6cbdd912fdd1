import type { Nm } from '@/analysis';
import type { Footing, Station } from '../api/footing-schemas';
import { RAILS, type Rail } from '../records';
import type { Surface } from '../rules';

/** A rail of a station before anything is known of its shots. `grade`: plan grade of the surface there. */
export interface Place {
  key: string;
  stationId: string;
  rail: Rail;
  at: Nm;
  x: number;
  y: number;
  grade: Nm;
}

/** How a rail of a station is named in targets, disagreements and level notes. */
export function targetKey(stationId: string, rail: Rail): string {
  return `${stationId}/${rail}`;
}

/**
 * Plan grade of a surface at a station: the rails stand `railOffset` above the top of footing, the dig lies a thickness (the
 * run's own, or the footing's) under it, and wet or hard concrete is judged against the top itself.
 */
export function surfaceGrade(footing: Footing, station: Station, surface: Surface): Nm {
  switch (surface) {
    case 'rails':
      return station.planGrade + footing.railOffset;
    case 'dig': {
      const run = footing.runs.find((candidate) => candidate.id === station.runId);
      return station.planGrade - (run?.thickness ?? footing.thickness);
    }
    case 'wet':
    case 'top':
      return station.planGrade;
  }
}

/** Everywhere that a round shoots, in walking order and rail by rail: the whole outer rail, then the whole inner one. */
export function placesInWalkingOrder(footing: Footing, surface: Surface): Place[] {
  const stations = [...footing.stations].sort((one, other) => one.position - other.position);
  return RAILS.flatMap((rail) =>
    stations.flatMap((station) =>
      station.points
        .filter((point) => point.rail === rail)
        .map((point) => ({
          key: targetKey(station.id, rail),
          stationId: station.id,
          rail,
          at: station.at,
          x: point.x,
          y: point.y,
          grade: surfaceGrade(footing, station, surface),
        })),
    ),
  );
}
