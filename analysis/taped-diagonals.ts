import { AnalysisError } from './analysis-error';
import { positiveLength } from './check-input';
import { diagonals } from './outline';
import type { OutlineRun } from './types';
import type { Nm } from './units';

export interface TapedDiagonal {
  /** Corner letters, either way round. */
  from: string;
  to: string;
  taped: Nm;
}

export interface DiagonalCheck extends TapedDiagonal {
  computed: Nm;
  /** Taped − computed: positive when the tape reads longer than the outline says. */
  difference: Nm;
}

/**
 * Diagonals as taped on the ground beside what the outline makes them.
 * @throws AnalysisError 'unknown-diagonal' (details from, to) | 'not-positive' | 'not-finite', and what an outline throws
 */
export function checkDiagonals(runs: OutlineRun[], taped: readonly TapedDiagonal[]): DiagonalCheck[] {
  const computed = diagonals(runs);
  return taped.map((diagonal) => {
    const { from, to } = diagonal;
    const found = computed.find((known) => (known.from === from && known.to === to) || (known.from === to && known.to === from));
    if (!found) throw new AnalysisError('unknown-diagonal', `The outline has no diagonal from ${from} to ${to}.`, { from, to });
    const length = positiveLength(`diagonal ${from} to ${to}`, diagonal.taped);
    return { from, to, taped: length, computed: found.length, difference: length - found.length };
  });
}
