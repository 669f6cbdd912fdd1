import type { Nm } from './units';

// ---- lengths ------------------------------------------------------------------------------------------------------

export type LengthStyle = 'feet-inches' | 'decimal-feet' | 'metric';
/** Finest mark that is read, e.g. 1/16 in = 1_587_500 nm, 0.01 ft = 3_048_000 nm, 1 mm = 1_000_000 nm. */
export type Graduation = Nm;

// ---- level notes --------------------------------------------------------------------------------------------------

export interface Reading {
  id: string;
  kind: 'backsight' | 'shot' | 'check' | 'foresight';
  point: string;
  reading: Nm;
  struck?: boolean;
  /** Place in the round, across series; absent: series order. */
  order?: number;
}

/** Everything read from one setup with one rod, in order. */
export interface Series {
  id: string;
  setup: string;
  rod: string;
  checkLimit: Nm;
  readings: Reading[];
}

export interface LevelNotes {
  benchmarks: Record<string, Nm>;
  series: Series[];
  allowableMisclosure?: Nm;
}

export type LaserState = 'held' | 'unchecked' | 'doubted';

export interface ReducedShot {
  id: string;
  series: string;
  point: string;
  elevation: Nm | null;
  adjusted: Nm | null;
  judged: Nm | null;
  laser: LaserState;
  /** The last unstruck shot of its point. */
  decides: boolean;
}

export interface Chain {
  series: string[];
  pageCheck: { sumBacksights: Nm; sumForesights: Nm; difference: Nm; lastMinusFirst: Nm; agrees: boolean };
  /** Observed − known at the closing point; null when the chain does not close on a known point. */
  misclosure: Nm | null;
  /** Null without a misclosure or an allowable one. */
  misclosureHolds: boolean | null;
}

export interface LevelReduction {
  series: {
    id: string;
    hi: Nm | null;
    backsightSpread: Nm;
    checks: { id: string; error: Nm; holds: boolean; of: 'laser' | 'mark' }[];
  }[];
  shots: ReducedShot[];
  turningPoints: { point: string; elevation: Nm; adjusted: Nm }[];
  chains: Chain[];
}

// ---- plane fit ----------------------------------------------------------------------------------------------------

export interface PlanePoint {
  id: string;
  x: number;
  y: number;
  z: number;
  weight?: number;
}

export interface Coefficient {
  value: number;
  standardError: number | null;
  t: number | null;
  p: number | null;
}

export interface PointFit {
  id: string;
  fitted: number;
  residual: number;
  leverage: number;
  studentized: number | null;
  deletedStudentized: number | null;
  cooks: number | null;
}

export interface PlaneFit {
  model: 'plane' | 'line' | 'level';
  n: number;
  df: number;
  /** z = a + b·x + c·y in the units and origin given; b and c only for model 'plane'. */
  a: Coefficient;
  b: Coefficient | null;
  c: Coefficient | null;
  residualStandardError: number | null;
  rSquared: number | null;
  fTest: { f: number; df1: number; df2: number; p: number } | null;
  tilt: { slope: number; slopeStandardError: number | null; fallAzimuth: number | null; drop: number };
  shares: { offset: number; tilt: number; rest: number };
  points: PointFit[];
}

export interface HuberPlane {
  a: number;
  b: number;
  c: number;
  scale: number;
  weights: number[];
  iterations: number;
}

export interface MinimumZonePlane {
  a: number;
  b: number;
  c: number;
  halfWidth: number;
  support: string[];
}

/** Stated accuracy ± at a distance. */
export interface LaserAccuracy {
  accuracy: Nm;
  at: Nm;
}

export interface TiltAgainstLaser {
  beyondReading: boolean;
  beyondLaser: boolean;
  laserSlope: number;
}

// ---- uncertainty, verdict, suspects -------------------------------------------------------------------------------

/** Both positive: allowed below and above. */
export interface Tolerance {
  low: Nm;
  high: Nm;
}

export type DecisionRule = 'simple' | 'guarded';

export interface ShotUncertaintyInput {
  graduation: Nm;
  receiverBand?: Nm;
  set?: boolean;
  laserAccuracy: Nm;
  laserAccuracyAt: Nm;
  distance: Nm;
  benchmarkDistance: Nm;
  repeatability?: Nm;
}

export interface ShotUncertainty {
  reading: Nm;
  laser: Nm;
  backsight: Nm;
  absolute: Nm;
  relative: Nm;
}

export interface Judgement {
  verdict: 'in' | 'high' | 'low' | 'cannot-tell';
  close: boolean;
  probabilityIn: number;
}

export interface ScreenedShot {
  id: string;
  x: Nm;
  y: Nm;
  station: Nm;
  deviation: Nm;
  keyed?: string;
  style?: LengthStyle;
}

export interface Suspect {
  id: string;
  seenBy: ('plane' | 'neighbours')[];
  size: Nm;
  explanation: 'foot' | 'inch' | 'half-inch' | 'tenth' | '100mm' | '10mm' | 'digits-swapped' | null;
}

// ---- flatness -----------------------------------------------------------------------------------------------------

/** A vertical step is two points at one station. */
export interface ProfilePoint {
  station: Nm;
  elevation: Nm;
}

export interface StraightedgePlace {
  gap: Nm;
  at: Nm;
  from: Nm;
  to: Nm;
}

export interface StraightedgeResult {
  worst: StraightedgePlace | null;
  places: StraightedgePlace[];
  tooSparse: boolean;
}

// ---- first course -------------------------------------------------------------------------------------------------

export interface WallRun {
  id: string;
  width: Nm;
  planGrade: Nm;
  profile: ProfilePoint[];
}

export interface BedRule {
  least: Nm;
  most: Nm;
  nominal: Nm;
  grindMost: Nm;
  beddedFraction: number;
  courseHeight: Nm | null;
  weights?: { bed: number; grind: number };
}

/** Full width; cubic metres. */
export interface BedVolume {
  below: number;
  above: number;
  aboveLength: Nm;
}

export interface FlaggedBed {
  run: string;
  station: Nm;
  bed: Nm;
  why: 'too-thin' | 'too-thick';
  grindable: boolean;
}

export interface CourseOption {
  kind: 'no-grinding' | 'least-material' | 'plan-height';
  elevation: Nm;
  bedVolume: number;
  grindVolume: number;
  grindLength: Nm;
  leastBed: Nm;
  mostBed: Nm;
  flagged: FlaggedBed[];
}

export interface CourseGroup {
  runs: string[];
  /** Courses below the highest step, a run. */
  coursesDown: Record<string, number>;
  window: { from: Nm; to: Nm } | null;
  shortBy: Nm;
  options: CourseOption[];
}

export interface ShimPack {
  shims: Nm[];
  rest: Nm;
}

// ---- concrete, outline, laser checks ------------------------------------------------------------------------------

/** Profiles run on the footing's centre line, mitre to mitre. */
export interface ConcreteRun {
  id: string;
  width: Nm;
  subgrade: ProfilePoint[];
  top: ProfilePoint[];
  planThickness: Nm;
}

/** Cubic metres. */
export interface FootingConcrete {
  planVolume: number;
  asDugVolume: number;
  orderVolume: number;
  thin: { run: string; station: Nm; thickness: Nm }[];
}

export interface OutlineRun {
  id: string;
  length: Nm;
  /** Degrees, clockwise positive, applied at the run's end. */
  turn: number;
  steps?: { at: Nm; by: Nm }[];
}

export interface PlanPoint {
  x: Nm;
  y: Nm;
}

export interface TracedOutline {
  corners: PlanPoint[];
  closure: { dx: Nm; dy: Nm; length: Nm; angle: number };
  perimeter: Nm;
  area: number;
  selfCrossing: boolean;
  mends: { run: string; length: Nm }[];
}

export interface Station {
  run: string;
  station: Nm;
  x: Nm;
  y: Nm;
  corner: string | null;
  step: 'before' | 'after' | null;
  outer?: PlanPoint;
  inner?: PlanPoint;
}

/** errorPerLength positive: reads too high, growing with distance. */
export interface TwoPegResult {
  errorPerLength: number;
  correctedA: Nm;
  correctedB: Nm;
}

export interface LevelCheckResult {
  error: Nm;
  slope: number;
  trueDifference: Nm;
  withinStated: boolean;
}
