import { shotUncertainty, type Nm } from '@/analysis';
import type { ReadingRecord, SeriesRecord, SetupRecord } from '../records';
import { readingGraduation } from './reading-graduation';
import type { Place } from './round-targets';
import type { RoundContext } from './round-state';

/** Plan distances that stand in where nobody tapped where the laser stands. */
export interface PlanReach {
  /** From the middle of the footing to its farthest target, nm. */
  farthest: Nm;
}

/** The middle is that of the box around all targets, so that closely set stations do not pull it to their side. */
export function planReach(places: readonly Place[]): PlanReach {
  if (places.length === 0) return { farthest: 0 };
  const xs = places.map((place) => place.x);
  const ys = places.map((place) => place.y);
  const middle = { x: (Math.min(...xs) + Math.max(...xs)) / 2, y: (Math.min(...ys) + Math.max(...ys)) / 2 };
  return { farthest: Math.max(...places.map((place) => Math.hypot(place.x - middle.x, place.y - middle.y))) };
}

/**
 * Standard uncertainties of one shot, nm: against plan grade, and of the reading alone. Null where the laser is not known.
 *
 * Read by eye: the mark that the rod is read to. With a receiver: its on-grade band (the whole width, fine or coarse), alone
 * when the shot was set, beside the mark when it was read. The laser's distance comes from where it stands on the plan; when
 * nobody tapped that, it is taken as if it stood in the middle of the footing and the target were its farthest one, which
 * never flatters a shot from the middle. A benchmark whose distance is not known counts as that far away too.
 */
export function roundShotUncertainty(
  shot: { record: Pick<ReadingRecord, 'how' | 'receiver'>; place: Place; series: SeriesRecord; setup: SetupRecord },
  context: RoundContext,
  reach: PlanReach,
): { absolute: Nm; relative: Nm } | null {
  const { record, place, series, setup } = shot;
  const laser = context.lasers.find((candidate) => candidate.id === setup.laserId);
  const rod = context.rods.find((candidate) => candidate.id === series.rodId);
  if (!laser || !rod) return null;
  const band = { fine: laser.receiverFine, coarse: laser.receiverCoarse };
  // A set shot that does not say how its receiver stood is taken at the wider band.
  const receiver = record.receiver ?? (record.how === 'set' ? 'coarse' : null);
  const { absolute, relative } = shotUncertainty({
    graduation: readingGraduation(context.job, rod),
    // Papers give the whole width of the band; the maths takes how far it reaches to either side.
    receiverBand: receiver ? band[receiver] / 2 : undefined,
    set: record.how === 'set',
    laserAccuracy: laser.accuracy,
    laserAccuracyAt: laser.accuracyAt,
    distance: setup.stand ? Math.hypot(place.x - setup.stand.x, place.y - setup.stand.y) : reach.farthest,
    benchmarkDistance: series.benchmarkDistance ?? reach.farthest,
  });
  return { absolute, relative };
}
