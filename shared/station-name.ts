import type { Nm } from '@/analysis';
import type { UnitStyle } from './quantities';

const TENTH_OF_A_FOOT: Nm = 30_480_000;
const CENTIMETRE: Nm = 10_000_000;

/**
 * What a place along the walk is called: in feet by 100-ft stations to a tenth (`0+74`, `1+07.3`), in metric by metres to a
 * centimetre (`22.55 m`). A name, not a measure: it is rounded, half away from zero.
 * @param at nm along the walk from its start, zero or more
 */
export function stationName(at: Nm, style: UnitStyle): string {
  if (style === 'metric') {
    const centimetres = Math.round(at / CENTIMETRE);
    return `${trimmed(Math.floor(centimetres / 100), centimetres % 100, 2)} m`;
  }
  const tenths = Math.round(at / TENTH_OF_A_FOOT);
  const feet = Math.floor(tenths / 10);
  const within = String(feet % 100).padStart(2, '0');
  return `${Math.floor(feet / 100)}+${trimmed(within, tenths % 10, 1)}`;
}

/** `whole.fraction` without the zeros that say nothing. */
function trimmed(whole: number | string, fraction: number, digits: number): string {
  const text = String(fraction).padStart(digits, '0').replace(/0+$/, '');
  return text === '' ? String(whole) : `${whole}.${text}`;
}
