import type { ExportPreview } from '../../shared/contracts/projects';
import type { CutRequest } from '../../shared/contracts/predictions';
import type { Prediction } from '../../shared/antenna/predict-design';
import { canonicalJson } from '../../shared/model/canonical-json';
import type { Outline } from '../../shared/model/design-document';
import type { Ground } from '../database/ground';
import { ENGINE_VERSION } from '../engine/engine-version';
import type { LibraryService } from '../library/library-service';
import type { PredictionService } from '../predictions/prediction-service';
import type { DraftService } from '../projects/draft-service';
import { CHECKSUM_FILE, fileNamePart, readArchive, sha256Of, zipArchive, type Archive, type ArchivedFile } from './export-archive';
import { exportReadme } from './export-readme';
import { cellTable, cutTable, figureTable, type ExportedStock } from './export-tables';
import type { FrozenRevision, RevisionService } from './revision-service';

export interface ExportServiceParts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly drafts: DraftService;
  readonly revisions: RevisionService;
  readonly predictions: PredictionService;
  readonly library: LibraryService;
  readonly productVersion: string;
}

/** Everything that goes into the files. */
interface ExportSources {
  readonly revision: FrozenRevision;
  readonly prediction: Prediction;
  readonly edition: ExportedStock['edition'];
  readonly invented: boolean;
}

/** Characters of each file that a preview shows. */
const PREVIEW_LENGTH = 1200;
const STEP_DEG = 0.1;

/** A revision as files that anyone can read without the product. The same revision gives the same bytes every time. */
export class ExportService {
  constructor(private readonly parts: ExportServiceParts) {}

  /** @throws NotFound */
  async archive(teamId: string, revisionId: string): Promise<Archive> {
    const sources = await this.sourcesOf(teamId, revisionId);
    const { header, projectName, panelName } = sources.revision;
    const name = `${fileNamePart(projectName, 'project')}_${fileNamePart(panelName, 'panel')}_r${header.number}`;
    return zipArchive(name, await this.filesOf(sources));
  }

  /** What the archive holds, read back from its bytes. @throws NotFound */
  async preview(teamId: string, revisionId: string): Promise<ExportPreview> {
    const archive = await this.archive(teamId, revisionId);
    const files = (await readArchive(archive)).map(({ name, content }) => ({
      name,
      bytes: content.length,
      sha256: sha256Of(content),
      function: FUNCTIONS[name] ?? '',
      head: content.toString('utf8').slice(0, PREVIEW_LENGTH),
    }));
    return { archiveName: `${archive.name}.zip`, bytes: archive.bytes.length, sha256: sha256Of(archive.bytes), files };
  }

  private async sourcesOf(teamId: string, revisionId: string): Promise<ExportSources> {
    const { ground, drafts, revisions, predictions, library } = this.parts;
    const revision = await revisions.frozen(teamId, revisionId);
    const { design, edition } = revision.content;
    const panel = await ground.transactions.read((transaction) => drafts.require(transaction, teamId, revision.header.panelId));
    return {
      revision,
      invented: panel.project.invented,
      edition: edition === null ? null : await library.edition(teamId, edition.id),
      prediction: await predictions.predict(teamId, { design, cells: true, cuts: exportedCuts(design.requirement.beams[0].thetaDeg) }),
    };
  }

  private async filesOf(sources: ExportSources): Promise<ArchivedFile[]> {
    const { content } = sources.revision;
    const { cells, cuts, figures, verdicts } = sources.prediction;
    if (cells === undefined || cuts === undefined) throw new Error('the prediction came without the arrays it was asked for');
    const file = (name: string, text: string): ArchivedFile => ({ name, function: FUNCTIONS[name] ?? '', content: text });
    const files = [
      file('README.txt', this.readmeOf(sources)),
      file('cells.csv', await cellTable(cells, { cells: content.design.cells, edition: sources.edition })),
      file('cut_across.csv', cutTable(cuts[1])),
      file('cut_along.csv', cutTable(cuts[0])),
      file('design.json', canonicalJson({ design: content.design, edition: content.edition })),
      file('figures.csv', figureTable(figures, verdicts)),
    ];
    return [...files, file('manifest.json', this.manifestOf(sources, files))];
  }

  private readmeOf({ revision, prediction, edition, invented }: ExportSources): string {
    const { header, projectName, panelName, content } = revision;
    const named = content.edition;
    return exportReadme({
      header,
      projectName,
      panelName,
      invented,
      edition: named === null || edition === null ? null : { ...named, provenance: edition.description.provenance, limits: edition.description.limits },
      warnings: prediction.warnings,
      engineVersion: ENGINE_VERSION,
      productVersion: this.parts.productVersion,
    });
  }

  private manifestOf({ revision, prediction, edition, invented }: ExportSources, files: readonly ArchivedFile[]): string {
    const { header, projectName, panelName, content } = revision;
    const { panel, requirement } = content.design;
    const manifest = {
      product: { name: 'Slantwise', version: this.parts.productVersion, engineVersion: ENGINE_VERSION },
      project: { name: projectName, invented },
      panel: { id: header.panelId, name: panelName, operation: panel.operation, ...overallMm(panel.outline), cellCount: prediction.figures.cellCount },
      revision: { ...header },
      designFrequencyGHz: requirement.designFrequencyGHz,
      edition: content.edition === null ? null : { ...content.edition, provenance: edition?.description.provenance ?? null },
      units: { length: 'mm', frequency: 'GHz', angle: 'deg', level: 'dB' },
      predicted: true,
      files: files.map(({ name, function: purpose, content: text }) => ({ name, bytes: Buffer.byteLength(text), sha256: sha256Of(text), function: purpose })),
    };
    return `${JSON.stringify(manifest, null, 2)}\n`;
  }
}

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

/** From horizon to horizon through the wanted beam, whose angle is 0. */
function exportedCuts(beamThetaDeg: number): CutRequest[] {
  return [
    { plane: 'along', angleDeg: [-90 - beamThetaDeg, 90 - beamThetaDeg, STEP_DEG] },
    { plane: 'across', angleDeg: [-90, 90, STEP_DEG] },
  ];
}

function overallMm(outline: Outline): { widthMm: number; heightMm: number } {
  if (outline.kind !== 'polygon') return { widthMm: outline.widthMm, heightMm: outline.heightMm };
  const extent = (axis: 0 | 1): number => Math.max(...outline.pointsMm.map((point) => point[axis])) - Math.min(...outline.pointsMm.map((point) => point[axis]));
  return { widthMm: extent(0), heightMm: extent(1) };
}
