import { fourierEngine } from '../../math/active-fourier-engine';
import type { ComplexSamples } from '../../math/fourier-engine';
import { amplitudeRatioToDb } from '../../units/decibels';

/** A rectangle of cells with fixed amplitudes, and bounds of |F| on the samples of its transform. */
export interface ProjectionProblem {
  readonly columnCount: number;
  readonly rowCount: number;
  /** Row by row; 0 where no cell stands. */
  readonly amplitude: Float64Array;
  readonly startPhaseRad: Float64Array;
  /** Samples along x and y, powers of two. */
  readonly columns: number;
  readonly rows: number;
  /** Bounds of |F| at sample m rows + n, unscaled. */
  readonly lower: Float64Array;
  readonly upper: Float64Array;
}

export interface ProjectionSchedule {
  readonly iterations: number;
  /** Iterations before which the cost is taken; 0 and the last one are always among them. */
  readonly watched: readonly number[];
  /** Goes on to the end although the bounds are reached or nothing moves any more. */
  readonly toTheEnd?: boolean;
}

export interface ProjectionRun {
  readonly phaseRad: Float64Array;
  readonly iterations: number;
  /** J_i = sum (|F| - clipped |F|)^2 / samples before clip i, over the power sum A^2: the share that violates the bounds. */
  readonly costs: readonly { readonly iteration: number; readonly share: number }[];
  readonly worstExcessDb: number;
  readonly worstShortfallDb: number;
  readonly outcome: 'reached' | 'stalled' | 'unfinished';
}

/** Within this of both bounds everywhere counts as reached. */
const REACHED_DB = 0.05;
/** A cost that falls by less than this share in so many iterations has stalled. */
const STALLED_SHARE = 0.01;
const STALLED_AFTER = 100;

/**
 * Alternating projections: clip |F| into its bounds and keep its phase, transform back, bring every cell to its amplitude and
 * keep its phase. The cost cannot rise (each step is a projection in the same norm); where it ends is a local matter of the
 * start (O. M. Bucci et al., IEE Proc. H 137(6), 349-357, 1990, from memory).
 */
export function runProjections(problem: ProjectionProblem, schedule: ProjectionSchedule): ProjectionRun {
  const start = startField(problem);
  const projections = fourierEngine().alternatingProjections({ ...problem, ...start, precision: 64 });
  const watched = [...new Set([0, ...schedule.watched.filter((i) => i > 0 && i < schedule.iterations), schedule.iterations])].sort((a, b) => a - b);
  const power = problem.amplitude.reduce((sum, a) => sum + a * a, 0);
  const costs: { iteration: number; share: number }[] = [];
  let done = 0;
  let reading = readBounds(problem, projections.cells());
  for (const iteration of watched) {
    projections.run(iteration - done);
    done = iteration;
    reading = readBounds(problem, projections.cells());
    costs.push({ iteration, share: power > 0 ? reading.cost / power : 0 });
    if (!schedule.toTheEnd && outcomeOf(reading, costs) !== 'unfinished') break;
  }
  const { re, im } = projections.cells();
  return {
    phaseRad: re.map((value, i) => Math.atan2(im[i], value)),
    iterations: done,
    costs,
    worstExcessDb: reading.excessDb,
    worstShortfallDb: reading.shortfallDb,
    outcome: outcomeOf(reading, costs),
  };
}

function startField({ amplitude, startPhaseRad }: ProjectionProblem): { re: Float64Array; im: Float64Array } {
  return { re: amplitude.map((a, i) => a * Math.cos(startPhaseRad[i])), im: amplitude.map((a, i) => a * Math.sin(startPhaseRad[i])) };
}

interface BoundsReading {
  readonly cost: number;
  readonly excessDb: number;
  readonly shortfallDb: number;
}

function readBounds(problem: ProjectionProblem, cells: ComplexSamples): BoundsReading {
  const { columnCount, rowCount, columns, rows, lower, upper } = problem;
  const { re, im } = fourierEngine().spectrum({ columnCount, rowCount, columns, rows, ...cells, originColumn: 0, originRow: 0 });
  let [cost, excess, shortfall] = [0, 1, 1];
  for (let i = 0; i < re.length; i++) {
    const size = Math.hypot(re[i], im[i]);
    const off = size - Math.min(upper[i], Math.max(lower[i], size));
    cost += off * off;
    if (upper[i] > 0) excess = Math.max(excess, size / upper[i]);
    if (lower[i] > 0) shortfall = Math.min(shortfall, size / lower[i]);
  }
  return { cost: cost / re.length, excessDb: amplitudeRatioToDb(excess), shortfallDb: -amplitudeRatioToDb(Math.max(1e-15, shortfall)) };
}

function outcomeOf(reading: BoundsReading, costs: ProjectionRun['costs']): ProjectionRun['outcome'] {
  if (reading.excessDb <= REACHED_DB && reading.shortfallDb <= REACHED_DB) return 'reached';
  const last = costs[costs.length - 1];
  const before = costs.findLast(({ iteration }) => iteration <= last.iteration - STALLED_AFTER);
  return before !== undefined && last.share > (1 - STALLED_SHARE) * before.share ? 'stalled' : 'unfinished';
}
