import { pino } from 'pino';
import { Client } from 'pg';
import { createDataSource } from '@/server/data-source';
import { seedDemo } from '@/server/demo/seed';
import type { Session } from '@/shared/api/session-endpoints';
import { freshDatabase } from '../support/fresh-database';
import { startTestApi, type TestApi } from './support/test-api';

let first: TestApi;
let second: TestApi;
let signIns: string[];
let owner: Session;

beforeAll(async () => {
  [first, second] = await Promise.all([startTestApi(), startTestApi()]);
  signIns = await seedDemo(first.source);
  owner = await signIn(signIns[0] ?? '');
});
afterAll(async () => {
  await Promise.all([first.stop(), second.stop()]);
});

function signIn(line: string): Promise<Session> {
  const [, , email = '', password = ''] = line.split(' · ');
  return first.ok('signIn', null, { body: { email, password } });
}

/** Every row of every table but those of sign-ins, which tests themselves make. */
async function everything({ database }: TestApi): Promise<Record<string, unknown[]>> {
  const client = new Client({ connectionString: database.superUrl });
  await client.connect();
  const { rows: tables } = await client.query<{ name: string }>(`
    select relname as name from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r'
      and relname not in ('migrations', 'sessions', 'refresh_tokens', 'rate_limits')`);
  const found: Record<string, unknown[]> = {};
  for (const { name } of tables) found[name] = (await client.query(`select ${name}::text as row from ${name} order by 1`)).rows;
  await client.end();
  return found;
}

describe('the demo', () => {
  it('is the same to the last character wherever it is laid', async () => {
    await seedDemo(second.source);
    const [one, two] = [await everything(first), await everything(second)];
    expect(Object.values(one).flat().length).toBeGreaterThan(600);
    expect(two).toEqual(one);
  });

  it('is not laid beside anybody’s data, nor twice', async () => {
    const before = await everything(first);
    expect(await seedDemo(first.source)).toEqual([]);
    expect(await everything(first)).toEqual(before);
  });

  it('is laid once by two who start at once', async () => {
    const database = await freshDatabase();
    const open = () =>
      createDataSource({ url: database.url, logger: pino({ level: 'silent' }), patience: 'of-a-migration' }).initialize();
    const sources = await Promise.all([open(), open()]);
    const said = await Promise.all(sources.map(seedDemo));
    expect(said.map(({ length }) => length).sort()).toEqual([0, 4]);
    await Promise.all(sources.map((source) => source.destroy()));
    await database.drop();
  });

  it('prints four sign-ins that work, one of each role', async () => {
    expect(signIns.map((line) => line.split(' · ')[1])).toEqual(['owner', 'super', 'operator', 'installer']);
    for (const line of signIns) {
      const { me } = await signIn(line);
      expect(line.startsWith(`${me.person.name} · ${me.roles[0]}`)).toBe(true);
    }
  });

  it('has four footings at different stages, and the verdicts that its story tells', async () => {
    const { jobs } = await first.ok('jobs', owner.accessToken, {});
    const told = jobs.flatMap(({ footings }) =>
      footings.map(({ name, stages, lastRound }) => [
        name,
        stages.now,
        lastRound?.surface,
        lastRound?.verdict,
        lastRound?.shot,
        lastRound?.of,
      ]),
    );
    expect(told.sort()).toEqual([
      ['Barn', 'rails', 'rails', 'not-yet', 14, 20],
      ['Garage', 'rails', 'rails', 'not-to-grade', 16, 16],
      ['House', 'release', 'top', 'not-to-grade', 20, 20],
      ['Workshop', 'release', 'top', 'to-grade', 56, 56],
    ]);
  });

  it('has something waiting for each of its people', async () => {
    const what = async (line: string) =>
      (await first.ok('today', (await signIn(line)).accessToken, {})).waiting.map((waiting) => [
        waiting.what,
        waiting.footingName,
      ]);
    expect(await what(signIns[2] ?? '')).toEqual([['finish-round', 'Barn'], ['mend-rails', 'Garage']]); // prettier-ignore
    expect(await what(signIns[1] ?? '')).toEqual([['see-results', 'Workshop'], ['see-results', 'House']]); // prettier-ignore
    expect(await what(signIns[3] ?? '')).toEqual([['see-results', 'Workshop'], ['see-results', 'House']]); // prettier-ignore
  });
});
