import { formatLength, NM_PER_FOOT, NM_PER_INCH, NM_PER_MILLIMETRE, type Nm } from '@/analysis';
import type { ChartUnits } from './chart-types';

const minus = '−';

/** Decimals without trailing noughts, at most `places`. */
const trimmed = (value: number, places: number) => String(Number(value.toFixed(places)));

/**
 * The size of a height on an axis without its unit mark, which the axis says once: "1/8", "0.02", "3". Metric heights are in
 * millimetres. Halves of a tolerance may be finer than the job reads to, so inches go to 64ths here.
 */
function heightSize(height: Nm, style: ChartUnits['style']): string {
  if (style === 'decimal-feet') return trimmed(height / NM_PER_FOOT, 3);
  if (style === 'metric') return trimmed(height / NM_PER_MILLIMETRE, 1);
  const text = formatLength(Math.round(height), style, NM_PER_INCH / 64);
  return text.includes('′') ? text : text.replace('″', '');
}

/** A signed height for an axis: "+1/8", "−1/4", "0". */
export function axisHeight(height: Nm, style: ChartUnits['style']): string {
  const size = heightSize(Math.abs(height), style);
  if (/^0(″)?$/.test(size)) return '0';
  return `${height > 0 ? '+' : minus}${size}`;
}

/** Width of a text in px as the charts' narrow face sets it: a touch generous, so that labels never run into one another. */
export function textWidth(text: string, size: number): number {
  let ems = 0;
  for (const char of text) ems += /[ .,′″'’|il+−/]/.test(char) ? 0.3 : /[MWm@]/.test(char) ? 0.75 : 0.5;
  return ems * size;
}
