import { designFaults } from '../../shared/antenna/design-faults';
import type { RunRequest } from '../../shared/contracts/runs';
import { MAX_CELL_COUNT } from '../../shared/model/design-document';
import type { Ground } from '../database/ground';
import { ENGINE_VERSION } from '../engine/engine-version';
import { predictionCost } from '../engine/prediction-cost';
import type { PlannedChunk } from '../engine/run-type';
import { runTypeOf } from '../engine/run-types';
import { InvalidInput, type Fault } from '../http/problems';
import { hashedJson, type DesignContent, type DesignContentService } from '../projects/design-content-service';
import type { DraftService } from '../projects/draft-service';
import type { RevisionService } from '../revisions/revision-service';
import type { Run } from './run-entity';

export interface RunPlanningParts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly drafts: DraftService;
  readonly revisions: RevisionService;
  readonly contents: DesignContentService;
}

type Source = Pick<Run, 'panelId' | 'panelName' | 'draftVersion' | 'revisionId' | 'revisionNumber'>;
type Planned = 'kind' | 'parameters' | 'design' | 'editionId' | 'contentHash' | 'resultKey' | 'engineVersion';

/** A run that may be stored. */
export interface PlannedRun extends Source, Pick<Run, Planned> {
  readonly chunks: readonly PlannedChunk<unknown>[];
}

/** Computing time of a run on one core, by its upper estimate, at most. */
export const MAX_RUN_SECONDS = 3600;
/** A chunk keeps a thread from everybody else. */
const MAX_CHUNK_SECONDS = 60;
/** A bounding rectangle this much above the limit is no ordinary outline of few cells: it is refused uncounted. */
const BOUND_OVER_LIMIT = 4;

/** Reads what is to be computed, checks that it can be, and splits it into chunks. Stores nothing. */
export class RunPlanningService {
  constructor(private readonly parts: RunPlanningParts) {}

  /** @throws NotFound, InvalidInput */
  async plan(teamId: string, panelId: string, request: RunRequest): Promise<PlannedRun> {
    const { source, content } = await this.contentOf(teamId, panelId, request.revisionId);
    const type = runTypeOf(request.kind);
    const { design } = content;
    const question = { design, parameters: request.parameters };
    refuseHuge(content);
    const faults = [...designFaults(design).map(intoDesign), ...type.faults(question)];
    if (faults.length > 0) throw new InvalidInput(faults);
    const chunks = type.plan(question);
    refuseTooLong(chunks);
    return {
      ...source,
      kind: request.kind,
      parameters: request.parameters,
      design,
      editionId: content.edition?.id ?? null,
      contentHash: content.hash,
      resultKey: hashedJson({ content: content.hash, parameters: request.parameters }).hash,
      engineVersion: `${ENGINE_VERSION} ${type.version}`,
      chunks,
    };
  }

  private async contentOf(teamId: string, panelId: string, revisionId: string | undefined): Promise<{ source: Source; content: DesignContent }> {
    const { ground, drafts, revisions, contents } = this.parts;
    const panel = await ground.transactions.read((transaction) => drafts.require(transaction, teamId, panelId));
    const named = { panelId, panelName: panel.name };
    if (revisionId === undefined) {
      const content = await contents.contentOf(teamId, panel.design);
      return { source: { ...named, draftVersion: panel.version, revisionId: null, revisionNumber: null }, content };
    }
    const { header, content } = await revisions.frozen(teamId, revisionId);
    if (header.panelId !== panelId) throw new InvalidInput([{ pointer: '#/revisionId', detail: 'is a revision of another panel' }]);
    return { source: { ...named, draftVersion: null, revisionId, revisionNumber: header.number }, content };
  }
}

const intoDesign = ({ pointer, detail }: Fault): Fault => ({ pointer: pointer.replace(/^#/, '#/design'), detail });

/** Before anything is counted cell by cell. */
function refuseHuge({ design }: DesignContent): void {
  const { cellBound } = predictionCost({ design });
  if (cellBound > BOUND_OVER_LIMIT * MAX_CELL_COUNT) {
    throw new InvalidInput([{ pointer: '#/design/panel', detail: `the panel would have ${cellBound} cells; the limit is ${MAX_CELL_COUNT}` }]);
  }
}

function refuseTooLong(chunks: readonly PlannedChunk<unknown>[]): void {
  const seconds = chunks.reduce((sum, chunk) => sum + chunk.seconds, 0);
  if (seconds > MAX_RUN_SECONDS) {
    throw new InvalidInput([{ pointer: '#/parameters', detail: `would take about ${Math.round(seconds)} s of computing; the limit is ${MAX_RUN_SECONDS} s` }]);
  }
  const longest = chunks.reduce((most, chunk) => Math.max(most, chunk.seconds), 0);
  if (longest > MAX_CHUNK_SECONDS) {
    throw new InvalidInput([{ pointer: '#/design', detail: `a single step would take about ${Math.round(longest)} s; the limit is ${MAX_CHUNK_SECONDS} s` }]);
  }
}
