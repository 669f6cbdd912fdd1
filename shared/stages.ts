import type { Footing, Stage, Stages } from './api/footing-schemas';
import { STAGES } from './api/footing-schemas';
import type { RoundState } from './round/round-state';
import type { Surface } from './rules';
import { walkOf } from './walk';
import { traceOutline, type Nm } from '@/analysis';

/** A round of a footing as its stages ask of it. */
export interface StageRound {
  surface: Surface;
  state: Pick<RoundState, 'targets' | 'shot' | 'of' | 'wholeReadLap'>;
}

/**
 * An outline is one when it comes back to where it began, or is a strip, which need not.
 * @param graduation nm: a miss of no more than the finest mark of the tape is none
 */
export function outlineCloses(footing: Pick<Footing, 'runs'>, graduation: Nm): boolean {
  if (footing.runs.length === 0) return false;
  return !walkOf(footing).closed || traceOutline(footing.runs, { closesWithin: graduation }).closure.length <= graduation;
}

/**
 * Which stages of a footing are behind it, from its outline and its rounds; nothing of this is stored.
 *
 * Outline: closes, or is a strip, and has stations. Dig: not needed, or every station of it shot. Rails: one whole lap by reading after the last
 * adjustment, each deciding shot within tolerance and with the laser held. Top: every station shot. Of several rounds of one surface the newest
 * that has a shot counts. Release and course come with the people who give them: neither is behind before it can be given.
 *
 * @param rounds oldest first
 * @param graduation nm, the job's
 */
export function deriveStages(
  footing: Pick<Footing, 'runs' | 'stations' | 'digNeeded'>,
  rounds: readonly StageRound[],
  graduation: Nm,
): Stages {
  const newest = (surface: Surface) => rounds.findLast((round) => round.surface === surface && round.state.shot > 0)?.state;
  const allShot = (surface: Surface) => {
    const state = newest(surface);
    return state !== undefined && state.of > 0 && state.shot === state.of;
  };
  const rails = newest('rails');
  const isDone: Record<Stage, boolean> = {
    outline: footing.stations.length > 0 && outlineCloses(footing, graduation),
    dig: !footing.digNeeded || allShot('dig'),
    rails:
      rails !== undefined &&
      rails.wholeReadLap &&
      rails.targets.every(({ deciding }) => deciding?.laser === 'held' && deciding.verdict === 'in'),
    release: false,
    top: allShot('top'),
    course: false,
  };
  return { done: STAGES.filter((stage) => isDone[stage]), now: STAGES.find((stage) => !isDone[stage]) ?? null };
}
