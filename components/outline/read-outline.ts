import { AnalysisError, NM_PER_INCH, NM_PER_MILE, traceOutline, type Nm, type TracedOutline } from '@/analysis';
import type { Run } from '@/shared/api/footing-schemas';
import type { DraftRun, DraftStep, Entry } from './outline-draft';

export interface ReadOutline {
  /** The runs from the first on that can be drawn: it ends before the first without a length. */
  drawn: Run[];
  /** Every field of every run reads, and there is a run. */
  complete: boolean;
  /** Why a field was not taken, by field: see `fieldOf` and `stepFieldOf`. */
  refusals: Readonly<Record<string, AnalysisError>>;
}

export const fieldOf = (runId: string, field: 'length' | 'angle' | 'width' | 'thickness') => `${runId}.${field}`;
export const stepFieldOf = (runId: string, stepId: string, field: 'at' | 'by') => `${runId}.${stepId}.${field}`;

type Take = (field: string, read: () => Nm | null) => Nm | null;

/** Throws `AnalysisError` as `parseLength` does; the screen knows the unit, this file does not. */
export type ReadLength = (text: string) => Nm;

const refuse = (code: string, details: Record<string, unknown> = {}) => new AnalysisError(code, code, details);

function lengthOf(entry: Entry, read: ReadLength): Nm {
  if (entry.kept !== null) return entry.kept;
  if (entry.text.trim() === '') throw refuse('length-empty');
  return read(entry.text);
}

/** A length that a run can have: an inch or more and less than a mile. */
function runLength(entry: Entry, read: ReadLength): Nm {
  const length = lengthOf(entry, read);
  if (length <= 0) throw refuse('run-zero');
  if (length < NM_PER_INCH) throw refuse('run-under-an-inch', { length });
  if (length >= NM_PER_MILE) throw refuse('run-a-mile', { length });
  return length;
}

function optionalSize(entry: Entry, read: ReadLength): Nm | null {
  if (entry.text.trim() === '') return null;
  const size = lengthOf(entry, read);
  if (size <= 0) throw refuse('size-not-positive');
  return size;
}

/**
 * The turn at a run's end in degrees, clockwise positive; 0 goes straight on.
 * @throws AnalysisError 'angle-unreadable', or 'angle-out-of-range' outside (0, 180): half a circle would walk back on the run.
 */
export function readTurn(run: Pick<DraftRun, 'way' | 'angle'>): number {
  if (run.way === 'straight') return 0;
  const text = run.angle.trim().replace(/°$/, '').replace(',', '.');
  if (!/^\d*\.?\d+$/.test(text)) throw refuse('angle-unreadable');
  const angle = Number(text);
  if (!(angle > 0 && angle < 180)) throw refuse('angle-out-of-range', { angle });
  return run.way === 'right' ? angle : -angle;
}

function readStep(runId: string, step: DraftStep, length: Nm | null, read: ReadLength, take: Take): Run['steps'][number] | null {
  const at = take(stepFieldOf(runId, step.id, 'at'), () => {
    const place = lengthOf(step.at, read);
    if (place < 0) throw refuse('length-negative', { length: place });
    if (length !== null && place > length) throw refuse('step-past-end', { at: place, length });
    return place;
  });
  const by = take(stepFieldOf(runId, step.id, 'by'), () => {
    const height = lengthOf(step.by, read);
    if (height === 0) throw refuse('step-zero');
    if (height < 0) throw refuse('length-negative', { length: height });
    return height;
  });
  return at === null || by === null ? null : { id: step.id, at, by: step.direction === 'up' ? by : -by };
}

function readRun(run: DraftRun, read: ReadLength, take: Take): Run | null {
  const length = take(fieldOf(run.id, 'length'), () => runLength(run.length, read));
  const turn = take(fieldOf(run.id, 'angle'), () => readTurn(run));
  const width = take(fieldOf(run.id, 'width'), () => optionalSize(run.width, read));
  const thickness = take(fieldOf(run.id, 'thickness'), () => optionalSize(run.thickness, read));
  const steps = run.steps.flatMap((step) => readStep(run.id, step, length, read, take) ?? []);
  steps.sort((p, q) => p.at - q.at);
  return length === null || turn === null ? null : { id: run.id, length, turn, width, thickness, steps };
}

/** Reads every field of the draft, and says of each that does not read why not. */
export function readOutline(runs: readonly DraftRun[], read: ReadLength): ReadOutline {
  const refusals: Record<string, AnalysisError> = {};
  const take: Take = (field, get) => {
    try {
      return get();
    } catch (error) {
      if (!(error instanceof AnalysisError)) throw error;
      refusals[field] = error;
      return null;
    }
  };
  const all = runs.map((run) => readRun(run, read, take));
  const firstMissing = all.indexOf(null);
  const drawn = (firstMissing < 0 ? all : all.slice(0, firstMissing)).filter((run) => run !== null);
  return { drawn, complete: runs.length > 0 && Object.keys(refusals).length === 0, refusals };
}

export type OutlineState =
  /** Nothing drawn yet. */
  | { kind: 'empty' }
  /** The turns do not go once round: two open ends. `turned` is what they add up to, degrees. */
  | { kind: 'strip'; traced: TracedOutline; turned: number }
  | { kind: 'closes'; traced: TracedOutline }
  | { kind: 'misses'; traced: TracedOutline; by: Nm; mends: { runId: string; number: number; length: Nm }[] }
  | { kind: 'crosses'; traced: TracedOutline };

/**
 * Where the outline stands. A misclosure comes with every single run that would close it. Less than the mark that the tape is
 * read to is none: a turn of 45° brings its runs to no mark.
 */
export function outlineState(runs: readonly Run[], graduation: Nm): OutlineState {
  if (runs.length === 0) return { kind: 'empty' };
  const traced = traceOutline([...runs], { closesWithin: graduation });
  if (traced.selfCrossing) return { kind: 'crosses', traced };
  if (traced.closure.angle !== 0) return { kind: 'strip', traced, turned: runs.reduce((sum, run) => sum + run.turn, 0) };
  if (traced.closure.length <= graduation) return { kind: 'closes', traced };
  const mends = traced.mends.map(({ run, length }) => ({
    runId: run,
    number: runs.findIndex(({ id }) => id === run) + 1,
    length,
  }));
  return { kind: 'misses', traced, by: Math.round(traced.closure.length), mends };
}

/** Top of footing at the start of each run, and how much lower or higher the walk ends than it began: zero when the steps come back. */
export function gradesOf(runs: readonly Run[], planGrade: Nm): { starts: Nm[]; endsBy: Nm } {
  let grade = planGrade;
  const starts = runs.map((run) => {
    const start = grade;
    for (const step of run.steps) grade += step.by;
    return start;
  });
  return { starts, endsBy: grade - planGrade };
}
