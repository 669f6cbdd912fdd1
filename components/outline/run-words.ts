import { i18n } from '@/hooks/i18n/i18n';
import type { Run } from '@/shared/api/footing-schemas';
import type { DraftRun } from './outline-draft';
import { toTheMark, type JobUnits } from '@/components/lengths/job-units';
import type { OutlineState } from './read-outline';

/** "turn right", "turn left 45°", and at the last run "closes" or "ends". */
export function turnWords(run: DraftRun, last: boolean, state: OutlineState): string {
  if (last && (state.kind === 'closes' || state.kind === 'misses')) return i18n.t('outline:turn.closes');
  if (run.way === 'straight') return i18n.t(last ? 'outline:turn.ends' : 'outline:turn.straight');
  const angle = run.angle.trim().replace(/°$/, '');
  if (angle === '90') return i18n.t(`outline:turn.${run.way}`);
  return i18n.t(run.way === 'right' ? 'outline:turn.rightBy' : 'outline:turn.leftBy', { angle });
}

/** The steps of a run in walking order: "down 8″ at 12′ 0″". */
export function stepWords(run: Run, units: JobUnits): string[] {
  return run.steps.map((step) => {
    const by = toTheMark(Math.abs(step.by), units);
    const at = toTheMark(step.at, units);
    return i18n.t(step.by < 0 ? 'outline:run.step_down' : 'outline:run.step_up', { by, at });
  });
}

/** What a run has of its own, where it differs from the footing. */
export function sizeWords(run: Run, units: JobUnits): string[] {
  return [
    ...(run.width === null ? [] : [i18n.t('outline:run.wide', { width: toTheMark(run.width, units) })]),
    ...(run.thickness === null ? [] : [i18n.t('outline:run.thick', { thickness: toTheMark(run.thickness, units) })]),
  ];
}

/** The length of a run as the list shows it: to the mark where it reads, as typed where it does not. */
export function lengthWords(draft: DraftRun, read: Run | null, units: JobUnits): string {
  if (read) return toTheMark(read.length, units);
  return draft.length.text.trim() || i18n.t('outline:run.noLength');
}
