import '@/hooks/i18n/i18n';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { LengthField, type LengthFieldProps } from '@/components/lengths/length-field';

function Held(props: Omit<LengthFieldProps, 'value' | 'onChange' | 'label'>) {
  const [text, setText] = useState('');
  return <LengthField {...props} label="Reading" value={text} onChange={setText} />;
}

const SIXTEENTH = 1_587_500;

test('nobody is told off in mid-number: the refusal comes when the field is left, and what was keyed stays', async () => {
  const person = userEvent.setup();
  render(<Held style="feet-inches" graduation={SIXTEENTH} />);
  await person.type(screen.getByLabelText('Reading'), '4 7 3/32');
  expect(screen.queryByText(/nearest marks/)).toBeNull();
  await person.tab();
  expect(screen.getByText('This rod is read to 1/16″. The nearest marks are 4′ 7 1/16″ and 4′ 7 1/8″.')).toBeInTheDocument();
  expect(screen.getByLabelText('Reading')).toHaveValue('4 7 3/32');
  expect(screen.getByLabelText('Reading')).toHaveAttribute('aria-invalid', 'true');
});

test('a refusal goes away as soon as the text changes', async () => {
  const person = userEvent.setup();
  render(<Held style="metric" />);
  await person.type(screen.getByLabelText('Reading'), '2');
  await person.tab();
  expect(screen.getByText('“2” could be metres or millimetres. Key 2 m or 2 mm.')).toBeInTheDocument();
  await person.type(screen.getByLabelText('Reading'), ' m');
  expect(screen.queryByText(/could be metres/)).toBeNull();
});

test('a text in another unit says what it was read as', async () => {
  const person = userEvent.setup();
  render(<Held style="feet-inches" bareDecimal="feet" />);
  await person.type(screen.getByLabelText('Reading'), '99.50');
  await person.tab();
  expect(screen.getByText('Read as 99′ 6″')).toBeInTheDocument();
  expect(screen.getByLabelText('Reading')).toHaveValue('99.50');
});

test('an empty field is not refused by being passed through', async () => {
  const person = userEvent.setup();
  render(<Held style="feet-inches" />);
  await person.click(screen.getByLabelText('Reading'));
  await person.tab();
  expect(screen.getByLabelText('Reading')).not.toHaveAttribute('aria-invalid');
});
