import { fitPlane } from '@/analysis/plane-fit';
import { tiltAgainstLaser } from '@/analysis/tilt-against-laser';
import type { PlaneFit } from '@/analysis/types';
import { FOOT, INCH, round, walk } from '../support/rounds';
import { normal, seeded } from '../support/seeded';

const laser = { accuracy: INCH / 16, at: 100 * FOOT };

/** A rectangle of 24 stations that falls by so much of the laser's stated slope, with a little noise. */
function tilted(times: number, noise: number): PlaneFit {
  const draw = normal(seeded(7));
  const slope = (times * laser.accuracy) / laser.at;
  return fitPlane(walk(24, 'rectangle').map(({ x, y }, i) => ({ id: `${i}`, x, y, z: slope * x + noise * draw() })));
}

const fitWith = (slope: number, error: number | null, p: number | null, s: number | null = 1): PlaneFit => {
  const fit = fitPlane(
    round(12, 'rectangle', 0.5, normal(seeded(3))).map(({ id, x, y, deviation }) => ({ id, x, y, z: deviation })),
  );
  return {
    ...fit,
    residualStandardError: s,
    fTest: p === null ? null : { f: 1, df1: 2, df2: 9, p },
    tilt: { ...fit.tilt, slope, slopeStandardError: error },
  };
};

describe('tiltAgainstLaser', () => {
  // By hand: 1/16 in in 100 ft = 0.0625/1200.
  it('takes accuracy by distance for the slope a laser may have', () => {
    expect(tiltAgainstLaser(tilted(3, 1000), laser).laserSlope).toBeCloseTo(0.0625 / 1200, 15);
  });

  it('says of a tilt that it is noise, the laser’s perhaps, or beyond both', () => {
    expect(tiltAgainstLaser(tilted(0, 500_000), laser)).toMatchObject({ beyondReading: false, beyondLaser: false });
    expect(tiltAgainstLaser(tilted(0.9, 20_000), laser)).toMatchObject({ beyondReading: true, beyondLaser: false });
    expect(tiltAgainstLaser(tilted(3, 20_000), laser)).toMatchObject({ beyondReading: true, beyondLaser: true });
  });

  it('draws the line at p = 0.05 and at 1.96 standard errors, neither included', () => {
    const at = { accuracy: 1, at: 10 };
    expect(tiltAgainstLaser(fitWith(0.5, 0.1, 0.0499), at).beyondReading).toBe(true);
    expect(tiltAgainstLaser(fitWith(0.5, 0.1, 0.05), at).beyondReading).toBe(false);
    expect(tiltAgainstLaser(fitWith(0.1 + 1.9599 * 0.01, 0.01, 0.5), at).beyondLaser).toBe(false);
    expect(tiltAgainstLaser(fitWith(0.1 + 1.9601 * 0.01, 0.01, 0.5), at).beyondLaser).toBe(true);
    expect(tiltAgainstLaser(fitWith(0.1, 0, 0.5), at).beyondLaser).toBe(false);
  });

  it('cannot tell where nothing is known of the error, and can where the plane is exact', () => {
    const at = { accuracy: 1, at: 10 };
    expect(tiltAgainstLaser(fitWith(0.5, null, null, null), at)).toMatchObject({ beyondReading: false, beyondLaser: false });
    expect(tiltAgainstLaser(fitWith(0.5, 0, null, 0), at)).toMatchObject({ beyondReading: true, beyondLaser: true });
    expect(tiltAgainstLaser(fitWith(0, null, null, 0), at)).toMatchObject({ beyondReading: false, beyondLaser: false });
  });

  it('takes a laser without error', () => {
    expect(tiltAgainstLaser(fitWith(0.5, 0.1, 0.01), { accuracy: 0, at: 1 })).toEqual({
      beyondReading: true,
      beyondLaser: true,
      laserSlope: 0,
    });
  });

  it.each([
    ['a negative accuracy', { accuracy: -1, at: 1 }, 'negative'],
    ['an accuracy at no distance', { accuracy: 1, at: 0 }, 'not-positive'],
    ['an accuracy that is no number', { accuracy: NaN, at: 1 }, 'not-finite'],
    ['a slope out of range', { accuracy: 1e300, at: 1e-300 }, 'out-of-range'],
  ])('refuses %s', (_, given, code) => {
    expect(() => tiltAgainstLaser(fitWith(0.5, 0.1, 0.01), given)).toThrow(expect.objectContaining({ code }));
  });

  it('refuses a fit that is none', () => {
    expect(() => tiltAgainstLaser(fitWith(NaN, 0.1, 0.01), laser)).toThrow(expect.objectContaining({ code: 'not-finite' }));
    expect(() => tiltAgainstLaser(fitWith(0.5, -0.1, 0.01), laser)).toThrow(expect.objectContaining({ code: 'negative' }));
    expect(() => tiltAgainstLaser(fitWith(0.5, 0.1, 2), laser)).toThrow(expect.objectContaining({ code: 'out-of-range' }));
    expect(() => tiltAgainstLaser(fitWith(0.5, 0.1, -1), laser)).toThrow(expect.objectContaining({ code: 'out-of-range' }));
  });
});
