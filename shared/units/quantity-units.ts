/** What a field holds. A `number` has no unit; a `length` is a size of the panel, a `distance` the way of a link. */
export type QuantityDimension = 'frequency' | 'length' | 'distance' | 'angle' | 'level' | 'power' | 'number';

/** How a unit relates to the document's unit: by a power of ten (exact), by a factor, or as decibels of a power. */
export type UnitScale =
  | { readonly kind: 'decimal'; readonly exponent: number }
  | { readonly kind: 'factor'; readonly factor: number }
  | { readonly kind: 'power-decibel'; readonly referenceW: number };

export interface QuantityUnit {
  readonly symbol: string;
  readonly dimension: QuantityDimension;
  readonly scale: UnitScale;
  /** Other spellings, matched as they stand. */
  readonly spellings?: readonly string[];
}

const decimal = (exponent: number): UnitScale => ({ kind: 'decimal', exponent });
const factor = (value: number): UnitScale => ({ kind: 'factor', factor: value });

/** Every unit the fields understand. The document's units are GHz, mm (m for distances), deg, dB and W. */
export const QUANTITY_UNITS: readonly QuantityUnit[] = [
  { symbol: 'Hz', dimension: 'frequency', scale: decimal(-9) },
  { symbol: 'kHz', dimension: 'frequency', scale: decimal(-6) },
  { symbol: 'MHz', dimension: 'frequency', scale: decimal(-3) },
  { symbol: 'GHz', dimension: 'frequency', scale: decimal(0) },
  { symbol: 'THz', dimension: 'frequency', scale: decimal(3) },
  { symbol: 'nm', dimension: 'length', scale: decimal(-6) },
  { symbol: 'µm', dimension: 'length', scale: decimal(-3), spellings: ['um'] },
  { symbol: 'mm', dimension: 'length', scale: decimal(0) },
  { symbol: 'cm', dimension: 'length', scale: decimal(1) },
  { symbol: 'm', dimension: 'length', scale: decimal(3) },
  { symbol: 'km', dimension: 'length', scale: decimal(6) },
  // The international inch is 25.4 mm exactly; the mil is its thousandth.
  { symbol: 'in', dimension: 'length', scale: factor(25.4), spellings: ['inch', 'inches', '"', '″'] },
  { symbol: 'mil', dimension: 'length', scale: factor(0.0254), spellings: ['mils', 'thou'] },
  { symbol: 'ft', dimension: 'length', scale: factor(304.8), spellings: ['foot', 'feet'] },
  { symbol: 'mm', dimension: 'distance', scale: decimal(-3) },
  { symbol: 'm', dimension: 'distance', scale: decimal(0) },
  { symbol: 'km', dimension: 'distance', scale: decimal(3) },
  { symbol: 'ft', dimension: 'distance', scale: factor(0.3048), spellings: ['foot', 'feet'] },
  { symbol: 'mi', dimension: 'distance', scale: factor(1609.344), spellings: ['mile', 'miles'] },
  { symbol: '°', dimension: 'angle', scale: decimal(0), spellings: ['deg', 'degree', 'degrees'] },
  { symbol: 'rad', dimension: 'angle', scale: factor(180 / Math.PI) },
  { symbol: 'mrad', dimension: 'angle', scale: factor(0.18 / Math.PI) },
  { symbol: 'arcmin', dimension: 'angle', scale: factor(1 / 60), spellings: ['′'] },
  { symbol: 'arcsec', dimension: 'angle', scale: factor(1 / 3600), spellings: ['″'] },
  { symbol: 'dB', dimension: 'level', scale: decimal(0) },
  { symbol: 'dBi', dimension: 'level', scale: decimal(0) },
  { symbol: 'W', dimension: 'power', scale: decimal(0) },
  { symbol: 'mW', dimension: 'power', scale: decimal(-3) },
  { symbol: 'µW', dimension: 'power', scale: decimal(-6), spellings: ['uW'] },
  { symbol: 'kW', dimension: 'power', scale: decimal(3) },
  { symbol: 'dBm', dimension: 'power', scale: { kind: 'power-decibel', referenceW: 1e-3 } },
  { symbol: 'dBW', dimension: 'power', scale: { kind: 'power-decibel', referenceW: 1 } },
];

/** The unit in which the document keeps each dimension and in which a bare number is read. */
export const DOCUMENT_UNITS: Readonly<Record<QuantityDimension, string>> = {
  frequency: 'GHz',
  length: 'mm',
  distance: 'm',
  angle: '°',
  level: 'dB',
  power: 'W',
  number: '',
};

/** Real units nobody means in these fields: one wrong letter away from a unit that is meant. */
const REFUSED_UNITS: readonly { readonly text: string; readonly meaning: string; readonly instead: string }[] = [
  { text: 'mHz', meaning: 'millihertz', instead: 'MHz' },
  { text: 'Mm', meaning: 'megametre', instead: 'mm' },
  { text: 'MW', meaning: 'megawatt', instead: 'mW' },
];

/** Beginnings of units, completed in the suggestion. */
const INCOMPLETE_UNITS: Readonly<Partial<Record<QuantityDimension, readonly (readonly [string, string])[]>>> = {
  frequency: [
    ['g', 'GHz'],
    ['G', 'GHz'],
    ['gig', 'GHz'],
    ['M', 'MHz'],
    ['meg', 'MHz'],
    ['k', 'kHz'],
    ['K', 'kHz'],
    ['T', 'THz'],
    ['H', 'Hz'],
  ],
  length: [
    ['u', 'µm'],
    ['µ', 'µm'],
    ['c', 'cm'],
    ['milli', 'mm'],
  ],
  angle: [
    ['d', '°'],
    ['r', 'rad'],
  ],
  level: [['d', 'dB']],
  power: [
    ['m', 'mW'],
    ['w', 'W'],
  ],
};

export type UnitMatch =
  | { readonly kind: 'unit'; readonly unit: QuantityUnit; readonly note?: string }
  | {
      readonly kind: 'refused';
      readonly reason: string;
      readonly instead?: string;
      /** A unit of something else: its number says nothing about this quantity. */
      readonly isForeign?: true;
    };

function spellingsOf(unit: QuantityUnit): readonly string[] {
  return [unit.symbol, ...(unit.spellings ?? [])];
}

/** Finds a unit by its exact spelling first, then by a spelling that is unique when case is ignored. */
export function matchUnit(text: string, dimension: QuantityDimension): UnitMatch {
  const exact = QUANTITY_UNITS.filter((unit) => spellingsOf(unit).includes(text));
  const fitting = exact.find((unit) => unit.dimension === dimension);
  if (fitting) return { kind: 'unit', unit: fitting };
  const refused = REFUSED_UNITS.find((entry) => entry.text === text);
  if (refused) return { kind: 'refused', reason: `"${text}" is the ${refused.meaning}`, instead: refused.instead };
  const incomplete = INCOMPLETE_UNITS[dimension]?.find(([beginning]) => beginning === text);
  if (incomplete) return { kind: 'refused', reason: `"${text}" is not a whole unit`, instead: incomplete[1] };
  if (exact.length > 0) {
    const reason = `"${text}" is a unit of ${exact[0].dimension}, and this is ${named(dimension)}`;
    // A single m may also be the beginning of megahertz.
    return text === 'm' && dimension === 'frequency' ? { kind: 'refused', reason, instead: 'MHz' } : { kind: 'refused', reason, isForeign: true };
  }
  return matchIgnoringCase(text, dimension);
}

function matchIgnoringCase(text: string, dimension: QuantityDimension): UnitMatch {
  const folded = text.toLowerCase();
  const candidates = QUANTITY_UNITS.filter(
    (unit) => unit.dimension === dimension && spellingsOf(unit).some((spelling) => spelling.toLowerCase() === folded),
  );
  if (candidates.length !== 1) return { kind: 'refused', reason: `"${text}" is not a unit of ${dimension}` };
  const unit = candidates[0];
  // A small m in front means milli in every other unit, so the reading is said aloud.
  const note = unit.symbol === 'MHz' && text.startsWith('m') ? `"${text}" read as MHz, megahertz` : undefined;
  return note ? { kind: 'unit', unit, note } : { kind: 'unit', unit };
}

function named(dimension: QuantityDimension): string {
  return dimension === 'angle' ? 'an angle' : `a ${dimension}`;
}
