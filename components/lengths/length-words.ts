import type { LengthStyle, Nm } from '@/analysis';
import { i18n } from '@/hooks/i18n/i18n';
import { printRound, printSmall } from './print-length';

/** How far off plan grade: "1/4″ low", "1/8″ high", "on grade". Positive is high. */
export function offGradeWords(deviation: Nm, style: LengthStyle): string {
  if (deviation === 0) return i18n.t('footing:offGrade.on');
  const length = printSmall(Math.abs(deviation), style);
  return deviation < 0 ? i18n.t('footing:offGrade.low', { length }) : i18n.t('footing:offGrade.high', { length });
}

/** What is allowed below and above plan grade, both zero or more: "±1/8″", "+0 / −1″". */
export function toleranceWords({ low, high, style }: { low: Nm; high: Nm; style: LengthStyle }): string {
  if (low === high) return `±${printSmall(low, style)}`;
  const part = (sign: string, limit: Nm) => (limit === 0 ? `${sign}0` : `${sign}${printSmall(limit, style)}`);
  return `${part('+', high)} / ${part('−', low)}`;
}

/** What a laser's maker states: "1/16″ at 100′". */
export function accuracyWords({ accuracy, accuracyAt }: { accuracy: Nm; accuracyAt: Nm }, style: LengthStyle): string {
  return i18n.t('lasers:accuracyWords', { accuracy: printSmall(accuracy, style), distance: printRound(accuracyAt, style) });
}
