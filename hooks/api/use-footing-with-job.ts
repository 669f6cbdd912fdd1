import { skipToken, useQuery } from '@tanstack/react-query';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import { footingQuery } from './footing-queries';
import { jobQuery } from './job-queries';

export type FootingWithJob =
  | { status: 'ready'; footing: Footing; job: Job }
  | { status: 'loading' }
  | { status: 'failed'; error: Error; tryAgain: () => void };

/** A footing and the job that says how its lengths are written. What was fetched before stays when fetching again fails. */
export function useFootingWithJob(footingId: string): FootingWithJob {
  const footing = useQuery(footingQuery(footingId));
  const jobId = footing.data?.jobId;
  const ofJob = jobQuery(jobId ?? '');
  const job = useQuery(jobId === undefined ? { ...ofJob, queryFn: skipToken } : ofJob);
  if (footing.data && job.data) return { status: 'ready', footing: footing.data, job: job.data };
  const error = footing.error ?? job.error;
  const tryAgain = () => void (footing.error ? footing.refetch() : job.refetch());
  return error ? { status: 'failed', error, tryAgain } : { status: 'loading' };
}
