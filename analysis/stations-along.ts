import { AnalysisError } from './analysis-error';
import { lengthFromZero, positiveLength } from './check-input';
import { cornerLetter, layOut, type OutlineOnPlan, type RunOnPlan } from './outline';
import { tangentOfHalf } from './plan-direction';
import type { OutlineRun, PlanPoint, Station } from './types';
import type { Nm } from './units';

/** More than any footing has; a spacing keyed in the wrong unit would ask for millions. */
const MOST_STATIONS = 20_000;

/** A place on one run where a station must stand, before equal parts are put between. */
interface Fixed {
  at: Nm;
  corner: string | null;
  step: Station['step'];
}

/** Steps of a run by place; one at the very end of a run belongs to the corner, and is told by the next run's start. */
function stepPlaces({ run }: RunOnPlan): Nm[] {
  const places = (run.steps ?? []).map(({ at }) => {
    const place = lengthFromZero(`step of ${run.id}`, at);
    if (place > run.length) {
      throw new AnalysisError('step-outside-run', `The step at ${at} is beyond the end of ${run.id}.`, { run: run.id, at });
    }
    return place;
  });
  return [...new Set(places)].sort((a, b) => a - b);
}

function fixedPlaces(outline: OutlineOnPlan, index: number, laid: RunOnPlan): Fixed[] {
  const { runs, closed } = outline;
  const before = index > 0 ? runs[index - 1] : closed ? runs.at(-1) : undefined;
  const places = stepPlaces(laid);
  const atCorner = places.includes(0) || (before !== undefined && stepPlaces(before).includes(before.run.length));
  const letter = cornerLetter(index);
  const fixed: Fixed[] = atCorner ? pair(0, letter) : [{ at: 0, corner: letter, step: null }];
  for (const at of places) if (at > 0 && at < laid.run.length) fixed.push(...pair(at, null));
  if (!closed && index === runs.length - 1) {
    const end = cornerLetter(index + 1);
    fixed.push(
      ...(places.includes(laid.run.length) ? pair(laid.run.length, end) : [{ at: laid.run.length, corner: end, step: null }]),
    );
  }
  return fixed;
}

function pair(at: Nm, corner: string | null): Fixed[] {
  return [
    { at, corner, step: 'before' },
    { at, corner, step: 'after' },
  ];
}

/** Equal parts no longer than the spacing, to a whole nanometre. */
function withParts(fixed: readonly Fixed[], runLength: Nm, spacing: Nm): Fixed[] {
  return fixed.flatMap((place, index) => {
    const to = fixed[index + 1]?.at ?? runLength;
    const parts = Math.ceil((to - place.at) / spacing);
    if (parts > MOST_STATIONS) {
      throw new AnalysisError('too-many-stations', `A spacing of ${spacing} nm asks for ${parts} stations.`, {
        spacing,
        stations: parts,
      });
    }
    const between = Array.from({ length: Math.max(0, parts - 1) }, (_, part) => ({
      at: place.at + Math.round(((to - place.at) * (part + 1)) / parts),
      corner: null,
      step: null,
    }));
    return [place, ...between];
  });
}

/** Where the rail on the left (+) or right (−) at `halfWidth` stands: mitred at a corner, square elsewhere. */
function railPoint(outline: OutlineOnPlan, index: number, place: Fixed, at: PlanPoint, left: Nm): PlanPoint {
  const laid = outline.runs[index];
  if (!laid) return at;
  const { direction } = laid;
  const previous = index > 0 ? outline.runs[index - 1] : outline.closed ? outline.runs.at(-1) : undefined;
  const bend = place.at === 0 && previous ? tangentOfHalf(previous.run.turn) : 0;
  // Left of the heading, and back along it by what the mitre takes: both offset lines meet there.
  return wholePoint({
    x: at.x - left * direction.y - left * bend * direction.x,
    y: at.y + left * direction.x - left * bend * direction.y,
  });
}

function wholePoint({ x, y }: PlanPoint): PlanPoint {
  return { x: Math.round(x) + 0, y: Math.round(y) + 0 };
}

function refuseFolds(outline: OutlineOnPlan): void {
  for (const [index, { run }] of outline.runs.entries()) {
    const corner = outline.closed || index < outline.runs.length - 1;
    if (corner && Math.abs(run.turn % 360) === 180) {
      throw new AnalysisError('turn-folds-back', `The turn of ${run.id} folds back on itself.`, { run: run.id });
    }
  }
}

/**
 * Stations in walking order: every corner, lettered; both sides of each step; and between them equal parts no longer than `spacing`.
 *
 * `station` is the distance from the first corner along the line that was keyed (0+00 at A). A closed outline ends before coming back to A;
 * a strip has a corner at both ends. With a `halfWidth`, `outer` and `inner` are the two rails, mitred at corners: outer is left of a
 * clockwise walk and right of a counterclockwise one; a strip counts as the way it turns on the whole.
 * @returns whole nm
 * @throws AnalysisError 'not-positive' | 'not-finite' | 'step-outside-run' | 'too-many-stations' | 'turn-folds-back'
 */
export function stationsAlong(runs: OutlineRun[], spacing: Nm, options: { halfWidth?: Nm } = {}): Station[] {
  const apart = positiveLength('spacing', spacing);
  const half = options.halfWidth === undefined ? undefined : positiveLength('halfWidth', options.halfWidth);
  const outline = layOut(runs);
  if (half !== undefined) refuseFolds(outline);
  const stations: Station[] = [];
  let walked = 0;
  for (const [index, laid] of outline.runs.entries()) {
    for (const place of withParts(fixedPlaces(outline, index, laid), laid.run.length, apart)) {
      const { direction, start } = laid;
      const at = { x: start.x + place.at * direction.x, y: start.y + place.at * direction.y };
      const rails =
        half === undefined
          ? {}
          : {
              outer: railPoint(outline, index, place, at, outline.sense * half),
              inner: railPoint(outline, index, place, at, -outline.sense * half),
            };
      stations.push({
        run: laid.run.id,
        station: Math.round(walked + place.at),
        ...wholePoint(at),
        corner: place.corner,
        step: place.step,
        ...rails,
      });
    }
    walked += laid.run.length;
    if (stations.length > MOST_STATIONS) {
      throw new AnalysisError('too-many-stations', `A spacing of ${spacing} nm asks for more than ${MOST_STATIONS} stations.`, {
        spacing,
      });
    }
  }
  return stations;
}
