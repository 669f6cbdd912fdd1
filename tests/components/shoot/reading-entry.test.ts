import { fractionRows, halfMark, readEntry, withImpliedPoint, type EntryRules } from '@/components/shoot/read-entry';
import { keyEntry, startEntry, type EntryAction, type ReadingEntry } from '@/components/shoot/reading-entry';

const FOOT = 304_800_000;
const INCH = 25_400_000;
const SIXTEENTH = INCH / 16;
const rod: EntryRules = { style: 'feet-inches', graduation: SIXTEENTH, rodLength: 15 * FOOT };
const decimalRod: EntryRules = { style: 'decimal-feet', graduation: 3_048_000, rodLength: 15 * FOOT };
const metricRod: EntryRules = { style: 'metric', graduation: 1_000_000, rodLength: 5_000_000_000 };

const keyed = (from: ReadingEntry, ...actions: EntryAction[]) => actions.reduce(keyEntry, from);
const digits = (text: string): EntryAction[] => [...text].map((digit) => ({ kind: 'digit', digit: Number(digit) }));
/** 4′ 7 3/16″ carried. */
const carried = () => startEntry('feet-inches', 4 * FOOT + 7 * INCH + 3 * SIXTEENTH);

describe('feet and inches carry over', () => {
  it('wants a fraction alone, and one key completes the reading', () => {
    expect(readEntry(carried(), rod)).toEqual({ kind: 'wanting', what: 'fraction' });
    const entry = keyed(carried(), { kind: 'fraction', part: 10 * SIXTEENTH });
    expect(readEntry(entry, rod)).toEqual({
      kind: 'reading',
      keyed: '4′ 7 5/8″',
      reading: 4 * FOOT + 7 * INCH + 10 * SIXTEENTH,
      settled: true,
    });
  });
  it('reads a whole inch by the key 0', () => {
    expect(readEntry(keyed(carried(), { kind: 'fraction', part: 0 }), rod)).toMatchObject({
      keyed: '4′ 7″',
      reading: 4 * FOOT + 7 * INCH,
    });
  });
  it('begins with an empty keypad when there is nothing to carry', () => {
    const entry = startEntry('feet-inches', null);
    expect(entry).toMatchObject({ feet: null, inches: null, keypad: 'feet' });
    expect(readEntry(entry, rod)).toEqual({ kind: 'wanting', what: 'reading' });
  });
  it('carries nothing from a grade rod above the beam', () => {
    expect(startEntry('feet-inches', -INCH)).toMatchObject({ feet: null, inches: null });
  });
});

describe('the inch stepper', () => {
  const at = (feet: number, inches: number, by: 1 | -1) => {
    const entry = keyed(startEntry('feet-inches', feet * FOOT + inches * INCH), { kind: 'inch', by });
    return [entry.feet, entry.inches];
  };
  it('carries twelve inches into a foot', () => expect(at(4, 11, 1)).toEqual([5, 0]));
  it('borrows a foot', () => expect(at(4, 0, -1)).toEqual([3, 11]));
  it('stops at the foot of the rod', () => expect(at(0, 0, -1)).toEqual([0, 0]));
  it('keeps the fraction', () => {
    const entry = keyed(carried(), { kind: 'fraction', part: SIXTEENTH }, { kind: 'inch', by: 1 });
    expect(readEntry(entry, rod)).toMatchObject({ keyed: '4′ 8 1/16″' });
  });
});

describe('the keypad of feet and inches', () => {
  it('goes from feet to inches to the fraction keys', () => {
    const entry = keyed(carried(), { kind: 'keypad', open: true }, ...digits('5'), { kind: 'next-part' }, ...digits('11'), {
      kind: 'next-part',
    });
    expect(entry).toMatchObject({ feet: 5, inches: 11, keypad: null });
    expect(readEntry(keyed(entry, { kind: 'fraction', part: 8 * SIXTEENTH }), rod)).toMatchObject({ keyed: '5′ 11 1/2″' });
  });
  it('begins a part anew with its first digit, and takes two', () => {
    const entry = keyed(carried(), { kind: 'keypad', open: true }, ...digits('123'));
    expect(entry.feet).toBe(12);
  });
  it('erases the last digit, and then the part', () => {
    const entry = keyed(carried(), { kind: 'keypad', open: true }, ...digits('12'), { kind: 'erase' });
    expect(entry.feet).toBe(1);
    expect(keyed(entry, { kind: 'erase' }).feet).toBeNull();
  });
  it('refuses 13 inches', () => {
    const entry = keyed(carried(), { kind: 'keypad', open: true }, ...digits('4'), { kind: 'next-part' }, ...digits('13'), {
      kind: 'fraction',
      part: 0,
    });
    expect(readEntry(entry, rod)).toMatchObject({ kind: 'refused', error: { code: 'length-inches-over-twelve' } });
  });
});

describe('typed on a keyboard', () => {
  const type = (text: string) => readEntry(keyed(carried(), { kind: 'type', text }), rod);
  it.each([
    ['5/8', '4′ 7 5/8″', 4 * FOOT + 7 * INCH + 10 * SIXTEENTH],
    ['8 1/16', '4′ 8 1/16″', 4 * FOOT + 8 * INCH + SIXTEENTH],
    ['5 8 1/16', '5 8 1/16', 5 * FOOT + 8 * INCH + SIXTEENTH],
    [`5' 8 1/16"`, `5' 8 1/16"`, 5 * FOOT + 8 * INCH + SIXTEENTH],
    ['5-8-1/16', '5-8-1/16', 5 * FOOT + 8 * INCH + SIXTEENTH],
    [`5'`, `5'`, 5 * FOOT],
  ])('%s is read as %s', (text, shown, reading) => {
    expect(type(text)).toMatchObject({ kind: 'reading', keyed: shown, reading });
  });
  it.each([
    ['7 3/32', 'length-finer-than-read'],
    [`16'`, 'reading-longer-than-rod'],
    [`-4' 7"`, 'length-negative'],
    ['7', 'length-bare-number'],
    [`4'7'`, 'length-not-understood'],
    [`4' 13"`, 'length-inches-over-twelve'],
    ['7/0', 'length-bad-fraction'],
    ['4,60', 'length-decimal-comma'],
  ])('%s is refused', (text, code) => {
    const read = type(text);
    expect(read.kind === 'refused' && [read.error.code, text]).toEqual([code, text]);
  });
  it('names the two nearest marks of a reading finer than the rod is read to', () => {
    expect(type(`4' 7 3/32"`)).toMatchObject({
      error: { details: { below: 4 * FOOT + 7 * INCH + SIXTEENTH, above: 4 * FOOT + 7 * INCH + 2 * SIXTEENTH } },
    });
  });
  it('is dropped for a key that is pressed after it', () => {
    const entry = keyed(carried(), { kind: 'type', text: '5 8' }, { kind: 'fraction', part: 0 });
    expect(readEntry(entry, rod)).toMatchObject({ keyed: '4′ 7″' });
  });
});

describe('decimal feet', () => {
  const entry = (text: string) => keyed(startEntry('decimal-feet', 4 * FOOT), ...digits(text));
  it('places the point that 4 6 0 implies', () => {
    expect(readEntry(entry('460'), decimalRod)).toMatchObject({ keyed: '4.60', reading: 1_402_080_000, settled: true });
  });
  it('judges nothing before the point is reached', () => {
    expect(readEntry(entry('46'), decimalRod)).toMatchObject({ keyed: '0.46', settled: false });
  });
  it('takes a typed point as it is', () => {
    const typed = keyed(startEntry('decimal-feet', null), { kind: 'type', text: '4.6' });
    expect(readEntry(typed, decimalRod)).toMatchObject({ keyed: '4.6', reading: 1_402_080_000, settled: true });
  });
  it('refuses a comma, a minus and a finer mark', () => {
    const code = (text: string) => {
      const read = readEntry(keyed(startEntry('decimal-feet', null), { kind: 'type', text }), decimalRod);
      return read.kind === 'refused' ? read.error.code : read.kind;
    };
    expect([code('4,60'), code('-4.60'), code('4.605')]).toEqual([
      'length-decimal-comma',
      'length-negative',
      'length-finer-than-read',
    ]);
  });
  it('carries no digits over: each reading is keyed whole', () => {
    expect(readEntry(startEntry('decimal-feet', 4 * FOOT), decimalRod)).toEqual({ kind: 'wanting', what: 'reading' });
  });
  it('erases a digit and clears them all', () => {
    expect(readEntry(keyed(entry('4601'), { kind: 'erase' }), decimalRod)).toMatchObject({ keyed: '4.60' });
    expect(readEntry(keyed(entry('460'), { kind: 'clear' }), decimalRod).kind).toBe('wanting');
  });
  it('implies three decimals where the rod is read to 0.001 ft', () => {
    expect(withImpliedPoint('4602', { style: 'decimal-feet', graduation: 304_800 })).toBe('4.602');
  });
});

describe('metric', () => {
  const read = (text: string) => readEntry(keyed(startEntry('metric', null), ...digits(text)), metricRod);
  it('places the point that 1 4 0 2 implies', () => {
    expect(read('1402')).toMatchObject({ keyed: '1.402', reading: 1_402_000_000, settled: true });
  });
  it('takes three digits as millimetres', () => expect(read('402')).toMatchObject({ keyed: '0.402', reading: 402_000_000 }));
  it.each(['2', '46'])('refuses %s, which could be metres or millimetres', (text) => {
    expect(read(text)).toMatchObject({ kind: 'refused', error: { code: 'length-ambiguous-metric' } });
  });
  it('refuses a mark between those of a 5 mm rod', () => {
    const coarse = { ...metricRod, graduation: 5_000_000 };
    expect(readEntry(keyed(startEntry('metric', null), ...digits('1402')), coarse)).toMatchObject({
      error: { code: 'length-finer-than-read', details: { below: 1_400_000_000, above: 1_405_000_000 } },
    });
  });
});

describe('the fraction keys', () => {
  it('are sixteen, a quarter inch a row', () => {
    const rows = fractionRows(SIXTEENTH);
    expect(rows.map((row) => row.length)).toEqual([4, 4, 4, 4]);
    expect(rows.map((row) => row[0])).toEqual([0, INCH / 4, INCH / 2, (3 * INCH) / 4]);
    expect(rows[3]?.[3]).toBe(15 * SIXTEENTH);
  });
  it('are eight on a rod read to eighths', () => {
    expect(fractionRows(INCH / 8).map((row) => row.length)).toEqual([2, 2, 2, 2]);
    expect(halfMark(INCH / 8)).toBeNull();
  });
  it('stay sixteen on a rod read to thirty-seconds, with the half mark beside them', () => {
    const thirtySecond = INCH / 32;
    expect(fractionRows(thirtySecond).flat()).toHaveLength(16);
    expect(halfMark(thirtySecond)).toBe(thirtySecond);
    const entry = keyed(carried(), { kind: 'fraction', part: 3 * SIXTEENTH }, { kind: 'half-mark', part: thirtySecond });
    expect(readEntry(entry, { ...rod, graduation: thirtySecond })).toMatchObject({ keyed: '4′ 7 7/32″' });
    expect(keyed(entry, { kind: 'half-mark', part: thirtySecond }).fraction).toBe(3 * SIXTEENTH);
  });
});
