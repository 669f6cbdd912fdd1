import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliDecompressSync, gunzipSync } from 'node:zlib';
import { precompress } from '../../scripts/precompress';

describe('compressed copies beside the exported files', () => {
  let folder: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'precompress-'));
    mkdirSync(join(folder, 'deep', 'er'), { recursive: true });
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  it('hold exactly what the file holds, however deep it lies', async () => {
    const content = Buffer.from('const footing = "level";\n'.repeat(500));
    writeFileSync(join(folder, 'deep', 'er', 'entry.js'), content);
    await precompress(folder);
    expect(brotliDecompressSync(readFileSync(join(folder, 'deep', 'er', 'entry.js.br'))).equals(content)).toBe(true);
    expect(gunzipSync(readFileSync(join(folder, 'deep', 'er', 'entry.js.gz'))).equals(content)).toBe(true);
  });

  it('are not made of what is small, of pictures, or of what they would not make smaller', async () => {
    writeFileSync(join(folder, 'small.js'), 'let a;');
    writeFileSync(join(folder, 'mark.png'), Buffer.alloc(5000));
    // A sequence of a full-period generator (Numerical Recipes' ranqd1), of which only the top byte is kept: nothing repeats in it.
    let state = 1;
    const noise = Uint8Array.from({ length: 4096 }, () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) >>> 24);
    writeFileSync(join(folder, 'noise.js'), noise);
    await precompress(folder);
    expect(readdirSync(folder).sort()).toEqual(['deep', 'mark.png', 'noise.js', 'small.js']);
  });
});
