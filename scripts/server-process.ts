import { fork, type ChildProcess } from 'node:child_process';
import { join } from 'node:path';
import { Stop } from './announce.mjs';

/** What the server reads from its environment. Everything is text, as environments are. */
export interface ServerEnvironment {
  DATABASE_URL: string;
  APP_URL: string;
  PORT: string;
  HOST: string;
  JWT_SECRET: string;
  WEB_DIR: string;
  NODE_ENV: 'development' | 'production' | 'test';
}

/** A server that accepts requests. */
export interface ServerProcess {
  port: number;
  /** Resolves when it has ended, of itself or by `stop`. */
  ended: Promise<number | null>;
  /** Asks it to end, and after ten seconds makes it. */
  stop(): Promise<void>;
  /** The last lines it wrote. */
  lastLines(): string;
}

const STARTS_WITHIN_MS = 60_000;
const ENDS_WITHIN_MS = 10_000;
const KEPT_LINES = 40;

/** Keeps the end of what a process writes. */
function tailOf(): { add(chunk: string): void; text(): string } {
  let kept = '';
  return {
    add: (chunk) => {
      kept = (kept + chunk).split('\n').slice(-KEPT_LINES).join('\n');
    },
    text: () => kept.trim(),
  };
}

/** Resolves to the port once the server says that it listens. */
function waitUntilListening(child: ChildProcess, tail: () => string): Promise<number> {
  return new Promise((resolve, reject) => {
    const late = setTimeout(() => {
      child.kill('SIGKILL');
      reject(new Stop(`The server did not accept requests within ${STARTS_WITHIN_MS / 1000} s:\n${tail()}`));
    }, STARTS_WITHIN_MS);
    let said = '';
    const listen = (chunk: string): void => {
      said += chunk;
      const line = /^listening (\d+)\r?$/m.exec(said);
      if (line === null) return;
      clearTimeout(late);
      child.stdout?.off('data', listen);
      resolve(Number(line[1]));
    };
    child.stdout?.on('data', listen);
    child.on('error', reject);
    child.on('close', (code, signal) => {
      clearTimeout(late);
      reject(new Stop(`The server ended (${signal ?? `code ${code}`}) before it accepted requests:\n${tail()}`));
    });
  });
}

/**
 * Starts the server and waits until it accepts requests, which it says by a line `listening <port>`.
 *
 * It gets a session of its own, so that Ctrl-C reaches it only through `stop`, in order; and it ends by itself when this process does.
 *
 * @param environment what the server reads; laid over this process's own
 * @param onOutput gets everything the server writes
 * @throws Stop with the last lines it wrote when it ends before it accepts
 */
export async function startServerProcess(
  root: string,
  environment: ServerEnvironment,
  onOutput: (chunk: string) => void,
): Promise<ServerProcess> {
  const child = fork(join(root, 'server', 'main.ts'), {
    cwd: root,
    // The right to change tables stays with migrations.
    env: { ...process.env, ...environment, MIGRATION_DATABASE_URL: undefined },
    execArgv: ['--import', 'tsx', '--import', './scripts/end-with-parent.mjs'],
    detached: true,
    silent: true,
  });
  const tail = tailOf();
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (chunk: string) => {
      tail.add(chunk);
      onOutput(chunk);
    });
  }
  const ended = new Promise<number | null>((resolve) => child.on('close', resolve));
  const stop = async (): Promise<void> => {
    if (child.exitCode !== null || child.signalCode !== null) return;
    const force = setTimeout(() => child.kill('SIGKILL'), ENDS_WITHIN_MS);
    child.kill('SIGTERM');
    await ended;
    clearTimeout(force);
  };
  const port = await waitUntilListening(child, tail.text);
  return { port, ended, stop, lastLines: tail.text };
}
