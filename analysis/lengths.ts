import { AnalysisError } from './analysis-error';
import { nanometres, positiveLength } from './check-input';
import { feetInchesText } from './feet-inches-text';
import { exactDecimal, notUnderstood, plainLengthText, type ExactLength } from './length-text';
import type { Graduation, LengthStyle } from './types';
import { NM_PER_FOOT, NM_PER_INCH, NM_PER_METRE, NM_PER_MILLIMETRE, type Nm } from './units';

/** Fractions are read and printed to 64ths, decimal feet to 0.00001 ft; finer marks are not whole nanometres. */
const NM_PER_64TH = 396_875;
const NM_PER_FINEST_FOOT_DECIMAL = 3_048;
const METRIC_UNITS: Record<string, number> = { mm: NM_PER_MILLIMETRE, cm: 10_000_000, m: NM_PER_METRE };

export interface ParseLengthOptions {
  /** Feet-inches only: this field takes decimals of an inch too, `4' 7.25"`. */
  decimalInches?: boolean;
}

function decimalFeetText(body: string, text: string): ExactLength {
  if (body.includes(',')) {
    throw new AnalysisError('length-decimal-comma', `"${text}" has a comma; decimal feet take a point.`, { text });
  }
  const digits = /^(\d+\.?\d*|\.\d+) ?(?:'|ft\.?|feet|foot)?$/i.exec(body)?.[1];
  if (digits === undefined) throw notUnderstood(text);
  return exactDecimal(digits, NM_PER_FOOT);
}

function metricText(body: string, text: string): ExactLength {
  const [, keyed, unit] = /^(\d+[.,]?\d*|[.,]\d+) ?(mm|cm|m)?$/i.exec(body) ?? [];
  if (keyed === undefined) throw notUnderstood(text);
  const digits = keyed.replace(',', '.');
  const said = unit === undefined ? undefined : METRIC_UNITS[unit.toLowerCase()];
  if (said !== undefined) return exactDecimal(digits, said);
  if (digits.includes('.')) return exactDecimal(digits, NM_PER_METRE);
  if (digits.length >= 3) return exactDecimal(digits, NM_PER_MILLIMETRE);
  const count = Number(digits);
  throw new AnalysisError('length-ambiguous-metric', `"${text}" could be metres or millimetres.`, {
    text,
    asMetres: count * NM_PER_METRE,
    asMillimetres: count * NM_PER_MILLIMETRE,
  });
}

function exactText(body: string, text: string, style: LengthStyle, options: ParseLengthOptions): ExactLength {
  switch (style) {
    case 'feet-inches':
      return feetInchesText(body, text, options.decimalInches === true);
    case 'decimal-feet':
      return decimalFeetText(body, text);
    case 'metric':
      return metricText(body, text);
    default:
      throw new AnalysisError('unknown-length-style', `There is no length style "${String(style)}".`, { style });
  }
}

/** Whole nanometres on a mark, or the two marks that it lies between. */
function onMark(exact: ExactLength, negative: boolean, graduation: Graduation, text: string): Nm {
  const mark = BigInt(graduation);
  const below = exact.numerator / (exact.denominator * mark);
  const between = exact.numerator % (exact.denominator * mark) !== 0n;
  const low = Number(below * mark);
  const high = Number((below + 1n) * mark);
  if (high > Number.MAX_SAFE_INTEGER)
    throw new AnalysisError('length-too-long', `"${text}" is longer than can be kept.`, { text });
  if (between) {
    const marks = negative ? { below: -high, above: low === 0 ? 0 : -low } : { below: low, above: high };
    throw new AnalysisError('length-finer-than-read', `"${text}" lies between two marks.`, { text, graduation, ...marks });
  }
  return negative && low !== 0 ? -low : low;
}

function wholeGraduation(graduation: Graduation): Graduation {
  const checked = positiveLength('graduation', graduation);
  if (!Number.isInteger(checked)) {
    throw new AnalysisError('bad-graduation', `A graduation is whole nanometres, got ${graduation}.`, { graduation });
  }
  return checked;
}

/**
 * Reads a length as it was keyed, exactly.
 * @param graduation finest mark read, nm; absent: 64ths of an inch, or whole nanometres
 * @returns whole nanometres, with the sign that was keyed
 * @throws AnalysisError, one code for each refusal: 'length-empty', 'length-not-understood', 'length-bare-number', 'length-ambiguous-metric'
 *   (details asMetres, asMillimetres), 'length-finer-than-read' (details below, above in nm), 'length-decimal-comma', 'length-decimal-inches',
 *   'length-inches-over-twelve', 'length-bad-fraction', 'length-too-long', 'bad-graduation', 'unknown-length-style'
 * @example parseLength(`4' 7 3/16"`, 'feet-inches') // 1_401_762_500
 */
export function parseLength(text: string, style: LengthStyle, graduation?: Graduation, options: ParseLengthOptions = {}): Nm {
  const { negative, body } = plainLengthText(text);
  const exact = exactText(body, text, style, options);
  return onMark(exact, negative, graduation === undefined ? 1 : wholeGraduation(graduation), text);
}

function needsMultipleOf(finest: Nm, graduation: Graduation, style: LengthStyle): void {
  if (graduation % finest !== 0) {
    throw new AnalysisError('bad-graduation', `A graduation of ${graduation} nm cannot be written in ${style}.`, {
      graduation,
      style,
    });
  }
}

/** Half away from zero; the remainder of two doubles is exact, so a half is never missed. */
function roundedTo(length: Nm, graduation: Graduation): { negative: boolean; size: Nm } {
  const size = Math.abs(length);
  const rest = size % graduation;
  const rounded = size - rest + (2 * rest >= graduation ? graduation : 0);
  return { negative: length < 0 && rounded > 0, size: nanometres('length', rounded) };
}

function feetInches(size: Nm): string {
  const feet = Math.floor(size / NM_PER_FOOT);
  const inches = Math.floor((size % NM_PER_FOOT) / NM_PER_INCH);
  let over = (size % NM_PER_INCH) / NM_PER_64TH;
  let under = 64;
  while (over > 0 && over % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  const fraction = over > 0 ? `${over}/${under}` : '';
  const inchPart =
    inches > 0 || feet > 0 || fraction === '' ? [String(inches), fraction].filter((part) => part !== '').join(' ') : fraction;
  return feet > 0 ? `${feet}′ ${inchPart}″` : `${inchPart}″`;
}

/** `size` in `unit`, with the fewest decimals that show every mark of the graduation. */
function decimals(size: Nm, unit: Nm, graduation: Graduation): string {
  let places = 0;
  let step = unit;
  while (graduation % step !== 0) {
    step /= 10;
    places += 1;
  }
  const digits = String(Math.round(size / step)).padStart(places + 1, '0');
  return places === 0 ? digits : `${digits.slice(0, -places)}.${digits.slice(-places)}`;
}

/**
 * Prints a length at a graduation, rounding half away from zero: `4′ 7 3/16″`, `4.60 ft`, `1.402 m`, with a real minus.
 * `parseLength` reads every one of them back.
 * @throws AnalysisError 'bad-graduation' when the style cannot write it (feet-inches: whole 64ths of an inch; decimal feet: whole 0.00001 ft)
 */
export function formatLength(length: Nm, style: LengthStyle, graduation: Graduation): string {
  const mark = wholeGraduation(graduation);
  const { negative, size } = roundedTo(nanometres('length', length), mark);
  const sign = negative ? '−' : '';
  switch (style) {
    case 'feet-inches':
      needsMultipleOf(NM_PER_64TH, mark, style);
      return `${sign}${feetInches(size)}`;
    case 'decimal-feet':
      needsMultipleOf(NM_PER_FINEST_FOOT_DECIMAL, mark, style);
      return `${sign}${decimals(size, NM_PER_FOOT, mark)} ft`;
    case 'metric':
      return `${sign}${decimals(size, NM_PER_METRE, mark)} m`;
    default:
      throw new AnalysisError('unknown-length-style', `There is no length style "${String(style)}".`, { style });
  }
}
