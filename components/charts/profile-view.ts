import type { Nm } from '@/analysis';

export interface ProfileView {
  from: Nm;
  to: Nm;
}

/** Closest that a look goes: a sixteenth of the walk. */
const closest = 16;

/**
 * The part of the walk to show after looking `times` closer (above 1) or wider (under 1) about a place, which stays where it
 * is drawn as far as the ends of the walk allow. The whole walk is undefined.
 */
export function zoomView(view: ProfileView | undefined, about: Nm, times: number, length: Nm): ProfileView | undefined {
  const old = view ?? { from: 0, to: length };
  const span = Math.max((old.to - old.from) / times, length / closest);
  if (span >= length) return undefined;
  const share = (about - old.from) / (old.to - old.from);
  const from = Math.min(Math.max(about - share * span, 0), length - span);
  return { from, to: from + span };
}

/** The view moved just so far that a place lies within it, with a tenth of it beyond where the walk goes on. */
export function followView(view: ProfileView | undefined, at: Nm, length: Nm): ProfileView | undefined {
  if (!view) return undefined;
  const span = view.to - view.from;
  const edge = span / 10;
  if (at >= view.from + edge && at <= view.to - edge) return view;
  const wanted = at < view.from + edge ? at - edge : at + edge - span;
  const from = Math.min(Math.max(wanted, 0), length - span);
  return { from, to: from + span };
}
