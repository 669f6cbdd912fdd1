import type { GivenRequest, ResponseOf } from '@/shared/api/endpoint';
import { endpoints, type EndpointName, type Endpoints } from '@/shared/api/endpoints';
import { refreshSession } from '../session/refresh-session';
import { sessionState } from '../session/session-store';
import { ApiError } from './api-error';
import { sendRequest, type RequestParts } from './send-request';

export { ApiError, OfflineError } from './api-error';

/** Endpoints that take nothing are called by their name alone. */
type Arguments<N extends EndpointName> =
  unknown extends GivenRequest<Endpoints[N]>
    ? [request?: { signal?: AbortSignal }]
    : [request: GivenRequest<Endpoints[N]> & { signal?: AbortSignal }];

const signedOut = () => new ApiError(401, 'signed-out', 'Nobody is signed in.');

/**
 * Calls an endpoint of the table by its name: `callApi('job', { params: { jobId } })`. The answer has been read by the
 * endpoint's schema. An access token that has run out is renewed once, and the call repeated.
 * @throws ApiError { status, code, fields } when refused; OfflineError when there was no answer.
 */
export async function callApi<N extends EndpointName>(name: N, ...[request]: Arguments<N>): Promise<ResponseOf<Endpoints[N]>> {
  const { signal, ...parts } = (request ?? {}) as RequestParts & { signal?: AbortSignal }; // Arguments<N> has checked each part
  const answer = await callSignedIn(name, parts, signal);
  return answer as ResponseOf<Endpoints[N]>; // sendRequest parsed it by this row's own schema
}

async function callSignedIn(name: EndpointName, parts: RequestParts, signal?: AbortSignal): Promise<unknown> {
  const row = endpoints[name];
  if (row.access === 'public') return sendRequest(row, parts, { accessToken: null, signal });
  const accessToken = sessionState().accessToken ?? (await refreshSession());
  if (accessToken === null) throw signedOut();
  try {
    return await sendRequest(row, parts, { accessToken, signal });
  } catch (error) {
    if (!(error instanceof ApiError) || error.code !== 'signed-out') throw error;
  }
  // While this call was out another may have renewed it already: then its token serves.
  const current = sessionState().accessToken;
  const renewed = current !== null && current !== accessToken ? current : await refreshSession();
  if (renewed === null) throw signedOut();
  return sendRequest(row, parts, { accessToken: renewed, signal });
}
