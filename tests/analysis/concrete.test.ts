import { AnalysisError, cubicYards, footingConcrete, offsetOutline, type ConcreteRun, type ProfilePoint } from '@/analysis';

const INCH = 25_400_000;
const FOOT = 304_800_000;
const CUBIC_FOOT = 0.3048 ** 3;
const PLAIN = { waste: 0, sideBulge: 0, thinBy: 0 };

const profile = (stationsFt: number[], heightsIn: number[]): ProfilePoint[] =>
  stationsFt.map((station, index) => ({ station: station * FOOT, elevation: (heightsIn[index] ?? 0) * INCH }));
/** A footing as planned: level, so wide, so deep, so long. */
const plain = (widthIn: number, depthIn: number, lengthFt: number): ConcreteRun => ({
  id: 'r',
  width: widthIn * INCH,
  planThickness: depthIn * INCH,
  subgrade: profile([0, lengthFt], [0, 0]),
  top: profile([0, lengthFt], [depthIn, depthIn]),
});
const yards = (run: ConcreteRun, options = PLAIN) => cubicYards(footingConcrete([run], options).orderVolume);

function refusal(work: () => unknown): AnalysisError {
  try {
    work();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('footingConcrete', () => {
  // Footing concrete in yd³ per lineal ft, engineering reference table, SEEN; ±0.0005.
  test.each([
    [6, [0.019, 0.023, 0.028, 0.037]],
    [8, [0.025, 0.031, 0.037, 0.049]],
    [10, [0.031, 0.039, 0.046, 0.062]],
    [12, [0.037, 0.046, 0.056, 0.074]],
    [24, [0.074, 0.093, 0.111, 0.148]],
  ])('per foot of run %d in deep is what the table prints for 12, 15, 18 and 24 in wide', (depth, printed) => {
    [12, 15, 18, 24].forEach((width, index) => {
      expect(Math.abs(yards(plain(width, depth, 1)) - (printed[index] ?? Number.NaN))).toBeLessThanOrEqual(0.0005 + 1e-9);
    });
  });

  // Common practice, no source: footing forms come in 4 in steps of width from 16 to 44 in. Worked as width × 1 ft × 1 ft ÷ 27.
  test.each([
    [16, 0.0494],
    [20, 0.0617],
    [24, 0.0741],
    [28, 0.0864],
    [32, 0.0988],
    [36, 0.1111],
    [40, 0.1235],
    [44, 0.1358],
  ])('per foot of run 12 in deep and %d in wide is %d yd³', (width, expected) => {
    expect(yards(plain(width, 12, 1))).toBeCloseTo(expected, 4);
    expect(yards(plain(width, 8, 1))).toBeCloseTo((expected * 2) / 3, 4);
  });

  // Trench 40 × 6 × 3.125 ft = 750 ft³ = 27.78 yd³, and 120 × 80 × 2 ft + 8 % = 768 yd³: worked examples, SEEN.
  it('of the worked examples is 27.78 and, with 8 % waste, 768 yd³', () => {
    expect(footingConcrete([plain(72, 37.5, 40)], PLAIN).planVolume / CUBIC_FOOT).toBeCloseTo(750, 9);
    expect(yards(plain(72, 37.5, 40))).toBeCloseTo(27.78, 2);
    expect(yards(plain(960, 24, 120), { ...PLAIN, waste: 0.08 })).toBeCloseTo(768, 9);
  });

  // The rest is worked by hand from the definitions.
  it('integrates between the breakpoints of both profiles', () => {
    // 12 in thick but for a hole 3 in deep in the middle of the subgrade, which the top's stations miss.
    const run = {
      ...plain(12, 12, 12),
      subgrade: profile([0, 4, 6, 8, 12], [0, 0, -3, 0, 0]),
      top: profile([0, 5, 12], [12, 12, 12]),
    };
    const found = footingConcrete([run], PLAIN);
    expect(found.planVolume / CUBIC_FOOT).toBeCloseTo(12, 12);
    expect(found.asDugVolume / CUBIC_FOOT).toBeCloseTo(12 + (4 * 0.25) / 2, 12);
    expect(found.thin).toEqual([]);
  });

  it('counts nothing where the dig stands above the top, and cuts at the crossing', () => {
    const run = { ...plain(12, 12, 4), subgrade: profile([0, 4], [0, 24]) };
    const found = footingConcrete([run], PLAIN);
    expect(found.asDugVolume / CUBIC_FOOT).toBeCloseTo((2 * 1) / 2, 12);
    expect(found.thin.map(({ station, thickness }) => [station / FOOT, thickness / INCH])).toEqual([[4, -12]]);
  });

  it('finds a place thin only beyond what may be missing', () => {
    const run = { ...plain(12, 12, 10), subgrade: profile([0, 5, 10], [0, 0.5, 1]) };
    const thin = (thinBy: number) => footingConcrete([run], { ...PLAIN, thinBy }).thin.map(({ station }) => station / FOOT);
    expect(thin(0.5 * INCH)).toEqual([10]);
    expect(thin(0.5 * INCH - 1)).toEqual([5, 10]);
    expect(thin(INCH)).toEqual([]);
    expect(footingConcrete([run], PLAIN).thin[0]).toEqual({ run: 'r', station: 5 * FOOT, thickness: 11.5 * INCH });
  });

  const stepped = (subgradeStepFt: number): ConcreteRun => ({
    ...plain(12, 8, 20),
    subgrade: profile([0, subgradeStepFt, subgradeStepFt, 20], [0, 0, 16, 16]),
    top: profile([0, 10, 10, 20], [8, 8, 24, 24]),
  });
  it('adds a riser as high as the step and as thick as the footing, once', () => {
    // 20 ft × 1 ft × 8 in, and a riser 16 in high, 8 in thick, 1 ft wide.
    const planned = (20 * 8) / 12 + (16 / 12) * (8 / 12);
    expect(footingConcrete([stepped(10)], PLAIN).planVolume / CUBIC_FOOT).toBeCloseTo(planned, 12);
    expect(footingConcrete([stepped(10)], PLAIN).asDugVolume / CUBIC_FOOT).toBeCloseTo(planned, 12);
    // Dug back by the riser's own 8 in: the profiles hold it already.
    expect(footingConcrete([stepped(10 + 8 / 12)], PLAIN).asDugVolume / CUBIC_FOOT).toBeCloseTo(planned, 12);
  });

  it('widens what is dug by the bulge on both sides, never the plan', () => {
    const found = footingConcrete([plain(12, 12, 10)], { ...PLAIN, sideBulge: INCH / 2, waste: 0.05 });
    expect(found.planVolume / CUBIC_FOOT).toBeCloseTo(10, 12);
    expect(found.asDugVolume / CUBIC_FOOT).toBeCloseTo(10 * (13 / 12), 12);
    expect(found.orderVolume / CUBIC_FOOT).toBeCloseTo(10 * (13 / 12) * 1.05, 12);
  });

  it('on the centre line, mitre to mitre, counts each corner once', () => {
    // 40 × 30 ft to the outer face, 2 ft wide, 1 ft deep: 40·30 − 36·26 = 264 ft².
    const outer = [40, 30, 40, 30].map((length, index) => ({ id: String(index), length: length * FOOT, turn: 90 }));
    const runs = offsetOutline(outer, -FOOT).map(({ id, length }) => ({ ...plain(24, 12, length / FOOT), id }));
    expect(footingConcrete(runs, PLAIN).planVolume / CUBIC_FOOT).toBeCloseTo(264, 9);
  });

  it('of no runs is nothing', () => {
    expect(footingConcrete([], PLAIN)).toEqual({ planVolume: 0, asDugVolume: 0, orderVolume: 0, thin: [] });
  });

  test.each<[string, ConcreteRun, Partial<typeof PLAIN>, string]>([
    ['a run without subgrade', { ...plain(12, 12, 1), subgrade: [] }, {}, 'profile-empty'],
    ['a subgrade that ends early', { ...plain(12, 12, 2), subgrade: profile([0, 1], [0, 0]) }, {}, 'profiles-do-not-cover'],
    ['a footing without width', plain(0, 12, 1), {}, 'not-positive'],
    ['waste in per cent', plain(12, 12, 1), { waste: 8 }, 'fraction-over-one'],
    ['a bulge inwards', plain(12, 12, 1), { sideBulge: -1 }, 'negative'],
    ['a tolerance that is no number', plain(12, 12, 1), { thinBy: Number.NaN }, 'not-finite'],
    ['stations out of order', { ...plain(12, 12, 1), top: profile([1, 0], [0, 0]) }, {}, 'profile-not-in-order'],
  ])('refuses %s', (_, run, change, code) => {
    expect(refusal(() => footingConcrete([run], { ...PLAIN, ...change })).code).toBe(code);
  });
});
