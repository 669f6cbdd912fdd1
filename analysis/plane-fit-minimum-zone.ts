import { inRange } from './check-input';
import { minimaxFit } from './minimax';
import { corrected, measureExtent } from './plane-solution';
import { solvePlane } from './plane-solve';
import type { MinimumZonePlane, PlanePoint } from './types';

const largest = (values: Float64Array): number => values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);

/**
 * The plane whose largest |residual| (vertical) is smallest: half the thickness of the thinnest slab between parallel planes, measured upright,
 * that holds every point. Weights do not count here: every shot has to fit in.
 *
 * `support` are the ids of the points that hold the slab open, four or fewer; none where the points lie exactly on a plane. The half-width is
 * unique, the plane need not be. Collinear points give a rise along their line and none across it; one place, or fewer than three points, a level plane.
 * Method: linear program by exchange, in the orthogonal coordinates and residuals of the least squares plane, exact to rounding.
 * @throws AnalysisError 'no-points', 'not-finite', 'not-positive' (a weight), 'out-of-range', 'no-convergence'
 */
export function fitPlaneMinimumZone(points: readonly PlanePoint[]): MinimumZonePlane {
  const extent = measureExtent(points);
  const solution = solvePlane(points, extent);
  const { rank, p, q, residuals } = solution;
  const height = largest(residuals);
  const plane = corrected(solution, []);
  if (height === 0)
    return { a: inRange('a', plane.a), b: inRange('b', plane.b), c: inRange('c', plane.c), halfWidth: 0, support: [] };
  const scales = [1, largest(p), largest(q)].slice(0, rank);
  const rows = points.map((_, i) => [1, (p[i] ?? 0) / (scales[1] ?? 1), (q[i] ?? 0) / (scales[2] ?? 1)].slice(0, rank));
  const values = Array.from(residuals, (residual) => residual / height);
  const { coefficients, halfWidth, support } = minimaxFit(rows, values);
  const turned = corrected(
    solution,
    coefficients.map((coefficient, j) => (coefficient * height) / (scales[j] ?? 1)),
  );
  return {
    a: inRange('a', turned.a),
    b: inRange('b', turned.b),
    c: inRange('c', turned.c),
    halfWidth: inRange('halfWidth', halfWidth * height),
    support: support.map((index) => points[index]?.id ?? ''),
  };
}
