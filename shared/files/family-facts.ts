import type { FamilyDescription } from '../model/cell-family';
import type { DetectedNumber, DetectedParameter, DetectionSource } from './family-inspection';
import { NUMBER_TEXT } from './file-text';
import type { TouchstoneComment } from './touchstone-data';

/** Values of the substrate and lattice that files mention beside the cell itself. */
export interface FamilySurroundings {
  readonly periodMm?: number;
  readonly thicknessMm?: number;
  readonly relativePermittivity?: number;
  readonly lossTangent?: number;
  readonly material?: string;
  readonly designFrequencyGHz?: number;
}

/** What one source (the comments, the index, the name) says of one file. */
export interface FileFacts {
  readonly cellId?: string;
  readonly parameters: readonly DetectedParameter[];
  readonly thetaDeg?: DetectedNumber;
  readonly phiDeg?: DetectedNumber;
  readonly polarisation?: string;
  readonly provenance?: string;
  readonly timeConvention?: FamilyDescription['timeConvention'];
  readonly surroundings: FamilySurroundings;
}

/** Lengths that describe the lattice or the slab and are no parameter of the cell. */
const SURROUNDING_NAMES: ReadonlyMap<string, keyof FamilySurroundings> = new Map([
  ['period_mm', 'periodMm'],
  ['thickness_mm', 'thicknessMm'],
  ['substrate_thickness_mm', 'thicknessMm'],
  ['eps_r', 'relativePermittivity'],
  ['substrate_er', 'relativePermittivity'],
  ['tan_delta', 'lossTangent'],
  ['f0_ghz', 'designFrequencyGHz'],
]);

/** A name as an identifier of the description: `ring_outer_side_mm` becomes `ringOuterSide`. */
export function parameterId(name: string): string {
  const words = name.replace(/_mm$/i, '').split(/[^A-Za-z0-9]+/).filter((word) => word !== '');
  const joined = words.map((word, i) => (i === 0 ? word[0].toLowerCase() + word.slice(1) : word[0].toUpperCase() + word.slice(1))).join('');
  return joined.replace(/^[^A-Za-z]+/, '').slice(0, 40);
}

/** Sorts one `name = value` into the facts it belongs to. Returns true when the name is known or is a length in mm. */
export function collectNamedValue(facts: CollectedFacts, name: string, value: string, from: DetectionSource): boolean {
  const key = name.trim().toLowerCase();
  const number = NUMBER_TEXT.test(value.trim()) ? Number(value) : null;
  if (key === 'cell_id' && value.trim() !== '') {
    facts.cellId ??= value.trim();
    return true;
  }
  if (number === null || !Number.isFinite(number)) return false;
  if (key === 'theta_deg') facts.thetaDeg ??= { value: number, from };
  else if (key === 'phi_deg') facts.phiDeg ??= { value: number, from };
  else if (SURROUNDING_NAMES.has(key)) facts.surroundings[SURROUNDING_NAMES.get(key) as NumericSurrounding] ??= number;
  else if (key.endsWith('_mm') && parameterId(name.trim()) !== '') addParameter(facts, { name: parameterId(name.trim()), value: number, from });
  else return false;
  return true;
}

type NumericSurrounding = Exclude<keyof FamilySurroundings, 'material'>;

/** Facts while they are being collected. */
export interface CollectedFacts {
  cellId?: string;
  parameters: DetectedParameter[];
  thetaDeg?: DetectedNumber;
  phiDeg?: DetectedNumber;
  polarisation?: string;
  provenance?: string;
  timeConvention?: FamilyDescription['timeConvention'];
  surroundings: { -readonly [Key in keyof FamilySurroundings]: FamilySurroundings[Key] };
}

export function noFacts(): CollectedFacts {
  return { parameters: [], surroundings: {} };
}

function addParameter(facts: CollectedFacts, parameter: DetectedParameter): void {
  if (!facts.parameters.some(({ name }) => name === parameter.name)) facts.parameters.push(parameter);
}

// The value is only looked at, since in `substrate: eps_r = 2.2` it is the next name.
const ASSIGNMENT = /(?<!\w)([A-Za-z]\w{0,60})\s{0,4}[=:]\s{0,4}(?=([^\s,;()]+))/g;

/** Facts in the comments of a network file, such as `! patch_side_mm = 3.00` or `! theta_deg = 15`. */
export function factsOfComments(comments: readonly TouchstoneComment[]): FileFacts {
  const facts = noFacts();
  const ports: string[] = [];
  for (const { text } of comments) {
    const short = text.slice(0, 2000);
    for (const match of short.matchAll(ASSIGNMENT)) collectNamedValue(facts, match[1], match[2], 'comment');
    facts.timeConvention ??= timeConventionIn(short);
    if (/^provenance\s*[:=]/i.test(short)) facts.provenance ??= short.replace(/^provenance\s*[:=]\s*/i, '');
    if (/\bport\s*[12]\s*[=:]/i.test(short)) ports.push(short);
  }
  if (ports.length > 0) facts.polarisation = ports.join(' ');
  return facts;
}

/** The sign of j w t in words such as `exp(+j w t)`, `e^{-i omega t}` or `exp(jwt)`. */
export function timeConventionIn(text: string): FamilyDescription['timeConvention'] | undefined {
  const match = /(?:exp\s?\(|e\^\{?)\s?([+\u2212-]?)\s?([ij])\s?\*?\s?(?:w|omega|\u03c9)\s?\*?\s?t/i.exec(text);
  if (!match) return undefined;
  return match[1] === '-' || match[1] === '\u2212' ? 'exp(-jwt)' : 'exp(+jwt)';
}

const ANGLE_IN_NAME = /_(t|th|theta|p|ph|phi)(\d+(?:\.\d+)?)(?=[_-]|$)/gi;
const LENGTH_IN_NAME = /_([a-z])(\d+(?:\.\d+)?)(?=[_-]|$)/gi;

/** Facts in a name such as `K5_a03.00_t15_p22.5.s2p`: t and p are angles in degrees, other single letters lengths in mm. */
export function factsOfName(fileName: string): FileFacts {
  const facts = noFacts();
  const stem = nameStem(fileName);
  for (const [, letter, digits] of stem.matchAll(ANGLE_IN_NAME)) {
    const angle: DetectedNumber = { value: Number(digits), from: 'file-name' };
    if (letter.toLowerCase().startsWith('t')) facts.thetaDeg ??= angle;
    else facts.phiDeg ??= angle;
  }
  const withoutAngles = stem.replace(ANGLE_IN_NAME, '');
  for (const [, letter, digits] of withoutAngles.matchAll(LENGTH_IN_NAME)) addParameter(facts, { name: letter, value: Number(digits), from: 'file-name' });
  facts.cellId = withoutAngles === '' ? stem : withoutAngles;
  return facts;
}

/** The name without folders and without its ending. */
export function nameStem(fileName: string): string {
  return baseName(fileName).replace(/\.[A-Za-z]\w{0,4}$/, '');
}

export function baseName(fileName: string): string {
  return fileName.slice(Math.max(fileName.lastIndexOf('/'), fileName.lastIndexOf('\\')) + 1);
}
