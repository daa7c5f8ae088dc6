import { convertToParamMap } from '@angular/router';
import { readPhaseLink, writePhaseLink } from './phase-link';
import type { PhaseLink } from './phase-link';

describe('address of the Phase sheet', () => {
  it.each<PhaseLink>([
    { view: 'error', cell: { column: 27, row: 31 }, zoom: { centreXMm: 37.5, centreYMm: -57.5, factor: 4 } },
    { view: 'target', cell: { column: -3, row: -12 }, zoom: null },
    { view: 'changed', cell: null, zoom: null },
  ])('reads back what it says: %j', (link) => {
    expect(readPhaseLink(convertToParamMap(writePhaseLink(link)))).toEqual(link);
  });
  it('says nothing of what is as at first', () => {
    expect(writePhaseLink({ view: 'target', cell: null, zoom: null })).toEqual({ view: null, cell: null, zoom: null });
  });
  it('takes nonsense for nothing', () => {
    expect(readPhaseLink(convertToParamMap({ view: 'colours', cell: '28', zoom: 'a_b_c' }))).toEqual({ view: 'target', cell: null, zoom: null });
  });
});
