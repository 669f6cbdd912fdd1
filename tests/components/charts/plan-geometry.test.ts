import * as fc from 'fast-check';
import { NM_PER_FOOT } from '@/analysis';
import {
  arrowGeometry,
  fitPlan,
  nearestSpot,
  outwardDirections,
  placeTexts,
  planHeight,
  roomInside,
} from '@/components/charts/plan-geometry';
import { textWidth } from '@/components/charts/axis-text';

const ft = (x: number, y: number) => ({ x: x * NM_PER_FOOT, y: y * NM_PER_FOOT });
/** An L, walked clockwise from its north-west corner. */
const ell = [ft(0, 22), ft(44, 22), ft(44, -8), ft(20, -8), ft(20, 0), ft(0, 0)];
const size = { width: 340, height: 260 };
const margin = { x: 40, y: 30 };

test('plan north is up, east is right, and both have one scale', () => {
  const { toSpot } = fitPlan(ell, size, margin);
  const [nw, ne, se] = ell.map(toSpot);
  expect(ne?.x).toBeGreaterThan(nw?.x ?? NaN);
  expect(se?.y).toBeGreaterThan(ne?.y ?? NaN);
  const east = ((ne?.x ?? NaN) - (nw?.x ?? NaN)) / 44;
  const south = ((se?.y ?? NaN) - (ne?.y ?? NaN)) / 30;
  expect(east).toBeCloseTo(south, 9);
});

test('everything lies within the margins, and a spot leads back to its place', () => {
  const place = fc.record({ x: fc.integer({ min: -1e13, max: 1e13 }), y: fc.integer({ min: -1e13, max: 1e13 }) });
  fc.assert(
    fc.property(fc.array(place, { minLength: 1, maxLength: 20 }), (places) => {
      const { toSpot, toPlace } = fitPlan(places, size, margin);
      for (const given of places) {
        const spot = toSpot(given);
        expect(spot.x).toBeGreaterThanOrEqual(margin.x - 1e-6);
        expect(spot.x).toBeLessThanOrEqual(size.width - margin.x + 1e-6);
        expect(spot.y).toBeGreaterThanOrEqual(margin.y - 1e-6);
        expect(spot.y).toBeLessThanOrEqual(size.height - margin.y + 1e-6);
        expect(toPlace(spot).x).toBeCloseTo(given.x, -2);
        expect(toPlace(spot).y).toBeCloseTo(given.y, -2);
      }
    }),
  );
});

test('a pad, one place, is drawn in the middle', () => {
  expect(fitPlan([ft(7, 9)], size, margin).toSpot(ft(7, 9))).toEqual({ x: 170, y: 130 });
  expect(planHeight([ft(7, 9)], 340, margin, [180, 380])).toBe(180);
});

test('letters point away from the footing at outer and inner corners, whichever way it is walked', () => {
  const spots = ell.map(fitPlan(ell, size, margin).toSpot);
  const signs = (way: { x: number; y: number }[]) => way.map(({ x, y }) => [Math.sign(x), Math.sign(y)]);
  const expected = [
    [-1, -1],
    [1, -1],
    [1, 1],
    [-1, 1],
    [-1, 1],
    [-1, 1],
  ];
  expect(signs(outwardDirections(spots, true))).toEqual(expected);
  expect(signs(outwardDirections([...spots].reverse(), true))).toEqual([...expected].reverse());
});

test('at the ends of a strip letters stand beyond it', () => {
  const out = outwardDirections(
    [
      { x: 10, y: 50 },
      { x: 90, y: 50 },
    ],
    false,
  );
  expect(out).toEqual([
    { x: -1, y: 0 },
    { x: 1, y: 0 },
  ]);
});

test('words stand inside the outline where it is widest; a strip has no inside', () => {
  const spots = ell.map(fitPlan(ell, size, margin).toSpot);
  const room = roomInside(spots, true);
  expect(room?.y).toBeLessThan(spots[5]?.y ?? NaN); // in the wide north part, not in the leg
  expect(roomInside(spots, false)).toBeNull();
});

// Azimuth is clockwise from plan north, which is up: 0 points up, 90 right, 180 down, 270 left.
test.each([
  [0, 0, -1],
  [90, 1, 0],
  [180, 0, 1],
  [270, -1, 0],
])('an arrow of azimuth %d points to (%d, %d) in the picture', (azimuth, x, y) => {
  const [tipX = NaN, tipY = NaN] = (arrowGeometry({ x: 0, y: 0 }, azimuth, 100).head.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
  expect(tipX).toBeCloseTo(50 * x, 1);
  expect(tipY).toBeCloseTo(50 * y, 1);
});

test('placed words lie in the picture and never touch', () => {
  const wish = fc.record({
    key: fc.uuid(),
    text: fc.constantFrom('A', 'B 12', '44′ 0″', 'falls toward Mill St'),
    middles: fc.array(fc.record({ x: fc.integer({ min: -50, max: 400 }), y: fc.integer({ min: -50, max: 300 }) }), {
      minLength: 1,
      maxLength: 3,
    }),
  });
  fc.assert(
    fc.property(fc.array(wish, { maxLength: 25 }), (wishes) => {
      const boxes = placeTexts(wishes, size, 15).map(({ text, x, y }) => {
        const half = textWidth(text, 15) / 2;
        return { left: x - half, right: x + half, top: y - 8, bottom: y + 8 };
      });
      boxes.forEach((a, at) => {
        expect(a.left).toBeGreaterThanOrEqual(0);
        expect(a.right).toBeLessThanOrEqual(size.width);
        for (const b of boxes.slice(at + 1)) {
          expect(a.right <= b.left || b.right <= a.left || a.bottom <= b.top + 1 || b.bottom <= a.top + 1).toBe(true);
        }
      });
    }),
  );
});

test('a word whose first place is taken moves to its second', () => {
  const taken = { left: 90, right: 110, top: 90, bottom: 110 };
  const wish = {
    key: 'C',
    text: 'C',
    middles: [
      { x: 100, y: 100 },
      { x: 150, y: 100 },
    ],
  };
  expect(placeTexts([wish], size, 15, [taken])).toEqual([{ key: 'C', text: 'C', x: 150, y: 100 }]);
});

test('a press picks the nearest within reach, and nothing beyond it', () => {
  const items = [
    { id: 'a', x: 0, y: 0 },
    { id: 'b', x: 30, y: 0 },
  ];
  expect(nearestSpot(items, (item) => item, { x: 20, y: 5 }, 40)?.id).toBe('b');
  expect(nearestSpot(items, (item) => item, { x: 200, y: 5 }, 40)).toBeNull();
});
