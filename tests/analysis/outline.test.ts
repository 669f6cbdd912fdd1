import * as fc from 'fast-check';
import {
  AnalysisError,
  cornerLetter,
  diagonals,
  offsetOutline,
  outlineOn,
  stationsAlong,
  traceOutline,
  type OutlineRun,
} from '@/analysis';

const FOOT = 304_800_000;
const feet = (count: number) => Math.round(count * FOOT);

/** Runs by length in feet and turn in degrees. */
const walk = (...runs: [length: number, turn: number][]): OutlineRun[] =>
  runs.map(([length, turn], index) => ({ id: `r${index + 1}`, length: feet(length), turn }));

const RECTANGLE = walk([40, 90], [30, 90], [40, 90], [30, 90]);
/** 40 × 30 ft with a 16 × 12 ft corner left out. */
const ELL = walk([40, 90], [18, 90], [16, -90], [12, 90], [24, 90], [30, 90]);

function refusal(run: () => unknown): AnalysisError {
  try {
    run();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

// Plane geometry worked by hand; no outside authority.
describe('traceOutline', () => {
  it('walks a rectangle clockwise from the origin, heading east, in whole nanometres', () => {
    expect(traceOutline(RECTANGLE)).toEqual({
      corners: [
        { x: 0, y: 0 },
        { x: feet(40), y: 0 },
        { x: feet(40), y: -feet(30) },
        { x: 0, y: -feet(30) },
      ],
      closure: { dx: 0, dy: 0, length: 0, angle: 0 },
      perimeter: feet(140),
      area: expect.closeTo(1200 * 0.3048 ** 2, 9),
      selfCrossing: false,
      mends: [],
    });
  });

  it('closes the same counterclockwise, to the north', () => {
    const traced = traceOutline(walk([40, -90], [30, -90], [40, -90], [30, -90]));
    expect(traced.corners[2]).toEqual({ x: feet(40), y: feet(30) });
    expect(traced.closure).toEqual({ dx: 0, dy: 0, length: 0, angle: 0 });
    expect(traced.area).toBeCloseTo(1200 * 0.3048 ** 2, 9);
  });

  it('knows the area of an L, 40 × 30 less 16 × 12 ft', () => {
    expect(traceOutline(ELL).area / 0.3048 ** 2).toBeCloseTo(1008, 9);
    expect(traceOutline(ELL).selfCrossing).toBe(false);
  });

  it('closes a 3-4-5 triangle and a hexagon, whose turns are no quarters', () => {
    const angle = (Math.atan2(3, 4) * 180) / Math.PI;
    const triangle = traceOutline(walk([4, 90], [3, 90 + angle], [5, 180 - angle]));
    expect(triangle.closure.length).toBeLessThan(1);
    expect(triangle.area / 0.3048 ** 2).toBeCloseTo(6, 9);
    const hexagon = traceOutline(walk(...Array.from({ length: 6 }, (): [number, number] => [10, 60])));
    expect(hexagon.closure.length).toBeLessThan(1);
    expect(hexagon.area / 0.3048 ** 2).toBeCloseTo(150 * Math.sqrt(3), 7);
  });

  it('shows the misclosure and every single run whose other length mends it', () => {
    const traced = traceOutline(walk([40, 90], [30, 90], [39, 90], [30, 90]));
    expect(traced.closure).toEqual({ dx: feet(1), dy: 0, length: feet(1), angle: 0 });
    expect(traced.mends).toEqual([
      { run: 'r1', length: feet(39) },
      { run: 'r3', length: feet(40) },
    ]);
  });

  it('offers no mend when the miss lies along no run, nor one that would leave a run without length', () => {
    expect(traceOutline(walk([40, 90], [30, 90], [39, 90], [29, 90])).mends).toEqual([]);
    // 7 ft too far west: the first jog of 2 ft west cannot give 7.
    expect(traceOutline(walk([3, 90], [10, 90], [2, -90], [2, 90], [8, 90], [12, 90])).mends).toEqual([
      { run: 'r1', length: feet(10) },
      { run: 'r5', length: feet(1) },
    ]);
  });

  it('says by how many degrees the turns miss once round, and takes such an outline for a strip', () => {
    const traced = traceOutline(walk([40, 90], [30, 90], [40, 90], [30, 80]));
    expect(traced.closure.angle).toBe(-10);
    expect(traced.corners).toHaveLength(5);
    expect(traced.area).toBe(0);
    expect(traced.mends).toEqual([]);
    expect(traceOutline(walk([40, -90], [30, -90], [40, -90], [30, -80])).closure.angle).toBe(10);
  });

  it('gives a strip a corner at both ends and no area', () => {
    const traced = traceOutline(walk([20, -90], [10, 0]));
    expect(traced.corners).toEqual([
      { x: 0, y: 0 },
      { x: feet(20), y: 0 },
      { x: feet(20), y: feet(10) },
    ]);
    expect(traced.selfCrossing).toBe(false);
  });

  test.each<[string, OutlineRun[], boolean]>([
    ['a run across an earlier one', walk([20, 90], [10, 90], [10, 90], [20, 0]), true],
    ['a run that ends on an earlier one', walk([20, 90], [10, 90], [10, 90], [10, 0]), true],
    ['a run that stops an inch short of it', walk([20, 90], [10, 90], [10, 90], [10 - 1 / 12, 0]), false],
    ['a strip that comes back to its start', walk([20, 90], [10, 90], [20, 90], [10, 0]), false],
    ['a run folded back on the one before', walk([20, 180], [10, 0]), true],
    ['an outline that overshoots its start', walk([40, 90], [30, 90], [40, 90], [31, 90]), false],
    ['runs laid on one another', walk([20, 90], [5, 90], [5, 90], [5, -90], [5, -90], [2, 0]), true],
  ])('says of %s whether the outline crosses itself', (_, runs, expected) => {
    expect(traceOutline(runs).selfCrossing).toBe(expected);
  });

  test.each<[string, OutlineRun[], string]>([
    ['no runs', [], 'no-runs'],
    ['a run of zero', walk([0, 90]), 'not-positive'],
    ['a length that is no number', [{ id: 'r', length: Number.NaN, turn: 0 }], 'not-finite'],
    ['a turn that is no number', [{ id: 'r', length: 1, turn: Number.POSITIVE_INFINITY }], 'not-finite'],
    ['a turn of more than once round', walk([1, 361]), 'turn-beyond-once-round'],
  ])('refuses %s', (_, runs, code) => {
    expect(refusal(() => traceOutline(runs)).code).toBe(code);
  });
});

describe('stationsAlong', () => {
  it('stands at every corner, lettered, and divides each run into equal parts no longer than the spacing', () => {
    const stations = stationsAlong(RECTANGLE, feet(8));
    expect(stations.filter(({ corner }) => corner).map(({ corner, station }) => [corner, station / FOOT])).toEqual([
      ['A', 0],
      ['B', 40],
      ['C', 70],
      ['D', 110],
    ]);
    // 40 ft in five parts of 8 ft; 30 ft in four of 7.5 ft; the walk ends before A.
    expect(stations.map(({ station }) => station / FOOT)).toEqual([
      0, 8, 16, 24, 32, 40, 47.5, 55, 62.5, 70, 78, 86, 94, 102, 110, 117.5, 125, 132.5,
    ]);
    expect(stations[7]).toMatchObject({ run: 'r2', x: feet(40), y: -feet(15), corner: null, step: null });
  });

  it('gives a strip a station at both ends', () => {
    expect(stationsAlong(walk([10, 0]), feet(5)).map(({ station, corner }) => [station / FOOT, corner])).toEqual([
      [0, 'A'],
      [5, null],
      [10, 'B'],
    ]);
  });

  it('stands on both sides of each step, and parts do not reach across it', () => {
    const [run] = walk([20, 0]);
    const stations = stationsAlong(
      [{ id: 'r1', length: run?.length ?? 0, turn: 0, steps: [{ at: feet(12), by: -feet(2 / 3) }] }],
      feet(5),
    );
    expect(stations.map(({ station, step }) => [station / FOOT, step])).toEqual([
      [0, null],
      [4, null],
      [8, null],
      [12, 'before'],
      [12, 'after'],
      [16, null],
      [20, null],
    ]);
  });

  it('tells a step at a corner once, whichever run it was keyed on', () => {
    const end = walk([10, 90], [10, 0]).map((run, index) => (index === 0 ? { ...run, steps: [{ at: feet(10), by: 1 }] } : run));
    const start = walk([10, 90], [10, 0]).map((run, index) => (index === 1 ? { ...run, steps: [{ at: 0, by: 1 }] } : run));
    const expected = [
      ['A', null],
      ['B', 'before'],
      ['B', 'after'],
      ['C', null],
    ];
    expect(stationsAlong(end, feet(10)).map(({ corner, step }) => [corner, step])).toEqual(expected);
    expect(stationsAlong(start, feet(10)).map(({ corner, step }) => [corner, step])).toEqual(expected);
  });

  it('sets rails beside the line, mitred at corners, the outer one outside whichever way the walk goes', () => {
    const clockwise = stationsAlong(ELL, feet(100), { halfWidth: feet(1) });
    expect(clockwise.map(({ outer }) => [(outer?.x ?? 0) / FOOT, (outer?.y ?? 0) / FOOT])).toEqual([
      [-1, 1],
      [41, 1],
      [41, -19],
      [25, -19],
      [25, -31],
      [-1, -31],
    ]);
    expect(clockwise[3]?.inner).toEqual({ x: feet(23), y: -feet(17) });
    const counter = stationsAlong(walk([40, -90], [30, -90], [40, -90], [30, -90]), feet(100), { halfWidth: feet(1) });
    expect(counter[0]?.outer).toEqual({ x: -feet(1), y: -feet(1) });
    expect(counter[2]?.inner).toEqual({ x: feet(39), y: feet(29) });
  });

  it('sets the mitre of a 60 degree turn at half width ÷ cos 30°', () => {
    const [, corner] = stationsAlong(walk(...Array.from({ length: 6 }, (): [number, number] => [10, 60])), feet(10), {
      halfWidth: feet(1),
    });
    const reach = Math.hypot((corner?.outer?.x ?? 0) - (corner?.x ?? 0), (corner?.outer?.y ?? 0) - (corner?.y ?? 0));
    expect(reach / FOOT).toBeCloseTo(2 / Math.sqrt(3), 8);
  });

  test.each<[string, () => unknown, string]>([
    ['a spacing of zero', () => stationsAlong(RECTANGLE, 0), 'not-positive'],
    ['a spacing of a millimetre', () => stationsAlong(RECTANGLE, 1_000_000), 'too-many-stations'],
    [
      'a step beyond its run',
      () => stationsAlong([{ id: 'r', length: 10, turn: 0, steps: [{ at: 11, by: 1 }] }], 5),
      'step-outside-run',
    ],
    ['a rail round a fold', () => stationsAlong(walk([10, 180], [5, 0]), feet(5), { halfWidth: 1 }), 'turn-folds-back'],
  ])('refuses %s', (_, run, code) => {
    expect(refusal(run).code).toBe(code);
  });

  it('never stands further apart than the spacing, nor off its own line', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({ length: fc.integer({ min: 1_000_000, max: 30_000_000_000 }), turn: fc.integer({ min: -170, max: 170 }) }),
          { minLength: 1, maxLength: 8 },
        ),
        fc.integer({ min: 300_000_000, max: 5_000_000_000 }),
        (shape, spacing) => {
          const runs = shape.map((run, index) => ({ id: String(index), ...run }));
          const stations = stationsAlong(runs, spacing, { halfWidth: 200_000_000 });
          const apart = stations.slice(1).map(({ station }, index) => station - (stations[index]?.station ?? 0));
          expect(Math.max(0, ...apart)).toBeLessThanOrEqual(spacing);
          const offLine = stations.flatMap(({ x, y, outer, inner }) => [
            Math.abs(((outer?.x ?? 0) + (inner?.x ?? 0)) / 2 - x),
            Math.abs(((outer?.y ?? 0) + (inner?.y ?? 0)) / 2 - y),
          ]);
          expect(Math.max(...offLine)).toBeLessThanOrEqual(1);
        },
      ),
    );
  });
});

describe('offsets between wall face, footing face and centre line', () => {
  const section = { wallWidth: feet(8 / 12), footingWidth: feet(20 / 12) };
  const lengths = (runs: OutlineRun[]) => runs.map(({ length }) => Math.round((length / FOOT) * 12 * 1e6) / 1e6);

  it('are exact at right angles: a footing face stands 6 in outside an 8 in wall on a 20 in footing', () => {
    expect(lengths(outlineOn(ELL, 'wall-face', 'footing-face', section))).toEqual([492, 228, 192, 144, 300, 372]);
    expect(lengths(outlineOn(ELL, 'wall-face', 'centre-line', section))).toEqual([472, 208, 192, 144, 280, 352]);
  });

  it('come back to what was keyed', () => {
    const there = outlineOn(ELL, 'wall-face', 'centre-line', section);
    expect(outlineOn(there, 'centre-line', 'wall-face', section)).toEqual(ELL);
  });

  it('lengthen a hexagon by 2 · tan 30° each run, and agree with the mitred rails', () => {
    const hexagon = walk(...Array.from({ length: 6 }, (): [number, number] => [10, 60]));
    const outside = offsetOutline(hexagon, feet(1));
    expect((outside[0]?.length ?? 0) / FOOT).toBeCloseTo(10 + 2 / Math.sqrt(3), 8);
    const rails = stationsAlong(hexagon, feet(10), { halfWidth: feet(1) });
    const [first, second] = rails;
    const between = Math.hypot(
      (second?.outer?.x ?? 0) - (first?.outer?.x ?? 0),
      (second?.outer?.y ?? 0) - (first?.outer?.y ?? 0),
    );
    expect(Math.abs(between - (outside[0]?.length ?? 0))).toBeLessThanOrEqual(2);
  });

  it('leave a strip its length, and keep a step where it is on the ground', () => {
    expect(offsetOutline(walk([10, 0]), feet(1))).toEqual(walk([10, 0]));
    // An L of two runs: both grow at the corner between them, neither at its free end, whatever turn is keyed there.
    expect(offsetOutline(walk([10, 90], [10, 45]), feet(1))).toEqual(walk([11, 90], [11, 45]));
    const stepped = RECTANGLE.map((run) => ({ ...run, steps: [{ at: feet(10), by: 1 }] }));
    expect(offsetOutline(stepped, feet(1))[1]).toMatchObject({ length: feet(32), steps: [{ at: feet(11), by: 1 }] });
  });

  it('let a wall stand off the middle of its footing', () => {
    const moved = outlineOn(RECTANGLE, 'wall-face', 'footing-face', { ...section, wallOutBy: feet(2 / 12) });
    expect(lengths(moved)).toEqual([488, 368, 488, 368]);
  });

  test.each<[string, () => unknown, string]>([
    ['a run with nothing left', () => offsetOutline(RECTANGLE, -feet(15)), 'offset-swallows-run'],
    [
      'a step that is swallowed',
      () =>
        offsetOutline(
          RECTANGLE.map((run) => ({ ...run, steps: [{ at: 0, by: 1 }] })),
          -feet(1),
        ),
      'offset-swallows-step',
    ],
    [
      'a step of no height at all',
      () =>
        offsetOutline(
          RECTANGLE.map((run) => ({ ...run, steps: [{ at: 0, by: Number.NaN }] })),
          FOOT,
        ),
      'not-finite',
    ],
    ['a fold', () => offsetOutline(walk([10, 180], [5, 180]), 1), 'turn-folds-back'],
    [
      'a wall without width',
      () => outlineOn(RECTANGLE, 'wall-face', 'centre-line', { wallWidth: 0, footingWidth: 1 }),
      'not-positive',
    ],
  ])('refuse %s', (_, run, code) => {
    expect(refusal(run).code).toBe(code);
  });
});

describe('diagonals', () => {
  it('of a 40 × 30 ft rectangle are both 50 ft', () => {
    expect(diagonals(RECTANGLE)).toEqual([
      { from: 'A', to: 'C', length: feet(50) },
      { from: 'B', to: 'D', length: feet(50) },
    ]);
  });

  it('of a strip join all corners that no run joins', () => {
    expect(diagonals(walk([30, 90], [40, 0]))).toEqual([{ from: 'A', to: 'C', length: feet(50) }]);
  });
});

test.each([
  [0, 'A'],
  [25, 'Z'],
  [26, 'AA'],
  [51, 'AZ'],
  [52, 'BA'],
  [701, 'ZZ'],
  [702, 'AAA'],
])('corner %d is lettered %s', (index, letter) => {
  expect(cornerLetter(index)).toBe(letter);
});
