import { AnalysisError } from './analysis-error';

/** An exact quotient of whole numbers, in nanometres: what was keyed, before it is asked to lie on a mark. */
export interface ExactLength {
  numerator: bigint;
  denominator: bigint;
}

/** Longest text read: anything longer is no length, and pattern matching stays quick. */
const LONGEST_TEXT = 64;
const VULGAR_FRACTIONS: Record<string, string> = {
  '½': '1/2',
  '¼': '1/4',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
};

/** The refusal for text that fits no way of writing a length in the style. */
export function notUnderstood(text: unknown): AnalysisError {
  return new AnalysisError(
    'length-not-understood',
    `"${String(text).slice(0, LONGEST_TEXT)}" is not a length that can be read.`,
    {
      text,
    },
  );
}

/**
 * Brings what phones and keyboards make of a length to plain marks: `'`, `"`, `/`, `-`, single spaces and one sign.
 * @throws AnalysisError 'length-empty' | 'length-not-understood'
 */
export function plainLengthText(text: string): { negative: boolean; body: string } {
  if (typeof text !== 'string') throw notUnderstood(text);
  const plain = text
    .replace(/[‘’′´`ʹʼ]/g, "'")
    .replace(/[“”″˝ʺ]|''/g, '"')
    .replace(/[−–—‐‑]/g, '-')
    .replace(/[⁄∕]/g, '/')
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (mark) => ` ${VULGAR_FRACTIONS[mark] ?? mark}`)
    .replace(/\s+/g, ' ')
    .trim();
  if (plain === '') throw new AnalysisError('length-empty', 'Nothing was keyed.');
  if (plain.length > LONGEST_TEXT) throw notUnderstood(text);
  const signed = /^([+-]) ?(.+)$/.exec(plain);
  return { negative: signed?.[1] === '-', body: signed?.[2] ?? plain };
}

/** `12`, `12.5`, `.5` and `12.` as an exact count of `unit` nanometres; the decimal mark is a point. */
export function exactDecimal(digits: string, unit: number): ExactLength {
  const [whole = '', decimals = ''] = digits.split('.');
  return {
    numerator: BigInt(`${whole}${decimals}` || '0') * BigInt(unit),
    denominator: BigInt(`1${'0'.repeat(decimals.length)}`),
  };
}
