import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import type { LivePrediction } from '../live-prediction-data';
import type { EditionInUse } from '../workspace-state';
import { cellName } from './cell-name';
import { illuminationDb } from './chosen-cell';

export interface WorstRow {
  readonly cell: number;
  readonly place: string;
  readonly error: string;
  readonly stock: string;
  readonly illumination: string;
  readonly chosen: boolean;
}

export interface WorstTable {
  /** "-12.62° to +13.37°" */
  readonly range: string;
  /** Head of the column that names the cell, with its unit. */
  readonly stockHead: string;
  readonly rows: readonly WorstRow[];
}

export interface WorstSource {
  readonly prediction: LivePrediction;
  readonly edition: EditionInUse | null;
  /** Worst first. */
  readonly worst: readonly number[];
  readonly chosen: number | null;
  readonly brightest: number;
}

/** The worst cells; the chosen one takes the last row when it is not among them. */
export function worstRows({ prediction, edition, worst, chosen, brightest }: WorstSource): WorstTable {
  const { cells, of } = prediction;
  const listed = chosen === null || worst.includes(chosen) ? worst : [...worst.slice(0, -1), chosen];
  const first = of.panel.lattice.kind === 'rectangular' ? 1 : 0;
  const stockText = (index: number): string => cellName(of, edition, index).replace(/ mm$/, '');
  let [low, high] = [0, 0];
  for (let i = 0; i < cells.errorDeg.length; i++) {
    low = Math.min(low, cells.errorDeg[i]);
    high = Math.max(high, cells.errorDeg[i]);
  }
  return {
    range: `${signedNumberText(low, 2)}° to ${signedNumberText(high, 2)}°`,
    stockHead: edition ? 'Cell, mm' : 'Cell',
    rows: listed.map((cell) => ({
      cell,
      place: `${numberText(cells.column[cell] + first, 0)}, ${numberText(cells.row[cell] + first, 0)}`,
      error: signedNumberText(cells.errorDeg[cell], 2),
      stock: stockText(cells.cellIndex[cell]),
      illumination: numberText(illuminationDb(cells.amplitude[cell], brightest), 1),
      chosen: cell === chosen,
    })),
  };
}
