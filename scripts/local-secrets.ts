import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Stop } from './announce.mjs';
import { codeOf } from './error-code.mjs';

const NAMES = ['jwtSecret', 'postgresPassword', 'ownerPassword', 'serverPassword'] as const;

/** What a start makes up for itself and keeps to itself: 256 bits each, as text that needs no quoting in a URL. */
export type LocalSecrets = Record<(typeof NAMES)[number], string>;

function isSecrets(value: unknown): value is LocalSecrets {
  return typeof value === 'object' && value !== null && NAMES.every((name) => typeof Reflect.get(value, name) === 'string');
}

function readSecrets(file: string): LocalSecrets {
  try {
    const found: unknown = JSON.parse(readFileSync(file, 'utf8'));
    if (isSecrets(found)) return found;
  } catch (error) {
    if (codeOf(error) !== undefined) throw new Stop(`${file} cannot be read: run this as the user who ran it first, or as root.`);
    if (!(error instanceof SyntaxError)) throw error;
  }
  throw new Stop(`${file} is damaged. Move it away, and the next start makes new secrets: everyone then signs in anew.`);
}

/**
 * Reads the secrets of a clone, or makes them.
 *
 * @param folder the clone's `.data`
 * @returns fresh: they were made just now, and an older database does not know them yet
 */
export function localSecrets(folder: string): { secrets: LocalSecrets; fresh: boolean } {
  const file = join(folder, 'secrets.json');
  if (existsSync(file)) return { secrets: readSecrets(file), fresh: false };
  const make = (): string => randomBytes(32).toString('base64url');
  const secrets: LocalSecrets = { jwtSecret: make(), postgresPassword: make(), ownerPassword: make(), serverPassword: make() };
  const partial = `${file}.${process.pid}`;
  writeFileSync(partial, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
  renameSync(partial, file);
  return { secrets, fresh: true };
}
