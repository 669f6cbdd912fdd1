import { endpoints, type EndpointName, type Endpoints } from '@/shared/api/endpoints';
import type { ParsedRequest, ResponseOf } from '@/shared/api/endpoint';
import { ERROR_STATUS, errorBodySchema, type ErrorCode, type FieldError } from '@/shared/error-codes';

/** Thrown by a handler to refuse as the server would. */
export class Refused extends Error {
  constructor(
    readonly code: ErrorCode,
    readonly fields?: Record<string, FieldError>,
  ) {
    super(code);
  }
}

/** What the server would answer, by the endpoint's name. An endpoint without a handler is not found. */
export type FakeHandlers = { [N in EndpointName]?: (request: ParsedRequest<Endpoints[N]>) => ResponseOf<Endpoints[N]> };

export interface FakeCall {
  name: EndpointName;
  body: unknown;
}

function matches(path: string, url: string): Record<string, string> | null {
  const names = [...path.matchAll(/:(\w+)/g)].map(([, name]) => name ?? '');
  const found = new RegExp(`^${path.replace(/:\w+/g, '([^/]+)')}$`).exec(url);
  return found ? Object.fromEntries(names.map((name, index) => [name, found[index + 1] ?? ''])) : null;
}

const answer = (status: number, body: unknown) => ({
  ok: status < 400,
  status,
  text: async () => JSON.stringify(body),
  json: async () => body,
});

function refuse(refused: Refused) {
  const body = { error: { code: refused.code, message: refused.code, ...(refused.fields ? { fields: refused.fields } : {}) } };
  return answer(ERROR_STATUS[refused.code], errorBodySchema.parse(body));
}

/**
 * Stands in for the network: requests are matched and read by the endpoint table as the server reads them, and answers must be
 * what the table allows.
 */
export function fakeApi(handlers: FakeHandlers): { calls: FakeCall[] } {
  const calls: FakeCall[] = [];
  global.fetch = jest.fn(async (input: RequestInfo | URL, init?: RequestInit) => {
    const url = new URL(String(input), 'http://localhost');
    for (const name of Object.keys(endpoints) as EndpointName[]) {
      // Object.keys forgets the key type
      const row = endpoints[name];
      const params = row.method === (init?.method ?? 'GET') ? matches(row.path, url.pathname) : null;
      if (!params) continue;
      const body: unknown = typeof init?.body === 'string' ? JSON.parse(init.body) : undefined;
      const parsed = {
        params: row.params?.parse(params),
        query: row.query?.parse(Object.fromEntries(url.searchParams)),
        body: row.body?.parse(body),
      };
      calls.push({ name, body });
      const handler = handlers[name] as ((request: unknown) => unknown) | undefined; // parsed by this row's own schemas
      if (!handler) return refuse(new Refused('not-found')) as Response; // a Response as far as the client reads it
      try {
        return answer(row.status, row.response?.parse(handler(parsed))) as Response; // as above
      } catch (error) {
        if (error instanceof Refused) return refuse(error) as Response; // as above
        throw error;
      }
    }
    return refuse(new Refused('not-found')) as Response; // as above
  });
  return { calls };
}
