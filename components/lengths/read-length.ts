import { AnalysisError, parseLength, type LengthStyle, type Nm } from '@/analysis';

/** What a field takes. */
export interface LengthRule {
  /** How lengths without a unit of their own are read. */
  style: LengthStyle;
  /** Finest mark, nm; absent: whatever the drawing says. */
  graduation?: Nm;
  /** `any` for elevations and grade rods; `positive` unless said. */
  sign?: 'any' | 'not-negative' | 'positive';
  /** Longest that makes sense here, nm. */
  most?: Nm;
  /** In a feet-inches field, `99.62` by itself is decimal feet: elevations on drawings are written so. Else it is refused. */
  bareDecimal?: 'feet';
}

const DECIMAL_FEET = /^[+\-−]? ?(\d+\.\d*|\.\d+) ?(['′’]|ft\.?|feet|foot)$/i;
const BARE_DECIMAL = /^[+\-−]? ?(\d+\.\d*|\.\d+)$/;
const METRIC = /\d ?(mm|cm|m)$/i;
/** A fraction says inches as plainly as a mark does. */
const FEET_INCHES = /['′’"″”]|\d ?(ft|feet|foot|in|inch|inches)\b|\d ?[/⁄∕] ?\d|[½¼¾⅛⅜⅝⅞]/i;

/** The style that the text says by its own marks; the field's where it says none. */
export function styleOfText(text: string, { style, bareDecimal }: LengthRule): LengthStyle {
  const plain = text.trim();
  if (METRIC.test(plain)) return 'metric';
  if (DECIMAL_FEET.test(plain)) return 'decimal-feet';
  if (FEET_INCHES.test(plain)) return 'feet-inches';
  if (style === 'feet-inches' && bareDecimal === 'feet' && BARE_DECIMAL.test(plain)) return 'decimal-feet';
  return style;
}

/**
 * Reads what was keyed into a field. The drawing and the rod may disagree on units, so a text that says its own unit is read in it.
 * @returns whole nanometres
 * @throws AnalysisError of `parseLength`, and 'length-negative', 'length-zero', 'length-over-most' (details most, nm)
 */
export function readLength(text: string, rule: LengthRule): Nm {
  const length = parseLength(text, styleOfText(text, rule), rule.graduation);
  const sign = rule.sign ?? 'positive';
  if (length < 0 && sign !== 'any') throw new AnalysisError('length-negative', `"${text}" is below zero.`, { text });
  if (length === 0 && sign === 'positive') throw new AnalysisError('length-zero', `"${text}" is zero.`, { text });
  if (rule.most !== undefined && Math.abs(length) > rule.most) {
    throw new AnalysisError('length-over-most', `"${text}" is more than this can be.`, { text, most: rule.most });
  }
  return length;
}
