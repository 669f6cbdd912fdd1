import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

jest.setTimeout(60_000);

const SCRIPTS = join(__dirname, '..', '..', 'scripts');

/** Everything a process and those below it write; resolved when the last of them has ended, since each holds the pipe open. */
function written(child: ChildProcess): { until: (text: string) => Promise<void>; all: Promise<string> } {
  let output = '';
  child.stdout?.setEncoding('utf8').on('data', (chunk: string) => (output += chunk));
  return {
    until: async (text) => {
      while (!output.includes(text) && child.stdout) await once(child.stdout, 'data');
    },
    all: new Promise((resolve) => child.on('close', () => resolve(output))),
  };
}

describe('nothing is left behind when the one above is ended', () => {
  let folder: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'ending-'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  const lay = (name: string, code: string): string => {
    writeFileSync(join(folder, name), code);
    return join(folder, name);
  };
  const layWaiting = (): string =>
    lay(
      'waiting.mjs',
      `import { whenAskedToEnd } from ${JSON.stringify(pathToFileURL(join(SCRIPTS, 'end-requests.mjs')).href)};
       setInterval(() => {}, 1000);
       let times = 0;
       whenAskedToEnd(() => {
         times += 1;
         console.log('asked ' + times);
         setTimeout(() => process.exit(), 1200);
       });
       console.log('ready');`,
    );
  const start = (env: Record<string, string>): ChildProcess =>
    // The shell waits for it, as npm's does, instead of becoming it.
    spawn('sh', ['-c', `"${process.execPath}" "${layWaiting()}"; true`], { env: { ...process.env, ...env }, detached: true });

  it('a command ends with the shell that npm put above it, though that passes nothing on', async () => {
    const shell = start({ npm_lifecycle_event: 'start' });
    const { until, all } = written(shell);
    await until('ready');
    shell.kill('SIGKILL');
    expect(await all).toBe('ready\nasked 1\n');
  });

  it('a Ctrl-C that arrives twice, from the terminal and from npm, counts once', async () => {
    const shell = start({ npm_lifecycle_event: 'start' });
    const { until, all } = written(shell);
    await until('ready');
    // To the whole group, as a terminal does.
    if (shell.pid === undefined) throw new Error('it did not start');
    process.kill(-shell.pid, 'SIGINT');
    await until('asked');
    expect(await all).toBe('ready\nasked 1\n');
  });

  it('a server ends when the command that started it was killed', async () => {
    const server = lay('server.mjs', `setInterval(() => {}, 1000); console.log('up');`);
    const options = JSON.stringify({
      execArgv: ['--import', pathToFileURL(join(SCRIPTS, 'end-with-parent.mjs')).href],
      detached: true,
    });
    const command = lay(
      'command.mjs',
      `import { fork } from 'node:child_process'; fork(${JSON.stringify(server)}, ${options}); setInterval(() => {}, 1000);`,
    );
    const parent = spawn(process.execPath, [command]);
    const { until, all } = written(parent);
    await until('up');
    parent.kill('SIGKILL');
    expect(await all).toBe('up\n');
  });

  it('a server that has finished is not kept alive by watching the command', async () => {
    const server = lay('server.mjs', `console.log('done');`);
    const options = JSON.stringify({ execArgv: ['--import', pathToFileURL(join(SCRIPTS, 'end-with-parent.mjs')).href] });
    const command = lay(
      'command.mjs',
      `import { fork } from 'node:child_process';
       fork(${JSON.stringify(server)}, ${options}).on('exit', (code) => { console.log('ended ' + code); process.exit(); });`,
    );
    expect(await written(spawn(process.execPath, [command])).all).toBe('done\nended 0\n');
  });
});
