import fc from 'fast-check';
import { exampleField } from './example-field';
import { directivityRatioAt, radiationPattern } from './radiation-pattern';
import { refinePeak } from './refine-peak';

const pattern = radiationPattern(exampleField({ columnCount: 16, rowCount: 12 }), 210, 0.5);
const staggered = radiationPattern(exampleField({ columnCount: 16, rowCount: 12, stagger: 'odd' }), 210, 1);
const start = fc.tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true }));

describe('refinePeak', () => {
  it('never ends below its start, and stays within the visible circle', () => {
    fc.assert(
      fc.property(fc.constantFrom(pattern, staggered), start, (of, [u, v]) => {
        const peak = refinePeak(of, u, v);
        const radius = Math.hypot(u, v);
        const from = radius < 1 - 1e-9 ? directivityRatioAt(of, u, v) : 0;
        expect(peak.directivityRatio).toBeGreaterThanOrEqual(from);
        expect(Math.hypot(peak.u, peak.v)).toBeLessThanOrEqual(1);
        expect(peak.directivityRatio).toBe(directivityRatioAt(of, peak.u, peak.v));
      }),
      { numRuns: 60 },
    );
  });

  it('ends where no direction nearby is higher', () => {
    fc.assert(
      fc.property(start, ([u, v]) => {
        const peak = refinePeak(pattern, u * 0.7, v * 0.7);
        if (Math.hypot(peak.u, peak.v) > 0.99) return;
        // A step of 1e-4 in direction cosines changes the ratio of a maximum by its curvature only.
        for (let k = 0; k < 8; k++) {
          const [nearU, nearV] = [peak.u + 1e-4 * Math.cos((k * Math.PI) / 4), peak.v + 1e-4 * Math.sin((k * Math.PI) / 4)];
          expect(directivityRatioAt(pattern, nearU, nearV)).toBeLessThanOrEqual(peak.directivityRatio * (1 + 1e-9));
        }
      }),
      { numRuns: 40 },
    );
  });

  it('comes back to the same place from anywhere on the same hill, to 1e-8', () => {
    const [first] = [refinePeak(pattern, 0, 0)];
    const again = [[0.01, 0], [0, -0.01], [-0.008, 0.008]].map(([du, dv]) => refinePeak(pattern, first.u + du, first.v + dv));
    for (const { u, v, lastStep } of again) {
      expect(Math.hypot(u - first.u, v - first.v)).toBeLessThan(1e-8);
      expect(lastStep).toBeLessThan(1e-6);
    }
  });
});
