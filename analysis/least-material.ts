import { segmentsOf } from './profile';
import type { WallRun } from './types';
import type { Nm } from './units';

/** A run whose surface is lifted by the courses that it lies below the highest one. */
export interface LiftedRun {
  run: WallRun;
  lift: Nm;
}

interface Slab {
  low: Nm;
  high: Nm;
  /** nm² of plan. */
  area: number;
}

function slabsOf(lifted: readonly LiftedRun[]): Slab[] {
  return lifted.flatMap(({ run, lift }) =>
    segmentsOf(run.profile)
      .filter(({ length }) => length > 0)
      .map(({ from, to, length }) => ({
        low: Math.min(from.elevation, to.elevation) + lift,
        high: Math.max(from.elevation, to.elevation) + lift,
        area: length * run.width,
      })),
  );
}

/** Plan area whose surface lies under `height`; a level slab at that very height counts where `levelToo`. */
function areaUnder(slabs: readonly Slab[], height: Nm, levelToo: boolean): number {
  return slabs.reduce((sum, { low, high, area }) => {
    if (low === high) return low < height || (levelToo && low === height) ? sum + area : sum;
    return sum + area * Math.min(1, Math.max(0, (height - low) / (high - low)));
  }, 0);
}

/**
 * The height to which grinding and filling together cost least. Cost is fill · ∫ max(height − surface, 0) + grind · ∫ max(surface − height, 0):
 * convex, and its slope, fill · (area under) − grind · (area over), is linear between surface points; so the best height is that where the slope
 * passes zero. Where several heights cost the same, the highest: less grinding.
 * @returns nm, fractional; null where the runs have no plan area
 */
export function cheapestHeight(lifted: readonly LiftedRun[], weights: { fill: number; grind: number }): Nm | null {
  const slabs = slabsOf(lifted);
  const whole = slabs.reduce((sum, { area }) => sum + area, 0);
  const heights = [...new Set(slabs.flatMap(({ low, high }) => [low, high]))].sort((a, b) => a - b);
  const highest = heights.at(-1);
  if (highest === undefined) return null;
  const slopeAt = (height: Nm, levelToo: boolean) => {
    const under = areaUnder(slabs, height, levelToo);
    return weights.fill * under - weights.grind * (whole - under);
  };
  let known = 0;
  let beyond = heights.length;
  while (known < beyond) {
    const middle = Math.floor((known + beyond) / 2);
    if (slopeAt(heights[middle] ?? highest, true) > 0) beyond = middle;
    else known = middle + 1;
  }
  const at = heights[known];
  const before = heights[known - 1];
  if (at === undefined || before === undefined) return at ?? highest;
  // Level slabs at `at` count only from there on; just under it their whole area still lies over.
  const under = areaUnder(slabs, at, false);
  const reached = weights.fill * under - weights.grind * (whole - under);
  if (reached <= 0) return at;
  const left = slopeAt(before, true);
  return before + (at - before) * (-left / (reached - left));
}
