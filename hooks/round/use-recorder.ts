import { useSession } from '../session/use-session';
import { browserOutbox } from '../outbox/browser-outbox';
import { outboxScope, type RecordDraft } from '../outbox/outbox-storage';
import {
  benchmarkDraft,
  setupDrafts,
  shotDraft,
  strikeDraft,
  type BenchmarkReadingInput,
  type SetupInput,
  type ShotInput,
  type StrikeInput,
} from './record-drafts';
import type { RoundView } from './use-round';

export interface Recorder {
  /** Resolves once setup and series are on this phone. */
  startSetup(input: SetupInput): Promise<{ setupId: string; seriesId: string }>;
  recordBacksight(input: BenchmarkReadingInput): Promise<string>;
  recordCheck(input: BenchmarkReadingInput): Promise<string>;
  recordShot(input: ShotInput): Promise<string>;
  /** Draws a line through an earlier reading, which stays visible. */
  strike(input: StrikeInput): Promise<string>;
}

/**
 * Writes records of a round. Each call resolves with the record's id when it is on this phone's disk, and not before; it
 * rejects when this browser will not keep it, and then nothing was recorded. Sending goes on by itself.
 */
export function useRecorder(roundId: string, view: RoundView): Recorder {
  const { me } = useSession();
  const { seen } = view;
  const lap = view.state?.lap.number ?? 1;
  const keep = async (drafts: readonly RecordDraft[]) => {
    if (me === null) throw new Error('Nobody is signed in: a record needs its person.');
    const { person, company } = me;
    const scope = outboxScope(company.id, person.id);
    await browserOutbox().keep({ scope, roundId, person: { id: person.id, name: person.name }, drafts, seen });
  };
  const keepOne = async (draft: RecordDraft) => {
    await keep([draft]);
    return draft.id;
  };
  return {
    startSetup: async (input) => {
      const { drafts, setupId, seriesId } = setupDrafts(input);
      await keep(drafts);
      return { setupId, seriesId };
    },
    recordBacksight: (input) => keepOne(benchmarkDraft('backsight', input, lap)),
    recordCheck: (input) => keepOne(benchmarkDraft('check', input, lap)),
    recordShot: (input) => keepOne(shotDraft(input)),
    strike: (input) => keepOne(strikeDraft(input)),
  };
}
