import type { Nm } from '@/analysis';

export const INCH: Nm = 25_400_000;
export const FOOT: Nm = 304_800_000;
export const METRE: Nm = 1_000_000_000;
export const MM: Nm = 1_000_000;
export const SIXTEENTH: Nm = INCH / 16;
/** 0.01 ft */
export const HUNDREDTH: Nm = FOOT / 100;
