import { AnalysisError } from './analysis-error';
import { parseLength } from './lengths';
import type { LengthStyle, Suspect } from './types';
import { NM_PER_FOOT, NM_PER_INCH, NM_PER_MILLIMETRE, type Nm } from './units';

/** Slips of a whole mark on the rods that crews read: a foot, an inch or half of one, a tenth of a foot, 100 mm, 10 mm. */
const WHOLE_MARKS = [
  ['foot', NM_PER_FOOT],
  ['inch', NM_PER_INCH],
  ['half-inch', NM_PER_INCH / 2],
  ['tenth', NM_PER_FOOT / 10],
  ['100mm', 100 * NM_PER_MILLIMETRE],
  ['10mm', 10 * NM_PER_MILLIMETRE],
] as const satisfies readonly (readonly [NonNullable<Suspect['explanation']>, Nm])[];

/** The text with each pair of neighbouring digits exchanged in turn, whatever stands between them: 4' 5" gives 5' 4". */
function swappedTexts(text: string): string[] {
  const places = [...text].flatMap((character, place) => (character >= '0' && character <= '9' ? [place] : []));
  return places.slice(1).flatMap((later, k) => {
    const earlier = places[k] ?? later;
    if (text[earlier] === text[later]) return [];
    return [text.slice(0, earlier) + text[later] + text.slice(earlier + 1, later) + text[earlier] + text.slice(later + 1)];
  });
}

/** Null where the text is no length: half of all swaps are none, `3/16` becoming `3/61`. */
function lengthOrNull(text: string, style: LengthStyle): Nm | null {
  try {
    return parseLength(text, style);
  } catch (error) {
    if (error instanceof AnalysisError) return null;
    throw error;
  }
}

/**
 * How far each swap would have put the shot off. A reading keyed too small makes the surface look high by as much, so the shot is off
 * by what the swapped reading has more.
 */
function swapSizes(keyed: string, style: LengthStyle): Nm[] {
  const reading = lengthOrNull(keyed, style);
  if (reading === null) return [];
  return swappedTexts(keyed).flatMap((text) => {
    const swapped = lengthOrNull(text, style);
    return swapped === null ? [] : [swapped - reading];
  });
}

/**
 * The bust that would explain a shot standing off by `size`, the nearest within `within`; null where none is. A whole mark may have gone
 * either way; a swap only the way that the swapped digits say.
 */
export function explainBust(size: Nm, within: Nm, keyed?: string, style?: LengthStyle): Suspect['explanation'] {
  let nearest: Suspect['explanation'] = null;
  let distance = within;
  const swaps = keyed === undefined || style === undefined ? [] : swapSizes(keyed, style);
  for (const swap of swaps) {
    if (Math.abs(size - swap) <= distance) {
      nearest = 'digits-swapped';
      distance = Math.abs(size - swap);
    }
  }
  for (const [name, mark] of WHOLE_MARKS) {
    const off = Math.abs(Math.abs(size) - mark);
    if (nearest === null ? off <= distance : off < distance) {
      nearest = name;
      distance = off;
    }
  }
  return nearest;
}
