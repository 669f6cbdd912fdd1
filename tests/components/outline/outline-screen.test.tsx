import { screen, waitFor, within } from '@testing-library/react';
import { OutlineScreen } from '@/components/outline/outline-screen';
import type { OutlineInput } from '@/hooks/api/footing-queries';
import type { Footing } from '@/shared/api/footing-schemas';
import { fakeApi, Refused, type FakeHandlers } from '@/tests/support/fake-api';
import { FOOTING, footingOf, jobOf, L_RUNS, run } from '@/tests/support/footing-of';
import { fill, renderSignedIn } from '@/tests/support/signed-in';
import type { Role } from '@/shared/roles';

const mockPush = jest.fn();
jest.mock('expo-router', () => ({
  useRouter: () => ({ push: mockPush, replace: mockPush }),
  Link: ({ children }: { children: unknown }) => children,
}));

const FOOT = 304_800_000;
const INCH = 25_400_000;

beforeEach(() => {
  localStorage.clear();
  mockPush.mockClear();
});

/** A server with this footing, which counts versions as the real one does. */
function serverWith(first: Footing, handlers: FakeHandlers = {}) {
  const state = { footing: first };
  const saved: OutlineInput[] = [];
  const { calls } = fakeApi({
    job: () => jobOf(),
    footing: () => state.footing,
    setOutline: ({ body }) => {
      if (body.version !== state.footing.outlineVersion) throw new Refused('out-of-date');
      saved.push(body);
      state.footing = { ...state.footing, runs: body.runs, outlineVersion: body.version + 1 };
      return state.footing;
    },
    ...handlers,
  });
  return { state, saved, calls };
}

async function open(first: Footing, roles?: Role[]) {
  const server = serverWith(first);
  const drawn = renderSignedIn(<OutlineScreen footingId={FOOTING} />, roles);
  await screen.findByText('Stepped footing · Ninth Street addition');
  return { ...server, ...drawn };
}

const lengthOf = (number: number) => screen.getByRole('textbox', { name: `Length of run ${number}` });
/** The row's words for a screen reader are its content, so its button is found by them. */
const rowSaying = (words: RegExp) => {
  const button = screen.getByText(words).closest('button');
  if (!button) throw new Error(`no row says ${words}`);
  return button;
};
const row = (number: number) => rowSaying(new RegExp(`^Run ${number}, .*top of footing$`));

test('an outline is typed run by run, saved with the version it was drawn over, and leads to the stations', async () => {
  const { person, saved } = await open(footingOf());
  const runs: [text: string, left?: true][] = [["44'"], ['30 0'], ["24'"], ["8'", true], ["20'"], ["22'"]];
  for (const [index, [text, left]] of runs.entries()) {
    await person.click(screen.getByText('Add run'));
    await fill(person, lengthOf(index + 1), text);
    if (left) await person.click(screen.getByText('Left'));
  }
  expect(await screen.findByText('The outline closes.')).toBeInTheDocument();
  await person.click(screen.getByText('Set stations'));
  await waitFor(() => expect(mockPush).toHaveBeenCalledWith(`/footings/${FOOTING}/stations`));
  expect(saved).toHaveLength(1);
  expect(saved[0]?.version).toBe(0);
  expect(saved[0]?.runs.map(({ length, turn }) => [length / FOOT, turn])).toEqual([
    [44, 90],
    [30, 90],
    [24, 90],
    [8, -90],
    [20, 90],
    [22, 90],
  ]);
});

test('a ready L fills in six runs from four dimensions', async () => {
  const { person } = await open(footingOf());
  await person.click(screen.getByText('Start from a ready shape'));
  await person.click(screen.getByText('L'));
  await fill(person, screen.getByLabelText('Length over all'), "44'");
  await fill(person, screen.getByLabelText('Depth over all'), "30'");
  await fill(person, screen.getByLabelText('Missing corner, along the length'), "44'");
  await fill(person, screen.getByLabelText('Missing corner, along the depth'), "8'");
  await person.click(screen.getByText('Fill in the runs'));
  expect(screen.getByText('This has to be less than 44′ 0″, or nothing is left of the side.')).toBeInTheDocument();
  const cut = screen.getByLabelText('Missing corner, along the length');
  await fill(person, cut, "20'");
  await person.click(screen.getByText('Fill in the runs'));
  expect(row(6)).toHaveAccessibleName('Run 6, 22′ 0″, closes, 99′ 6″, top of footing');
  // 44 × 30 less 20 × 8 = 1,160 square feet; 44 + 30 + 24 + 8 + 20 + 22 = 148 ft round.
  expect(screen.getByText('1,160 sq ft')).toBeInTheDocument();
  expect(screen.getByText('148′ 0″')).toBeInTheDocument();
});

test('a misclosure names every run that would close it, and one press puts a length in', async () => {
  const runs = L_RUNS.map((one, index) => (index === 5 ? { ...one, length: 22 * FOOT - 2 * INCH } : one));
  const { person } = await open(footingOf({ runs, outlineVersion: 4 }));
  expect(screen.getByText('The outline misses closing by 2″.')).toBeInTheDocument();
  expect(screen.getByText(/It closes if .*run 2 is 29′ 10″.*run 6 is 22′ 0″/)).toBeInTheDocument();
  await person.click(screen.getByLabelText('Use 22′ 0″ for run 6'));
  expect(screen.queryByText(/misses closing/)).not.toBeInTheDocument();
  expect(row(6)).toHaveAccessibleName(/22′ 0″, closes/);
});

test.each([
  ['0"', 'A run of no length is no run. Enter what was taped, or remove the run.'],
  ["5280'", '5280′ 0″ is a mile or more. Check the unit: a run of a footing is shorter.'],
  ['', 'Key a length here.'],
])('a run of “%s” is refused beside its field, keeps what was typed, and is not saved', async (text, sentence) => {
  const { person, saved } = await open(footingOf());
  await person.click(screen.getByText('Add run'));
  await fill(person, lengthOf(1), text);
  await person.click(screen.getByText('Save the outline'));
  expect(await screen.findByText(sentence)).toBeInTheDocument();
  expect(lengthOf(1)).toHaveValue(text);
  expect(lengthOf(1)).toHaveAccessibleDescription(expect.stringContaining(sentence));
  expect(saved).toHaveLength(0);
});

test('an outline that crosses itself is said to, and cannot be saved', async () => {
  const runs = [run(1, 20), run(2, 10), run(3, 10), run(4, 15), run(5, 5)];
  await open(footingOf({ runs, outlineVersion: 1 }));
  expect(screen.getByText('The outline crosses itself.')).toBeInTheDocument();
  expect(screen.getByRole('button', { name: 'Save the outline' })).toHaveAttribute('aria-disabled', 'true');
});

test('an outline that somebody else changed meanwhile is told; loading theirs sets what was typed aside, and takes it back', async () => {
  const { person, state, saved } = await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }));
  await person.click(row(1));
  await fill(person, lengthOf(1), "45'");
  state.footing = { ...state.footing, runs: [run(7, 10)], outlineVersion: 2 };
  await person.click(screen.getByText('Save the outline'));
  await person.click(await screen.findByText('Load theirs'));
  expect(await screen.findByText(/^Run 1, 10′ 0″/)).toBeInTheDocument();
  expect(saved).toHaveLength(0);
  await person.click(screen.getByText('Put mine back'));
  expect(screen.getByText(/^Run 1, 45′ 0″/)).toBeInTheDocument();
  await person.click(screen.getByText('Save the outline'));
  await waitFor(() => expect(saved).toHaveLength(1));
  expect(saved[0]).toMatchObject({ version: 2 });
});

test('what was typed survives a reload', async () => {
  const first = await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }));
  await first.person.click(row(6));
  await fill(first.person, lengthOf(6), '21\' 10"');
  first.unmount();
  await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }));
  expect(row(6)).toHaveAccessibleName(/21′ 10″/);
});

test('a step shows on the run where it is, and the runs after it stand on its grade', async () => {
  const { person } = await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }));
  await person.click(row(5));
  await person.click(screen.getByText('Add a step'));
  const step = within(screen.getByLabelText('Step 1'));
  await fill(person, step.getByLabelText('From the start of the run'), "12'");
  await fill(person, step.getByLabelText('Height of the step'), '8"');
  await person.click(screen.getByText('Done with run 5'));
  expect(row(5)).toHaveAccessibleName('Run 5, 20′ 0″, turn right, 99′ 6″, down 8″ at 12′ 0″, top of footing');
  expect(row(5)).toHaveFocus();
  expect(row(6)).toHaveAccessibleName(/98′ 10″, top of footing/);
  expect(screen.getByText('The steps end 8″ lower than they start.')).toBeInTheDocument();
});

test('once there are shots an operator reads the outline and a super changes it', async () => {
  const shot = footingOf({ runs: L_RUNS, outlineVersion: 1, hasShots: true });
  const { unmount } = await open(shot, ['operator']);
  expect(screen.queryByRole('button', { name: 'Add run' })).not.toBeInTheDocument();
  expect(screen.getByText(/only the owner or the super may change it/)).toBeInTheDocument();
  unmount();
  await open(shot, ['super']);
  expect(screen.getByRole('button', { name: 'Add run' })).toBeInTheDocument();
});
