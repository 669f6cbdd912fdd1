import { z } from 'zod';
import { endpoint } from './endpoint';
import { footingEndpoints } from './footing-endpoints';
import { instrumentEndpoints } from './instrument-endpoints';
import { jobEndpoints } from './job-endpoints';
import { roundEndpoints } from './round-endpoints';
import { sessionEndpoints } from './session-endpoints';

const serviceEndpoints = {
  health: endpoint({
    method: 'GET',
    path: '/api/health',
    summary: 'Whether the server runs and its database answers; 503 when that is away.',
    access: 'public',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: z.strictObject({ ok: z.literal(true), database: z.literal('answers') }),
  }),
  openapi: endpoint({
    method: 'GET',
    path: '/api/openapi.json',
    summary: 'This table, as an OpenAPI 3.1 document.',
    access: 'public',
    status: 200,
    params: null,
    query: null,
    body: null,
    response: z.looseObject({ openapi: z.string() }),
  }),
};

/** The one table of endpoints: the server registers it, the client calls by it, openapi.json and the access tests walk it. */
export const endpoints = {
  ...serviceEndpoints,
  ...sessionEndpoints,
  ...jobEndpoints,
  ...footingEndpoints,
  ...instrumentEndpoints,
  ...roundEndpoints,
};

export type Endpoints = typeof endpoints;
export type EndpointName = keyof Endpoints;
