import type { Page } from 'playwright-core';
import { seriousAccessFaults, windowSizes } from '../../support/browser';
import type { PageWish, WatchedPage } from '../../support/browser';
import { eventually } from './eventually';

type Size = NonNullable<PageWish['size']>;
type Theme = NonNullable<PageWish['theme']>;

/** All four, each one step from the one before: what the step changes has to be drawn anew only once. */
const looks: readonly (readonly [Size, Theme])[] = [
  ['desktop', 'light'],
  ['desktop', 'dark'],
  ['phone', 'dark'],
  ['phone', 'light'],
];

/** What sticks out of the page to the side; a wide thing in a scroll box of its own does not. */
export function sidewaysOverflow(): string[] {
  const room = document.documentElement.clientWidth;
  const excess = Math.max(document.documentElement.scrollWidth, document.body.scrollWidth) - room;
  if (excess <= 0) return [];
  const outside = [...document.querySelectorAll('body *')].filter((element) => element.getBoundingClientRect().right > room + 0.5);
  const names = outside.slice(0, 5).map((element) => `${element.tagName.toLowerCase()}.${element.getAttribute('class') ?? ''}`);
  return [`the page is ${excess} px wider than its window of ${room} px: ${names.join(', ')}`];
}

async function takeLook(page: Page, size: Size, theme: Theme): Promise<void> {
  await page.emulateMedia({ colorScheme: theme, reducedMotion: 'reduce' });
  await page.setViewportSize(windowSizes[size]);
  await eventually(async () => expect(await page.evaluate(() => [document.documentElement.dataset['theme'], innerWidth])).toEqual([theme, windowSizes[size].width]));
  // Layout and plots follow the new size in the next frames.
  await page.evaluate(() => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve))));
}

/** Everything that is wrong with the screen that stands open, at both sizes and in both themes. */
export async function faultsOfScreen({ page }: WatchedPage): Promise<string[]> {
  const faults: string[] = [];
  for (const [size, theme] of looks) {
    await takeLook(page, size, theme);
    // Structure is that of the size; the other theme of the same size differs in its colours alone.
    const isNewSize = theme === (size === 'desktop' ? 'light' : 'dark');
    const found = [...(await seriousAccessFaults(page, isNewSize ? 'everything' : 'colours')), ...(isNewSize ? await page.evaluate(sidewaysOverflow) : [])];
    faults.push(...found.map((fault) => `${size}, ${theme}: ${fault}`));
  }
  return faults;
}
