import '@/hooks/i18n/i18n';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { TextField } from '@/components/ui/text-field';

/** Refuses "2" as a metric job does, as soon as the field is left. */
function Refusing() {
  const [value, setValue] = useState('');
  const [error, setError] = useState<string | undefined>(undefined);
  return (
    <TextField
      label="Width"
      hint="metres with a point, or millimetres"
      value={value}
      onChangeText={setValue}
      onBlur={() => setError(value === '2' ? '2 could be metres or millimetres. Write 2 m or 2 mm.' : undefined)}
      error={error}
    />
  );
}

test('a field is found by its label, and its hint describes it', () => {
  render(<Refusing />);
  expect(screen.getByLabelText('Width')).toHaveAccessibleDescription('metres with a point, or millimetres');
});

test('a refused entry is announced beside the field, described by it, and keeps what was typed', async () => {
  const person = userEvent.setup();
  render(<Refusing />);
  const field = screen.getByLabelText('Width');
  expect(screen.getByRole('alert')).toBeEmptyDOMElement();
  await person.type(field, '2');
  await person.tab();
  expect(screen.getByRole('alert')).toHaveTextContent('2 could be metres or millimetres. Write 2 m or 2 mm.');
  expect(field).toHaveAccessibleDescription(/Write 2 m or 2 mm/);
  expect(field).toBeInvalid();
  expect(field).toHaveValue('2');
});

test('a mended entry is no longer called invalid', async () => {
  const person = userEvent.setup();
  render(<Refusing />);
  const field = screen.getByLabelText('Width');
  await person.type(field, '2');
  await person.tab();
  await person.type(field, ' mm');
  await person.tab();
  expect(field).toBeValid();
  expect(screen.getByRole('alert')).toBeEmptyDOMElement();
});

test('a press on the label goes to the field', async () => {
  const person = userEvent.setup();
  render(<Refusing />);
  await person.click(screen.getByText('Width'));
  expect(screen.getByLabelText('Width')).toHaveFocus();
});
