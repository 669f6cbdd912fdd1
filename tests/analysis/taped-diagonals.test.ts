import { AnalysisError, checkDiagonals } from '@/analysis';

const FOOT = 304_800_000;
const INCH = 25_400_000;
const RECTANGLE = [40, 30, 40, 30].map((length, index) => ({ id: String(index), length: length * FOOT, turn: 90 }));

// Worked by hand: a 40 × 30 ft rectangle has diagonals of 50 ft.
describe('checkDiagonals', () => {
  it('sets what was taped beside what the outline makes it, whichever way round it was named', () => {
    expect(
      checkDiagonals(RECTANGLE, [
        { from: 'A', to: 'C', taped: 50 * FOOT + INCH / 2 },
        { from: 'D', to: 'B', taped: 50 * FOOT - INCH / 4 },
      ]),
    ).toEqual([
      { from: 'A', to: 'C', taped: 50 * FOOT + INCH / 2, computed: 50 * FOOT, difference: INCH / 2 },
      { from: 'D', to: 'B', taped: 50 * FOOT - INCH / 4, computed: 50 * FOOT, difference: -INCH / 4 },
    ]);
  });

  test.each<[string, string, string, number, string]>([
    ['a side', 'A', 'B', FOOT, 'unknown-diagonal'],
    ['a corner that the outline has not', 'A', 'Q', FOOT, 'unknown-diagonal'],
    ['a tape of nothing', 'A', 'C', 0, 'not-positive'],
    ['a tape that is no number', 'A', 'C', Number.NaN, 'not-finite'],
  ])('refuses %s', (_, from, to, taped, code) => {
    try {
      checkDiagonals(RECTANGLE, [{ from, to, taped }]);
      throw new Error('nothing was refused');
    } catch (error) {
      expect(error).toBeInstanceOf(AnalysisError);
      expect(error).toMatchObject({ code });
    }
  });
});
