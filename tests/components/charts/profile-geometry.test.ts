import * as fc from 'fast-check';
import { NM_PER_FOOT, NM_PER_INCH } from '@/analysis';
import type { ProfilePoint } from '@/components/charts/chart-types';
import { freeCorner, markRadius, profileGeometry, roundDown } from '@/components/charts/profile-geometry';
import { axisHeight, textWidth } from '@/components/charts/axis-text';
import { followView, zoomView } from '@/components/charts/profile-view';

const eighth = NM_PER_INCH / 8;
const units = { style: 'feet-inches', graduation: NM_PER_INCH / 16 } as const;
const point = (at: number, deviation: number | null): ProfilePoint => ({
  id: `${at}`,
  at: at * NM_PER_FOOT,
  deviation,
  mark: deviation === null ? 'not-shot' : 'in',
  label: `${at}`,
});
const base = {
  points: [point(0, 0), point(44, -2 * eighth), point(74, null), point(98, eighth)],
  corners: [
    { at: 0, label: 'A 0+00' },
    { at: 44 * NM_PER_FOOT, label: 'B 0+44' },
    { at: 98 * NM_PER_FOOT, label: 'D 0+98' },
    { at: 106 * NM_PER_FOOT, label: 'E 1+06' },
  ],
  length: 148 * NM_PER_FOOT,
  tolerance: { low: eighth, high: eighth },
  units,
  width: 332,
  height: 200,
};

test('walking round is left to right over the whole field, and higher is further up', () => {
  const geometry = profileGeometry(base);
  expect(geometry.x(0)).toBeCloseTo(geometry.field.left, 9);
  expect(geometry.x(base.length)).toBeCloseTo(geometry.field.right, 9);
  expect(geometry.y(eighth)).toBeLessThan(geometry.grade);
  expect(geometry.y(0)).toBe(geometry.grade);
  expect(geometry.band.top).toBeCloseTo(geometry.y(eighth), 9);
  expect(geometry.band.bottom).toBeCloseTo(geometry.y(-eighth), 9);
});

test('the exaggeration that is said is the one that is drawn', () => {
  const geometry = profileGeometry(base);
  const along = (geometry.x(base.length) - geometry.x(0)) / base.length;
  const up = (geometry.y(0) - geometry.y(eighth)) / eighth;
  expect(up / along / geometry.exaggeration).toBeCloseTo(1, 9);
  expect(Number(geometry.exaggeration.toPrecision(2))).toBe(geometry.exaggeration);
});

test.each([
  [1, 1],
  [9.99, 9.9],
  [10, 10],
  [847.3, 840],
  [1000, 1000],
  [1299, 1200],
  [0.0123, 0.012],
])('%d rounds down to %d, two figures', (value, rounded) => {
  expect(roundDown(value)).toBe(rounded);
});

test('a trace is broken where a station was not shot', () => {
  const { trace } = profileGeometry(base);
  expect(trace.match(/M/g)).toHaveLength(2);
  expect(trace.match(/L/g)).toHaveLength(1);
});

test('a station that was not shot is a tick on the string line', () => {
  const geometry = profileGeometry(base);
  expect(geometry.marks[2]).toMatchObject({ mark: 'not-shot', y: geometry.grade, beyond: null });
});

test('a misread foot is drawn at the edge with its size, and does not flatten the rest', () => {
  const geometry = profileGeometry({ ...base, points: [...base.points, point(120, -NM_PER_FOOT)] });
  const bust = geometry.marks[4];
  expect(bust?.beyond).toBe('−1′ 0″');
  expect(bust?.y).toBeLessThan(geometry.field.bottom);
  expect(geometry.band.bottom - geometry.band.top).toBeGreaterThan(15);
});

test('names of corners never touch: the second of two that stand close keeps its letter or none', () => {
  const names = (width: number) => profileGeometry({ ...base, width }).verticals.map(({ label }) => label);
  expect(names(332)).toEqual(['A 0+00', 'B 0+44', 'D 0+98', null]);
  expect(names(640)).toEqual(['A 0+00', 'B 0+44', 'D 0+98', 'E']);
  expect(names(1000)).toEqual(['A 0+00', 'B 0+44', 'D 0+98', 'E 1+06']);
  fc.assert(
    fc.property(
      fc.array(fc.integer({ min: 0, max: 148 }), { maxLength: 30 }),
      fc.integer({ min: 240, max: 1200 }),
      (ats, width) => {
        const corners = [...ats].sort((a, b) => a - b).map((at, index) => ({ at: at * NM_PER_FOOT, label: `${index} 0+${at}` }));
        const drawn = profileGeometry({ ...base, corners, width }).verticals.flatMap(({ label, labelX }) =>
          label === null ? [] : [{ left: labelX - textWidth(label, 13) / 2, right: labelX + textWidth(label, 13) / 2 }],
        );
        drawn.forEach(({ left }, at) => expect(left).toBeGreaterThanOrEqual(drawn[at - 1]?.right ?? -Infinity));
      },
    ),
  );
});

test('heights are numbered at whole tolerances both ways, on lines of text that do not touch', () => {
  const { ticks } = profileGeometry(base);
  expect(ticks.map(({ label }) => label)).toEqual(['+1/4', '+1/8', '−1/8', '−1/4']);
  const ys = profileGeometry({ ...base, height: 70 }).ticks.map(({ y }) => y);
  ys.forEach((y, at) => expect(y - (ys[at - 1] ?? -Infinity)).toBeGreaterThan(10));
});

test('a one-sided tolerance is drawn on its own side', () => {
  const geometry = profileGeometry({ ...base, tolerance: { low: NM_PER_INCH, high: 0 } });
  expect(geometry.band.top).toBe(geometry.grade);
  expect(geometry.band.bottom).toBeGreaterThan(geometry.grade);
});

test('every mark lies in the picture, whatever was read, and no number is lost to NaN', () => {
  const reading = fc.option(fc.integer({ min: -4_000_000_000, max: 4_000_000_000 }));
  fc.assert(
    fc.property(
      fc.array(reading, { maxLength: 60 }),
      fc.integer({ min: 0, max: 50_000_000 }),
      fc.integer({ min: 200, max: 1400 }),
      (readings, tolerance, width) => {
        const geometry = profileGeometry({
          ...base,
          points: readings.map((value, at) => point(at, value)),
          tolerance: { low: tolerance, high: tolerance },
          width,
        });
        for (const { x, y } of geometry.marks) {
          expect(x).toBeGreaterThanOrEqual(0);
          expect(x).toBeLessThanOrEqual(width);
          expect(y).toBeGreaterThanOrEqual(0);
          expect(y).toBeLessThanOrEqual(base.height);
        }
        expect(geometry.exaggeration).toBeGreaterThan(0);
      },
    ),
  );
});

test('marks shrink where stations crowd, and the note takes a corner without marks', () => {
  expect(markRadius(profileGeometry(base))).toBe(5);
  const crowd = profileGeometry({ ...base, points: Array.from({ length: 400 }, (_, at) => point((at * 148) / 400, eighth * 2)) });
  expect(markRadius(crowd)).toBe(2.2);
  expect(freeCorner(crowd, 120, 13).y).toBeGreaterThan(crowd.grade);
});

test.each([
  [eighth, 'feet-inches', '+1/8'],
  [-2 * eighth, 'feet-inches', '−1/4'],
  [-NM_PER_FOOT, 'feet-inches', '−1′ 0″'],
  [0, 'feet-inches', '0'],
  [6_096_000, 'decimal-feet', '+0.02'],
  [-3_000_000, 'metric', '−3'],
  [500_000, 'metric', '+0.5'],
] as const)('%d nm is %s on an axis in %s', (height, style, label) => {
  expect(axisHeight(height, style)).toBe(label);
});

describe('looking closer', () => {
  test('keeps the place where it was drawn, and wider again is the whole walk', () => {
    const view = zoomView(undefined, 40, 2, 100);
    expect(view).toEqual({ from: 20, to: 70 });
    expect(zoomView(view, 40, 0.5, 100)).toBeUndefined();
  });

  test('stops at a sixteenth and never leaves the walk', () => {
    let view = zoomView(undefined, 0, 2, 160);
    for (let step = 0; step < 10; step += 1) view = zoomView(view, 0, 2, 160);
    expect(view).toEqual({ from: 0, to: 10 });
  });

  test('follows the station that is read', () => {
    expect(followView({ from: 0, to: 50 }, 60, 100)).toEqual({ from: 15, to: 65 });
    expect(followView({ from: 0, to: 50 }, 30, 100)).toEqual({ from: 0, to: 50 });
    expect(followView(undefined, 30, 100)).toBeUndefined();
  });
});
