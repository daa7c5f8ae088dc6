import { beamAperturePhaseRad } from '../../waves/conventions';
import type { ApertureLaw } from '../aperture-law';
import type { SiBeam, SiDesign } from '../si-design';
import { beamFrame } from './beam-frame';

/** Nearer to the axis than this there is no azimuth; its slope is taken at this radius instead of at none. */
const LEAST_RADIUS_M = 1e-9;

/** One beam with its spiral: phase at a point, and minus its gradient over k. */
interface SpiralBeam {
  readonly amplitude: number;
  phaseRad(wavenumber: number, xM: number, yM: number): number;
  cosines(wavenumber: number, xM: number, yM: number): readonly [number, number];
}

/**
 * Each beam's plane wave times exp(j order azimuth), the azimuth about the beam's own axis as seen along it. The far
 * field then turns its phase as often about the beam, and has a null on the axis. Several beams: the phase of the weighted sum.
 */
export function vortexLaw(design: SiDesign): ApertureLaw {
  if (design.synthesis.kind !== 'vortex') throw new TypeError('a vortex law needs a vortex');
  const { order } = design.synthesis;
  const beams = design.beams.map((beam) => spiralBeam(beam, order));
  return beams.length === 1 ? oneSpiral(beams[0]) : severalSpirals(beams);
}

function spiralBeam({ direction, amplitude, phaseRad }: SiBeam, order: number): SpiralBeam {
  const { across, upright } = beamFrame(direction);
  return {
    amplitude,
    phaseRad: (wavenumber, xM, yM) =>
      phaseRad + beamAperturePhaseRad(wavenumber, direction, xM, yM) + order * Math.atan2(xM * upright[0] + yM * upright[1], xM * across[0] + yM * across[1]),
    cosines: (wavenumber, xM, yM) => {
      const a = xM * across[0] + yM * across[1];
      const b = xM * upright[0] + yM * upright[1];
      const turn = order / (wavenumber * Math.max(a * a + b * b, LEAST_RADIUS_M * LEAST_RADIUS_M));
      return [direction.u - turn * (a * upright[0] - b * across[0]), direction.v - turn * (a * upright[1] - b * across[1])];
    },
  };
}

function oneSpiral(beam: SpiralBeam): ApertureLaw {
  return {
    phaseRad: (wavenumber, xM, yM) => beam.phaseRad(wavenumber, xM, yM),
    tangential: (wavenumber, xM, yM, out) => {
      [out.u, out.v] = beam.cosines(wavenumber, xM, yM);
    },
  };
}

function severalSpirals(beams: readonly SpiralBeam[]): ApertureLaw {
  return {
    phaseRad: (wavenumber, xM, yM) => {
      let [re, im] = [0, 0];
      for (const beam of beams) {
        const phase = beam.phaseRad(wavenumber, xM, yM);
        re += beam.amplitude * Math.cos(phase);
        im += beam.amplitude * Math.sin(phase);
      }
      return Math.atan2(im, re);
    },
    // As for several plane waves: with S the sum of terms s_b, the local cosines are Re(sum c_b s_b / S).
    tangential: (wavenumber, xM, yM, out) => {
      let [re, im, uRe, uIm, vRe, vIm] = [0, 0, 0, 0, 0, 0];
      for (const beam of beams) {
        const phase = beam.phaseRad(wavenumber, xM, yM);
        const [u, v] = beam.cosines(wavenumber, xM, yM);
        const [termRe, termIm] = [beam.amplitude * Math.cos(phase), beam.amplitude * Math.sin(phase)];
        re += termRe;
        im += termIm;
        uRe += u * termRe;
        uIm += u * termIm;
        vRe += v * termRe;
        vIm += v * termIm;
      }
      const power = Math.max(re * re + im * im, 1e-300);
      out.u = (uRe * re + uIm * im) / power;
      out.v = (vRe * re + vIm * im) / power;
    },
  };
}
