import { AnalysisError, parseLength } from '@/analysis';
import type { FieldRecord, ReadingRecord, Refusal, StrikeRecord } from '@/shared/records';
import { may } from '@/shared/roles';
import type { Actor } from '../../api/handler';
import type { RoundRow } from '../../entities/rounds';
import { mayShoot } from '../rounds/round-service';

/** What is known where a record is to be stored: enough to say why it may not be. */
export interface RecordSurroundings {
  actor: Actor;
  round: RoundRow;
  lasers: ReadonlySet<string>;
  /** Rods by id, with their length (nm). */
  rods: ReadonlyMap<string, number>;
  /** `stationId/rail` of every place that the round's footing has. */
  places: ReadonlySet<string>;
  benchmarks: ReadonlySet<string>;
  /** The rod that a series reads, as far as the series has come. */
  rodOfSeries: ReadonlyMap<string, string>;
  /** Who made a record, as far as it has come. */
  makers: ReadonlyMap<string, string>;
}

/** Why a record is refused, or null. `orderedAt`: when it was made, by the server's clock, ms. */
export function refusalOf(record: FieldRecord, orderedAt: number, known: RecordSurroundings): Refusal | null {
  const closed = known.round.closedAt;
  if (closed !== null && orderedAt > closed.getTime()) return 'round-closed';
  if (record.kind === 'strike') return refusalOfStrike(record, known);
  if (!mayShoot(known.actor, known.round.surface)) return 'surface-not-yours';
  switch (record.kind) {
    case 'setup':
      return known.lasers.has(record.laserId) ? null : 'laser-unknown';
    case 'series':
      return known.rods.has(record.rodId) ? null : 'rod-unknown';
    case 'reading':
      return refusalOfReading(record, known);
  }
}

/** Of one's own hand, or by somebody who may strike anyone's. A strike may come before what it strikes, and then waits for it. */
function refusalOfStrike({ targetId }: StrikeRecord, { actor, makers }: RecordSurroundings): Refusal | null {
  if (may(actor.roles, 'shot.strike-any')) return null;
  const maker = makers.get(targetId);
  return maker === undefined || maker === actor.personId ? null : 'strike-not-yours';
}

function refusalOfReading(record: ReadingRecord, known: RecordSurroundings): Refusal | null {
  if (!isPointKnown(record, known)) return 'point-unknown';
  if (!isWhatWasKeyed(record)) return 'keyed-differs';
  const rod = known.rodOfSeries.get(record.seriesId);
  const length = rod === undefined ? undefined : known.rods.get(rod);
  // Upside down on a mark above the beam, a rod reads below zero, and no further than it is long.
  return length !== undefined && Math.abs(record.reading) > length ? 'reading-longer-than-rod' : null;
}

function isPointKnown({ point, purpose }: ReadingRecord, { places, benchmarks }: RecordSurroundings): boolean {
  switch (point.kind) {
    case 'station':
      return purpose === 'shot' && places.has(`${point.stationId}/${point.rail}`);
    case 'benchmark':
      return purpose !== 'shot' && benchmarks.has(point.benchmarkId);
    case 'turning':
      return purpose !== 'shot';
  }
}

/** A set shot has nothing keyed. A read one's text says its length, to the nanometre. */
function isWhatWasKeyed({ how, keyed, style, reading }: ReadingRecord): boolean {
  if (how === 'set') return keyed === '';
  try {
    return parseLength(keyed, style) === reading;
  } catch (error) {
    if (error instanceof AnalysisError) return false;
    throw error;
  }
}
