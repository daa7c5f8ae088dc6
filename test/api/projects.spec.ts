import { randomUUID } from 'node:crypto';
import type { DraftSaved, PanelDetail, Project } from '../../shared/contracts/projects';
import { designContentHash } from '../support/content-hash';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { bodyOf, draw, freeze, newPanel, newProject } from '../support/panels';
import { expectInvalid, expectNotAllowed, expectNotFound, expectProblem, problemOf } from '../support/problems';

const STALE = 'Someone changed it since you read it. Read it again, then decide.';
const MISSING = 'Send If-Match with the ETag of the version you read.';
const steered = (thetaDeg: number): DesignDocument => ({
  ...STARTING_DESIGN,
  requirement: { ...STARTING_DESIGN.requirement, beams: [{ thetaDeg, phiDeg: 0 }] },
});

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

describe('projects and panels', () => {
  let api: Api;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  const detail = async (id: string): Promise<PanelDetail> => bodyOf<PanelDetail>(await designer.get(`/api/panels/${id}`), 200);
  const auditOf = (object: string): Promise<{ action: string; detail: Record<string, unknown> }[]> =>
    api.query('SELECT action, detail FROM audit_row WHERE object = $1 ORDER BY sequence', [object]);

  it('starts a project, and shows it with its panels and their figures', async () => {
    const answer = await designer.post('/api/projects', { name: '  Harbour link ' });
    const project = bodyOf<Project>(answer, 201);
    expect(project).toMatchObject({ name: 'Harbour link', version: 1, invented: false, panels: [] });
    expect(answer.headers.get('location')).toBe(`/api/projects/${project.id}`);
    const panel = bodyOf<PanelDetail>(await designer.post(`/api/projects/${project.id}/panels`, { name: 'A, relay' }), 201);
    expect(panel).toMatchObject({ name: 'A, relay', design: STARTING_DESIGN, etag: '"v1"', latestRevision: null, draftIsRevision: false, project: { name: 'Harbour link' } });
    const { items } = bodyOf<{ items: Project[] }>(await designer.get('/api/projects'), 200);
    const [shown] = items.filter(({ id }) => id === project.id);
    expect(shown?.panels).toEqual([expect.objectContaining({ id: panel.id, draftHash: panel.draftHash, changedBy: expect.objectContaining({ name: 'Designer (demo)' }) })]);
    expect(shown?.panels[0]?.summary).toMatchObject({ cellCount: 1600, overall: expect.stringMatching(/^(meets|falls-short)$/) });
    expect((await auditOf(`project:${project.id}`)).map(({ action }) => action)).toEqual(['project.created']);
    expect(await auditOf(`panel:${panel.id}`)).toEqual([{ action: 'panel.created', detail: { project: project.id, name: 'A, relay', after: panel.draftHash } }]);
  });

  it('tells with the figures which part of a design asks for a look', async () => {
    const wide = { ...STARTING_DESIGN.panel, lattice: { ...STARTING_DESIGN.panel.lattice, periodXMm: 9, periodYMm: 9 } };
    const { id } = await newPanel(designer, { ...STARTING_DESIGN, panel: wide });
    const { items } = bodyOf<{ items: Project[] }>(await designer.get('/api/projects'), 200);
    const remarks = items.flatMap(({ panels }) => panels).find((panel) => panel.id === id)?.summary?.remarks;
    expect(remarks).toContainEqual({ pointer: expect.stringContaining('/panel/lattice'), severity: expect.stringMatching(/^(warn|serious)$/), message: expect.stringContaining('lobe') });
  });

  it('computes the figures of a draft once', async () => {
    const { draftHash } = await newPanel(designer, steered(17));
    await designer.get('/api/projects');
    await designer.get('/api/projects');
    const kept = await api.query<{ kind: string }>('SELECT kind FROM result WHERE content_hash = $1', [draftHash]);
    expect(kept).toEqual([{ kind: 'figures' }]);
  });

  it('shows no figures for a draft that cannot be predicted, and keeps it all the same', async () => {
    const outline = { kind: 'rectangle', widthMm: 20_000, heightMm: 20_000 } as const;
    const panel = await newPanel(designer, { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline } });
    const { items } = bodyOf<{ items: Project[] }>(await designer.get('/api/projects'), 200);
    expect(items.flatMap(({ panels }) => panels).find(({ id }) => id === panel.id)?.summary).toBeNull();
    const refused = await designer.post(`/api/panels/${panel.id}/revisions`, { message: 'too large' }, { ifMatch: panel.etag });
    expectInvalid(refused, [{ pointer: '#/design/panel', detail: 'the panel would have 16000000 cells; the limit is 1000000' }]);
  });

  it('keeps names as the text they are', async () => {
    const names = ['<img src=x onerror=alert(1)>', '{{7*7}}', '\u202Egnp.exe', '../../etc/passwd', '=HYPERLINK("x")', "'; DROP TABLE project; --", 'é\u0301 漢字 🛰'];
    for (const name of names) expect((await newProject(designer, name)).name).toBe(name);
    expectInvalid(await designer.post('/api/projects', { name: 'a\0b' }), [{ pointer: '#/name', detail: 'must not contain the NUL character' }]);
    expectInvalid(await designer.post('/api/projects', { name: 'x'.repeat(121) }), [{ pointer: '#/name', detail: 'must have at most 120 characters' }]);
    expectInvalid(await designer.post('/api/projects', { name: ' ' }), [{ pointer: '#/name', detail: 'must have at least 1 characters' }]);
    expectInvalid(await designer.post('/api/projects', { name: 'a', invented: true }), [{ pointer: '#/invented', detail: 'is not a known field' }]);
  });

  it('renames a project only for who read it as it is', async () => {
    const { id } = await newProject(designer, 'Before');
    expectProblem(await designer.patch(`/api/projects/${id}`, { name: 'After' }), problemOf('version-required', 428, MISSING));
    const answer = await designer.patch(`/api/projects/${id}`, { name: 'After' }, { ifMatch: '"v1"' });
    expect(bodyOf<Project>(answer, 200)).toMatchObject({ name: 'After', version: 2 });
    expect(answer.headers.get('etag')).toBe('"v2"');
    expectProblem(await designer.patch(`/api/projects/${id}`, { name: 'Late' }, { ifMatch: '"v1"' }), problemOf('stale-version', 412, STALE));
    expect((await auditOf(`project:${id}`)).at(-1)).toEqual({ action: 'project.renamed', detail: { before: 'Before', after: 'After' } });
  });

  it('adds a panel from a given design, or as a copy of another panel', async () => {
    const given = await newPanel(designer, steered(31));
    const project = await newProject(designer);
    const copy = bodyOf<PanelDetail>(await designer.post(`/api/projects/${project.id}/panels`, { name: 'Copy', copyOfPanelId: given.id }), 201);
    expect([copy.design, copy.draftHash]).toEqual([given.design, given.draftHash]);
    const both = await designer.post(`/api/projects/${project.id}/panels`, { name: 'Both', copyOfPanelId: given.id, design: STARTING_DESIGN });
    expectInvalid(both, [{ pointer: '#/copyOfPanelId', detail: 'cannot go with "design": give one of them or none' }]);
    expectNotFound(await designer.post(`/api/projects/${project.id}/panels`, { name: 'None', copyOfPanelId: randomUUID() }), 'panel');
    expectNotFound(await designer.post(`/api/projects/${randomUUID()}/panels`, { name: 'None' }), 'project');
  });

  it('saves a draft for who read it as it is, and shows everyone else what stands there now', async () => {
    const { id, etag } = await newPanel(designer);
    const answer = await designer.put(`/api/panels/${id}/draft`, { design: steered(25) }, { ifMatch: etag });
    const saved = bodyOf<DraftSaved>(answer, 200);
    expect(saved).toEqual({ etag: '"v2"', draftHash: designContentHash(steered(25)), changedAt: expect.any(String), draftIsRevision: false });
    expect(answer.headers.get('etag')).toBe('"v2"');
    const late = await designer.put(`/api/panels/${id}/draft`, { design: steered(30) }, { ifMatch: etag });
    expectProblem(late, problemOf('stale-version', 412, STALE, { current: await detail(id) }));
    expect(late.headers.get('etag')).toBe('"v2"');
    expectProblem(await designer.put(`/api/panels/${id}/draft`, { design: steered(30) }), problemOf('version-required', 428, MISSING));
    expect((await detail(id)).design).toEqual(steered(25));
    expect((await auditOf(`panel:${id}`)).at(-1)).toMatchObject({ action: 'draft.saved', detail: { version: 2, after: saved.draftHash } });
  });

  it.each(['"v1', 'W/"v1"', '*', '"v01"', '"v1", "v2"', '"'])('takes %s for no current version', async (ifMatch) => {
    const { id } = await newPanel(designer);
    const answer = await designer.put(`/api/panels/${id}/draft`, { design: steered(26) }, { ifMatch });
    expect([412, 428]).toContain(answer.status);
    expect((await detail(id)).design).toEqual(STARTING_DESIGN);
  });

  it('lets exactly one of many who save at once win, and loses no version', async () => {
    const { id, etag } = await newPanel(designer);
    const answers = await Promise.all(Array.from({ length: 12 }, (_, i) => designer.put(`/api/panels/${id}/draft`, { design: steered(i + 1) }, { ifMatch: etag })));
    const statuses = answers.map(({ status }) => status).sort();
    expect(statuses).toEqual([200, ...Array.from({ length: 11 }, () => 412)]);
    const winner = answers.findIndex(({ status }) => status === 200);
    expect(await detail(id)).toMatchObject({ etag: '"v2"', design: steered(winner + 1) });
    expect((await auditOf(`panel:${id}`)).filter(({ action }) => action === 'draft.saved')).toHaveLength(1);
  });

  it('names every fault of a draft and stores none of it', async () => {
    const { id, etag } = await newPanel(designer);
    const broken = { ...STARTING_DESIGN, referencePhaseDeg: 'sometimes', panel: { ...STARTING_DESIGN.panel, keepOuts: [{ kind: 'disc' }] } };
    const answer = await designer.put(`/api/panels/${id}/draft`, { design: broken }, { ifMatch: etag });
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect([answer.status, errors.map(({ pointer }) => pointer).sort()]).toEqual([422, ['#/design/panel/keepOuts/0/kind', '#/design/referencePhaseDeg']]);
    expect((await detail(id)).etag).toBe('"v1"');
  });

  it('refuses a draft on an edition that the team has not published', async () => {
    const { id, etag } = await newPanel(designer);
    const design = { ...STARTING_DESIGN, cells: { kind: 'edition', editionId: randomUUID(), rule: 'nearest-phase', excludedCells: [] } };
    const errors = [{ pointer: '#/design/cells/editionId', detail: 'there is no such published edition' }];
    expectInvalid(await designer.put(`/api/panels/${id}/draft`, { design }, { ifMatch: etag }), errors);
    const project = await newProject(designer);
    expectInvalid(await designer.post(`/api/projects/${project.id}/panels`, { name: 'P', design }), errors);
  });

  it('renames a panel under the version of its draft', async () => {
    const { id, etag } = await newPanel(designer);
    const renamed = bodyOf<PanelDetail>(await designer.patch(`/api/panels/${id}`, { name: 'New name' }, { ifMatch: etag }), 200);
    expect(renamed).toMatchObject({ name: 'New name', etag: '"v2"' });
    expectProblem(await designer.patch(`/api/panels/${id}`, { name: 'Late' }, { ifMatch: etag }), problemOf('stale-version', 412, STALE, { current: renamed }));
    expectProblem(await designer.patch(`/api/panels/${id}`, { name: 'Late' }), problemOf('version-required', 428, MISSING));
  });

  it('knows whether the draft equals its latest revision', async () => {
    const { id } = await newPanel(designer, steered(12));
    const revision = await freeze(designer, id);
    expect(await detail(id)).toMatchObject({ draftIsRevision: true, latestRevision: { id: revision.id, number: 1 } });
    await draw(designer, id, steered(13));
    expect(await detail(id)).toMatchObject({ draftIsRevision: false });
    await draw(designer, id, steered(12));
    expect(await detail(id)).toMatchObject({ draftIsRevision: true, draftHash: revision.hash });
  });

  it('creates once for one Idempotency-Key', async () => {
    const headers = { 'idempotency-key': randomUUID() };
    const name = `Once ${randomUUID()}`;
    const first = bodyOf<Project>(await designer.post('/api/projects', { name }, { headers }), 201);
    const again = await designer.post('/api/projects', { name }, { headers });
    expect([again.status, again.json, again.headers.get('idempotency-replayed')]).toEqual([201, first, 'true']);
    expect(await api.query('SELECT 1 FROM project WHERE name = $1', [name])).toHaveLength(1);
  });

  it('keeps projects within their team, and drafts from the fabricator', async () => {
    const { id, project } = await newPanel(designer);
    const stranger = await api.signedIn(STRANGER);
    expectNotFound(await stranger.get(`/api/panels/${id}`), 'panel');
    expectNotFound(await stranger.put(`/api/panels/${id}/draft`, { design: STARTING_DESIGN }, { ifMatch: '"v1"' }), 'panel');
    expectNotFound(await stranger.patch(`/api/projects/${project.id}`, { name: 'Mine' }, { ifMatch: '"v1"' }), 'project');
    const own = await newProject(stranger);
    expectNotFound(await stranger.post(`/api/projects/${own.id}/panels`, { name: 'Copy', copyOfPanelId: id }), 'panel');
    expect(bodyOf<{ items: Project[] }>(await stranger.get('/api/projects'), 200).items.map((item) => item.id)).toEqual([own.id]);
    expectNotAllowed(await (await api.signedIn('fabricator')).get(`/api/panels/${id}`), 'This needs the role designer or lab or reviewer or range or administrator.');
  });
});
