import type { Mask } from '../../model/design-document';
import { maskFaults } from './mask-faults';

const faults = (mask: Mask) => maskFaults(mask, '#/m');

describe('faults of a mask', () => {
  it('are none without a mask and of a good one', () => {
    expect(maskFaults(undefined, '#/m')).toEqual([]);
    expect(faults({ kind: 'published', id: 'fcc-25-209-a1', spilloverDeg: [60, 100] })).toEqual([]);
    expect(faults({ kind: 'formula', segments: [{ fromDeg: 1, toDeg: 48, expression: '32 - 25*log10(theta)' }, { fromDeg: 48, toDeg: 180, expression: '-10' }] })).toEqual([]);
  });

  it('refuse an unknown name with the list of the known', () => {
    expect(faults({ kind: 'published', id: 'x' })).toEqual([{ pointer: '#/m/id', detail: expect.stringContaining('known are itu-r-s465-6, itu-r-s580-6') }]);
  });

  it('refuse a spillover region where the text has none, or that does not rise', () => {
    expect(faults({ kind: 'published', id: 'itu-r-s465-6', spilloverDeg: [60, 100] })).toEqual([{ pointer: '#/m/spilloverDeg', detail: 'ITU-R S.465-6 allows nothing more in a spillover region' }]);
    expect(faults({ kind: 'published', id: 'fcc-25-209-a2', spilloverDeg: [100, 60] })).toEqual([{ pointer: '#/m/spilloverDeg', detail: 'must rise; got 100 to 60°' }]);
  });

  it('refuse points and stretches that do not rise', () => {
    expect(faults({ kind: 'custom', points: [[5, 0], [5, 1]] })).toEqual([{ pointer: '#/m/points/1/0', detail: 'angles must rise; got 5 after 5°' }]);
    const segments = [{ fromDeg: 5, toDeg: 5, expression: '0' }, { fromDeg: 2, toDeg: 9, expression: '0' }];
    expect(faults({ kind: 'formula', segments }).map(({ pointer }) => pointer)).toEqual(['#/m/segments/0/toDeg', '#/m/segments/1/fromDeg']);
  });

  it('refuse a formula that gives no level somewhere on its stretch', () => {
    expect(faults({ kind: 'formula', segments: [{ fromDeg: 0, toDeg: 48, expression: '32 - 25*log10(theta)' }] })).toEqual([
      { pointer: '#/m/segments/0/expression', detail: 'must give a level within ±200 dB; gives Infinity at 0°' },
    ]);
    expect(faults({ kind: 'formula', segments: [{ fromDeg: 0, toDeg: 9, expression: 'x' }] })[0].detail).toContain('"x" is not known');
  });
});
