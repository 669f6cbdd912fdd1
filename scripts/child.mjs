import { spawn } from 'node:child_process';
import { Stop } from './announce.mjs';

/**
 * What runs, and whether it is to end: from then on nothing new begins but what ends things. Kept on `globalThis`, since one process holds this
 * file twice: loaded as a module by start.mjs and test.mjs, and by `require` from what tsx compiles.
 * @type {{ running: Set<import('node:child_process').ChildProcess>; ending: boolean }}
 */
const children = (globalThis[Symbol.for('tallyrod.children')] ??= { running: new Set(), ending: false });

/**
 * Runs a command to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {import('node:child_process').SpawnOptions & { show?: boolean; evenWhenEnding?: boolean }} [options] show: the command
 *   writes to this terminal, otherwise what it writes is returned; evenWhenEnding: `endRunning` neither ends nor prevents it
 * @returns {Promise<{ code: number; output: string }>} code is 128 + signal's number (as a shell says it) when a signal ended it
 */
export function run(command, args, { show = false, evenWhenEnding = false, ...options } = {}) {
  if (children.ending && !evenWhenEnding) return Promise.reject(new Stop('Ended before it was finished.'));
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: show ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'pipe', 'pipe'],
      ...options,
    });
    let output = '';
    if (!evenWhenEnding) children.running.add(child);
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => {
      children.running.delete(child);
      reject(error);
    });
    child.on('close', (code) => {
      children.running.delete(child);
      resolve({ code: code ?? 128, output });
    });
  });
}

/** Asks every command that still runs to end, and lets no other begin. Their `run` calls then resolve with a code that is not 0. */
export function endRunning() {
  children.ending = true;
  for (const child of children.running) child.kill('SIGTERM');
}
