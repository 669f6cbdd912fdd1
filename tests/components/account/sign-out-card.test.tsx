import { screen, waitFor } from '@testing-library/react';
import { SignOutCard } from '@/components/account/sign-out-card';
import { sessionState } from '@/hooks/session/session-store';
import { fakeApi } from '@/tests/support/fake-api';
import { renderSignedIn } from '@/tests/support/signed-in';

let mockKept = 0;
jest.mock('@/hooks/outbox/use-outbox', () => ({
  useOutbox: () => ({ kept: Array.from({ length: mockKept }), sending: false, ready: true, broken: false }),
}));
jest.mock('expo-router', () => jest.requireActual('@/tests/support/linked-router').linkedRouter);

function open(kept: number) {
  mockKept = kept;
  const server = fakeApi({ signOut: () => undefined });
  return { ...server, ...renderSignedIn(<SignOutCard />) };
}

test('with everything on the server, signing out ends the sign-in', async () => {
  const { person, calls } = open(0);
  await person.click(screen.getByRole('button', { name: 'Sign out' }));
  await waitFor(() => expect(sessionState().status).toBe('signed-out'));
  expect(calls.map(({ name }) => name)).toEqual(['signOut']);
});

test('with records that only this phone has there is no plain way out: the person must say that they stay here', async () => {
  const { person } = open(3);
  expect(screen.getByText('3 records are on this phone only.')).toBeInTheDocument();
  expect(screen.queryByRole('button', { name: 'Sign out' })).toBeNull();
  await person.click(screen.getByRole('button', { name: 'Leave them here and sign out' }));
  await waitFor(() => expect(sessionState().status).toBe('signed-out'));
});

test('without a signal nobody is signed out by half: the cookie would sign them in again', async () => {
  const { person } = open(0);
  global.fetch = jest.fn(async () => {
    throw new TypeError('Failed to fetch');
  });
  await person.click(screen.getByRole('button', { name: 'Sign out' }));
  expect(await screen.findByText(/No signal/)).toBeInTheDocument();
  expect(sessionState().status).toBe('signed-in');
});
