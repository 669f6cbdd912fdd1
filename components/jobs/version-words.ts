import { i18n } from '@/hooks/i18n/i18n';
import { dayWords } from '@/components/time/day-words';

/** "version 2, 3 Dec 2026". */
export function versionWords({ version, createdAt }: { version: number; createdAt: string }): string {
  return i18n.t('jobs:rule.version', { version, day: dayWords(createdAt) });
}
