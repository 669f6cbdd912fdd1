import { type PlaneShape, type PlaneSolution, measureExtent } from '@/analysis/plane-solution';
import { fitPlane } from '@/analysis/plane-fit';
import { solveCarefully } from '@/analysis/plane-solve-careful';
import { solveQuickly, withCoordinates } from '@/analysis/plane-solve-quick';
import type { PlanePoint } from '@/analysis/types';
import { apart } from '../support/closeness';
import { normal, seeded } from '../support/seeded';

/** Scattered shots with room in every direction, far enough off that nothing cancels; `north` makes the northing the wider coordinate. */
function scattered(n: number, north: boolean, weighted: boolean): PlanePoint[] {
  const uniform = seeded(1000 + n);
  const draw = normal(uniform);
  return Array.from({ length: n }, (_, i) => {
    const [long, short] = [60 * uniform() + 20, 35 * uniform() + 11];
    const [x, y] = north ? [short, long + 0.2 * short] : [long, short + 0.2 * long];
    const weight = weighted ? { weight: 0.3 + 2 * uniform() } : {};
    return { id: `${i}`, x, y, z: 3 + 0.02 * x - 0.03 * y + 0.1 * draw(), ...weight };
  });
}

const NUMBERS = [
  'rank',
  'totalWeight',
  'meanX',
  'meanY',
  'meanZ',
  'atOrigin',
  'gradientX',
  'gradientY',
  'directionX',
  'directionY',
  'alongP',
  'sumPP',
  'alongQ',
  'sumQQ',
  'shear',
  'originAcross',
  'sumEE',
] as const satisfies readonly (keyof PlaneShape)[];

const lists = (solution: PlaneSolution): [string, Float64Array][] => [
  ['p', solution.p],
  ['q', solution.q],
  ['residual', solution.residuals],
];

describe('the quick solver', () => {
  // Source: the careful solver, in double-double, itself held to exact fractions in plane-fit-hard.test.ts.
  it.each(
    [5, 40, 256, 257, 700].flatMap((n) =>
      [true, false].flatMap((north) => [true, false].map((weighted) => [n, north, weighted] as const)),
    ),
  )(
    'answers for ordinary rounds itself, and as the careful one does: %i stations, wider to the north %s, weighted %s',
    (n, north, weighted) => {
      const points = scattered(n, north, weighted);
      const quick = solveQuickly(points, measureExtent(points));
      const careful = solveCarefully(points, measureExtent(points));
      expect(quick).not.toBeNull();
      if (quick === null) return;
      expect([quick.model, quick.pivot]).toEqual([careful.model, careful.pivot]);
      expect(
        apart(
          NUMBERS.map((name) => [name, quick[name], careful[name]] as const),
          1e-10,
        ),
      ).toEqual([]);
      const filled = withCoordinates(points, quick);
      for (const [k, [name, values]] of lists(filled).entries()) {
        const [, expected = new Float64Array()] = lists(careful)[k] ?? [];
        values.forEach((value, i) =>
          expect(Math.abs(value - (expected[i] ?? NaN))).toBeLessThan(name === 'residual' ? 1e-12 : 1e-11),
        );
      }
      const rises = points.map(({ x, y }) => careful.gradientX * x + careful.gradientY * y);
      expect(quick.drop).toBeCloseTo(Math.max(...rises) - Math.min(...rises), 10);
    },
  );

  it.each([
    ['three stations', scattered(3, false, false)],
    [
      'a row that is nearly straight',
      scattered(20, false, false).map((point) => ({ ...point, y: 0.7 * point.x + 1e-3 * point.y })),
    ],
    ['a row that is nearly straight to the east', scattered(20, false, false).map((point) => ({ ...point, y: 1e-4 * point.y }))],
    [
      'an almost exact plane',
      scattered(20, false, false).map((point) => ({ ...point, z: 3 + 0.02 * point.x - 0.03 * point.y + 1e-5 * (point.z % 1) })),
    ],
    [
      'places that differ in their last digits only',
      scattered(20, false, false).map((point) => ({ ...point, x: 1e12 + point.x, y: point.y - 1e12 })),
    ],
    [
      'elevations that differ in their last digits only',
      scattered(20, false, false).map((point) => ({ ...point, z: 1e12 + point.z })),
    ],
    [
      'a mean of nothing',
      Array.from({ length: 9 }, (_, i) => ({
        id: `${i}`,
        x: i % 3,
        y: Math.floor(i / 3),
        z: [1, -1, 0, 0, 0, 0, 0, 1, -1][i] ?? 0,
      })),
    ],
  ])('leaves %s to the careful one', (_, points) => {
    expect(solveQuickly(points, measureExtent(points))).toBeNull();
  });
});

describe('the careful solver', () => {
  it('takes only coordinates that are all whole for rounded ones', () => {
    const row = Array.from({ length: 9 }, (_, i) => ({ id: `${i}`, x: 2.4e9 * i, y: i % 2 === 0 ? 0 : 0.5, z: i % 3 }));
    expect(fitPlane(row).model).toBe('plane');
    expect(fitPlane(row.map((point) => ({ ...point, y: Math.round(point.y) }))).model).toBe('line');
  });

  it('gives the unit direction of a line, and nothing across it', () => {
    const wall = Array.from({ length: 6 }, (_, i) => ({ id: `${i}`, x: 3 * i, y: 4 * i, z: 0.1 * i + (i % 2) }));
    const line = solveCarefully(wall, measureExtent(wall));
    expect(line).toMatchObject({ model: 'line', rank: 2, alongQ: 0, sumQQ: 0, shear: 0, originAcross: 0 });
    expect(line.directionX).toBeCloseTo(0.6, 12);
    expect(line.directionY).toBeCloseTo(0.8, 12);
    expect(line.gradientX / line.gradientY).toBeCloseTo(0.75, 12);
    expect(Array.from(line.q)).toEqual([0, 0, 0, 0, 0, 0]);
    const place = [wall[1], wall[1]].flatMap((point) => point ?? []);
    expect(solveCarefully(place, measureExtent(place))).toMatchObject({
      model: 'level',
      rank: 1,
      gradientX: 0,
      gradientY: 0,
      alongP: 0,
      sumPP: 0,
      alongQ: 0,
      sumQQ: 0,
    });
  });
});
