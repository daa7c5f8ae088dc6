import type { Figure } from '../../model/figures';
import { dbToPowerRatio } from '../../units/decibels';
import type { IlluminatedState } from '../illuminated-state';
import { isNumber, noFigure } from '../no-figure';
import { directivityRatio } from '../radiation-pattern';
import { axialLevel } from '../synthesis/axial-profile';
import { axialSources } from '../synthesis/focus-figures';

/** So many far-field distances away spherical waves from the cells are the far field. */
const FAR = 1e4;

/**
 * Power density at the focus: the level there over the level far out on the same line, times the density that the gain
 * gives out there, P G / (4 pi R^2). It can exceed the 4 P / A of a plain aperture.
 */
export function focusDensityWPerM2(state: IlluminatedState, powerW: number): Figure {
  const { placed, pattern, gainOffsetDb, wavelengthM } = state;
  const { synthesis } = placed.si;
  if (synthesis.kind !== 'focus') return noFigure('no-focus', 'the panel does not focus');
  if (!isNumber(gainOffsetDb)) return gainOffsetDb;
  const { xM, yM, zM } = synthesis.point;
  const distanceM = Math.hypot(xM, yM, zM);
  const direction = { u: xM / distanceM, v: yM / distanceM, w: zM / distanceM };
  const sources = axialSources(state, [direction.u, direction.v, direction.w]);
  const sideM = Math.hypot(placed.lattice.grid.columnCount * placed.lattice.grid.stepXM, placed.lattice.grid.rowCount * placed.lattice.grid.stepYM);
  const farM = FAR * Math.max(distanceM, (2 * sideM * sideM) / wavelengthM);
  const far = axialLevel(sources, farM) * farM * farM;
  const gain = directivityRatio(pattern, direction) * dbToPowerRatio(gainOffsetDb);
  if (far <= 0 || gain <= 0) return noFigure('null', 'the far field vanishes in the direction of the focus, so the level there has no scale');
  return ((powerW * gain) / (4 * Math.PI)) * (axialLevel(sources, distanceM) / far);
}
