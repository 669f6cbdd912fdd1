import type { RoundSummary } from '@/shared/api/footing-schemas';
import { i18n } from '@/hooks/i18n/i18n';

/** "Rails, round 2". */
export function roundName({ surface, number }: Pick<RoundSummary, 'surface' | 'number'>): string {
  return i18n.t('footing:round.name', { surface: i18n.t(`footing:surface.${surface}`), number });
}

/** Where a round stands, in a sentence: how many are shot, then its verdict. */
export function roundWords(round: RoundSummary): string {
  const { shot, of, out, verdict } = round;
  if (verdict === 'not-yet') return i18n.t('footing:verdict.not-yet', { shot, of });
  if (verdict === 'not-to-grade') return i18n.t('footing:verdict.not-to-grade', { count: out, of });
  if (verdict === 'to-grade') return i18n.t('footing:verdict.to-grade', { of });
  return i18n.t(`footing:verdict.${verdict}`);
}
