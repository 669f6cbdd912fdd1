import type {
  FieldRecord,
  ReadingRecord,
  RodPoint,
  SeriesRecord,
  SetupRecord,
  StoredRecord,
  StrikeRecord,
} from '@/shared/records';
import { may, ROLES } from '@/shared/roles';
import type { Tenant } from '../../api/handler';
import type { RecordRow, SeriesRow, SetupRow, ShotRow, StrikeRow } from '../../entities/rounds';
import { namesOf } from '../crew/crew-service';

/** bigint as the driver gives it. */
type Text<Row, Keys extends keyof Row> = Omit<Row, Keys> & { [Key in Keys]: string };

/** A line of the join below: the spine, and of its kind's own columns those that are not null. */
type Joined = Text<RecordRow, 'deviceSequence' | 'orderedAt' | 'clockSkew' | 'clockWall'> &
  Omit<SetupRow, 'companyId' | 'recordId'> &
  Text<Omit<SeriesRow, 'companyId' | 'recordId' | 'benchmarkDistance'>, 'checkLimit'> & {
    benchmarkDistance: string | null;
  } & Text<Omit<ShotRow, 'companyId' | 'recordId'>, 'reading'> &
  Omit<StrikeRow, 'companyId' | 'recordId'>;

const COLUMNS = `
  r.id, r.round_id "roundId", r.kind, r.device_id "deviceId", r.device_sequence "deviceSequence", r.clock_wall "clockWall",
  r.clock_counter "clockCounter", r.made_at "madeAt", r.received_at "receivedAt", r.ordered_at "orderedAt",
  r.clock_skew "clockSkew", r.person_id "personId", r.round_sequence "roundSequence",
  setup.laser_id "laserId", setup.stand_x "standX", setup.stand_y "standY",
  series.setup_id "setupId", series.rod_id "rodId", series.check_limit "checkLimit", series.benchmark_distance "benchmarkDistance",
  shot.series_id "seriesId", shot.purpose, shot.point_kind "pointKind", shot.station_id "stationId", shot.rail,
  shot.benchmark_id "benchmarkId", shot.turning_name "turningName", shot.how, shot.receiver, shot.keyed, shot.style, shot.reading, shot.lap,
  strike.target_id "targetId", strike.reason, strike.words`;

/**
 * A strike that came before its target could not be asked whose that is. Where it turns out to be somebody else's, and who struck it may strike only
 * their own, the strike counts for nothing.
 */
const STRIKE_OF_ANOTHERS = `
  select from records target join memberships striker on striker.company_id = r.company_id and striker.person_id = r.person_id
  where target.company_id = r.company_id and target.id = strike.target_id and target.round_sequence > r.round_sequence
    and target.person_id <> r.person_id and not striker.roles && array[${ROLES.filter((role) => may([role], 'shot.strike-any'))
      .map((role) => `'${role}'`)
      .join(', ')}]`;

const FROM = `
  from records r
  left join setups setup on setup.company_id = r.company_id and setup.record_id = r.id
  left join series on series.company_id = r.company_id and series.record_id = r.id
  left join shots shot on shot.company_id = r.company_id and shot.record_id = r.id
  left join strikes strike on strike.company_id = r.company_id and strike.record_id = r.id
  where r.company_id = $1 and r.refusal is null and not exists (${STRIKE_OF_ANOTHERS})`;

/** Records of one round after a sequence number, in that order; at most `limit`. */
export async function recordsAfter(tenant: Tenant, roundId: string, after: number, limit: number): Promise<StoredRecord[]> {
  const lines: Joined[] = await tenant.manager.query(
    `select ${COLUMNS} ${FROM} and r.round_id = $2 and r.round_sequence > $3::bigint order by r.round_sequence limit $4`,
    [tenant.actor.companyId, roundId, after, limit],
  );
  return toStored(tenant, lines);
}

/** All records of each of these rounds. */
export async function recordsOfRounds(tenant: Tenant, roundIds: readonly string[]): Promise<Map<string, StoredRecord[]>> {
  const byRound = new Map<string, StoredRecord[]>(roundIds.map((id) => [id, []]));
  if (roundIds.length === 0) return byRound;
  const lines: Joined[] = await tenant.manager.query(
    `select ${COLUMNS} ${FROM} and r.round_id = any($2) order by r.round_id, r.round_sequence`,
    [tenant.actor.companyId, roundIds],
  );
  const stored = await toStored(tenant, lines);
  lines.forEach((line, index) => {
    const record = stored[index];
    if (record !== undefined) byRound.get(line.roundId)?.push(record);
  });
  return byRound;
}

async function toStored(tenant: Tenant, lines: readonly Joined[]): Promise<StoredRecord[]> {
  const names = await namesOf(
    tenant,
    lines.map((line) => line.personId),
  );
  return lines.map((line) => ({
    record: recordOf(line),
    receipt: {
      roundSequence: line.roundSequence ?? 0,
      receivedAt: line.receivedAt.toISOString(),
      orderedAt: Number(line.orderedAt),
      clockSkew: Number(line.clockSkew),
      person: { id: line.personId, name: names.get(line.personId) ?? '' },
    },
  }));
}

function recordOf(line: Joined): FieldRecord {
  const made = {
    id: line.id,
    deviceId: line.deviceId,
    deviceSequence: Number(line.deviceSequence),
    clock: { wall: Number(line.clockWall), counter: line.clockCounter ?? 0 },
    madeAt: (line.madeAt ?? line.receivedAt).toISOString(),
  };
  switch (line.kind) {
    case 'setup':
      return { ...made, ...setupOf(line) };
    case 'series':
      return { ...made, ...seriesOf(line) };
    case 'reading':
      return { ...made, ...readingOf(line) };
    case 'strike':
      return { ...made, ...strikeOf(line) };
    case null:
      throw new Error(`record ${line.id} has a place in its round and no kind`);
  }
}

type Own<Kind> = Omit<Kind, 'id' | 'deviceId' | 'deviceSequence' | 'clock' | 'madeAt'>;

function setupOf({ laserId, standX, standY }: Joined): Own<SetupRecord> {
  return { kind: 'setup', laserId, stand: standX === null || standY === null ? null : { x: standX, y: standY } };
}

function seriesOf({ setupId, rodId, checkLimit, benchmarkDistance }: Joined): Own<SeriesRecord> {
  const distance = benchmarkDistance === null ? null : Number(benchmarkDistance);
  return { kind: 'series', setupId, rodId, checkLimit: Number(checkLimit), benchmarkDistance: distance };
}

function readingOf(line: Joined): Own<ReadingRecord> {
  const { seriesId, purpose, how, receiver, keyed, style, lap } = line;
  return {
    kind: 'reading',
    seriesId,
    purpose,
    point: pointOf(line),
    how,
    receiver,
    keyed,
    style,
    reading: Number(line.reading),
    lap,
  };
}

function strikeOf({ targetId, reason, words }: Joined): Own<StrikeRecord> {
  return { kind: 'strike', targetId, reason, words };
}

/** A check of the table holds each kind of point to its own columns. */
function pointOf({ id, stationId, rail, benchmarkId, turningName }: Joined): RodPoint {
  if (stationId !== null && rail !== null) return { kind: 'station', stationId, rail };
  if (benchmarkId !== null) return { kind: 'benchmark', benchmarkId };
  if (turningName !== null) return { kind: 'turning', name: turningName };
  throw new Error(`reading ${id} has no point`);
}
