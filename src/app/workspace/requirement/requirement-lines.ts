import type { Requirement } from '../../../../shared/model/design-document';
import type { Verdict } from '../../../../shared/model/figures';
import type { QuantityDimension } from '../../../../shared/units/quantity';
import { BY_SYMMETRY_DB } from '../by-symmetry';
import { figureText, signedText } from '../strip-figures';

/** A line of the requirement with its limit field and what the prediction says of it. */
export interface RequirementLine {
  readonly line: Verdict['line'];
  readonly name: string;
  readonly sign: '≥' | '≤';
  /** Null for the mask, whose limit is a table of its own. */
  readonly field: { readonly pointer: string; readonly dimension: QuantityDimension; readonly unit: string } | null;
  readonly word: 'meets' | 'falls-short' | 'not-evaluated' | 'stale' | 'no-limit' | 'waiting';
  readonly value: string;
  readonly margin: string | null;
  readonly reason: string | null;
}

export interface VerdictSource {
  /** Null before the first prediction. */
  readonly verdicts: readonly Verdict[] | null;
  /** The verdicts are of an older design than the one on the screen. */
  readonly stale: boolean;
}

type LineShape = Pick<RequirementLine, 'line' | 'name' | 'sign' | 'field'> & { readonly digits: number; readonly unit: string; readonly most?: number; isSet(requirement: Requirement): boolean; isShown?(requirement: Requirement): boolean };

const SHAPES: readonly LineShape[] = [
  {
    line: 'gain',
    name: 'Least gain',
    sign: '≥',
    field: { pointer: '/requirement/minGainDbi', dimension: 'level', unit: 'dBi' },
    digits: 2,
    unit: 'dBi',
    isSet: ({ minGainDbi }) => minGainDbi !== undefined,
  },
  {
    line: 'sidelobe',
    name: 'Highest sidelobe',
    sign: '≤',
    field: { pointer: '/requirement/maxSidelobeDb', dimension: 'level', unit: 'dB' },
    digits: 2,
    unit: 'dB',
    isSet: ({ maxSidelobeDb }) => maxSidelobeDb !== undefined,
  },
  {
    line: 'pointing',
    name: 'Pointing tolerance',
    sign: '≤',
    field: { pointer: '/requirement/pointingToleranceDeg', dimension: 'angle', unit: '°' },
    digits: 3,
    unit: '°',
    isSet: ({ pointingToleranceDeg }) => pointingToleranceDeg !== undefined,
  },
  {
    line: 'cross-polar',
    name: 'Cross-polar discrimination',
    sign: '≥',
    field: { pointer: '/requirement/minCrossPolarDiscriminationDb', dimension: 'level', unit: 'dB' },
    ...{ digits: 2, unit: 'dB', most: BY_SYMMETRY_DB },
    isSet: ({ minCrossPolarDiscriminationDb }) => minCrossPolarDiscriminationDb !== undefined,
  },
  { line: 'mask', name: 'Mask margin', sign: '≥', field: null, digits: 2, unit: 'dB', isSet: ({ mask }) => mask !== undefined },
  {
    line: 'cross-polar-mask',
    name: 'Cross-polar mask margin',
    ...{ sign: '≥', field: null, digits: 2, unit: 'dB' },
    isSet: ({ crossPolarMask }) => crossPolarMask !== undefined,
    isShown: ({ crossPolarMask }) => crossPolarMask !== undefined,
  },
  {
    line: 'eirp-density',
    name: 'EIRP density margin',
    ...{ sign: '≥', field: null, digits: 2, unit: 'dB' },
    isSet: ({ transmitter }) => transmitter?.densityMask !== undefined,
    isShown: ({ transmitter }) => transmitter?.densityMask !== undefined,
  },
  {
    line: 'received-power',
    name: 'Received power',
    sign: '≥',
    field: { pointer: '/requirement/link/minReceivedDbm', dimension: 'number', unit: 'dBm' },
    ...{ digits: 2, unit: 'dBm' },
    isSet: ({ link }) => link?.minReceivedDbm !== undefined,
    isShown: ({ link }) => link !== undefined,
  },
  {
    line: 'gain-over-temperature',
    name: 'G/T',
    sign: '≥',
    field: { pointer: '/requirement/receiver/minGainOverTemperatureDbPerK', dimension: 'number', unit: 'dB/K' },
    ...{ digits: 2, unit: 'dB/K' },
    isSet: ({ receiver }) => receiver?.minGainOverTemperatureDbPerK !== undefined,
    isShown: ({ receiver }) => receiver !== undefined,
  },
];

/** The lines in their fixed order, those of mask, link and receiver where there is one; a line without a limit is never shown as met. */
export function requirementLines(requirement: Requirement, { verdicts, stale }: VerdictSource): readonly RequirementLine[] {
  return SHAPES.filter(({ isShown }) => isShown?.(requirement) ?? true).map(({ line, name, sign, field, digits, unit, most = Infinity, isSet }) => {
    const shape = { line, name, sign, field };
    if (!isSet(requirement)) return { ...shape, word: 'no-limit', value: '–', margin: null, reason: null };
    const verdict = verdicts?.find((candidate) => candidate.line === line);
    if (!verdict) return { ...shape, word: 'waiting', value: '–', margin: null, reason: 'No prediction yet' };
    const beyond = typeof verdict.value === 'number' && verdict.value > most ? verdict.value - most : 0;
    const over = beyond > 0 ? '> ' : '';
    return {
      ...shape,
      word: stale ? 'stale' : verdict.verdict,
      value: typeof verdict.value === 'number' ? `${over}${figureText(verdict.value - beyond, digits)} ${unit}` : '–',
      margin: typeof verdict.margin === 'number' ? `${over}${signedText(verdict.margin - beyond, digits)}` : null,
      reason: verdict.reason ?? (typeof verdict.value === 'number' ? null : verdict.value.reason),
    };
  });
}
