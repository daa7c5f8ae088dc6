import type { Page } from 'playwright-core';
import type { PanelDetail } from '../../shared/contracts/projects';
import type { WatchedPage } from '../support/browser';
import { eventually } from './support/eventually';
import { PanelDesk } from './support/panel-desk';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import { WorkspaceScreen } from './support/workspace-screen';

const sheetNames = ['Requirement', 'Panel', 'Illumination', 'Cells', 'Phase', 'Pattern', 'Revisions'];

async function type(page: Page, label: string, text: string): Promise<void> {
  const field = page.getByLabel(label, { exact: true });
  await field.fill(text);
  await field.press('Enter');
}

/** Keeps what this page saves from the server until released. */
async function holdSaving(page: Page): Promise<() => void> {
  let release = (): void => undefined;
  const released = new Promise<void>((resolve) => (release = resolve));
  await page.route('**/draft', async (route) => {
    await released;
    await route.continue();
  });
  return release;
}

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
  });

  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  /** What the server holds, once it does. */
  const expectOutline = (sides: { readonly widthMm: number; readonly heightMm: number }): Promise<void> =>
    eventually(async () => expect((await desk.panel(panel.id)).design.panel.outline).toEqual({ kind: 'rectangle', ...sides }));

  it('goes back and forth step by step, by buttons and by keys, and outlives a reload', async () => {
    const { page, problems } = designer;
    await type(page, 'Width', '220');
    await type(page, 'Height', '21 cm');
    await screen.fieldShows('Height', '210');
    await page.getByRole('button', { name: 'Undo' }).click();
    await screen.fieldShows('Height', '200');
    await page.getByRole('heading', { name: 'Panel' }).click();
    await page.keyboard.press('Control+z');
    await screen.fieldShows('Width', '200');
    await page.keyboard.press('Control+Shift+z');
    await screen.fieldShows('Width', '220');
    await page.getByRole('button', { name: 'Redo' }).click();
    await screen.fieldShows('Height', '210');
    await screen.saved();
    await page.reload();
    await screen.strip('Gain at the peak').waitFor();
    await screen.fieldShows('Width', '220');
    await screen.fieldShows('Height', '210');
    await expectOutline({ widthMm: 220, heightMm: 210 });
    expect(problems).toEqual([]);
  });

  it('keeps an entry it cannot read, says why and what to write, and never guesses', async () => {
    const { page, problems } = designer;
    await type(page, 'Width', '20,5');
    await page.getByRole('alert').filter({ hasText: 'Not taken' }).waitFor();
    await screen.fieldShows('Width', '20,5');
    await page.getByRole('button', { name: 'Use 20.5' }).waitFor();
    await page.getByLabel('Width', { exact: true }).press('Escape');
    await screen.fieldShows('Width', '200');
    await type(page, 'Width', '8 in');
    await screen.fieldShows('Width', '203.2');
    expect(problems).toEqual([]);
  });

  it('shows both versions of a field that two people changed, and keeps the chosen ones', async () => {
    const { page, problems, expectReply } = designer;
    expectReply(412, /\/draft$/);
    const other = await stage.pageOf('designer');
    const otherScreen = new WorkspaceScreen(other.page);
    await otherScreen.open(panel.id, 'panel');
    await type(other.page, 'Width', '230');
    await type(other.page, 'Height', '190');
    await otherScreen.fieldShows('Height', '190');
    await otherScreen.saved();
    await expectOutline({ widthMm: 230, heightMm: 190 });
    // Both are typed before the first of them meets the other person's: a machine may be slower than the pause that saves.
    const release = await holdSaving(page);
    await type(page, 'Width', '240');
    await type(page, 'Height', '180');
    await screen.fieldShows('Height', '180');
    release();
    const dialog = page.getByRole('dialog');
    await dialog.getByRole('heading', { name: /changed this draft as well$/ }).waitFor();
    await eventually(async () => {
      const widths = await dialog.getByRole('row').filter({ hasText: /width/i }).getByRole('cell').allInnerTexts();
      expect(widths.slice(1).map((text) => text.trim())).toEqual(['200', '240', '230']);
    });
    await dialog.getByLabel(/^Keep mine for .*width/i).check();
    await dialog.getByLabel(/^Keep theirs for .*height/i).check();
    await dialog.getByRole('button', { name: 'Keep as chosen' }).click();
    await dialog.waitFor({ state: 'detached' });
    await screen.fieldShows('Width', '240');
    await screen.fieldShows('Height', '190');
    await screen.saved();
    await expectOutline({ widthMm: 240, heightMm: 190 });
    expect([...problems, ...other.problems]).toEqual([]);
  });

  it('is for a reviewer to look at: nothing can be changed, and it is said why', async () => {
    const reviewer = await stage.pageOf('reviewer');
    const shown = new WorkspaceScreen(reviewer.page);
    await shown.open(panel.id, 'panel');
    await reviewer.page.getByText('View only. Only a designer changes panels; your part here is reviewer.').waitFor();
    const freeze = reviewer.page.getByRole('button', { name: /^Freeze revision/ });
    await eventually(async () => {
      expect(await reviewer.page.getByLabel('Width', { exact: true }).getAttribute('readonly')).not.toBeNull();
      expect(await reviewer.page.getByRole('button', { name: 'Undo' }).count()).toBe(0);
      expect(await freeze.getAttribute('aria-disabled')).toBe('true');
      expect(await freeze.getAttribute('title')).toMatch(/designer/);
    });
    await shown.sheet('Pattern').click();
    const handle = reviewer.page.getByRole('slider', { name: /^Wanted beam/ });
    await eventually(async () => expect(await handle.getAttribute('aria-disabled')).toBe('true'));
    expect(reviewer.problems).toEqual([]);
  });

  it('is worked on by keys: sheets by number, the palette by Ctrl K, the list of keys by ?', async () => {
    const { page, problems } = designer;
    for (const title of sheetNames) {
      await page.keyboard.press(await screen.keyOf(title));
      await page.waitForURL(`**/panels/${panel.id}/${title.toLowerCase()}`);
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
    await page.getByRole('option', { name: /Illumination/ }).first().waitFor();
    await page.keyboard.press('Enter');
    await page.waitForURL('**/illumination');
    await page.keyboard.press('Control+k');
    await palette.waitFor();
    await page.keyboard.press('Escape');
    await palette.waitFor({ state: 'hidden' });
    // A number typed into a field is a number, not a sheet.
    await page.goto(`/panels/${panel.id}/panel`);
    const width = page.getByLabel('Width', { exact: true });
    await width.focus();
    await page.keyboard.press('Control+a');
    await page.keyboard.type('1');
    await screen.fieldShows('Width', '1');
    expect(page.url()).toMatch(/\/panel$/);
    expect(problems).toEqual([]);
  });
});
