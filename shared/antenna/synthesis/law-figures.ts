import type { Figures } from '../../model/figures';
import type { IlluminatedState } from '../illuminated-state';
import type { SpecularFigures } from '../../model/law-figures';
import { amplitudeRatioToDb } from '../../units/decibels';
import { assignmentFigures } from '../assignment/assignment-figures';
import { meanResponse } from '../feed/specular-part';
import { noFigure } from '../no-figure';
import { guidedWaveFigures } from '../guided-wave/guided-wave-figures';
import { diffuseFigures } from './diffuse-figures';
import { modulationFigures } from '../modulation/modulation-figures';
import { focusFigures } from './focus-figures';
import { vortexFigures } from './vortex-figures';

/** Figures that only this target phase or this way of lighting has. */
export function lawFigures(state: IlluminatedState): Pick<Figures, 'focus' | 'vortex' | 'projections' | 'diffuse' | 'guidedWave' | 'blockage' | 'specular' | 'assignment' | 'modulation'> {
  if (state.pattern.radiatedPower <= 0) return {};
  const { illumination } = state.placed.si;
  const { cells } = state.placed.design;
  const assignment = assignmentFigures(state.placed);
  return {
    ...synthesisFigures(state),
    ...(illumination.kind === 'guided-wave' ? { guidedWave: guidedWaveFigures(state, illumination) } : { specular: specularFigures(state) }),
    ...(state.blockage ? { blockage: state.blockage } : {}),
    ...(assignment ? { assignment } : {}),
    ...(cells.kind === 'modulated' ? { modulation: modulationFigures(cells, state.harmonic ?? cells.harmonic) } : {}),
  };
}

/** The part that all cells share, as a level against a plate. */
function specularFigures({ placed, responses }: IlluminatedState): SpecularFigures {
  const mean = Math.hypot(...meanResponse({ ...responses, amplitude: placed.light.amplitude }));
  return { meanResponseDb: mean > 1e-12 ? amplitudeRatioToDb(mean) : noFigure('none', 'the responses of the cells cancel on the average') };
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
