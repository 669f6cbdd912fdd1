import type { ScreenedShot } from '@/analysis';

export const FOOT = 304_800_000;
export const INCH = 25_400_000;
/** 1/16 in. */
export const SIXTEENTH = INCH / 16;
/** Standard uncertainty of a reading to 1/16 in: d/√12. */
export const U = SIXTEENTH / Math.sqrt(12);

/** Places along a closed rectangle of 60 × 30 ft, or along one straight wall, `n` of them in walking order. */
export function walk(n: number, shape: 'rectangle' | 'wall'): { x: number; y: number; station: number }[] {
  const [long, wide] = [60 * FOOT, 30 * FOOT];
  const round = 2 * (long + wide);
  return Array.from({ length: n }, (_, i) => {
    if (shape === 'wall') return { x: i * 4.8 * FOOT, y: i * 6.4 * FOOT, station: i * 8 * FOOT };
    const station = (round * i) / n;
    if (station < long) return { x: station, y: 0, station };
    if (station < long + wide) return { x: long, y: station - long, station };
    if (station < 2 * long + wide) return { x: 2 * long + wide - station, y: wide, station };
    return { x: 0, y: round - station, station };
  });
}

/** A round on a slightly tilted plane, read with noise of so many graduations and rounded to 1/16 in; `normal` gives standard normal numbers. */
export function round(n: number, shape: 'rectangle' | 'wall', graduations: number, normal: () => number): ScreenedShot[] {
  const [b, c, a] = [normal() * 3e-4, normal() * 3e-4, normal() * INCH];
  return walk(n, shape).map((place, i) => {
    const exact = a + b * place.x + c * place.y + graduations * SIXTEENTH * normal();
    return { id: `S${i}`, ...place, deviation: Math.round(exact / SIXTEENTH) * SIXTEENTH };
  });
}

/** The same round with some shots off by so many nanometres. */
export function busted(shots: readonly ScreenedShot[], busts: Record<number, number>): ScreenedShot[] {
  return shots.map((shot, i) => ({ ...shot, deviation: shot.deviation + (busts[i] ?? 0) }));
}
