import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { randomBytes } from 'node:crypto';
import 'reflect-metadata';
import { pino } from 'pino';
import request from 'supertest';
import type { DataSource } from 'typeorm';
import type { GivenRequest, ResponseOf } from '@/shared/api/endpoint';
import { endpoints, type EndpointName, type Endpoints } from '@/shared/api/endpoints';
import type { Session } from '@/shared/api/session-endpoints';
import type { Role } from '@/shared/roles';
import { issueAccessToken, readAccessToken } from '@/server/api/access-token';
import { createApp } from '@/server/app';
import { createDataSource } from '@/server/data-source';
import { Database } from '@/server/database/database';
import { newId, type Dependencies, type Sources } from '@/server/dependencies';
import { Membership } from '@/server/entities/people';
import { addPerson, SALT_BYTES } from '@/server/features/session/session-service';
import { hashPassphrase } from '@/server/features/session/passphrase';
import { freshDatabase, type FreshDatabase } from '../../support/fresh-database';

export const PASSPHRASE = 'nine lamps over a wet quay';
export const APP_URL = 'http://localhost:4870';

/** A server in this process, on a database of its own, whose clock the test moves. */
export interface TestApi {
  database: FreshDatabase;
  source: DataSource;
  dependencies: Dependencies;
  clock: TestClock;
  /** Sends a request of the endpoint table and answers as it came. */
  send<Name extends EndpointName>(name: Name, token: string | null, given: Loose): request.Test;
  /** As `send`, for one that must succeed: the parsed answer. */
  ok<Name extends EndpointName>(
    name: Name,
    token: string | null,
    given: GivenRequest<Endpoints[Name]>,
  ): Promise<ResponseOf<Endpoints[Name]>>;
  /** For what no row of the table says. */
  http(): ReturnType<typeof request>;
  /** Signs a company up; whoever does has all four roles. */
  signUp(company?: string): Promise<TestCompany>;
  stop(): Promise<void>;
}

export interface TestClock extends Sources {
  set(time: string): void;
  pass(ms: number): void;
}

/** Parts of a request that the table's types need not agree with. */
export interface Loose {
  params?: Record<string, string>;
  query?: Record<string, unknown>;
  body?: unknown;
}

export interface TestCompany {
  id: string;
  owner: TestPerson;
  /** Somebody more of the company, with these roles. */
  hire(...roles: Role[]): Promise<TestPerson>;
}

export interface TestPerson {
  id: string;
  email: string;
  /** Good at the time of the test's clock: a phone would have refreshed it. */
  readonly token: string;
}

function testClock(): TestClock {
  // Ahead of every real clock: express-rate-limit compares when a count starts anew with the real one.
  let now = Date.parse('2101-03-04T12:00:00.000Z');
  return {
    now: () => new Date(now),
    randomBytes: (count) => randomBytes(count),
    set: (time) => {
      now = Date.parse(time);
    },
    pass: (ms) => {
      now += ms;
    },
  };
}

export interface TestApiOptions {
  /** Reached instead of the database itself. */
  through?: (url: string) => Promise<string>;
  webDir?: string;
  poolSize?: number;
}

export async function startTestApi({ through, webDir, poolSize = 10 }: TestApiOptions = {}): Promise<TestApi> {
  const database = await freshDatabase();
  const logger = pino({ level: 'silent' });
  const url = through === undefined ? database.url : await through(database.url);
  const source = await createDataSource({ url, logger, poolSize }).initialize();
  const clock = testClock();
  const config = {
    appUrl: new URL(APP_URL),
    jwtSecret: 'a secret of tests, thirty-two or more',
    webDir: webDir ?? null,
    trustProxy: null,
  };
  const dependencies: Dependencies = { config, database: new Database(source, logger), sources: clock, logger };
  const server = await listen(dependencies);
  const { port } = server.address() as AddressInfo; // listening on TCP
  const http = () => request(`http://127.0.0.1:${port}`);
  const send = (name: EndpointName, token: string | null, given: Loose) => sendRequest(http(), name, token, given);
  const ok: TestApi['ok'] = async (name, token, given) => {
    const response = await send(name, token, given as Loose); // the table's types are narrower
    if (response.status !== endpoints[name].status) throw new Error(`${name} answered ${response.status}: ${response.text}`);
    return (endpoints[name].response === null ? undefined : endpoints[name].response.parse(response.body)) as never; // the row's own schema read it
  };
  const api: TestApi = {
    database,
    source,
    dependencies,
    clock,
    send,
    ok,
    http,
    signUp: (company = 'Fallow Creek Footings') => signUpCompany(api, company),
    stop: async () => {
      await new Promise((resolve) => server.close(resolve));
      await source.destroy();
      await database.drop();
    },
  };
  return api;
}

function listen(dependencies: Dependencies): Promise<Server> {
  return new Promise((resolve) => {
    const server = createApp(dependencies).listen(0, '127.0.0.1', () => resolve(server));
  });
}

function sendRequest(http: ReturnType<typeof request>, name: EndpointName, token: string | null, given: Loose): request.Test {
  const { method, path } = endpoints[name];
  const filled = path.replaceAll(/:(\w+)/g, (_whole, key: string) => encodeURIComponent(given.params?.[key] ?? 'absent'));
  const verb = { GET: http.get, POST: http.post, PUT: http.put, PATCH: http.patch, DELETE: http.delete }[method];
  const test = verb.call(http, filled);
  if (token !== null) test.set('Authorization', `Bearer ${token}`);
  if (given.query !== undefined) test.query(given.query);
  return given.body === undefined ? test : test.send(given.body as object); // supertest takes any JSON
}

let people = 0;

async function signUpCompany(api: TestApi, company: string): Promise<TestCompany> {
  people += 1;
  const email = `owner${people}@example.test`;
  const session = await api.ok('signUp', null, { body: { company, name: `Owner ${people}`, email, password: PASSPHRASE } });
  const id = session.me.company.id;
  const owner = signedIn(api, session);
  return { id, owner, hire: (...roles) => hire(api, id, roles) };
}

async function hire(api: TestApi, companyId: string, roles: Role[]): Promise<TestPerson> {
  people += 1;
  const { sources, database } = api.dependencies;
  const id = newId(sources);
  const email = `person${people}@example.test`;
  const hash = await hashPassphrase(PASSPHRASE, sources.randomBytes(SALT_BYTES));
  await database.asIdentity(async (manager) => {
    await addPerson(manager, { sources }, { id, name: `Person ${people}`, email, hash });
    await manager.insert(Membership, { companyId, personId: id, roles, createdAt: sources.now() });
  });
  return signedIn(api, await api.ok('signIn', null, { body: { email, password: PASSPHRASE } }));
}

function signedIn({ dependencies, clock }: TestApi, { me, accessToken }: Session): TestPerson {
  const { jwtSecret } = dependencies.config;
  const claims = readAccessToken(`Bearer ${accessToken}`, jwtSecret, clock.now());
  return {
    id: me.person.id,
    email: me.person.email,
    get token() {
      return issueAccessToken(claims, jwtSecret, clock.now()).accessToken;
    },
  };
}
