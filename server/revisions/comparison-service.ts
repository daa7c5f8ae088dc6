import { cellCountUpperBound } from '../../shared/antenna/cell-count';
import { compareCells, type CellChanges } from '../../shared/antenna/compare-cells';
import { mapDifferenceDb } from '../../shared/antenna/compare-cuts';
import { compareFigures, decidingFigure, type FigureDifference } from '../../shared/antenna/compare-figures';
import type { Prediction } from '../../shared/antenna/predict-design';
import type { UvShift } from '../../shared/antenna/uv-map';
import { COMPARED_CELL_ARRAY_NAMES, type ParameterDifference, type Side } from '../../shared/contracts/comparisons';
import { countParameters } from '../../shared/model/design-diff';
import type { NoFigure } from '../../shared/model/figures';
import type { Ground } from '../database/ground';
import { InvalidInput } from '../http/problems';
import type { LibraryService } from '../library/library-service';
import type { PredictionService } from '../predictions/prediction-service';
import type { DraftService } from '../projects/draft-service';
import { beamShift, comparedCuts, comparedPlanes, type ComparedCut } from './compared-cuts';
import { parameterDifferences } from './compared-parameters';
import { identitiesOf, sideOf, type ComparedEdition, type ComparedState } from './compared-state';
import type { RevisionService } from './revision-service';

export interface ComparisonServiceParts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly drafts: DraftService;
  readonly revisions: RevisionService;
  readonly predictions: PredictionService;
  readonly library: LibraryService;
}

/** The two sides of a comparison, read but not yet computed. */
export interface ComparedPair {
  readonly before: ComparedState;
  readonly after: ComparedState;
}

/** A comparison with its arrays as they were computed. */
export interface ComputedComparison {
  readonly before: Side;
  readonly after: Side;
  readonly parameterCount: number;
  readonly parameters: ParameterDifference[];
  readonly cells: CellChanges | NoFigure;
  readonly cuts: readonly ComparedCut[];
  readonly uv: { readonly size: number; readonly shiftU: number; readonly shiftV: number; readonly differenceDb: Float32Array };
  readonly figures: FigureDifference[];
  readonly deciding: string | null;
}

type SideName = 'before' | 'after';

const UV_SIZE = 129;
const REFERENCE = /^(revision|draft):([0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})$/;

/** What two states of panels have different. */
export class ComparisonService {
  constructor(private readonly parts: ComparisonServiceParts) {}

  /** @throws NotFound, InvalidInput for what is no reference */
  async pair(teamId: string, references: { readonly before: string; readonly after: string }): Promise<ComparedPair> {
    const faults = (['before', 'after'] as const).filter((name) => !REFERENCE.test(references[name]));
    if (faults.length > 0) throw new InvalidInput(faults.map((pointer) => ({ pointer, detail: 'must be revision:<id of a revision> or draft:<id of a panel>' })));
    return { before: await this.stateOf(teamId, references.before), after: await this.stateOf(teamId, references.after) };
  }

  /** @throws InvalidInput when one of them cannot be predicted: each fault points into the design of the side it names */
  async compare(teamId: string, { before, after }: ComparedPair, signal?: AbortSignal): Promise<ComputedComparison> {
    const planes = comparedPlanes(before.design, after.design);
    const cuts = planes.map(({ request }) => request);
    const shift = beamShift(before.design, after.design);
    const predict = ({ design }: ComparedState, uvShift?: UvShift): Promise<Prediction> =>
      this.parts.predictions.predict(teamId, { design, cells: true, cuts, uvSize: UV_SIZE, uvShift, signal });
    const [left, right] = await bothSides({ before: predict(before, shift), after: predict(after) });
    const arrays = { before: arraysOf(left), after: arraysOf(right) };
    const compared = comparedCuts(planes, arrays.before.cuts, arrays.after.cuts);
    const placed = (state: ComparedState, side: 'before' | 'after') => ({ lattice: state.design.panel.lattice, arrays: arrays[side].cells, identities: identitiesOf(state) });
    const figures = compareFigures(left, right);
    return {
      before: sideOf(before, left.verdicts),
      after: sideOf(after, right.verdicts),
      parameterCount: Math.max(countParameters(before.design), countParameters(after.design)),
      parameters: parameterDifferences(before, after),
      cells: compareCells(placed(before, 'before'), placed(after, 'after')),
      cuts: compared,
      uv: { size: UV_SIZE, shiftU: shift.u, shiftV: shift.v, differenceDb: mapDifferenceDb(arrays.before.uv.gainDbi, arrays.after.uv.gainDbi, compared[0].floorDbi) },
      figures,
      deciding: decidingFigure(figures),
    };
  }

  private async stateOf(teamId: string, reference: string): Promise<ComparedState> {
    const [, kind, id] = REFERENCE.exec(reference) ?? [];
    return kind === 'revision' ? this.frozenState(teamId, reference, id) : this.draftState(teamId, reference, id);
  }

  private async frozenState(teamId: string, reference: string, revisionId: string): Promise<ComparedState> {
    const { header, panelName, projectName, content } = await this.parts.revisions.frozen(teamId, revisionId);
    const edition = await this.editionOf(teamId, content.edition?.id ?? null);
    return { reference, panelId: header.panelId, panelName, projectName, hash: header.hash, header, design: content.design, edition };
  }

  private async draftState(teamId: string, reference: string, panelId: string): Promise<ComparedState> {
    const { ground, drafts } = this.parts;
    const { name, project, hash, design } = await ground.transactions.read((transaction) => drafts.require(transaction, teamId, panelId));
    const edition = await this.editionOf(teamId, design.cells.kind === 'edition' ? design.cells.editionId : null);
    return { reference, panelId, panelName: name, projectName: project.name, hash, header: null, design, edition };
  }

  private async editionOf(teamId: string, editionId: string | null): Promise<ComparedEdition | null> {
    return editionId === null ? null : this.parts.library.edition(teamId, editionId);
  }
}

/** Both predictions. Where a design cannot be predicted, the faults of both sides, each with the name of its side. */
async function bothSides(sides: Readonly<Record<SideName, Promise<Prediction>>>): Promise<[Prediction, Prediction]> {
  const [before, after] = await Promise.allSettled([sides.before, sides.after]);
  if (before.status === 'fulfilled' && after.status === 'fulfilled') return [before.value, after.value];
  const failed = [{ side: 'before' as const, result: before }, { side: 'after' as const, result: after }].flatMap(({ side, result }) =>
    result.status === 'rejected' ? [{ side, reason: result.reason as unknown }] : [],
  );
  const faults = failed.flatMap(({ side, reason }) => (reason instanceof InvalidInput ? reason.faults.map((fault) => ({ ...fault, detail: `${side}: ${fault.detail}` })) : []));
  const other = failed.find(({ reason }) => !(reason instanceof InvalidInput));
  throw other === undefined ? new InvalidInput(faults) : other.reason;
}

/** Numbers in the arrays of a comparison, at most. */
export function comparedNumberBound({ before, after }: ComparedPair): number {
  const cells = Math.min(cellCountUpperBound(before.design.panel), cellCountUpperBound(after.design.panel));
  return cells * COMPARED_CELL_ARRAY_NAMES.length + UV_SIZE * UV_SIZE;
}

function arraysOf({ cells, cuts, uv }: Prediction): Required<Pick<Prediction, 'cells' | 'cuts' | 'uv'>> {
  if (cells === undefined || cuts === undefined || uv === undefined) throw new Error('the prediction came without the arrays it was asked for');
  return { cells, cuts, uv };
}
