import 'reflect-metadata';
import type { Server } from 'node:http';
import { pino } from 'pino';
import { createApp } from './app';
import { readConfig } from './config';
import { createDataSource } from './data-source';
import { Database } from './database/database';
import { refuseUnsafeRole } from './database/refuse-unsafe-role';
import { systemSources } from './dependencies';

/** How long requests in hand may take once the server is asked to end. */
const LAST_REQUESTS_MS = 8_000;

async function main(): Promise<void> {
  const config = readConfig(process.env);
  // To stderr: stdout has the one line that says where the server listens.
  const logger = pino({ level: config.logLevel }, pino.destination(2));
  const source = createDataSource({ url: config.databaseUrl, logger });
  await source.initialize();
  await refuseUnsafeRole(source);
  const app = createApp({ config, database: new Database(source, logger), sources: systemSources, logger });
  const server = app.listen(config.port, config.host, (error) => {
    if (error) return fail(error);
    const address = server.address();
    process.stdout.write(`listening ${typeof address === 'object' && address !== null ? address.port : config.port}\n`);
  });
  const end = async (signal: NodeJS.Signals): Promise<void> => {
    logger.info({ signal }, 'ending');
    await close(server);
    await source.destroy();
  };
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void end(signal).catch(fail));
}

/** Takes no more, lets those in hand finish, then cuts them off. */
function close(server: Server): Promise<void> {
  return new Promise((resolve) => {
    const late = setTimeout(() => server.closeAllConnections(), LAST_REQUESTS_MS);
    server.close(() => {
      clearTimeout(late);
      resolve();
    });
    server.closeIdleConnections();
  });
}

function fail(error: unknown): void {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
}

main().catch(fail);
