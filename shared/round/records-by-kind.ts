import type { ReadingRecord, SeriesRecord, SetupRecord, StrikeRecord } from '../records';
import type { OrderedRecord } from './order-records';

export type Ordered<R> = Omit<OrderedRecord, 'record'> & { record: R };

/** The records of a round by kind, each list in the one order of records. */
export interface RecordsByKind {
  setups: Map<string, SetupRecord>;
  series: Ordered<SeriesRecord>[];
  readings: Ordered<ReadingRecord>[];
  /** By the id of the reading that is struck; of several strikes the first counts. */
  strikes: Map<string, Ordered<StrikeRecord>>;
  /** Ids of strikes whose target has not come yet. */
  waitingStrikes: string[];
}

/** Sorts ordered records by kind. A strike may come before its target: what is struck is known once both are here. */
export function recordsByKind(ordered: readonly OrderedRecord[]): RecordsByKind {
  const sorted: RecordsByKind = { setups: new Map(), series: [], readings: [], strikes: new Map(), waitingStrikes: [] };
  for (const entry of ordered) {
    const { record } = entry;
    switch (record.kind) {
      case 'setup':
        sorted.setups.set(record.id, record);
        break;
      case 'series':
        sorted.series.push({ ...entry, record });
        break;
      case 'reading':
        sorted.readings.push({ ...entry, record });
        break;
      case 'strike':
        if (!sorted.strikes.has(record.targetId)) sorted.strikes.set(record.targetId, { ...entry, record });
        break;
    }
  }
  const here = new Set(ordered.map((entry) => entry.record.id));
  for (const { record } of ordered) {
    if (record.kind === 'strike' && !here.has(record.targetId)) sorted.waitingStrikes.push(record.id);
  }
  return sorted;
}
