import type { Endpoint } from '@/shared/api/endpoint';
import { errorBodySchema } from '@/shared/error-codes';
import { ApiError, OfflineError } from './api-error';

export interface RequestParts {
  params?: Record<string, string>;
  query?: Record<string, unknown>;
  body?: unknown;
}

/** A request that has hung this long, ms, in a dead spot will not come back; the person is told instead. */
const PATIENCE = 20_000;

function address(row: Endpoint, { params = {}, query = {} }: RequestParts): string {
  const path = row.path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined) throw new Error(`${row.path} needs ${name}`);
    return encodeURIComponent(value);
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) if (value !== undefined) search.set(name, String(value));
  return search.size > 0 ? `${path}?${search}` : path;
}

async function refusal(response: Response): Promise<ApiError> {
  const body = errorBodySchema.safeParse(await response.json().catch(() => null));
  // Something between here and the server answered in its own words (a proxy's page): the status is all that is known.
  if (!body.success) return new ApiError(response.status, 'server-fault', `HTTP ${response.status} without a readable body`);
  const { code, message, fields } = body.data.error;
  return new ApiError(response.status, code, message, { fields });
}

async function fetchInTime(url: string, init: RequestInit, given: AbortSignal | undefined): Promise<Response> {
  const own = new AbortController();
  const timer = setTimeout(() => own.abort(), PATIENCE);
  const passOn = () => own.abort();
  given?.addEventListener('abort', passOn);
  try {
    return await fetch(url, { ...init, signal: own.signal });
  } catch (cause) {
    // A caller that gave up is not told that the server is away.
    if (given?.aborted) throw given.reason;
    throw new OfflineError(cause);
  } finally {
    clearTimeout(timer);
    given?.removeEventListener('abort', passOn);
  }
}

/**
 * Sends one request as its row of the endpoint table says, and reads the answer by the row's schema.
 * @throws ApiError when the server refuses or answers what the table does not allow; OfflineError when it does not answer.
 */
export async function sendRequest(
  row: Endpoint,
  parts: RequestParts,
  { accessToken, signal }: { accessToken: string | null; signal?: AbortSignal },
): Promise<unknown> {
  const headers: Record<string, string> = { accept: 'application/json' };
  if (row.body) headers['content-type'] = 'application/json';
  if (accessToken !== null) headers.authorization = `Bearer ${accessToken}`;
  const body = row.body ? JSON.stringify(parts.body) : undefined;
  const response = await fetchInTime(
    address(row, parts),
    { method: row.method, headers, body, credentials: 'same-origin' },
    signal,
  );
  if (!response.ok) throw await refusal(response);
  if (row.response === null) return undefined;
  const text = await response.text().catch((cause: unknown) => {
    throw new OfflineError(cause);
  });
  try {
    return row.response.parse(JSON.parse(text));
  } catch (cause) {
    throw new ApiError(response.status, 'server-fault', `${row.method} ${row.path} answered in a shape that is not its own`, {
      cause,
    });
  }
}
