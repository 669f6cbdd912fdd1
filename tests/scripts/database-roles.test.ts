import { ensureDatabase, ensureRoles, OWNER, SERVER, SERVER_MAY_BECOME, urlFor, withClient } from '../../scripts/database-roles';
import { startThrowAwayCluster, type ThrowAwayCluster } from '../../scripts/throw-away-cluster';

jest.setTimeout(120_000);

describe('the roles of a cluster', () => {
  const signIn = { owner: { user: OWNER, password: 'o' }, server: { user: SERVER, password: 's' } };

  let cluster: ThrowAwayCluster | undefined;
  beforeAll(async () => {
    cluster = await startThrowAwayCluster();
    const { superUrl } = cluster;
    await ensureRoles(superUrl, { owner: 'of before', server: 'of before' });
    await ensureRoles(superUrl, { owner: 'o', server: 's' });
    await ensureDatabase(superUrl, 'product');
  });

  afterAll(() => cluster?.end());

  const running = (): ThrowAwayCluster => {
    if (cluster === undefined) throw new Error('the cluster does not run');
    return cluster;
  };
  const asServer = (): string => urlFor(running().superUrl, 'product', signIn.server);

  it('let the owner make tables, and the server none', async () => {
    await withClient(urlFor(running().superUrl, 'product', signIn.owner), (client) => client.query('CREATE TABLE owned (n int)'));
    await expect(withClient(asServer(), (client) => client.query('CREATE TABLE mine (n int)'))).rejects.toMatchObject({
      code: '42501',
    });
    await expect(withClient(asServer(), (client) => client.query('CREATE TEMP TABLE mine (n int)'))).rejects.toMatchObject({
      code: '42501',
    });
  });

  it('give the server nothing until it becomes a role that was given it', async () => {
    await withClient(urlFor(running().superUrl, 'product', signIn.owner), (client) =>
      client.query('CREATE TABLE granted (n int); GRANT SELECT ON granted TO tallyrod_app'),
    );
    await withClient(asServer(), async (client) => {
      await expect(client.query('SELECT * FROM granted')).rejects.toMatchObject({ code: '42501' });
      await client.query('SET ROLE tallyrod_app');
      expect((await client.query('SELECT * FROM granted')).rowCount).toBe(0);
    });
  });

  it.each([OWNER, 'postgres'])('do not let the server become %s', async (role) => {
    await expect(withClient(asServer(), (client) => client.query(`SET ROLE ${role}`))).rejects.toMatchObject({ code: '42501' });
  });

  it('hold no superuser, and none that row-level security does not bind', async () => {
    const { rows } = await withClient(running().superUrl, (client) =>
      client.query(
        `SELECT rolname FROM pg_roles WHERE rolname = ANY($1) AND (rolsuper OR rolbypassrls OR rolcreaterole OR rolcreatedb OR rolreplication)`,
        [[OWNER, SERVER, ...SERVER_MAY_BECOME]],
      ),
    );
    expect(rows).toEqual([]);
  });

  it('leave a database that is there as it is, and give a clone the same rights', async () => {
    expect(await ensureDatabase(running().superUrl, 'product')).toBe(false);
    expect(await ensureDatabase(running().superUrl, 'clone', 'product')).toBe(true);
    const { rows } = await withClient(running().superUrl, (client) =>
      client.query(`SELECT count(DISTINCT datacl::text)::int AS kinds FROM pg_database WHERE datname IN ('product', 'clone')`),
    );
    expect(rows).toEqual([{ kinds: 1 }]);
  });
});
