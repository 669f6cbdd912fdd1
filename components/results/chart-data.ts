import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { Rail } from '@/shared/records';
import type { RoundResults } from '@/shared/round/round-results';
import type { RoundState, RoundTarget } from '@/shared/round/round-state';
import type { ChartStation, MarkKind, PlanStation, ProfileCorner, ProfilePoint } from '../charts/chart-types';
import { placeWords } from './place-words';

/** A station's mark: by the verdict of its deciding shot. One that cannot be told stands as in, with its ring. */
export function markOf(target: RoundTarget): MarkKind {
  const shot = target.deciding;
  if (!shot || shot.deviation === null) return 'not-shot';
  if (shot.verdict === 'high' || shot.verdict === 'low') return shot.verdict;
  return 'in';
}

function chartStation(bundle: RoundBundle, target: RoundTarget, suspects: ReadonlySet<string>): ChartStation {
  return {
    id: target.key,
    label: placeWords(bundle.footing, target),
    mark: markOf(target),
    close: target.deciding?.close ?? false,
    suspect: suspects.has(target.key),
  };
}

const suspectKeys = (results: Pick<RoundResults, 'suspects'>) => new Set(results.suspects.map((suspect) => suspect.target.key));

/** One rail unrolled. */
export function profilePoints(bundle: RoundBundle, state: RoundState, results: RoundResults, rail: Rail): ProfilePoint[] {
  const suspects = suspectKeys(results);
  return state.targets
    .filter((target) => target.rail === rail)
    .map((target) => ({
      ...chartStation(bundle, target, suspects),
      at: target.at,
      deviation: target.deciding?.deviation ?? null,
    }));
}

export function profileCorners(bundle: RoundBundle): ProfileCorner[] {
  return bundle.footing.stations
    .filter((station) => station.corner !== null || station.step === 'after')
    .map((station) => ({ at: station.at, label: station.corner ? `${station.corner} ${station.name}` : station.name }));
}

export function planStations(bundle: RoundBundle, state: RoundState, results: RoundResults): PlanStation[] {
  const suspects = suspectKeys(results);
  return state.targets.map((target) => ({ ...chartStation(bundle, target, suspects), x: target.x, y: target.y }));
}

export function planCorners(bundle: RoundBundle) {
  return bundle.footing.stations.flatMap((station) =>
    station.corner === null ? [] : [{ x: station.x, y: station.y, label: station.corner }],
  );
}

/** The rails that are shot, in the order in which they are shown. */
export function railsOf(bundle: RoundBundle): Rail[] {
  return bundle.footing.rails === 'both' ? ['outer', 'inner'] : ['centre'];
}
