/**
 * One invented footing with its results worked by hand, for the tests of the results and for the browser's whole morning.
 *
 * An L of 44 × 30 ft with an 8 ft jog, on the centre line, wall 8 in thick, stations at most 8 ft apart:
 *
 *   A ──── 44 ft, 6 parts ──── B        heading east, B 30 ft south to C, C 24 ft west to D, D 8 ft north to E,
 *   │ 22, 3 parts              │        E 20 ft west to F, F 22 ft north to A.
 *   F ─ 20, 3 ─ E              │ 30, 4 parts
 *               D ── 24, 3 ─── C
 *
 * HI 104′ 7 3/8″ over a plan grade of 100′ 0″: grade rod 4′ 7 3/8″. A shot d sixteenths high reads d sixteenths under that.
 */
export const SIXTEENTH = 1_587_500;
export const FOOT = 304_800_000;

/** What each station is called in feet, and how far off grade it was shot, in sixteenths of an inch, high positive. */
export const STATIONS = [
  { name: 'A, 0+00', x: 0, y: 0, off: 0 },
  { name: '0+07.3', x: 22 / 3, y: 0, off: 1 },
  { name: '0+14.7', x: 44 / 3, y: 0, off: 0 },
  { name: '0+22', x: 22, y: 0, off: -1 },
  { name: '0+29.3', x: 88 / 3, y: 0, off: -1 },
  { name: '0+36.7', x: 110 / 3, y: 0, off: -1 },
  { name: 'B, 0+44', x: 44, y: 0, off: -2 },
  { name: '0+51.5', x: 44, y: -7.5, off: -1 },
  { name: '0+59', x: 44, y: -15, off: -3 },
  { name: '0+66.5', x: 44, y: -22.5, off: -3 },
  { name: 'C, 0+74', x: 44, y: -30, off: -4 },
  { name: '0+82', x: 36, y: -30, off: -3 },
  { name: '0+90', x: 28, y: -30, off: -2 },
  { name: 'D, 0+98', x: 20, y: -30, off: -1 },
  { name: 'E, 1+06', x: 20, y: -22, off: 0 },
  { name: '1+12.7', x: 40 / 3, y: -22, off: 1 },
  { name: '1+19.3', x: 20 / 3, y: -22, off: 2 },
  { name: 'F, 1+26', x: 0, y: -22, off: 3 },
  { name: '1+33.3', x: 0, y: -44 / 3, off: 1 },
  { name: '1+40.7', x: 0, y: -22 / 3, off: 0 },
] as const;

/**
 * By hand, in sixteenths of an inch:
 *
 * Mean: Σd = −14 over 20 stations = −0.7, so the whole footing is 1/16″ low.
 *
 * Out of ±1/8″ (2/16): 0+59, 0+66.5, C, 0+82 low and F high: five; the worst is C, 4/16 = 1/4″ low.
 *
 * Too close to call: those at the limit itself, B, 0+90 and 1+19.3: three. The reading's own uncertainty at 95 % is about
 * 0.05 in, under one sixteenth (0.0625 in), so no other shot reaches a limit.
 *
 * Tilt, by least squares with x̄ = 22.7, ȳ = −13.75, z̄ = −0.7 and (ft, sixteenths)
 *   Sxx = 27171/5  Syy = 101201/36  Sxy = −915/2  Sxz = −2461/5  Syz = 485/6
 *   b = (Sxz·Syy − Syz·Sxy)/(Sxx·Syy − Sxy²) = −0.0893783 a foot east
 *   c = (Syz·Sxx − Sxz·Sxy)/(Sxx·Syy − Sxy²) = +0.0142087 a foot north
 * highest at A, lowest at C: 44·0.0893783 + 30·0.0142087 = 4.35891 sixteenths = 1/4″, over 4.35891/0.0905006 = 48.16 ft, falling
 * toward azimuth 99°, nine degrees off plan east. Shares: offset 0.136, tilt 0.627, the rest 0.237: mostly tilt. The largest residual is F's,
 * 3 − 1.2117 = 1.788 sixteenths, to the mark 1/8″.
 *
 * Course: beds 1/4″ to 3/4″ (4 to 12 sixteenths). Lowest course: highest place +3 and the least bed 4: 7/16″ over grade. Highest:
 * lowest place −4 and the most 12: 8/16″. One sixteenth of room.
 *
 * Bed at 7/16″: 7 − d at each station, no grinding. Trapezoids, part by part (ft · sixteenths):
 *   A–B 6 × 22/3:  (3.5 + 6 + 7 + 8 + 8 + 8 + 4.5) × 22/3 = 330
 *   B–C 4 × 7.5:   (4.5 + 8 + 10 + 10 + 5.5) × 7.5        = 285
 *   C–D 3 × 8:     (5.5 + 10 + 9 + 4) × 8                 = 228
 *   D–E 1 × 8:     (4 + 3.5) × 8                          =  60
 *   E–F 3 × 20/3:  (3.5 + 6 + 5 + 2) × 20/3               = 110
 *   F–A 3 × 22/3:  (2 + 6 + 7 + 3.5) × 22/3               = 407/3
 * together 3446/3; × 1/192 ft a sixteenth × 2/3 ft of wall = 3.98843 ft³.
 */
export const BY_HAND = {
  mean: -0.7,
  out: 5,
  worst: 'C, 0+74',
  close: 3,
  slopeEast: -0.08937828288291836,
  slopeNorth: 0.014208748748513696,
  drop: 4.358907173303819,
  over: 48.16437593742333,
  fallAzimuth: 99.03290252695044,
  rest: 1.788335019532991,
  window: { from: 7, to: 8 },
  bedCubicFeet: ((3446 / 3) * (2 / 3)) / 192,
} as const;
