import type { GivenRequest, ResponseOf } from '@/shared/api/endpoint';
import { endpoints, type EndpointName, type Endpoints } from '@/shared/api/endpoints';
import type { Session } from '@/shared/api/session-endpoints';

interface Parts {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
}

/** Whoever signs a company up, and with it the words for the sign-in screen. */
export interface Person {
  company: string;
  name: string;
  email: string;
  password: string;
}

async function callRow(origin: string, name: EndpointName, parts: Parts, token: string | null): Promise<unknown> {
  const { method, path, status } = endpoints[name];
  const filled = path.replaceAll(/:(\w+)/g, (_whole, key: string) => encodeURIComponent(String(parts.params?.[key] ?? '')));
  const query = new URLSearchParams(Object.entries(parts.query ?? {}).map(([key, value]) => [key, String(value)]));
  const answer = await fetch(`${origin}${filled}?${query}`, {
    method,
    headers: {
      origin,
      ...(parts.body === undefined ? {} : { 'content-type': 'application/json' }),
      ...(token === null ? {} : { authorization: `Bearer ${token}` }),
    },
    ...(parts.body === undefined ? {} : { body: JSON.stringify(parts.body) }),
  });
  if (answer.status !== status) throw new Error(`${name} answered ${answer.status}: ${await answer.text()}`);
  return answer.status === 204 ? undefined : answer.json();
}

/** One person's calls to a running product past its screens, for a browser spec to lay what it is not about. */
export class ProductApi {
  private constructor(
    readonly origin: string,
    readonly person: Person,
    private session: Session,
  ) {}

  /** Signs a company up; whoever does has all four roles. */
  static async signUp(origin: string, person: Person): Promise<ProductApi> {
    return new ProductApi(
      origin,
      person,
      endpoints.signUp.response.parse(await callRow(origin, 'signUp', { body: person }, null)),
    );
  }

  /** @throws Error with what the server said, for any status but the table's own */
  async call<Name extends EndpointName>(name: Name, given: GivenRequest<Endpoints[Name]>): Promise<ResponseOf<Endpoints[Name]>> {
    const answer = await callRow(this.origin, name, given as Parts, await this.token()); // the table's types are narrower
    return endpoints[name].response?.parse(answer) as ResponseOf<Endpoints[Name]>; // the row's own schema read it
  }

  /** Signs in anew before the last sign-in runs out. */
  private async token(): Promise<string> {
    if (Date.parse(this.session.expiresAt) - Date.now() < 60_000) {
      const { email, password } = this.person;
      const again = await callRow(this.origin, 'signIn', { body: { email, password } }, null);
      this.session = endpoints.signIn.response.parse(again);
    }
    return this.session.accessToken;
  }
}
