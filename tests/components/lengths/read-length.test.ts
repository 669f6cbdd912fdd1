import '@/hooks/i18n/i18n';
import { AnalysisError } from '@/analysis';
import { lengthRefusal } from '@/components/lengths/length-field';
import { accuracyWords, offGradeWords, toleranceWords } from '@/components/lengths/length-words';
import { printLength, printRound, printSmall } from '@/components/lengths/print-length';
import { readLength, type LengthRule } from '@/components/lengths/read-length';

const FOOT = 304_800_000;
const INCH = 25_400_000;
const MM = 1_000_000;
const inches: LengthRule = { style: 'feet-inches' };
const metric: LengthRule = { style: 'metric' };
const decimal: LengthRule = { style: 'decimal-feet' };

describe('a length is read in the unit that it says itself, whatever the job’s', () => {
  test.each<[string, LengthRule, number]>([
    ['44 0', inches, 44 * FOOT],
    ['44.5 ft', inches, 44.5 * FOOT],
    ["44.5'", inches, 44.5 * FOOT],
    ['400 mm', inches, 400 * MM],
    ['1.2m', inches, 1200 * MM],
    ['16"', metric, 16 * INCH],
    ['3/16', metric, (3 * INCH) / 16],
    ['4\' 7 1/2"', decimal, 4 * FOOT + 7.5 * INCH],
    ['4.6', decimal, 4.6 * FOOT],
    ['1402', metric, 1402 * MM],
  ])('%s', (text, rule, length) => {
    expect(readLength(text, rule)).toBe(length);
  });
});

test('a bare decimal is feet in a field for elevations of a job in inches, and refused in any other', () => {
  expect(readLength('99.62', { ...inches, bareDecimal: 'feet' })).toBe(30_364_176_000); // 99.62 × 304,800,000, by hand
  expect(() => readLength('99.62', inches)).toThrow(AnalysisError);
});

test('a minus is read only where elevations are', () => {
  expect(readLength('-2 6', { ...inches, sign: 'any' })).toBe(-2.5 * FOOT);
  expect(lengthRefusal('-2 6', inches)).toBe('This starts at zero. Take the minus off.');
  expect(readLength('0"', { ...inches, sign: 'not-negative' })).toBe(0);
  expect(lengthRefusal('0"', inches)).toBe('This has to be more than zero.');
});

describe('a refused length says what is wrong in the person’s own unit and what to key', () => {
  test.each<[string, LengthRule, string]>([
    ['', inches, 'Key a length here.'],
    ['44', inches, '“44” could be feet or inches. Key 44′ or 44″.'],
    ['2', metric, '“2” could be metres or millimetres. Key 2 m or 2 mm.'],
    [
      '4 7 3/32',
      { ...inches, graduation: INCH / 16 },
      'This rod is read to 1/16″. The nearest marks are 4′ 7 1/16″ and 4′ 7 1/8″.',
    ],
    ['4.605', { ...decimal, graduation: FOOT / 100 }, 'This rod is read to 0.01 ft. The nearest marks are 4.60 ft and 4.61 ft.'],
    ['1402.5 mm', { ...metric, graduation: MM }, 'This rod is read to 1 mm. The nearest marks are 1.402 m and 1.403 m.'],
    ["4'7'", inches, "“4'7'” cannot be read as a length. Key feet, inches and a fraction, such as 4 7 3/16."],
    ['4\' 13"', inches, '13 inches are a foot or more. Carry the foot over, so that the inches stay under 12.'],
    [
      '7/0',
      inches,
      '7/0 is not a fraction on a rule. Use halves, quarters, eighths, sixteenths, thirty-seconds or sixty-fourths.',
    ],
    ['4,60', decimal, 'Decimal feet take a point, not a comma, such as 4.60.'],
    ['20\' 0"', { ...inches, most: 13 * FOOT }, 'This can be 13′ at most.'],
  ])('%s', (text, rule, sentence) => {
    expect(lengthRefusal(text, rule)).toBe(sentence);
  });
});

test('lengths are printed as the trade writes them', () => {
  expect(printLength(99.5 * FOOT, 'feet-inches')).toBe('99′ 6″');
  expect(printLength(99.5 * FOOT, 'decimal-feet')).toBe('99.50 ft');
  expect(printRound(100 * FOOT, 'feet-inches')).toBe('100′');
  expect(printRound(30_000 * MM, 'metric')).toBe('30 m');
  expect(printSmall(3 * MM, 'metric')).toBe('3 mm');
  expect(printSmall(1.5 * MM, 'metric')).toBe('1.5 mm');
  expect(printSmall(INCH / 8, 'feet-inches')).toBe('1/8″');
});

test('tolerances, deviations and accuracies are said in words', () => {
  expect(toleranceWords({ low: INCH / 8, high: INCH / 8, style: 'feet-inches' })).toBe('±1/8″');
  expect(toleranceWords({ low: INCH, high: 0, style: 'feet-inches' })).toBe('+0 / −1″');
  expect(offGradeWords(-INCH / 4, 'feet-inches')).toBe('1/4″ low');
  expect(offGradeWords(INCH / 8, 'feet-inches')).toBe('1/8″ high');
  expect(offGradeWords(0, 'metric')).toBe('on grade');
  expect(accuracyWords({ accuracy: INCH / 16, accuracyAt: 100 * FOOT }, 'feet-inches')).toBe('1/16″ at 100′');
});
