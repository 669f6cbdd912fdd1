import { gradeRod, type Nm } from '@/analysis';
import type { ReadyRound } from '@/hooks/round/use-round';
import { readingGraduation } from '@/shared/round/reading-graduation';
import type { RoundSeries, RoundTarget } from '@/shared/round/round-state';
import type { EntryRules } from './read-entry';

/** The rules of a series' rod on this job; null while the series or its rod is not known. */
export function entryRules(view: ReadyRound, series: RoundSeries | null): EntryRules | null {
  const rod = view.bundle.rods.find((candidate) => candidate.id === series?.record.rodId);
  if (!rod) return null;
  return { style: rod.style, graduation: readingGraduation(view.bundle.job, rod), rodLength: rod.length };
}

/**
 * What carries over to a target, nm: the last reading off this rod, moved by what the plan grade differs, so that a step is no
 * surprise; before the first one the grade rod.
 */
export function carriedReading(view: ReadyRound, series: RoundSeries | null, target: RoundTarget | null): Nm | null {
  if (!series || series.hi === null || !target) return null;
  const shots = series.readings.filter(({ record, struck }) => record.purpose === 'shot' && !struck && record.how === 'read');
  const last = shots.at(-1)?.record;
  const point = last?.point.kind === 'station' ? last.point : null;
  const from = view.state.targets.find((one) => one.stationId === point?.stationId && one.rail === point.rail);
  if (!last || !from) return gradeRod(series.hi, target.grade);
  return last.reading + from.grade - target.grade;
}
