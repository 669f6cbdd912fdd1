import type { Extent, PlaneSolution } from './plane-solution';
import { solveCarefully } from './plane-solve-careful';
import { solveQuickly, withCoordinates } from './plane-solve-quick';
import type { PlanePoint } from './types';

/** Least squares with each point's coordinates and residual: by plain doubles where they hold their digits, with care where they do not. */
export function solvePlane(points: readonly PlanePoint[], extent: Extent): PlaneSolution {
  const quick = solveQuickly(points, extent);
  return quick === null ? solveCarefully(points, extent) : withCoordinates(points, quick);
}
