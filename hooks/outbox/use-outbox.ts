import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useSyncExternalStore } from 'react';
import { mergeStored, shotsChanged } from '../api/round-queries';
import { useSession } from '../session/use-session';
import { browserOutbox } from './browser-outbox';
import type { OutboxSnapshot } from './outbox';
import { outboxScope } from './outbox-storage';

/** What of this person's records is on this phone only, as it changes. */
export function useOutbox(): OutboxSnapshot {
  const outbox = browserOutbox();
  return useSyncExternalStore(outbox.subscribe, outbox.snapshot, outbox.snapshot);
}

/**
 * Keeps the outbox of whoever is signed in open and sending, and puts what the server stored into the cache. Mounted once in
 * the layout of the signed-in screens, so that records go on leaving the phone whatever is on the screen.
 */
export function useOutboxRunner(): void {
  const client = useQueryClient();
  const { me, accessToken } = useSession();
  const scope = me === null ? null : outboxScope(me.company.id, me.person.id);
  useEffect(() => void browserOutbox().open(scope), [scope]);
  // A fresh token may be just what a refused sender was waiting for.
  useEffect(() => {
    if (accessToken !== null) browserOutbox().send();
  }, [accessToken]);
  useEffect(
    () =>
      browserOutbox().onStored((roundId, records) => {
        mergeStored(client, roundId, records);
        shotsChanged(client);
      }),
    [client],
  );
}
