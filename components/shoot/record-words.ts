import { formatLength } from '@/analysis';
import { i18n } from '@/hooks/i18n/i18n';
import type { FieldRecord, ReadingRecord } from '@/shared/records';
import { GRADUATIONS } from '@/shared/quantities';

/** A reading in the unit that it was keyed in, at the finest mark of that unit. */
export function readingWords({ reading, style }: Pick<ReadingRecord, 'reading' | 'style'>): string {
  const finest = Math.min(...GRADUATIONS[style]);
  // A decimal reading on coarser marks is written with them: 4.60, not 4.600.
  const marks = [...GRADUATIONS[style]].sort((one, other) => other - one);
  return formatLength(reading, style, marks.find((mark) => reading % mark === 0 && mark !== 5_000_000) ?? finest);
}

/** What a record is, in a few words: "Shot 4′ 7 5/8″", "Strike-out". */
export function recordWords(record: FieldRecord): string {
  if (record.kind === 'reading') return i18n.t(`shoot:saved.what.${record.purpose}`, { reading: readingWords(record) });
  return i18n.t(`shoot:saved.what.${record.kind}`);
}
