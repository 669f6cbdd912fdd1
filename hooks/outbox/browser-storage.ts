import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import { v4 as randomId } from 'uuid';
import { newDevice, stamp, type Device } from './device-stamp';
import type { KeepRequest, KeptRecord, OutboxScope, OutboxStorage, Refused } from './outbox-storage';

interface OutboxDatabase extends DBSchema {
  devices: { key: OutboxScope; value: Device };
  records: { key: string; value: KeptRecord; indexes: { scope: OutboxScope } };
}

const NAME = 'tallyrod-outbox';

/** The disk, not the disk's cache: a flat battery right after "On this phone" must not make that a lie. */
const STRICT = { durability: 'strict' } as const;

function open(forget: () => void): Promise<IDBPDatabase<OutboxDatabase>> {
  return openDB<OutboxDatabase>(NAME, 1, {
    upgrade(database) {
      database.createObjectStore('devices', { keyPath: 'scope' });
      database.createObjectStore('records', { keyPath: 'id' }).createIndex('scope', 'scope');
    },
    // A newer page in another tab wants to change the shape: let it, this tab opens again on its next use.
    blocking: (_current, _blocked, event) => {
      forget();
      if (event.target instanceof IDBDatabase) event.target.close();
    },
    terminated: forget,
  });
}

/**
 * The outbox in the browser's own database, apart from every cache. A phone that forgot who it was (its storage was cleared)
 * is a new device: sequences are per device, so nothing is doubled.
 */
export class BrowserStorage implements OutboxStorage {
  private opening: Promise<IDBPDatabase<OutboxDatabase>> | null = null;

  async keep(request: KeepRequest): Promise<KeptRecord[]> {
    const database = await this.database();
    const transaction = database.transaction(['devices', 'records'], 'readwrite', STRICT);
    const devices = transaction.objectStore('devices');
    const device = (await devices.get(request.scope)) ?? newDevice(request.scope, randomId());
    const { device: next, kept } = stamp(device, request);
    await Promise.all([
      devices.put(next),
      ...kept.map((record) => transaction.objectStore('records').add(record)),
      transaction.done,
    ]);
    return kept;
  }

  async all(scope: OutboxScope): Promise<KeptRecord[]> {
    const database = await this.database();
    const kept = await database.getAllFromIndex('records', 'scope', scope);
    return kept.sort((one, other) => one.record.deviceSequence - other.record.deviceSequence);
  }

  async remove(ids: readonly string[]): Promise<void> {
    const database = await this.database();
    const transaction = database.transaction('records', 'readwrite', STRICT);
    await Promise.all([...ids.map((id) => transaction.store.delete(id)), transaction.done]);
  }

  async mark(ids: readonly string[], refused: Refused | null): Promise<void> {
    const database = await this.database();
    const transaction = database.transaction('records', 'readwrite', STRICT);
    const change = async (id: string) => {
      const kept = await transaction.store.get(id);
      if (kept) await transaction.store.put({ ...kept, refused });
    };
    await Promise.all([...ids.map(change), transaction.done]);
  }

  private database(): Promise<IDBPDatabase<OutboxDatabase>> {
    const forget = () => {
      this.opening = null;
    };
    this.opening ??= open(forget).catch((cause: unknown) => {
      // Blocked or broken now may be open at the next try.
      forget();
      throw cause;
    });
    return this.opening;
  }
}
