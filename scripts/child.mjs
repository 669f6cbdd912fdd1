import { spawn } from 'node:child_process';
import { Stop } from './announce.mjs';

/** Children that still run, so that a signal can end them together. @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

/** Whether `endRunning` was called: from then on nothing new begins but what ends things. */
let ending = false;

/**
 * Runs a command to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {import('node:child_process').SpawnOptions & { show?: boolean; evenWhenEnding?: boolean }} [options] show: the command
 *   writes to this terminal, otherwise what it writes is returned; evenWhenEnding: `endRunning` neither ends nor prevents it
 * @returns {Promise<{ code: number; output: string }>} code is 128 + signal's number (as a shell says it) when a signal ended it
 */
export function run(command, args, { show = false, evenWhenEnding = false, ...options } = {}) {
  if (ending && !evenWhenEnding) return Promise.reject(new Stop('Ended before it was finished.'));
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: show ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'pipe', 'pipe'],
      ...options,
    });
    let output = '';
    if (!evenWhenEnding) running.add(child);
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => {
      running.delete(child);
      reject(error);
    });
    child.on('close', (code) => {
      running.delete(child);
      resolve({ code: code ?? 128, output });
    });
  });
}

/** Asks every command that still runs to end, and lets no other begin. Their `run` calls then resolve with a code that is not 0. */
export function endRunning() {
  ending = true;
  for (const child of running) child.kill('SIGTERM');
}
