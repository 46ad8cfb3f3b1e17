import { AxeBuilder } from '@axe-core/playwright';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, inject } from 'vitest';
import { chromiumPath } from '../../scripts/lib/chromium.mjs';
import { demoSignIn, signIn } from '../server/client';

export const WIDTHS = [390, 768, 1440] as const;
export type Width = (typeof WIDTHS)[number];
const HEIGHTS: Record<Width, number> = { 390: 844, 768: 1024, 1440: 900 };

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
/** No browser of ours speaks to another machine. */
const OWN_MACHINE_ONLY = '--host-resolver-rules=MAP * ~NOTFOUND, EXCLUDE 127.0.0.1, EXCLUDE localhost';
const ARGUMENTS = ['--no-sandbox', '--disable-background-networking', OWN_MACHINE_ONLY];

export interface PageOptions {
  /** Default 1440. */
  width?: Width;
  /** A role of the demonstration, or an e-mail and password: signed in before the page opens. */
  as?: string | { email: string; password: string };
  baseUrl?: string;
  colourScheme?: 'light' | 'dark';
  /** Complaints that the test means to cause, such as /404/ on a page that is missing. */
  expected?: readonly RegExp[];
}

export interface TestBrowser {
  /** A page in a context of its own, which is closed after the test. */
  newPage(options?: PageOptions): Promise<Page>;
  /** A second page of the same person. */
  newTab(page: Page): Promise<Page>;
}

/** Call once at the top of a file. After each test the pages must have complained of nothing unexpected. */
export function testBrowser(): TestBrowser {
  let browser: Browser | undefined;
  const contexts: BrowserContext[] = [];
  const complaints: string[] = [];

  beforeAll(async () => {
    browser = await chromium.launch({ executablePath: chromiumPath(), args: ARGUMENTS });
  });
  afterEach(async () => {
    for (const context of contexts.splice(0)) await context.close();
    expect(complaints.splice(0), 'unexpected complaints of the browser').toEqual([]);
  });
  afterAll(async () => {
    await browser?.close();
  });

  return {
    async newPage(options = {}) {
      if (!browser) throw new Error('newPage works inside tests and hooks only');
      const context = await openContext(browser, options);
      contexts.push(context);
      collectComplaints(context, complaints, options.expected ?? []);
      return context.newPage();
    },
    newTab: (page) => page.context().newPage(),
  };
}

async function openContext(browser: Browser, options: PageOptions): Promise<BrowserContext> {
  const { width = 1440, as, baseUrl = inject('baseUrl'), colourScheme = 'light' } = options;
  const context = await browser.newContext({
    baseURL: baseUrl,
    viewport: { width, height: HEIGHTS[width] },
    colorScheme: colourScheme,
    locale: 'en-GB',
    timezoneId: 'UTC',
    reducedMotion: 'reduce',
    permissions: ['clipboard-read', 'clipboard-write'],
  });
  if (as) await addSession(context, baseUrl, typeof as === 'string' ? demoSignIn(as) : as);
  return context;
}

async function addSession(
  context: BrowserContext,
  baseUrl: string,
  { email, password }: { email: string; password: string },
): Promise<void> {
  const client = await signIn(email, password, { baseUrl });
  await context.addCookies([...client.cookies].map(([name, value]) => ({ name, value, url: baseUrl })));
}

function collectComplaints(context: BrowserContext, complaints: string[], expected: readonly RegExp[]): void {
  const keep = (text: string) => {
    if (!expected.some((pattern) => pattern.test(text))) complaints.push(text);
  };
  context.on('console', (message) => {
    const { url } = message.location();
    if (['error', 'warning'].includes(message.type())) keep(`${message.type()}: ${message.text()} (${url})`);
  });
  context.on('weberror', (webError) => keep(`uncaught: ${webError.error().message}`));
  context.on('response', (response) => {
    if (response.status() >= 500) keep(`${response.status()} from ${response.url()}`);
  });
}

/** The page breaks no rule of WCAG 2.2 A and AA that a program can check. */
export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).withTags(RULES).analyze();
  const found = violations.map(({ id, help, nodes }) => ({
    id,
    help,
    where: nodes.map((node) => `${node.target.join(' ')}: ${node.html.slice(0, 200)}`),
  }));
  expect(found, `accessibility of ${page.url()}`).toEqual([]);
}

/** The page itself never scrolls sideways; wide tables scroll within their own frame. */
export async function expectNoSidewaysScroll(page: Page): Promise<void> {
  const { content, window } = await page.evaluate(() => ({
    content: document.documentElement.scrollWidth,
    window: document.documentElement.clientWidth,
  }));
  expect(content, `width of ${page.url()}`).toBeLessThanOrEqual(window);
}
