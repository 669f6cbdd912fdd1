import { nextStep, openSurfaces } from '@/components/footing/next-step';
import type { Footing, RoundSummary } from '@/shared/api/footing-schemas';
import type { Role } from '@/shared/roles';
import { FOOTING, footingOf, L_RUNS, testId, withStations } from '@/tests/support/footing-of';

const FOOT = 304_800_000;
const drawn = footingOf({ runs: L_RUNS });
const stationed = (change: Partial<Footing> = {}): Footing => ({
  ...withStations(drawn, 8 * FOOT),
  stages: { done: ['outline', 'dig'], now: 'rails' },
  ...change,
});
const round = (change: Partial<RoundSummary>): RoundSummary => ({
  id: testId(500),
  footingId: FOOTING,
  surface: 'rails',
  number: 1,
  openedAt: '2026-11-30T08:00:00Z',
  openedBy: 'Rosa Ibarra',
  closedAt: null,
  shot: 6,
  of: 20,
  out: 0,
  verdict: 'not-yet',
  ...change,
});
const operator: Role[] = ['operator'];
const installer: Role[] = ['installer'];
const superintendent: Role[] = ['super'];

test('a footing without an outline asks for it, of whoever may draw one', () => {
  expect(nextStep(footingOf(), operator)).toEqual({ do: 'draw-outline' });
  expect(nextStep(footingOf(), installer)).toEqual({ do: 'wait', for: 'outline' });
});

test('an outline without stations asks for them', () => {
  expect(nextStep(drawn, operator)).toEqual({ do: 'set-stations' });
  expect(nextStep(drawn, installer)).toEqual({ do: 'wait', for: 'stations' });
});

test('the stage that is now asks for a round of its surface, of whoever may shoot it', () => {
  expect(nextStep(stationed(), operator)).toEqual({ do: 'open-round', surface: 'rails' });
  expect(nextStep(stationed(), superintendent)).toEqual({ do: 'wait', for: 'shots' });
  expect(nextStep(stationed({ digNeeded: true, stages: { done: ['outline'], now: 'dig' } }), operator)).toEqual({
    do: 'open-round',
    surface: 'dig',
  });
});

test('a round in hand goes on, for an installer only one of the top', () => {
  const rails = round({});
  expect(nextStep(stationed({ rounds: [rails] }), operator)).toEqual({ do: 'go-on', round: rails });
  expect(nextStep(stationed({ rounds: [rails] }), installer)).toEqual({ do: 'see-results', round: rails });
  const top = round({ surface: 'top' });
  expect(nextStep(stationed({ rounds: [top] }), installer)).toEqual({ do: 'go-on', round: top });
});

test('rails behind, the top is next, and once that is shot its results are', () => {
  const rails = round({ closedAt: '2026-11-30T10:00:00Z', shot: 20, verdict: 'to-grade' });
  const afterRails = stationed({ rounds: [rails], stages: { done: ['outline', 'dig', 'rails'], now: 'release' } });
  expect(nextStep(afterRails, installer)).toEqual({ do: 'open-round', surface: 'top' });
  const top = round({ id: testId(501), surface: 'top', openedAt: '2026-12-01T08:00:00Z', shot: 20, verdict: 'to-grade' });
  const afterTop = stationed({ rounds: [rails, top], stages: { done: ['outline', 'dig', 'rails', 'top'], now: 'release' } });
  expect(nextStep(afterTop, installer)).toEqual({ do: 'see-results', round: top });
});

test('a round opened before is gone on with rather than opened twice', () => {
  const older = round({ openedAt: '2026-11-29T08:00:00Z' });
  const newer = round({ id: testId(502), openedAt: '2026-11-30T08:00:00Z' });
  expect(nextStep(stationed({ rounds: [older, newer] }), operator)).toEqual({ do: 'go-on', round: newer });
});

test('an operator may open any surface, an installer the top, a super none; a dig only where it is shot', () => {
  expect(openSurfaces({ digNeeded: true }, operator)).toEqual(['dig', 'rails', 'wet', 'top']);
  expect(openSurfaces({ digNeeded: false }, operator)).toEqual(['rails', 'wet', 'top']);
  expect(openSurfaces({ digNeeded: true }, installer)).toEqual(['top']);
  expect(openSurfaces({ digNeeded: true }, superintendent)).toEqual([]);
});
