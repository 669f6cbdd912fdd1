import { z } from 'zod';
import { endpoints } from '@/shared/api/endpoints';
import { startTestApi, type TestApi } from './support/test-api';

let api: TestApi;
beforeAll(async () => {
  api = await startTestApi();
});
afterAll(() => api.stop());

/** What OpenAPI 3.1.0 asks of a document of this kind (spec.openapis.org/oas/v3.1.0, sections 4.8.1 to 4.8.19). */
const media = z.strictObject({ 'application/json': z.strictObject({ schema: z.record(z.string(), z.unknown()) }) });
const operationSchema = z.strictObject({
  operationId: z.string(),
  summary: z.string(),
  description: z.string().optional(),
  security: z.array(z.record(z.string(), z.array(z.string()))),
  parameters: z.array(
    z.strictObject({
      name: z.string(),
      in: z.enum(['path', 'query']),
      required: z.boolean(),
      schema: z.record(z.string(), z.unknown()),
    }),
  ),
  requestBody: z.strictObject({ required: z.literal(true), content: media }).optional(),
  responses: z.record(
    z.string().regex(/^[1-5]\d\d$/),
    z.strictObject({ description: z.string().min(1), content: media.optional() }),
  ),
});
const documentSchema = z.strictObject({
  openapi: z.string().regex(/^3\.1\.\d+$/),
  info: z.strictObject({ title: z.string(), version: z.string(), description: z.string() }),
  servers: z.array(z.strictObject({ url: z.url() })),
  paths: z.record(
    z.string().regex(/^\/api\//),
    z.partialRecord(z.enum(['get', 'post', 'put', 'patch', 'delete']), operationSchema),
  ),
  components: z.strictObject({
    securitySchemes: z.record(
      z.string(),
      z.strictObject({ type: z.literal('http'), scheme: z.literal('bearer'), bearerFormat: z.literal('JWT') }),
    ),
    schemas: z.record(z.string(), z.record(z.string(), z.unknown())),
  }),
});

async function read() {
  return documentSchema.parse((await api.send('openapi', null, {}).expect(200)).body);
}

describe('the OpenAPI document', () => {
  it('has every row of the table, under its own name, method and status, and nothing else', async () => {
    const { paths } = await read();
    const found = Object.entries(paths).flatMap(([path, operations]) =>
      Object.entries(operations).map(([method, operation]) => [
        operation.operationId,
        method,
        path,
        Object.keys(operation.responses)[0],
      ]),
    );
    const rows = Object.entries(endpoints).map(([name, row]) => [
      name,
      row.method.toLowerCase(),
      row.path.replaceAll(/:(\w+)/g, '{$1}'),
      String(row.status),
    ]);
    expect(found.sort()).toEqual(rows.sort());
  });

  it('declares every parameter that its path has, as one that must be there', async () => {
    for (const [path, operations] of Object.entries((await read()).paths)) {
      const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name).sort();
      for (const operation of Object.values(operations)) {
        const declared = operation.parameters.filter((parameter) => parameter.in === 'path');
        expect(declared.map(({ name }) => name).sort()).toEqual(inPath);
        expect(declared.every(({ required }) => required)).toBe(true);
      }
    }
  });

  it('has in its references nothing that is not in it', async () => {
    const document = await read();
    const text = JSON.stringify(document);
    const references = [...text.matchAll(/"\$ref":"([^"]+)"/g)].map(([, reference]) => reference);
    expect(new Set(references)).toEqual(new Set(['#/components/schemas/Error']));
    expect(document.components.schemas.Error).toBeDefined();
  });

  it('says which role an endpoint needs, and which needs none', async () => {
    const { paths } = await read();
    expect(paths['/api/jobs']?.post?.description).toContain('job.write');
    expect(paths['/api/jobs']?.get?.security).toEqual([{ signedIn: [] }]);
    expect(paths['/api/health']?.get?.security).toEqual([]);
  });

  it('asks for lengths as whole numbers, and lets no unknown key through', async () => {
    const { paths } = await read();
    const schema = paths['/api/jobs']?.post?.requestBody?.content['application/json'].schema;
    expect(schema).toMatchObject({
      type: 'object',
      additionalProperties: false,
      properties: { graduation: { type: 'integer' } },
    });
  });
});
