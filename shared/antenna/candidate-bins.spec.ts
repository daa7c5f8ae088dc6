import * as fc from 'fast-check';
import { candidateBins } from './candidate-bins';
import { incidenceWeigher } from './cell-response';
import { editionChooser } from './edition-choice';
import { exampleEdition, EXAMPLE_GRID } from './example-edition';
import { prepareEdition } from './prepare-edition';

describe('candidates by bins of angle and target', () => {
  it.each([
    ['TE and TM', exampleEdition()],
    ['one port, one plane', exampleEdition({ ...EXAMPLE_GRID, phisDeg: [0] }, { ports: 'either' })],
    ['many cells', exampleEdition({ ...EXAMPLE_GRID, cellCount: 120 })],
  ])('lead to the choice that trying every cell leads to: %s', (_name, edition) => {
    const prepared = prepareEdition(edition);
    const at = prepared.atFrequency(10e9);
    const allowed = Int32Array.from(edition.cells.keys());
    const choose = editionChooser(at, 'nearest-phase');
    for (const polarisation of ['x', 'y', 'rhcp'] as const) {
      const list = candidateBins({ prepared, at, polarisation, allowed, largestIncidenceRad: 1.1 });
      const weigh = incidenceWeigher(prepared, polarisation);
      fc.assert(
        fc.property(fc.double({ min: -300, max: 300, noNaN: true }), fc.double({ min: 0, max: 1.1, noNaN: true }), fc.double({ min: -3.14, max: 3.14, noNaN: true }), (target, theta, azimuth) => {
          const weights = weigh(theta, azimuth);
          expect(choose(target, weights, list(target, theta, azimuth))).toBe(choose(target, weights, allowed));
        }),
        { numRuns: 1500 },
      );
    }
  });

  it('are few', () => {
    const prepared = prepareEdition(exampleEdition());
    const list = candidateBins({ prepared, at: prepared.atFrequency(10e9), polarisation: 'x', allowed: Int32Array.from({ length: 24 }, (_, k) => k), largestIncidenceRad: 0.8 });
    const sizes = Array.from({ length: 400 }, (_, i) => list(i, (i % 40) / 50, i * 1.7).length);
    expect(sizes.reduce((sum, size) => sum + size, 0) / sizes.length).toBeLessThan(4);
  });
});
