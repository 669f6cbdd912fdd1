import { parseLength, type Nm } from '@/analysis';
import type { UnitStyle } from './quantities';

const DECIMAL_FEET = /^[+\-−]?\s*(\d+\.\d*|\.\d+)\s*(ft\.?|feet|foot|['’‘′])?$/i;
const METRIC = /\d[.,]?\s*(mm|cm|m)$/i;
const FEET_AND_INCHES = /['"’‘′”“″]|\d\s*(ft|feet|foot|in|inch|inches)\b/i;

/**
 * The style that a text says itself by its marks, else the job's: a drawing, a cut sheet and a rod disagree, and a field that
 * takes lengths off a drawing takes all of them. A bare number with decimals is decimal feet where inches take none.
 */
export function writtenStyle(text: string, style: UnitStyle): UnitStyle {
  const plain = text.trim();
  const decimal = DECIMAL_FEET.exec(plain);
  if (decimal) return decimal[2] !== undefined || style === 'feet-inches' ? 'decimal-feet' : style;
  if (METRIC.test(plain)) return 'metric';
  return FEET_AND_INCHES.test(plain) ? 'feet-inches' : style;
}

/**
 * Reads a length off a drawing, whole nanometres: in the style that it is written in, to any mark that the style has.
 * @throws AnalysisError as `parseLength` does
 * @example parseDrawnLength('743.62', 'feet-inches') // 226_655_376_000, decimal feet
 */
export function parseDrawnLength(text: string, style: UnitStyle): Nm {
  return parseLength(text, writtenStyle(text, style));
}
