import { AnalysisError } from './analysis-error';
import { inRange, lengthFromZero, notNegative, positiveLength } from './check-input';
import { checkedProfile, positivePart, segmentsOf, type Segment } from './profile';
import type { ConcreteRun, FootingConcrete, ProfilePoint } from './types';
import { CUBIC_METRES_PER_CUBIC_YARD, NM3_PER_CUBIC_METRE, type Nm } from './units';

/** Both profiles of a run must begin and end together, to a micrometre. */
const TOGETHER: Nm = 1_000;

interface Thickness {
  from: Nm;
  to: Nm;
  /** Just after `from`, and just before `to`. */
  first: Nm;
  last: Nm;
}

/** A profile read from left to right, one straight piece at a time. */
function heightReader(profile: readonly ProfilePoint[]): (from: Nm, to: Nm) => { first: Nm; last: Nm } {
  const pieces = segmentsOf(profile).filter(({ length }) => length > 0);
  let piece = 0;
  const heightOn = ({ from, to, length }: Segment, station: Nm) => {
    if (station <= from.station) return from.elevation;
    return station >= to.station
      ? to.elevation
      : from.elevation + (to.elevation - from.elevation) * ((station - from.station) / length);
  };
  return (from, to) => {
    while (piece < pieces.length - 1 && (pieces[piece]?.to.station ?? 0) <= from) piece += 1;
    const on = pieces[piece];
    return on ? { first: heightOn(on, from), last: heightOn(on, to) } : { first: 0, last: 0 };
  };
}

/** Top less subgrade between all breakpoints of either. */
function thicknesses(subgrade: readonly ProfilePoint[], top: readonly ProfilePoint[]): Thickness[] {
  const stations = [...new Set([...subgrade, ...top].map(({ station }) => station))].sort((a, b) => a - b);
  const under = heightReader(subgrade);
  const over = heightReader(top);
  return stations.slice(1).map((to, index) => {
    const from = stations[index] ?? to;
    const low = under(from, to);
    const high = over(from, to);
    return { from, to, first: high.first - low.first, last: high.last - low.last };
  });
}

/** Heights of the vertical steps of a profile, by station. */
function stepsOf(profile: readonly ProfilePoint[]): Map<Nm, Nm> {
  const steps = new Map<Nm, Nm>();
  for (const { from, to, length } of segmentsOf(profile)) {
    if (length === 0) steps.set(to.station, (steps.get(to.station) ?? 0) + to.elevation - from.elevation);
  }
  return steps;
}

/** nm² of riser seen from the side: as high as the step and as thick as the footing is deep. */
function riserArea(steps: Iterable<Nm>, planThickness: Nm): number {
  let area = 0;
  for (const height of steps) area += Math.abs(height) * planThickness;
  return area;
}

/** Both ends of every straight piece; the far end of one and the near end of the next are one place unless a step lies there. */
function thinPlaces(run: ConcreteRun, pieces: readonly Thickness[], limit: Nm): FootingConcrete['thin'] {
  const ends = pieces.flatMap(({ from, to, first, last }) => [
    { run: run.id, station: from, thickness: first },
    { run: run.id, station: to, thickness: last },
  ]);
  return ends.filter(
    ({ station, thickness }, index) =>
      thickness < limit && !(ends[index - 1]?.station === station && ends[index - 1]?.thickness === thickness),
  );
}

function checkedRun(run: ConcreteRun): ConcreteRun {
  const subgrade = checkedProfile(`subgrade of ${run.id}`, run.subgrade);
  const top = checkedProfile(`top of ${run.id}`, run.top);
  const ends = [subgrade[0], subgrade.at(-1), top[0], top.at(-1)].map((point) => point?.station);
  const [subgradeStart, subgradeEnd, topStart, topEnd] = ends;
  if (subgradeStart === undefined || subgradeEnd === undefined || topStart === undefined || topEnd === undefined) {
    throw new AnalysisError('profile-empty', `Run ${run.id} lacks a profile.`, { run: run.id });
  }
  if (Math.abs(subgradeStart - topStart) > TOGETHER || Math.abs(subgradeEnd - topEnd) > TOGETHER) {
    throw new AnalysisError('profiles-do-not-cover', `Subgrade and top of ${run.id} do not cover the same length.`, {
      run: run.id,
    });
  }
  return {
    id: run.id,
    width: positiveLength(`width of ${run.id}`, run.width),
    planThickness: positiveLength(`plan thickness of ${run.id}`, run.planThickness),
    subgrade,
    top,
  };
}

/**
 * Concrete of a footing from its subgrade to its top, in cubic metres.
 *
 * Profiles run on the footing's centre line, mitre to mitre, so that width × length counts each corner once; a butting strip starts at the
 * other's face. Thickness is top − subgrade, linear between the breakpoints of both profiles, negative thickness counting 0, integrated exactly.
 * A step of the top has a riser, as high as the step and as thick as the footing is deep: added to the plan volume, and to the dug one where
 * both profiles step at one place; where the subgrade steps elsewhere, the riser is already between them.
 * `sideBulge` is extra mean width on each side as dug; `waste` a fraction, 0.05 for 5 %. `thin` are the breakpoints where thickness < plan − thinBy.
 * @throws AnalysisError as for profiles; 'profile-empty' | 'profiles-do-not-cover' | 'fraction-over-one' (details run or waste)
 */
export function footingConcrete(runs: ConcreteRun[], options: { waste: number; sideBulge: Nm; thinBy: Nm }): FootingConcrete {
  const waste = notNegative('waste', options.waste);
  if (waste > 1) throw new AnalysisError('fraction-over-one', 'Waste is a fraction of the volume: 0.05 for 5 %.', { waste });
  const bulge = 2 * lengthFromZero('sideBulge', options.sideBulge);
  const thinBy = lengthFromZero('thinBy', options.thinBy);
  let plan = 0;
  let dug = 0;
  const thin: FootingConcrete['thin'] = [];
  for (const run of runs.map(checkedRun)) {
    const pieces = thicknesses(run.subgrade, run.top);
    const topSteps = stepsOf(run.top);
    const subgradeSteps = stepsOf(run.subgrade);
    const together = [...topSteps].filter(([station]) => subgradeSteps.has(station)).map(([, height]) => height);
    const length = (run.top.at(-1)?.station ?? 0) - (run.top[0]?.station ?? 0);
    plan += (length * run.planThickness + riserArea(topSteps.values(), run.planThickness)) * run.width;
    const side = pieces.reduce((sum, { from, to, first, last }) => sum + positivePart(first, last, to - from).area, 0);
    dug += (side + riserArea(together, run.planThickness)) * (run.width + bulge);
    thin.push(...thinPlaces(run, pieces, run.planThickness - thinBy));
  }
  const asDugVolume = inRange('asDugVolume', dug / NM3_PER_CUBIC_METRE);
  return {
    planVolume: inRange('planVolume', plan / NM3_PER_CUBIC_METRE),
    asDugVolume,
    orderVolume: inRange('orderVolume', asDugVolume * (1 + waste)),
    thin,
  };
}

/** Cubic yards of a volume in cubic metres; 1 yd³ = 0.9144³ m³ exactly. @throws AnalysisError 'not-finite' */
export function cubicYards(cubicMetres: number): number {
  return inRange('cubic yards', notNegative('volume', cubicMetres) / CUBIC_METRES_PER_CUBIC_YARD);
}
