import tCdf from '@stdlib/stats-base-dists-t-cdf';
import fCdf from '@stdlib/stats-base-dists-f-cdf';
import * as fc from 'fast-check';
import { AnalysisError } from '@/analysis/analysis-error';
import { fUpperTail, studentTwoSided, studentUpperQuantile } from '@/analysis/distributions';
import { apart } from '../support/closeness';
import { rVector, runR } from '../support/r';

const DEGREES = [1, 2, 3, 4, 5, 7, 10, 21, 31, 32, 33, 37, 100, 997, 9_997];
const TS = [1e-8, 0.001, 0.1, 0.5, 1, 1.5, 1.7, 1.732, 1.74, 1.8, 2, 3, 5, 10, 17, 30, 100, 1095.2, 1e5];

describe('tails of Student’s t', () => {
  const cases = DEGREES.flatMap((df) => TS.map((t) => ({ t, df })));

  // Source: R pt run live. Down to 1e-300; R and we both give 0 under the smallest double.
  it('are R’s pt to 1e-11, far out too', () => {
    const [expected = []] = runR(`emit(2 * pt(-${rVector(cases.map(({ t }) => t))}, ${rVector(cases.map(({ df }) => df))}))`);
    const pairs = cases.map(({ t, df }, i) => [`t ${t}, df ${df}`, studentTwoSided(t, df), expected[i]] as const);
    expect(apart(pairs, 1e-11)).toEqual([]);
  });

  // Source: R pt run live, for the number of stations that speed is measured at.
  it('are R’s pt to 1e-10 at a hundred thousand degrees of freedom', () => {
    const [expected = []] = runR(`emit(2 * pt(-${rVector(TS)}, 99997))`);
    expect(
      apart(
        TS.map((t, i) => [`t ${t}`, studentTwoSided(t, 99_997), expected[i]] as const),
        1e-10,
      ),
    ).toEqual([]);
  });

  // Source: @stdlib/stats-base-dists-t-cdf 0.2.3, whose lower tail holds 14 digits; at t = 1e-8 and one degree of freedom it has only eight.
  it('are twice the library’s lower tail', () => {
    const near = cases.filter(({ t, df }) => t >= 0.001 && tCdf(-t, df) > 1e-250);
    expect(
      apart(
        near.map(({ t, df }) => [`t ${t}, df ${df}`, studentTwoSided(t, df), 2 * tCdf(-t, df)] as const),
        1e-11,
      ),
    ).toEqual([]);
  });

  // By hand: with one degree of freedom the tail is 1 − 2·atan(t)/π = 2·atan(1/t)/π, with two 1 − t/√(2 + t²).
  it('are the closed forms of one and two degrees of freedom', () => {
    for (const t of [0.3, 1, 4, 1e6, 1e155, 1e200])
      expect(studentTwoSided(t, 1) / ((2 * Math.atan(1 / t)) / Math.PI)).toBeCloseTo(1, 12);
    for (const t of [0.3, 1, 4]) expect(studentTwoSided(t, 2)).toBeCloseTo(1 - t / Math.sqrt(2 + t * t), 13);
  });

  it('are the same either way, whole at 0, and between 0 and 1 for any t', () => {
    expect(studentTwoSided(0, 5)).toBe(1);
    fc.assert(
      fc.property(
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        fc.double({ min: 0.1, max: 1e6, noNaN: true }),
        (t, df) => {
          const p = studentTwoSided(t, df);
          expect(p).toBe(studentTwoSided(-t, df));
          expect(p >= 0 && p <= 1).toBe(true);
        },
      ),
    );
  });
});

describe('tails of F', () => {
  const cases = [1, 5, 21, 997].flatMap((df2) => [1e-6, 0.5, 1, 3.3143, 10, 157, 5000].map((f) => ({ f, df2 })));

  // Source: R pf run live with lower.tail = FALSE.
  it.each([1, 2] as const)('are R’s pf to 1e-11 with %i numerator degrees of freedom', (df1) => {
    const [expected = []] = runR(
      `emit(pf(${rVector(cases.map(({ f }) => f))}, ${df1}, ${rVector(cases.map(({ df2 }) => df2))}, lower.tail = FALSE))`,
    );
    expect(
      apart(
        cases.map(({ f, df2 }, i) => [`F ${f}, df ${df2}`, fUpperTail(f, df1, df2), expected[i]] as const),
        1e-11,
      ),
    ).toEqual([]);
  });

  // Source: @stdlib/stats-base-dists-f-cdf 0.2.3: its 1 − cdf agrees while p is large, and is 0 or noise where ours still has every digit.
  it('keep their digits where 1 − cdf has lost them', () => {
    expect(fUpperTail(3, 2, 21)).toBeCloseTo(1 - fCdf(3, 2, 21), 12);
    const deep = fUpperTail(5000, 2, 30);
    expect(1 - fCdf(5000, 2, 30)).toBeLessThan(1e-15);
    // By hand: (1 + 10000/30)^−15.
    expect(deep / (1 + 10_000 / 30) ** -15).toBeCloseTo(1, 11);
  });
});

describe('upper quantiles of Student’s t', () => {
  const cases = [1, 2, 3, 20, 996].flatMap((df) => [0.5, 0.4, 0.025, 0.05 / 48, 2.5e-5, 1e-8].map((tail) => ({ tail, df })));

  // Source: R qt run live; planefit.json's definitionCritical qt(1 − 0.05/(2n), n − 4).
  it('are R’s qt to 1e-11', () => {
    const [expected = []] = runR(
      `emit(qt(${rVector(cases.map(({ tail }) => tail))}, ${rVector(cases.map(({ df }) => df))}, lower.tail = FALSE))`,
    );
    const pairs = cases
      .filter(({ tail }) => tail < 0.5)
      .map(
        ({ tail, df }) =>
          [
            `tail ${tail}, df ${df}`,
            studentUpperQuantile(tail, df),
            expected[cases.findIndex((one) => one.tail === tail && one.df === df)],
          ] as const,
      );
    expect(apart(pairs, 1e-11)).toEqual([]);
    expect(studentUpperQuantile(0.5, 7)).toBeCloseTo(0, 14);
  });

  it('undo the tail', () => {
    for (const { tail, df } of cases) expect(studentTwoSided(studentUpperQuantile(tail, df), df) / (2 * tail)).toBeCloseTo(1, 10);
  });
});

describe('refusals', () => {
  it.each([
    ['no degree of freedom', () => studentTwoSided(1, 0), 'not-positive'],
    ['a t that is none', () => studentTwoSided(NaN, 3), 'not-finite'],
    ['an endless t', () => studentTwoSided(Infinity, 3), 'not-finite'],
    ['a negative F', () => fUpperTail(-1, 2, 3), 'negative'],
    ['an F without degrees of freedom', () => fUpperTail(1, 2, 0), 'not-positive'],
    ['a tail of nothing', () => studentUpperQuantile(0, 3), 'not-positive'],
    ['a tail of more than half', () => studentUpperQuantile(0.6, 3), 'out-of-range'],
    ['a quantile without degrees of freedom', () => studentUpperQuantile(0.1, -1), 'not-positive'],
  ])('refuse %s', (_, call, code) => {
    expect(call).toThrow(AnalysisError);
    expect(call).toThrow(expect.objectContaining({ code }));
  });
});
