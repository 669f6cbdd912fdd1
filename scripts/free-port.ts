import { createServer } from 'node:net';
import { codeOf } from './error-code.mjs';

/** The port of `npm start` when PORT says nothing. */
export const DEFAULT_PORT = 4870;

/** What `localhost` may mean to a browser. A port that somebody else has on either is not ours to print. */
const LOOPBACKS = ['127.0.0.1', '::1'];

const hasCode = (error: unknown, ...codes: string[]): boolean => codes.includes(codeOf(error) ?? '');

/** Binds a port for an instant. Resolves to the port bound, or undefined when it is taken or may not be bound. */
function tryPort(port: number, host: string): Promise<number | undefined> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', (error) => {
      if (hasCode(error, 'EADDRINUSE', 'EACCES')) resolve(undefined);
      else if (host === '::1' && hasCode(error, 'EADDRNOTAVAIL', 'EAFNOSUPPORT')) resolve(port);
      else reject(error);
    });
    server.listen({ port, host, exclusive: true }, () => {
      const address = server.address();
      const bound = typeof address === 'object' && address !== null ? address.port : port;
      server.close(() => resolve(bound));
    });
  });
}

/** Whether nobody listens on this port of any loopback address. */
export async function isPortFree(port: number): Promise<boolean> {
  for (const host of LOOPBACKS) if ((await tryPort(port, host)) === undefined) return false;
  return true;
}

/** A port of the system's choice that is free on every loopback address. */
export async function anyFreePort(): Promise<number> {
  for (let attempt = 0; attempt < 20; attempt += 1) {
    const port = await tryPort(0, '127.0.0.1');
    if (port !== undefined && (await isPortFree(port))) return port;
  }
  throw new Error('no free port on loopback');
}

/**
 * Reads PORT.
 *
 * @returns the port wanted, DEFAULT_PORT when the text is absent or empty, undefined when it is no port
 */
export function readPort(text: string | undefined): number | undefined {
  if (text === undefined || text.trim() === '') return DEFAULT_PORT;
  const port = /^\d{1,5}$/.test(text.trim()) ? Number(text.trim()) : 0;
  return port >= 1 && port <= 65535 ? port : undefined;
}

/**
 * The wanted port, or the first free one above it.
 *
 * @param isFree asked for each in turn
 * @throws Error when none of the next hundred is free
 */
export async function portFrom(wanted: number, isFree: (port: number) => Promise<boolean> = isPortFree): Promise<number> {
  const last = Math.min(wanted + 100, 65535);
  for (let port = wanted; port <= last; port += 1) if (await isFree(port)) return port;
  throw new Error(`no free port from ${wanted} to ${last}`);
}
