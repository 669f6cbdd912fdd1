import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { installLine, installMatchesLock, isNodeNewEnough, missingPackagesSentence } from '../../scripts/bootstrap.mjs';
import { postgresBinaries } from '../../scripts/postgres-binaries.mjs';

describe('what a bare clone is told and given', () => {
  it.each([
    ['20.19.0', true],
    ['20.18.9', false],
    ['18.20.8', false],
    ['20.20.2', true],
    ['22.0.0', true],
    ['100.0.0', true],
  ])('takes Node %s: %s', (version, taken) => {
    expect(isNodeNewEnough(version)).toBe(taken);
  });

  it('names in one line what a person who may install has to run', () => {
    const line = 'sudo apt-get update && sudo apt-get install -y --no-install-recommends postgresql chromium';
    expect(installLine(['postgresql', 'chromium'])).toBe(line);
    expect(
      missingPackagesSentence(['postgresql', 'chromium'], 'npm test')
        .split('\n')
        .map((text) => text.trim()),
    ).toContain(line);
  });

  it('says which command to type again', () => {
    expect(missingPackagesSentence(['postgresql'], 'npm start')).toContain('then npm start again');
  });

  describe('packages that are there already', () => {
    const lock = {
      packages: {
        '': { version: '0.1.0' },
        'node_modules/a': { version: '1.0.0' },
        'node_modules/for-another-system': { version: '2.0.0', optional: true },
      },
    };

    it('are kept when they are what the lock asks for, without those for other systems', () => {
      expect(installMatchesLock(lock, { packages: { 'node_modules/a': { version: '1.0.0' } } })).toBe(true);
    });

    it.each([
      ['one has another version', { 'node_modules/a': { version: '1.0.1' } }],
      ['one is missing', {}],
      [
        'an optional one has another version',
        { 'node_modules/a': { version: '1.0.0' }, 'node_modules/for-another-system': { version: '3.0.0' } },
      ],
      [
        'one is there that the lock does not name',
        { 'node_modules/a': { version: '1.0.0' }, 'node_modules/b': { version: '1.0.0' } },
      ],
    ])('are installed anew when %s', (_, packages) => {
      expect(installMatchesLock(lock, { packages })).toBe(false);
    });
  });

  describe('PostgreSQL’s programs', () => {
    let base: string;
    const lay = (version: string, programs: string[]): void => {
      mkdirSync(join(base, version, 'bin'), { recursive: true });
      for (const program of programs) writeFileSync(join(base, version, 'bin', program), '');
    };
    const all = ['initdb', 'pg_ctl', 'postgres'];

    beforeEach(() => {
      base = mkdtempSync(join(tmpdir(), 'postgres-versions-'));
    });
    afterEach(() => rmSync(base, { recursive: true }));

    it('are the newest by number, not by letter', () => {
      lay('9', all);
      lay('15', all);
      expect(postgresBinaries(undefined, base)).toBe(join(base, '15', 'bin'));
    });

    it('are not taken from a version of which only the client is installed', () => {
      lay('15', all);
      lay('17', ['pg_ctl']);
      expect(postgresBinaries(undefined, base)).toBe(join(base, '15', 'bin'));
    });

    it('are those of the version that made the cluster, or none', () => {
      lay('15', all);
      lay('17', all);
      expect(postgresBinaries('15', base)).toBe(join(base, '15', 'bin'));
      expect(postgresBinaries('16', base)).toBeUndefined();
    });

    it('are none when nothing is installed', () => {
      expect(postgresBinaries(undefined, join(base, 'nowhere'))).toBeUndefined();
    });
  });
});
