import { discriminationDb } from '../../shared/antenna/vector/cross-polar-figures';
import type { VectorForm } from '../../shared/antenna/vector/vector-pattern';
import { vectorState, type VectorState } from '../../shared/antenna/vector/vector-state';
import { wavenumberRadPerM } from '../../shared/waves/conventions';
import { inForm, type placeVector } from './vector-panels';

export type LitState = VectorState & { readonly result: NonNullable<VectorState['result']>; readonly discriminationDb: number };

/** The vector state of placed cells, at their design frequency unless another is named, in their own form unless another is given. */
export function stateOf(placed: ReturnType<typeof placeVector>, form: Partial<VectorForm> = {}, frequencyHz = placed.si.designFrequencyHz): LitState {
  const state = vectorState(inForm(placed, form), frequencyHz, wavenumberRadPerM(frequencyHz));
  if (!state.result) throw new Error('nothing goes to the beam');
  return { ...state, result: state.result, discriminationDb: discriminationDb(state.pattern, placed.si.beams[0].direction) };
}
