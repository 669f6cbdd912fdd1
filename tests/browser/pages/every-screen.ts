import type { Page } from 'playwright-core';

/** A screen by its address, and the heading by which it is known to stand. */
export interface ScreenToVisit {
  name: string;
  path: string;
}

interface Demo {
  jobId: string;
  footingId: string;
  roundId: string;
  /** A round that is still open, where the keys of the shoot screen stand. */
  openRoundId: string;
}

/** One of each thing of the demo, as the signed-in person's own API tells. */
export async function idsOfDemo(page: Page, origin: string, signIn: { email: string; password: string }): Promise<Demo> {
  const session = await page.request.post(`${origin}/api/sign-in`, { data: signIn, headers: { origin } });
  const { accessToken } = (await session.json()) as { accessToken: string }; // the API's own tests hold this shape
  const get = async (path: string): Promise<unknown> =>
    (await page.request.get(`${origin}${path}`, { headers: { authorization: `Bearer ${accessToken}` } })).json();
  const { footings } = (await get('/api/today')) as {
    footings: { id: string; jobId: string; lastRound: { id: string; surface: string; closedAt: string | null } | null }[];
  };
  const topped = footings.find((footing) => footing.lastRound?.surface === 'top');
  const open = footings.find((footing) => footing.lastRound && footing.lastRound.closedAt === null);
  if (!topped?.lastRound || !open?.lastRound) throw new Error('the demo has no round of a top, or none that is open');
  return { jobId: topped.jobId, footingId: topped.id, roundId: topped.lastRound.id, openRoundId: open.lastRound.id };
}

export const SIGNED_OUT: readonly ScreenToVisit[] = [
  { name: 'sign in', path: '/sign-in' },
  { name: 'sign up', path: '/sign-up' },
];

/** Every screen that a signed-in person can come to. */
export const signedInScreens = (ids: Demo): readonly ScreenToVisit[] => [
  { name: 'Today', path: '/' },
  { name: 'jobs', path: '/jobs' },
  { name: 'new job', path: '/jobs/new' },
  { name: 'job', path: `/jobs/${ids.jobId}` },
  { name: 'new benchmark', path: `/jobs/${ids.jobId}/benchmarks/new` },
  { name: 'new footing', path: `/jobs/${ids.jobId}/footings/new` },
  { name: 'footing', path: `/footings/${ids.footingId}` },
  { name: 'outline', path: `/footings/${ids.footingId}/outline` },
  { name: 'stations', path: `/footings/${ids.footingId}/stations` },
  { name: 'setup', path: `/rounds/${ids.openRoundId}/setup` },
  { name: 'shoot', path: `/rounds/${ids.openRoundId}/shoot` },
  { name: 'results', path: `/rounds/${ids.roundId}/results` },
  { name: 'lasers', path: '/lasers' },
  { name: 'new laser', path: '/lasers/new' },
  { name: 'new rod', path: '/rods/new' },
  { name: 'crew', path: '/crew' },
  { name: 'account', path: '/account' },
  { name: 'an address that leads nowhere', path: '/nowhere' },
];

/** Waits until nothing on the screen says that something is on its way. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole('heading', { level: 1 }).first().waitFor();
  await page.waitForFunction(() => document.querySelector('[aria-busy="true"]') === null);
  await page.waitForFunction(() => document.fonts.status === 'loaded');
}

/** What sticks out at the right of a window, as a few words each. */
export const stickingOut = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const { clientWidth } = document.documentElement;
    const hidden = (element: Element): boolean => {
      for (let at: Element | null = element; at; at = at.parentElement) {
        const { overflowX, clip, position } = getComputedStyle(at);
        if (at !== element && (overflowX === 'hidden' || overflowX === 'clip' || overflowX === 'auto')) {
          const box = at.getBoundingClientRect();
          if (box.right <= clientWidth + 1) return true;
        }
        if (position === 'absolute' && clip !== 'auto') return true;
      }
      return false;
    };
    return Array.from(document.querySelectorAll('body *'))
      .filter((element) => element.getBoundingClientRect().right > clientWidth + 1 && !hidden(element))
      .map((element) => `${element.tagName} ${(element.textContent ?? '').slice(0, 40)}`);
  });

/** Buttons, links, fields and groups of choices that the Tab key does not come to. */
export async function notReachedByTab(page: Page): Promise<string[]> {
  const count = await page.evaluate(() => {
    const controls = Array.from(
      document.querySelectorAll<HTMLElement>(
        '[role="button"], button, a[href], input, textarea, [role="checkbox"], [role="radiogroup"]',
      ),
    );
    const shown = controls.filter((control) => {
      if (control.getAttribute('aria-disabled') === 'true' || control.closest('[aria-hidden="true"]')) return false;
      return control.getClientRects().length > 0;
    });
    // forEach: what is sent to the page must not lean on this file's compiled helpers.
    shown.forEach((control, index) => {
      control.dataset.control = String(index);
    });
    document.body.tabIndex = -1;
    document.body.focus();
    return shown.length;
  });
  // A radio group takes one Tab; anything else one each. Twice as many as there are comes round, whatever else may be focused.
  for (let press = 0, left = count; left > 0 && press < count * 2 + 10; press += 1) {
    await page.keyboard.press('Tab');
    left = await page.evaluate(() => {
      const { activeElement } = document;
      const control = activeElement instanceof HTMLElement ? activeElement.closest<HTMLElement>('[data-control]') : null;
      if (control) control.dataset.reached = 'yes';
      return document.querySelectorAll('[data-control]:not([data-reached])').length;
    });
  }
  return page.evaluate(() =>
    Array.from(document.querySelectorAll<HTMLElement>('[data-control]:not([data-reached])'))
      .filter((control) => !control.querySelector('[data-reached]'))
      .map(
        (control) =>
          `${control.getAttribute('role') ?? control.tagName} “${control.getAttribute('aria-label') ?? control.textContent ?? ''}”`,
      ),
  );
}
