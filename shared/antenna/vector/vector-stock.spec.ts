import type { DesignDocument } from '../../model/design-document';
import { wrapRad } from '../../units/angles';
import { exampleDesign } from '../example-design';
import { exampleEdition, EXAMPLE_EDITION_ID } from '../example-edition';
import { placeCells, type PlacedDesign } from '../place-cells';
import { prepareEdition } from '../prepare-edition';
import { newCellStates } from '../reference-search';
import { wavePower } from './vector-light';

const VECTOR: DesignDocument['prediction'] = { receiveExponent: 0.5, radiateExponent: 0.5, model: 'vector' };
const oblique: DesignDocument['cells'] = { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] };
const skew: DesignDocument['illumination'] = { kind: 'horn', positionMm: [-60, -50, 200], aimMm: [8, 5, 0], exponentE: 7, exponentH: 5, polarisation: 'x' };
const grid = { cellCount: 12, frequenciesGHz: [9, 10, 11], thetasDeg: [0, 30, 60], phisDeg: [0, 22.5, 45] };

/** The invented edition with a coupling between TE and TM written into its cross terms. */
function coupled(ports: 'te-and-tm' | 'x-and-y' = 'te-and-tm') {
  const edition = exampleEdition(grid, { ports });
  const { values } = edition.responses;
  for (let point = 0; point < values.length / 8; point++) [values[8 * point + 2], values[8 * point + 4]] = [0.2, 0.2];
  return prepareEdition(edition);
}

const place = (cells: DesignDocument['cells'], more: Partial<DesignDocument> = {}, edition = prepareEdition(exampleEdition(grid))): PlacedDesign & { vector: NonNullable<PlacedDesign['vector']> } => {
  const placed = placeCells(exampleDesign({ prediction: VECTOR, illumination: skew, cells, ...more }), edition);
  if (!placed.vector) throw new Error('not by the vector model');
  return { ...placed, vector: placed.vector };
};

describe('cells of a 2x2 response', () => {
  it.each([['te-and-tm' as const], ['x-and-y' as const]])('are chosen by what they send into the beam: none of them comes nearer, %s', (ports) => {
    const edition = coupled(ports);
    const { vector, targetRad, assignment } = place(oblique, {}, edition);
    const states = newCellStates(grid.cellCount);
    for (let n = 0; n < targetRad.length; n += 37) {
      states.count = grid.cellCount;
      states.index.set(Array.from({ length: grid.cellCount }, (_, k) => k));
      vector.stock.sendStates(n, states);
      const errors = Array.from(states.phaseRad, (phase) => Math.abs(wrapRad(phase - targetRad[n])));
      expect(errors[assignment.cellIndex[n]]).toBeCloseTo(Math.min(...errors), 9);
      expect(assignment.phaseRad[n]).toBeCloseTo(states.phaseRad[assignment.cellIndex[n]], 12);
    }
  });

  it('send into the beam what their leaving waves hold', () => {
    const { vector, lattice, assignment, light } = place(oblique, {}, coupled());
    const leaving = vector.stock.leaving(assignment, 10e9);
    // Power waves of a beam wanted along x: q is the x part of b over |a|.
    for (let n = 0; n < lattice.count; n += 61) {
      const [c, s] = [vector.waves.cosAzimuth[n], vector.waves.sinAzimuth[n]];
      const re = c * leaving.tmRe[n] - s * leaving.teRe[n];
      const im = c * leaving.tmIm[n] - s * leaving.teIm[n];
      expect(Math.hypot(re, im) / light.amplitude[n]).toBeCloseTo(assignment.magnitude[n], 9);
      expect(wrapRad(Math.atan2(im, re) - assignment.phaseRad[n])).toBeCloseTo(0, 9);
    }
  });

  it('gain no power', () => {
    const { vector, assignment } = place(oblique);
    expect(wavePower(vector.stock.leaving(assignment, 10e9))).toBeLessThanOrEqual(wavePower(vector.waves));
  });

  it('keep an x-and-y description of no coupling apart along x and y', () => {
    const edition = prepareEdition(exampleEdition({ ...grid, thetasDeg: [0], phisDeg: [0] }, { ports: 'x-and-y' }));
    const { vector, assignment, lattice } = place(oblique, { illumination: { kind: 'plane-wave', thetaDeg: 0, phiDeg: 0, polarisation: 'x' } }, edition);
    const leaving = vector.stock.leaving(assignment, 10e9);
    // At normal incidence rho is x, so nothing may appear along y.
    for (let n = 0; n < lattice.count; n += 50) expect(Math.hypot(leaving.teRe[n], leaving.teIm[n])).toBeLessThan(1e-12);
  });

  it('find a reference phase at least as good as none', () => {
    const sumOf = (referencePhaseDeg: DesignDocument['referencePhaseDeg']): number => {
      const { assignment, light, targetRad } = place(oblique, { referencePhaseDeg }, coupled());
      let [re, im] = [0, 0];
      targetRad.forEach((target, n) => {
        re += light.amplitude[n] * assignment.magnitude[n] * Math.cos(assignment.phaseRad[n] - target);
        im += light.amplitude[n] * assignment.magnitude[n] * Math.sin(assignment.phaseRad[n] - target);
      });
      return Math.hypot(re, im);
    };
    expect(sumOf('search')).toBeGreaterThanOrEqual(sumOf(0));
  });
});

describe('cells of one response for all polarisations', () => {
  it('meet a continuous target exactly in what they send, for a circular beam too', () => {
    const { assignment, targetRad } = place({ kind: 'ideal', levels: null }, { requirement: { ...exampleDesign().requirement, polarisation: 'lhcp' }, illumination: { ...skew, polarisation: 'rhcp' } });
    targetRad.forEach((target, n) => expect(wrapRad(assignment.phaseRad[n] - target)).toBeCloseTo(0, 9));
  });

  it('stay within half a level of the target', () => {
    const { assignment, targetRad } = place({ kind: 'ideal', levels: 4 });
    targetRad.forEach((target, n) => expect(Math.abs(wrapRad(assignment.phaseRad[n] - target))).toBeLessThanOrEqual(Math.PI / 4 + 1e-9));
  });

  it('keep their own magnitude in the leaving power', () => {
    const inline: DesignDocument['cells'] = { kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 0.5 }, { phaseDeg: 180, magnitude: 0.5 }] };
    const { vector, assignment } = place(inline);
    expect(wavePower(vector.stock.leaving(assignment, 10e9)) / wavePower(vector.waves)).toBeCloseTo(0.25, 9);
  });

  it('answer at another frequency by their own data', () => {
    const single = prepareEdition(exampleEdition({ ...grid, thetasDeg: [0], phisDeg: [0] }, { ports: 'either' }));
    const { vector, assignment } = place(oblique, {}, single);
    const there = vector.stock.respond(assignment, 10.5e9);
    // The invented phase falls by 0.4 rad to the gigahertz.
    there.phaseRad.forEach((phase, n) => expect(wrapRad(phase - assignment.phaseRad[n])).toBeCloseTo(-0.2, 6));
  });
});
