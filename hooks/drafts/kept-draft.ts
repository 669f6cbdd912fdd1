import type { z } from 'zod';

/**
 * What is typed on a long form is kept in this browser until it is saved, so that a reload or a call in the trench loses nothing.
 * Field records do not come this way: they have the outbox, which is durable.
 */
const keyOf = (name: string) => `draft:${name}`;

/** Browsers in private windows, and phones that are full, have no store to give. */
function store(): Storage | null {
  try {
    return globalThis.localStorage ?? null;
  } catch {
    return null;
  }
}

/** Keeps it in this browser; where that has no room, what is typed lives as long as the page. */
export function keepDraft(name: string, draft: unknown): void {
  try {
    store()?.setItem(keyOf(name), JSON.stringify(draft));
  } catch (error) {
    // Full, or forbidden: `canKeepDrafts` has told the screen, and the form itself still holds what was typed.
    if (!(error instanceof DOMException)) throw error;
  }
}

/** Whether a reload would find what is typed: false where the browser gives no store or has no room left in it. */
export function canKeepDrafts(): boolean {
  const here = store();
  try {
    here?.setItem(keyOf('probe'), 'x');
    here?.removeItem(keyOf('probe'));
    return here !== null;
  } catch {
    return false;
  }
}

/** What was kept under this name, or null when there is nothing, or nothing that this version of the app can read. */
export function keptDraft<S extends z.ZodType>(name: string, schema: S): z.output<S> | null {
  const text = store()?.getItem(keyOf(name)) ?? null;
  if (text === null) return null;
  try {
    return schema.parse(JSON.parse(text));
  } catch {
    forgetDraft(name);
    return null;
  }
}

export function forgetDraft(name: string): void {
  store()?.removeItem(keyOf(name));
}
