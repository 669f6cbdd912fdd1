import { AnalysisError } from '@/analysis';
import { describeLengthRefusal } from '@/components/lengths/describe-length-refusal';
import { printRound } from '@/components/lengths/print-length';
import { i18n } from '@/hooks/i18n/i18n';
import type { UnitStyle } from '@/shared/quantities';
import type { Refusal } from './use-recording';

/** Why a press of Record did not record and what to do, in the unit of the rod. */
export function refusalWords(refusal: Refusal, style: UnitStyle): string {
  switch (refusal.kind) {
    case 'wanting':
      return i18n.t(`shoot:refusal.${refusal.what}`);
    case 'cannot-set':
      return i18n.t('shoot:set.cannot');
    case 'not-kept':
      return i18n.t('shoot:refusal.notKept');
    case 'entry':
      return entryRefusalWords(refusal.error, style);
  }
}

function entryRefusalWords(error: AnalysisError, style: UnitStyle): string {
  if (error.code === 'length-negative') return i18n.t('shoot:refusal.negative');
  if (error.code === 'reading-longer-than-rod') {
    const { length } = error.details;
    return i18n.t('shoot:refusal.longerThanRod', { length: printRound(typeof length === 'number' ? length : 0, style) });
  }
  return describeLengthRefusal(error, style);
}
