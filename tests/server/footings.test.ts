import { randomUUID } from 'node:crypto';
import type { Footing, Run } from '@/shared/api/footing-schemas';
import { startTestApi, type TestApi, type TestCompany } from './support/test-api';
import { buildSite, FOOT, FOOTING, INCH, openRound, runsOf, square, TestPhone, type Site } from './support/site';

let api: TestApi;
let company: TestCompany;
let site: Site;

beforeAll(async () => {
  api = await startTestApi();
  company = await api.signUp();
});
afterAll(() => api.stop());
beforeEach(async () => {
  site = await buildSite(api, company.owner.token);
});

const token = () => company.owner.token;
async function newFooting(change: object = {}): Promise<Footing> {
  return api.ok('addFooting', token(), { params: { jobId: site.jobId }, body: { ...FOOTING, name: randomUUID(), ...change } });
}
function draw(footing: Footing, runs: Run[]): Promise<Footing> {
  return api.ok('setOutline', token(), { params: { footingId: footing.id }, body: { runs, version: footing.outlineVersion } });
}
function layOut(footing: Footing, feet: number): Promise<Footing> {
  return api.ok('setStations', token(), { params: { footingId: footing.id }, body: { spacing: feet * FOOT } });
}
async function shoot(stations: number[], on: Site = site): Promise<void> {
  const { round } = await openRound(api, token(), on.footing.id, 'rails');
  const phone = new TestPhone(on, api);
  const body = phone.body(...phone.begin(), ...stations.map((station) => phone.shot(station)));
  await api.ok('sendRecords', token(), { params: { roundId: round.id }, body });
}
const namesOf = ({ stations }: Footing) =>
  stations.map(({ corner, name, step }) => `${corner ?? ''} ${name} ${step ?? ''}`.trim());

describe('stations', () => {
  it('stand at every corner and both sides of every step, and between them no further apart than the spacing, with their plan grade', async () => {
    const runs = runsOf([20, 90, [8, -2]], [10, 90], [20, 90, [12, 2]], [10, 90]);
    const footing = await layOut(await draw(await newFooting(), runs), 8);
    // By hand: 20 ft with a step at 8: 8, then 12 in two sixes; 10 ft in two fives; the far side the other way about.
    expect(namesOf(footing)).toEqual([
      'A 0+00', '0+08 before', '0+08 after', '0+14', 'B 0+20', '0+25', 'C 0+30', '0+36', '0+42 before', '0+42 after', 'D 0+50', '0+55',
    ]); // prettier-ignore
    expect(footing.stations.map(({ planGrade }) => planGrade / FOOT)).toEqual([
      100, 100, 98, 98, 98, 98, 98, 98, 98, 100, 100, 100,
    ]);
    expect(footing.stations.map(({ position }) => position)).toEqual(footing.stations.map((_station, index) => index));
    expect(footing.stages).toEqual({ done: ['outline', 'dig'], now: 'rails' });
  });

  it('have the rod on the centre of the footing though the wall’s face was taped', async () => {
    // Wall 8 in, so its centre lies 4 in inside its face; a clockwise walk has the inside on its right: south of a run east.
    const footing = await layOut(await draw(await newFooting({ measuredOn: 'wall-face' }), square()), 20);
    const points = footing.stations.map(({ points: [point] }) => [
      point?.rail,
      (point?.x ?? NaN) / INCH,
      (point?.y ?? NaN) / INCH,
    ]);
    expect(points).toEqual([
      ['centre', 4, -4],
      ['centre', 236, -4],
      ['centre', 236, -236],
      ['centre', 4, -236],
    ]);
  });

  it('have an outer and an inner rail over the faces of the footing, mitred at corners', async () => {
    // Footing 20 in on a wall of 8: its faces lie 6 in outside and 14 in inside the wall's face.
    const footing = await layOut(await draw(await newFooting({ measuredOn: 'wall-face', rails: 'both' }), square()), 10);
    const at = (index: number) => footing.stations[index]?.points.map(({ rail, x, y }) => [rail, x / INCH, y / INCH]);
    expect(at(0)).toEqual([['outer', -6, 6], ['inner', 14, -14]]); // prettier-ignore
    expect(at(1)).toEqual([['outer', 120, 6], ['inner', 120, -14]]); // prettier-ignore
  });

  it('are named in metres on a metric job, and by a person where one named them', async () => {
    const body = { name: 'Metric', address: '', unitStyle: 'metric', graduation: 1_000_000, wallType: 'block' } as const;
    const { id: jobId } = await api.ok('addJob', token(), { body });
    const made = await api.ok('addFooting', token(), { params: { jobId }, body: FOOTING });
    const runs = runsOf([20, 0]).map((run) => ({ ...run, length: 7_500_000_000 }));
    const drawn = await draw(made, runs);
    const laid = await api.ok('setStations', token(), { params: { footingId: drawn.id }, body: { spacing: 2_500_000_000 } });
    expect(laid.stations.map(({ name }) => name)).toEqual(['0 m', '2.5 m', '5 m', '7.5 m']);
    const stationId = laid.stations[1]?.id ?? '';
    const named = await api.ok('changeStation', token(), { params: { stationId }, body: { name: 'By the door' } });
    expect(named.stations.map(({ name }) => name)).toEqual(['0 m', 'By the door', '5 m', '7.5 m']);
  });

  it('may be added, moved and removed, and stay in walking order', async () => {
    const params = { footingId: site.footing.id };
    const added = await api.ok('addStation', token(), { params, body: { at: 4 * FOOT } });
    expect(namesOf(added).slice(0, 3)).toEqual(['A 0+00', '0+04', '0+10']);
    const stationId = added.stations[1]?.id ?? '';
    const moved = await api.ok('changeStation', token(), { params: { stationId }, body: { at: 33 * FOOT } });
    expect(namesOf(moved)).toEqual(['A 0+00', '0+10', 'B 0+20', '0+30', '0+33', 'C 0+40', '0+50', 'D 0+60', '0+70']);
    expect(moved.stations[4]).toMatchObject({ id: stationId, x: 20 * FOOT, y: -13 * FOOT });
    const laid = await layOut(moved, 5);
    expect(laid.stations.map(({ id }) => id)).toContain(stationId);
    const removed = await api.ok('removeStation', token(), { params: { stationId } });
    expect(removed.stations).toHaveLength(16);
  });

  it('once shot stay where they are: not moved, not removed, not lost to another spacing', async () => {
    await shoot([1]);
    const stationId = site.footing.stations[1]?.id ?? '';
    for (const [name, body] of [
      ['changeStation', { at: 11 * FOOT }],
      ['removeStation', undefined],
    ] as const) {
      const response = await api.send(name, token(), { params: { stationId }, body });
      expect([response.status, response.body.error.code]).toEqual([409, 'station-has-shots']);
    }
    await api.ok('changeStation', token(), { params: { stationId }, body: { name: 'Shot' } });
    const laid = await layOut(site.footing, 7);
    expect(laid.stations.find(({ id }) => id === stationId)).toMatchObject({ at: 10 * FOOT, name: 'Shot' });
  });
});

describe('the outline', () => {
  it('keeps the ids of stations that are still at their place, corners above all, when a run gets another length', async () => {
    const { footing } = site;
    const runs = footing.runs.map((run, index) => (index % 2 === 0 ? { ...run, length: 24 * FOOT } : run));
    const after = await draw(footing, runs);
    const idAt = ({ stations }: Footing, corner: string) => stations.find((station) => station.corner === corner)?.id;
    for (const corner of ['A', 'B', 'C', 'D']) expect(idAt(after, corner)).toBe(idAt(footing, corner));
    // 24 ft in parts of at most 10: three of 8. The second run is as it was.
    expect(namesOf(after).slice(0, 6)).toEqual(['A 0+00', '0+08', '0+16', 'B 0+24', '0+34', 'C 0+44']);
    expect(after.stations[4]?.id).toBe(footing.stations[3]?.id);
    expect(after.outlineVersion).toBe(2);
  });

  it('that somebody changed first is out of date', async () => {
    await draw(site.footing, square());
    const body = { runs: square(), version: site.footing.outlineVersion };
    const response = await api.send('setOutline', token(), { params: { footingId: site.footing.id }, body });
    expect([response.status, response.body.error.code]).toEqual([409, 'out-of-date']);
  });

  it('of two people at once is one’s, and the other is told', async () => {
    const params = { footingId: site.footing.id };
    const both = await Promise.all(
      [square(), square()].map((runs) => api.send('setOutline', token(), { params, body: { runs, version: 1 } })),
    );
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('is a super’s once something is shot, and a shot station that would be gone holds it up', async () => {
    await shoot([1]);
    const operator = await company.hire('operator');
    const params = { footingId: site.footing.id };
    const longer = site.footing.runs.map((run) => ({ ...run, length: 30 * FOOT }));
    const refused = await api.send('setOutline', operator.token, { params, body: { runs: longer, version: 1 } });
    expect([refused.status, refused.body.error.code]).toEqual([409, 'outline-has-shots']);
    const changed = await draw(site.footing, longer);
    expect(changed.stations.map(({ id }) => id)).toContain(site.footing.stations[1]?.id);
    const body = { runs: square(), version: changed.outlineVersion };
    const gone = await api.send('setOutline', token(), { params, body });
    expect([gone.status, gone.body.error.code]).toEqual([409, 'station-has-shots']);
  });

  it('may miss its own start, and then is no outline yet; within a mark of the tape it closes', async () => {
    const misses = await layOut(await draw(await newFooting(), runsOf([20, 90], [20, 90], [20, 90], [19, 90])), 10);
    expect(misses.stages.now).toBe('outline');
    const nearly = runsOf([20, 90], [20, 90], [20, 90], [20, 90]).map((run, index) =>
      index === 3 ? { ...run, length: run.length - INCH / 16 } : run,
    );
    expect((await draw(misses, nearly)).stages.now).toBe('rails');
  });

  it('that is a strip needs not close', async () => {
    const strip = await layOut(await draw(await newFooting({ digNeeded: true }), runsOf([20, 90], [20, 0])), 10);
    expect(namesOf(strip)).toEqual(['A 0+00', '0+10', 'B 0+20', '0+30', 'C 0+40']);
    expect(strip.stages).toEqual({ done: ['outline'], now: 'dig' });
  });
});

describe('a footing that is changed', () => {
  it('keeps what is absent, clears what is null, and its stations follow grade and section', async () => {
    const params = { footingId: site.footing.id };
    const marked = await api.ok('changeFooting', token(), { params, body: { landmark: { name: 'Mill St', azimuth: 90 } } });
    const raised = await api.ok('changeFooting', token(), { params, body: { planGrade: 101 * FOOT, measuredOn: 'wall-face' } });
    expect(raised.landmark).toEqual(marked.landmark);
    expect(raised.stations.map(({ id }) => id)).toEqual(site.footing.stations.map(({ id }) => id));
    expect(raised.stations[0]).toMatchObject({ planGrade: 101 * FOOT, x: 4 * INCH, y: -4 * INCH });
    expect((await api.ok('changeFooting', token(), { params, body: { landmark: null } })).landmark).toBeNull();
  });

  it('has other rails only while none has been shot', async () => {
    const params = { footingId: site.footing.id };
    const both = await api.ok('changeFooting', token(), { params, body: { rails: 'both' } });
    expect(both.stations.every(({ points }) => points.length === 2)).toBe(true);
    await api.ok('changeFooting', token(), { params, body: { rails: 'centre' } });
    await shoot([0]);
    const response = await api.send('changeFooting', token(), { params, body: { rails: 'both' } });
    expect([response.status, response.body.error.code]).toEqual([409, 'outline-has-shots']);
  });
});

describe('a round', () => {
  it('asked for twice with one id is opened once, and numbered by surface', async () => {
    const params = { footingId: site.footing.id };
    const body = { id: randomUUID(), surface: 'rails' } as const;
    const [one, two] = await Promise.all([body, body].map((same) => api.ok('openRound', token(), { params, body: same })));
    expect(one).toEqual(two);
    expect((await openRound(api, token(), site.footing.id, 'rails')).round.number).toBe(2);
    expect((await openRound(api, token(), site.footing.id, 'top')).round.number).toBe(1);
  });

  it('is judged for good by the rules it was opened under', async () => {
    const { round, toleranceRule } = await openRound(api, token(), site.footing.id, 'rails');
    const params = { jobId: site.jobId, surface: 'rails' } as const;
    const body = { low: 0, high: 0, decision: 'guarded', style: 'metric' } as const;
    const next = await api.ok('setToleranceRule', token(), { params, body });
    expect([toleranceRule.version, next.version]).toEqual([1, 2]);
    expect((await api.ok('round', token(), { params: { roundId: round.id } })).toleranceRule).toEqual(toleranceRule);
    expect((await openRound(api, token(), site.footing.id, 'rails')).toleranceRule).toEqual(next);
  });

  it('follows its benchmark when that is corrected, and the correction is kept beside what it corrects', async () => {
    const { round } = await openRound(api, token(), site.footing.id, 'top');
    const phone = new TestPhone(site, api);
    const begun = phone.begin();
    const all = site.footing.stations.map((_station, index) => phone.shot(index));
    const records = [...begun, ...all, phone.onBenchmark('check')];
    await api.ok('sendRecords', token(), { params: { roundId: round.id }, body: phone.body(...records) });
    const read = () => api.ok('round', token(), { params: { roundId: round.id } });
    const params = { benchmarkId: site.benchmarkId };
    const corrected = await api.ok('changeBenchmark', token(), { params, body: { elevation: 101 * FOOT, version: 1 } });
    expect(corrected).toMatchObject({ name: 'BM 1', elevation: 101 * FOOT, version: 2 });
    expect((await read()).round).toMatchObject({ shot: 8, of: 8, out: 8, verdict: 'not-to-grade' });
    const stale = await api.send('changeBenchmark', token(), { params, body: { elevation: 0, version: 1 } });
    expect([stale.status, stale.body.error.code]).toEqual([409, 'out-of-date']);
  });

  it('is not opened where there is no station', async () => {
    const params = { footingId: (await newFooting()).id };
    const response = await api.send('openRound', token(), { params, body: { id: randomUUID(), surface: 'rails' } });
    expect([response.status, response.body.error.fields.surface.code]).toEqual([422, 'no-stations']);
  });
});
