import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, screen, within } from '@testing-library/react';
import { ShootScreen } from '@/components/shoot/shoot-screen';
import { recordsQuery, roundQuery } from '@/hooks/api/round-queries';
import { browserOutbox } from '@/hooks/outbox/browser-outbox';
import { outboxScope } from '@/hooks/outbox/outbox-storage';
import type { RoundBundle } from '@/shared/api/round-endpoints';
import type { ReadingRecord, StoredRecord } from '@/shared/records';
import type { Role } from '@/shared/roles';
import { MemoryStorage } from '@/tests/support/memory-outbox';
import { ids, morningBundle, morningRecords } from '@/tests/support/morning-round';
import { COMPANY, fill, PERSON, renderSignedIn } from '@/tests/support/signed-in';

const FOOT = 304_800_000;
const INCH = 25_400_000;
const SIXTEENTH = INCH / 16;

jest.mock('expo-router', () => ({ Link: ({ children }: { children: unknown }) => children }));
// The phone's disk in memory; keeping, ordering, folding and sending are the product's own.
const mockDisk = new MemoryStorage();
jest.mock('@/hooks/outbox/browser-storage', () => ({ BrowserStorage: jest.fn(() => mockDisk) }));

const SCOPE = outboxScope(COMPANY, PERSON);
const ROSA = { id: PERSON, name: 'Rosa Ibarra' };

/** Setup, series and backsight of the morning round (HI 104′ 7 3/8″), made by whoever is signed in. Grade rod 4′ 7 3/8″. */
const setUp = () =>
  morningRecords([]).flatMap((entry): StoredRecord[] =>
    entry.receipt && !(entry.record.kind === 'reading' && entry.record.purpose === 'check')
      ? [{ record: entry.record, receipt: { ...entry.receipt, person: ROSA } }]
      : [],
  );

interface Morning {
  records?: StoredRecord[];
  bundle?: (bundle: RoundBundle) => void;
  roles?: Role[];
}

async function open({ records = setUp(), bundle: change, roles }: Morning = {}) {
  const bundle = morningBundle();
  bundle.round.surface = 'rails';
  change?.(bundle);
  await browserOutbox().open(SCOPE);
  // The round is in the cache already, as when the footing's home was open before.
  const cache = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  cache.setQueryData(roundQuery(ids.round).queryKey, bundle);
  cache.setQueryData(recordsQuery(ids.round).queryKey, { records, last: records.length });
  return renderSignedIn(
    <QueryClientProvider client={cache}>
      <ShootScreen roundId={ids.round} at={null} />
    </QueryClientProvider>,
    roles,
  ).person;
}

/** By its words: asking jsdom for the roles and names of sixteen keys at each press takes most of a test's time. */
const button = (name: string) => screen.queryAllByText(name).at(-1) ?? screen.getByLabelText(name);
const radio = (name: string) => screen.getByText(name);
const field = () => screen.getByLabelText('Rod reading');
const place = () => document.querySelector('[role="heading"][aria-level="2"], h2')?.textContent;
const kept = () =>
  browserOutbox()
    .snapshot()
    .kept.map(({ record }) => record);
const shots = () => kept().filter((record): record is ReadingRecord => record.kind === 'reading');

beforeEach(() => {
  // No signal: what is recorded stays on the phone, where the test looks at it.
  globalThis.fetch = () => Promise.reject(new TypeError('no signal'));
});

afterEach(async () => {
  cleanup();
  await browserOutbox().settled();
  await mockDisk.remove(
    browserOutbox()
      .snapshot()
      .kept.map(({ id }) => id),
  );
  mockDisk.full = false;
  await browserOutbox().open(null);
});

test('a shot is two presses when feet and inches carry over, and the next station comes up by itself', async () => {
  const person = await open();
  expect(place()).toBe('A, 0+00');
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  expect(await screen.findByText('0+07.3')).toBeInTheDocument();
  await person.click(button('7 sixteenths'));
  await person.click(button('Record'));
  expect(await screen.findByText('0+14.7')).toBeInTheDocument();
  expect(shots().map(({ keyed, reading }) => [keyed, reading])).toEqual([
    ['4′ 7 3/8″', 4 * FOOT + 7 * INCH + 6 * SIXTEENTH],
    ['4′ 7 7/16″', 4 * FOOT + 7 * INCH + 7 * SIXTEENTH],
  ]);
  expect(button('2 on phone')).toBeInTheDocument();
});

test('the verdict stands and is said while the reading is keyed', async () => {
  const person = await open();
  await person.click(button('5 eighths'));
  expect(screen.getByText('raise 1 quarter of an inch. low, out of ±1/8″')).toBeInTheDocument();
  await person.click(button('3 eighths'));
  expect(screen.getByText(/^on\. /)).toBeInTheDocument();
  await person.click(button('1 quarter'));
  expect(screen.getByText(/^lower 1 eighth of an inch/)).toBeInTheDocument();
});

test('a rail out of tolerance keeps the operator at its station until it is shot again or left', async () => {
  const person = await open();
  await person.click(button('3 quarters'));
  await person.click(button('Record'));
  expect(await screen.findByText('Recorded. Now move the rail.')).toBeInTheDocument();
  expect(place()).toBe('A, 0+00');
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  expect(await screen.findByText('0+07.3')).toBeInTheDocument();
  expect(shots().map((shot) => shot.point)).toEqual([shots()[0]?.point, shots()[0]?.point]);
  await person.click(button('Previous station'));
  expect(screen.getByText(/before adjusting 3\/8″ low/)).toBeInTheDocument();
});

test('a jump of half an inch from the neighbours is asked about, and is recorded only when somebody says so', async () => {
  const person = await open();
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  await screen.findByText('0+07.3');
  await person.click(button('One inch more'));
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  const question = await screen.findByRole('dialog');
  expect(question).toHaveTextContent('1″ off its neighbours');
  await person.click(within(question).getByText('Key again'));
  expect(shots()).toHaveLength(1);
  await person.click(button('Record'));
  await person.click(await screen.findByText('Record it'));
  expect(await screen.findByText('Recorded. Now move the rail.')).toBeInTheDocument();
  expect(shots().at(-1)?.keyed).toBe('4′ 8 3/8″');
});

test('the keypad keys feet and inches and comes back to the fractions', async () => {
  const person = await open();
  await person.click(button('Keypad'));
  for (const key of ['5', 'Inches', '1', '1', 'Fraction']) await person.click(button(key));
  await person.click(button('one half'));
  expect(screen.getByLabelText('5 feet 11 and one half inches')).toBeInTheDocument();
});

test.each([
  [`4' 7 3/32"`, 'This rod is read to 1/16″. The nearest marks are 4′ 7 1/16″ and 4′ 7 1/8″.'],
  [`14'`, 'This rod is 13′ long. Key the reading again.'],
  [`-4' 7"`, 'An upright rod reads from zero up. Take the minus off.'],
  [`4' 13"`, '13 inches are a foot or more. Carry the foot over, so that the inches stay under 12.'],
])('%s is refused beside the reading, and stays as it was typed', async (text, sentence) => {
  const person = await open();
  await fill(person, field(), text);
  await person.keyboard('{Enter}');
  expect(screen.getByText(sentence)).toBeInTheDocument();
  expect(field()).toHaveValue(text);
  expect(field()).toHaveAttribute('aria-invalid', 'true');
  expect(kept()).toEqual([]);
});

test('an empty reading is refused with what is wanted', async () => {
  const person = await open();
  await person.click(button('Record'));
  expect(screen.getByText('Pick the fraction first: 0 for a whole inch.')).toBeInTheDocument();
  expect(kept()).toEqual([]);
});

test('a keyboard does it all: a fraction and Enter record, arrows walk and step an inch', async () => {
  const person = await open();
  await person.keyboard('3/8{Enter}');
  expect(await screen.findByText('0+07.3')).toBeInTheDocument();
  expect(shots().at(-1)?.keyed).toBe('4′ 7 3/8″');
  await person.keyboard('{ArrowRight}');
  expect(place()).toBe('0+14.7');
  await person.keyboard('{ArrowUp}{ArrowUp}{ArrowDown}');
  await person.keyboard('5/16{Enter}');
  expect(await screen.findByRole('dialog')).toHaveTextContent('4′ 8 5/16″');
});

test('nothing is recorded without a backsight, and the way to it is there', async () => {
  await open({ records: setUp().filter(({ record }) => record.kind !== 'reading') });
  expect(screen.getByText('Read the benchmark first')).toBeInTheDocument();
  expect(screen.getByText('Set up the laser')).toBeInTheDocument();
  expect(screen.queryByText('Record')).toBeNull();
});

test('somebody else’s setup is taken over only when somebody says that it is the same laser and rod', async () => {
  const others = setUp().map(({ record, receipt }) => ({
    record,
    receipt: { ...receipt, person: { id: ids.person, name: 'Nadia Brandt' } },
  }));
  const person = await open({ records: others });
  expect(screen.queryByText('Record')).toBeNull();
  await person.click(button('Go on with Nadia Brandt’s setup'));
  expect(button('Record')).toBeInTheDocument();
});

test('the last shot is struck out in two presses, and its station comes up again', async () => {
  const person = await open();
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  await screen.findByText('0+07.3');
  await person.click(button('Strike last out'));
  await person.click(await screen.findByText('Misread'));
  expect(await screen.findByText('A, 0+00')).toBeInTheDocument();
  expect(kept().at(-1)).toMatchObject({ kind: 'strike', targetId: shots()[0]?.id, reason: 'misread' });
  expect(screen.getByText(/0 of 20 shot/)).toBeInTheDocument();
});

test('Set records the grade rod in one press with the receiver’s setting', async () => {
  const person = await open();
  await person.click(radio('Set'));
  await person.click(radio('Coarse, 1/8″'));
  await person.click(button('Record set'));
  expect(await screen.findByText('0+07.3')).toBeInTheDocument();
  expect(shots()[0]).toMatchObject({ how: 'set', receiver: 'coarse', keyed: '', reading: 4 * FOOT + 7 * INCH + 6 * SIXTEENTH });
});

describe('the benchmark read again', () => {
  const check = async (person: Awaited<ReturnType<typeof open>>, text: string) => {
    await fill(person, field(), text);
    await person.click(button('Record check'));
  };
  // BM 1 at 101′ 2″ under HI 104′ 7 3/8″ reads 3′ 5 3/8″; the limit is 1/16″.
  it('says nothing of what it should read before it is keyed, then that the laser held', async () => {
    const person = await open();
    await person.click(button('Check BM'));
    expect(document.body).not.toHaveTextContent('3′ 5 3/8″');
    await check(person, `3' 5 7/16"`);
    expect(await screen.findByText('The laser held.')).toBeInTheDocument();
    expect(shots()).toMatchObject([{ purpose: 'check', keyed: `3' 5 7/16"` }]);
    await person.click(button('Back to shooting'));
    expect(screen.getByText(/^laser held, /)).toBeInTheDocument();
  });
  it('asks to read again after a miss, and strikes that as misread when the next one fits', async () => {
    const person = await open();
    await person.click(button('Check BM'));
    await check(person, `3' 6 3/8"`);
    expect(await screen.findByText('That does not fit. Read BM 1 again.')).toBeInTheDocument();
    expect(screen.queryByText(/doubted/)).toBeNull();
    await check(person, `3' 5 3/8"`);
    expect(await screen.findByText('The laser held.')).toBeInTheDocument();
    expect(kept().at(-1)).toMatchObject({ kind: 'strike', targetId: shots()[0]?.id, reason: 'misread' });
  });
  it('doubts the laser when two readings agree on a miss', async () => {
    const person = await open();
    await person.click(button('Check BM'));
    await check(person, `3' 5 7/8"`);
    await screen.findByText('That does not fit. Read BM 1 again.');
    await check(person, `3' 5 15/16"`);
    expect(await screen.findByText('The laser has moved, or the benchmark has.')).toBeInTheDocument();
    expect(kept().some((record) => record.kind === 'strike')).toBe(false);
  });
});

test('a lap that is all shot says so and leads to the results or the next lap', async () => {
  const person = await open({
    bundle: (bundle) => {
      bundle.footing.stations = bundle.footing.stations.slice(0, 2);
    },
  });
  for (const next of ['0+07.3', 'All 2 shot']) {
    await person.click(button('3 eighths'));
    await person.click(button('Record'));
    await screen.findByText(next);
  }
  expect(screen.getByText('See results')).toBeInTheDocument();
  await person.click(button('Start lap 2'));
  expect(place()).toBe('A, 0+00');
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  await screen.findByText('0+07.3');
  expect(shots().map(({ lap }) => lap)).toEqual([1, 1, 2]);
});

test('decimal feet and metric rods are keyed with the point that the digits imply', async () => {
  const person = await open({
    bundle: (bundle) => {
      bundle.job = { ...bundle.job, unitStyle: 'metric', graduation: 1_000_000 };
      bundle.rods = bundle.rods.map((rod) => ({ ...rod, style: 'metric' as const, graduation: 1_000_000 }));
    },
  });
  for (const digit of '1407') await person.click(button(digit));
  expect(screen.getByLabelText('1.407 metres')).toBeInTheDocument();
  await person.click(button('Record'));
  await screen.findByText('0+07.3');
  expect(shots()[0]).toMatchObject({ keyed: '1.407', style: 'metric', reading: 1_407_000_000 });
  await person.click(button('2'));
  await person.click(button('Record'));
  expect(screen.getByText('“2” could be metres or millimetres. Key 2 m or 2 mm.')).toBeInTheDocument();
});

test('whoever may not shoot this surface looks on and presses nothing by mistake', async () => {
  await open({ roles: ['installer'] });
  expect(screen.getByText(/^Wall installers shoot rounds of the top/)).toBeInTheDocument();
  expect(screen.queryByText('Record')).toBeNull();
});

test('a shot that the phone will not keep is not recorded, and stays keyed', async () => {
  const person = await open();
  mockDisk.full = true;
  await person.click(button('3 eighths'));
  await person.click(button('Record'));
  expect(await screen.findByText(/This phone would not keep the shot/)).toBeInTheDocument();
  expect(screen.getByLabelText('4 feet 7 and 3 eighths inches')).toBeInTheDocument();
  expect(place()).toBe('A, 0+00');
});
