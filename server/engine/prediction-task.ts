import type { DesignFault } from '../../shared/antenna/invalid-design';
import type { CutRequest } from '../../shared/antenna/pattern-cut';
import type { Prediction } from '../../shared/antenna/predict-design';
import type { UvShift } from '../../shared/antenna/uv-map';
import type { CellEdition } from '../../shared/model/cell-family';
import type { DesignDocument } from '../../shared/model/design-document';

/** An edition on its way to the threads; `key` names its content, so that each thread prepares it once. */
export interface EngineEdition {
  readonly key: string;
  readonly edition: CellEdition;
}

/** What is asked of the engine. */
export interface PredictionQuestion {
  readonly design: DesignDocument;
  /** Null where the cells come from no edition. */
  readonly edition: EngineEdition | null;
  /** The design frequency when absent. */
  readonly frequencyGHz?: number;
  /** Of time-modulated cells; the steered one when absent. */
  readonly harmonic?: number;
  readonly cells?: boolean;
  readonly cuts?: readonly CutRequest[];
  /** Samples per side of the u-v map; no map when absent. */
  readonly uvSize?: number;
  /** Moves the map over direction cosines, see `uvMap`. */
  readonly uvShift?: UvShift;
}

/** The message to a thread. */
export interface PredictionTask extends PredictionQuestion {
  /** One number in shared memory: anything but 0 asks to stop at the next step. */
  readonly stop: Int32Array;
}

/** The message back. Errors lose their class between threads, so what is foreseen comes as a value. */
export type PredictionOutcome =
  | { readonly kind: 'predicted'; readonly prediction: Prediction }
  | { readonly kind: 'invalid'; readonly faults: readonly DesignFault[] }
  | { readonly kind: 'stopped' };
