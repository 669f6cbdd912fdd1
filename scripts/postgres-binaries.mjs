import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

/** Where Debian lays PostgreSQL's programs: one folder for each major version, none of them on PATH. */
export const DEBIAN_POSTGRES = '/usr/lib/postgresql';

/**
 * The folder of PostgreSQL's programs.
 * @param {string} [version] the major version that made an existing cluster; without it the newest installed
 * @param {string} [base] the folder of versions
 * @returns {string | undefined} undefined when it is not installed
 */
export function postgresBinaries(version, base = DEBIAN_POSTGRES) {
  if (!existsSync(base)) return undefined;
  const versions = readdirSync(base)
    .filter((name) => /^\d+$/.test(name) && (version === undefined || name === version))
    .sort((a, b) => Number(b) - Number(a));
  return versions
    .map((name) => join(base, name, 'bin'))
    .find((folder) => ['initdb', 'pg_ctl', 'postgres'].every((program) => existsSync(join(folder, program))));
}
