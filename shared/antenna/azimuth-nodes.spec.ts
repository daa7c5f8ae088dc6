import fc from 'fast-check';
import type { FamilyDescription } from '../model/cell-family';
import { radFromDeg } from '../units/angles';
import { azimuthNodes, type AzimuthNodes } from './azimuth-nodes';
import { EXAMPLE_GRID, exampleEdition } from './example-edition';
import { nearestAzimuth } from './excluded-regions';

const nodesAt = (phisDeg: readonly number[], description: Partial<FamilyDescription> = {}): AzimuthNodes => azimuthNodes(exampleEdition({ ...EXAMPLE_GRID, cellCount: 1, phisDeg }, description));

describe('azimuthNodes', () => {
  it('folds the azimuths of a square cell eight times: 0 to 45 degrees tell all', () => {
    const { fold, cosines, indices } = nodesAt([0, 22.5, 45]);
    expect(fold).toBe(4);
    expect(Array.from(cosines)).toEqual([-1, 0, 1].map((value) => expect.closeTo(value, 12)));
    expect(Array.from(indices)).toEqual([2, 1, 0]);
  });

  it('takes azimuths that symmetry makes equal for one node', () => {
    expect(Array.from(nodesAt([0, 22.5, 45], {}).indices)).toHaveLength(3);
    // -45 and 45 are one azimuth under either fold.
    expect(Array.from(nodesAt([-45, 0, 45]).indices)).toHaveLength(2);
  });

  it('folds only four times where periods or ports differ, or the data tell 0 from 90 degrees', () => {
    expect(nodesAt([0, 22.5, 45], { periodYMm: 12 }).fold).toBe(2);
    expect(nodesAt([0, 22.5, 45], { ports: 'x-and-y' }).fold).toBe(2);
    const told = nodesAt([0, 45, 90]);
    expect([told.fold, Array.from(told.indices)]).toEqual([2, [2, 1, 0]]);
  });

  it('gives each azimuth described to its own node, and any azimuth to that of its mirror images', () => {
    const nodes = nodesAt([0, 22.5, 45]);
    [0, 22.5, 45].forEach((phiDeg, index) => expect(nodes.indices[nearestAzimuth(nodes, radFromDeg(phiDeg))]).toBe(index));
    fc.assert(
      fc.property(fc.double({ min: -180, max: 180, noNaN: true }), (phiDeg) => {
        const own = nearestAzimuth(nodes, radFromDeg(phiDeg));
        for (const mirrored of [-phiDeg, 90 - phiDeg, phiDeg + 90, phiDeg + 180]) {
          const other = nearestAzimuth(nodes, radFromDeg(mirrored));
          // Half way between two nodes rounding may decide.
          const distance = (index: number): number => Math.abs(nodes.cosines[index] - Math.cos(4 * radFromDeg(phiDeg)));
          expect(Math.abs(distance(own) - distance(other))).toBeLessThan(1e-9);
        }
      }),
    );
  });
});
