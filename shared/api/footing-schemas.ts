import { z } from 'zod';
import {
  coordinateSchema,
  degreesSchema,
  idSchema,
  nameSchema,
  nmSchema,
  notNegativeNmSchema,
  positiveNmSchema,
  timeSchema,
  unitStyleSchema,
} from '../quantities';
import { railSchema } from '../records';
import { surfaceSchema } from '../rules';

const FOOT = 304_800_000;

/** The line that was taped: the wall's outer face, the footing's outer face, or the centre of both. */
export const measuredOnSchema = z.enum(['wall-face', 'footing-face', 'centre-line']);
export type MeasuredOn = z.infer<typeof measuredOnSchema>;

export const STAGES = ['outline', 'dig', 'rails', 'release', 'top', 'course'] as const;
export const stageSchema = z.enum(STAGES);
export type Stage = z.infer<typeof stageSchema>;

/** Stages are derived from the outline and the rounds, never stored. `now` is the first that is not done; null: all done. */
export const stagesSchema = z.strictObject({ done: z.array(stageSchema), now: stageSchema.nullable() });
export type Stages = z.infer<typeof stagesSchema>;

export const roundVerdictSchema = z.enum(['not-yet', 'cannot-tell', 'not-to-grade', 'too-close-to-call', 'to-grade']);
export type RoundVerdict = z.infer<typeof roundVerdictSchema>;

export const roundSummarySchema = z.strictObject({
  id: idSchema,
  footingId: idSchema,
  surface: surfaceSchema,
  number: z.int().positive(),
  openedAt: timeSchema,
  openedBy: z.string(),
  closedAt: timeSchema.nullable(),
  shot: z.int().min(0),
  of: z.int().min(0),
  out: z.int().min(0),
  verdict: roundVerdictSchema,
});
export type RoundSummary = z.infer<typeof roundSummarySchema>;

/** A footing as a line of a list; `unitStyle` is its job's. */
export const footingSummarySchema = z.strictObject({
  id: idSchema,
  jobId: idSchema,
  jobName: z.string(),
  name: z.string(),
  unitStyle: unitStyleSchema,
  stages: stagesSchema,
  stationCount: z.int().min(0),
  lastRound: roundSummarySchema.nullable(),
});
export type FootingSummary = z.infer<typeof footingSummarySchema>;

export const footingFields = {
  name: nameSchema,
  /** Top of footing at the start of the first run. */
  planGrade: nmSchema,
  width: positiveNmSchema,
  thickness: positiveNmSchema,
  wallThickness: positiveNmSchema,
  measuredOn: measuredOnSchema,
  /** A rail that stands above top of concrete by this much (grade nails, chamfer); zero usually. */
  railOffset: nmSchema,
  /** Shoot the middle of the footing, or an outer and an inner rail. */
  rails: z.enum(['centre', 'both']),
  digNeeded: z.boolean(),
  /** A street or mark and its azimuth from plan north, so that a tilt can be said "toward Mill St". */
  landmark: z.strictObject({ name: nameSchema, azimuth: degreesSchema }).nullable(),
};

/** A run of the outline in walking order. `turn`: degrees at its end, clockwise positive. Steps: `at` from the run's start, `by` up positive. */
export const runSchema = z.strictObject({
  id: idSchema,
  length: positiveNmSchema.min(FOOT / 12).max(5280 * FOOT - 1),
  turn: degreesSchema,
  /** null: the footing's own. */
  width: positiveNmSchema.nullable(),
  thickness: positiveNmSchema.nullable(),
  steps: z.array(z.strictObject({ id: idSchema, at: notNegativeNmSchema, by: nmSchema })).max(20),
});
export type Run = z.infer<typeof runSchema>;
export const outlineInputSchema = z.strictObject({ runs: z.array(runSchema).min(1).max(60), version: z.int().min(0) });

/** A place where the rod is held. `at`: along the walk from the start. `points`: the rails that are shot there, in plan coordinates. */
export const stationSchema = z.strictObject({
  id: idSchema,
  position: z.int().min(0),
  runId: idSchema,
  at: notNegativeNmSchema,
  name: z.string(),
  corner: z.string().nullable(),
  step: z.enum(['before', 'after']).nullable(),
  /** Plan grade of the top of footing here. */
  planGrade: nmSchema,
  x: coordinateSchema,
  y: coordinateSchema,
  points: z
    .array(z.strictObject({ rail: railSchema, x: coordinateSchema, y: coordinateSchema }))
    .min(1)
    .max(2),
});
export type Station = z.infer<typeof stationSchema>;

export const footingSchema = z.strictObject({
  id: idSchema,
  jobId: idSchema,
  ...footingFields,
  /** Counts every change of the outline, so that two people cannot overwrite one another. */
  outlineVersion: z.int().min(0),
  spacing: positiveNmSchema.nullable(),
  runs: z.array(runSchema),
  stations: z.array(stationSchema),
  rounds: z.array(roundSummarySchema),
  stages: stagesSchema,
  /** Something has been shot here: the outline is a super's to change, and shot stations stay. */
  hasShots: z.boolean(),
});
export type Footing = z.infer<typeof footingSchema>;
