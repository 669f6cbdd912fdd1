import type { Nm } from '@/analysis';
import type { z } from 'zod';
import type { endpoints } from '@/shared/api/endpoints';
import { addFooting } from '../features/footings/footing-service';
import { setOutline } from '../features/footings/outline-service';
import { setStations } from '../features/footings/station-service';
import { addBenchmark } from '../features/jobs/benchmark-service';
import { addJob } from '../features/jobs/job-service';
import type { DemoCrew } from './demo-crew';

/** A job with one benchmark on it. */
export async function openJob(
  crew: DemoCrew,
  job: z.input<typeof endpoints.addJob.body>,
  mark: { name: string; elevation: Nm; note: string },
): Promise<{ jobId: string; benchmark: { id: string; elevation: Nm } }> {
  const { id } = await crew.as('super', (tenant) => addJob(tenant, job));
  const benchmark = await crew.as('operator', (tenant) => addBenchmark(tenant, id, mark));
  return { jobId: id, benchmark: { id: benchmark.id, elevation: benchmark.elevation } };
}

/** A run: its length, its turn at the end (degrees, clockwise), and steps on it. */
export interface DemoRun {
  length: Nm;
  turn: number;
  steps?: readonly { at: Nm; by: Nm }[];
}

/** A footing with its outline drawn and its stations laid out. @returns its id */
export async function layFooting(
  crew: DemoCrew,
  jobId: string,
  footing: z.input<typeof endpoints.addFooting.body>,
  outline: { runs: readonly DemoRun[]; spacing: Nm },
): Promise<string> {
  const { id } = await crew.as('super', (tenant) => addFooting(tenant, jobId, footing));
  await crew.as('operator', (tenant) => {
    const runs = outline.runs.map(({ length, turn, steps = [] }) => ({
      id: tenant.newId(),
      length,
      turn,
      width: null,
      thickness: null,
      steps: steps.map((step) => ({ id: tenant.newId(), ...step })),
    }));
    return setOutline(tenant, id, { runs, version: 0 });
  });
  await crew.as('operator', (tenant) => setStations(tenant, id, outline.spacing));
  return id;
}
