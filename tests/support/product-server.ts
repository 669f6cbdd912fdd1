import { join } from 'node:path';
import { anyFreePort } from '../../scripts/free-port';
import { startServerProcess } from '../../scripts/server-process';
import { seedDemo } from '../../scripts/start-database';
import { freshDatabase, type FreshDatabase } from './fresh-database';

const ROOT = join(__dirname, '..', '..');

/** The whole product for one browser spec: the real server with the exported app, on a database of its own. */
export interface ProductServer {
  /** Where a browser finds it, without a slash at the end. */
  origin: string;
  /** As the server signs in to its database. */
  databaseUrl: string;
  /** For looking behind the product's back. */
  database: FreshDatabase;
  /** The demo's sign-ins as its seed prints them, name · role · email · password; empty without the demo. */
  signIns: string[];
  /** The last lines the server wrote. */
  lastLines(): string;
  /** Ends the server and removes the database. */
  stop(): Promise<void>;
}

/**
 * Starts the product on a free port of loopback.
 *
 * @param options demo: lay the demo's data first
 */
export async function startProductServer(options: { demo?: boolean } = {}): Promise<ProductServer> {
  const webFolder = process.env.TEST_WEB_DIR;
  if (!webFolder) throw new Error('there is no exported app: this jest project has no globalSetup that builds it');
  const database = await freshDatabase();
  try {
    const signIns = options.demo === true ? await seedDemo(ROOT, database.url) : [];
    const port = await anyFreePort();
    const origin = `http://localhost:${port}`;
    const environment = {
      DATABASE_URL: database.url,
      APP_URL: origin,
      PORT: String(port),
      HOST: '127.0.0.1',
      JWT_SECRET: 'only for tests: a server that lives as long as one spec',
      WEB_DIR: webFolder,
      NODE_ENV: 'test' as const,
    };
    const server = await startServerProcess(ROOT, environment, () => {});
    return {
      origin,
      databaseUrl: database.url,
      database,
      signIns,
      lastLines: server.lastLines,
      stop: async () => {
        await server.stop();
        await database.drop();
      },
    };
  } catch (error) {
    await database.drop();
    throw error;
  }
}
