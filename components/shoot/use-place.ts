import { useState } from 'react';
import type { RoundShot, RoundState, RoundTarget } from '@/shared/round/round-state';
import { nextToShoot, stepAlong } from './walk';

export interface WalkPlace {
  /** Where the rod goes; null once the lap is all shot. */
  target: RoundTarget | null;
  lap: number;
  /** The shot just recorded here lies out, and the operator is still at this station. */
  outShot: RoundShot | null;
  goTo(key: string | null, outShot?: string): void;
  step(by: 1 | -1): void;
  startNextLap(): void;
}

/** Where in the walk the operator stands. Until they go somewhere themselves it is the next target that the lap has not shot. */
export function usePlace({ targets, lap: newest }: Pick<RoundState, 'targets' | 'lap'>, at: string | null): WalkPlace {
  const [place, setPlace] = useState<{ key: string | null; lap: number; outShot: string | null }>({
    key: at,
    lap: 1,
    outShot: null,
  });
  const lap = Math.max(place.lap, newest.number);
  const chosen = targets.find((target) => target.key === place.key);
  const next = nextToShoot(targets, null, lap);
  const target = chosen ?? targets.find((one) => one.key === next) ?? null;
  const goTo = (key: string | null, outShot: string | null = null) => setPlace({ key, lap, outShot });
  return {
    target,
    lap,
    outShot: target?.shots.find((shot) => shot.id === place.outShot && shot.struck === null) ?? null,
    goTo,
    step: (by) => {
      const from = target ?? (by === 1 ? targets.at(-1) : targets[0]);
      if (from) goTo(stepAlong(targets, from.key, by));
    },
    startNextLap: () => setPlace({ key: null, lap: lap + 1, outShot: null }),
  };
}
