import { judge, judgeRound, reduceLevelNotes, type JudgedStation, type LevelReduction, type ReducedShot } from '@/analysis';
import type { ReadingRecord, SeriesRecord } from '../records';
import { orderRecords, type OrderedRecord } from './order-records';
import { recordsByKind, type Ordered, type RecordsByKind } from './records-by-kind';
import { isWholeReadLap, newestLap, phonesThatDisagree } from './round-laps';
import { roundLevelNotes } from './round-level-notes';
import type { FoldRecord, RoundContext, RoundSeries, RoundShot, RoundState, RoundTarget } from './round-state';
import { placesInWalkingOrder, targetKey, type Place } from './round-targets';
import { planReach, roundShotUncertainty, type PlanReach } from './round-uncertainty';

const FIVE_MINUTES = 300_000;

/**
 * Turns the records of a round into the round on screen, in the report and in a list: the one reducer, called by phone and
 * server alike. Pure; the order of `records` does not matter, see orderRecords.
 *
 * Elevations come from the level notes, deviations from the plan grade of the surface shot (surfaceGrade), verdicts from the
 * round's tolerance rule and each shot's uncertainty against plan grade. Shots of a station that is no longer laid out stay in
 * the level notes and belong to no target.
 */
export function foldRound(records: readonly FoldRecord[], context: RoundContext): RoundState {
  const ordered = orderRecords(records);
  const kinds = recordsByKind(ordered);
  const reduction = reduceLevelNotes(roundLevelNotes(kinds, context.benchmarks));
  const targets = foldTargets(kinds, reduction, context);
  const order = new Map(kinds.readings.map(({ record }, place) => [record.id, place]));
  const deciding = targets.map((target) => target.deciding);
  return {
    targets,
    series: foldSeries(kinds, reduction),
    reduction,
    shot: deciding.filter((shot) => shot !== null).length,
    of: targets.length,
    out: deciding.filter((shot) => shot?.verdict === 'high' || shot?.verdict === 'low').length,
    close: deciding.filter((shot) => shot?.close).length,
    lap: newestLap(targets),
    wholeReadLap: isWholeReadLap(targets, (shot) => order.get(shot.id) ?? -1),
    verdict: judgeRound(deciding.map(judgedStation)),
    disagreements: phonesThatDisagree(targets),
    waitingStrikes: kinds.waitingStrikes,
    clocksOff: clocksOff(ordered),
  };
}

/** A shot without an elevation (its backsight was struck out, or has not come yet) says nothing: the round cannot tell. */
function judgedStation(shot: RoundShot | null): JudgedStation | null {
  if (shot === null) return null;
  return shot.verdict === null ? { laser: 'unchecked', verdict: 'cannot-tell' } : { laser: shot.laser, verdict: shot.verdict };
}

function foldTargets(kinds: RecordsByKind, reduction: LevelReduction, context: RoundContext): RoundTarget[] {
  const places = placesInWalkingOrder(context.footing, context.surface);
  const reach = planReach(places);
  const reduced = new Map(reduction.shots.map((shot) => [shot.id, shot]));
  const series = new Map(kinds.series.map(({ record }) => [record.id, record]));
  const readings = new Map<string, Ordered<ReadingRecord>[]>();
  for (const reading of kinds.readings) {
    const { purpose, point } = reading.record;
    if (purpose !== 'shot' || point.kind !== 'station') continue;
    const key = targetKey(point.stationId, point.rail);
    readings.set(key, [...(readings.get(key) ?? []), reading]);
  }
  return places.map((place) => {
    const shots = (readings.get(place.key) ?? []).map((reading) =>
      foldShot({ reading, place, reduced: reduced.get(reading.record.id), series: series.get(reading.record.seriesId) }, kinds, {
        context,
        reach,
      }),
    );
    return { ...place, shots, deciding: shots.find((shot) => shot.decides) ?? null };
  });
}

interface ShotParts {
  reading: Ordered<ReadingRecord>;
  place: Place;
  reduced: ReducedShot | undefined;
  series: SeriesRecord | undefined;
}

function foldShot(
  { reading, place, reduced, series }: ShotParts,
  kinds: RecordsByKind,
  { context, reach }: { context: RoundContext; reach: PlanReach },
): RoundShot {
  const { record } = reading;
  const setup = series && kinds.setups.get(series.setupId);
  const uncertainty = series && setup ? roundShotUncertainty({ record, place, series, setup }, context, reach) : null;
  const judged = reduced?.judged ?? null;
  const deviation = judged === null ? null : judged - place.grade;
  const rule = context.toleranceRule;
  const judgement =
    deviation === null || uncertainty === null ? null : judge(deviation, rule, uncertainty.absolute, rule.decision);
  return {
    id: record.id,
    record,
    person: reading.person,
    receivedAt: reading.receivedAt,
    stationId: place.stationId,
    rail: place.rail,
    seriesId: record.seriesId,
    elevation: judged,
    deviation,
    laser: reduced?.laser ?? 'unchecked',
    struck: kinds.strikes.get(record.id) ?? null,
    decides: reduced?.decides ?? false,
    uncertainty: uncertainty ?? { absolute: 0, relative: 0 },
    verdict: judgement?.verdict ?? null,
    close: judgement?.close ?? false,
  };
}

function foldSeries(kinds: RecordsByKind, reduction: LevelReduction): RoundSeries[] {
  const reduced = new Map(reduction.series.map((series) => [series.id, series]));
  const shots = new Map(reduction.shots.map((shot) => [shot.id, shot]));
  const madeAt = new Map(kinds.readings.map(({ record }) => [record.id, record.madeAt]));
  return kinds.series.map(({ record, person }) => {
    const own = kinds.readings.filter((reading) => reading.record.seriesId === record.id);
    const notes = reduced.get(record.id);
    const checks = (notes?.checks ?? []).map((check) => ({ ...check, at: madeAt.get(check.id) ?? record.madeAt }));
    const newest = own.findLast((reading) => reading.record.purpose === 'shot' && !kinds.strikes.has(reading.record.id));
    return {
      id: record.id,
      record,
      setup: kinds.setups.get(record.setupId) ?? null,
      person,
      hi: notes?.hi ?? null,
      backsightSpread: notes?.backsightSpread ?? 0,
      readings: own.map((reading) => ({
        record: reading.record,
        struck: kinds.strikes.has(reading.record.id),
        person: reading.person,
      })),
      checks,
      laser: (newest && shots.get(newest.record.id)?.laser) ?? laserByChecks(checks),
    };
  });
}

/** Of a setup from which nothing was shot yet: what its checks of the laser alone say. */
function laserByChecks(checks: RoundSeries['checks']): RoundSeries['laser'] {
  const ofLaser = checks.filter((check) => check.of === 'laser');
  if (ofLaser.length === 0) return 'unchecked';
  return ofLaser.every((check) => check.holds) ? 'held' : 'doubted';
}

/** Phones that were more than five minutes off the server's clock when they sent, by the worst that was seen of each. */
function clocksOff(ordered: readonly OrderedRecord[]): RoundState['clocksOff'] {
  const worst = new Map<string, number>();
  for (const { record, clockSkew } of ordered) {
    if (clockSkew === null || Math.abs(clockSkew) <= Math.abs(worst.get(record.deviceId) ?? FIVE_MINUTES)) continue;
    worst.set(record.deviceId, clockSkew);
  }
  return [...worst].map(([deviceId, skew]) => ({ deviceId, skew }));
}
