import { In } from 'typeorm';
import type { FieldRecord } from '@/shared/records';
import type { Tenant } from '../../api/handler';
import { FootingEntity } from '../../entities/footings';
import { BenchmarkPlace } from '../../entities/jobs';
import { RecordEntity, SeriesEntity, type RoundRow } from '../../entities/rounds';
import { listInstruments } from '../instruments/instrument-service';
import type { RecordSurroundings } from './judge-record';

/** What is known round a batch, and what it teaches as it is taken: a series that comes with it is known to the readings after it. */
export interface LearningSurroundings extends RecordSurroundings {
  learn(record: FieldRecord): void;
}

export async function surroundingsOf(
  tenant: Tenant,
  round: RoundRow,
  records: readonly FieldRecord[],
): Promise<LearningSurroundings> {
  const { lasers, rods } = await listInstruments(tenant);
  const rodOfSeries = await readRodsOfSeries(tenant, records);
  const makers = await readMakers(tenant, records);
  return {
    actor: tenant.actor,
    round,
    lasers: new Set(lasers.map(({ id }) => id)),
    rods: new Map(rods.map(({ id, length }) => [id, length])),
    places: await readPlaces(tenant, round.footingId),
    benchmarks: await readBenchmarks(tenant, round.footingId),
    rodOfSeries,
    makers,
    learn: (record) => {
      makers.set(record.id, tenant.actor.personId);
      if (record.kind === 'series') rodOfSeries.set(record.id, record.rodId);
    },
  };
}

async function readRodsOfSeries({ manager, actor }: Tenant, records: readonly FieldRecord[]): Promise<Map<string, string>> {
  const ids = [...new Set(records.flatMap((record) => (record.kind === 'reading' ? [record.seriesId] : [])))];
  const rows = ids.length === 0 ? [] : await manager.findBy(SeriesEntity, { companyId: actor.companyId, recordId: In(ids) });
  return new Map(rows.map(({ recordId, rodId }) => [recordId, rodId]));
}

async function readMakers({ manager, actor }: Tenant, records: readonly FieldRecord[]): Promise<Map<string, string>> {
  const ids = [...new Set(records.flatMap((record) => (record.kind === 'strike' ? [record.targetId] : [])))];
  const rows = ids.length === 0 ? [] : await manager.findBy(RecordEntity, { companyId: actor.companyId, id: In(ids) });
  return new Map(rows.map(({ id, personId }) => [id, personId]));
}

async function readPlaces({ manager, actor }: Tenant, footingId: string): Promise<Set<string>> {
  const rows: { key: string }[] = await manager.query(
    `select point.station_id || '/' || point.rail key from station_points point
     join stations station on station.company_id = point.company_id and station.id = point.station_id
     where point.company_id = $1 and station.footing_id = $2`,
    [actor.companyId, footingId],
  );
  return new Set(rows.map(({ key }) => key));
}

async function readBenchmarks({ manager, actor }: Tenant, footingId: string): Promise<Set<string>> {
  const { companyId } = actor;
  const { jobId } = await manager.findOneByOrFail(FootingEntity, { companyId, id: footingId });
  return new Set((await manager.findBy(BenchmarkPlace, { companyId, jobId })).map(({ id }) => id));
}
