import { DataSource } from 'typeorm';
import type { Logger } from 'pino';
import * as footings from './entities/footings';
import * as instruments from './entities/instruments';
import * as jobs from './entities/jobs';
import * as people from './entities/people';
import * as rounds from './entities/rounds';
import { People1764579600000 } from './migrations/1764579600000-people';
import { JobsAndFootings1764580200000 } from './migrations/1764580200000-jobs-and-footings';
import { RoundsAndRecords1764580800000 } from './migrations/1764580800000-rounds-and-records';
import { SnakeNaming } from './snake-naming';

export interface DataSourceOptions {
  url: string;
  /** Takes what goes wrong with a connection that nobody is using: it is replaced, and the process lives. */
  logger: Pick<Logger, 'warn'>;
  poolSize?: number;
  /** A request may not hold others up for long; a migration takes as long as it takes. */
  patience?: 'of-a-request' | 'of-a-migration';
}

const REQUEST_TIMEOUTS = { statement_timeout: 20_000, lock_timeout: 10_000, idle_in_transaction_session_timeout: 30_000 };

const entities = [footings, instruments, jobs, people, rounds].flatMap((module) => Object.values(module));

/** The database as the server uses it, or, by the owner's URL, as migrations do. Nothing is ever synchronized from entities. */
export function createDataSource({ url, logger, poolSize = 10, patience = 'of-a-request' }: DataSourceOptions): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    applicationName: 'tallyrod',
    entities,
    migrations: [People1764579600000, JobsAndFootings1764580200000, RoundsAndRecords1764580800000],
    migrationsTableName: 'migrations',
    namingStrategy: new SnakeNaming(),
    synchronize: false,
    logging: false,
    poolSize,
    // Ours come from the phone or from `deps.newId`: the server needs no extension, and may not create one.
    installExtensions: false,
    poolErrorHandler: (error: unknown) => logger.warn({ err: error }, 'a resting database connection broke'),
    extra: {
      connectionTimeoutMillis: 5_000,
      keepAlive: true,
      ...(patience === 'of-a-request' ? REQUEST_TIMEOUTS : {}),
    },
  });
}
