import type { z } from 'zod';
import type { Action } from '../roles';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** Who may call: anybody; whoever is signed in to a company; or somebody whose roles allow the action. */
export type Access = 'public' | 'signed-in' | { may: Action };

/**
 * One row of the endpoint table: the server registers from it, the client calls by it, openapi.json is made from it.
 * `params`, `query` and `body` are strict; `response` is what a 2xx carries, null for 204.
 */
export interface Endpoint {
  method: Method;
  /** Express style: `/api/jobs/:jobId`. */
  path: `/api/${string}`;
  summary: string;
  access: Access;
  status: 200 | 201 | 204;
  params: z.ZodType | null;
  query: z.ZodType | null;
  body: z.ZodType | null;
  response: z.ZodType | null;
}

/** Keeps each schema's own type while it checks the row. */
export function endpoint<const E extends Endpoint>(row: E): E {
  return row;
}

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;
type Given<S> = S extends z.ZodType ? z.input<S> : undefined;

/** What the server's handler is given, after parsing. */
export interface ParsedRequest<E extends Endpoint> {
  params: Parsed<E['params']>;
  query: Parsed<E['query']>;
  body: Parsed<E['body']>;
}
/** What the client gives; absent parts are left out. */
export type GivenRequest<E extends Endpoint> = (E['params'] extends z.ZodType ? { params: Given<E['params']> } : unknown) &
  (E['query'] extends z.ZodType ? { query: Given<E['query']> } : unknown) &
  (E['body'] extends z.ZodType ? { body: Given<E['body']> } : unknown);
export type ResponseOf<E extends Endpoint> = E['response'] extends z.ZodType ? z.output<E['response']> : undefined;
