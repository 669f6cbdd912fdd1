import { lengthFromZero, nanometres } from './check-input';
import { reduceChain, splitIntoChains, type KnownMarks, type ReducedSeries } from './level-chains';
import { laserStates, liveSeries } from './level-series';
import type { LevelNotes, LevelReduction, Reading, ReducedShot } from './types';
import type { Nm } from './units';

/** Ids of the shots that decide: the last of each point, by `order` where all of its shots have one, else by series and place. */
function decidingShots(shots: readonly Reading[]): Set<string> {
  const byPoint = new Map<string, Reading[]>();
  for (const shot of shots) byPoint.set(shot.point, [...(byPoint.get(shot.point) ?? []), shot]);
  const deciding = new Set<string>();
  for (const same of byPoint.values()) {
    const ordered = same.every(({ order }) => order !== undefined);
    const last = same.reduce((best, shot) => (!ordered || (shot.order ?? 0) >= (best.order ?? 0) ? shot : best));
    deciding.add(last.id);
  }
  return deciding;
}

function reducedShots(
  { live, hi, correction, useAdjusted, chainDoubted }: ReducedSeries,
  deciding: ReadonlySet<string>,
): ReducedShot[] {
  const states = laserStates(live);
  return live.readings
    .filter(({ kind }) => kind === 'shot')
    .map(({ id, point, reading }) => {
      const elevation = hi === null ? null : hi - reading;
      const adjusted = elevation === null ? null : elevation + correction;
      return {
        id,
        series: live.id,
        point,
        elevation,
        adjusted,
        judged: useAdjusted ? adjusted : elevation,
        laser: chainDoubted ? 'doubted' : (states.get(id) ?? 'unchecked'),
        decides: deciding.has(id),
      };
    });
}

/**
 * Reduces level notes by height of instrument, the way a field book is.
 *
 * - Struck readings are absent: the result is that of the notes without them.
 * - HI = elevation of the mark + mean backsight; several backsights on it are one, to a whole nm, and `backsightSpread` is their range.
 *   Without a live backsight, or on a mark of unknown elevation, elevations are null and the notes stay.
 * - `checks`: on the backsight's own mark they test the laser (error = HI − reading − elevation, |error| = limit holds), on another known
 *   mark the marks. Checks on marks that nobody knows say nothing and are left out.
 * - A chain runs on while each series backsights the point that the one before foresighted. Its page check is ΣBS − ΣFS = last − first;
 *   without a closing foresight the last check stands for it, and without that the last HI.
 * - A chain with a turning point that closes on a benchmark has a misclosure m, and series i of n takes −i·m/n, side shots too, to a whole
 *   nm. Judged elevations are adjusted where it holds; where it fails they are raw and doubted from the second series on, and so is whatever
 *   starts from its turning points later.
 * - `turningPoints` are foresights on points that are no benchmark, or that the next series backsights.
 *
 * Source: height-of-instrument and page check as in NAVEDTRA 14071 and FM 5-233; equal adjustment by set-ups as in Ghilani & Wolf,
 * Elementary Surveying, 14th ed., problem 5.12.
 * @throws AnalysisError 'not-finite' | 'out-of-range' | 'negative' | 'unknown-reading-kind'
 */
export function reduceLevelNotes(notes: LevelNotes): LevelReduction {
  const benchmarks = new Map(
    Object.entries(notes.benchmarks).map(([point, elevation]) => [point, nanometres(`elevation of ${point}`, elevation)]),
  );
  const allowable =
    notes.allowableMisclosure === undefined ? undefined : lengthFromZero('allowableMisclosure', notes.allowableMisclosure);
  const known: KnownMarks = { benchmarks, turningPoints: new Map() };
  const live = notes.series.map(liveSeries);
  const reduced = splitIntoChains(live).map((chain) => reduceChain(chain, known, allowable));
  const series = reduced.flatMap((chain) => chain.series);
  const deciding = decidingShots(live.flatMap(({ readings }) => readings.filter(({ kind }) => kind === 'shot')));
  return {
    series: series.map(({ live: { id, backsightSpread }, hi, checks }) => ({ id, hi, backsightSpread, checks })),
    shots: series.flatMap((one) => reducedShots(one, deciding)),
    turningPoints: series.flatMap(({ turningPoints, correction }) =>
      turningPoints.map(({ point, elevation }) => ({ point, elevation, adjusted: elevation + correction })),
    ),
    chains: reduced.map(({ chain }) => chain),
  };
}

/** The reading that puts the foot of the rod on plan grade; negative when plan grade is above the beam. */
export function gradeRod(hi: Nm, planGrade: Nm): Nm {
  return nanometres('hi', hi) - nanometres('planGrade', planGrade);
}

/**
 * What the reading asks of the point: a reading above the grade rod is low, so raise. None only at exact equality; how much matters is for
 * `judge` to say.
 * @returns by: nm, never negative
 */
export function cutFill(reading: Nm, grade: Nm): { action: 'raise' | 'lower' | 'none'; by: Nm } {
  const low = nanometres('reading', reading) - nanometres('gradeRod', grade);
  if (low === 0) return { action: 'none', by: 0 };
  return low > 0 ? { action: 'raise', by: low } : { action: 'lower', by: -low };
}
