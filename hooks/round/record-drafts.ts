import { v7 as newRecordId } from 'uuid';
import type { RecordDraft } from '../outbox/outbox-storage';
import type { RodPoint, SetupRecord, StrikeRecord } from '@/shared/records';
import type { UnitStyle } from '@/shared/quantities';

/** A length as it was keyed and what it is exactly, nm. */
export interface KeyedReading {
  keyed: string;
  style: UnitStyle;
  reading: number;
}

export interface SetupInput {
  laserId: string;
  rodId: string;
  /** Where the laser stands on the plan, nm; null when nobody tapped it. */
  stand: SetupRecord['stand'];
  /** Laser to benchmark, nm; null when not known. */
  benchmarkDistance: number | null;
  /** How far the benchmark may re-read, nm: see usualCheckLimit. */
  checkLimit: number;
}

export interface ShotInput extends KeyedReading {
  seriesId: string;
  stationId: string;
  rail: Extract<RodPoint, { kind: 'station' }>['rail'];
  /** set: the receiver was clamped at `reading` and the rail moved to the tone; `keyed` is then empty. */
  how: 'read' | 'set';
  /** null: read by eye. */
  receiver: 'fine' | 'coarse' | null;
  lap: number;
}

export interface BenchmarkReadingInput extends KeyedReading {
  seriesId: string;
  benchmarkId: string;
}

export interface StrikeInput {
  targetId: string;
  reason: StrikeRecord['reason'];
  words?: string;
}

/** How far a benchmark may re-read before the laser is doubted: 1/8 in, 0.01 ft, 3 mm. Common practice, no source. */
export function usualCheckLimit(style: UnitStyle): number {
  return { 'feet-inches': 3_175_000, 'decimal-feet': 3_048_000, metric: 3_000_000 }[style];
}

/** A laser set up and one rod read from it: two records that are kept together. */
export function setupDrafts({ laserId, stand, ...series }: SetupInput): {
  drafts: RecordDraft[];
  setupId: string;
  seriesId: string;
} {
  const setupId = newRecordId();
  const seriesId = newRecordId();
  return {
    setupId,
    seriesId,
    drafts: [
      { kind: 'setup', id: setupId, laserId, stand },
      { kind: 'series', id: seriesId, setupId, ...series },
    ],
  };
}

export function shotDraft({ stationId, rail, ...input }: ShotInput): RecordDraft {
  return { kind: 'reading', id: newRecordId(), purpose: 'shot', point: { kind: 'station', stationId, rail }, ...input };
}

/** `purpose`: backsights come before the first shot of their series; every later reading of the benchmark is a check. */
export function benchmarkDraft(
  purpose: 'backsight' | 'check',
  { benchmarkId, ...input }: BenchmarkReadingInput,
  lap: number,
): RecordDraft {
  const point = { kind: 'benchmark', benchmarkId } as const;
  return { kind: 'reading', id: newRecordId(), purpose, point, how: 'read', receiver: null, lap, ...input };
}

export function strikeDraft({ targetId, reason, words = '' }: StrikeInput): RecordDraft {
  return { kind: 'strike', id: newRecordId(), targetId, reason, words };
}
