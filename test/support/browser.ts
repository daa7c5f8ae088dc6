import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { AxeBuilder } from '@axe-core/playwright';
import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, Page } from 'playwright-core';

const executablePath = '/usr/bin/chromium';
const switches = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export const screenshotFolder = join(__dirname, '../../.cache/screenshots');

export const windowSizes = { desktop: { width: 1440, height: 900 }, phone: { width: 390, height: 844 } } as const;

export interface PageWish {
  readonly size?: keyof typeof windowSizes;
  readonly theme?: 'light' | 'dark';
}

/** A page together with everything that went wrong on it; `problems` must be empty at the end of a test. */
export interface WatchedPage {
  readonly page: Page;
  readonly problems: readonly string[];
  /** Says beforehand that a failing reply is part of the story, such as a 401 for a wrong password. */
  readonly expectReply: (status: number, path: RegExp) => void;
}

interface Expected {
  readonly status: number;
  readonly path: RegExp;
}

/** Chromium reports each failed reply on the console too, as text with the status and the address in its location. */
const isReplyEcho = (text: string): boolean => text.startsWith('Failed to load resource: the server responded with a status of');

function watch(page: Page, origin: string): WatchedPage {
  const problems: string[] = [];
  const expected: Expected[] = [];
  page.on('console', (message) => {
    // A violation of the content security policy arrives as a console error as well.
    if (!['error', 'warning'].includes(message.type()) || isReplyEcho(message.text())) return;
    problems.push(`console ${message.type()}: ${message.text()}`);
  });
  page.on('pageerror', (error) => problems.push(`page error: ${error.message}`));
  page.on('request', (request) => {
    const url = request.url();
    if (!url.startsWith(`${origin}/`) && !/^(data|blob):/.test(url)) problems.push(`request leaves the origin: ${url}`);
  });
  page.on('response', (response) => {
    const path = new URL(response.url()).pathname;
    const isExpected = expected.some((reply) => reply.status === response.status() && reply.path.test(path));
    if (response.status() >= 400 && !isExpected) problems.push(`reply ${response.status()} for ${path}`);
  });
  return { page, problems, expectReply: (status, path) => expected.push({ status, path }) };
}

/** One Chromium for a suite; each page gets a context of its own, as if it were another person's browser. */
export class TestBrowser {
  private readonly contexts: BrowserContext[] = [];

  private constructor(
    private readonly browser: Browser,
    readonly origin: string,
  ) {}

  static async launch(origin: string): Promise<TestBrowser> {
    return new TestBrowser(await chromium.launch({ executablePath, headless: true, args: switches }), origin);
  }

  async openPage({ size = 'desktop', theme = 'light' }: PageWish = {}): Promise<WatchedPage> {
    const context = await this.browser.newContext({
      baseURL: this.origin,
      viewport: windowSizes[size],
      colorScheme: theme,
      reducedMotion: 'reduce',
      locale: 'en-GB',
      timezoneId: 'UTC',
    });
    // A busy machine takes its time; a test fails by what it sees, not by how soon.
    context.setDefaultTimeout(30_000);
    this.contexts.push(context);
    await context.addInitScript(() => {
      document.addEventListener('securitypolicyviolation', (event) =>
        console.error(`content security policy: ${event.violatedDirective} blocked ${event.blockedURI}`),
      );
    });
    return watch(await context.newPage(), this.origin);
  }

  /** Ends the pages of a test; call it after each. */
  async closePages(): Promise<void> {
    await Promise.all(this.contexts.splice(0).map((context) => context.close()));
  }

  async close(): Promise<void> {
    await this.closePages();
    await this.browser.close();
  }
}

/** Serious and critical findings of axe on the page as it stands, as readable lines; a test expects none. */
export async function seriousAccessFaults(page: Page, of: 'everything' | 'colours' = 'everything'): Promise<string[]> {
  const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];
  // Listing what passes, and looking for frames that we do not have, would take six times as long as the checks.
  const checks = new AxeBuilder({ page }).options({ resultTypes: ['violations'] });
  const { violations } = await (of === 'colours' ? checks.withRules(['color-contrast']) : checks.withTags(tags)).setLegacyMode().analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, help, nodes }) => nodes.map((node) => `${id}: ${help} at ${node.target.join(' ')}: ${node.failureSummary ?? ''}`));
}

/** Puts a picture of the page into .cache/screenshots, for people to look at. */
export async function takePicture(page: Page, name: string, fullPage = false): Promise<void> {
  mkdirSync(screenshotFolder, { recursive: true });
  await page.screenshot({ path: join(screenshotFolder, `${name}.png`), fullPage, animations: 'disabled' });
}
