import { designFaults } from '../../shared/antenna/design-faults';
import { InvalidDesign } from '../../shared/antenna/invalid-design';
import type { Prediction } from '../../shared/antenna/predict-design';
import type { DesignDocument } from '../../shared/model/design-document';
import type { PredictionEngine } from '../engine/prediction-engine';
import type { EngineEdition, PredictionQuestion } from '../engine/prediction-task';
import { NotFound } from '../http/problems';
import { EditionShelf } from './edition-shelf';
import type { EditionSource } from './edition-source';
import { problemOfEngine } from './engine-problems';

export interface PredictionWish extends Omit<PredictionQuestion, 'edition'> {
  readonly preview?: string;
  readonly patient?: boolean;
  readonly signal?: AbortSignal;
}

/** Predicts designs for a team, on its own editions. */
export class PredictionService {
  private readonly shelf: EditionShelf;

  constructor(
    private readonly engine: PredictionEngine,
    editions: EditionSource,
  ) {
    this.shelf = new EditionShelf(editions);
  }

  /**
   * @throws InvalidInput with pointers into `#/design` for a design that does not hold together or names an unknown edition;
   * Superseded, TooMany, Unavailable when there will be no answer
   */
  async predict(teamId: string, { preview, patient, signal, ...question }: PredictionWish): Promise<Prediction> {
    const { cells } = question.design;
    const edition = cells.kind === 'edition' ? () => this.editionOf(teamId, cells.editionId, question.design) : undefined;
    try {
      return await this.engine.predict({ teamId, question, edition, preview, patient, signal });
    } catch (error) {
      throw problemOfEngine(error);
    }
  }

  /** The edition that a design names, as the engine takes it; null where its cells come from none. @throws InvalidDesign when there is no such edition */
  async editionFor(teamId: string, design: DesignDocument): Promise<EngineEdition | null> {
    return design.cells.kind === 'edition' ? this.editionOf(teamId, design.cells.editionId, design) : null;
  }

  /** Without its edition a design never reaches the engine, so its other faults are looked for here: all are told at once. */
  private async editionOf(teamId: string, editionId: string, design: DesignDocument): Promise<EngineEdition> {
    try {
      return await this.shelf.take(teamId, editionId);
    } catch (error) {
      if (error instanceof NotFound) throw new InvalidDesign([...designFaults(design), { pointer: '#/cells/editionId', detail: 'there is no such published edition' }]);
      throw error;
    }
  }
}
