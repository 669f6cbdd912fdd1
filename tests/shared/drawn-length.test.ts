import { AnalysisError } from '@/analysis';
import { parseDrawnLength, writtenStyle } from '@/shared/drawn-length';
import type { UnitStyle } from '@/shared/quantities';

// Worked by hand: 1 in = 25,400,000 nm, 1 ft = 304,800,000 nm.
const cases: [text: string, job: UnitStyle, style: UnitStyle, nm: number][] = [
  ['44 0', 'feet-inches', 'feet-inches', 13_411_200_000],
  ['743.62', 'feet-inches', 'decimal-feet', 226_655_376_000],
  ['44.5′', 'feet-inches', 'decimal-feet', 13_563_600_000],
  ['13.4112 m', 'feet-inches', 'metric', 13_411_200_000],
  ["44'", 'decimal-feet', 'feet-inches', 13_411_200_000],
  ['7 3/16"', 'decimal-feet', 'feet-inches', 182_562_500],
  ['4.60', 'decimal-feet', 'decimal-feet', 1_402_080_000],
  ['1402', 'metric', 'metric', 1_402_000_000],
  ['1,402', 'metric', 'metric', 1_402_000_000],
  ['4.60 ft', 'metric', 'decimal-feet', 1_402_080_000],
  ['4\' 7"', 'metric', 'feet-inches', 1_397_000_000],
  ['-2.5', 'feet-inches', 'decimal-feet', -762_000_000],
];

test.each(cases)('“%s” on a %s job is read as %s', (text, job, style, nm) => {
  expect(writtenStyle(text, job)).toBe(style);
  expect(parseDrawnLength(text, job)).toBe(nm);
});

test('a bare number is refused, because it could be two lengths', () => {
  expect(() => parseDrawnLength('44', 'feet-inches')).toThrow(AnalysisError);
  expect(() => parseDrawnLength('2', 'metric')).toThrow(AnalysisError);
});
