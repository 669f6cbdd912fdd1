import { spawn, type ChildProcess } from 'node:child_process';
import { join } from 'node:path';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

const ROOT = join(__dirname, '..', '..');

let database: FreshDatabase;
beforeAll(async () => {
  database = await freshDatabase();
});
afterAll(() => database.drop());

const environment = (change: Record<string, string> = {}): NodeJS.ProcessEnv => ({
  NODE_ENV: 'production',
  PATH: process.env.PATH,
  DATABASE_URL: database.url,
  APP_URL: 'http://localhost:4870',
  PORT: '0',
  JWT_SECRET: 'a secret of tests, thirty-two or more',
  LOG_LEVEL: 'warn',
  ...change,
});

interface Run {
  child: ChildProcess;
  /** Resolves with the port once it listens, or with null when it ends before. */
  port: Promise<number | null>;
  ended: Promise<number | null>;
  said(): string;
}

function run(env: NodeJS.ProcessEnv): Run {
  const child = spawn(process.execPath, ['--import', 'tsx', join(ROOT, 'server', 'main.ts')], { cwd: ROOT, env });
  let text = '';
  const ended = new Promise<number | null>((resolve) => child.on('close', resolve));
  const port = new Promise<number | null>((resolve) => {
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (chunk: string) => {
        text += chunk;
        const line = /^listening (\d+)$/m.exec(text);
        if (line) resolve(Number(line[1]));
      });
    }
    void ended.then(() => resolve(null));
  });
  return { child, port, ended, said: () => text };
}

describe('the server as a process', () => {
  it('says where it listens, answers, and ends in order when asked to', async () => {
    const server = run(environment());
    const port = await server.port;
    const response = await fetch(`http://127.0.0.1:${port}/api/health`);
    expect([response.status, await response.json()]).toEqual([200, { ok: true, database: 'answers' }]);
    server.child.kill('SIGTERM');
    expect(await server.ended).toBe(0);
    expect(server.said()).toBe(`listening ${port}\n`);
  }, 60_000);

  it('will not start as a superuser', async () => {
    const server = run(environment({ DATABASE_URL: database.superUrl }));
    expect([await server.port, await server.ended]).toEqual([null, 1]);
    expect(server.said()).toContain('superuser');
  }, 60_000);

  it('names what is wrong with its environment, and tells no secret', async () => {
    const server = run(environment({ JWT_SECRET: 'short secret', APP_URL: 'http://tallyrod.test', PORT: '70000' }));
    expect([await server.port, await server.ended]).toEqual([null, 1]);
    for (const name of ['JWT_SECRET', 'APP_URL', 'PORT']) expect(server.said()).toContain(name);
    expect(server.said()).not.toContain('short secret');
  }, 60_000);
});
