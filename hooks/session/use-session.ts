import { useSyncExternalStore } from 'react';
import { may, type Action } from '@/shared/roles';
import { sessionState, subscribeToSession, type SessionState } from './session-store';

/** Who is signed in: `{ status: 'starting' | 'signed-out' | 'signed-in', me, … }`. */
export function useSession(): SessionState {
  return useSyncExternalStore(subscribeToSession, sessionState, sessionState);
}

/** Whether whoever is signed in may do this. The server refuses on its own; this hides what would be refused. */
export function useMay(action: Action): boolean {
  const { me } = useSession();
  return me !== null && may(me.roles, action);
}
