import { z } from 'zod';
import { coordinateSchema, idSchema, nmSchema, noteSchema, notNegativeNmSchema, timeSchema, unitStyleSchema } from './quantities';

/**
 * Everything that is written in the field is a record: made once on a phone, kept there until the server says that it has it,
 * never changed. Its identity is a UUIDv7 made on the phone; its order is (device, device sequence), gap-free as made, with a
 * hybrid logical clock to lay several phones beside one another.
 */
const madeOnAPhone = {
  id: idSchema,
  deviceId: idSchema,
  deviceSequence: z.int().positive(),
  /** Hybrid logical clock of the phone: wall in ms, counter within it. Never runs backwards on one device. */
  clock: z.strictObject({ wall: z.int().min(0), counter: z.int().min(0).max(1_000_000) }),
  /** What the phone's own clock said; shown, never trusted. */
  madeAt: timeSchema,
};

export const RAILS = ['centre', 'outer', 'inner'] as const;
export const railSchema = z.enum(RAILS);
export type Rail = z.infer<typeof railSchema>;

/** Where the rod stood. */
export const pointSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('station'), stationId: idSchema, rail: railSchema }),
  z.strictObject({ kind: z.literal('benchmark'), benchmarkId: idSchema }),
  z.strictObject({ kind: z.literal('turning'), name: z.string().trim().min(1).max(20) }),
]);
export type RodPoint = z.infer<typeof pointSchema>;

/** The laser is set up: which one, and where on the plan it stands. */
export const setupRecordSchema = z.strictObject({
  ...madeOnAPhone,
  kind: z.literal('setup'),
  laserId: idSchema,
  stand: z.strictObject({ x: coordinateSchema, y: coordinateSchema }).nullable(),
});
/** One rod read from one setup. Its backsights precede its shots. `benchmarkDistance`: laser to benchmark, null when not known. */
export const seriesRecordSchema = z.strictObject({
  ...madeOnAPhone,
  kind: z.literal('series'),
  setupId: idSchema,
  rodId: idSchema,
  checkLimit: notNegativeNmSchema,
  benchmarkDistance: notNegativeNmSchema.nullable(),
});
/**
 * One reading. `keyed` is what the person keyed, character for character; `reading` its exact length on the rod. A set shot
 * has nothing keyed: the receiver was clamped at `reading`, the grade rod, and the rail moved to the tone.
 */
export const readingRecordSchema = z.strictObject({
  ...madeOnAPhone,
  kind: z.literal('reading'),
  seriesId: idSchema,
  purpose: z.enum(['backsight', 'shot', 'check', 'foresight']),
  point: pointSchema,
  how: z.enum(['read', 'set']),
  receiver: z.enum(['fine', 'coarse']).nullable(),
  keyed: z.string().max(40),
  style: unitStyleSchema,
  reading: nmSchema,
  lap: z.int().min(1).max(999),
});
export const STRIKE_REASONS = ['misread', 'wrong-station', 'rod-not-plumb', 'laser-bumped', 'other'] as const;
export const strikeReasonSchema = z.enum(STRIKE_REASONS);
/** A line through an earlier reading; the reading stays visible. */
export const strikeRecordSchema = z.strictObject({
  ...madeOnAPhone,
  kind: z.literal('strike'),
  targetId: idSchema,
  reason: strikeReasonSchema,
  words: noteSchema,
});

export const recordSchema = z.discriminatedUnion('kind', [
  setupRecordSchema,
  seriesRecordSchema,
  readingRecordSchema,
  strikeRecordSchema,
]);
export type FieldRecord = z.infer<typeof recordSchema>;
export type SetupRecord = z.infer<typeof setupRecordSchema>;
export type SeriesRecord = z.infer<typeof seriesRecordSchema>;
export type ReadingRecord = z.infer<typeof readingRecordSchema>;
export type StrikeRecord = z.infer<typeof strikeRecordSchema>;

/** What the server adds on receipt. `orderedAt` (ms) never runs backwards on one device; it lays devices beside one another. */
export const receiptSchema = z.strictObject({
  roundSequence: z.int().positive(),
  receivedAt: timeSchema,
  orderedAt: z.int().min(0),
  /** Server clock less phone clock when the batch came, ms: a phone that is minutes off is flagged, never refused. */
  clockSkew: z.int(),
  person: z.strictObject({ id: idSchema, name: z.string() }),
});
export const storedRecordSchema = z.strictObject({ record: recordSchema, receipt: receiptSchema });
export type StoredRecord = z.infer<typeof storedRecordSchema>;

/** Why one record of a batch was refused; the others of the batch are stored all the same. */
export const REFUSALS = [
  'record-invalid',
  'keyed-differs',
  'strike-not-yours',
  'surface-not-yours',
  'round-closed',
  'sequence-taken',
  'point-unknown',
  'laser-unknown',
  'rod-unknown',
  'reading-longer-than-rod',
] as const;
export const refusalSchema = z.enum(REFUSALS);
export type Refusal = z.infer<typeof refusalSchema>;

export const recordAnswerSchema = z.discriminatedUnion('answer', [
  z.strictObject({ id: z.string(), answer: z.literal('stored'), receipt: receiptSchema }),
  z.strictObject({ id: z.string(), answer: z.literal('already'), receipt: receiptSchema }),
  /** The same id is stored with other content; nothing was overwritten. */
  z.strictObject({ id: z.string(), answer: z.literal('conflict') }),
  z.strictObject({ id: z.string(), answer: z.literal('rejected'), refusal: refusalSchema }),
]);
export type RecordAnswer = z.infer<typeof recordAnswerSchema>;
