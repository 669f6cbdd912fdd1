import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { LaserInput, RodInput } from '@/shared/api/instrument-endpoints';
import { callApi } from './client';
import { queryKeys } from './query-keys';

/** The company's lasers and rods. */
export const instrumentsQuery = () =>
  queryOptions({ queryKey: queryKeys.instruments, queryFn: ({ signal }) => callApi('instruments', { signal }) });

/** A round's bundle carries the instruments, and Today asks for the first laser. */
function instrumentsChanged(client: QueryClient) {
  return Promise.all([
    client.invalidateQueries({ queryKey: queryKeys.instruments }),
    client.invalidateQueries({ queryKey: queryKeys.rounds.all }),
    client.invalidateQueries({ queryKey: queryKeys.today }),
  ]);
}

export function useAddLaser() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: LaserInput) => callApi('addLaser', { body }),
    onSuccess: () => instrumentsChanged(client),
  });
}

export function useChangeLaser() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ laserId, change }: { laserId: string; change: Partial<LaserInput> }) =>
      callApi('changeLaser', { params: { laserId }, body: change }),
    onSuccess: () => instrumentsChanged(client),
  });
}

export function useAddRod() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: RodInput) => callApi('addRod', { body }),
    onSuccess: () => instrumentsChanged(client),
  });
}

export function useChangeRod() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ rodId, change }: { rodId: string; change: Partial<RodInput> }) =>
      callApi('changeRod', { params: { rodId }, body: change }),
    onSuccess: () => instrumentsChanged(client),
  });
}
