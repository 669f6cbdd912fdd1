import '@/hooks/i18n/i18n';
import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { SignUpScreen } from '@/components/auth/sign-up-screen';
import { sessionEnded, sessionState } from '@/hooks/session/session-store';
import { fakeApi, Refused, type FakeHandlers } from '@/tests/support/fake-api';
import { COMPANY, fill, PERSON } from '@/tests/support/signed-in';

jest.mock('expo-router', () => jest.requireActual('@/tests/support/linked-router').linkedRouter);

function open(handlers: FakeHandlers = {}) {
  sessionEnded({ tell: false });
  const server = fakeApi({
    signUp: ({ body }) => ({
      accessToken: 'a token of the test',
      expiresAt: '2099-01-01T00:00:00Z',
      me: {
        person: { id: PERSON, name: body.name, email: body.email },
        company: { id: COMPANY, name: body.company },
        roles: ['owner', 'super', 'operator', 'installer'],
      },
    }),
    ...handlers,
  });
  render(<SignUpScreen />);
  return { ...server, person: userEvent.setup() };
}

async function fillIn(person: ReturnType<typeof userEvent.setup>, password: string) {
  await fill(person, screen.getByLabelText('Company'), 'Heron Flats Concrete');
  await fill(person, screen.getByLabelText('Your name'), 'Rosa Ibarra');
  await fill(person, screen.getByLabelText('E-mail'), 'rosa@crew.example');
  await fill(person, screen.getByLabelText('Password'), password);
}

test('the rule for a password is said before it is broken', () => {
  open();
  expect(screen.getByLabelText('Password')).toHaveAccessibleDescription(/15 characters or more/);
});

test('Enter in the last field signs up, and the person is signed in', async () => {
  const { person } = open();
  await fillIn(person, 'grade rods lean left');
  await person.type(screen.getByLabelText('Password'), '{Enter}');
  await waitFor(() => expect(sessionState().status).toBe('signed-in'));
});

test('a short password and a bad e-mail are refused beside their fields, and nothing is sent', async () => {
  const { person, calls } = open();
  await fillIn(person, 'fourteen chars');
  await fill(person, screen.getByLabelText('E-mail'), 'rosa at crew');
  await person.click(screen.getByRole('button', { name: 'Sign up' }));
  expect(await screen.findByText('Too short: 15 characters or more. A few plain words are fine.')).toBeInTheDocument();
  expect(screen.getByText(/That is not an e-mail address/)).toBeInTheDocument();
  expect(calls).toEqual([]);
});

test('a password that others would try is refused beside the field by the server’s word, and nothing typed is lost', async () => {
  const { person } = open({
    signUp: () => {
      throw new Refused('not-possible', { password: { code: 'passphrase-easily-guessed', message: '' } });
    },
  });
  await fillIn(person, 'passwordpassword');
  await person.click(screen.getByRole('button', { name: 'Sign up' }));
  expect(await screen.findByText('Others would try this one first. Put a few more of your own words to it.')).toBeInTheDocument();
  expect(screen.getByLabelText('Company')).toHaveValue('Heron Flats Concrete');
  expect(screen.getByLabelText('Password')).toHaveValue('passwordpassword');
});

test('without a signal the form says so and keeps what was typed', async () => {
  const { person } = open();
  global.fetch = jest.fn(async () => {
    throw new TypeError('Failed to fetch');
  });
  await fillIn(person, 'grade rods lean left');
  await person.click(screen.getByRole('button', { name: 'Sign up' }));
  expect(await screen.findByText(/No signal/)).toBeInTheDocument();
  expect(screen.getByLabelText('Your name')).toHaveValue('Rosa Ibarra');
});
