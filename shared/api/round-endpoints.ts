import { z } from 'zod';
import { idSchema, timeSchema } from '../quantities';
import { recordAnswerSchema, recordSchema, storedRecordSchema } from '../records';
import { bedRuleSchema, surfaceSchema, toleranceRuleSchema } from '../rules';
import { endpoint } from './endpoint';
import { footingSchema, roundSummarySchema } from './footing-schemas';
import { laserSchema, rodSchema } from './instrument-endpoints';
import { benchmarkSchema, jobSchema } from './job-endpoints';

const roundId = z.strictObject({ roundId: idSchema });

/** Everything that a phone needs to shoot and judge a round: what foldRound takes beside the records. */
export const roundBundleSchema = z.strictObject({
  round: roundSummarySchema,
  job: jobSchema.pick({ id: true, name: true, unitStyle: true, graduation: true, wallType: true }),
  footing: footingSchema,
  benchmarks: z.array(benchmarkSchema),
  lasers: z.array(laserSchema),
  rods: z.array(rodSchema),
  /** The rules that this round is judged by: the versions in force when it was opened. */
  toleranceRule: toleranceRuleSchema,
  bedRule: bedRuleSchema,
});
export type RoundBundle = z.infer<typeof roundBundleSchema>;

export const roundEndpoints = {
  openRound: endpoint({
    method: 'POST',
    path: '/api/footings/:footingId/rounds',
    summary: 'Open a round of a surface under the rules now in force. The id is the phone’s: asked twice, answered alike.',
    access: { may: 'round.shoot' },
    status: 201,
    params: z.strictObject({ footingId: idSchema }),
    query: null,
    body: z.strictObject({ id: idSchema, surface: surfaceSchema }),
    response: roundBundleSchema,
  }),
  round: endpoint({
    method: 'GET',
    path: '/api/rounds/:roundId',
    summary: 'One round with all that judging it needs, less its records.',
    access: 'signed-in',
    status: 200,
    params: roundId,
    query: null,
    body: null,
    response: roundBundleSchema,
  }),
  changeRound: endpoint({
    method: 'PATCH',
    path: '/api/rounds/:roundId',
    summary: 'Close a round, or open it again.',
    access: { may: 'round.shoot' },
    status: 200,
    params: roundId,
    query: null,
    body: z.strictObject({ closed: z.boolean() }),
    response: roundBundleSchema,
  }),
  records: endpoint({
    method: 'GET',
    path: '/api/rounds/:roundId/records',
    summary: 'The records of a round after a sequence number, in that order.',
    access: 'signed-in',
    status: 200,
    params: roundId,
    query: z.strictObject({ after: z.coerce.number().int().min(0).default(0) }),
    body: null,
    response: z.strictObject({ records: z.array(storedRecordSchema), last: z.int().min(0), more: z.boolean() }),
  }),
  sendRecords: endpoint({
    method: 'POST',
    path: '/api/rounds/:roundId/records',
    summary:
      'A batch of records in device order, in one transaction, answered one by one. One that is refused holds up none of the others.',
    access: { may: 'record.send' },
    status: 200,
    params: roundId,
    query: null,
    /** `sentAt` is the phone's clock as it sends: the server learns by it how far that clock is off. */
    body: z.strictObject({
      sentAt: timeSchema,
      records: z
        .array(z.union([recordSchema, z.looseObject({ id: idSchema })]))
        .min(1)
        .max(500),
    }),
    response: z.strictObject({ answers: z.array(recordAnswerSchema) }),
  }),
};
