import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { StoredRecord } from '@/shared/records';
import type { Surface } from '@/shared/rules';
import { callApi } from './client';
import { queryKeys } from './query-keys';

/** How often, ms, a screen that is looked at asks for what other phones recorded. */
const POLL = 5_000;

/** One round with all that judging it needs, less its records. */
export const roundQuery = (roundId: string) =>
  queryOptions({
    queryKey: queryKeys.rounds.detail(roundId),
    queryFn: ({ signal }) => callApi('round', { params: { roundId }, signal }),
  });

/** What is held of a round: its records, and how far the server has been read. Own ones come in by the answer to sending them. */
export interface HeldRecords {
  records: StoredRecord[];
  last: number;
}

const NONE: HeldRecords = { records: [], last: 0 };

/** The records of a round. Each fetch asks only for what lies after the last that is held; asked again while it is looked at. */
export const recordsQuery = (roundId: string) => {
  const queryKey = queryKeys.rounds.records(roundId);
  return queryOptions({
    queryKey,
    queryFn: async ({ client, signal }): Promise<HeldRecords> => {
      let last = client.getQueryData<HeldRecords>(queryKey)?.last ?? 0;
      const pulled: StoredRecord[] = [];
      for (;;) {
        const answer = await callApi('records', { params: { roundId }, query: { after: last }, signal });
        pulled.push(...answer.records);
        last = Math.max(last, answer.last);
        if (!answer.more) break;
      }
      // Held now, not before the call: the sender may have put stored records in meanwhile.
      const held = client.getQueryData<HeldRecords>(queryKey) ?? NONE;
      const records = withRecords(held.records, pulled);
      return records === held.records && last === held.last ? held : { records, last };
    },
    refetchInterval: POLL,
    staleTime: 0,
    structuralSharing: false,
  });
};

/** Puts records that the server just stored beside those held of their round. */
export function mergeStored(client: QueryClient, roundId: string, stored: readonly StoredRecord[]): void {
  client.setQueryData<HeldRecords>(queryKeys.rounds.records(roundId), (held = NONE) => ({
    ...held,
    records: withRecords(held.records, stored),
  }));
}

/** How much is shot shows on Today, in the jobs and at the footing: they are asked for again when they are next looked at. */
export function shotsChanged(client: QueryClient): void {
  for (const queryKey of [queryKeys.today, queryKeys.jobs.all, queryKeys.footings.all]) {
    void client.invalidateQueries({ queryKey, refetchType: 'none' });
  }
}

function withRecords(held: StoredRecord[], more: readonly StoredRecord[]): StoredRecord[] {
  const known = new Set(held.map(({ record }) => record.id));
  const fresh = more.filter(({ record }) => !known.has(record.id));
  return fresh.length === 0 ? held : [...held, ...fresh];
}

function roundChanged(client: QueryClient, bundle: RoundBundle) {
  client.setQueryData(roundQuery(bundle.round.id).queryKey, bundle);
  return Promise.all([
    client.invalidateQueries({ queryKey: queryKeys.footings.all }),
    client.invalidateQueries({ queryKey: queryKeys.jobs.all }),
    client.invalidateQueries({ queryKey: queryKeys.today }),
  ]);
}

/** Opens a round under an id made here (UUIDv7), so that a lost answer can be asked for again without opening two. */
export function useOpenRound(footingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { id: string; surface: Surface }) => callApi('openRound', { params: { footingId }, body }),
    onSuccess: (bundle) => roundChanged(client, bundle),
  });
}

/** Closes a round, or opens it again. */
export function useChangeRound(roundId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (change: { closed: boolean }) => callApi('changeRound', { params: { roundId }, body: change }),
    onSuccess: (bundle) => roundChanged(client, bundle),
  });
}

export const useCloseRound = (roundId: string) => {
  const { mutate, mutateAsync, ...rest } = useChangeRound(roundId);
  return { ...rest, closeRound: () => mutate({ closed: true }), closeRoundAsync: () => mutateAsync({ closed: true }) };
};
