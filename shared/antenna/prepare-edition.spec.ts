import * as fc from 'fast-check';
import { radFromDeg, wrapRad } from '../units/angles';
import { coPolarResponse, entryLogMagnitude, entryPhaseRad, incidenceWeigher } from './cell-response';
import { EXAMPLE_GRID, exampleEdition, exampleResponse } from './example-edition';
import { prepareEdition, type PreparedEdition } from './prepare-edition';
import type { CellEdition } from '../model/cell-family';

const prepared = prepareEdition(exampleEdition());

/** Entry 0 (TE) and 1 (TM) of a cell by interpolation. */
function entryAt(source: PreparedEdition, cell: number, entry: number, [ghz, thetaDeg, phiDeg]: number[]): { magnitude: number; phaseRad: number } {
  const at = source.atFrequency(ghz * 1e9);
  const { nodes } = incidenceWeigher(source, 'x')(radFromDeg(thetaDeg), radFromDeg(phiDeg));
  return { magnitude: Math.exp(entryLogMagnitude(at, cell, entry, nodes)), phaseRad: entryPhaseRad(at, cell, entry, nodes) };
}
const errorDeg = (a: number, b: number): number => (Math.abs(wrapRad(a - b)) * 180) / Math.PI;

/** An edition of one cell and one angle whose S11 is given per frequency in GHz. */
function oneCell(frequenciesGHz: number[], phasesDeg: number[], present: number[] = frequenciesGHz.map(() => 1)): CellEdition {
  const edition = exampleEdition({ cellCount: 1, frequenciesGHz, thetasDeg: [0], phisDeg: [0] }, { ports: 'either' });
  phasesDeg.forEach((deg, i) => edition.responses.values.set([Math.cos(radFromDeg(deg)), Math.sin(radFromDeg(deg))], 8 * i));
  edition.responses.present.set(present);
  return edition;
}

describe('the responses of an edition between its points', () => {
  it('are those of the points themselves at every node', () => {
    EXAMPLE_GRID.thetasDeg.forEach((thetaDeg) => {
      for (const phiDeg of EXAMPLE_GRID.phisDeg) {
        const truth = exampleResponse(5 / 24, 9.5, { thetaDeg, phiDeg, entry: 3 });
        const found = entryAt(prepared, 5, 1, [9.5, thetaDeg, phiDeg]);
        expect(found.magnitude).toBeCloseTo(truth.magnitude, 12);
        expect(errorDeg(found.phaseRad, truth.phaseRad)).toBeLessThan(1e-9);
      }
    });
  });

  it('follow a smooth response between them: within 0.02 degrees and 1e-4', () => {
    fc.assert(
      fc.property(fc.nat(23), fc.double({ min: 9, max: 11, noNaN: true }), fc.double({ min: 0, max: 60, noNaN: true }), fc.double({ min: -180, max: 180, noNaN: true }), (cell, ghz, thetaDeg, phiDeg) => {
        [0, 3].forEach((entry, e) => {
          const truth = exampleResponse(cell / 24, ghz, { thetaDeg, phiDeg, entry });
          const found = entryAt(prepared, cell, e, [ghz, thetaDeg, phiDeg]);
          expect(errorDeg(found.phaseRad, truth.phaseRad)).toBeLessThan(0.02);
          expect(Math.abs(found.magnitude - truth.magnitude)).toBeLessThan(1e-4);
        });
      }),
      { numRuns: 200 },
    );
  });

  it('repeat round the lattice: the same at -phi, 90 - phi, phi + 90 and phi + 180', () => {
    const [cell, ghz, theta] = [7, 10.2, 37];
    const reference = entryAt(prepared, cell, 0, [ghz, theta, 17]);
    for (const phi of [-17, 73, 107, 197]) expect(entryAt(prepared, cell, 0, [ghz, theta, phi]).phaseRad).toBeCloseTo(reference.phaseRad, 12);
  });

  it('go from 359 to 1 degree through 0, not through 180', () => {
    const source = prepareEdition(oneCell([9, 11], [359, 1]));
    const { phaseRad } = entryAt(source, 0, 0, [10, 0, 0]);
    expect(errorDeg(phaseRad, 0)).toBeLessThan(1e-9);
  });

  it('lose no magnitude half way between phases 90 degrees apart, as complex numbers would (3 dB)', () => {
    const source = prepareEdition(oneCell([9, 11], [10, -80]));
    const { magnitude, phaseRad } = entryAt(source, 0, 0, [10, 0, 0]);
    expect(magnitude).toBeCloseTo(1, 12);
    expect(errorDeg(phaseRad, radFromDeg(-35))).toBeLessThan(1e-9);
  });

  it('stay passive: no interpolated magnitude exceeds 1 (passivity)', () => {
    fc.assert(
      fc.property(fc.nat(23), fc.double({ min: 9, max: 11, noNaN: true }), fc.double({ min: 0, max: 60, noNaN: true }), fc.double({ min: -180, max: 180, noNaN: true }), (cell, ghz, thetaDeg, phiDeg) => {
        const weights = incidenceWeigher(prepared, 'x')(radFromDeg(thetaDeg), radFromDeg(phiDeg));
        expect(coPolarResponse(prepared.atFrequency(ghz * 1e9), cell, weights, { magnitude: 0, phaseRad: 0 }).magnitude).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('step over missing points, and call a cell unusable where one side has none', () => {
    const within = prepareEdition(oneCell([9, 10, 11], [40, 999, 20], [1, 0, 1]));
    expect(errorDeg(entryAt(within, 0, 0, [10, 0, 0]).phaseRad, radFromDeg(30))).toBeLessThan(1e-9);
    expect(within.atFrequency(10e9).usable[0]).toBe(1);
    const atEdge = prepareEdition(oneCell([9, 10, 11], [999, 30, 20], [0, 1, 1]));
    expect(atEdge.atFrequency(9.2e9).usable[0]).toBe(0);
    expect(errorDeg(entryAt(atEdge, 0, 0, [9.2, 0, 0]).phaseRad, radFromDeg(30))).toBeLessThan(1e-9);
  });

  it('hold the edge of the band outside it, and say so', () => {
    const source = prepareEdition(oneCell([9, 11], [40, 20]));
    expect(source.atFrequency(12e9).outside).toBe(1);
    expect(source.atFrequency(8e9).outside).toBe(-1);
    expect(errorDeg(entryAt(source, 0, 0, [12, 0, 0]).phaseRad, radFromDeg(20))).toBeLessThan(1e-9);
  });

  it('hold the largest angle beyond it', () => {
    expect(entryAt(prepared, 3, 0, [10, 75, 0]).phaseRad).toBeCloseTo(entryAt(prepared, 3, 0, [10, 60, 0]).phaseRad, 12);
  });

  it('use lower polynomials where there are fewer angles, one angle as it stands', () => {
    const two = prepareEdition(exampleEdition({ ...EXAMPLE_GRID, thetasDeg: [0, 60] }));
    const half = radFromDeg(60);
    const theta = (Math.asin(Math.sqrt(Math.sin(half) ** 2 / 2)) * 180) / Math.PI;
    const ends = [0, 60].map((deg) => entryAt(two, 4, 0, [10, deg, 0]).phaseRad);
    expect(entryAt(two, 4, 0, [10, theta, 0]).phaseRad).toBeCloseTo((ends[0] + ends[1]) / 2, 10);
    const one = prepareEdition(exampleEdition({ ...EXAMPLE_GRID, thetasDeg: [0], phisDeg: [0] }));
    expect(entryAt(one, 4, 0, [10, 50, 33]).phaseRad).toBe(entryAt(one, 4, 0, [10, 0, 0]).phaseRad);
  });
});

describe('the co-polar response', () => {
  const at = prepared.atFrequency(10e9);
  const parts = (thetaDeg: number, phiDeg: number): { magnitude: number; phaseRad: number }[] => [0, 1].map((e) => entryAt(prepared, 6, e, [10, thetaDeg, phiDeg]));
  const response = (polarisation: 'x' | 'y' | 'rhcp', thetaDeg: number, phiDeg: number): { magnitude: number; phaseRad: number } => ({
    ...coPolarResponse(at, 6, incidenceWeigher(prepared, polarisation)(radFromDeg(thetaDeg), radFromDeg(phiDeg)), { magnitude: 0, phaseRad: 0 }),
  });

  it('is TM for x in the plane phi = 0 and TE in the plane phi = 90, the reverse for y', () => {
    const [te, tm] = parts(40, 0);
    expect(errorDeg(response('x', 40, 0).phaseRad, tm.phaseRad)).toBeLessThan(1e-9);
    expect(errorDeg(response('y', 40, 0).phaseRad, te.phaseRad)).toBeLessThan(1e-9);
    expect(errorDeg(response('x', 40, 90).phaseRad, te.phaseRad)).toBeLessThan(1e-6);
  });

  it('is S_TM cos^2 + S_TE sin^2 between them, and the even mixture for circular polarisation', () => {
    const [te, tm] = parts(40, 30);
    const mixture = (share: number): { re: number; im: number } => ({
      re: share * tm.magnitude * Math.cos(tm.phaseRad) + (1 - share) * te.magnitude * Math.cos(te.phaseRad),
      im: share * tm.magnitude * Math.sin(tm.phaseRad) + (1 - share) * te.magnitude * Math.sin(te.phaseRad),
    });
    for (const [polarisation, share] of [['x', 0.75], ['y', 0.25], ['rhcp', 0.5]] as const) {
      const { magnitude, phaseRad } = response(polarisation, 40, 30);
      const expected = mixture(share);
      expect(magnitude * Math.cos(phaseRad)).toBeCloseTo(expected.re, 10);
      expect(magnitude * Math.sin(phaseRad)).toBeCloseTo(expected.im, 10);
    }
  });

  it('is the port of the polarisation where ports mean x and y', () => {
    const ports = prepareEdition(exampleEdition(EXAMPLE_GRID, { ports: 'x-and-y' }));
    const weigh = (polarisation: 'x' | 'y'): Float64Array => incidenceWeigher(ports, polarisation)(0.3, 1).shares;
    expect([Array.from(weigh('x')), Array.from(weigh('y'))]).toEqual([[1, 0], [0, 1]]);
  });

  it('is S21 of a transmitting family of one polarisation, or S11 where its files have one port', () => {
    const onePort = exampleEdition(EXAMPLE_GRID, { ports: 'either', operation: 'transmit' });
    expect(prepareEdition(onePort).ports).toEqual({ kind: 'one', entries: [0] });
    onePort.responses.values[2] = 0.5;
    expect(prepareEdition(onePort).ports).toEqual({ kind: 'one', entries: [1] });
  });
});
