import { randomBytes } from 'node:crypto';
import { v7 } from 'uuid';
import type { Logger } from 'pino';
import type { Config } from './config';
import type { Database } from './database/database';

/** Whence the server takes time and chance. */
export interface Sources {
  now(): Date;
  randomBytes(count: number): Uint8Array;
}

export const systemSources: Sources = { now: () => new Date(), randomBytes: (count) => randomBytes(count) };

/** A UUIDv7: keys made one after another lie beside one another in the index. */
export function newId(sources: Sources): string {
  return v7({ msecs: sources.now().getTime(), random: sources.randomBytes(16) });
}

export interface Dependencies {
  config: Pick<Config, 'appUrl' | 'jwtSecret' | 'webDir' | 'trustProxy'>;
  database: Database;
  sources: Sources;
  logger: Logger;
}
