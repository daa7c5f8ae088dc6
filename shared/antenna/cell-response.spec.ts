import fc from 'fast-check';
import type { Polarisation } from '../model/design-document';
import { radFromDeg } from '../units/angles';
import { coPolarResponse, incidenceWeigher, windowedWeigher } from './cell-response';
import { EXAMPLE_GRID, exampleEdition, exampleResponse } from './example-edition';
import { prepareEdition } from './prepare-edition';

const prepared = prepareEdition(exampleEdition());
const POLARISATIONS: readonly Polarisation[] = ['x', 'y', 'rhcp', 'lhcp'];
const angle = fc.record({ thetaDeg: fc.double({ min: 0, max: 60, noNaN: true }), phiDeg: fc.double({ min: -180, max: 180, noNaN: true }) });
const sum = (values: Float64Array): number => values.reduce((total, value) => total + value, 0);

describe('the weights of an angle of incidence', () => {
  it('add up to 1, over the nodes and over the entries, whatever the angle and the polarisation', () => {
    fc.assert(
      fc.property(angle, fc.constantFrom(...POLARISATIONS), ({ thetaDeg, phiDeg }, polarisation) => {
        const { nodes, shares } = incidenceWeigher(prepared, polarisation)(radFromDeg(thetaDeg), radFromDeg(phiDeg));
        expect(sum(nodes)).toBeCloseTo(1, 9);
        expect(sum(shares)).toBeCloseTo(1, 12);
        expect(shares.every((share) => share >= 0)).toBe(true);
      }),
    );
  });

  it('are 1 at the node itself and 0 elsewhere', () => {
    const weigh = incidenceWeigher(prepared, 'x');
    EXAMPLE_GRID.thetasDeg.forEach((thetaDeg, t) => {
      // Nodes rise in cos 4 phi: 45, 22.5, 0 degrees.
      [45, 22.5, 0].forEach((phiDeg, a) => {
        const { nodes } = weigh(radFromDeg(thetaDeg), radFromDeg(phiDeg));
        nodes.forEach((weight, node) => expect(weight).toBeCloseTo(node === t * 3 + a ? 1 : 0, 9));
      });
    });
  });

  it('give x the TM share cos^2 phi and y the rest, so that turning the cell by 90 degrees swaps them', () => {
    fc.assert(
      fc.property(angle, ({ thetaDeg, phiDeg }) => {
        const [x, y] = (['x', 'y'] as const).map((polarisation) => Array.from(incidenceWeigher(prepared, polarisation)(radFromDeg(thetaDeg), radFromDeg(phiDeg)).shares));
        expect(x[1]).toBeCloseTo(Math.cos(radFromDeg(phiDeg)) ** 2, 12);
        expect([y[0], y[1]]).toEqual([expect.closeTo(x[1], 12), expect.closeTo(x[0], 12)]);
      }),
    );
  });

  it('let the nearest angle stand in beyond those described', () => {
    const weigh = incidenceWeigher(prepared, 'x');
    const at60 = Array.from(weigh(radFromDeg(60), 0.1).nodes);
    expect(Array.from(weigh(radFromDeg(85), 0.1).nodes)).toEqual(at60);
  });
});

describe('the co-polar response', () => {
  it('is that of the entry alone in the planes of symmetry: TM for x at azimuth 0, TE at 90', () => {
    const at = prepared.atFrequency(10e9);
    for (const [phiDeg, entry] of [[0, 3], [90, 0]] as const) {
      const weights = incidenceWeigher(prepared, 'x')(radFromDeg(30), radFromDeg(phiDeg));
      const { magnitude, phaseRad } = coPolarResponse(at, 5, weights, { magnitude: 0, phaseRad: 0 });
      const expected = exampleResponse(5 / 24, 10, { thetaDeg: 30, phiDeg, entry });
      expect(magnitude).toBeCloseTo(expected.magnitude, 9);
      expect(Math.abs(Math.sin((phaseRad - expected.phaseRad) / 2))).toBeLessThan(1e-9);
    }
  });

  it('never exceeds the larger of its entries', () => {
    const at = prepared.atFrequency(10.2e9);
    fc.assert(
      fc.property(angle, fc.integer({ min: 0, max: 23 }), ({ thetaDeg, phiDeg }, cell) => {
        const response = coPolarResponse(at, cell, incidenceWeigher(prepared, 'x')(radFromDeg(thetaDeg), radFromDeg(phiDeg)), { magnitude: 0, phaseRad: 0 });
        // The invented cells lose a little at every angle.
        expect(response.magnitude).toBeLessThan(0.985);
      }),
    );
  });
});

describe('windowedWeigher', () => {
  it('reproduces every polynomial of a degree below its width, and uses no node outside its window', () => {
    const nodes = Float64Array.of(0, 0.1, 0.25, 0.5, 0.6, 0.8, 0.95, 1.2);
    const weigh = windowedWeigher(nodes, 4);
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1.2, noNaN: true }), fc.array(fc.double({ min: -3, max: 3, noNaN: true }), { minLength: 4, maxLength: 4 }), (x, coefficients) => {
        const polynomial = (at: number): number => coefficients.reduce((total, c, power) => total + c * at ** power, 0);
        const weights = new Float64Array(nodes.length);
        weigh(x, weights);
        expect(weights.reduce((total, weight, i) => total + weight * polynomial(nodes[i]), 0)).toBeCloseTo(polynomial(x), 8);
        expect(weights.filter((weight) => weight !== 0).length).toBeLessThanOrEqual(4);
      }),
    );
  });
});
