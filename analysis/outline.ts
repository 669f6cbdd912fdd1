import { AnalysisError } from './analysis-error';
import { inRange, positiveLength, lengthFromZero } from './check-input';
import { onceRound, unitVector } from './plan-direction';
import type { OutlineRun, PlanPoint, TracedOutline } from './types';
import type { Nm } from './units';

/** Two lines nearer than this touch, and an outline that misses by no more closes: far under any tape, far over rounding. */
const TOUCHING: Nm = 1_000;
/** Heading of the first run: plan east. */
const FIRST_HEADING = 90;

export interface RunOnPlan {
  run: OutlineRun;
  /** Azimuth, degrees. */
  heading: number;
  direction: PlanPoint;
  start: PlanPoint;
  end: PlanPoint;
}

export interface OutlineOnPlan {
  closed: boolean;
  /** Degrees by which all turns miss ±360. */
  angle: number;
  sense: 1 | -1;
  runs: RunOnPlan[];
}

/** Walks the runs from (0, 0), the first one plan east. @throws AnalysisError 'not-finite' | 'not-positive' | 'out-of-range' */
export function layOut(runs: readonly OutlineRun[]): OutlineOnPlan {
  let heading = FIRST_HEADING;
  let at: PlanPoint = { x: 0, y: 0 };
  const laid = runs.map((run): RunOnPlan => {
    const length = positiveLength(`length of ${run.id}`, run.length);
    const direction = unitVector(heading);
    const start = at;
    const end = { x: start.x + length * direction.x, y: start.y + length * direction.y };
    const walked = { run, heading, direction, start, end };
    at = end;
    heading += run.turn;
    return walked;
  });
  return { ...onceRound(runs), runs: laid };
}

/** Signed distance of `point` left of the line through `from` and `to`; distance from `from` where those two are one place. */
function leftOf(from: PlanPoint, to: PlanPoint, point: PlanPoint): number {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  if (length === 0) return Math.hypot(point.x - from.x, point.y - from.y);
  return ((to.x - from.x) * (point.y - from.y) - (to.y - from.y) * (point.x - from.x)) / length;
}

function side(distance: number): -1 | 0 | 1 {
  return Math.abs(distance) <= TOUCHING ? 0 : distance > 0 ? 1 : -1;
}

function onStretch(point: PlanPoint, { start, end }: RunOnPlan): boolean {
  return (
    side(leftOf(start, end, point)) === 0 &&
    point.x >= Math.min(start.x, end.x) - TOUCHING &&
    point.x <= Math.max(start.x, end.x) + TOUCHING &&
    point.y >= Math.min(start.y, end.y) - TOUCHING &&
    point.y <= Math.max(start.y, end.y) + TOUCHING
  );
}

function samePlace(a: PlanPoint, b: PlanPoint): boolean {
  return Math.hypot(a.x - b.x, a.y - b.y) <= TOUCHING;
}

function meet(one: RunOnPlan, other: RunOnPlan): boolean {
  const crosses =
    side(leftOf(one.start, one.end, other.start)) * side(leftOf(one.start, one.end, other.end)) < 0 &&
    side(leftOf(other.start, other.end, one.start)) * side(leftOf(other.start, other.end, one.end)) < 0;
  return (
    crosses ||
    onStretch(other.start, one) ||
    onStretch(other.end, one) ||
    onStretch(one.start, other) ||
    onStretch(one.end, other)
  );
}

function foldsBack(run: OutlineRun): boolean {
  return Math.abs(run.turn % 360) === 180;
}

/** Neighbours share a corner, so they only cross by folding back on each other. */
function crossesItself({ closed, runs }: OutlineOnPlan): boolean {
  const last = runs.length - 1;
  if (runs.some(({ run }, index) => (closed || index < last) && foldsBack(run))) return true;
  for (const [index, one] of runs.entries()) {
    for (const [later, other] of runs.entries()) {
      if (later < index + 2) continue;
      const ends = index === 0 && later === last;
      if (ends && (closed || samePlace(one.start, other.end))) continue;
      if (meet(one, other)) return true;
    }
  }
  return false;
}

/** Square metres inside the corners (the shoelace sum), 0 for a strip. */
function areaInside(corners: readonly PlanPoint[]): number {
  let twice = 0;
  for (const [index, corner] of corners.entries()) {
    const next = corners[(index + 1) % corners.length] ?? corner;
    twice += (corner.x * next.y - next.x * corner.y) / 1e18;
  }
  return Math.abs(twice) / 2;
}

/** A run mends the outline when the miss lies along it and another length of it, still above zero, takes the miss up. */
function mendsFor({ runs }: OutlineOnPlan, miss: PlanPoint, closesWithin: Nm): TracedOutline['mends'] {
  return runs.flatMap(({ run, direction }) => {
    const along = miss.x * direction.x + miss.y * direction.y;
    const across = miss.x * direction.y - miss.y * direction.x;
    const length = Math.round(run.length - along);
    return Math.abs(across) <= closesWithin && length > 0 ? [{ run: run.id, length }] : [];
  });
}

/**
 * The outline as drawn: runs in walking order from (0, 0), the first one heading plan east, clockwise turns positive.
 *
 * It is closed when all turns, the last included, sum to ±360°; else it is a strip, with a corner at both ends, no area and no mends.
 * `closure` runs from the start to where the last run ends; its `angle` is how many degrees the turns miss ±360 by. `area` is in square
 * metres, of the corners as walked. `mends` are all single runs whose other length would close it.
 * @param options.closesWithin nm by which a closed outline may miss, and a mend still may; 1 µm unless said
 * @throws AnalysisError 'no-runs' | 'not-finite' | 'not-positive' | 'out-of-range'
 */
export function traceOutline(runs: OutlineRun[], options: { closesWithin?: Nm } = {}): TracedOutline {
  const closesWithin = lengthFromZero('closesWithin', options.closesWithin ?? TOUCHING);
  const outline = layOut(runs);
  const last = outline.runs.at(-1);
  if (!last) throw new AnalysisError('no-runs', 'An outline needs at least one run.');
  const corners = outline.runs.map(({ start }) => start);
  if (!outline.closed) corners.push(last.end);
  const miss = last.end;
  const length = Math.hypot(miss.x, miss.y);
  return {
    corners,
    closure: { dx: miss.x, dy: miss.y, length, angle: outline.angle },
    perimeter: inRange(
      'perimeter',
      runs.reduce((sum, run) => sum + run.length, 0),
    ),
    area: outline.closed ? areaInside(corners) : 0,
    selfCrossing: crossesItself(outline),
    mends: outline.closed && length > closesWithin ? mendsFor(outline, miss, closesWithin) : [],
  };
}

/** Corner letters in walking order: A to Z, then AA, AB … */
export function cornerLetter(index: number): string {
  const letter = String.fromCharCode(65 + (index % 26));
  return index < 26 ? letter : cornerLetter(Math.floor(index / 26) - 1) + letter;
}

export interface Diagonal {
  /** Corner letters. */
  from: string;
  to: string;
  length: Nm;
}

/**
 * Straight distances between all corners that no run joins, to compare with the tape; whole nm.
 * @throws AnalysisError as `traceOutline`
 */
export function diagonals(runs: OutlineRun[]): Diagonal[] {
  const { corners } = traceOutline(runs);
  const { closed } = onceRound(runs);
  return corners.flatMap((from, index) =>
    corners.flatMap((to, later) => {
      const neighbours = later < index + 2 || (closed && index === 0 && later === corners.length - 1);
      if (neighbours) return [];
      return [
        { from: cornerLetter(index), to: cornerLetter(later), length: Math.round(Math.hypot(to.x - from.x, to.y - from.y)) },
      ];
    }),
  );
}
