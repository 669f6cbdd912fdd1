import { NM_PER_FOOT, type Nm } from '@/analysis';

/** From 4 ft a way out within 25 ft, 29 CFR 1926.651(c)(2); from 5 ft a protective system, 29 CFR 1926.652(a)(1). */
export const WAY_OUT_FROM: Nm = 4 * NM_PER_FOOT;
export const PROTECTED_FROM: Nm = 5 * NM_PER_FOOT;

export type TrenchCaution = 'trench' | 'trench4' | 'trench5';

/**
 * Which sentences the trench caution has. It grows with the depth and is never empty: no depth clears a trench.
 * @param depth nm, as told; null when it was not
 * @param thickness of the footing, nm: the trench is at least that deep
 */
export function trenchCautions(depth: Nm | null, thickness: Nm): TrenchCaution[] {
  const known = Math.max(depth ?? 0, thickness);
  if (known >= PROTECTED_FROM) return ['trench', 'trench4', 'trench5'];
  return known >= WAY_OUT_FROM ? ['trench', 'trench4'] : ['trench'];
}
