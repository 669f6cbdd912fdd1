import { z } from 'zod';
import type { Nm } from '@/analysis';
import type { Run } from '@/shared/api/footing-schemas';

/**
 * A field as it is typed. `kept` is the exact length that an untouched text stands for: a length that is shown to the mark
 * (13.411 m in a feet-and-inches job) must not change because somebody opened the outline and saved it again.
 */
const entrySchema = z.strictObject({ text: z.string(), kept: z.int().nullable() });
export type Entry = z.infer<typeof entrySchema>;

const waySchema = z.enum(['right', 'left', 'straight']);
export type Way = z.infer<typeof waySchema>;

const draftStepSchema = z.strictObject({ id: z.string(), at: entrySchema, by: entrySchema, direction: z.enum(['up', 'down']) });
export type DraftStep = z.infer<typeof draftStepSchema>;

/** One run as it stands on the screen. `angle` is the turn's size in degrees as typed; which way it goes is `way`. */
const draftRunSchema = z.strictObject({
  id: z.string(),
  length: entrySchema,
  way: waySchema,
  angle: z.string(),
  width: entrySchema,
  thickness: entrySchema,
  steps: z.array(draftStepSchema),
});
export type DraftRun = z.infer<typeof draftRunSchema>;

/** What a browser keeps of an outline that is not saved yet. */
export const keptOutlineSchema = z.strictObject({ version: z.int(), runs: z.array(draftRunSchema) });

/** The outline as it is being drawn. Everything typed is kept as text, so that a refused entry loses nothing. */
export interface OutlineDraft {
  runs: DraftRun[];
  /** The outline version on the server that this was drawn over. */
  version: number;
  /** The run that is open for editing, and the one that was closed last. */
  open: string | null;
  closed: string | null;
  /** Changed since it was loaded or saved. */
  dirty: boolean;
  /** Fields whose refusal is shown: left once, or asked for by saving. */
  left: readonly string[];
  /** What was typed here before somebody else's outline was loaded over it. */
  setAside: DraftRun[] | null;
}

export type LengthField = 'length' | 'width' | 'thickness';

export type OutlineAction =
  | { type: 'load'; runs: DraftRun[]; version: number }
  | { type: 'load-theirs'; runs: DraftRun[]; version: number }
  | { type: 'take-back' }
  | { type: 'saved'; version: number }
  | { type: 'open'; runId: string | null }
  | { type: 'add-run'; id: string }
  | { type: 'remove-run'; runId: string }
  | { type: 'type-length'; runId: string; field: LengthField; text: string }
  | { type: 'type-angle'; runId: string; text: string }
  | { type: 'turn'; runId: string; way: Way }
  | { type: 'mend'; runId: string; entry: Entry }
  | { type: 'add-step'; runId: string; id: string }
  | { type: 'remove-step'; runId: string; stepId: string }
  | { type: 'type-step'; runId: string; stepId: string; field: 'at' | 'by'; text: string }
  | { type: 'step-direction'; runId: string; stepId: string; direction: DraftStep['direction'] }
  | { type: 'fill'; runs: DraftRun[] }
  | { type: 'leave'; field: string }
  | { type: 'leave-all'; fields: readonly string[] };

const typed = (text: string): Entry => ({ text, kept: null });
const EMPTY = typed('');

/** A new run: nothing measured yet, turning right by a right angle, which most runs do. */
export function newRun(id: string): DraftRun {
  return { id, length: EMPTY, way: 'right', angle: '90', width: EMPTY, thickness: EMPTY, steps: [] };
}

/** A run of the server as it is typed again. `show` prints a length in the job's unit. */
export function draftRun(run: Run, show: (length: Nm) => string): DraftRun {
  const entry = (length: Nm | null): Entry => (length === null ? EMPTY : { text: show(length), kept: length });
  return {
    id: run.id,
    length: entry(run.length),
    way: run.turn === 0 ? 'straight' : run.turn > 0 ? 'right' : 'left',
    angle: run.turn === 0 ? '90' : String(Math.abs(run.turn)),
    width: entry(run.width),
    thickness: entry(run.thickness),
    steps: run.steps.map((step) => ({
      id: step.id,
      at: entry(step.at),
      by: entry(Math.abs(step.by)),
      direction: step.by < 0 ? 'down' : 'up',
    })),
  };
}

export const emptyDraft: OutlineDraft = {
  runs: [],
  version: 0,
  open: null,
  closed: null,
  dirty: false,
  left: [],
  setAside: null,
};

const withRuns = (draft: OutlineDraft, runs: DraftRun[]): OutlineDraft => ({ ...draft, runs, dirty: true });

const changeRun = (draft: OutlineDraft, runId: string, change: (run: DraftRun) => DraftRun): OutlineDraft =>
  withRuns(
    draft,
    draft.runs.map((run) => (run.id === runId ? change(run) : run)),
  );

const changeStep = (draft: OutlineDraft, runId: string, stepId: string, change: (step: DraftStep) => DraftStep): OutlineDraft =>
  changeRun(draft, runId, (run) => ({ ...run, steps: run.steps.map((step) => (step.id === stepId ? change(step) : step)) }));

/** The one place where the outline being drawn changes. Pure: identities come with the action. */
export function outlineReducer(draft: OutlineDraft, action: OutlineAction): OutlineDraft {
  switch (action.type) {
    case 'load':
      return { ...emptyDraft, runs: action.runs, version: action.version };
    case 'load-theirs':
      return { ...emptyDraft, runs: action.runs, version: action.version, setAside: draft.runs };
    case 'take-back':
      return draft.setAside ? { ...withRuns(draft, draft.setAside), open: null, setAside: null } : draft;
    case 'saved':
      return { ...draft, version: action.version, dirty: false, setAside: null };
    case 'open':
      return { ...draft, open: action.runId, closed: draft.open };
    case 'add-run':
      return { ...withRuns(draft, [...draft.runs, newRun(action.id)]), open: action.id };
    case 'remove-run':
      return {
        ...withRuns(
          draft,
          draft.runs.filter((run) => run.id !== action.runId),
        ),
        open: null,
      };
    case 'fill':
      return { ...withRuns(draft, action.runs), open: null, left: [] };
    case 'leave':
      return draft.left.includes(action.field) ? draft : { ...draft, left: [...draft.left, action.field] };
    case 'leave-all':
      return { ...draft, left: [...new Set([...draft.left, ...action.fields])] };
    default:
      return reduceRun(draft, action);
  }
}

type RunAction = Extract<OutlineAction, { runId: string }>;

function reduceRun(draft: OutlineDraft, action: Exclude<RunAction, { type: 'open' | 'remove-run' }>): OutlineDraft {
  switch (action.type) {
    case 'type-length':
      return changeRun(draft, action.runId, (run) => ({ ...run, [action.field]: typed(action.text) }));
    case 'type-angle':
      return changeRun(draft, action.runId, (run) => ({ ...run, angle: action.text }));
    case 'turn':
      return changeRun(draft, action.runId, (run) => ({ ...run, way: action.way }));
    case 'mend':
      return changeRun(draft, action.runId, (run) => ({ ...run, length: action.entry }));
    case 'add-step':
      return changeRun(draft, action.runId, (run) => ({
        ...run,
        steps: [...run.steps, { id: action.id, at: EMPTY, by: EMPTY, direction: 'down' }],
      }));
    case 'remove-step':
      return changeRun(draft, action.runId, (run) => ({ ...run, steps: run.steps.filter((step) => step.id !== action.stepId) }));
    case 'type-step':
      return changeStep(draft, action.runId, action.stepId, (step) => ({ ...step, [action.field]: typed(action.text) }));
    case 'step-direction':
      return changeStep(draft, action.runId, action.stepId, (step) => ({ ...step, direction: action.direction }));
  }
}
