import { studentUpperQuantile } from './distributions';
import { EPS, type PlaneSolution, measureExtent } from './plane-solution';
import { solvePlane } from './plane-solve';
import type { PlanePoint } from './types';
import type { Nm } from './units';

/** Familywise error of the whole search. */
export const ALPHA = 0.05;

/** No t quantile of the search lies under this: the normal one at 0.05/(2·5), five points being the fewest that leave a degree of freedom. */
const LEAST_CRITICAL = 2.575;

/** Deviation expected at a place from the shots that are not suspect. */
export type Expected = (x: Nm, y: Nm) => number;

export interface PlaneSearch {
  /** Indices into the points given. */
  suspects: Set<number>;
  expected: Expected;
}

const solve = (points: readonly PlanePoint[]): PlaneSolution => solvePlane(points, measureExtent(points));

/** The points that are still in, in the orthogonal plan coordinates of the last full solution. */
interface Remaining {
  indices: number[];
  rank: 1 | 2 | 3;
  p: Float64Array;
  q: Float64Array;
  /** Σp², Σq² when they were taken: where a later sum has shrunk to nothing beside them, the geometry no longer carries the model. */
  sumPP: number;
  sumQQ: number;
}

function remainingOf(points: readonly PlanePoint[], indices: number[]): Remaining {
  const chosen = indices.flatMap((index) => points[index] ?? []);
  const { rank, p, q, sumPP, sumQQ } = solve(chosen);
  return { indices, rank, p, q, sumPP, sumQQ };
}

/** The worst shot of one step: its place in `indices`, its residual, and its external t with the scale held up to u. */
interface Worst {
  at: number;
  residual: number;
  t: number;
}

interface Sums {
  meanZ: number;
  meanP: number;
  meanQ: number;
  pp: number;
  pq: number;
  qq: number;
  pz: number;
  qz: number;
}

function sumsOf({ indices, p, q }: Remaining, z: readonly number[]): Sums {
  let [meanZ, meanP, meanQ] = [0, 0, 0];
  indices.forEach((index, i) => {
    meanZ += (z[index] ?? 0) / indices.length;
    meanP += (p[i] ?? 0) / indices.length;
    meanQ += (q[i] ?? 0) / indices.length;
  });
  let [pp, pq, qq, pz, qz] = [0, 0, 0, 0, 0];
  indices.forEach((index, i) => {
    const dp = (p[i] ?? 0) - meanP;
    const dq = (q[i] ?? 0) - meanQ;
    const dz = (z[index] ?? 0) - meanZ;
    pp += dp * dp;
    pq += dp * dq;
    qq += dq * dq;
    pz += dp * dz;
    qz += dq * dz;
  });
  return { meanZ, meanP, meanQ, pp, pq, qq, pz, qz };
}

/** Null where what is left no longer carries the model that the coordinates were made for. */
function residualsAndLeverages(
  left: Remaining,
  z: readonly number[],
): { residuals: Float64Array; leverages: Float64Array } | null {
  const { indices, rank, p, q } = left;
  const sums = sumsOf(left, z);
  const shear = rank === 3 ? sums.pq / sums.pp : 0;
  const qq = sums.qq - shear * sums.pq;
  if ((rank > 1 && !(sums.pp > 1e-9 * left.sumPP)) || (rank === 3 && !(qq > 1e-9 * left.sumQQ))) return null;
  const alongP = rank > 1 ? sums.pz / sums.pp : 0;
  const alongQ = rank === 3 ? (sums.qz - shear * sums.pz) / qq : 0;
  const residuals = new Float64Array(indices.length);
  const leverages = new Float64Array(indices.length);
  indices.forEach((index, i) => {
    const dp = (p[i] ?? 0) - sums.meanP;
    const dq = (q[i] ?? 0) - sums.meanQ - shear * dp;
    residuals[i] = (z[index] ?? 0) - sums.meanZ - alongP * dp - alongQ * dq;
    leverages[i] = 1 / indices.length + (rank > 1 ? (dp * dp) / sums.pp : 0) + (rank === 3 ? (dq * dq) / qq : 0);
  });
  return { residuals, leverages };
}

function worstOf(residuals: Float64Array, leverages: Float64Array, rank: number, u: Nm): Worst | null {
  const df = residuals.length - rank - 1;
  const sum = residuals.reduce((total, residual) => total + residual * residual, 0);
  let worst: Worst | null = null;
  for (let at = 0; at < residuals.length; at += 1) {
    const residual = residuals[at] ?? 0;
    const left = 1 - (leverages[at] ?? 1);
    if (left < 1e-9) continue;
    const others = Math.sqrt(Math.max(0, sum - (residual * residual) / left) / df);
    const t = Math.abs(residual) / (Math.max(others, u) * Math.sqrt(left));
    if (worst === null || t > worst.t) worst = { at, residual, t };
  }
  return worst;
}

/**
 * Takes out the shot with the largest externally studentized residual, again and again, up to ⌊n/4⌋ of them. Suspect is everything up to
 * the last step whose residual exceeds its Bonferroni-adjusted t quantile and 4u, so that busts cannot hide one another.
 * Source: B. Rosner, "Percentage points for a generalized ESD many-outlier procedure", Technometrics 25 (1983) (from memory), carried over to
 * residuals of a plane; one step of it is R's car::outlierTest.
 */
export function searchPlane(points: readonly PlanePoint[], u: Nm): PlaneSearch {
  const z = points.map((point) => point.z);
  const noise = 8 * EPS * measureExtent(points).maxZ;
  const most = Math.floor(points.length / 4);
  const removed: number[] = [];
  let significant = 0;
  let left = remainingOf(
    points,
    points.map((_, index) => index),
  );
  while (removed.length < most) {
    let fit = residualsAndLeverages(left, z);
    if (fit === null) {
      left = remainingOf(points, left.indices);
      fit = residualsAndLeverages(left, z);
    }
    const df = left.indices.length - left.rank - 1;
    if (fit === null || df < 1 || fit.residuals.every((residual) => Math.abs(residual) <= noise)) break;
    const worst = worstOf(fit.residuals, fit.leverages, left.rank, u);
    if (worst === null) break;
    removed.push(left.indices[worst.at] ?? -1);
    const matters = Math.abs(worst.residual) > 4 * u && worst.t > LEAST_CRITICAL;
    if (matters && worst.t > studentUpperQuantile(ALPHA / (2 * left.indices.length), df)) significant = removed.length;
    left = without(left, worst.at);
  }
  const suspects = new Set(removed.slice(0, significant));
  return { suspects, expected: expectedFrom(points.filter((_, index) => !suspects.has(index))) };
}

function without(left: Remaining, at: number): Remaining {
  const keep = (_: number, place: number): boolean => place !== at;
  return { ...left, indices: left.indices.filter(keep), p: left.p.filter(keep), q: left.q.filter(keep) };
}

function expectedFrom(clean: readonly PlanePoint[]): Expected {
  const { meanX, meanY, meanZ, gradientX, gradientY } = solve(clean);
  return (x, y) => meanZ + gradientX * (x - meanX) + gradientY * (y - meanY);
}
