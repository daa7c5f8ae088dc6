import type { ExportPreview } from '../../shared/contracts/projects';
import type { CutRequest } from '../../shared/contracts/predictions';
import type { AuditService } from '../audit/audit-service';
import type { Ground } from '../database/ground';
import { ENGINE_VERSION } from '../engine/engine-version';
import type { LibraryService } from '../library/library-service';
import type { PredictionService } from '../predictions/prediction-service';
import type { Actor, DraftService } from '../projects/draft-service';
import type { Archive } from './export-archive';
import type { ExportSources } from './export-packing';
import { createExportRunner, type ExportRunner } from './export-runner';
import type { RevisionService } from './revision-service';

export interface ExportServiceParts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly drafts: DraftService;
  readonly revisions: RevisionService;
  readonly predictions: PredictionService;
  readonly library: LibraryService;
  readonly audit: AuditService;
  readonly productVersion: string;
}

const STEP_DEG = 0.1;

/** A revision as files that anyone can read without the product. The same revision gives the same bytes every time. */
export class ExportService {
  constructor(
    private readonly parts: ExportServiceParts,
    private readonly runner: ExportRunner = createExportRunner(),
  ) {}

  /** Packs a revision, and writes down who took what. @throws NotFound */
  async archive({ teamId, person }: Actor, revisionId: string): Promise<Archive> {
    const sources = await this.sourcesOf(teamId, revisionId);
    const archive = await this.runner.pack(sources);
    const { header, panelName, projectName } = sources;
    await this.parts.ground.transactions.run((transaction) =>
      this.parts.audit.record(transaction, {
        teamId,
        personId: person.id,
        action: 'revision.exported',
        object: `revision:${revisionId}`,
        detail: { project: projectName, panel: panelName, number: header.number, hash: header.hash, archive: `${archive.name}.zip`, bytes: archive.bytes.length, sha256: archive.sha256 },
      }),
    );
    return archive;
  }

  /** What the archive would hold. @throws NotFound */
  async preview(teamId: string, revisionId: string): Promise<ExportPreview> {
    return this.runner.preview(await this.sourcesOf(teamId, revisionId));
  }

  async close(): Promise<void> {
    await this.runner.close();
  }

  private async sourcesOf(teamId: string, revisionId: string): Promise<ExportSources> {
    const { ground, drafts, revisions, predictions, library, productVersion } = this.parts;
    const { header, projectName, panelName, content } = await revisions.frozen(teamId, revisionId);
    const { design, edition } = content;
    const panel = await ground.transactions.read((transaction) => drafts.require(transaction, teamId, header.panelId));
    const stock = edition === null ? null : await library.edition(teamId, edition.id);
    const { figures, verdicts, warnings, cells, cuts } = await predictions.predict(teamId, {
      design,
      cells: true,
      cuts: exportedCuts(design.requirement.beams[0].thetaDeg),
    });
    return {
      header,
      projectName,
      panelName,
      invented: panel.project.invented,
      design,
      frozenEdition: edition,
      edition: stock === null ? null : { description: stock.description, cells: stock.cells },
      prediction: { figures, verdicts, warnings, cells, cuts },
      engineVersion: ENGINE_VERSION,
      productVersion,
    };
  }
}

/** From horizon to horizon through the wanted beam, whose angle is 0. */
function exportedCuts(beamThetaDeg: number): CutRequest[] {
  return [
    { plane: 'along', angleDeg: [-90 - beamThetaDeg, 90 - beamThetaDeg, STEP_DEG] },
    { plane: 'across', angleDeg: [-90, 90, STEP_DEG] },
  ];
}
