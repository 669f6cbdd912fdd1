import { bedVolume, type CourseGroup, type Nm, type WallRun } from '@/analysis';
import type { BedRule } from '../rules';

const CUBIC_METRES_PER_CUBIC_NM = 1e-27;

/** What a first course at one height takes. Volumes in cubic metres; beds and lengths in nm. */
export interface CourseAt {
  elevation: Nm;
  /** As laid: nowhere thinner than the rule's least, over the bedded part of the width. */
  bedVolume: number;
  /** Concrete to take off so that the bed is nowhere thinner than the least. */
  grindVolume: number;
  grindLength: Nm;
  /** Before grinding. */
  leastBed: Nm;
  mostBed: Nm;
  tooThin: boolean;
  tooThick: boolean;
}

/** The runs of a group, each lifted by the whole courses that its step lies below the highest. */
export function liftedRuns(group: CourseGroup, runs: WallRun[], rule: BedRule): WallRun[] {
  return runs
    .filter((run) => group.runs.includes(run.id))
    .map((run) => {
      const lift = (group.coursesDown[run.id] ?? 0) * (rule.courseHeight ?? 0);
      return {
        ...run,
        planGrade: run.planGrade + lift,
        profile: run.profile.map((point) => ({ ...point, elevation: point.elevation + lift })),
      };
    });
}

/**
 * Bed and grinding for a course whose bottom is at `elevation` on the group's highest step.
 * Grinding starts where the bed would be thinner than the least, so both volumes are taken against the line `elevation − least`.
 */
export function courseAt(group: CourseGroup, runs: WallRun[], rule: BedRule, elevation: Nm): CourseAt {
  const lifted = liftedRuns(group, runs, rule);
  const { below, above, aboveLength } = bedVolume(lifted, elevation - rule.least);
  const area = lifted.reduce(
    (sum, run) => sum + run.width * ((run.profile.at(-1)?.station ?? 0) - (run.profile[0]?.station ?? 0)),
    0,
  );
  const surface = lifted.flatMap((run) => run.profile.map((point) => point.elevation));
  const leastBed = elevation - Math.max(...surface);
  const mostBed = elevation - Math.min(...surface);
  return {
    elevation,
    bedVolume: (below + rule.least * area * CUBIC_METRES_PER_CUBIC_NM) * rule.beddedFraction,
    grindVolume: above,
    grindLength: aboveLength,
    leastBed,
    mostBed,
    tooThin: leastBed < rule.least,
    tooThick: mostBed > rule.most,
  };
}
