import type { FootingSummary } from '@/shared/api/footing-schemas';
import { i18n } from '@/hooks/i18n/i18n';
import { roundWords } from './round-words';

/** Where a footing stands, in a sentence: what its newest round says, else what its stage waits for. */
export function footingWords({ stages, stationCount, lastRound }: FootingSummary): string {
  if (stationCount === 0) return i18n.t('footing:standing.outline');
  if (lastRound !== null) {
    return i18n.t('footing:standing.round', {
      surface: i18n.t(`footing:surface.${lastRound.surface}`),
      words: roundWords(lastRound),
    });
  }
  return i18n.t(`footing:standing.${stages.now ?? 'done'}`);
}
