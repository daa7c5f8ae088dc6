import type { DesignFault } from '../../shared/antenna/invalid-design';
import type { PlacedDesign } from '../../shared/antenna/place-cells';
import type { PreparedEdition } from '../../shared/antenna/prepare-edition';
import type { RunKind, RunParameters, RunResult } from '../../shared/contracts/runs';
import type { DesignDocument } from '../../shared/model/design-document';

/** What a run is about. */
export interface RunQuestion<Kind extends RunKind> {
  readonly design: DesignDocument;
  readonly parameters: RunParameters<Kind>;
}

/** A piece of a run that any worker may take: plain JSON, and an upper estimate of its seconds on one core. */
export interface PlannedChunk<Chunk> {
  readonly chunk: Chunk;
  readonly seconds: number;
}

/** What a thread gives to the computing of a chunk. */
export interface ChunkSite<Kind extends RunKind, Chunk> extends RunQuestion<Kind> {
  /** The design with its cells placed; a thread places them once for many chunks. */
  readonly placed: PlacedDesign;
  /** The edition that the design names. */
  readonly edition?: PreparedEdition;
  readonly chunk: Chunk;
  /** Call it between steps of more than about 0.2 s: it throws when the run was cancelled. */
  readonly checkStop: () => void;
}

/**
 * One kind of run. All of it is pure: nothing may depend on the number of workers, on their order, on a clock or on an
 * unseeded random number, so that the same question gives the same bits wherever it is computed.
 */
export interface RunTypeOf<Kind extends RunKind, Chunk, Part> {
  readonly kind: Kind;
  /** Names the arithmetic of this kind beside ENGINE_VERSION: raise it when a result changes. */
  readonly version: string;
  /** Faults between parameters and design; pointers begin with `#/parameters` or `#/design`. Asked before anything is stored. */
  faults(question: RunQuestion<Kind>): DesignFault[];
  /** Chunks of about a second: long enough to be worth a message, short enough that another team need not wait. */
  plan(question: RunQuestion<Kind>): PlannedChunk<Chunk>[];
  /** Computes one chunk, in a thread. The part is plain JSON; it must not depend on other chunks. */
  compute(site: ChunkSite<Kind, Chunk>): Part;
  /** Puts the parts, in the order of the plan, together. */
  merge(question: RunQuestion<Kind>, parts: readonly Part[]): RunResult<Kind>;
}

/** A kind of run with the types of its chunks and parts forgotten, as the table, the queue and the threads see it. */
export type RunType<Kind extends RunKind = RunKind> = Kind extends RunKind ? RunTypeOf<Kind, unknown, unknown> : never;

/** Types a kind of run where it is written, and forgets the types where it is used: chunks and parts come back as they went. */
export function defineRunType<Kind extends RunKind, Chunk, Part>(type: RunTypeOf<Kind, Chunk, Part>): RunTypeOf<Kind, unknown, unknown> {
  return type as RunTypeOf<Kind, unknown, unknown>;
}
