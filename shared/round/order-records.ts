import type { FieldRecord } from '../records';
import type { FoldRecord } from './round-state';

/** A record with its place in time (ms) among those of every device. */
export interface OrderedRecord {
  record: FieldRecord;
  person: { id: string; name: string };
  receivedAt: string | null;
  /** Server clock less phone clock, ms; null while the record is on this phone only. */
  clockSkew: number | null;
  orderedAt: number;
}

/**
 * The one order of records, wherever they are shown, folded or printed: by `orderedAt`, then device, then device sequence.
 *
 * A device's own sequence is never reordered: each record's time is at least that of the one its device made before it, so a
 * phone clock that jumped back moves nothing. A record still on this phone takes the phone's own guess under the same bound,
 * and so stands after everything of its device that the server already placed. One that is both on the server and still on
 * the phone (the answer was lost) counts once, as the server has it.
 *
 * The result does not depend on the order of the input.
 */
export function orderRecords(records: readonly FoldRecord[]): OrderedRecord[] {
  const byDevice = new Map<string, OrderedRecord[]>();
  for (const entry of withoutDoubles(records)) {
    const own = byDevice.get(entry.record.deviceId);
    if (own) own.push(entry);
    else byDevice.set(entry.record.deviceId, [entry]);
  }
  for (const own of byDevice.values()) {
    own.sort((one, other) => one.record.deviceSequence - other.record.deviceSequence);
    let latest = 0;
    for (const entry of own) {
      latest = Math.max(latest, entry.orderedAt);
      entry.orderedAt = latest;
    }
  }
  return [...byDevice.values()].flat().sort(byPlace);
}

function withoutDoubles(records: readonly FoldRecord[]): OrderedRecord[] {
  const byId = new Map<string, OrderedRecord>();
  for (const entry of records) {
    const known = byId.get(entry.record.id);
    if (known && (known.receivedAt !== null || entry.receipt === null)) continue;
    byId.set(entry.record.id, {
      record: entry.record,
      person: entry.receipt ? entry.receipt.person : entry.person,
      receivedAt: entry.receipt ? entry.receipt.receivedAt : null,
      clockSkew: entry.receipt ? entry.receipt.clockSkew : null,
      orderedAt: entry.receipt ? entry.receipt.orderedAt : entry.orderedAt,
    });
  }
  return [...byId.values()];
}

function byPlace(one: OrderedRecord, other: OrderedRecord): number {
  if (one.orderedAt !== other.orderedAt) return one.orderedAt - other.orderedAt;
  if (one.record.deviceId !== other.record.deviceId) return one.record.deviceId < other.record.deviceId ? -1 : 1;
  return one.record.deviceSequence - other.record.deviceSequence;
}
