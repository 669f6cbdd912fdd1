/**
 * Arithmetic on unevaluated sums hi + lo of two doubles, about 32 significant digits. The plane fit turns to it only where plain
 * doubles would lose digits to cancellation: nearly collinear shots, busts on an almost exact plane, coefficients that come out near zero.
 *
 * Source: T. J. Dekker, "A floating-point technique for extending the available precision", Numer. Math. 18 (1971) 224–242 (split and
 * product); D. E. Knuth, The Art of Computer Programming vol. 2, 4.2.2 theorem B (sum). Both from memory. Operands stay under 1e150,
 * where the split cannot overflow.
 */
export interface DoubleDouble {
  readonly hi: number;
  readonly lo: number;
}

/** 2^27 + 1 cuts a double of 53 bits into two halves whose products are exact. */
const SPLITTER = 134_217_729;

export const ZERO: DoubleDouble = { hi: 0, lo: 0 };

/** a + b with its rounding error, exactly. */
export function exactSum(a: number, b: number): DoubleDouble {
  const hi = a + b;
  const part = hi - a;
  return { hi, lo: a - (hi - part) + (b - part) };
}

/** The same, three operations shorter, where |a| ≥ |b| is known. */
function orderedSum(a: number, b: number): DoubleDouble {
  const hi = a + b;
  return { hi, lo: b - (hi - a) };
}

/** a · b with its rounding error, exactly. */
export function exactProduct(a: number, b: number): DoubleDouble {
  const hi = a * b;
  const cutA = SPLITTER * a;
  const cutB = SPLITTER * b;
  const highA = cutA - (cutA - a);
  const highB = cutB - (cutB - b);
  const lowA = a - highA;
  const lowB = b - highB;
  return { hi, lo: highA * highB - hi + highA * lowB + lowA * highB + lowA * lowB };
}

export function plus(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const high = exactSum(a.hi, b.hi);
  const low = exactSum(a.lo, b.lo);
  const first = orderedSum(high.hi, high.lo + low.hi);
  return orderedSum(first.hi, first.lo + low.lo);
}

export function minus(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  return plus(a, { hi: -b.hi, lo: -b.lo });
}

export function times(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const product = exactProduct(a.hi, b.hi);
  return orderedSum(product.hi, product.lo + (a.hi * b.lo + a.lo * b.hi));
}

/** a · b for a plain double b. */
export function scaled(a: DoubleDouble, b: number): DoubleDouble {
  const product = exactProduct(a.hi, b);
  return orderedSum(product.hi, product.lo + a.lo * b);
}

/** a / b, b not zero. */
export function over(a: DoubleDouble, b: DoubleDouble): DoubleDouble {
  const first = a.hi / b.hi;
  const left = minus(a, scaled(b, first));
  const second = left.hi / b.hi;
  const third = minus(left, scaled(b, second)).hi / b.hi;
  return plus(orderedSum(first, second), { hi: third, lo: 0 });
}
