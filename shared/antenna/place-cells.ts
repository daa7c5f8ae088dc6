import type { DesignDocument } from '../model/design-document';
import { wavenumberRadPerM } from '../waves/conventions';
import { apertureLaw, type ApertureLaw } from './aperture-law';
import { cellStock, type CellAssignment, type CellStock } from './cell-stock';
import { checkDesign } from './design-faults';
import { shadowOf } from './feed/blocked-state';
import { openVectorStock } from './feed/open-vector-stock';
import { illuminateCells, type CellIllumination } from './illumination';
import { panelLattice, type PanelLattice } from './panel-lattice';
import type { PreparedEdition } from './prepare-edition';
import { siDesign, type SiDesign } from './si-design';
import { targetPhasesRad } from './target-phase';
import { vectorArrival, vectorStock, type VectorPlacement } from './vector/vector-stock';

/** A design with its cells placed: everything that does not depend on the frequency of use. */
export interface PlacedDesign {
  readonly design: DesignDocument;
  readonly si: SiDesign;
  readonly designWavenumber: number;
  readonly lattice: PanelLattice;
  readonly light: CellIllumination;
  readonly law: ApertureLaw;
  readonly stock: CellStock;
  /** The number given, or the one that the search found. */
  readonly referencePhaseRad: number;
  /** At the design frequency, reference phase included. */
  readonly targetRad: Float64Array;
  readonly assignment: CellAssignment;
  /** The edition that the cells are of, where they are of one. */
  readonly edition?: PreparedEdition;
  /** 1 for the cells in the shadow of horn and mount, where those are described. */
  readonly shadow?: Uint8Array;
  /** Present where the vector model is in use; responses are then what the cells send into the beam. */
  readonly vector?: VectorPlacement;
}

/** Places the cells of a design, at its design frequency. Throws InvalidDesign. */
export function placeCells(design: DesignDocument, edition?: PreparedEdition): PlacedDesign {
  checkDesign(design);
  const si = siDesign(design);
  const designWavenumber = wavenumberRadPerM(si.designFrequencyHz);
  const lattice = panelLattice(si.panel);
  const arrival = vectorArrival(si, lattice);
  const scalarLight = illuminateCells(si.illumination, lattice, si.receiveExponent);
  const light = arrival ? { ...scalarLight, amplitude: arrival.amplitude } : scalarLight;
  const law = apertureLaw(si, { lattice, light, wavenumber: designWavenumber });
  const bareTargetRad = targetPhasesRad(law, lattice, light, designWavenumber);
  const targetAt = (hz: number): Float64Array => targetPhasesRad(law, lattice, light, wavenumberRadPerM(hz));
  const site = { light, designFrequencyHz: si.designFrequencyHz, si, edition, targetAt };
  const shadow = shadowOf(si, lattice);
  const vector = arrival && { ...arrival, stock: openVectorStock(vectorStock(design.cells, { ...site, ...arrival }), shadow) };
  const stock = vector?.stock ?? cellStock(design.cells, site);
  const referencePhaseRad =
    si.referencePhaseRad === 'search'
      ? stock.searchReferenceRad({ targetRad: bareTargetRad, ...beamWeights({ si, lattice, light, wavenumber: designWavenumber }) })
      : si.referencePhaseRad;
  const targetRad = bareTargetRad.map((rad) => rad + referencePhaseRad);
  return { design, si, designWavenumber, lattice, light, law, stock, referencePhaseRad, targetRad, assignment: stock.assign(targetRad), ...(vector ? { vector } : {}), ...(shadow ? { shadow } : {}), ...(edition ? { edition } : {}) };
}

interface WeightQuery {
  readonly si: SiDesign;
  readonly lattice: PanelLattice;
  readonly light: CellIllumination;
  readonly wavenumber: number;
}

/** What a cell of unit response adds to the field at the first wanted beam: A exp(j(-k path + k r.b)). */
function beamWeights({ si, lattice, light, wavenumber }: WeightQuery): { weightRe: Float64Array; weightIm: Float64Array } {
  const { u, v } = si.beams[0].direction;
  const weightRe = new Float64Array(lattice.count);
  const weightIm = new Float64Array(lattice.count);
  for (let n = 0; n < lattice.count; n++) {
    const phase = wavenumber * (lattice.xM[n] * u + lattice.yM[n] * v - light.pathM[n]);
    weightRe[n] = light.amplitude[n] * Math.cos(phase);
    weightIm[n] = light.amplitude[n] * Math.sin(phase);
  }
  return { weightRe, weightIm };
}
