import type { Cells } from '../../model/design-document';
import { cellStock, type CellAssignment, type CellStock, type StockSite } from '../cell-stock';
import type { CellStates } from '../reference-search';
import { InvalidDesign } from '../invalid-design';
import { coPolarWeigher, type CoPolarWeigher } from './co-polar-weights';
import { isotropicStock } from './isotropic-stock';
import { matrixStock } from './matrix-stock';
import { NO_RAYS } from './vector-faults';
import { vectorLight, type VectorLight, type VectorWaves } from './vector-light';
import type { VectorForm } from './vector-pattern';
import type { PanelLattice } from '../panel-lattice';
import type { SiDesign } from '../si-design';

/** The cells of a design in the vector model. Phases and magnitudes are those of q, what a cell sends into the wanted beam. */
export interface VectorStock extends CellStock {
  /** Waves b that leave the placed cells, path phase left out. */
  leaving(assignment: CellAssignment, frequencyHz: number): VectorWaves;
  /** Turns the states that the scalar model lists at a position into what those cells send into the beam. */
  sendStates(n: number, states: CellStates): void;
}

export interface VectorSite extends StockSite {
  readonly waves: VectorLight;
  readonly form: VectorForm;
  readonly weigher: CoPolarWeigher;
}

/** What arrives at the cells of a design in the vector model, and how it is re-radiated. */
export interface VectorArrival {
  readonly waves: VectorLight;
  readonly form: VectorForm;
  readonly weigher: CoPolarWeigher;
  /** Arriving amplitude of what is re-radiated: it takes the place of the scalar one. */
  readonly amplitude: Float64Array;
}

/** What the vector model adds to the placing of a design's cells. */
export interface VectorPlacement extends VectorArrival {
  readonly stock: VectorStock;
}

/** Undefined where the design asks for the scalar model. */
export function vectorArrival({ illumination, vectorModel, beams }: SiDesign, lattice: Pick<PanelLattice, 'count' | 'xM' | 'yM'>): VectorArrival | undefined {
  if (!vectorModel) return undefined;
  if (illumination.kind === 'guided-wave') throw new InvalidDesign([NO_RAYS]);
  const form: VectorForm = { ...vectorModel, beam: beams[0].direction };
  const waves = vectorLight(illumination, lattice);
  const weigher = coPolarWeigher(waves, form);
  return { waves, form, weigher, amplitude: Float64Array.from({ length: lattice.count }, (_, n) => weigher.amplitudeAt(n)) };
}

/** Cells with a 2x2 response keep it; one response for all polarisations acts on both alike. */
export function vectorStock(cells: Cells, site: VectorSite): VectorStock {
  const hasMatrix = cells.kind === 'edition' && site.edition !== undefined && site.edition.ports.kind !== 'one';
  return hasMatrix ? matrixStock(cells, site) : isotropicStock(cellStock(cells, site), cells, site);
}
