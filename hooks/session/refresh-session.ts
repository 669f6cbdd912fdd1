import { sessionEndpoints, sessionSchema } from '@/shared/api/session-endpoints';
import { ApiError } from '../api/api-error';
import { sendRequest } from '../api/send-request';
import { serverNotReached, sessionBegan, sessionEnded } from './session-store';

const LOCK = 'tallyrod.refresh';
let running: Promise<string | null> | null = null;

/**
 * The cookie is one for all tabs, and each use of it rotates it: two at once would look like a stolen one, and a refresh that
 * came back after a sign-out would undo it.
 */
export function oneTabAtATime<T>(work: () => Promise<T>): Promise<T> {
  return typeof navigator !== 'undefined' && navigator.locks ? navigator.locks.request(LOCK, work) : work();
}

async function ask(): Promise<string | null> {
  try {
    const session = sessionSchema.parse(await sendRequest(sessionEndpoints.refresh, { body: {} }, { accessToken: null }));
    sessionBegan(session);
    return session.accessToken;
  } catch (error) {
    if (error instanceof ApiError && error.status === 401) {
      sessionEnded({ tell: false });
      return null;
    }
    serverNotReached();
    throw error;
  }
}

/**
 * A new access token for the refresh cookie. Whoever calls while one is under way gets that one's answer.
 * @returns null when the sign-in is over.
 * @throws OfflineError or ApiError when the server cannot say; the sign-in then stands.
 */
export function refreshSession(): Promise<string | null> {
  running ??= oneTabAtATime(ask).finally(() => {
    running = null;
  });
  return running;
}
