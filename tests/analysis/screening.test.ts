import * as fc from 'fast-check';
import { AnalysisError } from '@/analysis/analysis-error';
import { studentUpperQuantile } from '@/analysis/distributions';
import { fitPlane } from '@/analysis/plane-fit';
import { screenShots } from '@/analysis/screening';
import type { ScreenedShot } from '@/analysis/types';
import { planeSets } from '../support/plane-reference';
import { rVector, runR } from '../support/r';
import { FOOT, INCH, SIXTEENTH, U, busted, round, walk } from '../support/rounds';
import { normal, seeded } from '../support/seeded';

const closed = { closed: true, u: U };
const ids = (shots: readonly { id: string }[]): string[] => shots.map(({ id }) => id);

/** A set of planefit.json as a round in nanometres; its z are elevations in feet, which a constant offset from plan grade changes nothing in. */
function asRound(name: string): ScreenedShot[] {
  const set = planeSets().get(name);
  if (set === undefined) throw new Error(`planefit.json has no ${name}`);
  return set.points.map(([x, y, z], i) => ({
    id: String(i),
    x: x * FOOT,
    y: y * FOOT,
    station: i * FOOT,
    deviation: (z - 100) * FOOT,
  }));
}

const hundredth = { closed: true, u: (0.01 * FOOT) / Math.sqrt(12) };

describe('screenShots: what it finds', () => {
  // COMPUTED: planefit.json P4 `outliers.sequentialDeletion` takes index 9 alone; its bust is exactly +1.00 ft.
  it('finds the foot in the L-shaped footing, says so, and nothing else', () => {
    const [suspect, ...others] = screenShots(asRound('P4'), hundredth);
    expect(others).toEqual([]);
    expect(suspect).toMatchObject({ id: '9', seenBy: ['plane', 'neighbours'], explanation: 'foot' });
    expect(Math.abs((suspect?.size ?? 0) - FOOT)).toBeLessThan(3 * hundredth.u);
  });

  // COMPUTED: planefit.json P7 `outliers.singlePassFlags` is empty; Bonferroni holds over a thousand stations.
  it('raises nothing in a clean round of a thousand stations', () => {
    expect(screenShots(asRound('P7'), hundredth)).toEqual([]);
  });

  it('finds three busts of which one pass sees none', () => {
    const shots = busted(round(24, 'rectangle', 0.1, normal(seeded(5))), { 0: INCH, 1: INCH, 23: INCH });
    const once = fitPlane(shots.map(({ id, x, y, deviation }) => ({ id, x, y, z: deviation })));
    const critical = studentUpperQuantile(0.05 / 48, 20);
    expect(once.points.filter((point) => Math.abs(point.deletedStudentized ?? 0) > critical)).toEqual([]);
    const suspects = screenShots(shots, closed);
    expect(ids(suspects)).toEqual(['S0', 'S1', 'S23']);
    expect(suspects.map(({ explanation }) => explanation)).toEqual(['inch', 'inch', 'inch']);
  });

  it('finds a low bust on one straight wall, and calls its size negative', () => {
    const shots = busted(round(16, 'wall', 0.4, normal(seeded(8))), { 6: -INCH / 2 });
    const [suspect, ...others] = screenShots(shots, { closed: false, u: U });
    expect(others).toEqual([]);
    expect(suspect).toMatchObject({ id: 'S6', explanation: 'half-inch' });
    expect(Math.abs((suspect?.size ?? 0) + INCH / 2)).toBeLessThan(3 * U);
  });

  it('sees by its neighbours a bust that a sagging footing hides from the plane', () => {
    const sag = walk(80, 'wall').map((_, i) => INCH * Math.sin((i / 80) * 4 * Math.PI));
    const clean = round(80, 'wall', 0.3, normal(seeded(3))).map((shot, i) => ({
      ...shot,
      deviation: shot.deviation + (sag[i] ?? 0),
    }));
    expect(screenShots(clean, { closed: false, u: U })).toEqual([]);
    const [suspect, ...others] = screenShots(busted(clean, { 12: -INCH }), { closed: false, u: U });
    expect(others).toEqual([]);
    expect(suspect).toMatchObject({ id: 'S12', seenBy: ['neighbours'], explanation: 'inch' });
  });

  it('holds the first and last shot of a closed walk against each other, and of an open one against nobody', () => {
    const sag = walk(80, 'rectangle').map((_, i) => INCH * Math.sin((i / 80) * 4 * Math.PI));
    const clean = round(80, 'rectangle', 0.3, normal(seeded(4))).map((shot, i) => ({
      ...shot,
      deviation: shot.deviation + (sag[i] ?? 0),
    }));
    const shots = busted(clean, { 0: INCH });
    expect(ids(screenShots(shots, closed))).toEqual(['S0']);
    expect(screenShots(shots, { closed: false, u: U })).toEqual([]);
  });

  it('finds a bust among exact shots, with no uncertainty at all', () => {
    const shots = walk(12, 'rectangle').map((place, i) => ({ id: `S${i}`, ...place, deviation: i === 4 ? 7 * SIXTEENTH : 0 }));
    expect(screenShots(shots, { closed: true, u: 0 })).toEqual([
      { id: 'S4', seenBy: ['plane', 'neighbours'], size: 7 * SIXTEENTH, explanation: null },
    ]);
  });

  it('finds nothing in an exact plane, with no uncertainty at all', () => {
    const shots = walk(24, 'rectangle').map((place, i) => ({
      id: `S${i}`,
      ...place,
      deviation: 0.001 * place.x - 0.002 * place.y + 12_345,
    }));
    expect(screenShots(shots, { closed: true, u: 0 })).toEqual([]);
  });

  it('takes a residual of 4u for no suspect, and one just beyond it for one', () => {
    const flat = (deviation: number): ScreenedShot[] =>
      walk(400, 'rectangle').map((place, i) => ({ id: `S${i}`, ...place, deviation: i === 30 ? deviation : 0 }));
    expect(screenShots(flat(4 * U), closed)).toEqual([]);
    // One of 400 pulls the plane its way by 0.6 %, so that 4.1u still leaves more than 4u.
    expect(screenShots(flat(4.5 * U), closed)).toMatchObject([{ id: 'S30' }]);
  });

  it('never takes the scale under u: what stands out of a suspiciously quiet round by 3u is no suspect', () => {
    const quiet = walk(40, 'rectangle').map((place, i) => ({ id: `S${i}`, ...place, deviation: i === 7 ? 3 * U : (i % 3) * 10 }));
    expect(screenShots(quiet, closed)).toEqual([]);
    expect(screenShots(quiet, { closed: true, u: U / 10 })).toMatchObject([{ id: 'S7' }]);
  });

  it('says nothing where four shots leave nothing to judge by, or none are there', () => {
    expect(screenShots(busted(round(4, 'rectangle', 0.4, normal(seeded(1))), { 1: FOOT }), closed)).toEqual([]);
    expect(screenShots([], closed)).toEqual([]);
  });

  // At most a quarter may be taken out: ⌊n/4⌋.
  it('finds two busts in eight shots, and of three no more than two by the plane', () => {
    const eight = walk(8, 'rectangle').map((place, i) => ({ id: `S${i}`, ...place, deviation: 0 }));
    const planes = (busts: Record<number, number>): string[] =>
      ids(screenShots(busted(eight, busts), closed).filter(({ seenBy }) => seenBy.includes('plane')));
    expect(planes({ 1: FOOT, 4: -FOOT })).toEqual(['S1', 'S4']);
    expect(planes({ 1: FOOT, 4: -FOOT, 6: FOOT }).length).toBeLessThanOrEqual(2);
  });

  it('tells the plane again when the shots left no longer carry it', () => {
    // Ten on one line and two beside it, both bust: without them there is only a line.
    const line = walk(10, 'wall').map((place, i) => ({ id: `S${i}`, ...place, deviation: (i % 2) * 1000 }));
    const aside = [1, 4].map((i) => ({
      id: `A${i}`,
      x: i * 4 * FOOT,
      y: 90 * FOOT,
      station: 0,
      deviation: i === 1 ? FOOT : -2 * FOOT,
    }));
    expect(() => screenShots([...line, ...aside], { closed: false, u: U })).not.toThrow();
    expect(ids(screenShots(busted([...line, ...aside], { 5: INCH }), { closed: false, u: U }))).toContain('S5');
  });
});

describe('screenShots: the bust that would explain it', () => {
  const suspectOf = (bust: number, keyed?: string, style?: ScreenedShot['style'], u = U): ReturnType<typeof screenShots> => {
    const shots = walk(40, 'rectangle').map((place, i) => ({
      id: `S${i}`,
      ...place,
      deviation: ((i * 7) % 3) * 100_000 + (i === 11 ? bust : 0),
    }));
    return screenShots(
      shots.map((shot, i) => (i === 11 ? { ...shot, keyed, style } : shot)),
      { closed: true, u },
    );
  };

  it.each([
    ['foot', FOOT],
    ['inch', INCH],
    ['half-inch', INCH / 2],
    ['tenth', FOOT / 10],
    ['100mm', 100_000_000],
    ['10mm', 10_000_000],
  ])('calls a %s by its name, high or low', (explanation, size) => {
    expect(suspectOf(size)).toMatchObject([{ id: 'S11', explanation }]);
    expect(suspectOf(-size)).toMatchObject([{ id: 'S11', explanation }]);
  });

  it('explains within 3u and not beyond', () => {
    expect(suspectOf(FOOT + 2.5 * U)).toMatchObject([{ explanation: 'foot' }]);
    expect(suspectOf(FOOT + 3.5 * U)).toMatchObject([{ explanation: null }]);
    expect(suspectOf(FOOT - 3.5 * U)).toMatchObject([{ explanation: null }]);
  });

  it('takes the nearest where two lie within 3u', () => {
    expect(suspectOf(11_000_000, undefined, undefined, 1_000_000)).toMatchObject([{ explanation: '10mm' }]);
    expect(suspectOf(11_700_000, undefined, undefined, 1_000_000)).toMatchObject([{ explanation: 'half-inch' }]);
  });

  // A reading keyed too small by k makes the surface look high by k: elevation = HI − reading.
  it.each([
    ['4.35 for 4.53 ft: high by 0.18', '4.35', 'decimal-feet', 0.18 * FOOT],
    ['4.53 for 4.35 ft: low by 0.18', '4.53', 'decimal-feet', -0.18 * FOOT],
    ['1402 for 1042 mm: low by 360', '1402', 'metric', -360_000_000],
    ['4′ 5″ for 5′ 4″: high by 11 in', '4\' 5"', 'feet-inches', 11 * INCH],
    ['5′ 2 1/4″ for 2′ 5 1/4″: low by 2 ft 9 in', '5\' 2 1/4"', 'feet-inches', -33 * INCH],
  ] as const)('sees digits swapped in %s', (_, keyed, style, size) => {
    expect(suspectOf(size, keyed, style)).toMatchObject([{ id: 'S11', explanation: 'digits-swapped' }]);
  });

  it('does not blame a swap that would go the other way, or that nobody keyed, or whose text is no length', () => {
    expect(suspectOf(-0.18 * FOOT, '4.35', 'decimal-feet')).toMatchObject([{ explanation: null }]);
    expect(suspectOf(0.18 * FOOT)).toMatchObject([{ explanation: null }]);
    expect(suspectOf(0.18 * FOOT, '4.35')).toMatchObject([{ explanation: null }]);
    expect(suspectOf(0.18 * FOOT, 'about four', 'decimal-feet')).toMatchObject([{ explanation: null }]);
    expect(suspectOf(0.18 * FOOT, '4.44', 'decimal-feet')).toMatchObject([{ explanation: null }]);
  });
});

describe('screenShots: against R, and over many rounds', () => {
  /** The search by R's own lm, rstudent and qt, a line of 0-based indices a round (−1 for none). */
  function byR(rounds: readonly ScreenedShot[][]): number[][] {
    const script = rounds
      .map(
        (
          shots,
        ) => `x <- ${rVector(shots.map(({ x }) => x / FOOT))}; y <- ${rVector(shots.map(({ y }) => y / FOOT))}; z <- ${rVector(shots.map(({ deviation }) => deviation / INCH))}
n <- length(z); keep <- seq_len(n); gone <- c(); last <- 0
for (step in seq_len(n %/% 4)) {
  r <- abs(rstudent(lm(z ~ x + y, subset = keep))); i <- which.max(r); m <- length(keep)
  gone <- c(gone, keep[i])
  if (r[i] > qt(1 - 0.05 / (2 * m), m - 4)) last <- step
  keep <- keep[-i]
}
emit(if (last > 0) sort(gone[1:last]) - 1 else -1)`,
      )
      .join('\n');
    return runR(script).map((line) => line.map((value) => value ?? NaN));
  }

  // Source: R lm, rstudent, qt run live. u = 0 leaves the search as statistics alone define it; shots with equal t would be a tie.
  it('takes out by the plane the shots that R takes out, in thirty rounds with and without busts', () => {
    const rounds = Array.from({ length: 30 }, (_, k) => {
      const draw = normal(seeded(900 + k));
      const clean = round(8 + k, 'rectangle', 1, draw).map((shot) => ({ ...shot, deviation: shot.deviation + 1000 * draw() }));
      return k % 3 === 0 ? clean : busted(clean, { 3: INCH / 3, [k % 17]: -INCH / 2, 12: INCH });
    });
    const ours = rounds.map((shots) =>
      screenShots(shots, { closed: true, u: 0 }).flatMap(({ id, seenBy }) =>
        seenBy.includes('plane') ? [Number(id.slice(1))] : [],
      ),
    );
    expect(ours.map((found) => (found.length === 0 ? [-1] : found))).toEqual(byR(rounds));
  });

  it.each([
    ['rectangle', 24],
    ['rectangle', 60],
    ['wall', 24],
    ['wall', 60],
  ] as const)('raises anything in at most 8 %% of clean rounds: %s of %i shots', (shape, n) => {
    const seed = 20_261;
    const uniform = seeded(seed);
    const draw = normal(uniform);
    const rounds = 500;
    let raised = 0;
    for (let k = 0; k < rounds; k += 1) {
      const shots = round(n, shape, 0.3 + 0.7 * uniform(), draw);
      if (screenShots(shots, { closed: shape === 'rectangle', u: U }).length > 0) raised += 1;
    }
    expect({ seed, tooMany: raised / rounds > 0.08 ? raised : 0 }).toEqual({ seed, tooMany: 0 });
  });

  it('finds nine in ten single inches at 1/16 in, wherever they fall', () => {
    const uniform = seeded(77);
    const draw = normal(uniform);
    let found = 0;
    for (let k = 0; k < 200; k += 1) {
      const at = Math.floor(uniform() * 30);
      const shots = busted(round(30, 'rectangle', 0.5, draw), { [at]: k % 2 === 0 ? INCH : -INCH });
      if (ids(screenShots(shots, closed)).includes(`S${at}`)) found += 1;
    }
    expect(found).toBeGreaterThanOrEqual(180);
  });
});

describe('screenShots: what must change nothing', () => {
  const bustRound = fc.record({
    seed: fc.integer({ min: 0, max: 1e6 }),
    turn: fc.nat(29),
    busts: fc.uniqueArray(fc.nat(29), { maxLength: 4 }),
  });

  it('is the same from another start and in the other direction of a closed walk', () => {
    fc.assert(
      fc.property(bustRound, ({ seed, turn, busts }) => {
        const shots = busted(
          round(30, 'rectangle', 0.5, normal(seeded(seed))),
          Object.fromEntries(busts.map((at) => [at, INCH])),
        );
        const found = new Map(screenShots(shots, closed).map((suspect) => [suspect.id, suspect]));
        const turned = [...shots.slice(turn), ...shots.slice(0, turn)];
        for (const walked of [turned, [...shots].reverse()]) {
          const again = screenShots(walked, closed);
          expect(ids(again)).toEqual(ids(walked.filter(({ id }) => found.has(id))));
          for (const suspect of again) {
            const before = found.get(suspect.id);
            expect({ ...suspect, size: 0 }).toEqual({ ...before, size: 0 });
            expect(suspect.size).toBeCloseTo(before?.size ?? NaN, 2);
          }
        }
      }),
      { numRuns: 60 },
    );
  });

  it('is the same after lifting or tilting the whole round', () => {
    fc.assert(
      fc.property(bustRound, ({ seed, busts }) => {
        const shots = busted(
          round(30, 'rectangle', 0.5, normal(seeded(seed))),
          Object.fromEntries(busts.map((at) => [at, FOOT])),
        );
        const tilted = shots.map((shot) => ({ ...shot, deviation: shot.deviation + 3 * INCH + shot.x / 1024 - shot.y / 512 }));
        expect(ids(screenShots(tilted, closed))).toEqual(ids(screenShots(shots, closed)));
      }),
      { numRuns: 60 },
    );
  });

  it('is the same in any unit of length, but for the busts that have names', () => {
    fc.assert(
      fc.property(bustRound, fc.constantFrom(1e-12, 1 / 304_800_000, 1e6), ({ seed, busts }, unit) => {
        const shots = busted(
          round(30, 'rectangle', 0.5, normal(seeded(seed))),
          Object.fromEntries(busts.map((at) => [at, INCH])),
        );
        const scaled = shots.map((shot) => ({ ...shot, x: shot.x * unit, y: shot.y * unit, deviation: shot.deviation * unit }));
        const [before, after] = [screenShots(shots, closed), screenShots(scaled, { closed: true, u: U * unit })];
        expect(after.map(({ id, seenBy }) => ({ id, seenBy }))).toEqual(before.map(({ id, seenBy }) => ({ id, seenBy })));
        before.forEach(({ size }, i) => expect((after[i]?.size ?? NaN) / (size * unit)).toBeCloseTo(1, 6));
      }),
      { numRuns: 60 },
    );
  });

  it('gives finite suspects or an AnalysisError on any input', () => {
    const shot = fc.record({
      id: fc.string({ maxLength: 2 }),
      x: fc.double(),
      y: fc.double(),
      station: fc.double(),
      deviation: fc.double(),
      keyed: fc.option(fc.string(), { nil: undefined }),
      style: fc.option(fc.constantFrom('feet-inches' as const, 'decimal-feet' as const, 'metric' as const), { nil: undefined }),
    });
    const tame = shot.map((one) => ({
      ...one,
      x: Math.fround(one.x) || 0,
      deviation: Number.isFinite(one.deviation) ? one.deviation % 1e12 : 0,
    }));
    const shots = fc.oneof(fc.array(shot, { maxLength: 12 }), fc.uniqueArray(tame, { maxLength: 20, selector: ({ id }) => id }));
    fc.assert(
      fc.property(shots, fc.boolean(), fc.double(), (given, isClosed, u) => {
        try {
          for (const { size } of screenShots(given, { closed: isClosed, u })) expect(Number.isFinite(size)).toBe(true);
        } catch (error) {
          expect(error).toBeInstanceOf(AnalysisError);
        }
      }),
    );
  });
});

describe('screenShots: refusals', () => {
  const good = round(8, 'rectangle', 0.4, normal(seeded(2)));
  it.each([
    ['a deviation that is no number', good.map((shot) => ({ ...shot, deviation: NaN })), U, 'not-finite'],
    ['an endless place', good.map((shot) => ({ ...shot, x: Infinity })), U, 'not-finite'],
    ['a place beyond any length', good.map((shot) => ({ ...shot, y: 1e70 })), U, 'out-of-range'],
    ['a negative uncertainty', good, -1, 'negative'],
    ['two shots of one name', [...good, ...good], U, 'duplicate-id'],
  ])('refuses %s', (_, shots, u, code) => {
    expect(() => screenShots(shots, { closed: true, u })).toThrow(expect.objectContaining({ code }));
  });
});
