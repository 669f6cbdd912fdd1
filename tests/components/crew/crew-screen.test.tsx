import { screen, waitFor } from '@testing-library/react';
import { CrewScreen } from '@/components/crew/crew-screen';
import type { Role } from '@/shared/roles';
import { fakeApi, Refused, type FakeHandlers } from '@/tests/support/fake-api';
import { testId } from '@/tests/support/footing-of';
import { renderSignedIn } from '@/tests/support/signed-in';

jest.mock('expo-router', () => jest.requireActual('@/tests/support/linked-router').linkedRouter);

const sol = { id: testId(7), name: 'Sol Aguilar', email: 'sol@crew.example', roles: ['operator'] satisfies Role[] };

async function open(roles: Role[], handlers: FakeHandlers = {}) {
  const server = fakeApi({
    crew: () => ({ people: [sol] }),
    changeRoles: ({ body }) => ({ ...sol, roles: body.roles }),
    ...handlers,
  });
  const drawn = renderSignedIn(<CrewScreen />, roles);
  await screen.findByText('Sol Aguilar');
  return { ...server, ...drawn };
}

test('the owner gives a person another role, and the ones they had stay', async () => {
  const { person, calls } = await open(['owner']);
  await person.click(screen.getByRole('button', { name: 'Change roles of Sol Aguilar' }));
  await person.click(screen.getByRole('checkbox', { name: /^wall installer/ }));
  await person.click(screen.getByRole('button', { name: 'Save' }));
  await waitFor(() => expect(screen.queryByRole('button', { name: 'Save' })).toBeNull());
  expect(calls.find(({ name }) => name === 'changeRoles')?.body).toEqual({ roles: ['operator', 'installer'] });
});

test('a person is at least one thing: taking the last role away cannot be saved', async () => {
  const { person, calls } = await open(['owner']);
  await person.click(screen.getByRole('button', { name: 'Change roles of Sol Aguilar' }));
  await person.click(screen.getByRole('checkbox', { name: /^laser operator/ }));
  expect(screen.getByText('A person is at least one of these.')).toBeInTheDocument();
  await person.click(screen.getByRole('button', { name: 'Save' }));
  expect(calls.some(({ name }) => name === 'changeRoles')).toBe(false);
});

test('a company keeps an owner, and the sentence says what to do', async () => {
  const { person } = await open(['owner'], {
    changeRoles: () => {
      throw new Refused('not-possible');
    },
  });
  await person.click(screen.getByRole('button', { name: 'Change roles of Sol Aguilar' }));
  await person.click(screen.getByRole('button', { name: 'Save' }));
  expect(await screen.findByText('A company needs an owner. Make somebody else owner first.')).toBeInTheDocument();
});

test.each<Role>(['super', 'operator', 'installer'])('a %s sees who is who and is offered no change', async (role) => {
  await open([role]);
  expect(screen.getByText('laser operator')).toBeInTheDocument();
  expect(screen.queryByRole('button', { name: /Change/ })).toBeNull();
});
