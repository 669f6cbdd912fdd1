import type { RoundSeries, RoundState } from '@/shared/round/round-state';

/**
 * The setup and rod that a person shoots from: their own newest one. Another person's may stand on another rod or a moved
 * laser, so it is taken only when somebody says so.
 */
export function ownSeries(state: RoundState, personId: string): RoundSeries | null {
  return state.series.findLast((series) => series.person.id === personId) ?? null;
}

/** Somebody else's newest series that has a backsight: what can be taken over. */
export function othersSeries(state: RoundState, personId: string): RoundSeries | null {
  return state.series.findLast((series) => series.person.id !== personId && series.hi !== null) ?? null;
}
