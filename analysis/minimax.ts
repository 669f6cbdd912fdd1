import { AnalysisError } from './analysis-error';

/** In units of the largest value: what a vertex may be beyond optimal, and two ratios apart, before rounding explains it. */
const TOLERANCE = 1e-13;
const TIE = 1e-11;
/** A row or multiplier under this is zero. */
const ZERO = 1e-10;

export interface Minimax {
  /** One a column. */
  coefficients: number[];
  /** Largest |values − columns · coefficients|. */
  halfWidth: number;
  /** Indices of the rows that hold it there. */
  support: number[];
}

/** A column of the dual program: a row of the data, from above (+1) or below (−1). */
interface Side {
  row: number;
  sign: 1 | -1;
}

/** Inverse by Gauss and Jordan with row pivoting; null where singular. Four by four at most. */
function inverse(matrix: readonly number[][]): number[][] | null {
  const size = matrix.length;
  const work = matrix.map((row, i) => [...row, ...row.map((_, j) => (i === j ? 1 : 0))]);
  for (let k = 0; k < size; k += 1) {
    let best = k;
    for (let i = k + 1; i < size; i += 1) if (Math.abs(work[i]?.[k] ?? 0) > Math.abs(work[best]?.[k] ?? 0)) best = i;
    const pivotRow = work[best] ?? [];
    const pivot = pivotRow[k] ?? 0;
    if (Math.abs(pivot) < 1e-14) return null;
    work[best] = work[k] ?? [];
    const reduced = pivotRow.map((entry) => entry / pivot);
    work[k] = reduced;
    for (let i = 0; i < size; i += 1) {
      const factor = work[i]?.[k] ?? 0;
      if (i !== k && factor !== 0) work[i] = (work[i] ?? []).map((entry, j) => entry - factor * (reduced[j] ?? 0));
    }
  }
  return work.map((row) => row.slice(size));
}

const dot = (a: readonly number[], b: readonly number[]): number => a.reduce((sum, entry, i) => sum + entry * (b[i] ?? 0), 0);

/** The data of one program: rows of columns, values, and the basis the search started from, by which ties are broken. */
interface Program {
  rows: readonly (readonly number[])[];
  values: readonly number[];
}

const sideColumn = ({ rows }: Program, { row, sign }: Side): number[] => [...(rows[row] ?? []).map((entry) => sign * entry), 1];

const basisMatrix = (program: Program, basis: readonly Side[]): number[][] => {
  const columns = basis.map((side) => sideColumn(program, side));
  return columns.map((_, i) => columns.map((column) => column[i] ?? 0));
};

/** As many rows as there are columns, the farthest apart that a greedy sweep finds: the first vertex stands on them. */
function independentRows(rows: readonly (readonly number[])[]): number[] {
  const left = rows.map((row) => [...row]);
  const chosen: number[] = [];
  const width = rows[0]?.length ?? 0;
  for (let k = 0; k < width; k += 1) {
    let best = 0;
    let most = -1;
    left.forEach((row, i) => {
      const size = dot(row, row);
      if (size > most) [best, most] = [i, size];
    });
    if (most < ZERO * ZERO)
      throw new AnalysisError('dependent-columns', 'The columns of a minimax fit depend on one another.', { column: k });
    chosen.push(best);
    const unit = (left[best] ?? []).map((entry) => entry / Math.sqrt(most));
    left.forEach((row, i) => {
      const along = dot(row, unit);
      left[i] = row.map((entry, j) => entry - along * (unit[j] ?? 0));
    });
  }
  return chosen;
}

/** One vertex: the multipliers of its sides, and the fit (coefficients, then the half-width) that they price. */
interface Vertex {
  inverse: number[][];
  multipliers: number[];
  fit: number[];
}

function vertexOf(program: Program, basis: readonly Side[]): Vertex {
  const inverted = inverse(basisMatrix(program, basis));
  if (inverted === null)
    throw new AnalysisError('no-convergence', 'A minimax vertex has no volume.', { rows: basis.map(({ row }) => row) });
  const gains = basis.map(({ row, sign }) => sign * (program.values[row] ?? 0));
  return {
    inverse: inverted,
    multipliers: inverted.map((row) => row.at(-1) ?? 0),
    fit: inverted.map((_, j) => inverted.reduce((sum, row, i) => sum + (gains[i] ?? 0) * (row[j] ?? 0), 0)),
  };
}

/** The row that stands off the fit the most, and from which side. */
function worstSide({ rows, values }: Program, fit: readonly number[]): Side & { residual: number } {
  let worst: Side & { residual: number } = { row: 0, sign: 1, residual: -1 };
  rows.forEach((row, i) => {
    const residual = (values[i] ?? 0) - dot(row, fit);
    if (Math.abs(residual) > worst.residual) worst = { row: i, sign: residual < 0 ? -1 : 1, residual: Math.abs(residual) };
  });
  return worst;
}

/**
 * Which side leaves when another enters: the smallest ratio of multiplier to change; ties, common where support points stand in line, by the
 * lexicographically smallest row in terms of the first basis, which cannot go round in circles. −1 where none may.
 */
function leavingSide(vertex: Vertex, entering: readonly number[], start: readonly number[][]): number {
  let leaving = -1;
  let smallest: number[] = [];
  vertex.inverse.forEach((row, i) => {
    const change = dot(row, entering);
    if (change <= ZERO) return;
    const inStart = start.map((_, j) => row.reduce((sum, entry, m) => sum + entry * (start[m]?.[j] ?? 0), 0));
    const ratios = [Math.max(0, vertex.multipliers[i] ?? 0), ...inStart].map((entry) => entry / change);
    const place = ratios.findIndex((ratio, j) => Math.abs(ratio - (smallest[j] ?? Infinity)) > TIE);
    if (leaving === -1 || (place >= 0 && (ratios[place] ?? 0) < (smallest[place] ?? 0))) {
      leaving = i;
      smallest = ratios;
    }
  });
  return leaving;
}

/**
 * The coefficients whose largest |residual| is smallest, exactly: the simplex method on the dual linear program, one exchange of a support
 * row at a time, each O(n), until no row stands beyond the support. Columns and values are best within ±1. A few dozen exchanges settle a
 * thousand rows.
 * Source: E. Stiefel, "Über diskrete und lineare Tschebyscheff-Approximationen", Numer. Math. 1 (1959); lexicographic rule: Dantzig, Orden &
 * Wolfe (1955). Both from memory.
 * @throws AnalysisError 'dependent-columns', 'no-convergence'
 */
export function minimaxFit(rows: readonly (readonly number[])[], values: readonly number[]): Minimax {
  const program: Program = { rows, values };
  const [first = 0, ...others] = independentRows(rows);
  let basis: Side[] = [{ row: first, sign: 1 }, { row: first, sign: -1 }, ...others.map((row): Side => ({ row, sign: 1 }))];
  const start = basisMatrix(program, basis);
  const most = 1000 + 20 * rows.length;
  for (let step = 0; step < most; step += 1) {
    const vertex = vertexOf(program, basis);
    const level = vertex.fit.at(-1) ?? 0;
    const coefficients = vertex.fit.slice(0, -1);
    const worst = worstSide(program, coefficients);
    const within = worst.residual <= level + TOLERANCE || basis.some(({ row, sign }) => row === worst.row && sign === worst.sign);
    const leaving = within ? -1 : leavingSide(vertex, sideColumn(program, worst), start);
    if (leaving === -1) {
      const support = basis.flatMap(({ row }, i) => (Math.abs(vertex.multipliers[i] ?? 0) > ZERO ? [row] : []));
      return { coefficients, halfWidth: worst.residual, support: [...new Set(support)].sort((a, b) => a - b) };
    }
    basis = basis.map((side, i) => (i === leaving ? { row: worst.row, sign: worst.sign } : side));
  }
  throw new AnalysisError('no-convergence', 'The minimax exchange did not settle.', { steps: most });
}
