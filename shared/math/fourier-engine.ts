/** Complex numbers of a rectangle of cells, row by row, real and imaginary parts apart. */
export interface ComplexCells {
  readonly columnCount: number;
  readonly rowCount: number;
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** Numbers of samples along x and y: powers of two, not fewer than the cells along that side. */
export interface SampleCounts {
  readonly columns: number;
  readonly rows: number;
}

/** Samples of the grid, number (m, n) at m rows + n. */
export interface ComplexSamples {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

export interface SpectrumQuery extends ComplexCells, SampleCounts {
  /** Place of the phase origin in cells; may lie between two. */
  readonly originColumn: number;
  readonly originRow: number;
}

/** 32-bit numbers are enough for display, projections and trials: errors 140 dB below the peak. Figures use 64. */
export type SamplePrecision = 32 | 64;

export interface TrialQuery extends SampleCounts {
  readonly columnCount: number;
  readonly rowCount: number;
  readonly precision: SamplePrecision;
}

/** Sums |F|^2 of many apertures sample by sample. */
export interface PowerTrials {
  /** Adds the pattern of one aperture, cells row by row; gives its largest |F|^2 on the samples. */
  add(re: Float64Array, im: Float64Array): number;
  /** Sum of |F|^2 of all that were added, sample (m, n) at m rows + n; a copy. */
  sum(): Float64Array;
  /** Largest |F|^2 of all that were added; a copy. */
  largest(): Float64Array;
  /** Gives the memory back; nothing may be asked afterwards. What is never released goes with the garbage, late. */
  release(): void;
}

export interface ProjectionQuery extends ComplexCells, SampleCounts {
  readonly precision: SamplePrecision;
  /** Amplitude that every cell is brought to after each round; 0 where no cell stands. */
  readonly amplitude: Float64Array;
  /** Bounds of |F| of every sample, unscaled, at m rows + n. Equal bounds prescribe it, 0 and Infinity leave it free. */
  readonly lower: Float64Array;
  readonly upper: Float64Array;
}

/** Alternating projections between bounds of the pattern and amplitudes of the cells; `re` and `im` of the query are the start. */
export interface AlternatingProjections {
  /** Goes so many rounds further. */
  run(rounds: number): void;
  /** The cells now, row by row; copies. */
  cells(): ComplexSamples;
}

export interface PatternStepQuery extends SampleCounts {
  readonly columnCount: number;
  readonly rowCount: number;
  readonly precision: SamplePrecision;
  /** Weight of |F|^2 of every sample in the total, at m rows + n: the transform of the hemisphere's kernel gives the radiated power. */
  readonly weights: Float64Array;
}

export interface PatternSummary {
  /** Largest |F|^2 on the samples and its place m rows + n. */
  readonly peak: number;
  readonly peakSample: number;
  /** Weighted sum of |F|^2. */
  readonly total: number;
}

/** From cells to a displayed pattern in one go, again and again for one grid: the spectrum itself is not kept. */
export interface PatternStep {
  run(re: Float64Array, im: Float64Array): PatternSummary;
  /** 10 log10 |F|^2 of the last run, row after row: sample (m, n) at n columns + m. Overwritten by the next. */
  readonly powerDb: Float32Array;
  /** Gives the memory back; nothing may be asked afterwards. */
  release(): void;
}

/** F of a direction and of the opposite one, phase origin in the cell (0, 0); places as in the query. */
export interface LatticeSums {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly oppositeRe: Float64Array;
  readonly oppositeIm: Float64Array;
}

export interface LatticeSumQuery extends ComplexCells {
  /** Phase steps from column to column and from row to row, for each direction. */
  readonly stepXRad: Float64Array;
  readonly stepYRad: Float64Array;
}

/**
 * Transforms of whole rectangles. The sign is the one of the radiated pattern everywhere,
 * F = sum of x exp(+j 2 pi (c m / columns + r n / rows)), unscaled. Two makers agree up to rounding:
 * plainFourierEngine in TypeScript, and a vector kernel where the machine has one.
 */
export interface FourierEngine {
  /** F with c and r counted from the origin given. */
  spectrum(query: SpectrumQuery): ComplexSamples;
  /** At least 16 samples along each side. */
  patternStep(query: PatternStepQuery): PatternStep;
  powerTrials(query: TrialQuery): PowerTrials;
  alternatingProjections(query: ProjectionQuery): AlternatingProjections;
  /** Exact sums over the cells at any directions. */
  latticeSums(query: LatticeSumQuery): LatticeSums;
}
