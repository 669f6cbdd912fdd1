import { AnalysisError } from './analysis-error';
import { inRange, positive } from './check-input';
import { leastSquares } from './least-squares';
import { EPS } from './plane-solution';

/** Makes the median of |residuals| estimate their standard deviation, for normal ones. */
const MAD = 0.6745;

/** Where fitted values move by no more than this share of the scale, they have settled. */
const SETTLED = 1e-13;

/**
 * Steps that may be taken: thousands for the few-point rounds whose scale creeps by a thousandth a step, which cost little there. Past half of
 * them only half of each is taken, so that a scale that swings to and fro settles between.
 */
const mostSteps = (n: number): number => Math.max(2000, Math.floor(400_000 / n));

/** A scale of so many times the rounding noise is one on its way to zero: the steps toward it get lost in rounding there. */
const NO_SCALE = 512;

export interface HuberFit {
  coefficients: number[];
  scale: number;
  /** ψ(u)/u of each value: 1 inside k scales, k·scale/|residual| beyond. */
  weights: number[];
  iterations: number;
}

export interface HuberOptions {
  k: number;
  /** Precision weights: residuals count as √w·residual. Absent: all 1. */
  weights?: readonly number[];
  /** Residuals up to this are rounding noise, and a scale of this size is none. */
  noise: number;
}

function medianOfSizes(values: readonly number[]): number {
  const sorted = values.map(Math.abs).sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  const upper = sorted[middle] ?? 0;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[middle - 1] ?? 0)) / 2;
}

const toward = (from: readonly number[], to: readonly number[], share: number): number[] =>
  from.map((value, i) => value + share * ((to[i] ?? 0) - value));

/**
 * Huber's M-estimate with an intercept by iteratively reweighted least squares from the least squares fit, the scale median|residual| ÷ 0.6745
 * taken anew at each step, until the fitted values stand still to 1e-13 of the scale. Where more than half of the values lie exactly on one fit,
 * the scale is 0, those weigh 1 and the others 0.
 * Source: P. J. Huber, Robust Statistics (1981) ch. 7 (from memory); R's MASS::rlm with its default scale.
 * @throws AnalysisError as leastSquares, 'not-positive' (k), 'no-convergence'
 */
export function huberRegression(
  columns: readonly (readonly number[])[],
  values: readonly number[],
  options: HuberOptions,
): HuberFit {
  const k = positive('k', options.k);
  const precision = options.weights ?? values.map(() => 1);
  const start = leastSquares(columns, values, { intercept: true, weights: precision });
  let { coefficients, residuals } = start;
  const largest = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const most = mostSteps(values.length);
  for (let iterations = 1; iterations <= most; iterations += 1) {
    const sizes = residuals.map((residual, i) => Math.abs(residual) * Math.sqrt(precision[i] ?? 1));
    const scale = medianOfSizes(sizes) / MAD;
    if (scale <= NO_SCALE * options.noise) {
      const weights = sizes.map((size) => (size <= 16 * NO_SCALE * options.noise ? 1 : 0));
      return { coefficients, scale: 0, weights, iterations };
    }
    const weights = sizes.map((size) => (size <= k * scale ? 1 : (k * scale) / size));
    const total = weights.map((weight, i) => weight * (precision[i] ?? 1));
    const next = leastSquares(columns, values, { intercept: true, weights: total });
    const share = iterations < most / 2 ? 1 : 0.5;
    const moved = residuals.reduce((most, residual, i) => Math.max(most, Math.abs(residual - (next.residuals[i] ?? 0))), 0);
    coefficients = toward(coefficients, next.coefficients, share);
    residuals = toward(residuals, next.residuals, share);
    if (moved <= SETTLED * scale + 4 * EPS * largest)
      return { coefficients, scale: inRange('scale', scale), weights, iterations };
  }
  throw new AnalysisError('no-convergence', 'The Huber estimate did not settle: its scale keeps moving.', {
    iterations: most,
  });
}
