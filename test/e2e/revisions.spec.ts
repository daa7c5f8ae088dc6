import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import JSZip from 'jszip';
import type { Download, Page } from 'playwright-core';
import { comparison } from '../../shared/contracts/comparisons';
import type { Comparison } from '../../shared/contracts/comparisons';
import { exportPreview } from '../../shared/contracts/projects';
import type { PanelDetail } from '../../shared/contracts/projects';
import type { ApiClient } from '../support/api-client';
import type { WatchedPage } from '../support/browser';
import { eventually } from './support/eventually';
import { tabTo } from './support/keyboard';
import { PanelDesk, withBeamTheta } from './support/panel-desk';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import { WorkspaceScreen, shownNumber } from './support/workspace-screen';

const firstMessage = 'Beam at 20°, as the survey asks.';
const secondMessage = 'Beam at 22°: to see what two degrees cost.';

interface TwoRevisions {
  readonly panel: PanelDetail;
  readonly first: string;
  readonly second: string;
}

describe('revisions of a panel', () => {
  let stage: Stage;
  let api: ApiClient;
  let desk: PanelDesk;
  let designer: WatchedPage;
  let screen: WorkspaceScreen;

  beforeAll(async () => {
    stage = await Stage.open();
    api = await stage.apiOf('designer');
    desk = new PanelDesk(api);
  }, STAGE_START_MS);

  beforeEach(async () => {
    designer = await stage.pageOf('designer');
    screen = new WorkspaceScreen(designer.page);
  });

  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  async function newPanel(): Promise<PanelDetail> {
    return desk.ownPanel(`Revisions ${freshWord()}`, (await desk.demoPanel('A')).design);
  }

  /** Prepared past the screens, for what comes after freezing. */
  async function frozenTwice(): Promise<TwoRevisions> {
    const panel = await newPanel();
    const ids: string[] = [];
    for (const [message, theta] of [[firstMessage, 20], [secondMessage, 22]] as const) {
      await desk.saveDraft(panel.id, (design) => withBeamTheta(design, theta));
      ids.push(await desk.freeze(panel.id, message));
    }
    return { panel, first: ids[0], second: ids[1] };
  }

  async function compared(before: string, after: string): Promise<Comparison> {
    const query = `before=revision:${before}&after=revision:${after}`;
    return comparison.parse((await api.get(`/api/comparisons?${query}`, { headers: { accept: 'application/json' } })).json);
  }

  const section = (page: Page, title: string) => page.locator('section').filter({ has: page.getByRole('heading', { name: title, exact: true }) }).last();

  async function expectComparisonOf({ cells, parameters }: Comparison): Promise<void> {
    const { page } = designer;
    await page.getByText('Parameters that differ').waitFor();
    await eventually(async () => {
      const rows = await section(page, 'Parameters that differ').locator('tbody tr').allInnerTexts();
      expect(rows).toHaveLength(parameters.length);
      expect(rows.some((row) => /20°\s*22°/.test(row))).toBe(true);
    });
    if (cells.kind !== 'compared' || !('changed' in cells)) throw new Error('the cells of equal lattices were not compared');
    await eventually(async () => {
      const changed = await screen.fact('Changed');
      expect(shownNumber(changed)).toBe(cells.changed);
      expect(shownNumber(changed.split(' of ')[1])).toBe(cells.total);
    });
    expect(cells.changed).toBeGreaterThan(100);
  }

  it('are frozen twice with messages and compared: parameters, cells, figures, cuts', async () => {
    const { page, problems } = designer;
    const panel = await newPanel();
    await screen.open(panel.id, 'pattern');
    await screen.freeze(1, firstMessage);
    await page.getByLabel('Beam θ').fill('22');
    await page.getByLabel('Beam θ').press('Enter');
    await screen.settled(async () => (await screen.marker(/^\s*1\s*peak/)).angleDeg, (angle) => Math.abs(angle - 22) < 0.25);
    await screen.freeze(2, secondMessage);
    await screen.sheet('Revisions').click();
    await page.getByRole('row').filter({ hasText: secondMessage }).getByRole('link', { name: 'Compare revision 2 with its parent' }).click();
    const [newest, oldest] = await desk.revisions(panel.id);
    expect([newest.number, newest.message, oldest.number, oldest.message]).toEqual([2, secondMessage, 1, firstMessage]);
    await expectComparisonOf(await compared(oldest.id, newest.id));
    await page.locator('slant-compared-cuts .main-svg').first().waitFor();
    expect(problems).toEqual([]);
  });

  it('are steered to, frozen and compared on a phone in the dark', async () => {
    const panel = await newPanel();
    const { page, problems } = await stage.pageOf('designer', { size: 'phone', theme: 'dark' });
    const phone = new WorkspaceScreen(page);
    await phone.open(panel.id, 'pattern');
    await phone.freeze(1, firstMessage);
    await page.getByLabel('Beam θ').fill('22');
    await page.getByLabel('Beam θ').press('Enter');
    await phone.settled(async () => (await phone.marker(/^\s*1\s*peak/)).angleDeg, (angle) => Math.abs(angle - 22) < 0.25);
    await phone.freeze(2, secondMessage);
    await page.goto(`/panels/${panel.id}/revisions`);
    await page.getByRole('row').filter({ hasText: secondMessage }).getByRole('link', { name: 'Compare revision 2 with its parent' }).click();
    await page.getByText('Parameters that differ').waitFor();
    await page.locator('slant-compared-cuts .main-svg').first().waitFor();
    expect(problems).toEqual([]);
  });

  it('are frozen and compared by the keyboard alone', async () => {
    const { page, problems } = designer;
    const { panel, first } = await frozenTwice();
    await desk.saveDraft(panel.id, (design) => withBeamTheta(design, 20));
    await screen.open(panel.id, 'requirement');
    await page.keyboard.press(await screen.keyOf('Revisions'));
    await page.getByText(secondMessage).waitFor();
    await tabTo(page, /^Freeze revision 3$/);
    await page.keyboard.press('Enter');
    await page.getByLabel('What is this revision about?').and(page.locator(':focus')).waitFor();
    await page.keyboard.type('Back at 20°.');
    await tabTo(page, /^Freeze revision 3$/);
    await page.keyboard.press('Enter');
    await page.getByRole('cell', { name: /Back at 20°/ }).waitFor();
    const [third] = await desk.revisions(panel.id);
    // The same content has the same hash, whatever came between.
    expect(third.hash).toBe((await desk.revisions(panel.id)).find(({ id }) => id === first)?.hash);
    await tabTo(page, /^Compare revision 2 with its parent$/);
    await page.keyboard.press('Enter');
    await page.waitForURL('**/compare?**');
    await page.getByText('Parameters that differ').waitFor();
    expect(problems).toEqual([]);
  });

  async function checkArchive(download: Download, wanted: { name: string; sha256: string }): Promise<void> {
    expect(download.suggestedFilename()).toBe(wanted.name);
    const bytes = readFileSync(await download.path());
    expect(createHash('sha256').update(bytes).digest('hex')).toBe(wanted.sha256);
    const zip = await JSZip.loadAsync(bytes, { checkCRC32: true });
    const names = Object.keys(zip.files);
    const folder = names[0].split('/')[0];
    const sums = (await zip.file(`${folder}/SHA256SUMS`)?.async('string'))?.trim().split('\n') ?? [];
    expect(sums).toHaveLength(names.length - 1);
    for (const line of sums) {
      const [, sum, name] = /^([0-9a-f]{64})  (\S+)$/.exec(line) ?? [];
      const content = await zip.file(`${folder}/${name}`)?.async('nodebuffer');
      expect([name, createHash('sha256').update(content ?? '').digest('hex')]).toEqual([name, sum]);
    }
  }

  it('are exported: the preview tells what the zip holds, and its sums are right', async () => {
    const { page, problems } = designer;
    const { panel, second } = await frozenTwice();
    await screen.open(panel.id, 'revisions');
    await page.getByRole('button', { name: 'Export revision 2' }).click();
    const preview = exportPreview.parse((await api.get(`/api/revisions/${second}/export/preview`)).json);
    const table = page.locator('slant-export-panel');
    await table.getByText(preview.archiveName).waitFor();
    await eventually(async () => expect(await table.locator('button.name').allInnerTexts()).toEqual(preview.files.map(({ name }) => name)));
    await table.getByRole('button', { name: preview.files[0].name }).click();
    await eventually(async () => expect(await table.locator('pre').innerText()).toContain(preview.files[0].head.split('\n')[0].trim()));
    const download = page.waitForEvent('download');
    await table.getByRole('button', { name: 'Download' }).click();
    const sha256 = await table.locator('.hash').innerText();
    await checkArchive(await download, { name: preview.archiveName, sha256 });
    expect(problems).toEqual([]);
  });

  it('are restored as a new revision that the draft follows', async () => {
    const { page, problems } = designer;
    const { panel, first } = await frozenTwice();
    await screen.open(panel.id, 'revisions');
    await page.getByRole('button', { name: 'Restore revision 1' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Restore revision 1' }).click();
    await page.getByRole('button', { name: 'Export revision 3' }).waitFor();
    const [third] = await desk.revisions(panel.id);
    expect(third).toMatchObject({ number: 3, restoredFromNumber: 1, hash: (await desk.revisions(panel.id)).find(({ id }) => id === first)?.hash });
    expect((await desk.panel(panel.id)).design.requirement.beams[0].thetaDeg).toBe(20);
    expect(problems).toEqual([]);
  });
});
