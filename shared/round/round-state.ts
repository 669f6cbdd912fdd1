import type { LaserState, LevelReduction, Nm } from '@/analysis';
import type { RoundBundle } from '../api/round-endpoints';
import type { RoundVerdict } from '../api/footing-schemas';
import type { FieldRecord, Rail, ReadingRecord, SeriesRecord, SetupRecord, StoredRecord, StrikeRecord } from '../records';

/** A record as the fold takes it: off the server with its receipt, or still on this phone with what the phone knows of itself. */
export type FoldRecord =
  | StoredRecord
  | {
      record: FieldRecord;
      receipt: null;
      /** the phone's own guess, ms, never backwards on the device */ orderedAt: number;
      person: { id: string; name: string };
    };

/** What foldRound needs beside the records. */
export type RoundContext = Pick<RoundBundle, 'job' | 'footing' | 'benchmarks' | 'lasers' | 'rods' | 'toleranceRule'> & {
  surface: RoundBundle['round']['surface'];
};

export type PointVerdict = 'in' | 'high' | 'low' | 'cannot-tell';

/** One shot of one rail of one station, reduced and judged. Null where nothing can be said yet (no backsight). */
export interface RoundShot {
  id: string;
  record: ReadingRecord;
  person: { id: string; name: string };
  receivedAt: string | null;
  stationId: string;
  rail: Rail;
  seriesId: string;
  elevation: Nm | null;
  /** Judged elevation less the plan grade of the surface shot; positive is high. */
  deviation: Nm | null;
  laser: LaserState;
  struck: { record: StrikeRecord; person: { id: string; name: string } } | null;
  /** The last unstruck shot of its station and rail: it alone is judged. */
  decides: boolean;
  /** Standard uncertainties against plan grade, and of the reading alone. */
  uncertainty: { absolute: Nm; relative: Nm };
  verdict: PointVerdict | null;
  close: boolean;
}

/** A rail of a station in walking order, with everything shot there. `grade`: plan grade of the surface, rail offset included. */
export interface RoundTarget {
  /** `stationId/rail` */
  key: string;
  stationId: string;
  rail: Rail;
  at: Nm;
  x: number;
  y: number;
  grade: Nm;
  shots: RoundShot[];
  deciding: RoundShot | null;
}

/** One rod read from one setup. */
export interface RoundSeries {
  id: string;
  record: SeriesRecord;
  setup: SetupRecord | null;
  person: { id: string; name: string };
  hi: Nm | null;
  backsightSpread: Nm;
  readings: { record: ReadingRecord; struck: boolean; person: { id: string; name: string } }[];
  checks: { id: string; error: Nm; holds: boolean; of: 'laser' | 'mark'; at: string }[];
  /** State of the newest shot, or of the setup where there is none. */
  laser: LaserState;
}

export interface RoundState {
  targets: RoundTarget[];
  series: RoundSeries[];
  reduction: LevelReduction;
  /** Targets with a deciding shot, and all of them. */
  shot: number;
  of: number;
  out: number;
  close: number;
  lap: { number: number; shot: number; of: number };
  /** Every station shot in one lap, by reading, with no later adjustment. */
  wholeReadLap: boolean;
  verdict: RoundVerdict;
  /** Two phones' unstruck shots of one rail in one lap: the screen asks which stands. */
  disagreements: { key: string; shots: string[] }[];
  /** Strikes whose target has not come yet. */
  waitingStrikes: string[];
  /** Devices whose clock was more than five minutes off. */
  clocksOff: { deviceId: string; skew: number }[];
}
