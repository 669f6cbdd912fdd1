import { type Extent, type PlaneSolution } from './plane-solution';
import type { PlanePoint } from './types';

/** A result smaller than this share of its terms has lost five digits to cancellation: as many as may go if nine are to stay. */
const CANCELLED = 1e-5;

/** Long sums are taken in blocks, so that their rounding does not grow with the number of stations. */
const BLOCK = 256;

interface Sums {
  totalWeight: number;
  xx: number;
  yy: number;
  xy: number;
  xz: number;
  yz: number;
  zz: number;
}

interface Means {
  x: number;
  y: number;
  z: number;
}

/** Means about the first point: subtracting it is exact or nearly so, and what is left is as small as the footing. */
function meansFromFirst(points: readonly PlanePoint[], first: PlanePoint): Means {
  let weights = 0;
  let x = 0;
  let y = 0;
  let z = 0;
  for (const point of points) {
    const weight = point.weight ?? 1;
    weights += weight;
    x += weight * (point.x - first.x);
    y += weight * (point.y - first.y);
    z += weight * (point.z - first.z);
  }
  return { x: x / weights, y: y / weights, z: z / weights };
}

/** Deviations from the means of the points from `start` on, one block of them, written to the arrays and summed by products. */
function blockSums(
  points: readonly PlanePoint[],
  start: number,
  first: Means,
  mean: Means,
  dx: Float64Array,
  dy: Float64Array,
  dz: Float64Array,
): Sums {
  let [totalWeight, xx, yy, xy, xz, yz, zz] = [0, 0, 0, 0, 0, 0, 0];
  const end = Math.min(points.length, start + BLOCK);
  for (let i = start; i < end; i += 1) {
    const point = points[i];
    if (point === undefined) break;
    const weight = point.weight ?? 1;
    const x = point.x - first.x - mean.x;
    const y = point.y - first.y - mean.y;
    const z = point.z - first.z - mean.z;
    dx[i] = x;
    dy[i] = y;
    dz[i] = z;
    totalWeight += weight;
    const wx = weight * x;
    const wy = weight * y;
    xx += wx * x;
    xy += wx * y;
    xz += wx * z;
    yy += wy * y;
    yz += wy * z;
    zz += weight * z * z;
  }
  return { totalWeight, xx, yy, xy, xz, yz, zz };
}

function centredSums(
  points: readonly PlanePoint[],
  first: PlanePoint,
  means: Means,
  dx: Float64Array,
  dy: Float64Array,
  dz: Float64Array,
): Sums {
  const sums = blockSums(points, 0, first, means, dx, dy, dz);
  for (let start = BLOCK; start < points.length; start += BLOCK) {
    const block = blockSums(points, start, first, means, dx, dy, dz);
    sums.totalWeight += block.totalWeight;
    sums.xx += block.xx;
    sums.yy += block.yy;
    sums.xy += block.xy;
    sums.xz += block.xz;
    sums.yz += block.yz;
    sums.zz += block.zz;
  }
  return sums;
}

/** Whether a sum of products stands clear of the rounding of its terms, by Cauchy–Schwarz: |Σab| against √(Σa²·Σb²). */
const stands = (sum: number, squaresA: number, squaresB: number): boolean =>
  sum * sum > CANCELLED * CANCELLED * squaresA * squaresB;

/** Sweeps dz and the less spread coordinate in place; gives Σwe². */
function sweepResiduals(
  points: readonly PlanePoint[],
  p: Float64Array,
  q: Float64Array,
  e: Float64Array,
  shear: number,
  alongP: number,
  alongQ: number,
): number {
  let sumEE = 0;
  let i = 0;
  for (const point of points) {
    const first = p[i] ?? 0;
    const across = (q[i] ?? 0) - shear * first;
    const residual = (e[i] ?? 0) - alongP * first - alongQ * across;
    q[i] = across;
    e[i] = residual;
    i += 1;
    sumEE += (point.weight ?? 1) * residual * residual;
  }
  return sumEE;
}

/**
 * The plane by plain doubles, three passes: centre on the first point, then on the mean, orthogonalise, sweep. Null where that would lose
 * more than five digits anywhere (nearly straight rows, almost exact planes, a coefficient near zero, too few points): the careful solver
 * answers there, and alone decides what geometry carries.
 */
export function solveQuickly(points: readonly PlanePoint[], extent: Extent): PlaneSolution | null {
  const n = points.length;
  const [origin] = points;
  if (origin === undefined || n < 4) return null;
  const means = meansFromFirst(points, origin);
  const dx = new Float64Array(n);
  const dy = new Float64Array(n);
  const residuals = new Float64Array(n);
  const { totalWeight, xx, yy, xy, xz, yz, zz } = centredSums(points, origin, means, dx, dy, residuals);
  const byX = xx >= yy;
  const [p, q, sumPP, sumOO, sumPZ, sumOZ] = byX ? [dx, dy, xx, yy, xz, yz] : [dy, dx, yy, xx, yz, xz];
  const shear = xy / sumPP;
  const sumQQ = sumOO - shear * xy;
  const reach = 1e-10 * Math.max(extent.maxX, extent.maxY);
  if (!(sumQQ > 1e-3 * sumOO && sumQQ > 1e-8 * sumPP && sumQQ > reach * reach * totalWeight)) return null;
  const sumQZ = sumOZ - shear * sumPZ;
  if (!(stands(sumPZ, sumPP, zz) && stands(sumQZ, sumQQ, zz))) return null;
  const alongP = sumPZ / sumPP;
  const alongQ = sumQZ / sumQQ;
  const gradientFirst = alongP - shear * alongQ;
  if (Math.abs(gradientFirst) < CANCELLED * Math.abs(alongP)) return null;
  const sumEE = sweepResiduals(points, p, q, residuals, shear, alongP, alongQ);
  const finest = 1e-9 * extent.maxZ;
  if (!(sumEE > 1e-6 * zz && sumEE > finest * finest * totalWeight)) return null;

  const meanX = origin.x + means.x;
  const meanY = origin.y + means.y;
  const meanZ = origin.z + means.z;
  const [gradientX, gradientY] = byX ? [gradientFirst, alongQ] : [alongQ, gradientFirst];
  const atOrigin = meanZ - gradientX * meanX - gradientY * meanY;
  const [meanP, meanO] = byX ? [meanX, meanY] : [meanY, meanX];
  const originAcross = meanO - shear * meanP;
  const terms = Math.max(Math.abs(meanZ), Math.abs(gradientX * meanX), Math.abs(gradientY * meanY));
  if (Math.abs(meanZ) < CANCELLED * Math.abs(origin.z) || Math.abs(atOrigin) < CANCELLED * terms) return null;
  const reachAcross = Math.max(Math.abs(meanO), Math.abs(shear * meanP));
  // It matters only where it is what makes the standard error of `a`: 1/W + meanP²/Spp + originAcross²/Sqq.
  if (Math.abs(originAcross) < CANCELLED * reachAcross && reachAcross * reachAcross * totalWeight > sumQQ / CANCELLED)
    return null;
  return {
    model: 'plane',
    rank: 3,
    totalWeight,
    meanX,
    meanY,
    meanZ,
    atOrigin,
    gradientX,
    gradientY,
    pivot: byX ? 'x' : 'y',
    directionX: byX ? 1 : 0,
    directionY: byX ? 0 : 1,
    p,
    alongP,
    sumPP,
    q,
    alongQ,
    sumQQ,
    shear,
    originAcross,
    residuals,
    sumEE,
    noise: 0,
  };
}
