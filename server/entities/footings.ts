import { EntitySchema } from 'typeorm';
import type { MeasuredOn } from '@/shared/api/footing-schemas';
import type { Rail } from '@/shared/records';
import { big, companyId, double, flag, id, integer, text, time, uuid } from './columns';

export interface FootingRow {
  companyId: string;
  id: string;
  jobId: string;
  name: string;
  planGrade: number;
  width: number;
  thickness: number;
  wallThickness: number;
  measuredOn: MeasuredOn;
  railOffset: number;
  rails: 'centre' | 'both';
  digNeeded: boolean;
  landmarkName: string | null;
  landmarkAzimuth: number | null;
  outlineVersion: number;
  spacing: number | null;
  createdAt: Date;
  createdBy: string;
}
export const FootingEntity = new EntitySchema<FootingRow>({
  name: 'Footing',
  tableName: 'footings',
  columns: {
    companyId,
    id,
    jobId: uuid,
    name: text,
    planGrade: big,
    width: big,
    thickness: big,
    wallThickness: big,
    measuredOn: text,
    railOffset: big,
    rails: text,
    digNeeded: flag,
    landmarkName: { ...text, nullable: true },
    landmarkAzimuth: { ...double, nullable: true },
    outlineVersion: integer,
    spacing: { ...big, nullable: true },
    createdAt: time,
    createdBy: uuid,
  },
});

/** `turn`: degrees at the run's end, clockwise positive. Null width or thickness: the footing's own. */
export interface RunRow {
  companyId: string;
  id: string;
  footingId: string;
  position: number;
  length: number;
  turn: number;
  width: number | null;
  thickness: number | null;
}
export const RunEntity = new EntitySchema<RunRow>({
  name: 'Run',
  tableName: 'runs',
  columns: {
    companyId,
    id,
    footingId: uuid,
    position: integer,
    length: big,
    turn: double,
    width: { ...big, nullable: true },
    thickness: { ...big, nullable: true },
  },
});

/** `at`: from the run's start; `by`: up positive. */
export interface StepRow {
  companyId: string;
  id: string;
  runId: string;
  at: number;
  by: number;
}
export const StepEntity = new EntitySchema<StepRow>({
  name: 'Step',
  tableName: 'steps',
  columns: { companyId, id, runId: uuid, at: big, by: big },
});

/** `at`: along the walk from its start. `name`: a person's; null: called by its distance. `added`: by a person, between those that were laid out. */
export interface StationRow {
  companyId: string;
  id: string;
  footingId: string;
  runId: string;
  position: number;
  at: number;
  name: string | null;
  added: boolean;
  corner: string | null;
  step: 'before' | 'after' | null;
  planGrade: number;
  x: number;
  y: number;
}
export const StationEntity = new EntitySchema<StationRow>({
  name: 'Station',
  tableName: 'stations',
  columns: {
    companyId,
    id,
    footingId: uuid,
    runId: uuid,
    position: integer,
    at: big,
    name: { ...text, nullable: true },
    added: flag,
    corner: { ...text, nullable: true },
    step: { ...text, nullable: true },
    planGrade: big,
    x: double,
    y: double,
  },
});

/** Where a rail of a station is on the plan, nm. */
export interface StationPointRow {
  companyId: string;
  stationId: string;
  rail: Rail;
  x: number;
  y: number;
}
export const StationPoint = new EntitySchema<StationPointRow>({
  name: 'StationPoint',
  tableName: 'station_points',
  columns: { companyId, stationId: id, rail: { type: 'text', primary: true }, x: double, y: double },
});
