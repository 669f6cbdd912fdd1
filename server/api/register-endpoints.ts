import type { Express, Request, RequestHandler, Response } from 'express';
import type { Endpoint, Method } from '@/shared/api/endpoint';
import { endpoints, type EndpointName } from '@/shared/api/endpoints';
import { may, type Action } from '@/shared/roles';
import { Membership } from '../entities/people';
import { newId, type Dependencies } from '../dependencies';
import { ApiError } from '../errors';
import { readAccessToken } from './access-token';
import type { Actor, Handlers, Tenant } from './handler';
import { parseRequest, type ParsedParts } from './parse-request';
import { refreshCookieOf } from './refresh-cookie';

/** A handler once its row's types are behind it. */
type AnyHandler = (call: object) => Promise<unknown>;

/** Rows that need more before they are handled, such as a limit on tries. */
export type Guards = Partial<Record<EndpointName, RequestHandler[]>>;

/** Registers every row of the endpoint table, and answers the other methods of its paths. */
export function registerEndpoints(app: Express, handlers: Handlers, guards: Guards, dependencies: Dependencies): void {
  const methodsOf = new Map<string, Method[]>();
  for (const name of endpointNames()) {
    const row: Endpoint = endpoints[name];
    // A row and its handler have the same name; what they agree on cannot be said of all rows at once.
    const handler = handlers[name] as AnyHandler;
    const work = row.access === 'public' ? publicHandler(row, handler) : tenantHandler(row, handler, dependencies);
    register(app, row, [...(guards[name] ?? []), work]);
    methodsOf.set(row.path, [...(methodsOf.get(row.path) ?? []), row.method]);
  }
  for (const [path, methods] of methodsOf) {
    app.all(path, (request, response) => {
      response.set('Allow', methods.join(', '));
      throw new ApiError('method-not-allowed', `${request.method} is not for this address.`);
    });
  }
}

export function endpointNames(): EndpointName[] {
  return Object.keys(endpoints) as EndpointName[]; // Object.keys forgets the key type
}

function register(app: Express, row: Endpoint, work: RequestHandler[]): void {
  switch (row.method) {
    case 'GET':
      return void app.get(row.path, ...work);
    case 'POST':
      return void app.post(row.path, ...work);
    case 'PUT':
      return void app.put(row.path, ...work);
    case 'PATCH':
      return void app.patch(row.path, ...work);
    case 'DELETE':
      return void app.delete(row.path, ...work);
  }
}

function publicHandler(row: Endpoint, handler: AnyHandler): RequestHandler {
  return async (request, response) => {
    const input = parseRequest(row, request);
    answer(row, response, await handler({ input, cookie: refreshCookieOf(request, response) }));
  };
}

/** Signed in → understood → allowed → done, all but the first two in one transaction; answered once that is committed. */
function tenantHandler(row: Endpoint, handler: AnyHandler, dependencies: Dependencies): RequestHandler {
  const { config, database, sources } = dependencies;
  return async (request: Request, response: Response) => {
    const claims = readAccessToken(request.headers.authorization, config.jwtSecret, sources.now());
    const input: ParsedParts = parseRequest(row, request);
    const result = await database.asCompany(claims.companyId, async (manager) => {
      const membership = await manager.findOneBy(Membership, { companyId: claims.companyId, personId: claims.personId });
      if (membership === null || membership.roles.length === 0)
        throw new ApiError('signed-out', 'This person is not in this company.');
      const actor: Actor = { personId: claims.personId, companyId: claims.companyId, roles: membership.roles };
      if (typeof row.access === 'object') requireRole(actor, row.access.may);
      const tenant: Tenant = { actor, manager, now: () => sources.now(), newId: () => newId(sources) };
      return handler({ input, tenant });
    });
    answer(row, response, result);
  };
}

/** @throws ApiError 'role-refused' */
function requireRole(actor: Actor, action: Action): void {
  if (!may(actor.roles, action))
    throw new ApiError('role-refused', `Nobody in the role of ${actor.roles.join(', ')} may do this.`);
}

/** What goes out is parsed as well: a column too many is a fault of ours, and stays here. */
function answer(row: Endpoint, response: Response, result: unknown): void {
  response.status(row.status).set('Cache-Control', 'no-store');
  if (row.response === null) response.end();
  else response.json(row.response.parse(result));
}
