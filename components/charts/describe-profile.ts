import type { TFunction } from 'i18next';
import { formatLength, type Nm } from '@/analysis';
import type { ChartUnits, ProfilePoint } from './chart-types';
import type { ProfileGeometry } from './profile-geometry';

type Words = TFunction<'charts'>;

/** A deviation in words: "1/4″ low", "1/16″ high", "on grade". */
export function deviationWords(deviation: Nm, units: ChartUnits, t: Words): string {
  const size = formatLength(Math.abs(Math.round(deviation)), units.style, units.graduation);
  if (size === formatLength(0, units.style, units.graduation)) return t('onGrade');
  return deviation > 0 ? t('high', { size }) : t('low', { size });
}

/** One station and what it came to: "C, 1/4″ low, out of tolerance". */
export function stationWords(point: ProfilePoint, units: ChartUnits, t: Words): string {
  if (point.deviation === null) return t('station.notShot', { station: point.label });
  const parts = [t('station.shot', { station: point.label, deviation: deviationWords(point.deviation, units, t) })];
  if (point.suspect) parts.push(t('station.suspect'));
  if (point.close) parts.push(t('station.close'));
  else if (point.mark === 'high' || point.mark === 'low') parts.push(t('station.out'));
  return parts.join(', ');
}

/** What the picture shows, for whoever cannot see it: how many of each, and the lowest and highest place. */
export function describeProfile(points: readonly ProfilePoint[], units: ChartUnits, t: Words): string {
  const shot = points.flatMap((point) => (point.deviation === null ? [] : [{ point, deviation: point.deviation }]));
  const sentences = [t('profile.shot', { shot: shot.length, count: points.length })];
  if (shot.length === 0) return sentences.join(' ');
  const count = (mark: ProfilePoint['mark']) => shot.filter(({ point }) => point.mark === mark).length;
  sentences.push(t('profile.counts', { in: count('in'), high: count('high'), low: count('low') }));
  const close = shot.filter(({ point }) => point.close).length;
  if (close > 0) sentences.push(t('profile.close', { count: close }));
  const suspects = shot.filter(({ point }) => point.suspect).map(({ point }) => point.label);
  if (suspects.length > 0) sentences.push(t('profile.suspect', { stations: suspects.join(', ') }));
  const lowest = shot.reduce((a, b) => (b.deviation < a.deviation ? b : a));
  const highest = shot.reduce((a, b) => (b.deviation > a.deviation ? b : a));
  sentences.push(
    t('profile.ends', {
      lowest: lowest.point.label,
      low: deviationWords(lowest.deviation, units, t),
      highest: highest.point.label,
      high: deviationWords(highest.deviation, units, t),
    }),
  );
  return sentences.join(' ');
}

/** How much larger heights are drawn than distances, and in what unit their axis counts: "heights in inches, ×800". */
export function heightsNote({ exaggeration }: Pick<ProfileGeometry, 'exaggeration'>, { style }: ChartUnits, t: Words): string {
  return t('heightsIn', { unit: t(`unit.${style}`), times: formatTimes(exaggeration, t('thousands')) });
}

/** Whole times with the language's thousands mark; a long footing drawn small may have fewer than ten. */
const formatTimes = (times: number, mark: string) =>
  times >= 10 ? String(Math.round(times)).replace(/\B(?=(\d{3})+$)/g, mark) : String(Number(times.toFixed(1)));
