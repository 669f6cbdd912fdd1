import type { Nm } from '@/analysis';
import type { RoundTarget } from '@/shared/round/round-state';
import type { ToleranceRule } from '@/shared/rules';

/** A jump of half an inch from the neighbours is asked about, on every surface that is not allowed to vary more than that. */
const HALF_INCH: Nm = 12_700_000;

/** From what jump on a reading is asked about. */
export function jumpAskedAbout({ low, high }: Pick<ToleranceRule, 'low' | 'high'>): Nm {
  return Math.max(HALF_INCH, low + high);
}

/**
 * How far a deviation stands from the nearer of its neighbours' (the next targets along the same rail, either way, that have
 * been shot), nm with the sign of the jump. Null where no neighbour says anything. Deviations are compared, so that a step in
 * the footing is no jump.
 */
export function jumpFromNeighbours(targets: readonly RoundTarget[], key: string, deviation: Nm): Nm | null {
  const at = targets.findIndex((target) => target.key === key);
  const rail = targets[at]?.rail;
  const jumps = [-1, 1].flatMap((way) => {
    const found = nextShot(targets, at, way, rail);
    return found === null ? [] : [deviation - found];
  });
  return jumps.reduce<Nm | null>((least, jump) => (least === null || Math.abs(jump) < Math.abs(least) ? jump : least), null);
}

/** Deviation of the nearest shot target one way along a rail. */
function nextShot(targets: readonly RoundTarget[], at: number, way: number, rail: RoundTarget['rail'] | undefined): Nm | null {
  for (let place = at + way; targets[place]?.rail === rail && rail !== undefined; place += way) {
    const deviation = targets[place]?.deciding?.deviation ?? null;
    if (deviation !== null) return deviation;
  }
  return null;
}
