import { randomUUID } from 'node:crypto';
import { errorBodySchema } from '@/shared/error-codes';
import { startTestApi, type Loose, type TestApi } from './support/test-api';
import { buildSite, FOOT, FOOTING, INCH, JOB, LASER, openRound, ROD, runsOf, type Site } from './support/site';
import type { EndpointName } from '@/shared/api/endpoints';

let api: TestApi;
let token: string;
let site: Site;

beforeAll(async () => {
  api = await startTestApi();
  token = (await api.signUp()).owner.token;
  site = await buildSite(api, token);
});
afterAll(() => api.stop());

const footingId = () => ({ footingId: site.footing.id });
const steps = (at: number) => runsOf([20, 90, [at, 1]], [20, 90], [20, 90], [20, 90]);

/** Refused by the shape of the request: endpoint, what is wrong, and the one path at which it is said. */
const MALFORMED: [EndpointName, string, () => Loose, string][] = [
  ['addJob', 'an unknown key', () => ({ body: { ...JOB, colour: 'pink' } }), 'colour'],
  [
    'addJob',
    'an unknown key within',
    () => ({ body: { ...JOB, rules: { top: { low: 0, high: 0, decision: 'simple', style: 'metric', x: 1 } } } }),
    'rules.top.x',
  ],
  ['addJob', 'a missing key', () => ({ body: { ...JOB, name: undefined } }), 'name'],
  ['addJob', 'a name of blanks', () => ({ body: { ...JOB, name: '   ' } }), 'name'],
  ['addJob', 'a number as text', () => ({ body: { ...JOB, graduation: '1587500' } }), 'graduation'],
  ['addJob', 'a list', () => ({ body: [] }), ''],
  ['addJob', 'no body', () => ({}), ''],
  [
    'addFooting',
    'a fraction of a nanometre',
    () => ({ params: { jobId: site.jobId }, body: { ...FOOTING, width: 0.5 } }),
    'width',
  ],
  ['addFooting', 'a width of zero', () => ({ params: { jobId: site.jobId }, body: { ...FOOTING, width: 0 } }), 'width'],
  [
    'addFooting',
    'a grade beyond the earth',
    () => ({ params: { jobId: site.jobId }, body: { ...FOOTING, planGrade: 1e300 } }),
    'planGrade',
  ],
  [
    'addBenchmark',
    'a benchmark without elevation',
    () => ({ params: { jobId: site.jobId }, body: { name: 'BM 9', note: '' } }),
    'elevation',
  ],
  ['setOutline', 'a run of zero', () => ({ params: footingId(), body: { runs: runsOf([0, 90]), version: 1 } }), 'runs.0.length'],
  [
    'setOutline',
    'a run of a mile',
    () => ({ params: footingId(), body: { runs: runsOf([5280, 90]), version: 1 } }),
    'runs.0.length',
  ],
  ['setOutline', 'no runs', () => ({ params: footingId(), body: { runs: [], version: 1 } }), 'runs'],
  ['setStations', 'a spacing under a foot', () => ({ params: footingId(), body: { spacing: INCH } }), 'spacing'],
  ['changeRoles', 'a role that is none', () => ({ params: { personId: randomUUID() }, body: { roles: ['king'] } }), 'roles.0'],
  [
    'sendRecords',
    'a time that is none',
    () => ({ params: { roundId: randomUUID() }, body: { sentAt: 'noon', records: [{ id: randomUUID() }] } }),
    'sentAt',
  ],
  [
    'sendRecords',
    'a record without an id',
    () => ({ params: { roundId: randomUUID() }, body: { sentAt: '2026-11-30T12:00:00Z', records: [{}] } }),
    'records.0',
  ],
  ['job', 'an id that is none', () => ({ params: { jobId: "1' or '1'='1" } }), 'jobId'],
  ['records', 'a place that is no number', () => ({ params: { roundId: randomUUID() }, query: { after: 'x' } }), 'after'],
  ['records', 'a question that is not asked here', () => ({ params: { roundId: randomUUID() }, query: { order: '1' } }), 'order'],
];

/** Well formed, and cannot be. */
const IMPOSSIBLE: [EndpointName, string, () => Loose, string, string][] = [
  [
    'addJob',
    'a mark of another unit',
    () => ({ body: { ...JOB, unitStyle: 'metric' } }),
    'graduation',
    'graduation-not-of-style',
  ],
  [
    'changeJob',
    'another unit with the marks of the old',
    () => ({ params: { jobId: site.jobId }, body: { unitStyle: 'metric' } }),
    'graduation',
    'graduation-not-of-style',
  ],
  ['addRod', 'a mark of another unit', () => ({ body: { ...ROD, style: 'metric' } }), 'graduation', 'graduation-not-of-style'],
  [
    'setBedRule',
    'a thickest bed under the thinnest',
    () => ({
      params: { jobId: site.jobId },
      body: {
        material: 'mortar',
        least: 20,
        most: 10,
        nominal: 15,
        grindMost: 0,
        beddedFraction: 1,
        courseHeight: null,
        style: 'metric',
      },
    }),
    'most',
    'bed-most-under-least',
  ],
  [
    'setOutline',
    'an outline that crosses itself',
    () => ({
      params: footingId(),
      body: { runs: runsOf([30, 90], [20, 90], [10, 90], [30, -90], [20, -90], [10, -90]), version: 1 },
    }),
    'runs',
    'outline-crosses-itself',
  ],
  [
    'setOutline',
    'a step beyond its run',
    () => ({ params: footingId(), body: { runs: steps(21), version: 1 } }),
    'runs.0.steps.0.at',
    'step-outside-run',
  ],
  [
    'setOutline',
    'two runs of one id',
    () => ({
      params: footingId(),
      body: { runs: runsOf([20, 90], [20, 90]).map((run) => ({ ...run, id: site.jobId })), version: 1 },
    }),
    'runs.1.id',
    'id-taken',
  ],
  [
    'setOutline',
    'steps that leave the range of grades',
    () => ({ params: footingId(), body: { runs: runsOf([20, 0, [5, 32_000], [6, 32_000]]), version: 1 } }),
    'runs',
    'grade-out-of-range',
  ],
  [
    'setOutline',
    'an outline longer than a plan reaches',
    () => ({ params: footingId(), body: { runs: runsOf([3000, 0], [3000, 0]), version: 1 } }),
    'runs',
    'outline-too-large',
  ],
  ['addStation', 'a place off the walk', () => ({ params: footingId(), body: { at: 81 * FOOT } }), 'at', 'off-the-walk'],
  ['addStation', 'a place where one stands', () => ({ params: footingId(), body: { at: 10 * FOOT } }), 'at', 'station-there'],
  [
    'removeStation',
    'a corner',
    () => ({ params: { stationId: site.footing.stations[0]?.id ?? '' } }),
    'stationId',
    'station-of-outline',
  ],
  ['openRound', 'the id of another round', () => ({ params: footingId(), body: { id: '', surface: 'dig' } }), 'id', 'id-taken'],
];

describe('a request of the wrong shape', () => {
  it.each(MALFORMED)('%s: %s', async (name, _what, given, path) => {
    const response = await api.send(name, token, given());
    expect(response.status).toBe(400);
    const { error } = errorBodySchema.parse(response.body);
    expect(error.code).toMatch(/^(body|params|query)-invalid$/);
    expect(Object.keys(error.fields ?? {})).toEqual([path]);
  });
});

describe('a request that cannot be', () => {
  it.each(IMPOSSIBLE)('%s: %s', async (name, what, make, path, code) => {
    const given = make();
    if (what === 'the id of another round') {
      const { round } = await openRound(api, token, site.footing.id, 'top');
      given.body = { id: round.id, surface: 'dig' };
    }
    const response = await api.send(name, token, given);
    expect({ status: response.status, text: response.text }).toMatchObject({ status: 422 });
    const { error } = errorBodySchema.parse(response.body);
    expect(Object.entries(error.fields ?? {}).map(([at, field]) => [at, field.code])).toEqual([[path, code]]);
  });

  it('a name that is taken says so at the name', async () => {
    const name = `Laser ${randomUUID()}`;
    await api.ok('addLaser', token, { body: { ...LASER, name } });
    const response = await api.send('addLaser', token, { body: { ...LASER, name } });
    expect([response.status, response.body.error.code, Object.keys(response.body.error.fields)]).toEqual([
      409,
      'name-taken',
      ['name'],
    ]);
  });

  it('a text with a character that no text may have', async () => {
    const response = await api.send('addJob', token, { body: { ...JOB, name: 'a\u0000b' } });
    expect([response.status, response.body.error.code]).toEqual([400, 'body-invalid']);
  });
});

describe('a body that is no JSON, or too much of it', () => {
  const post = () => api.http().post('/api/jobs').set('Authorization', `Bearer ${token}`);

  it.each([
    ['broken JSON', '{"name":', 'application/json', 400, 'body-malformed'],
    ['JSON that is no object', '"text"', 'application/json', 400, 'body-malformed'],
    ['nothing but a type', '', 'application/json', 400, 'body-invalid'],
    ['a form', 'name=x', 'application/x-www-form-urlencoded', 415, 'body-not-json'],
    ['plain text', '{}', 'text/plain', 415, 'body-not-json'],
    ['a charset nobody has', '{}', 'application/json; charset=klingon', 415, 'body-not-json'],
    ['10 MB', JSON.stringify({ name: 'x'.repeat(10_000_000) }), 'application/json', 413, 'body-too-large'],
  ])('%s is refused in the one shape', async (_what, body, type, status, code) => {
    const response = await post().set('Content-Type', type).send(body);
    expect([response.status, errorBodySchema.parse(response.body).error.code]).toEqual([status, code]);
  });

  it('is refused under an encoding that is not known', async () => {
    const response = await post().set('Content-Type', 'application/json').set('Content-Encoding', 'tar').send('{}');
    expect([response.status, errorBodySchema.parse(response.body).error.code]).toEqual([415, 'body-not-json']);
  });
});

describe('an address', () => {
  it.each([
    ['of the API that is none', 'get', '/api/nothing', 404, 'not-found'],
    ['of another method', 'delete', '/api/jobs', 405, 'method-not-allowed'],
    ['that cannot be decoded', 'get', '/api/jobs/%E0%A4%A', 400, 'params-invalid'],
    ['outside the API, where no app is served', 'get', '/jobs', 404, 'not-found'],
  ] as const)('%s is refused in the one shape', async (_what, method, path, status, code) => {
    const response = await api.http()[method](path);
    expect([response.status, errorBodySchema.parse(response.body).error.code]).toEqual([status, code]);
  });

  it('of another method says which it has', async () => {
    expect((await api.http().delete('/api/jobs')).headers.allow).toBe('GET, POST');
  });
});
