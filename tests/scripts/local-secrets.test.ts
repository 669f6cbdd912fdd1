import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { localSecrets } from '../../scripts/local-secrets';

describe('the secrets of a clone', () => {
  let folder: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'local-secrets-'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  it('are made once and then stay', () => {
    const first = localSecrets(folder);
    expect(first.fresh).toBe(true);
    expect(localSecrets(folder)).toEqual({ secrets: first.secrets, fresh: false });
  });

  it('are 256 bits each, and no two the same', () => {
    const all = Object.values(localSecrets(folder).secrets);
    expect(new Set(all).size).toBe(all.length);
    for (const secret of all) expect(Buffer.from(secret, 'base64url')).toHaveLength(32);
  });

  it('can be read by their owner alone', () => {
    localSecrets(folder);
    expect(statSync(join(folder, 'secrets.json')).mode & 0o777).toBe(0o600);
  });

  it.each(['', '{', '{}', '{"jwtSecret": 5}'])(
    'are not replaced behind somebody’s back when the file is damaged: %j',
    (content) => {
      writeFileSync(join(folder, 'secrets.json'), content);
      expect(() => localSecrets(folder)).toThrow('damaged');
    },
  );
});
