import type { EntityManager } from 'typeorm';
import type { ParsedRequest, ResponseOf } from '@/shared/api/endpoint';
import type { EndpointName, Endpoints } from '@/shared/api/endpoints';
import type { Role } from '@/shared/roles';
import type { RefreshCookie } from './refresh-cookie';

/** Whoever asks, in the company they signed in to, with the roles that they have there now. */
export interface Actor {
  personId: string;
  companyId: string;
  roles: readonly Role[];
}

/**
 * What a service works with: who asks, and one transaction that row-level security holds to the actor's company.
 * Time and ids come through it, so that a test or a demo can say what they are.
 */
export interface Tenant {
  actor: Actor;
  manager: EntityManager;
  now(): Date;
  newId(): string;
}

/** A parsed request of an endpoint that anybody may call. */
export interface PublicCall<Name extends EndpointName> {
  input: ParsedRequest<Endpoints[Name]>;
  cookie: RefreshCookie;
}

/** A parsed request of somebody signed in whose roles allow it. */
export interface TenantCall<Name extends EndpointName> {
  input: ParsedRequest<Endpoints[Name]>;
  tenant: Tenant;
}

export type Call<Name extends EndpointName> = Endpoints[Name]['access'] extends 'public' ? PublicCall<Name> : TenantCall<Name>;
export type Handler<Name extends EndpointName> = (call: Call<Name>) => Promise<ResponseOf<Endpoints[Name]>>;

/** One for each row of the table: a row without a handler does not compile. */
export type Handlers = { [Name in EndpointName]: Handler<Name> };
/** A feature's share of them. */
export type HandlersOf<Names extends EndpointName> = Pick<Handlers, Names>;
