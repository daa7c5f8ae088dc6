import { derivedValues } from '../../../../shared/antenna/derived-values';
import { bestLeakage } from '../../../../shared/antenna/guided-wave/leaked-power';
import type { DesignDocument, Illumination } from '../../../../shared/model/design-document';
import type { Figure, Figures } from '../../../../shared/model/figures';
import { figureText } from '../strip-figures';

export interface Fact {
  readonly name: string;
  readonly value: string;
}

const shown = (figure: Figure, digits: number, unit: string): string => (typeof figure === 'number' ? `${figureText(figure, digits)}${unit}` : '–');
const told = (figure: Figure, digits: number, unit: string): string => (typeof figure === 'number' ? `${figureText(figure, digits)}${unit}` : `– (${figure.reason})`);

/** What follows from the fields alone. */
export function geometryFacts(design: DesignDocument): readonly Fact[] {
  const derived = derivedValues(design);
  const { illumination } = design;
  if (illumination.kind === 'plane-wave') return [{ name: 'Incidence, everywhere', value: shown(derived.maxIncidenceDeg, 1, '°') }];
  if (illumination.kind === 'guided-wave') {
    const { leakageLengthNp, product } = bestLeakage();
    return [
      { name: 'Period without a second lobe, below λ/(n + 1)', value: shown(derived.largestCellSpacingMm, 3, ' mm') },
      { name: 'Spacing of this lattice', value: shown(derived.spacingMm, 3, ' mm') },
      { name: 'Best for a plane wave', value: `αL = ${figureText(leakageLengthNp, 3)}: taper × leaked ${figureText(product * 100, 1)} %` },
    ];
  }
  return [
    { name: 'f/D', value: shown(derived.focalRatio, 3, '') },
    { name: 'Offset angle', value: `${figureText(offsetAngleDeg(illumination), 1)}°` },
    { name: 'Steepest incidence', value: shown(derived.maxIncidenceDeg, 1, '°') },
    { name: 'Gain of the horn, 2(2q + 1)', value: shown(derived.hornGainDbi, 2, ' dBi') },
    { name: 'Half-power width, E and H', value: `${shown(derived.hornBeamwidthDeg.e, 1, '°')}, ${shown(derived.hornBeamwidthDeg.h, 1, '°')}` },
  ];
}

/** What the prediction says of the way of lighting. */
export function predictedFacts(figures: Figures): readonly Fact[] {
  const taper = { name: 'Taper loss, held by the directivity', value: told(figures.taperDb, 2, ' dB') };
  if (figures.guidedWave === undefined) {
    return [{ name: 'Edge taper', value: told(figures.edgeTaperDb, 2, ' dB') }, { name: 'Spillover', value: told(figures.spilloverDb, 2, ' dB') }, taper, ...blockageFacts(figures), ...specularFacts(figures)];
  }
  const { lengthMm, leakedShare, beamRelativeDb, modulationEfficiency } = figures.guidedWave;
  return [
    { name: 'Way under the panel', value: shown(lengthMm, 1, ' mm') },
    { name: 'Leaked share', value: `${figureText(leakedShare * 100, 1)} %, ${figureText(10 * Math.log10(leakedShare), 2)} dB` },
    taper,
    { name: 'Beam against cells of free phase', value: told(beamRelativeDb, 2, ' dB') },
    { name: 'Modulation efficiency, held by the directivity', value: `${figureText(modulationEfficiency * 100, 1)} %` },
  ];
}

function blockageFacts({ blockage }: Figures): readonly Fact[] {
  if (!blockage) return [];
  return [
    { name: 'Cells in the shadow of the feed', value: figureText(blockage.cells, 0) },
    { name: 'Blockage, field at the beam', value: told(blockage.atBeamDb, 2, ' dB') },
    { name: 'Blockage, power not radiated', value: told(blockage.powerDb, 2, ' dB') },
  ];
}

function specularFacts({ specular }: Figures): readonly Fact[] {
  return specular ? [{ name: 'Specular part against a plate', value: told(specular.meanResponseDb, 1, ' dB') }] : [];
}

/** Between the axis of the horn and the normal of the panel. */
function offsetAngleDeg({ positionMm, aimMm }: Extract<Illumination, { kind: 'horn' }>): number {
  const across = Math.hypot(aimMm[0] - positionMm[0], aimMm[1] - positionMm[1]);
  return (Math.atan2(across, Math.abs(aimMm[2] - positionMm[2])) * 180) / Math.PI;
}

/** The line beside the title of the sheet. */
export function illuminationSubtitle(illumination: Illumination): string {
  switch (illumination.kind) {
    case 'horn':
      return `horn at ${illumination.positionMm.map((value) => figureText(value, Number.isInteger(value) ? 0 : 1)).join(', ')} mm, exponents ${illumination.exponentE} and ${illumination.exponentH}`;
    case 'plane-wave':
      return `plane wave from θ ${illumination.thetaDeg}°, φ ${illumination.phiDeg}°`;
    case 'guided-wave':
      return `guided wave, ${illumination.launch.kind}, index ${illumination.effectiveIndex}, leakage ${illumination.leakageNpPerM} per metre`;
  }
}
