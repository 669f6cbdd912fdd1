import { EntitySchema } from 'typeorm';
import type { UnitStyle } from '@/shared/quantities';
import type { BedRule as BedRuleShape, Surface, ToleranceRule as ToleranceRuleShape, WallType } from '@/shared/rules';
import { big, companyId, double, id, integer, text, time, uuid } from './columns';

export interface JobRow {
  companyId: string;
  id: string;
  name: string;
  address: string;
  unitStyle: UnitStyle;
  graduation: number;
  wallType: WallType;
  createdAt: Date;
  createdBy: string;
}
export const Job = new EntitySchema<JobRow>({
  name: 'Job',
  tableName: 'jobs',
  columns: {
    companyId,
    id,
    name: text,
    address: text,
    unitStyle: text,
    graduation: big,
    wallType: text,
    createdAt: time,
    createdBy: uuid,
  },
});

/** One version of the tolerance of one surface of a job. Written once; the newest is in force. */
export interface ToleranceRuleRow {
  companyId: string;
  id: string;
  jobId: string;
  surface: Surface;
  version: number;
  low: number;
  high: number;
  decision: ToleranceRuleShape['decision'];
  style: UnitStyle;
  createdAt: Date;
  createdBy: string;
}
export const ToleranceRule = new EntitySchema<ToleranceRuleRow>({
  name: 'ToleranceRule',
  tableName: 'tolerance_rules',
  columns: {
    companyId,
    id,
    jobId: uuid,
    surface: text,
    version: integer,
    low: big,
    high: big,
    decision: text,
    style: text,
    createdAt: time,
    createdBy: uuid,
  },
});

/** One version of how the first course is bedded. Written once; the newest is in force. */
export interface BedRuleRow {
  companyId: string;
  id: string;
  jobId: string;
  version: number;
  material: BedRuleShape['material'];
  least: number;
  most: number;
  nominal: number;
  grindMost: number;
  beddedFraction: number;
  courseHeight: number | null;
  style: UnitStyle;
  createdAt: Date;
  createdBy: string;
}
export const BedRule = new EntitySchema<BedRuleRow>({
  name: 'BedRule',
  tableName: 'bed_rules',
  columns: {
    companyId,
    id,
    jobId: uuid,
    version: integer,
    material: text,
    least: big,
    most: big,
    nominal: big,
    grindMost: big,
    beddedFraction: double,
    courseHeight: { ...big, nullable: true },
    style: text,
    createdAt: time,
    createdBy: uuid,
  },
});

/** A benchmark is its id; what is known of it is in its versions, of which the newest holds. */
export interface BenchmarkRow {
  companyId: string;
  id: string;
  jobId: string;
}
export const BenchmarkPlace = new EntitySchema<BenchmarkRow>({
  name: 'BenchmarkPlace',
  tableName: 'benchmarks',
  columns: { companyId, id, jobId: uuid },
});
export interface BenchmarkVersionRow {
  companyId: string;
  benchmarkId: string;
  version: number;
  name: string;
  elevation: number;
  note: string;
  createdAt: Date;
  createdBy: string;
}
export const BenchmarkVersion = new EntitySchema<BenchmarkVersionRow>({
  name: 'BenchmarkVersion',
  tableName: 'benchmark_versions',
  columns: {
    companyId,
    benchmarkId: id,
    version: { ...integer, primary: true },
    name: text,
    elevation: big,
    note: text,
    createdAt: time,
    createdBy: uuid,
  },
});
