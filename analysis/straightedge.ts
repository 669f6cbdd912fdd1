import { AnalysisError } from './analysis-error';
import { inRange, positiveLength } from './check-input';
import { checkedProfile } from './profile';
import type { ProfilePoint, StraightedgePlace, StraightedgeResult } from './types';
import type { Nm } from './units';

/** Window positions times points under each: past this the answer would take seconds. No footing comes near. */
const MOST_WORK = 40_000_000;

/** Runs are cut at steps: an edge does not lie across one. */
function cutAtSteps(profile: readonly ProfilePoint[]): ProfilePoint[][] {
  const pieces: ProfilePoint[][] = [];
  let before: ProfilePoint | undefined;
  for (const point of profile) {
    const piece = pieces.at(-1);
    if (piece && before && before.station < point.station) piece.push(point);
    else pieces.push([point]);
    before = point;
  }
  return pieces;
}

/** Best support found so far for each point of one piece, and the search that fills it. */
class EdgeOverPiece {
  readonly best: (StraightedgePlace | null)[];

  constructor(
    readonly points: readonly ProfilePoint[],
    readonly length: Nm,
  ) {
    this.best = points.map(() => null);
  }

  private at(index: number): ProfilePoint {
    const point = this.points[index];
    if (!point) throw new AnalysisError('out-of-range', 'A straightedge left its profile.', { index });
    return point;
  }

  /** Height on segment `index` (from point index to the next) at a station. */
  private heightOn(index: number, station: Nm): number {
    const from = this.at(index);
    const to = this.at(index + 1);
    if (station <= from.station) return from.elevation;
    if (station >= to.station) return to.elevation;
    return from.elevation + (to.elevation - from.elevation) * ((station - from.station) / (to.station - from.station));
  }

  private offer(index: number, from: ProfilePoint, to: ProfilePoint): void {
    const { station, elevation } = this.at(index);
    const share = (station - from.station) / (to.station - from.station);
    const gap = from.elevation - elevation + (to.elevation - from.elevation) * share;
    if (gap > (this.best[index]?.gap ?? 0)) this.best[index] = { gap, at: station, from: from.station, to: to.station };
  }

  /** The edge rests on the upper hull of what lies under it; each hull side spans a dip. */
  private layOver(left: ProfilePoint, first: number, last: number, right: ProfilePoint): void {
    const hull: { point: ProfilePoint; index: number }[] = [];
    const add = (point: ProfilePoint, index: number) => {
      for (let top = hull.at(-1), under = hull.at(-2); top && under; top = hull.at(-1), under = hull.at(-2)) {
        const turn =
          (top.point.station - under.point.station) * (point.elevation - under.point.elevation) -
          (top.point.elevation - under.point.elevation) * (point.station - under.point.station);
        if (turn <= 0) break;
        hull.pop();
      }
      hull.push({ point, index });
    };
    if (left.station < this.at(first).station) add(left, first - 1);
    for (let index = first; index <= last; index += 1) add(this.at(index), index);
    if (right.station > this.at(last).station) add(right, last + 1);
    for (const [side, { point, index }] of hull.entries()) {
      const next = hull[side + 1];
      if (!next) continue;
      for (let under = index + 1; under < next.index; under += 1) this.offer(under, point, next.point);
    }
  }

  /**
   * Both ends inside segments, the full length apart: the height over a point is a quadratic of where the edge starts, and its best start
   * may lie between the positions already tried.
   */
  private slideBetween(from: Nm, to: Nm, leftSegment: number, rightSegment: number): void {
    const ends = (start: Nm) => ({
      left: { station: start, elevation: this.heightOn(leftSegment, start) },
      right: { station: start + this.length, elevation: this.heightOn(rightSegment, start + this.length) },
    });
    const first = ends(from);
    const last = ends(to);
    const span = to - from;
    const leftRise = (last.left.elevation - first.left.elevation) / span;
    const apartRise = (last.right.elevation - first.right.elevation) / span - leftRise;
    // Over a point, with the start t past `from`: left(t) + apart(t) · (point − from − t) / length, both linear in t.
    if (apartRise <= 0) return;
    const apart = first.right.elevation - first.left.elevation;
    for (let index = leftSegment + 1; index <= rightSegment; index += 1) {
      const reach = this.at(index).station - from;
      const best = (leftRise * this.length + apartRise * reach - apart) / (2 * apartRise);
      if (best <= 0 || best >= span) continue;
      const { left, right } = ends(from + best);
      if (left.station < this.at(index).station && right.station > this.at(index).station) this.offer(index, left, right);
    }
  }

  /** Tries every position in which an end meets a point, and the best ones between. */
  search(): void {
    const start = this.at(0).station;
    const end = this.at(this.points.length - 1).station;
    if (end - start <= this.length) {
      this.layOver(this.at(0), 0, this.points.length - 1, this.at(this.points.length - 1));
      return;
    }
    const lastStart = end - this.length;
    const starts = this.points
      .flatMap(({ station }) => [station, station - this.length])
      .filter((at) => at >= start && at <= lastStart);
    const positions = [...new Set([...starts, lastStart])].sort((a, b) => a - b);
    let leftSegment = 0;
    let rightSegment = 0;
    let work = 0;
    for (const [order, from] of positions.entries()) {
      const to = from + this.length;
      while (leftSegment < this.points.length - 2 && this.at(leftSegment + 1).station <= from) leftSegment += 1;
      while (rightSegment < this.points.length - 2 && this.at(rightSegment + 1).station < to) rightSegment += 1;
      work += rightSegment - leftSegment + 1;
      if (work > MOST_WORK) {
        throw new AnalysisError('profile-too-dense', 'Too many stations stand under one straightedge.', {
          points: this.points.length,
        });
      }
      const left = { station: from, elevation: this.heightOn(leftSegment, from) };
      const right = { station: to, elevation: this.heightOn(rightSegment, to) };
      this.layOver(left, leftSegment + 1, rightSegment, right);
      const next = positions[order + 1];
      if (next !== undefined) {
        // An end that meets a point goes on into the next segment, and there is one: this was not the last position.
        const after = this.at(rightSegment + 1).station <= to ? rightSegment + 1 : rightSegment;
        this.slideBetween(from, next, leftSegment, after);
      }
    }
  }

  /** Every point whose gap no neighbour's exceeds; of a level stretch of equal gaps the first. */
  places(): StraightedgePlace[] {
    return this.best.flatMap((place, index) => {
      if (!place) return [];
      const before = this.best[index - 1]?.gap ?? 0;
      const after = this.best[index + 1]?.gap ?? 0;
      return place.gap > before && place.gap >= after ? [place] : [];
    });
  }
}

/**
 * Lays a straightedge on a profile and finds the gaps under it.
 *
 * The edge rests on two supports anywhere on the profile, stations or between, no further apart than `length`, and the profile is nowhere
 * above it between them; gaps are measured strictly between the supports, never under an overhang. The profile is one straight run and is cut
 * at its steps; a piece shorter than the edge gets an edge of its own length. The result does not change with any straight line added to
 * the profile, nor walked backwards.
 *
 * `places` are all local worst ones, largest first, `from` and `to` the supports. `tooSparse`: stations stand further apart than half the length,
 * or fewer than two stand at all, and the profile cannot show what the edge would.
 * @returns nm, fractional
 * @throws AnalysisError 'not-finite' | 'not-positive' | 'out-of-range' | 'profile-not-in-order' | 'profile-too-dense'
 */
export function straightedge(profile: ProfilePoint[], length: Nm): StraightedgeResult {
  const edge = positiveLength('length', length);
  const points = checkedProfile('the profile', profile);
  const pieces = cutAtSteps(points);
  const apart = points.map(({ station }, index) => station - (points[index - 1]?.station ?? station));
  const places = pieces.flatMap((piece) => {
    const laid = new EdgeOverPiece(piece, edge);
    laid.search();
    return laid.places();
  });
  places.sort((a, b) => b.gap - a.gap || a.at - b.at);
  for (const { gap } of places) inRange('gap', gap);
  const stands = new Set(points.map(({ station }) => station)).size;
  return { worst: places[0] ?? null, places, tooSparse: stands < 2 || apart.some((distance) => distance > edge / 2) };
}
