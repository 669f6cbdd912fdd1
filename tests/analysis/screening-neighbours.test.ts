import { studentUpperQuantile } from '@/analysis/distributions';
import { robustScale, searchNeighbours } from '@/analysis/screening-neighbours';
import { normal, seeded } from '../support/seeded';

const at = (residuals: readonly number[]) => residuals.map((residual, i) => ({ x: i, y: 0, residual }));
const nobody = new Set<number>();

describe('robustScale', () => {
  // By hand: the smaller four of 1, 2, 3, 4, 100 have a root mean square of √7.5; 1.51147 makes it that of all, were they normal.
  it('is the root mean square of the smaller four fifths, made up to the whole', () => {
    expect(robustScale([100, -1, 3, -4, 2])).toBeCloseTo(1.51147 * Math.sqrt(7.5), 12);
    expect(robustScale([])).toBe(0);
    expect(robustScale([-2])).toBeCloseTo(1.51147 * 2, 12);
  });

  it('estimates the standard deviation of normal numbers', () => {
    const draw = normal(seeded(4));
    expect(robustScale(Array.from({ length: 20_000 }, () => 3 * draw()))).toBeCloseTo(3, 1);
  });
});

describe('searchNeighbours', () => {
  it('takes the steps of a closed walk round its corner, of an open one not', () => {
    const shots = at([0, 1, 2, 3, 4]);
    expect(searchNeighbours({ shots, closed: false, u: 0 }, nobody, 1).usualStep).toBeCloseTo(1.51147, 12);
    // Steps 1, 1, 1, 1 and −4: the smaller four are the same.
    expect(searchNeighbours({ shots, closed: true, u: 0 }, nobody, 1).usualStep).toBeCloseTo(1.51147, 12);
    const jagged = at([3, 5, 4, 6, 7]);
    // Steps 2, −1, 2, 1 and, closing, 3 − 7 = −4: the smaller four 1, 1, 2, 2, open and closed; with 7 for 4 last, 3 − 4 = −1 counts.
    expect(searchNeighbours({ shots: at([3, 5, 4, 6, 4]), closed: true, u: 0 }, nobody, 1).usualStep).toBeCloseTo(
      1.51147 * Math.sqrt(10 / 4),
      12,
    );
    expect(searchNeighbours({ shots: jagged, closed: false, u: 0 }, nobody, 1).usualStep).toBeCloseTo(
      1.51147 * Math.sqrt(10 / 4),
      12,
    );
  });

  it('holds the step against the t quantile of a scale of at least √2·u, strictly beyond it, and more than 4u', () => {
    const u = 10;
    const limit = Math.SQRT2 * u * studentUpperQuantile(0.05 / 20, 9);
    const flat = (height: number) => at([0, 0, 0, 0, height, 0, 0, 0, 0, 0]);
    expect(searchNeighbours({ shots: flat(limit * 0.999), closed: true, u }, nobody, 2).sizes.size).toBe(0);
    expect([...searchNeighbours({ shots: flat(limit * 1.001), closed: true, u }, nobody, 2).sizes]).toEqual([
      [4, expect.closeTo(limit * 1.001, 6)],
    ]);
    expect([...searchNeighbours({ shots: flat(-limit * 1.001), closed: true, u }, nobody, 2).sizes]).toEqual([
      [4, expect.closeTo(-limit * 1.001, 6)],
    ]);
  });

  it('needs both neighbours, both stepping the same way, and steps enough to know a usual one', () => {
    const end = at([9, ...Array.from({ length: 11 }, () => 0)]);
    expect(searchNeighbours({ shots: end, closed: false, u: 0.1 }, nobody, 2).sizes.size).toBe(0);
    expect([...searchNeighbours({ shots: end, closed: true, u: 0.1 }, nobody, 2).sizes]).toEqual([[0, 9]]);
    const stair = at([0, 0, 0, 0, 0, 9, 18, 18, 18, 18, 18, 18]);
    expect(searchNeighbours({ shots: stair, closed: false, u: 0.1 }, nobody, 2).sizes.size).toBe(0);
    expect(searchNeighbours({ shots: at([0, 0, 9, 0]), closed: true, u: 0.1 }, nobody, 2).sizes.size).toBe(0);
  });

  it('takes out the largest first, no more than asked, and measures from the line between unequal distances', () => {
    const shots = at([0, 0, 20, 0, 0, 0, 50, 0, 0, 0, 0, 0]);
    expect([...searchNeighbours({ shots, closed: true, u: 0.1 }, nobody, 3).sizes.keys()]).toEqual([6, 2]);
    expect([...searchNeighbours({ shots, closed: true, u: 0.1 }, nobody, 1).sizes.keys()]).toEqual([6]);
    expect([...searchNeighbours({ shots, closed: true, u: 0.1 }, nobody, 0).sizes.keys()]).toEqual([]);
    const row = Array.from({ length: 14 }, (_, i) => i);
    const uneven = row.map((i) => ({ x: i === 3 ? 2.25 : i, y: 0, residual: i === 3 ? 30 : i >= 4 ? 8 : 0 }));
    // A quarter of a foot from 0 at 2, one and three quarters from 8 at 4: the line stands at 1 there.
    expect(searchNeighbours({ shots: uneven, closed: false, u: 0.1 }, nobody, 1).sizes.get(3)).toBeCloseTo(29, 10);
    const stacked = row.map((i) => ({ x: i > 1 && i < 5 ? 2 : i, y: 0, residual: i === 3 ? 30 : i >= 4 ? 4 : 0 }));
    expect(searchNeighbours({ shots: stacked, closed: false, u: 0.1 }, nobody, 1).sizes.get(3)).toBeCloseTo(28, 10);
  });

  it('holds a shot already suspect against the nearest that are not, and lets it be nobody’s neighbour', () => {
    const shots = at([0, 0, 20, 20, 0, 0, 0, 0, 0]);
    expect([...searchNeighbours({ shots, closed: true, u: 0.1 }, nobody, 2).sizes.keys()]).toEqual([]);
    const found = searchNeighbours({ shots, closed: true, u: 0.1 }, new Set([2, 3]), 2);
    expect([...found.sizes]).toEqual([
      [2, 20],
      [3, 20],
    ]);
    expect(found.usualStep).toBe(0);
  });
});
