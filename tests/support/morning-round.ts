import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { FoldRecord } from '@/shared/round/round-state';
import { FOOT, SIXTEENTH, STATIONS } from './morning-footing';

const at = '2026-12-01T08:00:00Z';
const id = (kind: number, number: number) =>
  `0198f000-0000-7000-8${String(kind).padStart(3, '0')}-${String(number).padStart(12, '0')}`;

/** Names of the things of the worked footing. */
export const ids = {
  job: id(1, 1),
  footing: id(2, 1),
  round: id(3, 1),
  benchmark: id(4, 1),
  laser: id(5, 1),
  rod: id(6, 1),
  station: (index: number) => id(7, index),
  run: (index: number) => id(8, index),
  setup: id(9, 1),
  series: id(9, 2),
  device: id(10, 1),
  person: id(11, 1),
};

const INCH = 16 * SIXTEENTH;
const RUNS = [
  { length: 44, turn: 90, corner: 'A', from: 0, stations: 6 },
  { length: 30, turn: 90, corner: 'B', from: 6, stations: 4 },
  { length: 24, turn: 90, corner: 'C', from: 10, stations: 3 },
  { length: 8, turn: -90, corner: 'D', from: 13, stations: 1 },
  { length: 20, turn: 90, corner: 'E', from: 14, stations: 3 },
  { length: 22, turn: 90, corner: 'F', from: 17, stations: 3 },
];

/** The footing of morning-footing.ts as a phone holds it: top round, rules ±1/8″ and beds 1/4″ to 3/4″, 8 in courses. */
export function morningBundle(): RoundBundle {
  let walked = 0;
  const stations = RUNS.flatMap((run, runIndex) => {
    const start = walked;
    walked += run.length;
    return STATIONS.slice(run.from, run.from + run.stations).map((station, index) => ({
      id: ids.station(run.from + index),
      position: run.from + index,
      runId: ids.run(runIndex),
      at: Math.round((start + (run.length / run.stations) * index) * FOOT),
      name: station.name.replace(/^[A-F], /, ''),
      corner: index === 0 ? run.corner : null,
      step: null,
      planGrade: 100 * FOOT,
      x: station.x * FOOT,
      y: station.y * FOOT,
      points: [{ rail: 'centre' as const, x: station.x * FOOT, y: station.y * FOOT }],
    }));
  });
  return {
    round: {
      id: ids.round,
      footingId: ids.footing,
      surface: 'top',
      number: 1,
      openedAt: at,
      openedBy: 'Nadia Brandt',
      closedAt: null,
      shot: 0,
      of: STATIONS.length,
      out: 0,
      verdict: 'not-yet',
    },
    job: { id: ids.job, name: 'Quarry Lane duplex', unitStyle: 'feet-inches', graduation: SIXTEENTH, wallType: 'block' },
    footing: {
      id: ids.footing,
      jobId: ids.job,
      name: 'Unit B footing',
      planGrade: 100 * FOOT,
      width: 16 * INCH,
      thickness: 8 * INCH,
      wallThickness: 8 * INCH,
      measuredOn: 'centre-line',
      railOffset: 0,
      rails: 'centre',
      digNeeded: false,
      landmark: { name: 'Mill St', azimuth: 90 },
      outlineVersion: 1,
      spacing: 8 * FOOT,
      runs: RUNS.map((run, index) => ({
        id: ids.run(index),
        length: run.length * FOOT,
        turn: run.turn,
        width: null,
        thickness: null,
        steps: [],
      })),
      stations,
      rounds: [],
      stages: { done: ['outline', 'dig'], now: 'rails' },
      hasShots: true,
    },
    benchmarks: [{ id: ids.benchmark, jobId: ids.job, name: 'BM 1', elevation: 101 * FOOT + 2 * INCH, note: '', version: 1 }],
    lasers: [
      {
        id: ids.laser,
        name: 'Yard laser',
        accuracy: SIXTEENTH,
        accuracyAt: 100 * FOOT,
        receiverFine: SIXTEENTH,
        receiverCoarse: 2 * SIXTEENTH,
        checkedOn: '2026-11-20',
      },
    ],
    rods: [{ id: ids.rod, name: 'Rod 1', style: 'feet-inches', graduation: SIXTEENTH, length: 13 * FOOT }],
    toleranceRule: {
      id: id(12, 1),
      surface: 'top',
      version: 1,
      low: 2 * SIXTEENTH,
      high: 2 * SIXTEENTH,
      decision: 'simple',
      style: 'feet-inches',
      createdAt: at,
    },
    bedRule: {
      id: id(12, 2),
      version: 1,
      material: 'mortar',
      least: 4 * SIXTEENTH,
      most: 12 * SIXTEENTH,
      nominal: 6 * SIXTEENTH,
      grindMost: 4 * SIXTEENTH,
      beddedFraction: 1,
      courseHeight: 8 * INCH,
      style: 'feet-inches',
      createdAt: at,
    },
  };
}

/** Setup, series, backsight 3′ 5 3/8″, a shot at every station, and a good closing check; `offs` in sixteenths, high positive. */
export function morningRecords(offs: readonly number[] = STATIONS.map((station) => station.off)): FoldRecord[] {
  const backsight = 3 * FOOT + 5 * INCH + 6 * SIXTEENTH;
  const gradeRod = 4 * FOOT + 7 * INCH + 6 * SIXTEENTH;
  let sequence = 0;
  const made = () => {
    sequence += 1;
    return {
      deviceId: ids.device,
      deviceSequence: sequence,
      clock: { wall: 1_764_576_000_000 + sequence * 60_000, counter: 0 },
      madeAt: at,
    };
  };
  const reading = (number: number, purpose: 'backsight' | 'shot' | 'check', length: number, station?: number) => ({
    ...made(),
    id: id(13, number),
    kind: 'reading' as const,
    seriesId: ids.series,
    purpose,
    point:
      station === undefined
        ? { kind: 'benchmark' as const, benchmarkId: ids.benchmark }
        : { kind: 'station' as const, stationId: ids.station(station), rail: 'centre' as const },
    how: 'read' as const,
    receiver: null,
    keyed: '',
    style: 'feet-inches' as const,
    reading: length,
    lap: 1,
  });
  const records = [
    { ...made(), id: ids.setup, kind: 'setup' as const, laserId: ids.laser, stand: { x: 30 * FOOT, y: -12 * FOOT } },
    {
      ...made(),
      id: ids.series,
      kind: 'series' as const,
      setupId: ids.setup,
      rodId: ids.rod,
      checkLimit: SIXTEENTH,
      benchmarkDistance: 40 * FOOT,
    },
    reading(100, 'backsight', backsight),
    ...offs.map((off, index) => reading(index, 'shot', gradeRod - off * SIXTEENTH, index)),
    reading(101, 'check', backsight),
  ];
  return records.map((record, index) => ({
    record,
    receipt: {
      roundSequence: index + 1,
      receivedAt: at,
      orderedAt: record.clock.wall,
      clockSkew: 0,
      person: { id: ids.person, name: 'Nadia Brandt' },
    },
  }));
}
