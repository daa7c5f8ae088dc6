import type { Figures } from '../../model/figures';
import type { IlluminatedState } from '../illuminated-state';
import { guidedWaveFigures } from '../guided-wave/guided-wave-figures';
import { focusFigures } from './focus-figures';
import { vortexFigures } from './vortex-figures';

/** Figures that only this target phase or this way of lighting has. */
export function lawFigures(state: IlluminatedState): Pick<Figures, 'focus' | 'vortex' | 'guidedWave'> {
  if (state.pattern.radiatedPower <= 0) return {};
  const { illumination } = state.placed.si;
  return { ...synthesisFigures(state), ...(illumination.kind === 'guided-wave' ? { guidedWave: guidedWaveFigures(state, illumination) } : {}) };
}

function synthesisFigures(state: IlluminatedState): Pick<Figures, 'focus' | 'vortex'> {
  const { synthesis, beams } = state.placed.si;
  if (synthesis.kind === 'focus') return { focus: focusFigures(state, synthesis.point) };
  if (synthesis.kind === 'vortex') return { vortex: vortexFigures(state.pattern, beams[0].direction, synthesis.order) };
  return {};
}
