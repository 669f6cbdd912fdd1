import { screen, waitFor } from '@testing-library/react';
import { NewJobScreen } from '@/components/jobs/new-job-screen';
import type { Role } from '@/shared/roles';
import { fakeApi, Refused, type FakeHandlers } from '@/tests/support/fake-api';
import { JOB, jobOf } from '@/tests/support/footing-of';
import { gone } from '@/tests/support/linked-router';
import { fill, renderSignedIn } from '@/tests/support/signed-in';

jest.mock('expo-router', () => jest.requireActual('@/tests/support/linked-router').linkedRouter);

const INCH = 25_400_000;
const MM = 1_000_000;

function open(handlers: FakeHandlers = {}, roles?: Role[]) {
  gone.length = 0;
  const server = fakeApi({ addJob: () => jobOf(), ...handlers });
  return { ...server, ...renderSignedIn(<NewJobScreen />, roles) };
}

test('a job goes out with the ready rules of its unit and wall, in nanometres', async () => {
  const { person, calls } = open();
  await fill(person, screen.getByLabelText('Name'), 'Quarry Lane duplex');
  await person.click(screen.getByRole('button', { name: 'Save the job' }));
  await waitFor(() => expect(gone).toEqual([`/jobs/${JOB}`]));
  // The ready rules as PRODUCT states them: rails ±1/8″, top ±1/4″, dig +0 / −1″; a block bed 1/4″ to 3/4″, 3/8″ planned.
  expect(calls[0]?.body).toMatchObject({
    name: 'Quarry Lane duplex',
    unitStyle: 'feet-inches',
    graduation: INCH / 16,
    rules: {
      rails: { low: INCH / 8, high: INCH / 8, decision: 'simple', style: 'feet-inches' },
      top: { low: INCH / 4, high: INCH / 4 },
      dig: { low: INCH, high: 0 },
    },
    bedRule: { material: 'mortar', least: INCH / 4, most: (3 * INCH) / 4, nominal: (3 * INCH) / 8, courseHeight: 8 * INCH },
  });
});

test('another unit fills in its own usual rules, and what was changed by hand stays with its unit', async () => {
  const { person, calls } = open();
  await fill(person, screen.getByLabelText('Name'), 'Quarry Lane duplex');
  await person.click(screen.getByRole('button', { name: 'Change the rule of Rails' }));
  await fill(person, screen.getByLabelText('Allowed below'), '3/16');
  await person.click(screen.getByRole('radio', { name: /Metres/ }));
  expect(screen.getByLabelText('Allowed below')).toHaveValue('3/16″');
  await person.click(screen.getByRole('button', { name: 'Save the job' }));
  await waitFor(() => expect(gone).toHaveLength(1));
  expect(calls[0]?.body).toMatchObject({
    unitStyle: 'metric',
    graduation: MM,
    rules: { rails: { low: (3 * INCH) / 16, high: INCH / 8 }, top: { low: 6 * MM, high: 6 * MM, style: 'metric' } },
    bedRule: { least: 6 * MM, most: 20 * MM, style: 'metric' },
  });
});

test('a rule that does not read is refused beside its field, and nothing is sent or lost', async () => {
  const { person, calls } = open();
  await fill(person, screen.getByLabelText('Name'), 'Quarry Lane duplex');
  await fill(person, screen.getByLabelText('Thickest'), 'plenty');
  await person.click(screen.getByRole('button', { name: 'Save the job' }));
  expect(await screen.findByText(/“plenty” cannot be read as a length/)).toBeInTheDocument();
  expect(screen.getByLabelText('Thickest')).toHaveValue('plenty');
  expect(calls).toEqual([]);
});

test('a name that is taken is said beside the name', async () => {
  const { person } = open({
    addJob: () => {
      throw new Refused('name-taken', { name: { code: 'name-taken', message: '' } });
    },
  });
  await fill(person, screen.getByLabelText('Name'), 'Quarry Lane duplex');
  await person.click(screen.getByRole('button', { name: 'Save the job' }));
  expect(await screen.findByText('That name is already used. Pick another.')).toBeInTheDocument();
  expect(screen.getByLabelText('Name')).toHaveValue('Quarry Lane duplex');
  expect(gone).toEqual([]);
});

test('an operator who comes by the address is told that the role does not allow it', () => {
  open({}, ['operator']);
  expect(screen.getByText('Your role does not allow this. Ask the owner or the super.')).toBeInTheDocument();
  expect(screen.queryByLabelText('Name')).toBeNull();
});
