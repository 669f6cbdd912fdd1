import { readdirSync } from 'node:fs';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

/** Kinds of file that compression makes smaller; pictures and woff2 fonts are compressed already. */
const COMPRESSIBLE = /\.(html|js|mjs|css|json|map|svg|txt|webmanifest|ttf|otf|ico|wasm)$/;

/** Below this a compressed copy saves less than the request's own headers. */
const SMALLEST = 1024;

const brotli = promisify(brotliCompress);
const zip = promisify(gzip);

async function compressFile(file: string): Promise<void> {
  const content = await readFile(file);
  if (content.length < SMALLEST) return;
  const copies = [
    ['.br', await brotli(content, { params: { [constants.BROTLI_PARAM_SIZE_HINT]: content.length } })],
    ['.gz', await zip(content, { level: 9 })],
  ] as const;
  for (const [ending, copy] of copies) if (copy.length < content.length) await writeFile(file + ending, copy);
}

/** Lays a `.br` and a `.gz` beside every file of a folder that they make smaller: the server sends what the browser asks for. */
export async function precompress(folder: string): Promise<void> {
  const files = readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && COMPRESSIBLE.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name));
  // Largest first would finish soonest, but at most two run at once in any case: zlib works beside us in the thread pool.
  const queue = files.values();
  const worker = async (): Promise<void> => {
    for (const file of queue) await compressFile(file);
  };
  await Promise.all([worker(), worker()]);
}
