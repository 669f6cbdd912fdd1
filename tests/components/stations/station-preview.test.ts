import { previewStations, reachOf, standingStations, usualSpacing } from '@/components/stations/station-preview';
import { footingOf, L_RUNS, run, withStations } from '@/tests/support/footing-of';

const FOOT = 304_800_000;

test('stations of an L at 8 ft are previewed where the server lays them: six corners and fourteen between', () => {
  // By hand: 44 ft in 6 parts, 30 in 4, 24 in 3, 8 in 1, 20 in 3, 22 in 3: 20 places.
  const plan = previewStations(footingOf({ runs: L_RUNS }), 8 * FOOT);
  expect(plan?.stations).toHaveLength(20);
  expect(plan?.corners.map(({ label }) => label)).toEqual(['A', 'B', 'C', 'D', 'E', 'F']);
  expect(plan?.atCorners).toBe(6);
  expect(plan?.closed).toBe(true);
});

test('a spacing that the server would refuse is not previewed', () => {
  const footing = footingOf({ runs: L_RUNS });
  expect(previewStations(footing, FOOT - 1)).toBeNull();
  expect(previewStations(footing, 100 * FOOT + 1)).toBeNull();
  expect(previewStations(footingOf(), 5 * FOOT)).toBeNull();
});

test('both sides of a step at a corner share one letter on the plan', () => {
  const runs = [{ ...run(1, 20), steps: [{ id: '0198f000-0000-7000-8001-000000000050', at: 20 * FOOT, by: -FOOT }] }, run(2, 10)];
  const plan = standingStations(withStations(footingOf({ runs }), 5 * FOOT));
  const letters = plan.corners.map(({ label }) => label);
  expect(new Set(letters).size).toBe(letters.length);
});

test.each([
  [
    'a square',
    [
      [0, 0],
      [10, 0],
      [10, 10],
      [0, 10],
    ],
    'plane',
  ],
  [
    'three in a line',
    [
      [0, 0],
      [5, 5],
      [10, 10],
    ],
    'line',
  ],
  [
    'two',
    [
      [0, 0],
      [10, 0],
    ],
    'level',
  ],
  ['one', [[3, 4]], 'level'],
] as const)('%s of stations can tell a %s', (_, places, reach) => {
  expect(reachOf(places.map(([x, y]) => ({ x: x * FOOT, y: y * FOOT })))).toBe(reach);
});

test('the usual spacing is 5 ft, or 1.5 m on a metric job', () => {
  expect(usualSpacing('feet-inches')).toBe(5 * FOOT);
  expect(usualSpacing('decimal-feet')).toBe(5 * FOOT);
  expect(usualSpacing('metric')).toBe(1_500_000_000);
});
