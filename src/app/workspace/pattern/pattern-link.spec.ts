import { convertToParamMap } from '@angular/router';
import { readPatternLink, writePatternLink } from './pattern-link';
import type { PatternLink } from './pattern-link';

const first = readPatternLink(convertToParamMap({}));

describe('address of the Pattern sheet', () => {
  it('is empty at first: along the beam, absolute, 50 dB deep', () => {
    expect(first).toMatchObject({ cut: 'along', form: 'absolute', depthDb: 50, beam: 0, marksDeg: [], window: null });
    expect(Object.values(writePatternLink(first)).every((value) => value === null)).toBe(true);
  });
  it.each<Partial<PatternLink>>([
    { cut: 'plane', planePhiDeg: -22.5, form: 'relative' },
    { depthDb: 40, show: { parent: false, mask: false, lobes: false, specular: false, cross: false } },
    { show: { parent: true, mask: true, lobes: true, specular: true, cross: true }, field: 'cross', beam: 2, polarWide: true },
    { marksDeg: [-44.8, 14.91], window: { fromDeg: 0, toDeg: 40, floorDb: -10.5, topDb: 40 } },
  ])('reads back what it says: %j', (part) => {
    const link = { ...first, ...part };
    expect(readPatternLink(convertToParamMap(writePatternLink(link)))).toEqual(link);
  });
  it('takes nonsense for nothing', () => {
    expect(readPatternLink(convertToParamMap({ cut: 'x', floor: '-3', window: '4_1_0_1', beam: 'two', marks: 'a_500' }))).toEqual(first);
  });
});
