import { linearRegression } from 'simple-statistics';
import { AnalysisError } from './analysis-error';
import { inRange, lengthFromZero, nanometres } from './check-input';
import type { Tolerance } from './types';
import type { Nm } from './units';

export interface PooledDeviation {
  /** dig, rails, wet or top: each has its own rule. */
  surface: string;
  /** Month of the shot, `2026-12`. */
  month: string;
  /** Deciding shot's deviation from plan grade, positive high. */
  deviation: Nm;
}

export interface BenchmarkCheck {
  /** HI − reading − elevation of the re-read mark. */
  error: Nm;
  holds: boolean;
}

interface Spread {
  n: number;
  /** Mean deviation. */
  bias: Nm;
  /** Standard deviation with n − 1; null under two. */
  spread: Nm | null;
}

export interface SurfaceCapability extends Spread {
  surface: string;
  /** Share of deviations within the rule in force; null without a rule. */
  within: number | null;
  /** Smaller of (high − bias) and (bias + low) over three spreads; null without a rule, or where the spread is 0 or not known. */
  cpk: number | null;
  /** Oldest first. */
  months: (Spread & { month: string })[];
  /** What the mean |deviation| of a month gains per month, nm; null under two months. */
  trend: Nm | null;
}

export interface Capability {
  surfaces: SurfaceCapability[];
  checks: {
    n: number;
    failed: number;
    failedShare: number | null;
    /** Standard deviation of one reading, √(Σerror² / 2n) over the checks that held; null without one. */
    repeatability: Nm | null;
  };
}

function spreadOf(deviations: readonly Nm[]): Spread {
  const n = deviations.length;
  const bias = deviations.reduce((sum, deviation) => sum + deviation, 0) / n;
  const squares = deviations.reduce((sum, deviation) => sum + (deviation - bias) ** 2, 0);
  return { n, bias: inRange('bias', bias), spread: n < 2 ? null : inRange('spread', Math.sqrt(squares / (n - 1))) };
}

/** Months since the year 0, so that neighbours are 1 apart. */
function monthNumber(month: string): number {
  const [, year, inYear] = /^(\d{4})-(0[1-9]|1[0-2])$/.exec(month) ?? [];
  if (year === undefined || inYear === undefined)
    throw new AnalysisError('bad-month', `"${month}" is not a month like 2026-12.`, { month });
  return Number(year) * 12 + Number(inYear);
}

function groupBy<Item>(items: readonly Item[], key: (item: Item) => string): [string, Item[]][] {
  const groups = new Map<string, Item[]>();
  for (const item of items) {
    const group = groups.get(key(item));
    if (group) group.push(item);
    else groups.set(key(item), [item]);
  }
  return [...groups].sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
}

function trendOf(months: readonly [string, PooledDeviation[]][]): Nm | null {
  if (months.length < 2) return null;
  const first = monthNumber(months[0]?.[0] ?? '');
  const sizes = months.map(([month, list]) => [
    monthNumber(month) - first,
    list.reduce((sum, { deviation }) => sum + Math.abs(deviation), 0) / list.length,
  ]);
  return inRange('trend', linearRegression(sizes).m);
}

function surfaceCapability(surface: string, list: PooledDeviation[], rule: Tolerance | undefined): SurfaceCapability {
  const deviations = list.map(({ deviation }) => deviation);
  const pooled = spreadOf(deviations);
  const months = groupBy(list, ({ month }) => month);
  const room = rule && Math.min(rule.high - pooled.bias, pooled.bias + rule.low);
  const within =
    rule && deviations.filter((deviation) => deviation <= rule.high && deviation >= -rule.low).length / deviations.length;
  return {
    surface,
    ...pooled,
    within: within ?? null,
    cpk: room === undefined || !pooled.spread ? null : inRange('cpk', room / (3 * pooled.spread)),
    months: months.map(([month, inMonth]) => ({ month, ...spreadOf(inMonth.map(({ deviation }) => deviation)) })),
    trend: trendOf(months),
  };
}

/**
 * How well a crew holds grade over many rounds: deviations pooled by surface against the rule in force, month by month, and how its re-readings of
 * benchmarks came out. A check is the difference of two readings of one mark, so one reading repeats to √(Σerror² / 2n) of those that held; a check
 * that failed tells of a moved laser, not of reading.
 * @param input.rules limits in force by surface
 * @throws AnalysisError 'bad-month' | 'not-finite' | 'negative' | 'out-of-range'
 */
export function capability(input: {
  deviations: readonly PooledDeviation[];
  rules: Readonly<Record<string, Tolerance>>;
  checks: readonly BenchmarkCheck[];
}): Capability {
  const rules = new Map(
    Object.entries(input.rules).map(([surface, { low, high }]) => [
      surface,
      { low: lengthFromZero(`low limit of ${surface}`, low), high: lengthFromZero(`high limit of ${surface}`, high) },
    ]),
  );
  const deviations = input.deviations.map((one) => ({ ...one, deviation: nanometres('deviation', one.deviation) }));
  for (const { month } of deviations) monthNumber(month);
  const errors = input.checks.map(({ error, holds }) => ({ error: nanometres('error', error), holds }));
  const held = errors.filter(({ holds }) => holds);
  const n = errors.length;
  return {
    surfaces: groupBy(deviations, ({ surface }) => surface).map(([surface, list]) =>
      surfaceCapability(surface, list, rules.get(surface)),
    ),
    checks: {
      n,
      failed: n - held.length,
      failedShare: n === 0 ? null : (n - held.length) / n,
      repeatability:
        held.length === 0 ? null : Math.sqrt(held.reduce((sum, { error }) => sum + error ** 2, 0) / (2 * held.length)),
    },
  };
}
