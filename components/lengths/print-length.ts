import { formatLength, NM_PER_FOOT, NM_PER_MILLIMETRE, type LengthStyle, type Nm } from '@/analysis';

/** Finest that is printed, nm: 1/64 in, 0.001 ft, 0.1 mm. */
const FINEST: Record<LengthStyle, Nm> = { 'feet-inches': 396_875, 'decimal-feet': 304_800, metric: 100_000 };
const HUNDREDTH = 3_048_000;

/** The coarsest usual graduation that shows a length as it is, so that 99.5 ft is not 99.500 ft. */
function graduationOf(length: Nm, style: LengthStyle): Nm {
  if (style === 'decimal-feet' && length % HUNDREDTH === 0) return HUNDREDTH;
  if (style === 'metric' && length % NM_PER_MILLIMETRE === 0) return NM_PER_MILLIMETRE;
  return FINEST[style];
}

/** A length as exactly as its style is written: `99′ 6″`, `99.50 ft`, `1.402 m`. @throws AnalysisError 'not-finite' */
export function printLength(length: Nm, style: LengthStyle): string {
  return formatLength(length, style, graduationOf(length, style));
}

/** A round one in the short: `100′` rather than `100′ 0″`, `30 m` rather than `30.000 m`. */
export function printRound(length: Nm, style: LengthStyle): string {
  const whole = style === 'metric' ? 1_000_000_000 : NM_PER_FOOT;
  if (length === 0 || length % whole !== 0) return printLength(length, style);
  const count = String(Math.abs(length / whole));
  const unit = { 'feet-inches': '′', 'decimal-feet': ' ft', metric: ' m' }[style];
  return `${length < 0 ? '−' : ''}${count}${unit}`;
}

/** A small one, as tolerances and beds are said: `1/8″`, `0.01 ft`, `3 mm`. */
export function printSmall(length: Nm, style: LengthStyle): string {
  if (style !== 'metric' || Math.abs(length) >= 1_000_000_000) return printLength(length, style);
  const tenths = Math.round(Math.abs(length) / 100_000);
  const digits = tenths % 10 === 0 ? String(tenths / 10) : (tenths / 10).toFixed(1);
  return `${length < 0 && tenths > 0 ? '−' : ''}${digits} mm`;
}
