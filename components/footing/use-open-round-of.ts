import { useRouter } from 'expo-router';
import { useRef, useState } from 'react';
import { v7 as newId } from 'uuid';
import { describeError } from '@/components/forms/describe-error';
import { useOpenRound } from '@/hooks/api/round-queries';
import type { Surface } from '@/shared/rules';

/** Opens a round and goes to its setup. A try whose answer was lost is repeated under the same id, so that one round opens. */
export function useOpenRoundOf(footingId: string) {
  const router = useRouter();
  const openRound = useOpenRound(footingId);
  const ids = useRef<Partial<Record<Surface, string>>>({});
  const [refusal, setRefusal] = useState<string | null>(null);
  const open = async (surface: Surface) => {
    setRefusal(null);
    const id = (ids.current[surface] ??= newId());
    try {
      await openRound.mutateAsync({ id, surface });
      router.push({ pathname: '/rounds/[roundId]/setup', params: { roundId: id } });
    } catch (error) {
      setRefusal(describeError(error));
    }
  };
  return { open: (surface: Surface) => void open(surface), opening: openRound.isPending, refusal };
}
