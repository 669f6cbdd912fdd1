import { In } from 'typeorm';
import type { z } from 'zod';
import type { endpoints } from '@/shared/api/endpoints';
import type { FieldRecord, RecordAnswer, Refusal, StoredRecord } from '@/shared/records';
import type { Tenant } from '../../api/handler';
import { RecordEntity, RoundEntity, type RecordRow, type RoundRow } from '../../entities/rounds';
import { namesOf } from '../crew/crew-service';
import { holdFooting } from '../footings/footing-rows';
import { findRound, lockRound } from '../rounds/round-service';
import { lockDevices, readTimelines, type DeviceTimeline } from './device-timeline';
import { refusalOf } from './judge-record';
import { readEntry, type Entry } from './read-entry';
import { surroundingsOf, type LearningSurroundings } from './record-surroundings';
import { recordsAfter } from './stored-records';
import { refusedRow, takenRow, writeRecords, type Received } from './write-records';

type Batch = z.output<typeof endpoints.sendRecords.body>;

/** Readers page through a round; a long day's round is two pages. */
const PAGE = 500;

/** @throws NotFound */
export async function readRecords(
  tenant: Tenant,
  roundId: string,
  after: number,
): Promise<{ records: StoredRecord[]; last: number; more: boolean }> {
  await findRound(tenant, roundId);
  const found = await recordsAfter(tenant, roundId, after, PAGE + 1);
  const records = found.slice(0, PAGE);
  return { records, last: records.at(-1)?.receipt.roundSequence ?? after, more: found.length > PAGE };
}

/**
 * Takes a batch into a round and answers for each record of it, in the order sent. All under the round's lock: places are handed
 * out in the order in which they are committed, so that a reader who has everything up to one place has missed none before it.
 * @throws NotFound
 */
export async function sendRecords(tenant: Tenant, roundId: string, { sentAt, records }: Batch): Promise<RecordAnswer[]> {
  const round = await lockRound(tenant, roundId);
  await holdFooting(tenant, round.footingId);
  const entries = records.map(readEntry);
  const places = entries.flatMap(({ place }) => (place === null ? [] : [place]));
  await lockDevices(
    tenant,
    places.map(({ deviceId }) => deviceId),
  );
  const { manager, actor } = tenant;
  const receivedAt = tenant.now();
  const taking = new Taking(
    {
      round,
      actor,
      receivedAt,
      clockSkew: receivedAt.getTime() - new Date(sentAt).getTime(),
      known: await surroundingsOf(
        tenant,
        round,
        entries.flatMap(({ record }) => (record === null ? [] : [record])),
      ),
      timelines: await readTimelines(tenant, places),
    },
    await manager.findBy(RecordEntity, { companyId: actor.companyId, id: In(entries.map(({ id }) => id)) }),
  );
  const outcomes = entries.map((entry) => taking.take(entry));
  await writeRecords(tenant, taking.rows, taking.taken);
  if (taking.taken.length > 0) {
    await manager.update(RoundEntity, { companyId: actor.companyId, id: roundId }, { lastSequence: taking.sequence });
  }
  return answersOf(tenant, outcomes);
}

interface Circumstances {
  round: RoundRow;
  actor: Tenant['actor'];
  receivedAt: Date;
  /** Server's clock less phone's, ms. */
  clockSkew: number;
  known: LearningSurroundings;
  timelines: ReadonlyMap<string, DeviceTimeline>;
}

type Outcome = { id: string } & (
  { answer: 'stored' | 'already'; row: RecordRow } | { answer: 'conflict' } | { answer: 'rejected'; refusal: Refusal }
);

/** Takes the entries of a batch one after the other, each seeing those before it; what is to be written gathers in `rows` and `taken`. */
class Taking {
  readonly rows: RecordRow[] = [];
  readonly taken: FieldRecord[] = [];
  sequence: number;
  private readonly there: Map<string, RecordRow>;

  constructor(
    private readonly at: Circumstances,
    there: readonly RecordRow[],
  ) {
    this.sequence = at.round.lastSequence;
    this.there = new Map(there.map((row) => [row.id, row]));
  }

  take(entry: Entry): Outcome {
    const id = entry.sentId;
    const there = this.there.get(entry.id);
    if (there !== undefined) return this.again(id, entry, there);
    const timeline = entry.place === null ? undefined : this.at.timelines.get(entry.place.deviceId);
    if (entry.place === null || timeline === undefined) return { id, answer: 'rejected', refusal: 'record-invalid' };
    if (timeline.has(entry.place.deviceSequence)) return { id, answer: 'rejected', refusal: 'sequence-taken' };
    const received = this.receive(entry.place, timeline);
    const { record } = entry;
    const refusal = record === null ? 'record-invalid' : refusalOf(record, received.orderedAt, this.at.known);
    if (record === null || refusal !== null) {
      const why = refusal ?? 'record-invalid';
      this.keep(refusedRow(entry, entry.place, received, why));
      return { id, answer: 'rejected', refusal: why };
    }
    this.sequence += 1;
    const row = takenRow(entry, record, received, this.sequence);
    this.keep(row);
    this.taken.push(record);
    this.at.known.learn(record);
    return { id, answer: 'stored', row };
  }

  /** The same said again gets the same answer; something else under the same id changes nothing. */
  private again(id: string, entry: Entry, there: RecordRow): Outcome {
    if (there.contentHash !== entry.hash || there.roundId !== this.at.round.id) return { id, answer: 'conflict' };
    if (there.refusal !== null) return { id, answer: 'rejected', refusal: there.refusal };
    return { id, answer: 'already', row: there };
  }

  private receive(place: NonNullable<Entry['place']>, timeline: DeviceTimeline): Received {
    const { round, actor, receivedAt, clockSkew } = this.at;
    const corrected = Math.min(place.wall + clockSkew, receivedAt.getTime());
    const orderedAt = timeline.take(place.deviceSequence, corrected);
    return { companyId: actor.companyId, personId: actor.personId, roundId: round.id, receivedAt, orderedAt, clockSkew };
  }

  private keep(row: RecordRow): void {
    this.rows.push(row);
    this.there.set(row.id, row);
  }
}

async function answersOf(tenant: Tenant, outcomes: readonly Outcome[]): Promise<RecordAnswer[]> {
  const names = await namesOf(
    tenant,
    outcomes.flatMap((outcome) => ('row' in outcome ? [outcome.row.personId] : [])),
  );
  return outcomes.map((outcome): RecordAnswer => {
    if (!('row' in outcome)) return outcome;
    const { id, answer, row } = outcome;
    const receipt = {
      roundSequence: row.roundSequence ?? 0,
      receivedAt: row.receivedAt.toISOString(),
      orderedAt: row.orderedAt,
      clockSkew: row.clockSkew,
      person: { id: row.personId, name: names.get(row.personId) ?? '' },
    };
    return { id, answer, receipt };
  });
}
