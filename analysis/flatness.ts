import { finite, inRange, nanometres, positiveLength } from './check-input';
import { checkedProfile } from './profile';
import type { ProfilePoint } from './types';
import { NM_PER_FOOT, NM_PER_INCH, type Nm } from './units';

export { straightedge } from './straightedge';

/** The two stations, the rise between them (positive: up), and that rise per 10 ft; null at a vertical step. */
export interface ProfileStep {
  from: Nm;
  to: Nm;
  difference: Nm;
  per10Feet: Nm | null;
}

/** Differences between neighbours. @throws AnalysisError 'not-finite' | 'out-of-range' | 'profile-not-in-order' */
export function steps(profile: ProfilePoint[]): ProfileStep[] {
  const points = checkedProfile('the profile', profile);
  return points.flatMap((to, index) => {
    const from = points[index - 1];
    if (!from) return [];
    const length = to.station - from.station;
    const difference = to.elevation - from.elevation;
    const per10Feet = length > 0 ? inRange('per10Feet', (difference / length) * 10 * NM_PER_FOOT) : null;
    return [{ from: from.station, to: to.station, difference, per10Feet }];
  });
}

/** Constants of the F-numbers in inches, and the spacing that they are defined for (ASTM E1155; from memory, definitions seen). */
const FLATNESS_INCHES = 4.57;
const LEVELNESS_INCHES = 12.5;
const SPACING = NM_PER_FOOT;
const LEVELNESS_SPAN = 10;

/** constant ÷ (3·s + |mean|), s with n − 1; null under two values, and where all are alike to rounding (an infinite F-number). */
function fNumber(values: readonly Nm[], constantInches: number, largestReading: Nm): number | null {
  if (values.length < 2) return null;
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const s = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
  const spread = 3 * s + Math.abs(mean);
  const rounding = 1e-12 * largestReading;
  return spread <= rounding ? null : inRange('F-number', (constantInches * NM_PER_INCH) / spread);
}

/**
 * F-numbers of one line of readings, for information: they are made for floors, and no footing rule uses them.
 *
 * FF from second differences and FL from rises over 10 ft, of readings 12 in apart: FF = 4.57 / (3·s + |mean|), FL = 12.5 / (3·s + |mean|),
 * in inches. Null where infinite (a constant slope), where there are too few readings (4 for FF, 12 for FL), and for any spacing but
 * 12 in, for which the published constants hold; the metric edition's were not at hand.
 * @param samples elevations along the line, nm
 * @throws AnalysisError 'not-finite' | 'not-positive' | 'out-of-range'
 */
export function fNumbers(samples: Nm[], spacing: Nm): { flatness: number | null; levelness: number | null } {
  const apart = positiveLength('spacing', spacing);
  const heights = samples.map((sample, index) => nanometres(`sample ${index}`, finite(`sample ${index}`, sample)));
  if (apart !== SPACING) return { flatness: null, levelness: null };
  const largest = heights.reduce((most, height) => Math.max(most, Math.abs(height)), 0);
  const curvatures = heights.slice(2).map((height, index) => height - 2 * (heights[index + 1] ?? 0) + (heights[index] ?? 0));
  const rises = heights.slice(LEVELNESS_SPAN).map((height, index) => height - (heights[index] ?? 0));
  return { flatness: fNumber(curvatures, FLATNESS_INCHES, largest), levelness: fNumber(rises, LEVELNESS_INCHES, largest) };
}
