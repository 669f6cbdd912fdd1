import { In } from 'typeorm';
import type { Tenant } from '../../api/handler';
import { Device } from '../../entities/instruments';

export interface DevicePlace {
  deviceId: string;
  deviceSequence: number;
}

/** Locks phones, those that are new entered first, so that two batches of one phone come one after the other. */
export async function lockDevices({ manager, actor, now }: Tenant, ids: readonly string[]): Promise<void> {
  const { companyId, personId } = actor;
  // In one order, so that two batches with two phones each do not wait for one another.
  const inOrder = [...new Set(ids)].sort();
  if (inOrder.length === 0) return;
  const entered = inOrder.map((id) => ({ companyId, id, firstSeenAt: now(), firstPersonId: personId }));
  await manager.createQueryBuilder().insert().into(Device).values(entered).orIgnore().execute();
  const where = { companyId, id: In(inOrder) };
  await manager.find(Device, { where, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } });
}

/** What one phone has sent so far, around the places of a batch: which places are taken, and when each was made (server's clock, ms). */
export class DeviceTimeline {
  private readonly entries: { sequence: number; at: number }[];

  constructor(entries: readonly { sequence: number; at: number }[]) {
    this.entries = [...entries].sort((a, b) => a.sequence - b.sequence);
  }

  has(sequence: number): boolean {
    return this.entries.some((entry) => entry.sequence === sequence);
  }

  /**
   * Takes a place. The time given is held between those of the records made before and after it on this phone: whatever its
   * clock did meanwhile, the phone's own order stands.
   * @param at the phone's clock put right, never after receipt, ms
   * @returns when the record counts as made, ms
   */
  take(sequence: number, at: number): number {
    const next = this.entries.findIndex((entry) => entry.sequence > sequence);
    const index = next < 0 ? this.entries.length : next;
    const earliest = this.entries[index - 1]?.at ?? 0;
    const latest = this.entries[index]?.at ?? Infinity;
    const held = Math.min(Math.max(at, earliest, 0), latest);
    this.entries.splice(index, 0, { sequence, at: held });
    return held;
  }
}

/** The timelines of all phones of a batch, from the record before its first place to the one after its last. */
export async function readTimelines(
  { manager, actor }: Tenant,
  places: readonly DevicePlace[],
): Promise<Map<string, DeviceTimeline>> {
  const timelines = new Map<string, DeviceTimeline>();
  for (const deviceId of new Set(places.map((place) => place.deviceId))) {
    const sequences = places.filter((place) => place.deviceId === deviceId).map((place) => place.deviceSequence);
    const first = Math.min(...sequences);
    const last = Math.max(...sequences);
    const rows: { sequence: string; at: string }[] = await manager.query(
      `select device_sequence sequence, ordered_at "at" from records
       where company_id = $1 and device_id = $2
         and device_sequence >= coalesce((select max(device_sequence) from records
           where company_id = $1 and device_id = $2 and device_sequence < $3::bigint), 0)
         and device_sequence <= coalesce((select min(device_sequence) from records
           where company_id = $1 and device_id = $2 and device_sequence > $4::bigint), $4::bigint)`,
      [actor.companyId, deviceId, first, last],
    );
    timelines.set(deviceId, new DeviceTimeline(rows.map(({ sequence, at }) => ({ sequence: Number(sequence), at: Number(at) }))));
  }
  return timelines;
}
