import { i18n } from '@/hooks/i18n/i18n';
import type { Footing } from '@/shared/api/footing-schemas';
import type { RoundTarget } from '@/shared/round/round-state';

/** A place as a foreman calls it: "C, 0+74", "0+82", and with two rails "C, 0+74, outer". */
export function placeWords(footing: Footing, target: Pick<RoundTarget, 'stationId' | 'rail'>): string {
  const station = footing.stations.find((one) => one.id === target.stationId);
  const name = station ? (station.corner ? `${station.corner}, ${station.name}` : station.name) : '';
  return target.rail === 'centre' ? name : `${name}, ${i18n.t(`results:rail.${target.rail}`)}`;
}

/** The shortest name that is one on this footing: the corner's letter, else the station's name. */
export function shortPlace(footing: Footing, target: Pick<RoundTarget, 'stationId'>): string {
  const station = footing.stations.find((one) => one.id === target.stationId);
  return station?.corner ?? station?.name ?? '';
}
