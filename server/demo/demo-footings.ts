import type { Nm } from '@/analysis';
import type { Place } from '@/shared/round/round-targets';
import type { DemoCrew } from './demo-crew';
import type { DemoInstruments } from './demo-instruments';
import { FOOT, HUNDREDTH, INCH, METRE, MM, SIXTEENTH } from './demo-lengths';
import { shootRound, type DemoSetup } from './demo-round';
import { layFooting, openJob } from './demo-site';
import type { DemoSources } from './demo-sources';

interface Demo {
  crew: DemoCrew;
  sources: DemoSources;
  instruments: DemoInstruments;
}

/** Most readings are right to the mark; some are one mark off, as rails and rods are. */
function jitter({ sources }: Demo, mark: Nm): Nm {
  const chance = sources.chance();
  return chance < 0.18 ? -mark : chance > 0.82 ? mark : 0;
}

const wholeMarks = (length: Nm, mark: Nm): Nm => Math.round(length / mark) * mark;

/**
 * Orchard Row: an L set with a laser out of level. Its rails read well against that laser, which is out with them; the top, shot
 * by the installer with another, falls toward the street.
 */
export async function orchardRow(demo: Demo): Promise<void> {
  const { crew, sources, instruments } = demo;
  sources.moveTo('2026-11-09T13:10:00Z');
  const { jobId, benchmark } = await openJob(
    crew,
    { name: 'Orchard Row, lot 7', address: '7 Orchard Row', unitStyle: 'feet-inches', graduation: SIXTEENTH, wallType: 'block' },
    { name: 'BM 1', elevation: 100 * FOOT + 8 * INCH, note: 'Bolt on the hydrant across the street' },
  );
  const ell = await layFooting(
    crew,
    jobId,
    {
      name: 'House',
      planGrade: 100 * FOOT,
      width: 20 * INCH,
      thickness: 8 * INCH,
      wallThickness: 8 * INCH,
      measuredOn: 'wall-face',
      railOffset: 0,
      rails: 'centre',
      digNeeded: false,
      landmark: { name: 'Mill St', azimuth: 90 },
    },
    { runs: walk([44, 90], [30, 90], [24, 90], [8, -90], [20, 90], [22, 90]), spacing: 8 * FOOT },
  );
  const near: DemoSetup = {
    laserId: instruments.loaner,
    rod: instruments.inches,
    benchmark,
    backsight: 3 * FOOT + 11 * INCH + 6 * SIXTEENTH,
    checkLimit: INCH / 8,
    benchmarkDistance: 62 * FOOT,
    stand: { x: 24 * FOOT, y: -14 * FOOT },
  };
  const set = { how: 'set', off: () => 0 } as const;
  const read = { how: 'read', off: () => jitter(demo, SIXTEENTH) } as const;
  await shootRound(crew, sources, ell, {
    surface: 'rails',
    role: 'operator',
    at: '2026-11-12T14:05:00Z',
    setup: near,
    laps: [set, read],
    finished: true,
  });
  const good = { ...near, laserId: instruments.good, backsight: 4 * FOOT + 2 * INCH + 9 * SIXTEENTH };
  const tilted = (place: Place) =>
    wholeMarks(-0.1 * INCH - (place.x / FOOT - 22) * (0.42 / 44) * INCH + 0.2 * jitter(demo, INCH / 8), SIXTEENTH);
  await shootRound(crew, sources, ell, {
    surface: 'top',
    role: 'installer',
    at: '2026-11-17T15:20:00Z',
    setup: good,
    laps: [{ how: 'read', off: tilted }],
    finished: true,
  });
  await garage(demo, jobId, { ...near, laserId: instruments.good });
}

/** Beside it the garage: rails whole and well set, but one corner keyed an inch off. */
async function garage(demo: Demo, jobId: string, setup: DemoSetup): Promise<void> {
  const { crew, sources } = demo;
  sources.moveTo('2026-11-23T13:40:00Z');
  const id = await layFooting(
    crew,
    jobId,
    {
      name: 'Garage',
      planGrade: 99 * FOOT + 4 * INCH,
      width: 16 * INCH,
      thickness: 8 * INCH,
      wallThickness: 8 * INCH,
      measuredOn: 'wall-face',
      railOffset: 0,
      rails: 'centre',
      digNeeded: false,
      landmark: { name: 'Mill St', azimuth: 90 },
    },
    { runs: walk([24, 90], [22, 90], [24, 90], [22, 90]), spacing: 6 * FOOT },
  );
  const misread = (_place: Place, index: number) => (index === 8 ? -INCH : jitter(demo, SIXTEENTH));
  await shootRound(crew, sources, id, {
    surface: 'rails',
    role: 'operator',
    at: '2026-11-25T14:30:00Z',
    setup: { ...setup, backsight: 3 * FOOT + 4 * INCH + 11 * SIXTEENTH, stand: { x: 12 * FOOT, y: -11 * FOOT } },
    laps: [{ how: 'read', off: misread }],
    finished: true,
  });
}

/** The barn steps down the hill by three courses and up again; its dig is in, its rails are half shot. */
export async function hillsideBarn(demo: Demo): Promise<void> {
  const { crew, sources, instruments } = demo;
  sources.moveTo('2026-11-24T13:00:00Z');
  const { jobId, benchmark } = await openJob(
    crew,
    { name: 'Hillside barn', address: '410 Upper Creek Rd', unitStyle: 'decimal-feet', graduation: HUNDREDTH, wallType: 'block' },
    { name: 'BM oak', elevation: 212.4 * FOOT, note: 'Spike in the oak by the gate' },
  );
  const id = await layFooting(
    crew,
    jobId,
    {
      name: 'Barn',
      planGrade: 210 * FOOT,
      width: 2 * FOOT,
      thickness: FOOT,
      wallThickness: 8 * INCH,
      measuredOn: 'centre-line',
      railOffset: 0,
      rails: 'centre',
      digNeeded: true,
      landmark: { name: 'the creek', azimuth: 180 },
    },
    {
      runs: walk([40, 90], [28, 90, { at: 12, by: -2 }], [40, 90], [28, 90, { at: 16, by: 2 }]),
      spacing: 8 * FOOT,
    },
  );
  const setup: DemoSetup = {
    laserId: instruments.good,
    rod: instruments.feet,
    benchmark,
    backsight: 3.27 * FOOT,
    checkLimit: HUNDREDTH,
    benchmarkDistance: 55 * FOOT,
    stand: { x: 20 * FOOT, y: -10 * FOOT },
  };
  const dug = () => wholeMarks(-0.02 * FOOT * sources.chance() - 0.01 * FOOT, HUNDREDTH);
  await shootRound(crew, sources, id, {
    surface: 'dig',
    role: 'operator',
    at: '2026-11-27T14:15:00Z',
    setup,
    laps: [{ how: 'read', off: dug }],
    finished: true,
  });
  const high = (_place: Place, index: number) =>
    index === 4 ? 3 * HUNDREDTH : index === 9 ? -2 * HUNDREDTH : jitter(demo, HUNDREDTH);
  await shootRound(crew, sources, id, {
    surface: 'rails',
    role: 'operator',
    at: '2026-11-30T14:50:00Z',
    setup: { ...setup, backsight: 3.41 * FOOT },
    laps: [{ how: 'read', upTo: 14, off: high }],
    finished: false,
  });
}

/** A workshop in millimetres with nothing wrong with it, rails and top: one rod on the wrong station, struck out. */
export async function northWorkshop(demo: Demo): Promise<void> {
  const { crew, sources, instruments } = demo;
  sources.moveTo('2026-11-16T13:30:00Z');
  const { jobId, benchmark } = await openJob(
    crew,
    { name: 'North workshop', address: 'Field 3, Reed Lane', unitStyle: 'metric', graduation: MM, wallType: 'foam-forms' },
    { name: 'BM 3', elevation: 48.25 * METRE, note: 'Brass disc in the culvert head' },
  );
  const id = await layFooting(
    crew,
    jobId,
    {
      name: 'Workshop',
      planGrade: 47.6 * METRE,
      width: 500 * MM,
      thickness: 250 * MM,
      wallThickness: 280 * MM,
      measuredOn: 'footing-face',
      railOffset: 0,
      rails: 'both',
      digNeeded: false,
      landmark: { name: 'Reed Lane', azimuth: 0 },
    },
    {
      runs: [
        { length: 12 * METRE, turn: 90 },
        { length: 9 * METRE, turn: 90 },
        { length: 12 * METRE, turn: 90 },
        { length: 9 * METRE, turn: 90 },
      ],
      spacing: 1.5 * METRE,
    },
  );
  const setup: DemoSetup = {
    laserId: instruments.good,
    rod: instruments.metric,
    benchmark,
    backsight: 932 * MM,
    checkLimit: 3 * MM,
    benchmarkDistance: 14 * METRE,
    stand: { x: 6 * METRE, y: -4.5 * METRE },
  };
  const even = () => jitter(demo, MM);
  const struck = { index: 17, by: 100 * MM, reason: 'wrong-station', words: 'Rod was on the stake' } as const;
  await shootRound(crew, sources, id, {
    surface: 'rails',
    role: 'operator',
    at: '2026-11-18T14:00:00Z',
    setup,
    laps: [{ how: 'read', off: even, struck }],
    finished: true,
  });
  await shootRound(crew, sources, id, {
    surface: 'top',
    role: 'installer',
    at: '2026-11-20T14:40:00Z',
    setup: { ...setup, backsight: 1_004 * MM },
    laps: [{ how: 'read', off: () => even() + (sources.chance() < 0.3 ? -MM : 0) }],
    finished: true,
  });
}

/** Runs in feet: length, turn, and a step on it. */
function walk(...runs: [length: number, turn: number, step?: { at: number; by: number }][]) {
  return runs.map(([length, turn, step]) => ({
    length: length * FOOT,
    turn,
    ...(step === undefined ? {} : { steps: [{ at: step.at * FOOT, by: step.by * FOOT }] }),
  }));
}
