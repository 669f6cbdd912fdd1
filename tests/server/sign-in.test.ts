import type { Response } from 'supertest';
import { isEasilyGuessed } from '@/server/features/session/easily-guessed';
import { APP_URL, PASSPHRASE, startTestApi, type TestApi } from './support/test-api';

const COOKIE = '__Host-tallyrod-refresh';
const MINUTE = 60_000;

let api: TestApi;
beforeAll(async () => {
  api = await startTestApi();
});
afterAll(() => api.stop());

let count = 0;
/** Signs a new person up and answers with their refresh token. */
async function newSignIn(): Promise<{ email: string; token: string }> {
  count += 1;
  const email = `sign-in-${count}@example.test`;
  const response = await api
    .send('signUp', null, { body: { company: 'Reed', name: 'Ann', email, password: PASSPHRASE } })
    .expect(201);
  return { email, token: tokenOf(response) };
}

function cookieOf(response: Response): string {
  const cookies: unknown = response.headers['set-cookie'];
  return (Array.isArray(cookies) ? cookies : []).map(String).find((cookie) => cookie.startsWith(`${COOKIE}=`)) ?? '';
}
function tokenOf(response: Response): string {
  return /=([^;]*)/.exec(cookieOf(response))?.[1] ?? '';
}
function refresh(token: string) {
  return api.send('refresh', null, { body: {} }).set('Cookie', `other=1; ${COOKIE}=${token}`);
}

describe('signing up', () => {
  it('gives a company, all four roles, a token for ten minutes, and a cookie that no script and no other site can use', async () => {
    const response = await api.send('signUp', null, {
      body: { company: 'Reed', name: 'Ann', email: 'Ann@Example.test', password: PASSPHRASE },
    });
    expect(response.body.me).toMatchObject({
      person: { email: 'ann@example.test' },
      roles: ['owner', 'super', 'operator', 'installer'],
    });
    expect(Date.parse(response.body.expiresAt) - api.clock.now().getTime()).toBe(10 * MINUTE);
    const cookie = cookieOf(response);
    for (const attribute of ['HttpOnly', 'Secure', 'SameSite=Strict', 'Path=/']) expect(cookie).toContain(attribute);
    expect(cookie).not.toContain('Domain');
    expect(response.text).not.toContain(tokenOf(response));
  });

  it('stores neither passphrase nor token, but Argon2id at 19 MiB and two passes, and a digest', async () => {
    const { token } = await newSignIn();
    await api.dependencies.database.asIdentity(async (manager) => {
      const [{ hash }] = await manager.query('select hash from credentials limit 1');
      expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
      const [{ n }] = await manager.query('select count(*)::int n from refresh_tokens where hash = $1', [token]);
      expect(n).toBe(0);
    });
  });

  it('with an address that is known and another passphrase is refused; with its own, the person has a company more', async () => {
    const { email } = await newSignIn();
    const body = { company: 'Second', name: 'Ann', email, password: `${PASSPHRASE}, again` };
    await api.send('signUp', null, { body }).expect(401);
    const again = await api.ok('signUp', null, { body: { ...body, password: PASSPHRASE } });
    expect(again.me.company.name).toBe('Second');
    expect((await api.ok('signIn', null, { body: { email, password: PASSPHRASE } })).me.company.name).toBe('Second');
  });

  it.each([
    ['14 characters', 'gulls over mud', 'body-invalid'],
    ['one thing again and again', 'abcabcabcabcabcabc', 'not-possible'],
    ['words that stand in for a secret', 'Password-password-2026!', 'not-possible'],
    ['a row of keys', 'qwertyuiopasdfghjkl1234', 'not-possible'],
    ['the company’s own name', 'Fallow Creek Footings 1', 'not-possible'],
    ['the person’s own address', 'marlow.teague@example.test', 'not-possible'],
  ])('refuses a passphrase of %s', async (_what, password, code) => {
    const body = { company: 'Fallow Creek Footings', name: 'Ann', email: 'marlow.teague@example.test', password };
    const response = await api.send('signUp', null, { body });
    expect(response.body.error.code).toBe(code);
    expect(Object.keys(response.body.error.fields)).toEqual(['password']);
  });

  it.each(['kettle on before the frost', 'drei nasse Stiefel im Flur', 'xkVq-90ulm-Ptz3-vbNe'])('takes %s', (password) => {
    expect(isEasilyGuessed(password, ['Fallow Creek', 'Ann', 'ann@example.test'])).toBe(false);
  });
});

describe('signing in', () => {
  it('answers a wrong passphrase and an unknown address alike', async () => {
    const { email } = await newSignIn();
    const wrong = await api.send('signIn', null, { body: { email, password: 'not the one, not at all' } });
    const unknown = await api.send('signIn', null, { body: { email: 'nobody@example.test', password: PASSPHRASE } });
    expect([wrong.status, wrong.body]).toEqual([401, { error: { code: 'sign-in-refused', message: expect.any(String) } }]);
    expect([unknown.status, unknown.body]).toEqual([wrong.status, wrong.body]);
    expect(cookieOf(wrong)).toBe('');
  });

  it('does not ask about capitals in an address', async () => {
    const { email } = await newSignIn();
    await api.send('signIn', null, { body: { email: ` ${email.toUpperCase()}`, password: PASSPHRASE } }).expect(200);
  });

  it('after ten wrong tries for one address is refused even when right, counted by every server on the database, until a quarter hour has passed', async () => {
    const { email } = await newSignIn();
    const other = (await newSignIn()).email;
    const tryOnce = (address: string, password: string) => api.send('signIn', null, { body: { email: address, password } });
    for (let n = 0; n < 10; n += 1) await tryOnce(email, 'not the one, not at all').expect(401);
    const refused = await tryOnce(email, PASSPHRASE);
    expect([refused.status, refused.body.error.code]).toEqual([429, 'too-many-tries']);
    await tryOnce(other, PASSPHRASE).expect(200);
    api.clock.pass(15 * MINUTE);
    await tryOnce(email, PASSPHRASE).expect(200);
  });

  it('counts no try that succeeds', async () => {
    const { email } = await newSignIn();
    for (let n = 0; n < 12; n += 1) await api.send('signIn', null, { body: { email, password: PASSPHRASE } }).expect(200);
  });
});

describe('the refresh token', () => {
  it('is rotated by every use, and the sign-in lasts', async () => {
    let { token } = await newSignIn();
    const seen = new Set([token]);
    for (let n = 0; n < 4; n += 1) {
      api.clock.pass(9 * MINUTE);
      const response = await refresh(token).expect(200);
      expect(response.body.me.company.name).toBe('Reed');
      token = tokenOf(response);
      seen.add(token);
    }
    expect(seen.size).toBe(5);
  });

  it('is good once more for a minute after it was rotated, because the answer may have been lost, and both new ones are good', async () => {
    const { token } = await newSignIn();
    const first = tokenOf(await refresh(token).expect(200));
    api.clock.pass(MINUTE);
    const second = tokenOf(await refresh(token).expect(200));
    expect(second).not.toBe(first);
    await refresh(second).expect(200);
    await refresh(first).expect(200);
  });

  it('used later than that ends the whole family: whoever kept it, and whoever rotated it', async () => {
    const { token } = await newSignIn();
    const next = tokenOf(await refresh(token).expect(200));
    api.clock.pass(MINUTE + 1);
    const reused = await refresh(token);
    expect([reused.status, reused.body.error.code]).toEqual([401, 'refresh-refused']);
    expect(cookieOf(reused)).toMatch(/Expires=Thu, 01 Jan 1970/);
    await refresh(next).expect(401);
  });

  it('two generations old ends the family within the minute too', async () => {
    const { token } = await newSignIn();
    const second = tokenOf(await refresh(token).expect(200));
    const third = tokenOf(await refresh(second).expect(200));
    await refresh(token).expect(401);
    await refresh(third).expect(401);
  });

  it('ends nobody else’s sign-in when it does', async () => {
    const { email, token } = await newSignIn();
    const elsewhere = tokenOf(await api.send('signIn', null, { body: { email, password: PASSPHRASE } }).expect(200));
    await refresh(tokenOf(await refresh(token)));
    await refresh(token).expect(401);
    await refresh(elsewhere).expect(200);
  });

  it('used by two at once gives each one that is good', async () => {
    const { token } = await newSignIn();
    const both = await Promise.all([refresh(token), refresh(token)]);
    expect(both.map(({ status }) => status)).toEqual([200, 200]);
    await refresh(tokenOf(both[1])).expect(200);
  });

  it.each([
    ['none', ''],
    ['one that is made up', 'A'.repeat(43)],
  ])('that is %s is refused', async (_what, token) => {
    await refresh(token).expect(401);
  });

  it('not used for thirty days is refused', async () => {
    const { token } = await newSignIn();
    api.clock.pass(30 * 24 * 60 * MINUTE);
    await refresh(token).expect(401);
  });

  it('is no good after signing out, which takes the cookie away and may be done twice', async () => {
    const { token } = await newSignIn();
    const out = await api.send('signOut', null, { body: {} }).set('Cookie', `${COOKIE}=${token}`).expect(204);
    expect(cookieOf(out)).toMatch(/Expires=Thu, 01 Jan 1970/);
    await refresh(token).expect(401);
    await api.send('signOut', null, { body: {} }).set('Cookie', `${COOKIE}=${token}`).expect(204);
  });
});

describe('a page of another site', () => {
  it.each(['signUp', 'signIn', 'refresh', 'signOut'] as const)('cannot call %s', async (name) => {
    for (const origin of ['https://elsewhere.test', 'http://localhost:9999', 'null']) {
      const response = await api.send(name, null, { body: {} }).set('Origin', origin);
      expect([response.status, response.body.error.code]).toEqual([403, 'origin-refused']);
    }
  });

  it('is not our own, by any name of loopback', async () => {
    for (const origin of [APP_URL, APP_URL.replace('localhost', '127.0.0.1')]) {
      const { token } = await newSignIn();
      await refresh(token).set('Origin', origin).expect(200);
    }
  });
});

describe('roles', () => {
  it('the last owner stays owner; with another one there, may step down', async () => {
    const company = await api.signUp();
    const { owner } = company;
    const change = (roles: string[]) => api.send('changeRoles', owner.token, { params: { personId: owner.id }, body: { roles } });
    const refused = await change(['operator']);
    expect([refused.status, refused.body.error.fields.roles.code]).toEqual([422, 'last-owner']);
    const other = await company.hire('super');
    await api.ok('changeRoles', owner.token, { params: { personId: other.id }, body: { roles: ['owner', 'super', 'owner'] } });
    expect((await change(['operator'])).body.roles).toEqual(['operator']);
    const { people } = await api.ok('crew', owner.token, {});
    expect(people.find(({ id }) => id === other.id)?.roles).toEqual(['owner', 'super']);
    await change(['owner']).expect(403);
  });
});
