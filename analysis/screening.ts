import { AnalysisError } from './analysis-error';
import { explainBust } from './bust-explanation';
import { finite, notNegative } from './check-input';
import { LARGEST } from './plane-solution';
import { robustScale, searchNeighbours } from './screening-neighbours';
import { searchPlane } from './screening-plane';
import type { ScreenedShot, Suspect } from './types';
import type { Nm } from './units';

/** A footing whose residuals scatter this many times what its steps from shot to shot account for is warped. */
const WARPED = 2;

function checkShots(shots: readonly ScreenedShot[]): void {
  const seen = new Set<string>();
  for (const { id, x, y, station, deviation } of shots) {
    if (seen.has(id)) throw new AnalysisError('duplicate-id', `Two shots are called "${id}".`, { id });
    seen.add(id);
    for (const [name, value] of Object.entries({ x, y, station, deviation })) {
      if (Math.abs(finite(name, value)) > LARGEST)
        throw new AnalysisError('out-of-range', `${name} is beyond any length: ${value}.`, { name, value });
    }
  }
}

/** Suspects of the plane, by place in the walk, with the size of each; found on the shots in one fixed order, so that where the walk starts is nothing. */
function planeSuspects(shots: readonly ScreenedShot[], u: Nm): { sizes: Map<number, Nm>; residuals: Nm[] } {
  const order = shots.map((_, place) => place).sort((a, b) => ((shots[a]?.id ?? '') < (shots[b]?.id ?? '') ? -1 : 1));
  const points = order.flatMap((place) => {
    const shot = shots[place];
    return shot === undefined ? [] : [{ id: shot.id, x: shot.x, y: shot.y, z: shot.deviation }];
  });
  const { suspects, expected } = searchPlane(points, u);
  const residuals = shots.map(({ x, y, deviation }) => deviation - expected(x, y));
  const sizes = new Map<number, Nm>();
  for (const index of suspects) {
    const place = order[index] ?? -1;
    const size = residuals[place] ?? 0;
    if (Math.abs(size) > 4 * u) sizes.set(place, size);
  }
  return { sizes, residuals };
}

/**
 * The shots of one rail that look like busts, in walking order. Nothing is dropped: a suspect asks for a second reading.
 *
 * `plane`: externally studentized residuals from the plane, one shot taken out at a time up to ⌊n/4⌋, each step held against its
 * Bonferroni-adjusted t quantile (α = 0.05); suspect is everything up to the last significant step. `neighbours`: what the plane leaves steps
 * the same way from both neighbours, against the robust scale of such steps, so that a bust on a warped footing is seen too. Scales are
 * never under u, and what stands off by 4u or less is no suspect.
 *
 * `size`: how far the shot stands from the plane of the others, or from the line between its neighbours where only they see it or the
 * footing is warped; positive = high. `explanation`: the bust within 3u of the size, the nearest of them; 'digits-swapped' needs `keyed` and `style`.
 *
 * Units: nanometres; `u` the relative standard uncertainty of a shot; `closed` where the walk comes back to its start. Ids are one of a kind.
 * Source: Rosner's generalized extreme studentized deviates; Belsley, Kuh & Welsch for the residuals (both from memory).
 * @throws AnalysisError 'not-finite', 'negative' (u), 'duplicate-id', 'out-of-range'
 */
export function screenShots(shots: readonly ScreenedShot[], options: { closed: boolean; u: Nm }): Suspect[] {
  const u = notNegative('u', options.u);
  checkShots(shots);
  if (shots.length === 0) return [];
  const { sizes, residuals } = planeSuspects(shots, u);
  const walked = shots.map(({ x, y }, place) => ({ x, y, residual: residuals[place] ?? 0 }));
  const walk = { shots: walked, closed: options.closed, u };
  const { sizes: steps, usualStep } = searchNeighbours(walk, new Set(sizes.keys()), Math.floor(shots.length / 4));
  // Two shots of one footing differ by √2 of what each scatters by. Where they differ by far less, the footing is no plane, and the line
  // between the neighbours says better than the plane what the shot should have been.
  const warped = robustScale(residuals.filter((_, place) => !sizes.has(place))) > WARPED * (usualStep / Math.SQRT2);
  return shots.flatMap(({ id, keyed, style }, place): Suspect[] => {
    const fromPlane = sizes.get(place);
    const fromNeighbours = steps.get(place);
    const size = warped ? (fromNeighbours ?? fromPlane) : (fromPlane ?? fromNeighbours);
    if (size === undefined) return [];
    const seenBy: Suspect['seenBy'] = [];
    if (fromPlane !== undefined) seenBy.push('plane');
    if (fromNeighbours !== undefined) seenBy.push('neighbours');
    return [{ id, seenBy, size, explanation: explainBust(size, 3 * u, keyed, style) }];
  });
}
