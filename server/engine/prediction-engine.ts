import { InvalidDesign } from '../../shared/antenna/invalid-design';
import type { Prediction } from '../../shared/antenna/predict-design';
import { MAX_CELL_COUNT } from '../../shared/model/design-document';
import { EngineRefusal, abandoned, superseded } from './engine-refusals';
import { FairQueue, type FairQueueLimits, type WaitOptions } from './fair-queue';
import { MAX_PREDICTION_SECONDS, predictionCost } from './prediction-cost';
import type { PredictionRunner } from './prediction-runner';
import type { EngineEdition, PredictionOutcome, PredictionQuestion } from './prediction-task';

/** Twice what the cost check lets pass, for a machine at work on other things. */
const TIME_LIMIT_MS = 2 * MAX_PREDICTION_SECONDS * 1000;
/** Previews go before anything else a team waits for. */
const PREVIEW_PRIORITY = 1;
const WAITING_PER_TEAM = 64;
/** A bounding rectangle this much above the limit is no ordinary outline of few cells: it is refused uncounted. */
const BOUND_OVER_LIMIT = 4;

export interface EngineRequest {
  readonly teamId: string;
  readonly question: Omit<PredictionQuestion, 'edition'>;
  /** Fetches the edition that the cells come from; asked for once the request has its place among the previews. */
  readonly edition?: () => Promise<EngineEdition>;
  /** Who previews what: a newer request of the same name takes the place of the older one. */
  readonly preview?: string;
  /** Waits behind however many others, instead of being told to come back: for what the house itself needs. */
  readonly patient?: boolean;
  /** Fires when nobody waits for the answer any more. */
  readonly signal?: AbortSignal;
}

/** Limits that leave a thread to the other teams wherever there is more than one. */
export const limitsFor = (threadCount: number): FairQueueLimits => ({
  concurrency: threadCount,
  perTeam: Math.max(1, threadCount - 1),
  waitingPerTeam: WAITING_PER_TEAM,
});

/** Predicts designs, a bounded number at a time. */
export class PredictionEngine {
  private readonly queue: FairQueue;
  private readonly previews = new Map<string, AbortController>();

  constructor(
    private readonly runner: PredictionRunner,
    limits: FairQueueLimits,
  ) {
    this.queue = new FairQueue(limits);
  }

  /** @throws InvalidDesign where fields do not go together, EngineRefusal where there will be no answer */
  async predict({ teamId, question, edition, preview, patient, signal }: EngineRequest): Promise<Prediction> {
    refuseTooCostly(question);
    const withdrawal = new AbortController();
    const withdraw = (): void => withdrawal.abort(abandoned());
    signal?.addEventListener('abort', withdraw, { once: true });
    if (signal?.aborted === true) withdraw();
    if (preview !== undefined) this.replace(preview, withdrawal);
    try {
      const complete = { ...question, edition: edition === undefined ? null : await edition() };
      return await this.answerInLine(teamId, complete, { withdrawn: withdrawal.signal, patient, priority: preview === undefined ? 0 : PREVIEW_PRIORITY });
    } finally {
      signal?.removeEventListener('abort', withdraw);
      if (preview !== undefined && this.previews.get(preview) === withdrawal) this.previews.delete(preview);
    }
  }

  async close(): Promise<void> {
    await this.runner.close();
  }

  private replace(preview: string, withdrawal: AbortController): void {
    this.previews.get(preview)?.abort(superseded());
    this.previews.set(preview, withdrawal);
  }

  /**
   * A withdrawn request leaves the line at once. One that runs is asked to stop, but answers all the same if it is past
   * its last step: whoever steers faster than predictions come would otherwise never see one.
   */
  private async answerInLine(teamId: string, question: PredictionQuestion, options: WaitOptions & { readonly withdrawn: AbortSignal }): Promise<Prediction> {
    const { withdrawn, ...wait } = options;
    const line = new AbortController();
    const leave = (): void => line.abort(withdrawn.reason);
    withdrawn.addEventListener('abort', leave, { once: true });
    if (withdrawn.aborted) leave();
    const begin = (): Promise<PredictionOutcome> => {
      withdrawn.throwIfAborted();
      withdrawn.removeEventListener('abort', leave);
      return this.start(question, withdrawn);
    };
    const outcome = await this.queue.run(teamId, begin, { ...wait, signal: line.signal });
    if (outcome.kind === 'stopped') throw withdrawn.reason;
    if (outcome.kind === 'invalid') throw new InvalidDesign(outcome.faults);
    return outcome.prediction;
  }

  private async start(question: PredictionQuestion, withdrawn: AbortSignal): Promise<PredictionOutcome> {
    const stop = new Int32Array(new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT));
    const askToStop = (): void => void Atomics.store(stop, 0, 1);
    withdrawn.addEventListener('abort', askToStop, { once: true });
    const limit = AbortSignal.timeout(TIME_LIMIT_MS);
    try {
      return await this.runner.run({ ...question, stop }, limit);
    } catch (error) {
      if (limit.aborted) throw new EngineRefusal('timed-out', `The prediction took longer than ${TIME_LIMIT_MS / 1000} s.`);
      throw error;
    } finally {
      withdrawn.removeEventListener('abort', askToStop);
    }
  }
}

function refuseTooCostly(question: EngineRequest['question']): void {
  const { cellBound, directionCount, seconds } = predictionCost(question);
  if (cellBound > BOUND_OVER_LIMIT * MAX_CELL_COUNT) {
    throw new InvalidDesign([{ pointer: '#/panel', detail: `the panel would have ${cellBound} cells; the limit is ${MAX_CELL_COUNT}` }]);
  }
  if (seconds > MAX_PREDICTION_SECONDS) {
    const asked = `${cellBound} lattice positions and ${directionCount} directions`;
    throw new EngineRefusal('too-costly', `${asked} would take about ${Math.round(seconds)} s; the limit is ${MAX_PREDICTION_SECONDS} s.`);
  }
}
