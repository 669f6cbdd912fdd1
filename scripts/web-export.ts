import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, statSync, utimesSync } from 'node:fs';
import { join } from 'node:path';
import { step, Stop } from './announce.mjs';
import { run } from './child.mjs';
import { precompress } from './precompress';

/** Everything the exported app is made of. What is not here may change without a new export. */
export const WEB_SOURCES = [
  'app',
  'components',
  'hooks',
  'constants',
  'shared',
  'analysis',
  'assets',
  'app.json',
  'metro.config.js',
  'babel.config.js',
  'tsconfig.json',
  'package-lock.json',
];

/** Exports kept beside the newest, for an older start that still serves one. */
const KEPT = 3;

function filesUnder(path: string): string[] {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(join(path, name)));
}

/**
 * A fingerprint of the names and contents of sources: it changes when a file is added, removed, renamed or edited, and by nothing else.
 *
 * @returns 16 hexadecimal digits
 */
export function hashSources(root: string, sources: readonly string[] = WEB_SOURCES): string {
  const hash = createHash('sha256');
  for (const source of sources) {
    for (const file of filesUnder(join(root, source))) {
      const content = readFileSync(file);
      hash.update(`${file.slice(root.length)}\0${content.length}\0`).update(content);
    }
  }
  return hash.digest('hex').slice(0, 16);
}

/** The finished export of the present sources; undefined when they have changed since, or it was never made. */
export function currentExport(root: string): string | undefined {
  const folder = join(root, 'dist', hashSources(root));
  return existsSync(join(folder, 'index.html')) ? folder : undefined;
}

function removeOldExports(dist: string, current: string): void {
  const others = readdirSync(dist, { withFileTypes: true })
    .filter((entry) => entry.isDirectory() && /^[0-9a-f]{16}$/.test(entry.name) && entry.name !== current)
    .map(({ name }) => ({ path: join(dist, name), made: statSync(join(dist, name)).mtimeMs }))
    .sort((a, b) => b.made - a.made);
  for (const { path } of others.slice(KEPT)) rmSync(path, { recursive: true });
}

async function exportWebApp(root: string, dist: string, name: string): Promise<void> {
  const partial = join(dist, `partial-${process.pid}`);
  rmSync(partial, { recursive: true, force: true });
  // Metro's cache under the clone: one in the system's temporary folder belongs to whichever user came first.
  const cache = join(root, 'node_modules', '.cache', 'web-export');
  mkdirSync(cache, { recursive: true });
  const env = {
    ...process.env,
    EXPO_NO_TELEMETRY: '1',
    EXPO_OFFLINE: '1',
    CI: '1',
    NODE_ENV: 'production' as const,
    TMPDIR: cache,
  };
  const expo = join(root, 'node_modules', 'expo', 'bin', 'cli');
  const { code, output } = await run(process.execPath, [expo, 'export', '-p', 'web', '--output-dir', partial], {
    cwd: root,
    env,
  });
  if (code !== 0 || !existsSync(join(partial, 'index.html'))) {
    rmSync(partial, { recursive: true, force: true });
    throw new Stop(`The web app could not be built:\n${output}`);
  }
  await precompress(partial);
  // One name a content: an export in use is never written to, and a half-made one never has a name that is served.
  const target = join(dist, name);
  if (existsSync(join(target, 'index.html'))) {
    // Another run finished the same content meanwhile, and may be serving it.
    rmSync(partial, { recursive: true });
    return;
  }
  rmSync(target, { recursive: true, force: true });
  renameSync(partial, target);
}

/**
 * The folder of the exported web app for the present sources, with compressed copies beside its files. Built when they have changed.
 *
 * @throws Stop with what the exporter said when it cannot be built
 */
export async function ensureWebApp(root: string): Promise<string> {
  const ready = currentExport(root);
  if (ready !== undefined) {
    utimesSync(ready, new Date(), new Date());
    return ready;
  }
  const dist = join(root, 'dist');
  mkdirSync(dist, { recursive: true });
  for (const left of readdirSync(dist).filter((name) => name.startsWith('partial-'))) {
    if (!existsSync(`/proc/${left.slice('partial-'.length)}`)) rmSync(join(dist, left), { recursive: true });
  }
  const name = hashSources(root);
  await step('Building the web app, since its sources changed (up to a minute)', () => exportWebApp(root, dist, name));
  removeOldExports(dist, name);
  return join(dist, name);
}
