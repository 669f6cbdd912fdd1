import type { Footing, RoundSummary } from '@/shared/api/footing-schemas';
import { may, type Role } from '@/shared/roles';
import { SURFACES, type Surface } from '@/shared/rules';

/** What is to be done next on a footing, by whoever looks. `see` and `none` change nothing. */
export type NextStep =
  | { do: 'draw-outline' }
  | { do: 'set-stations' }
  | { do: 'go-on'; round: RoundSummary }
  | { do: 'open-round'; surface: Surface }
  | { do: 'see-results'; round: RoundSummary }
  /** Somebody else has it in hand: who may, by role. */
  | { do: 'wait'; for: 'outline' | 'stations' | 'shots' };

/** Surfaces that these roles may open a round of; a dig only where one is shot at all. */
export function openSurfaces(footing: Pick<Footing, 'digNeeded'>, roles: readonly Role[]): Surface[] {
  if (!may(roles, 'round.shoot')) return [];
  const any = may(roles, 'round.any-surface');
  return SURFACES.filter((surface) => (any || surface === 'top') && (surface !== 'dig' || footing.digNeeded));
}

/** The newest first, as they were opened. */
export function newestFirst(rounds: readonly RoundSummary[]): RoundSummary[] {
  return [...rounds].sort((p, q) => Date.parse(q.openedAt) - Date.parse(p.openedAt));
}

/** The surface that a stage waits for a round of. After the rails the pour is released, and the top is what is shot next. */
function surfaceOf({ now, done }: Footing['stages']): Surface | null {
  if (now === 'dig' || now === 'rails') return now;
  return (now === 'release' || now === 'top') && !done.includes('top') ? 'top' : null;
}

/** The one step that a footing's home offers first. */
export function nextStep(footing: Footing, roles: readonly Role[]): NextStep {
  if (footing.runs.length === 0) return may(roles, 'outline.change') ? { do: 'draw-outline' } : { do: 'wait', for: 'outline' };
  if (footing.stations.length === 0)
    return may(roles, 'station.write') ? { do: 'set-stations' } : { do: 'wait', for: 'stations' };
  const rounds = newestFirst(footing.rounds);
  const mine = openSurfaces(footing, roles);
  const open = rounds.find((round) => round.closedAt === null && round.verdict !== 'to-grade' && mine.includes(round.surface));
  if (open) return { do: 'go-on', round: open };
  const surface = surfaceOf(footing.stages);
  const newest = rounds[0];
  if (
    surface !== null &&
    mine.includes(surface) &&
    !rounds.some((round) => round.surface === surface && round.closedAt === null)
  ) {
    return { do: 'open-round', surface };
  }
  return newest ? { do: 'see-results', round: newest } : { do: 'wait', for: 'shots' };
}
