import { draftRun, emptyDraft, outlineReducer, type OutlineAction, type OutlineDraft } from '@/components/outline/outline-draft';
import { gradesOf, outlineState, readOutline } from '@/components/outline/read-outline';
import { shapeRuns } from '@/components/outline/ready-shapes';
import { readLength } from '@/components/lengths/read-length';
import { printLength } from '@/components/lengths/print-length';
import { AnalysisError, traceOutline } from '@/analysis';

const INCH = 25_400_000;
const FOOT = 304_800_000;
const SIXTEENTH = INCH / 16;

const after = (actions: OutlineAction[], from: OutlineDraft = emptyDraft) => actions.reduce(outlineReducer, from);
const read = (draft: OutlineDraft) =>
  readOutline(draft.runs, (text) => readLength(text, { style: 'feet-inches', sign: 'any', bareDecimal: 'feet' }));
const type = (runId: string, text: string): OutlineAction => ({ type: 'type-length', runId, field: 'length', text });

/** The mockup's L: 44 × 30 with 20 × 8 missing, its last run taped 2″ short. */
function walked(last: string): OutlineDraft {
  const lengths = ["44'", "30'", "24'", "8'", "20'", last];
  const actions = lengths.flatMap((text, index): OutlineAction[] => [
    { type: 'add-run', id: `r${index + 1}` },
    type(`r${index + 1}`, text),
  ]);
  return after([...actions, { type: 'turn', runId: 'r4', way: 'left' }]);
}

describe('the outline as it is typed', () => {
  test('a run is read as soon as its length reads, and one with none ends the drawing', () => {
    const draft = after([{ type: 'add-run', id: 'a' }, type('a', '44 0'), { type: 'add-run', id: 'b' }]);
    const { drawn, complete, refusals } = read(draft);
    expect(drawn.map(({ length }) => length)).toEqual([44 * FOOT]);
    expect(complete).toBe(false);
    expect(refusals['b.length']?.code).toBe('length-empty');
  });

  test.each([
    ['0"', 'run-zero'],
    ["-4'", 'run-zero'],
    ['1/2"', 'run-under-an-inch'],
    ["5280'", 'run-a-mile'],
    ['44', 'length-bare-number'],
    ['4\' 13"', 'length-inches-over-twelve'],
  ])('a run of %s is refused as %s and its text stays', (text, code) => {
    const draft = after([{ type: 'add-run', id: 'a' }, type('a', text)]);
    expect(read(draft).refusals['a.length']?.code).toBe(code);
    expect(draft.runs[0]?.length.text).toBe(text);
  });

  test('a run of an inch, and one an inch short of a mile, are runs', () => {
    expect(read(after([{ type: 'add-run', id: 'a' }, type('a', '1"')])).complete).toBe(true);
    expect(read(after([{ type: 'add-run', id: 'a' }, type('a', '5279\' 11"')])).complete).toBe(true);
  });

  test.each([
    ['22.5', -22.5],
    ['45°', -45],
    ['7,5', -7.5],
  ])('a turn left of %s is any angle', (text, degrees) => {
    const draft = after([
      { type: 'add-run', id: 'a' },
      type('a', "10'"),
      { type: 'turn', runId: 'a', way: 'left' },
      { type: 'type-angle', runId: 'a', text },
    ]);
    expect(read(draft).drawn[0]?.turn).toBe(degrees);
  });

  test.each([
    ['180', 'angle-out-of-range'],
    ['0', 'angle-out-of-range'],
    ['-90', 'angle-unreadable'],
    ['', 'angle-unreadable'],
  ])('a turn of %s° is refused as %s', (text, code) => {
    const draft = after([{ type: 'add-run', id: 'a' }, type('a', "10'"), { type: 'type-angle', runId: 'a', text }]);
    expect(read(draft).refusals['a.angle']?.code).toBe(code);
  });

  test('a step past the end of its run, and a step of no height, are refused where they stand', () => {
    const draft = after([
      { type: 'add-run', id: 'a' },
      type('a', "20'"),
      { type: 'add-step', runId: 'a', id: 's' },
      { type: 'type-step', runId: 'a', stepId: 's', field: 'at', text: '20\' 1"' },
      { type: 'type-step', runId: 'a', stepId: 's', field: 'by', text: '0"' },
    ]);
    const { refusals } = read(draft);
    expect(refusals['a.s.at']?.code).toBe('step-past-end');
    expect(refusals['a.s.by']?.code).toBe('step-zero');
  });

  test('a length loaded from the server keeps its exact value until somebody types over it', () => {
    const exact = 13_411_123_457; // no mark of any rod
    const run = draftRun({ id: 'a', length: exact, turn: 0, width: null, thickness: null, steps: [] }, (nm) =>
      printLength(nm, 'feet-inches'),
    );
    const loaded = after([{ type: 'load', runs: [run], version: 3 }]);
    expect(read(loaded).drawn[0]?.length).toBe(exact);
    expect(read(after([type('a', "44'")], loaded)).drawn[0]?.length).toBe(44 * FOOT);
  });

  test('loading somebody else’s outline sets what was typed aside, and takes it back unharmed', () => {
    const mine = walked("22'");
    const theirs = after([{ type: 'load-theirs', runs: [], version: 9 }], mine);
    expect(theirs.runs).toEqual([]);
    expect(theirs.version).toBe(9);
    const back = after([{ type: 'take-back' }], theirs);
    expect(back.runs).toEqual(mine.runs);
    expect(back.version).toBe(9);
    expect(back.dirty).toBe(true);
  });
});

describe('where the outline stands', () => {
  test('an L taped 2″ short misses by 2″ and closes with any of the three runs that lie along the miss', () => {
    // By hand: the last run heads north, so runs 2 (south), 4 (south) and 6 can take it up. 30′ − 2″, 8′ + … and 22′.
    const state = outlineState(read(walked('21\' 10"')).drawn, SIXTEENTH);
    if (state.kind !== 'misses') throw new Error(`it ${state.kind}`);
    expect(state.by).toBe(2 * INCH);
    expect(state.mends.find(({ number }) => number === 6)?.length).toBe(22 * FOOT);
    expect(state.mends.find(({ number }) => number === 2)?.length).toBe(30 * FOOT - 2 * INCH);
    expect(state.mends).toHaveLength(3);
  });

  test('any mend that is put in closes it', () => {
    const draft = walked('21\' 10"');
    const state = outlineState(read(draft).drawn, SIXTEENTH);
    if (state.kind !== 'misses') throw new Error(`it ${state.kind}`);
    for (const { runId, length } of state.mends) {
      const mended = after([{ type: 'mend', runId, entry: { text: printLength(length, 'feet-inches'), kept: length } }], draft);
      expect(outlineState(read(mended).drawn, SIXTEENTH).kind).toBe('closes');
    }
  });

  test('turns that do not go once round leave a strip', () => {
    const state = outlineState(read(after([{ type: 'add-run', id: 'a' }, type('a', "20'")])).drawn, SIXTEENTH);
    expect(state).toMatchObject({ kind: 'strip', turned: 90 });
  });

  test('an outline that walks over itself is said to', () => {
    // 20 east, 10 south, 10 west, 15 north through the first run, 5 east.
    const lengths = ["20'", "10'", "10'", "15'", "5'"];
    const actions = lengths.flatMap((text, index): OutlineAction[] => [
      { type: 'add-run', id: `r${index}` },
      type(`r${index}`, text),
    ]);
    expect(outlineState(read(after(actions)).drawn, SIXTEENTH).kind).toBe('crosses');
  });

  test('steps carry plan grade from run to run, and what they leave open is told', () => {
    const draft = after(
      [
        { type: 'add-step', runId: 'r5', id: 's' },
        { type: 'type-step', runId: 'r5', stepId: 's', field: 'at', text: "12'" },
        { type: 'type-step', runId: 'r5', stepId: 's', field: 'by', text: '8"' },
      ],
      walked("22'"),
    );
    const { starts, endsBy } = gradesOf(read(draft).drawn, 99.5 * FOOT);
    expect(starts[4]).toBe(99.5 * FOOT);
    expect(starts[5]).toBe(99.5 * FOOT - 8 * INCH);
    expect(endsBy).toBe(-8 * INCH);
  });
});

describe('ready shapes', () => {
  const trace = (runs: ReturnType<typeof shapeRuns>) =>
    traceOutline(
      runs.map(({ length, way }, index) => ({ id: `${index}`, length, turn: { right: 90, left: -90, straight: 0 }[way] })),
    );
  const sizes = { length: 44 * FOOT, depth: 30 * FOOT, cut: 20 * FOOT, cutDepth: 8 * FOOT };
  const squareFoot = 0.3048 ** 2;

  test.each([
    // Areas by hand, in square feet.
    ['rectangle', { length: 44 * FOOT, depth: 30 * FOOT }, 1320],
    ['l', sizes, 1320 - 160],
    ['u', { length: 44 * FOOT, depth: 30 * FOOT, opening: 20 * FOOT, openingDepth: 8 * FOOT }, 1320 - 160],
    ['t', { length: 44 * FOOT, depth: 30 * FOOT, stem: 20 * FOOT, stemLength: 8 * FOOT }, 1320 + 160],
    ['u', { length: 44 * FOOT + 1, depth: 30 * FOOT, opening: 20 * FOOT, openingDepth: 8 * FOOT }, 1160],
  ] as const)('a %s closes without crossing itself, over the area worked by hand', (shape, given, area) => {
    const traced = trace(shapeRuns(shape, given));
    expect(traced.closure.length).toBe(0);
    expect(traced.closure.angle).toBe(0);
    expect(traced.selfCrossing).toBe(false);
    expect(traced.area / squareFoot).toBeCloseTo(area, 5);
  });

  test('a strip is one run with open ends', () => {
    expect(shapeRuns('strip', { length: 44 * FOOT })).toEqual([{ length: 44 * FOOT, way: 'straight' }]);
  });

  test.each([
    ['l', { ...sizes, cut: 44 * FOOT }, 'part-too-long', 'cut'],
    ['u', { length: 44 * FOOT, depth: 30 * FOOT, opening: 20 * FOOT, openingDepth: 31 * FOOT }, 'part-too-long', 'openingDepth'],
    ['rectangle', { length: 0, depth: 30 * FOOT }, 'run-zero', 'length'],
  ] as const)('a %s that cannot be is refused beside the size that is wrong', (shape, given, code, field) => {
    let refused: unknown = null;
    try {
      shapeRuns(shape, given);
    } catch (error) {
      refused = error;
    }
    expect(refused).toBeInstanceOf(AnalysisError);
    expect(refused).toMatchObject({ code, details: { field } });
  });
});
