import { chownSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { withClient } from '../../scripts/database-roles';
import { startCluster, type Cluster, type ClusterOptions } from '../../scripts/postgres-cluster';
import { processesIn } from '../../scripts/process-identity';

// Making a cluster takes a second, or ten on a machine that is busy with other things.
jest.setTimeout(120_000);

// Real PostgreSQL in a folder under /tmp, which the user that runs it can reach.
describe('a PostgreSQL of our own', () => {
  let folder: string;
  let cluster: Cluster | undefined;
  const start = async (options: Partial<ClusterOptions> = {}): Promise<Cluster> => {
    cluster = await startCluster({ folder, password: 'first', durable: false, ...options });
    return cluster;
  };
  const numbersKept = async (url: string): Promise<unknown[]> =>
    withClient(url, async (client) => (await client.query<{ n: number }>('SELECT n FROM kept')).rows.map(({ n }) => n));
  const keepNumber = (url: string): Promise<unknown> =>
    withClient(url, (client) => client.query('CREATE TABLE kept AS SELECT 7 AS n'));

  beforeEach(() => {
    folder = mkdtempSync('/tmp/postgres-cluster-');
  });

  afterEach(async () => {
    await cluster?.stop();
    cluster = undefined;
    rmSync(folder, { recursive: true, force: true });
  });

  it('is made where an earlier making was cut short', async () => {
    mkdirSync(join(folder, 'data.partial'));
    writeFileSync(join(folder, 'data.partial', 'PG_VERSION'), '15\n');
    const { superUrl } = await start();
    await keepNumber(superUrl);
    expect(await numbersKept(superUrl)).toEqual([7]);
    expect(existsSync(join(folder, 'data.partial'))).toBe(false);
  });

  it('is closed to others: on loopback, with a password, in a folder of its own', async () => {
    const { superUrl } = await start();
    const { rows } = await withClient(superUrl, (client) =>
      client.query(
        `SELECT name, setting FROM pg_settings WHERE name IN ('listen_addresses', 'unix_socket_directories') ORDER BY name`,
      ),
    );
    expect(rows).toEqual([
      { name: 'listen_addresses', setting: '127.0.0.1' },
      { name: 'unix_socket_directories', setting: '' },
    ]);
    await expect(withClient(superUrl.replace('first', 'wrong'), async () => {})).rejects.toThrow(
      'password authentication failed',
    );
    expect(statSync(folder).mode & 0o077).toBe(0);
    expect(existsSync(join(folder, 'password'))).toBe(false);
  });

  it('that a killed run left running is ended, and started again with what it held', async () => {
    const left = await start();
    await keepNumber(left.superUrl);
    const said = jest.spyOn(console, 'log').mockImplementation(() => {});
    const next = await start();
    expect(said).toHaveBeenCalledTimes(1);
    said.mockRestore();
    expect(await numbersKept(next.superUrl)).toEqual([7]);
    await expect(withClient(left.superUrl, async () => {})).rejects.toThrow('ECONNREFUSED');
  });

  it('starts after its server was killed, though its old number is another process by now', async () => {
    const killed = await start({ durable: true });
    await keepNumber(killed.superUrl);
    const data = join(folder, 'data');
    const pidFile = readFileSync(join(data, 'postmaster.pid'), 'utf8');
    await killed.stop();
    writeFileSync(join(data, 'postmaster.pid'), pidFile.replace(/^\d+/, String(process.pid)));
    const { uid, gid } = statSync(data);
    chownSync(join(data, 'postmaster.pid'), uid, gid);
    expect(await numbersKept((await start()).superUrl)).toEqual([7]);
  });

  it('takes a new password when the old one is lost, and keeps what it held', async () => {
    const first = await start({ durable: true });
    await keepNumber(first.superUrl);
    await first.stop();
    const second = await start({ password: 'second', passwordIsNew: true });
    expect(await numbersKept(second.superUrl)).toEqual([7]);
  });

  it('leaves no process behind when it is stopped', async () => {
    await (await start()).stop();
    expect(processesIn(join(folder, 'data'))).toEqual([]);
    cluster = undefined;
  });
});
