import { ApiError, callApi, OfflineError } from '@/hooks/api/client';
import { sessionBegan, sessionEnded, sessionState } from '@/hooks/session/session-store';
import type { Me } from '@/shared/api/session-endpoints';

const me: Me = {
  person: { id: '0198f000-0000-7000-8000-00000000aaaa', name: 'Rosa Ibarra', email: 'rosa@crew.example' },
  company: { id: '0198f000-0000-7000-8000-00000000bbbb', name: 'Heron Flats Concrete' },
  roles: ['operator'],
};
const session = (accessToken: string) => ({ accessToken, expiresAt: '2099-01-01T00:00:00Z', me });

interface Asked {
  url: string;
  token: string | null;
}

/** A server that takes one access token, and gives the next for each refresh. `refreshes` answers in its place when given. */
function serverTaking(valid: string, answerRefresh: () => { status: number; body: unknown } | Error) {
  const asked: Asked[] = [];
  const answer = (status: number, body: unknown) => ({
    ok: status < 400,
    status,
    text: async () => JSON.stringify(body),
    json: async () => body,
  });
  const refused = (status: number, code: string) => answer(status, { error: { code, message: code } });
  global.fetch = jest.fn(async (input: RequestInfo | URL, init?: RequestInit) => {
    const url = String(input);
    const token = new Headers(init?.headers).get('authorization')?.replace('Bearer ', '') ?? null;
    asked.push({ url, token });
    // Every answer takes a turn of the clock, so that calls made together are under way together.
    await new Promise((resolve) => setTimeout(resolve));
    if (url === '/api/refresh') {
      const given = answerRefresh();
      if (given instanceof Error) throw given;
      return answer(given.status, given.body) as Response; // a Response as far as the client reads it
    }
    if (token !== valid) return refused(401, 'signed-out') as Response; // as above
    if (url === '/api/crew') return answer(200, { people: [{ ...me.person, roles: me.roles }] }) as Response; // as above
    if (url === '/api/instruments') return answer(200, { lasers: 'none' }) as Response; // as above
    return refused(403, 'role-refused') as Response; // as above
  });
  return asked;
}

const refreshes = (asked: Asked[]) => asked.filter(({ url }) => url === '/api/refresh').length;
const gives = (token: string) => () => ({ status: 200, body: session(token) });

beforeEach(() => sessionBegan(session('old')));
afterAll(() => sessionEnded({ tell: false }));

test('calls that go out together with a token that has run out renew it once, and each is repeated with the new one', async () => {
  const asked = serverTaking('new', gives('new'));
  const answers = await Promise.all([callApi('crew'), callApi('crew'), callApi('crew')]);
  expect(answers.map(({ people }) => people[0]?.name)).toEqual(['Rosa Ibarra', 'Rosa Ibarra', 'Rosa Ibarra']);
  expect(refreshes(asked)).toBe(1);
  expect(asked.filter(({ url }) => url === '/api/crew').map(({ token }) => token)).toEqual([
    'old',
    'old',
    'old',
    'new',
    'new',
    'new',
  ]);
});

test('a call refused with a token that another call has renewed meanwhile takes the new one and renews nothing', async () => {
  const asked = serverTaking('new', gives('newer'));
  const late = callApi('crew');
  sessionBegan(session('new'));
  await late;
  expect(refreshes(asked)).toBe(0);
});

test('a call is repeated once: a server that refuses the new token as well is believed', async () => {
  const asked = serverTaking('another', gives('new'));
  await expect(callApi('crew')).rejects.toMatchObject({ status: 401, code: 'signed-out' });
  expect(refreshes(asked)).toBe(1);
  expect(asked.filter(({ url }) => url === '/api/crew')).toHaveLength(2);
});

test('a refused refresh ends the sign-in, and the call says so', async () => {
  serverTaking('new', () => ({ status: 401, body: { error: { code: 'refresh-refused', message: '' } } }));
  await expect(callApi('crew')).rejects.toMatchObject({ code: 'signed-out' });
  expect(sessionState()).toMatchObject({ status: 'signed-out', me: null, accessToken: null });
});

test('a dead spot during the refresh is no sign-out', async () => {
  serverTaking('new', () => new TypeError('Failed to fetch'));
  await expect(callApi('crew')).rejects.toBeInstanceOf(OfflineError);
  expect(sessionState()).toMatchObject({ status: 'signed-in', me, reached: false });
});

test('a server that is down for a moment during the refresh is no sign-out either', async () => {
  serverTaking('new', () => ({ status: 503, body: { error: { code: 'database-away', message: '' } } }));
  await expect(callApi('crew')).rejects.toMatchObject({ status: 503, code: 'database-away' });
  expect(sessionState().status).toBe('signed-in');
});

test('a refusal that is not about the token is not repeated', async () => {
  const asked = serverTaking('old', gives('new'));
  await expect(callApi('job', { params: { jobId: 'a/b' } })).rejects.toMatchObject({ status: 403, code: 'role-refused' });
  expect(asked).toEqual([{ url: '/api/jobs/a%2Fb', token: 'old' }]);
});

test('an answer in a shape that the table does not allow is a fault, not data', async () => {
  serverTaking('old', gives('new'));
  await expect(callApi('instruments')).rejects.toMatchObject({ code: 'server-fault' });
  await expect(callApi('instruments')).rejects.toBeInstanceOf(ApiError);
});

test('an answer in words that are not the server’s own is said as a fault with its status', async () => {
  const page = { ok: false, status: 502, json: async () => JSON.parse('<html>') };
  global.fetch = jest.fn(async () => page as unknown as Response); // only what the client reads of a refusal
  await expect(callApi('crew')).rejects.toMatchObject({ status: 502, code: 'server-fault' });
});

test('signing in and out sends no access token', async () => {
  const asked = serverTaking('old', gives('new'));
  await callApi('refresh', { body: {} });
  expect(asked).toEqual([{ url: '/api/refresh', token: null }]);
});
