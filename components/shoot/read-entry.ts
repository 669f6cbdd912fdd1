import { AnalysisError, formatLength, NM_PER_INCH, parseLength, type Graduation, type Nm } from '@/analysis';
import type { UnitStyle } from '@/shared/quantities';
import type { ReadingEntry } from './reading-entry';

/** What a rod allows. */
export interface EntryRules {
  style: UnitStyle;
  /** The finest mark that it is read to. */
  graduation: Graduation;
  rodLength: Nm;
}

export type EntryReading =
  /** Nothing keyed, or a part is wanted still: which. */
  | { kind: 'wanting'; what: 'reading' | 'feet' | 'inches' | 'fraction' }
  /** `settled`: no further digit is to be expected, so its verdict may be shown. */
  | { kind: 'reading'; keyed: string; reading: Nm; settled: boolean }
  /** 'reading-longer-than-rod' (details length, nm), 'length-negative', or a code of parseLength. */
  | { kind: 'refused'; error: AnalysisError };

/** How many digits stand after the point in a style without fractions. */
export function decimalsOf({ style, graduation }: Pick<EntryRules, 'style' | 'graduation'>): number {
  return formatLength(0, style, graduation).replace(/^0\.?/, '').replace(/\D.*$/, '').length;
}

/**
 * Digits with the point that they imply: 460 is 4.60 ft, 1402 is 1.402 m. Metric digits too few to reach the point stay as
 * they are, because 2 could be metres or millimetres.
 */
export function withImpliedPoint(digits: string, rules: Pick<EntryRules, 'style' | 'graduation'>): string {
  const decimals = decimalsOf(rules);
  if (decimals === 0 || (rules.style === 'metric' && digits.length < 3)) return digits;
  const padded = digits.padStart(decimals + 1, '0');
  return `${padded.slice(0, -decimals)}.${padded.slice(-decimals)}`;
}

const JUST_A_FRACTION = /^\d+ ?\/ ?\d+ ?["″]?$/;
const INCHES_AND_FRACTION = /^\d+[ -]\d+ ?\/ ?\d+ ?["″]?$/;

/** What was keyed as one text that parseLength reads: carried feet and inches included. Null while a part is wanting. */
export function keyedText(entry: ReadingEntry, rules: EntryRules): string | null {
  const text = entry.typed?.trim() ?? '';
  if (entry.style !== 'feet-inches') {
    if (text === '') return null;
    return /^\d+$/.test(text) ? withImpliedPoint(text, rules) : text;
  }
  if (text !== '') return withCarried(text, entry);
  if (entry.feet === null || entry.inches === null || entry.fraction === null) return null;
  return `${entry.feet}′ ${inchesText(entry.inches, entry.fraction)}`;
}

/** "3/16" alone takes the carried feet and inches, "7 3/16" the carried feet. */
function withCarried(text: string, { feet, inches }: ReadingEntry): string {
  if (JUST_A_FRACTION.test(text) && feet !== null && inches !== null) return `${feet}′ ${inches} ${text.replace(/["″]$/, '')}″`;
  if (INCHES_AND_FRACTION.test(text) && feet !== null) return `${feet}′ ${text.replace('-', ' ').replace(/["″]$/, '')}″`;
  return text;
}

/** Inches are kept as they were keyed, 13 of them too, so that the refusal can say what is wrong with them. */
function inchesText(inches: number, fraction: Nm): string {
  if (fraction === 0) return `${inches}″`;
  return `${inches} ${formatLength(fraction, 'feet-inches', 396_875)}`;
}

/** What an entry comes to on a rod. Never throws: a refusal is a result. */
export function readEntry(entry: ReadingEntry, rules: EntryRules): EntryReading {
  const keyed = keyedText(entry, rules);
  if (keyed === null) return { kind: 'wanting', what: wanting(entry) };
  try {
    const reading = parseLength(keyed, entry.style, rules.graduation);
    if (reading < 0) throw new AnalysisError('length-negative', `"${keyed}" is below the foot of the rod.`, { text: keyed });
    if (reading > rules.rodLength) {
      throw new AnalysisError('reading-longer-than-rod', `"${keyed}" is past the end of the rod.`, { length: rules.rodLength });
    }
    return { kind: 'reading', keyed, reading, settled: isSettled(entry, rules) };
  } catch (error) {
    if (!(error instanceof AnalysisError)) throw error;
    return { kind: 'refused', error };
  }
}

function wanting(entry: ReadingEntry): 'reading' | 'feet' | 'inches' | 'fraction' {
  if (entry.style !== 'feet-inches' || (entry.feet === null && entry.inches === null && entry.fraction === null))
    return 'reading';
  if (entry.feet === null) return 'feet';
  return entry.inches === null ? 'inches' : 'fraction';
}

/** Digits that have not passed the implied point are on their way to a longer number. */
function isSettled(entry: ReadingEntry, rules: EntryRules): boolean {
  const digits = entry.typed?.trim() ?? '';
  return entry.style === 'feet-inches' || !/^\d+$/.test(digits) || digits.length > decimalsOf(rules);
}

/** The parts of an inch that have a key, in rows of a quarter inch; sixteenths also where the rod is read to thirty-seconds. */
export function fractionRows(graduation: Graduation): Nm[][] {
  const step = Math.max(graduation, NM_PER_INCH / 16);
  const quarter = NM_PER_INCH / 4;
  return [0, 1, 2, 3].map((row) => {
    const count = Math.max(1, Math.round(quarter / step));
    return Array.from({ length: count }, (_, place) => row * quarter + place * step);
  });
}

/** The finer mark that is keyed beside a sixteenth, nm; null where sixteenths or eighths are the finest. */
export function halfMark(graduation: Graduation): Nm | null {
  return graduation < NM_PER_INCH / 16 ? graduation : null;
}
