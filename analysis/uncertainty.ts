import { AnalysisError } from './analysis-error';
import { inRange, notNegative, positive } from './check-input';
import type { ShotUncertainty, ShotUncertaintyInput } from './types';
import type { Nm } from './units';

/** Standard uncertainty of a reading to the nearest mark: uniform over one graduation (GUM F.2.2.1, from memory). */
const WHOLE_WIDTH = Math.sqrt(12);

/** Standard uncertainty of ± a, anything between equally likely (NIST TN 1297 §4.6; SEEN in a worked a = 1.5 → 0.87). */
const HALF_WIDTH = Math.sqrt(3);

function readingUncertainty(input: ShotUncertaintyInput): Nm {
  const graduation = notNegative('graduation', input.graduation) / WHOLE_WIDTH;
  const repeatability = notNegative('repeatability', input.repeatability ?? 0);
  const { receiverBand, set } = input;
  if (receiverBand === undefined) {
    if (set === true) {
      throw new AnalysisError(
        'receiver-band-missing',
        'A shot set with a receiver is as sure as the band it holds within; none was given.',
        {},
      );
    }
    return Math.hypot(graduation, repeatability);
  }
  const receiver = notNegative('receiverBand', receiverBand) / HALF_WIDTH;
  return set === true ? Math.hypot(receiver, repeatability) : Math.hypot(graduation, receiver, repeatability);
}

/**
 * Standard uncertainties (1 σ, nanometres) of one shot, by part and combined.
 *
 * - `reading`: read by eye d/√12; read with a receiver d/√12 and band/√3; set by the receiver band/√3; repeatability added where known.
 * - `laser`: accuracy · distance ÷ at, a half-width, /√3. `backsight`: reading and laser parts at the benchmark's distance.
 * - `absolute`: against plan grade, the root of all squares. `relative`: between shots of one setup after the plane is taken off, the
 *   reading alone, because a tilted laser does not scatter shots: it belongs to the plane's drop.
 *
 * Source: GUM / NIST TN 1297 (root sum of squares, rectangular distributions).
 * @throws AnalysisError 'not-finite', 'negative', 'not-positive' (laserAccuracyAt), 'receiver-band-missing' (set without a band), 'out-of-range'
 * @example shotUncertainty({ graduation: 3_048_000, laserAccuracy: 1_587_500, laserAccuracyAt: 30_480_000_000, distance: 0, benchmarkDistance: 0 })
 *   // reading 879_882 nm, laser 0, absolute 1_244_341 nm
 */
export function shotUncertainty(input: ShotUncertaintyInput): ShotUncertainty {
  const reading = inRange('reading uncertainty', readingUncertainty(input));
  const perLength =
    notNegative('laserAccuracy', input.laserAccuracy) / positive('laserAccuracyAt', input.laserAccuracyAt) / HALF_WIDTH;
  const laser = inRange('laser uncertainty', perLength * notNegative('distance', input.distance));
  const laserAtBenchmark = perLength * notNegative('benchmarkDistance', input.benchmarkDistance);
  const backsight = inRange('backsight uncertainty', Math.hypot(reading, laserAtBenchmark));
  return {
    reading,
    laser,
    backsight,
    absolute: inRange('combined uncertainty', Math.hypot(reading, laser, backsight)),
    relative: reading,
  };
}
