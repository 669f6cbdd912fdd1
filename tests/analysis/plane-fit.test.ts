import * as fc from 'fast-check';
import { AnalysisError } from '@/analysis/analysis-error';
import { fitPlane } from '@/analysis/plane-fit';
import type { PlanePoint } from '@/analysis/types';
import { NORRIS, NORRIS_CERTIFIED, TREES } from '../reference/handbook-sets';
import { apart } from '../support/closeness';
import { rVector, runR } from '../support/r';
import { normal, seeded } from '../support/seeded';

type Pair = readonly [string, number | null | undefined, number | null | undefined];

const named = (points: readonly (readonly [number, number, number, number?])[]): PlanePoint[] =>
  points.map(([x, y, z, weight], i) => ({ id: `${i}`, x, y, z, ...(weight === undefined ? {} : { weight }) }));

describe('fitPlane against handbooks', () => {
  const grid = [
    [-1, -1, 0.2],
    [0, -1, 0.3],
    [1, -1, 0.4],
    [-1, 0, 0.4],
    [1, 0, 0.6],
    [-1, 1, 0.6],
    [0, 1, 0.7],
    [1, 1, 0.8],
  ] as const;

  // Source: numerical-methods posting, plane through a 3 × 3 grid without its centre. SEEN: (0.5, 0.1, 0.2), 1e-12.
  it('finds the plane of the eight-point grid, and no residual in its rounding', () => {
    const fit = fitPlane(named(grid));
    expect(fit.a.value).toBeCloseTo(0.5, 12);
    expect(fit.b?.value).toBeCloseTo(0.1, 12);
    expect(fit.c?.value).toBeCloseTo(0.2, 12);
    expect(fit.points.map(({ residual }) => residual)).toEqual(grid.map(() => 0));
    expect(
      fit.points.every(
        ({ studentized, deletedStudentized, cooks }) => studentized === null && deletedStudentized === null && cooks === null,
      ),
    ).toBe(true);
  });

  // COMPUTED (REFERENCES H): lifting (1, 1) by 0.05. Its internal residual is √(n − p), so nothing is left for an external one.
  it('tells the lifted corner of the grid by its internal residual, and has no external one', () => {
    const fit = fitPlane(named(grid.map(([x, y, z]) => [x, y, x === 1 && y === 1 ? z + 0.05 : z])));
    expect([fit.a.value, fit.b?.value, fit.c?.value].map((value) => value?.toFixed(6))).toEqual([
      '0.506250',
      '0.108333',
      '0.208333',
    ]);
    const corner = fit.points.at(-1);
    expect(corner?.residual).toBeCloseTo(0.027083, 6);
    expect(corner?.leverage).toBeCloseTo(0.458333, 6);
    expect(corner?.studentized).toBeCloseTo(Math.sqrt(5), 10);
    expect(corner?.deletedStudentized).toBeNull();
  });

  // Source: R `trees`, summary(lm(Volume ~ Girth + Height)). Results SEEN, data MEMORY; s, t and Cook COMPUTED. Tol 1e-4.
  it('finds the plane of the trees', () => {
    const fit = fitPlane(named(TREES.girth.map((girth, i) => [girth, TREES.height[i] ?? NaN, TREES.volume[i] ?? NaN])));
    const residuals = fit.points.map(({ residual }) => residual);
    const interval = (value = NaN, error: number | null = NaN): number[] =>
      [-2.048407, 2.048407].map((t) => value + t * (error ?? NaN));
    const pairs: Pair[] = [
      ['lowest', Math.min(...residuals), -6.4065],
      ['highest', Math.max(...residuals), 8.4847],
      ['s', fit.residualStandardError, 3.88183],
      ['t of 31', fit.points[30]?.deletedStudentized, 2.7656],
      ['Cook of 31', fit.points[30]?.cooks, 0.6052],
      ...interval(fit.b?.value, fit.b?.standardError).map((value, i): Pair => [
        'girth interval',
        value,
        [4.16683899, 5.249482][i],
      ]),
      ...interval(fit.c?.value, fit.c?.standardError).map((value, i): Pair => [
        'height interval',
        value,
        [0.07264863, 0.6058538][i],
      ]),
    ];
    expect(apart(pairs, 1e-4)).toEqual([]);
    expect([fit.a, fit.b, fit.c].map((term) => term?.value.toFixed(4))).toEqual(['-57.9877', '4.7082', '0.3393']);
    expect(fit.rSquared).toBeCloseTo(0.948, 3);
  });

  // Source: NIST StRD Norris, certified. SEEN. A line along x: its slope, and its constant from the value at the mean x. Longley has six
  // columns and NoInt1 no constant: neither is a plane, and least-squares.test.ts holds them.
  it('finds Norris as a line of points along x', () => {
    const fit = fitPlane(named(NORRIS.map(([x, y]) => [x, 7, y])));
    const mean = NORRIS.reduce((sum, [x]) => sum + x, 0) / NORRIS.length;
    expect(fit.model).toBe('line');
    const pairs: Pair[] = [
      ['b1', fit.tilt.slope, NORRIS_CERTIFIED.coefficients[1]],
      ['se b1', fit.tilt.slopeStandardError, NORRIS_CERTIFIED.standardErrors[1]],
      ['b0', fit.a.value - fit.tilt.slope * mean, NORRIS_CERTIFIED.coefficients[0]],
      ['s', fit.residualStandardError, NORRIS_CERTIFIED.residualStandardError],
      ['R²', fit.rSquared, NORRIS_CERTIFIED.rSquared],
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
    expect(fit.tilt.fallAzimuth).toBe(270);
  });
});

describe('fitPlane against R’s lm, run live', () => {
  const uniform = seeded(2_026);
  const draw = normal(uniform);
  const sets = Array.from({ length: 12 }, (_, k) => {
    const n = 4 + 3 * k;
    const weighted = k % 2 === 1;
    return named(
      Array.from({ length: n }, () => {
        const [x, y] = [40 * uniform(), 25 * uniform()];
        return [x, y, 0.4 + 0.002 * x - 0.003 * y + 0.02 * draw(), ...(weighted ? [0.2 + 3 * uniform()] : [])] as [
          number,
          number,
          number,
          number?,
        ];
      }),
    );
  });

  // Source: R 4.2.2 lm, summary, hatvalues, rstandard, rstudent, cooks.distance, run live.
  it('agrees on every number, with weights and without', () => {
    const script = sets
      .map(
        (
          points,
        ) => `x <- ${rVector(points.map(({ x }) => x))}; y <- ${rVector(points.map(({ y }) => y))}; z <- ${rVector(points.map((point) => point.z))}; w <- ${rVector(points.map(({ weight = 1 }) => weight))}
f <- lm(z ~ x + y, weights = w); s <- summary(f); k <- s$coefficients
emit(c(k[, 1], k[, 2], k[, 3], k[, 4], s$sigma, s$r.squared, s$fstatistic, pf(s$fstatistic[1], 2, s$fstatistic[3], lower.tail = FALSE)))
emit(fitted(f)); emit(residuals(f)); emit(hatvalues(f)); emit(rstandard(f)); emit(rstudent(f)); emit(cooks.distance(f))`,
      )
      .join('\n');
    const lines = runR(script);
    sets.forEach((points, k) => {
      const [whole = [], fitted = [], residuals = [], hats = [], internal = [], external = [], cooks = []] = lines.slice(
        7 * k,
        7 * k + 7,
      );
      const fit = fitPlane(points);
      const terms = [fit.a, fit.b, fit.c];
      const ours = [
        ...terms.map((term) => term?.value),
        ...terms.map((term) => term?.standardError),
        ...terms.map((term) => term?.t),
        ...terms.map((term) => term?.p),
        fit.residualStandardError,
        fit.rSquared,
        fit.fTest?.f,
        fit.fTest?.df1,
        fit.fTest?.df2,
        fit.fTest?.p,
      ];
      const pairs = [
        ...whole.map((value, i): Pair => [`set ${k} number ${i}`, ours[i], value]),
        ...fit.points.flatMap((point, i): Pair[] => [
          [`fitted ${i}`, point.fitted, fitted[i]],
          [`residual ${i}`, point.residual, residuals[i]],
          [`leverage ${i}`, point.leverage, hats[i]],
          [`studentized ${i}`, point.studentized, internal[i]],
          // One degree of freedom leaves none for an external residual: R prints NaN or rounding noise there, we say null.
          ...(fit.df > 1 ? [[`deleted ${i}`, point.deletedStudentized, external[i]] satisfies Pair] : []),
          [`cooks ${i}`, point.cooks, cooks[i]],
        ]),
      ];
      expect(whole).toHaveLength(18);
      expect(apart(pairs, 1e-9)).toEqual([]);
    });
  });

  // Source: R lm(z ~ 1), run live: the mean alone, where two stations carry no tilt.
  it('agrees on the level of two stations', () => {
    const [[mean, error, t, p, s, r2] = []] = runR(
      'f <- summary(lm(c(0.31, 0.47) ~ 1)); emit(c(f$coefficients, f$sigma, f$r.squared))',
    );
    const fit = fitPlane(
      named([
        [0, 0, 0.31],
        [30, 4, 0.47],
      ]),
    );
    expect(fit).toMatchObject({ model: 'level', n: 2, df: 1, b: null, c: null, fTest: null });
    expect(
      apart(
        [
          ['mean', fit.a.value, mean],
          ['error', fit.a.standardError, error],
          ['t', fit.a.t, t],
          ['p', fit.a.p, p],
          ['s', fit.residualStandardError, s],
        ],
        1e-12,
      ),
    ).toEqual([]);
    expect(fit.rSquared).toBe(r2);
    expect(fit.tilt).toEqual({ slope: 0, slopeStandardError: null, fallAzimuth: null, drop: 0 });
    expect(fit.points.map(({ leverage }) => leverage)).toEqual([0.5, 0.5]);
  });
});

describe('fitPlane: what the geometry carries', () => {
  it('says undefined, never 0, of the external residuals of four corners', () => {
    const fit = fitPlane(
      named([
        [0, 0, 1],
        [40, 0, 2],
        [40, 24, 4],
        [0, 24, 2],
      ]),
    );
    expect(fit).toMatchObject({ model: 'plane', df: 1 });
    for (const point of fit.points) {
      expect(point.leverage).toBeCloseTo(0.75, 12);
      expect(point.deletedStudentized).toBeNull();
      expect(Math.abs(point.studentized ?? 0)).toBeCloseTo(1, 9);
    }
  });

  it('fits three stations exactly, and knows no error of it', () => {
    const fit = fitPlane(
      named([
        [0, 0, 0.1],
        [10, 0, 0.3],
        [0, 10, 0.2],
      ]),
    );
    expect(fit).toMatchObject({ model: 'plane', n: 3, df: 0, residualStandardError: null, rSquared: 1, fTest: null });
    expect(fit.b).toMatchObject({ standardError: null, t: null, p: null });
    expect(fit.b?.value).toBeCloseTo(0.02, 14);
    expect(fit.tilt.slopeStandardError).toBeNull();
    for (const point of fit.points)
      expect(point).toMatchObject({ residual: 0, leverage: 1, studentized: null, deletedStudentized: null, cooks: null });
  });

  it('takes stations on one line, in any direction and far away, for a line along it', () => {
    for (const [angle, offset] of [
      [0, 0],
      [0.3, 0],
      [1.1, 1e6],
      [Math.PI / 2, 3e5],
      [2.5, -1e6],
    ] as const) {
      const points = named(
        Array.from({ length: 9 }, (_, i) => [
          offset + 7 * i * Math.cos(angle),
          2 * offset + 7 * i * Math.sin(angle),
          0.05 * i + (i % 3 === 0 ? 0.01 : 0),
        ]),
      );
      const fit = fitPlane(points);
      expect(fit).toMatchObject({ model: 'line', b: null, c: null, df: 7 });
      expect(fit.fTest?.df1).toBe(1);
      expect(fit.tilt.slope).toBeCloseTo(0.05 / 7, 3);
      // Falls back along the walk: azimuth of (−cos, −sin), clockwise from north.
      expect(fit.tilt.fallAzimuth).toBeCloseTo(((Math.atan2(-Math.cos(angle), -Math.sin(angle)) * 180) / Math.PI + 360) % 360, 6);
    }
  });

  it('takes whole nanometres on a slanted line for a line, though rounding put them half a nanometre off it', () => {
    const points = named(
      Array.from({ length: 9 }, (_, i) => [
        Math.round(2.4e9 * i * 0.8 + 0.3),
        Math.round(2.4e9 * i * 0.6001),
        1e6 * (i % 2) + 1e5 * i,
      ]),
    );
    expect(fitPlane(points).model).toBe('line');
    // The same numbers as feet, where a foot beside the line is no rounding, make a plane.
    expect(
      fitPlane(
        named([
          [0, 0, 1],
          [1000, 0, 2],
          [2000, 1, 3],
          [3000, 0, 5],
        ]),
      ).model,
    ).toBe('plane');
    // Ten micrometres beside a line of whole nanometres is no rounding either.
    expect(fitPlane(points.map((point, i) => ({ ...point, y: point.y + (i === 4 ? 10_000 : 0) }))).model).toBe('plane');
  });

  it('takes any number of shots at one place for a level', () => {
    const fit = fitPlane(
      named([
        [5, 5, 1],
        [5, 5, 2],
        [5, 5, 3],
        [5, 5, 6],
      ]),
    );
    expect(fit).toMatchObject({ model: 'level', df: 3, rSquared: 0, fTest: null });
    expect(fit.a.value).toBe(3);
    expect(fitPlane(named([[5, 5, 1]]))).toMatchObject({
      model: 'level',
      n: 1,
      df: 0,
      rSquared: null,
      residualStandardError: null,
    });
  });

  it('takes two places, shot twice each, for a line', () => {
    const fit = fitPlane(
      named([
        [0, 0, 1],
        [0, 0, 1.2],
        [8, 6, 3],
        [8, 6, 3.2],
      ]),
    );
    expect(fit).toMatchObject({ model: 'line', df: 2 });
    expect(fit.tilt.slope).toBeCloseTo(0.2, 12);
    expect(fit.a.value).toBeCloseTo(2.1, 12);
  });

  it('finds zero residual and nothing to judge at a station that alone holds its side of the plane', () => {
    const fit = fitPlane(
      named([
        [0, 0, 1],
        [5, 0, 1.3],
        [10, 0, 0.9],
        [15, 0, 1.2],
        [20, 0, 1],
        [9, 30, 4],
      ]),
    );
    expect(fit.model).toBe('plane');
    expect(fit.points.at(-1)).toEqual({
      id: '5',
      fitted: 4,
      residual: 0,
      leverage: 1,
      studentized: null,
      deletedStudentized: null,
      cooks: null,
    });
    expect(fit.points[0]?.studentized).not.toBeNull();
  });

  it('gives no slope, azimuth or share to one elevation, but its offset', () => {
    const fit = fitPlane(
      named([
        [0, 0, 2.5],
        [10, 0, 2.5],
        [10, 10, 2.5],
        [0, 10, 2.5],
      ]),
    );
    expect(fit.tilt).toEqual({ slope: 0, slopeStandardError: null, fallAzimuth: null, drop: 0 });
    expect(fit.shares).toEqual({ offset: 1, tilt: 0, rest: 0 });
    expect(fit).toMatchObject({ rSquared: null, fTest: null, residualStandardError: 0 });
    expect(fit.a).toEqual({ value: 2.5, standardError: 0, t: null, p: null });
  });

  it('gives no shares where every deviation is 0, and takes 0.1 + 0.2 for 0.3', () => {
    expect(
      fitPlane(
        named([
          [0, 0, 0],
          [10, 0, 0],
          [10, 10, 0],
          [0, 10, 0],
        ]),
      ).shares,
    ).toEqual({ offset: 0, tilt: 0, rest: 0 });
    const same = fitPlane(
      named([
        [0, 0, 0.1 + 0.2],
        [10, 0, 0.3],
        [10, 10, 0.3],
        [0, 10, 0.3],
        [4, 4, 0.3],
      ]),
    );
    expect(same.tilt.slope).toBe(0);
    expect(same.points.every(({ studentized }) => studentized === null)).toBe(true);
  });

  it('reports no residual from the rounding of an exact plane, at any place and slope', () => {
    const exact = fc.record({
      a: fc.double({ min: -500, max: 500, noNaN: true }),
      b: fc.double({ min: -0.1, max: 0.1, noNaN: true }),
      c: fc.double({ min: -0.1, max: 0.1, noNaN: true }),
      far: fc.constantFrom(0, 1e3, 1e6),
    });
    fc.assert(
      fc.property(exact, ({ a, b, c, far }) => {
        const points = named(
          Array.from({ length: 12 }, (_, i): [number, number, number] => [far + 7 * (i % 4), far / 3 + 5 * Math.floor(i / 4), 0]),
        );
        const fit = fitPlane(points.map((point) => ({ ...point, z: a + b * point.x + c * point.y })));
        expect(fit.residualStandardError).toBe(0);
        expect(fit.points.every(({ residual, studentized }) => residual === 0 && studentized === null)).toBe(true);
      }),
    );
  });

  it('names the compass: east, south, west and north of a fall', () => {
    const falls = [
      [-0.01, 0, 90],
      [0, 0.01, 180],
      [0.01, 0, 270],
      [0, -0.01, 0],
      [-0.01, -0.01, 45],
      // Half a degree either side of north, where the circle closes.
      [-0.01 * Math.sin(Math.PI / 360), -0.01 * Math.cos(Math.PI / 360), 0.5],
      [0.01 * Math.sin(Math.PI / 360), -0.01 * Math.cos(Math.PI / 360), 359.5],
    ] as const;
    for (const [b, c, azimuth] of falls) {
      const fit = fitPlane(
        named([
          [0, 0, 0],
          [10, 0, 10 * b],
          [10, 10, 10 * b + 10 * c],
          [0, 10, 10 * c],
        ]),
      );
      expect(fit.tilt.fallAzimuth).toBeCloseTo(azimuth, 9);
      expect(fit.tilt.slope).toBeCloseTo(Math.hypot(b, c), 12);
      expect(fit.tilt.drop).toBeCloseTo(10 * (Math.abs(b) + Math.abs(c)), 12);
    }
  });
});

describe('fitPlane refuses', () => {
  const square = named([
    [0, 0, 1],
    [10, 0, 2],
    [10, 10, 4],
    [0, 10, 2],
  ]);
  it.each([
    ['no points at all', [], 'no-points'],
    ['a place that is no number', square.map((point) => ({ ...point, x: NaN })), 'not-finite'],
    ['a northing without end', square.map((point) => ({ ...point, y: -Infinity })), 'not-finite'],
    ['an elevation without end', square.map((point) => ({ ...point, z: Infinity })), 'not-finite'],
    ['an elevation beyond any length', square.map((point) => ({ ...point, z: 1e61 })), 'out-of-range'],
    ['a weight of nothing', square.map((point) => ({ ...point, weight: 0 })), 'not-positive'],
    ['a negative weight', square.map((point) => ({ ...point, weight: -1 })), 'not-positive'],
    ['a weight that is no number', square.map((point) => ({ ...point, weight: NaN })), 'not-finite'],
    ['a weight out of range', square.map((point) => ({ ...point, weight: 1e61 })), 'out-of-range'],
    ['a weight too small to count', square.map((point) => ({ ...point, weight: 1e-61 })), 'out-of-range'],
  ])('%s', (_, points, code) => {
    expect(() => fitPlane(points)).toThrow(AnalysisError);
    expect(() => fitPlane(points)).toThrow(expect.objectContaining({ code }));
  });
});
