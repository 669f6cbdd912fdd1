import { checkOutcome } from '@/components/shoot/check-flow';

const EXPECTED = 1_219_200_000; // 4′ 0″
const LIMIT = 3_175_000; // 1/8″
const miss = (id: string, off: number) => ({ id, reading: EXPECTED + off });

describe('reading the benchmark again', () => {
  it('holds up to the limit itself', () => {
    expect(checkOutcome([], EXPECTED + LIMIT, EXPECTED, LIMIT)).toEqual({ said: 'held', strike: [] });
    expect(checkOutcome([], EXPECTED - LIMIT - 1, EXPECTED, LIMIT).said).toBe('read-again');
  });
  it('asks to read again after one miss, and doubts nothing by it', () => {
    expect(checkOutcome([], EXPECTED + 25_400_000, EXPECTED, LIMIT)).toEqual({ said: 'read-again', strike: [] });
  });
  it('strikes a miss as misread when the next reading fits', () => {
    expect(checkOutcome([miss('a', 25_400_000)], EXPECTED, EXPECTED, LIMIT)).toEqual({ said: 'held', strike: ['a'] });
  });
  it('doubts when two agree on a miss, and both stay', () => {
    expect(checkOutcome([miss('a', 12_700_000)], EXPECTED + 12_700_000 + LIMIT, EXPECTED, LIMIT)).toEqual({
      said: 'doubted',
      strike: [],
    });
  });
  it('asks for a third when two misses disagree, and the third decides which was misread', () => {
    const [inch, half] = [miss('a', 25_400_000), miss('b', 12_700_000)];
    const two = [inch, half];
    expect(checkOutcome([inch], EXPECTED + 12_700_000, EXPECTED, LIMIT).said).toBe('read-again');
    expect(checkOutcome(two, EXPECTED + 12_700_000, EXPECTED, LIMIT)).toEqual({ said: 'doubted', strike: ['a'] });
    expect(checkOutcome(two, EXPECTED, EXPECTED, LIMIT)).toEqual({ said: 'held', strike: ['a', 'b'] });
  });
});
