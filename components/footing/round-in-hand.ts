import type { Href } from 'expo-router';

/** Where an open round is gone on with: at its shots, or at its setup while there are none. */
export function roundInHand({ id, shot }: { id: string; shot: number | null }): Href {
  const pathname = shot === 0 ? '/rounds/[roundId]/setup' : '/rounds/[roundId]/shoot';
  return { pathname, params: { roundId: id } };
}
