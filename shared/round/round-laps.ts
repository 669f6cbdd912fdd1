import type { ReadingRecord } from '../records';
import type { RoundShot, RoundState, RoundTarget } from './round-state';

/** Where a shot stands in the one order of records. */
export type OrderOf = (shot: RoundShot) => number;

/** The newest lap that has a standing shot, and how many targets it has; lap 1 before the first shot. */
export function newestLap(targets: readonly RoundTarget[]): RoundState['lap'] {
  const number = Math.max(1, ...targets.flatMap((target) => standing(target).map((shot) => shot.record.lap)));
  const shot = targets.filter((target) => standing(target).some((one) => one.record.lap === number)).length;
  return { number, shot, of: targets.length };
}

/**
 * Whether one lap went round every target by reading, with no adjustment after it began: each target's deciding shot is a
 * read one of that lap, and comes after the last adjustment. An adjustment is a set shot, or a shot of a target that already
 * had one in the same lap: the rail was moved in between. Struck shots count for nothing.
 */
export function isWholeReadLap(targets: readonly RoundTarget[], orderOf: OrderOf): boolean {
  const deciding = targets.map((target) => target.deciding);
  const lap = deciding[0]?.record.lap;
  if (lap === undefined) return false;
  const adjusted = Math.max(-1, ...targets.flatMap((target) => adjustments(standing(target)).map(orderOf)));
  return deciding.every(
    (shot) => shot !== null && shot.record.lap === lap && shot.record.how === 'read' && orderOf(shot) > adjusted,
  );
}

/** Unstruck shots of one rail in one lap by several phones that do not give the same height, where that lap decides. */
export function phonesThatDisagree(targets: readonly RoundTarget[]): RoundState['disagreements'] {
  return targets.flatMap((target) => {
    const lap = target.deciding?.record.lap;
    const same = standing(target).filter((shot) => shot.record.lap === lap);
    const phones = new Map(same.map((shot) => [shot.record.deviceId, shot]));
    const heights = new Set([...phones.values()].map((shot) => shot.elevation));
    return phones.size > 1 && heights.size > 1 ? [{ key: target.key, shots: same.map((shot) => shot.id) }] : [];
  });
}

function standing(target: RoundTarget): RoundShot[] {
  return target.shots.filter((shot) => shot.struck === null);
}

function adjustments(shots: readonly RoundShot[]): RoundShot[] {
  const lapsSeen = new Set<ReadingRecord['lap']>();
  return shots.filter((shot) => {
    const again = lapsSeen.has(shot.record.lap);
    lapsSeen.add(shot.record.lap);
    return again || shot.record.how === 'set';
  });
}
