import { z } from 'zod';
import type { Endpoint } from '@/shared/api/endpoint';
import { ERROR_STATUS, errorBodySchema } from '@/shared/error-codes';

type Json = Record<string, unknown>;

/** Bodies as they are written (before defaults and coercion) and answers as they are read. */
function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...json } = z.toJSONSchema(schema, { io, target: 'draft-2020-12', unrepresentable: 'any' });
  return json;
}

/** The endpoint table as an OpenAPI 3.1 document, whose schemas are JSON Schema 2020-12 as they stand. */
export function openApiDocument(table: Readonly<Record<string, Endpoint>>, serverUrl: string): Json & { openapi: string } {
  const paths: Record<string, Json> = {};
  for (const [name, row] of Object.entries(table)) {
    const path = row.path.replaceAll(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [row.method.toLowerCase()]: operation(name, row) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Tallyrod',
      version: '1',
      description: 'Lengths are whole nanometres. Errors have one shape; programs read their code.',
    },
    servers: [{ url: serverUrl }],
    paths,
    components: {
      securitySchemes: { signedIn: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
      schemas: { Error: schemaOf(errorBodySchema, 'output') },
    },
  };
}

function operation(name: string, row: Endpoint): Json {
  const role = typeof row.access === 'object' ? ` Needs a role that may ${row.access.may}.` : '';
  return {
    operationId: name,
    summary: row.summary,
    ...(role === '' ? {} : { description: role.trim() }),
    security: row.access === 'public' ? [] : [{ signedIn: [] }],
    parameters: [...parametersOf(row.params, 'path'), ...parametersOf(row.query, 'query')],
    ...(row.body === null ? {} : { requestBody: { required: true, content: jsonContent(schemaOf(row.body, 'input')) } }),
    responses: { [row.status]: success(row), ...refusals(row) },
  };
}

function jsonContent(schema: Json): Json {
  return { 'application/json': { schema } };
}

function success(row: Endpoint): Json {
  return row.response === null
    ? { description: 'Done; nothing to say.' }
    : { description: 'Done.', content: jsonContent(schemaOf(row.response, 'output')) };
}

function refusals(row: Endpoint): Json {
  const statuses = new Set<number>(Object.values(ERROR_STATUS));
  if (row.access === 'public') statuses.delete(403);
  const answer = { description: 'Refused.', content: jsonContent({ $ref: '#/components/schemas/Error' }) };
  return Object.fromEntries([...statuses].sort((a, b) => a - b).map((status) => [String(status), answer]));
}

const objectSchema = z.looseObject({ properties: z.record(z.string(), z.unknown()), required: z.array(z.string()).default([]) });

function parametersOf(schema: z.ZodType | null, place: 'path' | 'query'): Json[] {
  if (schema === null) return [];
  const { properties, required } = objectSchema.parse(schemaOf(schema, 'input'));
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}
