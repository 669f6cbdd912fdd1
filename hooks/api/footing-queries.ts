import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { GivenRequest } from '@/shared/api/endpoint';
import type { Endpoints } from '@/shared/api/endpoints';
import type { Footing } from '@/shared/api/footing-schemas';
import { ApiError, callApi } from './client';
import { queryKeys } from './query-keys';

export type NewFooting = GivenRequest<Endpoints['addFooting']>['body'];
export type FootingChange = GivenRequest<Endpoints['changeFooting']>['body'];
export type OutlineInput = GivenRequest<Endpoints['setOutline']>['body'];
export type StationChange = GivenRequest<Endpoints['changeStation']>['body'];

/** One footing with its outline, stations, rounds and stages. */
export const footingQuery = (footingId: string) =>
  queryOptions({
    queryKey: queryKeys.footings.detail(footingId),
    queryFn: ({ signal }) => callApi('footing', { params: { footingId }, signal }),
  });

/** Every answer is the whole footing: it is put in at once, and whatever else tells about it is asked for again. */
function footingChanged(client: QueryClient, footing: Footing) {
  client.setQueryData(footingQuery(footing.id).queryKey, footing);
  return Promise.all([
    client.invalidateQueries({ queryKey: queryKeys.jobs.all }),
    client.invalidateQueries({ queryKey: queryKeys.today }),
    client.invalidateQueries({ queryKey: queryKeys.rounds.all }),
  ]);
}

/** Whether somebody else changed the outline first: the footing has to be read again before it can be saved over. */
export function isOutOfDate(error: unknown): boolean {
  return error instanceof ApiError && error.code === 'out-of-date';
}

export function useAddFooting(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: NewFooting) => callApi('addFooting', { params: { jobId }, body }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}

export function useChangeFooting() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ footingId, change }: { footingId: string; change: FootingChange }) =>
      callApi('changeFooting', { params: { footingId }, body: change }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}

/** Saves every run at once, over the version that they were drawn over. */
export function useSetOutline(footingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: OutlineInput) => callApi('setOutline', { params: { footingId }, body }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}

export function useSetStations(footingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (spacing: number) => callApi('setStations', { params: { footingId }, body: { spacing } }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}

/** One more station, `at` nanometres along the walk. */
export function useAddStation(footingId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (at: number) => callApi('addStation', { params: { footingId }, body: { at } }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}

export function useChangeStation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ stationId, change }: { stationId: string; change: StationChange }) =>
      callApi('changeStation', { params: { stationId }, body: change }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}

export function useRemoveStation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (stationId: string) => callApi('removeStation', { params: { stationId } }),
    onSuccess: (footing) => footingChanged(client, footing),
  });
}
