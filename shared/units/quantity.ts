import { DOCUMENT_UNITS, QUANTITY_UNITS, matchUnit } from './quantity-units';
import type { QuantityDimension, QuantityUnit } from './quantity-units';

export type { QuantityDimension } from './quantity-units';

/** A typed quantity in the document's unit (GHz, mm, degrees, dB, W), or why it was refused. */
export type ParsedQuantity =
  | { readonly kind: 'value'; readonly value: number; readonly note?: string }
  | { readonly kind: 'refused'; readonly reason: string; readonly suggestion?: string };

/** What the field around the text shows. */
export interface QuantityField {
  /** The unit shown beside the field, which a bare number takes; the document's unit when absent. */
  readonly shownUnit?: string;
}

const NUMBER = '[+-]?(?:\\d+(?:\\.\\d*)?|\\.\\d+)(?:[eE][+-]?\\d+)?';
const QUANTITY = new RegExp(`^(${NUMBER})\\s*([^\\s\\d.,+\\-][^\\s\\d]*)?$`, 'u');
const COMMA_DECIMAL = /^([+-]?\d*),(\d+)((?:[eE][+-]?\d+)?)(?=$|[^\d,.])\s*(.*)$/u;
const GROUPED = /^([+-]?\d{1,3})((?:[ ,']\d{3})+)(\.\d+)?(?=$|[^\d,.])\s*(.*)$/u;
const LONGEST_TEXT = 80;
/** A bare frequency from here up was probably meant in hertz. */
const IMPLAUSIBLE_GHZ = 1e5;

/**
 * Reads what a person typed into a field: a number and an optional unit, nothing else.
 * A bare number takes the field's shown unit. Inverse of `formatQuantity` and `exactQuantity`.
 */
export function parseQuantity(text: string, dimension: QuantityDimension, field: QuantityField = {}): ParsedQuantity {
  const typed = normaliseTyping(text);
  if (typed === '') return { kind: 'refused', reason: 'Nothing was typed', suggestion: exampleOf(dimension) };
  if (typed.length > LONGEST_TEXT) return { kind: 'refused', reason: `Longer than ${LONGEST_TEXT} characters` };
  const match = QUANTITY.exec(typed);
  if (!match) return refuseShape(typed, dimension);
  const [, number, unitText] = match;
  if (!Number.isFinite(Number(number))) return { kind: 'refused', reason: `${number} is too large a number` };
  return unitText === undefined ? readBare(number, dimension, field) : readWithUnit(number, unitText, dimension, field);
}

/** Minus signs, micro signs, primes and spaces in all their Unicode forms become one form each. */
function normaliseTyping(text: string): string {
  return text
    .replace(/[\u2212\u2010\u2011\u2013\uFF0D]/gu, '-')
    .replace(/\u03BC/gu, 'µ')
    .replace(/[\u201D\u201C\u02BA]|''/gu, '"')
    .replace(/\u00BA/gu, '°')
    .replace(/[\u00A0\u2000-\u200A\u202F\u205F\u3000\t]/gu, ' ')
    .trim();
}

function readBare(number: string, dimension: QuantityDimension, field: QuantityField): ParsedQuantity {
  const shown = field.shownUnit ?? DOCUMENT_UNITS[dimension];
  if (dimension === 'number' || shown === '') return { kind: 'value', value: plainNumber(number) };
  const match = matchUnit(shown, dimension);
  if (match.kind === 'refused') throw new RangeError(`Shown unit "${shown}" is not a unit of ${dimension}`);
  const read = scaled(number, match.unit);
  if (read.kind === 'value' && dimension === 'frequency' && Math.abs(read.value) >= IMPLAUSIBLE_GHZ)
    return { ...read, note: `Read in ${shown}; for hertz write ${number} Hz` };
  return read;
}

function readWithUnit(number: string, unitText: string, dimension: QuantityDimension, field: QuantityField): ParsedQuantity {
  if (dimension === 'number') return { kind: 'refused', reason: `This is a number without a unit; got "${unitText}"`, suggestion: number };
  const match = matchUnit(unitText, dimension);
  if (match.kind === 'refused') {
    if (match.isForeign) return { kind: 'refused', reason: match.reason };
    return { kind: 'refused', reason: match.reason, suggestion: `${number} ${match.instead ?? field.shownUnit ?? DOCUMENT_UNITS[dimension]}` };
  }
  if (field.shownUnit === 'dB' && match.unit.symbol === 'dBi')
    return { kind: 'refused', reason: 'dBi is a gain against an isotropic radiator; this level is relative', suggestion: `${number} dB` };
  const read = scaled(number, match.unit);
  const note = field.shownUnit === 'dBi' && match.unit.symbol === 'dB' ? 'dB read as dBi' : match.note;
  return read.kind === 'value' && note !== undefined ? { ...read, note } : read;
}

/** Applies a unit's scale; powers of ten act on the decimal text so that 28e9 Hz is 28 GHz to the last bit. */
function scaled(number: string, unit: QuantityUnit): ParsedQuantity {
  const value = scaledValue(number, unit);
  return Number.isFinite(value) ? { kind: 'value', value } : { kind: 'refused', reason: `${number} ${unit.symbol} is too large` };
}

function scaledValue(number: string, unit: QuantityUnit): number {
  const { scale } = unit;
  if (scale.kind === 'decimal') return shiftDecimal(number, scale.exponent);
  if (scale.kind === 'power-decibel') return scale.referenceW * 10 ** (Number(number) / 10);
  // Fifteen digits hold every decimal a person types and drop the binary tail of the product.
  return plainNumber((Number(number) * scale.factor).toPrecision(15));
}

function shiftDecimal(number: string, exponent: number): number {
  const [mantissa, written] = number.toLowerCase().split('e');
  return plainNumber(`${mantissa}e${Number(written ?? 0) + exponent}`);
}

function plainNumber(number: string): number {
  const value = Number(number);
  return value === 0 ? 0 : value;
}

/** Says what is wrong with text that is not a number with a unit, and proposes what was probably meant. */
function refuseShape(typed: string, dimension: QuantityDimension): ParsedQuantity {
  const grouped = GROUPED.exec(typed);
  const comma = COMMA_DECIMAL.exec(typed);
  if (grouped && comma && !/[ '.]/u.test(grouped[2] + (grouped[3] ?? '')) && grouped[2].length === 4)
    return { kind: 'refused', reason: `The comma can mean ${comma[1]}.${comma[2]} or ${comma[1]}${comma[2]}; write it without a comma` };
  if (comma) return { kind: 'refused', reason: 'The decimal sign is a point', suggestion: joined(`${comma[1] || '0'}.${comma[2]}${comma[3]}`, comma[4]) };
  if (grouped) {
    const digits = grouped[1] + grouped[2].replace(/[ ,']/gu, '') + (grouped[3] ?? '');
    return { kind: 'refused', reason: 'Write the digits without separators', suggestion: joined(digits, grouped[4]) };
  }
  if (/^[+-]?(inf|nan)/iu.test(typed)) return { kind: 'refused', reason: `"${typed}" is not a finite number` };
  if (/^[\d.(][^a-z]*[*/^()+-]/iu.test(typed)) return { kind: 'refused', reason: 'Sums are not worked out here; type the result', suggestion: exampleOf(dimension) };
  return { kind: 'refused', reason: dimension === 'number' ? `"${typed}" is not a number` : `"${typed}" is not a number with a unit`, suggestion: exampleOf(dimension) };
}

function joined(number: string, unit: string): string {
  return unit === '' ? number : `${number} ${unit.trim()}`;
}

function exampleOf(dimension: QuantityDimension): string {
  const examples = { frequency: '28 GHz', length: '10.7 mm', distance: '2 km', angle: '45°', level: '-3 dB', power: '2 W', number: '4' };
  return examples[dimension];
}

const DISPLAY_DIGITS = 5;

/** A value in the document's unit as text with at most five significant figures. Throws on a number that is not finite. */
export function formatQuantity(value: number, dimension: QuantityDimension, field: QuantityField = {}): string {
  return withUnit(shortDigits(inShownUnit(value, dimension, field)), dimension, field);
}

/** A value in the document's unit to the last bit: what the clipboard gets. `parseQuantity` gives back the same number. */
export function exactQuantity(value: number, dimension: QuantityDimension): string {
  return withUnit(String(plainNumber(String(checked(value, dimension)))), dimension, {});
}

function checked(value: number, dimension: QuantityDimension): number {
  if (!Number.isFinite(value)) throw new RangeError(`A ${dimension} to be shown must be finite; got ${value}`);
  return value;
}

function shortDigits(value: number): string {
  return String(plainNumber(value.toPrecision(DISPLAY_DIGITS)));
}

function inShownUnit(value: number, dimension: QuantityDimension, field: QuantityField): number {
  checked(value, dimension);
  const unit = QUANTITY_UNITS.find((candidate) => candidate.dimension === dimension && candidate.symbol === field.shownUnit);
  if (!unit) return value;
  if (unit.scale.kind === 'decimal') return shiftDecimal(String(value), -unit.scale.exponent);
  if (unit.scale.kind === 'factor') return value / unit.scale.factor;
  return value > 0 ? 10 * Math.log10(value / unit.scale.referenceW) : checked(Number.NEGATIVE_INFINITY, dimension);
}

function withUnit(number: string, dimension: QuantityDimension, field: QuantityField): string {
  const unit = field.shownUnit ?? DOCUMENT_UNITS[dimension];
  if (dimension === 'number' || unit === '') return number;
  // The degree sign stands against its number, every other unit apart from it (SI Brochure, 5.4.3).
  return unit === '°' ? `${number}°` : `${number} ${unit}`;
}
