import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import type { GivenRequest } from '@/shared/api/endpoint';
import type { Endpoints } from '@/shared/api/endpoints';
import type { BedRuleInput, Surface, ToleranceRuleInput } from '@/shared/rules';
import { callApi } from './client';
import { queryKeys } from './query-keys';

export type NewJob = GivenRequest<Endpoints['addJob']>['body'];
export type JobChange = GivenRequest<Endpoints['changeJob']>['body'];
export type NewBenchmark = GivenRequest<Endpoints['addBenchmark']>['body'];
export type BenchmarkChange = GivenRequest<Endpoints['changeBenchmark']>['body'];

/** What waits for whoever is signed in, and the footings in hand. */
export const todayQuery = () =>
  queryOptions({ queryKey: queryKeys.today, queryFn: ({ signal }) => callApi('today', { signal }) });

export const jobsQuery = () =>
  queryOptions({
    queryKey: queryKeys.jobs.list,
    queryFn: async ({ signal }) => (await callApi('jobs', { signal })).jobs,
  });

export const jobQuery = (jobId: string) =>
  queryOptions({
    queryKey: queryKeys.jobs.detail(jobId),
    queryFn: ({ signal }) => callApi('job', { params: { jobId }, signal }),
  });

/** A job shows in the lists and on Today, and its rules and benchmarks are part of every round's bundle. */
function jobChanged(client: QueryClient) {
  return Promise.all([
    client.invalidateQueries({ queryKey: queryKeys.jobs.all }),
    client.invalidateQueries({ queryKey: queryKeys.today }),
    client.invalidateQueries({ queryKey: queryKeys.rounds.all }),
  ]);
}

export function useAddJob() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: NewJob) => callApi('addJob', { body }),
    onSuccess: (job) => {
      client.setQueryData(jobQuery(job.id).queryKey, job);
      return jobChanged(client);
    },
  });
}

export function useChangeJob(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: JobChange) => callApi('changeJob', { params: { jobId }, body }),
    onSuccess: () => jobChanged(client),
  });
}

export function useSetToleranceRule(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ surface, rule }: { surface: Surface; rule: ToleranceRuleInput }) =>
      callApi('setToleranceRule', { params: { jobId, surface }, body: rule }),
    onSuccess: () => jobChanged(client),
  });
}

export function useSetBedRule(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BedRuleInput) => callApi('setBedRule', { params: { jobId }, body }),
    onSuccess: () => jobChanged(client),
  });
}

export function useAddBenchmark(jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: NewBenchmark) => callApi('addBenchmark', { params: { jobId }, body }),
    onSuccess: () => jobChanged(client),
  });
}

/** Correcting an elevation moves everything shot from it, so the footings' stages and rounds are stale as well. */
export function useChangeBenchmark() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ benchmarkId, change }: { benchmarkId: string; change: BenchmarkChange }) =>
      callApi('changeBenchmark', { params: { benchmarkId }, body: change }),
    onSuccess: () => Promise.all([jobChanged(client), client.invalidateQueries({ queryKey: queryKeys.footings.all })]),
  });
}
