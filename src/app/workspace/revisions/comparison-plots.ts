import { designMask } from '../../../../shared/antenna/masks/design-mask';
import type { MaskEnvelope } from '../../../../shared/antenna/masks/mask-envelope';
import type { Comparison, CutDifference } from '../../../../shared/contracts/comparisons';
import type { DesignDocument } from '../../../../shared/model/design-document';
import type { ColourScale } from '../../ui/plots/colour-maps';
import type { CutFigure } from '../../ui/plots/cut-figure';
import type { LineFigure } from '../../ui/plots/line-figure';
import type { MapPlaces } from '../../ui/plots/map-places';
import type { MapLayer } from '../../ui/plots/paint-panel-map';
import { niceStep } from '../../ui/plots/axis-ticks';
import { numberText, signedNumberText } from '../../ui/plots/plot-text';
import { maskLevelDbi } from '../pattern/mask-level';
import { insidePhrase, sideMark, sideName } from './comparison-rows';
import type { ComparedCells } from './comparison-rows';

/** Which change of the cells the map shows. */
export type CellChange = 'parameter' | 'phase' | 'error';

/** Differences beyond this are clipped: they are moved nulls. */
export const CLIPPED_DB = 10;

/** A scale centred on zero that reaches a magnitude rounded up. */
function centredScale(reach: number, most: number): ColourScale {
  const step = niceStep(Math.max(reach, 1e-6), 3);
  const limit = Math.min(most, Math.max(step, Math.ceil(reach / step - 1e-9) * step));
  return { map: 'diverging', from: -limit, to: limit };
}

/**
 * Three times the median magnitude, or the largest when that is nearer. A cell that goes once round the curve changes by its
 * whole length and would leave no colour to the others.
 */
function robustReach(values: ArrayLike<number>): number {
  const magnitudes = Float64Array.from(values, Math.abs).filter((value) => value > 0).sort();
  if (magnitudes.length === 0) return 0;
  return Math.min(magnitudes[magnitudes.length - 1], 3 * magnitudes[magnitudes.length >> 1]);
}

const CHANGES: Readonly<Record<CellChange, { readonly title: string; readonly unit: string; readonly digits: number; readonly most: number; of(arrays: ComparedCells['arrays']): readonly number[] }>> = {
  parameter: { title: 'Change of size', unit: 'mm', digits: 2, most: Infinity, of: (arrays) => arrays.parameterChangeMm },
  phase: { title: 'Change of cell phase', unit: '°', digits: 1, most: 180, of: (arrays) => arrays.phaseChangeDeg },
  error: { title: 'Change of phase error', unit: '°', digits: 2, most: 180, of: (arrays) => arrays.errorChangeDeg },
};

/** The change at each cell; cells that did not change stay bare. */
export function changeLayer(cells: ComparedCells, change: CellChange): MapLayer {
  const { title, unit, digits, most, of } = CHANGES[change];
  const { changed } = cells.arrays;
  const all = of(cells.arrays);
  const values = Float64Array.from(all, (value, i) => (changed[i] === 0 ? Number.NaN : value));
  const named = change === 'parameter' && cells.parameter ? `Change of ${insidePhrase(cells.parameter.label)}` : title;
  return { title: named, unit, digits, values, scale: centredScale(robustReach(values), most) };
}

export function changePlaces(cells: ComparedCells, { panel: { lattice } }: DesignDocument): MapPlaces {
  const { xMm, yMm } = cells.arrays;
  return { xMm, yMm, pitchXMm: lattice.periodXMm, pitchYMm: lattice.kind === 'rectangular' ? lattice.periodYMm : lattice.rowSpacingMm };
}

export function cutName({ request }: CutDifference): string {
  if ('plane' in request) return request.plane === 'along' ? 'along the beam' : 'across the beam';
  return `in the plane φ = ${numberText(request.phiDeg, 1)}°`;
}

/** Both cuts in one plot with the mask of the side named last. */
export function overlaidCut(comparison: Comparison, cut: CutDifference, design: DesignDocument): CutFigure {
  const { before, after } = comparison;
  const { requirement } = design;
  const [beam] = requirement.beams;
  const top = Math.ceil((Math.max(...cut.afterDbi, ...cut.beforeDbi) + 3) / 10) * 10;
  const onCircle = 'plane' in cut.request;
  const beamDeg = onCircle ? 0 : beam.thetaDeg;
  return {
    title: `Cuts ${cutName(cut)}, overlaid`,
    angleTitle: onCircle ? 'angle from the beam, °' : `θ, plane φ = ${numberText('phiDeg' in cut.request ? cut.request.phiDeg : 0, 1)}°, °`,
    levelTitle: 'gain, dBi',
    main: { label: sideName(after), angleDeg: cut.angleDeg, levelDb: cut.afterDbi },
    overlay: { label: sideName(before), angleDeg: cut.angleDeg, levelDb: cut.beforeDbi },
    forbidden: forbiddenAbout(maskOfLater(comparison, design), cut.angleDeg, beamDeg),
    forbiddenLabel: `forbidden, beam of ${sideName(after)}`,
    least: requirement.minGainDbi === undefined ? null : { label: `least gain, ${numberText(requirement.minGainDbi, 1)} dBi`, angleDeg: beamDeg, levelDb: requirement.minGainDbi },
    marks: [],
    fromDeg: cut.angleDeg[0],
    toDeg: cut.angleDeg[cut.angleDeg.length - 1],
    floorDb: Math.floor((top - 60) / 10) * 10,
    topDb: top,
  };
}

/** The gain that a mask may depend on is that of its own side. */
function maskOfLater({ figures }: Comparison, design: DesignDocument): MaskEnvelope | null {
  const gainDbi = figures.find(({ id }) => id === 'gain-at-peak')?.after ?? { kind: 'no-figure', reason: 'the comparison has no gain' };
  return designMask(design, { frequencyGHz: design.requirement.designFrequencyGHz, gainDbi });
}

/** On a plane through the beam the angle off it is the difference of angles. */
function forbiddenAbout(mask: MaskEnvelope | null, angleDeg: readonly number[], beamDeg: number): CutFigure['forbidden'] {
  return [-1, 1].flatMap((side) => {
    const angles = angleDeg.filter((angle) => side * (angle - beamDeg) >= 0);
    const levels = angles.map((angle) => maskLevelDbi(mask, Math.abs(angle - beamDeg)));
    const kept = angles.filter((_, i) => levels[i] !== null);
    return kept.length < 2 ? [] : [{ angleDeg: kept, levelDb: levels.filter((level) => level !== null) }];
  });
}

/** After minus before once the beams coincide; gaps where either lies below the floor. */
export function cutDifferenceFigure(comparison: Comparison, cut: CutDifference): LineFigure {
  const { before, after } = comparison;
  const y = Float64Array.from(cut.differenceDb, (value) => (value === null ? Number.NaN : Math.max(-CLIPPED_DB, Math.min(CLIPPED_DB, value))));
  return {
    title: `Difference of the cuts ${cutName(cut)}`,
    x: { title: 'plane' in cut.request ? 'angle from the beam, °' : 'θ, °', from: cut.angleDeg[0], to: cut.angleDeg[cut.angleDeg.length - 1], step: 30 },
    y: { title: `${sideName(after)} less ${sideName(before)}, dB`, from: -CLIPPED_DB, to: CLIPPED_DB, step: 5 },
    lines: [{ label: 'difference', x: cut.angleDeg, y, ink: 'copper' }],
  };
}

/** Less than the last digit that is shown. */
const isNoShift = (shift: number): boolean => Math.abs(shift) < 5e-5;

export function shiftText({ before }: Comparison, cut: CutDifference): string {
  if (!isNoShift(cut.shiftU)) return `${sideMark(before)} shifted by Δu ${signedNumberText(cut.shiftU, 4)}`;
  return 'plane' in cut.request ? 'angle from each beam' : 'beams coincide';
}

/** How the difference was made, and what it leaves out, as drawing notes. */
export function comparisonNotes(comparison: Comparison): readonly string[] {
  const [cut] = comparison.cuts;
  return [
    ...(cut ? [`Difference of cuts: ${cutAlignment(comparison)}; gaps where either lies below ${numberText(cut.floorDbi, 0)} dBi, clipped at ±${CLIPPED_DB} dB.`] : []),
    hemisphereAlignment(comparison),
    'A mask margin is taken about the beam of its own side.',
    'A prediction is array theory, not a measurement.',
  ];
}

/** What was done to bring the beams of the cut along the beam together. */
function cutAlignment({ before, cuts: [cut] }: Comparison): string {
  if ('plane' in cut.request) return 'each side in the plane of its own beam, compared by the angle from that beam';
  if (isNoShift(cut.shiftU)) return 'both sides in one plane, direction by direction';
  return `in the plane of both beams ${sideName(before)} is moved by Δu ${signedNumberText(cut.shiftU, 4)} onto the other beam and resampled linearly; across, the angle from each beam is compared`;
}

function hemisphereAlignment({ before, uv: { shiftU, shiftV } }: Comparison): string {
  if (isNoShift(shiftU) && isNoShift(shiftV)) return 'Over the hemisphere the directions are subtracted as they are; moved nulls show as pairs.';
  const shift = `Δu ${signedNumberText(shiftU, 4)}, Δv ${signedNumberText(shiftV, 4)}`;
  return `Over the hemisphere ${sideName(before)} is moved by ${shift} so that the first beams coincide; what has no direction on one side stays bare.`;
}

export function hemisphereDifference({ uv }: Comparison): { readonly levels: { readonly size: number; readonly levelDb: readonly number[] }; readonly scale: ColourScale } {
  return { levels: { size: uv.size, levelDb: uv.differenceDb }, scale: centredScale(robustReach(uv.differenceDb), CLIPPED_DB) };
}
