import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { endpoints } from '@/shared/api/endpoints';
import type { Footing, Run } from '@/shared/api/footing-schemas';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { FieldRecord } from '@/shared/records';
import type { Surface } from '@/shared/rules';
import type { TestApi } from './test-api';

export const INCH = 25_400_000;
export const FOOT = 12 * INCH;
export const SIXTEENTH = INCH / 16;

export const JOB = {
  name: 'Orchard Row',
  address: '7 Orchard Row',
  unitStyle: 'feet-inches',
  graduation: SIXTEENTH,
  wallType: 'block',
} as const satisfies z.input<typeof endpoints.addJob.body>;

export const FOOTING = {
  name: 'House',
  planGrade: 100 * FOOT,
  width: 20 * INCH,
  thickness: 8 * INCH,
  wallThickness: 8 * INCH,
  measuredOn: 'centre-line',
  railOffset: 0,
  rails: 'centre',
  digNeeded: false,
  landmark: null,
} as const satisfies z.input<typeof endpoints.addFooting.body>;

export const LASER = {
  name: 'Laser 1',
  accuracy: SIXTEENTH,
  accuracyAt: 100 * FOOT,
  receiverFine: SIXTEENTH,
  receiverCoarse: INCH / 8,
  checkedOn: '2026-11-02',
} as const satisfies z.input<typeof endpoints.addLaser.body>;

export const ROD = { name: '13 ft', style: 'feet-inches', graduation: INCH / 8, length: 13 * FOOT } as const;

/** Runs in feet: length, turn at the end, steps as [at, by]. */
export function runsOf(...runs: [length: number, turn: number, ...steps: [at: number, by: number][]][]): Run[] {
  return runs.map(([length, turn, ...steps]) => ({
    id: randomUUID(),
    length: length * FOOT,
    turn,
    width: null,
    thickness: null,
    steps: steps.map(([at, by]) => ({ id: randomUUID(), at: at * FOOT, by: by * FOOT })),
  }));
}

export const square = () => runsOf([20, 90], [20, 90], [20, 90], [20, 90]);

/** A job with a square footing of eight stations, instruments and a benchmark at the plan grade. */
export interface Site {
  jobId: string;
  footing: Footing;
  laserId: string;
  rodId: string;
  benchmarkId: string;
}

export async function buildSite(api: TestApi, token: string): Promise<Site> {
  const { id: jobId } = await api.ok('addJob', token, { body: JOB });
  const { id: laserId } = await api.ok('addLaser', token, { body: { ...LASER, name: `Laser ${randomUUID()}` } });
  const { id: rodId } = await api.ok('addRod', token, { body: { ...ROD, name: `Rod ${randomUUID()}` } });
  const benchmark = { name: 'BM 1', elevation: 100 * FOOT, note: '' };
  const { id: benchmarkId } = await api.ok('addBenchmark', token, { params: { jobId }, body: benchmark });
  const { id: footingId } = await api.ok('addFooting', token, { params: { jobId }, body: FOOTING });
  await api.ok('setOutline', token, { params: { footingId }, body: { runs: square(), version: 0 } });
  const footing = await api.ok('setStations', token, { params: { footingId }, body: { spacing: 10 * FOOT } });
  return { jobId, footing, laserId, rodId, benchmarkId };
}

export function openRound(api: TestApi, token: string, footingId: string, surface: Surface): Promise<RoundBundle> {
  return api.ok('openRound', token, { params: { footingId }, body: { id: randomUUID(), surface } });
}

/** A phone as tests have it: makes records with its own clock, which may be off. */
export class TestPhone {
  readonly deviceId = randomUUID();
  /** The setup and series that `begin` makes and every reading belongs to. */
  readonly setupId = randomUUID();
  readonly seriesId = randomUUID();
  private sequence = 0;

  constructor(
    private readonly site: Site,
    private readonly api: Pick<TestApi, 'clock'>,
    /** How far the phone's clock is ahead, ms. */
    public ahead = 0,
  ) {}

  get now(): number {
    return this.api.clock.now().getTime() + this.ahead;
  }

  stamp() {
    this.sequence += 1;
    return {
      id: randomUUID(),
      deviceId: this.deviceId,
      deviceSequence: this.sequence,
      clock: { wall: this.now, counter: 0 },
      madeAt: new Date(this.now).toISOString(),
    };
  }

  /** A setup, its series, and a backsight of 4 ft: HI 104 ft. */
  begin(): FieldRecord[] {
    const setup = { ...this.stamp(), id: this.setupId, kind: 'setup', laserId: this.site.laserId, stand: null } as const;
    const limits = { checkLimit: INCH / 8, benchmarkDistance: null };
    const own = { id: this.seriesId, setupId: this.setupId, rodId: this.site.rodId };
    const series = { ...this.stamp(), ...own, kind: 'series', ...limits } as const;
    return [setup, series, this.onBenchmark('backsight')];
  }

  onBenchmark(purpose: 'backsight' | 'check'): FieldRecord & { kind: 'reading' } {
    return this.reading({
      purpose,
      point: { kind: 'benchmark', benchmarkId: this.site.benchmarkId },
      keyed: `4' 0"`,
      reading: 4 * FOOT,
    });
  }

  /** A reading of 4 ft at a station: on grade. */
  shot(station: number, change: Partial<FieldRecord & { kind: 'reading' }> = {}): FieldRecord & { kind: 'reading' } {
    const stationId = this.site.footing.stations[station]?.id ?? 'no such station';
    return this.reading({
      purpose: 'shot',
      point: { kind: 'station', stationId, rail: 'centre' },
      keyed: `4' 0"`,
      reading: 4 * FOOT,
      ...change,
    });
  }

  strike(targetId: string): FieldRecord & { kind: 'strike' } {
    return { ...this.stamp(), kind: 'strike', targetId, reason: 'misread', words: '' };
  }

  private reading(
    own: Pick<FieldRecord & { kind: 'reading' }, 'purpose' | 'point' | 'keyed' | 'reading'>,
  ): FieldRecord & { kind: 'reading' } {
    const usual = {
      kind: 'reading',
      seriesId: this.seriesId,
      how: 'read',
      receiver: null,
      style: 'feet-inches',
      lap: 1,
    } as const;
    return { ...this.stamp(), ...usual, ...own };
  }

  body(...records: object[]) {
    return { sentAt: new Date(this.now).toISOString(), records: records as FieldRecord[] }; // some tests send what is no record
  }
}
