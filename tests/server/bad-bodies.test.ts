import { randomUUID } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import type { Endpoint } from '@/shared/api/endpoint';
import { endpoints, type EndpointName } from '@/shared/api/endpoints';
import { ERROR_STATUS, errorBodySchema } from '@/shared/error-codes';
import { recordAnswerSchema, recordSchema } from '@/shared/records';
import { readyBedRule, readyToleranceRules } from '@/shared/rules';
import { ROLES } from '@/shared/roles';
import { everyObject, everyPlace, partAt, withPartAt, wrongFor, type Path } from './support/change-json';
import { sendBytes, type Answer } from './support/send-bytes';
import { PASSPHRASE, startTestApi, type TestApi, type TestCompany } from './support/test-api';
import { buildSite, FOOT, FOOTING, JOB, LASER, openRound, ROD, square, TestPhone, type Site } from './support/site';

/**
 * What people, other programs and broken phones may send to any row of the table: each is refused by a status of 4xx in the one error
 * shape, and none is ever a fault of the server.
 */
let api: TestApi;
let company: TestCompany;
let site: Site;
let roundId: string;
let baseUrl: string;

beforeAll(async () => {
  api = await startTestApi();
  baseUrl = api.http().get('/').url;
  company = await api.signUp('Bad weather');
  site = await buildSite(api, company.owner.token);
  roundId = (await openRound(api, company.owner.token, site.footing.id, 'top')).round.id;
});
afterAll(() => api.stop());

type WithBody = { [Name in EndpointName]: (typeof endpoints)[Name]['body'] extends null ? never : Name }[EndpointName];

/** A body that each row takes, for the tests to spoil: a row without one does not compile. */
const BODIES: Record<WithBody, () => object> = {
  signUp: () => ({ company: 'New', name: 'Lee Moss', email: `${randomUUID()}@example.test`, password: PASSPHRASE }),
  signIn: () => ({ email: company.owner.email, password: PASSPHRASE }),
  refresh: () => ({}),
  signOut: () => ({}),
  changeRoles: () => ({ roles: [...ROLES] }),
  addJob: () => ({
    ...JOB,
    rules: { top: readyToleranceRules('feet-inches').top },
    bedRule: readyBedRule('block', 'feet-inches'),
  }),
  changeJob: () => ({ ...JOB }),
  setToleranceRule: () => readyToleranceRules('feet-inches').top,
  setBedRule: () => readyBedRule('block', 'feet-inches'),
  addBenchmark: () => ({ name: randomUUID(), elevation: 100 * FOOT, note: 'Hydrant' }),
  changeBenchmark: () => ({ name: 'BM 1', elevation: 100 * FOOT, note: 'Bolt', version: 1 }),
  addFooting: () => ({ ...FOOTING, name: randomUUID(), landmark: { name: 'Mill St', azimuth: 90 } }),
  changeFooting: () => ({ ...FOOTING, landmark: { name: 'Mill St', azimuth: 90 } }),
  setOutline: () => ({
    runs: square().map((run) => ({ ...run, width: FOOT, thickness: FOOT, steps: [{ id: randomUUID(), at: FOOT, by: FOOT }] })),
    version: 1,
  }),
  setStations: () => ({ spacing: 5 * FOOT }),
  addStation: () => ({ at: 3 * FOOT }),
  changeStation: () => ({ name: 'By the door', at: 4 * FOOT }),
  addLaser: () => ({ ...LASER, name: randomUUID() }),
  changeLaser: () => ({ ...LASER }),
  addRod: () => ({ ...ROD, name: randomUUID() }),
  changeRod: () => ({ ...ROD }),
  openRound: () => ({ id: randomUUID(), surface: 'rails' }),
  changeRound: () => ({ closed: false }),
  sendRecords: () => {
    const phone = new TestPhone(site, api);
    const begun = phone.begin();
    const shot = phone.shot(0);
    return phone.body(...begun, shot, phone.strike(shot.id));
  },
};

const allNames = Object.keys(endpoints) as EndpointName[]; // Object.keys forgets the key type
const withBody = Object.keys(BODIES) as WithBody[];
const withParams = allNames.filter((name) => endpoints[name].params !== null);
const withQuery = allNames.filter((name) => endpoints[name].query !== null);

/** Ids that are there, by the name that paths give them. */
function paramsOf(name: EndpointName): Record<string, string> {
  const known: Record<string, string> = {
    jobId: site.jobId,
    footingId: site.footing.id,
    stationId: site.footing.stations.find(({ corner }) => corner === null)?.id ?? '',
    benchmarkId: site.benchmarkId,
    laserId: site.laserId,
    rodId: site.rodId,
    roundId,
    personId: company.owner.id,
    surface: 'top',
  };
  return Object.fromEntries([...endpoints[name].path.matchAll(/:(\w+)/g)].map(([, key = '']) => [key, known[key] ?? '']));
}

/** A row's address with these parts, or with what is there. */
const pathOf = (name: EndpointName, params = paramsOf(name)) =>
  endpoints[name].path.replaceAll(/:(\w+)/g, (_whole, key: string) => encodeURIComponent(params[key] ?? ''));

/** Sends to a row as its company's owner: JSON letter for letter, or bytes. */
function send(name: EndpointName, body: string | Buffer | undefined, headers: Record<string, string> = {}, path = pathOf(name)) {
  // Tries are counted by the hour: the next one is always the first.
  api.clock.pass(61 * 60_000);
  const json: Record<string, string> = body === undefined ? {} : { 'Content-Type': 'application/json' };
  const signedIn = { Authorization: `Bearer ${company.owner.token}` };
  return sendBytes(baseUrl, { method: endpoints[name].method, path, headers: { ...signedIn, ...json, ...headers }, body });
}
const sendJson = (name: EndpointName, body: unknown) => send(name, JSON.stringify(body));

/** Refused in the one shape with the status of its code; what it says. */
function refusalIn({ status, body, text }: Answer) {
  const read = errorBodySchema.safeParse(body);
  if (!read.success) return `${status} in another shape: ${text.slice(0, 200)}`;
  const { code, fields } = read.data.error;
  return { status, code, agrees: ERROR_STATUS[code] === status, fields: Object.keys(fields ?? {}) };
}
const refused = (code: keyof typeof ERROR_STATUS) => ({ status: ERROR_STATUS[code], code, agrees: true });

/** The paths that a refusal names. */
function fieldsOf({ body }: Answer): string[] {
  const read = errorBodySchema.safeParse(body);
  return read.success ? Object.keys(read.data.error.fields ?? {}) : [];
}

/** One names a part of the other, or the same. */
const isOnPath = (field: string, path: string): boolean =>
  `${path}.`.startsWith(`${field}.`) || `${field}.`.startsWith(`${path}.`);

/** Every status below 500, and in the shape wherever it is a refusal. */
function isAnswered(answer: Answer): boolean {
  if (answer.status >= 500) return false;
  return answer.status < 400 || errorBodySchema.safeParse(answer.body).success;
}

const LARGE = Buffer.from(JSON.stringify({ name: 'x'.repeat(10_000_000) }));
/** A ten-thousandth of it on the way. */
const PACKED = gzipSync(LARGE);

describe.each(allNames)('%s', (name) => {
  it.each([
    ['half of an object', '{"name": '],
    ['two objects', '{} {}'],
    ['a trailing comma', '{"name":"a",}'],
    ['text that is no JSON', 'name=a&elevation=2'],
    ['a bare word', 'null'],
    ['a bare number', '12'],
    ['bytes that are no text', Buffer.from([0x7b, 0xff, 0xfe, 0x00, 0x7d])],
  ])('refuses %s', async (_what, text) => {
    expect(refusalIn(await send(name, text))).toMatchObject(refused('body-malformed'));
  });

  it('refuses 10 MB, sent at once, in pieces, or packed small', async () => {
    expect(refusalIn(await send(name, LARGE))).toMatchObject(refused('body-too-large'));
    expect(refusalIn(await send(name, LARGE, { 'Transfer-Encoding': 'chunked' }))).toMatchObject(refused('body-too-large'));
    expect(refusalIn(await send(name, PACKED, { 'Content-Encoding': 'gzip' }))).toMatchObject(refused('body-too-large'));
  });

  it.each([
    ['a form', { 'Content-Type': 'application/x-www-form-urlencoded' }],
    ['plain text', { 'Content-Type': 'text/plain' }],
    ['an alphabet that nobody keys in', { 'Content-Type': 'application/json; charset=latin9' }],
    ['a packing that nobody knows', { 'Content-Encoding': 'mystery' }],
  ])('refuses %s', async (_what, headers) => {
    expect(refusalIn(await send(name, '{"name":"a"}', headers))).toMatchObject(refused('body-not-json'));
  });
});

it('there is a body to spoil for every row that takes one', () => {
  const taking = Object.entries(endpoints).flatMap(([name, row]) => (row.body === null ? [] : [name]));
  expect([...withBody].sort()).toEqual(taking.sort());
});

describe.each(withBody)('the body of %s', (name) => {
  const schema = (endpoints[name] as Endpoint).body;

  it('reads as it is, before anything is spoiled', () => {
    expect(schema?.safeParse(BODIES[name]()).error).toBeUndefined();
  });

  it('is refused where it is missing, or is a list', async () => {
    expect(refusalIn(await send(name, undefined))).toMatchObject(refused('body-invalid'));
    expect(refusalIn(await sendJson(name, []))).toMatchObject(refused('body-invalid'));
  });

  it('is refused with a key that nobody knows, at any depth, and names it', async () => {
    for (const object of everyObject(BODIES[name]())) {
      const path = [...object, 'surprise'];
      const answer = await sendJson(name, withPartAt(BODIES[name](), path, 'of a newer version'));
      // A batch is read record by record: one that says too much holds up none of the others.
      if (name === 'sendRecords' && path[0] === 'records') expect(rejectedIn(answer, path)).toBe('record-invalid');
      else expect(refusalIn(answer)).toEqual({ ...refused('body-invalid'), fields: [path.join('.')] });
    }
  });

  it.each(['constructor', 'toString', '__proto__'])('is refused with the key %s, which every object has', async (key) => {
    const text = JSON.stringify(BODIES[name]()).replace(/\}$/, `,"${key}":{"admin":true}}`).replace('{,', '{');
    const answer = await send(name, text);
    expect(refusalIn(answer)).toMatchObject(refused('body-invalid'));
    expect(answer.text).toContain(`"fields":{"${key}":`);
  });

  it('is refused with a part of the wrong type, anywhere, and says where', async () => {
    for (const path of everyPlace(BODIES[name]())) {
      for (const part of wrongFor(partAt(BODIES[name](), path))) {
        const body = withPartAt(BODIES[name](), path, part);
        const answer = await sendJson(name, body);
        const at = `${path.join('.')} = ${JSON.stringify(part)}`;
        if (!isAnswered(answer)) throw new Error(`${at}: ${answer.status} ${answer.text.slice(0, 300)}`);
        if (schema?.safeParse(body).success === false) {
          const refusal = refusalIn(answer);
          expect([at, refusal]).toEqual([at, expect.objectContaining(refused('body-invalid'))]);
          expect([at, fieldsOf(answer).some((field) => isOnPath(field, path.join('.')))]).toEqual([at, true]);
        } else if (name === 'sendRecords' && path[0] === 'records' && path.length > 2) {
          const read = recordSchema.safeParse(partAt(body, path.slice(0, 2)));
          if (!read.success) expect([at, rejectedIn(answer, path)]).toEqual([at, 'record-invalid']);
        }
      }
    }
  }, 120_000);

  it('is refused, not choked on, where a part is nested a hundred thousand deep', async () => {
    const deep = '['.repeat(100_000) + ']'.repeat(100_000);
    for (const path of [['deep'], ...everyPlace(BODIES[name]())]) {
      const marked = JSON.stringify(withPartAt(BODIES[name](), path, '<deep>'));
      expect(refusalIn(await send(name, marked.replace('"<deep>"', deep)))).toMatchObject(refused('body-malformed'));
    }
  }, 60_000);
});

/** Why the record at a path of a batch was not taken; the answer itself where it was. */
function rejectedIn({ status, body, text }: Answer, [, index]: Path): unknown {
  if (status !== 200) return `${status}: ${text.slice(0, 300)}`;
  const { answers } = endpoints.sendRecords.response.parse(body);
  const answer = recordAnswerSchema.parse(answers[Number(index)]);
  return answer.answer === 'rejected' ? answer.refusal : answer;
}

describe.each(withParams)('the address of %s', (name) => {
  const body = name in BODIES ? BODIES[name as WithBody] : () => undefined; // `in` does not narrow

  it.each(['no-id', '1', 'null', '%2E%2E', '%27%20or%201=1%20--', '%00', '%ff%fe', '%E0%A4%A'])(
    'is refused with %s for an id',
    async (id) => {
      const path = endpoints[name].path.replaceAll(/:\w+/g, id);
      const answer = await send(name, JSON.stringify(body()), {}, path);
      expect(refusalIn(answer)).toMatchObject(refused('params-invalid'));
    },
  );

  it('is refused with five thousand letters for an id', async () => {
    const path = endpoints[name].path.replaceAll(/:\w+/g, 'x'.repeat(5000));
    expect(refusalIn(await send(name, JSON.stringify(body()), {}, path))).toMatchObject(refused('params-invalid'));
  });
});

describe.each(withQuery)('the question of %s', (name) => {
  it.each(['after=-1', 'after=x', 'after=1.5', 'after=1e300', 'after=1&after=2', 'after[a]=1', 'nobody=knows', 'after=%ff'])(
    'is refused when it is %s',
    async (query) => {
      const answer = await send(name, undefined, {}, `${pathOf(name)}?${query}`);
      expect(refusalIn(answer)).toMatchObject(refused('query-invalid'));
    },
  );
});
