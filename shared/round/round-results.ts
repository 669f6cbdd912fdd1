import {
  fitPlane,
  planCourse,
  screenShots,
  straightedge,
  tiltAgainstLaser,
  type CourseGroup,
  type Nm,
  type PlaneFit,
  type StraightedgePlace,
  type Suspect,
  type TiltAgainstLaser,
  type WallRun,
} from '@/analysis';
import type { RoundVerdict } from '../api/footing-schemas';
import type { Laser } from '../api/instrument-endpoints';
import type { RoundBundle } from '../api/round-endpoints';
import { RAILS, type Rail } from '../records';
import type { BedRule } from '../rules';
import type { RoundShot, RoundState, RoundTarget } from './round-state';
import { profileOf, segmentsOf, wallRunsOf, type Segment } from './wall-runs';

/** The straightedge that a footing is judged with: 10 ft, or 3 m on a metric job. */
export const STRAIGHTEDGE = { feet: 3_048_000_000, metric: 3_000_000_000 } as const;

export type WallAnswer = 'can-be-set' | 'after-grinding' | 'cannot-be-set' | 'not-yet' | 'cannot-tell';

export interface GradeAnswer {
  verdict: RoundVerdict;
  shot: number;
  of: number;
  out: number;
  close: number;
  /** The shot furthest beyond its limit, or nearest to one; null before the first. */
  worst: RoundTarget | null;
}

export interface WallResult {
  answer: WallAnswer;
  runs: WallRun[];
  groups: CourseGroup[];
}

/** How the surface is wrong, as a plane through the deviations says it. Lengths in nm. */
export interface Shape {
  fit: PlaneFit;
  /** Mean deviation: the whole footing high (positive) or low. */
  offset: Nm;
  /** Range of the plane over the stations, and over what distance along the fall. */
  drop: Nm;
  over: Nm;
  fallAzimuth: number | null;
  /** Largest |residual| left over. */
  rest: Nm;
  mostly: 'offset' | 'tilt' | 'rest' | null;
  /** Null when the laser of the shots is not known, or more than one was used. */
  againstLaser: TiltAgainstLaser | null;
}

export interface StraightedgeResult {
  segment: Segment;
  worst: StraightedgePlace | null;
  tooSparse: boolean;
}

export interface RoundResults {
  grade: GradeAnswer;
  /** Only a round of the top is asked whether the wall can be set. */
  wall: WallResult | null;
  shape: Shape | null;
  suspects: (Suspect & { target: RoundTarget })[];
  struck: { shot: RoundShot; target: RoundTarget }[];
  straightedge: { length: Nm; results: StraightedgeResult[] };
  segments: Segment[];
}

function hasDeviation(target: RoundTarget): target is RoundTarget & { deciding: RoundShot & { deviation: Nm; elevation: Nm } } {
  return target.deciding !== null && target.deciding.deviation !== null && target.deciding.elevation !== null;
}

/** How far beyond its limit a deviation lies; negative inside. */
function beyond(deviation: Nm, rule: RoundBundle['toleranceRule']): Nm {
  return deviation >= 0 ? deviation - rule.high : -deviation - rule.low;
}

function gradeAnswer(state: RoundState, rule: RoundBundle['toleranceRule']): GradeAnswer {
  const judged = state.targets.filter(hasDeviation);
  const worst = judged.reduce<(typeof judged)[number] | null>(
    (found, target) =>
      found && beyond(found.deciding.deviation, rule) >= beyond(target.deciding.deviation, rule) ? found : target,
    null,
  );
  return { verdict: state.verdict, shot: state.shot, of: state.of, out: state.out, close: state.close, worst };
}

/** A window: yes. Else every thin place grindable and none too thick: after grinding. Else no. */
function wallAnswer(state: RoundState, groups: CourseGroup[]): WallAnswer {
  if (state.verdict === 'not-yet') return 'not-yet';
  if (state.verdict === 'cannot-tell' || groups.length === 0) return 'cannot-tell';
  if (groups.every((group) => group.window !== null)) return 'can-be-set';
  const grindable = groups.every((group) => {
    if (group.window) return true;
    const least = group.options.find((option) => option.kind === 'least-material');
    return least !== undefined && least.flagged.every((place) => place.why === 'too-thin' && place.grindable);
  });
  return grindable ? 'after-grinding' : 'cannot-be-set';
}

/** What planCourse takes of a bed rule. */
export function bedRuleFor(rule: BedRule) {
  const { least, most, nominal, grindMost, beddedFraction, courseHeight } = rule;
  return { least, most, nominal, grindMost, beddedFraction, courseHeight };
}

function wallResult(bundle: RoundBundle, state: RoundState, segments: Segment[]): WallResult {
  const runs = wallRunsOf(bundle.footing, segments);
  const groups = runs.length === 0 ? [] : planCourse(runs, bedRuleFor(bundle.bedRule));
  return { answer: wallAnswer(state, groups), runs, groups };
}

function onlyLaser(bundle: RoundBundle, state: RoundState): Laser | null {
  const ids = new Set(state.series.flatMap((series) => (series.setup ? [series.setup.laserId] : [])));
  const [id] = ids;
  return ids.size === 1 ? (bundle.lasers.find((laser) => laser.id === id) ?? null) : null;
}

function shapeOf(bundle: RoundBundle, state: RoundState): Shape | null {
  const judged = state.targets.filter(hasDeviation);
  if (judged.length === 0) return null;
  const fit = fitPlane(judged.map((target) => ({ id: target.key, x: target.x, y: target.y, z: target.deciding.deviation })));
  const { offset, tilt, rest } = fit.shares;
  const largest = Math.max(offset, tilt, rest);
  const laser = onlyLaser(bundle, state);
  return {
    fit,
    offset: judged.reduce((sum, target) => sum + target.deciding.deviation, 0) / judged.length,
    drop: fit.tilt.drop,
    over: fit.tilt.slope > 0 ? fit.tilt.drop / fit.tilt.slope : 0,
    fallAzimuth: fit.tilt.fallAzimuth,
    rest: fit.points.reduce((most, point) => Math.max(most, Math.abs(point.residual)), 0),
    mostly: largest === 0 ? null : largest === offset ? 'offset' : largest === tilt ? 'tilt' : 'rest',
    againstLaser:
      laser && fit.model !== 'level' ? tiltAgainstLaser(fit, { accuracy: laser.accuracy, at: laser.accuracyAt }) : null,
  };
}

function suspectsOf(bundle: RoundBundle, state: RoundState, closed: boolean): RoundResults['suspects'] {
  return railsOf(bundle).flatMap((rail) => {
    const judged = state.targets.filter((target) => target.rail === rail).filter(hasDeviation);
    if (judged.length < 3) return [];
    const u = Math.max(...judged.map((target) => target.deciding.uncertainty.relative));
    const shots = judged.map((target) => ({
      id: target.key,
      x: target.x,
      y: target.y,
      station: target.at,
      deviation: target.deciding.deviation,
      keyed: target.deciding.record.keyed,
      style: target.deciding.record.style,
    }));
    return screenShots(shots, { closed, u }).flatMap((suspect) => {
      const target = judged.find((one) => one.key === suspect.id);
      return target ? [{ ...suspect, target }] : [];
    });
  });
}

function railsOf(bundle: RoundBundle): readonly Rail[] {
  return bundle.footing.rails === 'both' ? RAILS.filter((rail) => rail !== 'centre') : ['centre'];
}

/**
 * Everything that the results screen, the report and a release say of a round. Pure: the phone and the server run the same.
 * `closed`: the walk ends where it began.
 */
export function roundResults(bundle: RoundBundle, state: RoundState, closed: boolean): RoundResults {
  const segments = railsOf(bundle).flatMap((rail) => segmentsOf(bundle.footing, state.targets, rail));
  const length = bundle.job.unitStyle === 'metric' ? STRAIGHTEDGE.metric : STRAIGHTEDGE.feet;
  return {
    grade: gradeAnswer(state, bundle.toleranceRule),
    wall: bundle.round.surface === 'top' ? wallResult(bundle, state, segments) : null,
    shape: shapeOf(bundle, state),
    suspects: suspectsOf(bundle, state, closed),
    struck: state.targets.flatMap((target) => target.shots.filter((shot) => shot.struck).map((shot) => ({ shot, target }))),
    straightedge: {
      length,
      results: segments.flatMap((segment) => {
        const profile = profileOf(segment);
        if (profile.length < 2) return [];
        const { worst, tooSparse } = straightedge(profile, length);
        return [{ segment, worst, tooSparse }];
      }),
    },
    segments,
  };
}
