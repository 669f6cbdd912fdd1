import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import { foldRound } from '@/shared/round/fold-round';
import type { FoldRecord, RoundState } from '@/shared/round/round-state';
import { recordsQuery, roundQuery } from '../api/round-queries';
import { useOutbox } from '../outbox/use-outbox';

export type RoundView =
  | { status: 'loading'; bundle: null; state: null; error: null; seen: 0; tryAgain(): void }
  | { status: 'failed'; bundle: null; state: null; error: Error; seen: 0; tryAgain(): void }
  | {
      status: 'ready';
      bundle: RoundBundle;
      state: RoundState;
      error: null;
      /** The latest place among all its records, ms. */
      seen: number;
      tryAgain(): void;
    };

export type ReadyRound = Extract<RoundView, { status: 'ready' }>;

/**
 * A round as it stands: what the server has and what is still on this phone, folded by the one reducer. Records that the
 * server refused are not part of it; they stand on the list of what needs somebody.
 */
export function useRound(roundId: string): RoundView {
  const round = useQuery(roundQuery(roundId));
  const records = useQuery(recordsQuery(roundId));
  const { kept } = useOutbox();
  const { data: bundle } = round;
  const { data: held } = records;
  // Folding thousands of records at every key press would be felt; it is done when they change.
  const folded = useMemo(() => {
    if (!bundle || !held) return null;
    const own = kept.filter((record) => record.roundId === roundId && record.refused === null);
    const all: FoldRecord[] = [
      ...held.records,
      ...own.map(({ record, orderedAt, person }) => ({ record, receipt: null, orderedAt, person })),
    ];
    const seen = all.reduce((latest, entry) => Math.max(latest, entry.receipt?.orderedAt ?? 0), 0);
    return { state: foldRound(all, { ...bundle, surface: bundle.round.surface }), seen };
  }, [bundle, held, kept, roundId]);
  const tryAgain = () => void Promise.all([round.refetch(), records.refetch()]);
  const none = { bundle: null, state: null, seen: 0, tryAgain } as const;
  if (bundle && folded) return { status: 'ready', bundle, ...folded, error: null, tryAgain };
  const error = round.error ?? records.error;
  return error ? { status: 'failed', ...none, error } : { status: 'loading', ...none, error: null };
}
