import { AnalysisError } from './analysis-error';
import { finite, inRange, positive } from './check-input';

/** A column whose part across the ones before it is this small beside itself is one of them again, to rounding. */
const DEPENDENT = 1e-11;

export interface LeastSquaresOptions {
  /** Whether a constant is fitted too; it is then the first coefficient. */
  intercept: boolean;
  /** One a value, all above zero; absent: all 1. */
  weights?: readonly number[];
}

export interface LeastSquaresFit {
  coefficients: number[];
  /** Null without a degree of freedom. */
  standardErrors: number[] | null;
  residuals: number[];
  df: number;
  /** Σw·residual². */
  residualSumOfSquares: number;
  residualStandardError: number | null;
  /** Against the mean with an intercept, against zero without; null where all values are the same as that. */
  rSquared: number | null;
}

interface Factored {
  /** Upper triangle, column by column: r[j][i] for i ≤ j. */
  r: Float64Array[];
  /** Qᵀ·values, as far as there are columns. */
  projected: Float64Array;
}

/** Householder's reflections, column by column, carried through `values` too. Overwrites its arguments. */
function factor(columns: readonly Float64Array[], values: Float64Array): Factored {
  columns.forEach((column, k) => {
    const whole = inRange('column', Math.sqrt(column.reduce((sum, entry) => sum + entry * entry, 0)));
    const below = column.subarray(k);
    const norm = Math.sqrt(below.reduce((sum, entry) => sum + entry * entry, 0));
    if (!(norm > DEPENDENT * whole)) {
      throw new AnalysisError('dependent-columns', `Column ${k + 1} is a combination of the columns before it.`, { column: k });
    }
    const first = below[0] ?? 0;
    const alpha = first > 0 ? -norm : norm;
    const mirror = Float64Array.from(below);
    mirror[0] = first - alpha;
    const size = mirror.reduce((sum, entry) => sum + entry * entry, 0);
    const reflect = (vector: Float64Array): void => {
      const tail = vector.subarray(k);
      const dot = tail.reduce((sum, entry, i) => sum + entry * (mirror[i] ?? 0), 0);
      const twice = (2 * dot) / size;
      for (let i = 0; i < tail.length; i += 1) tail[i] = (tail[i] ?? 0) - twice * (mirror[i] ?? 0);
    };
    columns.slice(k).forEach(reflect);
    reflect(values);
  });
  return { r: columns.map((column, j) => column.slice(0, j + 1)), projected: values.slice(0, columns.length) };
}

/** Solves R·x = b by back substitution. */
function backSubstitute(r: readonly Float64Array[], b: Float64Array): number[] {
  const x = Array.from(b);
  for (let i = x.length - 1; i >= 0; i -= 1) {
    let rest = x[i] ?? 0;
    for (let j = i + 1; j < x.length; j += 1) rest -= (r[j]?.[i] ?? 0) * (x[j] ?? 0);
    x[i] = rest / (r[i]?.[i] ?? 1);
  }
  return x;
}

/** Rows of R⁻¹: (RᵀR)⁻¹ is the sum of the products of its columns. */
function inverseColumns(r: readonly Float64Array[]): number[][] {
  return r.map((_, k) => {
    const unit = new Float64Array(r.length);
    unit[k] = 1;
    return backSubstitute(r, unit);
  });
}

function checkShape(
  columns: readonly (readonly number[])[],
  values: readonly number[],
  { intercept, weights }: LeastSquaresOptions,
): void {
  const parameters = columns.length + (intercept ? 1 : 0);
  if (values.length === 0 || values.length < parameters) {
    throw new AnalysisError('too-few-values', `${values.length} values cannot carry ${parameters} coefficients.`, {
      values: values.length,
      parameters,
    });
  }
  for (const column of [...columns, ...(weights === undefined ? [] : [weights])]) {
    if (column.length !== values.length) {
      throw new AnalysisError('length-mismatch', `A column of ${column.length} does not go with ${values.length} values.`, {
        length: column.length,
      });
    }
  }
  for (const column of columns) column.forEach((value) => finite('column', value));
  values.forEach((value) => finite('value', value));
  weights?.forEach((weight) => positive('weight', weight));
}

interface Centred {
  roots: number[];
  totalWeight: number;
  means: number[];
  meanValue: number;
}

function centreOf(
  columns: readonly (readonly number[])[],
  values: readonly number[],
  { intercept, weights }: LeastSquaresOptions,
): Centred {
  const weight = (i: number): number => weights?.[i] ?? 1;
  const totalWeight = values.reduce((sum, _, i) => sum + weight(i), 0);
  const mean = (column: readonly number[]): number => {
    if (!intercept) return 0;
    const first = column[0] ?? 0;
    return first + column.reduce((sum, value, i) => sum + weight(i) * (value - first), 0) / totalWeight;
  };
  return { roots: values.map((_, i) => Math.sqrt(weight(i))), totalWeight, means: columns.map(mean), meanValue: mean(values) };
}

/**
 * Weighted linear least squares of any number of columns, by Householder's QR of the centred and weighted columns. The plane fit has a
 * solver of its own, which says more and is faster; this one is for the Huber estimate, which weighs the same columns again and again,
 * and for whatever has other columns than x and y.
 *
 * `columns[j][i]` is the j-th column's entry for `values[i]`. Residuals and R² as in R's lm.
 * Source: Golub & Van Loan, Matrix Computations, 5.3.2 (from memory); checked against NIST StRD Norris, Longley and NoInt1 and R's lm.
 * @throws AnalysisError 'too-few-values', 'length-mismatch', 'not-finite', 'not-positive' (weight), 'dependent-columns', 'out-of-range'
 * @example leastSquares([[1, 2, 3]], [2, 4, 6], { intercept: true }).coefficients // [0, 2]
 */
export function leastSquares(
  columns: readonly (readonly number[])[],
  values: readonly number[],
  options: LeastSquaresOptions,
): LeastSquaresFit {
  checkShape(columns, values, options);
  const { roots, totalWeight, means, meanValue } = centreOf(columns, values, options);
  const weigh = (column: readonly number[], mean: number): Float64Array =>
    Float64Array.from(column, (value, i) => inRange('column', (value - mean) * (roots[i] ?? 1)));
  const weighted = columns.map((column, j) => weigh(column, means[j] ?? 0));
  const target = weigh(values, meanValue);
  const about = target.reduce((sum, value) => sum + value * value, 0);
  const { r, projected } = factor(weighted, target);
  const slopes = backSubstitute(r, projected);
  const residuals = values.map((value, i) =>
    inRange(
      'residual',
      columns.reduce((left, column, j) => left - (slopes[j] ?? 0) * ((column[i] ?? 0) - (means[j] ?? 0)), value - meanValue),
    ),
  );
  const residualSumOfSquares = inRange(
    'sum of squares',
    residuals.reduce((sum, residual, i) => sum + (residual * (roots[i] ?? 1)) ** 2, 0),
  );
  const constant = slopes.reduce((left, slope, j) => left - slope * (means[j] ?? 0), meanValue);
  const coefficients = (options.intercept ? [constant, ...slopes] : slopes).map((value) => inRange('coefficient', value));
  const df = values.length - coefficients.length;
  return {
    coefficients,
    standardErrors:
      df < 1 ? null : standardErrors(r, means, options.intercept ? 1 / totalWeight : null, residualSumOfSquares / df),
    residuals,
    df,
    residualSumOfSquares,
    residualStandardError: df < 1 ? null : Math.sqrt(residualSumOfSquares / df),
    rSquared: about === 0 ? null : 1 - residualSumOfSquares / about,
  };
}

function standardErrors(
  r: readonly Float64Array[],
  means: readonly number[],
  perWeight: number | null,
  variance: number,
): number[] {
  const inverse = inverseColumns(r);
  const root = (square: number): number => inRange('standard error', Math.sqrt(square));
  const slopes = means.map((_, j) => root(variance * inverse.reduce((sum, column) => sum + (column[j] ?? 0) ** 2, 0)));
  if (perWeight === null) return slopes;
  const atOrigin = inverse.reduce(
    (sum, column) => sum + column.reduce((dot, entry, j) => dot + entry * (means[j] ?? 0), 0) ** 2,
    perWeight,
  );
  return [root(variance * atOrigin), ...slopes];
}
