import type { Extent, PlaneShape, PlaneSolution } from './plane-solution';
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

interface Place {
  x: number;
  y: number;
  z: number;
}

/** A plane by plain doubles. Deviations are taken in two steps, from the first point and then from the mean of those, and made anew in each pass. */
export interface QuickPlane extends PlaneShape {
  model: 'plane';
  first: Place;
  mean: Place;
  /** Range of the fitted values. */
  drop: number;
}

/** Means about the first point: subtracting it is exact or nearly so, and what is left is as small as the footing. */
function meansFrom(first: Place, points: readonly PlanePoint[]): Place {
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

/** Sums of the products of the deviations of one block of points, from `start` on. */
function blockSums(points: readonly PlanePoint[], start: number, first: Place, mean: Place): Sums {
  let totalWeight = 0;
  let xx = 0;
  let yy = 0;
  let xy = 0;
  let xz = 0;
  let yz = 0;
  let zz = 0;
  const end = Math.min(points.length, start + BLOCK);
  for (let i = start; i < end; i += 1) {
    const point = points[i];
    if (point === undefined) break;
    const weight = point.weight ?? 1;
    const x = point.x - first.x - mean.x;
    const y = point.y - first.y - mean.y;
    const z = point.z - first.z - mean.z;
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

function centredSums(points: readonly PlanePoint[], first: Place, mean: Place): Sums {
  const sums = blockSums(points, 0, first, mean);
  for (let start = BLOCK; start < points.length; start += BLOCK) {
    const block = blockSums(points, start, first, mean);
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
function stands(sum: number, squaresA: number, squaresB: number): boolean {
  return sum * sum > CANCELLED * CANCELLED * squaresA * squaresB;
}

/** The gradient and the orthogonal coordinates it was found in; null where a digit too many would be lost. */
type Slopes = Pick<
  PlaneShape,
  'gradientX' | 'gradientY' | 'pivot' | 'directionX' | 'directionY' | 'alongP' | 'sumPP' | 'alongQ' | 'sumQQ' | 'shear'
>;

function slopesOf(sums: Sums, extent: Extent): Slopes | null {
  const byX = sums.xx >= sums.yy;
  const sumPP = byX ? sums.xx : sums.yy;
  const sumOO = byX ? sums.yy : sums.xx;
  const sumPZ = byX ? sums.xz : sums.yz;
  const sumOZ = byX ? sums.yz : sums.xz;
  const shear = sums.xy / sumPP;
  const sumQQ = sumOO - shear * sums.xy;
  const reach = 1e-10 * Math.max(extent.maxX, extent.maxY);
  if (!(sumQQ > 1e-3 * sumOO && sumQQ > 1e-8 * sumPP && sumQQ > reach * reach * sums.totalWeight)) return null;
  const sumQZ = sumOZ - shear * sumPZ;
  if (!(stands(sumPZ, sumPP, sums.zz) && stands(sumQZ, sumQQ, sums.zz))) return null;
  const alongP = sumPZ / sumPP;
  const alongQ = sumQZ / sumQQ;
  const gradientFirst = alongP - shear * alongQ;
  if (Math.abs(gradientFirst) < CANCELLED * Math.abs(alongP)) return null;
  return {
    gradientX: byX ? gradientFirst : alongQ,
    gradientY: byX ? alongQ : gradientFirst,
    pivot: byX ? 'x' : 'y',
    directionX: byX ? 1 : 0,
    directionY: byX ? 0 : 1,
    alongP,
    sumPP,
    alongQ,
    sumQQ,
    shear,
  };
}

/** Σwe² and the range of the fitted values. */
function residualSums(
  points: readonly PlanePoint[],
  first: Place,
  mean: Place,
  { gradientX, gradientY }: Slopes,
): { sumEE: number; drop: number } {
  let sumEE = 0;
  let low = Infinity;
  let high = -Infinity;
  for (const point of points) {
    const rise = gradientX * (point.x - first.x - mean.x) + gradientY * (point.y - first.y - mean.y);
    const residual = point.z - first.z - mean.z - rise;
    sumEE += (point.weight ?? 1) * residual * residual;
    if (rise < low) low = rise;
    if (rise > high) high = rise;
  }
  return { sumEE, drop: high - low };
}

/**
 * The plane by plain doubles, no arrays: centre on the first point, then on the mean, orthogonalise. Null where that would lose more than
 * five digits anywhere (nearly straight rows, almost exact planes, a coefficient near zero, too few points): the careful solver answers there,
 * and alone decides what geometry carries.
 */
export function solveQuickly(points: readonly PlanePoint[], extent: Extent): QuickPlane | null {
  const [first] = points;
  if (first === undefined || points.length < 4) return null;
  const mean = meansFrom(first, points);
  const sums = centredSums(points, first, mean);
  const slopes = slopesOf(sums, extent);
  if (slopes === null) return null;
  const { sumEE, drop } = residualSums(points, first, mean, slopes);
  const finest = 1e-9 * extent.maxZ;
  if (!(sumEE > 1e-6 * sums.zz && sumEE > finest * finest * sums.totalWeight)) return null;

  const { gradientX, gradientY, pivot, directionX, directionY, alongP, sumPP, alongQ, sumQQ, shear } = slopes;
  const meanX = first.x + mean.x;
  const meanY = first.y + mean.y;
  const meanZ = first.z + mean.z;
  const atOrigin = meanZ - gradientX * meanX - gradientY * meanY;
  const terms = Math.max(Math.abs(meanZ), Math.abs(gradientX * meanX), Math.abs(gradientY * meanY));
  if (Math.abs(meanZ) < CANCELLED * Math.abs(first.z) || Math.abs(atOrigin) < CANCELLED * terms) return null;
  const meanP = pivot === 'x' ? meanX : meanY;
  const meanO = pivot === 'x' ? meanY : meanX;
  const originAcross = meanO - shear * meanP;
  const reachAcross = Math.max(Math.abs(meanO), Math.abs(shear * meanP));
  // It matters only where it is what makes the standard error of `a`: 1/W + meanP²/Spp + originAcross²/Sqq.
  const matters = reachAcross * reachAcross * sums.totalWeight > sumQQ / CANCELLED;
  if (matters && Math.abs(originAcross) < CANCELLED * reachAcross) return null;
  return {
    model: 'plane',
    rank: 3,
    totalWeight: sums.totalWeight,
    meanX,
    meanY,
    meanZ,
    atOrigin,
    gradientX,
    gradientY,
    pivot,
    directionX,
    directionY,
    alongP,
    sumPP,
    alongQ,
    sumQQ,
    shear,
    originAcross,
    sumEE,
    first,
    mean,
    drop,
  };
}

/** A quick plane with what each of its points gives, for those who work on from there. */
export function withCoordinates(points: readonly PlanePoint[], plane: QuickPlane): PlaneSolution {
  const p = new Float64Array(points.length);
  const q = new Float64Array(points.length);
  const residuals = new Float64Array(points.length);
  points.forEach((point, i) => {
    const x = point.x - plane.first.x - plane.mean.x;
    const y = point.y - plane.first.y - plane.mean.y;
    p[i] = plane.pivot === 'x' ? x : y;
    q[i] = (plane.pivot === 'x' ? y : x) - plane.shear * (p[i] ?? 0);
    residuals[i] = point.z - plane.first.z - plane.mean.z - plane.gradientX * x - plane.gradientY * y;
  });
  return { ...plane, p, q, residuals, noise: 0 };
}
