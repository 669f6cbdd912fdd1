import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet, View } from 'react-native';
import Svg from 'react-native-svg';
import { VictoryAxis } from 'victory-native/lib/components/victory-axis';
import { VictoryChart } from 'victory-native/lib/components/victory-chart';
import { VictoryLine } from 'victory-native/lib/components/victory-line';
import type { Nm } from '@/analysis';
import { fonts } from '@/constants/fonts';
import { radius, space, target, typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { Icon } from '@/components/ui/icons';
import { Body, Heading } from '@/components/ui/text';
import type { ChartTolerance, ChartUnits, ProfileCorner, ProfilePoint } from './chart-types';
import { describeProfile, heightsNote, stationWords } from './describe-profile';
import { Legend } from './legend';
import { Marks, StringLine } from './marks';
import { markRadius, profileGeometry, type ProfileGeometry, type ProfileMark } from './profile-geometry';
import { BeyondHeights, CurrentStation, ProfileGround } from './profile-strip';
import { followView, zoomView, type ProfileView } from './profile-view';
import { ProfileWalker } from './profile-walker';
import { useMeasuredWidth } from './use-measured-width';

export interface ProfileVictoryProps {
  /** The card's heading; beside it stands how much larger heights are drawn than distances. */
  title: string;
  /** In walking order, one rail. */
  points: readonly ProfilePoint[];
  corners: readonly ProfileCorner[];
  /** The whole walk round the footing. */
  length: Nm;
  tolerance: ChartTolerance;
  units: ChartUnits;
  /** Of the drawing, in px; 200 unless said. */
  height?: number;
  /** Told as the reading line moves from station to station. */
  onStation?: (id: string) => void;
}

/** The profile around the footing: the string line, the band of tolerance, every station's mark; zoomed and read by pointer or keys. */
export default function ProfileVictory({ title, height = 200, onStation, ...data }: ProfileVictoryProps) {
  const { t } = useTranslation('charts');
  const [width, onLayout] = useMeasuredWidth();
  const [at, setAt] = useState<number | null>(null);
  const [view, setView] = useState<ProfileView | undefined>(undefined);
  const geometry = profileGeometry({ ...data, width, height, view });
  const here = at === null ? undefined : data.points[at];
  const read = (next: number) => {
    const point = data.points[next];
    if (!point) return;
    setAt(next);
    setView((old) => followView(old, point.at, data.length));
    onStation?.(point.id);
  };
  const zoom = (way: 1 | -1) => setView((old) => zoomView(old, here?.at ?? data.length / 2, way > 0 ? 2 : 0.5, data.length));
  return (
    <View style={styles.chart}>
      <View style={styles.head}>
        <Heading level={2}>{title}</Heading>
        <Body size="tiny" tone="ink2">
          {heightsNote(geometry, data.units, t)}
        </Body>
      </View>
      <View onLayout={onLayout} style={{ height }}>
        <View role="img" aria-label={describeProfile(data.points, data.units, t)}>
          <Svg width={width} height={height} aria-hidden>
            <ProfileGround geometry={geometry} ticks={false} />
            <StringLine from={geometry.field.left} to={geometry.field.right} y={geometry.grade} />
            <ChartBody geometry={geometry} points={data.points} size={{ width, height }} />
            <BeyondHeights geometry={geometry} />
            {here ? <CurrentStation x={geometry.x(here.at)} height={geometry.field.bottom} /> : null}
          </Svg>
        </View>
        <ProfileWalker points={data.points} geometry={geometry} units={data.units} at={at} onRead={read} onZoom={zoom} />
      </View>
      <View style={styles.below}>
        <View role="status" style={styles.reading}>
          {here ? <Body size="small">{stationWords(here, data.units, t)}</Body> : <Legend stations={data.points} />}
        </View>
        <ZoomKey name="minus" label={t('profile.wider')} onPress={() => zoom(-1)} off={!view} />
        <ZoomKey name="plus" label={t('profile.closer')} onPress={() => zoom(1)} off={false} />
      </View>
      {here ? <Legend stations={data.points} /> : null}
    </View>
  );
}

interface ChartBodyProps {
  geometry: ProfileGeometry;
  points: readonly ProfilePoint[];
  size: { width: number; height: number };
}

function ChartBody({ geometry, points, size }: ChartBodyProps) {
  const tokens = useTokens();
  const { field, heights, shown, view } = geometry;
  const labels = new Map(geometry.ticks.map(({ height, label }) => [height, label]));
  const inView = points.flatMap((point, index) => {
    const mark = geometry.marks[index];
    if (!mark || point.at < view.from || point.at > view.to) return [];
    const y = point.deviation === null ? null : Math.min(Math.max(point.deviation, shown.low), shown.high);
    return [{ x: point.at, y, mark }];
  });
  const r = markRadius({ marks: inView.map(({ mark }) => mark), field });
  const tickText = { fontFamily: fonts.figureMedium, fontSize: typeSize.tiny, fill: tokens.ink2, padding: 8 };
  const hidden = { axis: { stroke: 'none' }, ticks: { stroke: 'none' }, grid: { stroke: 'none' }, tickLabels: tickText };
  return (
    <VictoryChart
      standalone={false}
      width={size.width}
      height={size.height}
      padding={{ left: field.left, right: size.width - field.right, top: field.top, bottom: size.height - field.bottom }}
      domain={{ x: [view.from, view.to], y: [heights.low, heights.high] }}
    >
      <VictoryAxis
        dependentAxis
        tickValues={geometry.ticks.map(({ height }) => height)}
        tickFormat={(height: number) => labels.get(height) ?? ''}
        style={hidden}
      />
      <VictoryLine data={inView} style={{ data: { stroke: tokens.ink, strokeWidth: 1.4 } }} />
      <MarksLayer marks={inView.map(({ x, y, mark }) => ({ ...mark, at: x, height: y ?? 0 }))} r={r} />
    </VictoryChart>
  );
}

interface MarksLayerProps {
  marks: readonly (ProfileMark & { at: Nm; height: Nm })[];
  r: number;
  /** Handed down by the chart. */
  scale?: { x: (at: Nm) => number; y: (height: Nm) => number };
}

/**
 * The stations' marks on the chart's own scales, as one path a shape. A scatter plot makes a component of each point, which at
 * 400 stations takes a slow phone a third of a second.
 */
function MarksLayer({ marks, r, scale }: MarksLayerProps) {
  return scale ? <Marks marks={marks.map((mark) => ({ ...mark, x: scale.x(mark.at), y: scale.y(mark.height) }))} r={r} /> : null;
}

function ZoomKey({ name, label, onPress, off }: { name: 'plus' | 'minus'; label: string; onPress: () => void; off: boolean }) {
  const tokens = useTokens();
  return (
    <Pressable
      role="button"
      aria-label={label}
      aria-disabled={off}
      onPress={off ? undefined : onPress}
      style={[styles.key, { borderColor: tokens.rule2, backgroundColor: tokens.paper }]}
    >
      <Icon name={name} size={18} tone={off ? 'rule2' : 'ink'} />
    </Pressable>
  );
}

const styles = StyleSheet.create({
  chart: { gap: space.s },
  head: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', justifyContent: 'space-between', columnGap: space.s },
  below: { flexDirection: 'row', alignItems: 'center', gap: space.s },
  reading: { flex: 1, minWidth: 0 },
  key: {
    width: target.least,
    height: target.least,
    borderWidth: 1,
    borderRadius: radius.key,
    alignItems: 'center',
    justifyContent: 'center',
  },
});
