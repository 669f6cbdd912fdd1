import { Client } from 'pg';
import { errorBodySchema } from '@/shared/error-codes';
import { throughCutOff, type CutOff } from './support/cut-off';
import { startTestApi, type TestApi } from './support/test-api';

let way: CutOff;
let api: TestApi;
let token: string;

beforeAll(async () => {
  api = await startTestApi({
    through: async (url) => {
      way = await throughCutOff(url);
      return way.url;
    },
  });
  token = (await api.signUp()).owner.token;
});
afterAll(async () => {
  await api.stop();
  await way.close();
});

async function isAway(name: 'health' | 'jobs' | 'refresh'): Promise<void> {
  const response = await api
    .send(name, token, name === 'refresh' ? { body: {} } : {})
    .set('Cookie', '__Host-tallyrod-refresh=abc');
  expect([response.status, errorBodySchema.parse(response.body).error.code]).toEqual([503, 'database-away']);
  expect(response.headers['retry-after']).toBe('2');
}

describe('a database that goes away', () => {
  it('answers while it is there', async () => {
    const response = await api.send('health', null, {});
    expect([response.status, response.body]).toEqual([200, { ok: true, database: 'answers' }]);
  });

  it('is told as 503 on every kind of request, and is used again when it is back, without a new start', async () => {
    await way.cut();
    for (const name of ['health', 'jobs', 'refresh', 'health'] as const) await isAway(name);
    await way.mend();
    await api.send('health', null, {}).expect(200);
    await api.send('jobs', token, {}).expect(200);
  });

  it('and that ends every connection in the midst of a request is told as 503, not as a fault', async () => {
    const admin = new Client({ connectionString: api.database.superUrl });
    await admin.connect();
    // Another session holds the memberships: the request waits in its first statement until it is cut off.
    await admin.query('begin');
    await admin.query('lock table memberships in access exclusive mode');
    // A request is sent when it is awaited: `then` sends it now.
    const waiting = api.send('jobs', token, {}).then((response) => response);
    const others = `from pg_stat_activity where datname = current_database() and pid <> pg_backend_pid()`;
    for (;;) {
      const { rowCount } = await admin.query(`select ${others} and wait_event_type = 'Lock'`);
      if (rowCount !== 0) break;
    }
    await admin.query(`select pg_terminate_backend(pid) ${others}`);
    await admin.query('rollback');
    await admin.end();
    const response = await waiting;
    expect([response.status, response.body.error.code]).toEqual([503, 'database-away']);
    await api.send('jobs', token, {}).expect(200);
  });
});
