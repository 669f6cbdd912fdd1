import type { OutboxSnapshot } from './outbox';

/** Where what was recorded now is, most pressing first: the states of the pill. */
export type SavedState = 'needs-you' | 'sending' | 'on-phone' | 'on-server';

/** The state of all that is kept, and how many records it is about. */
export function savedState({ kept, sending }: OutboxSnapshot): { state: SavedState; count: number } {
  const refused = kept.filter((record) => record.refused !== null).length;
  const waiting = kept.length - refused;
  if (refused > 0) return { state: 'needs-you', count: refused };
  if (waiting === 0) return { state: 'on-server', count: 0 };
  return { state: sending ? 'sending' : 'on-phone', count: waiting };
}
