import { array, assert, constant, infiniteStream, integer, nat, oneof, property, record, type Arbitrary } from 'fast-check';
import type { FieldRecord } from '@/shared/records';
import { foldRound } from '@/shared/round/fold-round';
import { orderRecords } from '@/shared/round/order-records';
import type { FoldRecord, RoundState } from '@/shared/round/round-state';
import { contextOf, FOOT, footingOf, idOf, local, Phone, PHONE_A, PHONE_B, SIXTEENTH, stored } from '../../support/field-round';

const STATIONS = 5;
const context = contextOf(footingOf(STATIONS));
const SERIES = idOf(0x5e, 1);

const step = oneof(
  {
    weight: 6,
    arbitrary: record({
      do: constant('shoot' as const),
      station: nat(STATIONS - 1),
      off: integer({ min: -6, max: 6 }),
      lap: integer({ min: 1, max: 2 }),
    }),
  },
  { weight: 1, arbitrary: record({ do: constant('check' as const), off: integer({ min: -4, max: 4 }) }) },
  { weight: 1, arbitrary: record({ do: constant('strike' as const), back: nat(5) }) },
);
const morning = array(step, { maxLength: 25 });

function walk(
  steps: readonly (typeof step extends Arbitrary<infer T> ? T : never)[],
  deviceId = PHONE_A,
  seriesId = SERIES,
): Phone {
  const phone = new Phone(deviceId, seriesId);
  phone.setUp();
  phone.backsight(4 * FOOT);
  for (const one of steps) {
    const readings = phone.made.filter((record) => record.kind === 'reading' && record.purpose !== 'backsight');
    if (one.do === 'shoot') phone.shoot(one.station, 4 * FOOT + one.off * SIXTEENTH, { lap: one.lap });
    else if (one.do === 'check') phone.check(4 * FOOT + one.off * SIXTEENTH);
    else {
      const target = readings.at(-1 - one.back);
      if (target) phone.strike(target);
    }
  }
  return phone;
}

/** What a round comes to, without the times that are only shown. */
const result = (state: RoundState) => ({
  targets: state.targets.map((target) => ({
    deciding: target.deciding?.id,
    shots: target.shots.map(({ id, deviation, laser, decides, verdict, close }) => ({
      id,
      deviation,
      laser,
      decides,
      verdict,
      close,
    })),
  })),
  series: state.series.map(({ id, hi, laser, checks }) => ({
    id,
    hi,
    laser,
    checks: checks.map(({ id, error, holds }) => ({ id, error, holds })),
  })),
  counts: [state.shot, state.out, state.close, state.verdict, state.wholeReadLap],
  lap: state.lap,
});

describe('property tests of the fold', () => {
  it('no order of clocks changes a result on one device', () => {
    assert(
      property(morning, infiniteStream(integer({ min: 0, max: 4_000_000_000_000 })), (steps, clocks) => {
        const { made } = walk(steps);
        const times = clocks[Symbol.iterator]();
        const time = () => times.next().value as number; // an infinite stream never ends
        const off = local(made).map((entry) => ({ ...entry, orderedAt: time() })) as FoldRecord[]; // still local: receipt null
        const served = stored(made).map((entry) => ({ ...entry, receipt: { ...entry.receipt, orderedAt: time() } }));
        const expected = result(foldRound(local(made), context));
        expect(result(foldRound(off, context))).toEqual(expected);
        expect(result(foldRound(served, context))).toEqual(expected);
      }),
    );
  });

  it('no order in which records arrive changes a result, not with two devices either', () => {
    assert(
      property(morning, morning, infiniteStream(nat()), (steps, others, numbers) => {
        const all: FoldRecord[] = [...stored(walk(steps).made), ...stored(walk(others, PHONE_B, idOf(0x5f, 1)).made)];
        const keys = numbers[Symbol.iterator]();
        const shuffled = all
          .map((entry) => ({ entry, key: keys.next().value as number })) // an infinite stream never ends
          .sort((one, other) => one.key - other.key)
          .map(({ entry }) => entry);
        expect(foldRound(shuffled, context)).toEqual(foldRound(all, context));
      }),
    );
  });

  it('a struck shot never changes a result except by its absence', () => {
    assert(
      property(morning, (steps) => {
        const { made } = walk(steps);
        const struck = new Set(made.flatMap((record) => (record.kind === 'strike' ? [record.targetId] : [])));
        const without = made.filter((record) => record.kind !== 'strike' && !struck.has(record.id));
        const standing = (state: RoundState) => {
          const { targets, ...rest } = result(state);
          return {
            ...rest,
            targets: targets.map((target) => ({ ...target, shots: target.shots.filter((shot) => !struck.has(shot.id)) })),
          };
        };
        expect(standing(foldRound(local(made), context))).toEqual(standing(foldRound(local(without), context)));
      }),
    );
  });

  it('records that the server has and those still on the phone fold alike', () => {
    assert(
      property(morning, nat(30), (steps, cut) => {
        const { made } = walk(steps);
        const halves: FoldRecord[] = [...stored(made.slice(0, cut)), ...local(made.slice(cut))];
        expect(result(foldRound(halves, context))).toEqual(result(foldRound(stored(made), context)));
      }),
    );
  });

  it('the order of records never reorders a device, and is the same whatever order they are given in', () => {
    assert(
      property(morning, morning, (steps, others) => {
        const records: FieldRecord[] = [...walk(steps).made, ...walk(others, PHONE_B, idOf(0x5f, 1)).made];
        const ordered = orderRecords(stored(records)).map(({ record }) => record);
        expect(orderRecords(stored(records).reverse()).map(({ record }) => record)).toEqual(ordered);
        for (const deviceId of [PHONE_A, PHONE_B]) {
          const own = ordered.filter((record) => record.deviceId === deviceId).map((record) => record.deviceSequence);
          expect(own).toEqual([...own].sort((one, other) => one - other));
        }
      }),
    );
  });
});
