import type { ChartStation } from './chart-types';

/** The shapes that a mark is made of, as SVG path data about (0, 0). Plain text, so that a page on paper draws the same ones. */
export type MarkShape = 'high' | 'low' | 'in' | 'not-shot' | 'suspect' | 'suspect-sign' | 'close';

const n = (value: number) => String(Math.round(value * 100) / 100);

const circle = (x: number, y: number, r: number) =>
  `M${n(x - r)} ${n(y)}a${n(r)} ${n(r)} 0 1 0 ${n(2 * r)} 0a${n(r)} ${n(r)} 0 1 0 ${n(-2 * r)} 0Z`;

/** Path data of one shape at (x, y); `r` is the radius of the dot, 5 on a phone. Triangles and squares are drawn to look as heavy. */
export function markShapePath(shape: MarkShape, x: number, y: number, r: number): string {
  const t = r * 1.3;
  switch (shape) {
    case 'high':
      return `M${n(x)} ${n(y - t)}L${n(x + t)} ${n(y + t * 0.85)}H${n(x - t)}Z`;
    case 'low':
      return `M${n(x)} ${n(y + t)}L${n(x + t)} ${n(y - t * 0.85)}H${n(x - t)}Z`;
    case 'in':
      return circle(x, y, r);
    case 'not-shot':
      return `M${n(x)} ${n(y - r)}V${n(y + r)}`;
    case 'suspect':
      return `M${n(x - t)} ${n(y - t)}H${n(x + t)}V${n(y + t)}H${n(x - t)}Z`;
    case 'suspect-sign': {
      const s = r / 5;
      return (
        `M${n(x - 2.2 * s)} ${n(y - 1.8 * s)}a${n(2.2 * s)} ${n(2.2 * s)} 0 1 1 ${n(3.3 * s)} ${n(1.9 * s)}` +
        `q${n(-1.1 * s)} ${n(0.6 * s)} ${n(-1.1 * s)} ${n(1.6 * s)}M${n(x)} ${n(y + 3.7 * s)}v${n(0.5 * s)}`
      );
    }
    case 'close':
      return circle(x, y, r * 1.75);
  }
}

/** The shapes of a station's mark, in the order in which they are drawn. */
export function shapesOf(station: Pick<ChartStation, 'mark' | 'close' | 'suspect'>): MarkShape[] {
  const mark: MarkShape[] = station.suspect ? ['suspect', 'suspect-sign'] : [station.mark];
  return station.close ? [...mark, 'close'] : mark;
}

/** A station's mark somewhere on a picture, in px. */
export interface PlacedMark extends Pick<ChartStation, 'mark' | 'close' | 'suspect'> {
  x: number;
  y: number;
}

/** All marks of a picture as one path a shape: 400 stations are then seven elements, not 400. */
export function markPaths(marks: readonly PlacedMark[], r: number): Partial<Record<MarkShape, string>> {
  const paths: Partial<Record<MarkShape, string>> = {};
  for (const mark of marks) {
    for (const shape of shapesOf(mark)) paths[shape] = (paths[shape] ?? '') + markShapePath(shape, mark.x, mark.y, r);
  }
  return paths;
}
