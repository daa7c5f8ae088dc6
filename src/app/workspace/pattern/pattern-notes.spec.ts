import { exampleDesign, planeWaveDesign } from '../../../../shared/antenna/example-design';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { blockageNote, patternNotes } from './pattern-notes';

const bare = exampleDesign();
const shaded: DesignDocument = { ...bare, illumination: { kind: 'horn', positionMm: [-82.084, 0, 225.526], aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation: 'x', blockageRadiusMm: 24.5 } };

describe('notes of the pattern', () => {
  it('say that the shadow of the horn is not included while no radius is given', () => {
    expect(patternNotes(bare, null)[0]).toBe('A prediction is array theory, not a measurement. Blockage by the horn is not included; the Illumination sheet takes the radius of horn and mount.');
  });

  it('say what of the shadow is included once a radius is given', () => {
    expect(blockageNote(shaded)).toMatch(/^Blockage is included: a disc of radius 24\.5 mm .* what horn and mount scatter is not\.$/);
  });

  it('tell of no shadow where the horn stands behind the panel', () => {
    expect(blockageNote({ ...shaded, panel: { ...shaded.panel, operation: 'transmit' } })).toBe('The horn stands behind the panel and blocks nothing.');
  });

  it('do not speak of a horn where there is none', () => {
    expect(patternNotes(planeWaveDesign(), null)[0]).toBe('A prediction is array theory, not a measurement.');
  });
});
