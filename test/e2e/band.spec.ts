import type { PanelDetail } from '../../shared/contracts/projects';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { seriousAccessFaults } from '../support/browser';
import type { WatchedPage } from '../support/browser';
import { eventually } from './support/eventually';
import { PanelDesk, withBeamTheta } from './support/panel-desk';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import { WorkspaceScreen } from './support/workspace-screen';

const BAND: DesignDocument = { ...STARTING_DESIGN, requirement: { ...STARTING_DESIGN.requirement, bandGHz: [27, 29], minGainDbi: 25 } };

describe('a run over the band', () => {
  let stage: Stage;
  let desk: PanelDesk;
  let designer: WatchedPage;
  let screen: WorkspaceScreen;
  let panel: PanelDetail;

  beforeAll(async () => {
    stage = await Stage.open();
    desk = new PanelDesk(await stage.apiOf('designer'));
  }, STAGE_START_MS);

  beforeEach(async () => {
    designer = await stage.pageOf('designer');
    screen = new WorkspaceScreen(designer.page);
    // A beam that no other test asked for, so that no result is known already.
    panel = await desk.ownPanel(`Band ${freshWord()}`, withBeamTheta(BAND, 10 + (Date.now() % 10_000) / 1000));
    await screen.open(panel.id, 'band');
  });

  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  const start = async (frequencies: string): Promise<void> => {
    const { page } = designer;
    await page.getByLabel('Frequencies', { exact: true }).fill(frequencies);
    await page.getByLabel('Frequencies', { exact: true }).press('Enter');
    await page.getByRole('button', { name: 'Start run' }).click();
  };

  it('computes on a worker beside the server and shows the worst case by frequency', async () => {
    const { page } = designer;
    await start('9');
    await page.getByRole('heading', { name: 'Worst case in the band' }).waitFor();
    const gain = page.getByRole('row', { name: /^Gain ≥ 25\.00 dBi/ });
    await eventually(async () => expect(await gain.innerText()).toMatch(/\t2[78]\.\d{3}\t|\t29\.000\t/));
    const table = page.getByRole('group', { name: 'Figures at every frequency' });
    await eventually(async () => expect(await table.getByRole('row').count()).toBe(10));
    // The same question again is answered at once, from what is known.
    await page.getByRole('button', { name: 'Start run' }).click();
    await page.getByText('known already').waitFor();
    expect(await seriousAccessFaults(page)).toEqual([]);
    await desk.saveDraft(panel.id, (design) => withBeamTheta(design, 30));
    await page.reload();
    await page.getByText(/^Inputs changed: this is draft, save 1/).waitFor();
    expect(designer.problems).toEqual([]);
  });

  it('shows progress, and gives the worker back when it is cancelled', async () => {
    const { page } = designer;
    await start('401');
    const bar = page.getByRole('progressbar', { name: 'Progress of the run' });
    await bar.waitFor();
    await eventually(async () => {
      expect(Number(await bar.getAttribute('aria-valuenow'))).toBeGreaterThan(0);
      expect(await bar.getAttribute('aria-valuetext')).toMatch(/^computing: \d+ of \d+ parts done/);
    });
    await page.getByRole('button', { name: 'Cancel run' }).click();
    await bar.waitFor({ state: 'detached' });
    await page.getByRole('group', { name: 'Earlier runs' }).getByRole('cell', { name: 'cancelled' }).waitFor();
    expect(designer.problems).toEqual([]);
  });
});
