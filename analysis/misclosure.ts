import { lengthFromZero, notNegative } from './check-input';
import { NM_PER_KILOMETRE, NM_PER_MILE, type Nm } from './units';

/** c·√K: `c` nm at one kilometre, `line` in nm. FGCS classes are 4, 5, 6, 8 and 12 mm (from memory; 4 and 12 seen). */
export function allowableByKilometres(c: Nm, line: Nm): Nm {
  return lengthFromZero('c', c) * Math.sqrt(lengthFromZero('line', line) / NM_PER_KILOMETRE);
}

/** c·√miles: `c` nm at one mile, `line` in nm. Third order is 0.05 ft (NAVEDTRA 14070). */
export function allowableByMiles(c: Nm, line: Nm): Nm {
  return lengthFromZero('c', c) * Math.sqrt(lengthFromZero('line', line) / NM_PER_MILE);
}

/** c·√setups: `c` nm for one set-up. 0.02 ft is used for simple construction. */
export function allowableBySetups(c: Nm, setups: number): Nm {
  return lengthFromZero('c', c) * Math.sqrt(notNegative('setups', setups));
}
