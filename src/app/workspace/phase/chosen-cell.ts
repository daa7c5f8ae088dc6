import type { CellChoice } from '../../../../shared/antenna/cell-choices';
import { degFromRad, wrapDeg } from '../../../../shared/units/angles';
import { amplitudeRatioToDb } from '../../../../shared/units/decibels';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import type { LivePrediction } from '../live-prediction-data';
import type { EditionInUse } from '../workspace-state';
import { cellName, editionOf } from './cell-name';
import { emptyPlaces } from './empty-places';

/** One line of the list of facts. `tone` is for what is yours (copper) or wants attention (warn). */
export interface CellFact {
  readonly name: string;
  readonly value: string;
  readonly tone: 'plain' | 'copper' | 'warn';
  /** The number in full, for copying. */
  readonly full?: string;
}

export interface CellFactSource {
  readonly prediction: LivePrediction;
  readonly edition: EditionInUse | null;
  readonly cell: number;
  /** Best first. */
  readonly choices: readonly CellChoice[];
  /** Largest amplitude on the panel. */
  readonly brightest: number;
}

/** Columns and rows are counted from 1, as on drawings; those of a triangular lattice from its middle. */
export function cellPlaceText({ cells, of }: LivePrediction, cell: number): string {
  const first = of.panel.lattice.kind === 'rectangular' ? 1 : 0;
  return `col ${numberText(cells.column[cell] + first, 0)}, row ${numberText(cells.row[cell] + first, 0)}`;
}

export function illuminationDb(amplitude: number, brightest: number): number {
  return amplitude > 0 && brightest > 0 ? amplitudeRatioToDb(amplitude / brightest) : -200;
}

/** Everything about one cell, in the order of the picture. */
export function cellFacts(source: CellFactSource): readonly CellFact[] {
  const { prediction, cell, brightest } = source;
  const { cells, of } = prediction;
  const plain = (name: string, value: string, full?: number): CellFact => ({ name, value, tone: 'plain', ...(full === undefined ? {} : { full: String(full) }) });
  return [
    plain('Position', cellPlaceText(prediction, cell)),
    plain('x, y', `${numberText(cells.xMm[cell], 2)}, ${numberText(cells.yMm[cell], 2)} mm`),
    plain('Target phase', `${numberText(wrapDeg(cells.targetPhaseDeg[cell]), 1)}°`, wrapDeg(cells.targetPhaseDeg[cell])),
    plain('Cell', cellName(of, source.edition, cells.cellIndex[cell])),
    ...(emptyPlaces(prediction)(cell) ? [plain('Cell phase', '–'), plain('Phase error', 'none: no cell may stand here'), plain('Response', 'none')] : responseFacts(source)),
    plain('Illumination', `${numberText(illuminationDb(cells.amplitude[cell], brightest), 2)} dB`, illuminationDb(cells.amplitude[cell], brightest)),
    incidenceFact(source),
  ];
}

function responseFacts(source: CellFactSource): readonly CellFact[] {
  const { cells } = source.prediction;
  const [phaseDeg, errorDeg, responseDb] = [wrapDeg(cells.phaseDeg[source.cell]), cells.errorDeg[source.cell], cells.responseDb[source.cell]];
  return [
    { name: 'Cell phase', value: `${numberText(phaseDeg, 1)}°`, tone: 'plain', full: String(phaseDeg) },
    { name: 'Phase error', value: `${signedNumberText(errorDeg, 2)}°`, tone: 'copper', full: String(errorDeg) },
    { name: 'Next best', value: nextBestText(source), tone: 'plain' },
    { name: 'Response', value: `${numberText(responseDb, 2)} dB`, tone: 'plain', full: String(responseDb) },
  ];
}

function nextBestText({ prediction, edition, cell, choices }: CellFactSource): string {
  const { cells, of } = prediction;
  if (of.cells.kind === 'ideal' && of.cells.levels === null) return 'none, the phase is continuous';
  const next = choices.find(({ cellIndex }) => cellIndex !== cells.cellIndex[cell]);
  return next ? `${cellName(of, edition, next.cellIndex)}, ${signedNumberText(next.errorDeg, 2)}°` : '–';
}

/** Cell data used beyond the angles they were taken at are said so, cell by cell. */
function incidenceFact({ prediction, edition, cell }: CellFactSource): CellFact {
  const { cells, of } = prediction;
  const incidence = cells.incidenceDeg[cell];
  const text = `${numberText(incidence, 1)}°`;
  const own = editionOf(of, edition);
  if (!own) return { name: 'Incidence', value: text, tone: 'plain', full: String(incidence) };
  const { thetasRad } = own.responses;
  const [smallest, steepest] = [degFromRad(thetasRad[0]), degFromRad(thetasRad[thetasRad.length - 1])];
  // Over two degrees the response of no cell moves by more than its own uncertainty.
  const covered = incidence >= smallest - 2 && incidence <= steepest + 2;
  if (covered) return { name: 'Incidence', value: `${text}, covered`, tone: 'plain', full: String(incidence) };
  const data = smallest === steepest ? `data at ${numberText(smallest, 0)}°` : `data ${numberText(smallest, 0)} to ${numberText(steepest, 0)}°`;
  return { name: 'Incidence', value: `${text}, ${data}`, tone: 'warn', full: String(incidence) };
}

/** The short form for the line under the map. */
export function cellSentence(prediction: LivePrediction, cell: number): string {
  const { cells } = prediction;
  if (emptyPlaces(prediction)(cell)) return `${cellPlaceText(prediction, cell)}: target ${numberText(wrapDeg(cells.targetPhaseDeg[cell]), 1)}°, no cell may stand here`;
  return `${cellPlaceText(prediction, cell)}: target ${numberText(wrapDeg(cells.targetPhaseDeg[cell]), 1)}°, error ${signedNumberText(cells.errorDeg[cell], 2)}°`;
}
