import { AnalysisError } from './analysis-error';
import { inRange, notNegative, positive } from './check-input';
import type { LaserAccuracy, PlaneFit, TiltAgainstLaser } from './types';

/** Two-sided 95 % of the normal distribution (NIST TN 1297 §4: 1.960; SEEN). */
const NORMAL_95 = 1.96;

/** The level at which the F-test calls a tilt real. */
const SIGNIFICANCE = 0.05;

/**
 * Whether a fitted tilt is more than reading noise, and more than the laser's stated accuracy could make. A fit alone cannot tell a tilted
 * footing from a tilted laser: `beyondLaser` says that this laser within its statement would not show it, `levelCheck` tells the two apart.
 *
 * `laserSlope` = accuracy ÷ at. `beyondReading`: p of the F-test under 0.05; an exact plane with any slope is beyond reading noise.
 * `beyondLaser`: the slope less 1.96 of its standard errors still exceeds `laserSlope`; false where no standard error is known.
 *
 * Units: accuracy and at in one length unit; the fit's z and plan in one unit too, so that slopes compare.
 * @throws AnalysisError 'not-finite', 'negative' (accuracy), 'not-positive' (at), 'out-of-range'
 */
export function tiltAgainstLaser(fit: PlaneFit, laser: LaserAccuracy): TiltAgainstLaser {
  const laserSlope = inRange('laser slope', notNegative('accuracy', laser.accuracy) / positive('at', laser.at));
  const { slope, slopeStandardError } = fit.tilt;
  notNegative('slope', slope);
  if (slopeStandardError !== null) notNegative('standard error of the slope', slopeStandardError);
  const exact = fit.residualStandardError === 0 && slope > 0;
  const p = fit.fTest === null ? null : fit.fTest.p;
  if (p !== null && !(p >= 0 && p <= 1))
    throw new AnalysisError('out-of-range', `p of the F-test is no probability: ${p}.`, { p });
  return {
    beyondReading: exact || (p !== null && p < SIGNIFICANCE),
    beyondLaser: slopeStandardError !== null && slope - NORMAL_95 * slopeStandardError > laserSlope,
    laserSlope,
  };
}
