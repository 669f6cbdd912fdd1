import { offGradeWords } from '@/components/lengths/length-words';
import { i18n } from '@/hooks/i18n/i18n';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundTarget } from '@/shared/round/round-state';

/** How a deviation is said at the mark that the job reads to: "1/4″ low". */
export function deviationWords(deviation: number, { unitStyle, graduation }: RoundBundle['job']): string {
  return offGradeWords(Math.round(deviation / graduation) * graduation, unitStyle);
}

/** What a target was before: "recorded 1/16″ low", "before adjusting 1/4″ low, 1/8″ low". Null before its first shot. */
export function earlierWords(target: RoundTarget, lap: number, job: RoundBundle['job']): string | null {
  const standing = target.shots.filter((shot) => shot.struck === null && shot.deviation !== null);
  const last = standing.at(-1);
  if (!last) return null;
  const words = (shots: typeof standing) => shots.map((shot) => deviationWords(shot.deviation ?? 0, job)).join(', ');
  const before = standing.slice(0, -1);
  // In a new lap even the last one is from before.
  if (last.record.lap < lap) return i18n.t('shoot:station.before', { deviations: words(standing.slice(-2)) });
  const recorded = i18n.t('shoot:station.recorded', { deviation: words([last]) });
  if (before.length === 0) return recorded;
  return `${recorded}, ${i18n.t('shoot:station.before', { deviations: words(before.slice(-2)) })}`;
}
