import { formatLength, type Nm } from '@/analysis';
import type { UnitStyle } from '@/shared/quantities';
import type { FieldRecord, ReadingRecord, StrikeRecord } from '@/shared/records';
import type { Tenant } from '../api/handler';
import { newId } from '../dependencies';
import { sendRecords } from '../features/records/record-service';
import type { DemoSources } from './demo-sources';

/** What every record of a phone carries, whatever its kind. */
type Stamp = Pick<FieldRecord, 'id' | 'deviceId' | 'deviceSequence' | 'clock' | 'madeAt'>;

/** A rod in a series, as a reading on it is keyed. */
export interface DemoRod {
  id: string;
  style: UnitStyle;
  /** The finest mark read on the job, nm. */
  graduation: Nm;
}

export interface DemoReading {
  purpose: ReadingRecord['purpose'];
  point: ReadingRecord['point'];
  reading: Nm;
  how?: ReadingRecord['how'];
  lap?: number;
}

/** A phone of the crew: makes records in its own order and sends them as phones do, through the one path there is. */
export class DemoPhone {
  private readonly deviceId: string;
  private sequence = 0;
  private unsent: FieldRecord[] = [];

  constructor(private readonly sources: DemoSources) {
    this.deviceId = newId(sources);
  }

  setUp(laserId: string, stand: { x: Nm; y: Nm }): string {
    return this.keep({ ...this.stamp(), kind: 'setup', laserId, stand });
  }

  startSeries(
    setupId: string,
    rod: DemoRod,
    limits: { checkLimit: Nm; benchmarkDistance: Nm },
  ): (reading: DemoReading) => string {
    const seriesId = this.keep({ ...this.stamp(), kind: 'series', setupId, rodId: rod.id, ...limits });
    return ({ purpose, point, reading, how = 'read', lap = 1 }) => {
      const keyed = how === 'set' ? '' : formatLength(reading, rod.style, rod.graduation);
      const own = {
        seriesId,
        purpose,
        point,
        how,
        keyed,
        reading,
        lap,
        style: rod.style,
        receiver: how === 'set' ? 'fine' : null,
      } as const;
      return this.keep({ ...this.stamp(), kind: 'reading', ...own });
    };
  }

  strike(targetId: string, reason: StrikeRecord['reason'], words: string): string {
    return this.keep({ ...this.stamp(), kind: 'strike', targetId, reason, words });
  }

  /** @throws Error when the server would not take what the demo made: then the demo is wrong */
  async send(tenant: Tenant, roundId: string): Promise<void> {
    const records = this.unsent;
    this.unsent = [];
    const answers = await sendRecords(tenant, roundId, { sentAt: this.sources.now().toISOString(), records });
    const refused = answers.find(({ answer }) => answer !== 'stored');
    if (refused !== undefined) throw new Error(`a record of the demo was not stored: ${JSON.stringify(refused)}`);
  }

  private keep(record: FieldRecord): string {
    this.unsent.push(record);
    return record.id;
  }

  /** Half a minute or so from one shot to the next. */
  private stamp(): Stamp {
    this.sources.pass(0.4 + 0.3 * this.sources.chance());
    this.sequence += 1;
    const now = this.sources.now();
    const clock = { wall: now.getTime(), counter: 0 };
    return { id: newId(this.sources), deviceId: this.deviceId, deviceSequence: this.sequence, clock, madeAt: now.toISOString() };
  }
}
