import type { KeptRecord } from './outbox-storage';

/** What the server takes at once. */
const MOST = 500;

/** The next batch in device order: from the first that waits, as far as the same round goes. Empty when nothing waits. */
export function nextBatch(kept: readonly KeptRecord[]): KeptRecord[] {
  const waiting = kept.filter((record) => record.refused === null);
  const end = waiting.findIndex((record) => record.roundId !== waiting[0]?.roundId);
  return waiting.slice(0, Math.min(end === -1 ? waiting.length : end, MOST));
}

const FIRST_WAIT = 2_000;
const LONGEST_WAIT = 60_000;

/** How long to wait before the next try after so many failures in a row, ms. */
export function waitAfter(failures: number): number {
  return Math.min(FIRST_WAIT * 2 ** (failures - 1), LONGEST_WAIT);
}
