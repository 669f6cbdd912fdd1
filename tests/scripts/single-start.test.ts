import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { takeSingleStart } from '../../scripts/single-start.mjs';

describe('one start at a time', () => {
  const roots: string[] = [];
  const clone = (): string => {
    const root = mkdtempSync(join(tmpdir(), 'single-start-'));
    roots.push(root);
    return root;
  };
  const taken = async (root: string): Promise<{ setAddress: (address: string) => void; release: () => void }> => {
    const mark = await takeSingleStart(root);
    if ('running' in mark) throw new Error('the mark is held already');
    return mark;
  };

  afterAll(() => roots.forEach((root) => rmSync(root, { recursive: true })));

  it('tells a second one who runs, and where once that is known', async () => {
    const root = clone();
    const mark = await taken(root);
    expect(await takeSingleStart(root)).toEqual({ running: { pid: process.pid, address: null } });
    mark.setAddress('http://localhost:4870');
    expect(await takeSingleStart(root)).toEqual({ running: { pid: process.pid, address: 'http://localhost:4870' } });
    mark.release();
  });

  it('lets the next one in when the first has ended', async () => {
    const root = clone();
    (await taken(root)).release();
    (await taken(root)).release();
  });

  it('keeps no clone from starting beside another', async () => {
    const marks = [await taken(clone()), await taken(clone())];
    marks.forEach((mark) => mark.release());
  });
});
