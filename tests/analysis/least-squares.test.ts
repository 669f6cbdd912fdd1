import { readFileSync } from 'node:fs';
import path from 'node:path';
import * as fc from 'fast-check';
import { z } from 'zod';
import { AnalysisError } from '@/analysis/analysis-error';
import { leastSquares } from '@/analysis/least-squares';
import { LONGLEY, LONGLEY_CERTIFIED, NORRIS, NORRIS_CERTIFIED, NO_INTERCEPT, STACKLOSS, TREES } from '../reference/handbook-sets';
import { apart } from '../support/closeness';
import { rVector, runR } from '../support/r';
import { normal, seeded } from '../support/seeded';

const named = (name: string, actual: readonly number[] | null, expected: readonly number[]) =>
  expected.map((value, i) => [`${name} ${i}`, actual?.[i], value] as const);

describe('leastSquares against NIST StRD', () => {
  it('solves Norris to 1e-9: coefficients, their errors, s, sum of squares, R²', () => {
    const fit = leastSquares(
      [NORRIS.map(([x]) => x)],
      NORRIS.map(([, y]) => y),
      { intercept: true },
    );
    const pairs = [
      ...named('coefficient', fit.coefficients, NORRIS_CERTIFIED.coefficients),
      ...named('standard error', fit.standardErrors, NORRIS_CERTIFIED.standardErrors),
      ['s', fit.residualStandardError, NORRIS_CERTIFIED.residualStandardError] as const,
      ['sum of squares', fit.residualSumOfSquares, NORRIS_CERTIFIED.residualSumOfSquares] as const,
      ['R²', fit.rSquared, NORRIS_CERTIFIED.rSquared] as const,
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  it('solves Longley to 1e-9, which the handbook holds to 1e-6', () => {
    const columns = [1, 2, 3, 4, 5, 6].map((j) => LONGLEY.map((row) => row[j] ?? NaN));
    const fit = leastSquares(
      columns,
      LONGLEY.map(([y = NaN]) => y),
      { intercept: true },
    );
    const pairs = [
      ...named('coefficient', fit.coefficients, LONGLEY_CERTIFIED.coefficients),
      ['s', fit.residualStandardError, LONGLEY_CERTIFIED.residualStandardError] as const,
      ['sum of squares', fit.residualSumOfSquares, LONGLEY_CERTIFIED.residualSumOfSquares] as const,
      ['R²', fit.rSquared, LONGLEY_CERTIFIED.rSquared] as const,
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  it('solves NoInt1 through the origin', () => {
    const fit = leastSquares([NO_INTERCEPT.x], NO_INTERCEPT.y, { intercept: false });
    const pairs = [
      ['coefficient', fit.coefficients[0], NO_INTERCEPT.coefficient] as const,
      ['s', fit.residualStandardError, NO_INTERCEPT.residualStandardError] as const,
      ['sum of squares', fit.residualSumOfSquares, NO_INTERCEPT.residualSumOfSquares] as const,
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
    expect(fit.df).toBe(10);
  });
});

describe('leastSquares against R', () => {
  // Source: R 4.2.2 `stackloss`, exact rational solution (rdatasets.json `exactReference`). COMPUTED.
  it('solves stackloss to 1e-9', () => {
    const exact = z.object({
      coef: z.array(z.number()),
      se: z.array(z.number()),
      sigma: z.number(),
      rss: z.number(),
      r2: z.number(),
      residual: z.array(z.number()),
    });
    const file = readFileSync(path.join(__dirname, '../reference/rdatasets.json'), 'utf8');
    const expected = z.object({ stackloss: z.object({ exactReference: exact }) }).parse(JSON.parse(file))
      .stackloss.exactReference;
    const fit = leastSquares([STACKLOSS.air, STACKLOSS.water, STACKLOSS.acid], STACKLOSS.loss, { intercept: true });
    const pairs = [
      ...named('coefficient', fit.coefficients, expected.coef),
      ...named('standard error', fit.standardErrors, expected.se),
      ...named('residual', fit.residuals, expected.residual),
      ['s', fit.residualStandardError, expected.sigma] as const,
      ['sum of squares', fit.residualSumOfSquares, expected.rss] as const,
      ['R²', fit.rSquared, expected.r2] as const,
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  // Source: printed output of summary(lm(Volume ~ Girth + Height, trees)). SEEN, four digits.
  it('solves trees to the printed digit', () => {
    const fit = leastSquares([TREES.girth, TREES.height], TREES.volume, { intercept: true });
    expect(fit.coefficients.map((value) => Number(value.toFixed(4)))).toEqual([-57.9877, 4.7082, 0.3393]);
    expect(fit.residualStandardError).toBeCloseTo(3.88183, 5);
    expect(fit.rSquared).toBeCloseTo(0.948, 3);
  });

  // Source: R lm run live, with weights and far-off columns.
  it('agrees with lm to 1e-9 on weighted random columns', () => {
    const draw = normal(seeded(41));
    const columns = [1e3, 1, 1e-3].map((size, j) => Array.from({ length: 25 }, () => size * draw() + 10 * size * j));
    const values = Array.from({ length: 25 }, (_, i) => 3 + (columns[0]?.[i] ?? 0) / 500 + draw());
    const weights = values.map(() => 0.2 + Math.abs(draw()));
    for (const intercept of [true, false]) {
      const [coefficients = [], errors = [], [s, r2] = []] = runR(
        `f <- lm(${rVector(values)} ~ ${intercept ? '' : '0 + '}${columns.map((column) => rVector(column)).join(' + ')}, weights = ${rVector(weights)})
emit(coef(f)); emit(summary(f)$coefficients[, 2]); emit(c(summary(f)$sigma, summary(f)$r.squared))`,
      );
      const fit = leastSquares(columns, values, { intercept, weights });
      const pairs = [
        ...coefficients.map((value, i) => [`coefficient ${i}`, fit.coefficients[i], value] as const),
        ...errors.map((value, i) => [`standard error ${i}`, fit.standardErrors?.[i], value] as const),
        ['s', fit.residualStandardError, s] as const,
        ['R²', fit.rSquared, r2] as const,
      ];
      expect(pairs).toHaveLength(intercept ? 10 : 8);
      expect(apart(pairs, 1e-9)).toEqual([]);
    }
  });
});

describe('leastSquares at its edges', () => {
  it('leaves errors null where no degree of freedom is left, and R² where values are all one', () => {
    const exact = leastSquares([[0, 1]], [1, 3], { intercept: true });
    expect(exact).toMatchObject({ coefficients: [1, 2], standardErrors: null, residualStandardError: null, df: 0, rSquared: 1 });
    expect(leastSquares([[0, 1, 2]], [5, 5, 5], { intercept: true })).toMatchObject({ coefficients: [5, 0], rSquared: null });
  });

  it.each([
    ['no values', [], [], undefined, 'too-few-values'],
    ['fewer values than coefficients', [[1]], [1], undefined, 'too-few-values'],
    ['a column of another length', [[1, 2]], [1, 2, 3], undefined, 'length-mismatch'],
    ['weights of another length', [[1, 2, 4]], [1, 2, 3], [1, 1], 'length-mismatch'],
    ['a column without end', [[1, 2, Infinity]], [1, 2, 3], undefined, 'not-finite'],
    ['a value that is none', [[1, 2, 4]], [1, NaN, 3], undefined, 'not-finite'],
    ['a weight of nothing', [[1, 2, 4]], [1, 2, 3], [1, 0, 1], 'not-positive'],
    ['a column that never changes', [[2, 2, 2]], [1, 2, 3], undefined, 'dependent-columns'],
    [
      'a column that is another again',
      [
        [1, 2, 4, 7],
        [3, 6, 12, 21],
      ],
      [1, 2, 3, 4],
      undefined,
      'dependent-columns',
    ],
    ['columns whose squares leave the range', [[1e200, -1e200, 3e200]], [1, 2, 3], undefined, 'out-of-range'],
    ['residuals whose squares leave the range', [[0, 1, 3]], [1e300, -1e300, 1e300], undefined, 'out-of-range'],
  ])('refuses %s', (_, columns, values, weights, code) => {
    expect(() => leastSquares(columns, values, { intercept: true, weights })).toThrow(expect.objectContaining({ code }));
  });

  it('gives finite numbers or an AnalysisError on any input', () => {
    const column = fc.array(fc.double(), { minLength: 4, maxLength: 5 });
    fc.assert(
      fc.property(
        fc.array(column, { maxLength: 3 }),
        column,
        fc.boolean(),
        fc.option(column, { nil: undefined }),
        (columns, values, intercept, weights) => {
          try {
            const { coefficients, residuals, standardErrors, residualSumOfSquares } = leastSquares(columns, values, {
              intercept,
              weights,
            });
            const all = [...coefficients, ...residuals, ...(standardErrors ?? []), residualSumOfSquares];
            expect(all.every(Number.isFinite)).toBe(true);
          } catch (error) {
            expect(error).toBeInstanceOf(AnalysisError);
          }
        },
      ),
      // The example once gave a standard error without end: a weight too small to divide by.
      {
        numRuns: 500,
        examples: [[[[1, 2, 4, 7]], [1e177, -1e177, 1e177, 0], true, [5e-324, 5e-324, 5e-324, 5e-324]]],
      },
    );
  });
});
