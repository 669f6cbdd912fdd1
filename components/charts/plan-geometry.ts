import type { Nm } from '@/analysis';
import { textWidth } from './axis-text';
import type { PlanPlace } from './chart-types';

/** A place in the picture, in px: y goes down. */
export interface Spot {
  x: number;
  y: number;
}

export interface PlanFit {
  /** px per nanometre, the same both ways. */
  scale: number;
  toSpot: (place: PlanPlace) => Spot;
  toPlace: (spot: Spot) => PlanPlace;
}

/** Fits places into a picture with plan north up, in the middle of what its margins leave. */
export function fitPlan(
  places: readonly PlanPlace[],
  size: { width: number; height: number },
  margin: { x: number; y: number },
): PlanFit {
  const xs = places.map(({ x }) => x);
  const ys = places.map(({ y }) => y);
  const [west, east, south, north] =
    places.length > 0 ? [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)] : [0, 1, 0, 1];
  const room = { x: Math.max(size.width - 2 * margin.x, 1), y: Math.max(size.height - 2 * margin.y, 1) };
  const spans = [east - west, north - south];
  // A single place, a pad, has no span: any scale shows it in the middle.
  const scale = Math.min(room.x / Math.max(spans[0] ?? 0, 1), room.y / Math.max(spans[1] ?? 0, 1));
  const middle = { x: (west + east) / 2, y: (south + north) / 2 };
  return {
    scale,
    toSpot: ({ x, y }) => ({ x: size.width / 2 + (x - middle.x) * scale, y: size.height / 2 - (y - middle.y) * scale }),
    toPlace: ({ x, y }) => ({ x: middle.x + (x - size.width / 2) / scale, y: middle.y - (y - size.height / 2) / scale }),
  };
}

/** Height that a picture of these places wants at a width, in px, between a least and a most. */
export function planHeight(
  places: readonly PlanPlace[],
  width: number,
  margin: { x: number; y: number },
  limits: [number, number],
): number {
  if (places.length < 2) return limits[0];
  const xs = places.map(({ x }) => x);
  const ys = places.map(({ y }) => y);
  const spanX = Math.max(...xs) - Math.min(...xs);
  const spanY = Math.max(...ys) - Math.min(...ys);
  const wanted = ((width - 2 * margin.x) * spanY) / Math.max(spanX, 1) + 2 * margin.y;
  return Math.round(Math.min(Math.max(wanted, limits[0]), limits[1]));
}

/** SVG path through spots, closed on itself where asked. */
export function spotPath(spots: readonly Spot[], closed: boolean): string {
  const path = spots.map(({ x, y }, at) => `${at === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`).join('');
  return closed && spots.length > 2 ? `${path}Z` : path;
}

/** Twice the signed area in px²: positive when the spots go clockwise as seen. */
const turning = (spots: readonly Spot[]) =>
  spots.reduce((sum, { x, y }, at) => {
    const next = spots[(at + 1) % spots.length] ?? { x, y };
    return sum + x * next.y - next.x * y;
  }, 0);

const unit = (from: Spot, to: Spot): Spot => {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  return length === 0 ? { x: 0, y: 0 } : { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
};

/**
 * For each corner the direction away from the footing, as a unit vector: where its letter goes. At a strip's ends it points on
 * along the strip.
 */
export function outwardDirections(spots: readonly Spot[], closed: boolean): Spot[] {
  const side = turning(spots) >= 0 ? 1 : -1;
  return spots.map((spot, at) => {
    const before = closed ? spots[(at - 1 + spots.length) % spots.length] : spots[at - 1];
    const after = closed ? spots[(at + 1) % spots.length] : spots[at + 1];
    if (!before && !after) return { x: 0, y: -1 };
    if (!before || !after) return unit(before ?? after ?? spot, spot);
    const [arriving, leaving] = [unit(before, spot), unit(spot, after)];
    // Left of the walk in the picture is (y, −x); a clockwise walk has the outside there.
    const out = { x: side * (arriving.y + leaving.y), y: -side * (arriving.x + leaving.x) };
    const length = Math.hypot(out.x, out.y);
    return length < 1e-9 ? { x: side * arriving.y, y: -side * arriving.x } : { x: out.x / length, y: out.y / length };
  });
}

function inside(spot: Spot, spots: readonly Spot[]): boolean {
  let within = false;
  spots.forEach((a, at) => {
    const b = spots[(at + 1) % spots.length] ?? a;
    if (a.y > spot.y !== b.y > spot.y && spot.x < ((b.x - a.x) * (spot.y - a.y)) / (b.y - a.y) + a.x) within = !within;
  });
  return within;
}

/** Distance to a segment with widths counted `squeeze` times, because words are wider than they are high. */
function clearance(spot: Spot, a: Spot, b: Spot, squeeze: number): number {
  const [px, py] = [(spot.x - a.x) * squeeze, spot.y - a.y];
  const [dx, dy] = [(b.x - a.x) * squeeze, b.y - a.y];
  const along = Math.min(Math.max((px * dx + py * dy) / Math.max(dx * dx + dy * dy, 1e-9), 0), 1);
  return Math.hypot(px - along * dx, py - along * dy);
}

/** The middle of the widest open place inside the outline, for words; null for a strip, which has no inside. */
export function roomInside(spots: readonly Spot[], closed: boolean): Spot | null {
  if (!closed || spots.length < 3) return null;
  const xs = spots.map(({ x }) => x);
  const ys = spots.map(({ y }) => y);
  const [left, right, top, bottom] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  const cells = 24;
  let best: { spot: Spot; room: number } | null = null;
  for (let i = 1; i < cells; i += 1) {
    for (let j = 1; j < cells; j += 1) {
      const spot = { x: left + ((right - left) * i) / cells, y: top + ((bottom - top) * j) / cells };
      if (!inside(spot, spots)) continue;
      const room = Math.min(...spots.map((a, at) => clearance(spot, a, spots[(at + 1) % spots.length] ?? a, 0.4)));
      if (!best || room > best.room + 1e-9) best = { spot, room };
    }
  }
  return best?.spot ?? null;
}

export interface ArrowGeometry {
  shaft: string;
  head: string;
}

/** An arrow about a middle that points to an azimuth: degrees clockwise from plan north, which is up. */
export function arrowGeometry(middle: Spot, azimuth: number, length: number): ArrowGeometry {
  const turn = (azimuth * Math.PI) / 180;
  const way = { x: Math.sin(turn), y: -Math.cos(turn) };
  const tip = { x: middle.x + (way.x * length) / 2, y: middle.y + (way.y * length) / 2 };
  const tail = { x: middle.x - (way.x * length) / 2, y: middle.y - (way.y * length) / 2 };
  const neck = { x: tip.x - way.x * 12, y: tip.y - way.y * 12 };
  const p = ({ x, y }: Spot) => `${x.toFixed(1)} ${y.toFixed(1)}`;
  const side = (s: number) => ({ x: neck.x - way.y * 6.5 * s, y: neck.y + way.x * 6.5 * s });
  return { shaft: `M${p(tail)}L${p(neck)}`, head: `M${p(tip)}L${p(side(1))}L${p(side(-1))}Z` };
}

export interface PlacedText {
  key: string;
  text: string;
  x: number;
  y: number;
}

interface TextWish {
  key: string;
  text: string;
  /** Where the middle of the text may stand, best first. */
  middles: readonly Spot[];
}

/** A part of the picture, in px, that words keep clear of. */
export interface TextBox {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** Of texts in order of importance, those that find a place clear of the others, moved in from the picture's edges where they stick out. */
export function placeTexts(
  wishes: readonly TextWish[],
  size: { width: number; height: number },
  fontSize: number,
  obstacles: readonly TextBox[] = [],
): PlacedText[] {
  const taken = [...obstacles];
  return wishes.flatMap(({ key, text, middles }) => {
    const half = textWidth(text, fontSize) / 2 + 2;
    for (const middle of middles) {
      const x = Math.min(Math.max(middle.x, half), size.width - half);
      const y = Math.min(Math.max(middle.y, fontSize * 0.6), size.height - fontSize * 0.6);
      const box = { left: x - half, right: x + half, top: y - fontSize * 0.55, bottom: y + fontSize * 0.55 };
      if (
        taken.some(
          (other) => box.left < other.right && other.left < box.right && box.top < other.bottom && other.top < box.bottom,
        )
      )
        continue;
      taken.push(box);
      return [{ key, text, x, y }];
    }
    return [];
  });
}

/** The nearest of places to a spot in the picture, if it lies within `reach` px. */
export function nearestSpot<Item>(items: readonly Item[], spotOf: (item: Item) => Spot, spot: Spot, reach: number): Item | null {
  let best: { item: Item; distance: number } | null = null;
  for (const item of items) {
    const own = spotOf(item);
    const distance = Math.hypot(own.x - spot.x, own.y - spot.y);
    if (distance <= reach && (!best || distance < best.distance)) best = { item, distance };
  }
  return best?.item ?? null;
}

/** Width of a footing drawn to scale, in px, but never so thin that a mark would hide it. */
export const bandWidth = (width: Nm, scale: number): number => Math.max(width * scale, 10);
