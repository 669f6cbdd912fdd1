import type { Page } from 'playwright-core';
import type { Run } from '@/shared/api/footing-schemas';
import type { UnitStyle } from '@/shared/quantities';
import { FOOT, runsOf, SIXTEENTH } from '../server/support/site';
import { layFooting, laySite, openTop, recordRound, type BrowserSite } from '../support/browser-site';
import { openPage } from '../support/chromium';
import { ProductApi } from '../support/product-api';
import { startProductServer, type ProductServer } from '../support/product-server';
import { button, choose, field, fill, heading, link } from './pages/fields';
import { isOnGlass, refusalOf } from './pages/refusals';
import { ShootPage } from './pages/shoot-page';
import { signIn } from './pages/sign-up-page';

/**
 * What people key wrong, where they key it. Each is refused with a sentence beside the field, in the unit that they key in, and what
 * they keyed is still there to be mended. The sentences are the product's own; the marks that they name are worked by hand:
 *   4′ 7 1/32″ on a rod read to 1/16″  lies between 4′ 7″ and 4′ 7 1/16″
 *   4.605 ft on one read to 0.01 ft    between 4.60 and 4.61
 *   1.4025 m on one read to 1 mm       between 1.402 and 1.403
 */
const PHONE = { width: 390, height: 844 };
const SITE_OFFICE = { width: 1280, height: 800 };
const STYLES = ['feet-inches', 'decimal-feet', 'metric'] as const;

interface Entry {
  typed: string;
  says: RegExp;
}

/** Readings that no rod of a style gives, the same wherever a rod is read. */
const READINGS: Record<UnitStyle, readonly Entry[]> = {
  'feet-inches': [
    { typed: '4 7 1/32', says: /^This rod is read to 1\/16″\. The nearest marks are 4′ 7″ and 4′ 7 1\/16″\.$/ },
    { typed: '13 0 1/16', says: /^This rod is 13′ long\./ },
    { typed: '-4 7 3/16', says: /^An upright rod .*Take the minus off\.$/ },
    { typed: `4'7'`, says: /^“4'7'” cannot be read as a length\. Key feet, inches and a fraction, such as 4 7 3\/16\.$/ },
    { typed: `4' 13"`, says: /^13 inches are a foot or more\./ },
    { typed: '7/0', says: /^7\/0 is not a fraction on a rule\./ },
    { typed: '4', says: /^“4” could be feet or inches\. Key 4′ or 4″\.$/ },
  ],
  'decimal-feet': [
    { typed: '4.605', says: /^This rod is read to 0\.01 ft\. The nearest marks are 4\.60 ft and 4\.61 ft\.$/ },
    { typed: '13.01', says: /^This rod is 13 ft long\./ },
    { typed: '-4.60', says: /^An upright rod .*Take the minus off\.$/ },
    { typed: '4,60', says: /^Decimal feet take a point, not a comma/ },
  ],
  metric: [
    { typed: '1.4025', says: /^This rod is read to 1 mm\. The nearest marks are 1\.402 m and 1\.403 m\.$/ },
    { typed: '4.001', says: /^This rod is 4 m long\./ },
    { typed: '-1.402', says: /^An upright rod .*Take the minus off\.$/ },
    { typed: '2', says: /^“2” could be metres or millimetres\. Key 2 m or 2 mm\.$/ },
  ],
};

/** The same rod read as it may be, keyed once all else has been refused. */
const GOOD: Record<UnitStyle, { typed: string; hi: string }> = {
  'feet-inches': { typed: '4 0', hi: '104′ 0″' },
  'decimal-feet': { typed: '4.00', hi: '104.00 ft' },
  // BM 1 is 100 ft, 30.480 m.
  metric: { typed: '1.200', hi: '31.680 m' },
};

/** Lengths that no run of an outline has. */
const RUNS: Record<UnitStyle, readonly Entry[]> = {
  'feet-inches': [
    { typed: '', says: /^Key a length here\.$/ },
    { typed: `0'`, says: /^A run of no length is no run\./ },
    { typed: `5280'`, says: /^5280′ 0″ is a mile or more\./ },
    { typed: `4'7'`, says: /^“4'7'” cannot be read as a length\./ },
    { typed: `4' 13"`, says: /^13 inches are a foot or more\./ },
    { typed: '7/0', says: /^7\/0 is not a fraction on a rule\./ },
    { typed: '44', says: /^“44” could be feet or inches\. Key 44′ or 44″\.$/ },
  ],
  'decimal-feet': [
    { typed: '0.00', says: /^A run of no length is no run\./ },
    { typed: '5280.00', says: /^5280\.00 ft is a mile or more\./ },
  ],
  metric: [
    { typed: '0.000', says: /^A run of no length is no run\./ },
    { typed: '1610 m', says: /^1610\.000 m is over a kilometre and a half\./ },
    { typed: '2', says: /^“2” could be metres or millimetres\. Key 2 m or 2 mm\.$/ },
  ],
};

const LINE_ONLY = 'The stations stand on one line: this sees tilt along that line only.';
const LEVEL_ONLY = 'One or two stations tell how high it is, not how it tilts.';

/** A strip: one run with two open ends. */
const strip = (feet: number): Run[] => runsOf([feet, 0]);

describe('what is keyed wrong is refused', () => {
  let product: ProductServer;
  let sites: Record<UnitStyle, BrowserSite>;
  beforeAll(async () => {
    product = await startProductServer();
    const api = await ProductApi.signUp(product.origin, {
      company: 'Fallow Creek Footings',
      name: 'Nadia Brandt',
      email: 'nadia@example.test',
      password: 'seven gravel barrows',
    });
    sites = {
      'feet-inches': await laySite(api, 'feet-inches'),
      'decimal-feet': await laySite(api, 'decimal-feet'),
      metric: await laySite(api, 'metric'),
    };
  }, 240_000);
  afterAll(() => product.stop());

  /** A page at an address, signed in. */
  async function openAt(path: string, size: { width: number; height: number }): Promise<Page> {
    const { page } = await openPage(size);
    await signIn(page, product.origin, sites.metric.api.person);
    await page.goto(`${product.origin}${path}`);
    return page;
  }

  const backsights = [...STYLES.map((style) => ({ style, ...PHONE })), { style: 'feet-inches' as const, ...SITE_OFFICE }];
  it.each(backsights)(
    'as a backsight in $style at $width × $height',
    async ({ style, ...size }) => {
      const site = sites[style];
      const roundId = await openTop(site, await layFooting(site));
      const page = await openAt(`/rounds/${roundId}/setup`, size);
      await choose(page, 'Laser', `Laser for ${style}`);
      await choose(page, 'Rod', new RegExp(`^Rod in ${style}`));
      const box = field(page, 'Rod reading on BM 1');
      for (const { typed, says } of [{ typed: '', says: /^Read the rod on the benchmark/ }, ...READINGS[style]]) {
        await box.fill(typed);
        await button(page, 'Record the backsight').click();
        expect(await refusalOf(box)).toEqual({ says: expect.stringMatching(says), typed, hidden: [] });
      }
      expect(await recordsOf(site, roundId)).toBe(0);
      await box.fill(GOOD[style].typed);
      await button(page, 'Record the backsight').click();
      await page.getByText(GOOD[style].hi).first().waitFor();
    },
    120_000,
  );

  const shots = [...STYLES.map((style) => ({ style, ...PHONE })), { style: 'feet-inches' as const, ...SITE_OFFICE }];
  it.each(shots)(
    'as a shot from a keyboard in $style at $width × $height',
    async ({ style, ...size }) => {
      const { page, box, site, roundId } = await openShooting(style, size);
      for (const { typed, says } of READINGS[style]) {
        await box.fill(typed);
        await page.keyboard.press('Enter');
        expect(await refusalOf(box)).toEqual({ says: expect.stringMatching(says), typed, hidden: [] });
      }
      expect(await recordsOf(site, roundId)).toBe(3);
      await box.fill(GOOD[style].typed);
      await page.keyboard.press('Enter');
      await page.getByText('1 of 8 shot').first().waitFor();
    },
    120_000,
  );

  async function openShooting(style: UnitStyle, size: { width: number; height: number }) {
    const site = sites[style];
    const footing = await layFooting(site);
    const roundId = await openTop(site, footing);
    await recordRound(site, footing, roundId, {});
    const page = await openAt(`/rounds/${roundId}/shoot`, size);
    const box = field(page, 'Rod reading');
    await box.waitFor();
    return { page, box, site, roundId, shoot: new ShootPage(page) };
  }

  it('as a shot by the keypad in feet and inches, part by part', async () => {
    const { page, box, shoot } = await openShooting('feet-inches', PHONE);
    const refused = (says: RegExp, typed: string) => ({ says: expect.stringMatching(says), typed, hidden: [] });
    // Feet and inches have carried over from the grade rod; nothing else is keyed.
    await shoot.record();
    expect(await refusalOf(box)).toEqual(refused(/^Pick the fraction first: 0 for a whole inch\.$/, '4′0″'));
    await shoot.keyFeetInches('4', '13', 'Whole inch');
    await shoot.record();
    expect(await refusalOf(box)).toEqual(refused(/^13 inches are a foot or more\./, '4 feet 13 inches'));
    await shoot.keyFeetInches('13', '0', '1 sixteenth');
    await shoot.record();
    expect(await refusalOf(box)).toEqual(
      refused(/^This rod is 13′ long\. Key the reading again\.$/, '13 feet 0 and 1 sixteenth inches'),
    );
    await shoot.keyFeetInches('4', '0', 'Whole inch');
    await shoot.record();
    await page.getByText('1 of 8 shot').first().waitFor();
  }, 120_000);

  it.each([
    {
      style: 'decimal-feet' as const,
      digits: '1301',
      drawn: '13.01 ft',
      says: /^This rod is 13 ft long\. Key the reading again\.$/,
    },
    { style: 'metric' as const, digits: '4001', drawn: '4.001 m', says: /^This rod is 4 m long\. Key the reading again\.$/ },
    { style: 'metric' as const, digits: '2', drawn: '2', says: /^“2” could be metres or millimetres\. Key 2 m or 2 mm\.$/ },
    { style: 'metric' as const, digits: '', drawn: '– m', says: /^Key the rod reading first\.$/ },
  ])(
    'as a shot by the keypad in $style: “$digits”',
    async ({ style, digits, drawn, says }) => {
      const { box, shoot } = await openShooting(style, PHONE);
      await shoot.digits(digits);
      await shoot.record();
      const { says: said, typed, hidden } = await refusalOf(box);
      expect({ said, hidden }).toEqual({ said: expect.stringMatching(says), hidden: [] });
      expect([digits, drawn]).toContain(typed);
    },
    60_000,
  );

  it.each([
    { backsight: false, why: /no standing backsight/ },
    { backsight: null, why: /no height of instrument yet/ },
  ])(
    'as a shot before a backsight: nothing can be keyed, and the way to the benchmark is told ($backsight)',
    async ({ backsight, why }) => {
      const site = sites['feet-inches'];
      const footing = await layFooting(site);
      const roundId = await openTop(site, footing);
      if (backsight !== null) await recordRound(site, footing, roundId, { backsight });
      const page = await openAt(`/rounds/${roundId}/shoot`, PHONE);
      await page.getByText('Read the benchmark first').waitFor();
      await page.getByText(why).waitFor();
      expect(await button(page, 'Record').count()).toBe(0);
      expect(await field(page, 'Rod reading').count()).toBe(0);
      await link(page, 'Set up the laser').click();
      await button(page, 'Record the backsight').waitFor();
      expect(await link(page, 'Start shooting').or(button(page, 'Start shooting')).count()).toBe(0);
    },
    60_000,
  );

  it.each([
    { style: 'feet-inches' as const, round: '100′ 0″', ...PHONE },
    { style: 'metric' as const, round: '100.000 m', ...PHONE },
    { style: 'feet-inches' as const, round: '100′ 0″', ...SITE_OFFICE },
  ])(
    'as a benchmark without an elevation in $style at $width × $height',
    async ({ style, round, ...size }) => {
      const page = await openAt(`/jobs/${sites[style].jobId}/benchmarks/new`, size);
      const elevation = field(page, 'Elevation');
      await fill(page, 'Name', `BM at ${size.width}`);
      await button(page, 'Add the benchmark').click();
      expect(await refusalOf(elevation)).toEqual({
        says: `A benchmark without an elevation gives no grade. Key one, or call it ${round}.`,
        typed: '',
        hidden: [],
      });
      expect(await field(page, 'Name').inputValue()).toBe(`BM at ${size.width}`);
      await button(page, `Call it ${round}`).click();
      await button(page, 'Add the benchmark').click();
      await heading(page, 'Benchmarks').waitFor();
      await page.getByText(`BM at ${size.width}`).waitFor();
    },
    60_000,
  );

  it.each([...STYLES.map((style) => ({ style, ...PHONE })), { style: 'feet-inches' as const, ...SITE_OFFICE }])(
    'as the length of a run in $style at $width × $height',
    async ({ style, ...size }) => {
      const site = sites[style];
      const footing = await layFooting(site, { runs: [] });
      const page = await openAt(`/footings/${footing.id}/outline`, size);
      await button(page, 'Add run').first().click();
      const box = field(page, 'Length of run 1');
      for (const { typed, says } of RUNS[style]) {
        await box.fill(typed);
        await box.blur();
        expect(await refusalOf(box)).toEqual({ says: expect.stringMatching(says), typed, hidden: [] });
      }
      // Closed by mistake: saving opens the run again, and says it again.
      const last = RUNS[style].at(-1);
      await button(page, 'Done with run 1').click();
      await button(page, 'Save the outline').click();
      expect(await refusalOf(box)).toEqual({
        says: expect.stringMatching(last?.says ?? /never/),
        typed: last?.typed,
        hidden: [],
      });
      expect((await site.api.call('footing', { params: { footingId: footing.id } })).runs).toEqual([]);
    },
    120_000,
  );

  it.each([PHONE, SITE_OFFICE])(
    'as an outline that crosses itself, at $width × $height',
    async (size) => {
      const site = sites['feet-inches'];
      const footing = await layFooting(site, { runs: [] });
      const page = await openAt(`/footings/${footing.id}/outline`, size);
      await button(page, 'Add run').first().click();
      // East 30 ft, south 20, west 10, and north 30: over the first run, 20 ft from its start, and 10 ft past it.
      const runs = [
        { length: "30'", turn: 'Right' },
        { length: "20'", turn: 'Right' },
        { length: "10'", turn: 'Right' },
        { length: "30'", turn: 'Left' },
      ];
      for (const [index, { length, turn }] of runs.entries()) {
        const editor = page.getByRole('group', { name: `Run ${index + 1}`, exact: true });
        await fill(editor, `Length of run ${index + 1}`, length);
        await editor.getByRole('radio', { name: turn, exact: true }).click();
        if (index < 3) await button(editor, 'Next run').click();
      }
      const told = page.getByText('The outline crosses itself.');
      await told.waitFor();
      await page.getByText('Check which way each run turns, and the length of the run before the crossing.').waitFor();
      expect(await isOnGlass(told)).toBe(true);
      expect(await button(page, 'Save the outline').isDisabled()).toBe(true);
      expect((await site.api.call('footing', { params: { footingId: footing.id } })).runs).toEqual([]);
      // What was keyed is there, and there still when the page comes back.
      await page.reload();
      await told.waitFor();
      for (const [index, { length }] of runs.entries()) {
        await button(page, new RegExp(`^Run ${index + 1}, ${length.replace("'", '′ 0″')}, `)).waitFor();
      }
      // Mended: the last run ends 10 ft short of the first.
      await button(page, /^Run 4, /).click();
      await fill(page, 'Length of run 4', "10'");
      await button(page, 'Done with run 4').click();
      await told.waitFor({ state: 'detached' });
      await button(page, 'Set stations').click();
      await page.getByRole('heading', { name: 'Stations', level: 1 }).waitFor();
      expect((await site.api.call('footing', { params: { footingId: footing.id } })).runs).toHaveLength(4);
    },
    120_000,
  );

  it.each([
    { stations: 5, feet: 40, spacing: 10, lead: 'All stations lie on one line: tilt along the line only.', ...PHONE },
    { stations: 5, feet: 40, spacing: 10, lead: 'All stations lie on one line: tilt along the line only.', ...SITE_OFFICE },
    { stations: 2, feet: 20, spacing: 20, lead: '2 stations: level only.', ...PHONE },
  ])(
    'as what $stations stations of a strip cannot tell, at $width × $height',
    async ({ stations, feet, spacing, lead, ...size }) => {
      const site = sites['feet-inches'];
      const footing = await layFooting(site, { runs: strip(feet), spacing: spacing * FOOT });
      expect(footing.stations).toHaveLength(stations);
      const page = await openAt(`/footings/${footing.id}/stations`, size);
      await page.getByText(lead).waitFor();

      const roundId = await openTop(site, footing);
      // Rising an eighth of an inch from one end to the other.
      const offs = footing.stations.map((_, index) => (index === stations - 1 ? 2 * SIXTEENTH : 0));
      await recordRound(site, footing, roundId, { offs });
      await page.goto(`${product.origin}/rounds/${roundId}/results`);
      await page.getByText(stations === 2 ? LEVEL_ONLY : LINE_ONLY).waitFor();
      expect(await page.getByRole('group', { name: /^Out of level/ }).count()).toBe(stations === 2 ? 0 : 1);
    },
    60_000,
  );

  it('as what a single shot cannot tell', async () => {
    const site = sites['feet-inches'];
    const footing = await layFooting(site);
    const roundId = await openTop(site, footing);
    await recordRound(site, footing, roundId, { offs: [SIXTEENTH] });
    const page = await openAt(`/rounds/${roundId}/results`, PHONE);
    await page.getByText(LEVEL_ONLY).waitFor();
    expect(await page.getByRole('group', { name: /^Out of level/ }).count()).toBe(0);
  }, 60_000);
});

/** How many records of a round the server has. */
async function recordsOf({ api }: BrowserSite, roundId: string): Promise<number> {
  return (await api.call('records', { params: { roundId }, query: { after: 0 } })).records.length;
}
