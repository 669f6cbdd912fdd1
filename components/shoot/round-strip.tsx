import { ProfileStrip } from '@/components/charts/profile-strip';
import type { ReadyRound } from '@/hooks/round/use-round';
import type { RoundTarget } from '@/shared/round/round-state';
import type { ShotVerdict } from './live-verdict';
import { stripCorners, stripPoints, walkLength } from './strip-points';

interface RoundStripProps {
  view: ReadyRound;
  /** The target being shot: its rail is drawn, and a dotted line stands at it. */
  target: RoundTarget | null;
  /** Of what is being keyed there. */
  verdict: ShotVerdict | null;
  height?: number;
}

/** The footing unrolled, the rail at hand. */
export function RoundStrip({ view, target, verdict, height }: RoundStripProps) {
  const { bundle, state } = view;
  const rail = target?.rail ?? state.targets[0]?.rail;
  if (rail === undefined) return null;
  return (
    <ProfileStrip
      points={stripPoints(view, rail, target && { key: target.key, verdict })}
      corners={stripCorners(bundle)}
      length={walkLength(bundle)}
      tolerance={bundle.toleranceRule}
      units={{ style: bundle.job.unitStyle, graduation: bundle.job.graduation }}
      currentId={target?.key}
      height={height}
    />
  );
}
