import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { extname, join, relative, sep } from 'node:path';
import type { Request, RequestHandler, Response } from 'express';

/** Names under these have a hash of their content in them: what is behind one never changes. */
const HASHED = /^\/(_expo\/static|assets)\/.*[.-][0-9a-f]{20,}\./;
const FOR_EVER = 'public, max-age=31536000, immutable';
/** Asked about each time, and answered by 304 while it is the same. */
const ASK_AGAIN = 'no-cache';

const ENCODINGS = [
  { name: 'br', ending: '.br' },
  { name: 'gzip', ending: '.gz' },
] as const;

interface WebFile {
  path: string;
  etag: string;
  encodings: readonly (typeof ENCODINGS)[number][];
}

/**
 * Serves the exported web app of a folder, as it lay there when the server started: compressed as the browser takes it, and
 * `index.html` for every address that is no file's, because the app has routes of its own. An address that ends like a file and is none is not found:
 * a missing script that came back as a page would be run as one.
 */
export function serveWeb(folder: string): RequestHandler {
  const files = readFiles(folder);
  const page = files.get('/index.html');
  if (page === undefined) throw new Error(`${folder} has no index.html: it is not an exported web app`);
  return (request, response, next) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') return next();
    const path = decodedPath(request);
    const file = path === null ? undefined : (files.get(path) ?? (extname(path) === '' ? page : undefined));
    if (file === undefined || path === null) return void response.status(404).type('text/plain').send('Not found');
    send(request, response, file, HASHED.test(path) ? FOR_EVER : ASK_AGAIN, next);
  };
}

function decodedPath(request: Request): string | null {
  try {
    return decodeURIComponent(request.path);
  } catch (error) {
    if (error instanceof URIError) return null;
    throw error;
  }
}

function readFiles(folder: string): Map<string, WebFile> {
  const files = new Map<string, WebFile>();
  for (const entry of readdirSync(folder, { recursive: true, withFileTypes: true })) {
    const path = join(entry.parentPath, entry.name);
    if (!entry.isFile() || ENCODINGS.some(({ ending }) => path.endsWith(ending))) continue;
    const url = `/${relative(folder, path).split(sep).join('/')}`;
    const etag = createHash('sha256').update(readFileSync(path)).digest('base64url').slice(0, 27);
    files.set(url, { path, etag, encodings: ENCODINGS.filter(({ ending }) => existsSync(path + ending)) });
  }
  return files;
}

function send(request: Request, response: Response, file: WebFile, cache: string, next: (error?: unknown) => void): void {
  const accepted = request.acceptsEncodings(file.encodings.map(({ name }) => name));
  const encoding = file.encodings.find(({ name }) => name === accepted);
  response.set({ 'Cache-Control': cache, Vary: 'Accept-Encoding', ETag: `"${file.etag}${encoding ? `-${encoding.name}` : ''}"` });
  response.type(extname(file.path));
  if (encoding) response.set('Content-Encoding', encoding.name);
  const options = { cacheControl: false, etag: false, lastModified: false, acceptRanges: false, dotfiles: 'allow' } as const;
  response.sendFile(file.path + (encoding?.ending ?? ''), options, (error) => {
    // A browser that went away is nobody's fault.
    if (error && !response.headersSent && !request.destroyed) next(error);
  });
}
