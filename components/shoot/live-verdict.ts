import { judge, type Nm } from '@/analysis';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { ReadingRecord } from '@/shared/records';
import type { PointVerdict, RoundSeries, RoundState, RoundTarget } from '@/shared/round/round-state';
import { planReach, roundShotUncertainty } from '@/shared/round/round-uncertainty';

/** What a deviation means on the surface being shot. */
export interface ShotVerdict {
  deviation: Nm;
  verdict: PointVerdict;
  close: boolean;
}

/** Judges a reading that is only keyed, just as foldRound will judge it once it is recorded. Null without a backsight. */
export function liveVerdict(
  reading: Nm,
  shot: { target: RoundTarget; series: RoundSeries | null } & Pick<ReadingRecord, 'how' | 'receiver'>,
  { bundle, state }: { bundle: RoundBundle; state: RoundState },
): ShotVerdict | null {
  const { target, series } = shot;
  if (!series?.setup || series.hi === null) return null;
  const context = { ...bundle, surface: bundle.round.surface };
  const parts = { record: shot, place: target, series: series.record, setup: series.setup };
  const uncertainty = roundShotUncertainty(parts, context, planReach(state.targets));
  if (uncertainty === null) return null;
  const deviation = series.hi - reading - target.grade;
  const { verdict, close } = judge(deviation, bundle.toleranceRule, uncertainty.absolute, bundle.toleranceRule.decision);
  return { deviation, verdict, close };
}
