import { formatLength, type LengthStyle, type Nm } from '@/analysis';
import type { Job } from '@/shared/api/job-endpoints';

/** How a job writes its lengths, and to which mark. */
export interface JobUnits {
  style: LengthStyle;
  graduation: Nm;
}

export const unitsOf = (job: Pick<Job, 'unitStyle' | 'graduation'>): JobUnits => ({
  style: job.unitStyle,
  graduation: job.graduation,
});

/** A length to the job's mark, for reading; fields print theirs exactly. */
export const toTheMark = (length: Nm, { style, graduation }: JobUnits): string => formatLength(length, style, graduation);
