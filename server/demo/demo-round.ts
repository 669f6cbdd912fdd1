import type { Nm } from '@/analysis';
import type { Footing } from '@/shared/api/footing-schemas';
import { placesInWalkingOrder, type Place } from '@/shared/round/round-targets';
import type { Surface } from '@/shared/rules';
import { newId } from '../dependencies';
import { readFooting } from '../features/footings/footing-service';
import { changeRound, openRound } from '../features/rounds/round-service';
import type { DemoCrew, DemoRole } from './demo-crew';
import { DemoPhone, type DemoReading, type DemoRod } from './demo-phone';
import type { DemoSources } from './demo-sources';

export interface DemoSetup {
  laserId: string;
  rod: DemoRod;
  benchmark: { id: string; elevation: Nm };
  /** Rod reading on the benchmark, nm: how high the laser stands. */
  backsight: Nm;
  checkLimit: Nm;
  benchmarkDistance: Nm;
  stand: { x: Nm; y: Nm };
}

/** Once round, or as far as `upTo` places. `off`: how far above its grade each place is read, nm, whole marks of the rod. */
export interface DemoLap {
  how: DemoReading['how'];
  upTo?: number;
  off(place: Place, index: number): Nm;
  /** A shot of this place that is struck out again before the right one: what it said, and why. */
  struck?: { index: number; by: Nm; reason: 'misread' | 'wrong-station'; words: string };
}

export interface DemoRound {
  surface: Surface;
  role: DemoRole;
  at: string;
  setup: DemoSetup;
  laps: readonly DemoLap[];
  /** Ends with a good check on the benchmark, and is closed. */
  finished: boolean;
}

/** The benchmark is read again after so many shots. */
const CHECK_EVERY = 12;

/** Shoots a round from backsight to last check, on a phone of its own, through the records that phones send. */
export async function shootRound(crew: DemoCrew, sources: DemoSources, footingId: string, round: DemoRound): Promise<void> {
  sources.moveTo(round.at);
  const id = newId(sources);
  await crew.as(round.role, (tenant) => openRound(tenant, footingId, { id, surface: round.surface }));
  const footing = await crew.as(round.role, (tenant) => readFooting(tenant, footingId));
  sources.pass(5);
  const phone = new DemoPhone(sources);
  readAll(phone, footing, round);
  sources.pass(2);
  await crew.as(round.role, (tenant) => phone.send(tenant, id));
  if (!round.finished) return;
  sources.pass(1);
  await crew.as(round.role, (tenant) => changeRound(tenant, id, true));
}

function readAll(phone: DemoPhone, footing: Footing, { surface, setup, laps, finished }: DemoRound): void {
  const read = phone.startSeries(phone.setUp(setup.laserId, setup.stand), setup.rod, {
    checkLimit: setup.checkLimit,
    benchmarkDistance: setup.benchmarkDistance,
  });
  const benchmark = { kind: 'benchmark', benchmarkId: setup.benchmark.id } as const;
  const hi = setup.benchmark.elevation + setup.backsight;
  read({ purpose: 'backsight', point: benchmark, reading: setup.backsight });
  const places = placesInWalkingOrder(footing, surface);
  laps.forEach((lap, lapIndex) => {
    places.slice(0, lap.upTo ?? places.length).forEach((place, index) => {
      const point = { kind: 'station', stationId: place.stationId, rail: place.rail } as const;
      const shot = { purpose: 'shot', point, how: lap.how, lap: lapIndex + 1 } as const;
      const reading = hi - place.grade - lap.off(place, index);
      if (lap.struck?.index === index) {
        phone.strike(read({ ...shot, reading: reading - lap.struck.by }), lap.struck.reason, lap.struck.words);
      }
      read({ ...shot, reading });
      if ((index + 1) % CHECK_EVERY === 0) read({ purpose: 'check', point: benchmark, reading: setup.backsight });
    });
  });
  if (finished) read({ purpose: 'check', point: benchmark, reading: setup.backsight });
}
