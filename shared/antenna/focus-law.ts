import type { ApertureLaw } from './aperture-law';
import type { SiDesign } from './si-design';

/** A wave that converges on a point f: phase k |f - r|, so that every path arrives in step. */
export function focusLaw(design: SiDesign): ApertureLaw {
  if (design.synthesis.kind !== 'focus') throw new TypeError('a focus law needs a focus');
  const { xM: focusX, yM: focusY, zM: focusZ } = design.synthesis.point;
  return {
    phaseRad: (wavenumber, xM, yM) => wavenumber * Math.hypot(focusX - xM, focusY - yM, focusZ),
    tangential: (_wavenumber, xM, yM, out) => {
      const distance = Math.hypot(focusX - xM, focusY - yM, focusZ);
      out.u = (focusX - xM) / distance;
      out.v = (focusY - yM) / distance;
    },
  };
}
