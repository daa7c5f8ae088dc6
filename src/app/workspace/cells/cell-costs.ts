import type { Figure } from '../../../../shared/model/figures';
import type { LivePrediction } from '../live-prediction-data';
import { figureText } from '../strip-figures';

export interface CellCost {
  readonly name: string;
  readonly value: string;
}

/** An error from here up is counted: it costs a cell 3.4 % of its power in the beam's direction. */
const NOTABLE_ERROR_DEG = 15;

/** What only a band fit or a limit between neighbours has. */
function assignmentCosts({ assignment }: LivePrediction['head']['figures']): readonly CellCost[] {
  const band = (assignment?.band ?? []).map(({ frequencyGHz, phaseErrorRmsDeg }) => ({ name: `Band fit at ${figureText(frequencyGHz, 3)} GHz, RMS`, value: `${figureText(phaseErrorRmsDeg, 2)}°` }));
  const neighbours = assignment?.neighbours;
  if (!neighbours) return band;
  const { violations, pairs, largestMm } = neighbours;
  return [...band, { name: 'Steps to a neighbour beyond the limit', value: `${figureText(violations, 0)} of ${figureText(pairs, 0)}; the largest ${figureText(largestMm, 2)} mm` }];
}

/** What the choice of cells costs against ideal continuous ones. */
export function cellCosts({ head, cells }: LivePrediction): readonly CellCost[] {
  const { figures } = head;
  const shown = (figure: Figure, digits: number, unit: string): string => (typeof figure === 'number' ? `${figureText(figure, digits)}${unit}` : `– (${figure.reason})`);
  let largest = 0;
  let notable = 0;
  for (let i = 0; i < cells.errorDeg.length; i += 1) {
    const size = Math.abs(cells.errorDeg[i]);
    largest = Math.max(largest, size);
    if (size > NOTABLE_ERROR_DEG) notable += 1;
  }
  return [
    { name: 'RMS phase error', value: shown(figures.phaseErrorRmsDeg, 2, '°') },
    { name: 'Largest phase error', value: `${figureText(largest, 2)}°` },
    { name: `Cells off by more than ${NOTABLE_ERROR_DEG}°`, value: `${figureText(notable, 0)} of ${figureText(figures.cellCount, 0)}` },
    { name: 'Phase loss', value: shown(figures.phaseLossDb, 3, ' dB') },
    { name: 'Cell loss', value: shown(figures.cellLossDb, 3, ' dB') },
    ...assignmentCosts(figures),
    { name: 'Reference phase in use', value: `${figureText(figures.referencePhaseDeg, 1)}°` },
  ];
}
