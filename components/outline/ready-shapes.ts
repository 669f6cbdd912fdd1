import { AnalysisError, type Nm } from '@/analysis';
import type { Way } from './outline-draft';

/** Shapes that fill in the runs from a few dimensions. */
export const READY_SHAPES = ['rectangle', 'l', 'u', 't', 'strip'] as const;
export type ReadyShape = (typeof READY_SHAPES)[number];

/**
 * What each asks for, all as walked: `length` along the first run and `depth` at right angles to it are over all;
 * L: a corner `cut` along by `cutDepth` deep is missing; U: an opening that wide and deep in the far side, in the middle;
 * T: a stem that wide and long at the middle of the far side.
 */
export const SHAPE_FIELDS = {
  rectangle: ['length', 'depth'],
  l: ['length', 'depth', 'cut', 'cutDepth'],
  u: ['length', 'depth', 'opening', 'openingDepth'],
  t: ['length', 'depth', 'stem', 'stemLength'],
  strip: ['length'],
} as const satisfies Record<ReadyShape, readonly string[]>;
export type ShapeField = (typeof SHAPE_FIELDS)[ReadyShape][number];
export type ShapeSizes = Partial<Record<ShapeField, Nm>>;

export interface ShapeRun {
  length: Nm;
  way: Way;
}

/** The refusal of one size of a shape; `field` says which. */
const refuse = (field: ShapeField, code: string, details: Record<string, unknown> = {}) =>
  new AnalysisError(code, `${field}: ${code}`, { ...details, field });

function size(sizes: ShapeSizes, field: ShapeField): Nm {
  const value = sizes[field];
  if (value === undefined) throw refuse(field, 'length-empty');
  if (value <= 0) throw refuse(field, 'run-zero');
  return value;
}

/** A part that has to leave something of the whole: 'part-too-long' otherwise. */
function part(sizes: ShapeSizes, field: ShapeField, whole: Nm): Nm {
  const value = size(sizes, field);
  if (value >= whole) throw refuse(field, 'part-too-long', { whole });
  return value;
}

const right = (length: Nm): ShapeRun => ({ length, way: 'right' });
const left = (length: Nm): ShapeRun => ({ length, way: 'left' });

/** Two shoulders that are alike to the nanometre: what cannot be halved goes to the first. */
const shoulders = (rest: Nm): [Nm, Nm] => [Math.ceil(rest / 2), Math.floor(rest / 2)];

/**
 * The runs of a ready shape in walking order, clockwise, lengths in nm.
 * @throws AnalysisError 'length-empty', 'run-zero' or 'part-too-long' with `details.field`.
 */
export function shapeRuns(shape: ReadyShape, sizes: ShapeSizes): ShapeRun[] {
  const length = size(sizes, 'length');
  if (shape === 'strip') return [{ length, way: 'straight' }];
  const depth = size(sizes, 'depth');
  switch (shape) {
    case 'rectangle':
      return [right(length), right(depth), right(length), right(depth)];
    case 'l': {
      const cut = part(sizes, 'cut', length);
      const cutDepth = part(sizes, 'cutDepth', depth);
      return [right(length), right(depth), right(length - cut), left(cutDepth), right(cut), right(depth - cutDepth)];
    }
    case 'u': {
      const opening = part(sizes, 'opening', length);
      const deep = part(sizes, 'openingDepth', depth);
      const [first, second] = shoulders(length - opening);
      return [right(length), right(depth), right(first), left(deep), left(opening), right(deep), right(second), right(depth)];
    }
    case 't': {
      const stem = part(sizes, 'stem', length);
      const long = size(sizes, 'stemLength');
      const [first, second] = shoulders(length - stem);
      return [right(length), right(depth), left(first), right(long), right(stem), left(long), right(second), right(depth)];
    }
  }
}
