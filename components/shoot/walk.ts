import type { RoundShot, RoundState, RoundTarget } from '@/shared/round/round-state';

/** Whether a target has a standing shot in a lap. */
export function shotInLap(target: RoundTarget, lap: number): boolean {
  return target.shots.some((shot) => shot.struck === null && shot.record.lap === lap);
}

/** The next target in walking order, from after `key` and round again, that this lap has not shot; null when all are. */
export function nextToShoot(targets: readonly RoundTarget[], key: string | null, lap: number): string | null {
  const after = targets.findIndex((target) => target.key === key) + 1;
  const walk = [...targets.slice(after), ...targets.slice(0, after)];
  return walk.find((target) => target.key !== key && !shotInLap(target, lap))?.key ?? null;
}

/** The neighbour of a target, round the ends as well. */
export function stepAlong(targets: readonly RoundTarget[], key: string, by: 1 | -1): string {
  const at = targets.findIndex((target) => target.key === key);
  return targets[(at + by + targets.length) % targets.length]?.key ?? key;
}

/** The newest shot of a person that is not struck out: what "Strike last out" means. */
export function lastShotOf(state: RoundState, personId: string): RoundShot | null {
  const own = state.targets
    .flatMap((target) => target.shots)
    .filter((shot) => shot.struck === null && shot.person.id === personId);
  return own.reduce<RoundShot | null>((last, shot) => (last === null || isAfter(shot, last) ? shot : last), null);
}

/** By the phones' own counters; between two phones of one person by their clocks. */
function isAfter({ record: one }: RoundShot, { record: other }: RoundShot): boolean {
  if (one.deviceId === other.deviceId) return one.deviceSequence > other.deviceSequence;
  return one.clock.wall > other.clock.wall;
}
