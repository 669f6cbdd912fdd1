import { createHash } from 'node:crypto';
import { existsSync, lstatSync, mkdirSync, realpathSync } from 'node:fs';
import { join } from 'node:path';
import { Stop } from './announce.mjs';
import { canReach, isRoot, systemUser } from './system-user';

/** Makes the folder of everything that a start keeps. Others may pass through it (PostgreSQL's user has to) but not look into it. */
export function dataFolder(root: string): string {
  const folder = join(root, '.data');
  mkdirSync(folder, { recursive: true, mode: 0o711 });
  return folder;
}

/** The folder outside the clone, the same at each start of this clone. */
export const outsideFolder = (root: string): string =>
  `/var/tmp/tallyrod-${createHash('sha256').update(realpathSync(root)).digest('hex').slice(0, 12)}`;

/** /var/tmp is open to all: a folder that somebody else laid there under our name would give them the database. */
function refuseStrangers(folder: string, ours: number[]): void {
  if (!existsSync(folder)) return;
  const found = lstatSync(folder);
  if (!found.isDirectory() || !ours.includes(found.uid)) {
    throw new Stop(`${folder} is where the database would lie, but another user (number ${found.uid}) made it. Remove it first.`);
  }
}

/**
 * Where this clone's PostgreSQL lies: `.data/postgres`; or, for a root whose clone PostgreSQL's own user cannot reach (some folder above it
 * is closed), a folder in /var/tmp.
 *
 * @returns outside: whether it is the latter, which the person is told
 */
export function placeForCluster(root: string): { folder: string; outside: boolean } {
  const inside = join(dataFolder(root), 'postgres');
  const postgres = isRoot() ? systemUser('postgres') : undefined;
  if (postgres === undefined || canReach(postgres, dataFolder(root))) return { folder: inside, outside: false };
  const folder = outsideFolder(root);
  refuseStrangers(folder, [0, postgres.uid]);
  return { folder, outside: true };
}
