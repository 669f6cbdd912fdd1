import { z } from 'zod';

const KILOMETRE = 1_000_000_000_000;

/** Whole nanometres; further than ten kilometres is no footing and no elevation on earth. */
export const nmSchema = z
  .int()
  .min(-10 * KILOMETRE)
  .max(10 * KILOMETRE)
  .describe('whole nanometres');
export const positiveNmSchema = z.int().positive().max(KILOMETRE).describe('whole nanometres, above zero');
export const notNegativeNmSchema = z.int().min(0).max(KILOMETRE).describe('whole nanometres, zero or more');
/** Fractional nanometres: plan coordinates are derived. */
export const coordinateSchema = z.number().min(-KILOMETRE).max(KILOMETRE).describe('nanometres on the plan: x east, y north');
export const degreesSchema = z.number().min(-360).max(360).describe('degrees');

export const nameSchema = z.string().trim().min(1).max(120);
export const noteSchema = z.string().trim().max(2000);
export const idSchema = z.uuid();
export const timeSchema = z.iso.datetime({ offset: true });

export const UNIT_STYLES = ['feet-inches', 'decimal-feet', 'metric'] as const;
export const unitStyleSchema = z.enum(UNIT_STYLES);
export type UnitStyle = z.infer<typeof unitStyleSchema>;

/** The finest marks that a rod of each style is read to, coarse to fine, in nanometres. */
export const GRADUATIONS = {
  'feet-inches': [3_175_000, 1_587_500, 793_750],
  'decimal-feet': [3_048_000, 1_524_000, 304_800],
  metric: [5_000_000, 1_000_000, 500_000],
} as const satisfies Record<UnitStyle, readonly number[]>;

/** What a new job reads to unless said otherwise: 1/16 in, 0.01 ft, 1 mm. */
export const USUAL_GRADUATION: Record<UnitStyle, number> = {
  'feet-inches': 1_587_500,
  'decimal-feet': 3_048_000,
  metric: 1_000_000,
};

export function isGraduationOf(style: UnitStyle, graduation: number): boolean {
  return GRADUATIONS[style].some((mark) => mark === graduation);
}
