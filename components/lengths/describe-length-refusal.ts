import type { AnalysisError, LengthStyle } from '@/analysis';
import { i18n } from '@/hooks/i18n/i18n';
import { printLength, printRound, printSmall } from './print-length';

const number = (value: unknown): number | null => (typeof value === 'number' ? value : null);
const text = (value: unknown): string => (typeof value === 'string' ? value.trim() : String(value));

/**
 * Why a length was not taken and what to key instead, as one sentence or two in the person's own unit. `style` is the one
 * that the field is read in. A code that no field can bring about is said in general words.
 */
export function describeLengthRefusal({ code, details }: AnalysisError, style: LengthStyle): string {
  const typed = text(details.text);
  switch (code) {
    case 'length-empty':
      return i18n.t(`errors:length-empty`);
    case 'length-bare-number':
      return i18n.t('errors:length-bare-number', { text: typed });
    case 'length-ambiguous-metric':
      return i18n.t('errors:length-ambiguous-metric', { text: typed });
    case 'length-finer-than-read':
      return finerThanRead(details, style);
    case 'length-decimal-comma':
      return i18n.t(style === 'feet-inches' ? 'errors:length-comma-in-inches' : 'errors:length-decimal-comma');
    case 'length-decimal-inches':
      return i18n.t('errors:length-decimal-inches');
    case 'length-inches-over-twelve':
      return i18n.t('errors:length-inches-over-twelve', { inches: text(details.inches) });
    case 'length-bad-fraction':
      return i18n.t('errors:length-bad-fraction', { fraction: text(details.fraction) });
    case 'length-too-long':
      return i18n.t('errors:length-too-long');
    case 'length-negative':
      return i18n.t('errors:length-negative');
    case 'length-zero':
      return i18n.t('errors:length-zero');
    case 'length-over-most':
      return i18n.t('errors:length-over-most', { most: printRound(number(details.most) ?? 0, style) });
    default:
      return i18n.t(`errors:length-not-understood.${style}`, { text: typed });
  }
}

function finerThanRead(details: Record<string, unknown>, style: LengthStyle): string {
  const [graduation, below, above] = [number(details.graduation), number(details.below), number(details.above)];
  if (graduation === null || below === null || above === null || graduation < 1_000) return i18n.t('errors:length-too-fine');
  return i18n.t('errors:length-finer-than-read', {
    graduation: printSmall(graduation, style),
    below: printLength(below, style),
    above: printLength(above, style),
  });
}
