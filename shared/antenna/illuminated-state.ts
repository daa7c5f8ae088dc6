import type { Figure } from '../model/figures';
import type { BlockageFigures } from '../model/law-figures';
import { wavenumberRadPerM } from '../waves/conventions';
import { apertureField } from './aperture-field';
import { apertureLosses, commonPhaseRad, phaseErrorsRad, type ApertureLosses } from './aperture-figures';
import { capturedPower, countedCellLossDb } from './captured-power';
import type { CellResponses } from './cell-stock';
import { blockageFigures, openResponses } from './feed/blocked-state';
import { noFigure, sumFigures } from './no-figure';
import type { PlacedDesign } from './place-cells';
import { radiationPattern, type RadiationPattern } from './radiation-pattern';
import { targetPhasesRad } from './target-phase';
import type { VectorPlacement } from './vector/vector-stock';
import { vectorState, type VectorState } from './vector/vector-state';

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
  /** The harmonic asked for, of time-modulated cells. */
  readonly harmonic?: number;
  /** Present where horn and mount are described. */
  readonly blockage?: BlockageFigures;
  /** Present where the vector model is in use; `pattern` is then its co-polar part. */
  readonly vector?: VectorState;
}

/** `harmonic` is that of time-modulated cells, the steered one when absent; others have none. */
export function illuminatedState(placed: PlacedDesign, frequencyGHz?: number, harmonic?: number): IlluminatedState {
  const { si, lattice, light, assignment, stock } = placed;
  const frequencyHz = frequencyGHz === undefined ? si.designFrequencyHz : frequencyGHz * 1e9;
  const wavenumber = wavenumberRadPerM(frequencyHz);
  const responses = harmonic !== undefined && stock.harmonic ? stock.harmonic(assignment, harmonic) : stock.respond(assignment, frequencyHz);
  const targetRad = targetInUse(placed, responses, frequencyHz);
  const losses = apertureLosses(light, responses, phaseErrorsRad(responses.phaseRad, targetRad));
  if (placed.vector) return vectorLit({ placed, vector: placed.vector, frequencyHz, wavenumber, responses, targetRad, losses });
  const open = openResponses(responses, placed.shadow);
  const blockage = blockageOf(placed, responses, wavenumber);
  const { capturedDb, ...spillover } = capturedPower(si);
  const cellLossDb = countedCellLossDb(placed.design.cells, losses.cellLossDb);
  return {
    placed,
    frequencyHz,
    wavenumber,
    wavelengthM: (2 * Math.PI) / wavenumber,
    responses,
    targetRad,
    pattern: radiationPattern(apertureField(lattice, light, open, wavenumber), wavenumber, si.radiateExponent),
    losses: { ...losses, cellLossDb },
    ...spillover,
    gainOffsetDb: placed.design.cells.kind === 'resonant' ? capturedDb : sumFigures(capturedDb, cellLossDb, blockage?.powerDb ?? 0),
    ...(blockage ? { blockage } : {}),
    ...(harmonic === undefined ? {} : { harmonic }),
    litCount: litCells(light.amplitude),
  };
}

function blockageOf({ si, lattice, light, shadow }: PlacedDesign, responses: CellResponses, wavenumber: number): BlockageFigures | undefined {
  return shadow && blockageFigures({ si, lattice, light, responses, shadow, wavenumber });
}

function litCells(amplitude: Float64Array): number {
  return amplitude.reduce((count, size) => count + (size > 0 ? 1 : 0), 0);
}

interface LitVector extends Pick<IlluminatedState, 'placed' | 'frequencyHz' | 'wavenumber' | 'responses' | 'targetRad' | 'losses'> {
  readonly vector: VectorPlacement;
}

/** The same by the vector model: powers of all polarisations, the co-polar pattern, phase errors of what goes to the beam. */
function vectorLit({ placed, vector, frequencyHz, wavenumber, responses, targetRad, losses }: LitVector): IlluminatedState {
  const state = vectorState({ ...placed, vector }, frequencyHz, wavenumber);
  const blockage = blockageOf(placed, responses, wavenumber);
  const { result, spilloverDb, spilloverUncertaintyDb, gainOffsetDb, cellLossDb } = state;
  return {
    placed,
    frequencyHz,
    wavenumber,
    wavelengthM: (2 * Math.PI) / wavenumber,
    responses,
    targetRad,
    pattern: state.pattern.co,
    losses: { ...losses, cellLossDb, phaseErrorRmsDeg: result?.phaseErrorRmsDeg ?? losses.phaseErrorRmsDeg },
    spilloverDb,
    spilloverUncertaintyDb,
    gainOffsetDb,
    litCount: litCells(placed.light.amplitude),
    vector: state,
    ...(blockage ? { blockage: { ...blockage, powerDb: noFigure('vector-model', 'in the vector model it is part of the cell loss') } } : {}),
  };
}

function targetInUse(placed: PlacedDesign, responses: CellResponses, frequencyHz: number): Float64Array {
  const { si, law, lattice, light } = placed;
  if (frequencyHz === si.designFrequencyHz) return placed.targetRad;
  const bareRad = targetPhasesRad(law, lattice, light, wavenumberRadPerM(frequencyHz));
  const referenceRad = commonPhaseRad(responses.phaseRad, bareRad);
  return bareRad.map((rad) => rad + referenceRad);
}
