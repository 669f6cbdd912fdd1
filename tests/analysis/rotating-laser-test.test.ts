import * as fc from 'fast-check';
import { AnalysisError, rotatingLaserTest, twoPegTest, type AcReading, type RotatingLaserSet } from '@/analysis';

const METRE = 1_000_000_000;

function refusal(work: () => unknown): AnalysisError {
  try {
    work();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

/** What a laser with these faults would read: built from the meaning of each fault, direction by direction, not from the solver's formula. */
function readings(
  fault: { x: number; y: number; cone: number },
  heights: AcReading,
  distances: AcReading,
  between: boolean,
): RotatingLaserSet {
  const at = (turned: number): AcReading => {
    const error = (bearing: number, distance: number) => {
      // Bearing of the mark from the laser's own X axis, clockwise.
      const angle = ((bearing - turned) * Math.PI) / 180;
      return distance * (fault.x * Math.cos(angle) + fault.y * Math.sin(angle) + fault.cone);
    };
    return { c: heights.c + error(0, distances.c), a: heights.a + error(between ? 180 : 0, distances.a) };
  };
  return { distanceA: distances.a, distanceC: distances.c, between, quarters: [at(0), at(90), at(180), at(270)] };
}

describe('rotatingLaserTest', () => {
  const fault = { x: 50e-6, y: -30e-6, cone: 20e-6 };
  const heights = { a: 1.4 * METRE, c: 1.1 * METRE };
  const midway = readings(fault, heights, { a: 30 * METRE, c: 30 * METRE }, true);
  const nearA = readings(fault, heights, { a: 5 * METRE, c: 55 * METRE }, true);

  it('finds both axes and the cone from two set-ups', () => {
    const found = rotatingLaserTest([midway, nearA]);
    expect(found.xAxis).toBeCloseTo(50e-6, 12);
    expect(found.yAxis).toBeCloseTo(-30e-6, 12);
    expect(found.cone).toBeCloseTo(20e-6, 12);
    expect((found.trueDifference ?? 0) / METRE).toBeCloseTo(-0.3, 9);
    expect(found.residualStandardError).toBeLessThan(1);
    expect(found.largest).toBeCloseTo(Math.hypot(50e-6, 30e-6) + 20e-6, 12);
  });

  it('finds the axes, but no cone, from one set-up midway, where the cone cancels', () => {
    const found = rotatingLaserTest([midway]);
    expect(found.xAxis).toBeCloseTo(50e-6, 12);
    expect(found.cone).toBeNull();
    expect((found.trueDifference ?? 0) / METRE).toBeCloseTo(-0.3, 9);
  });

  it('cannot tell cone from difference from one set-up off the middle', () => {
    expect(rotatingLaserTest([nearA])).toMatchObject({ cone: null, trueDifference: null });
  });

  it('works from beyond the marks as from between them', () => {
    const beyond = readings(fault, heights, { a: 10 * METRE, c: 70 * METRE }, false);
    const found = rotatingLaserTest([midway, beyond]);
    expect([found.xAxis, found.yAxis, found.cone].map((slope) => Math.round((slope ?? 0) * 1e9))).toEqual([
      50_000, -30_000, 20_000,
    ]);
  });

  // NAVEDTRA 14070 on Fig. 6-3 gives the two-peg test; a laser without tilted axes is a level that only has its line's error.
  it('agrees with the two-peg test where only the cone is wrong', () => {
    const only = { x: 0, y: 0, cone: -60e-6 };
    const middle = readings(only, heights, { a: 25 * METRE, c: 25 * METRE }, true);
    const off = readings(only, heights, { a: 55 * METRE, c: 5 * METRE }, false);
    const peg = twoPegTest({
      atMidpoint: { a: middle.quarters[0].a, b: middle.quarters[0].c },
      offCentre: { a: off.quarters[0].a, b: off.quarters[0].c, distanceA: 55 * METRE, distanceB: 5 * METRE },
    });
    expect(rotatingLaserTest([middle, off]).cone).toBeCloseTo(peg.errorPerLength, 12);
  });

  it('judges the largest slope against what is stated', () => {
    const judged = (accuracy: number) => rotatingLaserTest([midway], { accuracy, at: 30 * METRE }).withinStated;
    // hypot(50, 30) millionths over 30 m is 1.749 mm.
    expect(judged(1_750_000)).toBe(true);
    expect(judged(1_749_000)).toBe(false);
    expect(rotatingLaserTest([midway]).withinStated).toBeNull();
  });

  it('leaves noise in the residual, and does not take it for tilt beyond its size', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -500_000, max: 500_000 }), { minLength: 8, maxLength: 8 }), (noise) => {
        const shaken = [midway, nearA].map((set, order): RotatingLaserSet => {
          const [one, two, three, four] = set.quarters;
          const shake = (reading: AcReading, index: number) => ({ ...reading, c: reading.c + (noise[order * 4 + index] ?? 0) });
          return { ...set, quarters: [shake(one, 0), shake(two, 1), shake(three, 2), shake(four, 3)] };
        });
        const found = rotatingLaserTest(shaken);
        // No readings off by half a millimetre over 60 m can move an axis by more than a millimetre over 60 m.
        expect(Math.abs(found.xAxis - fault.x)).toBeLessThanOrEqual(1e6 / (60 * METRE));
        expect(found.residualStandardError).toBeLessThanOrEqual(1_000_000);
      }),
    );
  });

  test.each<[string, RotatingLaserSet[], string]>([
    ['no sets', [], 'no-sets'],
    ['marks in one place', [readings(fault, heights, { a: 30 * METRE, c: 30 * METRE }, false)], 'no-base'],
    [
      'a reading that is no number',
      [
        {
          ...midway,
          quarters: [
            { a: Number.NaN, c: 0 },
            { a: 0, c: 0 },
            { a: 0, c: 0 },
            { a: 0, c: 0 },
          ],
        },
      ],
      'not-finite',
    ],
    ['a negative distance', [{ ...midway, distanceA: -1 }], 'negative'],
  ])('refuses %s', (_, sets, code) => {
    expect(refusal(() => rotatingLaserTest(sets)).code).toBe(code);
  });
});
