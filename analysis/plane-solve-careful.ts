import { type DoubleDouble, ZERO, exactProduct, exactSum, minus, over, plus, scaled, times } from './double-double';
import { EPS, type Extent, LARGEST, type PlaneSolution } from './plane-solution';
import type { PlanePoint } from './types';

type Axis = 'x' | 'y' | 'z';

/** Deviations from the weighted mean of one coordinate, and that mean. */
interface Centred {
  mean: DoubleDouble;
  values: DoubleDouble[];
}

function centre(points: readonly PlanePoint[], axis: Axis, totalWeight: DoubleDouble): Centred {
  let sum = ZERO;
  for (const point of points) sum = plus(sum, exactProduct(point[axis], point.weight ?? 1));
  const mean = over(sum, totalWeight);
  const values = points.map((point) => plus(exactSum(point[axis], -mean.hi), { hi: -mean.lo, lo: 0 }));
  return { mean, values };
}

function weightedProduct(points: readonly PlanePoint[], a: readonly DoubleDouble[], b: readonly DoubleDouble[]): DoubleDouble {
  let sum = ZERO;
  points.forEach((point, i) => {
    sum = plus(sum, scaled(times(a[i] ?? ZERO, b[i] ?? ZERO), point.weight ?? 1));
  });
  return sum;
}

/** values − factor · along, term by term. */
function sweep(values: readonly DoubleDouble[], along: readonly DoubleDouble[], factor: DoubleDouble): DoubleDouble[] {
  return values.map((value, i) => minus(value, times(along[i] ?? ZERO, factor)));
}

function largest(values: readonly DoubleDouble[]): number {
  return values.reduce((most, { hi }) => Math.max(most, Math.abs(hi)), 0);
}

/**
 * How far apart plan coordinates must stand to count as apart: 16 units of rounding of the largest coordinate, a few operations' worth.
 * Whole coordinates that reach 10^8 are whole nanometres, already rounded by up to 0.71 in the plan, so they must differ by more than that.
 */
function planRounding(points: readonly PlanePoint[], extent: Extent, reach: number): number {
  const rounding = Math.max(16 * EPS * Math.max(extent.maxX, extent.maxY), 1 / LARGEST);
  const whole = reach >= 1e8 && points.every(({ x, y }) => Number.isInteger(x) && Number.isInteger(y));
  return whole ? Math.max(rounding, 1) : rounding;
}

/** Unit vector of the direction in which the places spread most (principal axis of the weighted plan). */
function principalDirection(
  points: readonly PlanePoint[],
  dx: readonly DoubleDouble[],
  dy: readonly DoubleDouble[],
): { ux: number; uy: number } {
  const xx = weightedProduct(points, dx, dx).hi;
  const yy = weightedProduct(points, dy, dy).hi;
  const xy = weightedProduct(points, dx, dy).hi;
  const angle = Math.atan2(2 * xy, xx - yy) / 2;
  return { ux: Math.cos(angle), uy: Math.sin(angle) };
}

const toDoubles = (values: readonly DoubleDouble[]): Float64Array => Float64Array.from(values, ({ hi }) => hi);

function withResiduals(
  points: readonly PlanePoint[],
  solution: PlaneSolution,
  residuals: readonly DoubleDouble[],
): PlaneSolution {
  const values = largest(residuals) <= solution.noise ? new Float64Array(points.length) : toDoubles(residuals);
  let sumEE = 0;
  points.forEach((point, i) => {
    const residual = values[i] ?? 0;
    sumEE += (point.weight ?? 1) * residual * residual;
  });
  return { ...solution, residuals: values, sumEE };
}

interface Prepared {
  points: readonly PlanePoint[];
  extent: Extent;
  x: Centred;
  y: Centred;
  z: Centred;
  /** What 'level' says of the same points; the two others build on it. */
  level: PlaneSolution;
}

function prepare(points: readonly PlanePoint[], extent: Extent): Prepared {
  let totalWeight = ZERO;
  for (const point of points) totalWeight = plus(totalWeight, { hi: point.weight ?? 1, lo: 0 });
  const x = centre(points, 'x', totalWeight);
  const y = centre(points, 'y', totalWeight);
  const centredZ = centre(points, 'z', totalWeight);
  const noise = Math.max(8 * EPS * extent.maxZ, 1 / LARGEST);
  // Elevations that differ by rounding alone are one elevation: a slope or a share of that would be invented.
  const z = largest(centredZ.values) <= noise ? { mean: centredZ.mean, values: points.map(() => ZERO) } : centredZ;
  const nothing = new Float64Array(points.length);
  const level: PlaneSolution = {
    model: 'level',
    rank: 1,
    totalWeight: totalWeight.hi,
    meanX: x.mean.hi,
    meanY: y.mean.hi,
    meanZ: z.mean.hi,
    atOrigin: z.mean.hi,
    gradientX: 0,
    gradientY: 0,
    pivot: 'x',
    directionX: 1,
    directionY: 0,
    p: nothing,
    alongP: 0,
    sumPP: 0,
    q: nothing,
    alongQ: 0,
    sumQQ: 0,
    shear: 0,
    originAcross: 0,
    residuals: nothing,
    sumEE: 0,
    noise,
  };
  return { points, extent, x, y, z, level };
}

function lineAlong({ points, extent, x, y, z, level }: Prepared, ux: number, uy: number): PlaneSolution {
  const along = x.values.map((dx, i) => plus(scaled(dx, ux), scaled(y.values[i] ?? ZERO, uy)));
  const sumPP = weightedProduct(points, along, along);
  const slope = over(weightedProduct(points, along, z.values), sumPP);
  const noise = Math.max(level.noise, 8 * EPS * Math.abs(slope.hi) * Math.max(extent.maxX, extent.maxY));
  const solution: PlaneSolution = {
    ...level,
    model: 'line',
    rank: 2,
    gradientX: slope.hi * ux,
    gradientY: slope.hi * uy,
    directionX: ux,
    directionY: uy,
    p: toDoubles(along),
    alongP: slope.hi,
    sumPP: sumPP.hi,
    noise,
  };
  return withResiduals(points, solution, sweep(z.values, along, slope));
}

function planeThrough({ points, extent, x, y, z, level }: Prepared): PlaneSolution {
  const xx = weightedProduct(points, x.values, x.values);
  const yy = weightedProduct(points, y.values, y.values);
  const pivot = xx.hi >= yy.hi ? 'x' : 'y';
  const first = pivot === 'x' ? x : y;
  const other = pivot === 'x' ? y : x;
  const sumPP = pivot === 'x' ? xx : yy;
  const shear = over(weightedProduct(points, first.values, other.values), sumPP);
  const across = sweep(other.values, first.values, shear);
  const sumQQ = weightedProduct(points, across, across);
  const alongP = over(weightedProduct(points, first.values, z.values), sumPP);
  const alongQ = over(weightedProduct(points, across, z.values), sumQQ);
  const gradientFirst = minus(alongP, times(shear, alongQ));
  const [gradientX, gradientY] = pivot === 'x' ? [gradientFirst, alongQ] : [alongQ, gradientFirst];
  const atOrigin = minus(minus(z.mean, times(gradientX, x.mean)), times(gradientY, y.mean));
  // The caller may have made z from a gradient and far coordinates. The gradient across a nearly straight row of points is no such thing.
  const reach = Math.max(extent.maxX, extent.maxY);
  const carried = sumQQ.hi > 1e-6 * sumPP.hi ? Math.max(Math.abs(gradientX.hi), Math.abs(gradientY.hi)) : Math.abs(alongP.hi);
  const solution: PlaneSolution = {
    ...level,
    model: 'plane',
    rank: 3,
    atOrigin: atOrigin.hi,
    gradientX: gradientX.hi,
    gradientY: gradientY.hi,
    pivot,
    directionX: pivot === 'x' ? 1 : 0,
    directionY: pivot === 'x' ? 0 : 1,
    p: toDoubles(first.values),
    alongP: alongP.hi,
    sumPP: sumPP.hi,
    q: toDoubles(across),
    alongQ: alongQ.hi,
    sumQQ: sumQQ.hi,
    shear: shear.hi,
    originAcross: minus(other.mean, times(shear, first.mean)).hi,
    noise: Math.max(level.noise, 8 * EPS * carried * reach),
  };
  return withResiduals(points, solution, sweep(sweep(z.values, first.values, alongP), across, alongQ));
}

/**
 * Weighted least squares of z on plan coordinates to about 30 digits, and the judgement of what the geometry carries: a plane; along the
 * principal direction only, where the points are collinear to rounding; or the mean alone, where they are one place or fewer than three.
 * Method: centre, orthogonalise the less spread coordinate on the more spread one, all sums in double-double.
 */
export function solveCarefully(points: readonly PlanePoint[], extent: Extent): PlaneSolution {
  const prepared = prepare(points, extent);
  const { x, y, z, level } = prepared;
  const reach = Math.max(largest(x.values), largest(y.values));
  const rounding = planRounding(points, extent, reach);
  if (points.length < 3 || reach <= rounding) return withResiduals(points, level, z.values);
  const { ux, uy } = principalDirection(points, x.values, y.values);
  const across = x.values.reduce((most, dx, i) => Math.max(most, Math.abs((y.values[i] ?? ZERO).hi * ux - dx.hi * uy)), 0);
  return across <= rounding ? lineAlong(prepared, ux, uy) : planeThrough(prepared);
}
