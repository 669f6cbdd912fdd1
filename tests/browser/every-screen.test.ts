import { readFileSync } from 'node:fs';
import type { AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';
import { openPage } from '../support/chromium';
import { startProductServer, type ProductServer } from '../support/product-server';
import {
  idsOfDemo,
  notReachedByTab,
  settled,
  SIGNED_OUT,
  signedInScreens,
  stickingOut,
  type ScreenToVisit,
} from './pages/every-screen';
import { signIn } from './pages/sign-up-page';

const AXE = readFileSync(require.resolve('axe-core/axe.min.js'), 'utf8');

/** What axe finds, a line each. */
async function axe(page: Page): Promise<string[]> {
  await page.evaluate(AXE);
  const results = await page.evaluate(
    // Put there by the line before; the page's own types do not know it.
    () => (window as unknown as { axe: { run(): Promise<AxeResults> } }).axe.run(),
  );
  return results.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`);
}

describe('every screen of the demo', () => {
  let product: ProductServer;
  let owner: { email: string; password: string };
  beforeAll(async () => {
    product = await startProductServer({ demo: true });
    const line = product.signIns.find((signedIn) => signedIn.split(' · ')[1]?.includes('owner')) ?? '';
    const [, , email = '', password = ''] = line.split(' · ');
    owner = { email, password };
  }, 240_000);
  afterAll(() => product.stop());

  /** Walks all screens at one size and gathers what a look at each finds. */
  async function findings(
    size: { width: number; height: number; colorScheme?: 'light' | 'dark' },
    look: (page: Page) => Promise<string[]>,
  ): Promise<Record<string, string[]>> {
    const { colorScheme, ...window } = size;
    const { page } = await openPage({ ...window, context: { colorScheme: colorScheme ?? 'light', reducedMotion: 'reduce' } });
    const found: Record<string, string[]> = {};
    const visit = async (screens: readonly ScreenToVisit[]): Promise<void> => {
      for (const { name, path } of screens) {
        await page.goto(`${product.origin}${path}`);
        await settled(page);
        const here = await look(page);
        if (here.length > 0) found[name] = here;
      }
    };
    await visit(SIGNED_OUT);
    await signIn(page, product.origin, owner);
    await visit(signedInScreens(await idsOfDemo(page, product.origin, owner)));
    return found;
  }

  /** Looks one after the other, each with its own words before what it found. */
  const all =
    (...looks: { what: string; look: (page: Page) => Promise<string[]> }[]) =>
    async (page: Page): Promise<string[]> => {
      const found: string[] = [];
      for (const { what, look } of looks) found.push(...(await look(page)).map((finding) => `${what}: ${finding}`));
      return found;
    };
  const byAxe = { what: 'axe', look: axe };
  const byTab = { what: 'not reached by Tab', look: notReachedByTab };

  it.each([
    { width: 390, height: 844 },
    { width: 1280, height: 800 },
  ])(
    'gives axe nothing to find and is walked by the Tab key alone at $width × $height',
    async (size) => {
      expect(await findings(size, all(byAxe, byTab))).toEqual({});
    },
    300_000,
  );

  it('gives axe nothing to find in the dark theme', async () => {
    expect(await findings({ width: 390, height: 844, colorScheme: 'dark' }, axe)).toEqual({});
  }, 240_000);

  it('holds everything inside a window 320 wide', async () => {
    expect(await findings({ width: 320, height: 700 }, stickingOut)).toEqual({});
  }, 240_000);
});
