import { studentUpperQuantile } from './distributions';
import { ALPHA } from './screening-plane';
import type { Nm } from './units';

/** The smallest steps that make the scale, as a share of all: a bust in ten shots spoils one step in five. */
const TRUSTED = 0.8;

/**
 * Makes the root mean square of the trusted steps estimate the standard deviation of all, for normal ones: 1/√(1 − 2zφ(z)/0.8), z = 1.28155.
 * A median of rounded steps jumps between whole graduations; this does not.
 */
const PER_TRUSTED = 1.51147;

/** Fewer shots than this have too few steps to say what a usual one is. */
const FEWEST = 5;

/** A shot as the walk sees it: what it stands off the plane by, and where it stands. */
export interface WalkedShot {
  x: Nm;
  y: Nm;
  residual: Nm;
}

/** The two shots beside one, in the walk. */
interface Beside {
  before: WalkedShot;
  after: WalkedShot;
}

/** The nearest shots in `kept` on either side of place `at`; null at the ends of an open walk. */
function beside(shots: readonly WalkedShot[], at: number, kept: (place: number) => boolean, closed: boolean): Beside | null {
  const find = (direction: 1 | -1): WalkedShot | null => {
    for (let step = 1; step < shots.length; step += 1) {
      const place = at + direction * step;
      const wrapped = (place + shots.length) % shots.length;
      if (!closed && wrapped !== place) return null;
      if (kept(wrapped)) return shots[wrapped] ?? null;
    }
    return null;
  };
  const before = find(-1);
  const after = find(1);
  return before === null || after === null || before === after ? null : { before, after };
}

/** The smaller of the steps from both neighbours where both go the same way, else zero. */
function stepFrom(shot: WalkedShot, { before, after }: Beside): number {
  const first = shot.residual - before.residual;
  const second = shot.residual - after.residual;
  return first * second <= 0 ? 0 : Math.min(Math.abs(first), Math.abs(second));
}

/** What the shot stands off the straight line between its neighbours by. */
function sizeFrom(shot: WalkedShot, { before, after }: Beside): Nm {
  const back = Math.hypot(shot.x - before.x, shot.y - before.y);
  const on = Math.hypot(shot.x - after.x, shot.y - after.y);
  const share = back + on === 0 ? 0.5 : back / (back + on);
  return shot.residual - (before.residual + share * (after.residual - before.residual));
}

/** Standard deviation that the smaller four fifths of the sizes given speak for; 0 for none. */
export function robustScale(sizes: readonly number[]): number {
  const trusted = sizes
    .map(Math.abs)
    .sort((a, b) => a - b)
    .slice(0, Math.ceil(TRUSTED * sizes.length));
  return trusted.length === 0 ? 0 : PER_TRUSTED * Math.sqrt(trusted.reduce((sum, size) => sum + size * size, 0) / trusted.length);
}

/** Steps from each shot to the next one, round the corner of a closed walk too. */
function stepsOf(kept: readonly WalkedShot[], closed: boolean): number[] {
  const steps = kept.slice(1).map((shot, i) => shot.residual - (kept[i]?.residual ?? 0));
  const [first] = kept;
  const last = kept.at(-1);
  if (closed && first !== undefined && last !== undefined) steps.push(first.residual - last.residual);
  return steps;
}

/** The step that a usual pair of neighbours does not reach: the Bonferroni t quantile of the robust scale of steps, held up to √2·u. */
function limitOf(kept: readonly WalkedShot[], { closed, u }: Walk): number {
  if (kept.length < FEWEST) return Infinity;
  const scale = Math.max(robustScale(stepsOf(kept, closed)), Math.SQRT2 * u);
  return scale * studentUpperQuantile(ALPHA / (2 * kept.length), kept.length - 1);
}

/** Where a shot steps off both neighbours by more than the limit, by how much; null where it does not. */
interface Standing {
  place: number;
  step: number;
  size: Nm;
}

interface Walk {
  shots: readonly WalkedShot[];
  closed: boolean;
  u: Nm;
}

function standingAt({ shots, closed, u }: Walk, place: number, kept: (place: number) => boolean, limit: number): Standing | null {
  const shot = shots[place];
  const pair = beside(shots, place, kept, closed);
  if (shot === undefined || pair === null) return null;
  const step = stepFrom(shot, pair);
  const size = sizeFrom(shot, pair);
  return step > limit && Math.abs(size) > 4 * u ? { place, step, size } : null;
}

export interface NeighbourSearch {
  /** Place in the walk → size against the line between its neighbours. */
  sizes: Map<number, Nm>;
  /** Robust standard deviation of the steps between shots that are not suspect. */
  usualStep: Nm;
}

/**
 * Shots that step off both their neighbours, the largest first, each taken out before the next is looked for, up to `most`. Those in
 * `known` are nobody's neighbours; each of them is held against the nearest that are not suspect.
 */
export function searchNeighbours(walk: Walk, known: ReadonlySet<number>, most: number): NeighbourSearch {
  const { shots, closed } = walk;
  const out = new Set(known);
  const kept = (place: number): boolean => !out.has(place);
  const clean = (): WalkedShot[] => shots.filter((_, place) => kept(place));
  const found = new Map<number, Nm>();
  let left = clean();
  let limit = limitOf(left, walk);
  while (found.size < most && limit < Infinity) {
    let worst: Standing | null = null;
    for (let place = 0; place < shots.length; place += 1) {
      const standing = kept(place) ? standingAt(walk, place, kept, limit) : null;
      if (standing !== null && (worst === null || standing.step > worst.step)) worst = standing;
    }
    if (worst === null) break;
    found.set(worst.place, worst.size);
    out.add(worst.place);
    left = clean();
    limit = limitOf(left, walk);
  }
  for (const place of known) {
    const standing = standingAt(walk, place, kept, limit);
    if (standing !== null) found.set(place, standing.size);
  }
  return { sizes: found, usualStep: robustScale(stepsOf(left, closed)) };
}
