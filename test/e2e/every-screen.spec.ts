import type { Locator, Page } from 'playwright-core';
import { familyList } from '../../shared/contracts/library';
import type { WatchedPage } from '../support/browser';
import { PanelDesk, withBeamTheta } from './support/panel-desk';
import { faultsOfScreen } from './support/screen-soundness';
import { STAGE_START_MS, Stage, freshWord } from './support/stage';
import type { DemoName } from './support/stage';
import { WorkspaceScreen } from './support/workspace-screen';

/** What the addresses of the screens are made of. */
interface Places {
  readonly panelId: string;
  readonly before: string;
  readonly after: string;
  readonly familyId: string;
  readonly editionId: string;
}

interface Visit {
  readonly name: string;
  readonly path: (places: Places) => string;
  /** Visible once the screen shows what it is about. */
  readonly shows: (page: Page) => Locator;
}

const heading =
  (name: string | RegExp) =>
  (page: Page): Locator =>
    page.getByRole('heading', { name }).first();

const entranceScreens: readonly Visit[] = [
  { name: 'sign-in', path: () => '/sign-in', shows: (page) => page.getByRole('region', { name: 'Demo accounts' }) },
  { name: 'forgotten password', path: () => '/forgotten-password', shows: heading('Forgotten password') },
  { name: 'new password', path: () => '/new-password#of-no-letter', shows: (page) => page.getByLabel('New password') },
  { name: 'invitation that is over', path: () => '/invitation#of-no-letter', shows: (page) => page.getByRole('alert') },
];

const designerScreens: readonly Visit[] = [
  { name: 'projects', path: () => '/projects', shows: (page) => page.getByRole('link', { name: /^Open A/ }).first() },
  {
    name: 'comparison',
    path: ({ panelId, before, after }) => `/panels/${panelId}/revisions/compare?before=${before}&after=${after}`,
    shows: (page) => page.locator('slant-compared-cuts .main-svg').first(),
  },
  { name: 'library', path: () => '/library', shows: (page) => page.getByRole('link', { name: /edition 1/i }).first() },
  { name: 'family', path: ({ familyId }) => `/library/families/${familyId}`, shows: (page) => page.getByRole('link', { name: /edition/i }).first() },
  { name: 'edition', path: ({ editionId }) => `/library/editions/${editionId}`, shows: (page) => page.getByRole('region', { name: 'Original files' }) },
  { name: 'team', path: () => '/team', shows: (page) => page.getByRole('cell', { name: 'designer@merrow.example' }).first() },
  { name: 'account', path: () => '/account', shows: (page) => page.getByRole('heading', { level: 1 }).and(page.getByText('Designer')) },
  { name: 'page of another role', path: () => '/letters', shows: (page) => page.getByText('This sheet is for the administrator').first() },
  { name: 'address of nothing', path: () => '/no-such-sheet', shows: (page) => page.getByText('No such sheet').first() },
];

const administratorScreens: readonly Visit[] = [
  { name: 'team with invitations', path: () => '/team', shows: (page) => page.getByRole('region', { name: 'Invitations' }) },
  { name: 'audit log', path: () => '/team/audit', shows: (page) => page.getByRole('row').nth(1) },
  { name: 'letters', path: () => '/letters', shows: heading('Letters') },
];

const labScreens: readonly Visit[] = [{ name: 'import', path: () => '/library/import', shows: heading('Import a family') }];
const fabricatorScreens: readonly Visit[] = [{ name: 'projects without any', path: () => '/projects', shows: heading('Projects') }];

describe('every screen, wide and narrow, light and dark', () => {
  let stage: Stage;
  let places: Places;

  beforeAll(async () => {
    stage = await Stage.open();
    places = await preparePlaces();
  }, STAGE_START_MS);
  afterEach(() => stage.browser.closePages());
  afterAll(() => stage.close());

  async function preparePlaces(): Promise<Places> {
    const api = await stage.apiOf('designer');
    const desk = new PanelDesk(api);
    const panel = await desk.ownPanel(`Screens ${freshWord()}`, (await desk.demoPanel('A')).design);
    const before = `revision:${await desk.freeze(panel.id, 'As the demonstration has it.')}`;
    await desk.saveDraft(panel.id, (design) => withBeamTheta(design, 24));
    const after = `revision:${await desk.freeze(panel.id, 'Four degrees farther.')}`;
    const { items } = familyList.parse((await api.get('/api/library/families')).json);
    const family = items.find(({ editions }) => editions.some(({ state }) => state === 'published'));
    if (family === undefined) throw new Error('the demonstration has no published family');
    return { panelId: panel.id, before, after, familyId: family.id, editionId: family.editions[0].id };
  }

  async function expectSound(watched: WatchedPage, name: string): Promise<void> {
    const faults = await faultsOfScreen(watched);
    expect({ name, faults, problems: watched.problems }).toEqual({ name, faults: [], problems: [] });
  }

  async function visitAll(watched: WatchedPage, visits: readonly Visit[]): Promise<void> {
    for (const { name, path, shows } of visits) {
      await watched.page.goto(path(places));
      await shows(watched.page).waitFor();
      await expectSound(watched, name);
    }
  }

  it('is sound before anybody has signed in', async () => {
    const guest = await stage.browser.openPage();
    guest.expectReply(401, /^\/api\/session/);
    guest.expectReply(422, /^\/api\/invitations\/lookup$/);
    await visitAll(guest, entranceScreens);
  });

  it.each<[DemoName, readonly Visit[]]>([
    ['designer', designerScreens],
    ['admin', administratorScreens],
    ['lab', labScreens],
    ['fabricator', fabricatorScreens],
  ])('is sound for %s', async (name, visits) => {
    await visitAll(await stage.pageOf(name), visits);
  });

  it('is sound on every sheet of a panel, and with the contents of an export open', async () => {
    const designer = await stage.pageOf('designer');
    const screen = new WorkspaceScreen(designer.page);
    await screen.open(places.panelId, 'requirement');
    for (const title of await screen.sheetTitles()) {
      await designer.page.setViewportSize({ width: 1440, height: 900 });
      await screen.sheet(title).click();
      await designer.page.getByRole('heading', { level: 1, name: title }).waitFor();
      await expectSound(designer, title);
    }
    await designer.page.getByRole('button', { name: 'Export revision 2' }).click();
    await designer.page.locator('slant-export-panel button.name').first().click();
    await designer.page.locator('slant-export-panel pre').waitFor();
    await expectSound(designer, 'export');
  });
});
