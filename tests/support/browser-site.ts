import { randomUUID } from 'node:crypto';
import type { Footing, Run } from '@/shared/api/footing-schemas';
import type { FieldRecord } from '@/shared/records';
import { USUAL_GRADUATION, type UnitStyle } from '@/shared/quantities';
import { FOOT, FOOTING, JOB, LASER, square } from '../server/support/site';
import type { ProductApi } from './product-api';

const METRE = 1_000_000_000;

/** What a rod of each style is: 13 ft, 13.00 ft or 4 m long, read to 1/16 in, 0.01 ft or 1 mm. */
export const ROD_LENGTH: Record<UnitStyle, number> = { 'feet-inches': 13 * FOOT, 'decimal-feet': 13 * FOOT, metric: 4 * METRE };

/** One job with what shooting needs: a laser, one rod of its style, and BM 1. */
export interface BrowserSite {
  api: ProductApi;
  style: UnitStyle;
  jobId: string;
  benchmarkId: string;
  laserId: string;
  rodId: string;
}

/** Lays a job with everything that a round of it needs but a footing. */
export async function laySite(api: ProductApi, style: UnitStyle): Promise<BrowserSite> {
  const graduation = USUAL_GRADUATION[style];
  const { id: jobId } = await api.call('addJob', {
    body: { ...JOB, name: `Orchard Row, ${style}`, unitStyle: style, graduation },
  });
  const { id: laserId } = await api.call('addLaser', { body: { ...LASER, name: `Laser for ${style}` } });
  const { id: rodId } = await api.call('addRod', {
    body: { name: `Rod in ${style}`, style, graduation, length: ROD_LENGTH[style] },
  });
  const benchmark = { name: 'BM 1', elevation: 100 * FOOT, note: '' };
  const { id: benchmarkId } = await api.call('addBenchmark', { params: { jobId }, body: benchmark });
  return { api, style, jobId, benchmarkId, laserId, rodId };
}

/** A footing with stations no further apart than `spacing`, and its outline; a square of 20 ft unless said. Its plan grade is BM 1's. */
export async function layFooting(
  { api, jobId }: BrowserSite,
  { runs = square(), spacing = 10 * FOOT }: { runs?: Run[]; spacing?: number } = {},
): Promise<Footing> {
  const { id: footingId } = await api.call('addFooting', {
    params: { jobId },
    body: { ...FOOTING, name: `House ${randomUUID()}` },
  });
  if (runs.length === 0) return api.call('footing', { params: { footingId } });
  await api.call('setOutline', { params: { footingId }, body: { runs, version: 0 } });
  return api.call('setStations', { params: { footingId }, body: { spacing } });
}

/** Opens a round of the top; answers its id. */
export async function openTop({ api }: BrowserSite, footing: Footing): Promise<string> {
  const { round } = await api.call('openRound', {
    params: { footingId: footing.id },
    body: { id: randomUUID(), surface: 'top' },
  });
  return round.id;
}

export interface Readings {
  /** Leave the backsight out: a setup that nothing can be shot from. */
  backsight?: boolean;
  /** Readings off grade at the footing's first stations, nm, high positive. */
  offs?: readonly number[];
}

/** What another device of the same person has recorded in a round: a setup, its series, a backsight of 4 ft or 1.2 m, shots. */
export async function recordRound(
  site: BrowserSite,
  footing: Footing,
  roundId: string,
  { backsight = true, offs = [] }: Readings,
) {
  const records = recordsOf(site, footing, { backsight, offs });
  const body = { sentAt: new Date().toISOString(), records };
  const { answers } = await site.api.call('sendRecords', { params: { roundId }, body });
  const rejected = answers.find(({ answer }) => answer !== 'stored');
  if (rejected) throw new Error(`a record of the round was not stored: ${JSON.stringify(rejected)}`);
}

function recordsOf(site: BrowserSite, footing: Footing, { backsight, offs }: Required<Readings>): FieldRecord[] {
  const deviceId = randomUUID();
  let sequence = 0;
  const made = () => {
    sequence += 1;
    const wall = Date.now();
    return {
      id: randomUUID(),
      deviceId,
      deviceSequence: sequence,
      clock: { wall, counter: sequence },
      madeAt: new Date(wall).toISOString(),
    };
  };
  const setup = { ...made(), kind: 'setup', laserId: site.laserId, stand: null } as const;
  const limits = { checkLimit: USUAL_GRADUATION[site.style], benchmarkDistance: null };
  const series = { ...made(), kind: 'series', setupId: setup.id, rodId: site.rodId, ...limits } as const;
  // The plan grade is BM 1's elevation, so that this is the grade rod as well.
  const onGrade = site.style === 'metric' ? 1.2 * METRE : 4 * FOOT;
  const read = { kind: 'reading', seriesId: series.id, how: 'read', receiver: null, style: site.style, lap: 1 } as const;
  const reading = (length: number) => ({ keyed: keyedOf(length, site.style), reading: length });
  return [
    setup,
    series,
    ...(backsight
      ? [
          {
            ...{ ...made(), ...read, ...reading(onGrade), purpose: 'backsight' as const },
            point: { kind: 'benchmark' as const, benchmarkId: site.benchmarkId },
          },
        ]
      : []),
    ...offs.map((off, index) => ({
      ...{ ...made(), ...read, ...reading(onGrade - off), purpose: 'shot' as const },
      point: { kind: 'station' as const, stationId: footing.stations[index]?.id ?? 'no such station', rail: 'centre' as const },
    })),
  ];
}

/** A reading as it was keyed, in sixteenths of an inch, hundredths of a foot or millimetres. */
function keyedOf(length: number, style: UnitStyle): string {
  if (style === 'metric') return `${length / 1_000_000} mm`;
  if (style === 'decimal-feet') return (length / FOOT).toFixed(2);
  const sixteenths = Math.round(length / 1_587_500);
  return `${Math.floor(sixteenths / 192)} ${Math.floor((sixteenths % 192) / 16)} ${sixteenths % 16}/16`;
}
