import type { Page } from 'playwright-core';

/** What a screen reader would call the element that has the focus. */
function focusedName(): string {
  const element = document.activeElement;
  if (!(element instanceof HTMLElement || element instanceof SVGElement)) return '';
  const labels = element instanceof HTMLInputElement || element instanceof HTMLTextAreaElement || element instanceof HTMLSelectElement ? [...(element.labels ?? [])].map((label) => label.textContent ?? '').join(' ') : '';
  return (element.getAttribute('aria-label') ?? (labels || (element.textContent ?? ''))).replace(/\s+/g, ' ').trim();
}

/** Presses Tab until something of this name has the focus; fails when a whole round does not meet it. */
export async function tabTo(page: Page, name: RegExp, atMost = 150): Promise<void> {
  const met: string[] = [];
  for (let press = 0; press < atMost; press++) {
    const focused = await page.evaluate(focusedName);
    if (name.test(focused)) return;
    met.push(focused);
    await page.keyboard.press('Tab');
  }
  throw new Error(`Tab never reached ${String(name)}; it met ${[...new Set(met)].join(' | ')}`);
}

/** True when the focused element shows that it has the focus. */
export const focusIsShown = (page: Page): Promise<boolean> =>
  page.evaluate(() => {
    const element = document.activeElement;
    if (!element || element === document.body) return false;
    const drawn = (part: Element | null): boolean => {
      if (!part) return false;
      const { outlineStyle, outlineWidth } = getComputedStyle(part);
      return outlineStyle !== 'none' && parseFloat(outlineWidth) > 0;
    };
    // In a drawing the ring is a circle of the focused group; around fields and check boxes it may lie on a neighbour.
    const first = element.firstElementChild;
    const ringed = element instanceof SVGElement && first instanceof SVGElement && getComputedStyle(first).stroke !== 'none';
    return ringed || drawn(element) || drawn(element.parentElement) || drawn(element.nextElementSibling);
  });
