import { isNumber } from '../../shared/antenna/no-figure';
import type { Project, RevisionDetail, RevisionListItem } from '../../shared/contracts/projects';
import { seedLibrary } from '../../server/library/library-seed-service';
import { seedProjects } from '../../server/projects/project-seed-service';
import type { RevisionService } from '../../server/revisions/revision-service';
import { Api } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { bodyOf } from '../support/panels';

/** The service as it is, but for freezing, which fails after so many revisions. */
function cutOffAfter(count: number, revisions: RevisionService): RevisionService {
  let left = count;
  const freeze: RevisionService['freeze'] = (...details) => {
    left -= 1;
    return left < 0 ? Promise.reject(new Error('cut off')) : revisions.freeze(...details);
  };
  return Object.assign(Object.create(revisions) as RevisionService, { freeze });
}

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

describe('the demonstration project', () => {
  let api: Api;
  let designer: ApiClient;
  let project: Project;
  beforeAll(async () => {
    api = await Api.start();
    await seedLibrary(api.house);
    // A start that is cut off while it draws the second panel, and one that takes up from there.
    await expect(seedProjects({ ...api.house, revisions: cutOffAfter(5, api.house.revisions) })).rejects.toThrow('cut off');
    expect(await api.query('SELECT number FROM revision')).toHaveLength(5);
    await seedProjects(api.house);
    designer = await api.signedIn('designer');
    const { items } = bodyOf<{ items: Project[] }>(await designer.get('/api/projects'), 200);
    expect(items).toHaveLength(1);
    project = items[0];
  }, 120_000);
  afterAll(() => api.close());

  /** Oldest first. */
  const revisionsOf = async (panel: number): Promise<RevisionDetail[]> => {
    const { items } = bodyOf<{ items: RevisionListItem[] }>(await designer.get(`/api/panels/${project.panels[panel].id}/revisions`), 200);
    return Promise.all([...items].reverse().map(async ({ id }) => bodyOf<RevisionDetail>(await designer.get(`/api/revisions/${id}`), 200)));
  };
  const shortOf = ({ verdicts }: RevisionDetail): string[] => verdicts.filter(({ verdict }) => verdict !== 'meets').map(({ line }) => line);
  const marginOf = ({ verdicts }: RevisionDetail, line: string): number => Number(verdicts.find((verdict) => verdict.line === line)?.margin);
  const gainOf = ({ figures }: RevisionDetail): number => (isNumber(figures.gainDbi) ? figures.gainDbi : NaN);

  it('is invented and says so, with every draft at its last revision', () => {
    expect(project).toMatchObject({ name: 'Merrow Point sea-rescue link', invented: true });
    expect(project.panels.map(({ name }) => name)).toEqual(['A, lighthouse relay', 'B, slipway wall', 'C, training, two beams']);
    expect(project.panels.map(({ latestRevision, draftIsRevision, changedBy }) => [latestRevision?.number, draftIsRevision, changedBy.name])).toEqual([
      [4, true, 'Designer (demo)'],
      [2, true, 'Designer (demo)'],
      [2, true, 'Designer (demo)'],
    ]);
    expect(project.panels.map(({ summary }) => [summary?.cellCount, summary?.overall])).toEqual([[1600, 'meets'], [3600, 'meets'], [716, 'meets']]);
  });

  it('A: what the messages say of gain and mask is so', async () => {
    const [ideal, four, turned, last] = await revisionsOf(0);
    expect([ideal, four, turned, last].map(shortOf)).toEqual([[], ['mask'], ['mask'], []]);
    expect(marginOf(ideal, 'mask')).toBeCloseTo(1.8, 1);
    expect(ideal.message).toContain('1.8 dB to spare');
    expect(gainOf(ideal) - gainOf(four)).toBeCloseTo(0.8, 1);
    expect(marginOf(four, 'mask')).toBeCloseTo(-4.0, 1);
    expect(four.message).toMatch(/Costs 0\.8 dB .* 4\.0 dB above the mask/);
    expect(marginOf(turned, 'mask')).toBeCloseTo(-0.3, 1);
    expect(turned.message).toContain('exceeds the mask by 0.3 dB');
    expect(marginOf(last, 'mask')).toBeCloseTo(0.7, 1);
    expect(last.message).toContain('0.7 dB to spare');
    expect([turned, last].map(({ edition }) => edition?.familyName)).toEqual(['Ring and patch, 5 mm lattice', 'Ring and patch, 5 mm lattice']);
  });

  it('B: two states make an image as strong as the beam, and patches do not', async () => {
    const [twoStates, patches] = await revisionsOf(1);
    expect([shortOf(twoStates), shortOf(patches)]).toEqual([['sidelobe', 'mask'], []]);
    expect(twoStates.figures.sidelobeDb.hemisphere.levelDb).toBeCloseTo(0, 0);
    expect(twoStates.warnings.map(({ code }) => code)).toContain('image-lobe');
    expect(patches.warnings.map(({ code }) => code)).not.toContain('image-lobe');
    const inBeam = ({ figures }: RevisionDetail): number => Number(figures.gainAtBeamDbi);
    expect(inBeam(patches) - inBeam(twoStates)).toBeCloseTo(3.4, 1);
    expect(patches.message).toContain('3.4 dB of gain');
  });

  it('C: both editions meet every line, and only the second covers the incidence', async () => {
    const [normal, oblique] = await revisionsOf(2);
    expect([shortOf(normal), shortOf(oblique)]).toEqual([[], []]);
    expect(normal.figures.maxIncidenceDeg).toBeCloseTo(29.3, 1);
    expect(normal.warnings.map(({ code }) => code)).toContain('incidence-not-covered');
    expect(oblique.warnings.map(({ code }) => code)).not.toContain('incidence-not-covered');
    expect(Math.abs(gainOf(oblique) - gainOf(normal))).toBeLessThan(0.05);
  });

  it('is left alone by the next start, under another name too', async () => {
    const count = async (): Promise<unknown> => api.query('SELECT (SELECT count(*)::int FROM panel) AS panels, (SELECT count(*)::int FROM revision) AS revisions');
    const before = await count();
    bodyOf(await designer.patch(`/api/projects/${project.id}`, { name: 'Renamed' }, { ifMatch: `"v${project.version}"` }), 200);
    await seedProjects(api.house);
    expect(await count()).toEqual(before);
    expect(before).toEqual([{ panels: 3, revisions: 8 }]);
  });
});
