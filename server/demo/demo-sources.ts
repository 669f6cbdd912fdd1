import type { Sources } from '../dependencies';

/** Time and chance of the demo: the same on every machine, so that its screens are the same on every machine. */
export interface DemoSources extends Sources {
  /** Moves the clock to a time, or by minutes. */
  moveTo(time: string): void;
  pass(minutes: number): void;
  /** A number from 0 up to 1. */
  chance(): number;
}

/** Marsaglia's xorshift32: small, and the same everywhere. Nothing secret is made with it but what the demo prints anyway. */
function xorshift(seed: number): () => number {
  let state = seed;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}

export function demoSources(seed: number): DemoSources {
  const chance = xorshift(seed);
  let now = 0;
  return {
    chance,
    now: () => new Date(now),
    randomBytes: (count) => Uint8Array.from({ length: count }, () => Math.floor(chance() * 256)),
    moveTo: (time) => {
      now = Date.parse(time);
    },
    pass: (minutes) => {
      now += Math.round(minutes * 60_000);
    },
  };
}
