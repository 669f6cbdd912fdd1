import { Client } from 'pg';
import { startTestApi, type TestApi, type TestCompany } from './support/test-api';
import { buildSite, openRound, TestPhone } from './support/site';

const WRITTEN_ONCE = ['records', 'setups', 'series', 'shots', 'strikes', 'tolerance_rules', 'bed_rules', 'benchmark_versions'];

let api: TestApi;
let company: TestCompany;

beforeAll(async () => {
  api = await startTestApi();
  company = await api.signUp();
  const { token } = company.owner;
  const site = await buildSite(api, token);
  const { round } = await openRound(api, token, site.footing.id, 'rails');
  const phone = new TestPhone(site, api);
  const shot = phone.shot(0);
  const body = phone.body(...phone.begin(), shot, phone.strike(shot.id));
  await api.ok('sendRecords', token, { params: { roundId: round.id }, body });
});
afterAll(() => api.stop());

async function as<T>(url: string, work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    await client.query(`select set_config('app.company_id', $1, false)`, [company.id]);
    return await work(client);
  } finally {
    await client.end();
  }
}

/** A column that may be written to itself. */
const CHANGES = (table: string) => `update ${table} set company_id = company_id`;

describe.each(WRITTEN_ONCE)('%s', (table) => {
  it('have rows to try it on', async () => {
    const { rowCount } = await as(api.database.superUrl, (client) => client.query(`select from ${table}`));
    expect(rowCount).toBeGreaterThan(0);
  });

  it.each(['update', 'delete', 'truncate'])('the application’s role has no right to %s', async (what) => {
    const sql = what === 'update' ? CHANGES(table) : what === 'delete' ? `delete from ${table}` : `truncate ${table} cascade`;
    await as(api.database.url, async (client) => {
      await client.query('set role tallyrod_app');
      await expect(client.query(sql)).rejects.toMatchObject({ code: '42501' });
    });
  });

  it.each(['update', 'delete', 'truncate'])('even the owner is refused %s by a trigger', async (what) => {
    const sql = what === 'update' ? CHANGES(table) : what === 'delete' ? `delete from ${table}` : `truncate ${table} cascade`;
    await as(api.database.ownerUrl, (client) => expect(client.query(sql)).rejects.toMatchObject({ code: '23001' }));
  });
});
