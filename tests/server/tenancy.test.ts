import { pino } from 'pino';
import { Client } from 'pg';
import { createDataSource } from '@/server/data-source';
import { refuseUnsafeRole } from '@/server/database/refuse-unsafe-role';
import type { Tenant } from '@/server/api/handler';
import { listCrew } from '@/server/features/crew/crew-service';
import { readFooting } from '@/server/features/footings/footing-service';
import { readJob } from '@/server/features/jobs/job-service';
import { readRecords } from '@/server/features/records/record-service';
import { readRound } from '@/server/features/rounds/round-service';
import { startTestApi, type TestApi, type TestCompany } from './support/test-api';
import { buildSite, FOOTING, openRound, runsOf, TestPhone, type Site } from './support/site';

let api: TestApi;
let ours: TestCompany;
let theirs: TestCompany;
let site: Site;
let roundId: string;

beforeAll(async () => {
  api = await startTestApi();
  ours = await api.signUp('Ours');
  theirs = await api.signUp('Theirs');
  for (const company of [ours, theirs]) {
    const { token } = company.owner;
    site = await buildSite(api, token);
    roundId = (await openRound(api, token, site.footing.id, 'rails')).round.id;
    const phone = new TestPhone(site, api);
    const shot = phone.shot(0);
    const body = phone.body(...phone.begin(), shot, phone.strike(shot.id));
    await api.ok('sendRecords', token, { params: { roundId }, body });
    const { id: footingId } = await api.ok('addFooting', token, {
      params: { jobId: site.jobId },
      body: { ...FOOTING, name: 'Stepped' },
    });
    await api.ok('setOutline', token, { params: { footingId }, body: { runs: runsOf([20, 0, [8, -2]]), version: 0 } });
  }
});
afterAll(() => api.stop());

/** As the server works for our company, with whatever our services forgot to ask. */
async function asOurs<T>(work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: api.database.url });
  await client.connect();
  try {
    await client.query('set role tallyrod_app');
    await client.query(`select set_config('app.company_id', $1, false)`, [ours.id]);
    return await work(client);
  } finally {
    await client.end();
  }
}

describe('row-level security, with the services’ own checks off', () => {
  it('hides another company on every table, and lets nothing be written into it', async () => {
    await asOurs(async (client) => {
      const { rows: tables } = await client.query<{ name: string; may: string[] }>(`
        select relname as name, array_remove(array[
          case when has_any_column_privilege(oid, 'update') then 'update' end, case when has_table_privilege(oid, 'delete') then 'delete' end], null) as may
        from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r'
          and exists (select from pg_attribute where attrelid = pg_class.oid and attname = 'company_id')
          and has_table_privilege(oid, 'select')`);
      expect(tables.length).toBeGreaterThanOrEqual(20);
      for (const { name, may } of tables) {
        const { rows } = await client.query<{ company_id: string }>(`select distinct company_id from ${name}`);
        expect({ name, rows }).toEqual({ name, rows: [{ company_id: ours.id }] });
        if (may.includes('delete')) {
          const { rowCount } = await client.query(`delete from ${name} where company_id = $1`, [theirs.id]);
          expect({ name, rowCount }).toEqual({ name, rowCount: 0 });
        }
      }
    });
  });

  it('refuses a row for another company on every table that may be written', async () => {
    const { rows } = await asOurs((client) =>
      client.query<{
        name: string;
      }>(`select relname as name from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r'
        and exists (select from pg_attribute where attrelid = pg_class.oid and attname = 'company_id') and has_table_privilege(oid, 'insert')`),
    );
    expect(rows.length).toBeGreaterThanOrEqual(19);
    for (const { name } of rows) {
      // Their own row, read behind the product's back, with nothing changed but its ids.
      const foreign = await asSuper(
        async (client) => (await client.query(`select * from ${name} where company_id = $1 limit 1`, [theirs.id])).rows[0],
      );
      const keys = Object.keys(foreign);
      const sql = `insert into ${name} (${keys.map((key) => `"${key}"`).join(', ')}) values (${keys.map((_key, index) => `$${index + 1}`).join(', ')})`;
      await asOurs((client) => expect(client.query(sql, Object.values(foreign))).rejects.toMatchObject({ code: '42501' }));
    }
  });

  it('shows people of the company through the crew list, and no other person anywhere', async () => {
    await asOurs(async (client) => {
      const { rows } = await client.query('select id from crew_people');
      expect(rows).toEqual([{ id: ours.owner.id }]);
      for (const table of ['people', 'credentials', 'sessions', 'refresh_tokens', 'rate_limits']) {
        await expect(client.query(`select * from ${table}`)).rejects.toMatchObject({ code: '42501' });
      }
    });
  });

  it('shows nothing at all where no company is set, or an empty one', async () => {
    await asOurs(async (client) => {
      for (const company of ['', null]) {
        await (company === null
          ? client.query('reset app.company_id')
          : client.query(`select set_config('app.company_id', '', false)`));
        expect((await client.query('select from jobs')).rowCount).toBe(0);
      }
    });
  });

  it('holds when a service takes its company from somebody who is in another', async () => {
    // The first lock off: the actor says "theirs", the transaction is ours.
    await api.dependencies.database.asCompany(ours.id, async (manager) => {
      const actor = { companyId: theirs.id, personId: theirs.owner.id, roles: ['owner'] as const };
      const tenant: Tenant = { actor, manager, now: () => new Date(), newId: () => '' };
      expect(await listCrew(tenant)).toEqual([]);
      await expect(readJob(tenant, site.jobId)).rejects.toMatchObject({ code: 'not-found' });
      await expect(readFooting(tenant, site.footing.id)).rejects.toMatchObject({ code: 'not-found' });
      await expect(readRound(tenant, roundId)).rejects.toMatchObject({ code: 'not-found' });
      await expect(readRecords(tenant, roundId, 0)).rejects.toMatchObject({ code: 'not-found' });
    });
  });

  it('gives the server’s own sign-in no right before it takes a role', async () => {
    const client = new Client({ connectionString: api.database.url });
    await client.connect();
    await expect(client.query('select from jobs')).rejects.toMatchObject({ code: '42501' });
    await client.end();
  });
});

async function asSuper<T>(work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: api.database.superUrl });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

describe('the server will not start', () => {
  async function start(url: string): Promise<void> {
    const source = await createDataSource({ url, logger: pino({ level: 'silent' }), poolSize: 1 }).initialize();
    try {
      await refuseUnsafeRole(source);
    } finally {
      await source.destroy();
    }
  }

  it('as a superuser', () => expect(start(api.database.superUrl)).rejects.toThrow(/superuser/));
  it('as the owner of the tables', () =>
    expect(start(api.database.ownerUrl)).rejects.toThrow(/owns, or may become the owner of, the table jobs/));
  it('where a table’s row-level security is not forced', async () => {
    await asSuper((client) => client.query('alter table shots no force row level security'));
    await expect(start(api.database.url)).rejects.toThrow(/the table shots without forced/);
    await asSuper((client) => client.query('alter table shots force row level security'));
  });
  it('otherwise it does', () => expect(start(api.database.url)).resolves.toBeUndefined());
});
