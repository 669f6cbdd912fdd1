import {
  AnalysisError,
  cornerLetter,
  fitPlane,
  NM_PER_FOOT,
  stationsAlong,
  traceOutline,
  type Nm,
  type PlanPoint,
} from '@/analysis';
import type { PlanStation } from '@/components/charts/chart-types';
import type { Footing, Station } from '@/shared/api/footing-schemas';
import type { UnitStyle } from '@/shared/quantities';

/** The spacing that is asked for unless said otherwise: 5 ft, or 1.5 m. A straightedge of twice it can be judged. */
export function usualSpacing(style: UnitStyle): Nm {
  return style === 'metric' ? 1_500_000_000 : 5 * NM_PER_FOOT;
}

/** What the API takes as a spacing, nm: a foot to a hundred. */
export const SPACING_LIMITS = { least: NM_PER_FOOT, most: 100 * NM_PER_FOOT } as const;

export interface PlanCorner extends PlanPoint {
  label: string;
}

/** What is drawn of stations that stand, or would stand, on an outline. */
export interface StationPlan {
  corners: PlanCorner[];
  closed: boolean;
  stations: PlanStation[];
  /** Stations at corners. */
  atCorners: number;
}

const isClosed = (footing: Footing) => traceOutline(footing.runs).closure.angle === 0;

const drawn = (id: string, label: string, { x, y }: PlanPoint): PlanStation => ({ id, label, x, y, mark: 'not-shot' });

/** A station as people call it: a corner by its letter and place, "C 0+74"; any other by its name. */
export const stationTitle = ({ corner, name }: Pick<Station, 'corner' | 'name'>): string =>
  corner === null ? name : `${corner} ${name}`;

/** Where stations of this spacing would stand; null where the spacing cannot be laid out. */
export function previewStations(footing: Footing, spacing: Nm): StationPlan | null {
  if (footing.runs.length === 0 || spacing < SPACING_LIMITS.least || spacing > SPACING_LIMITS.most) return null;
  try {
    const stations = stationsAlong(footing.runs, spacing);
    return {
      corners: traceOutline(footing.runs).corners.map((corner, index) => ({ ...corner, label: cornerLetter(index) })),
      closed: isClosed(footing),
      stations: stations.map((station, index) => drawn(`${index}`, station.corner ?? '', station)),
      atCorners: stations.filter(({ corner }) => corner !== null).length,
    };
  } catch (error) {
    if (error instanceof AnalysisError) return null; // an outline that cannot be laid out is told about on its own screen
    throw error;
  }
}

/** The stations that stand, on the line that they lie on. Both sides of a step at a corner share its letter. */
export function standingStations(footing: Footing): StationPlan {
  const inOrder = [...footing.stations].sort((p, q) => p.position - q.position);
  const corners = inOrder.filter((station): station is Station & { corner: string } => station.corner !== null);
  return {
    corners: corners
      .filter(({ corner }, index) => corners.findIndex((other) => other.corner === corner) === index)
      .map(({ corner, x, y }) => ({ label: corner, x, y })),
    closed: isClosed(footing),
    stations: inOrder.map((station) => drawn(station.id, station.name, station)),
    atCorners: corners.length,
  };
}

/** What shots of these places can tell: a tilt any way, a tilt along their line alone, or the level alone. */
export function reachOf(places: readonly PlanPoint[]): 'plane' | 'line' | 'level' {
  if (places.length === 0) return 'level';
  return fitPlane(places.map(({ x, y }, index) => ({ id: `${index}`, x, y, z: 0 }))).model;
}
