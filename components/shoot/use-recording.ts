import { useRef, useState } from 'react';
import type { Nm } from '@/analysis';
import type { Recorder } from '@/hooks/round/use-recorder';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { ReadingRecord } from '@/shared/records';
import type { RoundSeries } from '@/shared/round/round-state';
import { liveVerdict, type ShotVerdict } from './live-verdict';
import { jumpAskedAbout, jumpFromNeighbours } from './neighbours';
import type { EntryReading, EntryRules } from './read-entry';
import type { KeyedEntry } from './use-entry';
import type { WalkPlace } from './use-place';
import { nextToShoot } from './walk';

/** Why a press of Record did not record. */
export type Refusal =
  | { kind: 'wanting'; what: Extract<EntryReading, { kind: 'wanting' }>['what'] }
  | { kind: 'entry'; error: Extract<EntryReading, { kind: 'refused' }>['error'] }
  /** The grade rod is off this rod: above the beam, or past its end. */
  | { kind: 'cannot-set' }
  | { kind: 'not-kept' };

/** A keyed reading that stands far off its neighbours, nm. */
export interface Jump {
  size: Nm;
  keyed: string;
  reading: Nm;
}

export type Mode = ReadingRecord['how'];
export type Receiver = 'fine' | 'coarse';
type KeyedShot = Pick<ReadingRecord, 'keyed' | 'reading' | 'how'>;

interface Shot {
  view: ReadyRound;
  series: RoundSeries | null;
  rules: EntryRules | null;
  place: WalkPlace;
  keyed: KeyedEntry;
  mode: Mode;
  receiver: Receiver;
  /** Grade rod at the target, nm. */
  rod: Nm | null;
  recorder: Recorder;
}

export interface Recording {
  refusal: Refusal | null;
  jump: Jump | null;
  record(): void;
  answerJump(record: boolean): void;
  /** What was asked or refused no longer stands. */
  forget(): void;
  /** What a reading here would be judged. */
  verdictOf(reading: Nm, how: Mode): ShotVerdict | null;
}

/** Surfaces that can still be moved: a shot out of tolerance there is shot again, not left. */
const MOVABLE = { dig: true, rails: true, wet: true, top: false } as const;

/** Turns a press of Record into a record, a refusal or a question, and moves on when it is on the disk. */
export function useRecording(shot: Shot): Recording {
  const { view, rules, place, keyed, rod } = shot;
  const { bundle, state } = view;
  const { target } = place;
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const [jump, setJump] = useState<Jump | null>(null);
  const keeping = useRef(false);
  const forget = () => {
    setRefusal(null);
    setJump(null);
  };
  const verdictOf = (reading: Nm, how: Mode) => judged(shot, reading, how);

  const commit = async (keyedShot: KeyedShot) => {
    // A second press while the first is on its way to the disk is the same press.
    if (!target || keeping.current) return;
    keeping.current = true;
    const verdict = verdictOf(keyedShot.reading, keyedShot.how)?.verdict;
    const stays = (verdict === 'high' || verdict === 'low') && MOVABLE[bundle.round.surface];
    try {
      const id = await keep(shot, keyedShot);
      keyed.startAnew();
      forget();
      if (stays) place.goTo(target.key, id);
      else place.goTo(nextToShoot(state.targets, target.key, place.lap));
    } catch {
      // Told on the screen; what was keyed still stands in the box.
      setRefusal({ kind: 'not-kept' });
    } finally {
      keeping.current = false;
    }
  };

  const recordRead = () => {
    const { reading } = keyed;
    if (reading.kind === 'wanting') return setRefusal({ kind: 'wanting', what: reading.what });
    if (reading.kind === 'refused') return setRefusal({ kind: 'entry', error: reading.error });
    const deviation = verdictOf(reading.reading, 'read')?.deviation;
    const size = deviation === undefined || !target ? null : jumpFromNeighbours(state.targets, target.key, deviation);
    const keyedShot = { keyed: reading.keyed, reading: reading.reading };
    if (size !== null && Math.abs(size) >= jumpAskedAbout(bundle.toleranceRule)) return setJump({ size, ...keyedShot });
    return void commit({ ...keyedShot, how: 'read' });
  };

  const recordSet = () => {
    if (rod === null || !rules || rod < 0 || rod > rules.rodLength) return setRefusal({ kind: 'cannot-set' });
    return void commit({ keyed: '', reading: rod, how: 'set' });
  };

  return {
    refusal,
    jump,
    record: shot.mode === 'set' ? recordSet : recordRead,
    answerJump: (yes) => {
      setJump(null);
      if (yes && jump) void commit({ keyed: jump.keyed, reading: jump.reading, how: 'read' });
    },
    forget,
    verdictOf,
  };
}

function judged({ view, series, place, receiver }: Shot, reading: Nm, how: Mode): ShotVerdict | null {
  const { target } = place;
  return target && liveVerdict(reading, { target, series, how, receiver: how === 'set' ? receiver : null }, view);
}

/** @returns the record's id, once it is on the disk */
function keep({ series, rules, place, receiver, recorder }: Shot, keyedShot: KeyedShot): Promise<string> {
  const { target, lap } = place;
  if (!series || !rules || !target) throw new Error('A shot needs a setup, a rod and a station.');
  const { stationId, rail } = target;
  const ofReceiver = keyedShot.how === 'set' ? receiver : null;
  return recorder.recordShot({
    ...{ seriesId: series.id, stationId, rail, lap, style: rules.style, receiver: ofReceiver },
    ...keyedShot,
  });
}
