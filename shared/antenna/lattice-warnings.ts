import type { Figures, Warning } from '../model/figures';
import { degFromRad } from '../units/angles';
import { degreesText, directionText } from './angle-text';
import { shortestReciprocalPerM } from './grating-lobes';
import type { SiDesign } from './si-design';

export interface LatticeFacts {
  readonly si: SiDesign;
  readonly wavelengthM: number;
  readonly gratingLobeCount: number;
  readonly maxIncidenceRad: number;
  readonly figures: Figures;
}

const mm = (metres: number): number => metres * 1000;

/** Remarks that follow from periods and angles alone. */
export function latticeWarnings(facts: LatticeFacts): Warning[] {
  return [...gratingLobeWarning(facts), ...cellPeriodWarning(facts), ...evanescentWarning(facts)];
}

function gratingLobeWarning({ si, wavelengthM, gratingLobeCount, figures }: LatticeFacts): Warning[] {
  if (gratingLobeCount === 0) return [];
  const sine = Math.max(...si.beams.map(({ direction }) => Math.hypot(direction.u, direction.v)));
  // Keeps the first grating lobe out of visible space: d < lambda / (1 + sin theta), d = 1 over the shortest reciprocal vector.
  const limitMm = mm(wavelengthM / (1 + sine));
  const spacingMm = mm(1 / shortestReciprocalPerM(si.panel.lattice));
  const [lobe] = figures.gratingLobes;
  const where = directionText(lobe.thetaDeg, lobe.phiDeg);
  return [
    {
      code: 'grating-lobe',
      pointer: '#/panel/lattice',
      severity: 'warn',
      message:
        `The lattice repeats every ${spacingMm.toFixed(3)} mm; a beam at θ ${degreesText(degFromRad(Math.asin(Math.min(1, sine))))} has no grating lobe only below ` +
        `λ / (1 + sin θ) = ${limitMm.toFixed(3)} mm. ${gratingLobeCount === 1 ? 'One stands' : `${gratingLobeCount} stand, the first`} at ${where}.`,
      numbers: { count: gratingLobeCount, spacingMm, limitMm, thetaDeg: lobe.thetaDeg, phiDeg: lobe.phiDeg },
    },
  ];
}

function cellPeriodWarning({ si, wavelengthM, maxIncidenceRad }: LatticeFacts): Warning[] {
  if (si.illumination.kind === 'guided-wave') return [];
  // The cell itself must send back one order only at the steepest incidence: d < lambda / (1 + sin theta_inc).
  const limitMm = mm(wavelengthM / (1 + Math.sin(maxIncidenceRad)));
  const spacingMm = mm(1 / shortestReciprocalPerM(si.panel.lattice));
  if (spacingMm <= limitMm) return [];
  const maxIncidenceDeg = degFromRad(maxIncidenceRad);
  return [
    {
      code: 'cell-period',
      pointer: '#/panel/lattice',
      severity: 'warn',
      message:
        `At the largest angle of incidence, ${degreesText(maxIncidenceDeg)}, cells ${spacingMm.toFixed(3)} mm apart can scatter into a second order; ` +
        `below λ / (1 + sin θ) = ${limitMm.toFixed(3)} mm they cannot, whatever the azimuth.`,
      numbers: { spacingMm, limitMm, maxIncidenceDeg },
    },
  ];
}

function evanescentWarning({ si, figures }: LatticeFacts): Warning[] {
  const count = figures.evanescentCells;
  if (count === 0) return [];
  const share = count / figures.cellCount;
  const several = si.beams.length > 1 ? ' Where several beams nearly cancel, the phase of their sum changes faster than any travelling wave.' : '';
  return [
    {
      code: 'evanescent-beam',
      pointer: '#/requirement/beams',
      severity: share > 0.5 ? 'serious' : share > 0.05 ? 'warn' : 'note',
      message: `At ${count} of ${figures.cellCount} cells the wanted tangential wavenumber exceeds that of free space, so no wave leaves there as wanted.${several}`,
      numbers: { count, cellCount: figures.cellCount },
    },
  ];
}
