import type { Figure } from '../model/figures';
import { powerRatioToDb } from '../units/decibels';
import { wavenumberRadPerM } from '../waves/conventions';
import { apertureField } from './aperture-field';
import { apertureLosses, commonPhaseRad, phaseErrorsRad, type ApertureLosses } from './aperture-figures';
import type { CellResponses } from './cell-stock';
import { hornCapturedShare } from './horn-spillover';
import { noFigure, nothingLit, sumFigures } from './no-figure';
import type { PlacedDesign } from './place-cells';
import { radiationPattern, type RadiationPattern } from './radiation-pattern';
import { targetPhasesRad } from './target-phase';

/** A placed design in use at one frequency. */
export interface IlluminatedState {
  readonly placed: PlacedDesign;
  readonly frequencyHz: number;
  readonly wavenumber: number;
  readonly wavelengthM: number;
  readonly responses: CellResponses;
  /**
   * What this frequency needs of the cells: at the design frequency the target phase, elsewhere the phase of the same law
   * there with the reference phase that fits the cells best, since a constant common to all costs nothing.
   */
  readonly targetRad: Float64Array;
  readonly pattern: RadiationPattern;
  readonly losses: ApertureLosses;
  readonly spilloverDb: Figure;
  readonly spilloverUncertaintyDb: number;
  /** Gain less directivity. */
  readonly gainOffsetDb: Figure;
  readonly litCount: number;
}

export function illuminatedState(placed: PlacedDesign, frequencyGHz?: number): IlluminatedState {
  const { si, lattice, light, assignment, stock } = placed;
  const frequencyHz = frequencyGHz === undefined ? si.designFrequencyHz : frequencyGHz * 1e9;
  const wavenumber = wavenumberRadPerM(frequencyHz);
  const responses = stock.respond(assignment, frequencyHz);
  const targetRad = targetInUse(placed, responses, frequencyHz);
  const losses = apertureLosses(light, responses, phaseErrorsRad(responses.phaseRad, targetRad));
  const spillover = spilloverOf(placed);
  const captured = si.illumination.kind === 'horn' ? spillover.spilloverDb : 0;
  return {
    placed,
    frequencyHz,
    wavenumber,
    wavelengthM: (2 * Math.PI) / wavenumber,
    responses,
    targetRad,
    pattern: radiationPattern(apertureField(lattice, light, responses, wavenumber), wavenumber, si.radiateExponent),
    losses,
    ...spillover,
    gainOffsetDb: sumFigures(captured, losses.cellLossDb),
    litCount: light.amplitude.reduce((count, amplitude) => count + (amplitude > 0 ? 1 : 0), 0),
  };
}

function targetInUse(placed: PlacedDesign, responses: CellResponses, frequencyHz: number): Float64Array {
  const { si, law, lattice, light } = placed;
  if (frequencyHz === si.designFrequencyHz) return placed.targetRad;
  const bareRad = targetPhasesRad(law, lattice, light, wavenumberRadPerM(frequencyHz));
  const referenceRad = commonPhaseRad(responses.phaseRad, bareRad);
  return bareRad.map((rad) => rad + referenceRad);
}

function spilloverOf({ si }: PlacedDesign): { spilloverDb: Figure; spilloverUncertaintyDb: number } {
  if (si.illumination.kind !== 'horn') {
    return { spilloverDb: noFigure('plane-wave', 'a plane wave fills all space, so no share of it misses the panel'), spilloverUncertaintyDb: 0 };
  }
  const { fraction, uncertainty } = hornCapturedShare(si.illumination, si.panel.outline);
  if (fraction <= 0) return { spilloverDb: nothingLit(), spilloverUncertaintyDb: 0 };
  return { spilloverDb: Math.min(0, powerRatioToDb(fraction)), spilloverUncertaintyDb: powerRatioToDb(1 + uncertainty / fraction) };
}
