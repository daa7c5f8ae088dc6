import type { Cells } from '../../model/design-document';
import { radFromDeg } from '../../units/angles';
import type { CellAssignment, CellResponses, CellStock } from '../cell-stock';
import { delayedPhaseRad, equalEdges, harmonicAmplitude, type SwitchingSequence } from './switching-sequence';

type ModulatedCells = Extract<Cells, { kind: 'modulated' }>;

/** A sequence as the engine takes it. */
export function sequenceOf({ states, edges }: ModulatedCells): SwitchingSequence {
  return { states: states.map(({ phaseDeg, magnitude }) => ({ magnitude, phaseRad: radFromDeg(phaseDeg) })), edges: edges ?? equalEdges(states.length) };
}

interface Polar {
  readonly magnitude: number;
  readonly phaseRad: number;
}

function harmonicOf(sequence: SwitchingSequence, order: number): Polar {
  const { re, im } = harmonicAmplitude(sequence, order);
  return { magnitude: Math.hypot(re, im), phaseRad: Math.atan2(im, re) };
}

/**
 * All cells run through the same sequence, each with its own delay: the steered harmonic then has any wanted phase,
 * arg a_m - 2 pi m delay, at the strength |a_m|; every other harmonic turns by its own order.
 */
export function modulatedStock(cells: ModulatedCells): CellStock {
  const sequence = sequenceOf(cells);
  const steered = harmonicOf(sequence, cells.harmonic);
  // Of the delays that give a phase, the one within the first 1/|m| of the period.
  const delayFor = (targetRad: number): number => {
    const turns = (steered.phaseRad - targetRad) / (2 * Math.PI);
    return (cells.harmonic > 0 ? turns - Math.floor(turns) : Math.ceil(turns) - turns) / Math.abs(cells.harmonic);
  };
  const respond = (delays: Float64Array, order: number): CellResponses => {
    const { magnitude, phaseRad } = harmonicOf(sequence, order);
    return { magnitude: new Float64Array(delays.length).fill(magnitude), phaseRad: delays.map((delay) => phaseRad + delayedPhaseRad(order, delay)) };
  };
  return {
    assign: (targetRad): CellAssignment => ({ ...respond(targetRad.map(delayFor), cells.harmonic), cellIndex: new Int32Array(targetRad.length).fill(-1) }),
    respond: (assignment) => assignment,
    // The delays have been chosen for the phases placed, so they follow from them.
    harmonic: (assignment, order) => respond(assignment.phaseRad.map(delayFor), order),
    searchReferenceRad: () => 0,
    warnings: () => [],
  };
}
