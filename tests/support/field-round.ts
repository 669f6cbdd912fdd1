import type { Footing, Station } from '@/shared/api/footing-schemas';
import type { FieldRecord, Rail, ReadingRecord, StoredRecord } from '@/shared/records';
import { readyToleranceRules, type Surface } from '@/shared/rules';
import type { FoldRecord, RoundContext } from '@/shared/round/round-state';

export const FOOT = 304_800_000;
export const INCH = 25_400_000;
export const SIXTEENTH = 1_587_500;

const hex = (n: number) => n.toString(16).padStart(12, '0');
/** Ids that read like UUIDs and say what they are by their first group. */
export const idOf = (kind: number, n: number) => `${kind.toString(16).padStart(8, '0')}-0000-7000-8000-${hex(n)}`;
export const stationId = (n: number) => idOf(0x57, n);
export const BENCHMARK = idOf(0xb3, 1);
export const LASER = idOf(0x1a, 1);
export const ROD = idOf(0x2d, 1);
export const PHONE_A = idOf(0xa0, 1);
export const PHONE_B = idOf(0xb0, 1);
export const RAY = { id: idOf(0x9e, 1), name: 'Ray Oduya' };
export const MIA = { id: idOf(0x9e, 2), name: 'Mia Tran' };

/** A strip of stations 8 ft apart; benchmark 100′ 0″, plan grade 100′ 0″ unless said. */
export function footingOf(count: number, change: Partial<Footing> = {}): Footing {
  const runId = idOf(0x40, 1);
  const rails: Rail[] = change.rails === 'both' ? ['outer', 'inner'] : ['centre'];
  const stations = Array.from({ length: count }, (_, n): Station => {
    const x = n * 8 * FOOT;
    return {
      id: stationId(n),
      position: n,
      runId,
      at: x,
      name: `0+${String(n * 8).padStart(2, '0')}`,
      corner: n === 0 ? 'A' : null,
      step: null,
      planGrade: 100 * FOOT,
      x,
      y: 0,
      points: rails.map((rail, place) => ({ rail, x, y: place * FOOT })),
    };
  });
  return {
    id: idOf(0xf0, 1),
    jobId: idOf(0x10, 1),
    name: 'North strip',
    planGrade: 100 * FOOT,
    width: 20 * INCH,
    thickness: 10 * INCH,
    wallThickness: 8 * INCH,
    measuredOn: 'centre-line',
    railOffset: 0,
    rails: 'centre',
    digNeeded: true,
    landmark: null,
    outlineVersion: 1,
    spacing: 8 * FOOT,
    runs: [{ id: runId, length: Math.max(count - 1, 1) * 8 * FOOT, turn: 0, width: null, thickness: null, steps: [] }],
    rounds: [],
    stages: { done: ['outline'], now: 'rails' },
    hasShots: false,
    ...change,
    stations: change.stations ?? stations,
  };
}

export function contextOf(footing: Footing, surface: Surface = 'rails', change: Partial<RoundContext> = {}): RoundContext {
  return {
    job: { id: footing.jobId, name: 'Pond Road shop', unitStyle: 'feet-inches', graduation: SIXTEENTH, wallType: 'block' },
    footing,
    benchmarks: [{ id: BENCHMARK, jobId: footing.jobId, name: 'BM 1', elevation: 100 * FOOT, note: '', version: 1 }],
    lasers: [
      {
        id: LASER,
        name: 'Yellow one',
        accuracy: SIXTEENTH,
        accuracyAt: 100 * FOOT,
        receiverFine: SIXTEENTH,
        receiverCoarse: 2 * SIXTEENTH,
        checkedOn: null,
      },
    ],
    rods: [{ id: ROD, name: 'Long rod', style: 'feet-inches', graduation: SIXTEENTH, length: 15 * FOOT }],
    toleranceRule: {
      ...readyToleranceRules('feet-inches')[surface],
      id: idOf(0x7e, 1),
      surface,
      version: 1,
      createdAt: '2026-11-30T12:00:00.000Z',
    },
    surface,
    ...change,
  };
}

const START = Date.UTC(2026, 11, 1, 9, 0, 0);
type Draft<R> = R extends FieldRecord ? Omit<R, 'deviceId' | 'deviceSequence' | 'clock' | 'madeAt'> : never;

/** One phone writing records; each has the next sequence number and, unless said, a clock a second on. */
export class Phone {
  private sequence = 0;
  readonly made: FieldRecord[] = [];
  constructor(
    readonly deviceId: string,
    readonly seriesId: string,
    private readonly startAt = START,
  ) {}

  write(draft: Draft<FieldRecord>): FieldRecord {
    this.sequence += 1;
    const wall = this.startAt + this.sequence * 1000;
    const record: FieldRecord = {
      ...draft,
      deviceId: this.deviceId,
      deviceSequence: this.sequence,
      clock: { wall, counter: 0 },
      madeAt: new Date(wall).toISOString(),
    };
    this.made.push(record);
    return record;
  }

  nextId(): string {
    return `${this.deviceId.slice(0, 24)}${hex(this.sequence + 1)}`;
  }

  setUp(): void {
    const setupId = `${this.seriesId.slice(0, 24)}${hex(0xffff)}`;
    this.write({ kind: 'setup', id: setupId, laserId: LASER, stand: { x: 0, y: 0 } });
    this.write({
      kind: 'series',
      id: this.seriesId,
      setupId,
      rodId: ROD,
      checkLimit: 2 * SIXTEENTH,
      benchmarkDistance: 20 * FOOT,
    });
  }

  read(purpose: ReadingRecord['purpose'], point: ReadingRecord['point'], reading: number, change: Partial<ReadingRecord> = {}) {
    return this.write({
      kind: 'reading',
      id: this.nextId(),
      seriesId: this.seriesId,
      purpose,
      point,
      how: 'read',
      receiver: null,
      keyed: 'as read',
      style: 'feet-inches',
      reading,
      lap: 1,
      ...change,
    });
  }

  backsight(reading: number) {
    return this.read('backsight', { kind: 'benchmark', benchmarkId: BENCHMARK }, reading);
  }
  check(reading: number) {
    return this.read('check', { kind: 'benchmark', benchmarkId: BENCHMARK }, reading);
  }
  shoot(station: number, reading: number, change: Partial<ReadingRecord> = {}, rail: Rail = 'centre') {
    return this.read('shot', { kind: 'station', stationId: stationId(station), rail }, reading, change);
  }
  strike(target: FieldRecord) {
    return this.write({ kind: 'strike', id: this.nextId(), targetId: target.id, reason: 'misread', words: '' });
  }
}

/** As the server hands records out: receipts in the order given. */
export function stored(records: readonly FieldRecord[], change: Partial<StoredRecord['receipt']> = {}): StoredRecord[] {
  return records.map((record, n) => ({
    record,
    receipt: {
      roundSequence: n + 1,
      receivedAt: new Date(record.clock.wall + 500).toISOString(),
      orderedAt: record.clock.wall,
      clockSkew: 0,
      person: RAY,
      ...change,
    },
  }));
}

/** As they lie on the phone. */
export function local(records: readonly FieldRecord[]): FoldRecord[] {
  return records.map((record) => ({ record, receipt: null, orderedAt: record.clock.wall, person: RAY }));
}
