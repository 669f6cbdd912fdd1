import { z } from 'zod';
import { idSchema, nameSchema, nmSchema, noteSchema, positiveNmSchema, timeSchema, unitStyleSchema } from '../quantities';
import {
  bedRuleInputSchema,
  bedRuleSchema,
  surfaceSchema,
  toleranceRuleInputSchema,
  toleranceRuleSchema,
  wallTypeSchema,
} from '../rules';
import { endpoint } from './endpoint';
import { footingSummarySchema } from './footing-schemas';

const jobFields = {
  name: nameSchema,
  address: z.string().trim().max(300),
  unitStyle: unitStyleSchema,
  /** The finest mark that rods are read to on this job, one of GRADUATIONS of the style. */
  graduation: positiveNmSchema,
  wallType: wallTypeSchema,
};

export const benchmarkSchema = z.strictObject({
  id: idSchema,
  jobId: idSchema,
  name: z.string(),
  elevation: nmSchema,
  note: z.string(),
  version: z.int().positive(),
});
export type Benchmark = z.infer<typeof benchmarkSchema>;
export const benchmarkInputSchema = z.strictObject({ name: nameSchema, elevation: nmSchema, note: noteSchema });

export const jobSchema = z.strictObject({
  id: idSchema,
  ...jobFields,
  createdAt: timeSchema,
  /** The rule in force of each surface: the newest version. */
  toleranceRules: z.array(toleranceRuleSchema),
  bedRule: bedRuleSchema,
  benchmarks: z.array(benchmarkSchema),
  footings: z.array(footingSummarySchema),
});
export type Job = z.infer<typeof jobSchema>;
export const jobSummarySchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  address: z.string(),
  unitStyle: unitStyleSchema,
  footings: z.array(footingSummarySchema),
});
export type JobSummary = z.infer<typeof jobSummarySchema>;

/** What waits for the person who asks, most pressing first. */
export const waitingSchema = z.strictObject({
  what: z.enum([
    'enter-laser',
    'enter-job',
    'draw-outline',
    'set-stations',
    'finish-round',
    'shoot-rails',
    'shoot-top',
    'mend-rails',
    'see-results',
  ]),
  jobId: idSchema.nullable(),
  jobName: z.string().nullable(),
  footingId: idSchema.nullable(),
  footingName: z.string().nullable(),
  roundId: idSchema.nullable(),
  shot: z.int().nullable(),
  of: z.int().nullable(),
});
export type Waiting = z.infer<typeof waitingSchema>;

const jobId = z.strictObject({ jobId: idSchema });

export const jobEndpoints = {
  today: endpoint({
    method: 'GET',
    path: '/api/today',
    summary: 'What waits for whoever asks, and the footings in hand.',
    access: 'signed-in',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: z.strictObject({ waiting: z.array(waitingSchema), footings: z.array(footingSummarySchema) }),
  }),
  jobs: endpoint({
    method: 'GET',
    path: '/api/jobs',
    summary: 'Every job of the company, newest first.',
    access: 'signed-in',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: z.strictObject({ jobs: z.array(jobSummarySchema) }),
  }),
  job: endpoint({
    method: 'GET',
    path: '/api/jobs/:jobId',
    summary: 'One job with its rules, benchmarks and footings.',
    access: 'signed-in',
    status: 200,
    params: jobId,
    query: null,
    body: null,
    response: jobSchema,
  }),
  addJob: endpoint({
    method: 'POST',
    path: '/api/jobs',
    summary: 'A new job; absent rules are the ready ones of its wall and unit.',
    access: { may: 'job.write' },
    status: 201,
    params: null,
    query: null,
    body: z.strictObject({
      ...jobFields,
      rules: z.partialRecord(surfaceSchema, toleranceRuleInputSchema).optional(),
      bedRule: bedRuleInputSchema.optional(),
    }),
    response: jobSchema,
  }),
  changeJob: endpoint({
    method: 'PATCH',
    path: '/api/jobs/:jobId',
    summary: 'Change a job; absent keeps.',
    access: { may: 'job.write' },
    status: 200,
    params: jobId,
    query: null,
    body: z.strictObject(jobFields).partial(),
    response: jobSchema,
  }),
  setToleranceRule: endpoint({
    method: 'PUT',
    path: '/api/jobs/:jobId/rules/:surface',
    summary: 'A new version of a surface’s tolerance; the old ones stay.',
    access: { may: 'rules.change' },
    status: 200,
    params: z.strictObject({ jobId: idSchema, surface: surfaceSchema }),
    query: null,
    body: toleranceRuleInputSchema,
    response: toleranceRuleSchema,
  }),
  setBedRule: endpoint({
    method: 'PUT',
    path: '/api/jobs/:jobId/bed-rule',
    summary: 'A new version of the bed rule; the old ones stay.',
    access: { may: 'rules.change' },
    status: 200,
    params: jobId,
    query: null,
    body: bedRuleInputSchema,
    response: bedRuleSchema,
  }),
  addBenchmark: endpoint({
    method: 'POST',
    path: '/api/jobs/:jobId/benchmarks',
    summary: 'A point of known elevation.',
    access: { may: 'benchmark.add' },
    status: 201,
    params: jobId,
    query: null,
    body: benchmarkInputSchema,
    response: benchmarkSchema,
  }),
  changeBenchmark: endpoint({
    method: 'PATCH',
    path: '/api/benchmarks/:benchmarkId',
    summary: 'Correct a benchmark; every elevation shot from it follows.',
    access: { may: 'benchmark.change' },
    status: 200,
    params: z.strictObject({ benchmarkId: idSchema }),
    query: null,
    body: benchmarkInputSchema.partial().extend({ version: z.int().positive() }),
    response: benchmarkSchema,
  }),
};
