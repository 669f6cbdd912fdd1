import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { AnalysisError } from './analysis-error';
import { notNegative, positive } from './check-input';

/**
 * Tails of Student's t and of F, computed as tails: 1 − cdf would lose every digit of a p under 1e-16. The kept library's own
 * t-cdf agrees to 13 digits and is a test here; a closed form for the half-integer beta function is used because one fit needs three
 * tails, and the library's general incomplete beta costs more than the whole rest of a 40-station fit.
 */

/** Γ(a + ½) / Γ(a): the asymptotic series from a = 16 on, reached from below by Γ(z + 1) = z·Γ(z). Relative error under 1e-15. */
function gammaHalfRatio(a: number): number {
  let factor = 1;
  let at = a;
  while (at < 16) {
    factor *= at / (at + 0.5);
    at += 1;
  }
  const u = 1 / at;
  // Abramowitz & Stegun 6.1.47 with a = ½, b = 0 (from memory; the digits are held by a test against R's beta function).
  const series =
    1 -
    u *
      (1 / 8 -
        u *
          (1 / 128 +
            u * (5 / 1024 - u * (21 / 32_768 + u * (399 / 262_144 - u * (869 / 4_194_304 + (u * 39_325) / 33_554_432))))));
  return factor * Math.sqrt(at) * series;
}

/**
 * Continued fraction of the incomplete beta function by its forward recurrence, two steps and one division at a time (Abramowitz & Stegun 26.5.8,
 * from memory); x under its turning point, so that a few dozen steps settle it.
 */
function betaFraction(a: number, b: number, x: number): number {
  let earlierTop = 1;
  let earlierBottom = 1;
  let value = 1;
  let bottom = 1 - ((a + b) * x) / (a + 1);
  value /= bottom;
  earlierTop /= bottom;
  earlierBottom /= bottom;
  for (let m = 1; m < 10_000; m += 1) {
    const at = a + 2 * m;
    const even = (m * (b - m) * x) / ((at - 1) * at);
    const top = value + even * earlierTop;
    const evenBottom = 1 + even * earlierBottom;
    const odd = (-(a + m) * (a + b + m) * x) / (at * (at + 1));
    bottom = 1 / (evenBottom + odd);
    const before = value;
    earlierTop = top * bottom;
    earlierBottom = evenBottom * bottom;
    value = (top + odd * value) * bottom;
    if (Math.abs(value - before) <= 1e-15 * value) return value;
  }
  throw new AnalysisError('no-convergence', 'The tail of the t distribution did not settle.', { a, b, x });
}

/**
 * P(|T| > |t|) for Student's t with `df` degrees of freedom (any df > 0). Relative error under 1e-12 to 10,000
 * degrees of freedom and 4e-11 to a million, down to the smallest double.
 * Source: Abramowitz & Stegun 26.5.27, 26.7.1 (from memory): I_x(df/2, ½), x = df / (df + t²).
 * @throws AnalysisError 'not-finite', 'not-positive'
 * @example studentTwoSided(2.228, 10) // 0.05001
 */
export function studentTwoSided(t: number, df: number): number {
  positive('df', df);
  const size = Math.abs(t);
  notNegative('|t|', size);
  if (size === 0) return 1;
  const squared = (size / df) * size;
  const a = df / 2;
  // (1 − x)^½ · x^a / (a·B(a, ½)), with x^a through log1p so that small t keep their digits and large t do not overflow.
  const logX = squared > 1e300 ? Math.log(df) - 2 * Math.log(size) : -Math.log1p(squared);
  const x = squared > 1e300 ? 0 : 1 / (1 + squared);
  const rest = squared > 1e300 ? 1 : squared / (1 + squared);
  const front = (Math.exp(a * logX) * Math.sqrt(rest) * gammaHalfRatio(a)) / Math.sqrt(Math.PI);
  if (x < (a + 1) / (a + 2.5)) return Math.min(1, (front / a) * betaFraction(a, 0.5, x));
  return 1 - 2 * front * betaFraction(0.5, a, rest);
}

/**
 * P(F > f) for F with 1 or 2 numerator degrees of freedom, the two that a plane and a line have. With two it is exactly
 * (1 + 2f/df2)^(−df2/2); with one it is the two-sided t tail of √f.
 * @throws AnalysisError 'not-finite', 'negative', 'not-positive'
 */
export function fUpperTail(f: number, df1: 1 | 2, df2: number): number {
  notNegative('f', f);
  positive('df2', df2);
  if (df1 === 1) return studentTwoSided(Math.sqrt(f), df2);
  return Math.exp((-df2 / 2) * Math.log1p((2 * f) / df2));
}

/**
 * The t that `upperTail` (0 < upperTail ≤ ½) of Student's distribution lies above. Asked of the library as a lower tail, because
 * 1 − upperTail would round the small tails of a Bonferroni test.
 * @throws AnalysisError 'not-finite', 'not-positive', 'out-of-range' above ½
 * @example studentUpperQuantile(0.025, 10) // 2.2281
 */
export function studentUpperQuantile(upperTail: number, df: number): number {
  positive('upperTail', upperTail);
  positive('df', df);
  if (upperTail > 0.5)
    throw new AnalysisError('out-of-range', `An upper tail is at most one half, got ${upperTail}.`, { upperTail });
  return -tQuantile(upperTail, df);
}
