import { explainBust } from '@/analysis/bust-explanation';

const FOOT = 304_800_000;
const INCH = 25_400_000;

describe('explainBust to the nanometre', () => {
  // By definition: 1 ft = 304.8 mm, 1 in = 25.4 mm, a tenth of a foot 30.48 mm.
  it.each([
    ['foot', 304_800_000],
    ['inch', 25_400_000],
    ['half-inch', 12_700_000],
    ['tenth', 30_480_000],
    ['100mm', 100_000_000],
    ['10mm', 10_000_000],
  ])('knows a %s exactly, either way, and nothing a nanometre beside it where nothing is allowed', (name, size) => {
    expect(explainBust(size, 0)).toBe(name);
    expect(explainBust(-size, 0)).toBe(name);
    expect(explainBust(size + 1, 0)).toBeNull();
    expect(explainBust(size - 1, 0)).toBeNull();
  });

  it('takes what is allowed to the last nanometre, and not one more', () => {
    expect(explainBust(FOOT + 500, 500)).toBe('foot');
    expect(explainBust(FOOT + 501, 500)).toBeNull();
    expect(explainBust(0.18 * FOOT + 500, 500, '4.35', 'decimal-feet')).toBe('digits-swapped');
    expect(explainBust(0.18 * FOOT + 501, 500, '4.35', 'decimal-feet')).toBeNull();
  });

  it('prefers the swap where it explains as well as a whole mark, and the mark where it is nearer', () => {
    // 1212 mm for 1122: 90 mm low; 95 mm off lies as near to it as to 100 mm.
    expect(explainBust(-95_000_000, 6_000_000, '1212', 'metric')).toBe('digits-swapped');
    expect(explainBust(-96_000_000, 6_000_000, '1212', 'metric')).toBe('100mm');
    expect(explainBust(-94_000_000, 6_000_000, '1212', 'metric')).toBe('digits-swapped');
  });

  it('swaps noughts and nines too, and the nearest of several swaps', () => {
    // 1092 → 0192 (−900), 1902 (+810), 1029 (−63).
    expect(explainBust(810_000_000, 500, '1092', 'metric')).toBe('digits-swapped');
    expect(explainBust(-63_000_000, 0, '1092', 'metric')).toBe('digits-swapped');
    expect(explainBust(-900_000_000, 0, '1092', 'metric')).toBe('digits-swapped');
    expect(explainBust(-12_600_000, 200_000, '1.0120', 'metric')).toBe('half-inch');
  });

  it('looks across what stands between two digits', () => {
    expect(explainBust(11 * INCH, 0, '4\' 5"', 'feet-inches')).toBe('digits-swapped');
    expect(explainBust(11 * INCH, 0, '4\' 5"')).toBeNull();
  });
});
