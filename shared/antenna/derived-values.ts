import { MAX_CELL_COUNT, type DesignDocument } from '../model/design-document';
import type { Figure } from '../model/figures';
import { degFromRad } from '../units/angles';
import { powerRatioToDb } from '../units/decibels';
import { wavenumberRadPerM } from '../waves/conventions';
import { cellCountUpperBound, countCells } from './cell-count';
import { shortestReciprocalPerM } from './grating-lobes';
import { hornPower } from './horn-field';
import { noFigure } from './no-figure';
import { largestDimensionM, outlineAreaM2, outlineTrace } from './outline';
import { polygonFault } from './polygon-fault';
import { siDesign, type SiDesign, type SiHorn } from './si-design';

/** What follows from the fields alone, for hints beside them while they are edited. */
export interface DerivedValues {
  readonly wavelengthMm: number;
  readonly largestDimensionMm: number;
  readonly apertureOverWavelength: number;
  readonly areaMm2: number;
  readonly cellCount: Figure;
  /** 2 D^2 / lambda with the largest dimension. */
  readonly farFieldDistanceM: number;
  /** Distance of the horn's phase centre from its aim, over the largest dimension: f/D. */
  readonly focalRatio: Figure;
  readonly hornGainDbi: Figure;
  /** Full width between the half-power directions of the horn, in its E plane and H plane. */
  readonly hornBeamwidthDeg: { readonly e: Figure; readonly h: Figure };
  readonly maxIncidenceDeg: Figure;
  /** Largest spacing without a grating lobe of any wanted beam, lambda / (1 + sin theta). */
  readonly largestFreeSpacingMm: number;
  /** Largest spacing at which the cell sends back one order only: lambda / (1 + sin incidence), lambda / (1 + n) on a guided wave. */
  readonly largestCellSpacingMm: Figure;
  /** The lattice's own spacing to hold against both: 1 over its shortest reciprocal vector. */
  readonly spacingMm: number;
}

const MM_PER_M = 1000;

/** Largest dimension of the outline in wavelengths at the design frequency. */
export function apertureOverWavelength(design: DesignDocument): number {
  const { panel, designFrequencyHz } = siDesign(design);
  return (largestDimensionM(panel.outline) * wavenumberRadPerM(designFrequencyHz)) / (2 * Math.PI);
}

/** Never throws for a document whose fields are each valid; what does not exist says why. */
export function derivedValues(design: DesignDocument): DerivedValues {
  const si = siDesign(design);
  const wavelengthM = (2 * Math.PI) / wavenumberRadPerM(si.designFrequencyHz);
  const largestM = largestDimensionM(si.panel.outline);
  const steepestSine = Math.max(...si.beams.map(({ direction }) => Math.hypot(direction.u, direction.v)));
  const incidenceRad = steepestIncidenceRad(si);
  const noHorn = si.illumination.kind === 'guided-wave' ? noFigure('guided-wave', 'the panel is lit by a guided wave') : noFigure('plane-wave', 'the panel is lit by a plane wave');
  const horn = si.illumination.kind === 'horn' ? si.illumination : undefined;
  return {
    wavelengthMm: wavelengthM * MM_PER_M,
    largestDimensionMm: largestM * MM_PER_M,
    apertureOverWavelength: largestM / wavelengthM,
    areaMm2: outlineAreaM2(si.panel.outline) * MM_PER_M * MM_PER_M,
    cellCount: cellCountFigure(design),
    farFieldDistanceM: (2 * largestM * largestM) / wavelengthM,
    focalRatio: horn ? distanceToAimM(horn) / largestM : noHorn,
    hornGainDbi: horn ? powerRatioToDb((4 * Math.PI) / hornPower(horn)) : noHorn,
    hornBeamwidthDeg: horn ? { e: halfPowerWidthDeg(horn.exponentE), h: halfPowerWidthDeg(horn.exponentH) } : { e: noHorn, h: noHorn },
    maxIncidenceDeg: si.illumination.kind === 'guided-wave' ? noHorn : degFromRad(incidenceRad),
    largestFreeSpacingMm: (wavelengthM / (1 + steepestSine)) * MM_PER_M,
    largestCellSpacingMm: (wavelengthM / (1 + (si.illumination.kind === 'guided-wave' ? si.illumination.effectiveIndex : Math.sin(incidenceRad)))) * MM_PER_M,
    spacingMm: MM_PER_M / shortestReciprocalPerM(si.panel.lattice),
  };
}

function cellCountFigure({ panel }: DesignDocument): Figure {
  const { outline } = panel;
  const fault = outline.kind === 'polygon' ? polygonFault(outline.pointsMm) : undefined;
  if (fault) return noFigure('outline', fault);
  const bound = cellCountUpperBound(panel);
  return bound > 4 * MAX_CELL_COUNT ? noFigure('too-many', `up to ${bound} cells; the limit is ${MAX_CELL_COUNT}`) : countCells(panel);
}

/** Width of cos^2q: 2 acos(2^(-1/2q)). */
function halfPowerWidthDeg(exponent: number): Figure {
  if (exponent === 0) return noFigure('not-reached', 'a horn of exponent 0 is the same in every forward direction');
  return degFromRad(2 * Math.acos(Math.pow(2, -1 / (2 * exponent))));
}

function distanceToAimM({ position, aim }: SiHorn): number {
  return Math.hypot(position.xM - aim.xM, position.yM - aim.yM, position.zM - aim.zM);
}

/** Largest angle of incidence over the outline; the farthest point of an outline from the horn lies on its edge. */
function steepestIncidenceRad({ illumination, panel }: SiDesign): number {
  if (illumination.kind === 'guided-wave') return 0;
  if (illumination.kind === 'plane-wave') return Math.acos(Math.min(1, illumination.source.w));
  const { xM, yM, zM } = illumination.position;
  const farthest = outlineTrace(panel.outline, 720).reduce((far, point) => Math.max(far, Math.hypot(point.xM - xM, point.yM - yM)), 0);
  return Math.atan2(farthest, Math.abs(zM));
}
