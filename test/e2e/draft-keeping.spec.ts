import type { Page } from 'playwright-core';
import type { PanelDetail } from '../../shared/contracts/projects';
import type { WatchedPage } from '../support/browser';
import { PanelDesk } from './support/panel-desk';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import { WorkspaceScreen } from './support/workspace-screen';

const sheetNames = ['requirement', 'panel', 'illumination', 'cells', 'phase', 'pattern', 'revisions'];

async function type(page: Page, label: string, text: string): Promise<void> {
  const field = page.getByLabel(label, { exact: true });
  await field.fill(text);
  await field.press('Enter');
}

const valueOf = (page: Page, label: string): Promise<string> => page.getByLabel(label, { exact: true }).inputValue();

describe('the draft of a panel', () => {
  let stage: Stage;
  let desk: PanelDesk;
  let panel: PanelDetail;
  let designer: WatchedPage;
  let screen: WorkspaceScreen;

  beforeAll(async () => {
    stage = await Stage.open();
    desk = new PanelDesk(await stage.apiOf('designer'));
  }, STAGE_START_MS);

  beforeEach(async () => {
    const { design } = await desk.demoPanel('A');
    panel = await desk.ownPanel(`Draft ${freshWord()}`, design);
    designer = await stage.pageOf('designer');
    screen = new WorkspaceScreen(designer.page);
    await screen.open(panel.id, 'panel');
  }, 30_000);

  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  it('goes back and forth step by step, by buttons and by keys, and outlives a reload', async () => {
    const { page, problems } = designer;
    await type(page, 'Width', '220');
    await type(page, 'Height', '21 cm');
    await screen.settled(() => valueOf(page, 'Height'), (value) => value === '210');
    await page.getByRole('button', { name: 'Undo' }).click();
    await screen.settled(() => valueOf(page, 'Height'), (value) => value === '200');
    await page.getByRole('heading', { name: 'Panel' }).click();
    await page.keyboard.press('Control+z');
    await screen.settled(() => valueOf(page, 'Width'), (value) => value === '200');
    await page.keyboard.press('Control+Shift+z');
    await screen.settled(() => valueOf(page, 'Width'), (value) => value === '220');
    await page.getByRole('button', { name: 'Redo' }).click();
    await screen.settled(() => valueOf(page, 'Height'), (value) => value === '210');
    await screen.saved();
    await page.reload();
    await screen.strip('Gain at the peak').waitFor();
    expect([await valueOf(page, 'Width'), await valueOf(page, 'Height')]).toEqual(['220', '210']);
    expect((await desk.panel(panel.id)).design.panel.outline).toEqual({ kind: 'rectangle', widthMm: 220, heightMm: 210 });
    expect(problems).toEqual([]);
  }, 60_000);

  it('keeps an entry it cannot read, says why and what to write, and never guesses', async () => {
    const { page, problems } = designer;
    await type(page, 'Width', '20,5');
    await page.getByRole('alert').filter({ hasText: 'Not taken' }).waitFor();
    expect(await valueOf(page, 'Width')).toBe('20,5');
    await page.getByRole('button', { name: 'Use 20.5' }).waitFor();
    await page.getByLabel('Width', { exact: true }).press('Escape');
    expect(await valueOf(page, 'Width')).toBe('200');
    await type(page, 'Width', '8 in');
    expect(await valueOf(page, 'Width')).toBe('203.2');
    expect(problems).toEqual([]);
  }, 30_000);

  it('shows both versions of a field that two people changed, and keeps the chosen ones', async () => {
    const { page, problems, expectReply } = designer;
    expectReply(412, /\/draft$/);
    const other = await stage.pageOf('designer');
    const otherScreen = new WorkspaceScreen(other.page);
    await otherScreen.open(panel.id, 'panel');
    await type(other.page, 'Width', '230');
    await type(other.page, 'Height', '190');
    await otherScreen.saved();
    await screen.settled(async () => (await desk.panel(panel.id)).design.panel.outline, (outline) => JSON.stringify(outline).includes('190'));
    await type(page, 'Width', '240');
    await type(page, 'Height', '180');
    const dialog = page.getByRole('dialog');
    await dialog.getByRole('heading', { name: /changed this draft as well$/ }).waitFor();
    const widths = await dialog.getByRole('row').filter({ hasText: /width/i }).getByRole('cell').allInnerTexts();
    expect(widths.slice(1).map((text) => text.trim())).toEqual(['200', '240', '230']);
    await dialog.getByLabel(/^Keep mine for .*width/i).check();
    await dialog.getByLabel(/^Keep theirs for .*height/i).check();
    await dialog.getByRole('button', { name: 'Keep as chosen' }).click();
    await screen.saved();
    await screen.settled(async () => (await desk.panel(panel.id)).design.panel.outline, (outline) => JSON.stringify(outline) === JSON.stringify({ kind: 'rectangle', widthMm: 240, heightMm: 190 }));
    expect([await valueOf(page, 'Width'), await valueOf(page, 'Height')]).toEqual(['240', '190']);
    expect([...problems, ...other.problems]).toEqual([]);
  }, 60_000);

  it('is for a reviewer to look at: nothing can be changed, and it is said why', async () => {
    const reviewer = await stage.pageOf('reviewer');
    const shown = new WorkspaceScreen(reviewer.page);
    await shown.open(panel.id, 'panel');
    await reviewer.page.getByText('View only. Only a designer changes panels; your part here is reviewer.').waitFor();
    expect(await reviewer.page.getByLabel('Width', { exact: true }).getAttribute('readonly')).not.toBeNull();
    expect(await reviewer.page.getByRole('button', { name: 'Undo' }).count()).toBe(0);
    const freeze = reviewer.page.getByRole('button', { name: /^Freeze revision/ });
    expect(await freeze.getAttribute('aria-disabled')).toBe('true');
    expect(await freeze.getAttribute('title')).toMatch(/designer/);
    await reviewer.page.getByRole('link', { name: /^6\s*Pattern/ }).click();
    const handle = reviewer.page.getByRole('slider', { name: /^Wanted beam/ });
    expect(await handle.getAttribute('aria-disabled')).toBe('true');
    expect(reviewer.problems).toEqual([]);
  }, 30_000);

  it('is worked on by keys: sheets by number, the palette by Ctrl K, the list of keys by ?', async () => {
    const { page, problems } = designer;
    for (const [place, name] of sheetNames.entries()) {
      await page.keyboard.press(String(place + 1));
      await page.waitForURL(`**/panels/${panel.id}/${name}`);
    }
    await page.keyboard.press('?');
    const keys = page.getByRole('dialog', { name: 'Keys' });
    await keys.getByText('opens the sheet of that number').waitFor();
    await page.keyboard.press('Escape');
    await keys.waitFor({ state: 'hidden' });
    await page.keyboard.press('Control+k');
    const palette = page.getByRole('combobox', { name: /^Find a panel/ });
    await palette.waitFor();
    await page.keyboard.type('illum');
    await page.keyboard.press('Enter');
    await page.waitForURL('**/illumination');
    await page.keyboard.press('Control+k');
    await palette.waitFor();
    await page.keyboard.press('Escape');
    await palette.waitFor({ state: 'hidden' });
    // A number typed into a field is a number, not a sheet.
    await page.goto(`/panels/${panel.id}/panel`);
    await page.getByLabel('Width', { exact: true }).focus();
    await page.keyboard.type('1');
    expect(page.url()).toMatch(/\/panel$/);
    expect(problems).toEqual([]);
  }, 60_000);
});
