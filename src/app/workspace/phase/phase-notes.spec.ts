import { exampleDesign } from '../../../../shared/antenna/example-design';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { computedPrediction } from '../computed-prediction';
import { phaseNotes, phaseSubtitle } from './phase-notes';
import { SAMPLE_EDITION, SAMPLE_PHASE } from './sample-phase';

const planeWave: DesignDocument = { ...exampleDesign(), illumination: { kind: 'plane-wave', thetaDeg: 20, phiDeg: 0, polarisation: 'x' } };

describe('notes of the Phase sheet', () => {
  it('say from where the panel is seen and what the mark is', () => {
    const horn = computedPrediction(exampleDesign());
    const [first] = phaseNotes(horn, null);
    expect(first).toMatch(/^Seen from the side of the beams and the horn\. Cross and circle: foot of the horn, x .+ mm\.$/);
    expect(phaseNotes({ ...horn, of: { ...horn.of, panel: { ...horn.of.panel, operation: 'transmit' } } }, null)[0]).toMatch(/^Seen from the side of the beams; the horn is behind\./);
  });

  it('name no horn where a plane wave lights the panel', () => {
    expect(phaseNotes(computedPrediction(planeWave), null)[0]).toBe('Seen from the side of the beams.');
  });

  it('tell how far the data of the cells reach, and that the panel asks for more', () => {
    const flat = { ...SAMPLE_EDITION, responses: { ...SAMPLE_EDITION.responses, thetasRad: Float64Array.of(0) } };
    expect(phaseNotes(SAMPLE_PHASE, flat)[1]).toMatch(/ at normal incidence, used up to \d+\.\d°: beyond the data the nearest angle holds\.$/);
    expect(phaseNotes(SAMPLE_PHASE, SAMPLE_EDITION)[1]).toMatch(/ up to \d+°/);
  });

  it('close with what a prediction is not', () => {
    expect(phaseNotes(SAMPLE_PHASE, SAMPLE_EDITION).at(-1)).toBe('A prediction is array theory, not a measurement.');
    expect(phaseSubtitle(computedPrediction(exampleDesign()), null)).toMatch(/ cells, ideal phase, continuous$/);
  });
});
