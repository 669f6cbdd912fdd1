import * as fc from 'fast-check';
import { minimaxFit } from '@/analysis/minimax';
import { fitPlane } from '@/analysis/plane-fit';
import { fitPlaneMinimumZone } from '@/analysis/plane-fit-minimum-zone';
import type { MinimumZonePlane, PlanePoint } from '@/analysis/types';
import { apart } from '../support/closeness';
import { planeSets, pointsOf } from '../support/plane-reference';
import { normal, seeded } from '../support/seeded';

const named = (points: readonly (readonly [number, number, number])[]): PlanePoint[] =>
  points.map(([x, y, z], i) => ({ id: `${i}`, x, y, z }));

const widest = (points: readonly PlanePoint[], { a, b, c }: MinimumZonePlane): number =>
  Math.max(...points.map(({ x, y, z }) => Math.abs(z - a - b * x - c * y)));

/** Twice the area of the triangle of three places, signed. */
const area = ([p, q, r]: readonly PlanePoint[]): number =>
  p === undefined || q === undefined || r === undefined ? NaN : (q.x - p.x) * (r.y - p.y) - (r.x - p.x) * (q.y - p.y);

/** The least half-width by trying every four points: no plane holds four of them closer than |Σλz| / Σ|λ|, λ their affine dependence. */
function byEveryFour(points: readonly PlanePoint[]): number {
  let most = 0;
  const take = (chosen: PlanePoint[], from: number): void => {
    if (chosen.length === 4) {
      const lambda = chosen.map((_, m) => {
        const others = chosen.filter((_, k) => k !== m);
        return (m % 2 === 0 ? 1 : -1) * area(others);
      });
      const size = lambda.reduce((sum, value) => sum + Math.abs(value), 0);
      if (size > 1e-9)
        most = Math.max(most, Math.abs(lambda.reduce((sum, value, m) => sum + value * (chosen[m]?.z ?? NaN), 0)) / size);
      return;
    }
    points.slice(from).forEach((point, k) => take([...chosen, point], from + k + 1));
  };
  take([], 0);
  return most;
}

describe('fitPlaneMinimumZone against a certified linear program', () => {
  // Source: planefit.json minimumZoneVertical, certified optimal in exact arithmetic. COMPUTED. The plane of P7, P3 and X3 is not unique.
  it.each([...planeSets()])('%s: the half-width within 1e-9, and a plane that keeps to it', (_, set) => {
    const points = pointsOf(set);
    const zone = fitPlaneMinimumZone(points);
    const expected = set.minimumZoneVertical;
    expect(apart([['half-width', zone.halfWidth, expected.halfWidth]], 1e-9)).toEqual([]);
    expect(widest(points, zone) - expected.halfWidth).toBeLessThan(1e-9 * Math.max(expected.halfWidth, 1e-3));
    if (expected.unique)
      expect(
        apart(
          [zone.a, zone.b, zone.c].map((value, i) => [`coefficient ${i}`, value, expected.coef[i]] as const),
          1e-9,
        ),
      ).toEqual([]);
  });

  it('names the points that hold the slab open', () => {
    const support = (name: string): string[] => fitPlaneMinimumZone(pointsOf(planeSets().get(name) ?? fail(name))).support;
    expect(support('P1')).toEqual(['0', '1', '2', '3']);
    expect(support('P4')).toEqual(['0', '8', '9', '16']);
    expect(support('P7')).toEqual(['14', '34', '267']);
    expect(support('P2')).toEqual([]);
  });
});

function fail(name: string): never {
  throw new Error(`planefit.json has no ${name}`);
}

describe('fitPlaneMinimumZone against every four points', () => {
  const anywhere = fc.record({
    x: fc.integer({ min: -400, max: 400 }).map((v) => v / 8),
    y: fc.integer({ min: -400, max: 400 }).map((v) => v / 8),
    z: fc.integer({ min: -9, max: 9 }).map((v) => v / 16),
  });
  const crowded = fc.record({
    x: fc.integer({ min: 0, max: 3 }),
    y: fc.integer({ min: 0, max: 3 }),
    z: fc.integer({ min: 0, max: 4 }),
  });

  it.each([
    ['scattered', anywhere],
    ['on a small grid, many in line and many at one place', crowded],
  ])('is no wider and no narrower, with points %s', (_, point) => {
    fc.assert(
      fc.property(fc.array(point, { minLength: 4, maxLength: 11 }), (places) => {
        const points = places.map((place, i) => ({ id: `${i}`, ...place }));
        fc.pre(fitPlane(points).model === 'plane');
        const zone = fitPlaneMinimumZone(points);
        expect(zone.halfWidth).toBeCloseTo(byEveryFour(points), 10);
        expect(widest(points, zone)).toBeCloseTo(zone.halfWidth, 10);
        // The support alone holds it open as wide.
        if (zone.halfWidth > 1e-9) {
          const held = points.filter(({ id }) => zone.support.includes(id));
          expect(zone.support.length).toBeGreaterThan(1);
          expect(zone.support.length).toBeLessThanOrEqual(4);
          for (const { x, y, z } of held) expect(Math.abs(z - zone.a - zone.b * x - zone.c * y)).toBeCloseTo(zone.halfWidth, 10);
        }
      }),
      { numRuns: 300 },
    );
  });

  it('is never wider than least squares, and moves with a lift, a shift and a scale', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.integer({ min: -1e6, max: 1e6 }),
        fc.double({ min: 1e-3, max: 1e9, noNaN: true }),
        (seed, east, scale) => {
          const draw = normal(seeded(seed));
          const points = named(Array.from({ length: 20 }, (_, i) => [8 * (i % 5), 6 * Math.floor(i / 5), 0.01 * draw()]));
          const zone = fitPlaneMinimumZone(points);
          expect(zone.halfWidth).toBeLessThanOrEqual(
            Math.max(...fitPlane(points).points.map(({ residual }) => Math.abs(residual))) * (1 + 1e-12),
          );
          const moved = fitPlaneMinimumZone(points.map((point) => ({ ...point, x: point.x + east, z: scale * (point.z + 5) })));
          expect(moved.halfWidth / (scale * zone.halfWidth)).toBeCloseTo(1, 9);
          expect(moved.support).toEqual(zone.support);
        },
      ),
    );
  });
});

describe('fitPlaneMinimumZone at its edges', () => {
  it('takes a thousand stations round a perimeter, read to 1/16 in, in well under a second', () => {
    const uniform = seeded(12);
    const points = named(
      Array.from({ length: 1000 }, (_, i) => {
        const along = 60 * uniform();
        const [x, y] = i % 2 === 0 ? [along, i % 4 === 0 ? 0 : 30] : [i % 4 === 1 ? 0 : 60, along / 2];
        return [x, y, Math.round(16 * uniform()) / 192];
      }),
    );
    const start = performance.now();
    const zone = fitPlaneMinimumZone(points);
    expect(performance.now() - start).toBeLessThan(1000);
    expect(widest(points, zone)).toBeCloseTo(zone.halfWidth, 12);
  });

  it('ignores weights: every shot has to fit in', () => {
    const points = named([
      [0, 0, 1],
      [40, 0, 2],
      [40, 24, 4],
      [0, 24, 2],
      [20, 9, 2.2],
    ]);
    expect(fitPlaneMinimumZone(points.map((point, i) => ({ ...point, weight: i + 1 }))).halfWidth).toBeCloseTo(
      fitPlaneMinimumZone(points).halfWidth,
      12,
    );
  });

  it('rises along a wall and not across it, is half the difference at one place, and 0 through three', () => {
    const wall = fitPlaneMinimumZone(
      named([
        [0, 0, 0],
        [3, 4, 0.4],
        [6, 8, 0.2],
        [9, 12, 0.6],
      ]),
    );
    expect(4 * wall.b - 3 * wall.c).toBeCloseTo(0, 12);
    // By hand: of 0, 0.4, 0.2, 0.6 equally spaced, the first three stand |0 − 2·0.4 + 0.2| ÷ 4 = 0.15 off any line, and no three stand more.
    expect(wall.halfWidth).toBeCloseTo(0.15, 12);
    expect(
      fitPlaneMinimumZone(
        named([
          [5, 5, 1],
          [5, 5, 4],
          [5, 5, 2],
        ]),
      ),
    ).toEqual({ a: 2.5, b: 0, c: 0, halfWidth: 1.5, support: ['0', '1'] });
    expect(
      fitPlaneMinimumZone(
        named([
          [0, 0, 1],
          [10, 0, 3],
          [0, 10, 2],
        ]),
      ),
    ).toMatchObject({ halfWidth: 0, support: [] });
    expect(fitPlaneMinimumZone(named([[5, 5, 3]]))).toEqual({ a: 3, b: 0, c: 0, halfWidth: 0, support: [] });
  });

  it.each([
    ['no points', [], 'no-points'],
    ['an elevation that is no number', named([[0, 0, NaN]]), 'not-finite'],
    ['a place beyond any length', named([[1e61, 0, 1]]), 'out-of-range'],
  ])('refuses %s', (_, points, code) => {
    expect(() => fitPlaneMinimumZone(points)).toThrow(expect.objectContaining({ code }));
  });

  it('refuses columns that depend on one another', () => {
    const rows = [0, 1, 2, 3].map((i) => [1, i / 4, i / 4]);
    expect(() => minimaxFit(rows, [0, 1, 0, 1])).toThrow(expect.objectContaining({ code: 'dependent-columns' }));
  });
});
