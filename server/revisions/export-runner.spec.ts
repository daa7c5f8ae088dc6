import { join } from 'node:path';
import JSZip from 'jszip';
import { exampleDesign } from '../../shared/antenna/example-design';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { predictDesign } from '../../shared/antenna/predict-design';
import { prepareEdition } from '../../shared/antenna/prepare-edition';
import { sha256Of } from './export-archive';
import type { ExportSources } from './export-packing';
import { createExportRunner, createPooledExportRunner } from './export-runner';

/** Made by `npm run build` and before this stage by `npm test`. */
const workerFile = join(__dirname, '../../dist/server/server/revisions/export-worker.js');

const id = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const edition = exampleEdition();
const design = exampleDesign({ cells: { kind: 'edition', editionId: id, rule: 'nearest-phase', excludedCells: [] } });
const author = { id, name: 'Designer' };
const sources: ExportSources = {
  header: { id, panelId: id, number: 2, hash: 'a'.repeat(64), parentId: null, parentNumber: null, restoredFromNumber: null, author, message: 'm', createdAt: '2026-12-01T14:02:31.000Z' },
  projectName: 'Project',
  panelName: 'Panel',
  invented: true,
  design,
  frozenEdition: { id, familyName: 'Example', number: 1, hash: 'b'.repeat(64) },
  edition: { description: edition.description, cells: edition.cells },
  prediction: predictDesign(design, {
    edition: prepareEdition(edition),
    include: { cells: true, cuts: [{ plane: 'along', angleDeg: [-110, 70, 1] }, { plane: 'across', angleDeg: [-90, 90, 1] }] },
  }),
  engineVersion: 'scalar-1',
  productVersion: '0.1.0',
};

describe('the packing of exports', () => {
  const pool = createPooledExportRunner(workerFile);
  const own = createExportRunner();
  afterAll(() => pool.close());

  it('gives the same bytes in a thread as in the caller’s own', async () => {
    const [threaded, here] = await Promise.all([pool.pack(sources), own.pack(sources)]);
    expect(threaded.name).toBe('Project_Panel_r2');
    expect(Buffer.isBuffer(threaded.bytes)).toBe(true);
    expect(threaded.bytes.equals(here.bytes)).toBe(true);
    expect(threaded.sha256).toBe(sha256Of(here.bytes));
  }, 30_000);

  it('previews the files of the archive it would pack, without packing it', async () => {
    const [preview, { bytes }] = [await pool.preview(sources), await own.pack(sources)];
    expect(preview).toEqual(await own.preview(sources));
    expect([preview.archiveName, preview.files.length]).toEqual(['Project_Panel_r2.zip', 8]);
    const entries = Object.values((await JSZip.loadAsync(bytes)).files);
    const held = await Promise.all(entries.map(async (entry) => [entry.name, sha256Of(await entry.async('nodebuffer'))]));
    expect(preview.files.map(({ name, sha256 }) => [`Project_Panel_r2/${name}`, sha256])).toEqual(held);
    expect(preview.contentBytes).toBe(preview.files.reduce((sum, file) => sum + file.bytes, 0));
  }, 30_000);
});
