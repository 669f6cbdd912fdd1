import * as fc from 'fast-check';
import { huberRegression } from '@/analysis/huber-regression';
import { fitPlane } from '@/analysis/plane-fit';
import { fitPlaneHuber } from '@/analysis/plane-fit-huber';
import type { PlanePoint } from '@/analysis/types';
import { STACKLOSS } from '../reference/handbook-sets';
import { apart } from '../support/closeness';
import { planeSets, pointsOf } from '../support/plane-reference';
import { rVector, runR } from '../support/r';
import { normal, seeded } from '../support/seeded';

type Pair = readonly [string, number | null | undefined, number | null | undefined];

describe('fitPlaneHuber against its fixed point', () => {
  const sets = [...planeSets()].filter(([, set]) => set.huber?.reference40digitFixedPoint !== undefined);

  // Source: planefit.json huber.reference40digitFixedPoint, k = 1.345, scale = median|e| / 0.6745. COMPUTED.
  it.each(sets)('%s: plane, scale and weights within 1e-9', (_, set) => {
    const expected = set.huber?.reference40digitFixedPoint;
    const huber = fitPlaneHuber(pointsOf(set));
    const pairs: Pair[] = [
      ['a', huber.a, expected?.coef[0]],
      ['b', huber.b, expected?.coef[1]],
      ['c', huber.c, expected?.coef[2]],
      ['scale', huber.scale, expected?.scale],
      ...(expected?.weights ?? []).map((weight, i): Pair => [`weight ${i}`, huber.weights[i], weight]),
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
    expect(huber.weights).toHaveLength(set.n);
  });

  it('covers the corners, the bust and the far-off thousand', () => {
    expect(sets.map(([name]) => name)).toEqual(['P1', 'P4', 'P7']);
    const corners = planeSets().get('P1');
    expect(corners === undefined ? null : fitPlaneHuber(pointsOf(corners)).iterations).toBe(1);
  });
});

describe('fitPlaneHuber against R', () => {
  // Source: R MASS::rlm run live, its tolerance tightened to 1e-12; weights the inverse variances of its wt.method.
  it('agrees with rlm to 1e-9 on busted rounds, weighted and not', () => {
    const rounds = Array.from({ length: 6 }, (_, k) => {
      const uniform = seeded(50 + k);
      const draw = normal(uniform);
      return Array.from({ length: 15 + k }, (_, i): PlanePoint => {
        const [x, y] = [60 * uniform(), 30 * uniform()];
        const z = 0.3 + 0.002 * x - 0.001 * y + 0.01 * draw() + (i % 7 === 3 ? 0.1 : 0);
        return { id: `${i}`, x, y, z, ...(k % 2 === 1 ? { weight: 0.3 + 2 * uniform() } : {}) };
      });
    });
    const lines = runR(
      `suppressMessages(library(MASS))\n${rounds
        .map(
          (
            points,
          ) => `x <- ${rVector(points.map(({ x }) => x))}; y <- ${rVector(points.map(({ y }) => y))}; z <- ${rVector(points.map((point) => point.z))}; v <- ${rVector(points.map(({ weight = 1 }) => weight))}
f <- rlm(z ~ x + y, weights = v, k = 1.345, maxit = 5000, acc = 1e-13, method = "M"); emit(c(coef(f), f$s)); emit(f$w)`,
        )
        .join('\n')}`,
    );
    rounds.forEach((points, k) => {
      const [[a, b, c, scale] = [], weights = []] = lines.slice(2 * k, 2 * k + 2);
      const huber = fitPlaneHuber(points);
      const pairs: Pair[] = [
        ['a', huber.a, a],
        ['b', huber.b, b],
        ['c', huber.c, c],
        ['scale', huber.scale, scale],
        ...weights.map((weight, i): Pair => [`round ${k} weight ${i}`, huber.weights[i], weight]),
      ];
      expect(pairs).toHaveLength(4 + points.length);
      expect(apart(pairs, 1e-9)).toEqual([]);
    });
  });

  // Source: stackloss, Huber k = 1.345, MAD/0.6745. SEEN; nine digits.
  it('solves stackloss, which has three columns, to the printed digit', () => {
    const { coefficients, scale } = huberRegression([STACKLOSS.air, STACKLOSS.water, STACKLOSS.acid], STACKLOSS.loss, {
      k: 1.345,
      noise: 0,
    });
    expect([...coefficients, scale].map((value) => Number(value.toFixed(9)))).toEqual([
      -41.026485373, 0.82938577, 0.926059416, -0.127846318, 2.440489046,
    ]);
  });
});

describe('fitPlaneHuber at its edges', () => {
  const named = (points: readonly (readonly [number, number, number])[]): PlanePoint[] =>
    points.map(([x, y, z], i) => ({ id: `${i}`, x, y, z }));

  it('lies on the plane that most points share exactly, with scale 0 and no weight for the others', () => {
    const points = named(
      Array.from({ length: 12 }, (_, i) => [
        i % 4,
        Math.floor(i / 4),
        1 + 0.5 * (i % 4) - 0.25 * Math.floor(i / 4) + (i === 5 || i === 6 ? 3 : 0),
      ]),
    );
    const huber = fitPlaneHuber(points);
    expect(huber.a).toBeCloseTo(1, 9);
    expect(huber.b).toBeCloseTo(0.5, 9);
    expect(huber.c).toBeCloseTo(-0.25, 9);
    expect(huber.scale).toBe(0);
    expect(huber.weights).toEqual(points.map((_, i) => (i === 5 || i === 6 ? 0 : 1)));
  });

  it('is least squares where nothing stands out, and for a k that nothing reaches', () => {
    const points = named([
      [0, 0, 1],
      [40, 0, 2],
      [40, 24, 4],
      [0, 24, 2],
    ]);
    const fit = fitPlane(points);
    expect(fitPlaneHuber(points).b).toBeCloseTo(fit.b?.value ?? NaN, 12);
    const busted = named(Array.from({ length: 9 }, (_, i) => [i % 3, Math.floor(i / 3), i === 4 ? 5 : 0.01 * i]));
    expect(fitPlaneHuber(busted, 1e6).a).toBeCloseTo(fitPlane(busted).a.value, 9);
    expect(Math.abs(fitPlaneHuber(busted).a - fitPlane(busted).a.value)).toBeGreaterThan(0.1);
  });

  it('rises along a wall and not across it, and is level at one place', () => {
    const wall = fitPlaneHuber(
      named(Array.from({ length: 9 }, (_, i) => [3 * i, 4 * i, 0.1 * i + (i === 2 ? 7 : 0.001 * (i % 2))])),
    );
    expect(3 * wall.b + 4 * wall.c).toBeCloseTo(0.1, 3);
    expect(4 * wall.b - 3 * wall.c).toBeCloseTo(0, 12);
    expect(wall.a).toBeCloseTo(0, 2);
    expect(
      fitPlaneHuber(
        named([
          [5, 5, 1],
          [5, 5, 2],
        ]),
      ),
    ).toMatchObject({ a: 1.5, b: 0, c: 0 });
  });

  it.each([
    ['no points', [], 1.345, 'no-points'],
    ['a k of nothing', named([[0, 0, 1]]), 0, 'not-positive'],
    ['a k that is no number', named([[0, 0, 1]]), NaN, 'not-finite'],
    ['a place without end', named([[0, Infinity, 1]]), 1.345, 'not-finite'],
  ])('refuses %s', (_, points, k, code) => {
    expect(() => fitPlaneHuber(points, k)).toThrow(expect.objectContaining({ code }));
  });

  it('moves with a shift, a lift and a scale of the elevations', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.integer({ min: -1e6, max: 1e6 }),
        fc.double({ min: 1e-3, max: 1e9, noNaN: true }),
        (seed, east, scale) => {
          const draw = normal(seeded(seed));
          const points = named(
            Array.from({ length: 16 }, (_, i) => [8 * (i % 4), 6 * Math.floor(i / 4), 0.01 * draw() + (i === 6 ? 1 : 0)]),
          );
          const before = fitPlaneHuber(points);
          const after = fitPlaneHuber(points.map((point) => ({ ...point, x: point.x + east, z: scale * (point.z + 2) })));
          expect(after.scale / (scale * before.scale)).toBeCloseTo(1, 7);
          expect(Math.abs(after.b / scale - before.b)).toBeLessThan(1e-9);
          expect(Math.abs(after.a / scale - (before.a + 2 - before.b * east))).toBeLessThan(1e-9 * (1 + Math.abs(east)));
        },
      ),
    );
  });
});
