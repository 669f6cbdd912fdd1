import '@/hooks/i18n/i18n';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { NM_PER_FOOT, NM_PER_INCH } from '@/analysis';
import type { ProfilePoint } from '@/components/charts/chart-types';
import { markPaths } from '@/components/charts/mark-shapes';
import ProfileVictory from '@/components/charts/profile-victory';
import { markRadius, profileGeometry } from '@/components/charts/profile-geometry';
import { ProfileStrip } from '@/components/charts/profile-strip';

const sixteenth = NM_PER_INCH / 16;
const units = { style: 'feet-inches', graduation: sixteenth } as const;
const station = (feet: number, sixteenths: number | null, more: Partial<ProfilePoint> = {}): ProfilePoint => ({
  id: `at-${feet}`,
  at: feet * NM_PER_FOOT,
  deviation: sixteenths === null ? null : sixteenths * sixteenth,
  mark: sixteenths === null ? 'not-shot' : sixteenths > 2 ? 'high' : sixteenths < -2 ? 'low' : 'in',
  label: `0+${String(feet).padStart(2, '0')}`,
  ...more,
});
const points = [
  station(0, 0),
  station(20, 2, { close: true }),
  station(44, -4, { label: 'C' }),
  station(60, 3),
  station(70, 16, { suspect: true, label: 'C + 26 ft' }),
  station(80, null),
];
const props = {
  points,
  corners: [{ at: 0, label: 'A 0+00' }],
  length: 100 * NM_PER_FOOT,
  tolerance: { low: 2 * sixteenth, high: 2 * sixteenth },
  units,
};
// Counted by hand from the stations above.
const said =
  'Profile round the footing, 5 of 6 stations shot. 2 in, 2 high, 1 low. 1 too close to call. To look at again: C + 26 ft. ' +
  'Lowest C, 1/4″ low; highest C + 26 ft, 1″ high.';

test('the strip says in words what it shows, and where one is', () => {
  render(<ProfileStrip {...props} currentId="at-80" />);
  expect(screen.getByRole('img', { name: `${said} Now at 0+80, not shot.` })).toBeInTheDocument();
});

test('nothing shot yet is said so', () => {
  render(<ProfileStrip {...props} points={[station(0, null)]} />);
  expect(screen.getByRole('img', { name: 'Profile round the footing, 0 of 1 station shot.' })).toBeInTheDocument();
});

// The module behind the lazy one: jest has no dynamic import. The browser tests see it arrive by itself.
const shown = () => render(<ProfileVictory title="Around the footing" {...props} />).container;

test('the chart says in words what it shows', () => {
  shown();
  expect(screen.getByRole('img', { name: said })).toBeInTheDocument();
  expect(screen.getByRole('heading', { name: 'Around the footing' })).toBeInTheDocument();
  expect(screen.getByText(/^heights in inches, ×[\d,]+$/)).toBeInTheDocument();
});

test('the charting library draws each mark where the one geometry puts it', async () => {
  const container = shown();
  const width = Number(container.querySelector('svg')?.getAttribute('width'));
  const geometry = profileGeometry({ ...props, width, height: 200 });
  const expected = markPaths(geometry.marks, markRadius(geometry));
  const drawn = [...container.querySelectorAll('path')].map((path) => path.getAttribute('d'));
  for (const shape of ['high', 'low', 'in', 'close', 'suspect', 'not-shot'] as const) expect(drawn).toContain(expected[shape]);
});

test('arrow keys read it station by station, Home and End go to its ends', async () => {
  const person = userEvent.setup();
  shown();
  const walk = screen.getByRole('slider', { name: 'Walk along the profile' });
  await person.tab();
  expect(walk).toHaveFocus();
  await person.keyboard('{ArrowRight}{ArrowRight}');
  expect(walk).toHaveAttribute('aria-valuetext', '0+20, 1/8″ high, too close to call');
  expect(screen.getByRole('status')).toHaveTextContent('0+20, 1/8″ high, too close to call');
  await person.keyboard('{ArrowRight}');
  expect(screen.getByRole('status')).toHaveTextContent('C, 1/4″ low, out of tolerance');
  await person.keyboard('{End}');
  expect(screen.getByRole('status')).toHaveTextContent('0+80, not shot');
  await person.keyboard('{ArrowRight}{Home}');
  expect(screen.getByRole('status')).toHaveTextContent('0+00, on grade');
});

test('plus looks closer, minus wider, and the keys beside it do the same', async () => {
  const person = userEvent.setup();
  shown();
  const times = () => Number(screen.getByText(/^heights in/).textContent?.replace(/\D/g, ''));
  const whole = times();
  await person.tab();
  await person.keyboard('{ArrowRight}+');
  expect(times()).toBeLessThan(whole);
  await person.keyboard('-');
  expect(times()).toBe(whole);
  await person.click(screen.getByRole('button', { name: 'Closer' }));
  expect(times()).toBeLessThan(whole);
  await person.click(screen.getByRole('button', { name: 'Wider' }));
  expect(times()).toBe(whole);
});
