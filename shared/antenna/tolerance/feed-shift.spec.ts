import type { DesignDocument } from '../../model/design-document';
import { wrapRad } from '../../units/angles';
import { exampleDesign, planeWaveDesign } from '../example-design';
import { EXAMPLE_EDITION_ID, exampleEdition } from '../example-edition';
import { placeCells } from '../place-cells';
import { prepareEdition } from '../prepare-edition';
import { predictPlaced } from '../predict-design';
import { feedShift } from './feed-shift';
import { movedFeed } from './moved-feed';

const edition = prepareEdition(exampleEdition());
const cells: DesignDocument['cells'] = { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] };
const placed = placeCells(exampleDesign({ cells }), edition);
const horn = placed.si.illumination;
if (horn.kind !== 'horn') throw new Error('the example has a horn');
const NO_MOVE = { xM: 0, yM: 0, zM: 0 };

describe('a horn that stands elsewhere', () => {
  it('leaves the panel as it is where it stands', () => {
    const same = movedFeed(placed, NO_MOVE, edition);
    expect(predictPlaced(same, { include: {} }).figures).toEqual(predictPlaced(placed, { include: {} }).figures);
  });

  it.each([
    { xM: 0.002, yM: 0, zM: 0 },
    { xM: 0, yM: -0.002, zM: 0 },
    { xM: 0, yM: 0, zM: 0.002 },
    { xM: 0.0005, yM: 0.0005, zM: -0.0005 },
  ])('is followed by the trials to a hundredth of a degree and 0.001 dB: %o', (move) => {
    const exact = movedFeed(placed, move, edition);
    const phaseRad = new Float64Array(placed.lattice.count);
    const logMagnitude = new Float64Array(placed.lattice.count);
    feedShift(placed, horn, edition).addChanges(move, phaseRad, logMagnitude);
    for (let n = 0; n < phaseRad.length; n++) {
      const path = placed.designWavenumber * (exact.light.pathM[n] - placed.light.pathM[n]);
      const exactPhase = exact.assignment.phaseRad[n] - placed.assignment.phaseRad[n] - path;
      const exactLog = Math.log((exact.light.amplitude[n] * exact.assignment.magnitude[n]) / (placed.light.amplitude[n] * placed.assignment.magnitude[n]));
      expect(Math.abs(wrapRad(phaseRad[n] - exactPhase))).toBeLessThan(1.7e-4);
      expect(Math.abs(logMagnitude[n] - exactLog)).toBeLessThan(1.15e-4);
    }
  });

  it('moves away from its aim along its axis', () => {
    const { backwards } = feedShift(placed, horn, edition);
    expect(Math.hypot(backwards.xM, backwards.yM, backwards.zM)).toBeCloseTo(1, 12);
    expect(backwards.zM).toBeGreaterThan(0.9);
  });

  it('is refused where there is no horn', () => {
    expect(() => movedFeed(placeCells(planeWaveDesign()), NO_MOVE)).toThrow('A horn is to be moved, and the panel is lit by a plane-wave');
  });
});
