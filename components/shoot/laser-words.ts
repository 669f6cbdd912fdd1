import { i18n } from '@/hooks/i18n/i18n';
import type { RoundSeries } from '@/shared/round/round-state';

/** Time of day as the person's language writes it: "9:42". */
export function timeOfDay(iso: string): string {
  return new Date(iso).toLocaleTimeString(i18n.language, { hour: 'numeric', minute: '2-digit' });
}

/** Whether the laser stood still, by its last check: "laser held, 9:42", "not checked yet", "laser doubted, 9:42". */
export function laserWords({ checks, laser }: RoundSeries): string {
  const ofLaser = checks.filter((check) => check.of === 'laser');
  const failed = ofLaser.find((check) => !check.holds);
  if (failed) return i18n.t('shoot:laser.doubted', { time: timeOfDay(failed.at) });
  const last = ofLaser.at(-1);
  if (!last) return i18n.t('shoot:laser.unchecked');
  return i18n.t(laser === 'unchecked' ? 'shoot:laser.heldThen' : 'shoot:laser.held', { time: timeOfDay(last.at) });
}
