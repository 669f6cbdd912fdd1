import { AnalysisError } from './analysis-error';
import { finite, positive } from './check-input';
import type { PlanePoint } from './types';

/** Unit roundoff of doubles, 2^-52. */
export const EPS = Number.EPSILON;

/** Beyond this nothing is a length, an elevation or a weight in any unit, and squares of squares would leave the range of doubles. */
export const LARGEST = 1e60;

/** What a fit knows of the whole: its gradient, and the two orthogonal plan directions about the weighted mean that it was found in. */
export interface PlaneShape {
  model: 'plane' | 'line' | 'level';
  /** Fitted parameters. */
  rank: 1 | 2 | 3;
  totalWeight: number;
  meanX: number;
  meanY: number;
  meanZ: number;
  /** Value of the plane at the origin given; for 'line' and 'level' the mean elevation, where it is told instead. */
  atOrigin: number;
  /** Rise of z to the east and to the north. */
  gradientX: number;
  gradientY: number;
  /** Which coordinate p is, where the model is 'plane'. */
  pivot: 'x' | 'y';
  /** Unit vector of p in the plan: east or north by the pivot, along the points for 'line'. */
  directionX: number;
  directionY: number;
  /** Rise of z along p, and Σwp². */
  alongP: number;
  sumPP: number;
  /** Rise along q = other − shear·p, what the other coordinate has across the first, and Σwq²; zero unless 'plane'. */
  alongQ: number;
  sumQQ: number;
  shear: number;
  /** Mean of the other coordinate less shear · mean of the first: how far across p the origin lies. */
  originAcross: number;
  /** Σw·residual². */
  sumEE: number;
}

/** The same with what each point gives. */
export interface PlaneSolution extends PlaneShape {
  /** First coordinate of each point, about the weighted mean; zero for 'level'. */
  p: Float64Array;
  /** Second coordinate; zero unless 'plane'. */
  q: Float64Array;
  /** z − fitted; all exactly zero where they are no more than rounding noise. */
  residuals: Float64Array;
  /** Residuals up to this are rounding noise of the elevations given. */
  noise: number;
}

/** The largest magnitudes among the coordinates given: what rounding is measured against. */
export interface Extent {
  maxX: number;
  maxY: number;
  maxZ: number;
}

function refuse(point: PlanePoint): never {
  for (const name of ['x', 'y', 'z'] as const) {
    const value = finite(name, point[name]);
    if (Math.abs(value) > LARGEST)
      throw new AnalysisError('out-of-range', `${name} of a point is beyond any length: ${value}.`, { name, value });
  }
  const value = positive('weight', point.weight ?? 1);
  throw new AnalysisError('out-of-range', `The weight of a point is out of range: ${value}.`, { name: 'weight', value });
}

/**
 * Refuses points that are no finite places, and gives the largest magnitudes. Weights are above zero: a point that weighs nothing
 * is left out by the caller, so that n and degrees of freedom count what was weighed.
 * @throws AnalysisError 'no-points', 'not-finite', 'not-positive' (weight), 'out-of-range'
 */
export function measureExtent(points: readonly PlanePoint[]): Extent {
  if (points.length === 0) throw new AnalysisError('no-points', 'There is no point to fit.', {});
  let maxX = 0;
  let maxY = 0;
  let maxZ = 0;
  for (const point of points) {
    const { x, y, z, weight } = point;
    if (typeof x !== 'number' || typeof y !== 'number' || typeof z !== 'number') refuse(point);
    const sizeX = Math.abs(x);
    const sizeY = Math.abs(y);
    const sizeZ = Math.abs(z);
    // Written so that NaN fails it.
    if (!(sizeX <= LARGEST && sizeY <= LARGEST && sizeZ <= LARGEST)) refuse(point);
    if (weight !== undefined && !(weight <= LARGEST && weight >= 1 / LARGEST)) refuse(point);
    if (sizeX > maxX) maxX = sizeX;
    if (sizeY > maxY) maxY = sizeY;
    if (sizeZ > maxZ) maxZ = sizeZ;
  }
  return { maxX, maxY, maxZ };
}

/** Rise to the east and to the north of what rises by so much along p and along q. */
export function gradientOf(s: PlaneShape, alongP: number, alongQ: number): { x: number; y: number } {
  const first = alongP - s.shear * alongQ;
  const across = s.pivot === 'x' ? { x: 0, y: alongQ } : { x: alongQ, y: 0 };
  return { x: first * s.directionX + across.x, y: first * s.directionY + across.y };
}

/** The plane z = a + b·x + c·y that a solution becomes when a constant and rises along p and q are added to it. */
export function corrected(
  s: PlaneSolution,
  [constant = 0, alongP = 0, alongQ = 0]: readonly number[],
): { a: number; b: number; c: number } {
  const turn = gradientOf(s, alongP, alongQ);
  const base = s.model === 'plane' ? s.atOrigin : s.meanZ - s.gradientX * s.meanX - s.gradientY * s.meanY;
  return { a: base + constant - turn.x * s.meanX - turn.y * s.meanY, b: s.gradientX + turn.x, c: s.gradientY + turn.y };
}
