import type { NoFigure } from '../../model/figures';
import type { FocusFigures } from '../../model/law-figures';
import { powerRatioToDb } from '../../units/decibels';
import type { IlluminatedState } from '../illuminated-state';
import { noFigure, nothingLit } from '../no-figure';
import { largestDimensionM } from '../outline';
import type { SiPosition } from '../si-design';
import { axialLevel, axialMaximum, type AxialSources } from './axial-profile';

/** Evaluations of one cell that the line may cost: about half a second. */
const MOST_EVALUATIONS = 12_000_000;
const SAMPLES = 161;
/** Evaluations that refining the maximum and two crossings takes on top of the samples. */
const REFINING = 130;
const FLOOR_DB = -60;

/** The level along the line through the focus as the cells in use make it: amplitudes, cell phases and losses included. */
export function focusFigures(state: IlluminatedState, focus: SiPosition): FocusFigures | NoFigure {
  const { lattice } = state.placed;
  if (lattice.count * (SAMPLES + REFINING) > MOST_EVALUATIONS) {
    return noFigure('too-many-cells', `${lattice.count} cells are too many to follow the level along the axis; the limit is ${Math.floor(MOST_EVALUATIONS / (SAMPLES + REFINING))}`);
  }
  const distanceM = Math.hypot(focus.xM, focus.yM, focus.zM);
  const sources = axialSources(state, [focus.xM / distanceM, focus.yM / distanceM, focus.zM / distanceM]);
  const atFocus = axialLevel(sources, distanceM);
  if (atFocus <= 0) return nothingLit();
  const sideM = largestDimensionM(state.placed.si.panel.outline);
  // However far the focus, the level of a panel is highest nearer than about a third of side^2 / lambda.
  const fromM = Math.max(sideM / 4, Math.min(distanceM / 6, (0.05 * sideM * sideM) / state.wavelengthM));
  const found = axialMaximum(sources, { fromM: Math.min(fromM, distanceM / 2), toM: 2.5 * distanceM, samples: SAMPLES });
  const reached = (edgeM: number | undefined): number | NoFigure =>
    edgeM === undefined ? noFigure('not-reached', 'the level does not fall to half within the line followed') : edgeM * 1000;
  return {
    distanceMm: distanceM * 1000,
    maximumMm: found.distanceM * 1000,
    shiftMm: (found.distanceM - distanceM) * 1000,
    riseDb: powerRatioToDb(found.level / atFocus),
    halfPowerMm: { from: reached(found.nearHalfM), to: reached(found.farHalfM) },
    profile: {
      distanceMm: Array.from(found.sampleM, (s) => s * 1000),
      levelDb: Array.from(found.sampleLevel, (level) => (level > 0 ? Math.max(FLOOR_DB, powerRatioToDb(level / found.level)) : FLOOR_DB)),
    },
  };
}

/** The cells in use as point sources, for the line along a unit vector. */
export function axialSources({ placed, responses, wavenumber }: IlluminatedState, along: AxialSources['along']): AxialSources {
  const { lattice, light, si } = placed;
  const re = new Float64Array(lattice.count);
  const im = new Float64Array(lattice.count);
  for (let n = 0; n < lattice.count; n++) {
    const size = light.amplitude[n] * responses.magnitude[n];
    const phase = responses.phaseRad[n] - wavenumber * light.pathM[n];
    re[n] = size * Math.cos(phase);
    im[n] = size * Math.sin(phase);
  }
  return { xM: lattice.xM, yM: lattice.yM, re, im, wavenumber, radiateExponent: si.radiateExponent, along };
}
