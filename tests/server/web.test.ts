import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, dirname, join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import { sendBytes } from './support/send-bytes';
import { startTestApi, type TestApi } from './support/test-api';

const SCRIPT = '/_expo/static/js/web/entry-0123456789abcdef0123456789abcdef.js';
const FONT = '/assets/node_modules/@expo-google-fonts/barlow/Barlow.0123456789abcdef0123456789abcdef.ttf';
const CODE = 'console.info("tally");\n'.repeat(40);

let folder: string;
let api: TestApi;

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'web-'));
  const write = (url: string, content: string | Buffer) => {
    mkdirSync(dirname(join(folder, url)), { recursive: true });
    writeFileSync(join(folder, url), content);
  };
  write('/index.html', '<!doctype html><title>Tallyrod</title>');
  write('/favicon.ico', 'icon');
  write(FONT, 'font');
  write(SCRIPT, CODE);
  write(`${SCRIPT}.br`, brotliCompressSync(CODE));
  write(`${SCRIPT}.gz`, gzipSync(CODE));
  writeFileSync(`${folder}-secret.txt`, 'no');
  api = await startTestApi({ webDir: folder });
});
afterAll(async () => {
  await api.stop();
  rmSync(folder, { recursive: true });
  rmSync(`${folder}-secret.txt`);
});

const get = (path: string, encoding = 'identity') => api.http().get(path).set('Accept-Encoding', encoding);

describe('the web app', () => {
  it.each([
    ['br, gzip', 'br'],
    ['gzip', 'gzip'],
    ['gzip;q=1, br;q=0.5', 'gzip'],
    ['identity', undefined],
    ['zstd', undefined],
  ])('is sent compressed as a browser takes it: %s', async (accepted, sent) => {
    const response = await get(SCRIPT, accepted).expect(200);
    expect(response.headers['content-encoding']).toBe(sent);
    expect(response.headers['content-type']).toMatch(/^text\/javascript/);
    expect(response.headers.vary).toBe('Accept-Encoding');
  });

  it('reads the same whichever way it came', async () => {
    // supertest unpacks gzip itself.
    expect((await get(SCRIPT, 'gzip')).text).toBe(CODE);
    expect((await get(SCRIPT)).text).toBe(CODE);
  });

  it('is kept for ever where its name has its content’s hash, and asked about again where not', async () => {
    for (const path of [SCRIPT, FONT])
      expect((await get(path)).headers['cache-control']).toBe('public, max-age=31536000, immutable');
    for (const path of ['/', '/index.html', '/jobs', '/favicon.ico'])
      expect((await get(path)).headers['cache-control']).toBe('no-cache');
  });

  it('is answered by 304 while it is the same, each encoding for itself', async () => {
    const { etag } = (await get('/')).headers;
    await get('/').set('If-None-Match', String(etag)).expect(304);
    const plain = (await get(SCRIPT)).headers.etag;
    await get(SCRIPT, 'br').set('If-None-Match', String(plain)).expect(200);
  });

  it.each(['/', '/jobs', '/jobs/01a23113-037b-739c-9a63-f6437a682e3a', '/rounds/x/shoot'])(
    'shows its page at %s',
    async (path) => {
      const response = await get(path).expect(200);
      expect(response.text).toContain('<title>Tallyrod</title>');
    },
  );

  it.each(['/sw.js', '/assets/gone.png', `${SCRIPT}x.js`, '/jobs/plan.pdf'])(
    'has no page for %s, which ends like a file',
    async (path) => {
      const response = await get(path).expect(404);
      expect(response.text).not.toContain('<title>');
    },
  );

  it.each(['/../NAME', '/%2e%2e%2fNAME', '/..%5cNAME', '/assets/../../NAME', '/%00.txt', '/%E0%A4%A'])(
    'serves nothing beside its folder: %s',
    async (path) => {
      // Sent as it stands: a client that tidies addresses up would ask for something else.
      const name = `${basename(folder)}-secret.txt`;
      const sent = { method: 'GET', path: path.replace('NAME', name), headers: {}, body: undefined };
      const answered = await sendBytes(api.http().get('/').url, sent);
      expect(answered.text).not.toBe('no');
      expect([400, 404]).toContain(answered.status);
    },
  );

  it('does not stand in for the API', async () => {
    const response = await get('/api/nothing').expect(404);
    expect(response.body.error.code).toBe('not-found');
    await api.http().post('/jobs').expect(404);
  });

  it('may run its own scripts and nobody else’s, is framed by nobody, and over plain http asks for no https', async () => {
    const policy = String((await get('/')).headers['content-security-policy']);
    for (const part of [`script-src 'self'`, `frame-ancestors 'none'`, `object-src 'none'`, `img-src 'self' data: blob:`])
      expect(policy).toContain(part);
    expect(policy).not.toContain('upgrade-insecure-requests');
    expect((await get('/')).headers['strict-transport-security']).toBeUndefined();
  });
});
