import type { Nm } from '@/analysis';

/** A reading of the benchmark that missed, since the operator pressed Check. */
export interface MissedCheck {
  id: string;
  reading: Nm;
}

export type CheckOutcome =
  /** The laser held. */
  | { said: 'held'; strike: string[] }
  /** A miss that nothing confirms or refutes yet. */
  | { said: 'read-again'; strike: string[] }
  /** Two readings agree on a miss: what was shot since the last good check is doubted. */
  | { said: 'doubted'; strike: string[] };

/**
 * What a reading of the benchmark means after those that missed before it, and which of them are now known to be misread.
 * A hit refutes every miss. Two misses that agree within the limit stand, and strike those that disagree with them. Misses
 * that all disagree ask for one more.
 * @param expected what the rod should read there, nm
 */
export function checkOutcome(missed: readonly MissedCheck[], reading: Nm, expected: Nm, limit: Nm): CheckOutcome {
  if (Math.abs(reading - expected) <= limit) return { said: 'held', strike: missed.map((miss) => miss.id) };
  const agrees = (miss: MissedCheck) => Math.abs(miss.reading - reading) <= limit;
  if (!missed.some(agrees)) return { said: 'read-again', strike: [] };
  return { said: 'doubted', strike: missed.filter((miss) => !agrees(miss)).map((miss) => miss.id) };
}
