import type { Nm, ProfilePoint, WallRun } from '@/analysis';
import type { Footing, Station } from '../api/footing-schemas';
import type { Rail } from '../records';
import type { RoundTarget } from './round-state';

/** One straight, unstepped piece of the footing under one rail, with what was shot on it. */
export interface Segment {
  /** `runId`, or `runId#2` for the piece after a run's first step; the rail stands behind a slash where there are two. */
  id: string;
  runId: string;
  rail: Rail;
  planGrade: Nm;
  /** In walking order, both ends included. */
  targets: RoundTarget[];
  /** Distance of each target from the first, along the rail that was shot. */
  distances: Nm[];
}

interface Place {
  station: Station;
  target: RoundTarget;
}

/** Stations of each run in walking order with the corner that ends it, which belongs to the next run; a closed walk ends at its first station. */
function placesByRun(footing: Footing, targets: RoundTarget[]): { runId: string; places: Place[] }[] {
  const byStation = new Map(targets.map((target) => [target.stationId, target]));
  const inOrder = [...footing.stations].sort((p, q) => p.position - q.position);
  const places = inOrder.flatMap((station) => {
    const target = byStation.get(station.id);
    return target ? [{ station, target }] : [];
  });
  const [start] = places;
  return footing.runs.map((run, index) => {
    const own = places.filter((place) => place.station.runId === run.id);
    const next = footing.runs[index + 1];
    const end = next ? places.find((place) => place.station.runId === next.id && place.station.corner !== null) : undefined;
    if (end) return { runId: run.id, places: [...own, end] };
    const isStrip = own.at(-1)?.station.corner !== null && own.length > 1;
    return { runId: run.id, places: start && !next && !isStrip ? [...own, start] : own };
  });
}

/**
 * Cuts one rail's targets into straight pieces at corners and steps. Distances are taken between the points where the rod stood
 * (the corner's is the mitre), so that width × length counts each corner once.
 */
export function segmentsOf(footing: Footing, targets: RoundTarget[], rail: Rail): Segment[] {
  const suffix = rail === 'centre' ? '' : `/${rail}`;
  return placesByRun(
    footing,
    targets.filter((target) => target.rail === rail),
  ).flatMap(({ runId, places }) => {
    const pieces: Place[][] = [[]];
    for (const place of places) {
      if (place.station.step === 'after') pieces.push([]);
      pieces.at(-1)?.push(place);
    }
    return pieces.flatMap((piece, index) => {
      const [first] = piece;
      if (!first) return [];
      return [
        {
          id: `${runId}${index === 0 ? '' : `#${index + 1}`}${suffix}`,
          runId,
          rail,
          planGrade: first.station.planGrade,
          targets: piece.map((place) => place.target),
          distances: piece.map((place) =>
            Math.round(Math.hypot(place.target.x - first.target.x, place.target.y - first.target.y)),
          ),
        },
      ];
    });
  });
}

/** The surface as shot along a segment; stations not shot, or without an elevation, are left out. */
export function profileOf(segment: Segment): ProfilePoint[] {
  return segment.targets.flatMap((target, index) => {
    const elevation = target.deciding?.elevation;
    return elevation === null || elevation === undefined ? [] : [{ station: segment.distances[index] ?? 0, elevation }];
  });
}

/** What the course planner takes: every segment as wide as the wall, or half of it where an outer and an inner rail were shot. */
export function wallRunsOf(footing: Footing, segments: Segment[]): WallRun[] {
  const width = footing.rails === 'both' ? footing.wallThickness / 2 : footing.wallThickness;
  return segments.flatMap((segment) => {
    const profile = profileOf(segment);
    return profile.length < 2 ? [] : [{ id: segment.id, width, planGrade: segment.planGrade, profile }];
  });
}
