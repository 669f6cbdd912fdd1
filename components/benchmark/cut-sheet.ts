import { AnalysisError, type LengthStyle, type Nm } from '@/analysis';
import { readLength } from '@/components/lengths/read-length';

export type CutOrFill = 'cut' | 'fill';

/** The grade that a hub gives: so much under it where a cut is written on it, over it where a fill is. Elevations may be negative. */
export function gradeFromHub(hub: Nm, direction: CutOrFill, amount: Nm): Nm {
  return direction === 'cut' ? hub - amount : hub + amount;
}

export interface CutSheetReading {
  hub: Nm;
  amount: Nm;
  grade: Nm;
}

/** What the cut sheet comes to as it is typed; null until both lengths read. */
export function readCutSheet(
  texts: { elevation: string; amount: string; direction: CutOrFill },
  style: LengthStyle,
): CutSheetReading | null {
  try {
    const hub = readLength(texts.elevation, { style, sign: 'any', bareDecimal: 'feet' });
    const amount = readLength(texts.amount, { style, sign: 'not-negative', bareDecimal: 'feet' });
    return { hub, amount, grade: gradeFromHub(hub, texts.direction, amount) };
  } catch (error) {
    if (error instanceof AnalysisError) return null; // each field says beside itself why it does not read
    throw error;
  }
}
