import type { GivenRequest } from '@/shared/api/endpoint';
import type { Endpoints } from '@/shared/api/endpoints';
import { callApi } from '../api/client';
import { oneTabAtATime } from './refresh-session';
import { sessionBegan, sessionEnded } from './session-store';

export type SignUpForm = GivenRequest<Endpoints['signUp']>['body'];
export type SignInForm = GivenRequest<Endpoints['signIn']>['body'];

/** @throws ApiError 'sign-in-refused' | 'too-many-tries', OfflineError. */
export async function signIn(body: SignInForm): Promise<void> {
  sessionBegan(await callApi('signIn', { body }));
}

/** Signs a company up and whoever does so in. @throws ApiError with `fields`, OfflineError. */
export async function signUp(body: SignUpForm): Promise<void> {
  sessionBegan(await callApi('signUp', { body }));
}

/**
 * Ends the sign-in on the server, then here and in this browser's other tabs. Without the server it does not end: the cookie
 * would live on, and the next start would sign the same person in again.
 * @throws OfflineError, ApiError.
 */
export async function signOut(): Promise<void> {
  await oneTabAtATime(async () => {
    await callApi('signOut', { body: {} });
    sessionEnded({ tell: true });
  });
}
