import { ApiError, OfflineError } from '@/hooks/api/api-error';
import { Outbox, type OutboxNews, type OutboxParts } from '@/hooks/outbox/outbox';
import { outboxScope, type KeptRecord, type RecordDraft } from '@/hooks/outbox/outbox-storage';
import { savedState } from '@/hooks/outbox/saved-state';
import type { RecordAnswer, StoredRecord } from '@/shared/records';
import { MemoryStorage } from '../../support/memory-outbox';

const RAY = { id: 'ray', name: 'Ray Oduya' };
const SCOPE = outboxScope('company', RAY.id);

const draft = (id: string): RecordDraft => ({ kind: 'strike', id, targetId: 'target', reason: 'misread', words: '' });

/** A server that stores what comes, once, in the order in which it came. */
class FakeServer {
  stored: { roundId: string; id: string; sequence: number }[] = [];
  batches: string[][] = [];
  /** The next calls fail with these before anything is stored; `lost` fails after. */
  faults: (Error | 'lost')[] = [];
  refuse = new Map<string, RecordAnswer>();

  post: OutboxParts['post'] = async (roundId, kept) => {
    const fault = this.faults.shift();
    if (fault instanceof Error) throw fault;
    this.batches.push(kept.map(({ id }) => id));
    const answers = kept.map((record) => this.answer(roundId, record));
    if (fault === 'lost') throw new OfflineError('the answer was lost');
    return answers;
  };

  private answer(roundId: string, { id, record }: KeptRecord): RecordAnswer {
    const refused = this.refuse.get(id);
    if (refused) return refused;
    const receipt = {
      roundSequence: this.stored.length + 1,
      receivedAt: '2026-12-01T09:00:00.000Z',
      orderedAt: record.clock.wall,
      clockSkew: 0,
      person: RAY,
    };
    if (this.stored.some((one) => one.id === id)) return { id, answer: 'already', receipt };
    this.stored.push({ roundId, id, sequence: record.deviceSequence });
    return { id, answer: 'stored', receipt };
  }
}

function outboxOf(server: FakeServer, storage = new MemoryStorage(), change: Partial<OutboxParts> = {}) {
  const waits: { ms: number; work: () => void }[] = [];
  const news: OutboxNews[] = [];
  const faults: unknown[] = [];
  let now = 1_000;
  const outbox = new Outbox({
    storage,
    post: server.post,
    now: () => (now += 1),
    alone: (work) => work(),
    after: (ms, work) => {
      const wait = { ms, work };
      waits.push(wait);
      return () => {
        if (waits.includes(wait)) waits.splice(waits.indexOf(wait), 1);
      };
    },
    tell: (one) => news.push(one),
    report: (error) => faults.push(error),
    ...change,
  });
  const keep = (id: string, roundId = 'round') =>
    outbox.keep({ scope: SCOPE, roundId, person: RAY, drafts: [draft(id)], seen: 0 });
  return { outbox, storage, waits, news, faults, keep };
}

const offline = () => new OfflineError('no signal');

describe('keeping', () => {
  it('says that a record is on the phone only once the disk has it, and sends it', async () => {
    const server = new FakeServer();
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = [offline()];
    await keep('a');
    expect(savedState(outbox.snapshot())).toMatchObject({ count: 1 });
    await outbox.settled();
    expect(savedState(outbox.snapshot())).toEqual({ state: 'on-phone', count: 1 });
    outbox.send();
    await outbox.settled();
    expect(server.stored).toEqual([{ roundId: 'round', id: 'a', sequence: 1 }]);
    expect(savedState(outbox.snapshot())).toEqual({ state: 'on-server', count: 0 });
  });

  it('rejects and keeps nothing when the disk takes nothing', async () => {
    const { outbox, storage, keep } = outboxOf(new FakeServer());
    await outbox.open(SCOPE);
    storage.full = true;
    await expect(keep('a')).rejects.toThrow('QuotaExceededError');
    expect(outbox.snapshot().kept).toEqual([]);
  });

  it('numbers a device’s records without a gap, drafts kept together in their order', async () => {
    const { outbox } = outboxOf(new FakeServer());
    await outbox.open(SCOPE);
    const kept = await outbox.keep({ scope: SCOPE, roundId: 'round', person: RAY, drafts: [draft('a'), draft('b')], seen: 0 });
    const next = await outbox.keep({ scope: SCOPE, roundId: 'round', person: RAY, drafts: [draft('c')], seen: 0 });
    expect([...kept, ...next].map(({ record }) => record.deviceSequence)).toEqual([1, 2, 3]);
  });

  it('runs its clock forward when the phone’s runs back, and never behind what it has seen', async () => {
    let now = 5_000;
    const { outbox } = outboxOf(new FakeServer(), new MemoryStorage(), { now: () => now });
    await outbox.open(SCOPE);
    const clockOf = async (id: string, seen: number) => {
      const [kept] = await outbox.keep({ scope: SCOPE, roundId: 'round', person: RAY, drafts: [draft(id)], seen });
      return kept?.record.clock;
    };
    expect(await clockOf('a', 0)).toEqual({ wall: 5_000, counter: 0 });
    now = 1_000;
    expect(await clockOf('b', 0)).toEqual({ wall: 5_000, counter: 1 });
    expect(await clockOf('c', 9_000)).toEqual({ wall: 9_000, counter: 0 });
    now = 9_500;
    expect(await clockOf('d', 0)).toEqual({ wall: 9_500, counter: 0 });
  });
});

describe('sending', () => {
  it('goes in device order, one round a batch', async () => {
    const server = new FakeServer();
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = [offline(), offline(), offline(), offline()];
    for (const [id, round] of [
      ['a', 'one'],
      ['b', 'one'],
      ['c', 'two'],
      ['d', 'one'],
    ] as const) {
      await keep(id, round);
      await outbox.settled();
    }
    outbox.send();
    await outbox.settled();
    expect(server.batches).toEqual([['a', 'b'], ['c'], ['d']]);
    expect(server.stored.map(({ sequence }) => sequence)).toEqual([1, 2, 3, 4]);
  });

  it('sends no more than 500 at once', async () => {
    const server = new FakeServer();
    const { outbox } = outboxOf(server);
    await outbox.open(SCOPE);
    const drafts = Array.from({ length: 1_201 }, (_, n) => draft(String(n)));
    await outbox.keep({ scope: SCOPE, roundId: 'round', person: RAY, drafts, seen: 0 });
    await outbox.settled();
    expect(server.batches.map((batch) => batch.length)).toEqual([500, 500, 201]);
  });

  it('stores once what was sent twice because the answer was lost', async () => {
    const server = new FakeServer();
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = ['lost'];
    await keep('a');
    await outbox.settled();
    expect(outbox.snapshot().kept).toHaveLength(1);
    outbox.send();
    await outbox.settled();
    expect(server.stored).toHaveLength(1);
    expect(outbox.snapshot().kept).toEqual([]);
  });

  it('waits longer after each failure in a row, a minute at most, and begins anew after one that worked', async () => {
    const server = new FakeServer();
    const { outbox, keep, waits } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = Array.from({ length: 8 }, offline);
    await keep('a');
    await outbox.settled();
    const waited: number[] = [];
    for (let failure = 1; failure < 8; failure += 1) {
      const wait = waits.shift();
      waited.push(wait?.ms ?? 0);
      wait?.work();
      await outbox.settled();
    }
    expect(waited).toEqual([2_000, 4_000, 8_000, 16_000, 32_000, 60_000, 60_000]);
    waits.shift()?.work();
    await outbox.settled();
    server.faults = [offline()];
    await keep('b');
    await outbox.settled();
    expect(waits.map(({ ms }) => ms)).toEqual([2_000]);
  });

  it('keeps everything and stays quiet when signed out', async () => {
    const server = new FakeServer();
    const { outbox, keep, waits } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = [new ApiError(401, 'signed-out', '')];
    await keep('a');
    await outbox.settled();
    expect(waits).toEqual([]);
    expect(outbox.snapshot().kept).toHaveLength(1);
  });

  it('tells what was stored before it leaves the phone, so that a record is always in one of both', async () => {
    const server = new FakeServer();
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    const held: StoredRecord[] = [];
    outbox.onStored((_, records) => held.push(...records));
    const missing: string[] = [];
    outbox.subscribe(() => {
      const ids = [...outbox.snapshot().kept.map(({ id }) => id), ...held.map(({ record }) => record.id)];
      if (server.stored.some(({ id }) => !ids.includes(id))) missing.push('gone');
    });
    await keep('a');
    await outbox.settled();
    expect(held.map(({ record }) => record.id)).toEqual(['a']);
    expect(missing).toEqual([]);
  });
});

describe('what the server refuses', () => {
  it('stands on the list with its reason, and blocks nothing', async () => {
    const server = new FakeServer();
    server.refuse.set('b', { id: 'b', answer: 'rejected', refusal: 'round-closed' });
    server.refuse.set('c', { id: 'c', answer: 'conflict' });
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    for (const id of ['a', 'b', 'c', 'd']) await keep(id);
    await outbox.settled();
    expect(server.stored.map(({ id }) => id)).toEqual(['a', 'd']);
    expect(outbox.snapshot().kept.map(({ id, refused }) => [id, refused])).toEqual([
      ['b', 'round-closed'],
      ['c', 'conflict'],
    ]);
    expect(savedState(outbox.snapshot())).toEqual({ state: 'needs-you', count: 2 });
  });

  it('is not sent again by itself, only when somebody says so', async () => {
    const server = new FakeServer();
    server.refuse.set('a', { id: 'a', answer: 'rejected', refusal: 'round-closed' });
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    await keep('a');
    await outbox.settled();
    outbox.send();
    await outbox.settled();
    expect(server.batches).toHaveLength(1);
    server.refuse.clear();
    await outbox.sendAgain(['a']);
    await outbox.settled();
    expect(server.stored.map(({ id }) => id)).toEqual(['a']);
  });

  it('of a batch refused whole is found one by one', async () => {
    const server = new FakeServer();
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = [offline(), offline()];
    await keep('a');
    await outbox.settled();
    await keep('b');
    await outbox.settled();
    server.faults = [new ApiError(400, 'body-invalid', ''), new ApiError(400, 'body-invalid', '')];
    outbox.send();
    await outbox.settled();
    expect(outbox.snapshot().kept.map(({ id, refused }) => [id, refused])).toEqual([['a', 'body-invalid']]);
    expect(server.stored.map(({ id }) => id)).toEqual(['b']);
  });

  it('can be let go, and nothing else can', async () => {
    const server = new FakeServer();
    server.refuse.set('a', { id: 'a', answer: 'conflict' });
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    await keep('a');
    await outbox.settled();
    server.faults = [offline()];
    await keep('b');
    await outbox.settled();
    await outbox.letGo(['a', 'b']);
    expect(outbox.snapshot().kept.map(({ id }) => id)).toEqual(['b']);
  });
});

describe('several people and several tabs', () => {
  it('sends only what the person who is signed in made', async () => {
    const server = new FakeServer();
    const { outbox, keep } = outboxOf(server);
    await outbox.open(SCOPE);
    server.faults = [offline()];
    await keep('a');
    await outbox.settled();
    await outbox.open(outboxScope('company', 'mia'));
    await outbox.settled();
    expect(outbox.snapshot()).toMatchObject({ kept: [], ready: true });
    expect(server.stored).toEqual([]);
    await outbox.open(SCOPE);
    await outbox.settled();
    expect(server.stored.map(({ id }) => id)).toEqual(['a']);
  });

  it('shows in one tab what another kept and sent', async () => {
    const server = new FakeServer();
    const storage = new MemoryStorage();
    const other = outboxOf(server, storage);
    const one = outboxOf(server, storage, { tell: (news) => void other.outbox.heard(news) });
    await other.outbox.open(SCOPE);
    await one.outbox.open(SCOPE);
    const heard: string[] = [];
    other.outbox.onStored((_, records) => heard.push(...records.map(({ record }) => record.id)));
    await one.keep('a');
    await one.outbox.settled();
    expect(heard).toEqual(['a']);
    expect(other.outbox.snapshot().kept).toEqual([]);
  });

  it('says that nothing can be recorded where the browser keeps nothing', async () => {
    const storage = new MemoryStorage();
    storage.all = () => Promise.reject(new Error('SecurityError'));
    const { outbox, faults } = outboxOf(new FakeServer(), storage);
    await outbox.open(SCOPE);
    expect(outbox.snapshot()).toMatchObject({ broken: true, ready: false });
    expect(faults).toHaveLength(1);
  });
});
