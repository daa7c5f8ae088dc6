import type { ExportPreview } from '../../shared/contracts/projects';
import type { Prediction } from '../../shared/antenna/predict-design';
import { canonicalJson } from '../../shared/model/canonical-json';
import type { DesignDocument, Outline } from '../../shared/model/design-document';
import { archivedFile, fileNamePart, withChecksums, zipArchive, type Archive, type ArchivedFile } from './export-archive';
import { cellTable, type ExportedStock } from './cell-table';
import { exportReadme } from './export-readme';
import type { ReadmeFacts } from './export-readme';
import { cutTable, figureTable } from './export-tables';

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
};

/** The archive of a revision. Equal sources give equal bytes. */
export async function packExport(sources: ExportSources): Promise<Archive> {
  return zipArchive(archiveName(sources), await filesOf(sources));
}

/** The files that the archive of a revision would hold, with sizes and hashes of what they are; nothing is packed for it. */
export async function previewExport(sources: ExportSources): Promise<ExportPreview> {
  const files = withChecksums(await filesOf(sources)).map(({ name, function: purpose, bytes, sha256 }) => ({
    name,
    bytes: bytes.length,
    sha256,
    function: purpose,
    head: headOf(bytes),
  }));
  return { archiveName: `${archiveName(sources)}.zip`, contentBytes: files.reduce((sum, { bytes }) => sum + bytes, 0), files };
}

/** The first lines of a file. None is cut, unless the first alone is longer than a preview. */
export function headOf(bytes: Buffer): string {
  // A letter takes at most four bytes.
  const text = bytes.subarray(0, 4 * PREVIEW_LENGTH).toString('utf8');
  if (text.length <= PREVIEW_LENGTH && bytes.length <= 4 * PREVIEW_LENGTH) return text;
  const head = text.slice(0, PREVIEW_LENGTH);
  return head.slice(0, head.lastIndexOf('\n') + 1) || head;
}

const archiveName = ({ header, projectName, panelName }: ExportSources): string => `${fileNamePart(projectName, 'project')}_${fileNamePart(panelName, 'panel')}_r${header.number}`;

async function filesOf(sources: ExportSources): Promise<ArchivedFile[]> {
  const { design, frozenEdition, edition } = sources;
  const { cells, cuts, figures, verdicts } = sources.prediction;
  if (cells === undefined || cuts === undefined) throw new Error('the prediction came without the arrays it was asked for');
  const file = (name: string, content: string | Buffer): ArchivedFile => archivedFile(name, FUNCTIONS[name] ?? '', content);
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
    files: files.map(({ name, function: purpose, bytes, sha256 }) => ({ name, bytes: bytes.length, sha256, function: purpose })),
  };
  return `${JSON.stringify(manifest, null, 2)}\n`;
}

function overallMm(outline: Outline): { widthMm: number; heightMm: number } {
  if (outline.kind !== 'polygon') return { widthMm: outline.widthMm, heightMm: outline.heightMm };
  const extent = (axis: 0 | 1): number => Math.max(...outline.pointsMm.map((point) => point[axis])) - Math.min(...outline.pointsMm.map((point) => point[axis]));
  return { widthMm: extent(0), heightMm: extent(1) };
}
