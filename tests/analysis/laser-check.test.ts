import { AnalysisError, levelCheck, twoPegTest } from '@/analysis';

const METRE = 1_000_000_000;
const FOOT = 304_800_000;
const INCH = 25_400_000;
const metres = (value: number) => Math.round(value * METRE);

function refusal(work: () => unknown): AnalysisError {
  try {
    work();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('twoPegTest reproduces published examples', () => {
  // Uren & Price, Ex. 2.1 (numbers SEEN, attribution from MEMORY): pegs 50 m apart, instrument 5 m beyond B. True B COMPUTED.
  it('−0.030 m in 50 m, true readings 1.645 and 1.222', () => {
    const found = twoPegTest({
      atMidpoint: { a: metres(1.283), b: metres(0.86) },
      offCentre: { a: metres(1.612), b: metres(1.219), distanceA: 55 * METRE, distanceB: 5 * METRE },
    });
    expect(found.errorPerLength * 50).toBeCloseTo(-0.03, 9);
    expect(found.correctedA / METRE).toBeCloseTo(1.645, 9);
    expect(found.correctedB / METRE).toBeCloseTo(1.222, 9);
  });

  // SEEN: pegs 80 m apart, instrument 10 m beyond A. +0.050 m in 100 m; correct 1.105 and 1.345.
  it('+0.050 m in 100 m, correct readings 1.105 and 1.345', () => {
    const found = twoPegTest({
      atMidpoint: { a: metres(1.32), b: metres(1.56) },
      offCentre: { a: metres(1.11), b: metres(1.39), distanceA: 10 * METRE, distanceB: 90 * METRE },
    });
    expect(found.errorPerLength * 100).toBeCloseTo(0.05, 9);
    expect(found.correctedA / METRE).toBeCloseTo(1.105, 9);
    expect(found.correctedB / METRE).toBeCloseTo(1.345, 9);
  });

  // SEEN: 25 and 50 m, readings 2.847 and 3.462, true fall from A to B 0.630 m. The page prints the reduced levels 283.665 and 284.295 for A and B, B
  // the higher one, which its readings contradict: they belong the other way round.
  it('−0.0006 m a metre with a known difference between the pegs', () => {
    const { errorPerLength } = twoPegTest({
      atMidpoint: { a: 0, b: metres(284.295 - 283.665) },
      offCentre: { a: metres(2.847), b: metres(3.462), distanceA: 25 * METRE, distanceB: 50 * METRE },
    });
    expect(errorPerLength).toBeCloseTo(-0.0006, 9);
  });

  // Open Access Surveying Library, Elevations G-7, SEEN: −0.0000266 ft a foot over 152 ft is −0.004; 5.540 becomes 5.544.
  it('a reading of 5.540 ft at 152 ft becomes 5.544', () => {
    const slope = -0.0000266;
    const { correctedA, errorPerLength } = twoPegTest({
      atMidpoint: { a: 0, b: 0 },
      offCentre: { a: 5.54 * FOOT, b: 5.54 * FOOT - slope * 152 * FOOT, distanceA: 152 * FOOT, distanceB: 0 },
    });
    expect(errorPerLength).toBeCloseTo(slope, 12);
    expect(correctedA / FOOT).toBeCloseTo(5.544, 3);
  });

  test.each<[string, number, number, string]>([
    ['equal distances', 10, 10, 'equal-distances'],
    ['a negative distance', -1, 10, 'negative'],
    ['a distance that is no number', Number.NaN, 10, 'not-finite'],
    ['distances told apart by nothing', 5e-324, 0, 'out-of-range'],
  ])('and refuses %s', (_, distanceA, distanceB, code) => {
    const input = { atMidpoint: { a: 0, b: 1 }, offCentre: { a: 0, b: 0, distanceA, distanceB } };
    expect(refusal(() => twoPegTest(input)).code).toBe(code);
  });
});

describe('levelCheck', () => {
  const laser = { accuracy: INCH / 16, at: 100 * FOOT };
  // Worked by hand: a true difference of 2 in, and a beam that the first setting lifts by 1/8 in toward c over 200 ft.
  const tilted = (lift: number) =>
    levelCheck({
      first: { a: 40 * INCH, c: 42 * INCH + lift },
      turned: { a: 40 * INCH, c: 42 * INCH - lift },
      distance: 200 * FOOT,
      laser,
    });

  it('tells the true difference from the tilt, positive when the first setting read c too high', () => {
    expect(tilted(INCH / 8)).toEqual({
      error: INCH / 8,
      slope: INCH / 8 / (200 * FOOT),
      trueDifference: 2 * INCH,
      withinStated: true,
    });
    expect(tilted(-INCH / 8)).toMatchObject({ error: -INCH / 8, trueDifference: 2 * INCH });
  });

  it('is within at the stated accuracy itself and out one nanometre beyond', () => {
    expect(tilted(INCH / 8).withinStated).toBe(true);
    expect(tilted(INCH / 8 + 1).withinStated).toBe(false);
    expect(tilted(-INCH / 8 - 1).withinStated).toBe(false);
  });

  // REFERENCES "Field practice", COMPUTED: 10″ is 0.0582 in at 100 ft and 1.454 mm at 30 m, 0.5 %.
  it('finds 10 seconds to be 0.0582 in at 100 ft', () => {
    const slope = Math.tan((10 / 3600) * (Math.PI / 180));
    const lift = Math.round(slope * 100 * FOOT);
    const { error } = levelCheck({ first: { a: 0, c: lift }, turned: { a: 0, c: -lift }, distance: 100 * FOOT, laser });
    expect(Math.abs(error / INCH / 0.0582 - 1)).toBeLessThan(0.005);
    expect(Math.abs((slope * 30_000) / 1.454 - 1)).toBeLessThan(0.005);
  });

  test.each<[string, Partial<Parameters<typeof levelCheck>[0]>, string]>([
    ['marks in one place', { distance: 0 }, 'not-positive'],
    ['a reading that is no number', { first: { a: Number.NaN, c: 0 } }, 'not-finite'],
    ['an accuracy at no distance', { laser: { accuracy: 1, at: 0 } }, 'not-positive'],
    ['a negative accuracy', { laser: { accuracy: -1, at: 1 } }, 'negative'],
  ])('refuses %s', (_, change, code) => {
    const input = { first: { a: 0, c: 0 }, turned: { a: 0, c: 0 }, distance: FOOT, laser, ...change };
    expect(refusal(() => levelCheck(input)).code).toBe(code);
  });
});
