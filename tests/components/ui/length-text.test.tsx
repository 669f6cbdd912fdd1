import { i18n } from '@/hooks/i18n/i18n';
import { render, screen } from '@testing-library/react';
import { LengthText } from '@/components/ui/length-text';
import { spokenFraction, spokenLength } from '@/components/ui/spoken-length';
import { fractionPart, StackedFraction } from '@/components/ui/stacked-fraction';

const t = i18n.getFixedT('en', 'common');

// Expected words: how the trade reads a rod aloud, common practice, no source.
test.each([
  ['4′ 7 3/16″', '4 feet 7 and 3 sixteenths inches'],
  ['1′ 0″', '1 foot 0 inches'],
  ['3/16″', '3 sixteenths of an inch'],
  ['1/2″', 'one half of an inch'],
  ['7″', '7 inches'],
  ['0″', '0 inches'],
  ['−1/4″', 'minus 1 quarter of an inch'],
  ['4′ 0 5/8″', '4 feet 0 and 5 eighths inches'],
  ['4′', '4 feet'],
  ['4.60 ft', '4.60 feet'],
  ['1.402 m', '1.402 metres'],
  ['−0.002 m', 'minus 0.002 metres'],
  ['3 mm', '3 millimetres'],
  ['half a shovel', 'half a shovel'],
  ['', ''],
])('%j is said as %j', (printed, said) => {
  expect(spokenLength(printed, t)).toBe(said);
});

test.each([
  [3, 16, '3 sixteenths'],
  [1, 8, '1 eighth'],
  [5, 32, '5 thirty-seconds'],
  [63, 64, '63 sixty-fourths'],
  [3, 10, '3 over 10'],
])('%i/%i is said as "%s"', (numerator, denominator, said) => {
  expect(spokenFraction(numerator, denominator, t)).toBe(said);
});

test('in Spanish the same length is said in Spanish', () => {
  expect(spokenLength('4′ 7 3/16″', i18n.getFixedT('es', 'common'))).toBe('4 pies 7 pulgadas y 3 dieciseisavos');
});

test('a large length stacks its fraction and is one picture with its words', () => {
  render(<LengthText value="4′ 7 5/8″" size="verdict" />);
  const picture = screen.getByRole('img', { name: '4 feet 7 and 5 eighths inches' });
  expect(picture).toHaveTextContent('4′ 758″');
  expect(screen.queryByText('4′ 7 5/8″')).toBeNull();
});

test('a small length writes the fraction in a line', () => {
  render(<LengthText value="4′ 7 5/8″" size="lead" />);
  expect(screen.getByText('4′ 7 5/8″')).toBeInTheDocument();
});

test('each part of a stacked fraction is at least 13 px, and under 20 px there is none', () => {
  expect(fractionPart(20, true)).toBeGreaterThanOrEqual(13);
  expect(fractionPart(20, false)).toBeGreaterThanOrEqual(13);
  jest.spyOn(console, 'error').mockImplementation(() => undefined); // React reports the error that is expected here
  expect(() => render(<StackedFraction numerator={1} denominator={4} size={17} />)).toThrow(RangeError);
});
