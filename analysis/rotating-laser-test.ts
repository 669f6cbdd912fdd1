import { AnalysisError } from './analysis-error';
import { inRange, lengthFromZero, nanometres, positiveLength } from './check-input';
import type { LaserAccuracy } from './types';
import type { Nm } from './units';

/** Readings on both marks, with the laser turned clockwise by no, one, two and three quarters; at first its X axis points at c. */
export interface RotatingLaserSet {
  distanceA: Nm;
  distanceC: Nm;
  /** The laser stands between the marks; else both lie in one direction from it. */
  between: boolean;
  quarters: readonly [AcReading, AcReading, AcReading, AcReading];
}

export interface AcReading {
  a: Nm;
  c: Nm;
}

export interface RotatingLaserResult {
  /** Slopes, positive: reads too high toward X, and toward a quarter clockwise from X. */
  xAxis: number;
  yAxis: number;
  /** Slope by which it reads too high in every direction; null where all set-ups stand alike to the marks. */
  cone: number | null;
  /** c − a; null where cone and difference cannot be told apart. */
  trueDifference: Nm | null;
  /** Of one difference c − a, from what the model leaves. */
  residualStandardError: Nm;
  /** Largest slope in any direction: hypot of both axes, and the cone where it is known. */
  largest: number;
  withinStated: boolean | null;
}

interface SetDifferences {
  quarters: [number, number, number, number];
  mean: number;
  /** What a tilt acts over, and what a cone acts over. */
  base: Nm;
  unequal: Nm;
}

function differencesOf(set: RotatingLaserSet, index: number): SetDifferences {
  const difference = ({ a, c }: AcReading) => nanometres(`c of set ${index}`, c) - nanometres(`a of set ${index}`, a);
  const distanceA = lengthFromZero('distanceA', set.distanceA);
  const distanceC = lengthFromZero('distanceC', set.distanceC);
  const [ahead, quarter, half, threeQuarters] = set.quarters;
  const quarters: SetDifferences['quarters'] = [
    difference(ahead),
    difference(quarter),
    difference(half),
    difference(threeQuarters),
  ];
  return {
    quarters,
    mean: quarters.reduce((sum, one) => sum + one, 0) / 4,
    base: set.between ? distanceC + distanceA : distanceC - distanceA,
    unequal: distanceC - distanceA,
  };
}

/** Mean differences as true difference + cone · unequal distance; each null where it cannot be told. */
function coneOf(sets: readonly SetDifferences[]): {
  cone: number | null;
  trueDifference: number | null;
  predicted: (unequal: Nm) => number;
} {
  const meanUnequal = sets.reduce((sum, { unequal }) => sum + unequal, 0) / sets.length;
  const mean = sets.reduce((sum, set) => sum + set.mean, 0) / sets.length;
  const spread = sets.reduce((sum, { unequal }) => sum + (unequal - meanUnequal) ** 2, 0);
  if (spread === 0) return { cone: null, trueDifference: meanUnequal === 0 ? mean : null, predicted: () => mean };
  const cone = sets.reduce((sum, set) => sum + (set.unequal - meanUnequal) * (set.mean - mean), 0) / spread;
  return { cone, trueDifference: mean - cone * meanUnequal, predicted: (unequal) => mean + cone * (unequal - meanUnequal) };
}

/**
 * Both axes and the cone of a rotating laser, from two marks read with the laser turned through the quarters on one spot, on one set-up or more.
 *
 * Turning by half reverses what an axis does to a difference and leaves the cone; unequal distances show the cone and leave the axes. Least squares of
 * c − a = Δ + base · (x cos φ − y sin φ) + cone · (distanceC − distanceA), φ the clockwise turn, base the sum of both distances between the marks and
 * their difference beyond them. Two set-ups at different places between or beyond the marks tell the cone from the true difference.
 *
 * Source: the four-quarter check that makers of such lasers publish, and the two-peg test for the cone, solved together. No conformance with
 * ISO 17123-6 is claimed: its text was not at hand.
 * @throws AnalysisError 'no-sets' | 'no-base' (no set in which a tilt would show) | 'not-finite' | 'negative' | 'not-positive' | 'out-of-range'
 */
export function rotatingLaserTest(sets: readonly RotatingLaserSet[], laser?: LaserAccuracy): RotatingLaserResult {
  if (sets.length === 0) throw new AnalysisError('no-sets', 'A rotating-laser test needs at least one set of readings.');
  const differences = sets.map(differencesOf);
  const squares = differences.reduce((sum, { base }) => sum + base ** 2, 0);
  if (squares === 0) throw new AnalysisError('no-base', 'No set of readings stands where a tilt would show.');
  const along = (pick: (quarters: SetDifferences['quarters']) => number) =>
    inRange('axis', differences.reduce((sum, { quarters, base }) => sum + base * pick(quarters), 0) / (2 * squares));
  const xAxis = along(([ahead, , half]) => ahead - half);
  const yAxis = along(([, quarter, , threeQuarters]) => threeQuarters - quarter);
  const { cone, trueDifference, predicted } = coneOf(differences);
  const left = differences.flatMap(({ quarters, base, unequal }) => {
    const level = predicted(unequal);
    const model = [level + base * xAxis, level - base * yAxis, level - base * xAxis, level + base * yAxis];
    return quarters.map((observed, index) => observed - (model[index] ?? 0));
  });
  const unknowns = cone === null ? 3 : 4;
  const largest = Math.hypot(xAxis, yAxis) + Math.abs(cone ?? 0);
  return {
    xAxis,
    yAxis,
    cone: cone === null ? null : inRange('cone', cone),
    trueDifference: trueDifference === null ? null : inRange('trueDifference', trueDifference),
    residualStandardError: inRange(
      'residualStandardError',
      Math.sqrt(left.reduce((sum, one) => sum + one ** 2, 0) / (left.length - unknowns)),
    ),
    largest: inRange('largest', largest),
    withinStated: laser
      ? largest * positiveLength('at', laser.at) <= lengthFromZero('accuracy', laser.accuracy) * (1 + 4 * Number.EPSILON)
      : null,
  };
}
