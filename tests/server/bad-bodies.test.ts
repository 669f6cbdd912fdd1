import { randomUUID } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import type { Endpoint } from '@/shared/api/endpoint';
import { endpoints, type EndpointName } from '@/shared/api/endpoints';
import { ERROR_STATUS, errorBodySchema } from '@/shared/error-codes';
import { recordAnswerSchema, recordSchema } from '@/shared/records';
import { readyBedRule, readyToleranceRules } from '@/shared/rules';
import { ROLES } from '@/shared/roles';
import { everyPlace, unknownKeysIn, withPartAt, type Json, type Path } from './support/change-json';
import { PASSPHRASE, startTestApi, type Loose, type TestApi, type TestCompany } from './support/test-api';
import { buildSite, FOOT, FOOTING, JOB, LASER, openRound, ROD, square, TestPhone, type Site } from './support/site';

/**
 * What people, other programs and broken phones may send to any row of the table: each is refused by a status of 4xx in the one error
 * shape, and none is ever a fault of the server.
 */
let api: TestApi;
let company: TestCompany;
let site: Site;
let roundId: string;

beforeAll(async () => {
  api = await startTestApi();
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

/** Tries are counted by the hour: the next one is always the first. */
function send(name: EndpointName, given: Loose) {
  api.clock.pass(61 * 60_000);
  return api.send(name, company.owner.token, { params: paramsOf(name), ...given });
}

/** A body letter for letter, which JSON.stringify would not write. */
function sendText(name: EndpointName, text: string | Buffer, headers: Record<string, string> = {}) {
  const request = send(name, {}).set('Content-Type', 'application/json');
  for (const [key, value] of Object.entries(headers)) request.set(key, value);
  // Superagent makes JSON of what is no text, so that bytes are written past it.
  if (typeof text === 'string') return request.send(text);
  return request.serialize(() => text as unknown as string).send({});
}

interface Answer {
  status: number;
  body: unknown;
  text: string;
}

/** Refused in the one shape with the status of its code; what it says. */
function refusalIn({ status, body, text }: Answer) {
  const read = errorBodySchema.safeParse(body);
  if (!read.success) return `${status} in another shape: ${text.slice(0, 200)}`;
  const { code, fields } = read.data.error;
  return { status, code, agrees: ERROR_STATUS[code] === status, fields: Object.keys(fields ?? {}) };
}
const refused = (code: keyof typeof ERROR_STATUS) => ({ status: ERROR_STATUS[code], code, agrees: true });

/** Every status below 500, and in the shape wherever it is a refusal. */
function isAnswered(answer: Answer): boolean {
  if (answer.status >= 500) return false;
  return answer.status < 400 || errorBodySchema.safeParse(answer.body).success;
}

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
    expect(refusalIn(await sendText(name, text))).toMatchObject(refused('body-malformed'));
  });

  it('refuses 10 MB, sent at once, in pieces, or packed small', async () => {
    const large = JSON.stringify({ name: 'x'.repeat(10_000_000) });
    expect(refusalIn(await sendText(name, large))).toMatchObject(refused('body-too-large'));
    expect(refusalIn(await sendText(name, large, { 'Transfer-Encoding': 'chunked' }))).toMatchObject(refused('body-too-large'));
    const packed = gzipSync(large);
    expect(packed.length).toBeLessThan(20_000);
    expect(refusalIn(await sendText(name, packed, { 'Content-Encoding': 'gzip' }))).toMatchObject(refused('body-too-large'));
  });

  it.each([
    ['a form', { 'Content-Type': 'application/x-www-form-urlencoded' }],
    ['plain text', { 'Content-Type': 'text/plain' }],
    ['an alphabet that nobody keys in', { 'Content-Type': 'application/json; charset=latin9' }],
    ['a packing that nobody knows', { 'Content-Encoding': 'mystery' }],
  ])('refuses %s', async (_what, headers) => {
    expect(refusalIn(await sendText(name, '{"name":"a"}', headers))).toMatchObject(refused('body-not-json'));
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
    expect(refusalIn(await send(name, {}))).toMatchObject(refused('body-invalid'));
    expect(refusalIn(await send(name, { body: [] }))).toMatchObject(refused('body-invalid'));
  });

  it('is refused with a key that nobody knows, at any depth, and names it', async () => {
    for (const { path, body } of unknownKeysIn(BODIES[name]())) {
      const answer = await send(name, { body });
      // A batch is read record by record: one that says too much holds up none of the others.
      if (name === 'sendRecords' && path[0] === 'records') expect(rejectedIn(answer, path)).toBe('record-invalid');
      else expect(refusalIn(answer)).toEqual({ ...refused('body-invalid'), fields: [path.join('.')] });
    }
    const names = ['__proto__', 'constructor', 'toString'];
    for (const key of names) {
      const text = JSON.stringify(BODIES[name]()).replace(/\}$/, `,"${key}":{"admin":true}}`).replace('{,', '{');
      expect([key, refusalIn(await sendText(name, text))]).toEqual([key, { ...refused('body-invalid'), fields: [key] }]);
    }
  });

  it('is refused with a part of the wrong type, anywhere, and says where', async () => {
    const wrong: Json[] = [null, true, -1, 0.5, 1e300, 'no such thing', '', '\u0000', '\ud800', [], {}, [[]], { a: 1 }];
    for (const path of everyPlace(BODIES[name]())) {
      for (const part of wrong) {
        const body = withPartAt(BODIES[name](), path, part);
        const answer = await send(name, { body });
        const at = `${path.join('.')} = ${JSON.stringify(part)}`;
        if (!isAnswered(answer)) throw new Error(`${at}: ${answer.status} ${answer.text.slice(0, 300)}`);
        if (schema?.safeParse(body).success === false) {
          expect([at, refusalIn(answer)]).toEqual([at, expect.objectContaining(refused('body-invalid'))]);
        } else if (name === 'sendRecords' && path[0] === 'records' && path.length > 2) {
          const read = recordSchema.safeParse(body.records[Number(path[1])]);
          if (!read.success) expect([at, rejectedIn(answer, path)]).toEqual([at, 'record-invalid']);
        }
      }
    }
  }, 120_000);

  it('is refused, not choked on, where a part is nested a hundred thousand deep', async () => {
    const deep = '['.repeat(100_000) + ']'.repeat(100_000);
    for (const path of [['deep'], ...everyPlace(BODIES[name]())]) {
      const marked = JSON.stringify(withPartAt(BODIES[name](), path, '<deep>'));
      const answer = await sendText(name, marked.replace('"<deep>"', deep));
      if (!isAnswered(answer)) throw new Error(`${path.join('.')}: ${answer.status} ${answer.text.slice(0, 300)}`);
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
  it.each(['no-id', '1', 'null', '..', "' or 1=1 --", 'x'.repeat(5000), '\u0000'])('is refused with %j for an id', async (id) => {
    const params = Object.fromEntries(Object.keys(paramsOf(name)).map((key) => [key, id]));
    const body = name in BODIES ? BODIES[name as WithBody]() : undefined; // `in` does not narrow
    const answer = await send(name, { params, body });
    // `..` is walked by clients before it is sent: what is left leads nowhere.
    if (id === '..') expect([400, 404, 405]).toContain(answer.status);
    else expect(refusalIn(answer)).toMatchObject(refused('params-invalid'));
    expect(isAnswered(answer)).toBe(true);
  });

  it('is refused where it is no text at all', async () => {
    const row: Endpoint = endpoints[name];
    const path = row.path.replaceAll(/:\w+/g, '%ff%fe');
    const answer = await api.http().get(path).set('Authorization', `Bearer ${company.owner.token}`);
    expect(refusalIn(answer)).toMatchObject(refused('params-invalid'));
  });
});

describe.each(withQuery)('the question of %s', (name) => {
  it.each([{ after: -1 }, { after: 'x' }, { after: 1.5 }, { after: 1e300 }, { after: ['1', '2'] }, { nobody: 'knows' }])(
    'is refused when it is %j',
    async (query) => {
      expect(refusalIn(await send(name, { query }))).toMatchObject(refused('query-invalid'));
    },
  );
});
