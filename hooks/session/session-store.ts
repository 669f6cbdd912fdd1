import { meSchema, type Me, type Session } from '@/shared/api/session-endpoints';

/**
 * Who is signed in here. `signed-in` without a token: this browser remembers somebody, and the server has not answered yet or cannot be
 * reached; the phone goes on with them, because a dead spot is not a sign-out. `starting`: the browser keeps nothing for us, so only
 * the server can tell.
 */
export type SessionState =
  | { status: 'starting'; me: null; accessToken: null; reached: boolean }
  | { status: 'signed-out'; me: null; accessToken: null; reached: boolean }
  | { status: 'signed-in'; me: Me; accessToken: string | null; reached: boolean };

const REMEMBERED = 'tallyrod.me';
const CHANNEL = 'tallyrod.session';

const blank = { me: null, accessToken: null } as const;
let state: SessionState = asRemembered();
const listeners = new Set<() => void>();
const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(CHANNEL);

function set(next: SessionState): void {
  state = next;
  for (const listener of listeners) listener();
}

/** What the browser keeps for us; null where it keeps nothing (a locked-down one throws at the mere name). */
function storage(): Storage | null {
  try {
    return typeof localStorage === 'undefined' ? null : localStorage;
  } catch {
    return null;
  }
}

/** Names and roles, no secret: enough to go on recording where there is no signal. The token never leaves memory. */
function remember(me: Me | null): void {
  if (me === null) storage()?.removeItem(REMEMBERED);
  else storage()?.setItem(REMEMBERED, JSON.stringify(me));
}

function readMe(text: string): Me | null {
  try {
    return meSchema.parse(JSON.parse(text));
  } catch {
    // Written by an older version or by hand: as good as nobody remembered.
    return null;
  }
}

/** Where the app starts. Nobody remembered is nobody signed in: signing out forgets, and so does the browser, cookie and all. */
function asRemembered(): SessionState {
  const kept = storage();
  if (kept === null) return { status: 'starting', ...blank, reached: true };
  const text = kept.getItem(REMEMBERED);
  const me = text === null ? null : readMe(text);
  if (me === null) return { status: 'signed-out', ...blank, reached: true };
  return { status: 'signed-in', me, accessToken: null, reached: true };
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

/** The server could not be asked: nothing is known but that, and whoever was signed in still is. */
export function serverNotReached(): void {
  if (state.status !== 'signed-out') set({ ...state, reached: false });
}

channel?.addEventListener('message', (event: MessageEvent<unknown>) => {
  if (event.data === 'ended') sessionEnded({ tell: false });
});
