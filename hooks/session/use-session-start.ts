import { useEffect } from 'react';
import { ApiError, OfflineError } from '../api/api-error';
import { refreshSession } from './refresh-session';
import { sessionState } from './session-store';

/** Asks; a server that does not answer has been noted in the session by then, and is asked again when there is signal. */
export async function startSession(): Promise<void> {
  try {
    await refreshSession();
  } catch (error) {
    if (!(error instanceof OfflineError) && !(error instanceof ApiError)) throw error;
  }
}

/** How often, ms, a server that did not answer at the start is asked again; `online` events are not told to every browser. */
const ASK_AGAIN = 15_000;

/** Signs in silently by the refresh cookie when the app starts with somebody remembered, and goes on asking until the server has answered. */
export function useSessionStart(): void {
  useEffect(() => {
    const again = () => {
      const { status, accessToken } = sessionState();
      if (status !== 'signed-out' && accessToken === null) void startSession();
    };
    again();
    const timer = setInterval(again, ASK_AGAIN);
    window.addEventListener('online', again);
    return () => {
      clearInterval(timer);
      window.removeEventListener('online', again);
    };
  }, []);
}
