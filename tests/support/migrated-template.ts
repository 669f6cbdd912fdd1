import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { escapeIdentifier, escapeLiteral } from 'pg';
import { ensureDatabase, ensureRoles, OWNER, SERVER, urlFor, withClient } from '../../scripts/database-roles';
import { migrate } from '../../scripts/start-database';
import { startThrowAwayCluster } from '../../scripts/throw-away-cluster';

// Jest loads this outside its module mapping: imports are relative.

export const TEMPLATE = 'tallyrod_template';

const ROOT = join(__dirname, '..', '..');

/**
 * The cluster of this run of tests, by its superuser's URL. `npm test` starts one for all its steps and names it in TEST_CLUSTER_URL; jest run
 * by hand gets one of its own, which ends with jest.
 */
async function clusterOfThisRun(): Promise<string> {
  const given = process.env.TEST_CLUSTER_URL;
  if (given) return given;
  const { superUrl } = await startThrowAwayCluster();
  // A Ctrl-C ends jest without its exit handlers, by which the cluster ends.
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => process.exit(130));
  process.env.TEST_CLUSTER_URL = superUrl;
  return superUrl;
}

/** The sign-ins of the two roles in a cluster of tests: derived, so that every worker finds them from TEST_CLUSTER_URL alone. */
export function testSignIns(superUrl: string): {
  owner: { user: string; password: string };
  server: { user: string; password: string };
} {
  const passwordOf = (role: string): string =>
    createHash('sha256')
      .update(`${new URL(superUrl).password} ${role}`)
      .digest('hex');
  return { owner: { user: OWNER, password: passwordOf(OWNER) }, server: { user: SERVER, password: passwordOf(SERVER) } };
}

/** What the shape of the database is made of, as a fingerprint. */
function migrationsFingerprint(): string {
  const hash = createHash('sha256');
  const folder = join(ROOT, 'server', 'migrations');
  const names = existsSync(folder) ? readdirSync(folder, { recursive: true, encoding: 'utf8' }).sort() : [];
  for (const name of names.filter((entry) => entry.endsWith('.ts'))) hash.update(name).update(readFileSync(join(folder, name)));
  return hash.digest('hex');
}

async function isMade(superUrl: string, fingerprint: string): Promise<boolean> {
  const sql = `SELECT shobj_description(oid, 'pg_database') AS made_from FROM pg_database WHERE datname = $1`;
  const { rows } = await withClient(superUrl, (client) => client.query<{ made_from: string | null }>(sql, [TEMPLATE]));
  return rows[0]?.made_from === fingerprint;
}

/**
 * Makes the migrated database that every test file clones, once for a run: it is marked, last of all, with what it was made from.
 *
 * Sets TEST_CLUSTER_URL for the workers.
 */
export async function ensureTemplate(): Promise<void> {
  const superUrl = await clusterOfThisRun();
  const fingerprint = migrationsFingerprint();
  if (await isMade(superUrl, fingerprint)) return;
  const signIns = testSignIns(superUrl);
  await withClient(superUrl, (client) => client.query(`DROP DATABASE IF EXISTS ${escapeIdentifier(TEMPLATE)} WITH (FORCE)`));
  await ensureRoles(superUrl, { owner: signIns.owner.password, server: signIns.server.password });
  await ensureDatabase(superUrl, TEMPLATE);
  await migrate(ROOT, urlFor(superUrl, TEMPLATE, signIns.owner));
  await withClient(superUrl, (client) =>
    client.query(`COMMENT ON DATABASE ${escapeIdentifier(TEMPLATE)} IS ${escapeLiteral(fingerprint)}`),
  );
}

export default ensureTemplate;
