import {
  AnalysisError,
  lineOffset,
  stationsAlong,
  traceOutline,
  type Nm,
  type OutlineRun,
  type PlanPoint,
  type Station as Laid,
} from '@/analysis';
import type { Run, Station } from '@/shared/api/footing-schemas';
import type { Rail } from '@/shared/records';
import type { FootingRow } from '../../entities/footings';
import { notPossible } from '../../errors';

/** What of a footing its stations follow from. */
export type Geometry = Pick<FootingRow, 'planGrade' | 'width' | 'wallThickness' | 'measuredOn' | 'rails'>;

/** A place on a run, `along` from its start (nm). */
export interface Place {
  runId: string;
  along: Nm;
}

/** A station as the outline has it, before it has an id. */
export type LaidStation = Pick<Station, 'runId' | 'at' | 'corner' | 'step' | 'planGrade' | 'x' | 'y' | 'points'>;

/** The plan reaches no further than the contract's coordinates, nor a grade further than its lengths. */
const FURTHEST: Nm = 1_000_000_000_000;
const HIGHEST: Nm = 10_000_000_000_000;
/** Further apart than any run is long: nothing is put between. */
const NOTHING_BETWEEN: Nm = FURTHEST * 10;

/**
 * Corners, both sides of every step, and the places asked for between them, with plan grade and the points where the rod stands.
 *
 * The taped line is whatever face it was taped on; the centre of the footing and its two rails, which stand over the footing's
 * faces, lie beside it and are mitred at corners. A run's own width moves no rail: forms meet at one width at a corner.
 * @param between places on runs, none of them at a corner or a step
 * @throws ApiError 'not-possible' for an outline on which no station can stand
 */
export function layStations(geometry: Geometry, runs: readonly Run[], between: readonly Place[]): LaidStation[] {
  try {
    return lay(geometry, runs, between);
  } catch (error) {
    if (error instanceof AnalysisError) throw notPossible('runs', error.code, error.message, error.details);
    throw error;
  }
}

function lay(geometry: Geometry, runs: readonly Run[], between: readonly Place[]): LaidStation[] {
  const offsets = railOffsets(geometry);
  const fixed = alongLines(runs, offsets);
  // A place between is laid as a step of no height, which stands just where it is put.
  const marked = runs.map((run) => ({
    ...run,
    steps: between.filter(({ runId }) => runId === run.id).map(({ along }) => ({ id: run.id, at: along, by: 0 })),
  }));
  const placed = alongLines(marked, offsets).filter(({ laid }) => laid.corner === null && laid.step === 'before');
  const grade = gradeAlong(geometry.planGrade, runs);
  const stations = [...fixed, ...placed.map(({ laid, points }) => ({ laid: { ...laid, step: null }, points }))].map(
    ({ laid, points }) => ({
      runId: laid.run,
      at: laid.station,
      corner: laid.corner,
      step: laid.step,
      planGrade: grade(laid),
      ...(centreOf(points) ?? { x: laid.x, y: laid.y }),
      points: points.filter(({ wanted }) => wanted).map(({ rail, x, y }) => ({ rail, x, y })),
    }),
  );
  refuseBeyondPlan(stations);
  return stations.sort((a, b) => a.at - b.at || stepOrder(a) - stepOrder(b));
}

/** Equal parts between corners and steps, no longer than the spacing. */
export function placesBetween(runs: readonly Run[], spacing: Nm): Place[] {
  const starts = runStarts(runs);
  return stationsAlong(runs.map(outlineRun), spacing)
    .filter(({ corner, step }) => corner === null && step === null)
    .map(({ run, station }) => ({ runId: run, along: station - (starts.get(run) ?? 0) }));
}

/** How far along the walk each run starts. */
export function runStarts(runs: readonly Pick<Run, 'id' | 'length'>[]): Map<string, Nm> {
  const starts = new Map<string, Nm>();
  let walked = 0;
  for (const { id, length } of runs) {
    starts.set(id, walked);
    walked += length;
  }
  return starts;
}

interface RailOffset {
  rail: Rail;
  /** Outward from the taped line, nm. */
  outward: Nm;
  /** Shot there; the centre of a footing with two rails is drawn only. */
  wanted: boolean;
}

function railOffsets({ width, wallThickness, measuredOn, rails }: Geometry): RailOffset[] {
  const toCentre = -lineOffset(measuredOn, { wallWidth: wallThickness, footingWidth: width });
  const centre: RailOffset = { rail: 'centre', outward: toCentre, wanted: rails === 'centre' };
  if (rails === 'centre') return [centre];
  return [
    centre,
    { rail: 'outer', outward: toCentre + width / 2, wanted: true },
    { rail: 'inner', outward: toCentre - width / 2, wanted: true },
  ];
}

interface Placed {
  laid: Laid;
  points: (PlanPoint & { rail: Rail; wanted: boolean })[];
}

function alongLines(runs: readonly Run[], offsets: readonly RailOffset[]): Placed[] {
  const outline = runs.map(outlineRun);
  const lines = offsets.map(({ outward, ...offset }) => ({
    ...offset,
    outward,
    along: stationsAlong(outline, NOTHING_BETWEEN, outward === 0 ? {} : { halfWidth: Math.abs(outward) }),
  }));
  return stationsAlong(outline, NOTHING_BETWEEN).map((laid, index) => ({
    laid,
    points: lines.map(({ rail, wanted, outward, along }) => {
      const at = along[index] ?? laid;
      const { x, y } = (outward > 0 ? at.outer : outward < 0 ? at.inner : at) ?? at;
      return { rail, wanted, x, y };
    }),
  }));
}

function outlineRun({ id, length, turn, steps }: Run): OutlineRun {
  return { id, length, turn, steps: steps.map(({ at, by }) => ({ at, by })) };
}

function centreOf(points: Placed['points']): PlanPoint | undefined {
  const centre = points.find(({ rail }) => rail === 'centre');
  return centre && { x: centre.x, y: centre.y };
}

/**
 * Plan grade at a station: that of the start, and every step walked over. Coming back to the start of a closed outline over a
 * step at its very end, the grade before that step is the one walked with.
 */
function gradeAlong(start: Nm, runs: readonly Run[]): (laid: Pick<Laid, 'station' | 'step'>) => Nm {
  const starts = runStarts(runs);
  const end = runs.reduce((sum, { length }) => sum + length, 0);
  const steps = runs.flatMap((run) => run.steps.map(({ at, by }) => ({ at: (starts.get(run.id) ?? 0) + at, by })));
  const sum = (which: (at: Nm) => boolean) => steps.reduce((total, { at, by }) => (which(at) ? total + by : total), 0);
  const startsOverAStep = steps.some(({ at }) => at === 0);
  const endsOverAStep = steps.some(({ at }) => at === end);
  const closed = Math.abs(traceOutline(runs.map(outlineRun)).closure.angle) < 1e-9;
  return ({ station, step }) => {
    if (station === 0 && closed && endsOverAStep && !startsOverAStep)
      return step === 'before' ? start + sum((at) => at < end) : start;
    return start + sum((at) => at < station || (at === station && step === 'after'));
  };
}

function stepOrder({ step }: Pick<LaidStation, 'step'>): number {
  return step === 'after' ? 1 : 0;
}

function refuseBeyondPlan(stations: readonly LaidStation[]): void {
  for (const { at, planGrade, x, y, points } of stations) {
    if (Math.abs(planGrade) > HIGHEST) throw notPossible('runs', 'grade-out-of-range', 'The steps leave the range of grades.');
    const furthest = Math.max(at, ...[{ x, y }, ...points].flatMap((point) => [Math.abs(point.x), Math.abs(point.y)]));
    if (furthest > FURTHEST)
      throw notPossible('runs', 'outline-too-large', 'The outline reaches further than a plan does.', { most: FURTHEST });
  }
}
