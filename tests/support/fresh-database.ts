import { randomBytes } from 'node:crypto';
import { escapeIdentifier } from 'pg';
import { ensureDatabase, urlFor, withClient } from '../../scripts/database-roles';
import { TEMPLATE, testSignIns } from './migrated-template';

/** A migrated database of its own, empty of data. */
export interface FreshDatabase {
  /** As the server signs in. */
  url: string;
  /** As migrations sign in. */
  ownerUrl: string;
  /** As the superuser, whom row-level security does not bind: for looking behind the product's back. */
  superUrl: string;
  /** Removes it, whoever is still signed in. */
  drop(): Promise<void>;
}

/**
 * Clones the migrated template, for one test file.
 *
 * @throws Error when the file's jest project does not make the template (see jest.config.js)
 * @example
 * let database: FreshDatabase;
 * beforeAll(async () => { database = await freshDatabase(); });
 * afterAll(() => database.drop());
 */
export async function freshDatabase(): Promise<FreshDatabase> {
  const clusterUrl = process.env.TEST_CLUSTER_URL;
  if (!clusterUrl) throw new Error('there is no cluster: this jest project has no globalSetup that makes the template');
  const name = `test_${process.env.JEST_WORKER_ID ?? 'x'}_${randomBytes(5).toString('hex')}`;
  await ensureDatabase(clusterUrl, name, TEMPLATE);
  const signIns = testSignIns(clusterUrl);
  return {
    url: urlFor(clusterUrl, name, signIns.server),
    ownerUrl: urlFor(clusterUrl, name, signIns.owner),
    superUrl: urlFor(clusterUrl, name),
    drop: async () => {
      await withClient(clusterUrl, (client) => client.query(`DROP DATABASE IF EXISTS ${escapeIdentifier(name)} WITH (FORCE)`));
    },
  };
}
