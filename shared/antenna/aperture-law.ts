import type { SiDesign } from './si-design';
import { directLaw } from './direct-law';
import { focusLaw } from './focus-law';
import { vortexLaw } from './synthesis/vortex-law';

/** The wanted aperture field of a synthesis: what the cells must turn the incident field into. */
export interface ApertureLaw {
  /** Phase of the wanted field at a point, rad, continuous for one beam or a focus. */
  phaseRad(wavenumber: number, xM: number, yM: number): number;
  /** Tangential direction cosines of the wanted wave at a point: -grad(phase) / k. Written into `out`. */
  tangential(wavenumber: number, xM: number, yM: number, out: { u: number; v: number }): void;
}

/** One line for each synthesis. */
const laws: { readonly [Kind in SiDesign['synthesis']['kind']]: (design: SiDesign) => ApertureLaw } = {
  direct: directLaw,
  focus: focusLaw,
  vortex: vortexLaw,
};

export function apertureLaw(design: SiDesign): ApertureLaw {
  return laws[design.synthesis.kind](design);
}
