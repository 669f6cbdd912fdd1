import type { LevelNotes, Series } from '@/analysis';
import type { RodPoint } from '../records';
import type { RecordsByKind } from './records-by-kind';
import { targetKey } from './round-targets';
import type { RoundContext } from './round-state';

/** How a place where the rod stood is named in the level notes. */
export function pointName(point: RodPoint): string {
  switch (point.kind) {
    case 'station':
      return targetKey(point.stationId, point.rail);
    case 'benchmark':
      return `benchmark/${point.benchmarkId}`;
    case 'turning':
      return `turning/${point.name}`;
  }
}

/**
 * The records of a round as level notes. A reading whose series has not come yet (another phone's, still on its way) stands
 * in a series of its own without a backsight: it keeps its place and has no elevation.
 */
export function roundLevelNotes(records: RecordsByKind, benchmarks: RoundContext['benchmarks']): LevelNotes {
  const series = new Map<string, Series>();
  for (const { record } of records.series) {
    series.set(record.id, {
      id: record.id,
      setup: record.setupId,
      rod: record.rodId,
      checkLimit: record.checkLimit,
      readings: [],
    });
  }
  records.readings.forEach(({ record }, order) => {
    const own = series.get(record.seriesId) ?? { id: record.seriesId, setup: '', rod: '', checkLimit: 0, readings: [] };
    series.set(own.id, own);
    own.readings.push({
      id: record.id,
      kind: record.purpose,
      point: pointName(record.point),
      reading: record.reading,
      struck: records.strikes.has(record.id),
      order,
    });
  });
  return {
    benchmarks: Object.fromEntries(
      benchmarks.map((benchmark) => [pointName({ kind: 'benchmark', benchmarkId: benchmark.id }), benchmark.elevation]),
    ),
    series: [...series.values()],
  };
}
