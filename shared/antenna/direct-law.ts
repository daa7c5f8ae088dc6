import { beamAperturePhaseRad } from '../waves/conventions';
import type { ApertureLaw } from './aperture-law';
import type { SiBeam, SiDesign } from './si-design';

/**
 * Each beam's plane wave: -k r.b for one beam, the phase of the weighted sum for several. Keeping only the phase of the
 * sum costs power: two equal beams come out 3.92 dB down each, not 3.01.
 */
export function directLaw(design: SiDesign): ApertureLaw {
  return design.beams.length === 1 ? oneBeamLaw(design.beams[0]) : severalBeamsLaw(design.beams);
}

function oneBeamLaw({ direction }: SiBeam): ApertureLaw {
  return {
    phaseRad: (wavenumber, xM, yM) => beamAperturePhaseRad(wavenumber, direction, xM, yM),
    tangential: (_wavenumber, _xM, _yM, out) => {
      out.u = direction.u;
      out.v = direction.v;
    },
  };
}

function severalBeamsLaw(beams: readonly SiBeam[]): ApertureLaw {
  return {
    phaseRad: (wavenumber, xM, yM) => {
      let re = 0;
      let im = 0;
      for (const beam of beams) {
        const phase = beam.phaseRad + beamAperturePhaseRad(wavenumber, beam.direction, xM, yM);
        re += beam.amplitude * Math.cos(phase);
        im += beam.amplitude * Math.sin(phase);
      }
      return Math.atan2(im, re);
    },
    // With S the sum of terms s_b and -grad(s_b) = j k b s_b, the local cosines are Re(sum b s_b / S).
    tangential: (wavenumber, xM, yM, out) => {
      let [re, im, uRe, uIm, vRe, vIm] = [0, 0, 0, 0, 0, 0];
      for (const { amplitude, phaseRad, direction } of beams) {
        const phase = phaseRad + beamAperturePhaseRad(wavenumber, direction, xM, yM);
        const termRe = amplitude * Math.cos(phase);
        const termIm = amplitude * Math.sin(phase);
        re += termRe;
        im += termIm;
        uRe += direction.u * termRe;
        uIm += direction.u * termIm;
        vRe += direction.v * termRe;
        vIm += direction.v * termIm;
      }
      // At a null of the sum there is no phase; the smallest number keeps the quotient a number.
      const power = Math.max(re * re + im * im, 1e-300);
      out.u = (uRe * re + uIm * im) / power;
      out.v = (vRe * re + vIm * im) / power;
    },
  };
}
