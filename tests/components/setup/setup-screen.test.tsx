import { screen, within } from '@testing-library/react';
import { useSyncExternalStore } from 'react';
import { SetupScreen } from '@/components/setup/setup-screen';
import type { RecordDraft } from '@/hooks/outbox/outbox-storage';
import { benchmarkDraft, setupDrafts, strikeDraft } from '@/hooks/round/record-drafts';
import type { Recorder } from '@/hooks/round/use-recorder';
import type { RoundView } from '@/hooks/round/use-round';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import { recordSchema } from '@/shared/records';
import type { Role } from '@/shared/roles';
import { foldRound } from '@/shared/round/fold-round';
import type { FoldRecord } from '@/shared/round/round-state';
import { ids, morningBundle } from '@/tests/support/morning-round';
import { fill, renderSignedIn } from '@/tests/support/signed-in';

const FOOT = 304_800_000;
const INCH = 25_400_000;

/** A phone's disk: records are made, checked and folded as in the product; only where they are kept is not a browser's database. */
const mockDisk = {
  records: [] as FoldRecord[],
  full: false,
  listeners: new Set<() => void>(),
  keep(drafts: readonly RecordDraft[]) {
    if (this.full) throw new Error('QuotaExceededError');
    const made = drafts.map((draft, index): FoldRecord => {
      const deviceSequence = this.records.length + index + 1;
      const record = recordSchema.parse({
        ...draft,
        deviceId: ids.device,
        deviceSequence,
        clock: { wall: 1_764_576_000_000 + deviceSequence, counter: 0 },
        madeAt: '2026-12-01T08:00:00Z',
      });
      return { record, receipt: null, orderedAt: record.clock.wall, person: { id: ids.person, name: 'Nadia Brandt' } };
    });
    this.records = [...this.records, ...made];
    for (const listener of this.listeners) listener();
  },
};
let mockBundle: RoundBundle = morningBundle();

/** jsdom lays nothing out and cannot scroll: it is written down instead. */
let broughtIntoSight: Element[] = [];
beforeEach(() => {
  broughtIntoSight = [];
  Element.prototype.scrollIntoView = function scrollIntoView(this: Element) {
    broughtIntoSight.push(this);
  };
});

jest.mock('expo-router', () => ({ Link: ({ children }: { children: unknown }) => children }));
jest.mock('@/hooks/outbox/use-outbox', () => ({ useOutbox: () => ({ kept: [], sending: false }) }));
jest.mock('@/hooks/round/use-round', () => ({ useRound: () => mockHooks.useRound() }));
jest.mock('@/hooks/round/use-recorder', () => ({ useRecorder: () => mockRecorder() }));

const mockHooks = {
  useRound: function useRound(): RoundView {
    const records = useSyncExternalStore(
      (listener) => {
        mockDisk.listeners.add(listener);
        return () => void mockDisk.listeners.delete(listener);
      },
      () => mockDisk.records,
    );
    const state = foldRound(records, { ...mockBundle, surface: mockBundle.round.surface });
    return { status: 'ready', bundle: mockBundle, state, error: null, seen: 0, tryAgain: () => undefined };
  },
};

function mockRecorder(): Recorder {
  return {
    startSetup: async (input) => {
      const { drafts, setupId, seriesId } = setupDrafts(input);
      mockDisk.keep(drafts);
      return { setupId, seriesId };
    },
    recordBacksight: async (input) => mockKeepOne(benchmarkDraft('backsight', input, 1)),
    recordCheck: async (input) => mockKeepOne(benchmarkDraft('check', input, 1)),
    recordShot: async () => {
      throw new Error('nothing is shot at setup');
    },
    strike: async (input) => mockKeepOne(strikeDraft(input)),
  };
}

function mockKeepOne(draft: RecordDraft) {
  mockDisk.keep([draft]);
  return draft.id;
}

beforeEach(() => {
  mockDisk.records = [];
  mockDisk.full = false;
  mockBundle = morningBundle();
});

const open = (roles?: Role[]) => renderSignedIn(<SetupScreen roundId={ids.round} />, roles);
const reading = () => screen.getByLabelText('Rod reading on BM 1');
const kinds = () => mockDisk.records.map(({ record }) => (record.kind === 'reading' ? record.purpose : record.kind));

test('a backsight gives the height of instrument with its working, and the grade rod', async () => {
  const { person } = open();
  await person.click(screen.getByText('Near A'));
  await fill(person, reading(), '3 5 3/8');
  await person.click(screen.getByText('Record the backsight'));
  // BM 1 at 101′ 2″ and a backsight of 3′ 5 3/8″: HI 104′ 7 3/8″; at grade 100′ 0″ the rod reads 4′ 7 3/8″.
  expect(await screen.findByText('101′ 2″ + 3′ 5 3/8″ = 104′ 7 3/8″')).toBeInTheDocument();
  expect(screen.getByText('4′ 7 3/8″')).toBeInTheDocument();
  expect(screen.getByText('Start shooting')).toBeInTheDocument();
  expect(kinds()).toEqual(['setup', 'series', 'backsight']);
  const [setup] = mockDisk.records;
  expect(setup?.record).toMatchObject({
    kind: 'setup',
    laserId: ids.laser,
    stand: { x: expect.any(Number), y: expect.any(Number) },
  });
});

test.each([
  ['', 'Read the rod on the benchmark and key what it says.'],
  ['3 5 1/32', /^This rod is read to 1\/16″\. The nearest marks are 3′ 5″ and 3′ 5 1\/16″\.$/],
  ['13\' 1"', 'This rod is 13′ long. Read it again, or pick the rod that is held.'],
  ['-1\' 0"', 'An upright rod starts at zero. Take the minus off.'],
  ["4'7'", /cannot be read as a length/],
  ['4\' 13"', /13 inches are a foot or more/],
  ['7/0', /7\/0 is not a fraction on a rule/],
])('a reading of “%s” is refused beside its field, and nothing is recorded', async (text, sentence) => {
  const { person } = open();
  await fill(person, reading(), text);
  await person.click(screen.getByText('Record the backsight'));
  expect(await screen.findByText(sentence)).toBeInTheDocument();
  expect(reading()).toHaveValue(text);
  expect(reading()).toHaveAttribute('aria-invalid', 'true');
  expect(broughtIntoSight).toEqual([screen.getByText(sentence).closest('[role="alert"]')]);
  expect(mockDisk.records).toEqual([]);
});

test('a reading is keyed with large keys as on the shoot screen, and goes back to the field as it stands', async () => {
  const { person } = open();
  await person.click(screen.getByText('Key it with large keys'));
  const digits = within(screen.getByLabelText('Digits'));
  await person.click(digits.getByText('3'));
  await person.click(digits.getByText('Inches ›'));
  await person.click(digits.getByText('5'));
  await person.click(digits.getByText('Fraction ›'));
  await person.click(screen.getByText('Record the backsight'));
  expect(screen.getByText('Pick the fraction first: 0 for a whole inch.')).toBeInTheDocument();
  await person.click(screen.getByText('3 eighths'));
  await person.click(screen.getByText('Type it instead'));
  expect(reading()).toHaveValue('3′ 5 3/8″');
  await person.click(screen.getByText('Record the backsight'));
  expect(await screen.findByText('101′ 2″ + 3′ 5 3/8″ = 104′ 7 3/8″')).toBeInTheDocument();
});

test('without a benchmark the screen says so and offers to add one, and records nothing', async () => {
  mockBundle = { ...mockBundle, benchmarks: [] };
  const { person } = open();
  expect(screen.getByText('This job has no benchmark yet. The backsight needs one.')).toBeInTheDocument();
  expect(screen.getByText('Add a benchmark')).toBeInTheDocument();
  await fill(person, screen.getByLabelText(/^Rod reading on/), '3 5 3/8');
  await person.click(screen.getByText('Record the backsight'));
  expect(screen.getByText('Pick the benchmark that the rod stands on.')).toBeInTheDocument();
  expect(mockDisk.records).toEqual([]);
});

test('a second backsight shows the spread, and a misread one is struck out and stays visible', async () => {
  const { person } = open();
  await fill(person, reading(), '3 5 3/8');
  await person.click(screen.getByText('Record the backsight'));
  await fill(person, await screen.findByLabelText('Read it again on BM 1'), '3 6 3/8');
  await person.click(screen.getByText('Record it again'));
  expect(await screen.findByText('The readings differ by 1″, more than 1/8″.')).toBeInTheDocument();
  // The mean of 3′ 5 3/8″ and 3′ 6 3/8″ is 3′ 5 7/8″.
  expect(screen.getByText('101′ 2″ + 3′ 5 7/8″ = 104′ 7 7/8″')).toBeInTheDocument();
  await person.click(screen.getByLabelText('Strike out backsight 2, 3′ 6 3/8″'));
  expect(await screen.findByText('101′ 2″ + 3′ 5 3/8″ = 104′ 7 3/8″')).toBeInTheDocument();
  expect(screen.getByText('3′ 6 3/8″')).toBeInTheDocument();
  expect(screen.getByText('struck out')).toBeInTheDocument();
});

test('a reading that this browser does not keep is not shown as recorded, and stays typed', async () => {
  mockDisk.full = true;
  const { person } = open();
  await fill(person, reading(), '3 5 3/8');
  await person.click(screen.getByText('Record the backsight'));
  expect(await screen.findByText(/^This browser did not keep the reading\./)).toBeInTheDocument();
  expect(reading()).toHaveValue('3 5 3/8');
  expect(screen.queryByText('Start shooting')).not.toBeInTheDocument();
});

test('a laser without a recent check warns, and does not stop anybody', async () => {
  const [laser] = mockBundle.lasers;
  if (!laser) throw new Error('no laser');
  mockBundle = { ...mockBundle, lasers: [{ ...laser, checkedOn: null }] };
  const { person } = open();
  expect(screen.getByText('No check of Yard laser is on record.')).toBeInTheDocument();
  await fill(person, reading(), '3 5 3/8');
  await person.click(screen.getByText('Record the backsight'));
  expect(await screen.findByText('Start shooting')).toBeInTheDocument();
});

test('the beam is cautioned about at every setup, the trench at a dig round, more with depth', async () => {
  const first = open();
  expect(screen.getByText(/Never look into the beam/)).toBeInTheDocument();
  expect(screen.queryByText(/competent person/)).not.toBeInTheDocument();
  first.unmount();
  mockBundle = { ...mockBundle, round: { ...mockBundle.round, surface: 'dig' } };
  const { person } = open();
  expect(screen.getByText(/Nothing in this app clears a trench for entry\./)).toBeInTheDocument();
  expect(screen.queryByText(/^At 5 ft and deeper/)).not.toBeInTheDocument();
  await fill(person, screen.getByLabelText(/^How deep is the trench\?/), "5'");
  expect(screen.getByText(/^At 4 ft and deeper/)).toBeInTheDocument();
  expect(screen.getByText(/^At 5 ft and deeper/)).toBeInTheDocument();
});

test('an installer sets up for the top, and not for the rails', () => {
  const first = open(['installer']);
  expect(screen.getByText('Record the backsight')).toBeInTheDocument();
  first.unmount();
  mockBundle = { ...mockBundle, round: { ...mockBundle.round, surface: 'rails' } };
  open(['installer']);
  expect(screen.queryByText('Record the backsight')).not.toBeInTheDocument();
  expect(screen.getByText(/^Your role reads this round\./)).toBeInTheDocument();
});

test('a footing whose grade lies above the beam says to set the laser up higher', async () => {
  const [mark] = mockBundle.benchmarks;
  if (!mark) throw new Error('no benchmark');
  mockBundle = { ...mockBundle, benchmarks: [{ ...mark, elevation: 95 * FOOT + INCH }] };
  const { person } = open();
  await fill(person, reading(), '3 5 3/8');
  await person.click(screen.getByText('Record the backsight'));
  expect(await screen.findByText('The beam passes below this grade. Set the laser up higher.')).toBeInTheDocument();
});
