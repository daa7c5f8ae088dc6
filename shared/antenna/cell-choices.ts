import { degFromRad, wrapRad } from '../units/angles';
import { amplitudeRatioToDb } from '../units/decibels';
import { phaseInTurnDeg } from './cell-arrays';
import { complexError } from './edition-choice';
import { editionSite, stateFiller } from './edition-stock';
import { coupledField } from './guided-wave/resonant-cell';
import { FLOOR_DBI } from './pattern-cut';
import type { PlacedDesign } from './place-cells';
import type { PreparedEdition } from './prepare-edition';
import { newCellStates, type CellStates } from './reference-search';
import { radFromDeg } from '../units/angles';
import type { VectorStock } from './vector/vector-stock';

/** One cell that could stand at a position, at that position's angle of incidence and the design frequency. */
export interface CellChoice {
  readonly cellIndex: number;
  readonly phaseDeg: number;
  /** Achieved minus target, in (-180, 180]. */
  readonly errorDeg: number;
  readonly responseDb: number;
  /** |Gamma - exp(j target)|. */
  readonly complexError: number;
}

/** What the choice at a position needs of a placed design; light and targets may be those of a few positions alone. */
export type ChoiceSite = Pick<PlacedDesign, 'design' | 'si' | 'light' | 'targetRad'> & {
  /** In the vector model, what cells send into the beam. */
  readonly vector?: { readonly stock: Pick<VectorStock, 'sendStates'> };
};

/** The three cells that come nearest at one position, best first by the design's own rule. None for a continuous ideal phase. */
export function cellChoices(placed: ChoiceSite, position: number, edition?: PreparedEdition): CellChoice[] {
  if (!Number.isInteger(position) || position < 0 || position >= placed.targetRad.length) {
    throw new RangeError(`the panel has positions 0 to ${placed.targetRad.length - 1}; got ${position}`);
  }
  const targetRad = placed.targetRad[position];
  const states = statesOf(placed, position, edition);
  placed.vector?.stock.sendStates(position, states);
  const { cells } = placed.design;
  const byLoss = cells.kind === 'resonant' || (cells.kind === 'edition' && cells.rule === 'least-error');
  const choices = Array.from({ length: states.count }, (_, i) => choiceOf(states, i, targetRad));
  const measure = (choice: CellChoice): number => (byLoss ? choice.complexError : Math.abs(choice.errorDeg));
  // Equal up to rounding: the smallest index first, as in the assignment.
  choices.sort((a, b) => (Math.abs(measure(a) - measure(b)) < 1e-7 ? a.cellIndex - b.cellIndex : measure(a) - measure(b)));
  return choices.slice(0, 3);
}

function choiceOf(states: CellStates, i: number, targetRad: number): CellChoice {
  const response = { magnitude: states.magnitude[i], phaseRad: states.phaseRad[i] };
  return {
    cellIndex: states.index[i],
    phaseDeg: phaseInTurnDeg(response.phaseRad),
    errorDeg: degFromRad(wrapRad(response.phaseRad - targetRad)),
    responseDb: response.magnitude > 0 ? Math.max(FLOOR_DBI, amplitudeRatioToDb(response.magnitude)) : FLOOR_DBI,
    complexError: complexError(response, targetRad),
  };
}

function statesOf(placed: ChoiceSite, position: number, edition?: PreparedEdition): CellStates {
  const { cells } = placed.design;
  if (cells.kind === 'edition') {
    const site = editionSite(cells, { light: placed.light, designFrequencyHz: placed.si.designFrequencyHz, si: placed.si, edition });
    const states = newCellStates(site.edition.edition.cells.length);
    stateFiller(site, site.permitted.at)(position, states);
    return states;
  }
  if (cells.kind === 'inline') {
    return tableStates(cells.cells.map((cell) => radFromDeg(cell.phaseDeg)), cells.cells.map((cell) => cell.magnitude));
  }
  if (cells.kind === 'resonant') return resonantStates(cells.states ?? 0);
  // A delay is continuous: there is nothing to choose from.
  if (cells.kind === 'modulated') return tableStates([], []);
  const count = cells.levels ?? 0;
  return tableStates(Array.from({ length: count }, (_, i) => (2 * Math.PI * i) / count), new Array<number>(count).fill(1));
}

function resonantStates(count: number): CellStates {
  const fields = Array.from({ length: count }, (_, k) => coupledField((2 * Math.PI * k) / count, { magnitude: 0, phaseRad: 0 }));
  return tableStates(fields.map(({ phaseRad }) => phaseRad), fields.map(({ magnitude }) => magnitude));
}

function tableStates(phasesRad: readonly number[], magnitudes: readonly number[]): CellStates {
  return {
    count: phasesRad.length,
    index: Int32Array.from(phasesRad.keys()),
    phaseRad: Float64Array.from(phasesRad),
    magnitude: Float64Array.from(magnitudes),
  };
}
