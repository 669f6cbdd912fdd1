import { i18n } from '@/hooks/i18n/i18n';

/** A day as the person's language writes it: "Dec 3, 2026". Takes an instant, or a plain day, which is the same day everywhere. */
export function dayWords(when: string): string {
  const plainDay = /^\d{4}-\d{2}-\d{2}$/.test(when);
  const format = new Intl.DateTimeFormat(i18n.language, { dateStyle: 'medium', timeZone: plainDay ? 'UTC' : undefined });
  return format.format(new Date(when));
}

/** Day and time of day, by this device's clock. */
export function momentWords(when: string): string {
  return new Intl.DateTimeFormat(i18n.language, { dateStyle: 'medium', timeStyle: 'short' }).format(new Date(when));
}
