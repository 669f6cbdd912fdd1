import { fitPlane } from '@/analysis/plane-fit';
import { apart } from '../support/closeness';
import { type PlaneSet, planeSets, pointsOf } from '../support/plane-reference';

type Pair = readonly [string, number | null | undefined, number | null | undefined];

/** P3 and X3 are collinear: there the reference gives a and the rise on x alone, ours the mean and the rise along the line. */
const sets = [...planeSets()];
const planes = sets.filter(([, set]) => set.reference.rank === 3);
const lines = sets.filter(([, set]) => set.reference.rank === 2);

function perPoint(set: PlaneSet): Pair[] {
  const { reference } = set;
  return fitPlane(pointsOf(set)).points.flatMap((point, i): Pair[] => [
    [`residual ${i}`, point.residual, reference.residual[i]],
    [`fitted ${i}`, point.fitted, (set.points[i]?.[2] ?? NaN) - (reference.residual[i] ?? NaN)],
    [`leverage ${i}`, point.leverage, reference.hat[i]],
    [`studentized ${i}`, point.studentized, reference.rInternal[i]],
    [`deleted ${i}`, point.deletedStudentized, reference.rExternal[i]],
    [`cooks ${i}`, point.cooks, reference.cook[i]],
  ]);
}

function overall(set: PlaneSet): Pair[] {
  const { reference } = set;
  const fit = fitPlane(pointsOf(set));
  return [
    ['df', fit.df, reference.dfResidual],
    ['n', fit.n, set.n],
    ['s', fit.residualStandardError, reference.sigma],
    ['R²', fit.rSquared, reference.r2],
    ['F', fit.fTest?.f ?? null, reference.F],
    ['p of F', fit.fTest?.p ?? null, reference.Fp],
  ];
}

// Source: exact rational arithmetic on the doubles given, rounded once (tests/reference/plane-sources.md). COMPUTED.
describe('fitPlane against exact arithmetic', () => {
  test.each(planes)('%s: coefficients, their errors, t and p within 1e-9', (_, set) => {
    const fit = fitPlane(pointsOf(set));
    expect(fit.model).toBe('plane');
    const names = ['a', 'b', 'c'] as const;
    const pairs = names.flatMap((name, k): Pair[] => [
      [name, fit[name]?.value, set.reference.coef[k]],
      [`se ${name}`, fit[name]?.standardError, set.reference.se[k]],
      [`t ${name}`, fit[name]?.t, set.reference.t[k]],
      [`p ${name}`, fit[name]?.p, set.reference.p[k]],
    ]);
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  test.each(sets)('%s: R², F, s and degrees of freedom within 1e-9', (_, set) => {
    expect(apart(overall(set), 1e-9)).toEqual([]);
  });

  test.each(sets)('%s: every residual, leverage, studentized residual and Cook distance within 1e-9', (_, set) => {
    expect(apart(perPoint(set), 1e-9)).toEqual([]);
  });

  test.each(sets)('%s: shares are offset, tilt and rest of the sum of squares', (_, set) => {
    const { n, reference } = set;
    const offset = n * reference.zMean ** 2;
    const total = offset + reference.tss;
    const { shares } = fitPlane(pointsOf(set));
    const pairs: Pair[] = [
      ['offset', shares.offset, offset / total],
      ['tilt', shares.tilt, (reference.tss - reference.rss) / total],
      ['rest', shares.rest, reference.rss / total],
      ['sum', shares.offset + shares.tilt + shares.rest, 1],
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  test.each(planes)('%s: slope, its fall and its drop follow from the coefficients', (_, set) => {
    const [, b = NaN, c = NaN] = set.reference.coef;
    const { tilt } = fitPlane(pointsOf(set));
    const fitted = set.points.map(([, , z], i) => z - (set.reference.residual[i] ?? NaN));
    const towards = (Math.atan2(-(b ?? NaN), -(c ?? NaN)) * 180) / Math.PI;
    const pairs: Pair[] = [
      ['slope', tilt.slope, Math.hypot(b ?? NaN, c ?? NaN)],
      ['azimuth', tilt.fallAzimuth, (towards + 360) % 360],
      ['drop', tilt.drop, Math.max(...fitted) - Math.min(...fitted)],
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
  });

  test.each(lines)('%s: collinear points give the line along them, its mean at their mean point', (_, set) => {
    const fit = fitPlane(pointsOf(set));
    expect(fit.model).toBe('line');
    expect([fit.b, fit.c]).toEqual([null, null]);
    const [first, last] = [set.points[0], set.points.at(-1)];
    const run = Math.hypot((last?.[0] ?? NaN) - (first?.[0] ?? NaN), (last?.[1] ?? NaN) - (first?.[1] ?? NaN));
    const perEast = ((last?.[0] ?? NaN) - (first?.[0] ?? NaN)) / run;
    const { reference } = set;
    const pairs: Pair[] = [
      ['a', fit.a.value, reference.zMean],
      ['se a', fit.a.standardError, (reference.sigma ?? NaN) / Math.sqrt(set.n)],
      ['slope', fit.tilt.slope, Math.abs((reference.coef[1] ?? NaN) * perEast)],
      ['se slope', fit.tilt.slopeStandardError, (reference.se[1] ?? NaN) * perEast],
      ['p of F is p of t', fit.fTest?.p, reference.p[1]],
    ];
    expect(apart(pairs, 1e-9)).toEqual([]);
    expect(fit.fTest?.df1).toBe(1);
  });
});
