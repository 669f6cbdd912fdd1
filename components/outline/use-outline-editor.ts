import { useEffect, useReducer, useState } from 'react';
import { v7 as newId } from 'uuid';
import { readLength } from '@/components/lengths/read-length';
import { printLength } from '@/components/lengths/print-length';
import { isOutOfDate, useSetOutline } from '@/hooks/api/footing-queries';
import { canKeepDrafts, forgetDraft, keepDraft, keptDraft } from '@/hooks/drafts/kept-draft';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import { draftRun, emptyDraft, keptOutlineSchema, outlineReducer, type OutlineDraft } from './outline-draft';
import { gradesOf, outlineState, readOutline } from './read-outline';

const runsOf = (footing: Footing, job: Job) =>
  footing.runs.map((run) => draftRun(run, (length) => printLength(length, job.unitStyle)));

/** The server's outline, or what was being typed over it when the page last went away. */
function firstDraft(footing: Footing, job: Job, name: string): OutlineDraft {
  const loaded: OutlineDraft = { ...emptyDraft, runs: runsOf(footing, job), version: footing.outlineVersion };
  const kept = keptDraft(name, keptOutlineSchema);
  if (!kept) return loaded;
  if (kept.version !== footing.outlineVersion) return { ...loaded, setAside: kept.runs };
  return { ...loaded, runs: kept.runs, dirty: true };
}

/** Everything that the outline screen shows and does: the draft, what it reads as, and saving it. */
export function useOutlineEditor(footing: Footing, job: Job, personId: string) {
  const name = `outline:${personId}:${footing.id}`;
  const [draft, dispatch] = useReducer(outlineReducer, null, () => firstDraft(footing, job, name));
  const [kept] = useState(canKeepDrafts);
  const saving = useSetOutline(footing.id);
  const read = readOutline(draft.runs, (text) => readLength(text, { style: job.unitStyle, sign: 'any', bareDecimal: 'feet' }));
  const state = outlineState(read.drawn, job.graduation);
  const theirs = footing.outlineVersion > draft.version;

  useEffect(() => {
    if (draft.dirty) keepDraft(name, { version: draft.version, runs: draft.runs });
  }, [draft.dirty, draft.runs, draft.version, name]);
  // Somebody else saved, and nothing is being typed here: show theirs.
  useEffect(() => {
    if (theirs && !draft.dirty) dispatch({ type: 'load', runs: runsOf(footing, job), version: footing.outlineVersion });
  }, [theirs, draft.dirty, footing, job]);

  const loadTheirs = (fresh: Footing) => {
    saving.reset();
    dispatch({ type: 'load-theirs', runs: runsOf(fresh, job), version: fresh.outlineVersion });
    forgetDraft(name);
  };
  /** Saves when every entry reads and the outline can be; resolves to whether what is drawn is on the server. */
  const save = async (): Promise<boolean> => {
    dispatch({ type: 'leave-all', fields: Object.keys(read.refusals) });
    const refused = draft.runs.find((run) => Object.keys(read.refusals).some((field) => field.startsWith(run.id)));
    if (refused) dispatch({ type: 'open', runId: refused.id });
    if (!read.complete || state.kind === 'crosses') return false;
    if (!draft.dirty) return true;
    const saved = await saving.mutateAsync({ runs: read.drawn, version: draft.version }).catch(() => null);
    if (!saved) return false;
    dispatch({ type: 'saved', version: saved.outlineVersion });
    forgetDraft(name);
    return true;
  };
  return {
    draft,
    dispatch,
    read,
    state,
    grades: gradesOf(read.drawn, footing.planGrade),
    addRun: () => dispatch({ type: 'add-run', id: newId() }),
    save,
    saving: saving.isPending,
    /** The refusal of the last save; a stale version is told by `stale`. */
    refusal: saving.error && !isOutOfDate(saving.error) ? saving.error : null,
    // While this phone's own save is on its way, the newer version is its own.
    stale: !saving.isPending && (isOutOfDate(saving.error) || (theirs && draft.dirty)),
    loadTheirs,
    kept,
  };
}

export type OutlineEditor = ReturnType<typeof useOutlineEditor>;
