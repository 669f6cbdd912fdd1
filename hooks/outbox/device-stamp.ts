import type { FieldRecord } from '@/shared/records';
import type { KeepRequest, KeptRecord, OutboxScope, RecordDraft } from './outbox-storage';

/** What a phone remembers of itself in one scope: who it is, how far it has counted, and the last reading of its clock. */
export interface Device {
  scope: OutboxScope;
  deviceId: string;
  deviceSequence: number;
  clock: { wall: number; counter: number };
}

export const newDevice = (scope: OutboxScope, deviceId: string): Device => ({
  scope,
  deviceId,
  deviceSequence: 0,
  clock: { wall: 0, counter: 0 },
});

/**
 * The next reading of a hybrid logical clock (Kulkarni, Demirbas et al. 2014; from memory): wall time in ms while that moves on,
 * otherwise one more within the same ms. It never runs backwards, and is never behind `seen`.
 */
export function tick(clock: Device['clock'], now: number, seen: number): Device['clock'] {
  const wall = Math.max(clock.wall, now, seen);
  return wall === clock.wall ? { wall, counter: clock.counter + 1 } : { wall, counter: 0 };
}

/** Stamps drafts with a device's next sequence numbers and clock. Pure: whoever stores both does it in one transaction. */
export function stamp(device: Device, { drafts, now, seen, ...request }: KeepRequest): { device: Device; kept: KeptRecord[] } {
  let next = device;
  const kept = drafts.map((draft) => {
    next = { ...next, deviceSequence: next.deviceSequence + 1, clock: tick(next.clock, now, seen) };
    const record = stamped(draft, next, now);
    return { ...request, id: record.id, record, orderedAt: next.clock.wall, refused: null };
  });
  return { device: next, kept };
}

function stamped(draft: RecordDraft, { deviceId, deviceSequence, clock }: Device, now: number): FieldRecord {
  return { ...draft, deviceId, deviceSequence, clock, madeAt: new Date(now).toISOString() };
}
