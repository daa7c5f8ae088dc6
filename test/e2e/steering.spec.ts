import type { Locator, Page } from 'playwright-core';
import type { PanelDetail } from '../../shared/contracts/projects';
import type { WatchedPage } from '../support/browser';
import { eventually } from './support/eventually';
import { focusIsShown, tabTo } from './support/keyboard';
import { PanelDesk } from './support/panel-desk';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import { WorkspaceScreen, shownNumber } from './support/workspace-screen';

const fourStates = 'Four-state ring and patch, 5 mm lattice';

/** The chosen cell as the address of the Phase sheet names it, counted from 0. */
function chosenPlace(page: Page): { column: number; row: number } {
  const place = /cell=c(-?\d+)r(-?\d+)/.exec(page.url());
  if (place === null) throw new Error(`${page.url()} names no cell`);
  return { column: Number(place[1]), row: Number(place[2]) };
}

type Box = NonNullable<Awaited<ReturnType<Locator['boundingBox']>>>;

/** Where a drawing lies once it has stopped moving: layout goes on for a moment after the first paint. */
async function boxAtRest(drawing: Locator): Promise<Box> {
  let last: Box | null = null;
  await eventually(async () => {
    const before = last;
    last = await drawing.boundingBox();
    expect(last).not.toBeNull();
    expect(last).toEqual(before);
  });
  if (last === null) throw new Error('the drawing has no box');
  return last;
}

describe('steering and reading', () => {
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
    panel = await desk.ownPanel(`Steering ${freshWord()}`, design);
    designer = await stage.pageOf('designer');
    screen = new WorkspaceScreen(designer.page);
  });

  afterEach(async () => {
    await stage.browser.closePages();
  });
  afterAll(() => stage.close());

  async function peakNear(thetaDeg: number): Promise<void> {
    await screen.settled(async () => (await screen.marker(/^\s*1\s*peak/)).angleDeg, (angle) => Math.abs(angle - thetaDeg) < 0.25);
  }

  async function beamTheta(): Promise<number> {
    return shownNumber(await designer.page.getByLabel('Beam θ').inputValue());
  }

  /** Holds what the sheet says of the chosen cell against the cells that the server computes for the draft. */
  async function expectReadOutOfServer(): Promise<void> {
    await screen.saved();
    const { design } = await desk.panel(panel.id);
    const cells = await desk.cells(design);
    const { column, row } = chosenPlace(designer.page);
    const at = cells.column.findIndex((value, i) => value === column && cells.row[i] === row);
    expect(at).toBeGreaterThanOrEqual(0);
    await eventually(async () => {
      expect(await screen.fact('Position')).toBe(`col ${column + 1}, row ${row + 1}`);
      expect(shownNumber(await screen.fact('Phase error'))).toBeCloseTo(cells.errorDeg[at], 2);
      expect(shownNumber(await screen.fact('Response'))).toBeCloseTo(cells.responseDb[at], 2);
      const readOut = await designer.page.locator('slant-panel-map .read-out').innerText();
      expect(readOut).toContain(`col ${column + 1}, row ${row + 1}: target`);
      expect(shownNumber(readOut.split('error')[1])).toBeCloseTo(cells.errorDeg[at], 2);
    });
  }

  it('follows a typed and a dragged beam with strip, cut and markers', async () => {
    const { page, problems } = designer;
    await page.goto('/projects');
    await page.getByRole('link', { name: `Open ${panel.name}` }).click();
    await screen.strip('Gain at the peak').waitFor();
    await peakNear(20);
    const sidelobe = await screen.figure('Sidelobe level');
    await page.getByLabel('Beam θ').fill('27');
    await page.getByLabel('Beam θ').press('Enter');
    await peakNear(27);
    await screen.figureAfter('Sidelobe level', sidelobe);

    const handle = page.getByRole('slider', { name: /^Wanted beam/ });
    const disc = await boxAtRest(page.locator('slant-uv-map canvas'));
    const box = await boxAtRest(handle.locator('circle').nth(1));
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
    const stepPx = 0.1 * (disc.width / 2);
    await page.mouse.move(x, y);
    await page.mouse.down();
    for (let step = 1; step <= 6; step++) await page.mouse.move(x - (step / 6) * stepPx, y);
    await page.mouse.up();
    const wanted = (Math.asin(Math.sin((27 * Math.PI) / 180) - 0.1) * 180) / Math.PI;
    await screen.settled(beamTheta, (theta) => Math.abs(theta - wanted) < 0.3);
    await peakNear(wanted);
    await screen.saved();
    await eventually(async () => expect((await desk.panel(panel.id)).design.requirement.beams[0].thetaDeg).toBeCloseTo(await beamTheta(), 6));
    expect(problems).toEqual([]);
  });

  it('takes the cells of a library edition, and reads the phase error cell by cell with the mouse', async () => {
    const { page, problems } = designer;
    await screen.open(panel.id, 'cells');
    const rms = await screen.figure('RMS phase error');
    await page.getByRole('button', { name: `Use ${fourStates}, edition 1` }).click();
    await page.getByRole('row').filter({ hasText: fourStates }).getByText('in use').waitFor();
    // Four states about 90° apart leave errors spread evenly over ±45°: 45°/√3 = 26° RMS.
    const coarse = await screen.settled(() => screen.figure('RMS phase error'), (now) => now > 20);
    expect(coarse).toBeGreaterThan(rms);
    expect(coarse).toBeLessThan(30);

    await screen.sheet('Phase').click();
    await page.getByRole('radio', { name: 'Phase error' }).click();
    await page.locator('slant-panel-map').getByText(/error/).first().waitFor();
    const box = await boxAtRest(page.locator('slant-panel-map canvas'));
    await page.mouse.click(box.x + box.width * 0.31, box.y + box.height * 0.41);
    await page.waitForURL(/cell=c\d+r\d+/);
    expect(chosenPlace(page)).toEqual({ column: 12, row: 23 });
    await page.mouse.move(5, 5);
    await expectReadOutOfServer();
    expect(problems).toEqual([]);
  });

  it('does the same by the keyboard alone', async () => {
    const { page, problems } = designer;
    await page.goto('/projects');
    await page.getByRole('heading', { name: 'Projects' }).waitFor();
    await page.keyboard.press('Control+k');
    await page.getByRole('combobox', { name: /^Find a panel/ }).and(page.locator(':focus')).waitFor();
    await page.keyboard.type(panel.name);
    await page.getByRole('option', { name: new RegExp(panel.name) }).first().waitFor();
    await page.keyboard.press('Enter');
    await screen.strip('Gain at the peak').waitFor();
    await page.keyboard.press(await screen.keyOf('Pattern'));
    await page.waitForURL('**/pattern');
    await peakNear(20);
    await tabTo(page, /^Beam θ/);
    await eventually(async () => expect(await focusIsShown(page)).toBe(true));
    await page.keyboard.press('Control+a');
    await page.keyboard.type('24°');
    await page.keyboard.press('Enter');
    await peakNear(24);
    await tabTo(page, /^Wanted beam/);
    await eventually(async () => expect(await focusIsShown(page)).toBe(true));
    await page.keyboard.press('Shift+ArrowRight');
    const farther = (Math.asin(Math.sin((24 * Math.PI) / 180) + 0.05) * 180) / Math.PI;
    await screen.settled(beamTheta, (theta) => Math.abs(theta - farther) < 0.06);
    await peakNear(farther);

    await page.keyboard.press(await screen.keyOf('Phase'));
    await page.waitForURL('**/phase');
    await boxAtRest(page.locator('slant-panel-map canvas'));
    await tabTo(page, /^Target phase of the panel/);
    await eventually(async () => expect(await focusIsShown(page)).toBe(true));
    await page.keyboard.press('ArrowRight');
    await page.waitForURL(/cell=/);
    const start = chosenPlace(page);
    for (const [key, by] of [['ArrowLeft', [-1, 0]], ['ArrowUp', [-1, 1]], ['ArrowRight', [0, 1]]] as const) {
      await page.keyboard.press(key);
      await screen.settled(async () => chosenPlace(page), (at) => at.column === start.column + by[0] && at.row === start.row + by[1]);
      await expectReadOutOfServer();
    }
    expect(problems).toEqual([]);
  });
});
