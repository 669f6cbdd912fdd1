import { deriveStages, outlineCloses, type StageRound } from '@/shared/stages';
import type { RoundShot } from '@/shared/round/round-state';
import type { Surface } from '@/shared/rules';
import { footingOf, SIXTEENTH } from '../support/field-round';

/** A round as far as stages ask of it. */
function round(
  surface: Surface,
  change: Partial<StageRound['state']> & Partial<Pick<RoundShot, 'laser' | 'verdict'>> = {},
): StageRound {
  const { laser = 'held', verdict = 'in', ...state } = change;
  const targets = [{ deciding: { laser, verdict } }] as unknown as StageRound['state']['targets']; // only what stages read of a target
  return { surface, state: { shot: 4, of: 4, wholeReadLap: true, targets, ...state } };
}
const stages = (rounds: StageRound[], change: Parameters<typeof footingOf>[1] = {}) =>
  deriveStages(footingOf(4, change), rounds, SIXTEENTH);

describe('stages', () => {
  it('begin with an outline that closes or is a strip, and has stations', () => {
    expect(stages([], { runs: [], stations: [] }).now).toBe('outline');
    expect(stages([], { stations: [] }).now).toBe('outline');
    expect(stages([]).now).toBe('dig');
  });

  it('take a dig that is not needed as done, and one that is when every station of it is shot', () => {
    expect(stages([], { digNeeded: false }).now).toBe('rails');
    expect(stages([round('dig', { shot: 3 })]).now).toBe('dig');
    expect(stages([round('dig')]).now).toBe('rails');
  });

  it.each([
    ['one whole lap by reading, all within tolerance, with the laser held', {}, 'release'],
    ['all stations, but not in one lap by reading', { wholeReadLap: false }, 'rails'],
    ['a whole lap that no check has closed', { laser: 'unchecked' }, 'rails'],
    ['a whole lap from a laser that moved', { laser: 'doubted' }, 'rails'],
    ['a whole lap with a rail to mend', { verdict: 'low' }, 'rails'],
    ['a whole lap too close to call', { verdict: 'cannot-tell' }, 'rails'],
  ] as const)('rails: %s', (_what, change, now) => {
    expect(stages([round('dig'), round('rails', change)]).now).toBe(now);
  });

  it('take the top as done when all of it is shot, whatever came of the rails', () => {
    expect(stages([round('dig'), round('top')])).toEqual({ done: ['outline', 'dig', 'top'], now: 'rails' });
    expect(stages([round('dig'), round('rails'), round('top')]).now).toBe('release');
  });

  it('go by the newest round of a surface that has a shot: another one opened takes nothing back until it is shot', () => {
    expect(stages([round('dig'), round('rails'), round('rails', { shot: 0, wholeReadLap: false })]).now).toBe('release');
    expect(stages([round('dig'), round('rails'), round('rails', { shot: 1, wholeReadLap: false })]).now).toBe('rails');
  });
});

describe('an outline closes', () => {
  const FOOT = 304_800_000;
  const square = (last: number) =>
    [20 * FOOT, 20 * FOOT, 20 * FOOT, last].map((length, n) => ({
      id: String(n),
      length,
      turn: 90,
      width: null,
      thickness: null,
      steps: [],
    }));

  it.each([
    ['exactly', 20 * FOOT, true],
    ['within a mark of the tape', 20 * FOOT - SIXTEENTH, true],
    ['not a nanometre further', 20 * FOOT - SIXTEENTH - 1, false],
  ])('%s', (_what, last, closes) => {
    expect(outlineCloses({ runs: square(last) }, SIXTEENTH)).toBe(closes);
  });

  it('where it never turns round it need not', () => {
    expect(outlineCloses({ runs: square(20 * FOOT).slice(0, 2) }, SIXTEENTH)).toBe(true);
    expect(outlineCloses({ runs: [] }, SIXTEENTH)).toBe(false);
  });
});
