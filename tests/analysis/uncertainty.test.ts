import * as fc from 'fast-check';
import { AnalysisError } from '@/analysis/analysis-error';
import { shotUncertainty } from '@/analysis/uncertainty';
import { NM_PER_INCH } from '@/analysis/units';

const NM_PER_FOOT = 304_800_000;
const laser = { laserAccuracy: NM_PER_INCH / 16, laserAccuracyAt: 100 * NM_PER_FOOT };
const here = { ...laser, distance: 0, benchmarkDistance: 0 };
const inches = (nm: number): number => nm / NM_PER_INCH;

describe('shotUncertainty', () => {
  // COMPUTED (REFERENCES G): 0.01 ft resolution → 0.0346 in, by d/√12 (GUM F.2.2.1, from memory).
  it('takes a hundredth of a foot read by eye for 0.0346 in', () => {
    expect(inches(shotUncertainty({ ...here, graduation: 0.01 * NM_PER_FOOT }).reading)).toBeCloseTo(0.0346, 4);
  });

  // COMPUTED (REFERENCES G): ±1/16 in rectangular → 0.0361 in; combined with the reading 0.0500, U = 0.100 in.
  it('takes ±1/16 in at its distance for 0.0361 in, and the two together for 0.0500', () => {
    const parts = shotUncertainty({
      ...laser,
      graduation: 0.01 * NM_PER_FOOT,
      distance: 100 * NM_PER_FOOT,
      benchmarkDistance: 0,
    });
    expect(inches(parts.laser)).toBeCloseTo(0.0361, 4);
    expect(inches(Math.hypot(parts.reading, parts.laser))).toBeCloseTo(0.05, 4);
    expect(2 * inches(Math.hypot(parts.reading, parts.laser))).toBeCloseTo(0.1, 3);
  });

  // SEEN: chemistry uncertainty guide's worked half-width, a = 1.5 → 0.87, by a/√3.
  it('takes a half-width of 1.5 for 0.87', () => {
    expect(shotUncertainty({ ...here, graduation: 5, set: true, receiverBand: 1.5 }).reading).toBeCloseTo(0.87, 2);
  });

  // By hand: 1/16 in is 1,587,500 nm; /√12 = 458,272; band 1,000,000/√3 = 577,350; together 737,120.
  it.each([
    ['by eye, the graduation alone', {}, 458_271.8],
    ['with a receiver, both', { receiverBand: 1_000_000 }, 737_120.3],
    ['set by a receiver, the band alone', { receiverBand: 1_000_000, set: true }, 577_350.3],
    ['by eye and repeated, root of both squares', { repeatability: 300_000 }, 547_734.4],
    ['set and repeated, root of both squares', { receiverBand: 1_000_000, set: true, repeatability: 300_000 }, 650_640.7],
  ])('reads %s', (_, how, expected) => {
    expect(shotUncertainty({ ...here, graduation: 1_587_500, ...how }).reading).toBeCloseTo(expected, 0);
  });

  it('gives the backsight a reading and the laser at its own distance, and adds all squares against plan grade', () => {
    const parts = shotUncertainty({
      ...laser,
      graduation: 1_587_500,
      distance: 50 * NM_PER_FOOT,
      benchmarkDistance: 200 * NM_PER_FOOT,
    });
    const at100 = NM_PER_INCH / 16 / Math.sqrt(3);
    expect(parts.laser).toBeCloseTo(at100 / 2, 3);
    expect(parts.backsight).toBeCloseTo(Math.sqrt(parts.reading ** 2 + (2 * at100) ** 2), 3);
    expect(parts.absolute).toBeCloseTo(Math.sqrt(parts.reading ** 2 + parts.laser ** 2 + parts.backsight ** 2), 3);
    expect(parts.relative).toBe(parts.reading);
  });

  it.each([
    ['a negative graduation', { graduation: -1 }, 'negative'],
    ['a stated accuracy at no distance', { laserAccuracyAt: 0 }, 'not-positive'],
    ['a distance that is no number', { distance: NaN }, 'not-finite'],
    ['a negative band', { receiverBand: -1 }, 'negative'],
    ['a negative repeatability', { repeatability: -1 }, 'negative'],
    ['a negative accuracy', { laserAccuracy: -1 }, 'negative'],
    ['a negative distance to the benchmark', { benchmarkDistance: -1 }, 'negative'],
    ['a set shot without its receiver band', { set: true }, 'receiver-band-missing'],
    ['numbers whose product leaves the range', { distance: 1e308, laserAccuracy: 1e308 }, 'out-of-range'],
  ])('refuses %s', (_, change, code) => {
    expect(() => shotUncertainty({ ...here, graduation: 1_587_500, ...change })).toThrow(expect.objectContaining({ code }));
  });

  it('gives finite numbers or an AnalysisError on any input', () => {
    const any = fc.double();
    const maybe = fc.option(any, { nil: undefined });
    const input = fc.record({
      graduation: any,
      receiverBand: maybe,
      set: fc.option(fc.boolean(), { nil: undefined }),
      laserAccuracy: any,
      laserAccuracyAt: any,
      distance: any,
      benchmarkDistance: any,
      repeatability: maybe,
    });
    fc.assert(
      fc.property(input, (given) => {
        try {
          expect(Object.values(shotUncertainty(given)).every((value) => Number.isFinite(value) && value >= 0)).toBe(true);
        } catch (error) {
          expect(error).toBeInstanceOf(AnalysisError);
        }
      }),
    );
  });
});
