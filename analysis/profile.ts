import { AnalysisError } from './analysis-error';
import { nanometres } from './check-input';
import type { ProfilePoint } from './types';
import type { Nm } from './units';

/**
 * A profile with every number checked; two points at one station are a step.
 * @throws AnalysisError 'not-finite' | 'out-of-range' | 'profile-not-in-order' (details station)
 */
export function checkedProfile(name: string, profile: readonly ProfilePoint[]): ProfilePoint[] {
  let before = -Infinity;
  return profile.map((point) => {
    const station = nanometres(`station of ${name}`, point.station);
    const elevation = nanometres(`elevation of ${name}`, point.elevation);
    if (station < before) {
      throw new AnalysisError('profile-not-in-order', `The stations of ${name} do not run on at ${station}.`, { name, station });
    }
    before = station;
    return { station, elevation };
  });
}

export interface Segment {
  from: ProfilePoint;
  to: ProfilePoint;
  length: Nm;
}

/** The straight pieces between neighbours; a step has length 0. */
export function segmentsOf(profile: readonly ProfilePoint[]): Segment[] {
  return profile.flatMap((to, index) => {
    const from = profile[index - 1];
    return from ? [{ from, to, length: to.station - from.station }] : [];
  });
}

/**
 * ∫ max(h, 0) over a straight piece that runs from height `h0` to `h1`, and the length over which h is above 0: exact, cut at the zero
 * crossing. A piece that lies at 0 is not above it.
 */
export function positivePart(h0: number, h1: number, length: Nm): { area: number; length: Nm } {
  if (h0 <= 0 && h1 <= 0) return { area: 0, length: 0 };
  if (h0 >= 0 && h1 >= 0) return { area: (length * (h0 + h1)) / 2, length };
  const top = Math.max(h0, h1);
  const over = length * (top / (top - Math.min(h0, h1)));
  return { area: (over * top) / 2, length: over };
}
