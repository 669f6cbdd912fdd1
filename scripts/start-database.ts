import { step, Stop } from './announce.mjs';
import { run } from './child.mjs';
import { dataFolder, placeForCluster } from './cluster-place';
import { ensureDatabase, ensureRoles, OWNER, SERVER, urlFor } from './database-roles';
import { localSecrets } from './local-secrets';
import { startCluster } from './postgres-cluster';

/** The name of the database in a cluster of ours. */
const DATABASE = 'tallyrod';

/** The database of a start. */
export interface StartDatabase {
  /** For the server. */
  url: string;
  /** For migrations. */
  ownerUrl: string;
  stop(): Promise<void>;
}

/** Somebody else's database, when both its URLs are given. */
function givenDatabase(): StartDatabase | undefined {
  const url = process.env.DATABASE_URL;
  const ownerUrl = process.env.MIGRATION_DATABASE_URL;
  if (!url && !ownerUrl) return undefined;
  if (!url || !ownerUrl) {
    throw new Stop(
      `${url ? 'MIGRATION_DATABASE_URL' : 'DATABASE_URL'} is not set. Set both (${SERVER} signs in by DATABASE_URL, ${OWNER} by ` +
        'MIGRATION_DATABASE_URL), or neither: then a database of our own is started.',
    );
  }
  return { url, ownerUrl, stop: async () => {} };
}

async function ownDatabase(root: string): Promise<StartDatabase> {
  const { folder, outside } = placeForCluster(root);
  if (outside) console.log(`  The user postgres cannot reach this clone, so the database lies in ${folder}`);
  const { secrets, fresh } = localSecrets(dataFolder(root));
  const cluster = await startCluster({ folder, password: secrets.postgresPassword, durable: true, passwordIsNew: fresh });
  try {
    const passwords = { owner: secrets.ownerPassword, server: secrets.serverPassword };
    await ensureRoles(cluster.superUrl, passwords);
    await ensureDatabase(cluster.superUrl, DATABASE);
    return {
      url: urlFor(cluster.superUrl, DATABASE, { user: SERVER, password: passwords.server }),
      ownerUrl: urlFor(cluster.superUrl, DATABASE, { user: OWNER, password: passwords.owner }),
      stop: cluster.stop,
    };
  } catch (error) {
    await cluster.stop();
    throw error;
  }
}

/** The database that DATABASE_URL and MIGRATION_DATABASE_URL name, or else a PostgreSQL of our own, started. */
export async function startDatabase(root: string): Promise<StartDatabase> {
  return givenDatabase() ?? step('Starting PostgreSQL', () => ownDatabase(root));
}

const tsx = (root: string, script: string, env: Record<string, string>): Promise<{ code: number; output: string }> =>
  run(process.execPath, ['--import', 'tsx', script], { cwd: root, env: { ...process.env, ...env } });

/**
 * Brings a database to the newest shape.
 *
 * @throws Stop with what the migrations said when one of them failed
 */
export async function migrate(root: string, ownerUrl: string): Promise<void> {
  const { code, output } = await tsx(root, 'server/migrate.ts', { MIGRATION_DATABASE_URL: ownerUrl });
  if (code !== 0) throw new Stop(`The database could not be brought up to date:\n${output}`);
}

/**
 * Lays the demo into an empty database, and leaves one with data as it is.
 *
 * @returns the sign-ins that the demo prints, one a line: name · role · email · password
 * @throws Stop with what the seed said when it failed
 */
export async function seedDemo(root: string, url: string): Promise<string[]> {
  const { code, output } = await tsx(root, 'server/demo/seed.ts', { DATABASE_URL: url });
  if (code !== 0) throw new Stop(`The demo could not be laid into the database:\n${output}`);
  return output.split('\n').filter((line) => line.split(' · ').length === 4);
}
