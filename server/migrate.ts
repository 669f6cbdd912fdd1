import 'reflect-metadata';
import { pino } from 'pino';
import { createDataSource } from './data-source';

/**
 * `node --import tsx server/migrate.ts` brings the database of MIGRATION_DATABASE_URL (signed in as its owner) up to date;
 * with `--down` it takes all of it back, newest first. Two at once wait for one another.
 */
async function migrate(url: string, down: boolean): Promise<string[]> {
  const source = createDataSource({
    url,
    logger: pino({ level: 'warn' }, pino.destination(2)),
    poolSize: 2,
    patience: 'of-a-migration',
  });
  await source.initialize();
  const lock = source.createQueryRunner();
  try {
    await lock.connect();
    await lock.query(`select pg_advisory_lock(hashtext('tallyrod migrations'))`);
    if (!down) return (await source.runMigrations({ transaction: 'each' })).map((migration) => migration.name);
    const undone = source.migrations.map((migration) => migration.name ?? migration.constructor.name).reverse();
    const there: { name: string }[] = await source.query('select name from migrations');
    const names = undone.filter((name) => there.some((row) => row.name === name));
    for (const name of names) {
      await source.undoLastMigration({ transaction: 'each' });
      process.stdout.write(`undone ${name}\n`);
    }
    return [];
  } finally {
    // The lock goes with its connection.
    await lock.release();
    await source.destroy();
  }
}

const url = process.env.MIGRATION_DATABASE_URL;
if (url === undefined || url === '') {
  process.stderr.write('MIGRATION_DATABASE_URL is not set: the database, signed in to as its owner.\n');
  process.exitCode = 2;
} else {
  migrate(url, process.argv.includes('--down')).then(
    (names) => names.forEach((name) => process.stdout.write(`migrated ${name}\n`)),
    (error: unknown) => {
      process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
      process.exitCode = 1;
    },
  );
}
