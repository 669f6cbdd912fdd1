import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { View } from 'react-native';
import Svg, { Circle, G, Path, Text as SvgText } from 'react-native-svg';
import type { Nm } from '@/analysis';
import { fonts } from '@/constants/fonts';
import { typeSize } from '@/constants/theme';
import { useTokens } from '@/hooks/use-tokens';
import type { PlanPlace, PlanStation } from './chart-types';
import { Marks } from './marks';
import {
  arrowGeometry,
  bandWidth,
  fitPlan,
  outwardDirections,
  placeTexts,
  planHeight,
  roomInside,
  spotPath,
  type PlacedText,
  type PlanFit,
  type Spot,
  type TextBox,
} from './plan-geometry';
import { PlacePicker, StationPicker } from './plan-pickers';
import { useMeasuredWidth } from './use-measured-width';

export interface PlanViewProps {
  /** Corners in walking order, on the line that the stations lie on; `label` is the letter. */
  corners: readonly (PlanPlace & { label: string })[];
  /** Whether the last corner joins the first. */
  closed: boolean;
  /** Width of the footing. */
  width: Nm;
  /** In walking order. Empty draws the footing alone. */
  stations: readonly PlanStation[];
  /** Which way it falls, degrees clockwise from plan north, and in words: "falls 1/4″ toward Mill St". */
  tilt?: { azimuth: number; text: string } | null;
  /** Where the laser stands. */
  laser?: PlanPlace | null;
  /** A station to point out: a ring in the line's colour, "you are here". */
  currentId?: string;
  /** Picks a station by a press near it, or by arrow keys and Enter. */
  onPressStation?: (id: string) => void;
  /** Picks any place by a press, or by arrow keys and Enter. */
  onPressPlace?: (place: PlanPlace) => void;
  /** How a place is said while the keys move the cross: "12′ east, 3′ north". */
  placeText?: (place: PlanPlace) => string;
  /** Least and most height, in px. */
  heights?: [number, number];
}

const margin = { x: 42, y: 34 };

/** The footing from above: its band and centre line, the corners' letters, the stations' marks, which way it falls. */
export function PlanView({ heights = [180, 380], ...props }: PlanViewProps) {
  const { t } = useTranslation('charts');
  const [width, onLayout] = useMeasuredWidth();
  // The place being picked must be able to lie outside the footing, and the laser mostly does.
  const places = [...props.corners, ...props.stations, ...(props.laser ? [props.laser] : [])];
  const room = props.onPressPlace ? { x: 84, y: 76 } : margin;
  const size = { width, height: planHeight(places, width, room, heights) };
  const fit = fitPlan(places, size, room);
  const [cross, setCross] = useState<Spot | null>(null);
  return (
    <View onLayout={onLayout} style={{ height: size.height }}>
      <Svg width={width} height={size.height} role="img" aria-label={describePlan(props, t)}>
        <PlanGround {...props} fit={fit} size={size} />
        <Marks marks={props.stations.map((station) => ({ ...station, ...fit.toSpot(station) }))} r={5.5} />
        <HereRing station={props.stations.find(({ id }) => id === props.currentId)} fit={fit} />
        {props.laser ? <LaserMark spot={fit.toSpot(props.laser)} label={t('plan.laser')} width={width} /> : null}
        {props.tilt ? <Tilt tilt={props.tilt} spots={props.corners.map(fit.toSpot)} closed={props.closed} size={size} /> : null}
        {cross ? <Cross spot={cross} /> : null}
      </Svg>
      {props.onPressStation ? (
        <StationPicker stations={props.stations} fit={fit} onPick={props.onPressStation} onMove={setCross} />
      ) : null}
      {props.onPressPlace ? (
        <PlacePicker
          start={props.laser}
          size={size}
          fit={fit}
          onPick={props.onPressPlace}
          onMove={setCross}
          placeText={props.placeText}
        />
      ) : null}
    </View>
  );
}

function describePlan(props: PlanViewProps, t: ReturnType<typeof useTranslation<'charts'>>['t']): string {
  const out = props.stations.filter(({ mark }) => mark === 'high' || mark === 'low').map(({ label }) => label);
  const shot = props.stations.some(({ mark }) => mark !== 'not-shot');
  const sentences = [t('plan.of', { count: props.stations.length })];
  if (out.length > 0) sentences.push(t('plan.out', { stations: out.join(', ') }));
  else if (shot) sentences.push(t('plan.allIn'));
  if (props.tilt) sentences.push(`${props.tilt.text}.`);
  if (props.laser) sentences.push(t('plan.laserAt'));
  return sentences.join(' ');
}

function PlanGround({
  corners,
  closed,
  width,
  laser,
  fit,
  size,
}: PlanViewProps & { fit: PlanFit; size: { width: number; height: number } }) {
  const tokens = useTokens();
  const spots = corners.map(fit.toSpot);
  const path = spotPath(spots, closed);
  const band = bandWidth(width, fit.scale);
  const out = outwardDirections(spots, closed);
  const letters = placeTexts(
    corners.map(({ label }, at) => {
      const spot = spots[at] ?? { x: 0, y: 0 };
      const way = out[at] ?? { x: 0, y: -1 };
      const away = band / 2 + 18;
      // Outside, then to its sides, then inside: a letter that has to move is better than a corner without a name.
      const ways = [way, { x: way.y, y: -way.x }, { x: -way.y, y: way.x }, { x: -way.x, y: -way.y }];
      return { key: `${at}`, text: label, middles: ways.map((to) => ({ x: spot.x + to.x * away, y: spot.y + to.y * away })) };
    }),
    size,
    typeSize.small,
    laser ? [laserBox(fit.toSpot(laser), size.width)] : [],
  );
  return (
    <G>
      <Path d={path} fill="none" stroke={tokens.rule} strokeWidth={band} strokeLinejoin="miter" strokeLinecap="square" />
      <Path d={path} fill="none" stroke={tokens.rule2} strokeWidth={1.2} strokeDasharray="7 5" />
      <PlanTexts texts={letters} />
    </G>
  );
}

/** Words on a plan, each about its middle. */
export function PlanTexts({ texts, fill }: { texts: readonly PlacedText[]; fill?: (key: string) => string }) {
  const { ink } = useTokens();
  return (
    <G>
      {texts.map(({ key, text, x, y }) => (
        <SvgText
          key={key}
          x={x}
          y={y + typeSize.small * 0.35}
          textAnchor="middle"
          fontFamily={fonts.figure}
          fontSize={typeSize.small}
          fill={fill?.(key) ?? ink}
        >
          {text}
        </SvgText>
      ))}
    </G>
  );
}

function Tilt({
  tilt,
  spots,
  closed,
  size,
}: {
  tilt: { azimuth: number; text: string };
  spots: readonly Spot[];
  closed: boolean;
  size: { width: number; height: number };
}) {
  const { ink, paper } = useTokens();
  const middle = roomInside(spots, closed) ?? { x: size.width / 2, y: size.height - 22 };
  const arrow = arrowGeometry({ x: middle.x, y: middle.y + 14 }, tilt.azimuth, Math.min(size.width * 0.26, 110));
  const upright = Math.abs(Math.cos((tilt.azimuth * Math.PI) / 180));
  const lift = 10 + upright * Math.min(size.width * 0.13, 55);
  const [label] = placeTexts(
    [{ key: 'tilt', text: tilt.text, middles: [{ x: middle.x, y: middle.y + 8 - lift }] }],
    size,
    typeSize.small,
  );
  const text = { textAnchor: 'middle' as const, fontFamily: fonts.figure, fontSize: typeSize.small };
  return (
    <G>
      <Path d={arrow.shaft} stroke={ink} strokeWidth={2.4} fill="none" />
      <Path d={arrow.head} fill={ink} />
      {label ? (
        <>
          <SvgText x={label.x} y={label.y + 5} stroke={paper} strokeWidth={5} strokeLinejoin="round" fill={paper} {...text}>
            {label.text}
          </SvgText>
          <SvgText x={label.x} y={label.y + 5} fill={ink} {...text}>
            {label.text}
          </SvgText>
        </>
      ) : null}
    </G>
  );
}

/** What the laser's mark and word take up. */
function laserBox({ x, y }: Spot, width: number): TextBox {
  const left = x > width - 70;
  return { left: x - (left ? 60 : 15), right: x + (left ? 15 : 60), top: y - 15, bottom: y + 15 };
}

function LaserMark({ spot, label, width }: { spot: Spot; label: string; width: number }) {
  const { ink, paper } = useTokens();
  const left = spot.x > width - 70;
  return (
    <G>
      <Circle cx={spot.x} cy={spot.y} r={9} fill={paper} stroke={ink} strokeWidth={2} />
      <Path d={`M${spot.x - 14} ${spot.y}h28M${spot.x} ${spot.y - 14}v28`} stroke={ink} strokeWidth={2} />
      <SvgText
        x={spot.x + (left ? -18 : 18)}
        y={spot.y - 7}
        textAnchor={left ? 'end' : 'start'}
        fontFamily={fonts.figure}
        fontSize={typeSize.small}
        fill={ink}
      >
        {label}
      </SvgText>
    </G>
  );
}

function HereRing({ station, fit }: { station: PlanStation | undefined; fit: PlanFit }) {
  const { line } = useTokens();
  if (!station) return null;
  const { x, y } = fit.toSpot(station);
  return <Circle cx={x} cy={y} r={13} fill="none" stroke={line} strokeWidth={3} />;
}

function Cross({ spot }: { spot: Spot }) {
  const { line } = useTokens();
  return (
    <Path
      d={`M${spot.x - 16} ${spot.y}h12m8 0h12M${spot.x} ${spot.y - 16}v12m0 8v12`}
      stroke={line}
      strokeWidth={3}
      fill="none"
    />
  );
}
