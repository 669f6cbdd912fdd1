import type { HandlersOf } from '../../api/handler';
import { addBenchmark, changeBenchmark } from './benchmark-service';
import { addJob, changeJob, listJobs, readJob, setBedRule, setToleranceRule } from './job-service';
import { findJob } from './job-store';

type Names = 'jobs' | 'job' | 'addJob' | 'changeJob' | 'setToleranceRule' | 'setBedRule' | 'addBenchmark' | 'changeBenchmark';

export const jobHandlers: HandlersOf<Names> = {
  jobs: async ({ tenant }) => ({ jobs: await listJobs(tenant) }),
  job: ({ input, tenant }) => readJob(tenant, input.params.jobId),
  addJob: ({ input, tenant }) => addJob(tenant, input.body),
  changeJob: ({ input, tenant }) => changeJob(tenant, input.params.jobId, input.body),
  setToleranceRule: ({ input, tenant }) => setToleranceRule(tenant, input.params, input.body),
  setBedRule: ({ input, tenant }) => setBedRule(tenant, input.params.jobId, input.body),
  addBenchmark: async ({ input, tenant }) => {
    const job = await findJob(tenant, input.params.jobId);
    return addBenchmark(tenant, job.id, input.body);
  },
  changeBenchmark: ({ input, tenant }) => changeBenchmark(tenant, input.params.benchmarkId, input.body),
};
