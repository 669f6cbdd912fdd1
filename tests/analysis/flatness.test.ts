import * as fc from 'fast-check';
import fnumbers from '../reference/fnumbers.json';
import profiles from '../reference/profiles.json';
import { AnalysisError, fNumbers, steps, straightedge, type ProfilePoint } from '@/analysis';

const INCH = 25_400_000;
const FOOT = 304_800_000;
const TEN_FEET = 10 * FOOT;

const inches = (stations: number[], heights: number[]): ProfilePoint[] =>
  stations.map((station, index) => ({ station: station * FOOT, elevation: (heights[index] ?? 0) * INCH }));

function refusal(run: () => unknown): AnalysisError {
  try {
    run();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

// tests/reference/profiles.json: exact rational arithmetic, COMPUTED.
describe.each(Object.entries(profiles.profiles))('profile %s', (_, { stationFt, deviationIn, results }) => {
  const profile = inches(stationFt, deviationIn);
  const edge = results.straightedge10ft;

  it('has the reference gap under a 10 ft edge, to 1e-12', () => {
    const { worst } = straightedge(profile, TEN_FEET);
    expect(Math.abs((worst?.gap ?? 0) / INCH / edge.gapIn - 1)).toBeLessThan(1e-12);
    expect((worst?.at ?? 0) / FOOT).toBeCloseTo(edge.atFt, 9);
    expect([(worst?.from ?? 0) / FOOT, (worst?.to ?? 0) / FOOT].map((at) => Math.round(at * 1e9) / 1e9)).toEqual(edge.supportsFt);
  });

  it('has the reference slopes between neighbours', () => {
    steps(profile).forEach(({ difference, per10Feet, from, to }, index) => {
      expect((difference / INCH / (to - from)) * FOOT).toBeCloseTo(results.adjacentSlopeInPerFt[index] ?? Number.NaN, 12);
      expect((per10Feet ?? 0) / INCH).toBeCloseTo(10 * (results.adjacentSlopeInPerFt[index] ?? Number.NaN), 11);
    });
  });
});

describe('straightedge', () => {
  it('says of a profile whose stations stand further apart than half the edge that it is too sparse', () => {
    expect(straightedge(inches([0, 5, 10], [0, 0, 0]), TEN_FEET).tooSparse).toBe(false);
    expect(straightedge(inches([0, 5, 10.1], [0, 0, 0]), TEN_FEET).tooSparse).toBe(true);
    expect(straightedge(inches([0], [0]), TEN_FEET)).toEqual({ worst: null, places: [], tooSparse: true });
    expect(straightedge([], TEN_FEET)).toEqual({ worst: null, places: [], tooSparse: true });
    // Profile B of the reference stands every 5 ft, D has 6.75 ft between two of its stations.
    expect(straightedge(inches(profiles.profiles.B.stationFt, profiles.profiles.B.deviationIn), TEN_FEET).tooSparse).toBe(false);
    expect(straightedge(inches(profiles.profiles.D.stationFt, profiles.profiles.D.deviationIn), TEN_FEET).tooSparse).toBe(true);
  });

  it('rests on both ends of a run shorter than itself', () => {
    expect(straightedge(inches([0, 2, 4], [0, -0.25, 0]), TEN_FEET).worst).toEqual({
      gap: 0.25 * INCH,
      at: 2 * FOOT,
      from: 0,
      to: 4 * FOOT,
    });
  });

  it('finds nothing under an edge on a hump, nor under an overhang', () => {
    expect(straightedge(inches([0, 5, 10], [0, 1, 0]), TEN_FEET)).toEqual({ worst: null, places: [], tooSparse: false });
    expect(straightedge(inches([0, 5], [0, -1]), TEN_FEET).worst).toBeNull();
  });

  it('with both supports between stations finds the gap that a wide notch has: worked by calculus', () => {
    // Sides fall 1 in a foot to a dip 12 ft wide; under a 10 ft edge the chord over the middle lies at most 1 in above the floor of the notch
    // when centred: supports at 1 and 11 ft, height 5 in under the brim, floor 6 in under it.
    const { worst } = straightedge(inches([0, 6, 12], [0, -6, 0]), TEN_FEET);
    expect((worst?.gap ?? 0) / INCH).toBeCloseTo(5, 9);
    expect([(worst?.from ?? 0) / FOOT, (worst?.to ?? 0) / FOOT]).toEqual([1, 11]);
  });

  it('is cut at a step, and does not take the step for a dip', () => {
    const profile = inches([0, 4, 8, 8, 12, 16], [0, -0.1, 0, 8, 7.8, 8]);
    expect(
      straightedge(profile, TEN_FEET).places.map(({ gap, at }) => [Math.round((gap / INCH) * 1e6) / 1e6, at / FOOT]),
    ).toEqual([
      [0.2, 12],
      [0.1, 4],
    ]);
  });

  it('lists every local worst, largest first, each with its own supports', () => {
    const { places, worst } = straightedge(inches([0, 5, 10, 15, 20, 25, 30], [0, -0.1, 0, -0.3, 0, -0.2, 0]), TEN_FEET);
    expect(
      places.map(({ at, gap, from, to }) => [at / FOOT, Math.round((gap / INCH) * 1e6) / 1e6, from / FOOT, to / FOOT]),
    ).toEqual([
      [15, 0.3, 10, 20],
      [25, 0.2, 20, 30],
      [5, 0.1, 0, 10],
    ]);
    expect(worst).toEqual(places[0]);
  });

  test.each<[string, ProfilePoint[], number, string]>([
    ['stations out of order', inches([0, 5, 4], [0, 0, 0]), TEN_FEET, 'profile-not-in-order'],
    ['an edge without length', inches([0, 5], [0, 0]), 0, 'not-positive'],
    ['an edge of no length at all', inches([0, 5], [0, 0]), Number.NaN, 'not-finite'],
    ['an elevation that is no number', [{ station: 0, elevation: Number.NaN }], TEN_FEET, 'not-finite'],
    ['a station beyond all measure', [{ station: 1e300, elevation: 0 }], TEN_FEET, 'out-of-range'],
  ])('refuses %s', (_, profile, length, code) => {
    expect(refusal(() => straightedge(profile, length)).code).toBe(code);
  });

  const shape = fc.array(fc.record({ ahead: fc.integer({ min: 1, max: 5_000 }), height: fc.integer({ min: -500, max: 500 }) }), {
    minLength: 1,
    maxLength: 14,
  });
  const build = (list: { ahead: number; height: number }[]): ProfilePoint[] => {
    let station = 0;
    return list.map(({ ahead, height }) => ({ station: (station += ahead) * 1_000_000, elevation: height * 100_000 }));
  };
  const EDGE = 3_000_000_000;
  const gapsOf = (profile: ProfilePoint[]) => straightedge(profile, EDGE).worst?.gap ?? 0;

  it('is not changed by any straight line added to the profile, nor by walking it backwards', () => {
    fc.assert(
      fc.property(shape, fc.integer({ min: -20, max: 20 }), (list, permille) => {
        const profile = build(list);
        const sloped = profile.map(({ station, elevation }) => ({
          station,
          elevation: elevation + (station * permille) / 1_000 + 7_000_000,
        }));
        const length = profile.at(-1)?.station ?? 0;
        const backwards = profile.map(({ station, elevation }) => ({ station: length - station, elevation })).reverse();
        expect(Math.abs(gapsOf(sloped) - gapsOf(profile))).toBeLessThan(1e-3);
        expect(Math.abs(gapsOf(backwards) - gapsOf(profile))).toBeLessThan(1e-3);
      }),
    );
  });

  it('finds at least what an edge slid along in small steps finds, and no more than its finest step could miss', () => {
    const heightAt = (profile: ProfilePoint[], at: number): number => {
      const index = profile.findIndex(({ station }) => station >= at);
      const to = profile[Math.max(index, 0)];
      const from = profile[Math.max(index - 1, 0)];
      if (!to || !from || to.station === from.station) return to?.elevation ?? 0;
      return from.elevation + ((to.elevation - from.elevation) * (at - from.station)) / (to.station - from.station);
    };
    fc.assert(
      fc.property(shape, (list) => {
        const profile = build(list);
        const start = profile[0]?.station ?? 0;
        const end = profile.at(-1)?.station ?? 0;
        // Brute force: every pair of supports on a grid and at stations, every station between.
        const grid = Array.from({ length: 61 }, (_, step) => start + ((end - start) * step) / 60);
        const supports = [
          ...grid,
          ...profile.map(({ station }) => station),
          ...grid.map((at) => at + EDGE).filter((at) => at <= end),
        ].sort((a, b) => a - b);
        let brute = 0;
        for (const p of supports) {
          for (const q of supports) {
            if (q <= p || q - p > EDGE) continue;
            const left = heightAt(profile, p);
            const right = heightAt(profile, q);
            for (const { station, elevation } of profile) {
              if (station > p && station < q)
                brute = Math.max(brute, left + ((right - left) * (station - p)) / (q - p) - elevation);
            }
          }
        }
        const steepest = Math.max(0, ...steps(profile).map(({ from, to, difference }) => Math.abs(difference) / (to - from)));
        const found = gapsOf(profile);
        expect(found).toBeGreaterThanOrEqual(brute - 1e-3);
        expect(found).toBeLessThanOrEqual(brute + 4 * steepest * ((end - start) / 60) + 1e-3);
      }),
      { numRuns: 60 },
    );
  });

  it('answers ten thousand stations in well under a second', () => {
    const profile = Array.from({ length: 10_000 }, (_, index) => ({
      station: index * 5 * FOOT,
      elevation: ((index * 7919) % 101) * 100_000,
    }));
    const before = process.hrtime.bigint();
    expect(straightedge(profile, TEN_FEET).places.length).toBeGreaterThan(100);
    expect(Number(process.hrtime.bigint() - before) / 1e6).toBeLessThan(1_000);
  });
});

describe('steps', () => {
  it('give no slope at a vertical step', () => {
    expect(steps(inches([0, 0, 5], [0, 8, 8.5]))).toEqual([
      { from: 0, to: 0, difference: 8 * INCH, per10Feet: null },
      { from: 0, to: 5 * FOOT, difference: 0.5 * INCH, per10Feet: INCH },
    ]);
  });
});

describe('F-numbers', () => {
  // tests/reference/fnumbers.json: exact sums, COMPUTED; constants of ASTM E1155 FROM MEMORY.
  it.each(Object.entries(fnumbers.lines))('of line %s', (_, { readingsIn, FF, FL }) => {
    const { flatness, levelness } = fNumbers(
      readingsIn.map((reading) => reading * INCH),
      FOOT,
    );
    expect(Math.abs((flatness ?? 0) / FF - 1)).toBeLessThan(1e-12);
    expect(Math.abs((levelness ?? 0) / FL - 1)).toBeLessThan(1e-12);
  });

  // REFERENCES "F-numbers", COMPUTED, arithmetic only; tolerance 0.01.
  it('of the line worked by hand are 14.390 and 120.58', () => {
    const line = [0, 0.05, 0.02, 0.08, 0.03, 0.1, 0.06, 0.04, 0.09, 0.01, 0.07, 0.12, 0.05, 0.11, 0.08, 0.15];
    const { flatness, levelness } = fNumbers(
      line.map((reading) => reading * INCH),
      FOOT,
    );
    expect(Math.abs((flatness ?? 0) - 14.39)).toBeLessThan(0.01);
    expect(Math.abs((levelness ?? 0) - 120.58)).toBeLessThan(0.01);
  });

  it('are null where infinite: a constant slope', () => {
    expect(
      fNumbers(
        Array.from({ length: 20 }, () => 5 * INCH),
        FOOT,
      ),
    ).toEqual({ flatness: null, levelness: null });
    const sloped = fNumbers(
      Array.from({ length: 20 }, (_, index) => index * 0.1 * INCH),
      FOOT,
    );
    expect(sloped.flatness).toBeNull();
    // 1 in in 10 ft everywhere: |mean z| = 1 in, no spread: 12.5.
    expect(sloped.levelness).toBeCloseTo(12.5, 9);
  });

  it('are null on any spacing but a foot, and on lines too short for two differences', () => {
    const line = [0, 1, 0, 2, 0, 1, 3, 0, 1, 0, 2, 0].map((reading) => reading * INCH);
    expect(fNumbers(line, FOOT / 2)).toEqual({ flatness: null, levelness: null });
    expect(fNumbers(line.slice(0, 3), FOOT)).toEqual({ flatness: null, levelness: null });
    expect(fNumbers(line.slice(0, 11), FOOT).levelness).toBeNull();
    expect(fNumbers(line, FOOT).levelness).not.toBeNull();
    expect(fNumbers([], FOOT)).toEqual({ flatness: null, levelness: null });
  });

  it('refuse readings that are no numbers', () => {
    expect(refusal(() => fNumbers([0, Number.NaN], FOOT)).code).toBe('not-finite');
    expect(refusal(() => fNumbers([0], 0)).code).toBe('not-positive');
  });
});
