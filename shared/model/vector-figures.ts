import './zod-jitless';
import * as z from 'zod';
import { figure, noFigure } from './figure-value';

/** The gain at the wanted beam item by item; the items add up to `gainAtBeamDbi`. */
export const gainBudget = z.strictObject({
  areaDbi: z.number(),
  spilloverDb: z.number(),
  cellLossDb: z.number(),
  projectionDb: z.number(),
  crossPolarDb: z.number(),
  taperDb: z.number(),
  phaseDb: z.number(),
  cellFactorDb: z.number(),
  blockageDb: z.number(),
  gainAtBeamDbi: z.number(),
});

/** What only the vector model has, and in which form it was used. */
export const vectorFigures = z.strictObject({
  reradiation: z.enum(['power-wave', 'aperture']),
  cellFactor: z.enum(['none', 'normal', 'beam']),
  /** Co- over cross-polar power in the direction of each wanted beam; from 200 dB on they are 200. */
  crossPolarDiscriminationDb: z.array(figure),
  /** Smallest local ratio within half power of the co-polar peak. */
  worstDiscriminationDb: figure,
  /** Highest cross-polar level there, relative to the co-polar peak. */
  highestCrossPolarDb: figure,
  axialRatioDb: figure,
  /** Power of the far field over the power that leaves the cells: how well the form conserves it. */
  radiatedOverLeavingDb: figure,
  budget: z.union([gainBudget, noFigure]),
});

export type GainBudgetFigures = z.infer<typeof gainBudget>;
export type VectorFigures = z.infer<typeof vectorFigures>;
