import type { DesignDocument } from '../model/design-document';
import { radFromDeg } from '../units/angles';
import { wavenumberRadPerM } from '../waves/conventions';
import { apertureLaw } from './aperture-law';
import { checkDesign } from './design-faults';
import { illuminateCells } from './illumination';
import { panelLattice, type PanelLattice } from './panel-lattice';
import { siDesign } from './si-design';
import { targetPhasesRad } from './target-phase';
import { phaseInTurnDeg } from './cell-arrays';

/** Target phases without cells or pattern: cheap enough for thumbnails. */
export interface PanelTargetPhase {
  readonly lattice: PanelLattice;
  /** In [0, 360), a given reference phase included; one that is to be searched counts as 0. */
  readonly targetPhaseDeg: Float32Array;
}

/** Throws InvalidDesign. */
export function panelTargetPhase(design: DesignDocument): PanelTargetPhase {
  checkDesign(design);
  const si = siDesign(design);
  const lattice = panelLattice(si.panel);
  const light = illuminateCells(si.illumination, lattice, si.receiveExponent);
  const wavenumber = wavenumberRadPerM(si.designFrequencyHz);
  const targetRad = targetPhasesRad(apertureLaw(si, { lattice, light, wavenumber }), lattice, light, wavenumber);
  const referenceRad = design.referencePhaseDeg === 'search' ? 0 : radFromDeg(design.referencePhaseDeg);
  return { lattice, targetPhaseDeg: Float32Array.from(targetRad, (rad) => phaseInTurnDeg(rad + referenceRad)) };
}
