import type { Graduation } from '@/analysis';
import type { Rod } from '../api/instrument-endpoints';
import type { Job } from '../api/job-endpoints';

/**
 * The finest mark that a rod is read to on a job. The job says it for rods of its own unit (a rod marked to eighths may be
 * read to sixteenths); a rod in another unit is read to its own marks.
 */
export function readingGraduation(
  job: Pick<Job, 'unitStyle' | 'graduation'>,
  rod: Pick<Rod, 'style' | 'graduation'>,
): Graduation {
  return rod.style === job.unitStyle ? job.graduation : rod.graduation;
}
