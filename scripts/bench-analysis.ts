import { execFileSync } from 'node:child_process';
import { MultivariateLinearRegression } from 'ml-regression';
import { Matrix, QrDecomposition, inverse } from 'ml-matrix';
import { type PlaneFit, type PlanePoint, fUpperTail, fitPlane, studentTwoSided } from '../analysis';

/**
 * How long a plane fit with all its diagnostics takes, beside what else could have made it: ml-regression, ml-matrix's QR, R's lm with studentized
 * residuals, and a centred closed form that returns the same object without any of the care. One run, candidates in turn, medians of
 * processor time.
 * `node --import tsx scripts/bench-analysis.ts`
 */

const SIZES = [40, 1_000, 100_000] as const;
/** Rounds of each candidate in turn; the median of them is printed. */
const ROUNDS = 15;
const SECONDS_A_ROUND = 0.02;

/** A round on a tilted perimeter and its cross walls, in nanometres, read to 1/16 in; the same every time. */
function stations(n: number): PlanePoint[] {
  let state = 20_261_201;
  const uniform = (): number => {
    state = (state * 48_271) % 2_147_483_647;
    return state / 2_147_483_647;
  };
  return Array.from({ length: n }, (_, i) => {
    const x = Math.round(3e10 * uniform());
    const y = Math.round(2e10 * uniform());
    const noise = (uniform() + uniform() + uniform() - 1.5) * 2e6;
    return { id: `S${i}`, x, y, z: Math.round((4e5 + 1.2e-4 * x - 0.8e-4 * y + noise) / 1_587_500) * 1_587_500 };
  });
}

/** The textbook: means, sums about them, Cramer's rule, one pass for the points. No care for collinear, far-off, exact or refused input. */
function closedForm(points: readonly PlanePoint[]): PlaneFit {
  const n = points.length;
  let [meanX, meanY, meanZ] = [0, 0, 0];
  for (const { x, y, z } of points) {
    meanX += x;
    meanY += y;
    meanZ += z;
  }
  meanX /= n;
  meanY /= n;
  meanZ /= n;
  let [xx, yy, xy, xz, yz, zz] = [0, 0, 0, 0, 0, 0];
  for (const point of points) {
    const x = point.x - meanX;
    const y = point.y - meanY;
    const z = point.z - meanZ;
    xx += x * x;
    yy += y * y;
    xy += x * y;
    xz += x * z;
    yz += y * z;
    zz += z * z;
  }
  const det = xx * yy - xy * xy;
  const b = (yy * xz - xy * yz) / det;
  const c = (xx * yz - xy * xz) / det;
  const a = meanZ - b * meanX - c * meanY;
  const df = n - 3;
  let sse = 0;
  let [low, high] = [Infinity, -Infinity];
  for (const { x, y, z } of points) {
    const rise = b * (x - meanX) + c * (y - meanY);
    const e = z - meanZ - rise;
    sse += e * e;
    if (rise < low) low = rise;
    if (rise > high) high = rise;
  }
  const variance = sse / df;
  const s = Math.sqrt(variance);
  const fits: PlaneFit['points'] = [];
  for (const { id, x, y, z } of points) {
    const dx = x - meanX;
    const dy = y - meanY;
    const residual = z - meanZ - b * dx - c * dy;
    const leverage = 1 / n + (yy * dx * dx - 2 * xy * dx * dy + xx * dy * dy) / det;
    const left = 1 - leverage;
    const studentized = residual / (s * Math.sqrt(left));
    const squared = studentized * studentized;
    fits.push({
      id,
      fitted: z - residual,
      residual,
      leverage,
      studentized,
      deletedStudentized: studentized * Math.sqrt((df - 1) / (df - squared)),
      cooks: (squared * leverage) / (3 * left),
    });
  }
  const term = (value: number, unit: number): PlaneFit['a'] => {
    const standardError = s * Math.sqrt(unit);
    const t = value / standardError;
    return { value, standardError, t, p: studentTwoSided(t, df) };
  };
  const ssr = zz - sse;
  const f = ssr / 2 / variance;
  const slope = Math.hypot(b, c);
  const total = n * meanZ * meanZ + zz;
  const east = (Math.atan2(-b, -c) * 180) / Math.PI;
  return {
    model: 'plane',
    n,
    df,
    a: term(a, 1 / n + (yy * meanX * meanX - 2 * xy * meanX * meanY + xx * meanY * meanY) / det),
    b: term(b, yy / det),
    c: term(c, xx / det),
    residualStandardError: s,
    rSquared: ssr / zz,
    fTest: { f, df1: 2, df2: df, p: fUpperTail(f, 2, df) },
    tilt: {
      slope,
      slopeStandardError: (s * Math.sqrt((b * b * yy - 2 * b * c * xy + c * c * xx) / det)) / slope,
      fallAzimuth: east < 0 ? east + 360 : east,
      drop: high - low,
    },
    shares: { offset: (n * meanZ * meanZ) / total, tilt: ssr / total, rest: sse / total },
    points: fits,
  };
}

/** The contract's object from what a library gives: coefficients (a, b, c), their variances and each point's leverage; the rest is arithmetic. */
function objectOf(
  points: readonly PlanePoint[],
  [a = NaN, b = NaN, c = NaN]: number[],
  unit: (i: number, j: number) => number,
  leverages: number[],
): PlaneFit {
  const n = points.length;
  const df = n - 3;
  let sse = 0;
  let sum = 0;
  for (const { x, y, z } of points) {
    sse += (z - a - b * x - c * y) ** 2;
    sum += z;
  }
  const meanZ = sum / n;
  let zz = 0;
  let [low, high] = [Infinity, -Infinity];
  const variance = sse / df;
  const fits = points.map(({ id, x, y, z }, i) => {
    const fitted = a + b * x + c * y;
    const residual = z - fitted;
    const leverage = leverages[i] ?? NaN;
    const left = 1 - leverage;
    const studentized = residual / Math.sqrt(variance * left);
    zz += (z - meanZ) ** 2;
    low = Math.min(low, fitted);
    high = Math.max(high, fitted);
    const deletedStudentized = studentized * Math.sqrt((df - 1) / (df - studentized * studentized));
    return {
      id,
      fitted,
      residual,
      leverage,
      studentized,
      deletedStudentized,
      cooks: (studentized * studentized * leverage) / (3 * left),
    };
  });
  const term = (value: number, unit: number): PlaneFit['a'] => {
    const standardError = Math.sqrt(variance * unit);
    const t = value / standardError;
    return { value, standardError, t, p: studentTwoSided(t, df) };
  };
  const f = (zz - sse) / 2 / variance;
  const slope = Math.hypot(b, c);
  const perVariance = (b * b * unit(1, 1) + 2 * b * c * unit(1, 2) + c * c * unit(2, 2)) / (slope * slope);
  const total = n * meanZ * meanZ + zz;
  const east = (Math.atan2(-b, -c) * 180) / Math.PI;
  return {
    model: 'plane',
    n,
    df,
    a: term(a, unit(0, 0)),
    b: term(b, unit(1, 1)),
    c: term(c, unit(2, 2)),
    residualStandardError: Math.sqrt(variance),
    rSquared: 1 - sse / zz,
    fTest: { f, df1: 2, df2: df, p: fUpperTail(f, 2, df) },
    tilt: {
      slope,
      slopeStandardError: Math.sqrt(variance * perVariance),
      fallAzimuth: east < 0 ? east + 360 : east,
      drop: high - low,
    },
    shares: { offset: (n * meanZ * meanZ) / total, tilt: (zz - sse) / total, rest: sse / total },
    points: fits,
  };
}

/** By the library's QR; the inverse of RᵀR gives the variances, the rows of Q the leverages. */
function byMatrixQr(points: readonly PlanePoint[]): PlaneFit {
  const qr = new QrDecomposition(new Matrix(points.map(({ x, y }) => [1, x, y])));
  const coefficients = qr.solve(Matrix.columnVector(points.map(({ z }) => z))).to1DArray();
  const upper = inverse(qr.upperTriangularMatrix);
  const unit = upper.mmul(upper.transpose());
  const q = qr.orthogonalMatrix;
  const leverages = points.map((_, i) => q.get(i, 0) ** 2 + q.get(i, 1) ** 2 + q.get(i, 2) ** 2);
  return objectOf(points, coefficients, (i, j) => unit.get(i, j), leverages);
}

/** By the library's multivariate regression; its covariance matrix, constant last, gives variances and leverages. */
function byRegression(points: readonly PlanePoint[]): PlaneFit {
  const { weights, stdError, stdErrorMatrix } = new MultivariateLinearRegression(
    points.map(({ x, y }) => [x, y]),
    points.map(({ z }) => [z]),
  );
  const [[b = NaN] = [], [c = NaN] = [], [a = NaN] = []] = weights;
  const unit = (i: number, j: number): number => stdErrorMatrix.get((i + 2) % 3, (j + 2) % 3) / (stdError * stdError);
  const [aa, ab, ac, bb, bc, cc] = [unit(0, 0), unit(0, 1), unit(0, 2), unit(1, 1), unit(1, 2), unit(2, 2)];
  const leverages = points.map(({ x, y }) => aa + bb * x * x + cc * y * y + 2 * (ab * x + ac * y + bc * x * y));
  return objectOf(points, [a, b, c], unit, leverages);
}

/** Median processor microseconds of one call in R itself, the start of R not counted. */
function inR(points: readonly PlanePoint[]): number {
  const vector = (values: number[]): string => `scan(text = "${values.join(' ')}", quiet = TRUE)`;
  const script = `x <- ${vector(points.map(({ x }) => x))}; y <- ${vector(points.map(({ y }) => y))}; z <- ${vector(points.map((point) => point.z))}
one <- function() { f <- lm(z ~ x + y); s <- summary(f); c(s$sigma, rstandard(f)[1], rstudent(f)[1], hatvalues(f)[1], cooks.distance(f)[1]) }
invisible(one()); calls <- max(1, round(20000 / length(z)))
times <- replicate(9, { from <- sum(proc.time()[1:2]); for (i in seq_len(calls)) one(); (sum(proc.time()[1:2]) - from) / calls })
cat(median(times) * 1e6)`;
  return Number(execFileSync('Rscript', ['--vanilla', '-'], { input: `${script}\n`, encoding: 'utf8', maxBuffer: 1 << 28 }));
}

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;

/** Kept from being optimized away: every result leaves a trace here. */
let trace = 0;

/** Processor microseconds a call over one round, so that a busy machine changes little. */
function time(call: () => number, calls: number): number {
  const from = process.cpuUsage();
  for (let i = 0; i < calls; i += 1) trace += call();
  const { user, system } = process.cpuUsage(from);
  return (user + system) / calls;
}

/** Each makes the same object. */
const CANDIDATES: readonly { name: string; fit: (points: readonly PlanePoint[]) => PlaneFit }[] = [
  { name: 'fitPlane', fit: fitPlane },
  { name: 'centred closed form', fit: closedForm },
  { name: 'ml-matrix QR', fit: byMatrixQr },
  { name: 'ml-regression', fit: byRegression },
];

/** Median of one candidate at one size, in this process. */
function measure(fit: (points: readonly PlanePoint[]) => PlaneFit, n: number): number {
  const points = stations(n);
  const call = (): number => fit(points).points.length;
  time(call, Math.max(3, Math.ceil(400_000 / n)));
  const calls = Math.max(1, Math.ceil((SECONDS_A_ROUND * 1e6) / Math.max(1, time(call, Math.max(1, Math.ceil(20_000 / n))))));
  const micros = median(Array.from({ length: ROUNDS }, () => time(call, calls)));
  if (!(trace > 0)) throw new Error('A candidate gave no points.');
  return micros;
}

/**
 * A hundred thousand stations are 18 MB of result. In Node's usual nursery of 16 MB they would be copied twice on the way out of it, which is
 * more work than making them; with a larger one the arithmetic is what is timed, for every candidate alike.
 */
const FLAGS = ['--max-semi-space-size=128', '--import', 'tsx'];

/** The same in a process of its own, so that nobody sweeps up after another. */
function measureApart(candidate: number, n: number): number {
  return Number(execFileSync(process.execPath, [...FLAGS, __filename, String(candidate), String(n)], { encoding: 'utf8' }));
}

/** From 1,000 to 100,000 stations: 1 is linear. */
function growth(micros: readonly (readonly number[])[], candidate: number): string {
  return ((micros[2]?.[candidate] ?? NaN) / (micros[1]?.[candidate] ?? NaN) / 100).toFixed(2);
}

function main(): void {
  console.log('plane fit with all diagnostics, median processor time; every candidate in JavaScript makes the same object');
  const table = SIZES.map((n) => {
    const micros = [...CANDIDATES.map((_, candidate) => measureApart(candidate, n)), inR(stations(n))];
    const [ours = NaN, closed = NaN] = micros;
    console.log(`\n${n} stations`);
    [...CANDIDATES.map(({ name }) => name), 'R lm, studentized residuals'].forEach((name, i) => {
      const against =
        i === 0 ? `${(ours / closed).toFixed(2)} × the closed form` : `${((micros[i] ?? NaN) / ours).toFixed(2)} × fitPlane`;
      console.log(`  ${name.padEnd(28)} ${(micros[i] ?? NaN).toFixed(2).padStart(12)} µs   ${against}`);
    });
    return micros;
  });
  console.log(
    `\nfrom 1,000 to 100,000 stations: fitPlane ${growth(table, 0)} × linear, closed form ${growth(table, 1)} × linear`,
  );
}

const [, , candidate, size] = process.argv;
const asked = candidate === undefined ? undefined : CANDIDATES[Number(candidate)];
if (asked === undefined) main();
else console.log(measure(asked.fit, Number(size)));
