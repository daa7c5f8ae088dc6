import { parseQuantity } from './quantity';
import { DOCUMENT_UNITS, QUANTITY_UNITS, matchUnit } from './quantity-units';
import type { QuantityDimension } from './quantity-units';

describe('the units of the fields', () => {
  it('are each found by every spelling they list', () => {
    for (const unit of QUANTITY_UNITS)
      for (const spelling of [unit.symbol, ...(unit.spellings ?? [])])
        expect([spelling, matchUnit(spelling, unit.dimension)]).toEqual([spelling, { kind: 'unit', unit }]);
  });

  it('are read as 1 in the unit of the document', () => {
    for (const dimension of ['frequency', 'length', 'distance', 'angle', 'level', 'power'] as const)
      expect([dimension, parseQuantity(`1 ${DOCUMENT_UNITS[dimension]}`, dimension)]).toEqual([dimension, { kind: 'value', value: 1 }]);
  });

  // Definitions: SI prefixes; inch 25.4 mm (1959 agreement); foot 12 inches; mil 0.001 inch; a turn is 2 pi rad and 360 degrees.
  it.each<readonly [string, QuantityDimension, number]>([
    ['Hz', 'frequency', 1e-9],
    ['THz', 'frequency', 1000],
    ['nm', 'length', 1e-6],
    ['µm', 'length', 1e-3],
    ['km', 'length', 1e6],
    ['in', 'length', 25.4],
    ['mil', 'length', 0.0254],
    ['ft', 'length', 304.8],
    ['km', 'distance', 1000],
    ['mi', 'distance', 1609.344],
    ['rad', 'angle', 360 / (2 * Math.PI)],
    ['mrad', 'angle', 0.36 / (2 * Math.PI)],
    ['arcmin', 'angle', 1 / 60],
    ['arcsec', 'angle', 1 / 3600],
    ['kW', 'power', 1000],
    ['µW', 'power', 1e-6],
  ])('have the size their definition gives: 1 %s', (symbol, dimension, value) => {
    const read = parseQuantity(`1 ${symbol}`, dimension);
    expect(read.kind === 'value' ? read.value / value : read).toBeCloseTo(1, 13);
  });

  it('give 0 dBm as a milliwatt and 0 dBW as a watt', () => {
    expect(parseQuantity('0 dBm', 'power')).toEqual({ kind: 'value', value: 0.001 });
    expect(parseQuantity('0 dBW', 'power')).toEqual({ kind: 'value', value: 1 });
  });

  it('keep a double prime apart as inches in a length and seconds of arc in an angle', () => {
    expect(matchUnit('″', 'length')).toMatchObject({ unit: { symbol: 'in' } });
    expect(matchUnit('″', 'angle')).toMatchObject({ unit: { symbol: 'arcsec' } });
  });

  it.each<readonly [string, QuantityDimension, string | undefined]>([
    ['mHz', 'frequency', 'MHz'],
    ['Mm', 'length', 'mm'],
    ['MW', 'power', 'mW'],
    ['G', 'frequency', 'GHz'],
    ['u', 'length', 'µm'],
    ['GHz', 'length', undefined],
    ['parsec', 'length', undefined],
  ])('refuse %s in a field of %s and offer %s', (text, dimension, instead) => {
    const match = matchUnit(text, dimension);
    expect(match.kind === 'refused' ? match.instead : match).toBe(instead);
  });
});
