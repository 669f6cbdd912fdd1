import { AnalysisError } from './analysis-error';
import { inRange, lengthFromZero, nanometres, positiveLength } from './check-input';
import type { LaserAccuracy, LevelCheckResult, TwoPegResult } from './types';
import type { Nm } from './units';

/**
 * Two-peg test: from midway the true difference b − a, from off centre the observed one; what it gained with distance is the line's error.
 *
 * errorPerLength = (observed − true) / (distanceB − distanceA), a slope, positive when the instrument reads too high, growing with distance; the
 * corrected readings are those off centre less slope · distance. One axis only: a rotating laser is tested along each of two.
 *
 * Source: NAVEDTRA 14070, on Fig. 6-3 (instrument close to one peg); general form by the same proportion.
 * @throws AnalysisError 'equal-distances' | 'not-finite' | 'negative' | 'out-of-range'
 */
export function twoPegTest(input: {
  atMidpoint: { a: Nm; b: Nm };
  offCentre: { a: Nm; b: Nm; distanceA: Nm; distanceB: Nm };
}): TwoPegResult {
  const { atMidpoint, offCentre } = input;
  const trueDifference = nanometres('atMidpoint.b', atMidpoint.b) - nanometres('atMidpoint.a', atMidpoint.a);
  const a = nanometres('offCentre.a', offCentre.a);
  const b = nanometres('offCentre.b', offCentre.b);
  const distanceA = lengthFromZero('distanceA', offCentre.distanceA);
  const distanceB = lengthFromZero('distanceB', offCentre.distanceB);
  if (distanceA === distanceB) {
    throw new AnalysisError('equal-distances', 'From equal distances no error of the line can be seen.', {
      distanceA,
      distanceB,
    });
  }
  const errorPerLength = inRange('errorPerLength', (b - a - trueDifference) / (distanceB - distanceA));
  return {
    errorPerLength,
    correctedA: inRange('correctedA', a - errorPerLength * distanceA),
    correctedB: inRange('correctedB', b - errorPerLength * distanceB),
  };
}

/**
 * Level check: two far marks read, the laser turned half round on the same spot, and both read again.
 *
 * Differences are c − a. The true one is the mean of both; `error` is half of first − turned, positive when the first setting read c too high;
 * `slope` is that over the distance between the marks. Judged against stated accuracy × distance ÷ at, the limit itself being within. It sees only
 * tilt along the line of the marks: two lines, roughly square, see it all.
 * @throws AnalysisError 'not-finite' | 'negative' | 'not-positive' | 'out-of-range'
 */
export function levelCheck(input: {
  first: { a: Nm; c: Nm };
  turned: { a: Nm; c: Nm };
  distance: Nm;
  laser: LaserAccuracy;
}): LevelCheckResult {
  const first = nanometres('first.c', input.first.c) - nanometres('first.a', input.first.a);
  const turned = nanometres('turned.c', input.turned.c) - nanometres('turned.a', input.turned.a);
  const distance = positiveLength('distance', input.distance);
  const accuracy = lengthFromZero('accuracy', input.laser.accuracy);
  const at = positiveLength('at', input.laser.at);
  const error = inRange('error', (first - turned) / 2);
  return {
    error,
    slope: inRange('slope', error / distance),
    trueDifference: inRange('trueDifference', (first + turned) / 2),
    withinStated: withinStated(error, accuracy, distance, at),
  };
}

/** |error| ≤ accuracy · distance ÷ at; equality survives the rounding of the products. */
function withinStated(error: Nm, accuracy: Nm, distance: Nm, at: Nm): boolean {
  const allowed = (accuracy * distance) / at;
  return Math.abs(error) <= allowed * (1 + 4 * Number.EPSILON);
}
