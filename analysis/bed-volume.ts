import { inRange, nanometres, positiveLength } from './check-input';
import { checkedProfile, positivePart, segmentsOf } from './profile';
import type { BedVolume, WallRun } from './types';
import { NM3_PER_CUBIC_METRE, type Nm } from './units';

/** Area under and over a level line along one run's width, and the length of run above it. */
export interface AgainstLine {
  /** nm² times the width: nm³. */
  below: number;
  above: number;
  aboveLength: Nm;
}

/** One run against a line at `height`, `lift` added to its surface; exact, cut at every crossing. */
export function runAgainstLine(run: WallRun, height: Nm, lift: Nm = 0): AgainstLine {
  const total: AgainstLine = { below: 0, above: 0, aboveLength: 0 };
  for (const { from, to, length } of segmentsOf(run.profile)) {
    const over0 = from.elevation + lift - height;
    const over1 = to.elevation + lift - height;
    const above = positivePart(over0, over1, length);
    total.below += positivePart(-over0, -over1, length).area * run.width;
    total.above += above.area * run.width;
    total.aboveLength += above.length;
  }
  return total;
}

/** Runs with every number checked. @throws AnalysisError 'not-finite' | 'not-positive' | 'out-of-range' | 'profile-not-in-order' */
export function checkedRuns(runs: readonly WallRun[]): WallRun[] {
  return runs.map((run) => ({
    id: run.id,
    width: positiveLength(`width of ${run.id}`, run.width),
    planGrade: nanometres(`plan grade of ${run.id}`, run.planGrade),
    profile: checkedProfile(`run ${run.id}`, run.profile),
  }));
}

/**
 * Exact volume between the surface and a level course line at full width: `below` the line to fill, `above` it to grind, in cubic metres;
 * `aboveLength` is the length over the line, nm. The surface is piecewise linear and each piece is cut at its zero crossing, so that
 * below − above = ∫(course − surface) · width.
 * @throws AnalysisError as for runs, and 'not-finite' | 'out-of-range' for the elevation
 */
export function bedVolume(runs: WallRun[], courseElevation: Nm): BedVolume {
  const line = nanometres('courseElevation', courseElevation);
  const total: AgainstLine = { below: 0, above: 0, aboveLength: 0 };
  for (const run of checkedRuns(runs)) {
    const part = runAgainstLine(run, line);
    total.below += part.below;
    total.above += part.above;
    total.aboveLength += part.aboveLength;
  }
  return {
    below: inRange('below', total.below / NM3_PER_CUBIC_METRE),
    above: inRange('above', total.above / NM3_PER_CUBIC_METRE),
    aboveLength: total.aboveLength,
  };
}
