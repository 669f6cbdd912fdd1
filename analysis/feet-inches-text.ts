import { AnalysisError } from './analysis-error';
import { exactDecimal, notUnderstood, type ExactLength } from './length-text';
import { NM_PER_FOOT, NM_PER_INCH } from './units';

const NUMBER = String.raw`(\d+\.?\d*|\.\d+)`;
const FRACTION = String.raw`(\d+) ?\/ ?(\d+)`;
const GAP = '(?: ?- ?| )';
/** `7`, `7 3/16`, `3/16`, with or without the inch mark. */
const INCHES = String.raw`(?:${NUMBER}(?:${GAP}${FRACTION})?|${FRACTION}) ?("?)`;
const MARKED_FEET = new RegExp(`^${NUMBER} ?'(?: ?-? ?${INCHES})?$`);
const BARE_FEET = new RegExp(`^${NUMBER}${GAP}${NUMBER}(?:${GAP}${FRACTION})? ?"?$`);
const INCHES_ALONE = new RegExp(`^${INCHES}$`);

interface Parts {
  feet?: string | undefined;
  inches?: string | undefined;
  over?: string | undefined;
  under?: string | undefined;
}

/** Two bare numbers are feet and inches; a number and a fraction are inches; one bare number could be either. */
function partsOf(body: string, text: string): Parts {
  const marked = MARKED_FEET.exec(body);
  if (marked) {
    const [, feet, inches, over, under, aloneOver, aloneUnder] = marked;
    return { feet, inches, over: over ?? aloneOver, under: under ?? aloneUnder };
  }
  const bare = BARE_FEET.exec(body);
  if (bare) return { feet: bare[1], inches: bare[2], over: bare[3], under: bare[4] };
  const alone = INCHES_ALONE.exec(body);
  if (!alone) throw notUnderstood(text);
  const [, inches, over, under, aloneOver, aloneUnder, mark] = alone;
  if (inches !== undefined && over === undefined && mark === '') {
    throw inches.includes('.') ? decimalsRefused(text) : bareNumber(text);
  }
  return { inches, over: over ?? aloneOver, under: under ?? aloneUnder };
}

function decimalsRefused(text: string): AnalysisError {
  return new AnalysisError('length-decimal-inches', `"${text}" has decimals; this is read in feet, inches and fractions.`, {
    text,
  });
}

function bareNumber(text: string): AnalysisError {
  return new AnalysisError('length-bare-number', `"${text}" could be feet or inches.`, { text });
}

function refuseDecimals({ feet, inches, over }: Parts, text: string, decimalInches: boolean): void {
  if (feet?.includes('.')) throw decimalsRefused(text);
  if (!inches?.includes('.')) return;
  if (!decimalInches) throw decimalsRefused(text);
  if (over !== undefined) throw notUnderstood(text);
}

/** Halves to sixty-fourths, less than one. */
function exactFraction(over: string, under: string, text: string): ExactLength {
  const halving = ['2', '4', '8', '16', '32', '64'].includes(under);
  if (!halving || BigInt(over) >= BigInt(under)) {
    throw new AnalysisError(
      'length-bad-fraction',
      `${over}/${under} in "${text}" is not a fraction of an inch that a rule has.`,
      {
        text,
        fraction: `${over}/${under}`,
      },
    );
  }
  return { numerator: BigInt(over) * BigInt(NM_PER_INCH), denominator: BigInt(under) };
}

/**
 * Feet, inches and fractions as people key them, without the sign.
 * @throws AnalysisError 'length-not-understood' | 'length-bare-number' | 'length-decimal-inches' | 'length-decimal-comma' |
 *   'length-bad-fraction' | 'length-inches-over-twelve'
 */
export function feetInchesText(body: string, text: string, decimalInches: boolean): ExactLength {
  if (body.includes(',')) {
    throw new AnalysisError('length-decimal-comma', `"${text}" has a comma; feet and inches are keyed without one.`, { text });
  }
  const marked = body
    .replace(/(feet|foot|ft)\.?/gi, "'")
    .replace(/(inches|inch|in)\.?/gi, '"')
    .trim();
  const parts = partsOf(marked, text);
  refuseDecimals(parts, text, decimalInches);
  const { feet, inches = '0', over, under } = parts;
  const whole = exactDecimal(inches, NM_PER_INCH);
  if (feet !== undefined && whole.numerator >= BigInt(NM_PER_FOOT) * whole.denominator) {
    throw new AnalysisError('length-inches-over-twelve', `"${text}" has ${inches} inches beside its feet.`, {
      text,
      inches: Number(inches),
    });
  }
  const part = over !== undefined && under !== undefined ? exactFraction(over, under, text) : { numerator: 0n, denominator: 1n };
  const denominator = whole.denominator * part.denominator;
  return {
    numerator:
      BigInt(feet ?? '0') * BigInt(NM_PER_FOOT) * denominator +
      whole.numerator * part.denominator +
      part.numerator * whole.denominator,
    denominator,
  };
}
