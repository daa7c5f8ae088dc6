import type { Locator, Page } from 'playwright-core';
import { familyList } from '../../shared/contracts/library';
import { SHEETS } from '../../src/app/workspace/sheets';
import { windowSizes } from '../support/browser';
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

/** Who looks. */
type Visitor = DemoName | 'nobody';

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

const visits: readonly (readonly [Visitor, readonly Visit[]])[] = [
  ['nobody', entranceScreens],
  ['designer', designerScreens],
  ['admin', administratorScreens],
  ['lab', labScreens],
  ['fabricator', fabricatorScreens],
];

describe('every screen, wide and narrow, light and dark', () => {
  let stage: Stage;
  let places: Places;
  /** Each person signs in once. */
  const pages = new Map<Visitor, WatchedPage>();

  beforeAll(async () => {
    stage = await Stage.open();
    places = await preparePlaces();
  }, STAGE_START_MS);
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

  async function pageOf(visitor: Visitor): Promise<WatchedPage> {
    const known = pages.get(visitor);
    if (known !== undefined) return known;
    const made = visitor === 'nobody' ? await stage.browser.openPage() : await stage.pageOf(visitor);
    if (visitor === 'nobody') {
      made.expectReply(401, /^\/api\/session/);
      made.expectReply(422, /^\/api\/invitations\/lookup$/);
    }
    pages.set(visitor, made);
    return made;
  }

  /** Opens a screen at the first look and expects nothing wrong with it, then or at the other looks. */
  async function expectSound(visitor: Visitor, open: (page: Page) => Promise<void>): Promise<void> {
    const watched = await pageOf(visitor);
    const before = watched.problems.length;
    await watched.page.setViewportSize(windowSizes.desktop);
    await open(watched.page);
    const faults = await faultsOfScreen(watched);
    expect({ faults, problems: watched.problems.slice(before) }).toEqual({ faults: [], problems: [] });
  }

  describe.each(visits)('of %s', (visitor, screens) => {
    it.each(screens.map((screen) => [screen.name, screen] as const))('has a sound %s', async (_name, { path, shows }) => {
      await expectSound(visitor, async (page) => {
        await page.goto(path(places));
        await shows(page).waitFor();
      });
    });
  });

  it.each(SHEETS)('has a sound sheet $title', async ({ id, title }) => {
    await expectSound('designer', async (page) => {
      await page.goto(`/panels/${places.panelId}/${id}`);
      await page.getByRole('heading', { level: 1, name: title }).waitFor();
      await new WorkspaceScreen(page).strip('Gain at the peak').waitFor();
    });
  });

  it('has sound contents of an export', async () => {
    await expectSound('designer', async (page) => {
      await page.goto(`/panels/${places.panelId}/revisions`);
      await page.getByRole('button', { name: 'Export revision 2' }).click();
      await page.locator('slant-export-panel button.name').first().click();
      await page.locator('slant-export-panel pre').waitFor();
    });
  });
});
