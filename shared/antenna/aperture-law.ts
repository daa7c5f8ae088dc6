import type { CellIllumination } from './illumination';
import type { PanelLattice } from './panel-lattice';
import type { SiDesign } from './si-design';
import { directLaw } from './direct-law';
import { focusLaw } from './focus-law';
import type { BoardSearch } from './synthesis/diffuse-board';
import { diffuseLaw } from './synthesis/diffuse-law';
import type { ProjectionRun } from './synthesis/projection-run';
import { projectionsLaw } from './synthesis/projections-law';
import { vortexLaw } from './synthesis/vortex-law';

/** The wanted aperture field of a synthesis: what the cells must turn the incident field into. */
export interface ApertureLaw {
  /** Phase of the wanted field at a point, rad, continuous for one beam or a focus. */
  phaseRad(wavenumber: number, xM: number, yM: number): number;
  /** Tangential direction cosines of the wanted wave at a point: -grad(phase) / k. Written into `out`. */
  tangential(wavenumber: number, xM: number, yM: number, out: { u: number; v: number }): void;
  /** How alternating projections went, where they made the law. */
  readonly projections?: ProjectionRun;
  /** How the search for a diffuse board went, where it made the law. */
  readonly board?: BoardSearch;
}

/** Where a law is used, for those that are made of the whole panel at once. */
export interface LawSite {
  readonly lattice: PanelLattice;
  readonly light: CellIllumination;
  /** At the design frequency. */
  readonly wavenumber: number;
}

/** One line for each synthesis. */
const laws: { readonly [Kind in SiDesign['synthesis']['kind']]: (design: SiDesign, site?: LawSite) => ApertureLaw } = {
  direct: directLaw,
  focus: focusLaw,
  vortex: vortexLaw,
  projections: projectionsLaw,
  diffuse: diffuseLaw,
};

export function apertureLaw(design: SiDesign, site?: LawSite): ApertureLaw {
  return laws[design.synthesis.kind](design, site);
}
