import { themes, typeSize, type TokenName, type Tokens } from '@/constants/theme';

/** Relative luminance and contrast ratio: W3C, WCAG 2.2, "relative luminance" and "contrast ratio" in the glossary. */
function luminance(hex: string): number {
  const [r = NaN, g = NaN, b = NaN] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [dim = NaN, bright = NaN] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (bright + 0.05) / (dim + 0.05);
}

const grounds: TokenName[] = ['chalk', 'paper', 'lineTint', 'highTint', 'lowTint', 'onTint', 'cautionTint'];
const text: [TokenName, TokenName[]][] = [
  ['ink', grounds],
  ['ink2', ['chalk', 'paper']],
  ['high', ['chalk', 'paper', 'highTint']],
  ['low', ['chalk', 'paper', 'lowTint']],
  ['on', ['chalk', 'paper', 'onTint']],
  ['caution', ['chalk', 'paper', 'cautionTint']],
  ['paper', ['ink', 'on']],
  ['chalk', ['ink']],
];
const drawn: [TokenName, TokenName[]][] = [
  ['rule2', ['chalk', 'paper']],
  ['line', ['chalk', 'paper', 'onTint']],
  ['high', ['onTint', 'rule']],
  ['low', ['onTint', 'rule']],
  ['on', ['onTint', 'rule']],
  ['caution', ['onTint', 'rule']],
];
const pairs = (table: [TokenName, TokenName[]][]) =>
  table.flatMap(([front, backs]) => backs.map((back) => [front, back] as const));

test('the formula gives the known ratios: black on white 21, #767676 on white 4.54 (W3C, Understanding SC 1.4.3)', () => {
  expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 10);
  expect(contrast('#767676', '#FFFFFF')).toBeCloseTo(4.54, 2);
});

describe.each(Object.entries(themes))('%s theme', (_name, tokens: Tokens) => {
  test.each(pairs(text))('%s as text on %s is at least 7:1', (front, back) => {
    expect(contrast(tokens[front], tokens[back])).toBeGreaterThanOrEqual(7);
  });

  test.each(pairs(drawn))('%s drawn on %s is at least 3:1', (front, back) => {
    expect(contrast(tokens[front], tokens[back])).toBeGreaterThanOrEqual(3);
  });

  test('the string line is a colour of its own', () => {
    const others = Object.entries(tokens).filter(([name]) => name !== 'line');
    expect(others.map(([, colour]) => colour)).not.toContain(tokens.line);
  });
});

test('nothing a person reads is set under 13 px', () => {
  expect(Math.min(...Object.values(typeSize))).toBeGreaterThanOrEqual(13);
});
