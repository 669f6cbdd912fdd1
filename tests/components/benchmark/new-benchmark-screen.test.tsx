import { screen, waitFor } from '@testing-library/react';
import { gradeFromHub } from '@/components/benchmark/cut-sheet';
import { NewBenchmarkScreen } from '@/components/benchmark/new-benchmark-screen';
import type { Job } from '@/shared/api/job-endpoints';
import { fakeApi, Refused, type FakeHandlers } from '@/tests/support/fake-api';
import { FOOTING, footingOf, JOB, jobOf, testId } from '@/tests/support/footing-of';
import { fill, renderSignedIn } from '@/tests/support/signed-in';

const mockReplace = jest.fn();
jest.mock('expo-router', () => ({
  useRouter: () => ({ replace: mockReplace }),
  Link: ({ children }: { children: unknown }) => children,
}));

const FOOT = 304_800_000;
const INCH = 25_400_000;

async function open(job: Job = jobOf(), handlers: FakeHandlers = {}) {
  mockReplace.mockClear();
  const server = fakeApi({
    job: () => job,
    addBenchmark: ({ body }) => ({ id: testId(1), jobId: JOB, version: 1, ...body }),
    changeFooting: ({ body }) => footingOf(body),
    ...handlers,
  });
  const drawn = renderSignedIn(<NewBenchmarkScreen jobId={JOB} />);
  await screen.findByLabelText('Elevation');
  return { ...server, ...drawn };
}

const sent = (calls: { name: string; body: unknown }[]) =>
  calls.filter(({ name }) => name === 'addBenchmark').map(({ body }) => body);

test('a benchmark without an elevation is refused with the sentence, and nothing is sent', async () => {
  const { person, calls } = await open();
  await fill(person, screen.getByLabelText('Name'), 'BM 1');
  await person.click(screen.getByText('Add the benchmark'));
  expect(
    await screen.findByText('A benchmark without an elevation gives no grade. Key one, or call it 100′ 0″.'),
  ).toBeInTheDocument();
  expect(screen.getByLabelText('Name')).toHaveValue('BM 1');
  expect(sent(calls)).toEqual([]);
});

test.each([
  // 743.62 × 304,800,000 and 226.6554 m, by hand.
  ['743.62', 226_655_376_000],
  ['743\' 7 1/2"', 743 * FOOT + 7.5 * INCH],
  ['226.6554 m', 226_655_400_000],
  ['-2\' 0"', -2 * FOOT],
])('an elevation of %s is taken in the marks it is written in', async (text, elevation) => {
  const { person, calls } = await open();
  await fill(person, screen.getByLabelText('Name'), 'BM 1');
  await fill(person, screen.getByLabelText('Elevation'), text);
  await person.click(screen.getByText('Add the benchmark'));
  await waitFor(() => expect(mockReplace).toHaveBeenCalledWith(`/jobs/${JOB}`));
  expect(sent(calls)).toEqual([{ name: 'BM 1', elevation, note: '' }]);
});

test('a job without elevations calls it 100, in feet or in metres', async () => {
  const first = await open();
  await first.person.click(screen.getByText('Call it 100′ 0″'));
  expect(screen.getByLabelText('Elevation')).toHaveValue('100′ 0″');
  first.unmount();
  const { person } = await open(jobOf({ unitStyle: 'metric', graduation: 1_000_000 }));
  await person.click(screen.getByText('Call it 100.000 m'));
  expect(screen.getByLabelText('Elevation')).toHaveValue('100.000 m');
});

test('a name that is taken is said beside the name', async () => {
  const { person } = await open(jobOf(), {
    addBenchmark: () => {
      throw new Refused('name-taken');
    },
  });
  await fill(person, screen.getByLabelText('Name'), 'BM 1');
  await person.click(screen.getByText('Call it 100′ 0″'));
  await person.click(screen.getByText('Add the benchmark'));
  expect(await screen.findByText('That name is already used. Pick another.')).toBeInTheDocument();
  expect(screen.getByLabelText('Name')).toHaveAccessibleDescription(expect.stringContaining('already used'));
});

test('a hub and its cut give a grade, which becomes a footing’s plan grade with one press', async () => {
  const footing = {
    id: FOOTING,
    jobId: JOB,
    jobName: 'Ninth Street addition',
    name: 'Stepped footing',
    unitStyle: 'feet-inches' as const,
    stages: { done: [], now: 'outline' as const },
    stationCount: 0,
    lastRound: null,
  };
  const { person, calls } = await open(jobOf({ footings: [footing] }));
  await fill(person, screen.getByLabelText('Elevation'), '103\' 0"');
  await fill(person, screen.getByLabelText('How much'), '3\' 6"');
  // 103′ 0″ less a cut of 3′ 6″ is 99′ 6″.
  expect(screen.getByText('Grade 99′ 6″')).toBeInTheDocument();
  expect(screen.getByText('103′ 0″ − 3′ 6″ = 99′ 6″')).toBeInTheDocument();
  await person.click(screen.getByText('Plan grade of Stepped footing'));
  expect(await screen.findByText('The plan grade of Stepped footing is now 99′ 6″.')).toBeInTheDocument();
  expect(calls.find(({ name }) => name === 'changeFooting')?.body).toEqual({ planGrade: 99.5 * FOOT });
  await person.click(screen.getByText('Fill'));
  expect(screen.getByText('Grade 106′ 6″')).toBeInTheDocument();
});

test('a cut deeper than the hub is high gives a negative grade', () => {
  expect(gradeFromHub(2 * FOOT, 'cut', 3 * FOOT)).toBe(-FOOT);
});
