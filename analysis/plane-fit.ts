import { inRange } from './check-input';
import { fUpperTail, studentTwoSided } from './distributions';
import { carefulPointFits, quickPointFits } from './plane-diagnostics';
import { type PlaneShape, type PlaneSolution, measureExtent } from './plane-solution';
import { solveCarefully } from './plane-solve-careful';
import { solveQuickly } from './plane-solve-quick';
import type { Coefficient, PlaneFit, PlanePoint, PointFit } from './types';

/** `variance` null: no degree of freedom. t and p are null where the standard error is null or zero. */
function coefficient(value: number, variance: number | null, df: number): Coefficient {
  const held = inRange('coefficient', value);
  if (variance === null) return { value: held, standardError: null, t: null, p: null };
  const standardError = inRange('standard error', Math.sqrt(variance));
  if (standardError === 0) return { value: held, standardError, t: null, p: null };
  const t = inRange('t', held / standardError);
  return { value: held, standardError, t, p: studentTwoSided(t, df) };
}

/** Clockwise from plan north, 0 ≤ azimuth < 360. */
function azimuth(east: number, north: number): number {
  const degrees = (Math.atan2(east, north) * 180) / Math.PI;
  const turned = degrees < 0 ? degrees + 360 : degrees;
  return turned >= 360 || turned === 0 ? 0 : turned;
}

/** Variance of the slope |∇z| by the delta method, s² = 1; the slope must not be zero unless the model is 'line'. */
function slopeVariance(s: PlaneShape, slope: number): number | null {
  if (s.model === 'level' || (s.model === 'plane' && slope === 0)) return null;
  if (s.model === 'line') return 1 / s.sumPP;
  const first = s.pivot === 'x' ? s.gradientX : s.gradientY;
  const other = s.pivot === 'x' ? s.gradientY : s.gradientX;
  const alongP = first / slope;
  const alongQ = (other - s.shear * first) / slope;
  return (alongP * alongP) / s.sumPP + (alongQ * alongQ) / s.sumQQ;
}

/** Range of the fitted values over the points, from the centred coordinates, so that high elevations cost no digits. */
function dropOver(s: PlaneSolution): number {
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < s.p.length; i += 1) {
    const rise = s.alongP * (s.p[i] ?? 0) + s.alongQ * (s.q[i] ?? 0);
    if (rise < low) low = rise;
    if (rise > high) high = rise;
  }
  return high - low;
}

function tiltOf(s: PlaneShape, variance: number | null, drop: number): PlaneFit['tilt'] {
  const slope = inRange(
    'slope',
    s.model === 'line' ? Math.abs(s.alongP) : Math.sqrt(s.gradientX * s.gradientX + s.gradientY * s.gradientY),
  );
  const unit = variance === null ? null : slopeVariance(s, slope);
  return {
    slope,
    slopeStandardError:
      unit === null || variance === null ? null : inRange('standard error of the slope', Math.sqrt(unit * variance)),
    fallAzimuth: slope === 0 ? null : azimuth(-s.gradientX, -s.gradientY),
    drop: inRange('drop', drop),
  };
}

/** Where Σwz² comes from. The three sum to 1, or are all zero where every z is. */
function sharesOf(offset: number, tilt: number, rest: number): PlaneFit['shares'] {
  const total = inRange('sum of squares', offset + tilt + rest);
  return total === 0 ? { offset: 0, tilt: 0, rest: 0 } : { offset: offset / total, tilt: tilt / total, rest: rest / total };
}

function times(unit: number, variance: number | null): number | null {
  return variance === null ? null : unit * variance;
}

function slopes(s: PlaneShape, variance: number | null, df: number): Pick<PlaneFit, 'a' | 'b' | 'c'> {
  const at = 1 / s.totalWeight;
  if (s.model !== 'plane') return { a: coefficient(s.meanZ, times(at, variance), df), b: null, c: null };
  const meanP = s.pivot === 'x' ? s.meanX : s.meanY;
  const first = times(1 / s.sumPP + (s.shear * s.shear) / s.sumQQ, variance);
  const other = times(1 / s.sumQQ, variance);
  const origin = times(at + (meanP * meanP) / s.sumPP + (s.originAcross * s.originAcross) / s.sumQQ, variance);
  return {
    a: coefficient(s.atOrigin, origin, df),
    b: coefficient(s.gradientX, s.pivot === 'x' ? first : other, df),
    c: coefficient(s.gradientY, s.pivot === 'x' ? other : first, df),
  };
}

function fTestOf(s: PlaneShape, sumTilt: number, df: number): PlaneFit['fTest'] {
  if (s.model === 'level' || df < 1 || s.sumEE === 0) return null;
  const df1 = s.model === 'plane' ? 2 : 1;
  const f = inRange('F', sumTilt / df1 / (s.sumEE / df));
  return { f, df1, df2: df, p: fUpperTail(f, df1, df) };
}

function assemble(s: PlaneShape, fits: PointFit[], drop: number): PlaneFit {
  const n = fits.length;
  const df = n - s.rank;
  const variance = df < 1 ? null : s.sumEE / df;
  const sumTilt = s.alongP * s.alongP * s.sumPP + s.alongQ * s.alongQ * s.sumQQ;
  const sumOffset = s.totalWeight * s.meanZ * s.meanZ;
  const about = sumTilt + s.sumEE;
  const { a, b, c } = slopes(s, variance, df);
  return {
    model: s.model,
    n,
    df,
    a,
    b,
    c,
    residualStandardError: variance === null ? null : inRange('residual standard error', Math.sqrt(variance)),
    rSquared: about === 0 ? null : sumTilt / about,
    fTest: fTestOf(s, sumTilt, df),
    tilt: tiltOf(s, variance, drop),
    shares: sharesOf(sumOffset, sumTilt, s.sumEE),
    points: fits,
  };
}

/**
 * Ordinary or weighted least squares of z = a + b·x + c·y, with everything that tells how far to trust it. z is the deviation from plan
 * grade, so that stepped and sloping footings are judged like level ones.
 *
 * `model` is what the geometry carries: 'line' along the principal direction where the points are collinear to rounding (`a` is then the
 * fitted value at the weighted mean point), 'level' where they are one place or fewer than three (`a` the mean). What is undefined is null,
 * never 0: no degree of freedom, an exact fit (residuals within 8 units of rounding of the largest |z| are zero), a point of leverage 1.
 * R² and the F-test are against the mean alone; standard errors of the slope by the delta method.
 *
 * Units: x and y in one, z in one, any of them; b, c and slope in z per plan unit; azimuths in degrees clockwise from plan north.
 * Accuracy: 1e-9 relative or better on every number against exact arithmetic, far from the origin and for nearly collinear points too.
 * Source: Draper & Smith, Applied Regression Analysis, ch. 1–8 (from memory); checked against R's lm and exact rational solutions.
 *
 * @throws AnalysisError 'no-points', 'not-finite', 'not-positive' (a weight), 'out-of-range'
 * @example fitPlane([{ id: 'A', x: 0, y: 0, z: 0 }, { id: 'B', x: 10, y: 0, z: 1 }, { id: 'C', x: 0, y: 10, z: 0 }]).tilt.slope // 0.1
 */
export function fitPlane(points: readonly PlanePoint[]): PlaneFit {
  const extent = measureExtent(points);
  const quick = solveQuickly(points, extent);
  const fits = quick === null ? null : quickPointFits(points, quick);
  if (quick !== null && fits !== null) return assemble(quick, fits, quick.drop);
  const careful = solveCarefully(points, extent);
  return assemble(careful, carefulPointFits(points, careful), dropOver(careful));
}
