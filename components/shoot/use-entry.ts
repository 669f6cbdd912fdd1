import { useState } from 'react';
import { type Nm } from '@/analysis';
import type { UnitStyle } from '@/shared/quantities';
import { readEntry, type EntryReading, type EntryRules } from './read-entry';
import { keyEntry, startEntry, type EntryAction, type ReadingEntry } from './reading-entry';

export interface KeyedEntry {
  entry: ReadingEntry;
  reading: EntryReading;
  key(action: EntryAction): void;
  /** Begins the next reading in the same place. */
  startAnew(): void;
}

/**
 * The reading being keyed at a place. It belongs to that place: at another (`of` differs) an entry begins with what carries
 * over there, and one that was left half keyed is not taken along.
 */
export function useEntry(of: string, from: Nm | null, rules: EntryRules | null, style: UnitStyle): KeyedEntry {
  const [kept, setKept] = useState<{ of: string; entry: ReadingEntry } | null>(null);
  const entry = kept?.of === of ? kept.entry : startEntry(rules?.style ?? style, from);
  return {
    entry,
    reading: rules ? readEntry(entry, rules) : { kind: 'wanting', what: 'reading' },
    key: (action) => setKept({ of, entry: keyEntry(entry, action) }),
    startAnew: () => setKept(null),
  };
}
