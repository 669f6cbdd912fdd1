import type { ErrorCode } from '@/shared/error-codes';
import type { FieldRecord, Refusal } from '@/shared/records';

/** Whose records these are: what one person made in one company is never sent as another's. */
export type OutboxScope = `${string}/${string}`;

export const outboxScope = (companyId: string, personId: string): OutboxScope => `${companyId}/${personId}`;

/** Why the server would not take a record: its own refusal, another record under the same id, or a refusal of the whole batch. */
export type Refused = Refusal | 'conflict' | ErrorCode;

/** A record as it lies on this phone until the server says that it has it. */
export interface KeptRecord {
  id: string;
  scope: OutboxScope;
  roundId: string;
  record: FieldRecord;
  /** The phone's own guess at its place among all records, ms: see the hybrid clock. */
  orderedAt: number;
  person: { id: string; name: string };
  /** Null while it waits to be sent; otherwise it needs a person. */
  refused: Refused | null;
}

type Stamped = 'deviceId' | 'deviceSequence' | 'clock' | 'madeAt';
type Unstamped<R> = R extends FieldRecord ? Omit<R, Stamped> : never;
/** A record before the phone gave it its place: the id is the maker's (UUIDv7), so that it can be named at once. */
export type RecordDraft = Unstamped<FieldRecord>;

export interface KeepRequest {
  scope: OutboxScope;
  roundId: string;
  person: { id: string; name: string };
  /** Kept together or not at all, in this order. */
  drafts: readonly RecordDraft[];
  /** The phone's clock, ms. */
  now: number;
  /** The latest place among the round's records that this phone has seen, ms: what is made now comes after it. */
  seen: number;
}

/** Where records lie on the phone. A promise that resolves means that it is on the disk. */
export interface OutboxStorage {
  /** Gives the device's next sequence numbers and clock, and keeps the records, in one transaction. */
  keep(request: KeepRequest): Promise<KeptRecord[]>;
  /** Everything kept in a scope, in device order. */
  all(scope: OutboxScope): Promise<KeptRecord[]>;
  /** The server has these. */
  remove(ids: readonly string[]): Promise<void>;
  /** Marks why records were refused, or with null that they shall be sent again. */
  mark(ids: readonly string[], refused: Refused | null): Promise<void>;
}
