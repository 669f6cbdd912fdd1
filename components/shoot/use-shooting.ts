import { useState } from 'react';
import { gradeRod, type Nm } from '@/analysis';
import { useSession } from '@/hooks/session/use-session';
import { useRecorder, type Recorder } from '@/hooks/round/use-recorder';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { StrikeRecord } from '@/shared/records';
import type { RoundSeries, RoundShot } from '@/shared/round/round-state';
import { targetKey } from '@/shared/round/round-targets';
import { carriedReading, entryRules } from './carried-reading';
import { ownSeries } from './choose-series';
import type { ShotVerdict } from './live-verdict';
import type { EntryRules } from './read-entry';
import { useEntry, type KeyedEntry } from './use-entry';
import { usePlace, type WalkPlace } from './use-place';
import { useRecording, type Mode, type Receiver, type Recording } from './use-recording';
import { lastShotOf, nextToShoot } from './walk';

/** Everything that the shoot screen shows and does, so that its parts only draw. */
export interface Shooting extends WalkPlace, KeyedEntry, Pick<Recording, 'refusal' | 'jump' | 'record' | 'answerJump'> {
  view: ReadyRound;
  /** Null: this person has no setup to shoot from. */
  series: RoundSeries | null;
  takeSeries(seriesId: string): void;
  rules: EntryRules | null;
  /** Grade rod at the target, nm; may be negative. Null without a backsight. */
  rod: Nm | null;
  mode: Mode;
  setMode(mode: Mode): void;
  receiver: Receiver;
  setReceiver(receiver: Receiver): void;
  /** Of what is keyed; else of the shot that was just recorded out of tolerance. */
  verdict: ShotVerdict | null;
  /** Leaves a station that lies out for the next one to shoot. */
  goOn(): void;
  last: RoundShot | null;
  strikeLast(reason: StrikeRecord['reason']): Promise<void>;
  recorder: Recorder;
}

/** @param at key of the target to begin with; null: the next one to shoot */
export function useShooting(roundId: string, view: ReadyRound, at: string | null): Shooting {
  const { bundle, state } = view;
  const personId = useSession().me?.person.id ?? '';
  const recorder = useRecorder(roundId, view);
  const [takenId, takeSeries] = useState<string | null>(null);
  const series = state.series.find((one) => one.id === takenId) ?? ownSeries(state, personId);
  const rules = entryRules(view, series);
  const place = usePlace(state, at);
  const { target, lap, outShot } = place;
  const entryOf = `${series?.id ?? ''} ${target?.key ?? ''}`;
  const keyed = useEntry(entryOf, carriedReading(view, series, target), rules, bundle.job.unitStyle);
  const [mode, setMode] = useState<Mode>('read');
  const [receiver, setReceiver] = useState<Receiver>('fine');
  const rod = series && series.hi !== null && target ? gradeRod(series.hi, target.grade) : null;
  const recording = useRecording({ view, series, rules, place, keyed, mode, receiver, rod, recorder });
  const { forget } = recording;
  const last = lastShotOf(state, personId);
  const { reading } = keyed;
  const live =
    mode === 'read' && reading.kind === 'reading' && reading.settled ? recording.verdictOf(reading.reading, 'read') : null;
  const moving = (move: () => void) => {
    forget();
    move();
  };
  return {
    ...{ view, series, takeSeries, rules, rod, mode, receiver, setReceiver, last, recorder },
    ...place,
    ...keyed,
    ...recording,
    key: (action) => moving(() => keyed.key(action)),
    setMode: (next) => moving(() => setMode(next)),
    goTo: (key, shot) => moving(() => place.goTo(key, shot)),
    step: (by) => moving(() => place.step(by)),
    startNextLap: () => moving(place.startNextLap),
    goOn: () => moving(() => place.goTo(nextToShoot(state.targets, target?.key ?? null, lap))),
    verdict: live ?? (reading.kind === 'wanting' && outShot ? verdictOfShot(outShot) : null),
    strikeLast: async (reason) => {
      if (!last) return;
      await recorder.strike({ targetId: last.id, reason });
      moving(() => place.goTo(targetKey(last.stationId, last.rail)));
    },
  };
}

function verdictOfShot({ deviation, verdict, close }: RoundShot): ShotVerdict | null {
  return deviation === null || verdict === null ? null : { deviation, verdict, close };
}
