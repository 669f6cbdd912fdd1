import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import type { PlanePoint } from '@/analysis';

const numbers = z.array(z.number());
const maybe = z.number().nullable();
const maybes = z.array(maybe);

const planeSet = z.object({
  description: z.string(),
  n: z.number(),
  points: z.array(z.tuple([z.number(), z.number(), z.number()])),
  reference: z.object({
    rank: z.number(),
    dfResidual: z.number(),
    coef: maybes,
    se: maybes,
    t: maybes,
    p: maybes,
    sigma: maybe,
    rss: z.number(),
    tss: z.number(),
    r2: maybe,
    F: maybe,
    Fdf: numbers,
    Fp: maybe,
    xMean: z.number(),
    yMean: z.number(),
    zMean: z.number(),
    residual: numbers,
    hat: numbers,
    rInternal: maybes,
    rExternal: maybes,
    cook: maybes,
  }),
  minimumZoneVertical: z.object({ halfWidth: z.number(), coef: numbers, unique: z.boolean(), support: numbers.optional() }),
  huber: z
    .object({
      reference40digitFixedPoint: z.object({ coef: numbers, scale: z.number(), weights: numbers.optional() }).optional(),
    })
    .optional(),
  outliers: z
    .object({
      singlePassFlags: numbers,
      sequentialDeletion: z
        .array(z.object({ index: z.number(), critical: z.number(), maxAbsRExternal: z.number(), removed: z.boolean() }))
        .optional(),
    })
    .nullish(),
});

export type PlaneSet = z.infer<typeof planeSet>;

/** tests/reference/planefit.json: invented point sets solved by exact rational arithmetic, see tests/reference/plane-sources.md. */
export function planeSets(): Map<string, PlaneSet> {
  const text = readFileSync(path.join(__dirname, '../reference/planefit.json'), 'utf8');
  const { sets } = z.object({ sets: z.record(z.string(), planeSet) }).parse(JSON.parse(text));
  return new Map(Object.entries(sets));
}

/** The points of a set with their index as id. */
export function pointsOf(set: PlaneSet): PlanePoint[] {
  return set.points.map(([x, y, z], index) => ({ id: String(index), x, y, z }));
}
