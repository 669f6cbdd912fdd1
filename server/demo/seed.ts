import 'reflect-metadata';
import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { createDataSource } from '../data-source';
import { refuseUnsafeRole } from '../database/refuse-unsafe-role';
import { Company } from '../entities/people';
import { hireCrew } from './demo-crew';
import { hillsideBarn, northWorkshop, orchardRow } from './demo-footings';
import { buyInstruments } from './demo-instruments';
import { demoSources } from './demo-sources';
import { inOneTransaction } from './one-transaction';

/** Which chance the demo is made of: any number but 0. */
const SEED = 20_261_109;

/**
 * `node --import tsx server/demo/seed.ts` lays the demo into an empty database of DATABASE_URL, by the services that the API calls, and prints its
 * sign-ins as `name · role · email · password`. Where there is a company already it does nothing and says nothing.
 */
export async function seedDemo(source: DataSource): Promise<string[]> {
  return inOneTransaction(source, async (database) => {
    if (await database.asIdentity((manager) => manager.existsBy(Company, {}))) return [];
    const sources = demoSources(SEED);
    sources.moveTo('2026-11-09T12:30:00Z');
    const crew = await hireCrew(database, sources);
    const instruments = await buyInstruments(crew);
    const demo = { crew, sources, instruments };
    await orchardRow(demo);
    await northWorkshop(demo);
    await hillsideBarn(demo);
    return crew.signIns;
  });
}

async function main(url: string): Promise<void> {
  const source = createDataSource({
    url,
    logger: pino({ level: 'warn' }, pino.destination(2)),
    poolSize: 1,
    patience: 'of-a-migration',
  });
  await source.initialize();
  try {
    await refuseUnsafeRole(source);
    for (const signIn of await seedDemo(source)) process.stdout.write(`${signIn}\n`);
  } finally {
    await source.destroy();
  }
}

const url = process.env.DATABASE_URL;
if (require.main === module) {
  if (url === undefined || url === '') {
    process.stderr.write('DATABASE_URL is not set.\n');
    process.exitCode = 2;
  } else {
    main(url).catch((error: unknown) => {
      process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
      process.exitCode = 1;
    });
  }
}
