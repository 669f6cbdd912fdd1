import { execFileSync, spawnSync } from 'node:child_process';
import { MultivariateLinearRegression } from 'ml-regression';
import { Matrix, QrDecomposition } from 'ml-matrix';
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

/** Coefficients, residuals and leverages by the library's QR: all that it offers towards the same answer. */
function byMatrixQr(columns: Matrix, values: Matrix): number {
  const qr = new QrDecomposition(columns);
  const residuals = Matrix.sub(values, columns.mmul(qr.solve(values)));
  const q = qr.orthogonalMatrix;
  let check = 0;
  for (let i = 0; i < q.rows; i += 1) check += q.get(i, 0) ** 2 + q.get(i, 1) ** 2 + q.get(i, 2) ** 2;
  return check + residuals.get(0, 0);
}

function byRegression(x: number[][], z: number[][]): number {
  return new MultivariateLinearRegression(x, z).stdError;
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

/** Processor microseconds a call over one round, so that a busy machine changes little; the garbage of whoever ran before is swept away first. */
function time(call: () => number, calls: number): number {
  globalThis.gc?.();
  const from = process.cpuUsage();
  for (let i = 0; i < calls; i += 1) trace += call();
  const { user, system } = process.cpuUsage(from);
  return (user + system) / calls;
}

interface Row {
  name: string;
  micros: number;
}

interface Candidate {
  name: string;
  call: () => number;
  calls: number;
  times: number[];
}

function measure(n: number): Row[] {
  const points = stations(n);
  const columns = new Matrix(points.map(({ x, y }) => [1, x, y]));
  const values = Matrix.columnVector(points.map(({ z }) => z));
  const x = points.map((point) => [point.x, point.y]);
  const z = points.map((point) => [point.z]);
  const candidates = [
    { name: 'fitPlane, all diagnostics', call: () => fitPlane(points).points.length },
    { name: 'centred closed form, same object', call: () => closedForm(points).points.length },
    { name: 'ml-matrix QR, leverages', call: () => byMatrixQr(columns, values) },
    { name: 'ml-regression, no diagnostics', call: () => byRegression(x, z) },
  ].map(({ name, call }): Candidate => {
    time(call, Math.max(2, Math.ceil(20_000 / n)));
    const calls = Math.max(1, Math.ceil((SECONDS_A_ROUND * 1e6) / Math.max(1, time(call, Math.max(1, Math.ceil(2_000 / n))))));
    return { name, call, calls, times: [] };
  });
  for (let round = 0; round < ROUNDS; round += 1)
    for (const candidate of candidates) candidate.times.push(time(candidate.call, candidate.calls));
  return [
    ...candidates.map(({ name, times }) => ({ name, micros: median(times) })),
    { name: 'R lm, studentized residuals', micros: inR(points) },
  ];
}

/** The same-object candidates beside each other from 1,000 to 100,000 stations: 1 is linear. */
function growth(thousand: number | undefined, hundredThousand: number | undefined): string {
  return ((hundredThousand ?? NaN) / (thousand ?? NaN) / 100).toFixed(2);
}

function main(): void {
  const [own, closed]: [number[], number[]] = [[], []];
  for (const n of SIZES) {
    const rows = measure(n);
    const ours = rows[0]?.micros ?? NaN;
    own.push(ours);
    closed.push(rows[1]?.micros ?? NaN);
    console.log(`\n${n} stations`);
    rows.forEach(({ name, micros }, i) => {
      const against =
        i === 0 ? `${(ours / (closed.at(-1) ?? NaN)).toFixed(2)} × the closed form` : `${(micros / ours).toFixed(2)} × fitPlane`;
      console.log(`  ${name.padEnd(34)} ${micros.toFixed(2).padStart(12)} µs   ${against}`);
    });
  }
  console.log(
    `\nfrom 1,000 to 100,000 stations: fitPlane ${growth(own[1], own[2])} × linear, closed form ${growth(closed[1], closed[2])} × linear`,
  );
  if (!Number.isFinite(trace)) throw new Error('A candidate gave no number.');
}

/**
 * A hundred thousand stations are 18 MB of result. In Node's usual nursery of 16 MB they would be copied twice on the way out of it, which is
 * more work than making them; with a larger one the arithmetic is what is timed, for every candidate alike.
 */
const NURSERY = '--max-semi-space-size=128';

if (process.execArgv.includes(NURSERY)) main();
else
  process.exitCode =
    spawnSync(process.execPath, [NURSERY, ...process.execArgv, ...process.argv.slice(1)], { stdio: 'inherit' }).status ?? 1;
