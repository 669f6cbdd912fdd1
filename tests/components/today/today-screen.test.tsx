import { screen } from '@testing-library/react';
import { TodayScreen } from '@/components/today/today-screen';
import type { FootingSummary } from '@/shared/api/footing-schemas';
import type { Waiting } from '@/shared/api/job-endpoints';
import type { Role } from '@/shared/roles';
import { fakeApi, Refused } from '@/tests/support/fake-api';
import { FOOTING, JOB, testId } from '@/tests/support/footing-of';
import { renderSignedIn } from '@/tests/support/signed-in';

jest.mock('expo-router', () => jest.requireActual('@/tests/support/linked-router').linkedRouter);

const ROUND = testId(500);
const nowhere: Waiting = {
  what: 'enter-laser',
  jobId: null,
  jobName: null,
  footingId: null,
  footingName: null,
  roundId: null,
  shot: null,
  of: null,
};
const atFooting = (change: Partial<Waiting>): Waiting => ({
  ...nowhere,
  jobId: JOB,
  jobName: 'Ninth Street addition',
  footingId: FOOTING,
  footingName: 'Stepped footing',
  ...change,
});
const footing: FootingSummary = {
  id: FOOTING,
  jobId: JOB,
  jobName: 'Ninth Street addition',
  name: 'Stepped footing',
  unitStyle: 'feet-inches',
  stages: { done: ['outline', 'dig'], now: 'rails' },
  stationCount: 14,
  lastRound: null,
};
const round: NonNullable<FootingSummary['lastRound']> = {
  id: ROUND,
  footingId: FOOTING,
  surface: 'rails',
  number: 1,
  openedAt: '2026-11-30T08:00:00Z',
  openedBy: 'Rosa Ibarra',
  closedAt: null,
  shot: 6,
  of: 14,
  out: 0,
  verdict: 'not-yet',
};

async function open(today: { waiting: Waiting[]; footings: FootingSummary[] }, roles?: Role[]) {
  fakeApi({ today: () => today });
  const drawn = renderSignedIn(<TodayScreen />, roles);
  await screen.findByRole('heading', { name: 'Today' });
  return drawn;
}

test('a new company is shown the one next step, and its button leads there', async () => {
  await open({ waiting: [nowhere, { ...nowhere, what: 'enter-job' }], footings: [] });
  expect(await screen.findByRole('heading', { name: 'Enter the laser' })).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Enter the laser' })).toHaveAttribute('href', '/lasers/new');
});

test.each<[Waiting, string, string]>([
  [atFooting({ what: 'draw-outline' }), 'Draw the outline', `/footings/${FOOTING}/outline`],
  [atFooting({ what: 'set-stations' }), 'Set stations', `/footings/${FOOTING}/stations`],
  [atFooting({ what: 'finish-round', roundId: ROUND, shot: 6, of: 14 }), 'Go on shooting', `/rounds/${ROUND}/shoot`],
  [atFooting({ what: 'finish-round', roundId: ROUND, shot: 0, of: 14 }), 'Set up the laser', `/rounds/${ROUND}/setup`],
  [atFooting({ what: 'shoot-rails' }), 'Open the footing', `/footings/${FOOTING}`],
  // The round may be closed by now: the footing's home goes on with it or opens the next.
  [atFooting({ what: 'mend-rails', roundId: ROUND, shot: 14, of: 14 }), 'Open the footing', `/footings/${FOOTING}`],
  [atFooting({ what: 'see-results', roundId: ROUND, shot: 14, of: 14 }), 'See the results', `/rounds/${ROUND}/results`],
])('what waits first has the one button of the screen: %j', async (waiting, button, href) => {
  await open({ waiting: [waiting], footings: [footing] });
  expect(await screen.findByRole('link', { name: button })).toHaveAttribute('href', href);
});

test('a round in hand says how far it is', async () => {
  await open({ waiting: [atFooting({ what: 'finish-round', roundId: ROUND, shot: 6, of: 14 })], footings: [] });
  expect(await screen.findByText('Ninth Street addition · 6 of 14 shot')).toBeInTheDocument();
});

test.each<[string, Partial<FootingSummary>]>([
  ['Stations set; rails to shoot', {}],
  ['Outline and stations to set', { stationCount: 0, stages: { done: [], now: 'outline' } }],
  ['Rails: 6 of 14 shot', { lastRound: round }],
  ['Rails: not to grade, 3 of 14 out', { lastRound: { ...round, shot: 14, out: 3, verdict: 'not-to-grade' } }],
  ['Rails: to grade, all 14 in', { lastRound: { ...round, shot: 14, verdict: 'to-grade' } }],
  ['Rails: too close to call', { lastRound: { ...round, shot: 14, verdict: 'too-close-to-call' } }],
])('a footing says where it stands: %s', async (sentence, change) => {
  await open({ waiting: [], footings: [{ ...footing, ...change }] });
  expect(await screen.findByText(sentence)).toBeInTheDocument();
  expect(screen.getByText('Local code, the drawings, and the licensed engineer or inspector govern.')).toBeInTheDocument();
});

test('whoever may enter jobs is offered one; an installer with nothing waiting is told so and offered nothing', async () => {
  const first = await open({ waiting: [], footings: [footing] }, ['super']);
  expect(await screen.findByRole('link', { name: 'New job' })).toHaveAttribute('href', '/jobs/new');
  first.unmount();
  await open({ waiting: [], footings: [footing] }, ['installer']);
  expect(await screen.findByText('Nothing waits for you')).toBeInTheDocument();
  expect(screen.queryByRole('link', { name: 'New job' })).toBeNull();
});

test('what could not be fetched says why and can be tried again', async () => {
  let away = true;
  fakeApi({
    today: () => {
      if (away) throw new Refused('role-refused');
      return { waiting: [], footings: [footing] };
    },
  });
  const { person } = renderSignedIn(<TodayScreen />);
  expect(await screen.findByText(/Your role does not allow this/)).toBeInTheDocument();
  away = false;
  await person.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByText('Stepped footing')).toBeInTheDocument();
});
