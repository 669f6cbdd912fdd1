import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet } from 'react-native';
import type { ChartUnits, ProfilePoint } from './chart-types';
import { stationWords } from './describe-profile';
import { pressedAt } from './pressed-at';
import type { ProfileGeometry } from './profile-geometry';

interface ProfileWalkerProps {
  points: readonly ProfilePoint[];
  geometry: ProfileGeometry;
  units: ChartUnits;
  /** Index of the station that is read; null before the first. */
  at: number | null;
  onRead: (index: number) => void;
  /** Closer (1) or wider (−1). */
  onZoom: (way: 1 | -1) => void;
}

/** Lies over the profile: a pointer or the arrow keys read it station by station, plus and minus look closer and wider. */
export function ProfileWalker({ points, geometry, units, at, onRead, onZoom }: ProfileWalkerProps) {
  const { t } = useTranslation('charts');
  const last = points.length - 1;
  const here = points[at ?? 0];
  const readAt = (x: number | undefined) => {
    if (x === undefined) return;
    const index = nearestIndex(geometry, x);
    if (index !== null && index !== at) onRead(index);
  };
  // The web's own attributes and events, which react-native's types do not know.
  const web = {
    onKeyDown: (event: { key: string; preventDefault(): void }) => {
      const to: Record<string, number> = {
        ArrowRight: at === null ? 0 : Math.min(at + 1, last),
        ArrowLeft: Math.max((at ?? 0) - 1, 0),
        Home: 0,
        End: last,
      };
      const next = to[event.key];
      if (next !== undefined) onRead(next);
      else if (event.key === '+' || event.key === '=') onZoom(1);
      else if (event.key === '-') onZoom(-1);
      else return;
      event.preventDefault();
    },
    onMouseMove: ({ nativeEvent }: { nativeEvent: { offsetX?: number } }) => readAt(nativeEvent.offsetX),
  };
  if (!here) return null;
  return (
    <Pressable
      {...web}
      role="slider"
      aria-label={t('profile.walk')}
      aria-valuemin={1}
      aria-valuemax={points.length}
      aria-valuenow={(at ?? 0) + 1}
      aria-valuetext={stationWords(here, units, t)}
      onPress={(event) => readAt(pressedAt(event)?.x)}
      style={StyleSheet.absoluteFill}
    />
  );
}

/** Index of the station drawn nearest to an x of the picture, among those in view. */
function nearestIndex({ marks, field }: ProfileGeometry, x: number): number | null {
  return marks.reduce<number | null>((best, mark, index) => {
    if (mark.x < field.left - 1 || mark.x > field.right + 1) return best;
    const rival = best === null ? undefined : marks[best];
    return rival && Math.abs(rival.x - x) <= Math.abs(mark.x - x) ? best : index;
  }, null);
}
