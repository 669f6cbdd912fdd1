import { foldRound } from '@/shared/round/fold-round';
import type { FoldRecord } from '@/shared/round/round-state';
import {
  contextOf,
  FOOT,
  footingOf,
  idOf,
  INCH,
  local,
  MIA,
  Phone,
  PHONE_A,
  PHONE_B,
  SIXTEENTH,
  stationId,
  stored,
} from '../../support/field-round';

const SERIES_A = idOf(0x5e, 1);
const SERIES_B = idOf(0x5f, 1);

/** HI 104′ 0″ (benchmark 100′ 0″ + 4′ 0″), so that the grade rod of top of footing is 4′ 0″. */
function phone(deviceId = PHONE_A, seriesId = SERIES_A, startAt?: number): Phone {
  const made = new Phone(deviceId, seriesId, startAt);
  made.setUp();
  made.backsight(4 * FOOT);
  return made;
}

const wholeRound = (count = 4) => {
  const made = phone();
  for (let n = 0; n < count; n += 1) made.shoot(n, 4 * FOOT);
  return made;
};

describe('what a shot comes to', () => {
  it('is HI less the reading, and its deviation is that less plan grade, high above zero', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT + 5 * SIXTEENTH);
    made.shoot(1, 4 * FOOT - SIXTEENTH);
    const { targets, series } = foldRound(local(made.made), contextOf(footingOf(4)));
    expect(series[0]?.hi).toBe(104 * FOOT);
    expect(targets[0]?.deciding).toMatchObject({ deviation: -5 * SIXTEENTH, verdict: 'low' });
    expect(targets[1]?.deciding).toMatchObject({ elevation: 100 * FOOT + SIXTEENTH, deviation: SIXTEENTH, verdict: 'in' });
    expect(targets[2]?.deciding).toBeNull();
  });

  it('has no elevation, deviation or verdict without a standing backsight, and the round then cannot tell', () => {
    const made = new Phone(PHONE_A, SERIES_A);
    made.setUp();
    for (let n = 0; n < 2; n += 1) made.shoot(n, 4 * FOOT);
    const state = foldRound(local(made.made), contextOf(footingOf(2)));
    expect(state.targets[0]?.deciding).toMatchObject({ elevation: null, deviation: null, verdict: null });
    expect(state).toMatchObject({ shot: 2, of: 2, verdict: 'cannot-tell' });
  });

  it('keeps its place without an elevation while its series has not come', () => {
    const made = wholeRound(2);
    const shotsOnly = made.made.filter((record) => record.kind === 'reading' && record.purpose === 'shot');
    const state = foldRound(local(shotsOnly), contextOf(footingOf(2)));
    expect(state.shot).toBe(2);
    expect(state.targets.map((target) => target.deciding?.elevation)).toEqual([null, null]);
    expect(state.series).toEqual([]);
  });

  // Reading 1/16 in: d/√12 = 458,272 nm. Laser 1/16 in at 100 ft as a half-width /√3: 9,165.4 nm a foot.
  // Stand at (0, 0), station 1 is 8 ft off: laser 73,323 nm. Backsight at 20 ft: √(458,272² + 183,309²) = 493,573 nm.
  it('has the uncertainty of its reading, its laser at its own distance, and its backsight', () => {
    const made = phone();
    made.shoot(1, 4 * FOOT);
    const [, target] = foldRound(local(made.made), contextOf(footingOf(4))).targets;
    expect(target?.deciding?.uncertainty.relative).toBeCloseTo(SIXTEENTH / Math.sqrt(12), 3);
    const laser = ((SIXTEENTH / 100) * 8) / Math.sqrt(3);
    const backsight = Math.hypot(SIXTEENTH / Math.sqrt(12), ((SIXTEENTH / 100) * 20) / Math.sqrt(3));
    expect(target?.deciding?.uncertainty.absolute).toBeCloseTo(Math.hypot(SIXTEENTH / Math.sqrt(12), laser, backsight), 3);
  });

  it('carries half the receiver’s band to either side when it was set, the wider one with the coarse setting', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT, { how: 'set', receiver: 'fine', keyed: '' });
    made.shoot(1, 4 * FOOT, { how: 'set', receiver: 'coarse', keyed: '' });
    const { targets } = foldRound(local(made.made), contextOf(footingOf(2)));
    expect(targets[0]?.deciding?.uncertainty.relative).toBeCloseTo(SIXTEENTH / 2 / Math.sqrt(3), 3);
    expect(targets[1]?.deciding?.uncertainty.relative).toBeCloseTo(SIXTEENTH / Math.sqrt(3), 3);
  });

  it('takes the farthest target from the middle for its distance when nobody tapped where the laser stands', () => {
    const made = new Phone(PHONE_A, SERIES_A);
    made.write({ kind: 'setup', id: idOf(0x5a, 1), laserId: idOf(0x1a, 1), stand: null });
    made.write({
      kind: 'series',
      id: SERIES_A,
      setupId: idOf(0x5a, 1),
      rodId: idOf(0x2d, 1),
      checkLimit: 0,
      benchmarkDistance: 0,
    });
    made.backsight(4 * FOOT);
    made.shoot(1, 4 * FOOT);
    // Stations at 0, 8, 16 ft: the ends are 8 ft from the middle.
    const [, target] = foldRound(local(made.made), contextOf(footingOf(3))).targets;
    const reading = SIXTEENTH / Math.sqrt(12);
    const laser = ((SIXTEENTH / 100) * 8) / Math.sqrt(3);
    expect(target?.deciding?.uncertainty.absolute).toBeCloseTo(Math.hypot(reading, laser, reading), 3);
  });
});

describe('the plan grade of the surface', () => {
  const shotAt = (surface: 'dig' | 'rails' | 'wet' | 'top', change = {}) => {
    const made = phone();
    made.shoot(0, 4 * FOOT);
    return foldRound(local(made.made), contextOf(footingOf(1, change), surface)).targets[0];
  };

  it('is top of footing for wet and hard concrete', () => {
    expect(shotAt('top')?.grade).toBe(100 * FOOT);
    expect(shotAt('wet', { railOffset: INCH })?.grade).toBe(100 * FOOT);
  });
  it('is a rail offset above it for rails', () => {
    expect(shotAt('rails', { railOffset: 2 * INCH })?.grade).toBe(100 * FOOT + 2 * INCH);
  });
  it('is a thickness below it for the dig, the run’s own where it has one', () => {
    expect(shotAt('dig')?.grade).toBe(100 * FOOT - 10 * INCH);
    const { runs } = footingOf(1);
    expect(shotAt('dig', { runs: runs.map((run) => ({ ...run, thickness: 16 * INCH })) })?.grade).toBe(100 * FOOT - 16 * INCH);
  });
});

describe('the walk', () => {
  it('goes round the outer rail, then round the inner one', () => {
    const { targets } = foldRound([], contextOf(footingOf(3, { rails: 'both' })));
    expect(targets.map((target) => target.key)).toEqual([
      ...[0, 1, 2].map((n) => `${stationId(n)}/outer`),
      ...[0, 1, 2].map((n) => `${stationId(n)}/inner`),
    ]);
  });
  it('follows the stations’ positions, whatever their order in the list', () => {
    const footing = footingOf(3);
    const { targets } = foldRound([], contextOf({ ...footing, stations: [...footing.stations].reverse() }));
    expect(targets.map((target) => target.stationId)).toEqual([0, 1, 2].map(stationId));
  });
});

describe('the last shot of a station decides', () => {
  it('keeps the earlier one as before adjusting', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT + 5 * SIXTEENTH);
    made.shoot(0, 4 * FOOT);
    const [target] = foldRound(local(made.made), contextOf(footingOf(1))).targets;
    expect(target?.shots.map((shot) => [shot.deviation, shot.decides])).toEqual([
      [-5 * SIXTEENTH, false],
      [0, true],
    ]);
  });

  it('leaves a struck one with its line and lets the one before it decide', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT);
    const wrong = made.shoot(0, 5 * FOOT);
    made.strike(wrong);
    const [target] = foldRound(local(made.made), contextOf(footingOf(1))).targets;
    expect(target?.deciding?.deviation).toBe(0);
    expect(target?.shots[1]).toMatchObject({ decides: false, struck: { record: { reason: 'misread' } } });
  });

  it('lets a strike that came before its target wait, and strikes once that is here', () => {
    const made = phone();
    const wrong = made.shoot(0, 5 * FOOT);
    const strike = made.strike(wrong);
    const early = made.made.filter((record) => record !== wrong);
    expect(foldRound(local(early), contextOf(footingOf(1))).waitingStrikes).toEqual([strike.id]);
    const both = foldRound([...local(early), ...local([wrong])], contextOf(footingOf(1)));
    expect(both.waitingStrikes).toEqual([]);
    expect(both.targets[0]?.deciding).toBeNull();
  });

  it('counts a record once that the server has and the phone still holds, as the server has it', () => {
    const made = wholeRound(2);
    const state = foldRound([...local(made.made), ...stored(made.made)], contextOf(footingOf(2)));
    expect(state.targets[0]?.shots).toHaveLength(1);
    expect(state.targets[0]?.shots[0]?.receivedAt).not.toBeNull();
  });
});

describe('whether the laser held', () => {
  it('holds shots between the backsight and a good check, and the round is then judged', () => {
    const made = wholeRound();
    expect(foldRound(local(made.made), contextOf(footingOf(4))).verdict).toBe('cannot-tell');
    made.check(4 * FOOT + SIXTEENTH);
    const state = foldRound(local(made.made), contextOf(footingOf(4)));
    expect(state.targets.map((target) => target.deciding?.laser)).toEqual(['held', 'held', 'held', 'held']);
    expect(state.series[0]).toMatchObject({ laser: 'held', checks: [{ error: -SIXTEENTH, holds: true, of: 'laser' }] });
    expect(state.verdict).toBe('to-grade');
  });

  it('doubts them when the check misses by more than its limit, and not any more once that check is struck', () => {
    const made = wholeRound();
    const miss = made.check(4 * FOOT + 8 * SIXTEENTH);
    const doubted = foldRound(local(made.made), contextOf(footingOf(4)));
    expect(doubted.targets[0]?.deciding?.laser).toBe('doubted');
    expect(doubted.verdict).toBe('cannot-tell');
    made.strike(miss);
    made.check(4 * FOOT);
    expect(foldRound(local(made.made), contextOf(footingOf(4))).targets[0]?.deciding?.laser).toBe('held');
  });

  it('says of a setup without shots what its checks say', () => {
    const made = phone();
    expect(foldRound(local(made.made), contextOf(footingOf(1))).series[0]?.laser).toBe('unchecked');
    made.check(4 * FOOT);
    expect(foldRound(local(made.made), contextOf(footingOf(1))).series[0]?.laser).toBe('held');
    made.check(5 * FOOT);
    expect(foldRound(local(made.made), contextOf(footingOf(1))).series[0]?.laser).toBe('doubted');
  });
});

describe('counts and the verdict of a round', () => {
  it('is not yet until all are shot, and counts what is out', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT);
    made.shoot(1, 4 * FOOT + 4 * SIXTEENTH);
    made.check(4 * FOOT);
    const state = foldRound(local(made.made), contextOf(footingOf(3)));
    expect(state).toMatchObject({ shot: 2, of: 3, out: 1, verdict: 'not-yet', lap: { number: 1, shot: 2, of: 3 } });
  });
  it('is not to grade when one is out', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT);
    made.shoot(1, 4 * FOOT + 4 * SIXTEENTH);
    made.check(4 * FOOT);
    expect(foldRound(local(made.made), contextOf(footingOf(2))).verdict).toBe('not-to-grade');
  });
  it('is not yet without stations', () => {
    expect(foldRound([], contextOf(footingOf(0)))).toMatchObject({ shot: 0, of: 0, verdict: 'not-yet', wholeReadLap: false });
  });
});

describe('a whole read lap', () => {
  const lapOf = (made: Phone, count: number) => foldRound(local(made.made), contextOf(footingOf(count))).wholeReadLap;

  it('is every station read once in one lap', () => {
    expect(lapOf(wholeRound(), 4)).toBe(true);
    const short = phone();
    for (let n = 0; n < 3; n += 1) short.shoot(n, 4 * FOOT);
    expect(lapOf(short, 4)).toBe(false);
  });
  it('is none any more after a station was adjusted and shot again, until a lap went round after that', () => {
    const made = wholeRound();
    made.shoot(2, 4 * FOOT);
    expect(lapOf(made, 4)).toBe(false);
    for (let n = 0; n < 4; n += 1) made.shoot(n, 4 * FOOT, { lap: 2 });
    expect(lapOf(made, 4)).toBe(true);
  });
  it('is none when a shot of it was set, not read', () => {
    const made = phone();
    for (let n = 0; n < 3; n += 1) made.shoot(n, 4 * FOOT);
    made.shoot(3, 4 * FOOT, { how: 'set', receiver: 'fine', keyed: '' });
    expect(lapOf(made, 4)).toBe(false);
  });
  it('is none when a later lap re-shot only some of it', () => {
    const made = wholeRound();
    made.shoot(0, 4 * FOOT, { lap: 2 });
    expect(lapOf(made, 4)).toBe(false);
  });
  it('still stands when the shot that was shot again had been struck out as misread', () => {
    const made = phone();
    made.shoot(0, 4 * FOOT);
    made.strike(made.shoot(1, 5 * FOOT));
    made.shoot(1, 4 * FOOT);
    expect(lapOf(made, 2)).toBe(true);
  });
});

describe('two phones', () => {
  const two = (second: number): FoldRecord[] => {
    const one = phone();
    one.shoot(0, 4 * FOOT);
    const other = phone(PHONE_B, SERIES_B, Date.UTC(2026, 11, 1, 9, 30));
    other.shoot(0, second);
    return [...stored(one.made), ...stored(other.made, { person: MIA })];
  };
  it('ask when they do not agree on one rail in one lap', () => {
    const state = foldRound(two(4 * FOOT + SIXTEENTH), contextOf(footingOf(1)));
    expect(state.disagreements).toEqual([{ key: `${stationId(0)}/centre`, shots: [expect.any(String), expect.any(String)] }]);
    expect(state.targets[0]?.deciding?.person).toEqual(MIA);
  });
  it('do not ask when they agree', () => {
    expect(foldRound(two(4 * FOOT), contextOf(footingOf(1))).disagreements).toEqual([]);
  });
  it('are named when their clocks were more than five minutes off', () => {
    const one = stored(phone().made, { clockSkew: 300_000 });
    const other = stored(phone(PHONE_B, SERIES_B).made, { clockSkew: -86_400_000 });
    expect(foldRound([...one, ...other], contextOf(footingOf(1))).clocksOff).toEqual([{ deviceId: PHONE_B, skew: -86_400_000 }]);
  });
});
