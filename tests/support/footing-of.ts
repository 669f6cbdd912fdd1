import { stationsAlong } from '@/analysis';
import { outlineInputSchema, type Footing, type Run } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import { readyBedRule } from '@/shared/rules';
import { stationName } from '@/shared/station-name';

const FOOT = 304_800_000;
export const JOB = '0198f000-0000-7000-8000-000000000001';
export const FOOTING = '0198f000-0000-7000-8000-000000000002';

/** An id of the test's own: v7 by shape. */
export const testId = (number: number) => `0198f000-0000-7000-8001-${String(number).padStart(12, '0')}`;

export const run = (number: number, feet: number, turn = 90): Run => ({
  id: testId(number),
  length: feet * FOOT,
  turn,
  width: null,
  thickness: null,
  steps: [],
});

/** The worked L: 44 × 30 ft with a corner of 20 × 8 ft missing. */
export const L_RUNS: Run[] = [run(1, 44), run(2, 30), run(3, 24), run(4, 8, -90), run(5, 20), run(6, 22)];

export function jobOf(change: Partial<Job> = {}): Job {
  return {
    id: JOB,
    name: 'Ninth Street addition',
    address: '',
    unitStyle: 'feet-inches',
    graduation: 1_587_500,
    wallType: 'block',
    createdAt: '2026-11-30T08:00:00Z',
    toleranceRules: [],
    bedRule: { ...readyBedRule('block', 'feet-inches'), id: testId(900), version: 1, createdAt: '2026-11-30T08:00:00Z' },
    benchmarks: [],
    footings: [],
    ...change,
  };
}

export function footingOf(change: Partial<Footing> = {}): Footing {
  return {
    id: FOOTING,
    jobId: JOB,
    name: 'Stepped footing',
    planGrade: 99.5 * FOOT,
    width: 2 * FOOT,
    thickness: FOOT,
    wallThickness: (2 * FOOT) / 3,
    measuredOn: 'wall-face',
    railOffset: 0,
    rails: 'centre',
    digNeeded: false,
    landmark: null,
    outlineVersion: 0,
    spacing: null,
    runs: [],
    stations: [],
    rounds: [],
    stages: { done: [], now: 'outline' },
    hasShots: false,
    ...change,
  };
}

/** The footing with stations laid out on the line that was keyed, as the server would name them. */
export function withStations(footing: Footing, spacing: number): Footing {
  const { runs } = outlineInputSchema.parse({ runs: footing.runs, version: footing.outlineVersion });
  const stations = stationsAlong(runs, spacing).map((station, position) => ({
    id: testId(100 + position),
    position,
    runId: station.run,
    at: station.station,
    name: stationName(station.station, 'feet-inches'),
    corner: station.corner,
    step: station.step,
    planGrade: footing.planGrade,
    x: station.x,
    y: station.y,
    points: [{ rail: 'centre' as const, x: station.x, y: station.y }],
  }));
  return { ...footing, spacing, stations };
}
