import { NM_PER_MILLIMETRE } from '@/analysis';
import type { Laser } from '@/shared/api/instrument-endpoints';
import type { UnitStyle } from '@/shared/quantities';

/** The unit that a laser's figures were stated in: metric where its distance is whole millimetres, which no round number of feet is. */
export function laserStyle({ accuracyAt }: Pick<Laser, 'accuracyAt'>): UnitStyle {
  return accuracyAt % NM_PER_MILLIMETRE === 0 && accuracyAt % (100 * NM_PER_MILLIMETRE) === 0 ? 'metric' : 'feet-inches';
}
