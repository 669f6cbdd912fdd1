import type { FieldRecord, ReadingRecord, Refusal } from '@/shared/records';
import type { Tenant } from '../../api/handler';
import {
  RecordEntity,
  SeriesEntity,
  SetupEntity,
  ShotEntity,
  StrikeEntity,
  type RecordRow,
  type ShotRow,
} from '../../entities/rounds';
import type { Entry } from './read-entry';

/** What the server adds to a record on receipt. */
export type Received = Pick<RecordRow, 'companyId' | 'personId' | 'roundId' | 'receivedAt' | 'orderedAt' | 'clockSkew'>;

/** The spine of a record that is taken, at its place in the round. */
export function takenRow({ hash }: Entry, record: FieldRecord, received: Received, roundSequence: number): RecordRow {
  return {
    ...received,
    id: record.id,
    kind: record.kind,
    deviceId: record.deviceId,
    deviceSequence: record.deviceSequence,
    clockWall: record.clock.wall,
    clockCounter: record.clock.counter,
    madeAt: new Date(record.madeAt),
    roundSequence,
    contentHash: hash,
    refusal: null,
    refusedContent: null,
  };
}

/** What a refused record leaves: its place among the phone's, and what it said. */
export function refusedRow(
  { id, hash, content }: Entry,
  place: { deviceId: string; deviceSequence: number },
  received: Received,
  refusal: Refusal,
): RecordRow {
  return {
    ...received,
    id,
    kind: null,
    deviceId: place.deviceId,
    deviceSequence: place.deviceSequence,
    clockWall: null,
    clockCounter: null,
    madeAt: null,
    roundSequence: null,
    contentHash: hash,
    refusal,
    refusedContent: JSON.stringify(content),
  };
}

/** Writes spines and, of those taken, each kind's own rows, for good. */
export async function writeRecords(
  { manager, actor }: Tenant,
  rows: readonly RecordRow[],
  taken: readonly FieldRecord[],
): Promise<void> {
  if (rows.length > 0) await manager.insert(RecordEntity, [...rows]);
  const key = (record: FieldRecord) => ({ companyId: actor.companyId, recordId: record.id });
  const setups = taken.flatMap((record) =>
    record.kind === 'setup'
      ? [{ ...key(record), laserId: record.laserId, standX: record.stand?.x ?? null, standY: record.stand?.y ?? null }]
      : [],
  );
  const series = taken.flatMap((record) => {
    if (record.kind !== 'series') return [];
    const { setupId, rodId, checkLimit, benchmarkDistance } = record;
    return [{ ...key(record), setupId, rodId, checkLimit, benchmarkDistance }];
  });
  const shots = taken.flatMap((record) => (record.kind === 'reading' ? [{ ...key(record), ...shotColumns(record) }] : []));
  const strikes = taken.flatMap((record) => {
    if (record.kind !== 'strike') return [];
    const { targetId, reason, words } = record;
    return [{ ...key(record), targetId, reason, words }];
  });
  if (setups.length > 0) await manager.insert(SetupEntity, setups);
  if (series.length > 0) await manager.insert(SeriesEntity, series);
  if (shots.length > 0) await manager.insert(ShotEntity, shots);
  if (strikes.length > 0) await manager.insert(StrikeEntity, strikes);
}

function shotColumns(record: ReadingRecord): Omit<ShotRow, 'companyId' | 'recordId'> {
  const { seriesId, purpose, point, how, receiver, keyed, style, reading, lap } = record;
  return {
    seriesId,
    purpose,
    pointKind: point.kind,
    stationId: point.kind === 'station' ? point.stationId : null,
    rail: point.kind === 'station' ? point.rail : null,
    benchmarkId: point.kind === 'benchmark' ? point.benchmarkId : null,
    turningName: point.kind === 'turning' ? point.name : null,
    how,
    receiver,
    keyed,
    style,
    reading,
    lap,
  };
}
