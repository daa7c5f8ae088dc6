import { CONTRIBUTOR_IDS, CONTRIBUTORS } from '../../../../shared/model/tolerance-contributors';
import { readSpread, spreadText, spreadUnit } from './spread-text';

describe('the text of a spread', () => {
  it('reads back what it shows, for every contributor', () => {
    for (const id of CONTRIBUTOR_IDS) {
      const { spread } = CONTRIBUTORS[id];
      const read = readSpread(id, `${spreadText(id, spread)} ${spreadUnit(id)}`);
      expect(read.kind === 'value' ? read.spread : read.reason).toBeCloseTo(spread, 9);
      expect(readSpread(id, spreadText(id, spread))).toEqual(read);
    }
  });

  it('takes a length in any unit and a bare number in the one shown', () => {
    expect(readSpread('etch-random', '0.02 mm')).toEqual({ kind: 'value', spread: 0.02 });
    expect(readSpread('etch-random', '20')).toEqual({ kind: 'value', spread: 0.02 });
    expect(readSpread('bow', '300 um')).toEqual({ kind: 'value', spread: 0.3 });
    expect(readSpread('dead-cells', '0.1 %')).toEqual({ kind: 'value', spread: 0.001 });
    expect(readSpread('temperature', '30 K')).toEqual({ kind: 'value', spread: 30 });
  });

  it('refuses what is no spread, with its reason', () => {
    expect(readSpread('bow', '-0.3')).toEqual({ kind: 'refused', reason: 'A spread is a size and not negative', suggestion: '0.3' });
    expect(readSpread('dead-cells', '120')).toEqual({ kind: 'refused', reason: 'At most 100 %', suggestion: null });
    expect(readSpread('bow', '3 GHz').kind).toBe('refused');
  });
});
