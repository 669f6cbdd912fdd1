import type { CourseGroup, Nm } from '@/analysis';
import { printRound, printSmall } from '@/components/lengths/print-length';
import { i18n } from '@/hooks/i18n/i18n';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundResults, Shape } from '@/shared/round/round-results';
import type { RoundState } from '@/shared/round/round-state';
import { toleranceWords } from '../lengths/length-words';
import { shortPlace } from './place-words';

/** Rounded to the mark that the job reads to, so that a derived length is not said finer than anybody can see. */
export function toMark(length: Nm, graduation: Nm): Nm {
  return Math.sign(length) * Math.round(Math.abs(length) / graduation) * graduation + 0;
}

/** Above, below or at plan grade. */
export function heightWords(offset: Nm, bundle: RoundBundle): string {
  const { unitStyle, graduation } = bundle.job;
  const rounded = toMark(offset, graduation);
  if (rounded === 0) return i18n.t('results:range.at');
  return i18n.t(rounded > 0 ? 'results:range.above' : 'results:range.below', {
    height: printSmall(Math.abs(rounded), unitStyle),
  });
}

/** Plan grade of the highest step of a group: its course heights are said against it. */
export function groupGrade(group: CourseGroup, runs: { id: string; planGrade: Nm }[]): Nm {
  return Math.max(...runs.filter((run) => group.runs.includes(run.id)).map((run) => run.planGrade));
}

/** Window of course heights over plan grade, drawn in to whole marks; null when no mark lies in it. */
export function windowInMarks(window: { from: Nm; to: Nm }, grade: Nm, graduation: Nm): { from: Nm; to: Nm } | null {
  const from = Math.ceil((window.from - grade) / graduation) * graduation + 0;
  const to = Math.floor((window.to - grade) / graduation) * graduation + 0;
  return from <= to ? { from, to } : null;
}

/** "7/16″ to 1/2″ above grade" */
export function rangeWords(range: { from: Nm; to: Nm }, bundle: RoundBundle): string {
  if (range.from === range.to) return heightWords(range.from, bundle);
  const words = {
    from: printSmall(Math.abs(range.from), bundle.job.unitStyle),
    to: printSmall(Math.abs(range.to), bundle.job.unitStyle),
  };
  if (range.from >= 0) return i18n.t('results:range.bothAbove', words);
  return range.to <= 0 ? i18n.t('results:range.bothBelow', words) : i18n.t('results:range.across', words);
}

/** The sentence under "can the wall be set?". */
export function wallWords(bundle: RoundBundle, state: RoundState, wall: NonNullable<RoundResults['wall']>): string {
  const { bedRule, job } = bundle;
  const limits = { least: printSmall(bedRule.least, bedRule.style), most: printSmall(bedRule.most, bedRule.style) };
  if (wall.answer === 'not-yet') return i18n.t('results:wall.notYet', { shot: state.shot, of: state.of });
  if (wall.answer === 'cannot-tell') return i18n.t('results:wall.cannotTell');
  const [group] = wall.groups;
  if (wall.answer === 'can-be-set' && group?.window) {
    if (wall.groups.length > 1) return i18n.t('results:wall.windowSteps', { ...limits, count: wall.groups.length });
    const exact = { from: group.window.from - groupGrade(group, wall.runs), to: group.window.to - groupGrade(group, wall.runs) };
    const range = windowInMarks(group.window, groupGrade(group, wall.runs), job.graduation) ?? exact;
    if (range.from === range.to)
      return i18n.t('results:wall.windowTight', { ...limits, height: heightWords(range.from, bundle) });
    return i18n.t('results:wall.window', {
      ...limits,
      range: rangeWords(range, bundle),
      room: printSmall(range.to - range.from, job.unitStyle),
    });
  }
  const short = printSmall(toMark(Math.max(...wall.groups.map((one) => one.shortBy)), job.graduation), job.unitStyle);
  if (wall.answer === 'after-grinding') {
    const length = wall.groups.reduce(
      (sum, one) => sum + (one.options.find((option) => option.kind === 'least-material')?.grindLength ?? 0),
      0,
    );
    return i18n.t('results:wall.grind', { ...limits, short, length: grindLengthWords(length, bundle) });
  }
  return i18n.t('results:wall.no', { ...limits, short, grind: printSmall(bedRule.grindMost, bedRule.style) });
}

/** A length along the footing, to the foot or the tenth of a metre: grinding is not measured finer, and is never said too short. */
export function grindLengthWords(length: Nm, bundle: RoundBundle): string {
  return distanceWords(length, bundle, Math.ceil);
}

/** A distance across the footing, to the foot or the tenth of a metre. */
export function distanceWords(length: Nm, bundle: RoundBundle, round: (count: number) => number = Math.round): string {
  const { unitStyle } = bundle.job;
  const step = unitStyle === 'metric' ? 100_000_000 : 304_800_000;
  const rounded = round(length / step) * step;
  return unitStyle === 'metric' ? `${(rounded / 1_000_000_000).toFixed(1)} m` : printRound(rounded, unitStyle);
}

/** The sentences under "is it to grade?", without the worst place, which is set in bold. */
export function gradeWords(bundle: RoundBundle, state: RoundState): { before: string; after: string } {
  const tolerance = toleranceWords(bundle.toleranceRule);
  const deciding = state.targets.flatMap((target) => (target.deciding ? [target.deciding] : []));
  const doubted = deciding.filter((shot) => shot.laser === 'doubted').length;
  const unchecked = deciding.filter((shot) => shot.laser === 'unchecked').length;
  const closeIn = deciding.filter((shot) => shot.close && shot.verdict !== 'high' && shot.verdict !== 'low').length;
  const close = closeIn > 0 ? i18n.t('results:grade.close', { count: closeIn }) : '';
  switch (state.verdict) {
    case 'not-yet':
      return { before: i18n.t('results:grade.outSoFar', { count: state.out, tolerance }), after: '' };
    case 'cannot-tell':
      return {
        before:
          doubted > 0
            ? i18n.t('results:grade.doubted', { count: doubted })
            : i18n.t('results:grade.unchecked', { count: unchecked }),
        after: state.out > 0 ? i18n.t('results:grade.out', { count: state.out, of: state.of, tolerance }) : '',
      };
    case 'not-to-grade':
      return { before: i18n.t('results:grade.out', { count: state.out, of: state.of, tolerance }), after: close };
    case 'too-close-to-call':
      return { before: i18n.t('results:grade.closeOnly', { count: closeIn }), after: '' };
    case 'to-grade':
      return { before: i18n.t('results:grade.allIn', { of: state.of, tolerance }), after: close };
  }
}

/** Smallest angle between two azimuths, degrees. */
function apart(first: number, second: number): number {
  return Math.abs(((first - second + 540) % 360) - 180);
}

/** The targets that the fitted surface puts highest and lowest. */
function extremes(shape: Shape): { high: string; low: string } | null {
  const [first] = shape.fit.points;
  if (!first) return null;
  const high = shape.fit.points.reduce((found, point) => (point.fitted > found.fitted ? point : found), first);
  const low = shape.fit.points.reduce((found, point) => (point.fitted < found.fitted ? point : found), first);
  return { high: high.id, low: low.id };
}

/** High and low end of the tilt by name: what the half turn of the laser is shot on. */
export function tiltEnds(bundle: RoundBundle, state: RoundState, shape: Shape): { high: string; low: string } {
  const ends = extremes(shape);
  const name = (key: string | undefined) => {
    const target = state.targets.find((one) => one.key === key);
    return target ? shortPlace(bundle.footing, target) : '';
  };
  return { high: name(ends?.high), low: name(ends?.low) };
}

/** "toward Mill St", "away from Mill St", else toward the lowest place; null where nothing falls. */
export function fallWords(bundle: RoundBundle, state: RoundState, shape: Shape): string | null {
  if (shape.fallAzimuth === null || toMark(shape.drop, bundle.job.graduation) === 0) return null;
  const { landmark } = bundle.footing;
  if (landmark && apart(shape.fallAzimuth, landmark.azimuth) <= 45)
    return i18n.t('results:shape.toward', { place: landmark.name });
  if (landmark && apart(shape.fallAzimuth, landmark.azimuth) >= 135)
    return i18n.t('results:shape.awayFrom', { place: landmark.name });
  return i18n.t('results:shape.toward', { place: tiltEnds(bundle, state, shape).low });
}

/** What the tilt means, against reading error and against this laser. */
export function tiltWords(bundle: RoundBundle, state: RoundState, shape: Shape): string {
  if (shape.fit.model === 'level') return i18n.t('results:shape.modelLevel');
  const line = shape.fit.model === 'line' ? `${i18n.t('results:shape.modelLine')} ` : '';
  const against = shape.againstLaser;
  if (!against) return line.trim();
  if (!against.beyondReading) return `${line}${i18n.t('results:shape.readingExplains')}`;
  return `${line}${i18n.t(against.beyondLaser ? 'results:shape.laserCannot' : 'results:shape.laserMayBe', tiltEnds(bundle, state, shape))}`;
}

const CUBIC_FOOT = 0.3048 ** 3;

/** A bed's volume as it is bought: cubic feet to the tenth, or litres. */
export function volumeWords(cubicMetres: number, bundle: RoundBundle): string {
  if (bundle.job.unitStyle === 'metric') return `${(cubicMetres * 1000).toFixed(cubicMetres < 0.1 ? 1 : 0)} L`;
  return `${(cubicMetres / CUBIC_FOOT).toFixed(1)} ft³`;
}
