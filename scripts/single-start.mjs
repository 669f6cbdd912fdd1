/**
 * One start at a time for one clone. The mark is a listening socket in Linux's abstract namespace: taken in one step, and gone with the
 * process that held it however it ended, so there is no stale lock file to judge.
 */
import { createHash } from 'node:crypto';
import { realpathSync } from 'node:fs';
import { connect, createServer } from 'node:net';
import { codeOf } from './error-code.mjs';

/** @typedef {{ pid: number; address: string | null }} Running address: null while that start is still on its way up */

/** @param {string} root */
const socketName = (root) => `\0tallyrod-start-${createHash('sha256').update(realpathSync(root)).digest('hex').slice(0, 24)}`;

/**
 * @param {string} name
 * @param {Running} mine
 * @returns {Promise<import('node:net').Server | undefined>} undefined when another process holds the mark
 */
function take(name, mine) {
  return new Promise((resolve, reject) => {
    const server = createServer((socket) => {
      socket.on('error', () => socket.destroy());
      socket.end(JSON.stringify(mine));
    });
    server.on('error', (error) => (codeOf(error) === 'EADDRINUSE' ? resolve(undefined) : reject(error)));
    server.listen(name, () => resolve(server.unref()));
  });
}

/**
 * @param {string} name
 * @returns {Promise<Running | undefined>} undefined when it ended between our two questions
 */
function ask(name) {
  return new Promise((resolve) => {
    let answer = '';
    const socket = connect(name);
    socket.setTimeout(5000, () => socket.destroy());
    socket.on('data', (chunk) => (answer += chunk));
    socket.on('error', () => resolve(undefined));
    socket.on('close', () => resolve(answer === '' ? undefined : JSON.parse(answer)));
  });
}

/**
 * Takes the mark, or tells who has it.
 * @param {string} root the clone
 * @returns {Promise<{ running: Running } | { setAddress: (address: string) => void; release: () => void }>}
 */
export async function takeSingleStart(root) {
  const name = socketName(root);
  const mine = { pid: process.pid, address: /** @type {string | null} */ (null) };
  for (let attempt = 0; attempt < 10; attempt += 1) {
    const server = await take(name, mine);
    if (server !== undefined)
      return { setAddress: (address) => void (mine.address = address), release: () => void server.close() };
    const running = await ask(name);
    if (running !== undefined) return { running };
  }
  throw new Error('another start of this clone holds its mark but does not answer');
}
