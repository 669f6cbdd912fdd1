import { useTranslation } from 'react-i18next';
import { View } from 'react-native';
import Svg, { G, Path, Rect, Text as SvgText } from 'react-native-svg';
import type { Nm } from '@/analysis';
import { fonts } from '@/constants/fonts';
import { typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import { textWidth } from './axis-text';
import type { ChartTolerance, ChartUnits, ProfileCorner, ProfilePoint } from './chart-types';
import { describeProfile, heightsNote, stationWords } from './describe-profile';
import { Marks, StringLine } from './marks';
import { freeCorner, markRadius, profileGeometry, type ProfileGeometry } from './profile-geometry';
import { useMeasuredWidth } from './use-measured-width';

interface ProfileStripProps {
  /** In walking order. */
  points: readonly ProfilePoint[];
  corners: readonly ProfileCorner[];
  /** The whole walk round the footing. */
  length: Nm;
  tolerance: ChartTolerance;
  units: ChartUnits;
  /** Station being shot: a dotted vertical. */
  currentId?: string;
  /** In px; 96 unless said. */
  height?: number;
}

/** The footing unrolled, in a strip: what has been shot hangs over or under the string line, the rest are ticks on it. */
export function ProfileStrip({ height = 96, currentId, ...data }: ProfileStripProps) {
  const { t } = useTranslation('charts');
  const [width, onLayout] = useMeasuredWidth();
  const geometry = profileGeometry({ ...data, width, height });
  const current = data.points.find(({ id }) => id === currentId);
  const spoken = [
    describeProfile(data.points, data.units, t),
    current ? t('profile.now', { station: stationWords(current, data.units, t) }) : null,
  ];
  return (
    <View onLayout={onLayout} style={{ height }}>
      <Svg width={width} height={height} role="img" aria-label={spoken.filter((part) => part !== null).join(' ')}>
        <ProfileGround geometry={geometry} />
        <Note geometry={geometry} text={heightsNote(geometry, data.units, t)} />
        <StringLine from={geometry.field.left} to={geometry.field.right} y={geometry.grade} />
        <ProfileTrace geometry={geometry} />
        <Marks marks={geometry.marks} r={markRadius(geometry)} />
        <BeyondHeights geometry={geometry} />
        {current ? <CurrentStation x={geometry.x(current.at)} height={geometry.field.bottom} /> : null}
      </Svg>
    </View>
  );
}

/** The exaggeration, in whichever corner hides no shot. */
function Note({ geometry, text }: { geometry: ProfileGeometry; text: string }) {
  const tokens = useTokens();
  const size = typeSize.tiny;
  const { x, y, anchor } = freeCorner(geometry, textWidth(text, size), size);
  return (
    <SvgText x={x} y={y + size - 3} textAnchor={anchor} fontFamily={fonts.figureMedium} fontSize={size} fill={tokens.ink2}>
      {text}
    </SvgText>
  );
}

/** Beside marks that lie beyond the picture, how far: "−1′ 0″". */
export function BeyondHeights({ geometry }: { geometry: ProfileGeometry }) {
  const tokens = useTokens();
  return (
    <G>
      {geometry.marks.map(({ id, x, y, beyond }) => {
        if (beyond === null) return null;
        const left = x > geometry.field.right - 70;
        return (
          <SvgText
            key={id}
            x={x + (left ? -12 : 12)}
            y={y + 4.5}
            textAnchor={left ? 'end' : 'start'}
            fontFamily={fonts.figure}
            fontSize={typeSize.tiny}
            fill={tokens.ink}
          >
            {beyond}
          </SvgText>
        );
      })}
    </G>
  );
}

/** What lies under the shots: the band of tolerance, the corners, and unless the chart writes them itself the heights. */
export function ProfileGround({ geometry, ticks = true }: { geometry: ProfileGeometry; ticks?: boolean }) {
  const tokens = useTokens();
  const { field, band } = geometry;
  const text = { fontFamily: fonts.figureMedium, fontSize: typeSize.tiny, fill: tokens.ink2 };
  const lines = geometry.verticals.map(({ x }) => `M${x.toFixed(1)} ${field.top}V${field.bottom}`).join('');
  return (
    <G>
      <Rect
        x={field.left}
        y={Math.max(band.top, field.top)}
        width={field.right - field.left}
        height={Math.max(Math.min(band.bottom, field.bottom) - Math.max(band.top, field.top), 0)}
        fill={tokens.onTint}
      />
      <Path d={lines} stroke={tokens.rule} strokeWidth={1} fill="none" />
      {(ticks ? geometry.ticks : []).map((tick) => (
        <SvgText key={tick.height} x={field.left - 8} y={tick.y + 4.5} textAnchor="end" {...text}>
          {tick.label}
        </SvgText>
      ))}
      {geometry.verticals.map(({ x, label, labelX, anchor }) =>
        label === null ? null : (
          <SvgText key={`${label} ${x}`} x={labelX} y={field.bottom + typeSize.tiny + 3} textAnchor={anchor} {...text}>
            {label}
          </SvgText>
        ),
      )}
    </G>
  );
}

/** The line from shot to shot. */
export function ProfileTrace({ geometry }: { geometry: ProfileGeometry }) {
  return <Path d={geometry.trace} stroke={useTokens().ink} strokeWidth={1.4} strokeLinejoin="round" fill="none" />;
}

/** You are here. */
export function CurrentStation({ x, height }: { x: number; height: number }) {
  return (
    <Path d={`M${x.toFixed(1)} 2V${height}`} stroke={useTokens().ink} strokeWidth={2.4} strokeDasharray="2.4 3.2" fill="none" />
  );
}
