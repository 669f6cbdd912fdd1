import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { AnalysisError } from './analysis-error';
import { lengthFromZero, nanometres } from './check-input';
import type { DecisionRule, Judgement, LaserState, Tolerance } from './types';
import type { Nm } from './units';

/** One-sided 95 % of a normal distribution, as guard bands are quoted. */
export const GUARD_FACTOR = 1.645;

/**
 * Probability that the true deviation lies within the limits, the reading being normal about it. Tails are added rather than one cdf taken
 * from the other, so that neither a sure pass nor a sure miss loses its digits.
 */
function probabilityWithin(roomAbove: Nm, roomBelow: Nm, u: Nm): number {
  if (u === 0) return roomAbove >= 0 && roomBelow >= 0 ? 1 : 0;
  const beyondHigh = normalCdf(-roomAbove / u, 0, 1);
  const beyondLow = normalCdf(-roomBelow / u, 0, 1);
  if (roomAbove < 0) return Math.max(0, normalCdf(roomAbove / u, 0, 1) - beyondLow);
  if (roomBelow < 0) return Math.max(0, normalCdf(roomBelow / u, 0, 1) - beyondHigh);
  return Math.max(0, 1 - beyondHigh - beyondLow);
}

/**
 * Judges one deviation (positive: high) against limits that may differ below and above; a limit itself is in.
 *
 * `simple` compares. `guarded` says in only up to the limits drawn in by 1.645·u, cannot-tell between those and the true limits, high or low
 * beyond the true limits. `close`: a limit lies within 1.645·u, whichever rule is used. With u = 0 the probability is 0 or 1.
 *
 * Source: guard bands as in ILAC-G8:2019 and JCGM 106:2012; the factor is one-sided 95 %.
 * @param u standard uncertainty of the deviation, nm
 * @throws AnalysisError 'not-finite' | 'negative' | 'out-of-range' | 'unknown-decision-rule'
 */
export function judge(deviation: Nm, tolerance: Tolerance, u: Nm, rule: DecisionRule): Judgement {
  const at = nanometres('deviation', deviation);
  const roomAbove = lengthFromZero('tolerance.high', tolerance.high) - at;
  const roomBelow = at + lengthFromZero('tolerance.low', tolerance.low);
  const guard = GUARD_FACTOR * lengthFromZero('u', u);
  if (rule !== 'simple' && rule !== 'guarded') {
    throw new AnalysisError('unknown-decision-rule', `There is no decision rule "${String(rule)}".`, { rule });
  }
  const close = Math.min(Math.abs(roomAbove), Math.abs(roomBelow)) <= guard;
  const probabilityIn = probabilityWithin(roomAbove, roomBelow, u);
  if (roomAbove < 0) return { verdict: 'high', close, probabilityIn };
  if (roomBelow < 0) return { verdict: 'low', close, probabilityIn };
  const sure = rule === 'simple' || (roomAbove >= guard && roomBelow >= guard);
  return { verdict: sure ? 'in' : 'cannot-tell', close, probabilityIn };
}

/** True where the guard bands meet: no reading at all could be accepted, so the reading or the laser is too coarse for the rule. */
export function guardLeavesNothing(tolerance: Tolerance, u: Nm): boolean {
  const width = lengthFromZero('tolerance.low', tolerance.low) + lengthFromZero('tolerance.high', tolerance.high);
  return width < 2 * GUARD_FACTOR * lengthFromZero('u', u);
}

/** One station of a round, as its deciding shot stands; null while it has none. */
export interface JudgedStation {
  laser: LaserState;
  verdict: Judgement['verdict'];
}

export type RoundVerdict = 'not-yet' | 'cannot-tell' | 'not-to-grade' | 'too-close-to-call' | 'to-grade';

/**
 * The verdict of a round over all its stations: not all shot: not yet; any deciding shot doubted or unchecked: cannot tell; any out: not to
 * grade; any cannot-tell: too close to call; else to grade. A round without stations is not yet.
 */
export function judgeRound(stations: readonly (JudgedStation | null)[]): RoundVerdict {
  const shot = stations.filter((station) => station !== null);
  if (shot.length === 0 || shot.length < stations.length) return 'not-yet';
  if (shot.some(({ laser }) => laser !== 'held')) return 'cannot-tell';
  if (shot.some(({ verdict }) => verdict === 'high' || verdict === 'low')) return 'not-to-grade';
  return shot.some(({ verdict }) => verdict === 'cannot-tell') ? 'too-close-to-call' : 'to-grade';
}
