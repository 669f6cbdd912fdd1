import { screen, waitFor } from '@testing-library/react';
import { StationsScreen } from '@/components/stations/stations-screen';
import type { Footing } from '@/shared/api/footing-schemas';
import type { Job } from '@/shared/api/job-endpoints';
import type { Role } from '@/shared/roles';
import { fakeApi, Refused } from '@/tests/support/fake-api';
import { FOOTING, footingOf, jobOf, L_RUNS, run, testId, withStations } from '@/tests/support/footing-of';
import { fill, renderSignedIn } from '@/tests/support/signed-in';

jest.mock('expo-router', () => ({ Link: ({ children }: { children: unknown }) => children }));

const FOOT = 304_800_000;

async function open(first: Footing, { job = jobOf(), roles }: { job?: Job; roles?: Role[] } = {}) {
  const state = { footing: first };
  const { calls } = fakeApi({
    job: () => job,
    footing: () => state.footing,
    setStations: ({ body }) => (state.footing = withStations(state.footing, body.spacing)),
    changeStation: ({ params, body }) => {
      const stations = state.footing.stations.map((one) =>
        one.id === params.stationId ? { ...one, name: body.name ?? one.name } : one,
      );
      return (state.footing = { ...state.footing, stations });
    },
    removeStation: ({ params }) => {
      if (params.stationId === testId(101)) throw new Refused('station-has-shots');
      return (state.footing = { ...state.footing, stations: state.footing.stations.filter(({ id }) => id !== params.stationId) });
    },
  });
  const drawn = renderSignedIn(<StationsScreen footingId={FOOTING} />, roles);
  await screen.findByText('Stepped footing · Ninth Street addition');
  return { calls, state, ...drawn };
}

test('stations are previewed, laid out by the server, and listed with their corners and grades', async () => {
  const { person, calls } = await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }));
  await fill(person, screen.getByLabelText('No further apart than'), "8'");
  // Worked in station-preview.test.ts: 20 places.
  expect(screen.getByText('20 stations, 6 at corners.')).toBeInTheDocument();
  await person.click(screen.getByText('Lay out 20 stations'));
  expect(await screen.findByText('20 stations')).toBeInTheDocument();
  expect(calls.find(({ name }) => name === 'setStations')?.body).toEqual({ spacing: 8 * FOOT });
  // The third corner, after runs of 44 and 30 ft.
  expect(screen.getByText('C 0+74')).toBeInTheDocument();
});

test('a spacing wider than half a straightedge is warned about, in the job’s own unit', async () => {
  const { person, unmount } = await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }));
  expect(screen.queryByText(/cannot be judged/)).not.toBeInTheDocument();
  await fill(person, screen.getByLabelText('No further apart than'), "8'");
  expect(screen.getByText('A 10′ edge cannot be judged on stations further apart than 5′.')).toBeInTheDocument();
  await person.click(screen.getByText('Use 5′'));
  expect(screen.queryByText(/cannot be judged/)).not.toBeInTheDocument();
  unmount();
  const metric = await open(footingOf({ runs: L_RUNS, outlineVersion: 1 }), {
    job: jobOf({ unitStyle: 'metric', graduation: 1_000_000 }),
  });
  await fill(metric.person, screen.getByLabelText('No further apart than'), '2 m');
  expect(screen.getByText('A 3 m edge cannot be judged on stations further apart than 1.500 m.')).toBeInTheDocument();
});

test('stations on one line are said to tell the tilt along it only', async () => {
  await open(footingOf({ runs: [run(1, 40, 0)], outlineVersion: 1 }));
  expect(screen.getByText('All stations lie on one line: tilt along the line only.')).toBeInTheDocument();
});

test('two stations are said to tell the level only', async () => {
  const { person } = await open(footingOf({ runs: [run(1, 4, 0)], outlineVersion: 1 }));
  await fill(person, screen.getByLabelText('No further apart than'), "5'");
  expect(screen.getByText('2 stations: level only.')).toBeInTheDocument();
});

test('a station past the end of the walk is refused beside its field', async () => {
  const { person, calls } = await open(withStations(footingOf({ runs: L_RUNS, outlineVersion: 1 }), 8 * FOOT));
  await fill(person, screen.getByLabelText('Distance along the walk'), "149'");
  await person.click(screen.getByText('Add a station'));
  expect(screen.getByText('The walk is only 148′ 0″ long.')).toBeInTheDocument();
  expect(screen.getByLabelText('Distance along the walk')).toHaveValue("149'");
  expect(calls.some(({ name }) => name === 'addStation')).toBe(false);
});

test('a station is named; one that has been shot stays, and says so', async () => {
  const { person, state } = await open(withStations(footingOf({ runs: L_RUNS, outlineVersion: 1 }), 8 * FOOT));
  await person.click(screen.getByText('0+14.7'));
  await fill(person, screen.getByLabelText('Name of 0+14.7'), 'Pilaster');
  await person.click(screen.getByText('Save'));
  expect(await screen.findByText('Pilaster')).toBeInTheDocument();
  await person.click(screen.getByText('0+07.3'));
  await person.click(screen.getByText('Remove 0+07.3'));
  expect(await screen.findByText('This station has been shot, so it stays.')).toBeInTheDocument();
  expect(state.footing.stations.some(({ id }) => id === testId(101))).toBe(true);
});

test('an installer reads the stations and is offered no change', async () => {
  await open(withStations(footingOf({ runs: L_RUNS, outlineVersion: 1 }), 8 * FOOT), { roles: ['installer'] });
  await waitFor(() => expect(screen.getByText(/^Your role reads the stations/)).toBeInTheDocument());
  expect(screen.queryByLabelText('No further apart than')).not.toBeInTheDocument();
  expect(screen.queryByText('Add a station')).not.toBeInTheDocument();
});
