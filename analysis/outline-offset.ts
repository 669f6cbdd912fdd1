import { AnalysisError } from './analysis-error';
import { nanometres, positiveLength } from './check-input';
import { onceRound, tangentOfHalf } from './plan-direction';
import type { OutlineRun } from './types';
import type { Nm } from './units';

/** What an outline was measured on. Faces are the outer ones: left of a clockwise walk, right of a counterclockwise one. */
export type OutlineLine = 'wall-face' | 'footing-face' | 'centre-line';

export interface OutlineSection {
  wallWidth: Nm;
  footingWidth: Nm;
  /** How far the wall's own centre stands outside the footing's; absent: centred. */
  wallOutBy?: Nm;
}

/** Distance of a line outward from the footing's centre line; inward is negative. @throws AnalysisError 'not-positive' and what lengths throw */
export function lineOffset(line: OutlineLine, section: OutlineSection): Nm {
  const wall = positiveLength('wallWidth', section.wallWidth);
  const footing = positiveLength('footingWidth', section.footingWidth);
  const outBy = nanometres('wallOutBy', section.wallOutBy ?? 0);
  switch (line) {
    case 'centre-line':
      return 0;
    case 'wall-face':
      return outBy + wall / 2;
    case 'footing-face':
      return footing / 2;
    default:
      throw new AnalysisError('unknown-line', `An outline is not measured on "${String(line)}".`, { line });
  }
}

/**
 * The parallel outline `outward` nm outside (negative: inside), mitred at every corner: a corner that turns with the walk lengthens both
 * its runs by outward · tan(turn / 2), one that turns against it shortens them. Exact for right angles, to a whole nm elsewhere; the
 * free ends of a strip stay square. Steps stay where they are on the ground.
 * @throws AnalysisError 'turn-folds-back' | 'offset-swallows-run' (details run, length) | 'offset-swallows-step' (details run, at)
 */
export function offsetOutline(runs: OutlineRun[], outward: Nm): OutlineRun[] {
  const by = nanometres('outward', outward);
  const { closed, sense } = onceRound(runs);
  const growth = runs.map((run, index) => {
    if (!closed && index === runs.length - 1) return 0;
    if (Math.abs(run.turn % 360) === 180) {
      throw new AnalysisError('turn-folds-back', `The turn of ${run.id} folds back on itself.`, { run: run.id });
    }
    return by * sense * tangentOfHalf(run.turn);
  });
  return runs.map((run, index) => {
    const atStart = (index === 0 ? (closed ? growth.at(-1) : 0) : growth[index - 1]) ?? 0;
    const length = nanometres(
      `length of ${run.id}`,
      Math.round(positiveLength(`length of ${run.id}`, run.length) + atStart + (growth[index] ?? 0)),
    );
    if (length <= 0) {
      throw new AnalysisError('offset-swallows-run', `Nothing is left of ${run.id} there.`, { run: run.id, length });
    }
    if (!run.steps) return { ...run, length };
    const steps = run.steps.map(({ at, by: rise }) => ({
      at: movedStep(run, at, atStart, length),
      by: nanometres(`step of ${run.id}`, rise),
    }));
    return { ...run, length, steps };
  });
}

function movedStep(run: OutlineRun, at: Nm, atStart: Nm, length: Nm): Nm {
  const moved = Math.round(nanometres(`step of ${run.id}`, at) + atStart);
  if (moved < 0 || moved > length) {
    throw new AnalysisError('offset-swallows-step', `The step of ${run.id} is not on the run there.`, { run: run.id, at });
  }
  return moved === 0 ? 0 : moved;
}

/** An outline measured on one line, as it is on another. @throws AnalysisError as `lineOffset` and `offsetOutline` */
export function outlineOn(runs: OutlineRun[], from: OutlineLine, to: OutlineLine, section: OutlineSection): OutlineRun[] {
  return offsetOutline(runs, lineOffset(to, section) - lineOffset(from, section));
}
