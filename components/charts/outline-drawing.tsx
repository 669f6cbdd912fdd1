import { useTranslation } from 'react-i18next';
import { View } from 'react-native';
import Svg, { Circle, G, Path } from 'react-native-svg';
import type { Nm } from '@/analysis';
import { typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { textWidth } from './axis-text';
import type { PlanPlace } from './chart-types';
import {
  bandWidth,
  fitPlan,
  outwardDirections,
  placeTexts,
  planHeight,
  spotPath,
  type PlanFit,
  type Spot,
} from './plan-geometry';
import { PlanTexts } from './plan-view';
import { useMeasuredWidth } from './use-measured-width';

export interface DrawnRun {
  id: string;
  from: PlanPlace;
  to: PlanPlace;
  /** Its length as the job writes it. */
  length: string;
  /** Its length is in question: written in the colour that says so. */
  doubtful?: boolean;
}

export interface OutlineDrawingProps {
  /** In walking order; the drawing grows as they are typed. */
  runs: readonly DrawnRun[];
  /** Steps: places where plan grade changes. */
  steps?: readonly PlanPlace[];
  /** Width of the footing. */
  width: Nm;
  /** Whether the last run ends where the first began. A miss is drawn as a gap wide enough to see. */
  closed: boolean;
  /** Whether it is meant to close; a strip is not, and has no gap. */
  strip?: boolean;
  heights?: [number, number];
}

const margin = { x: 62, y: 42 };
/** A miss of two inches in forty feet would be drawn thinner than a hair, in px. */
const leastGap = 12;

/** The outline as it is typed: the footing's band, the line that was measured, a circle at every corner and step, each run's length beside it. */
export function OutlineDrawing({ runs, steps = [], width, closed, strip = false, heights = [160, 360] }: OutlineDrawingProps) {
  const { t } = useTranslation('charts');
  const [room, onLayout] = useMeasuredWidth();
  const first = runs[0];
  const places = first ? [first.from, ...runs.map(({ to }) => to)] : [];
  const size = { width: room, height: planHeight(places, room, margin, heights) };
  const fit = fitPlan(places, size, margin);
  const spots = places.map(fit.toSpot);
  const line = closed ? spots.slice(0, -1) : spots;
  const drawn = closed || strip ? line : openedGap(line);
  const spoken = [
    closed ? t('outline.closed', { count: runs.length }) : t('outline.open', { count: runs.length }),
    ...runs.map(({ length }, at) => t('outline.run', { number: at + 1, length })),
  ];
  return (
    <View onLayout={onLayout} style={{ height: size.height }}>
      <Svg width={room} height={size.height} role="img" aria-label={spoken.join(' ')}>
        <OutlineLine spots={drawn} closed={closed} band={runs.length > 0 ? bandWidth(width, fit.scale) : 0} />
        <CornerRings spots={[...(closed || strip ? line : line.slice(0, -1)), ...steps.map(fit.toSpot)]} />
        <RunLengths runs={runs} fit={fit} corners={line} closed={closed} size={size} band={bandWidth(width, fit.scale)} />
      </Svg>
    </View>
  );
}

/** The line with its end drawn back along the last run, where the gap to the start would not be seen. */
function openedGap(spots: readonly Spot[]): Spot[] {
  const [start, end, before] = [spots[0], spots.at(-1), spots.at(-2)];
  if (!start || !end || !before || spots.length < 4) return [...spots];
  const gap = Math.hypot(end.x - start.x, end.y - start.y);
  const length = Math.hypot(end.x - before.x, end.y - before.y);
  if (gap >= leastGap || length < 2 * leastGap) return [...spots];
  const back = leastGap / length;
  return [...spots.slice(0, -1), { x: end.x + (before.x - end.x) * back, y: end.y + (before.y - end.y) * back }];
}

function OutlineLine({ spots, closed, band }: { spots: readonly Spot[]; closed: boolean; band: number }) {
  const tokens = useTokens();
  const path = spotPath(spots, closed);
  return (
    <G>
      <Path d={path} fill="none" stroke={tokens.rule} strokeWidth={band} strokeLinejoin="miter" strokeLinecap="butt" />
      <Path d={path} fill="none" stroke={tokens.ink} strokeWidth={2} strokeLinejoin="round" />
    </G>
  );
}

function CornerRings({ spots }: { spots: readonly Spot[] }) {
  const tokens = useTokens();
  return (
    <G>
      {spots.map(({ x, y }, at) => (
        <Circle key={at} cx={x} cy={y} r={6.5} fill={tokens.paper} stroke={tokens.ink} strokeWidth={2.6} />
      ))}
    </G>
  );
}

interface RunLengthsProps {
  runs: readonly DrawnRun[];
  fit: PlanFit;
  corners: readonly Spot[];
  closed: boolean;
  size: { width: number; height: number };
  band: number;
}

/** Lengths beside their runs, on the outside: doubtful ones first, then the longest, each where it touches no other. */
function RunLengths({ runs, fit, corners, closed, size, band }: RunLengthsProps) {
  const tokens = useTokens();
  const out = outwardDirections(corners, closed || corners.length > 3);
  const drawn = runs.map((run) => ({ run, from: fit.toSpot(run.from), to: fit.toSpot(run.to) }));
  const span = ({ from, to }: { from: Spot; to: Spot }) => Math.hypot(to.x - from.x, to.y - from.y);
  const ranked = drawn
    .map((item, at) => ({ ...item, way: normalOn(item, out[at]) }))
    .sort((a, b) => Number(b.run.doubtful ?? false) - Number(a.run.doubtful ?? false) || span(b) - span(a));
  const texts = placeTexts(
    ranked.map(({ run, from, to, way }) => {
      const away = band / 2 + 8 + (Math.abs(way.x) * textWidth(run.length, typeSize.small)) / 2 + Math.abs(way.y) * 8;
      return {
        key: run.id,
        text: run.length,
        middles: [1, -1].map((side) => beside(from, to, way, side * away)),
      };
    }),
    size,
    typeSize.small,
  );
  const doubtful = new Set(runs.filter((run) => run.doubtful).map(({ id }) => id));
  return <PlanTexts texts={texts} fill={(key) => (doubtful.has(key) ? tokens.high : tokens.ink)} />;
}

/** The place at a distance from the middle of a run, along a direction. */
const beside = (from: Spot, to: Spot, way: Spot, away: number): Spot => ({
  x: (from.x + to.x) / 2 + way.x * away,
  y: (from.y + to.y) / 2 + way.y * away,
});

/** The normal of a run on the side that its first corner faces away to. */
function normalOn({ from, to }: { from: Spot; to: Spot }, corner: Spot | undefined): Spot {
  const length = Math.max(Math.hypot(to.x - from.x, to.y - from.y), 1e-9);
  const normal = { x: (to.y - from.y) / length, y: -(to.x - from.x) / length };
  const away = corner ? normal.x * corner.x + normal.y * corner.y : 1;
  return away < -1e-9 ? { x: -normal.x, y: -normal.y } : normal;
}
