import { laserError, type LiveSeries } from './level-series';
import type { Chain, LevelReduction, Reading } from './types';
import type { Nm } from './units';

/** Marks whose elevation is known when a chain starts: benchmarks, and turning points that earlier chains left. */
export interface KnownMarks {
  benchmarks: ReadonlyMap<string, Nm>;
  turningPoints: Map<string, { elevation: Nm; doubted: boolean }>;
}

export interface ReducedSeries {
  live: LiveSeries;
  hi: Nm | null;
  checks: LevelReduction['series'][number]['checks'];
  /** What the chain's misclosure takes off every elevation of this series; 0 without one. */
  correction: Nm;
  /** Judged by what the chain says of itself: adjusted, or raw and doubted. */
  useAdjusted: boolean;
  chainDoubted: boolean;
  turningPoints: { point: string; elevation: Nm }[];
}

/** Series run on while each backsights the point that the one before foresighted. */
export function splitIntoChains(series: readonly LiveSeries[]): LiveSeries[][] {
  const chains: LiveSeries[][] = [];
  for (const live of series) {
    const current = chains.at(-1);
    const before = current?.at(-1);
    if (current && before && before.mark !== null && linkTo(before, live.mark)) current.push(live);
    else chains.push([live]);
  }
  return chains;
}

function linkTo(before: LiveSeries, mark: string | null): Reading | undefined {
  return before.foresights.filter(({ point }) => point === mark).at(-1);
}

function elevationOf(point: string | null, known: KnownMarks): { elevation: Nm | null; doubted: boolean } {
  if (point === null) return { elevation: null, doubted: false };
  const benchmark = known.benchmarks.get(point);
  if (benchmark !== undefined) return { elevation: benchmark, doubted: false };
  return known.turningPoints.get(point) ?? { elevation: null, doubted: false };
}

function reduceChecks(live: LiveSeries, hi: Nm | null, known: KnownMarks): ReducedSeries['checks'] {
  if (live.mark === null) return [];
  return live.checks.flatMap((check) => {
    const ofLaser = check.point === live.mark;
    const elevation = elevationOf(check.point, known).elevation;
    if (!ofLaser && (hi === null || elevation === null)) return [];
    const error = ofLaser ? laserError(live, check) : (hi ?? 0) - check.reading - (elevation ?? 0);
    return [
      { id: check.id, error, holds: Math.abs(error) <= live.checkLimit, of: ofLaser ? ('laser' as const) : ('mark' as const) },
    ];
  });
}

/** The last foresight of each point; one that closes on a benchmark is no turning point. */
function turningPointsOf(
  live: LiveSeries,
  hi: Nm | null,
  next: LiveSeries | undefined,
  known: KnownMarks,
): ReducedSeries['turningPoints'] {
  if (hi === null) return [];
  const last = new Map(live.foresights.map(({ point, reading }) => [point, reading]));
  return [...last]
    .filter(([point]) => point === next?.mark || !known.benchmarks.has(point))
    .map(([point, reading]) => ({ point, elevation: hi - reading }));
}

/** Heights from one mark to the next, by sums and by walking: two ways that must give the same number. */
function pageCheckOf(chain: readonly LiveSeries[], first: Nm): Chain['pageCheck'] {
  let sumBacksights = 0;
  let sumForesights = 0;
  let elevation = first;
  for (const [index, live] of chain.entries()) {
    if (live.mark === null) continue;
    const next = chain[index + 1];
    const closing = next ? linkTo(live, next.mark) : (live.foresights.at(-1) ?? live.checks.at(-1));
    const hi = elevation + live.backsight;
    sumBacksights += live.backsight;
    sumForesights += closing?.reading ?? 0;
    elevation = closing ? hi - closing.reading : hi;
  }
  const difference = sumBacksights - sumForesights;
  const lastMinusFirst = elevation - first;
  // Whole nanometres either agree or differ by one or more.
  return { sumBacksights, sumForesights, difference, lastMinusFirst, agrees: Math.abs(difference - lastMinusFirst) < 0.5 };
}

/** Carries the heights through one chain, closes it, and leaves its turning points among the known marks. */
export function reduceChain(
  chain: readonly LiveSeries[],
  known: KnownMarks,
  allowable: Nm | undefined,
): { chain: Chain; series: ReducedSeries[] } {
  const start = elevationOf(chain[0]?.mark ?? null, known);
  let carried = start.elevation;
  const series = chain.map((live, index): ReducedSeries => {
    const next = chain[index + 1];
    const elevation = carried ?? elevationOf(live.mark, known).elevation;
    const hi = live.mark === null || elevation === null ? null : elevation + live.backsight;
    const checks = reduceChecks(live, hi, known);
    const turningPoints = turningPointsOf(live, hi, next, known);
    for (const { point, elevation: at } of turningPoints)
      known.turningPoints.set(point, { elevation: at, doubted: start.doubted });
    const link = next && linkTo(live, next.mark);
    carried = hi === null || !link ? null : hi - link.reading;
    return { live, hi, checks, correction: 0, useAdjusted: false, chainDoubted: start.doubted, turningPoints };
  });
  const misclosure = start.elevation === null ? null : misclosureOf(series, known);
  const misclosureHolds = misclosure === null || allowable === undefined ? null : Math.abs(misclosure) <= allowable;
  if (misclosure !== null) spreadMisclosure(series, misclosure, misclosureHolds, known);
  return {
    chain: {
      series: chain.map(({ id }) => id),
      pageCheck: pageCheckOf(chain, start.elevation ?? 0),
      misclosure,
      misclosureHolds,
    },
    series,
  };
}

/** Observed − known, where a chain with a turning point closes on a benchmark. */
function misclosureOf(series: readonly ReducedSeries[], known: KnownMarks): Nm | null {
  const last = series.at(-1);
  const closing = last?.live.foresights.at(-1);
  if (series.length < 2 || !last || last.hi === null || !closing) return null;
  const benchmark = known.benchmarks.get(closing.point);
  return benchmark === undefined ? null : last.hi - closing.reading - benchmark;
}

function spreadMisclosure(series: readonly ReducedSeries[], misclosure: Nm, holds: boolean | null, known: KnownMarks): void {
  for (const [index, reduced] of series.entries()) {
    reduced.correction = Math.round((-(index + 1) * misclosure) / series.length) + 0;
    reduced.useAdjusted = holds === true;
    const afterFirstTurningPoint = index > 0;
    reduced.chainDoubted ||= holds === false && afterFirstTurningPoint;
    for (const { point, elevation } of reduced.turningPoints) {
      const judged = holds === true ? elevation + reduced.correction : elevation;
      known.turningPoints.set(point, { elevation: judged, doubted: reduced.chainDoubted || holds === false });
    }
  }
}
