import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { promisify } from 'node:util';
import JSZip from 'jszip';
import { readCsv } from '../../shared/files/csv-table';
import type { AuditRow } from '../../shared/contracts/team';
import type { ExportPreview, RevisionDetail } from '../../shared/contracts/projects';
import type { PredictionReply } from '../../shared/contracts/predictions';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { bodyOf, draw, freeze, newPanel } from '../support/panels';
import { expectInvalid, expectNotAllowed, expectNotFound } from '../support/problems';
import { onEdition, publishedEdition } from '../support/published-edition';

const run = promisify(execFile);
const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');
const NAMES = ['README.txt', 'SHA256SUMS', 'cells.csv', 'cut_across.csv', 'cut_along.csv', 'design.json', 'figures.csv', 'manifest.json'];

/** A table as objects of its header. */
function rowsOf(text: string): Record<string, string>[] {
  const read = readCsv(Buffer.from(text));
  if (read.kind === 'refused') throw new Error(JSON.stringify(read.messages));
  const [header, ...rows] = read.table.rows;
  return rows.map((row) => Object.fromEntries(header.map((name, i) => [name, row[i]])));
}

async function unpack(bytes: Uint8Array, folder: string): Promise<void> {
  const zip = await JSZip.loadAsync(bytes, { checkCRC32: true });
  for (const entry of Object.values(zip.files)) {
    mkdirSync(join(folder, dirname(entry.name)), { recursive: true });
    // Fails where two entries have one name.
    writeFileSync(join(folder, entry.name), await entry.async('nodebuffer'), { flag: 'wx' });
  }
}

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

describe('export', () => {
  let api: Api;
  let designer: ApiClient;
  let revision: RevisionDetail;
  let editionId: string;
  let folder: string;
  let bytes: Buffer;
  const text = (name: string): string => readFileSync(join(folder, 'Trials_Panel_r1', name), 'utf8');

  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
    editionId = (await publishedEdition(api)).id;
    const panel = await newPanel(designer, onEdition(editionId));
    revision = await freeze(designer, panel.id, '=made for "export", with Ångström');
    const answer = await designer.get(`/api/revisions/${revision.id}/export`);
    expect(answer.status).toBe(200);
    expect(answer.headers.get('content-type')).toBe('application/zip');
    expect(answer.headers.get('content-disposition')).toBe(`attachment; filename="Trials_Panel_r1.zip"; filename*=UTF-8''Trials_Panel_r1.zip`);
    bytes = answer.bytes;
    folder = mkdtempSync(join(tmpdir(), 'slantwise-export-'));
    await unpack(bytes, folder);
  }, 60_000);
  afterAll(async () => {
    rmSync(folder, { recursive: true, force: true });
    await api.close();
  });

  it('is one folder of files that sha256sum accepts', async () => {
    expect(readdirSync(join(folder, 'Trials_Panel_r1')).sort()).toEqual([...NAMES].sort());
    const { stdout } = await run('sha256sum', ['--strict', '-c', 'SHA256SUMS'], { cwd: join(folder, 'Trials_Panel_r1') });
    expect(stdout.trim().split('\n')).toEqual(NAMES.filter((name) => name !== 'SHA256SUMS').map((name) => `${name}: OK`));
  });

  it('has the same bytes every time, with a fixed time and in fixed order', async () => {
    const again = await designer.get(`/api/revisions/${revision.id}/export`);
    expect(again.bytes.equals(bytes)).toBe(true);
    const zip = await JSZip.loadAsync(bytes);
    const entries = Object.values(zip.files);
    expect(entries.map(({ name }) => name)).toEqual(NAMES.map((name) => `Trials_Panel_r1/${name}`));
    expect(new Set(entries.map(({ date }) => date.toISOString()))).toEqual(new Set(['1980-01-01T00:00:00.000Z']));
  });

  it('holds the frozen content itself: its SHA-256 is the hash of the revision', () => {
    expect(sha256(Buffer.from(text('design.json')))).toBe(revision.hash);
    expect(JSON.parse(text('design.json'))).toMatchObject({ design: revision.design, edition: { id: editionId, number: 1 } });
  });

  it('lists every cell with its place, its cell and what the prediction says of it', async () => {
    const prediction = (await designer.post('/api/predictions', { design: revision.design, include: ['cells'] })).json as PredictionReply;
    const rows = rowsOf(text('cells.csv'));
    expect(rows).toHaveLength(1600);
    expect(Object.keys(rows[0])).toEqual([
      'x_mm', 'y_mm', 'column', 'row', 'cell_id', 'ringOuterSide_mm', 'target_phase_deg', 'phase_deg', 'error_deg', 'amplitude', 'response_db', 'incidence_deg', 'incidence_azimuth_deg',
    ]);
    expect(rows[0]).toMatchObject({ x_mm: '-97.5', y_mm: '-97.5', column: '0', row: '0' });
    const column = (name: string): number[] => rows.map((row) => Number(row[name]));
    for (const [name, array] of [['phase_deg', 'phaseDeg'], ['error_deg', 'errorDeg'], ['incidence_deg', 'incidenceDeg'], ['x_mm', 'xMm']] as const) {
      column(name).forEach((value, n) => expect(Math.abs(value - (prediction.cells?.[array][n] ?? NaN))).toBeLessThan(1e-4));
    }
    const lengths = new Map(rows.map((row) => [row['cell_id'], row['ringOuterSide_mm']]));
    expect(lengths.size).toBe(4);
    for (const [id, length] of lengths) expect(id).toContain(Number(length).toFixed(2));
  });

  it('gives the figures, the requirement line by line, and the cuts', () => {
    const figures = new Map(rowsOf(text('figures.csv')).map((row) => [row['figure'], row]));
    expect(Number(figures.get('directivityDbi')?.['value'])).toBe(revision.figures.directivityDbi);
    expect(figures.get('sidelobeDb.along')).toMatchObject({ unit: 'dB', value: String(revision.figures.sidelobeDb.along) });
    expect(figures.get('maskMargin')).toMatchObject({ value: '', reason: 'the requirement has no mask' });
    expect(figures.get('requirement.gain')).toMatchObject({ limit: '34', sense: 'at-least', unit: 'dBi', verdict: revision.verdicts[0].verdict });
    const along = rowsOf(text('cut_along.csv'));
    const beam = along.find((row) => Number(row['angle_deg']) === 0);
    expect(Number(beam?.['theta_deg'])).toBeCloseTo(20, 6);
    expect(Number(beam?.['gain_dbi'])).toBeCloseTo(Number(revision.figures.gainAtBeamDbi), 3);
    expect([along.length, rowsOf(text('cut_across.csv')).length]).toEqual([1801, 1801]);
  });

  it('says in manifest and text what it is, and beware of what', () => {
    const manifest = JSON.parse(text('manifest.json')) as { files: { name: string; bytes: number; sha256: string }[] };
    expect(manifest).toMatchObject({
      product: { name: 'Slantwise', version: '0.1.0' },
      project: { name: 'Trials', invented: false },
      panel: { name: 'Panel', widthMm: 200, heightMm: 200, cellCount: 1600 },
      revision: { id: revision.id, number: 1, hash: revision.hash, message: revision.message },
      edition: { id: editionId, provenance: 'simulated' },
      predicted: true,
    });
    for (const { name, sha256: hash } of manifest.files) expect(sha256(Buffer.from(text(name)))).toBe(hash);
    const readme = text('README.txt');
    expect(readme).toContain(revision.hash);
    expect(readme).toContain('Ångström');
    expect(readme).toContain('predicted by a scalar model');
    expect(Math.max(...readme.split('\n').map((line) => line.length))).toBeLessThanOrEqual(78);
  });

  it('previews the very files it exports, without packing them', async () => {
    const preview = (await designer.get(`/api/revisions/${revision.id}/export/preview`)).json as ExportPreview;
    const sizes = NAMES.map((name) => Buffer.byteLength(text(name)));
    expect(preview).toMatchObject({ archiveName: 'Trials_Panel_r1.zip', contentBytes: sizes.reduce((sum, size) => sum + size, 0) });
    expect(preview.files.map(({ name }) => name)).toEqual(NAMES);
    for (const file of preview.files) {
      const content = Buffer.from(text(file.name));
      expect([file.bytes, file.sha256]).toEqual([content.length, sha256(content)]);
      expect(text(file.name).startsWith(file.head)).toBe(true);
      expect(file.function).not.toBe('');
    }
  });

  it('says its hash beside the bytes, and writes down who took which revision with it', async () => {
    const answer = await designer.get(`/api/revisions/${revision.id}/export`);
    expect(answer.headers.get('repr-digest')).toBe(`sha-256=:${createHash('sha256').update(answer.bytes).digest('base64')}:`);
    const { items } = bodyOf<{ items: AuditRow[] }>(await (await api.signedIn('admin')).get('/api/audit'), 200);
    const exported = items.filter(({ action }) => action === 'revision.exported');
    expect(exported[0]).toMatchObject({
      object: `revision:${revision.id}`,
      detail: { project: 'Trials', panel: 'Panel', number: 1, hash: revision.hash, archive: 'Trials_Panel_r1.zip', bytes: bytes.length, sha256: sha256(bytes) },
    });
    const before = exported.length;
    await designer.get(`/api/revisions/${revision.id}/export/preview`);
    await (await api.signedIn(STRANGER)).get(`/api/revisions/${revision.id}/export`);
    const { items: after } = bodyOf<{ items: AuditRow[] }>(await (await api.signedIn('admin')).get('/api/audit'), 200);
    expect(after.filter(({ action }) => action === 'revision.exported')).toHaveLength(before);
  });

  it('leaves the columns of a geometry out where ideal cells have none', async () => {
    const panel = await newPanel(designer, { ...STARTING_DESIGN, cells: { kind: 'ideal', levels: 2 } });
    const { id } = await freeze(designer, panel.id);
    const zip = await JSZip.loadAsync((await designer.get(`/api/revisions/${id}/export`)).bytes);
    const cells = rowsOf((await zip.file('Trials_Panel_r1/cells.csv')?.async('string')) ?? '');
    expect(Object.keys(cells[0])).not.toContain('ringOuterSide_mm');
    expect(new Set(cells.map((row) => row['cell_id']))).toEqual(new Set(['level-0', 'level-1']));
    const readme = (await zip.file('Trials_Panel_r1/README.txt')?.async('string')) ?? '';
    expect(readme.replace(/\s+/g, ' ')).toContain('cannot be made as they stand');
  });

  it('stays the same when the panel and the draft go on', async () => {
    const panel = await newPanel(designer);
    const { id } = await freeze(designer, panel.id);
    const before = (await designer.get(`/api/revisions/${id}/export`)).bytes;
    await draw(designer, panel.id, { ...STARTING_DESIGN, referencePhaseDeg: 10 });
    expect((await designer.get(`/api/revisions/${id}/export`)).bytes.equals(before)).toBe(true);
  });

  it.each(['export', 'export/preview'])('refuses what is no id of a revision: %s', async (what) => {
    expectInvalid(await designer.get(`/api/revisions/7/${what}`), [{ pointer: 'id', detail: 'must be an id' }]);
    expectInvalid(await designer.get(`/api/revisions/${revision.id}x/${what}`), [{ pointer: 'id', detail: 'must be an id' }]);
  });

  it('goes to nobody outside the team, and not to a fabricator', async () => {
    const path = `/api/revisions/${revision.id}/export`;
    expectNotFound(await (await api.signedIn(STRANGER)).get(path), 'revision');
    const roles = 'This needs the role designer or lab or reviewer or range or administrator.';
    expectNotAllowed(await (await api.signedIn('fabricator')).get(path), roles);
  });
});
