import { randomUUID } from 'node:crypto';
import type { Endpoint } from '@/shared/api/endpoint';
import { endpoints, type EndpointName } from '@/shared/api/endpoints';
import { ERROR_STATUS, errorBodySchema } from '@/shared/error-codes';
import { may, ROLES, type Role } from '@/shared/roles';
import { readyBedRule, readyToleranceRules } from '@/shared/rules';
import { startTestApi, type Loose, type TestApi, type TestCompany, type TestPerson } from './support/test-api';
import { buildSite, FOOT, FOOTING, JOB, LASER, openRound, ROD, square, TestPhone, type Site } from './support/site';

/** What exists in a company for its endpoints to be about. */
interface Company {
  company: TestCompany;
  site: Site;
  roundId: string;
}

/** A request that somebody of the company who may make it succeeds with. */
type Case = (company: Company) => Loose;

const jobId = ({ site }: Company) => ({ jobId: site.jobId });
const footingId = ({ site }: Company) => ({ footingId: site.footing.id });
/** A station between corners, which may be moved and removed. */
const stationId = ({ site }: Company) => ({ stationId: site.footing.stations.find(({ corner }) => corner === null)?.id ?? '' });
const roundId = (company: Company) => ({ roundId: company.roundId });

/** One for each row of the table that is not public: a row without a case does not compile. */
const CASES: Record<Exclude<EndpointName, 'health' | 'openapi' | 'signUp' | 'signIn' | 'refresh' | 'signOut'>, Case> = {
  me: () => ({}),
  crew: () => ({}),
  changeRoles: ({ company }) => ({ params: { personId: company.owner.id }, body: { roles: [...ROLES] } }),
  today: () => ({}),
  jobs: () => ({}),
  job: (on) => ({ params: jobId(on) }),
  addJob: () => ({ body: JOB }),
  changeJob: (on) => ({ params: jobId(on), body: { address: '9 Orchard Row' } }),
  setToleranceRule: (on) => ({ params: { ...jobId(on), surface: 'top' }, body: readyToleranceRules('feet-inches').top }),
  setBedRule: (on) => ({ params: jobId(on), body: readyBedRule('block', 'feet-inches') }),
  addBenchmark: (on) => ({ params: jobId(on), body: { name: randomUUID(), elevation: 0, note: '' } }),
  changeBenchmark: ({ site }) => ({ params: { benchmarkId: site.benchmarkId }, body: { note: 'Bolt', version: 1 } }),
  addFooting: (on) => ({ params: jobId(on), body: { ...FOOTING, name: randomUUID() } }),
  footing: (on) => ({ params: footingId(on) }),
  changeFooting: (on) => ({ params: footingId(on), body: { thickness: FOOT } }),
  setOutline: (on) => ({ params: footingId(on), body: { runs: square(), version: 1 } }),
  setStations: (on) => ({ params: footingId(on), body: { spacing: 5 * FOOT } }),
  addStation: (on) => ({ params: footingId(on), body: { at: 3 * FOOT } }),
  changeStation: (on) => ({ params: stationId(on), body: { name: 'By the door' } }),
  removeStation: (on) => ({ params: stationId(on) }),
  instruments: () => ({}),
  addLaser: () => ({ body: { ...LASER, name: randomUUID() } }),
  changeLaser: ({ site }) => ({ params: { laserId: site.laserId }, body: { checkedOn: null } }),
  addRod: () => ({ body: { ...ROD, name: randomUUID() } }),
  changeRod: ({ site }) => ({ params: { rodId: site.rodId }, body: { length: 16 * FOOT } }),
  openRound: (on) => ({ params: footingId(on), body: { id: randomUUID(), surface: 'top' } }),
  round: (on) => ({ params: roundId(on) }),
  changeRound: (on) => ({ params: roundId(on), body: { closed: false } }),
  records: (on) => ({ params: roundId(on), query: { after: 0 } }),
  sendRecords: (on) => {
    const phone = new TestPhone(on.site, api);
    return { params: roundId(on), body: phone.body(...phone.begin()) };
  },
};

const names = Object.keys(CASES) as (keyof typeof CASES)[]; // Object.keys forgets the key type
const byId = names.filter((name) => endpoints[name].params !== null);
const restricted = names.filter((name) => typeof endpoints[name].access === 'object');

let api: TestApi;
let ours: Company;
let stranger: TestPerson;
const people = new Map<Role, TestPerson>();

beforeAll(async () => {
  api = await startTestApi();
  const company = await api.signUp('Ours');
  for (const role of ROLES) people.set(role, await company.hire(role));
  stranger = (await api.signUp('Theirs')).owner;
  ours = await siteOf(company);
});
afterAll(() => api.stop());

async function siteOf(company: TestCompany): Promise<Company> {
  const { token } = company.owner;
  const site = await buildSite(api, token);
  return { company, site, roundId: (await openRound(api, token, site.footing.id, 'top')).round.id };
}

/** What these are about is no longer as it was once they have succeeded. */
const USED_UP: readonly EndpointName[] = [
  'changeBenchmark',
  'setOutline',
  'setStations',
  'addStation',
  'changeStation',
  'removeStation',
];
const whole = (name: EndpointName): Company | Promise<Company> => (USED_UP.includes(name) ? siteOf(ours.company) : ours);

function refusal(code: keyof typeof ERROR_STATUS) {
  return { status: ERROR_STATUS[code], code };
}
async function said(name: EndpointName, token: string | null, given: Loose) {
  const response = await api.send(name, token, given);
  const body = errorBodySchema.safeParse(response.body);
  return { status: response.status, code: body.success ? body.data.error.code : null };
}

it('every row of the table is either public or has a case here', () => {
  const open = Object.entries(endpoints).flatMap(([name, row]) => (row.access === 'public' ? [name] : []));
  expect([...names, ...open].sort()).toEqual(Object.keys(endpoints).sort());
});

describe.each(names)('%s', (name) => {
  it('answers somebody who may, as the table says', async () => {
    const on = await whole(name);
    const response = await api.send(name, on.company.owner.token, CASES[name](on));
    expect({ status: response.status, text: response.text.slice(0, 300) }).toMatchObject({ status: endpoints[name].status });
    expect(endpoints[name].response.safeParse(response.body).error).toBeUndefined();
  });

  it('is closed to whoever is not signed in, or whose sign-in is over', async () => {
    const token = ours.company.owner.token;
    expect(await said(name, null, CASES[name](ours))).toEqual(refusal('signed-out'));
    expect(await said(name, `${token.slice(0, -3)}AAA`, CASES[name](ours))).toEqual(refusal('signed-out'));
    api.clock.pass(10 * 60_000);
    expect(await said(name, token, CASES[name](ours))).toEqual(refusal('signed-out'));
  });
});

describe.each(byId)('%s of another company', (name) => {
  it('is not found, and said in the very words of an id that nobody has', async () => {
    const given = CASES[name](ours);
    const foreign = await api.send(name, stranger.token, given);
    const { surface, ...ids } = given.params ?? {};
    const params = { ...Object.fromEntries(Object.keys(ids).map((key) => [key, randomUUID()])), ...(surface ? { surface } : {}) };
    const unknown = await api.send(name, stranger.token, { ...given, params });
    expect({ status: foreign.status, code: foreign.body.error?.code }).toEqual(refusal('not-found'));
    expect([foreign.status, foreign.body]).toEqual([unknown.status, unknown.body]);
  });
});

describe.each(restricted)('%s', (name) => {
  const row: Endpoint = endpoints[name];
  const action = typeof row.access === 'object' ? row.access.may : null;
  const refused = ROLES.filter((role) => action !== null && !may([role], action));
  const allowed = ROLES.filter((role) => !refused.includes(role));

  it.each(refused.length > 0 ? refused : (['nobody'] as const))('is refused to somebody who is only %s', async (role) => {
    if (role === 'nobody') return expect(allowed).toEqual([...ROLES]);
    expect(await said(name, people.get(role)?.token ?? null, CASES[name](ours))).toEqual(refusal('role-refused'));
  });

  it.each(allowed)('is open to somebody who is only %s', async (role) => {
    const on = await whole(name);
    const response = await api.send(name, people.get(role)?.token ?? null, CASES[name](on));
    expect({ status: response.status, text: response.text.slice(0, 300) }).toMatchObject({ status: row.status });
  });
});

it('somebody whose last role was taken is out at once, though their sign-in is good', async () => {
  const leaver = await ours.company.hire('operator');
  expect((await api.send('me', leaver.token, {})).status).toBe(200);
  await api.source.transaction(async (manager) => {
    await manager.query(`select set_config('role', 'tallyrod_app', true), set_config('app.company_id', $1, true)`, [
      ours.company.id,
    ]);
    await manager.query(`update memberships set roles = '{}' where person_id = $1`, [leaver.id]);
  });
  expect(await said('me', leaver.token, {})).toEqual(refusal('signed-out'));
});
