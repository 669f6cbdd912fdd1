import '@/hooks/i18n/i18n';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { CheckBox } from '@/components/ui/check-box';
import { Notice } from '@/components/ui/notice';
import { StatusPill } from '@/components/ui/status-pill';
import { Table } from '@/components/ui/table';
import { Heading } from '@/components/ui/text';

describe('a button', () => {
  test('is pressed by pointer, Enter and Space', async () => {
    const person = userEvent.setup();
    const onPress = jest.fn();
    render(<Button label="Record" onPress={onPress} />);
    await person.click(screen.getByRole('button', { name: 'Record' }));
    screen.getByRole('button').focus();
    await person.keyboard('{Enter}');
    await person.keyboard(' ');
    expect(onPress).toHaveBeenCalledTimes(3);
  });

  test('at work says so and takes no second press', async () => {
    const person = userEvent.setup({ pointerEventsCheck: 0 });
    const onPress = jest.fn();
    render(<Button label="Record" busy onPress={onPress} />);
    const button = screen.getByRole('button', { name: 'Record' });
    await person.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(button).toHaveAttribute('aria-busy', 'true');
    expect(button).toHaveAttribute('aria-disabled', 'true');
  });

  test.each(['small', 'normal', 'large'] as const)('of size %s is at least 48 px high', (size) => {
    render(<Button label="Record" size={size} />);
    expect(parseInt(getComputedStyle(screen.getByRole('button')).minHeight, 10)).toBeGreaterThanOrEqual(48);
  });
});

test('a check box is changed by Space and by a press, and names itself with its note', async () => {
  const person = userEvent.setup();
  function Braced() {
    const [on, setOn] = useState(false);
    return <CheckBox label="Rails braced" note="2 photos" checked={on} onChange={setOn} />;
  }
  render(<Braced />);
  const box = screen.getByRole('checkbox', { name: /Rails braced.*2 photos/ });
  expect(box).not.toBeChecked();
  await person.tab();
  await person.keyboard(' ');
  expect(box).toBeChecked();
  await person.click(box);
  expect(box).not.toBeChecked();
});

test('a refusal is announced, a caution is not', () => {
  render(
    <>
      <Notice kind="refusal" lead="Not taken.">
        Read the rod again.
      </Notice>
      <Notice kind="caution" lead="Mind the trench." />
    </>,
  );
  expect(screen.getByRole('alert')).toHaveTextContent('Not taken. Read the rod again.');
  expect(screen.getAllByRole('alert')).toHaveLength(1);
});

test.each([
  ['on-phone', 0, 'On this phone'],
  ['on-phone', 3, '3 on phone'],
  ['sending', 2, 'Sending'],
  ['on-server', 0, 'On server'],
  ['needs-you', 1, '1 needs you'],
] as const)('the pill says where records are: %s with %i waiting is "%s"', (state, count, words) => {
  render(<StatusPill state={state} count={count} />);
  expect(screen.getByRole('status')).toHaveTextContent(words);
});

test('a table can be walked by its roles, and a row opened by its first cell', async () => {
  const person = userEvent.setup();
  const onPressRow = jest.fn();
  render(
    <Table
      label="Stations"
      columns={[
        { key: 'station', title: 'Station' },
        { key: 'off', title: 'Off grade', align: 'right' },
      ]}
      rows={[
        { key: 'a', cells: { station: '0+00', off: '0' } },
        { key: 'b', cells: { station: '0+08', off: '1/16″ high' }, current: true },
      ]}
      onPressRow={onPressRow}
    />,
  );
  const table = screen.getByRole('table', { name: 'Stations' });
  expect(
    within(table)
      .getAllByRole('columnheader')
      .map((cell) => cell.textContent),
  ).toEqual(['Station', 'Off grade']);
  const rows = within(table).getAllByRole('row');
  expect(
    within(rows[2] ?? table)
      .getAllByRole('cell')
      .map((cell) => cell.textContent),
  ).toEqual(['0+08', '1/16″ high']);
  expect(rows[2]).toHaveAttribute('aria-current', 'true');
  await person.click(screen.getByRole('button', { name: '0+08' }));
  expect(onPressRow).toHaveBeenCalledWith('b');
});

test('headings carry their level', () => {
  render(<Heading level={3}>Runs</Heading>);
  expect(screen.getByRole('heading', { level: 3, name: 'Runs' })).toBeInTheDocument();
});
