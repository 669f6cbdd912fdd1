import type { RecordAnswer, StoredRecord } from '@/shared/records';
import { ApiError, isPassing, OfflineError } from '../api/api-error';
import { nextBatch, waitAfter } from './batches';
import type { KeepRequest, KeptRecord, OutboxScope, OutboxStorage, Refused } from './outbox-storage';

/** What the outbox needs of the world; tests give their own. */
export interface OutboxParts {
  storage: OutboxStorage;
  /** POST /api/rounds/:roundId/records. @throws ApiError, OfflineError. */
  post(roundId: string, kept: readonly KeptRecord[]): Promise<RecordAnswer[]>;
  now(): number;
  /** Runs work while no other tab of the browser does. */
  alone<T>(work: () => Promise<T>): Promise<T>;
  /** Calls back after ms, unless the returned function is called first. */
  after(ms: number, work: () => void): () => void;
  /** Lets the browser's other tabs know. */
  tell(news: OutboxNews): void;
  /** Takes note of a fault that is neither a dead spot nor a refusal. */
  report(error: unknown): void;
}

/** Something changed on the disk; `stored` is what the server now has, with its receipts. */
export interface OutboxNews {
  scope: OutboxScope;
  stored: { roundId: string; records: StoredRecord[] }[];
}

export interface OutboxSnapshot {
  /** Everything of this scope that the server is not known to have, in device order. */
  kept: readonly KeptRecord[];
  /** A batch is on its way. */
  sending: boolean;
  /** The disk has been read; before that `kept` says nothing. */
  ready: boolean;
  /** This browser will not let anything be kept (a private window, a full disk): nothing may be recorded here. */
  broken: boolean;
}

const NOTHING: OutboxSnapshot = { kept: [], sending: false, ready: false, broken: false };

/**
 * Records kept on this phone until the server says that it has them. One scope (person and company) is open at a time; only
 * its records are sent. Keeping resolves when the record is on the disk, and not before.
 */
export class Outbox {
  private current: OutboxSnapshot = NOTHING;
  private scope: OutboxScope | null = null;
  private readonly listeners = new Set<() => void>();
  private readonly storedListeners = new Set<(roundId: string, records: StoredRecord[]) => void>();
  private running: Promise<void> | null = null;
  private again = false;
  private failures = 0;
  private cancelWait: (() => void) | null = null;

  constructor(private readonly parts: OutboxParts) {}

  snapshot = (): OutboxSnapshot => this.current;

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => void this.listeners.delete(listener);
  };

  /** Hears what the server stored, before it leaves the snapshot: a record is always in one of both. */
  onStored(listener: (roundId: string, records: StoredRecord[]) => void): () => void {
    this.storedListeners.add(listener);
    return () => void this.storedListeners.delete(listener);
  }

  /** Opens the records of a person in a company, and starts sending them; null closes. */
  async open(scope: OutboxScope | null): Promise<void> {
    if (scope === this.scope) return;
    this.scope = scope;
    this.set(NOTHING);
    if (scope === null) return;
    try {
      await this.read(scope);
    } catch (error) {
      this.parts.report(error);
      if (scope === this.scope) this.set({ broken: true });
      return;
    }
    this.send();
  }

  /** @throws what the disk throws: then nothing was kept, and the person must be told. */
  async keep(request: Omit<KeepRequest, 'now'>): Promise<KeptRecord[]> {
    const kept = await this.parts.storage.keep({ ...request, now: this.parts.now() });
    this.parts.tell({ scope: request.scope, stored: [] });
    if (request.scope === this.scope) this.set({ kept: inDeviceOrder([...this.current.kept, ...kept]) });
    this.send();
    return kept;
  }

  /** What was refused is sent again, because somebody did something about it. */
  async sendAgain(ids: readonly string[]): Promise<void> {
    await this.parts.storage.mark(ids, null);
    await this.changed([]);
    this.send();
  }

  /** Takes refused records off the phone, for good. Only what the server refused can be let go. */
  async letGo(ids: readonly string[]): Promise<void> {
    const refused = this.current.kept.filter((kept) => kept.refused !== null && ids.includes(kept.id));
    await this.parts.storage.remove(refused.map((kept) => kept.id));
    await this.changed([]);
  }

  /** Another tab kept, sent or let go. */
  async heard({ scope, stored }: OutboxNews): Promise<void> {
    if (scope !== this.scope) return;
    for (const { roundId, records } of stored) this.tellStored(roundId, records);
    await this.read(scope);
  }

  /** Sends what waits, now: after a record, on `online`, when the page is seen again. Safe to call at any time. */
  send(): void {
    this.cancelWait?.();
    this.cancelWait = null;
    this.again = true;
    this.running ??= this.sendAll();
  }

  /** Resolves once nothing is under way: for tests, and before signing out. */
  async settled(): Promise<void> {
    while (this.running) await this.running;
  }

  private async sendAll(): Promise<void> {
    try {
      while (this.again) await this.sendOnce();
    } finally {
      // In the same breath as the last look at `again`: a record kept after that begins a new run.
      this.running = null;
    }
  }

  private async sendOnce(): Promise<void> {
    this.again = false;
    try {
      await this.parts.alone(() => this.sendBatches());
      this.failures = 0;
    } catch (error) {
      this.failures += 1;
      if (!(error instanceof ApiError) && !(error instanceof OfflineError)) this.parts.report(error);
      // Signed out: the next sign-in sends.
      if (error instanceof ApiError && error.status === 401) return;
      this.cancelWait?.();
      this.cancelWait = this.parts.after(waitAfter(this.failures), () => this.send());
    } finally {
      this.set({ sending: false });
    }
  }

  private async sendBatches(): Promise<void> {
    const scope = this.scope;
    if (scope === null) return;
    for (;;) {
      // Read anew: another tab may have sent these while this one waited for its turn.
      const batch = nextBatch(await this.parts.storage.all(scope));
      const roundId = batch[0]?.roundId;
      if (roundId === undefined || scope !== this.scope) return;
      this.set({ sending: true });
      await this.sendOne(roundId, batch);
    }
  }

  /** @throws what will pass (no signal, a fault, signed out): the records wait. */
  private async sendOne(roundId: string, batch: readonly KeptRecord[]): Promise<void> {
    let answers: RecordAnswer[];
    try {
      answers = await this.parts.post(roundId, batch);
    } catch (error) {
      if (!(error instanceof ApiError) || isPassing(error) || error.status === 401) throw error;
      // The batch was refused whole. Alone, each shows whether it is the one.
      if (batch.length > 1) for (const kept of batch) await this.sendOne(roundId, [kept]);
      else await this.refuse(batch, error.code);
      return;
    }
    await this.heed(roundId, batch, answers);
  }

  private async heed(roundId: string, batch: readonly KeptRecord[], answers: readonly RecordAnswer[]): Promise<void> {
    const byId = new Map(answers.map((answer) => [answer.id, answer]));
    const stored: StoredRecord[] = [];
    for (const kept of batch) {
      const answer = byId.get(kept.id);
      if (!answer) throw new Error(`The server did not say what became of record ${kept.id}.`);
      if ('receipt' in answer) stored.push({ record: kept.record, receipt: answer.receipt });
      else await this.refuse([kept], answer.answer === 'rejected' ? answer.refusal : 'conflict');
    }
    if (stored.length === 0) return;
    this.tellStored(roundId, stored);
    await this.parts.storage.remove(stored.map(({ record }) => record.id));
    await this.changed([{ roundId, records: stored }]);
  }

  private async refuse(batch: readonly KeptRecord[], refused: Refused): Promise<void> {
    await this.parts.storage.mark(
      batch.map((kept) => kept.id),
      refused,
    );
    await this.changed([]);
  }

  private tellStored(roundId: string, records: StoredRecord[]): void {
    for (const listener of this.storedListeners) listener(roundId, records);
  }

  private async changed(stored: OutboxNews['stored']): Promise<void> {
    const scope = this.scope;
    if (scope === null) return;
    this.parts.tell({ scope, stored });
    await this.read(scope);
  }

  private async read(scope: OutboxScope): Promise<void> {
    const kept = await this.parts.storage.all(scope);
    if (scope === this.scope) this.set({ kept, ready: true });
  }

  private set(change: Partial<OutboxSnapshot>): void {
    this.current = { ...this.current, ...change };
    for (const listener of this.listeners) listener();
  }
}

function inDeviceOrder(kept: KeptRecord[]): KeptRecord[] {
  const byId = new Map(kept.map((record) => [record.id, record]));
  return [...byId.values()].sort((one, other) => one.record.deviceSequence - other.record.deviceSequence);
}
