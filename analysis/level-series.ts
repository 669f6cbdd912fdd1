import { AnalysisError } from './analysis-error';
import { finite, lengthFromZero, nanometres } from './check-input';
import type { LaserState, Reading, Series } from './types';
import type { Nm } from './units';

/** A series as it stands: struck readings are absent, and the backsights are one number. */
export interface LiveSeries {
  id: string;
  checkLimit: Nm;
  readings: Reading[];
  /** The mark that the height of instrument comes from; null without a live backsight. */
  mark: string | null;
  /** Mean of all backsights on the mark, whole nm; 0 without one. */
  backsight: Nm;
  backsightSpread: Nm;
  foresights: Reading[];
  /** Every re-reading: kind 'check', and backsights that did not make the height of instrument. */
  checks: Reading[];
}

const KINDS: readonly Reading['kind'][] = ['backsight', 'shot', 'check', 'foresight'];

function checked(reading: Reading): Reading {
  if (!KINDS.includes(reading.kind)) {
    throw new AnalysisError('unknown-reading-kind', `Reading ${reading.id} is of no known kind.`, {
      id: reading.id,
      kind: reading.kind,
    });
  }
  if (reading.order !== undefined) finite(`order of ${reading.id}`, reading.order);
  return { ...reading, reading: nanometres(`reading ${reading.id}`, reading.reading) };
}

/** Backsights precede the first shot; where the first one was struck and taken again later, the first live ones count. */
function heightGivers(readings: readonly Reading[]): Reading[] {
  const sighted = ({ kind }: Reading) => kind === 'shot' || kind === 'foresight';
  const isBacksight = ({ kind }: Reading) => kind === 'backsight';
  const firstSight = readings.findIndex(sighted);
  const before = (firstSight === -1 ? readings : readings.slice(0, firstSight)).filter(isBacksight);
  if (before.length > 0) return before;
  const late = readings.slice(Math.max(readings.findIndex(isBacksight), 0));
  const until = late.findIndex(sighted);
  return (until === -1 ? late : late.slice(0, until)).filter(isBacksight);
}

/** @throws AnalysisError 'not-finite' | 'out-of-range' | 'negative' | 'unknown-reading-kind' */
export function liveSeries(series: Series): LiveSeries {
  const readings = series.readings.map(checked).filter(({ struck }) => struck !== true);
  const givers = heightGivers(readings);
  const mark = givers[0]?.point ?? null;
  const backsights = givers.filter(({ point }) => point === mark);
  const values = backsights.map(({ reading }) => reading);
  const sum = values.reduce((total, value) => total + value, 0);
  return {
    id: series.id,
    checkLimit: lengthFromZero(`check limit of ${series.id}`, series.checkLimit),
    readings,
    mark,
    backsight: values.length > 1 ? Math.round(sum / values.length) + 0 : sum,
    backsightSpread: values.length > 1 ? Math.max(...values) - Math.min(...values) : 0,
    foresights: readings.filter(({ kind }) => kind === 'foresight'),
    checks: readings.filter(
      (reading) => reading.kind === 'check' || (reading.kind === 'backsight' && !backsights.includes(reading)),
    ),
  };
}

/** How far the mark seems to have moved when it is read again: positive when it comes out high. */
export function laserError(series: LiveSeries, check: Reading): Nm {
  return series.backsight - check.reading;
}

/**
 * Held, not checked or doubted, for every shot by id. Shots between the backsight (or the last good check) and a good check are held;
 * between it and a failed one, and after that to the end, doubted.
 */
export function laserStates(series: LiveSeries): Map<string, LaserState> {
  const states = new Map<string, LaserState>();
  let waiting: string[] = [];
  let anchored = false;
  let moved = false;
  for (const reading of series.readings) {
    if (reading.kind === 'shot') {
      states.set(reading.id, moved ? 'doubted' : 'unchecked');
      waiting.push(reading.id);
    } else if (series.mark !== null && reading.point === series.mark && series.checks.includes(reading)) {
      const good = Math.abs(laserError(series, reading)) <= series.checkLimit;
      if (!moved) for (const id of waiting) if (!good || anchored) states.set(id, good ? 'held' : 'doubted');
      moved ||= !good;
      anchored = true;
      waiting = [];
    } else if (reading.kind === 'backsight' && !series.checks.includes(reading)) {
      anchored = true;
      waiting = [];
    }
  }
  return states;
}
