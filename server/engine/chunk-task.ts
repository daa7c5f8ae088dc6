import type { DesignFault } from '../../shared/antenna/invalid-design';
import type { RunKind } from '../../shared/contracts/runs';
import type { DesignDocument } from '../../shared/model/design-document';
import type { EngineEdition } from './prediction-task';

/** The message to a thread: one chunk of a run. */
export interface ChunkTask {
  readonly kind: RunKind;
  /** Names design and edition, so that a thread places the cells once for all chunks that it gets. */
  readonly contentHash: string;
  readonly design: DesignDocument;
  readonly edition: EngineEdition | null;
  /** Checked by the schema of the kind when the run was accepted. */
  readonly parameters: unknown;
  readonly chunk: unknown;
  /** One number in shared memory: anything but 0 asks to stop at the next step. */
  readonly stop: Int32Array;
}

/** The message back. Errors lose their class between threads, so what is foreseen comes as a value. */
export type ChunkOutcome =
  | { readonly kind: 'computed'; readonly part: unknown }
  | { readonly kind: 'invalid'; readonly faults: readonly DesignFault[] }
  | { readonly kind: 'stopped' };
