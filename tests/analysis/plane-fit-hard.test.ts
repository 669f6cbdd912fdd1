import { fitPlane } from '@/analysis/plane-fit';
import type { PlanePoint } from '@/analysis/types';
import { apart } from '../support/closeness';
import { exactPlane } from '../support/exact-plane';
import { normal, seeded } from '../support/seeded';

type Pair = readonly [string, number | null | undefined, number | null | undefined];

function pairsOf(points: readonly PlanePoint[]): Pair[] {
  const fit = fitPlane(points);
  const exact = exactPlane(points);
  const terms = [fit.a, fit.b, fit.c];
  return [
    ...terms.flatMap((term, i): Pair[] => [
      [`coefficient ${i}`, term?.value, exact.coefficients[i]],
      [`standard error ${i}`, term?.standardError, exact.standardErrors[i]],
    ]),
    ['s', fit.residualStandardError, exact.s],
    ['R²', fit.rSquared, exact.rSquared],
    ['F', fit.fTest?.f, exact.f],
    ['slope', fit.tilt.slope, exact.slope],
    ['slope error', fit.tilt.slopeStandardError, exact.slopeStandardError],
    ...fit.points.flatMap((point, i): Pair[] => [
      [`residual ${i}`, point.residual, exact.residuals[i]],
      [`leverage ${i}`, point.leverage, exact.leverages[i]],
      [`studentized ${i}`, point.studentized, exact.studentized[i]],
      [`deleted ${i}`, point.deletedStudentized, exact.deleted[i]],
      [`cooks ${i}`, point.cooks, exact.cooks[i]],
    ]),
  ];
}

/** Points scattered along a turned strip, `width` of its 100 units wide, with its corner at (offset, 0.7·offset). */
function strip(n: number, width: number, offset: number, seed: number, weighted = false): PlanePoint[] {
  const uniform = seeded(seed);
  const draw = normal(uniform);
  const angle = 3.1 * uniform();
  return Array.from({ length: n }, (_, i) => {
    const [along, across] = [100 * uniform() - 50, width * (uniform() - 0.5)];
    const x = offset + along * Math.cos(angle) - across * Math.sin(angle);
    const y = 0.7 * offset + along * Math.sin(angle) + across * Math.cos(angle);
    return { id: `${i}`, x, y, z: 100 + 0.002 * along + 0.005 * draw(), ...(weighted ? { weight: 0.1 + 4 * uniform() } : {}) };
  });
}

// Source: the definition in exact fractions of whole numbers (tests/support/exact-plane.ts). COMPUTED.
describe('fitPlane where doubles are short of digits', () => {
  it.each([0, 1e6].flatMap((offset) => [100, 1, 0.01, 1e-4, 1e-6].map((width) => [width, offset] as const)))(
    'holds 1e-9 on every number for a strip %d wide, %d away',
    (width, offset) => {
      for (const [n, seed] of [
        [4, 1],
        [7, 2],
        [15, 3],
      ] as const) {
        expect(apart(pairsOf(strip(n, width, offset, 100 * seed + n)), 1e-9)).toEqual([]);
        expect(apart(pairsOf(strip(n, width, offset, 200 * seed + n, true)), 1e-9)).toEqual([]);
      }
    },
  );

  it.each([1e-3, 1e-6, 1e-9])('holds 1e-9 where one bust of 1 stands on a plane read to %d', (noise) => {
    const draw = normal(seeded(31));
    const points = Array.from({ length: 20 }, (_, i) => ({
      id: `${i}`,
      x: i % 5,
      y: Math.floor(i / 5),
      z: 100 + 0.001 * (i % 5) + noise * draw() + (i === 7 ? 1 : 0),
    }));
    expect(apart(pairsOf(points), 1e-9)).toEqual([]);
  });

  it.each([1e3, 1e5, 1e7])('holds 1e-9 where one point stands %d away from all others', (far) => {
    const uniform = seeded(17);
    const near = Array.from({ length: 10 }, (_, i) => ({
      id: `${i}`,
      x: 10 * uniform(),
      y: 10 * uniform(),
      z: 0.02 * uniform(),
    }));
    expect(apart(pairsOf([...near, { id: 'far', x: far, y: 0.3 * far, z: 0.4 }]), 1e-9)).toEqual([]);
  });

  it.each([1e4, 1e8, 1e12])('holds 1e-9 where one point weighs %d times the others', (weight) => {
    const uniform = seeded(18);
    const points = Array.from({ length: 9 }, (_, i) => ({
      id: `${i}`,
      x: 10 * uniform(),
      y: 10 * uniform(),
      z: 0.02 * uniform(),
      ...(i === 4 ? { weight } : {}),
    }));
    expect(apart(pairsOf(points), 1e-9)).toEqual([]);
  });

  it('holds 1e-9 where a slope, a constant or a mean all but cancels', () => {
    const grid = (z: (x: number, y: number, i: number) => number): PlanePoint[] =>
      Array.from({ length: 30 }, (_, i) => ({
        id: `${i}`,
        x: 8 * (i % 6),
        y: 8 * Math.floor(i / 6),
        z: z(8 * (i % 6), 8 * Math.floor(i / 6), i),
      }));
    const draw = normal(seeded(6));
    const noise = Array.from({ length: 30 }, () => 0.01 * draw());
    expect(apart(pairsOf(grid((x, y, i) => 0.1 * (((7 * x + 3 * y) / 8) % 3) + (noise[i] ?? 0) * 1e-6)), 1e-9)).toEqual([]);
    expect(apart(pairsOf(grid((x, _, i) => 0.003 * x + 1e-7 * (noise[i] ?? 0))), 1e-9)).toEqual([]);
    expect(apart(pairsOf(grid((x, y, i) => 1e-9 * (x + y) + (noise[i] ?? 0))), 1e-9)).toEqual([]);
    const far = grid((x, y, i) => 0.001 * x + 0.002 * y + (noise[i] ?? 0)).map((point) => ({
      ...point,
      x: point.x + 1e6,
      y: point.y - 5e5,
    }));
    expect(apart(pairsOf(far), 1e-9)).toEqual([]);
  });

  it('holds 1e-9 in whole nanometres, a million feet from the origin', () => {
    const uniform = seeded(9);
    const draw = normal(uniform);
    const points = Array.from({ length: 40 }, (_, i) => ({
      id: `${i}`,
      x: Math.round(3e14 + 3e10 * uniform()),
      y: Math.round(2e14 + 2e10 * uniform()),
      z: Math.round(1.5e6 * draw()),
    }));
    expect(apart(pairsOf(points), 1e-9)).toEqual([]);
  });
});
