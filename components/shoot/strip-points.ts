import type { ProfileCorner, ProfilePoint } from '@/components/charts/chart-types';
import { placeWords } from '@/components/results/place-words';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { RoundState, RoundTarget } from '@/shared/round/round-state';
import type { ShotVerdict } from './live-verdict';

/** One rail of the round as the strip draws it; the reading that is being keyed stands at its station already. */
export function stripPoints(
  { bundle, state }: { bundle: RoundBundle; state: RoundState },
  rail: RoundTarget['rail'],
  live: { key: string; verdict: ShotVerdict | null } | null,
): ProfilePoint[] {
  return state.targets
    .filter((target) => target.rail === rail)
    .map((target) => {
      const keyed = live?.key === target.key ? live.verdict : null;
      const { deviation = null, verdict = null, close = false } = keyed ?? target.deciding ?? {};
      return {
        id: target.key,
        label: placeWords(bundle.footing, target),
        at: target.at,
        deviation,
        mark: deviation === null ? 'not-shot' : verdict === 'high' || verdict === 'low' ? verdict : 'in',
        close: close && verdict !== 'high' && verdict !== 'low',
      };
    });
}

/** Corners and steps, which stand as thin verticals. */
export function stripCorners({ footing }: RoundBundle): ProfileCorner[] {
  return footing.stations
    .filter((station) => station.corner !== null || station.step === 'after')
    .map((station) => ({ at: station.at, label: station.corner === null ? station.name : `${station.corner} ${station.name}` }));
}

/** The whole walk, nm. */
export function walkLength({ footing }: RoundBundle): number {
  return footing.runs.reduce((length, run) => length + run.length, 0);
}
