import type { HandlersOf, PublicCall } from '../../api/handler';
import type { Dependencies } from '../../dependencies';
import { ApiError } from '../../errors';
import { readMeInCompany } from '../crew/crew-service';
import { refresh, signIn, signOut, signUp, type SignedIn } from './session-service';

/** Sign-up, sign-in, the rotation of the cookie, sign-out. */
export function sessionHandlers(dependencies: Dependencies): HandlersOf<'signUp' | 'signIn' | 'refresh' | 'signOut' | 'me'> {
  const enter = (cookie: PublicCall<'signIn'>['cookie'], { session, refresh: fresh }: SignedIn) => {
    cookie.write(fresh.token, fresh.expiresAt);
    return session;
  };
  return {
    signUp: async ({ input, cookie }) => enter(cookie, await signUp(dependencies, input.body)),
    signIn: async ({ input, cookie }) => enter(cookie, await signIn(dependencies, input.body)),
    refresh: async ({ cookie }) => {
      try {
        return enter(cookie, await refresh(dependencies, cookie.read()));
      } catch (error) {
        if (error instanceof ApiError && error.code === 'refresh-refused') cookie.clear();
        throw error;
      }
    },
    signOut: async ({ cookie }) => {
      await signOut(dependencies, cookie.read());
      cookie.clear();
      return undefined;
    },
    me: ({ tenant }) => readMeInCompany(tenant),
  };
}
