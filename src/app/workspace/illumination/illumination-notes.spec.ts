import { EXAMPLE_DESIGN, planeWaveDesign } from '../../../../shared/antenna/example-design';
import { illuminationNotes } from './illumination-notes';

const RANGE_TEST = 'A range test is a transmission: confirm authorisation for frequency, power, place and dates.';

describe('illuminationNotes', () => {
  it('tell of shadow, spillover and the space before a reflecting panel', () => {
    const [blockage, caution] = illuminationNotes(EXAMPLE_DESIGN);
    expect(blockage).toMatch(/^Blockage counts where the radius of horn and mount is given/);
    expect(caution).toBe(`Do not enter the space between horn and panel while transmitting. ${RANGE_TEST}`);
  });

  it('tell of no shadow where the horn stands behind the panel', () => {
    const [blockage] = illuminationNotes({ ...EXAMPLE_DESIGN, panel: { ...EXAMPLE_DESIGN.panel, operation: 'transmit' } });
    expect(blockage).toBe('The horn stands behind the panel and blocks nothing. Spillover counts the power that misses the outline.');
  });

  it('speak of no horn where a wave lights the panel', () => {
    expect(illuminationNotes(planeWaveDesign())).toEqual([RANGE_TEST]);
  });
});
