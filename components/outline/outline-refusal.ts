import { NM_PER_INCH, type AnalysisError, type LengthStyle } from '@/analysis';
import { describeLengthRefusal } from '@/components/lengths/describe-length-refusal';
import { printLength } from '@/components/lengths/print-length';
import { i18n } from '@/hooks/i18n/i18n';

const length = (value: unknown, style: LengthStyle): string => printLength(typeof value === 'number' ? value : 0, style);

/** Why an entry of the outline was not taken, in the person's unit: what only an outline can refuse, and every length's own. */
export function outlineRefusal(error: AnalysisError, style: LengthStyle): string {
  const { code, details } = error;
  switch (code) {
    case 'run-zero':
    case 'size-not-positive':
    case 'angle-unreadable':
    case 'angle-out-of-range':
    case 'step-zero':
      return i18n.t(`outline:refused.${code}`);
    case 'run-under-an-inch':
      return i18n.t('outline:refused.run-under-an-inch', { least: printLength(NM_PER_INCH, style) });
    case 'run-a-mile':
      // Who tapes in metres has no mile in mind.
      return i18n.t(style === 'metric' ? 'outline:refused.run-a-mile-metric' : 'outline:refused.run-a-mile', {
        length: length(details.length, style),
      });
    case 'step-past-end':
      return i18n.t('outline:refused.step-past-end', { length: length(details.length, style) });
    case 'part-too-long':
      return i18n.t('outline:refused.part-too-long', { whole: length(details.whole, style) });
    default:
      return describeLengthRefusal(error, style);
  }
}
