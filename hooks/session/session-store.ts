import { meSchema, type Me, type Session } from '@/shared/api/session-endpoints';

/**
 * Who is signed in here. `starting`: the server has not been asked yet and nobody is remembered. `signed-in` without a token: the
 * server could not be reached, and the phone goes on with whoever it remembers, because a dead spot is not a sign-out.
 */
export type SessionState =
  | { status: 'starting'; me: null; accessToken: null; reached: boolean }
  | { status: 'signed-out'; me: null; accessToken: null; reached: boolean }
  | { status: 'signed-in'; me: Me; accessToken: string | null; reached: boolean };

const REMEMBERED = 'tallyrod.me';
const CHANNEL = 'tallyrod.session';

const blank = { me: null, accessToken: null } as const;
let state: SessionState = { status: 'starting', ...blank, reached: true };
const listeners = new Set<() => void>();
const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(CHANNEL);

function set(next: SessionState): void {
  state = next;
  for (const listener of listeners) listener();
}

/** Names and roles, no secret: enough to go on recording where there is no signal. The token never leaves memory. */
function remember(me: Me | null): void {
  if (typeof localStorage === 'undefined') return;
  if (me === null) localStorage.removeItem(REMEMBERED);
  else localStorage.setItem(REMEMBERED, JSON.stringify(me));
}

function remembered(): Me | null {
  const text = typeof localStorage === 'undefined' ? null : localStorage.getItem(REMEMBERED);
  if (text === null) return null;
  try {
    return meSchema.parse(JSON.parse(text));
  } catch {
    // Written by an older version or by hand: as good as nobody remembered.
    localStorage.removeItem(REMEMBERED);
    return null;
  }
}

/** Reads; `useSession` is for screens. */
export function sessionState(): SessionState {
  return state;
}

/** @returns what ends the subscription. */
export function subscribeToSession(listener: () => void): () => void {
  listeners.add(listener);
  return () => void listeners.delete(listener);
}

export function sessionBegan(session: Session): void {
  remember(session.me);
  set({ status: 'signed-in', me: session.me, accessToken: session.accessToken, reached: true });
}

/** Ends it here; `tell` ends it in this browser's other tabs as well. */
export function sessionEnded({ tell }: { tell: boolean }): void {
  remember(null);
  set({ status: 'signed-out', ...blank, reached: true });
  if (tell) channel?.postMessage('ended');
}

/** The server could not be asked: go on with whoever is remembered; with nobody, stay at the start and say so. */
export function serverNotReached(): void {
  if (state.status === 'signed-out') return;
  const me = state.me ?? remembered();
  set(
    me === null
      ? { status: 'starting', ...blank, reached: false }
      : { status: 'signed-in', me, accessToken: state.accessToken, reached: false },
  );
}

channel?.addEventListener('message', (event: MessageEvent<unknown>) => {
  if (event.data === 'ended') sessionEnded({ tell: false });
});
