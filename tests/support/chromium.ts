import { chromium, type Browser, type BrowserContext, type BrowserContextOptions, type Page } from 'playwright-core';

// Importing this file makes every page that `openPage` opened be judged and closed after each test, and the browser ended after the last.

const EXECUTABLE = '/usr/bin/chromium';

/** No sandbox, since it may run as root; nothing that would go out to the network by itself. */
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** What a page did that no page should: its uncaught errors, and what it wrote to the console as an error. */
interface Watched {
  context: BrowserContext;
  troubles: string[];
  /** Opened before any test of the file began, so it lasts for all of them. */
  lasting: boolean;
}

export interface OpenPageOptions {
  width: number;
  height: number;
  /** Errors that this test provokes: what matches one of these is let pass. The text of a console error is followed by ` (its address)`. */
  allow?: RegExp[];
  /** Anything else of Playwright's browser contexts: hasTouch, colorScheme, reducedMotion, locale, baseURL, storageState … */
  context?: BrowserContextOptions;
}

export interface OpenedPage {
  page: Page;
  context: BrowserContext;
  /** What has gone wrong so far that was not allowed. */
  troubles(): readonly string[];
  /** Forgets what has gone wrong so far, for a test that has looked at it. */
  forgive(): void;
}

let launched: Promise<Browser> | undefined;
let watched: Watched[] = [];
let inTest = false;

/** The one browser of a test file, launched at first use. */
export function launchChromium(): Promise<Browser> {
  launched ??= chromium.launch({ executablePath: EXECUTABLE, args: FLAGS, headless: true });
  return launched;
}

/** Writes down what goes wrong on a page. */
function watch(page: Page, troubles: string[], allow: RegExp[]): void {
  const note = (text: string): void => {
    if (!allow.some((pattern) => pattern.test(text))) troubles.push(text);
  };
  page.on('pageerror', (error) => note(`uncaught: ${error.stack ?? error.message}`));
  page.on('crash', () => note('the page crashed'));
  page.on('console', (message) => {
    const { url } = message.location();
    if (message.type() === 'error') note(`console: ${message.text()}${url === '' ? '' : ` (${url})`}`);
  });
}

/**
 * Opens a page in a browser context of its own, with nothing stored. The test in which an uncaught error or a console error happens on it
 * fails. Opened in a test it is closed at its end; opened in beforeAll it stays for the file.
 */
export async function openPage({ width, height, allow = [], context: more = {} }: OpenPageOptions): Promise<OpenedPage> {
  const browser = await launchChromium();
  const context = await browser.newContext({
    locale: 'en-US',
    timezoneId: 'America/Chicago',
    ...more,
    viewport: { width, height },
  });
  context.setDefaultTimeout(10_000);
  const troubles: string[] = [];
  watched.push({ context, troubles, lasting: !inTest });
  context.on('page', (page) => watch(page, troubles, allow));
  const page = await context.newPage();
  return { page, context, troubles: () => troubles, forgive: () => void troubles.splice(0) };
}

beforeEach(() => {
  inTest = true;
});

afterEach(async () => {
  inTest = false;
  const troubles = watched.flatMap((each) => each.troubles.splice(0));
  for (const { context } of watched.filter(({ lasting }) => !lasting)) await context.close();
  watched = watched.filter(({ lasting }) => lasting);
  if (troubles.length > 0) throw new Error(`on a page of this test:\n${troubles.join('\n')}`);
});

afterAll(async () => {
  const browser = await launched;
  launched = undefined;
  watched = [];
  await browser?.close();
});
