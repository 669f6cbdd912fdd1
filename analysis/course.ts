import { AnalysisError } from './analysis-error';
import { checkedRuns, runAgainstLine } from './bed-volume';
import { inRange, lengthFromZero, nanometres, notNegative, positive, positiveLength } from './check-input';
import { cheapestHeight, type LiftedRun } from './least-material';
import { segmentsOf } from './profile';
import type { BedRule, CourseGroup, CourseOption, FlaggedBed, WallRun } from './types';
import { NM3_PER_CUBIC_METRE, type Nm } from './units';

export { bedVolume } from './bed-volume';
export { materials, shimPack, type MaterialNeed } from './materials';

interface CheckedRule extends BedRule {
  weights: { bed: number; grind: number };
}

/** Grinding a litre of concrete is taken to be worth ten litres of bed, unless said otherwise. */
const DEFAULT_WEIGHTS = { bed: 1, grind: 10 };

function checkedRule(rule: BedRule): CheckedRule {
  const least = lengthFromZero('least', rule.least);
  const most = lengthFromZero('most', rule.most);
  if (least > most) throw new AnalysisError('bed-rule-contradicts', 'The least bed is thicker than the most.', { least, most });
  const beddedFraction = positive('beddedFraction', rule.beddedFraction);
  if (beddedFraction > 1) {
    throw new AnalysisError('fraction-over-one', 'No more than the whole width can be bedded.', { beddedFraction });
  }
  const weights = rule.weights ?? DEFAULT_WEIGHTS;
  return {
    least,
    most,
    nominal: nanometres('nominal', rule.nominal),
    grindMost: lengthFromZero('grindMost', rule.grindMost),
    beddedFraction,
    courseHeight: rule.courseHeight === null ? null : positiveLength('courseHeight', rule.courseHeight),
    weights: { bed: notNegative('weights.bed', weights.bed), grind: notNegative('weights.grind', weights.grind) },
  };
}

/** Whole courses that `under` lies below `top`, or null when it is not a whole number of them. */
function wholeCourses(top: Nm, under: Nm, courseHeight: Nm | null): number | null {
  if (top === under) return 0;
  if (courseHeight === null) return null;
  const courses = Math.round((top - under) / courseHeight);
  return Math.abs(top - under - courses * courseHeight) < 0.5 ? courses : null;
}

interface Members {
  planGrade: Nm;
  lifted: (LiftedRun & { coursesDown: number })[];
}

/** The highest run takes with it all that lie whole courses under it; what is left groups again about its own highest. */
function groupRuns(runs: readonly WallRun[], courseHeight: Nm | null): Members[] {
  const groups: Members[] = [];
  let left = runs;
  while (left.length > 0) {
    const planGrade = left.reduce((top, run) => Math.max(top, run.planGrade), -Infinity);
    const joined = (run: WallRun) => wholeCourses(planGrade, run.planGrade, courseHeight);
    groups.push({
      planGrade,
      lifted: left.flatMap((run) => {
        const coursesDown = joined(run);
        return coursesDown === null ? [] : [{ run, coursesDown, lift: coursesDown * (courseHeight ?? 0) }];
      }),
    });
    left = left.filter((run) => joined(run) === null);
  }
  return groups;
}

function flaggedBeds({ lifted }: Members, elevation: Nm, rule: CheckedRule): FlaggedBed[] {
  return lifted.flatMap(({ run, lift }) =>
    run.profile.flatMap((point): FlaggedBed[] => {
      const bed = elevation - (point.elevation + lift);
      if (bed >= rule.least && bed <= rule.most) return [];
      const thin = bed < rule.least;
      return [
        {
          run: run.id,
          station: point.station,
          bed,
          why: thin ? 'too-thin' : 'too-thick',
          grindable: thin && rule.least - bed <= rule.grindMost,
        },
      ];
    }),
  );
}

function planArea(run: WallRun): number {
  return segmentsOf(run.profile).reduce((sum, { length }) => sum + length * run.width, 0);
}

function optionAt(
  kind: CourseOption['kind'],
  elevation: Nm,
  group: Members,
  extremes: { low: Nm; high: Nm },
  rule: CheckedRule,
): CourseOption {
  let bed = 0;
  let grind = 0;
  let grindLength = 0;
  for (const { run, lift } of group.lifted) {
    // Ground down to the least bed where it would be thinner: over that line is dust, under it is bed, and the least bed is everywhere.
    const { below, above, aboveLength } = runAgainstLine(run, elevation - rule.least, lift);
    bed += below + planArea(run) * rule.least;
    grind += above;
    grindLength += aboveLength;
  }
  return {
    kind,
    elevation,
    bedVolume: inRange('bedVolume', (bed * rule.beddedFraction) / NM3_PER_CUBIC_METRE),
    grindVolume: inRange('grindVolume', grind / NM3_PER_CUBIC_METRE),
    grindLength,
    leastBed: elevation - extremes.high,
    mostBed: elevation - extremes.low,
    flagged: flaggedBeds(group, elevation, rule),
  };
}

/** Least weighted material with every bed at most `most` and every grind at most `grindMost`; where both cannot be, least material alone. */
function leastMaterialElevation(group: Members, extremes: { low: Nm; high: Nm }, rule: CheckedRule): Nm {
  const height = cheapestHeight(group.lifted, { fill: rule.weights.bed * rule.beddedFraction, grind: rule.weights.grind });
  const best = Math.round(height ?? extremes.high) + rule.least;
  const from = extremes.high - rule.grindMost + rule.least;
  const to = extremes.low + rule.most;
  return from > to ? best : Math.min(Math.max(best, from), to);
}

function planGroup(group: Members, rule: CheckedRule): CourseGroup {
  const surfaces = group.lifted.flatMap(({ run, lift }) => run.profile.map(({ elevation }) => elevation + lift));
  const extremes = {
    low: surfaces.reduce((low, z) => Math.min(low, z), Infinity),
    high: surfaces.reduce((high, z) => Math.max(high, z), -Infinity),
  };
  const from = extremes.high + rule.least;
  const to = extremes.low + rule.most;
  const option = (kind: CourseOption['kind'], elevation: Nm) => optionAt(kind, elevation, group, extremes, rule);
  return {
    runs: group.lifted.map(({ run }) => run.id),
    coursesDown: Object.fromEntries(group.lifted.map(({ run, coursesDown }) => [run.id, coursesDown])),
    window: from <= to ? { from, to } : null,
    shortBy: Math.max(0, from - to),
    options: [
      option('no-grinding', from),
      option('least-material', leastMaterialElevation(group, extremes, rule)),
      option('plan-height', group.planGrade + rule.nominal),
    ],
  };
}

/**
 * Heights at which the first course can run.
 *
 * Runs whose plan grade lies whole courses under the highest join it, their surfaces lifted by as many; the rest group again about their own
 * highest run, with an elevation of their own. Per group, the `window` holds every elevation with no grinding and no flagged bed,
 * [highest surface + least, lowest surface + most], its ends included; null, and `shortBy` how much, where there is none.
 *
 * Elevations are those over the highest run of the group: a run m courses down has its first course m · courseHeight lower. Options: no-grinding,
 * least-material (weights 1 for bed and 10 for grinding unless the rule says), plan-height. `leastBed` and `mostBed` are course − surface before
 * grinding; a bed as laid is never under `least`, since the surface is ground there. Volumes in cubic metres, bed times `beddedFraction`.
 * @throws AnalysisError as for runs and lengths; 'bed-rule-contradicts' | 'fraction-over-one' | 'profile-empty' (details run)
 */
export function planCourse(runs: WallRun[], rule: BedRule): CourseGroup[] {
  const bedRule = checkedRule(rule);
  const checked = checkedRuns(runs);
  for (const { id, profile } of checked) {
    if (profile.length === 0) throw new AnalysisError('profile-empty', `Run ${id} has no surface.`, { run: id });
  }
  return groupRuns(checked, bedRule.courseHeight).map((group) => planGroup(group, bedRule));
}

export type WallAnswer = 'yes' | 'after-grinding' | 'no';

/**
 * Can the wall be set? A window in every group: yes. Else, if some height of each group leaves every thin place grindable and none too thick
 * (its window is short by no more than may be ground): after grinding. Else no.
 * @throws AnalysisError 'no-groups' | 'not-finite' | 'negative'
 */
export function canWallBeSet(groups: readonly CourseGroup[], rule: Pick<BedRule, 'grindMost'>): WallAnswer {
  const grindMost = lengthFromZero('grindMost', rule.grindMost);
  if (groups.length === 0) throw new AnalysisError('no-groups', 'There is nothing to set a wall on.');
  if (groups.every(({ window }) => window !== null)) return 'yes';
  return groups.every(({ shortBy }) => shortBy <= grindMost) ? 'after-grinding' : 'no';
}
