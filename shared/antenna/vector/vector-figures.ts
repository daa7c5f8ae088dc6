import type { VectorFigures } from '../../model/vector-figures';
import { axialRatioDb } from '../../waves/polarisation';
import type { Direction } from '../../waves/conventions';
import { noFigure } from '../no-figure';
import { discriminationDb, withinHalfPower } from './cross-polar-figures';
import type { VectorState } from './vector-state';
import type { VectorForm } from './vector-pattern';

/** Every figure that only the vector model has. */
export function vectorFigures(state: VectorState, form: VectorForm, beams: readonly Direction[]): VectorFigures {
  const { pattern, result } = state;
  const isCircular = form.polarisation === 'rhcp' || form.polarisation === 'lhcp';
  const dark = noFigure('nothing-radiated', 'nothing of the wanted polarisation goes towards the beam');
  const shared = { reradiation: form.reradiation, cellFactor: form.cellFactor, radiatedOverLeavingDb: state.radiatedOverLeavingDb };
  if (!(pattern.radiatedPower > 0) || !result) {
    return { ...shared, crossPolarDiscriminationDb: [dark], worstDiscriminationDb: dark, highestCrossPolarDb: dark, axialRatioDb: dark, budget: dark };
  }
  const atBeams = beams.map((beam) => discriminationDb(pattern, beam));
  const inside = withinHalfPower(pattern, beams[0]);
  const open = noFigure('not-reached', 'the beam does not fall to half power on all sides within the hemisphere');
  return {
    ...shared,
    crossPolarDiscriminationDb: atBeams,
    worstDiscriminationDb: inside?.worstDiscriminationDb ?? open,
    highestCrossPolarDb: inside?.highestCrossDb ?? open,
    axialRatioDb: isCircular ? axialRatioOf(atBeams[0]) : noFigure('linear', 'an axial ratio is asked of a circular beam only'),
    budget: { ...result.budget, blockageDb: 0, gainAtBeamDbi: result.gainAtBeamDbi },
  };
}

/** At 0 dB or less the wave is linear, or turns the other way. */
function axialRatioOf(discrimination: number): VectorFigures['axialRatioDb'] {
  if (discrimination <= 0) return noFigure('other-sense', 'at the beam the other circular sense is at least as strong as the wanted one');
  return axialRatioDb(discrimination);
}
