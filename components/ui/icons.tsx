import Svg, { Path } from 'react-native-svg';
import { useTokens } from '@/hooks/use-tokens';
import type { TokenName } from '@/constants/theme';

/** Drawn in a box of 24 × 24. Stroked ones are open lines, filled ones closed shapes. */
const shapes = {
  'chevron-left': { d: 'M14.5 5.5 9 12l5.5 6.5', stroke: 3 },
  'chevron-right': { d: 'M9.5 5.5 15 12l-5.5 6.5', stroke: 3 },
  'chevron-up': { d: 'M5.5 14.5 12 9l6.5 5.5', stroke: 3 },
  'chevron-down': { d: 'M5.5 9.5 12 15l6.5-5.5', stroke: 3 },
  tick: { d: 'M4.5 12.5 10 18 19.5 6.5', stroke: 2.6 },
  plus: { d: 'M12 5v14M5 12h14', stroke: 3 },
  minus: { d: 'M5 12h14', stroke: 3 },
  cross: { d: 'M6 6l12 12M18 6 6 18', stroke: 2.6 },
  'arrow-up': { d: 'M12 1 22.5 12H16v11H8V12H1.5Z', stroke: 0 },
  'arrow-down': { d: 'M12 23 1.5 12H8V1h8v11h6.5Z', stroke: 0 },
} as const;

export type IconName = keyof typeof shapes;

/** A drawn sign. It carries no words: whoever shows it says beside it, or in a label, what it means. */
export function Icon({ name, size = 24, tone = 'ink' }: { name: IconName; size?: number; tone?: TokenName }) {
  const colour = useTokens()[tone];
  const { d, stroke } = shapes[name];
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" aria-hidden>
      <Path d={d} fill={stroke ? 'none' : colour} stroke={stroke ? colour : 'none'} strokeWidth={stroke} />
    </Svg>
  );
}
