import { mkdirSync, mkdtempSync, renameSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { currentExport, hashSources, WEB_SOURCES } from '../../scripts/web-export';

describe('whether the web app has to be built', () => {
  let root: string;

  beforeEach(() => {
    root = mkdtempSync(join(tmpdir(), 'web-export-'));
    mkdirSync(join(root, 'app', 'jobs'), { recursive: true });
    writeFileSync(join(root, 'app', 'jobs', 'index.tsx'), 'one');
    writeFileSync(join(root, 'app.json'), '{}');
  });

  afterEach(() => rmSync(root, { recursive: true }));

  const layExport = (): string => {
    const folder = join(root, 'dist', hashSources(root));
    mkdirSync(folder, { recursive: true });
    writeFileSync(join(folder, 'index.html'), '<!doctype html>');
    return folder;
  };

  it('is built when there is no export', () => {
    expect(currentExport(root)).toBeUndefined();
  });

  it('is not built again while nothing changed, whatever the files’ times say', () => {
    const folder = layExport();
    utimesSync(join(root, 'app', 'jobs', 'index.tsx'), new Date(), new Date('2030-01-01'));
    expect(currentExport(root)).toBe(folder);
  });

  it.each([
    ['a file is edited', () => writeFileSync(join(root, 'app', 'jobs', 'index.tsx'), 'two')],
    ['a file is added', () => writeFileSync(join(root, 'app', 'new.tsx'), '')],
    ['a file is removed', () => rmSync(join(root, 'app', 'jobs', 'index.tsx'))],
    ['a file is renamed', () => renameSync(join(root, 'app', 'jobs', 'index.tsx'), join(root, 'app', 'jobs', 'home.tsx'))],
    ['a source appears that was not there', () => writeFileSync(join(root, 'package-lock.json'), '{}')],
  ])('is built again when %s', (_, change) => {
    layExport();
    change();
    expect(currentExport(root)).toBeUndefined();
  });

  it('is not built again when a change is taken back', () => {
    const folder = layExport();
    writeFileSync(join(root, 'app', 'jobs', 'index.tsx'), 'two');
    writeFileSync(join(root, 'app', 'jobs', 'index.tsx'), 'one');
    expect(currentExport(root)).toBe(folder);
  });

  it('is not built again for what is no part of it: the server, tests, documents', () => {
    const folder = layExport();
    for (const other of ['server', 'tests', 'docs', 'scripts']) {
      mkdirSync(join(root, other));
      writeFileSync(join(root, other, 'file.ts'), other);
    }
    expect(currentExport(root)).toBe(folder);
  });

  it('does not take an export for finished that has no page', () => {
    rmSync(join(layExport(), 'index.html'));
    expect(currentExport(root)).toBeUndefined();
  });

  it('tells apart what moves from one file’s end to the next one’s beginning', () => {
    writeFileSync(join(root, 'app', 'a'), 'xy');
    writeFileSync(join(root, 'app', 'b'), 'z');
    const before = hashSources(root);
    writeFileSync(join(root, 'app', 'a'), 'x');
    writeFileSync(join(root, 'app', 'b'), 'yz');
    expect(hashSources(root)).not.toBe(before);
  });

  it('watches every folder whose code reaches the browser', () => {
    expect(WEB_SOURCES).toEqual(
      expect.arrayContaining(['app', 'components', 'hooks', 'constants', 'shared', 'analysis', 'assets']),
    );
  });
});
