import { AnalysisError } from './analysis-error';
import { finite } from './check-input';
import type { OutlineRun, PlanPoint } from './types';

const QUARTERS: readonly (readonly [sine: number, cosine: number])[] = [
  [0, 1],
  [1, 0],
  [0, -1],
  [-1, 0],
];

/** Azimuth brought into 0 up to 360 degrees, clockwise from plan north. */
export function azimuth(degrees: number): number {
  const turned = degrees % 360;
  return turned < 0 ? turned + 360 : turned;
}

/** Unit vector of an azimuth: x east, y north; the four quarters exactly, so that square corners stay whole nanometres. */
export function unitVector(degrees: number): PlanPoint {
  const bearing = azimuth(degrees);
  const quarter = QUARTERS[bearing / 90];
  if (quarter) return { x: quarter[0], y: quarter[1] };
  const radians = (bearing * Math.PI) / 180;
  return { x: Math.sin(radians), y: Math.cos(radians) };
}

/** Tangent of half a turn in degrees: exactly ±1 at a right angle, 0 straight on. Grows without bound toward ±180. */
export function tangentOfHalf(turn: number): number {
  const bend = ((turn % 360) + 540) % 360;
  const signed = bend - 180;
  if (signed === 90 || signed === -90) return Math.sign(signed);
  return Math.tan((signed * Math.PI) / 360);
}

/** Degrees keyed to a tenth of a second are told apart; rounding of a sum of them is not. */
const SAME_ANGLE = 1e-9;

/**
 * How far all turns, the last included, are from once round: 0 for an outline that closes.
 * @throws AnalysisError 'not-finite' | 'turn-beyond-once-round'
 * `sense` is 1 walked clockwise, −1 counterclockwise: the sign of the sum, and the side on which the outside lies (left of a clockwise walk).
 */
export function onceRound(runs: readonly OutlineRun[]): { closed: boolean; angle: number; sense: 1 | -1 } {
  let sum = 0;
  for (const run of runs) {
    const turn = finite(`turn of ${run.id}`, run.turn);
    if (Math.abs(turn) > 360) {
      throw new AnalysisError('turn-beyond-once-round', `The turn of ${run.id} is more than once round.`, { run: run.id, turn });
    }
    sum += turn;
  }
  const sense = sum < 0 ? -1 : 1;
  const angle = sum - 360 * sense;
  const closed = Math.abs(angle) <= SAME_ANGLE;
  return { closed, angle: closed ? 0 : angle, sense };
}
