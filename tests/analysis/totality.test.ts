import * as fc from 'fast-check';
import {
  allowableByKilometres,
  allowableByMiles,
  allowableBySetups,
  AnalysisError,
  bedVolume,
  canWallBeSet,
  cutFill,
  diagonals,
  fNumbers,
  footingConcrete,
  formatLength,
  gradeRod,
  judge,
  levelCheck,
  materials,
  offsetOutline,
  planCourse,
  reduceLevelNotes,
  shimPack,
  stationsAlong,
  steps,
  straightedge,
  traceOutline,
  twoPegTest,
  type Reading,
} from '@/analysis';

/** Any double at all, the awkward ones often. */
const number = fc.oneof(
  { weight: 6, arbitrary: fc.integer({ min: -5_000_000_000, max: 5_000_000_000 }) },
  { weight: 2, arbitrary: fc.constantFrom(0, -0, 1, -1, 25_400_000, 304_800_000, 0.5) },
  {
    weight: 1,
    arbitrary: fc.constantFrom(Number.NaN, Infinity, -Infinity, Number.MAX_VALUE, -Number.MAX_VALUE, Number.MIN_VALUE, 2 ** 53),
  },
  { weight: 1, arbitrary: fc.double() },
);
const profile = fc.array(fc.record({ station: number, elevation: number }), { maxLength: 6 });
/** Profiles in order get past the door more often. */
const ordered = profile.map((points) => [...points].sort((a, b) => a.station - b.station));
const anyProfile = fc.oneof(ordered, profile);
const id = fc.constantFrom('a', 'b', '__proto__', 'constructor', '');
const run = fc.record({ id, width: number, planGrade: number, profile: anyProfile });
const bedRule = fc.record({
  least: number,
  most: number,
  nominal: number,
  grindMost: number,
  beddedFraction: fc.oneof(number, fc.constant(0.5), fc.constant(1)),
  courseHeight: fc.option(number),
});
const outlineRun = fc.record({
  id,
  length: number,
  turn: fc.oneof(number, fc.constantFrom(0, 90, -90, 180, 45, 120)),
  steps: fc.array(fc.record({ at: number, by: number }), { maxLength: 2 }),
});
const reading = fc.record({
  id,
  kind: fc.constantFrom<Reading['kind']>('backsight', 'shot', 'check', 'foresight'),
  point: id,
  reading: number,
  struck: fc.boolean(),
});
const concreteRun = fc.record({ id, width: number, planThickness: number, subgrade: anyProfile, top: anyProfile });

/** Where a result holds NaN or an infinity, or nothing. */
function notFinite(value: unknown, path = 'result'): string | null {
  if (typeof value === 'number') return Number.isFinite(value) ? null : path;
  if (typeof value !== 'object' || value === null) return null;
  for (const [key, inner] of Object.entries(value)) {
    const found = notFinite(inner, `${path}.${key}`);
    if (found) return found;
  }
  return null;
}

function isTotal(work: () => unknown): void {
  let result: unknown;
  try {
    result = work();
  } catch (error) {
    if (!(error instanceof AnalysisError)) throw error;
    expect(error.code).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
    expect(error.message).toMatch(/\.$/);
    return;
  }
  expect(notFinite(result)).toBeNull();
}

const points = fc.record({ a: number, b: number, c: number });
const cases: [string, fc.Arbitrary<() => unknown>][] = [
  [
    'formatLength',
    fc
      .tuple(number, fc.constantFrom('feet-inches' as const, 'decimal-feet' as const, 'metric' as const), number)
      .map((given) => () => formatLength(...given)),
  ],
  [
    'reduceLevelNotes',
    fc
      .record({
        benchmarks: fc.dictionary(id, number),
        series: fc.array(
          fc.record({ id, setup: id, rod: id, checkLimit: number, readings: fc.array(reading, { maxLength: 8 }) }),
          { maxLength: 4 },
        ),
        allowableMisclosure: number,
      })
      .map((given) => () => reduceLevelNotes(given)),
  ],
  ['gradeRod', fc.tuple(number, number).map((given) => () => gradeRod(...given))],
  ['cutFill', fc.tuple(number, number).map((given) => () => cutFill(...given))],
  [
    'allowable misclosures',
    fc
      .tuple(number, number)
      .map((given) => () => [allowableByKilometres(...given), allowableByMiles(...given), allowableBySetups(...given)]),
  ],
  [
    'judge',
    fc
      .tuple(number, fc.record({ low: number, high: number }), number, fc.constantFrom('simple' as const, 'guarded' as const))
      .map((given) => () => judge(...given)),
  ],
  ['straightedge', fc.tuple(anyProfile, number).map((given) => () => straightedge(...given))],
  ['steps', anyProfile.map((given) => () => steps(given))],
  [
    'fNumbers',
    fc
      .tuple(fc.array(number, { maxLength: 14 }), fc.oneof(number, fc.constant(304_800_000)))
      .map((given) => () => fNumbers(...given)),
  ],
  ['bedVolume', fc.tuple(fc.array(run, { maxLength: 3 }), number).map((given) => () => bedVolume(...given))],
  [
    'planCourse and canWallBeSet',
    fc.tuple(fc.array(run, { maxLength: 3 }), bedRule).map(([runs, rule]) => () => {
      const groups = planCourse(runs, { ...rule });
      return [groups, canWallBeSet(groups, rule)];
    }),
  ],
  ['shimPack', fc.tuple(number, fc.array(number, { maxLength: 3 })).map((given) => () => shimPack(...given))],
  [
    'materials',
    fc.tuple(number, fc.record({ yield: number, waste: number, unit: id })).map((given) => () => materials(...given)),
  ],
  [
    'footingConcrete',
    fc
      .tuple(
        fc.array(concreteRun, { maxLength: 2 }),
        fc.record({ waste: fc.constantFrom(0, 0.1, Number.NaN), sideBulge: number, thinBy: number }),
      )
      .map((given) => () => footingConcrete(...given)),
  ],
  ['traceOutline', fc.array(outlineRun, { maxLength: 6 }).map((given) => () => traceOutline(given))],
  ['diagonals', fc.array(outlineRun, { maxLength: 6 }).map((given) => () => diagonals(given))],
  [
    'stationsAlong',
    fc
      .tuple(fc.array(outlineRun, { maxLength: 4 }), number, fc.record({ halfWidth: number }))
      .map((given) => () => stationsAlong(...given)),
  ],
  ['offsetOutline', fc.tuple(fc.array(outlineRun, { maxLength: 4 }), number).map((given) => () => offsetOutline(...given))],
  [
    'twoPegTest',
    fc
      .record({ atMidpoint: points, offCentre: fc.record({ a: number, b: number, distanceA: number, distanceB: number }) })
      .map((given) => () => twoPegTest(given)),
  ],
  [
    'levelCheck',
    fc
      .record({ first: points, turned: points, distance: number, laser: fc.record({ accuracy: number, at: number }) })
      .map((given) => () => levelCheck(given)),
  ],
];

describe('any numbers at all give finite numbers or an AnalysisError', () => {
  test.each(cases)('%s', (_, arbitrary) => {
    fc.assert(fc.property(arbitrary, isTotal), { numRuns: 600 });
  });
});
