import { createWriteStream, existsSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { step, Stop } from './announce.mjs';
import { dataFolder } from './cluster-place';
import { portFrom, readPort } from './free-port';
import { localSecrets } from './local-secrets';
import { startServerProcess, type ServerProcess } from './server-process';
import { migrate, seedDemo, startDatabase, type StartDatabase } from './start-database';
import { ensureWebApp } from './web-export';

const LARGEST_LOG = 10 * 1024 * 1024;

/** A product that runs. */
export interface RunningProduct {
  address: string;
  /** Resolves when the server has ended, which it should not of itself. */
  ended: Promise<number | null>;
  stop(): Promise<void>;
}

/** Lays the demo into an empty database. It says its sign-ins only then, so they are kept: a later start shows them again. */
async function layDemo(root: string, database: StartDatabase): Promise<string[]> {
  const said = await step('Laying the demo if the database is empty', () => seedDemo(root, database.url));
  const file = join(dataFolder(root), 'demo-sign-ins.txt');
  if (said.length > 0) writeFileSync(file, said.join('\n'), { mode: 0o600 });
  return existsSync(file) ? readFileSync(file, 'utf8').split('\n') : [];
}

/** Sign-ins in columns. */
export function signInTable(lines: string[]): string {
  const rows = lines.map((line) => line.split(' · '));
  const widthOf = (column: number): number => Math.max(...rows.map((row) => row[column]?.length ?? 0));
  return rows.map((row) => `  ${row.map((cell, column) => cell.padEnd(widthOf(column))).join('   ')}`.trimEnd()).join('\n');
}

function wantedPort(): number {
  const wanted = readPort(process.env.PORT);
  if (wanted === undefined)
    throw new Stop(`PORT is "${process.env.PORT}", which is no port: it must be a number from 1 to 65535.`);
  return wanted;
}

async function freePortFrom(wanted: number): Promise<number> {
  const port = await portFrom(wanted);
  if (port !== wanted) console.log(`  Port ${wanted} is taken by another program, so this is on ${port}.`);
  return port;
}

/** Opens the server's log for adding to; one that grew large is kept aside as `.old`. */
function openLog(file: string): (chunk: string) => void {
  if (existsSync(file) && statSync(file).size > LARGEST_LOG) renameSync(file, `${file}.old`);
  const log = createWriteStream(file, { flags: 'a', mode: 0o600 });
  return (chunk) => void log.write(chunk);
}

async function startServer(
  root: string,
  database: StartDatabase,
  webFolder: string,
  wanted: number,
): Promise<ServerProcess & { address: string }> {
  const data = dataFolder(root);
  const port = await freePortFrom(wanted);
  const address = process.env.APP_URL || `http://localhost:${port}`;
  const environment = {
    DATABASE_URL: database.url,
    APP_URL: address,
    PORT: String(port),
    HOST: '127.0.0.1',
    JWT_SECRET: process.env.JWT_SECRET || localSecrets(data).secrets.jwtSecret,
    WEB_DIR: webFolder,
    NODE_ENV: process.env.NODE_ENV ?? 'production',
  };
  const server = await step('Starting the server', () =>
    startServerProcess(root, environment, openLog(join(data, 'server.log'))),
  );
  return { ...server, address };
}

function sayReady(root: string, address: string, signIns: string[], began: number): void {
  const seconds = ((performance.now() - began) / 1000).toFixed(1);
  console.log(`\nTallyrod runs at ${address}  (up in ${seconds} s)\n`);
  if (signIns.length > 0)
    console.log(`Sign in to the demo as one of these (name, role, email, password):\n\n${signInTable(signIns)}\n`);
  console.log(`What the server writes goes to ${join(root, '.data', 'server.log')}. Ctrl-C ends everything.`);
}

/**
 * Brings the whole product up: database, migrations, demo, web app, server.
 *
 * @param began when the command was typed, on the clock of `performance.now()`
 * @throws Stop with a sentence when a part does not come up; what had come up is ended first
 */
export async function startProduct(root: string, began: number): Promise<RunningProduct> {
  const wanted = wantedPort();
  const database = await startDatabase(root);
  try {
    await step('Bringing the database up to date', () => migrate(root, database.ownerUrl));
    const webFolder = await ensureWebApp(root);
    // Side by side: each takes seconds to load its code, and neither waits for the other.
    const [demo, started] = await Promise.allSettled([layDemo(root, database), startServer(root, database, webFolder, wanted)]);
    if (started.status === 'rejected') throw started.reason;
    const server = started.value;
    if (demo.status === 'rejected') {
      await server.stop();
      throw demo.reason;
    }
    sayReady(root, server.address, demo.value, began);
    return {
      address: server.address,
      ended: server.ended.then((code) => {
        if (code !== 0) console.error(`\nThe end of what the server wrote:\n${server.lastLines()}`);
        return code;
      }),
      stop: async () => {
        await server.stop();
        await database.stop();
      },
    };
  } catch (error) {
    await database.stop();
    throw error;
  }
}
