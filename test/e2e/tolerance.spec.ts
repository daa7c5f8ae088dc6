import type { PanelDetail } from '../../shared/contracts/projects';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { seriousAccessFaults } from '../support/browser';
import type { WatchedPage } from '../support/browser';
import { eventually } from './support/eventually';
import { PanelDesk, withBeamTheta } from './support/panel-desk';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import { WorkspaceScreen } from './support/workspace-screen';

describe('a tolerance run', () => {
  let stage: Stage;
  let desk: PanelDesk;
  let designer: WatchedPage;
  let panel: PanelDetail;

  beforeAll(async () => {
    stage = await Stage.open();
    desk = new PanelDesk(await stage.apiOf('designer'));
  }, STAGE_START_MS);

  beforeEach(async () => {
    designer = await stage.pageOf('designer');
    // A beam that no other test asked for, so that no result is known already.
    panel = await desk.ownPanel(`Tolerance ${freshWord()}`, withBeamTheta(STARTING_DESIGN, 10 + (Date.now() % 10_000) / 1000));
    await new WorkspaceScreen(designer.page).open(panel.id, 'tolerance');
  });

  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  it('makes panels by chance on a worker and shows yield with its interval, ranking and envelope', async () => {
    const { page } = designer;
    const bow = page.getByLabel('Panel bowed, spread in mm', { exact: true });
    await bow.fill('500 µm');
    await bow.press('Enter');
    await eventually(async () => expect(await bow.inputValue()).toBe('0.5'));
    const trials = page.getByLabel('Trials', { exact: true });
    await trials.fill('40');
    await trials.press('Enter');
    await page.getByRole('button', { name: 'Start run' }).click();
    await page.getByText(/^\d+ of 40 panels meet every line judged, /).waitFor();
    await eventually(async () => expect(await page.getByRole('group', { name: 'Yield per line of the requirement' }).getByRole('row').count()).toBe(4));
    await page.getByRole('img', { name: /^Contributors by what they do: .*only the cells of an edition have a geometry/ }).waitFor();
    await page.getByRole('application', { name: /^Envelope of the cut along the beam/ }).waitFor();
    expect(await seriousAccessFaults(page)).toEqual([]);
    // The spreads come back with the run, and another one marks the result.
    await page.reload();
    await eventually(async () => expect(await bow.inputValue()).toBe('0.5'));
    await bow.fill('0.1');
    await bow.press('Enter');
    await page.getByText(/^Spreads changed: this run had others/).waitFor();
    expect(designer.problems).toEqual([]);
  });
});
