import type { FileQuestion } from './family-inspection';
import type { FileMessage } from './file-message';

export type TouchstoneVersion = '1.0' | '1.1' | '2.0' | '2.1';
export type NetworkParameter = 'S' | 'Y' | 'Z' | 'H' | 'G';

/** One comment of a file, with its `key: value` or `key = value` where it reads as one. */
export interface TouchstoneComment {
  readonly line: number;
  readonly text: string;
  readonly key?: string;
  readonly value?: string;
}

/** Noise figures of a two-port against frequency. */
export interface TouchstoneNoise {
  readonly frequenciesHz: Float64Array;
  readonly minimumFigureDb: Float64Array;
  /** re, im pairs. */
  readonly optimumReflection: Float64Array;
  readonly resistanceOhm: Float64Array;
}

/**
 * A network file in one form whatever its version, unit, format and order were.
 * S is a ratio; Y is in siemens and Z in ohms, not normalised; H and G are mixed, not normalised.
 */
export interface TouchstoneData {
  readonly version: TouchstoneVersion;
  readonly portCount: number;
  readonly parameter: NetworkParameter;
  /** Strictly increasing. */
  readonly frequenciesHz: Float64Array;
  /** re, im pairs in the order [frequency][row][column]. */
  readonly values: Float64Array;
  /** One resistance per port. */
  readonly referenceOhm: readonly number[];
  readonly comments: readonly TouchstoneComment[];
  readonly noise?: TouchstoneNoise;
  /** Line of each frequency, of a file that was read. */
  readonly recordLines?: Int32Array;
}

export type TouchstoneResult =
  | { readonly kind: 'read'; readonly data: TouchstoneData; readonly notices: readonly FileMessage[] }
  | { readonly kind: 'refused'; readonly messages: readonly FileMessage[]; readonly question?: FileQuestion };

/** Bounds checked before anything of that size is allocated. */
export interface TouchstoneLimits {
  readonly bytes: number;
  readonly ports: number;
  readonly points: number;
}

export const TOUCHSTONE_LIMITS: TouchstoneLimits = { bytes: 20_000_000, ports: 64, points: 200_000 };

/** Answers of a person to questions the file leaves open; each one used is told as a notice. */
export interface TouchstoneChoices {
  /** Keeps only so many records from the start of a damaged file. */
  readonly keepFirstRecords?: number;
  /** Stands in for a missing option line, such as `# GHz S RI R 50`. */
  readonly optionLine?: string;
  readonly limits?: TouchstoneLimits;
}
