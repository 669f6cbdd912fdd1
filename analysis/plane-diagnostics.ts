import { type PlaneSolution, measureExtent } from './plane-solution';
import { solveCarefully } from './plane-solve-careful';
import type { QuickPlane } from './plane-solve-quick';
import type { PlanePoint, PointFit } from './types';

/** A point nearer than this to leverage 1 decides its own fitted value: nothing is left over to judge it by. */
const OWN_FIT = 1e-24;

/** Symmetric hat matrix entry √(wi·wj)·(1/W + pi·pj/Spp + qi·qj/Sqq). */
function hat(points: readonly PlanePoint[], s: PlaneSolution, i: number, j: number): number {
  const along = s.sumPP > 0 ? ((s.p[i] ?? 0) * (s.p[j] ?? 0)) / s.sumPP : 0;
  const across = s.sumQQ > 0 ? ((s.q[i] ?? 0) * (s.q[j] ?? 0)) / s.sumQQ : 0;
  return Math.sqrt((points[i]?.weight ?? 1) * (points[j]?.weight ?? 1)) * (1 / s.totalWeight + along + across);
}

/** 1 − h without the cancellation: the hat matrix is idempotent, so h·(1 − h) = Σ of the squares of the row's other entries. */
function leverageLeft(points: readonly PlanePoint[], s: PlaneSolution, i: number): number {
  let sum = 0;
  for (let j = 0; j < points.length; j += 1) {
    if (j !== i) sum += hat(points, s, i, j) ** 2;
  }
  return sum / hat(points, s, i, i);
}

/**
 * Σwe² of the fit without point i, by fitting without it: the short form SSE − e²/(1 − h) keeps no digits where one bust holds nearly
 * all of SSE. Zero where what is left is rounding noise.
 */
function deletedSum(points: readonly PlanePoint[], i: number): number {
  const others = points.filter((_, j) => j !== i);
  return solveCarefully(others, measureExtent(others)).sumEE;
}

/** Internally studentized residual, the external one and Cook's distance; `left` = 1 − leverage. */
interface Studentized {
  internal: number | null;
  external: number | null;
  cooks: number | null;
}

function studentize(points: readonly PlanePoint[], s: PlaneSolution, i: number, leverage: number, left: number): Studentized {
  const df = points.length - s.rank;
  if (df < 1 || s.sumEE === 0 || left === 0) return { internal: null, external: null, cooks: null };
  const weighted = Math.sqrt(points[i]?.weight ?? 1) * (s.residuals[i] ?? 0);
  const internal = weighted / Math.sqrt((s.sumEE / df) * left);
  const cooks = (internal * internal * leverage) / (s.rank * left);
  const remaining = df - internal * internal;
  if (df === 1) return { internal, external: null, cooks };
  if (remaining > 1e-3 * df) return { internal, external: internal * Math.sqrt((df - 1) / remaining), cooks };
  const without = deletedSum(points, i);
  return { internal, external: without === 0 ? null : weighted / Math.sqrt((without / (df - 1)) * left), cooks };
}

/**
 * Everything the contract says of each point, from a careful solution. Null where undefined: no degree of freedom left, an exact fit,
 * or a point that decides its own fitted value.
 * Source: Belsley, Kuh & Welsch, Regression Diagnostics (1980), ch. 2 (from memory); R's hatvalues, rstandard, rstudent, cooks.distance.
 */
export function carefulPointFits(points: readonly PlanePoint[], s: PlaneSolution): PointFit[] {
  return points.map((point, i) => {
    const own = Math.min(1, hat(points, s, i, i));
    const near = own > 0.9 ? leverageLeft(points, s, i) : 1 - own;
    const left = near < OWN_FIT ? 0 : near;
    const residual = left === 0 ? 0 : (s.residuals[i] ?? 0);
    const leverage = own > 0.9 ? 1 - left : own;
    const { internal, external, cooks } = studentize(points, s, i, leverage, left);
    return {
      id: point.id,
      fitted: point.z - residual,
      residual,
      leverage,
      studentized: internal,
      deletedStudentized: external,
      cooks,
    };
  });
}

/**
 * The same of a quick plane, in one pass of plain arithmetic; null where a point comes so near leverage 1, or holds so much of the whole
 * sum, that digits would be lost.
 */
export function quickPointFits(points: readonly PlanePoint[], plane: QuickPlane): PointFit[] | null {
  const { first, mean, gradientX, gradientY, shear } = plane;
  const byX = plane.pivot === 'x';
  const df = points.length - 3;
  const perVariance = df / plane.sumEE;
  const perRank = 1 / plane.rank;
  const perPP = 1 / plane.sumPP;
  const perQQ = 1 / plane.sumQQ;
  const perWeight = 1 / plane.totalWeight;
  const fits: PointFit[] = [];
  for (let i = 0; i < points.length; i += 1) {
    const point = points[i];
    if (point === undefined) break;
    const x = point.x - first.x - mean.x;
    const y = point.y - first.y - mean.y;
    const residual = point.z - first.z - mean.z - gradientX * x - gradientY * y;
    const along = byX ? x : y;
    const across = (byX ? y : x) - shear * along;
    const weight = point.weight ?? 1;
    const leverage = weight * (perWeight + along * along * perPP + across * across * perQQ);
    const left = 1 - leverage;
    const perLeft = 1 / left;
    const squared = weight * residual * residual * perVariance * perLeft;
    const remaining = df - squared;
    if (left < 1e-3 || (df > 1 && remaining < 1e-5 * df)) return null;
    const size = Math.sqrt(squared);
    const studentized = residual < 0 ? -size : size;
    fits.push({
      id: point.id,
      fitted: point.z - residual,
      residual,
      leverage,
      studentized,
      deletedStudentized: df > 1 ? studentized * Math.sqrt((df - 1) / remaining) : null,
      cooks: squared * leverage * perLeft * perRank,
    });
  }
  return fits;
}
