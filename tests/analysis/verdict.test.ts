import * as fc from 'fast-check';
import conformance from '../reference/conformance.json';
import {
  AnalysisError,
  formatLength,
  guardLeavesNothing,
  judge,
  judgeRound,
  parseLength,
  type DecisionRule,
  type JudgedStation,
  type LengthStyle,
} from '@/analysis';

const INCH = 25_400_000;
const FOOT = 304_800_000;
const SIXTY_FOURTH = INCH / 64;
const even = (limit: number) => ({ low: limit, high: limit });

describe('judge', () => {
  // tests/reference/conformance.json: R 4.2.2 and exact arithmetic; COMPUTED. Inches.
  it('gives the probability of conformity of every reference row', () => {
    for (const { d, u, T, pTwoSided } of conformance.rows) {
      expect(Math.abs(judge(d * INCH, even(T * INCH), u * INCH, 'simple').probabilityIn - pTwoSided)).toBeLessThan(2e-14);
    }
  });
  it('is in under the guarded rule exactly where every reference row conforms', () => {
    for (const row of conformance.rows) {
      const { verdict } = judge(row.d * INCH, even(row.T * INCH), row.u * INCH, 'guarded');
      expect([row.d, row.u, row.T, verdict === 'in']).toEqual([row.d, row.u, row.T, row['decisionGuard1.645u'] === 'conform']);
    }
  });
  it('is in under the simple rule exactly where every reference row conforms without guard', () => {
    for (const row of conformance.rows) {
      expect(judge(row.d * INCH, even(row.T * INCH), row.u * INCH, 'simple').verdict === 'in').toBe(
        row.decisionNoGuard === 'conform',
      );
    }
  });

  // JCGM 106:2012 examples: inputs from MEMORY, results COMPUTED; tolerance 0.0005. Units are whatever the example's are, scaled to whole numbers.
  test.each([
    ['limits 12.5 to 16.3, reading 13.6, u 1.8', 13.6 - 14.4, 1.9, 1.8, 0.663],
    ['one upper limit −5.40, reading −5.47, u 0.05', -5.47 + 5.4 + 5e5, 5e5, 0.05, 0.919],
    ['one lower limit 490, reading 509.7, u 8.6', 509.7 - 490 - 5e5, 5e5, 8.6, 0.989],
  ])('%s', (_, deviation, limit, u, expected) => {
    expect(judge(deviation * 1e6, even(limit * 1e6), u * 1e6, 'simple').probabilityIn).toBeCloseTo(expected, 3);
  });

  // COMPUTED: false accept at the limit of acceptance for guard bands w = 0, u, 1.645u, 1.96u, 2u: 50, 15.87, 5.00, 2.50, 2.28 %.
  test.each([
    [0, 0.5],
    [1, 0.1587],
    [1.645, 0.05],
    [1.96, 0.025],
    [2, 0.0228],
  ])('accepts falsely at %d u inside a limit as often as the normal tail says', (guard, expected) => {
    expect(1 - judge((1000 - guard) * 1000, even(1_000_000), 1000, 'simple').probabilityIn).toBeCloseTo(expected, 4);
  });

  // Micrometer, SEEN: limit ±0.003, U 0.001 gives acceptance ±0.002; +0.0017 passes, +0.0025 is grey. U is 1.645 u here.
  test.each([
    [1.7, 'in'],
    [2, 'in'],
    [2.5, 'cannot-tell'],
    [3, 'cannot-tell'],
    [3.001, 'high'],
    [-2.5, 'cannot-tell'],
    [-3.001, 'low'],
  ])('of a micrometer with ±0.003 and U 0.001, %d thousandths is %s', (thousandths, verdict) => {
    expect(judge(Math.round(thousandths * 1_645_000), even(3 * 1_645_000), 1_000_000, 'guarded').verdict).toBe(verdict);
  });

  // ACI 117-90 §3.3 (SEEN in a trade journal's answer): footings under masonry ±1/2 in; others +1/2, −2 in.
  test.each([
    [-0.5, 0.5, 0.5, 'in'],
    [-0.501, 0.5, 0.5, 'low'],
    [-2, 2, 0.5, 'in'],
    [0.5, 2, 0.5, 'in'],
    [0.501, 2, 0.5, 'high'],
    [-2.001, 2, 0.5, 'low'],
  ])('of a footing at %d in with −%d and +%d in is %s', (at, low, high, verdict) => {
    expect(judge(at * INCH, { low: low * INCH, high: high * INCH }, 0, 'simple').verdict).toBe(verdict);
  });

  // Common practice, no source: an unevenness of 1 1/2 in is far beyond any rule offered; "flat enough for foam forms within about 1/4 in".
  it('finds 1 1/2 in out under every limit up to an inch, and 1/4 in within a quarter', () => {
    for (const limit of [1 / 8, 1 / 4, 3 / 8, 1 / 2, 3 / 4, 1]) {
      expect(judge(1.5 * INCH, even(limit * INCH), limit * INCH * 0.1, 'guarded').verdict).toBe('high');
      expect(judge(-1.5 * INCH, even(limit * INCH), 0, 'simple').verdict).toBe('low');
    }
    expect(judge(INCH / 4, even(INCH / 4), 0, 'simple').verdict).toBe('in');
  });

  test.each<[LengthStyle, string, number]>([
    ['feet-inches', '1/8"', SIXTY_FOURTH],
    ['feet-inches', '1/4"', SIXTY_FOURTH],
    ['feet-inches', `0' 1/2"`, SIXTY_FOURTH],
    ['decimal-feet', '0.02', 304_800],
    ['metric', '3 mm', 100_000],
  ])('is in at the limit itself and out one mark beyond, in %s: %s', (style, keyed, mark) => {
    const limit = parseLength(keyed, style);
    for (const rule of ['simple', 'guarded'] satisfies DecisionRule[]) {
      // An elevation read and judged the long way round: plan grade plus the limit, printed, read back, and taken from plan grade.
      const grade = 100 * FOOT;
      const judged = (off: number) =>
        judge(parseLength(formatLength(grade + off, style, mark), style, mark) - grade, even(limit), 0, rule).verdict;
      const there = style === 'metric' || style === 'decimal-feet' ? Math.floor(limit / mark) * mark : limit;
      expect(judge(limit, even(limit), 0, rule).verdict).toBe('in');
      expect(judge(limit + mark, even(limit), 0, rule).verdict).toBe('high');
      expect(judge(-limit, even(limit), 0, rule).verdict).toBe('in');
      expect(judge(-limit - mark, even(limit), 0, rule).verdict).toBe('low');
      expect(judged(there)).toBe('in');
      expect(judged(there + mark)).toBe('high');
    }
  });

  it('is close, whichever rule, whenever a limit lies within 1.645 u', () => {
    for (const rule of ['simple', 'guarded'] satisfies DecisionRule[]) {
      const close = (deviation: number) => judge(deviation, { low: 4_000, high: 10_000 }, 1_000, rule).close;
      expect([8_355, 8_354, 11_645, 11_646, -2_355, -2_354, -5_645, -5_646].map(close)).toEqual([
        true,
        false,
        true,
        false,
        true,
        false,
        true,
        false,
      ]);
    }
  });

  it('with u = 0 is certain', () => {
    expect(judge(0, even(10), 0, 'guarded')).toEqual({ verdict: 'in', close: false, probabilityIn: 1 });
    expect(judge(11, even(10), 0, 'guarded')).toEqual({ verdict: 'high', close: false, probabilityIn: 0 });
    expect(judge(10, even(10), 0, 'guarded')).toMatchObject({ verdict: 'in', probabilityIn: 1 });
    expect(judge(-0, { low: 0, high: 0 }, 0, 'simple')).toMatchObject({ verdict: 'in', probabilityIn: 1 });
  });

  it('can accept nothing where the guard bands meet, and says so', () => {
    expect(judge(0, even(1_000), 700, 'guarded').verdict).toBe('cannot-tell');
    expect(guardLeavesNothing(even(1_000), 700)).toBe(true);
    expect(guardLeavesNothing(even(1_645), 1_000)).toBe(false);
    expect(judge(0, even(1_645), 1_000, 'guarded').verdict).toBe('in');
  });

  it('keeps the digits of a sure miss', () => {
    // Φ(−10) = 7.619853024160527e-24 (conformance.json, R 4.2.2).
    expect(judge(20_000, { low: 1e9, high: 10_000 }, 1_000, 'simple').probabilityIn / 7.619853024160527e-24).toBeCloseTo(1, 12);
    expect(judge(-20_000, { low: 10_000, high: 1e9 }, 1_000, 'simple').probabilityIn / 7.619853024160527e-24).toBeCloseTo(1, 12);
  });

  it('never answers what is not a verdict and a probability', () => {
    const size = fc.oneof(fc.integer({ min: 0, max: 1e12 }), fc.double({ min: 0, max: 1e13, noNaN: true }));
    fc.assert(
      fc.property(
        fc.double({ min: -1e13, max: 1e13, noNaN: true }),
        size,
        size,
        size,
        fc.constantFrom<DecisionRule>('simple', 'guarded'),
        (at, low, high, u, rule) => {
          const { verdict, probabilityIn } = judge(at, { low, high }, u, rule);
          expect(probabilityIn).toBeGreaterThanOrEqual(0);
          expect(probabilityIn).toBeLessThanOrEqual(1);
          expect(verdict === 'high').toBe(at > high);
          expect(verdict === 'low').toBe(at < -low);
        },
      ),
    );
  });

  test.each<[number, number, number, number]>([
    [Number.NaN, 1, 1, 1],
    [0, Number.NaN, 1, 1],
    [0, 1, Number.POSITIVE_INFINITY, 1],
    [0, 1, 1, Number.NaN],
    [0, -1, 1, 1],
    [0, 1, -1, 1],
    [0, 1, 1, -1],
  ])('refuses deviation %d, limits %d and %d, u %d', (deviation, low, high, u) => {
    expect(() => judge(deviation, { low, high }, u, 'simple')).toThrow(AnalysisError);
  });
});

describe('judgeRound', () => {
  const held = (verdict: JudgedStation['verdict']): JudgedStation => ({ laser: 'held', verdict });
  test.each<[string, (JudgedStation | null)[], string]>([
    ['without stations', [], 'not-yet'],
    ['with a station not shot, whatever the others are', [held('high'), null], 'not-yet'],
    ['with a doubted shot, even beside one that is out', [held('high'), { laser: 'doubted', verdict: 'in' }], 'cannot-tell'],
    ['with a shot not checked yet', [held('in'), { laser: 'unchecked', verdict: 'in' }], 'cannot-tell'],
    ['with one out, even beside one too close to call', [held('cannot-tell'), held('low')], 'not-to-grade'],
    ['with one within its uncertainty', [held('in'), held('cannot-tell')], 'too-close-to-call'],
    ['with all in', [held('in'), held('in')], 'to-grade'],
  ])('%s', (_, stations, expected) => {
    expect(judgeRound(stations)).toBe(expected);
  });
});
