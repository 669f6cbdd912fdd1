import { AnalysisError, capability, type PooledDeviation } from '@/analysis';

const MILLIMETRE = 1_000_000;
const RULE = { top: { low: 6 * MILLIMETRE, high: 6 * MILLIMETRE } };
const shots = (surface: string, month: string, ...millimetres: number[]): PooledDeviation[] =>
  millimetres.map((deviation) => ({ surface, month, deviation: deviation * MILLIMETRE }));

// Worked by hand from the definitions; no outside authority.
describe('capability', () => {
  it('pools deviations by surface: bias, spread, share within and Cpk', () => {
    const { surfaces } = capability({
      deviations: [...shots('top', '2026-10', 1, 2, 3), ...shots('rails', '2026-10', 5)],
      rules: RULE,
      checks: [],
    });
    expect(surfaces).toEqual([
      {
        surface: 'rails',
        n: 1,
        bias: 5 * MILLIMETRE,
        spread: null,
        within: null,
        cpk: null,
        months: [{ month: '2026-10', n: 1, bias: 5 * MILLIMETRE, spread: null }],
        trend: null,
      },
      {
        surface: 'top',
        n: 3,
        bias: 2 * MILLIMETRE,
        spread: MILLIMETRE,
        within: 1,
        // 6 − 2 = 4 mm of room above, over three spreads.
        cpk: 4 / 3,
        months: [{ month: '2026-10', n: 3, bias: 2 * MILLIMETRE, spread: MILLIMETRE }],
        trend: null,
      },
    ]);
  });

  it('takes the nearer limit for Cpk, and lets it be negative', () => {
    const of = (...millimetres: number[]) =>
      capability({ deviations: shots('top', '2026-10', ...millimetres), rules: RULE, checks: [] }).surfaces[0];
    expect(of(-3, -2, -1)?.cpk).toBeCloseTo(4 / 3, 12);
    expect(of(7, 8, 9)?.cpk).toBeCloseTo(-2 / 3, 12);
    expect(of(2, 2, 2)?.cpk).toBeNull();
    expect(of(6, -6, 6.000001, 0)?.within).toBe(0.75);
  });

  it('shows the months in order and how |deviation| changes from one to the next, across a new year', () => {
    const deviations = [...shots('top', '2027-01', 4, -4), ...shots('top', '2026-11', -1, 1, 3), ...shots('top', '2026-12', 3)];
    const [top] = capability({ deviations, rules: RULE, checks: [] }).surfaces;
    expect(top?.months.map(({ month, n }) => [month, n])).toEqual([
      ['2026-11', 3],
      ['2026-12', 1],
      ['2027-01', 2],
    ]);
    // Means of |deviation| 5/3, 3 and 4 mm: (4 − 5/3) / 2 a month.
    expect((top?.trend ?? 0) / MILLIMETRE).toBeCloseTo((4 - 5 / 3) / 2, 9);
  });

  it('takes the repeatability of one reading from checks that held, and counts those that failed', () => {
    const checks = [
      { error: 3 * MILLIMETRE, holds: true },
      { error: -4 * MILLIMETRE, holds: true },
      { error: 90 * MILLIMETRE, holds: false },
    ];
    expect(capability({ deviations: [], rules: {}, checks }).checks).toEqual({
      n: 3,
      failed: 1,
      failedShare: 1 / 3,
      // √((9 + 16) / 4) = 2.5 mm
      repeatability: 2.5 * MILLIMETRE,
    });
  });

  it('of nothing says nothing', () => {
    expect(capability({ deviations: [], rules: {}, checks: [] })).toEqual({
      surfaces: [],
      checks: { n: 0, failed: 0, failedShare: null, repeatability: null },
    });
  });

  test.each<[string, PooledDeviation[], Record<string, { low: number; high: number }>, string]>([
    ['a month that is none', [{ surface: 'top', month: '2026-13', deviation: 0 }], {}, 'bad-month'],
    ['a deviation that is no number', [{ surface: 'top', month: '2026-12', deviation: Number.NaN }], {}, 'not-finite'],
    ['a negative limit', [], { top: { low: -1, high: 1 } }, 'negative'],
  ])('refuses %s', (_, deviations, rules, code) => {
    try {
      capability({ deviations, rules, checks: [] });
      throw new Error('nothing was refused');
    } catch (error) {
      expect(error).toBeInstanceOf(AnalysisError);
      expect(error).toMatchObject({ code });
    }
  });
});
