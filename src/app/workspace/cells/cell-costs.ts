import type { Figure } from '../../../../shared/model/figures';
import type { LivePrediction } from '../live-prediction-data';
import { figureText } from '../strip-figures';

export interface CellCost {
  readonly name: string;
  readonly value: string;
}

/** An error from here up is counted: it costs a cell 3.4 % of its power in the beam's direction. */
const NOTABLE_ERROR_DEG = 15;

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
    { name: 'Reference phase in use', value: `${figureText(figures.referencePhaseDeg, 1)}°` },
  ];
}
