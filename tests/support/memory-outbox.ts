import { newDevice, stamp, type Device } from '@/hooks/outbox/device-stamp';
import type { KeepRequest, KeptRecord, OutboxScope, OutboxStorage, Refused } from '@/hooks/outbox/outbox-storage';

/** The phone's disk for tests: what two outboxes share is two tabs of one browser. */
export class MemoryStorage implements OutboxStorage {
  private devices = new Map<OutboxScope, Device>();
  private records = new Map<string, KeptRecord>();
  /** Set: the disk takes nothing. */
  full = false;

  async keep(request: KeepRequest): Promise<KeptRecord[]> {
    if (this.full) throw new Error('QuotaExceededError');
    const known = this.devices.get(request.scope) ?? newDevice(request.scope, `device of ${request.scope}`);
    const { device, kept } = stamp(known, request);
    this.devices.set(request.scope, device);
    for (const record of kept) this.records.set(record.id, record);
    return kept;
  }

  async all(scope: OutboxScope): Promise<KeptRecord[]> {
    return [...this.records.values()]
      .filter((record) => record.scope === scope)
      .sort((one, other) => one.record.deviceSequence - other.record.deviceSequence);
  }

  async remove(ids: readonly string[]): Promise<void> {
    for (const id of ids) this.records.delete(id);
  }

  async mark(ids: readonly string[], refused: Refused | null): Promise<void> {
    for (const id of ids) {
      const kept = this.records.get(id);
      if (kept) this.records.set(id, { ...kept, refused });
    }
  }
}
