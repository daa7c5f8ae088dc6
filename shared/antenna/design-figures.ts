import type { Figure, Figures } from '../model/figures';
import { degFromRad, radFromDeg } from '../units/angles';
import { dbToPowerRatio } from '../units/decibels';
import { edgeTaperDb, maxIncidenceRad } from './aperture-figures';
import { gratingLobes } from './grating-lobes';
import type { IlluminatedState } from './illuminated-state';
import { transmissionFigures } from './link/transmission-figures';
import { isNumber, noFigure, nothingLit } from './no-figure';
import { largestDimensionM } from './outline';
import { patternFigures, type PatternFigures } from './pattern-figures';
import { lawFigures } from './synthesis/law-figures';
import { evanescentCellCount } from './target-phase';
import { vectorFigures } from './vector/vector-figures';

export interface DesignFigures {
  readonly figures: Figures;
  /** All grating lobes; the list in the figures stops at the nearest. */
  readonly gratingLobeCount: number;
  readonly maxIncidence: number;
}

/** Collects every figure of one state. A figure that does not exist holds its reason. */
export function designFigures(state: IlluminatedState): DesignFigures {
  const { placed, frequencyHz, wavelengthM, pattern, losses } = state;
  const { si, lattice, light, law, designWavenumber } = placed;
  const beams = si.beams.map((beam) => beam.direction);
  const orders = beams.map((beam) => gratingLobes(si.panel.lattice, beam, wavelengthM));
  const maxIncidence = maxIncidenceRad(light);
  // The wanted directions as written, not as they come back from direction cosines.
  const { mask, beams: wanted } = placed.design.requirement;
  const radiates = pattern.radiatedPower > 0;
  const { peakUncertaintyDeg, ...read } = radiates ? patternFigures({ pattern, beams, mask, gainOffsetDb: state.gainOffsetDb, largestDimensionM: largestDimensionM(si.panel.outline) }) : darkFigures(state);
  const figures: Figures = {
    frequencyGHz: frequencyHz / 1e9,
    wavelengthMm: wavelengthM * 1000,
    cellCount: lattice.count,
    maxIncidenceDeg: si.illumination.kind === 'guided-wave' ? noFigure('guided-wave', 'a guided wave has no angle of incidence') : degFromRad(maxIncidence),
    evanescentCells: evanescentCellCount({ law, lattice, light, designWavenumber, wavenumber: state.wavenumber }),
    gratingLobes: orders.flatMap((order) => order.lobes),
    edgeTaperDb: edgeTaperDb(si.illumination, si.panel, lattice),
    ...read,
    beams: read.beams.map((found, i) => ({ ...found, thetaDeg: wanted[i].thetaDeg, phiDeg: wanted[i].phiDeg })),
    spilloverDb: state.spilloverDb,
    ...losses,
    apertureEfficiency: apertureEfficiency(read.gainDbi, lattice.count * lattice.cellAreaM2, wavelengthM),
    referencePhaseDeg: degFromRad(placed.referencePhaseRad),
    ...(state.vector && placed.vector ? { vector: vectorFigures(state.vector, placed.vector.form, beams) } : {}),
    uncertainty: radiates ? uncertainties(state, read.peakThetaDeg, peakUncertaintyDeg) : {},
    ...lawFigures(state),
    ...transmissionFigures(state, { ...read, ...(state.vector ? { cross: { pattern: state.vector.pattern.cross, gainOffsetDb: state.vector.gainOffsetDb } } : {}) }),
  };
  return { figures, gratingLobeCount: orders.reduce((sum, order) => sum + order.count, 0), maxIncidence };
}

/** Gain at the peak against 4 pi area / lambda^2, area being cells times the area of one. */
function apertureEfficiency(gainDbi: Figure, areaM2: number, wavelengthM: number): Figure {
  return isNumber(gainDbi) ? (dbToPowerRatio(gainDbi) * wavelengthM * wavelengthM) / (4 * Math.PI * areaM2) : gainDbi;
}

/**
 * Numerical uncertainties of this computation, not of the model. Directivity: interpolation of
 * the far field, 1e-8 of the field up to 256 cells a side and 1e-7 beyond. Beamwidths and
 * cut sidelobes: the tolerances of the bisection and of the golden-section search.
 */
function uncertainties(state: IlluminatedState, peakThetaDeg: Figure, peakUncertaintyDeg: number): Record<string, number> {
  const { columnCount, rowCount } = state.placed.lattice.grid;
  const directivityDb = 8.7 * (Math.max(columnCount, rowCount) <= 256 ? 1e-8 : 1e-7);
  return {
    directivityDbi: directivityDb,
    directivityAtBeamDbi: directivityDb,
    peakThetaDeg: peakUncertaintyDeg,
    // The same arc is a wider azimuth the nearer the peak stands to broadside, and any azimuth there.
    peakPhiDeg: Math.min(180, peakUncertaintyDeg / Math.max(1e-12, isNumber(peakThetaDeg) ? Math.sin(radFromDeg(peakThetaDeg)) : 0)),
    pointingErrorDeg: peakUncertaintyDeg,
    gainDbi: directivityDb + state.spilloverUncertaintyDb,
    gainAtBeamDbi: directivityDb + state.spilloverUncertaintyDb,
    ...(isNumber(state.spilloverDb) ? { spilloverDb: state.spilloverUncertaintyDb } : {}),
    halfPowerBeamwidthDeg: 1e-7,
    sidelobeDb: 1e-6,
  };
}

function darkFigures(state: IlluminatedState): PatternFigures {
  const reason = state.litCount === 0 ? nothingLit() : noFigure('nothing-reflected', 'no lit cell returns anything, so nothing is radiated');
  return {
    directivityDbi: reason,
    peakThetaDeg: reason,
    peakPhiDeg: reason,
    directivityAtBeamDbi: reason,
    gainDbi: reason,
    gainAtBeamDbi: reason,
    pointingErrorDeg: reason,
    halfPowerBeamwidthDeg: { along: reason, across: reason },
    sidelobeDb: { along: reason, across: reason, hemisphere: reason },
    maskMargin: reason,
    highestLobes: [],
    beams: state.placed.design.requirement.beams.map(({ thetaDeg, phiDeg }) => ({
      thetaDeg,
      phiDeg,
      directivityDbi: reason,
      gainDbi: reason,
      foundThetaDeg: reason,
      foundPhiDeg: reason,
      pointingErrorDeg: reason,
    })),
    peakUncertaintyDeg: 0,
  };
}
