import type { DesignDocument, Outline } from '../model/design-document';
import { cellCountFault } from './cell-count';
import { InvalidDesign, type DesignFault } from './invalid-design';
import { modulationFaults } from './modulation/modulation-faults';
import { maskFaults } from './masks/mask-faults';
import { polygonFault } from './polygon-fault';
import { synthesisFaults } from './synthesis/synthesis-faults';
import { vectorFaults } from './vector/vector-faults';

/** A horn nearer than this to the plane of the panel lights it at grazing incidence everywhere. */
const LEAST_HORN_HEIGHT_MM = 1e-3;

/** Throws InvalidDesign naming every fault between fields at once; returns where there is none. */
export function checkDesign(design: DesignDocument): void {
  const faults = designFaults(design);
  if (faults.length > 0) throw new InvalidDesign(faults);
}

/** Faults that no single field shows, of a document whose fields are each valid. */
export function designFaults(design: DesignDocument): DesignFault[] {
  const shape = shapeFaults(design);
  const isShapeSound = shape.length === 0;
  return [
    ...requirementFaults(design),
    ...shape,
    ...(isShapeSound ? countFaults(design) : []),
    ...sourceFaults(design),
    ...synthesisFaults(design, isShapeSound),
    ...cellFaults(design),
    ...vectorFaults(design),
    ...bandFitFaults(design),
    ...modulationFaults(design),
  ];
}

/** A band fit needs more than the design frequency, and reckons with one response per cell. */
function bandFitFaults({ cells, requirement, prediction }: DesignDocument): DesignFault[] {
  if (cells.kind !== 'edition' || cells.rule !== 'band-fit') return [];
  if (prediction.model === 'vector') return [{ pointer: '#/cells/rule', detail: 'a band fit chooses by the scalar model; choose the scalar model or another rule' }];
  return cells.fitFrequenciesGHz || requirement.bandGHz ? [] : [{ pointer: '#/cells/rule', detail: 'a band fit needs the band of the requirement, or frequencies of its own' }];
}

function requirementFaults({ requirement }: DesignDocument): DesignFault[] {
  const faults: DesignFault[] = [];
  const band = requirement.bandGHz;
  if (band && band[0] > band[1]) faults.push({ pointer: '#/requirement/bandGHz', detail: `must rise; got ${band[0]} to ${band[1]} GHz` });
  const { occupiedBandwidthGHz, referenceBandwidthGHz } = requirement.transmitter ?? {};
  if (occupiedBandwidthGHz !== undefined && referenceBandwidthGHz !== undefined && referenceBandwidthGHz > occupiedBandwidthGHz) {
    const detail = `must not exceed the occupied bandwidth, ${occupiedBandwidthGHz} GHz; got ${referenceBandwidthGHz} GHz`;
    faults.push({ pointer: '#/requirement/transmitter/referenceBandwidthGHz', detail });
  }
  return [
    ...faults,
    ...maskFaults(requirement.mask, '#/requirement/mask'),
    ...maskFaults(requirement.crossPolarMask, '#/requirement/crossPolarMask'),
    ...maskFaults(requirement.transmitter?.densityMask, '#/requirement/transmitter/densityMask'),
  ];
}

function shapeFaults({ panel }: DesignDocument): DesignFault[] {
  const outlines: [string, Outline][] = [
    ['#/panel/outline', panel.outline],
    ...panel.keepOuts.map((keepOut, i): [string, Outline] => [`#/panel/keepOuts/${i}`, keepOut]),
  ];
  return outlines.flatMap(([pointer, outline]) => {
    const detail = outline.kind === 'polygon' ? polygonFault(outline.pointsMm) : undefined;
    return detail ? [{ pointer: `${pointer}/pointsMm`, detail }] : [];
  });
}

function countFaults({ panel }: DesignDocument): DesignFault[] {
  const detail = cellCountFault(panel);
  return detail ? [{ pointer: '#/panel', detail }] : [];
}

/** Cells that cannot be lit in the given way. */
function guidedWaveFaults(illumination: DesignDocument['illumination'], cells: DesignDocument['cells']): DesignFault[] {
  const guided = illumination.kind === 'guided-wave';
  if (guided && cells.kind === 'edition') {
    return [{ pointer: '#/cells/kind', detail: 'cells of an edition are measured under waves from outside; under a guided wave use resonant, ideal or what-if cells' }];
  }
  if (!guided && cells.kind === 'resonant') return [{ pointer: '#/cells/kind', detail: `resonant cells need a guided wave under the panel; got illumination ${illumination.kind}` }];
  if (cells.kind === 'resonant' && cells.rule === 'phase-only' && cells.states !== null) {
    return [{ pointer: '#/cells/states', detail: 'the rule phase-only needs a continuous tuning, states null' }];
  }
  return [];
}

function sourceFaults({ illumination }: DesignDocument): DesignFault[] {
  const faults: DesignFault[] = [];
  if (illumination.kind === 'horn') {
    const { positionMm, aimMm } = illumination;
    if (Math.abs(positionMm[2]) < LEAST_HORN_HEIGHT_MM) {
      faults.push({ pointer: '#/illumination/positionMm/2', detail: `the horn must stand off the plane of the panel; got z = ${positionMm[2]} mm` });
    }
    if (Math.hypot(...positionMm.map((p, i) => p - aimMm[i])) < LEAST_HORN_HEIGHT_MM) {
      faults.push({ pointer: '#/illumination/aimMm', detail: 'the horn must be aimed at a point other than its own position' });
    }
  }
  return faults;
}

function cellFaults({ illumination, cells }: DesignDocument): DesignFault[] {
  const faults = guidedWaveFaults(illumination, cells);
  if (cells.kind === 'inline' && cells.cells.every((cell) => cell.magnitude === 0)) {
    faults.push({ pointer: '#/cells/cells', detail: 'at least one cell must have a magnitude above 0' });
  }
  return faults;
}
