import type { GuidedWaveFigures } from '../../model/law-figures';
import { degFromRad } from '../../units/angles';
import { amplitudeRatioToDb } from '../../units/decibels';
import { anglesOf, outwardDirection } from '../../waves/conventions';
import { gratingLobes } from '../grating-lobes';
import type { IlluminatedState } from '../illuminated-state';
import { noFigure } from '../no-figure';
import type { SiDesign, SiGuidedWave } from '../si-design';
import { guideLengthM } from './guided-wave-illumination';
import { leakedShare } from './leaked-power';

/** Figures of a guided wave: what leaks, what of it the cells put into the beam, and where the unmodulated part goes. */
export function guidedWaveFigures(state: IlluminatedState, wave: SiGuidedWave): GuidedWaveFigures {
  const { placed, wavelengthM } = state;
  const lengthM = guideLengthM(wave, placed.si.panel.outline);
  const { inPhase, efficiency } = modulation(state);
  return {
    lengthMm: lengthM * 1000,
    leakedShare: leakedShare(wave.leakageNpPerM, lengthM),
    beamRelativeDb: inPhase > 0 ? amplitudeRatioToDb(inPhase) : noFigure('cancels', 'the cells add up to nothing in the wanted direction'),
    modulationEfficiency: efficiency,
    unmodulatedLobes: unmodulatedLobes(placed.si, wavelengthM),
  };
}

/** |sum A alpha exp(-j target)| over sum A, and the share of the coupled power in it: |sum|^2 / (sum A)^2 over sum A^2|alpha|^2 / sum A^2. */
function modulation({ placed, responses }: IlluminatedState): { inPhase: number; efficiency: number } {
  const { light, targetRad } = placed;
  let [re, im, sum, squares, coupled] = [0, 0, 0, 0, 0];
  for (let n = 0; n < targetRad.length; n++) {
    const a = light.amplitude[n];
    const size = a * responses.magnitude[n];
    re += size * Math.cos(responses.phaseRad[n] - targetRad[n]);
    im += size * Math.sin(responses.phaseRad[n] - targetRad[n]);
    sum += a;
    squares += a * a;
    coupled += size * size;
  }
  const mean = sum > 0 ? Math.hypot(re, im) / sum : 0;
  return { inPhase: mean, efficiency: coupled > 0 ? (mean * mean * squares) / coupled : 0 };
}

/**
 * Directions into which the constant part j/2 of resonant cells re-radiates a plane guided wave: (n cos, n sin) plus the
 * vectors of the reciprocal lattice, those that are visible. A radial wave spreads it over all azimuths: none is listed.
 */
export function unmodulatedLobes(si: SiDesign, wavelengthM: number): { thetaDeg: number; phiDeg: number }[] {
  const { illumination, panel } = si;
  if (illumination.kind !== 'guided-wave' || illumination.launch.kind !== 'plane') return [];
  const { effectiveIndex, launch } = illumination;
  const reference = { u: effectiveIndex * Math.cos(launch.directionRad), v: effectiveIndex * Math.sin(launch.directionRad), w: 0 };
  const lobes = gratingLobes(panel.lattice, reference, wavelengthM).lobes.map(({ thetaDeg, phiDeg }) => ({ thetaDeg, phiDeg }));
  // A wave faster than in free space leaves by itself, whatever the cells.
  if (effectiveIndex > 1) return lobes;
  const { thetaRad, phiRad } = anglesOf(outwardDirection(reference.u, reference.v));
  return [{ thetaDeg: degFromRad(thetaRad), phiDeg: degFromRad(phiRad) }, ...lobes];
}
