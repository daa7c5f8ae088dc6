import * as fc from 'fast-check';
import { radFromDeg } from '../../units/angles';
import { exampleEdition } from '../example-edition';
import { permittedNodes } from '../excluded-nodes';
import { regionFilter } from '../excluded-regions';
import { prepareEdition, type PreparedEdition } from '../prepare-edition';
import { crossTermsGiven } from './cross-terms';
import { allNodes, matrixSampler, newMatrixSample, type MatrixSample } from './matrix-response';
import { singularValues } from './scattering';

/** Size of the invented coupling at an angle: odd about the planes of symmetry, none at normal incidence. */
const coupling = (thetaDeg: number, phiDeg: number): number => 0.25 * Math.sin(radFromDeg(thetaDeg)) ** 2 * Math.sin(4 * radFromDeg(phiDeg));

/**
 * The invented edition made lossless, with a reciprocal coupling that keeps it lossless: TE and TM diagonal entries shrink by
 * sqrt(1 - t^2) and the cross term is j t at the half sum of their phases.
 */
function coupledEdition(): PreparedEdition {
  const edition = exampleEdition({ cellCount: 6, frequenciesGHz: [9, 10, 11], thetasDeg: [0, 15, 30, 45, 60], phisDeg: [0, 22.5, 45] });
  const { values, thetasRad, phisRad, frequenciesHz } = edition.responses;
  for (let point = 0; point < values.length / 8; point++) {
    const series = Math.floor(point / frequenciesHz.length);
    const phiDeg = (phisRad[series % phisRad.length] * 180) / Math.PI;
    const thetaDeg = (thetasRad[Math.floor(series / phisRad.length) % thetasRad.length] * 180) / Math.PI;
    const t = coupling(thetaDeg, phiDeg);
    const phases = [0, 3].map((entry) => Math.atan2(values[8 * point + 2 * entry + 1], values[8 * point + 2 * entry]));
    // The half sum on the branch where the two phases are neighbours.
    const step = phases[1] - phases[0] - 2 * Math.PI * Math.round((phases[1] - phases[0]) / (2 * Math.PI));
    const half = phases[0] + step / 2 + Math.PI / 2;
    [0, 3].forEach((entry, i) => {
      values[8 * point + 2 * entry] = Math.sqrt(1 - t * t) * Math.cos(phases[i]);
      values[8 * point + 2 * entry + 1] = Math.sqrt(1 - t * t) * Math.sin(phases[i]);
    });
    for (const entry of [1, 2]) {
      values[8 * point + 2 * entry] = t * Math.cos(half);
      values[8 * point + 2 * entry + 1] = t * Math.sin(half);
    }
  }
  return prepareEdition(edition);
}

const prepared = coupledEdition();

const sampleAt = (frequencyGHz: number, thetaDeg: number, phiDeg: number, cell = 3): MatrixSample => {
  const sampler = matrixSampler(prepared, allNodes(prepared, frequencyGHz * 1e9));
  sampler.setAngle(radFromDeg(thetaDeg), radFromDeg(phiDeg));
  return sampler.sample(cell, newMatrixSample());
};

const largestSingularValue = (s: MatrixSample): number =>
  singularValues({ s11: { re: s.s11Re, im: s.s11Im }, s12: { re: s.s12Re, im: s.s12Im }, s21: { re: s.s21Re, im: s.s21Im }, s22: { re: s.s22Re, im: s.s22Im } })[0];

const angles = fc.record({
  thetaDeg: fc.double({ min: 0, max: 60, noNaN: true }),
  phiDeg: fc.double({ min: -360, max: 360, noNaN: true }),
  frequencyGHz: fc.constantFrom(9, 10, 11),
  cell: fc.integer({ min: 0, max: 5 }),
});

describe('the 2x2 response between the points given', () => {
  it('reads back the points given', () => {
    const { values } = prepared.edition.responses;
    // Cell 3, 45 degrees, 22.5 degrees, 10 GHz.
    const point = ((3 * 5 + 3) * 3 + 1) * 3 + 1;
    const s = sampleAt(10, 45, 22.5);
    const got = [s.s11Re, s.s11Im, s.s21Re, s.s21Im, s.s12Re, s.s12Im, s.s22Re, s.s22Im];
    got.forEach((value, i) => expect(value).toBeCloseTo(values[8 * point + i], 9));
  });

  it('stays passive between the angles, where the points are lossless', () => {
    fc.assert(
      fc.property(angles, ({ thetaDeg, phiDeg, frequencyGHz, cell }) => {
        expect(largestSingularValue(sampleAt(frequencyGHz, thetaDeg, phiDeg, cell))).toBeLessThan(1 + 2e-3);
      }),
      { numRuns: 200 },
    );
  });

  it('stays reciprocal, and the same after half a turn', () => {
    fc.assert(
      fc.property(angles, ({ thetaDeg, phiDeg, frequencyGHz, cell }) => {
        const s = sampleAt(frequencyGHz, thetaDeg, phiDeg, cell);
        const turned = sampleAt(frequencyGHz, thetaDeg, phiDeg + 180, cell);
        expect(Math.hypot(s.s12Re - s.s21Re, s.s12Im - s.s21Im)).toBeLessThan(1e-12);
        (Object.keys(s) as (keyof MatrixSample)[]).forEach((key) => expect(turned[key]).toBeCloseTo(s[key], 9));
      }),
      { numRuns: 100 },
    );
  });

  it('turns the sign of the cross term at the mirrored azimuth, and loses it in planes of symmetry', () => {
    const [here, mirrored, complement] = [sampleAt(10, 40, 10), sampleAt(10, 40, -10), sampleAt(10, 40, 80)];
    expect(mirrored.s12Re).toBeCloseTo(-here.s12Re, 12);
    expect(complement.s12Im).toBeCloseTo(-here.s12Im, 12);
    expect(complement.s11Re).toBeCloseTo(here.s11Re, 12);
    expect(Math.hypot(sampleAt(10, 40, 45).s12Re, sampleAt(10, 40, 45).s12Im)).toBeLessThan(1e-9);
  });

  it('interpolates the coupling itself to its own law', () => {
    const s = sampleAt(10, 37, 15);
    expect(Math.hypot(s.s12Re, s.s12Im)).toBeCloseTo(coupling(37, 15), 6);
  });

  it('holds a piecewise rule in theta for comparison', () => {
    const sampler = matrixSampler(prepared, allNodes(prepared, 10e9), 'linear');
    sampler.setAngle(radFromDeg(37.5), 0);
    const middle = sampler.sample(3, newMatrixSample());
    const [low, high] = [sampleAt(10, 30, 0), sampleAt(10, 45, 0)];
    const mean = (Math.atan2(low.s11Im, low.s11Re) + Math.atan2(high.s11Im, high.s11Re)) / 2;
    expect(Math.atan2(middle.s11Im, middle.s11Re)).toBeCloseTo(mean, 9);
  });

  it('reads no cross term of an excluded angle', () => {
    const { edition } = prepared;
    const excluded = { ...edition, description: { ...edition.description, excludedRegions: [{ reason: 'invented', fromThetaDeg: 50 }] } };
    const values = edition.responses.values.slice();
    // Nonsense at 60 degrees, in every cross term.
    for (let point = 0; point < values.length / 8; point++) {
      if (Math.floor(Math.floor(point / 3) / 3) % 5 === 4) values.fill(7, 8 * point + 2, 8 * point + 6);
    }
    const spoilt = prepareEdition({ ...excluded, responses: { ...edition.responses, values } });
    const regions = regionFilter(spoilt.edition, spoilt.azimuths, 10e9);
    const sampler = matrixSampler(spoilt, permittedNodes(spoilt, regions, spoilt.atFrequency(10e9)));
    sampler.setAngle(radFromDeg(40), radFromDeg(22.5));
    const s = sampler.sample(3, newMatrixSample());
    expect(Math.hypot(s.s12Re, s.s12Im)).toBeCloseTo(coupling(40, 22.5), 1);
  });

  it('refuses a description of one response', () => {
    const single = prepareEdition(exampleEdition({ cellCount: 2, frequenciesGHz: [10], thetasDeg: [0], phisDeg: [0] }, { ports: 'either' }));
    expect(() => matrixSampler(single, allNodes(single, 10e9))).toThrow('holds no matrix');
  });
});

describe('what an edition says of cross terms', () => {
  it('tells given, zero and not described apart', () => {
    const grid = { cellCount: 2, frequenciesGHz: [10], thetasDeg: [0, 30] };
    expect(crossTermsGiven(prepared)).toBe('given');
    expect(crossTermsGiven(prepareEdition(exampleEdition({ ...grid, phisDeg: [0, 22.5, 45] })))).toBe('zero');
    expect(crossTermsGiven(prepareEdition(exampleEdition({ ...grid, phisDeg: [0, 45] })))).toBe('not-described');
    expect(crossTermsGiven(prepareEdition(exampleEdition({ ...grid, phisDeg: [0] }, { ports: 'either' })))).toBe('not-described');
  });
});
