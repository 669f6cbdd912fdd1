import '@/hooks/i18n/i18n';
import { besideCorner, cornersOf, farthestFrom, placeWords } from '@/components/setup/stand-places';
import { trenchCautions } from '@/components/setup/trench-caution';
import { footingOf, L_RUNS, withStations } from '@/tests/support/footing-of';

const FOOT = 304_800_000;
const INCH = 25_400_000;

describe('the trench caution', () => {
  // 29 CFR 1926.651(c)(2): a way out at 4 ft; 1926.652(a)(1): protection at 5 ft.
  test.each([
    [null, FOOT, ['trench']],
    [4 * FOOT - INCH / 16, FOOT, ['trench']],
    [4 * FOOT, FOOT, ['trench', 'trench4']],
    [5 * FOOT - INCH / 16, FOOT, ['trench', 'trench4']],
    [5 * FOOT, FOOT, ['trench', 'trench4', 'trench5']],
    [null, 5 * FOOT, ['trench', 'trench4', 'trench5']],
    [FOOT, 4 * FOOT, ['trench', 'trench4']],
  ] as const)('told %s nm deep under a footing %s nm thick it says %j', (depth, thickness, says) => {
    expect(trenchCautions(depth, thickness)).toEqual(says);
  });

  test('is never empty: no depth clears a trench', () => {
    expect(trenchCautions(0, 1)).not.toHaveLength(0);
  });
});

describe('where the laser stands', () => {
  const corners = cornersOf(withStations(footingOf({ runs: L_RUNS }), 8 * FOOT));

  test('the corners of the footing are named in walking order', () => {
    expect(corners.map(({ corner }) => corner)).toEqual(['A', 'B', 'C', 'D', 'E', 'F']);
  });

  test('a place is said from the first corner, in paced feet or tenths of a metre', () => {
    expect(placeWords({ x: 12.3 * FOOT, y: -3 * FOOT }, corners, 'feet-inches')).toBe('12′ east and 3′ south of corner A');
    expect(placeWords({ x: -1_240_000_000, y: 0 }, corners, 'metric')).toBe('1.200 m west and 0.000 m north of corner A');
  });

  test('near a corner is a metre from it, toward the middle', () => {
    const [first] = corners;
    if (!first) throw new Error('no corner');
    const spot = besideCorner(first, corners);
    expect(Math.hypot(spot.x - first.x, spot.y - first.y)).toBeCloseTo(1e9, 0);
    // Corner A is the northwest one of a footing that lies east and south of it.
    expect(spot.x).toBeGreaterThan(first.x);
    expect(spot.y).toBeLessThan(first.y);
  });

  test('the farthest place to shoot is found', () => {
    const targets = corners.map(({ corner, x, y }) => ({ stationId: corner, x, y }));
    // From A at the origin, C lies 44 east and 30 south: 53.25 ft.
    const far = farthestFrom({ x: 0, y: 0 }, targets);
    expect(far?.stationId).toBe('C');
    expect((far?.distance ?? 0) / FOOT).toBeCloseTo(Math.hypot(44, 30), 9);
  });
});
