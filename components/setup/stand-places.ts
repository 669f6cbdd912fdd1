import { NM_PER_FOOT, type LengthStyle, type Nm, type PlanPoint } from '@/analysis';
import { printRound } from '@/components/lengths/print-length';
import { stationTitle } from '@/components/stations/station-preview';
import { i18n } from '@/hooks/i18n/i18n';
import type { Footing } from '@/shared/api/footing-schemas';
import type { RoundTarget } from '@/shared/round/round-state';

/** How far inside a corner a laser is put that stands "near" it, nm: room for a tripod. */
const BESIDE: Nm = 1_000_000_000;
const DECIMETRE: Nm = 100_000_000;

/** A place is paced, not taped: whole feet, or tenths of a metre. */
function paced(distance: Nm, style: LengthStyle): string {
  const step = style === 'metric' ? DECIMETRE : NM_PER_FOOT;
  return printRound(Math.round(distance / step) * step, style);
}

export interface NamedPlace extends PlanPoint {
  corner: string;
}

/** Corners of the footing in walking order, by letter. */
export function cornersOf(footing: Footing): NamedPlace[] {
  const inOrder = [...footing.stations].sort((p, q) => p.position - q.position);
  const seen = new Set<string>();
  return inOrder.flatMap(({ corner, x, y }) => {
    if (corner === null || seen.has(corner)) return [];
    seen.add(corner);
    return [{ corner, x, y }];
  });
}

/** The middle of the box round all corners. */
export function middleOf(corners: readonly PlanPoint[]): PlanPoint {
  const xs = corners.map(({ x }) => x);
  const ys = corners.map(({ y }) => y);
  return { x: (Math.min(...xs) + Math.max(...xs)) / 2, y: (Math.min(...ys) + Math.max(...ys)) / 2 };
}

/** A metre from the corner toward the middle; the corner itself where there is no middle to go to. */
export function besideCorner(corner: PlanPoint, corners: readonly PlanPoint[]): PlanPoint {
  const middle = middleOf(corners);
  const away = Math.hypot(middle.x - corner.x, middle.y - corner.y);
  if (away <= BESIDE) return { x: corner.x, y: corner.y };
  return { x: corner.x + ((middle.x - corner.x) * BESIDE) / away, y: corner.y + ((middle.y - corner.y) * BESIDE) / away };
}

/** "12′ east and 3′ north of corner A". */
export function placeWords(place: PlanPoint, corners: readonly NamedPlace[], style: LengthStyle): string {
  const from = corners[0] ?? { x: 0, y: 0, corner: 'A' };
  const [east, north] = [place.x - from.x, place.y - from.y];
  const words = { x: paced(Math.abs(east), style), y: paced(Math.abs(north), style), corner: from.corner };
  if (north >= 0) return i18n.t(east >= 0 ? 'setup:stand.place.eastNorth' : 'setup:stand.place.westNorth', words);
  return i18n.t(east >= 0 ? 'setup:stand.place.eastSouth' : 'setup:stand.place.westSouth', words);
}

/** The place to shoot that is farthest from where the laser stands, and how far; null before there are stations. */
export function farthestFrom(
  stand: PlanPoint,
  targets: readonly Pick<RoundTarget, 'stationId' | 'x' | 'y'>[],
): { stationId: string; distance: Nm } | null {
  let far: { stationId: string; distance: Nm } | null = null;
  for (const { stationId, x, y } of targets) {
    const distance = Math.hypot(x - stand.x, y - stand.y);
    if (far === null || distance > far.distance) far = { stationId, distance };
  }
  return far;
}

/** "The farthest station is G, 62′ away." */
export function farthestWords(stand: PlanPoint, targets: readonly RoundTarget[], footing: Footing, style: LengthStyle): string {
  const far = farthestFrom(stand, targets);
  const station = footing.stations.find(({ id }) => id === far?.stationId);
  if (far === null || station === undefined) return '';
  return i18n.t('setup:stand.farthest', { station: stationTitle(station), distance: paced(far.distance, style) });
}
