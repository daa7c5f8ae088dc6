import type { AssignmentFigures } from '../../model/law-figures';
import { degFromRad } from '../../units/angles';
import type { PlacedDesign } from '../place-cells';
import { neighbourSteps } from './neighbour-steps';

/** Figures of the choice of cells that only some rules and limits have; undefined where there are none. */
export function assignmentFigures({ design, assignment, lattice, edition }: PlacedDesign): AssignmentFigures | undefined {
  const { cells } = design;
  const band = assignment.band?.map(({ frequencyHz, errorRmsRad }) => ({ frequencyGHz: frequencyHz / 1e9, phaseErrorRmsDeg: degFromRad(errorRmsRad) }));
  const limitMm = cells.kind === 'edition' ? cells.neighbourStepMm : undefined;
  const neighbours = limitMm !== undefined && edition ? neighbourSteps({ lattice, cellIndex: assignment.cellIndex, cells: edition.edition.cells, limitMm }) : undefined;
  return band || neighbours ? { ...(band ? { band } : {}), ...(neighbours ? { neighbours } : {}) } : undefined;
}
