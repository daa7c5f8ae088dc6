import type { Locator, Page } from 'playwright-core';
import { PATIENCE_MS, eventually } from './eventually';

/** A number as the screens write it: true minus sign, spaces between thousands, a unit behind. */
export function shownNumber(text: string): number {
  const found = /[+\u2212-]?[\d\s\u00a0\u2009]*\d(?:\.\d+)?/.exec(text);
  return found === null ? Number.NaN : Number(found[0].replace(/[\s\u00a0\u2009]/g, '').replace('\u2212', '-'));
}

/** The workspace as a person reads it. */
export class WorkspaceScreen {
  constructor(readonly page: Page) {}

  async open(panelId: string, sheet: string): Promise<void> {
    await this.page.goto(`/panels/${panelId}/${sheet}`);
    await this.strip('Gain at the peak').waitFor();
  }

  /** The line of a sheet in the rail; its number is the place of the sheet, which grows with the product. */
  sheet(title: string): Locator {
    return this.page.getByRole('navigation', { name: 'Sheets of the panel' }).getByRole('link', { name: new RegExp(`^\\d+\\s*${title}`) });
  }

  /** The key that opens a sheet, as the rail names it. */
  async keyOf(title: string): Promise<string> {
    return (await this.sheet(title).locator('.number').innerText()).trim();
  }

  /** What stands in a field once it stands there. */
  async fieldShows(label: string, text: string): Promise<void> {
    const field = this.page.getByLabel(label, { exact: true });
    await eventually(async () => expect([label, await field.inputValue()]).toEqual([label, text]));
  }

  /** A figure of the strip. */
  strip(label: string): Locator {
    return this.page.getByRole('button', { name: new RegExp(`^${label}`) });
  }

  async figure(label: string): Promise<number> {
    return shownNumber(await this.strip(label).locator('.value b').innerText());
  }

  /** Waits until a figure of the strip is no longer what it was, and gives the new one. */
  async figureAfter(label: string, before: number): Promise<number> {
    return this.settled(() => this.figure(label), (now) => now !== before);
  }

  /** Row of the marker table of the Pattern sheet. */
  async marker(what: RegExp): Promise<{ readonly angleDeg: number; readonly levelDbi: number }> {
    const cells = this.page.locator('slant-marker-table tbody tr').filter({ hasText: what }).first().getByRole('cell');
    const [, angle, level] = await cells.allInnerTexts();
    return { angleDeg: shownNumber(angle ?? ''), levelDbi: shownNumber(level ?? '') };
  }

  /** Every change that the screen shows has reached the server. */
  async saved(): Promise<void> {
    await this.page.getByRole('status').filter({ hasText: /^\s*Saved \d\d:\d\d:\d\d UTC\s*$/ }).waitFor();
  }

  /** What stands in a list of names and values. */
  async fact(name: string): Promise<string> {
    return this.page.locator('dt', { hasText: new RegExp(`^${name}$`) }).locator('xpath=following-sibling::dd[1]').innerText();
  }

  /** Freezes the draft with a message, by the dialog. */
  async freeze(number: number, message: string): Promise<void> {
    await this.saved();
    const freeze = this.page.getByRole('button', { name: `Freeze revision ${number}` });
    await eventually(async () => expect(await freeze.getAttribute('title')).toBeNull()); // what would hinder it
    await freeze.click();
    const dialog = this.page.getByRole('dialog');
    await dialog.getByLabel('What is this revision about?').fill(message);
    await dialog.getByRole('button', { name: `Freeze revision ${number}` }).click();
    await dialog.waitFor({ state: 'detached' });
  }

  async settled<T>(read: () => Promise<T>, isWanted: (value: T) => boolean): Promise<T> {
    const end = Date.now() + PATIENCE_MS;
    for (;;) {
      const value = await read();
      if (isWanted(value)) return value;
      if (Date.now() > end) throw new Error(`it stayed at ${String(value)}`);
      await this.page.waitForTimeout(50);
    }
  }
}
