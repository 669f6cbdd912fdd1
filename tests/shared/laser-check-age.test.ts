import { daysSince, laserCheckDue } from '@/shared/laser-check-age';

test('the 180th day after a check is in time, the 181st is not', () => {
  // 2026-06-04 to 2026-12-01: 26 + 31 + 31 + 30 + 31 + 30 + 1 = 180 days, counted on a calendar.
  expect(daysSince('2026-06-04', '2026-12-01')).toBe(180);
  expect(laserCheckDue('2026-06-04', '2026-12-01')).toBeNull();
  expect(laserCheckDue('2026-06-03', '2026-12-01')).toEqual({ kind: 'old', days: 181 });
});

test('a laser without a check on record is always warned about', () => {
  expect(laserCheckDue(null, '2026-12-01')).toEqual({ kind: 'never' });
});
