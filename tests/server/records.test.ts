import { randomUUID } from 'node:crypto';
import type { RecordAnswer } from '@/shared/records';
import { startTestApi, type TestApi, type TestCompany } from './support/test-api';
import { buildSite, FOOT, openRound, TestPhone, type Site } from './support/site';

const HOUR = 3_600_000;

let api: TestApi;
let company: TestCompany;
let site: Site;
let roundId: string;

beforeAll(async () => {
  api = await startTestApi();
  company = await api.signUp();
});
afterAll(() => api.stop());
beforeEach(async () => {
  site = await buildSite(api, company.owner.token);
  roundId = (await openRound(api, company.owner.token, site.footing.id, 'rails')).round.id;
});

async function send(phone: TestPhone, records: object[], token = company.owner.token, round = roundId): Promise<RecordAnswer[]> {
  return (await api.ok('sendRecords', token, { params: { roundId: round }, body: phone.body(...records) })).answers;
}
const words = (answers: readonly RecordAnswer[]) =>
  answers.map((answer) => (answer.answer === 'rejected' ? answer.refusal : answer.answer));
async function stored(after = 0) {
  return api.ok('records', company.owner.token, { params: { roundId }, query: { after } });
}

describe('a batch of records', () => {
  it('comes back as it was sent, numbered in the round from 1 without a gap', async () => {
    const phone = new TestPhone(site, api);
    const sent = [...phone.begin(), phone.shot(0), phone.shot(1, { how: 'set', keyed: '', receiver: 'fine' })];
    sent.push(phone.strike(sent[3]?.id ?? ''));
    expect(words(await send(phone, sent))).toEqual(sent.map(() => 'stored'));
    const { records, last, more } = await stored();
    expect(records.map(({ record }) => record)).toEqual(sent);
    expect(records.map(({ receipt }) => receipt.roundSequence)).toEqual([1, 2, 3, 4, 5, 6]);
    expect({ last, more }).toEqual({ last: 6, more: false });
    expect((await stored(4)).records).toHaveLength(2);
  });

  it('sent twice is stored once and answered with the first receipt', async () => {
    const phone = new TestPhone(site, api);
    const sent = [...phone.begin(), phone.shot(0)];
    const first = await send(phone, sent);
    api.clock.pass(HOUR);
    const second = await send(phone, sent);
    expect(words(second)).toEqual(['already', 'already', 'already', 'already']);
    expect(second.map((answer) => ('receipt' in answer ? answer.receipt : null))).toEqual(
      first.map((answer) => ('receipt' in answer ? answer.receipt : null)),
    );
    expect((await stored()).records).toHaveLength(4);
  });

  it('with an id that has other content is a conflict, and what was stored stays', async () => {
    const phone = new TestPhone(site, api);
    const sent = phone.begin();
    const shot = phone.shot(0);
    await send(phone, [...sent, shot]);
    expect(words(await send(phone, [{ ...shot, keyed: `4' 0 1/16"`, reading: 4 * FOOT + 1_587_500 }]))).toEqual(['conflict']);
    expect((await stored()).records.at(-1)?.record).toEqual(shot);
    const other = (await openRound(api, company.owner.token, site.footing.id, 'top')).round.id;
    expect(words(await send(phone, [shot], company.owner.token, other))).toEqual(['conflict']);
  });

  it('with one record that is refused stores the others', async () => {
    const phone = new TestPhone(site, api);
    const sent = [...phone.begin(), phone.shot(0, { keyed: `4' 1"` }), phone.shot(1)];
    expect(words(await send(phone, sent))).toEqual(['stored', 'stored', 'stored', 'keyed-differs', 'stored']);
    expect((await stored()).records.map(({ receipt }) => receipt.roundSequence)).toEqual([1, 2, 3, 4]);
  });

  it('takes 500 records, and refuses 501 and none', async () => {
    const phone = new TestPhone(site, api);
    const many = [...phone.begin(), ...Array.from({ length: 498 }, (_, n) => phone.shot(n % 8))];
    const token = company.owner.token;
    const params = { roundId };
    await api.send('sendRecords', token, { params, body: phone.body(...many) }).expect(400);
    await api.send('sendRecords', token, { params, body: phone.body() }).expect(400);
    expect(new Set(words(await send(phone, many.slice(0, 500))))).toEqual(new Set(['stored']));
    const page = await stored();
    expect([page.records.length, page.more]).toEqual([500, false]);
    await send(phone, many.slice(500));
    expect([(await stored()).more, (await stored(500)).records.length]).toEqual([true, 1]);
  });
});

describe('the order of a phone', () => {
  it('stands though its batches come the wrong way round', async () => {
    const phone = new TestPhone(site, api);
    const first = phone.begin();
    api.clock.pass(HOUR);
    const second = [phone.shot(0), phone.shot(1)];
    await send(phone, second);
    api.clock.pass(HOUR);
    await send(phone, first);
    const times = new Map((await stored()).records.map(({ record, receipt }) => [record.deviceSequence, receipt.orderedAt]));
    expect([...times.keys()]).toEqual([4, 5, 1, 2, 3]);
    const inOrder = [1, 2, 3, 4, 5].map((sequence) => times.get(sequence) ?? NaN);
    expect(inOrder).toEqual([...inOrder].sort((a, b) => a - b));
    expect((inOrder[3] ?? 0) - (inOrder[2] ?? 0)).toBe(HOUR);
  });

  it('keeps its place for a refused record: what it said is kept, its place is not given away, and readers do not see it', async () => {
    const phone = new TestPhone(site, api);
    const begun = phone.begin();
    const wrong = phone.shot(0, { keyed: 'nonsense' });
    expect(words(await send(phone, [...begun, wrong]))).toEqual(['stored', 'stored', 'stored', 'keyed-differs']);
    const usurper = { ...phone.shot(0), deviceSequence: wrong.deviceSequence };
    expect(words(await send(phone, [usurper]))).toEqual(['sequence-taken']);
    expect(words(await send(phone, [wrong]))).toEqual(['keyed-differs']);
    expect(words(await send(phone, [{ ...wrong, lap: 2 }]))).toEqual(['conflict']);
    expect((await stored()).records).toHaveLength(3);
    const rows = await api.source.transaction(async (manager) => {
      await manager.query(`select set_config('role', 'tallyrod_app', true), set_config('app.company_id', $1, true)`, [
        company.id,
      ]);
      return manager.query('select device_sequence, refusal, refused_content from records where id = $1', [wrong.id]);
    });
    expect(rows).toEqual([
      { device_sequence: '4', refusal: 'keyed-differs', refused_content: expect.stringContaining('nonsense') },
    ]);
  });

  it.each([
    ['an unknown kind', { kind: 'guess' }],
    ['a reading that is no whole number of nanometres', { reading: 0.5 }],
    ['an unknown key', { verdict: 'fine' }],
    ['a character that no text may have', { keyed: 'a\u0000b' }],
  ])('keeps its place for a record that cannot be read: %s', async (_what, change) => {
    const phone = new TestPhone(site, api);
    const broken = { ...phone.shot(0), ...change };
    expect(words(await send(phone, [broken, ...phone.begin()]))).toEqual(['record-invalid', 'stored', 'stored', 'stored']);
    expect(words(await send(phone, [{ ...phone.shot(0), deviceSequence: 1 }]))).toEqual(['sequence-taken']);
  });

  it('is no matter of a record that says no place at all: it is refused and leaves nothing', async () => {
    const phone = new TestPhone(site, api);
    expect(words(await send(phone, [{ id: randomUUID() }]))).toEqual(['record-invalid']);
  });
});

describe('clocks', () => {
  it('a phone a day ahead is put right by how far it was off as it sent', async () => {
    const phone = new TestPhone(site, api, 24 * HOUR);
    const made = api.clock.now().getTime();
    const sent = phone.begin();
    api.clock.pass(HOUR);
    const [answer] = await send(phone, sent);
    expect(answer).toMatchObject({ answer: 'stored', receipt: { clockSkew: -24 * HOUR, orderedAt: made } });
  });

  it('a phone that lags a day is put right too, and nothing counts as made after it came', async () => {
    const phone = new TestPhone(site, api, -24 * HOUR);
    const made = api.clock.now().getTime();
    const [setup, series] = phone.begin();
    const future = { ...(series ?? {}), clock: { wall: phone.now + 9 * HOUR, counter: 0 } };
    api.clock.pass(HOUR);
    const answers = await send(phone, [setup ?? {}, future]);
    expect(answers[0]).toMatchObject({ receipt: { clockSkew: 24 * HOUR, orderedAt: made } });
    expect(answers[1]).toMatchObject({ receipt: { orderedAt: made + HOUR } });
  });

  it('a clock that is set back on the way moves no record before an earlier one of the phone', async () => {
    const phone = new TestPhone(site, api);
    const begun = phone.begin();
    phone.ahead = -6 * HOUR;
    const after = phone.shot(0);
    phone.ahead = 0;
    const answers = await send(phone, [...begun, after]);
    const times = answers.map((answer) => ('receipt' in answer ? answer.receipt.orderedAt : NaN));
    expect(times[3]).toBe(times[2]);
  });
});

describe('two phones on one round', () => {
  it('are numbered without gap or double, however they send at once', async () => {
    const phones = Array.from({ length: 6 }, () => new TestPhone(site, api));
    const batches = phones.flatMap((phone) =>
      [[...phone.begin()], [phone.shot(0), phone.shot(1)]].map((records) => ({ phone, records })),
    );
    const answers = await Promise.all(batches.map(({ phone, records }) => send(phone, records)));
    expect(new Set(words(answers.flat()))).toEqual(new Set(['stored']));
    const { records } = await stored();
    expect(records.map(({ receipt }) => receipt.roundSequence)).toEqual(Array.from({ length: 30 }, (_, n) => n + 1));
    expect(new Set(records.map(({ record }) => record.id)).size).toBe(30);
  });

  it('sending the same batch at once store it once', async () => {
    const phone = new TestPhone(site, api);
    const sent = phone.begin();
    const answers = await Promise.all([send(phone, sent), send(phone, sent), send(phone, sent)]);
    expect(answers.map(words).flat().sort()).toEqual([...Array<string>(6).fill('already'), ...Array<string>(3).fill('stored')]);
  });
});

describe('what a record may not be', () => {
  it.each([
    ['keyed as another length', 'keyed-differs', (phone: TestPhone) => phone.shot(0, { reading: 4 * FOOT + 1 })],
    ['keyed as nothing, though read', 'keyed-differs', (phone: TestPhone) => phone.shot(0, { keyed: '' })],
    ['set, yet keyed', 'keyed-differs', (phone: TestPhone) => phone.shot(0, { how: 'set' })],
    [
      'longer than its rod',
      'reading-longer-than-rod',
      (phone: TestPhone) => phone.shot(0, { keyed: `13' 1"`, reading: 13 * FOOT + 25_400_000 }),
    ],
    [
      'at a station that is none',
      'point-unknown',
      (phone: TestPhone) => phone.shot(0, { point: { kind: 'station', stationId: randomUUID(), rail: 'centre' } }),
    ],
    [
      'on a rail that the station has not',
      'point-unknown',
      (phone: TestPhone) =>
        phone.shot(0, { point: { kind: 'station', stationId: site.footing.stations[0]?.id ?? '', rail: 'outer' } }),
    ],
    [
      'from a benchmark of nowhere',
      'point-unknown',
      (phone: TestPhone) => ({ ...phone.onBenchmark('check'), point: { kind: 'benchmark', benchmarkId: randomUUID() } }),
    ],
    [
      'with a laser of nobody',
      'laser-unknown',
      (phone: TestPhone) => ({ ...phone.stamp(), kind: 'setup', laserId: randomUUID(), stand: null }),
    ],
    [
      'with a rod of nobody',
      'rod-unknown',
      (phone: TestPhone) => ({
        ...phone.stamp(),
        kind: 'series',
        setupId: phone.setupId,
        rodId: randomUUID(),
        checkLimit: 0,
        benchmarkDistance: null,
      }),
    ],
  ])('%s: %s', async (_what, refusal, make) => {
    const phone = new TestPhone(site, api);
    await send(phone, phone.begin());
    expect(words(await send(phone, [make(phone)]))).toEqual([refusal]);
  });

  it('a benchmark above the beam is read with the rod upside down, no further than the rod is long', async () => {
    const phone = new TestPhone(site, api);
    await send(phone, phone.begin());
    const above = { ...phone.onBenchmark('check'), keyed: `-2' 3"`, reading: -27 * 25_400_000 };
    const beyond = { ...phone.onBenchmark('check'), keyed: `-14' 0"`, reading: -14 * FOOT };
    expect(words(await send(phone, [above, beyond]))).toEqual(['stored', 'reading-longer-than-rod']);
  });

  it('made after the round was closed; what was made before it and sent late is taken', async () => {
    const phone = new TestPhone(site, api);
    const before = phone.begin();
    api.clock.pass(HOUR);
    await api.ok('changeRound', company.owner.token, { params: { roundId }, body: { closed: true } });
    api.clock.pass(HOUR);
    expect(words(await send(phone, [...before, phone.shot(0)]))).toEqual(['stored', 'stored', 'stored', 'round-closed']);
    await api.ok('changeRound', company.owner.token, { params: { roundId }, body: { closed: false } });
    expect(words(await send(phone, [phone.shot(0)]))).toEqual(['stored']);
  });
});

describe('who may', () => {
  it('strike: one’s own, or anyone’s as a super, also before the shot has come', async () => {
    const operator = await company.hire('operator');
    const other = await company.hire('operator');
    const superintendent = await company.hire('super');
    const phone = new TestPhone(site, api);
    const own = phone.shot(0);
    await send(phone, [...phone.begin(), own], operator.token);
    const second = new TestPhone(site, api);
    expect(words(await send(second, [second.strike(own.id)], other.token))).toEqual(['strike-not-yours']);
    expect(words(await send(second, [second.strike(own.id)], superintendent.token))).toEqual(['stored']);
    expect(words(await send(phone, [phone.strike(own.id)], operator.token))).toEqual(['stored']);
    expect(words(await send(phone, [phone.strike(randomUUID())], operator.token))).toEqual(['stored']);
  });

  it('not by being early: a strike of what turns out to be somebody else’s counts for nothing, a super’s counts', async () => {
    const operator = await company.hire('operator');
    const other = await company.hire('operator');
    const superintendent = await company.hire('super');
    const phone = new TestPhone(site, api);
    const shots = [...phone.begin(), phone.shot(0), phone.shot(1)];
    const second = new TestPhone(site, api);
    const early = second.strike(shots[3]?.id ?? '');
    const ofSuper = second.strike(shots[4]?.id ?? '');
    expect(words(await send(second, [early], other.token))).toEqual(['stored']);
    expect(words(await send(second, [ofSuper], superintendent.token))).toEqual(['stored']);
    await send(phone, shots, operator.token);
    const strikes = (await stored()).records.map(({ record }) => record).filter(({ kind }) => kind === 'strike');
    expect(strikes).toEqual([ofSuper]);
  });

  it('shoot: an operator any surface, an installer the top alone, a super none', async () => {
    const installer = await company.hire('installer');
    const superintendent = await company.hire('super');
    const operator = await company.hire('operator');
    const footingId = site.footing.id;
    const top = (await openRound(api, installer.token, footingId, 'top')).round.id;
    const phone = new TestPhone(site, api);
    expect(words(await send(phone, phone.begin(), installer.token, top))).toEqual(['stored', 'stored', 'stored']);
    expect(words(await send(phone, [phone.shot(0)], installer.token))).toEqual(['surface-not-yours']);
    expect(words(await send(phone, [phone.shot(0)], superintendent.token, top))).toEqual(['surface-not-yours']);
    expect(words(await send(phone, [phone.shot(0)], operator.token, top))).toEqual(['stored']);
    await api
      .send('openRound', installer.token, { params: { footingId }, body: { id: randomUUID(), surface: 'rails' } })
      .expect(403);
    await api.send('changeRound', installer.token, { params: { roundId }, body: { closed: true } }).expect(403);
  });
});
