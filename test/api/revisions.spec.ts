import { createHash, randomUUID } from 'node:crypto';
import type { EditionDetail, EditionUse, FamilyDetail } from '../../shared/contracts/library';
import type { PanelDetail, RevisionDetail, RevisionListItem } from '../../shared/contracts/projects';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { designContentHash } from '../support/content-hash';
import { bodyOf, draw, freeze, newPanel } from '../support/panels';
import { expectInvalid, expectNotAllowed, expectNotFound, expectProblem, problemOf } from '../support/problems';
import { onEdition, publishedEdition } from '../support/published-edition';

const steered = (thetaDeg: number): DesignDocument => ({
  ...STARTING_DESIGN,
  requirement: { ...STARTING_DESIGN.requirement, beams: [{ thetaDeg, phiDeg: 0 }] },
});

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

describe('revisions', () => {
  let api: Api;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  const detail = async (id: string): Promise<PanelDetail> => bodyOf<PanelDetail>(await designer.get(`/api/panels/${id}`), 200);
  const list = async (id: string): Promise<RevisionListItem[]> => bodyOf<{ items: RevisionListItem[] }>(await designer.get(`/api/panels/${id}/revisions`), 200).items;

  it('freezes the draft under the next number, with its hash, parent, author and figures', async () => {
    const { id } = await newPanel(designer);
    const first = await freeze(designer, id, ' first light ');
    expect(first).toMatchObject({
      panelId: id,
      number: 1,
      hash: designContentHash(STARTING_DESIGN),
      parentId: null,
      parentNumber: null,
      restoredFromNumber: null,
      author: { name: 'Designer (demo)' },
      message: 'first light',
      design: STARTING_DESIGN,
      edition: null,
      figures: { cellCount: 1600 },
    });
    await draw(designer, id, steered(25));
    const second = await freeze(designer, id);
    expect(second).toMatchObject({ number: 2, parentId: first.id, parentNumber: 1, hash: designContentHash(steered(25)) });
    expect((await list(id)).map(({ number, summary }) => [number, summary?.cellCount])).toEqual([[2, 1600], [1, 1600]]);
    expect(bodyOf(await designer.get(`/api/revisions/${first.id}`), 200)).toEqual(first);
    const audit = await api.query(`SELECT action, detail FROM audit_row WHERE object = $1`, [`revision:${second.id}`]);
    expect(audit).toEqual([{ action: 'revision.frozen', detail: { panel: id, number: 2, hash: second.hash, message: 'as drawn' } }]);
  });

  it('covers the cells by the hash: the edition is a part of its own', async () => {
    const edition = await publishedEdition(api);
    const { id } = await newPanel(designer, onEdition(edition.id));
    const revision = await freeze(designer, id);
    const reference = { id: edition.id, familyName: edition.familyName, number: 1, hash: edition.hash };
    expect(revision.edition).toEqual({ id: edition.id, familyName: edition.familyName, number: 1 });
    expect(revision.hash).toBe(designContentHash(onEdition(edition.id), reference));
    const parts = await api.query<{ role: string; body: Buffer; hash: string }>(
      `SELECT p.role, c.body, c.hash FROM revision_part p JOIN content c ON c.team_id = p.team_id AND c.hash = p.content_hash WHERE p.revision_id = $1 ORDER BY p.role`,
      [revision.id],
    );
    expect(parts.map(({ role, body }) => [role, JSON.parse(body.toString('utf8'))])).toEqual([['design', onEdition(edition.id)], ['edition', reference]]);
    for (const { body, hash } of parts) expect(createHash('sha256').update(body).digest('hex')).toBe(hash);
  });

  it('points unchanged parts at the content they had', async () => {
    const edition = await publishedEdition(api);
    const { id } = await newPanel(designer, onEdition(edition.id));
    await freeze(designer, id);
    await draw(designer, id, onEdition(edition.id, steered(18)));
    await freeze(designer, id);
    const parts = await api.query<{ role: string; count: number }>(
      `SELECT p.role, count(DISTINCT p.content_hash)::int AS count FROM revision_part p JOIN revision r ON r.id = p.revision_id WHERE r.panel_id = $1 GROUP BY p.role ORDER BY p.role`,
      [id],
    );
    expect(parts).toEqual([{ role: 'design', count: 2 }, { role: 'edition', count: 1 }]);
  });

  it('tells the library where an edition is used, in revisions and drafts', async () => {
    const edition: EditionDetail = await publishedEdition(api);
    const { id } = await newPanel(designer, onEdition(edition.id));
    const revision = await freeze(designer, id);
    const { items } = bodyOf<{ items: EditionUse[] }>(await designer.get(`/api/library/editions/${edition.id}/uses`), 200);
    expect(items).toEqual([
      { projectName: 'Trials', panelId: id, panelName: 'Panel', revisionId: revision.id, revisionNumber: 1 },
      { projectName: 'Trials', panelId: id, panelName: 'Panel', revisionId: null, revisionNumber: null },
    ]);
    expect(bodyOf<FamilyDetail>(await designer.get(`/api/library/families/${edition.familyId}`), 200).useCount).toBe(2);
  });

  it.each([
    ['content', 'body', `'{}'`],
    ['content', 'hash', `repeat('0', 64)`],
    ['revision', 'message', `'other'`],
    ['revision', 'number', '99'],
    ['revision_part', 'content_hash', `repeat('0', 64)`],
  ])('the database refuses to change %s.%s, to remove rows, or to empty the table', async (table, column, value) => {
    await freeze(designer, (await newPanel(designer)).id);
    const before = await api.query(`SELECT * FROM ${table}`);
    const refusal = `rows of ${table} are never changed or removed`;
    await expect(api.query(`UPDATE ${table} SET ${column} = ${value}`)).rejects.toThrow(refusal);
    await expect(api.query(`DELETE FROM ${table}`)).rejects.toThrow(refusal);
    await expect(api.query(`TRUNCATE ${table} CASCADE`)).rejects.toThrow(/rows of \w+ are never changed or removed/);
    expect(await api.query(`SELECT * FROM ${table}`)).toEqual(before);
  });

  it('the database refuses a body that has not its hash, and a number twice', async () => {
    const { id } = await freeze(designer, (await newPanel(designer)).id);
    const insert = `INSERT INTO content (team_id, hash, body) SELECT team_id, repeat('a', 64), '{}' FROM revision WHERE id = $1`;
    await expect(api.query(insert, [id])).rejects.toThrow('content_hash');
    const columns = 'team_id, panel_id, number, hash, panel_name, project_name, author_id, author_name, message, created_at';
    const twice = `INSERT INTO revision (id, ${columns}) SELECT $2, ${columns} FROM revision WHERE id = $1`;
    await expect(api.query(twice, [id, randomUUID()])).rejects.toThrow('revision_number');
  });

  it('gives distinct numbers without gaps to those who freeze at once', async () => {
    const { id, etag } = await newPanel(designer, steered(11));
    const answers = await Promise.all(Array.from({ length: 10 }, (_, i) => designer.post(`/api/panels/${id}/revisions`, { message: `at once ${i}` }, { ifMatch: etag })));
    expect(answers.map(({ status }) => status)).toEqual(Array.from({ length: 10 }, () => 201));
    const numbers = answers.map(({ json }) => (json as RevisionDetail).number).sort((a, b) => a - b);
    expect(numbers).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
    const items = await list(id);
    expect(items.map(({ parentNumber }) => parentNumber)).toEqual([9, 8, 7, 6, 5, 4, 3, 2, 1, null]);
  });

  it('freezes once for one Idempotency-Key, and refuses the key for another request', async () => {
    const { id, etag } = await newPanel(designer);
    const headers = { 'idempotency-key': randomUUID() };
    const send = (message: string) => designer.post(`/api/panels/${id}/revisions`, { message }, { ifMatch: etag, headers });
    const first = bodyOf<RevisionDetail>(await send('once'), 201);
    const again = await send('once');
    expect([again.status, again.json, again.headers.get('idempotency-replayed'), again.headers.get('location')]).toEqual([201, first, 'true', `/api/revisions/${first.id}`]);
    expect(await list(id)).toHaveLength(1);
    expectProblem(await send('twice'), problemOf('conflict', 409, 'This Idempotency-Key was used for another request.'));
  });

  it('freezes only what the caller read', async () => {
    const { id, etag } = await newPanel(designer);
    await draw(designer, id, steered(40));
    const stale = await designer.post(`/api/panels/${id}/revisions`, { message: 'late' }, { ifMatch: etag });
    expectProblem(stale, problemOf('stale-version', 412, 'Someone changed it since you read it. Read it again, then decide.'));
    expectProblem(await designer.post(`/api/panels/${id}/revisions`, { message: 'blind' }), problemOf('version-required', 428, 'Send If-Match with the ETag of the version you read.'));
    expect(await list(id)).toEqual([]);
  });

  it('names what is wrong with a message', async () => {
    const { id, etag } = await newPanel(designer);
    const send = (body: unknown) => designer.post(`/api/panels/${id}/revisions`, body, { ifMatch: etag });
    expectInvalid(await send({ message: ' ' }), [{ pointer: '#/message', detail: 'must have at least 1 characters' }]);
    expectInvalid(await send({ message: 'a', number: 7, author: 'me' }), [
      { pointer: '#/number', detail: 'is not a known field' },
      { pointer: '#/author', detail: 'is not a known field' },
    ]);
  });

  it('restores by a new revision, and the draft follows', async () => {
    const { id } = await newPanel(designer, steered(5));
    const first = await freeze(designer, id);
    await draw(designer, id, steered(6));
    await freeze(designer, id);
    const answer = await designer.post(`/api/revisions/${first.id}/restoration`, { message: 'back to the first' });
    const restored = bodyOf<RevisionDetail>(answer, 201);
    expect(answer.headers.get('location')).toBe(`/api/revisions/${restored.id}`);
    expect(restored).toMatchObject({ number: 3, parentNumber: 2, restoredFromNumber: 1, hash: first.hash, design: first.design, message: 'back to the first' });
    expect(await detail(id)).toMatchObject({ design: first.design, etag: '"v3"', draftIsRevision: true, latestRevision: { number: 3 } });
    expect((await list(id)).map(({ number }) => number)).toEqual([3, 2, 1]);
    const audit = await api.query<{ action: string }>('SELECT action FROM audit_row WHERE object = $1', [`revision:${restored.id}`]);
    expect(audit).toEqual([{ action: 'revision.restored' }]);
  });

  it('keeps the names of the time it was frozen', async () => {
    const { id, etag } = await newPanel(designer);
    const revision = await freeze(designer, id);
    bodyOf(await designer.patch(`/api/panels/${id}`, { name: 'Renamed' }, { ifMatch: etag }), 200);
    expect(bodyOf(await designer.get(`/api/revisions/${revision.id}`), 200)).toMatchObject({ panelName: 'Panel', projectName: 'Trials' });
  });

  it('answers 404 to others whatever they ask, and 403 to those who may only read', async () => {
    const { id, etag } = await newPanel(designer);
    const revision = await freeze(designer, id);
    const stranger = await api.signedIn(STRANGER);
    expectNotFound(await stranger.get(`/api/revisions/${revision.id}`), 'revision');
    expectNotFound(await stranger.post(`/api/revisions/${revision.id}/restoration`, { message: 'mine' }), 'revision');
    expectNotFound(await stranger.get(`/api/panels/${id}/revisions`), 'panel');
    expectNotFound(await stranger.post(`/api/panels/${id}/revisions`, { message: 'mine' }, { ifMatch: etag }), 'panel');
    const reviewer = await api.signedIn('reviewer');
    expect((await reviewer.get(`/api/revisions/${revision.id}`)).status).toBe(200);
    expectNotAllowed(await reviewer.post(`/api/revisions/${revision.id}/restoration`, { message: 'mine' }), 'This needs the role designer.');
    const script = await api.withToken('designer', ['read']);
    expect((await script.get(`/api/revisions/${revision.id}`)).status).toBe(200);
    expectNotAllowed(await script.post(`/api/panels/${id}/revisions`, { message: 'mine' }, { ifMatch: etag }), 'The personal token lacks the scope "design".');
  });

  it('leaves the audit chain whole', async () => {
    const admin = await api.signedIn('admin');
    expect((await admin.get('/api/audit')).json).toMatchObject({ chainIntact: true });
  });
});
