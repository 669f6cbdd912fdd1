import Svg, { Path, Rect } from 'react-native-svg';
import { themes } from '@/constants/theme';

/** The mark: a rod's ticks and the string line through them. The same in both themes, as on the phone's home screen. */
export function AppMark({ size = 34 }: { size?: number }) {
  const { ink, line } = themes.light;
  return (
    <Svg width={size} height={size} viewBox="0 0 34 34" aria-hidden>
      <Rect width={34} height={34} rx={7.5} fill={ink} />
      <Path d="M11 3.6V30.4M9.8 4.8H22M11 13H18M11 21.2H22M9.8 29.2H18" fill="none" stroke="#FFFFFF" strokeWidth={2.4} />
      <Path d="M2 17H32" fill="none" stroke={line} strokeWidth={4} />
    </Svg>
  );
}
