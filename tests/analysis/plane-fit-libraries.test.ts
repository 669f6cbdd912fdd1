import { MultivariateLinearRegression } from 'ml-regression';
import { linearRegression } from 'simple-statistics';
import { fitPlane } from '@/analysis/plane-fit';
import { apart, relativeError } from '../support/closeness';
import { planeSets, pointsOf } from '../support/plane-reference';

type Pair = readonly [string, number | null | undefined, number | null | undefined];

function setOf(name: string): ReturnType<typeof pointsOf> {
  const set = planeSets().get(name);
  if (set === undefined) throw new Error(`planefit.json has no ${name}`);
  return pointsOf(set);
}

function byLibrary(points: ReturnType<typeof pointsOf>): { b: number; c: number; a: number; s: number; errors: number[] } {
  const { weights, stdError, stdErrors } = new MultivariateLinearRegression(
    points.map(({ x, y }) => [x, y]),
    points.map(({ z }) => [z]),
  );
  const [[b = NaN] = [], [c = NaN] = [], [a = NaN] = []] = weights;
  return { b, c, a, s: stdError, errors: stdErrors };
}

// ml-regression 6.3.0 inverts XᵀX, uncentred: near the origin it is sound and agrees with us; at coordinates a million feet from it, which a job tied
// to a state grid has, the squares take all sixteen digits and the answer is wrong without a word. simple-statistics 7.12.1 fits one column only.
describe('regression libraries beside fitPlane', () => {
  it.each(['P1', 'P4'])('ml-regression agrees on %s to 1e-9, near the origin', (name) => {
    const [fit, other] = [fitPlane(setOf(name)), byLibrary(setOf(name))];
    const pairs: Pair[] = [
      ['a', fit.a.value, other.a],
      ['b', fit.b?.value, other.b],
      ['c', fit.c?.value, other.c],
      ['s', fit.residualStandardError, other.s],
      ['se b', fit.b?.standardError, other.errors[0]],
      ['se c', fit.c?.standardError, other.errors[1]],
      ['se a', fit.a.standardError, other.errors[2]],
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  // Source: exact arithmetic (planefit.json P7) says (−347.02, 0.0017014, −0.00089898).
  it('ml-regression is wrong by more than 5 % on P7, a million feet away, where fitPlane holds 1e-9', () => {
    const [, b, c] = planeSets().get('P7')?.reference.coef ?? [];
    const [fit, other] = [fitPlane(setOf('P7')), byLibrary(setOf('P7'))];
    expect(Math.max(relativeError(other.b, b), relativeError(other.c, c))).toBeGreaterThan(0.05);
    expect(
      apart(
        [
          ['b', fit.b?.value, b],
          ['c', fit.c?.value, c],
        ],
        1e-9,
      ),
    ).toEqual([]);
  });

  it('ml-regression gives a wall that no plane stands on a gradient all the same, where fitPlane says line', () => {
    const { b, c } = byLibrary(setOf('P3'));
    expect(fitPlane(setOf('P3'))).toMatchObject({ model: 'line', b: null, c: null });
    expect(Number.isFinite(b) && Number.isFinite(c)).toBe(true);
  });

  it('simple-statistics agrees on a wall along x to 1e-9, near the origin', () => {
    const points = setOf('X3');
    const { m, b } = linearRegression(points.map(({ x, z }) => [x, z]));
    const fit = fitPlane(points);
    const mean = points.reduce((sum, { x }) => sum + x, 0) / points.length;
    expect(
      apart(
        [
          ['slope', fit.tilt.slope, Math.abs(m)],
          ['value at the mean', fit.a.value, b + m * mean],
        ],
        1e-9,
      ),
    ).toEqual([]);
  });

  // It subtracts the first x before it sums, so distance costs it nothing; but it knows one column and gives no error of anything, so it cannot
  // be the solver of a plane either.
  it('simple-statistics agrees on it a million feet away too', () => {
    const points = setOf('X3').map((point) => ({ ...point, x: point.x + 1_203_417.25 }));
    const { m } = linearRegression(points.map(({ x, z }) => [x, z]));
    expect(apart([['slope', fitPlane(points).tilt.slope, Math.abs(m)]], 1e-9)).toEqual([]);
  });
});
