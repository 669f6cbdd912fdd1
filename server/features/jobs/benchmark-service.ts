import { In } from 'typeorm';
import type { z } from 'zod';
import type { Benchmark, benchmarkInputSchema } from '@/shared/api/job-endpoints';
import type { Tenant } from '../../api/handler';
import { sqlState, UNIQUE_VIOLATION } from '../../database/database';
import { BenchmarkPlace, BenchmarkVersion } from '../../entities/jobs';
import { ApiError, nameTaken, NotFound } from '../../errors';

type BenchmarkInput = z.output<typeof benchmarkInputSchema>;

/** What is now known of every benchmark of these jobs, by job, each job's by name. */
export async function benchmarksOfJobs({ manager, actor }: Tenant, jobIds: readonly string[]): Promise<Map<string, Benchmark[]>> {
  const { companyId } = actor;
  const places = jobIds.length === 0 ? [] : await manager.findBy(BenchmarkPlace, { companyId, jobId: In([...jobIds]) });
  const versions =
    places.length === 0
      ? []
      : await manager.find(BenchmarkVersion, {
          where: { companyId, benchmarkId: In(places.map(({ id }) => id)) },
          order: { version: 'DESC' },
        });
  const byJob = new Map<string, Benchmark[]>(jobIds.map((id) => [id, []]));
  for (const { id, jobId } of places) {
    const newest = versions.find(({ benchmarkId }) => benchmarkId === id);
    if (newest === undefined) continue;
    const { name, elevation, note, version } = newest;
    byJob.get(jobId)?.push({ id, jobId, name, elevation, note, version });
  }
  for (const benchmarks of byJob.values()) benchmarks.sort((a, b) => a.name.localeCompare(b.name) || a.id.localeCompare(b.id));
  return byJob;
}

/** @throws ApiError 'name-taken' */
export async function addBenchmark(tenant: Tenant, jobId: string, input: BenchmarkInput): Promise<Benchmark> {
  await refuseNameTaken(tenant, jobId, input.name, null);
  const id = tenant.newId();
  await tenant.manager.insert(BenchmarkPlace, { companyId: tenant.actor.companyId, id, jobId });
  return addVersion(tenant, { id, jobId, version: 1, ...input });
}

/**
 * Corrects a benchmark by a new version of it; the old one stays.
 * @throws NotFound; ApiError 'out-of-date' when somebody corrected it first, 'name-taken'
 */
export async function changeBenchmark(
  tenant: Tenant,
  id: string,
  { version, ...change }: Partial<BenchmarkInput> & { version: number },
): Promise<Benchmark> {
  const place = await tenant.manager.findOneBy(BenchmarkPlace, { companyId: tenant.actor.companyId, id });
  const known =
    place && (await benchmarksOfJobs(tenant, [place.jobId])).get(place.jobId)?.find((benchmark) => benchmark.id === id);
  if (!known) throw new NotFound();
  if (known.version !== version) throw changedFirst();
  const next = { ...known, ...change, version: version + 1 };
  await refuseNameTaken(tenant, known.jobId, next.name, id);
  try {
    return await addVersion(tenant, next);
  } catch (error) {
    throw sqlState(error) === UNIQUE_VIOLATION ? changedFirst() : error;
  }
}

function changedFirst(): ApiError {
  return new ApiError('out-of-date', 'Somebody corrected this benchmark first.');
}

async function addVersion(tenant: Tenant, benchmark: Benchmark): Promise<Benchmark> {
  const { id, version, name, elevation, note } = benchmark;
  const { companyId, personId } = tenant.actor;
  const written = { createdAt: tenant.now(), createdBy: personId };
  await tenant.manager.insert(BenchmarkVersion, { companyId, benchmarkId: id, version, name, elevation, note, ...written });
  return benchmark;
}

/** Two marks of one name would be read for one another. */
async function refuseNameTaken(tenant: Tenant, jobId: string, name: string, except: string | null): Promise<void> {
  const others = (await benchmarksOfJobs(tenant, [jobId])).get(jobId) ?? [];
  if (others.some((other) => other.id !== except && other.name === name)) throw nameTaken('name');
}
