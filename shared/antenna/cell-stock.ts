import type { Cells } from '../model/design-document';
import type { Warning } from '../model/figures';
import { editionStock } from './edition-stock';
import { resonantStock } from './guided-wave/resonant-stock';
import { idealStock } from './ideal-stock';
import type { CellIllumination } from './illumination';
import { modulatedStock } from './modulation/modulated-stock';
import { inlineStock } from './inline-stock';
import type { PreparedEdition } from './prepare-edition';
import type { SiDesign } from './si-design';

/** Complex response of the cell at each position: Gamma = magnitude exp(j phase). */
export interface CellResponses {
  /** Not wrapped where the source has a continuous phase. */
  readonly phaseRad: Float64Array;
  readonly magnitude: Float64Array;
}

/** Which cell stands where, and what it does at the design frequency. */
export interface CellAssignment extends CellResponses {
  /** Index into the edition's cells, the inline table or the ideal levels; -1 for a continuous ideal phase or where none fits. */
  readonly cellIndex: Int32Array;
  /** What a fit over the band has left at each of its frequencies, where cells were chosen so. */
  readonly band?: readonly { readonly frequencyHz: number; readonly errorRmsRad: number }[];
}

/** What the search for a reference phase needs: target phases and what each cell's unit response adds at the wanted beam. */
export interface ReferenceQuery {
  readonly targetRad: Float64Array;
  readonly weightRe: Float64Array;
  readonly weightIm: Float64Array;
}

/** The cells that a design may use, ready to be placed. */
export interface CellStock {
  /** Places a cell at every position, for targets that hold the reference phase already. */
  assign(targetRad: Float64Array): CellAssignment;
  /** What the placed cells do at another frequency. */
  respond(assignment: CellAssignment, frequencyHz: number): CellResponses;
  /** What the placed cells do at a harmonic of their switching, where they are switched in time. */
  harmonic?(assignment: CellAssignment, order: number): CellResponses;
  /** The reference phase that gives the most field, and so gain, at the wanted beam; the smallest of equal ones. */
  searchReferenceRad(query: ReferenceQuery): number;
  /** Remarks on what the cells' data cover, for the cells placed and the frequency of use. */
  warnings(assignment: CellAssignment, frequencyHz: number): Warning[];
}

/** Where and how the cells are used. */
export interface StockSite {
  readonly light: CellIllumination;
  readonly designFrequencyHz: number;
  readonly si: SiDesign;
  readonly edition?: PreparedEdition;
  /** Target phases at another frequency, reference phase not added; for rules that look at more than one. */
  targetAt?(frequencyHz: number): Float64Array;
}

type StockMaker<Kind extends Cells['kind']> = (cells: Extract<Cells, { kind: Kind }>, site: StockSite) => CellStock;

/** One line for each kind of cells. */
const stocks: { readonly [Kind in Cells['kind']]: StockMaker<Kind> } = {
  ideal: idealStock,
  inline: inlineStock,
  edition: editionStock,
  resonant: resonantStock,
  modulated: modulatedStock,
};

export function cellStock(cells: Cells, site: StockSite): CellStock {
  const make = stocks[cells.kind] as (c: Cells, s: StockSite) => CellStock;
  return make(cells, site);
}
