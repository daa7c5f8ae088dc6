import { pointerSteps } from './design-pointer';

/** What a field of the design document is called on screens, and its unit. */
export interface FieldLabel {
  readonly label: string;
  readonly unit: string;
}

/** `*` stands for the place in a list; `#` in the label for that place, counted from 1. */
const LABELS: readonly (readonly [path: string, label: string, unit: string])[] = [
  ['requirement/designFrequencyGHz', 'Design frequency', 'GHz'],
  ['requirement/bandGHz', 'Band', 'GHz'],
  ['requirement/bandGHz/0', 'Lower band edge', 'GHz'],
  ['requirement/bandGHz/1', 'Upper band edge', 'GHz'],
  ['requirement/beams', 'Beams', ''],
  ['requirement/beams/*/thetaDeg', 'Beam # θ', '°'],
  ['requirement/beams/*/phiDeg', 'Beam # φ', '°'],
  ['requirement/beams/*/levelDb', 'Beam # level', 'dB'],
  ['requirement/beams/*/phaseDeg', 'Beam # phase', '°'],
  ['requirement/polarisation', 'Polarisation', ''],
  ['requirement/minGainDbi', 'Least gain', 'dBi'],
  ['requirement/minCrossPolarDiscriminationDb', 'Least cross-polar discrimination', 'dB'],
  ['requirement/pointingToleranceDeg', 'Pointing tolerance', '°'],
  ['requirement/maxSidelobeDb', 'Highest sidelobe', 'dB'],
  ['requirement/mask', 'Sidelobe mask', ''],
  ['requirement/mask/id', 'Published envelope', ''],
  ['requirement/mask/spilloverDeg', 'Spillover region', ''],
  ['requirement/mask/spilloverDeg/0', 'Spillover region from', '°'],
  ['requirement/mask/spilloverDeg/1', 'Spillover region to', '°'],
  ['requirement/mask/segments', 'Mask formula', ''],
  ['requirement/mask/segments/*/fromDeg', 'Formula # from', '°'],
  ['requirement/mask/segments/*/toDeg', 'Formula # to', '°'],
  ['requirement/mask/segments/*/expression', 'Formula #', 'dBi'],
  ['requirement/mask/points', 'Mask points', ''],
  ['requirement/mask/points/*/0', 'Mask point # off axis', '°'],
  ['requirement/mask/points/*/1', 'Mask point # level', 'dBi'],
  ['panel/operation', 'Operation', ''],
  ['panel/outline', 'Outline', ''],
  ['panel/outline/widthMm', 'Width', 'mm'],
  ['panel/outline/heightMm', 'Height', 'mm'],
  ['panel/outline/pointsMm', 'Corners', ''],
  ['panel/outline/pointsMm/*/0', 'Corner # x', 'mm'],
  ['panel/outline/pointsMm/*/1', 'Corner # y', 'mm'],
  ['panel/lattice', 'Lattice', ''],
  ['panel/lattice/periodXMm', 'Period along x', 'mm'],
  ['panel/lattice/periodYMm', 'Period along y', 'mm'],
  ['panel/lattice/rowSpacingMm', 'Row spacing', 'mm'],
  ['panel/keepOuts', 'Keep-outs', ''],
  ['panel/keepOuts/*', 'Keep-out #', ''],
  ['panel/keepOuts/*/widthMm', 'Keep-out # width', 'mm'],
  ['panel/keepOuts/*/heightMm', 'Keep-out # height', 'mm'],
  ['panel/keepOuts/*/centreMm/0', 'Keep-out # centre x', 'mm'],
  ['panel/keepOuts/*/centreMm/1', 'Keep-out # centre y', 'mm'],
  ['panel/keepOuts/*/pointsMm', 'Keep-out # corners', ''],
  ['panel/keepOuts/*/pointsMm/*/0', 'Keep-out # corner x', 'mm'],
  ['panel/keepOuts/*/pointsMm/*/1', 'Keep-out # corner y', 'mm'],
  ['illumination', 'Illumination', ''],
  ['illumination/positionMm/0', 'Horn x', 'mm'],
  ['illumination/positionMm/1', 'Horn y', 'mm'],
  ['illumination/positionMm/2', 'Horn z', 'mm'],
  ['illumination/aimMm/0', 'Horn aim x', 'mm'],
  ['illumination/aimMm/1', 'Horn aim y', 'mm'],
  ['illumination/aimMm/2', 'Horn aim z', 'mm'],
  ['illumination/exponentE', 'Horn exponent, E-plane', ''],
  ['illumination/exponentH', 'Horn exponent, H-plane', ''],
  ['illumination/polarisation', 'Polarisation of the illumination', ''],
  ['illumination/thetaDeg', 'Plane wave from θ', '°'],
  ['illumination/phiDeg', 'Plane wave from φ', '°'],
  ['illumination/launch', 'Launch of the guided wave', ''],
  ['illumination/launch/directionDeg', 'Guided wave runs towards', '°'],
  ['illumination/launch/centreMm/0', 'Launch x', 'mm'],
  ['illumination/launch/centreMm/1', 'Launch y', 'mm'],
  ['illumination/launch/radiusMm', 'Radius of the launch', 'mm'],
  ['illumination/effectiveIndex', 'Effective index', ''],
  ['illumination/leakageNpPerM', 'Leakage', '1/m'],
  ['synthesis', 'Target phase', ''],
  ['synthesis/pointMm/0', 'Focus x', 'mm'],
  ['synthesis/pointMm/1', 'Focus y', 'mm'],
  ['synthesis/pointMm/2', 'Focus z', 'mm'],
  ['synthesis/order', 'Vortex order', ''],
  ['cells', 'Cells', ''],
  ['cells/levels', 'Phase levels', ''],
  ['cells/states', 'States of a resonant cell', ''],
  ['cells/editionId', 'Edition', ''],
  ['cells/rule', 'Rule of assignment', ''],
  ['cells/excludedCells', 'Excluded cells', ''],
  ['cells/excludedCells/*', 'Excluded cell #', ''],
  ['cells/cells', 'What-if table', ''],
  ['cells/cells/*/phaseDeg', 'What-if cell # phase', '°'],
  ['cells/cells/*/magnitude', 'What-if cell # magnitude', ''],
  ['referencePhaseDeg', 'Reference phase', '°'],
  ['prediction/receiveExponent', 'Receive exponent', ''],
  ['prediction/radiateExponent', 'Radiate exponent', ''],
  ['schemaVersion', 'Version of the document', ''],
];

const rows = LABELS.map(([path, label, unit]) => ({ steps: path.split('/'), label, unit }));

/** The name of the field at a pointer; of an unnamed one the pointer itself. */
export function fieldLabel(pointer: string): FieldLabel {
  const steps = pointerSteps(pointer);
  const row = rows.find((candidate) => fits(candidate.steps, steps));
  if (!row) return { label: pointer, unit: '' };
  const place = Number(steps[row.steps.indexOf('*')]) + 1;
  return { label: row.label.replace('#', String(place)), unit: row.unit };
}

function fits(pattern: readonly string[], steps: readonly string[]): boolean {
  return pattern.length === steps.length && pattern.every((step, at) => step === steps[at] || (step === '*' && /^\d+$/.test(steps[at])));
}
