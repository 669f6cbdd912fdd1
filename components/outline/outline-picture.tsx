import { Card } from '@/components/ui/card';
import { OutlineDrawing, type DrawnRun } from '@/components/charts/outline-drawing';
import type { Nm, PlanPoint, TracedOutline } from '@/analysis';
import type { Run } from '@/shared/api/footing-schemas';
import { toTheMark, type JobUnits } from '@/components/lengths/job-units';
import type { OutlineState } from './read-outline';

/** Where each run begins and ends on the plan. A closed outline that misses ends where the last run does, not at its start. */
function endsOf(runs: readonly Run[], { corners, closure }: TracedOutline): { from: PlanPoint; to: PlanPoint }[] {
  const end = { x: closure.dx, y: closure.dy };
  return runs.map((_, index) => ({
    from: corners[index] ?? end,
    to: index === runs.length - 1 ? end : (corners[index + 1] ?? end),
  }));
}

function stepPlaces(runs: readonly Run[], ends: readonly { from: PlanPoint; to: PlanPoint }[]): PlanPoint[] {
  return runs.flatMap((run, index) => {
    const at = ends[index];
    if (!at) return [];
    return run.steps.map((step) => ({
      x: at.from.x + ((at.to.x - at.from.x) * step.at) / run.length,
      y: at.from.y + ((at.to.y - at.from.y) * step.at) / run.length,
    }));
  });
}

interface OutlinePictureProps {
  runs: readonly Run[];
  state: OutlineState;
  width: Nm;
  units: JobUnits;
  heights?: [number, number];
}

/** The outline as it grows, with the runs in question written in the colour that says so. */
export function OutlinePicture({ runs, state, width, units, heights }: OutlinePictureProps) {
  if (state.kind === 'empty') return null;
  const ends = endsOf(runs, state.traced);
  const doubtful = new Set(state.kind === 'misses' ? state.mends.map(({ runId }) => runId) : []);
  const drawn: DrawnRun[] = runs.flatMap((run, index) => {
    const at = ends[index];
    return at ? [{ id: run.id, ...at, length: toTheMark(run.length, units), doubtful: doubtful.has(run.id) }] : [];
  });
  return (
    <Card style={{ padding: 0 }}>
      <OutlineDrawing
        runs={drawn}
        steps={stepPlaces(runs, ends)}
        width={width}
        closed={state.kind === 'closes'}
        strip={state.kind === 'strip' || state.kind === 'crosses'}
        heights={heights}
      />
    </Card>
  );
}
