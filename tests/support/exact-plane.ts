import type { PlanePoint } from '@/analysis';

/** A fraction of whole numbers, d > 0. */
interface Fraction {
  n: bigint;
  d: bigint;
}

/** A double is a whole number times a power of two: the fraction loses nothing. */
function fraction(value: number): Fraction {
  let [whole, power] = [value, 0];
  while (!Number.isInteger(whole)) {
    whole *= 2;
    power += 1;
  }
  return { n: BigInt(whole), d: 1n << BigInt(power) };
}

function gcd(a: bigint, b: bigint): bigint {
  while (b !== 0n) [a, b] = [b, a % b];
  return a < 0n ? -a : a;
}

function reduced(n: bigint, d: bigint): Fraction {
  const common = gcd(n, d) || 1n;
  return d < 0n ? { n: -n / common, d: -d / common } : { n: n / common, d: d / common };
}

const add = (a: Fraction, b: Fraction): Fraction => reduced(a.n * b.d + b.n * a.d, a.d * b.d);
const subtract = (a: Fraction, b: Fraction): Fraction => reduced(a.n * b.d - b.n * a.d, a.d * b.d);
const multiply = (a: Fraction, b: Fraction): Fraction => reduced(a.n * b.n, a.d * b.d);
const divide = (a: Fraction, b: Fraction): Fraction => reduced(a.n * b.d, a.d * b.n);
const zero: Fraction = { n: 0n, d: 1n };

const bits = (value: bigint): number => value.toString(2).length;

/** To 70 significant bits and then to a double: relative error about one unit of rounding. */
function toDouble({ n, d }: Fraction): number {
  if (n === 0n) return 0;
  const size = n < 0n ? -n : n;
  const shift = 70 - (bits(size) - bits(d));
  const scaled = shift >= 0 ? (size << BigInt(shift)) / d : size / (d << BigInt(-shift));
  return (n < 0n ? -1 : 1) * Number(scaled) * 2 ** -shift;
}

const root = (value: Fraction): number => Math.sqrt(toDouble(value));

export interface ExactPlane {
  coefficients: number[];
  standardErrors: number[];
  s: number;
  rSquared: number;
  f: number;
  slope: number;
  slopeStandardError: number;
  residuals: number[];
  leverages: number[];
  studentized: number[];
  deleted: (number | null)[];
  cooks: number[];
}

/**
 * Weighted least squares of a plane by its definition, in exact fractions of whole numbers: sums about the weighted means and Cramer's rule. Slow,
 * and right to the last digit for any input; needs at least four points that are not collinear and leave some residual.
 */
export function exactPlane(points: readonly PlanePoint[]): ExactPlane {
  const w = points.map(({ weight = 1 }) => fraction(weight));
  const sum = (terms: readonly Fraction[]): Fraction => terms.reduce(add, zero);
  const total = sum(w);
  const weighted = (a: readonly Fraction[], b?: readonly Fraction[]): Fraction =>
    sum(a.map((value, i) => multiply(w[i] ?? zero, b === undefined ? value : multiply(value, b[i] ?? zero))));
  const about = (values: Fraction[]): { mean: Fraction; off: Fraction[] } => {
    const mean = divide(weighted(values), total);
    return { mean, off: values.map((value) => subtract(value, mean)) };
  };
  const x = about(points.map((point) => fraction(point.x)));
  const y = about(points.map((point) => fraction(point.y)));
  const z = about(points.map((point) => fraction(point.z)));
  const [xx, yy, xy] = [weighted(x.off, x.off), weighted(y.off, y.off), weighted(x.off, y.off)];
  const [xz, yz, zz] = [weighted(x.off, z.off), weighted(y.off, z.off), weighted(z.off, z.off)];
  const det = subtract(multiply(xx, yy), multiply(xy, xy));
  const b = divide(subtract(multiply(yy, xz), multiply(xy, yz)), det);
  const c = divide(subtract(multiply(xx, yz), multiply(xy, xz)), det);
  const a = subtract(z.mean, add(multiply(b, x.mean), multiply(c, y.mean)));
  const form = (p: Fraction, q: Fraction): Fraction =>
    divide(
      add(
        subtract(multiply(yy, multiply(p, p)), multiply(fraction(2), multiply(xy, multiply(p, q)))),
        multiply(xx, multiply(q, q)),
      ),
      det,
    );
  const residuals = z.off.map((off, i) => subtract(off, add(multiply(b, x.off[i] ?? zero), multiply(c, y.off[i] ?? zero))));
  const sse = weighted(residuals, residuals);
  const df = fraction(points.length - 3);
  const variance = divide(sse, df);
  const one = fraction(1);
  const leverages = w.map((weight, i) => multiply(weight, add(divide(one, total), form(x.off[i] ?? zero, y.off[i] ?? zero))));
  const squares = residuals.map((residual, i) => multiply(w[i] ?? zero, multiply(residual, residual)));
  const perPoint = squares.map((square, i) => {
    const left = subtract(one, leverages[i] ?? zero);
    const sign = (residuals[i] ?? zero).n < 0n ? -1 : 1;
    const spare = subtract(df, one);
    const others = spare.n === 0n ? null : divide(subtract(sse, divide(square, left)), spare);
    return {
      studentized: sign * root(divide(square, multiply(variance, left))),
      deleted: others === null ? null : sign * root(divide(square, multiply(others, left))),
      cooks: toDouble(
        divide(multiply(square, leverages[i] ?? zero), multiply(multiply(variance, fraction(3)), multiply(left, left))),
      ),
    };
  });
  const slopeSquared = add(multiply(b, b), multiply(c, c));
  // gᵀ·V·g with g = (b, c)/slope and V = s²/det · [[yy, −xy], [−xy, xx]].
  const slopeForm = divide(form(b, c), slopeSquared);
  return {
    coefficients: [a, b, c].map(toDouble),
    standardErrors: [add(divide(one, total), form(x.mean, y.mean)), divide(yy, det), divide(xx, det)].map((unit) =>
      root(multiply(variance, unit)),
    ),
    s: root(variance),
    rSquared: toDouble(subtract(one, divide(sse, zz))),
    f: toDouble(divide(divide(subtract(zz, sse), fraction(2)), variance)),
    slope: root(slopeSquared),
    slopeStandardError: root(multiply(variance, slopeForm)),
    residuals: residuals.map(toDouble),
    leverages: leverages.map(toDouble),
    studentized: perPoint.map(({ studentized }) => studentized),
    deleted: perPoint.map(({ deleted }) => deleted),
    cooks: perPoint.map(({ cooks }) => cooks),
  };
}
