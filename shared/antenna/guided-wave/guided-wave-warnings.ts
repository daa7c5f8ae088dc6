import type { Warning } from '../../model/figures';
import { directionText } from '../angle-text';
import { shortestReciprocalPerM } from '../grating-lobes';
import type { SiDesign } from '../si-design';
import { unmodulatedLobes } from './guided-wave-figures';

/** The second lobe of resonant cells: visible from a period of lambda / (n + 1) on. */
export function guidedWaveWarnings(si: SiDesign, wavelengthM: number, resonant: boolean): Warning[] {
  const { illumination, panel } = si;
  if (illumination.kind !== 'guided-wave' || !resonant) return [];
  const limitMm = (1000 * wavelengthM) / (illumination.effectiveIndex + 1);
  const spacingMm = 1000 / shortestReciprocalPerM(panel.lattice);
  const lobes = unmodulatedLobes(si, wavelengthM);
  const somewhere = illumination.launch.kind === 'radial' ? spacingMm >= limitMm : lobes.length > 0;
  if (!somewhere) return [];
  const [lobe] = lobes;
  return [
    {
      code: 'unmodulated-lobe',
      pointer: '#/panel/lattice',
      severity: 'serious',
      message:
        `The constant part of resonant cells sends the guided wave out by itself${lobe ? ` at ${directionText(lobe.thetaDeg, lobe.phiDeg)}` : ''}, about as strong as the beam. ` +
        `Cells ${spacingMm.toFixed(3)} mm apart; below λ / (n + 1) = ${limitMm.toFixed(3)} mm there is no such lobe, whatever the direction of the wave.`,
      numbers: { spacingMm, limitMm, ...(lobe ? { thetaDeg: lobe.thetaDeg, phiDeg: lobe.phiDeg } : {}) },
    },
  ];
}
