/** Nanometres. Whole where keyed, stored or judged; fractional where derived. Whole values are exact up to 2^53 nm, about 9,000 km. */
export type Nm = number;

/** 1 in = 25.4 mm exactly (international yard and pound agreement, 1959). */
export const NM_PER_INCH = 25_400_000;
/** 12 in. */
export const NM_PER_FOOT = 304_800_000;
/** 3 ft. */
export const NM_PER_YARD = 914_400_000;
/** 5,280 ft. */
export const NM_PER_MILE = 1_609_344_000_000;
export const NM_PER_MILLIMETRE = 1_000_000;
export const NM_PER_METRE = 1_000_000_000;
export const NM_PER_KILOMETRE = 1_000_000_000_000;

/** Cubic nanometres in a cubic metre: volumes are worked in the first and given in the second. */
export const NM3_PER_CUBIC_METRE = 1e27;
/** 1 yd³ = 0.9144³ m³ exactly. */
export const CUBIC_METRES_PER_CUBIC_YARD = 0.764_554_857_984;
/** 1 ft³ = 0.3048³ m³ exactly. */
export const CUBIC_METRES_PER_CUBIC_FOOT = 0.028_316_846_592;
