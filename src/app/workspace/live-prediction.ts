import { concat, of, switchMap, timer } from 'rxjs';
import type { Observable } from 'rxjs';
import type { Problem } from '../../../shared/contracts/common';
import type { CutRequest, PredictionRequest } from '../../../shared/contracts/predictions';
import type { DesignDocument } from '../../../shared/model/design-document';
import type { PredictionAnswer } from '../api/prediction-client';
import { followLatest } from './follow-latest';
import type { LivePrediction } from './live-prediction-data';
import { unpackPrediction } from './unpack-prediction';

/** Work that is older than this gives way to a newer design. */
const PATIENCE_MS = 400;
const RETRY_MS = 3000;
const AGAIN_MS = 300;
/** Fine enough that a curve 500 pixels wide over 180 degrees shows every null. */
const CUT_STEP_DEG = 0.2;
/** The contract allows eight cuts. */
const CUT_LIMIT = 8;

/** What is to be predicted. */
export interface PredictionAsk {
  readonly design: DesignDocument;
  readonly cuts: readonly CutRequest[];
  readonly uvSize: number;
  /** Of time-modulated cells; null for the steered one. */
  readonly harmonic?: number | null;
}

export type LiveOutcome =
  | { readonly kind: 'predicted'; readonly prediction: LivePrediction }
  | { readonly kind: 'failed'; readonly problem: Problem; readonly of: DesignDocument };

const OUT_OF_REACH: Problem = {
  type: 'about:blank',
  title: 'The server is out of reach',
  status: 0,
  detail: 'No prediction of the latest change yet; it is asked for again every 3 seconds',
};

const BEAM_CUTS: readonly CutRequest[] = [
  { plane: 'along', angleDeg: [-90, 90, CUT_STEP_DEG] },
  { plane: 'across', angleDeg: [-90, 90, CUT_STEP_DEG] },
];

/** The request for a design: the cuts along and across its beam first, then the wanted ones. */
export function requestOf({ design, cuts, uvSize, harmonic }: PredictionAsk): PredictionRequest {
  return {
    design,
    include: uvSize > 0 ? ['cells', 'cuts', 'uv'] : ['cells', 'cuts'],
    cuts: [...BEAM_CUTS, ...cuts].slice(0, CUT_LIMIT),
    ...(uvSize > 0 ? { uvSize } : {}),
    ...(typeof harmonic === 'number' && design.cells.kind === 'modulated' ? { harmonic } : {}),
  };
}

/** One outcome after the other for a stream of asks; asks that were overtaken have none. */
export function livePredictions(
  asks: Observable<PredictionAsk>,
  predict: (request: PredictionRequest) => Observable<PredictionAnswer>,
): Observable<LiveOutcome> {
  const outcomes = (ask: PredictionAsk): Observable<LiveOutcome> =>
    predict(requestOf(ask)).pipe(
      switchMap((answer): Observable<LiveOutcome> => {
        if (answer.kind === 'predicted') return of({ kind: 'predicted', prediction: unpackPrediction(answer.block, ask.design) });
        // An older request of this tab that arrived late, or another tab, took its place, while this is still what is wanted.
        if (answer.kind === 'superseded') return timer(AGAIN_MS).pipe(switchMap(() => outcomes(ask)));
        if (answer.kind === 'failed') return of({ kind: 'failed', problem: answer.problem, of: ask.design });
        return concat(of<LiveOutcome>({ kind: 'failed', problem: OUT_OF_REACH, of: ask.design }), timer(RETRY_MS).pipe(switchMap(() => outcomes(ask))));
      }),
    );
  return asks.pipe(followLatest(outcomes, PATIENCE_MS));
}
