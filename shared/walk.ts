import { traceOutline, type Nm } from '@/analysis';
import type { Footing } from './api/footing-schemas';

/** The walk round a footing: whether it comes back to where it began (the turns make one full turn), and how long it is. */
export function walkOf(footing: Pick<Footing, 'runs'>): { closed: boolean; length: Nm } {
  if (footing.runs.length === 0) return { closed: false, length: 0 };
  const { closure, perimeter } = traceOutline(footing.runs);
  return { closed: Math.abs(closure.angle) < 1e-9, length: perimeter };
}
