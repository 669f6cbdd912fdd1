/** Every key of the query cache, in one place, so that a change of one resource can name the others it makes stale. */
export const queryKeys = {
  today: ['today'],
  jobs: {
    all: ['jobs'],
    list: ['jobs', 'list'],
    detail: (jobId: string) => ['jobs', 'detail', jobId],
  },
  footings: {
    all: ['footings'],
    detail: (footingId: string) => ['footings', 'detail', footingId],
  },
  rounds: {
    all: ['rounds'],
    detail: (roundId: string) => ['rounds', 'detail', roundId],
    records: (roundId: string) => ['rounds', 'records', roundId],
  },
  instruments: ['instruments'],
  crew: ['crew'],
} as const;
