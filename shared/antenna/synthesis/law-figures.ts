import type { Figures } from '../../model/figures';
import type { IlluminatedState } from '../illuminated-state';
import { guidedWaveFigures } from '../guided-wave/guided-wave-figures';
import { diffuseFigures } from './diffuse-figures';
import { focusFigures } from './focus-figures';
import { vortexFigures } from './vortex-figures';

/** Figures that only this target phase or this way of lighting has. */
export function lawFigures(state: IlluminatedState): Pick<Figures, 'focus' | 'vortex' | 'projections' | 'diffuse' | 'guidedWave'> {
  if (state.pattern.radiatedPower <= 0) return {};
  const { illumination } = state.placed.si;
  return { ...synthesisFigures(state), ...(illumination.kind === 'guided-wave' ? { guidedWave: guidedWaveFigures(state, illumination) } : {}) };
}

function synthesisFigures(state: IlluminatedState): Pick<Figures, 'focus' | 'vortex' | 'projections' | 'diffuse'> {
  const { synthesis, beams } = state.placed.si;
  const { projections, board } = state.placed.law;
  if (projections) {
    const { outcome, iterations, costs, worstExcessDb, worstShortfallDb } = projections;
    return { projections: { outcome, iterations, costs: [...costs], worstExcessDb, worstShortfallDb } };
  }
  if (board) return { diffuse: diffuseFigures(state, board) };
  if (synthesis.kind === 'focus') return { focus: focusFigures(state, synthesis.point) };
  if (synthesis.kind === 'vortex') return { vortex: vortexFigures(state.pattern, beams[0].direction, synthesis.order) };
  return {};
}
