import { EntitySchema } from 'typeorm';
import type { UnitStyle } from '@/shared/quantities';
import type { FieldRecord, Rail, ReadingRecord, Refusal, RodPoint, StrikeRecord } from '@/shared/records';
import type { Surface } from '@/shared/rules';
import { big, companyId, double, id, integer, text, time, uuid } from './columns';

/** `toleranceRuleId`, `bedRuleId`: the versions in force when it was opened, by which it is judged for good. */
export interface RoundRow {
  companyId: string;
  id: string;
  footingId: string;
  surface: Surface;
  number: number;
  openedAt: Date;
  openedBy: string;
  closedAt: Date | null;
  toleranceRuleId: string;
  bedRuleId: string;
  lastSequence: number;
}
export const RoundEntity = new EntitySchema<RoundRow>({
  name: 'Round',
  tableName: 'rounds',
  columns: {
    companyId,
    id,
    footingId: uuid,
    surface: text,
    number: integer,
    openedAt: time,
    openedBy: uuid,
    closedAt: { ...time, nullable: true },
    toleranceRuleId: uuid,
    bedRuleId: uuid,
    lastSequence: integer,
  },
});

/**
 * The spine of every record: whose, from which phone, in which order. A refused one keeps its place among the phone's records
 * and what it said (`refusedContent`, as JSON), and has no place in the round. `orderedAt`, `clockWall`, `clockSkew`: milliseconds.
 */
export interface RecordRow {
  companyId: string;
  id: string;
  roundId: string;
  kind: FieldRecord['kind'] | null;
  deviceId: string;
  deviceSequence: number;
  clockWall: number | null;
  clockCounter: number | null;
  madeAt: Date | null;
  receivedAt: Date;
  orderedAt: number;
  clockSkew: number;
  personId: string;
  roundSequence: number | null;
  contentHash: string;
  refusal: Refusal | null;
  refusedContent: string | null;
}
export const RecordEntity = new EntitySchema<RecordRow>({
  name: 'Record',
  tableName: 'records',
  columns: {
    companyId,
    id,
    roundId: uuid,
    kind: { ...text, nullable: true },
    deviceId: uuid,
    deviceSequence: big,
    clockWall: { ...big, nullable: true },
    clockCounter: { ...integer, nullable: true },
    madeAt: { ...time, nullable: true },
    receivedAt: time,
    orderedAt: big,
    clockSkew: big,
    personId: uuid,
    roundSequence: { ...integer, nullable: true },
    contentHash: text,
    refusal: { ...text, nullable: true },
    refusedContent: { ...text, nullable: true },
  },
});

export interface SetupRow {
  companyId: string;
  recordId: string;
  laserId: string;
  standX: number | null;
  standY: number | null;
}
export const SetupEntity = new EntitySchema<SetupRow>({
  name: 'Setup',
  tableName: 'setups',
  columns: {
    companyId,
    recordId: id,
    laserId: uuid,
    standX: { ...double, nullable: true },
    standY: { ...double, nullable: true },
  },
});

export interface SeriesRow {
  companyId: string;
  recordId: string;
  setupId: string;
  rodId: string;
  checkLimit: number;
  benchmarkDistance: number | null;
}
export const SeriesEntity = new EntitySchema<SeriesRow>({
  name: 'Series',
  tableName: 'series',
  columns: {
    companyId,
    recordId: id,
    setupId: uuid,
    rodId: uuid,
    checkLimit: big,
    benchmarkDistance: { ...big, nullable: true },
  },
});

/** One reading, whatever its purpose. */
export interface ShotRow {
  companyId: string;
  recordId: string;
  seriesId: string;
  purpose: ReadingRecord['purpose'];
  pointKind: RodPoint['kind'];
  stationId: string | null;
  rail: Rail | null;
  benchmarkId: string | null;
  turningName: string | null;
  how: ReadingRecord['how'];
  receiver: ReadingRecord['receiver'];
  keyed: string;
  style: UnitStyle;
  reading: number;
  lap: number;
}
export const ShotEntity = new EntitySchema<ShotRow>({
  name: 'Shot',
  tableName: 'shots',
  columns: {
    companyId,
    recordId: id,
    seriesId: uuid,
    purpose: text,
    pointKind: text,
    stationId: { ...uuid, nullable: true },
    rail: { ...text, nullable: true },
    benchmarkId: { ...uuid, nullable: true },
    turningName: { ...text, nullable: true },
    how: text,
    receiver: { ...text, nullable: true },
    keyed: text,
    style: text,
    reading: big,
    lap: integer,
  },
});

export interface StrikeRow {
  companyId: string;
  recordId: string;
  targetId: string;
  reason: StrikeRecord['reason'];
  words: string;
}
export const StrikeEntity = new EntitySchema<StrikeRow>({
  name: 'Strike',
  tableName: 'strikes',
  columns: { companyId, recordId: id, targetId: uuid, reason: text, words: text },
});
