/**
 * A laser whose last field check is older than this many days, or that has none on record, is warned about at setup.
 * Half a year between checks is common practice, no source; makers ask for shorter in rough handling.
 */
export const LASER_CHECK_DAYS = 180;

const DAY = 86_400_000;

/** The day as `YYYY-MM-DD` where the person is. @param now ms */
export function localDay(now: number): string {
  const date = new Date(now);
  const two = (part: number) => String(part).padStart(2, '0');
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
}

/** Whole days from a check to a day, both `YYYY-MM-DD`; negative for a check entered with a day still to come. */
export function daysSince(checkedOn: string, today: string): number {
  return Math.round((Date.parse(`${today}T00:00:00Z`) - Date.parse(`${checkedOn}T00:00:00Z`)) / DAY);
}

/** What setup has to say of a laser's last check; null when it is recent enough. The 180th day still is. */
export function laserCheckDue(checkedOn: string | null, today: string): { kind: 'never' } | { kind: 'old'; days: number } | null {
  if (checkedOn === null) return { kind: 'never' };
  const days = daysSince(checkedOn, today);
  return days > LASER_CHECK_DAYS ? { kind: 'old', days } : null;
}
