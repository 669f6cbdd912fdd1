import { courseAt } from '@/shared/round/course-at';
import { foldRound } from '@/shared/round/fold-round';
import { roundResults } from '@/shared/round/round-results';
import { BY_HAND, FOOT, SIXTEENTH, STATIONS } from '../../support/morning-footing';
import { ids, morningBundle, morningRecords } from '../../support/morning-round';

const CUBIC_FOOT = 0.3048 ** 3;

function judged(offs?: readonly number[], change: (bundle: ReturnType<typeof morningBundle>) => void = () => undefined) {
  const bundle = morningBundle();
  change(bundle);
  const state = foldRound(morningRecords(offs), { ...bundle, surface: bundle.round.surface });
  return { bundle, state, results: roundResults(bundle, state, true) };
}

describe('results of the footing worked by hand in tests/support/morning-footing.ts', () => {
  const { bundle, state, results } = judged();

  it('finds five stations out, the worst at C, and three too close to call', () => {
    expect(state.verdict).toBe('not-to-grade');
    expect(state.out).toBe(BY_HAND.out);
    expect(results.grade.worst?.stationId).toBe(ids.station(STATIONS.findIndex((station) => station.name === BY_HAND.worst)));
    expect(state.close).toBe(BY_HAND.close);
  });

  it('says the mean, the tilt and what is left over as worked by least squares', () => {
    const { shape } = results;
    expect((shape?.offset ?? 0) / SIXTEENTH).toBeCloseTo(BY_HAND.mean, 9);
    expect((shape?.drop ?? 0) / SIXTEENTH).toBeCloseTo(BY_HAND.drop, 9);
    expect((shape?.over ?? 0) / FOOT).toBeCloseTo(BY_HAND.over, 9);
    expect(shape?.fallAzimuth).toBeCloseTo(BY_HAND.fallAzimuth, 9);
    expect((shape?.rest ?? 0) / SIXTEENTH).toBeCloseTo(BY_HAND.rest, 9);
    expect(shape?.mostly).toBe('tilt');
  });

  it('lets the wall be set between 7/16 and 1/2 in above grade', () => {
    expect(results.wall?.answer).toBe('can-be-set');
    const [group, ...others] = results.wall?.groups ?? [];
    expect(others).toHaveLength(0);
    expect(group?.window).toEqual({
      from: 100 * FOOT + BY_HAND.window.from * SIXTEENTH,
      to: 100 * FOOT + BY_HAND.window.to * SIXTEENTH,
    });
  });

  it('finds the bed at 7/16 in and nothing to grind', () => {
    const [group] = results.wall?.groups ?? [];
    if (!group || !results.wall) throw new Error('no group');
    const course = courseAt(group, results.wall.runs, bundle.bedRule, 100 * FOOT + 7 * SIXTEENTH);
    expect(course.bedVolume / CUBIC_FOOT).toBeCloseTo(BY_HAND.bedCubicFeet, 9);
    expect(course.grindVolume).toBe(0);
    expect(course.leastBed).toBe(4 * SIXTEENTH);
    expect(course.mostBed).toBe(11 * SIXTEENTH);
  });

  it('counts each run once: the wall runs make up the whole walk of 148 ft', () => {
    const length = (results.wall?.runs ?? []).reduce((sum, run) => sum + (run.profile.at(-1)?.station ?? 0), 0);
    expect(length / FOOT).toBeCloseTo(148, 6);
  });

  it('says that stations further apart than half a 10 ft edge cannot show what it would', () => {
    expect(results.straightedge.length).toBe(10 * FOOT);
    expect(results.straightedge.results.map((result) => result.tooSparse)).toContain(true);
  });
});

describe('the wall answer', () => {
  it('is "after grinding" when one hump leaves no window and can be ground', () => {
    // 6 high and 4 low: the window is short by 2 sixteenths; grinding up to 4 mends it.
    const offs = STATIONS.map((station) => (station.name === 'F, 1+26' ? 6 : station.off));
    expect(judged(offs).results.wall?.answer).toBe('after-grinding');
  });

  it('is "cannot be set" when the hump is higher than may be ground', () => {
    // 1 1/2 in of unevenness is far beyond any rule offered (common practice, no source).
    const offs = STATIONS.map((station) => (station.name === 'F, 1+26' ? 20 : station.off));
    expect(judged(offs).results.wall?.answer).toBe('cannot-be-set');
  });

  it('is "cannot tell" while the benchmark was not read again', () => {
    const bundle = morningBundle();
    const unchecked = morningRecords().slice(0, -1);
    const state = foldRound(unchecked, { ...bundle, surface: 'top' });
    expect(roundResults(bundle, state, true).wall?.answer).toBe('cannot-tell');
  });

  it('is not asked of rails', () => {
    const { results } = judged(undefined, (bundle) => (bundle.round.surface = 'rails'));
    expect(results.wall).toBeNull();
  });

  it('takes outer and inner rails as two halves of the wall', () => {
    const bundle = morningBundle();
    bundle.footing.rails = 'both';
    for (const station of bundle.footing.stations) {
      station.points = [
        { rail: 'outer', x: station.x, y: station.y },
        { rail: 'inner', x: station.x, y: station.y },
      ];
    }
    const records = morningRecords().flatMap((entry) => {
      const { record } = entry;
      if (record.kind !== 'reading' || record.point.kind !== 'station') return [entry];
      const point = record.point;
      return (['outer', 'inner'] as const).map((rail, index) => ({
        ...entry,
        record: { ...record, id: index === 0 ? record.id : record.id.replace('-8013-', '-8014-'), point: { ...point, rail } },
      }));
    });
    const state = foldRound(records, { ...bundle, surface: 'top' });
    const { wall } = roundResults(bundle, state, true);
    const [group] = wall?.groups ?? [];
    if (!group || !wall) throw new Error('no group');
    expect(courseAt(group, wall.runs, bundle.bedRule, 100 * FOOT + 7 * SIXTEENTH).bedVolume / CUBIC_FOOT).toBeCloseTo(
      BY_HAND.bedCubicFeet,
      9,
    );
  });
});

describe('what is wrong with it', () => {
  it('asks about an inch misread at one station, and says that an inch explains it', () => {
    const offs = STATIONS.map((_, index) => (index === 8 ? -16 : 0));
    const [suspect, ...others] = judged(offs).results.suspects;
    expect(others).toHaveLength(0);
    expect(suspect?.target.stationId).toBe(ids.station(8));
    expect(suspect?.explanation).toBe('inch');
  });

  it('says level only for two stations and tilt along the line only for stations on one line', () => {
    const two = judged(undefined, (bundle) => (bundle.footing.stations = bundle.footing.stations.slice(0, 2)));
    expect(two.results.shape?.fit.model).toBe('level');
    const line = judged(undefined, (bundle) => (bundle.footing.stations = bundle.footing.stations.slice(0, 7)));
    expect(line.results.shape?.fit.model).toBe('line');
  });
});
