import { illuminateCells } from '../../../shared/antenna/illumination';
import { panelTargetPhase } from '../../../shared/antenna/panel-target-phase';
import { siDesign } from '../../../shared/antenna/si-design';
import type { DesignDocument } from '../../../shared/model/design-document';
import { radFromDeg } from '../../../shared/units/angles';
import { directionOf, wavenumberRadPerM } from '../../../shared/waves/conventions';

/** Where the wave is sampled: points of the plane y = 0 above the panel, row by row from the lowest. */
export interface SectionGrid {
  readonly fromXM: number;
  readonly fromZM: number;
  readonly stepM: number;
  readonly columns: number;
  readonly rows: number;
}

/**
 * The wave that the cells send out, sampled, with the carrier of its first beam taken off: what is left varies slowly,
 * so that straight lines between samples three eighths of a wavelength apart follow it.
 */
export interface OutgoingField {
  readonly grid: SectionGrid;
  readonly real: Float32Array;
  readonly imaginary: Float32Array;
  readonly wavenumber: number;
  /** Direction cosines of the carrier along x and z. */
  readonly beamU: number;
  readonly beamW: number;
  readonly largest: number;
}

const TURN = 4096;
const COSINES = Float32Array.from({ length: TURN + TURN / 4 }, (_, i) => Math.cos((2 * Math.PI * i) / TURN));

/**
 * Sum over the cells of a_n exp(j(psi_n - k R_n)) exp(-j k r_n) / r_n, with psi the target phase and R the path from the
 * horn. Every cell counts as equal in all directions. Phases come from a table of 4096 steps: good for a drawing.
 */
export function outgoingField(design: DesignDocument, grid: SectionGrid): OutgoingField {
  const si = siDesign(design);
  const { lattice, targetPhaseDeg } = panelTargetPhase(design);
  const light = illuminateCells(si.illumination, lattice, si.receiveExponent);
  const wavenumber = wavenumberRadPerM(si.designFrequencyHz);
  const { thetaDeg, phiDeg } = design.requirement.beams[0];
  const { u: beamU, w: beamW } = directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg));
  const perRad = TURN / (2 * Math.PI);
  const startSteps = Float64Array.from(lattice.xM, (_, n) => (radFromDeg(targetPhaseDeg[n]) - wavenumber * light.pathM[n]) * perRad);
  const real = new Float32Array(grid.columns * grid.rows);
  const imaginary = new Float32Array(real.length);
  let largest = 0;
  for (let at = 0; at < real.length; at++) {
    const xM = grid.fromXM + (at % grid.columns) * grid.stepM;
    const zM = grid.fromZM + Math.floor(at / grid.columns) * grid.stepM;
    const carrierSteps = wavenumber * (beamU * xM + beamW * zM) * perRad;
    let [re, im] = [0, 0];
    for (let n = 0; n < lattice.count; n++) {
      const dx = xM - lattice.xM[n];
      const r = Math.sqrt(dx * dx + lattice.yM[n] * lattice.yM[n] + zM * zM);
      const step = (startSteps[n] - wavenumber * perRad * r + carrierSteps) & (TURN - 1);
      const weight = light.amplitude[n] / r;
      re += weight * COSINES[step];
      // sin(x) = cos(x - a quarter turn) = cos(x + three quarters of a turn)
      im += weight * COSINES[(step + (3 * TURN) / 4) & (TURN - 1)];
    }
    real[at] = re;
    imaginary[at] = im;
    largest = Math.max(largest, Math.hypot(re, im));
  }
  return { grid, real, imaginary, wavenumber, beamU, beamW, largest };
}
