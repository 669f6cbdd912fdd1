import type { Me } from '@/shared/api/session-endpoints';

const me: Me = {
  person: { id: '0198f000-0000-7000-8000-00000000aaaa', name: 'Rosa Ibarra', email: 'rosa@crew.example' },
  company: { id: '0198f000-0000-7000-8000-00000000bbbb', name: 'Heron Flats Concrete' },
  roles: ['operator'],
};
type Store = typeof import('@/hooks/session/session-store');

/** The store as the app finds it when the page is loaded. */
function loaded(): Store {
  let store: Store | undefined;
  jest.isolateModules(() => {
    store = jest.requireActual<Store>('@/hooks/session/session-store');
  });
  if (!store) throw new Error('the module was not loaded');
  return store;
}

beforeEach(() => localStorage.clear());

test('a reload goes on with whoever was signed in, before the server has answered', () => {
  loaded().sessionBegan({ accessToken: 'secret', expiresAt: '2099-01-01T00:00:00Z', me });
  expect(loaded().sessionState()).toEqual({ status: 'signed-in', me, accessToken: null, reached: true });
});

test('the access token is kept in memory alone', () => {
  loaded().sessionBegan({ accessToken: 'secret', expiresAt: '2099-01-01T00:00:00Z', me });
  expect(JSON.stringify({ ...localStorage })).not.toContain('secret');
});

test('a browser that remembers nobody starts at the door', () => {
  expect(loaded().sessionState().status).toBe('signed-out');
});

test('signing out forgets the person', () => {
  const store = loaded();
  store.sessionBegan({ accessToken: 'secret', expiresAt: '2099-01-01T00:00:00Z', me });
  store.sessionEnded({ tell: false });
  expect(loaded().sessionState().status).toBe('signed-out');
});

test('what an older version or a hand wrote there is as good as nobody', () => {
  localStorage.setItem('tallyrod.me', '{"person":"Rosa"}');
  expect(loaded().sessionState().status).toBe('signed-out');
});

test('a server that does not answer changes nothing but that', () => {
  const store = loaded();
  store.sessionBegan({ accessToken: 'secret', expiresAt: '2099-01-01T00:00:00Z', me });
  store.serverNotReached();
  expect(store.sessionState()).toMatchObject({ status: 'signed-in', me, reached: false });
});
