import { NM_PER_FOOT, NM_PER_INCH, type Nm } from '@/analysis';
import type { UnitStyle } from '@/shared/quantities';

/**
 * A reading as it is being keyed. In feet and inches it stands in parts, so that feet and inches carry over from shot to shot
 * and a fraction completes it; in decimal feet and metric it is a row of digits. `typed` is what came from a keyboard, or the
 * digits of the keypad: while it is there it is what counts.
 */
export interface ReadingEntry {
  style: UnitStyle;
  feet: number | null;
  inches: number | null;
  /** Part of an inch, nm; null until it is picked. */
  fraction: Nm | null;
  typed: string | null;
  /** Feet and inches are being keyed by digits: which of both. */
  keypad: 'feet' | 'inches' | null;
  /** The next digit begins its part anew. */
  fresh: boolean;
}

export type EntryAction =
  | { kind: 'fraction'; part: Nm }
  | { kind: 'half-mark'; part: Nm }
  | { kind: 'inch'; by: 1 | -1 }
  | { kind: 'foot'; by: 1 | -1 }
  | { kind: 'digit'; digit: number }
  | { kind: 'next-part' }
  | { kind: 'keypad'; open: boolean }
  | { kind: 'erase' }
  | { kind: 'clear' }
  | { kind: 'type'; text: string }
  /** Begins the next reading: feet and inches of this one carry over. */
  | { kind: 'carry'; from: Nm | null };

/** An empty entry; with a reading to carry from, its feet and inches stand already and only the fraction is wanted. */
export function startEntry(style: UnitStyle, from: Nm | null): ReadingEntry {
  const whole = style === 'feet-inches' && from !== null && from >= 0 ? from : null;
  return {
    style,
    feet: whole === null ? null : Math.floor(whole / NM_PER_FOOT),
    inches: whole === null ? null : Math.floor((whole % NM_PER_FOOT) / NM_PER_INCH),
    fraction: null,
    typed: null,
    // With nothing to carry, feet and inches have to be keyed first.
    keypad: style === 'feet-inches' && whole === null ? 'feet' : null,
    fresh: true,
  };
}

/** The next state of an entry. Pure. */
export function keyEntry(entry: ReadingEntry, action: EntryAction): ReadingEntry {
  switch (action.kind) {
    case 'fraction':
      return { ...entry, fraction: action.part, typed: null, keypad: null };
    case 'half-mark':
      return { ...entry, fraction: withHalfMark(entry.fraction ?? 0, action.part), typed: null };
    case 'inch':
      return stepped(entry, action.by);
    case 'foot':
      return stepped(entry, action.by * 12);
    case 'digit':
      return entry.style === 'feet-inches'
        ? keyedDigit(entry, action.digit)
        : typed(entry, `${entry.typed ?? ''}${action.digit}`);
    case 'next-part':
      return { ...entry, keypad: entry.keypad === 'feet' ? 'inches' : null, fresh: true };
    case 'keypad':
      return { ...entry, keypad: action.open ? 'feet' : null, typed: null, fresh: true };
    case 'erase':
      return erased(entry);
    case 'clear':
      return entry.style === 'feet-inches' ? { ...entry, fraction: null, typed: null, fresh: true } : typed(entry, '');
    case 'type':
      return typed(entry, action.text);
    case 'carry':
      return startEntry(entry.style, action.from);
  }
}

function typed(entry: ReadingEntry, text: string): ReadingEntry {
  return { ...entry, typed: text === '' ? null : text };
}

/** Toggles the finer mark beside a picked fraction: 3/16 and 7/32. */
function withHalfMark(fraction: Nm, part: Nm): Nm {
  return fraction % (2 * part) === 0 ? fraction + part : fraction - part;
}

/** Inches carry into feet and borrow from them; an upright rod starts at zero. */
function stepped(entry: ReadingEntry, by: number): ReadingEntry {
  const inches = (entry.feet ?? 0) * 12 + (entry.inches ?? 0) + by;
  if (inches < 0) return entry;
  return { ...entry, feet: Math.floor(inches / 12), inches: inches % 12, typed: null };
}

const MOST_DIGITS = 2;

function keyedDigit(entry: ReadingEntry, digit: number): ReadingEntry {
  const part = entry.keypad ?? 'feet';
  const before = entry.fresh ? '' : String(entry[part] ?? '');
  if (before.length >= MOST_DIGITS) return entry;
  return { ...entry, [part]: Number(`${before}${digit}`), typed: null, keypad: part, fresh: false };
}

function erased(entry: ReadingEntry): ReadingEntry {
  if (entry.typed !== null) return typed(entry, entry.typed.slice(0, -1));
  if (entry.keypad === null) return { ...entry, fraction: null };
  const digits = String(entry[entry.keypad] ?? '');
  return { ...entry, [entry.keypad]: digits.length > 1 ? Number(digits.slice(0, -1)) : null, fresh: false };
}
