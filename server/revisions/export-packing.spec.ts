import JSZip from 'jszip';
import { exampleDesign } from '../../shared/antenna/example-design';
import { exampleEdition } from '../../shared/antenna/example-edition';
import { predictDesign } from '../../shared/antenna/predict-design';
import { prepareEdition } from '../../shared/antenna/prepare-edition';
import type { DesignDocument } from '../../shared/model/design-document';
import { sha256Of } from './export-archive';
import { packExport, previewExport, type ExportSources } from './export-packing';

const id = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const edition = exampleEdition();

function sourcesOf(design: DesignDocument, change: Partial<ExportSources> = {}): ExportSources {
  const onEdition = design.cells.kind === 'edition';
  return {
    header: { id, panelId: id, number: 7, hash: 'a'.repeat(64), parentId: null, parentNumber: null, restoredFromNumber: null, author: { id, name: 'Ada' }, message: 'as drawn', createdAt: '2026-12-01T14:02:31.000Z' },
    projectName: 'Merrow Point',
    panelName: 'Panel A',
    invented: false,
    design,
    frozenEdition: onEdition ? { id, familyName: 'Example', number: 1, hash: 'b'.repeat(64) } : null,
    edition: onEdition ? { description: edition.description, cells: edition.cells } : null,
    prediction: predictDesign(design, { edition: prepareEdition(edition), include: { cells: true, cuts: [{ plane: 'along', angleDeg: [-90, 90, 2] }, { plane: 'across', angleDeg: [-90, 90, 2] }] } }),
    engineVersion: 'engine',
    productVersion: '1.2.3',
    ...change,
  };
}

async function unpacked(sources: ExportSources): Promise<Map<string, string>> {
  const { name, bytes } = await packExport(sources);
  const entries = Object.values((await JSZip.loadAsync(bytes, { checkCRC32: true })).files);
  return new Map(await Promise.all(entries.map(async (entry): Promise<[string, string]> => [entry.name.slice(name.length + 1), await entry.async('string')])));
}

const onEdition = exampleDesign({ cells: { kind: 'edition', editionId: id, rule: 'nearest-phase', excludedCells: [] } });

describe('the export of a revision', () => {
  it('says in its manifest what it is, of which edition, and what every other file is', async () => {
    const files = await unpacked(sourcesOf(onEdition));
    const manifest = JSON.parse(files.get('manifest.json') ?? '') as { files: { name: string; bytes: number; sha256: string; function: string }[] };
    expect(manifest).toMatchObject({
      product: { name: 'Slantwise', version: '1.2.3', engineVersion: 'engine' },
      project: { name: 'Merrow Point', invented: false },
      panel: { id, name: 'Panel A', operation: 'reflect', widthMm: 300, heightMm: 300, cellCount: 400 },
      revision: { number: 7, author: { name: 'Ada' } },
      designFrequencyGHz: 10,
      edition: { familyName: 'Example', number: 1, provenance: 'invented' },
      predicted: true,
    });
    const others = [...files].filter(([name]) => name !== 'manifest.json' && name !== 'SHA256SUMS');
    expect(manifest.files.map(({ name }) => name).sort()).toEqual(others.map(([name]) => name).sort());
    for (const { name, bytes, sha256, function: purpose } of manifest.files) {
      const content = files.get(name) ?? '';
      expect([bytes, sha256, purpose !== '']).toEqual([Buffer.byteLength(content), sha256Of(content), true]);
    }
  });

  it('takes the overall size of a polygon from its corners', async () => {
    const { panel } = exampleDesign();
    const design = exampleDesign({ panel: { ...panel, outline: { kind: 'polygon', pointsMm: [[-100, -50], [140, -50], [0, 90]] } } });
    const manifest = JSON.parse((await unpacked(sourcesOf(design))).get('manifest.json') ?? '') as { panel: object; edition: unknown };
    expect([manifest.panel, manifest.edition]).toEqual([expect.objectContaining({ widthMm: 240, heightMm: 140 }), null]);
  });

  it('previews the same files with the same hashes, and the beginning of each', async () => {
    const sources = sourcesOf(onEdition, { projectName: 'Å'.repeat(2000) });
    const [preview, files] = [await previewExport(sources), await unpacked(sources)];
    expect(preview.files.map(({ name, sha256, bytes }) => [name, sha256, bytes])).toEqual([...files].map(([name, content]) => [name, sha256Of(content), Buffer.byteLength(content)]));
    expect(preview.contentBytes).toBe([...files.values()].reduce((sum, content) => sum + Buffer.byteLength(content), 0));
    // Letters of two bytes must not be cut in half where the beginning ends.
    for (const { name, head } of preview.files) expect(files.get(name)?.startsWith(head)).toBe(true);
    expect(preview.files.find(({ name }) => name === 'README.txt')?.head).toHaveLength(1200);
  });

  it('needs the arrays that its tables are made of', async () => {
    const { cells: _cells, ...bare } = sourcesOf(onEdition).prediction;
    await expect(packExport(sourcesOf(onEdition, { prediction: bare }))).rejects.toThrow('the prediction came without the arrays it was asked for');
  });
});
