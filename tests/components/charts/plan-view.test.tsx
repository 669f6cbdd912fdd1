import '@/hooks/i18n/i18n';
import { fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { NM_PER_FOOT } from '@/analysis';
import { OutlineDrawing } from '@/components/charts/outline-drawing';
import { PlanView } from '@/components/charts/plan-view';

const ft = (x: number, y: number) => ({ x: x * NM_PER_FOOT, y: y * NM_PER_FOOT });
const corners = [
  { ...ft(0, 20), label: 'A' },
  { ...ft(40, 20), label: 'B' },
  { ...ft(40, 0), label: 'C' },
  { ...ft(0, 0), label: 'D' },
];
const stations = [
  { id: 'a', ...ft(0, 20), label: 'A', mark: 'in' },
  { id: 'b', ...ft(40, 20), label: 'B', mark: 'low' },
  { id: 'c', ...ft(40, 0), label: 'C', mark: 'high' },
] as const;
const plan = { corners, closed: true, width: NM_PER_FOOT, stations };

test('the plan says what is out and which way it falls', () => {
  render(<PlanView {...plan} tilt={{ azimuth: 98, text: 'falls 1/4″ toward Mill St' }} laser={ft(50, 10)} />);
  const name =
    'Plan of the footing with 3 stations. Out of tolerance: B, C. falls 1/4″ toward Mill St. The laser is marked on it.';
  expect(screen.getByRole('img', { name })).toHaveTextContent('falls 1/4″ toward Mill St');
});

test('stations are picked by arrow keys and Enter', async () => {
  const person = userEvent.setup();
  const onPressStation = jest.fn();
  render(<PlanView {...plan} onPressStation={onPressStation} />);
  const picker = screen.getByRole('slider', { name: 'Pick a station on the plan' });
  await person.tab();
  expect(picker).toHaveFocus();
  await person.keyboard('{ArrowRight}');
  expect(picker).toHaveAttribute('aria-valuetext', 'B');
  await person.keyboard('{Enter}');
  expect(onPressStation).toHaveBeenLastCalledWith('b');
  await person.keyboard('{End}{Enter}');
  expect(onPressStation).toHaveBeenLastCalledWith('c');
  expect(onPressStation).toHaveBeenCalledTimes(2);
});

test('a place is picked by moving a cross with the arrow keys: right is east, up is north', async () => {
  const person = userEvent.setup();
  const onPressPlace = jest.fn();
  render(
    <PlanView
      {...plan}
      laser={ft(10, 10)}
      onPressPlace={onPressPlace}
      placeText={({ x }) => `${Math.round(x / NM_PER_FOOT)} ft east`}
    />,
  );
  await person.tab();
  const picker = screen.getByRole('slider', { name: 'Pick a place on the plan' });
  expect(picker).toHaveAttribute('aria-valuetext', '10 ft east');
  await person.keyboard('{Enter}');
  expect(onPressPlace).toHaveBeenLastCalledWith(ft(10, 10));
  await person.keyboard('{ArrowRight}{ArrowUp}{Enter}');
  const [moved] = onPressPlace.mock.lastCall ?? [];
  expect(moved.x).toBeGreaterThan(10 * NM_PER_FOOT);
  expect(moved.y).toBeGreaterThan(10 * NM_PER_FOOT);
  expect(Number.isInteger(moved.x)).toBe(true);
});

test('one Enter picks once', () => {
  const onPressPlace = jest.fn();
  render(<PlanView {...plan} onPressPlace={onPressPlace} />);
  const picker = screen.getByRole('slider');
  fireEvent.keyDown(picker, { key: 'Enter' });
  fireEvent.keyUp(picker, { key: 'Enter' });
  expect(onPressPlace).toHaveBeenCalledTimes(1);
});

const run = (id: string, from: [number, number], to: [number, number], length: string, doubtful = false) => ({
  id,
  from: ft(...from),
  to: ft(...to),
  length,
  doubtful,
});

test('an outline that misses closing says so and reads its runs', () => {
  const runs = [
    run('1', [0, 20], [40, 20], '40′ 0″'),
    run('2', [40, 20], [40, 0], '20′ 0″'),
    run('3', [40, 0], [0, 0], '40′ 0″'),
    run('4', [0, 0], [0, 19], '19′ 0″', true),
  ];
  render(<OutlineDrawing runs={runs} width={NM_PER_FOOT} closed={false} />);
  const name = 'Outline of 4 runs, not closed. Run 1 is 40′ 0″. Run 2 is 20′ 0″. Run 3 is 40′ 0″. Run 4 is 19′ 0″.';
  expect(screen.getByRole('img', { name })).toHaveTextContent('19′ 0″');
});

test.each([0, 1, 2])('an outline of %i runs draws without a complaint', (count) => {
  const runs = [run('1', [0, 20], [40, 20], '40′ 0″'), run('2', [40, 20], [40, 0], '20′ 0″')].slice(0, count);
  render(<OutlineDrawing runs={runs} width={NM_PER_FOOT} closed={false} />);
  const paths = [...document.querySelectorAll('path, circle')].map((shape) => shape.outerHTML).join('');
  expect(paths).not.toMatch(/NaN|Infinity|undefined/);
});
