import type { TangentialField } from './reradiation';

/**
 * Angle, from x towards y, by which a cell must be turned so that the sense of circular polarisation that it keeps leaves with the phase
 * 0 at the beam: psi = -arg(s)/2 for rhcp and +arg(s)/2 for lhcp, with s the incident circular component times exp(j beam phase).
 * The component of rhcp is E.(x - j y)/sqrt 2 for a wave that travels along -z. Determined up to half a turn.
 */
export function cellRotationRad({ x, y }: TangentialField, beamPhaseRad: number, sense: 'rhcp' | 'lhcp'): number {
  const sign = sense === 'rhcp' ? 1 : -1;
  const re = x.re + sign * y.im;
  const im = x.im - sign * y.re;
  return (-sign * (Math.atan2(im, re) + beamPhaseRad)) / 2;
}
