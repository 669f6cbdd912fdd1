import '@/hooks/i18n/i18n';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { Choice } from '@/components/ui/choice';

type Way = 'feet-inches' | 'decimal-feet' | 'metric';
const options = [
  { value: 'feet-inches', label: 'Feet and inches' },
  { value: 'decimal-feet', label: 'Decimal feet' },
  { value: 'metric', label: 'Metric' },
] as const;

function Units({ start }: { start: Way | null }) {
  const [value, setValue] = useState<Way | null>(start);
  return <Choice label="Unit style" options={options} value={value} onChange={setValue} />;
}

const checked = () =>
  screen.getAllByRole('radio').find((radio) => radio.getAttribute('aria-checked') === 'true')?.textContent ?? null;

test('the group and its choices are named', () => {
  render(<Units start="metric" />);
  expect(screen.getByRole('radiogroup', { name: 'Unit style' })).toBeInTheDocument();
  expect(screen.getByRole('radio', { name: 'Metric' })).toBeChecked();
});

test('Tab stops once, at the chosen one', async () => {
  const person = userEvent.setup();
  render(
    <>
      <Units start="decimal-feet" />
      <button>After</button>
    </>,
  );
  await person.tab();
  expect(screen.getByRole('radio', { name: 'Decimal feet' })).toHaveFocus();
  await person.tab();
  expect(screen.getByRole('button', { name: 'After' })).toHaveFocus();
});

test('arrows move and choose, round the ends; Home and End go to them', async () => {
  const person = userEvent.setup();
  render(<Units start="feet-inches" />);
  await person.tab();
  await person.keyboard('{ArrowRight}');
  expect(checked()).toBe('Decimal feet');
  expect(screen.getByRole('radio', { name: 'Decimal feet' })).toHaveFocus();
  await person.keyboard('{ArrowDown}{ArrowDown}');
  expect(checked()).toBe('Feet and inches');
  await person.keyboard('{ArrowLeft}');
  expect(checked()).toBe('Metric');
  await person.keyboard('{Home}');
  expect(checked()).toBe('Feet and inches');
  await person.keyboard('{End}');
  expect(checked()).toBe('Metric');
});

test('with nothing chosen Tab goes to the first, and Space chooses it', async () => {
  const person = userEvent.setup();
  render(<Units start={null} />);
  expect(checked()).toBeNull();
  await person.tab();
  expect(checked()).toBeNull();
  await person.keyboard(' ');
  expect(checked()).toBe('Feet and inches');
});

test('a press chooses', async () => {
  const person = userEvent.setup();
  render(<Units start={null} />);
  await person.click(screen.getByRole('radio', { name: 'Metric' }));
  expect(checked()).toBe('Metric');
});
