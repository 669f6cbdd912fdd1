import type { Nm } from '@/analysis';
import { axisHeight, textWidth } from './axis-text';
import type { ChartTolerance, ChartUnits, ProfileCorner, ProfilePoint } from './chart-types';
import type { PlacedMark } from './mark-shapes';

/** Sides of the drawn field within the picture, in px. */
export interface FieldBox {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

export interface ProfileInput {
  points: readonly ProfilePoint[];
  corners: readonly ProfileCorner[];
  /** The whole walk round the footing. */
  length: Nm;
  tolerance: ChartTolerance;
  units: ChartUnits;
  /** Size of the picture, in px. */
  width: number;
  height: number;
  /** Size of the axis text, in px; 13 unless said. */
  fontSize?: number;
  /** Part of the walk that is shown; the whole unless said. */
  view?: { from: Nm; to: Nm };
}

export interface ProfileMark extends PlacedMark {
  id: string;
  /** Its height in words, "−1′ 0″", where it lies beyond the picture and is drawn at the edge. */
  beyond: string | null;
}

export interface ProfileGeometry {
  field: FieldBox;
  /** Heights at the field's bottom and top: a chart with this domain draws exactly what `y` says. */
  heights: { low: Nm; high: Nm };
  /** Heights between which a mark is drawn where it belongs; beyond them it is drawn at the edge. */
  shown: { low: Nm; high: Nm };
  view: { from: Nm; to: Nm };
  /** How many times heights are drawn larger than distances, a round number. */
  exaggeration: number;
  /** y of plan grade. */
  grade: number;
  band: { top: number; bottom: number };
  ticks: { height: Nm; y: number; label: string }[];
  verticals: { x: number; label: string | null; labelX: number; anchor: 'start' | 'middle' | 'end' }[];
  /** SVG path through the shots; broken where a station was not shot. */
  trace: string;
  marks: ProfileMark[];
  x: (at: Nm) => number;
  y: (height: Nm) => number;
}

/** Room over the highest and under the lowest height for the marks that are drawn there, in px. */
const markRoom = 7;
/** Heights beyond this many tolerances are drawn at the edge: a misread foot must not flatten everything else. */
const mostTolerances = 8;

/** The largest number of two figures (840, 1,200) that is at most `value`: an exaggeration that can be said in a word. */
export function roundDown(value: number): number {
  const step = 10 ** (Math.floor(Math.log10(value)) - 1);
  return Number((Math.floor(value / step + 1e-9) * step).toPrecision(2));
}

/** Range of heights to show: the tolerance with as much again outside it, and every reading within reason. */
export function heightRange(points: readonly ProfilePoint[], tolerance: ChartTolerance): { low: Nm; high: Nm } {
  const unit = Math.max(tolerance.low, tolerance.high, 1);
  const seen = points.flatMap(({ deviation }) => (deviation === null ? [] : [deviation]));
  const reach = (far: number, own: Nm) => Math.max(own * 2.1, Math.min(far, unit * mostTolerances), unit * 0.7);
  return {
    low: -reach(Math.max(0, ...seen.map((value) => -value)), tolerance.low),
    high: reach(Math.max(0, ...seen), tolerance.high),
  };
}

/** Heights that get a number: whole tolerances out from grade, in steps that leave each label its line of text. */
function tickHeights(range: { low: Nm; high: Nm }, tolerance: ChartTolerance, pxPerNm: number, fontSize: number): Nm[] {
  const unit = Math.max(tolerance.low, tolerance.high);
  if (unit <= 0) return [];
  let step = unit;
  while (step * pxPerNm < fontSize * 0.85) step *= 2;
  const heights: Nm[] = [];
  for (let k = 1; k * step <= Math.max(range.high, -range.low); k += 1) {
    if (k * step <= range.high * 0.98) heights.push(k * step);
    if (-k * step >= range.low * 0.98) heights.push(-k * step);
  }
  return heights.sort((a, b) => b - a);
}

/** Places the corners' names along the bottom, from the left, each only where it does not touch the one before. */
function placeLabels(corners: readonly { x: number; label: string }[], field: FieldBox, fontSize: number) {
  let free = -Infinity;
  return corners.map(({ x, label }) => {
    for (const text of [label, label.split(' ')[0] ?? label]) {
      const width = textWidth(text, fontSize);
      const left = Math.min(Math.max(x - width / 2, field.left), field.right + 6 - width);
      if (left < free) continue;
      free = left + width + fontSize * 0.5;
      return { x, label: text, labelX: left + width / 2, anchor: 'middle' as const };
    }
    return { x, label: null, labelX: x, anchor: 'middle' as const };
  });
}

function tracePath(points: readonly ProfilePoint[], marks: readonly ProfileMark[]): string {
  let path = '';
  let pen = 'M';
  points.forEach((point, index) => {
    const mark = marks[index];
    if (point.deviation === null || !mark) {
      pen = 'M';
      return;
    }
    path += `${pen}${mark.x.toFixed(1)} ${mark.y.toFixed(1)}`;
    pen = 'L';
  });
  return path;
}

/** Radius of a mark's dot, in px: 5 where stations stand apart, smaller where they would hide one another. */
export function markRadius({ marks, field }: Pick<ProfileGeometry, 'marks' | 'field'>): number {
  return Math.min(Math.max(((field.right - field.left) / Math.max(marks.length, 1)) * 0.55, 2.2), 5);
}

/** Where in the field a note of this width hides no mark: a corner if one is free, else the corner with the fewest. */
export function freeCorner({ marks, field }: Pick<ProfileGeometry, 'marks' | 'field'>, width: number, height: number) {
  const corners = [
    { x: field.right, y: field.top, anchor: 'end' as const },
    { x: field.right, y: field.bottom - height, anchor: 'end' as const },
    { x: field.left + 12, y: field.top, anchor: 'start' as const },
    { x: field.left + 12, y: field.bottom - height, anchor: 'start' as const },
  ];
  const hidden = corners.map(({ x, y, anchor }) => {
    const left = anchor === 'end' ? x - width : x;
    return marks.filter((mark) => mark.x > left - 8 && mark.x < left + width + 8 && mark.y > y - 8 && mark.y < y + height + 8)
      .length;
  });
  const best = hidden.indexOf(Math.min(...hidden));
  return corners[best] ?? { x: field.right, y: field.top, anchor: 'end' as const };
}

/**
 * The footing unrolled: walking round it is left to right, heights are drawn larger by a round number that the picture says.
 * Pure; the phone's strip, the results' chart and the page on paper are all drawn from it. Points come in walking order.
 */
export function profileGeometry(input: ProfileInput): ProfileGeometry {
  const { points, tolerance, units, width, height, fontSize = 13 } = input;
  const view = input.view ?? { from: 0, to: Math.max(input.length, 1) };
  const range = heightRange(points, tolerance);
  const unit = Math.max(tolerance.low, tolerance.high);
  const gutter = Math.max(...[unit, -2 * unit].map((value) => textWidth(axisHeight(value, units.style), fontSize))) + 12;
  const field: FieldBox = {
    left: gutter,
    right: Math.max(width - 10, gutter + 1),
    top: 6,
    bottom: Math.max(height - fontSize - 9, 7),
  };
  const perNmAlong = (field.right - field.left) / (view.to - view.from);
  const fieldHeight = Math.max(field.bottom - field.top - 2 * markRoom, 1);
  const room = fieldHeight / (range.high - range.low);
  const exaggeration = roundDown(room / perNmAlong);
  const perNm = exaggeration * perNmAlong;
  const spare = fieldHeight - perNm * (range.high - range.low);
  const grade = field.top + markRoom + spare / 2 + perNm * range.high;
  const x = (at: Nm) => field.left + (at - view.from) * perNmAlong;
  const y = (value: Nm) => grade - value * perNm;
  const shown = { low: (grade - field.bottom + markRoom) / perNm, high: (grade - field.top - markRoom) / perNm };
  const marks = points.map((point): ProfileMark => {
    const value = point.deviation ?? 0;
    const beyond = value > shown.high || value < shown.low;
    const at = y(Math.min(Math.max(value, shown.low), shown.high));
    const { id, mark, close, suspect } = point;
    const said = beyond ? axisHeight(value, units.style) : null;
    return { id, mark: point.deviation === null ? 'not-shot' : mark, close, suspect, beyond: said, x: x(point.at), y: at };
  });
  const inView = input.corners.filter(({ at }) => at >= view.from && at <= view.to).map(({ at, label }) => ({ x: x(at), label }));
  return {
    field,
    heights: { low: (grade - field.bottom) / perNm, high: (grade - field.top) / perNm },
    shown,
    view,
    exaggeration,
    grade,
    band: { top: y(tolerance.high), bottom: y(-tolerance.low) },
    ticks: tickHeights(shown, tolerance, perNm, fontSize).map((value) => ({
      height: value,
      y: y(value),
      label: axisHeight(value, units.style),
    })),
    verticals: placeLabels(inView, field, fontSize),
    trace: tracePath(points, marks),
    marks,
    x,
    y,
  };
}
