import Svg, { G, Path, Rect } from 'react-native-svg';
import type { Tokens } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { ChartStation } from './chart-types';
import { markPaths, type MarkShape, type PlacedMark } from './mark-shapes';

function paint(tokens: Tokens, shape: MarkShape, r: number) {
  switch (shape) {
    case 'high':
    case 'low':
      return { fill: tokens[shape], stroke: 'none' };
    case 'in':
      return { fill: tokens.on, stroke: 'none' };
    case 'not-shot':
      return { fill: 'none', stroke: tokens.rule2, strokeWidth: 2 };
    case 'suspect':
      return { fill: tokens.cautionTint, stroke: tokens.caution, strokeWidth: 2 };
    case 'suspect-sign':
      return { fill: 'none', stroke: tokens.caution, strokeWidth: Math.max(1.4, r * 0.34), strokeLinecap: 'round' as const };
    case 'close':
      return { fill: 'none', stroke: tokens.ink, strokeWidth: 1.8 };
  }
}

const order: readonly MarkShape[] = ['not-shot', 'in', 'high', 'low', 'suspect', 'suspect-sign', 'close'];

/** The marks of many stations: triangle up high, triangle down low, dot in, ring close, square with a question mark suspect, tick not shot. */
export function Marks({ marks, r = 5 }: { marks: readonly PlacedMark[]; r?: number }) {
  const tokens = useTokens();
  const paths = markPaths(marks, r);
  return (
    <G>{order.map((shape) => (paths[shape] ? <Path key={shape} d={paths[shape]} {...paint(tokens, shape, r)} /> : null))}</G>
  );
}

/** One mark in a line of text or a table's cell; the word stands beside it. */
export function MarkIcon({ station, size = 16 }: { station: Pick<ChartStation, 'mark' | 'close' | 'suspect'>; size?: number }) {
  return (
    <Svg width={size} height={size} viewBox="0 0 20 20" aria-hidden>
      <Marks marks={[{ ...station, x: 10, y: 10 }]} r={station.close ? 5 : 6.4} />
    </Svg>
  );
}

/** Plan grade as the stretched string: one straight heavy line with a block at each end. */
export function StringLine({ from, to, y, weight = 4 }: { from: number; to: number; y: number; weight?: number }) {
  const { line } = useTokens();
  const block = { width: weight * 2, height: weight * 3, rx: 1.5, fill: line };
  return (
    <G>
      <Path d={`M${from} ${y}H${to}`} stroke={line} strokeWidth={weight} fill="none" />
      <Rect x={from - block.width * 0.75} y={y - block.height / 2} {...block} />
      <Rect x={to - block.width * 0.25} y={y - block.height / 2} {...block} />
    </G>
  );
}
