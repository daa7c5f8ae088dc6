import { isBranch } from './design-pointer';
import type { Branch } from './design-pointer';

type Fields = Readonly<Record<string, unknown>>;

/** Lists up to this length are written out; longer ones are counted. */
const WRITTEN_OUT = 4;

/** A part of the design in one line, as lists of differences print it. */
export function designPartText(value: unknown): number | string | boolean | null {
  if (value === undefined || value === null) return null;
  if (typeof value === 'number' || typeof value === 'string' || typeof value === 'boolean') return value;
  return isBranch(value) ? branchText(value) : null;
}

function branchText(value: Branch): string {
  return Array.isArray(value) ? listText(value) : fieldsText(value as Fields);
}

function listText(items: readonly unknown[]): string {
  if (items.length === 0) return 'none';
  const tuple = items.every((item) => typeof item === 'number');
  if (tuple && items.length <= WRITTEN_OUT) return items.join(', ');
  if (items.length <= WRITTEN_OUT) return items.map((item) => String(designPartText(item))).join('; ');
  return `${items.length} entries`;
}

function sizeText(fields: Fields): string {
  const corners = fields['pointsMm'];
  return Array.isArray(corners) ? `polygon of ${corners.length} corners` : `${fields['kind']} ${fields['widthMm']} × ${fields['heightMm']} mm`;
}

function beamText(fields: Fields): string {
  const level = fields['levelDb'] === undefined ? '' : `, ${fields['levelDb']} dB`;
  const phase = fields['phaseDeg'] === undefined ? '' : `, phase ${fields['phaseDeg']}°`;
  return `θ ${fields['thetaDeg']}° φ ${fields['phiDeg']}°${level}${phase}`;
}

const BY_KIND: Readonly<Record<string, (fields: Fields) => string>> = {
  rectangle: sizeText,
  ellipse: sizeText,
  polygon: sizeText,
  published: (fields) => `published ${fields['id']}`,
  formula: (fields) => `formula, ${lengthOf(fields['segments'])} stretches`,
  hop: (fields) => `hop of ${fields['distanceM']} m`,
  relay: (fields) => `over the panel, ${fields['incomingDistanceM']} m and ${fields['outgoingDistanceM']} m`,
  custom: (fields) => `custom, ${lengthOf(fields['points'])} points`,
  rectangular: (fields) => `rectangular ${fields['periodXMm']} × ${fields['periodYMm']} mm`,
  triangular: (fields) => `triangular ${fields['periodXMm']} × ${fields['rowSpacingMm']} mm`,
  horn: (fields) => `horn at ${designPartText(fields['positionMm'])} mm`,
  'plane-wave': (fields) => `plane wave from θ ${fields['thetaDeg']}° φ ${fields['phiDeg']}°`,
  'guided-wave': (fields) => `guided wave, ${designPartText(fields['launch'])}, index ${fields['effectiveIndex']}`,
  plane: (fields) => `plane towards ${fields['directionDeg']}°`,
  radial: (fields) => `radial, launch radius ${fields['radiusMm']} mm`,
  direct: () => 'direct',
  focus: (fields) => `focus at ${designPartText(fields['pointMm'])} mm`,
  projections: (fields) => `projections, ${designPartText(fields['goal'])}, ${fields['iterations']} iterations`,
  sectors: (fields) => `${lengthOf(fields['sectors'])} sectors`,
  mask: (fields) => `mask of ${lengthOf(fields['points'])} points`,
  diffuse: (fields) => `diffuse, blocks of ${fields['blockColumns']} × ${fields['blockRows']}, ${fields['states']} states`,
  vortex: (fields) => `vortex of order ${fields['order']}`,
  ideal: (fields) => (fields['levels'] === null ? 'ideal, continuous' : `ideal, ${fields['levels']} levels`),
  edition: (fields) => `edition ${fields['editionId']}, ${fields['rule']}`,
  modulated: (fields) => `modulated, ${lengthOf(fields['states'])} states, harmonic ${fields['harmonic']}`,
  resonant: (fields) => `resonant, ${fields['rule']}${fields['states'] === null ? '' : `, ${fields['states']} states`}`,
  inline: (fields) => `what-if table of ${lengthOf(fields['cells'])} cells`,
};

function lengthOf(value: unknown): number {
  return Array.isArray(value) ? value.length : 0;
}

function fieldsText(fields: Fields): string {
  const kind = fields['kind'];
  if (typeof kind === 'string' && kind in BY_KIND) {
    const centre = fields['centreMm'] === undefined ? '' : ` at ${designPartText(fields['centreMm'])} mm`;
    return `${BY_KIND[kind](fields)}${centre}`;
  }
  if ('thetaDeg' in fields) return beamText(fields);
  return Object.entries(fields)
    .map(([name, value]) => `${name} ${designPartText(value)}`)
    .join(', ');
}
