import { z } from 'zod';
import { idSchema, notNegativeNmSchema, positiveNmSchema, timeSchema, unitStyleSchema, type UnitStyle } from './quantities';

/** What a round shoots: the bottom of the dig, the form rails, the wet top during the pour, the top as built. */
export const SURFACES = ['dig', 'rails', 'wet', 'top'] as const;
export const surfaceSchema = z.enum(SURFACES);
export type Surface = z.infer<typeof surfaceSchema>;

/** Both limits are zero or more: allowed below and above. `style` is the unit it was given in and is shown in. */
export const toleranceRuleInputSchema = z.strictObject({
  low: notNegativeNmSchema,
  high: notNegativeNmSchema,
  decision: z.enum(['simple', 'guarded']),
  style: unitStyleSchema,
});
export type ToleranceRuleInput = z.infer<typeof toleranceRuleInputSchema>;
export const toleranceRuleSchema = toleranceRuleInputSchema.extend({
  id: idSchema,
  surface: surfaceSchema,
  version: z.int().positive(),
  createdAt: timeSchema,
});
export type ToleranceRule = z.infer<typeof toleranceRuleSchema>;

export const WALL_TYPES = ['block', 'foam-forms', 'panel-forms', 'sill'] as const;
export const wallTypeSchema = z.enum(WALL_TYPES);
export type WallType = z.infer<typeof wallTypeSchema>;

/** How the first course may be bedded on the footing. `courseHeight` null: steps need not be whole courses. */
export const bedRuleInputSchema = z.strictObject({
  material: z.enum(['mortar', 'foam', 'shim']),
  least: notNegativeNmSchema,
  most: positiveNmSchema,
  nominal: notNegativeNmSchema,
  grindMost: notNegativeNmSchema,
  beddedFraction: z.number().gt(0).max(1),
  courseHeight: positiveNmSchema.nullable(),
  style: unitStyleSchema,
});
export type BedRuleInput = z.infer<typeof bedRuleInputSchema>;
export const bedRuleSchema = bedRuleInputSchema.extend({ id: idSchema, version: z.int().positive(), createdAt: timeSchema });
export type BedRule = z.infer<typeof bedRuleSchema>;

const INCH = 25_400_000;
const MM = 1_000_000;

/** Ready tolerance rules of a new job; a metric job has them in whole millimetres. Common practice, no source. */
export function readyToleranceRules(style: UnitStyle): Record<Surface, ToleranceRuleInput> {
  const metric = style === 'metric';
  const own: UnitStyle = metric ? 'metric' : 'feet-inches';
  const both = (limit: number): ToleranceRuleInput => ({ low: limit, high: limit, decision: 'simple', style: own });
  return {
    dig: { low: metric ? 25 * MM : INCH, high: 0, decision: 'simple', style: own },
    rails: both(metric ? 3 * MM : INCH / 8),
    wet: both(metric ? 6 * MM : INCH / 4),
    top: both(metric ? 6 * MM : INCH / 4),
  };
}

/**
 * The ready bed rule of each wall. Block: first bed joint 1/4 to 3/4 in, 3/8 in nominal, TMS 602 first-course limits
 * (as printed in a masonry contractors' article), in metric 6 to 20 mm, 10 mm. The others: common practice, no source.
 */
export function readyBedRule(wall: WallType, style: UnitStyle): BedRuleInput {
  const metric = style === 'metric';
  const own: UnitStyle = metric ? 'metric' : 'feet-inches';
  const pick = (inches: number, mm: number) => (metric ? mm * MM : inches * INCH);
  switch (wall) {
    case 'block':
      return {
        material: 'mortar',
        least: pick(1 / 4, 6),
        most: pick(3 / 4, 20),
        nominal: pick(3 / 8, 10),
        grindMost: pick(1 / 4, 6),
        beddedFraction: 1,
        courseHeight: pick(8, 200),
        style: own,
      };
    case 'foam-forms':
      return {
        material: 'foam',
        least: 0,
        most: pick(1 / 2, 12),
        nominal: pick(1 / 4, 6),
        grindMost: pick(1 / 4, 6),
        beddedFraction: 1,
        courseHeight: null,
        style: own,
      };
    case 'panel-forms':
    case 'sill':
      return {
        material: 'shim',
        least: 0,
        most: pick(1 / 2, 12),
        nominal: pick(1 / 4, 6),
        grindMost: pick(1 / 4, 6),
        beddedFraction: 1,
        courseHeight: null,
        style: own,
      };
  }
}
