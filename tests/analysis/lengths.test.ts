import * as fc from 'fast-check';
import { AnalysisError, formatLength, parseLength, type LengthStyle } from '@/analysis';

const INCH = 25_400_000;
const FOOT = 304_800_000;
const SIXTEENTH = INCH / 16;

function refusal(run: () => unknown): AnalysisError {
  try {
    run();
  } catch (error) {
    if (error instanceof AnalysisError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('parseLength reads feet and inches as people key them', () => {
  const fourSevenThree = 4 * FOOT + 7 * INCH + 3 * SIXTEENTH;
  test.each([
    [`4' 7 3/16"`, fourSevenThree],
    ['4-7-3/16', fourSevenThree],
    ['4 7 3/16', fourSevenThree],
    ['4′ 7 3/16″', fourSevenThree],
    ['4’ 7 3/16”', fourSevenThree],
    [`4'-7 3/16"`, fourSevenThree],
    [`4'7 3/16''`, fourSevenThree],
    [`  4 '  7   3 / 16 "  `, fourSevenThree],
    ['4 ft 7 3/16 in', fourSevenThree],
    ['4ft 7-3/16in.', fourSevenThree],
    ['−4′ 7 3/16″', -fourSevenThree],
    ['-4-7-3/16', -fourSevenThree],
    ['55 3/16"', fourSevenThree],
    ['7 3/16', 7 * INCH + 3 * SIXTEENTH],
    ['3/16', 3 * SIXTEENTH],
    ['7½"', 7 * INCH + INCH / 2],
    [`4'`, 4 * FOOT],
    [`0"`, 0],
    ['4 7', 4 * FOOT + 7 * INCH],
    [`4' 3/16"`, 4 * FOOT + 3 * SIXTEENTH],
    ['1/64"', INCH / 64],
    [`4' 11 63/64"`, 5 * FOOT - INCH / 64],
  ])('%s', (text, expected) => {
    expect(parseLength(text, 'feet-inches')).toBe(expected);
  });

  test.each([
    ['', 'length-empty'],
    ['   ', 'length-empty'],
    ['4', 'length-bare-number'],
    ['0', 'length-bare-number'],
    ['4.60', 'length-decimal-inches'],
    [`4.5'`, 'length-decimal-inches'],
    [`4' 7.5"`, 'length-decimal-inches'],
    [`4' 7,5"`, 'length-decimal-comma'],
    [`4'7'`, 'length-not-understood'],
    ['4 7 3', 'length-not-understood'],
    ['4--7', 'length-not-understood'],
    ['--4 7', 'length-not-understood'],
    ['four', 'length-not-understood'],
    ['1.402 m', 'length-not-understood'],
    ['7 '.repeat(40), 'length-not-understood'],
    [`4' 12"`, 'length-inches-over-twelve'],
    [`4' 13"`, 'length-inches-over-twelve'],
    ['4-12-1/2', 'length-inches-over-twelve'],
    ['7/0', 'length-bad-fraction'],
    ['7 0/0', 'length-bad-fraction'],
    ['16/16', 'length-bad-fraction'],
    ['7 3/10"', 'length-bad-fraction'],
    ['7 3/128"', 'length-bad-fraction'],
    [`${'9'.repeat(20)}"`, 'length-too-long'],
  ])('and refuses "%s" as %s', (text, code) => {
    expect(refusal(() => parseLength(text, 'feet-inches')).code).toBe(code);
  });

  it('takes decimals of an inch only where the field says so', () => {
    expect(parseLength(`4' 7.25"`, 'feet-inches', undefined, { decimalInches: true })).toBe(4 * FOOT + 7.25 * INCH);
    expect(refusal(() => parseLength('7.25', 'feet-inches', undefined, { decimalInches: true })).code).toBe(
      'length-decimal-inches',
    );
    expect(refusal(() => parseLength('7.25 3/16"', 'feet-inches', undefined, { decimalInches: true })).code).toBe(
      'length-not-understood',
    );
  });
});

describe('parseLength reads decimal feet', () => {
  test.each([
    ['4.60', 4.6 * FOOT],
    ['.6', 0.6 * FOOT],
    ['4', 4 * FOOT],
    ['4.60 ft', 4.6 * FOOT],
    [`4.60'`, 4.6 * FOOT],
    ['−0.01', -0.01 * FOOT],
    ['-0', 0],
  ])('%s', (text, expected) => {
    expect(parseLength(text, 'decimal-feet')).toBe(expected);
  });

  test.each([
    ['4,60', 'length-decimal-comma'],
    [`4' 7"`, 'length-not-understood'],
    ['4..6', 'length-not-understood'],
    ['.', 'length-not-understood'],
    ['1e3', 'length-not-understood'],
  ])('and refuses "%s" as %s', (text, code) => {
    expect(refusal(() => parseLength(text, 'decimal-feet')).code).toBe(code);
  });
});

describe('parseLength reads metric', () => {
  test.each([
    ['1,402', 1_402_000_000],
    ['1.402', 1_402_000_000],
    ['1402', 1_402_000_000],
    ['100', 100_000_000],
    ['1402 mm', 1_402_000_000],
    ['140.2cm', 1_402_000_000],
    ['2 m', 2_000_000_000],
    ['12 mm', 12_000_000],
    ['2.', 2_000_000_000],
    ['-0,5', -500_000_000],
  ])('%s', (text, expected) => {
    expect(parseLength(text, 'metric')).toBe(expected);
  });

  test.each([
    ['2', 'length-ambiguous-metric'],
    ['-12', 'length-ambiguous-metric'],
    ['1,402.5', 'length-not-understood'],
    ['1 402', 'length-not-understood'],
    ['4 ft', 'length-not-understood'],
  ])('and refuses "%s" as %s', (text, code) => {
    expect(refusal(() => parseLength(text, 'metric')).code).toBe(code);
  });

  it('says what an ambiguous metric length could be', () => {
    expect(refusal(() => parseLength('2', 'metric')).details).toMatchObject({
      asMetres: 2_000_000_000,
      asMillimetres: 2_000_000,
    });
  });
});

describe('a reading finer than it is read to is refused with its two nearest marks', () => {
  test.each<[string, LengthStyle, number, number, number]>([
    [`4' 7 3/32"`, 'feet-inches', SIXTEENTH, 4 * FOOT + 7 * INCH + SIXTEENTH, 4 * FOOT + 7 * INCH + 2 * SIXTEENTH],
    [`-4' 7 3/32"`, 'feet-inches', SIXTEENTH, -(4 * FOOT + 7 * INCH + 2 * SIXTEENTH), -(4 * FOOT + 7 * INCH + SIXTEENTH)],
    ['-1/32"', 'feet-inches', SIXTEENTH, -SIXTEENTH, 0],
    ['4.605', 'decimal-feet', 3_048_000, 4.6 * FOOT, 4.61 * FOOT],
    ['1402.5 mm', 'metric', 1_000_000, 1_402_000_000, 1_403_000_000],
  ])('%s', (text, style, graduation, below, above) => {
    const error = refusal(() => parseLength(text, style, graduation));
    expect(error.code).toBe('length-finer-than-read');
    expect(error.details).toMatchObject({ below, above });
  });

  it('and nothing finer than a whole nanometre is kept', () => {
    expect(refusal(() => parseLength('1.4020000001 m', 'metric')).details).toMatchObject({
      below: 1_402_000_000,
      above: 1_402_000_001,
    });
  });
});

describe('formatLength', () => {
  test.each<[number, LengthStyle, number, string]>([
    // The forms that ANALYSIS "Lengths" prints.
    [4 * FOOT + 7 * INCH + 3 * SIXTEENTH, 'feet-inches', SIXTEENTH, '4′ 7 3/16″'],
    [3 * SIXTEENTH, 'feet-inches', SIXTEENTH, '3/16″'],
    [FOOT, 'feet-inches', SIXTEENTH, '1′ 0″'],
    [0, 'feet-inches', SIXTEENTH, '0″'],
    [-0, 'feet-inches', SIXTEENTH, '0″'],
    [FOOT + SIXTEENTH, 'feet-inches', SIXTEENTH, '1′ 0 1/16″'],
    [-SIXTEENTH, 'feet-inches', SIXTEENTH, '−1/16″'],
    [4.6 * FOOT, 'decimal-feet', 3_048_000, '4.60 ft'],
    [-0.01 * FOOT, 'decimal-feet', 3_048_000, '−0.01 ft'],
    [1_402_000_000, 'metric', 1_000_000, '1.402 m'],
    [-499_999, 'metric', 1_000_000, '0.000 m'],
    // Half goes away from zero, on both sides.
    [SIXTEENTH / 2, 'feet-inches', SIXTEENTH, '1/16″'],
    [-SIXTEENTH / 2, 'feet-inches', SIXTEENTH, '−1/16″'],
    [500_000, 'metric', 1_000_000, '0.001 m'],
    [-500_000, 'metric', 1_000_000, '−0.001 m'],
    // Carries: NAVEDTRA 14045 p. AI-12 (12.65 ft) and a published feet-inches table (6.76438 ft), both SEEN; 1.40 ft to eighths, Van Sickle, SEEN.
    [12.65 * FOOT, 'feet-inches', SIXTEENTH, '12′ 7 13/16″'],
    [6.76438 * FOOT, 'feet-inches', SIXTEENTH, '6′ 9 3/16″'],
    [1.4 * FOOT, 'feet-inches', INCH / 8, '1′ 4 3/4″'],
    // Carries at 1/32 in: 11.9999 in and 72.9999 in, SEEN beside them.
    [11.9999 * INCH, 'feet-inches', INCH / 32, '1′ 0″'],
    [72.9999 * INCH, 'feet-inches', INCH / 32, '6′ 1″'],
  ])('%d nm as %s at %d nm is %s', (length, style, graduation, expected) => {
    expect(formatLength(length, style, graduation)).toBe(expected);
  });

  // constructionknowledge.net, inches to hundredths of a foot, SEEN. Its exact halves (1-1/2, 4-1/2, 7-1/2, 10-1/2 in) print down; this
  // product rounds half away from zero, so those four come out one hundredth higher, as the second table says.
  test.each([
    [1 / 8, '0.01'],
    [1 / 4, '0.02'],
    [3 / 8, '0.03'],
    [1 / 2, '0.04'],
    [5 / 8, '0.05'],
    [3 / 4, '0.06'],
    [7 / 8, '0.07'],
    [1, '0.08'],
    [11 / 8, '0.11'],
    [13 / 8, '0.14'],
    [2, '0.17'],
    [3, '0.25'],
    [31 / 8, '0.32'],
    [4, '0.33'],
    [37 / 8, '0.39'],
    [6, '0.50'],
    [8, '0.67'],
    [73 / 8, '0.76'],
    [85 / 8, '0.89'],
    [95 / 8, '0.99'],
  ])('prints %d in as the conversion table does: %s ft', (inches, feet) => {
    expect(formatLength(inches * INCH, 'decimal-feet', 3_048_000)).toBe(`${feet} ft`);
  });
  test.each([
    [1.5, '0.13', '0.12'],
    [4.5, '0.38', '0.37'],
    [7.5, '0.63', '0.62'],
    [10.5, '0.88', '0.87'],
  ])('prints %d in, an exact half, as %s ft where the table rounds down to %s', (inches, feet) => {
    expect(formatLength(inches * INCH, 'decimal-feet', 3_048_000)).toBe(`${feet} ft`);
  });

  test.each<[number, LengthStyle, number, string]>([
    [1, 'feet-inches', 1_000_000, 'bad-graduation'],
    [1, 'decimal-feet', SIXTEENTH, 'bad-graduation'],
    [1, 'metric', 0.5, 'bad-graduation'],
    [1, 'metric', 0, 'not-positive'],
    [Number.NaN, 'metric', 1, 'not-finite'],
    [Number.POSITIVE_INFINITY, 'metric', 1, 'not-finite'],
    [1e300, 'metric', 1, 'out-of-range'],
  ])('refuses %d as %s at %d with %s', (length, style, graduation, code) => {
    expect(refusal(() => formatLength(length, style, graduation)).code).toBe(code);
  });
});

describe('parse(format(x)) = x', () => {
  const marks: [LengthStyle, number][] = [
    ...[1, 2, 4, 8, 16, 32, 64].map((under): [LengthStyle, number] => ['feet-inches', INCH / under]),
    ...[30_480_000, 3_048_000, 304_800, 30_480, 3_048].map((mark): [LengthStyle, number] => ['decimal-feet', mark]),
    ...[10_000_000, 1_000_000, 500_000, 100_000, 1].map((mark): [LengthStyle, number] => ['metric', mark]),
  ];
  test.each(marks)('on every mark of %s at %d nm', (style, mark) => {
    fc.assert(
      fc.property(fc.integer({ min: -3_000_000, max: 3_000_000 }), (count) => {
        const length = count === 0 ? 0 : count * mark;
        const text = formatLength(length, style, mark);
        expect(parseLength(text, style, mark)).toBe(length);
        expect(text).not.toMatch(/ 12″|(\d+)\/\1″|−0″|−0\.0+ /);
      }),
    );
  });

  it('and whatever is keyed is a whole length or an AnalysisError', () => {
    const keys = fc.array(fc.constantFrom(...`0123456789'"/-., ftinm½−`), { maxLength: 12 }).map((list) => list.join(''));
    fc.assert(
      fc.property(keys, fc.constantFrom<LengthStyle>('feet-inches', 'decimal-feet', 'metric'), (text, style) => {
        try {
          expect(Number.isSafeInteger(parseLength(text, style))).toBe(true);
        } catch (error) {
          expect(error).toBeInstanceOf(AnalysisError);
        }
      }),
      { numRuns: 3_000 },
    );
  });
});
