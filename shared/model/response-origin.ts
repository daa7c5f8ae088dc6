/** Where the responses of an edition were read from. */
export interface ResponseOrigin {
  /** File that the curve [cell][theta][phi] came from; null where none gave it. */
  readonly fileOfCurve: readonly (string | null)[];
  /** Line in that file for each [cell][theta][phi][frequency]; 0 where it is not known. */
  readonly lineOfPoint: Int32Array;
  /** Measurements of cells that were measured again; they are compared and stand in no table. */
  readonly repeats: readonly RepeatedCurve[];
}

/** One more measurement of a curve that an edition holds, as the edition holds it: exp(+j omega t), S11, S21, S12, S22. */
export interface RepeatedCurve {
  readonly file: string;
  readonly cell: number;
  readonly theta: number;
  readonly phi: number;
  readonly frequenciesHz: Float64Array;
  /** re, im pairs, eight numbers for each frequency. */
  readonly values: Float64Array;
  /** Line of each frequency; empty where not known. */
  readonly lines: Int32Array;
}
