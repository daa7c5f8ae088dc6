import type { ExportPreview } from '../../shared/contracts/projects';
import type { Prediction } from '../../shared/antenna/predict-design';
import { canonicalJson } from '../../shared/model/canonical-json';
import type { DesignDocument, Outline } from '../../shared/model/design-document';
import { CHECKSUM_FILE, fileNamePart, readArchive, sha256Of, zipArchive, type Archive, type ArchivedFile } from './export-archive';
import { exportReadme } from './export-readme';
import type { ReadmeFacts } from './export-readme';
import { cellTable, cutTable, figureTable, type ExportedStock } from './export-tables';

/** Everything that goes into the files, as plain data that may travel to a thread. */
export interface ExportSources {
  readonly header: ReadmeFacts['header'];
  readonly projectName: string;
  readonly panelName: string;
  readonly invented: boolean;
  readonly design: DesignDocument;
  /** The edition as it is frozen with the design. */
  readonly frozenEdition: { readonly id: string; readonly familyName: string; readonly number: number; readonly hash: string } | null;
  readonly edition: ExportedStock['edition'];
  readonly prediction: Pick<Prediction, 'figures' | 'verdicts' | 'warnings' | 'cells' | 'cuts'>;
  readonly engineVersion: string;
  readonly productVersion: string;
}

/** Characters of each file that a preview shows. */
const PREVIEW_LENGTH = 1200;

const FUNCTIONS: Readonly<Record<string, string>> = {
  'README.txt': 'what the files are, units, conventions, cautions',
  'cells.csv': 'place, cell, dimensions and phases of every cell',
  'figures.csv': 'predicted figures and the requirement line by line',
  'cut_along.csv': 'pattern in the plane of the wanted beam and the z axis',
  'cut_across.csv': 'pattern on the great circle across the wanted beam',
  'design.json': 'the frozen design document with its cell edition',
  'manifest.json': 'identity, versions, hashes',
  [CHECKSUM_FILE]: 'checksums of the other files',
};

/** The archive of a revision. Equal sources give equal bytes. */
export async function packExport(sources: ExportSources): Promise<Archive> {
  const { header, projectName, panelName } = sources;
  const name = `${fileNamePart(projectName, 'project')}_${fileNamePart(panelName, 'panel')}_r${header.number}`;
  return zipArchive(name, await filesOf(sources));
}

/** What the archive of a revision holds, read back from its bytes. */
export async function previewExport(sources: ExportSources): Promise<ExportPreview> {
  const archive = await packExport(sources);
  const files = (await readArchive(archive)).map(({ name, content }) => ({
    name,
    bytes: content.length,
    sha256: sha256Of(content),
    function: FUNCTIONS[name] ?? '',
    head: content.toString('utf8').slice(0, PREVIEW_LENGTH),
  }));
  return { archiveName: `${archive.name}.zip`, bytes: archive.bytes.length, sha256: sha256Of(archive.bytes), files };
}

async function filesOf(sources: ExportSources): Promise<ArchivedFile[]> {
  const { design, frozenEdition, edition } = sources;
  const { cells, cuts, figures, verdicts } = sources.prediction;
  if (cells === undefined || cuts === undefined) throw new Error('the prediction came without the arrays it was asked for');
  const file = (name: string, content: string): ArchivedFile => ({ name, function: FUNCTIONS[name] ?? '', content });
  const files = [
    file('README.txt', readmeOf(sources)),
    file('cells.csv', await cellTable(cells, { cells: design.cells, edition })),
    file('cut_across.csv', cutTable(cuts[1])),
    file('cut_along.csv', cutTable(cuts[0])),
    file('design.json', canonicalJson({ design, edition: frozenEdition })),
    file('figures.csv', figureTable(figures, verdicts)),
  ];
  return [...files, file('manifest.json', manifestOf(sources, files))];
}

function readmeOf({ frozenEdition, edition, prediction, ...facts }: ExportSources): string {
  const named = frozenEdition === null || edition === null ? null : { ...frozenEdition, provenance: edition.description.provenance, limits: edition.description.limits };
  return exportReadme({ ...facts, edition: named, warnings: prediction.warnings });
}

function manifestOf(sources: ExportSources, files: readonly ArchivedFile[]): string {
  const { header, projectName, panelName, invented, design, frozenEdition, edition } = sources;
  const manifest = {
    product: { name: 'Slantwise', version: sources.productVersion, engineVersion: sources.engineVersion },
    project: { name: projectName, invented },
    panel: { id: header.panelId, name: panelName, operation: design.panel.operation, ...overallMm(design.panel.outline), cellCount: sources.prediction.figures.cellCount },
    revision: { ...header },
    designFrequencyGHz: design.requirement.designFrequencyGHz,
    edition: frozenEdition === null ? null : { ...frozenEdition, provenance: edition?.description.provenance ?? null },
    units: { length: 'mm', frequency: 'GHz', angle: 'deg', level: 'dB' },
    predicted: true,
    files: files.map(({ name, function: purpose, content }) => ({ name, bytes: Buffer.byteLength(content), sha256: sha256Of(content), function: purpose })),
  };
  return `${JSON.stringify(manifest, null, 2)}\n`;
}

function overallMm(outline: Outline): { widthMm: number; heightMm: number } {
  if (outline.kind !== 'polygon') return { widthMm: outline.widthMm, heightMm: outline.heightMm };
  const extent = (axis: 0 | 1): number => Math.max(...outline.pointsMm.map((point) => point[axis])) - Math.min(...outline.pointsMm.map((point) => point[axis]));
  return { widthMm: extent(0), heightMm: extent(1) };
}
