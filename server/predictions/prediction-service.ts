import type { Prediction } from '../../shared/antenna/predict-design';
import type { DesignDocument } from '../../shared/model/design-document';
import type { PredictionEngine } from '../engine/prediction-engine';
import type { EngineEdition, PredictionQuestion } from '../engine/prediction-task';
import { InvalidInput, NotFound } from '../http/problems';
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
    const edition = await this.editionOf(teamId, question.design);
    try {
      return await this.engine.predict({ teamId, question: { ...question, edition }, preview, patient, signal });
    } catch (error) {
      throw problemOfEngine(error);
    }
  }

  private async editionOf(teamId: string, { cells }: DesignDocument): Promise<EngineEdition | null> {
    if (cells.kind !== 'edition') return null;
    try {
      return await this.shelf.take(teamId, cells.editionId);
    } catch (error) {
      if (error instanceof NotFound) throw unknownEdition('#/design');
      throw error;
    }
  }
}

/** @param at pointer of the design document */
export const unknownEdition = (at: string): InvalidInput =>
  new InvalidInput([{ pointer: `${at}/cells/editionId`, detail: 'there is no such published edition' }]);
