import type { Figure, Figures } from '../../../../shared/model/figures';
import type { GainBudgetFigures } from '../../../../shared/model/vector-figures';
import { numberText } from '../../ui/plots/plot-text';
import { BY_SYMMETRY_DB } from '../by-symmetry';

/** One line of a small table. */
export interface VectorRow {
  readonly name: string;
  readonly value: string;
  /** Why there is no value. */
  readonly reason: string | null;
}

const ITEMS: readonly (readonly [keyof GainBudgetFigures, string])[] = [
  ['areaDbi', 'Area, projected'],
  ['spilloverDb', 'Spillover'],
  ['cellLossDb', 'Cell loss'],
  ['projectionDb', 'Projection'],
  ['crossPolarDb', 'Cross-polar'],
  ['taperDb', 'Taper of what leaves'],
  ['phaseDb', 'Phase'],
  ['cellFactorDb', 'Cell factor'],
  ['blockageDb', 'Blockage'],
];

/** Three decimals, so that what is read can be added up. */
const DIGITS = 3;

export interface BudgetTable {
  readonly items: readonly VectorRow[];
  readonly sum: VectorRow;
}

/** The budget of the gain at the beam, or the reason why there is none; null in the scalar model. */
export function budgetTable({ vector, blockage }: Figures): BudgetTable | { readonly reason: string } | null {
  if (!vector) return null;
  const { budget } = vector;
  if ('reason' in budget) return { reason: String(budget.reason) };
  const known = budget as GainBudgetFigures;
  return {
    // The null field of shadowed cells leaves nothing, so it counts where leaving power and amplitudes do.
    items: ITEMS.map(([item, name]) => ({ name: item === 'blockageDb' && blockage ? 'Blockage: within cell loss, taper' : name, value: signed(known[item], item === 'areaDbi'), reason: null })),
    sum: { name: 'Gain at the beam', value: numberText(known.gainAtBeamDbi, DIGITS), reason: null },
  };
}

function signed(value: number, plain: boolean): string {
  const text = numberText(value, DIGITS);
  return plain || value <= 0 || Number(value.toFixed(DIGITS)) === 0 ? text : `+${text}`;
}

/** Cross-polar figures in dB; none in the scalar model. */
export function crossPolarRows({ vector }: Figures): readonly VectorRow[] {
  if (!vector) return [];
  const { crossPolarDiscriminationDb, worstDiscriminationDb, highestCrossPolarDb, axialRatioDb } = vector;
  const several = crossPolarDiscriminationDb.length > 1;
  const isLinear = typeof axialRatioDb !== 'number' && axialRatioDb.kind === 'linear';
  return [
    ...crossPolarDiscriminationDb.map((figure, i) => row(several ? `XPD at beam ${i + 1}` : 'XPD at the beam', figure)),
    row('Worst XPD within half power', worstDiscriminationDb),
    row('Highest cross level there, to the peak', highestCrossPolarDb),
    ...(isLinear ? [] : [row('Axial ratio at the beam', axialRatioDb)]),
  ];
}

function row(name: string, figure: Figure): VectorRow {
  if (typeof figure !== 'number') return { name, value: '–', reason: figure.reason };
  if (figure > BY_SYMMETRY_DB) return { name, value: '> 100', reason: null };
  return { name, value: figure < -BY_SYMMETRY_DB ? '< −100' : numberText(figure, 2), reason: null };
}

const RERADIATION = { 'power-wave': 'power waves', aperture: 'aperture form' } as const;
const CELL_FACTOR = { none: 'no cell factor', normal: 'factor of a uniform cell', beam: 'cell factor about the beam' } as const;

/** Which model a prediction is by, in a few words. */
export function modelText(prediction: { readonly model?: string; readonly reradiation?: keyof typeof RERADIATION; readonly cellFactor?: keyof typeof CELL_FACTOR; readonly radiateExponent: number }): string {
  if (prediction.model !== 'vector') return `scalar model, radiate exponent ${prediction.radiateExponent}, after spillover and cell loss`;
  return `vector model, ${RERADIATION[prediction.reradiation ?? 'power-wave']}, ${CELL_FACTOR[prediction.cellFactor ?? 'none']}, gain against the power of the source`;
}
