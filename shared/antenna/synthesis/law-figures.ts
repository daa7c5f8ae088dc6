import type { Figures } from '../../model/figures';
import type { IlluminatedState } from '../illuminated-state';
import { focusFigures } from './focus-figures';
import { vortexFigures } from './vortex-figures';

/** Figures that only this target phase has. */
export function lawFigures(state: IlluminatedState): Pick<Figures, 'focus' | 'vortex'> {
  const { synthesis, beams } = state.placed.si;
  if (state.pattern.radiatedPower <= 0) return {};
  if (synthesis.kind === 'focus') return { focus: focusFigures(state, synthesis.point) };
  if (synthesis.kind === 'vortex') return { vortex: vortexFigures(state.pattern, beams[0].direction, synthesis.order) };
  return {};
}
