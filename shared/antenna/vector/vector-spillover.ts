import { capturedShare, type CapturedShare } from '../horn-spillover';
import type { SiHorn, SiOutline } from '../si-design';
import { newLocalWave } from './local-wave';
import { vectorHornPower } from './vector-horn';
import { vectorWaveSampler } from './vector-light';

/**
 * Share of the horn's power, all polarisations, that hits the outline: the integral of |E|^2 cos(incidence) over the horn's
 * power, along the true edge. The density is |a|^2 of the local waves: |E_TE|^2 c + |E_TM|^2 c with E_TM c its tangential part.
 */
export function vectorCapturedShare(horn: SiHorn, outline: SiOutline): CapturedShare {
  const waveAt = vectorWaveSampler(horn);
  const wave = newLocalWave();
  const power = vectorHornPower(horn);
  return capturedShare(horn, outline, (xM, yM) => {
    const { teRe, teIm, tmRe, tmIm } = waveAt(xM, yM, wave);
    return (teRe * teRe + teIm * teIm + tmRe * tmRe + tmIm * tmIm) / power;
  });
}
