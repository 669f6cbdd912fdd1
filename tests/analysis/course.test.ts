import * as fc from 'fast-check';
import profiles from '../reference/profiles.json';
import {
  AnalysisError,
  bedVolume,
  canWallBeSet,
  materials,
  planCourse,
  shimPack,
  type BedRule,
  type ProfilePoint,
  type WallRun,
} from '@/analysis';

const INCH = 25_400_000;
const FOOT = 304_800_000;
const CUBIC_INCH = 0.0254 ** 3;
const CUBIC_FOOT = 0.3048 ** 3;

const profile = (stationsFt: number[], heightsIn: number[]): ProfilePoint[] =>
  stationsFt.map((station, index) => ({ station: station * FOOT, elevation: (heightsIn[index] ?? 0) * INCH }));
const run = (id: string, stationsFt: number[], heightsIn: number[], planGrade = 0, width = 8 * INCH): WallRun => ({
  id,
  width,
  planGrade,
  profile: profile(stationsFt, heightsIn),
});
/** Block on a mortar bed: TMS 602, first bed 1/4 to 3/4 in, 3/8 in nominal (SEEN in a masonry contractors' association article). */
const MORTAR: BedRule = {
  least: INCH / 4,
  most: (3 * INCH) / 4,
  nominal: (3 * INCH) / 8,
  grindMost: INCH / 4,
  beddedFraction: 1,
  courseHeight: 8 * INCH,
};

function refusal(work: () => unknown): AnalysisError {
  try {
    work();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

const surface = fc.array(
  fc.record({ ahead: fc.integer({ min: 0, max: 3_000_000_000 }), height: fc.integer({ min: -30_000_000, max: 30_000_000 }) }),
  { minLength: 1, maxLength: 12 },
);
const runsOf = (lists: { ahead: number; height: number }[][]): WallRun[] =>
  lists.map((list, index) => {
    let station = 0;
    return {
      id: `r${index}`,
      width: 200_000_000,
      planGrade: 0,
      profile: list.map(({ ahead, height }) => ({ station: (station += ahead), elevation: height })),
    };
  });

describe('bedVolume', () => {
  // tests/reference/profiles.json: exact rational arithmetic, COMPUTED. D tapers in width, which a run here does not.
  it.each(['A', 'B', 'C'] as const)('holds the exact volumes of profile %s to 1e-12', (name) => {
    const { stationFt, deviationIn, width, results } = profiles.profiles[name];
    const found = bedVolume([{ id: name, width: width.w * INCH, planGrade: 0, profile: profile(stationFt, deviationIn) }], 0);
    for (const [volume, reference] of [
      [found.below, results.volumeBelowIn3],
      [found.above, results.volumeAboveIn3],
    ] as const) {
      expect(Math.abs(volume / CUBIC_INCH - reference)).toBeLessThanOrEqual(1e-12 * reference);
    }
  });

  it('does not fall for trapezoids on clipped stations, which overstate profile C by half', () => {
    const { stationFt, deviationIn, width, results } = profiles.profiles.C;
    const naive = results.naiveTrapezoidOfClippedStations.belowIn3;
    const { below } = bedVolume([{ id: 'C', width: width.w * INCH, planGrade: 0, profile: profile(stationFt, deviationIn) }], 0);
    expect(naive / (below / CUBIC_INCH)).toBeGreaterThan(1.5);
  });

  // REFERENCES "Volumes", COMPUTED: wedge 10 ft × 16 in × 0 → 1/4 in = 0.1389 ft³.
  it('of a wedge 10 ft by 16 in by 0 to 1/4 in is 0.1389 cubic feet', () => {
    expect(bedVolume([run('w', [0, 10], [0, -0.25], 0, 16 * INCH)], 0).below / CUBIC_FOOT).toBeCloseTo(0.1389, 4);
  });

  it('measures the length over the line, not the length in it', () => {
    expect(bedVolume([run('r', [0, 4, 8, 12], [-1, 1, 0, 0])], 0).aboveLength / FOOT).toBeCloseTo(6, 12);
    expect(bedVolume([run('r', [0, 4], [0, 0])], 0)).toEqual({ below: 0, above: 0, aboveLength: 0 });
  });

  it('jumps at a vertical step and needs no length for it', () => {
    const found = bedVolume([run('r', [0, 6, 6, 12], [-1, -1, 1, 1])], 0);
    expect(found.below / CUBIC_FOOT).toBeCloseTo((6 * 8) / 144, 12);
    expect(found.above / CUBIC_FOOT).toBeCloseTo((6 * 8) / 144, 12);
    expect(found.aboveLength).toBe(6 * FOOT);
  });

  it('misses not one nanometre', () => {
    const slight = (from: number, to: number) =>
      bedVolume(
        [
          {
            id: 'r',
            width: 1e9,
            planGrade: 0,
            profile: [
              { station: 0, elevation: from },
              { station: 2e9, elevation: to },
            ],
          },
        ],
        0,
      );
    expect(slight(1, 0)).toEqual({ below: 0, above: 1e-9, aboveLength: 2e9 });
    expect(slight(0, -1)).toEqual({ below: 1e-9, above: 0, aboveLength: 0 });
    expect(slight(-1, 1)).toEqual({ below: 0.5e-9, above: 0.5e-9, aboveLength: 1e9 });
  });

  it('of nothing is nothing', () => {
    expect(bedVolume([], 0)).toEqual({ below: 0, above: 0, aboveLength: 0 });
  });

  it('below − above = ∫(course − surface), for any surface and height', () => {
    fc.assert(
      fc.property(fc.array(surface, { maxLength: 4 }), fc.integer({ min: -40_000_000, max: 40_000_000 }), (lists, height) => {
        const runs = runsOf(lists);
        const { below, above } = bedVolume(runs, height);
        let whole = 0;
        for (const { profile: points, width } of runs) {
          points.forEach((to, index) => {
            const from = points[index - 1] ?? to;
            whole += ((to.station - from.station) / 1e9) * ((2 * height - from.elevation - to.elevation) / 2e9) * (width / 1e9);
          });
        }
        expect(Math.abs(below - above - whole)).toBeLessThan(1e-12);
      }),
    );
  });
});

describe('planCourse', () => {
  it('has the window [highest + least, lowest + most] and flags nothing at either edge', () => {
    const [group] = planCourse([run('r', [0, 5, 10], [0, 0.25, -0.125])], MORTAR);
    expect(group?.window).toEqual({ from: 0.5 * INCH, to: 0.625 * INCH });
    expect(group?.shortBy).toBe(0);
    // Least material: 10/11 ft of the 10 ft may stand over the line, at 10 of grinding to 1 of bed; the peak is 100/3 ft wide an inch down.
    expect(group?.options.map(({ kind, elevation }) => [kind, elevation])).toEqual([
      ['no-grinding', 0.5 * INCH],
      ['least-material', Math.round((0.5 - 10 / 11 / (100 / 3)) * INCH)],
      ['plan-height', 0.375 * INCH],
    ]);
    expect(group?.options[0]).toMatchObject({
      leastBed: 0.25 * INCH,
      mostBed: 0.625 * INCH,
      flagged: [],
      grindVolume: 0,
      grindLength: 0,
    });
    expect(group?.options[2]?.flagged).toEqual([
      { run: 'r', station: 5 * FOOT, bed: 0.125 * INCH, why: 'too-thin', grindable: true },
    ]);
  });

  it('has no window, and says by how much it is short, where the surface ranges further than the beds may', () => {
    const [group] = planCourse([run('r', [0, 10], [0, 0.75])], MORTAR);
    expect(group?.window).toBeNull();
    expect(group?.shortBy).toBe(0.25 * INCH);
    expect(planCourse([run('r', [0, 10], [0, 0.5])], MORTAR)[0]?.window).toEqual({ from: 0.75 * INCH, to: 0.75 * INCH });
  });

  // TMS 602 first-course bed, SEEN in a masonry contractors' association article: ≤ 3/4 in ungrouted, ≤ 1 1/4 in fully grouted on a foundation.
  it('finds a footing 7/16 in low under a 3/8 in joint to be 13/16 in: too thick at 3/4, in at 1 1/4', () => {
    const low = [run('r', [0, 10], [0, -7 / 16])];
    const atPlan = (most: number) => planCourse(low, { ...MORTAR, most })[0]?.options.find(({ kind }) => kind === 'plan-height');
    expect(atPlan((3 * INCH) / 4)?.flagged).toEqual([
      { run: 'r', station: 10 * FOOT, bed: (13 / 16) * INCH, why: 'too-thick', grindable: false },
    ]);
    expect(atPlan((5 * INCH) / 4)?.flagged).toEqual([]);
  });

  it('joins a run that lies whole courses down, lifted by them, and leaves any other to itself', () => {
    const groups = planCourse(
      [
        run('low', [0, 10], [-16 + 0.125, -16], -16 * INCH),
        run('top', [0, 10], [0, 0.25]),
        run('odd', [0, 10], [-5, -5], -5 * INCH),
        run('odder', [0, 10], [-13, -13], -13 * INCH),
      ],
      MORTAR,
    );
    expect(groups.map(({ runs, coursesDown }) => [runs, coursesDown])).toEqual([
      [['low', 'top'], { low: 2, top: 0 }],
      [['odd', 'odder'], { odd: 0, odder: 1 }],
    ]);
    expect(groups[0]?.window).toEqual({ from: 0.5 * INCH, to: 0.75 * INCH });
    expect(groups[1]?.options[2]?.elevation).toBe((-5 + 0.375) * INCH);
  });

  it('without a course height joins only runs of one plan grade', () => {
    const runs = [run('a', [0, 1], [0, 0]), run('b', [0, 1], [-8, -8], -8 * INCH), run('c', [0, 1], [0, 0])];
    expect(planCourse(runs, { ...MORTAR, courseHeight: null }).map((group) => group.runs)).toEqual([['a', 'c'], ['b']]);
  });

  it('grinds and beds by exact volumes: a wedge of 1/4 in over 10 ft, at plan height', () => {
    // Bed at plan height: 3/8 in at the low end, 1/8 at the high one. Under 1/4 in from the middle on: 5 ft long, 0 to 1/8 in deep.
    const [group] = planCourse([run('r', [0, 10], [0, 0.25], 0, 12 * INCH)], { ...MORTAR, beddedFraction: 0.5 });
    const option = group?.options.find(({ kind }) => kind === 'plan-height');
    expect((option?.grindLength ?? 0) / FOOT).toBeCloseTo(5, 12);
    expect((option?.grindVolume ?? 0) / CUBIC_FOOT).toBeCloseTo((5 * (0.125 / 12)) / 2, 12);
    // As laid 3/8 → 1/4 over the first half, 1/4 from there on; half of it bedded.
    expect((option?.bedVolume ?? 0) / CUBIC_FOOT).toBeCloseTo((5 * (0.3125 / 12) + 5 * (0.25 / 12)) / 2, 12);
    expect(option).toMatchObject({ leastBed: 0.125 * INCH, mostBed: 0.375 * INCH });
  });

  it('spends least where the slope of the cost is nil: a wedge with equal weights is cut in the middle', () => {
    const equal = { ...MORTAR, most: 10 * INCH, grindMost: 10 * INCH, weights: { bed: 1, grind: 1 } };
    const elevation = (rule: BedRule, heights = [0, 1]) =>
      planCourse([run('r', [0, 10], heights)], rule)[0]?.options[1]?.elevation;
    expect(elevation(equal)).toBe((0.5 + 0.25) * INCH);
    expect(elevation({ ...equal, weights: { bed: 1, grind: 3 } })).toBe((0.75 + 0.25) * INCH);
    // Half bedded costs half: one half of the wedge against three, six sevenths up.
    expect(elevation({ ...equal, beddedFraction: 0.5, weights: { bed: 1, grind: 3 } })).toBe(Math.round((6 / 7 + 0.25) * INCH));
    // Grinding no deeper than 1/8 in, or beds no thicker than 1/2 in, draw it in.
    expect(elevation({ ...equal, grindMost: INCH / 8 })).toBe((1 - 1 / 8 + 0.25) * INCH);
    expect(elevation({ ...equal, most: INCH / 2 })).toBe(INCH / 2);
    // Both together cannot be: least material alone.
    expect(elevation({ ...equal, most: INCH / 2, grindMost: INCH / 8 })).toBe((0.5 + 0.25) * INCH);
  });

  it('of equal costs takes the height with less grinding', () => {
    const rule = { ...MORTAR, most: 10 * INCH, grindMost: 10 * INCH, weights: { bed: 1, grind: 1 } };
    const two = [run('low', [0, 10], [0, 0]), run('high', [0, 10], [1, 1])];
    expect(planCourse(two, rule)[0]?.options[1]?.elevation).toBe(1.25 * INCH);
    expect(planCourse([run('pad', [0], [1])], rule)[0]?.options[1]).toMatchObject({ elevation: 1.25 * INCH, bedVolume: 0 });
  });

  it('answers whether the wall can be set', () => {
    const answer = (heights: number[]) => canWallBeSet(planCourse([run('r', [0, 10], heights)], MORTAR), MORTAR);
    expect(answer([0, 0.5])).toBe('yes');
    expect(answer([0, 0.75])).toBe('after-grinding');
    expect(answer([0, 0.75 + 1 / 64])).toBe('no');
    // Common practice, no source: 1 1/2 in of unevenness is far beyond any rule.
    expect(answer([0, 1.5])).toBe('no');
    expect(refusal(() => canWallBeSet([], MORTAR)).code).toBe('no-groups');
  });

  it('plans no group for no runs', () => {
    expect(planCourse([], MORTAR)).toEqual([]);
  });

  test.each<[string, WallRun[], Partial<BedRule>, string]>([
    ['a run without surface', [{ id: 'r', width: 1, planGrade: 0, profile: [] }], {}, 'profile-empty'],
    ['a least bed over the most', [], { least: INCH }, 'bed-rule-contradicts'],
    ['a negative least bed', [], { least: -1 }, 'negative'],
    ['no bedding at all', [], { beddedFraction: 0 }, 'not-positive'],
    ['more than full bedding', [], { beddedFraction: 1.1 }, 'fraction-over-one'],
    ['a course without height', [], { courseHeight: 0 }, 'not-positive'],
    ['a weight that is no number', [], { weights: { bed: Number.NaN, grind: 1 } }, 'not-finite'],
    [
      'a plan grade that is no number',
      [{ id: 'r', width: 1, planGrade: Number.NaN, profile: [{ station: 0, elevation: 0 }] }],
      {},
      'not-finite',
    ],
    ['a width of nothing', [run('r', [0], [0], 0, 0)], {}, 'not-positive'],
  ])('refuses %s', (_, runs, change, code) => {
    expect(refusal(() => planCourse(runs, { ...MORTAR, ...change })).code).toBe(code);
  });

  const anyRuns = fc.array(surface, { minLength: 1, maxLength: 4 }).map(runsOf);
  const flaggedAt = (runs: WallRun[], rule: BedRule, elevation: number) => {
    // Plan height is plan grade + nominal: with plan grade 0 it tries any elevation.
    const option = planCourse(runs, { ...rule, nominal: elevation })[0]?.options.find(({ kind }) => kind === 'plan-height');
    return option?.flagged.length ?? Number.NaN;
  };

  it('flags nothing inside the window and at its edges, and something one nanometre outside', () => {
    fc.assert(
      fc.property(anyRuns, fc.double({ min: 0, max: 1, noNaN: true }), (runs, share) => {
        const rule = { ...MORTAR, most: 70_000_000 };
        const window = planCourse(runs, rule)[0]?.window;
        if (!window) throw new Error('a range of 60 mm fits beds of 6.35 to 70 mm');
        expect(flaggedAt(runs, rule, window.from)).toBe(0);
        expect(flaggedAt(runs, rule, window.to)).toBe(0);
        expect(flaggedAt(runs, rule, Math.round(window.from + (window.to - window.from) * share))).toBe(0);
        expect(flaggedAt(runs, rule, window.from - 1)).toBeGreaterThan(0);
        expect(flaggedAt(runs, rule, window.to + 1)).toBeGreaterThan(0);
      }),
    );
  });

  it('finds no cheaper elevation than least-material within what the rule allows', () => {
    fc.assert(
      fc.property(anyRuns, fc.integer({ min: 1, max: 20 }), (runs, grind) => {
        const weights = { bed: 1, grind };
        const rule = { ...MORTAR, weights, beddedFraction: 0.6, grindMost: 20_000_000, most: 60_000_000 };
        const cost = (elevation: number) => {
          const option = planCourse(runs, { ...rule, nominal: elevation })[0]?.options[2];
          return (option?.bedVolume ?? 0) + grind * (option?.grindVolume ?? 0);
        };
        const heights = runs.flatMap(({ profile: points }) => points.map(({ elevation }) => elevation));
        const from = Math.max(...heights) + rule.least - rule.grindMost;
        const to = Math.min(...heights) + rule.most;
        const best = planCourse(runs, rule)[0]?.options[1]?.elevation ?? 0;
        if (from <= to) {
          expect(best).toBeGreaterThanOrEqual(from);
          expect(best).toBeLessThanOrEqual(to);
        }
        const [low, high] = from <= to ? [from, to] : [Math.min(...heights), Math.max(...heights) + rule.least];
        for (let part = 0; part <= 40; part += 1) {
          const elevation = low + ((high - low) * part) / 40;
          expect(cost(best)).toBeLessThanOrEqual(cost(elevation) + 1e-12);
        }
      }),
      { numRuns: 40 },
    );
  });
});

describe('shimPack', () => {
  const sixteenths = [INCH / 16, INCH / 8, INCH / 4];
  const packed = (gap: number, thicknesses = sixteenths) => {
    const { shims, rest } = shimPack(gap * INCH, thicknesses.map(Math.round));
    return [shims.map((shim) => shim / INCH), rest / INCH];
  };

  it('takes the fewest shims and leaves no more than half the thinnest, either way', () => {
    expect(packed(7 / 16)).toEqual([[1 / 4, 1 / 8, 1 / 16], 0]);
    expect(packed(5 / 8)).toEqual([[1 / 4, 1 / 4, 1 / 8], 0]);
    expect(packed(0)).toEqual([[], 0]);
    // 1/32 in is half the thinnest: no shim at all.
    expect(packed(1 / 32)).toEqual([[], 1 / 32]);
    expect(packed(1 / 32 + 1 / 64)).toEqual([[1 / 16], -1 / 64]);
    // Where greed takes three, two will do.
    expect(
      packed(
        6 / 16,
        [1 / 16, 3 / 16, 4 / 16].map((size) => size * INCH),
      ),
    ).toEqual([[3 / 16, 3 / 16], 0]);
  });

  it('is the best of all packs, for gaps small enough to try them all', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 1, max: 9 }), { minLength: 1, maxLength: 3 }),
        fc.integer({ min: 0, max: 60 }),
        (sizes, gap) => {
          const { shims, rest } = shimPack(gap, sizes);
          const half = Math.min(...sizes) / 2;
          const fewest = Array.from({ length: gap + 10 }, () => Infinity);
          fewest[0] = 0;
          for (let amount = 1; amount < fewest.length; amount += 1)
            for (const size of sizes) fewest[amount] = Math.min(fewest[amount] ?? 0, (fewest[amount - size] ?? Infinity) + 1);
          const allowed = fewest.filter((_, amount) => Math.abs(gap - amount) <= half);
          expect(shims.reduce((sum, shim) => sum + shim, 0) + rest).toBe(gap);
          expect(Math.abs(rest)).toBeLessThanOrEqual(half);
          expect(shims).toHaveLength(Math.min(...allowed));
        },
      ),
      { numRuns: 400 },
    );
  });

  it('stacks a deep gap without trying every way', () => {
    const { shims, rest } = shimPack(1_000 * INCH + INCH / 16, sixteenths);
    expect(shims).toHaveLength(4_001);
    expect(rest).toBe(0);
  });

  test.each<[string, number, number[], string]>([
    ['no shims', 1, [], 'no-shims'],
    ['a shim of nothing', 1, [0], 'not-positive'],
    ['a shim that is no number', 1, [Number.NaN], 'not-finite'],
    ['a gap that is no number', Number.NaN, [1], 'not-finite'],
    ['a negative gap', -1, [1], 'negative'],
    ['half a nanometre', 1, [0.5], 'not-whole'],
    ['a gap that no stack fills', 1e12, [1], 'gap-too-deep'],
    ['shims without a common measure', 1e9, [1_000_003, 999_983], 'shims-too-unlike'],
  ])('refuses %s', (_, gap, thicknesses, code) => {
    expect(refusal(() => shimPack(gap, thicknesses)).code).toBe(code);
  });
});

describe('materials', () => {
  // Non-shrink grout: a 50-lb bag yields about 0.45 ft³, waste excluded (SEEN, two data sheets).
  it('buys whole bags, rounded up, and gives both figures', () => {
    const need = materials(2 * CUBIC_FOOT, { yield: 0.45 * CUBIC_FOOT, waste: 0.1, unit: 'bag' });
    expect(need.exact).toBeCloseTo(4.8889, 4);
    expect(need).toMatchObject({ whole: 5, unit: 'bag' });
    expect(need.withWaste / CUBIC_FOOT).toBeCloseTo(2.2, 12);
  });
  it('does not buy a bag for a rounding error, nor for nothing', () => {
    expect(materials(0.45 * 1.1 * 3, { yield: 0.45 * 1.1, waste: 0, unit: 'bag' }).whole).toBe(3);
    expect(materials(0, { yield: 1, waste: 0.1, unit: 'can' })).toEqual({
      volume: 0,
      withWaste: 0,
      unit: 'can',
      exact: 0,
      whole: 0,
    });
    expect(materials(3.001, { yield: 1, waste: 0, unit: 'can' }).whole).toBe(4);
  });
  test.each<[number, number, number, string]>([
    [-1, 1, 0, 'negative'],
    [1, 0, 0, 'not-positive'],
    [1, 1, 5, 'fraction-over-one'],
    [Number.NaN, 1, 0, 'not-finite'],
    [1e300, 1e-300, 0, 'out-of-range'],
  ])('refuses volume %d, yield %d, waste %d', (volume, yields, waste, code) => {
    expect(refusal(() => materials(volume, { yield: yields, waste, unit: 'bag' })).code).toBe(code);
  });
});
