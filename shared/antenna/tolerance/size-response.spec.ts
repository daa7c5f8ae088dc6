import type { DesignDocument } from '../../model/design-document';
import { coPolarResponse, incidenceWeigher } from '../cell-response';
import { exampleDesign } from '../example-design';
import { EXAMPLE_EDITION_ID, exampleEdition } from '../example-edition';
import { placeCells } from '../place-cells';
import { prepareEdition } from '../prepare-edition';
import { wrapRad } from '../../units/angles';
import { sizeResponse, type ResponseChange } from './size-response';

const cells: DesignDocument['cells'] = { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] };
const edition = prepareEdition(exampleEdition());
const placed = placeCells(exampleDesign({ cells }), edition);

function changeAt(n: number, growthM: number, reachM = 0): ResponseChange {
  const change: ResponseChange = { phaseRad: 0, logMagnitude: 0 };
  sizeResponse(placed, edition, reachM).addChange(n, growthM, change);
  return change;
}

/** Sizes of the example are 0.1 mm apart. */
const STEP_M = 1e-4;

/** A position whose cell has two neighbours either side. */
const inner = placed.assignment.cellIndex.findIndex((cell) => cell > 2 && cell < 21);

describe('sizeResponse', () => {
  it('changes nothing at the size drawn', () => {
    expect(changeAt(inner, 0)).toEqual({ phaseRad: 0, logMagnitude: 0 });
  });

  it.each([1, -1, 2, -2])('becomes the cell %d sizes on when it grows to that size', (by) => {
    const { phaseRad, logMagnitude } = changeAt(inner, by * STEP_M, 2.5 * STEP_M);
    const weights = incidenceWeigher(edition, 'x')(placed.light.incidenceRad[inner], placed.light.azimuthRad[inner]);
    const there = coPolarResponse(edition.atFrequency(10e9), placed.assignment.cellIndex[inner] + by, weights, { magnitude: 0, phaseRad: 0 });
    expect(wrapRad(placed.assignment.phaseRad[inner] + phaseRad - there.phaseRad)).toBeCloseTo(0, 9);
    expect(placed.assignment.magnitude[inner] * Math.exp(logMagnitude)).toBeCloseTo(there.magnitude, 9);
  });

  it('is linear between sizes and goes on beyond the cells looked at', () => {
    expect(changeAt(inner, STEP_M / 2).phaseRad).toBeCloseTo(changeAt(inner, STEP_M).phaseRad / 2, 12);
    expect(changeAt(inner, 3 * STEP_M).phaseRad).toBeCloseTo(3 * changeAt(inner, STEP_M).phaseRad, 9);
  });

  it('turns the phase the way a larger cell turns it', () => {
    // The example falls by 5.9 rad over 24 sizes.
    expect(changeAt(inner, STEP_M).phaseRad).toBeLessThan(-0.1);
  });

  it('adds the changes of two parameters, each along its own neighbours', () => {
    const source = exampleEdition({ cellCount: 4, frequenciesGHz: [9, 10, 11], thetasDeg: [0, 45], phisDeg: [0] });
    const square = prepareEdition({ ...source, cells: source.cells.map((cell, k) => ({ ...cell, parametersMm: [1 + (k % 2) / 10, 1 + Math.floor(k / 2) / 10] })) });
    const own = placeCells(exampleDesign({ cells }), square);
    const first = own.assignment.cellIndex.indexOf(0);
    const change: ResponseChange = { phaseRad: 0, logMagnitude: 0 };
    sizeResponse(own, square, 0).addChange(first, STEP_M, change);
    const weights = incidenceWeigher(square, 'x')(own.light.incidenceRad[first], own.light.azimuthRad[first]);
    const phases = [0, 1, 2].map((k) => coPolarResponse(square.atFrequency(10e9), k, weights, { magnitude: 0, phaseRad: 0 }).phaseRad);
    expect(wrapRad(change.phaseRad - (phases[1] + phases[2] - 2 * phases[0]))).toBeCloseTo(0, 9);
  });

  it('counts the cells that have no neighbour', () => {
    const source = exampleEdition({ cellCount: 1, frequenciesGHz: [9, 10, 11], thetasDeg: [0], phisDeg: [0] });
    const single = prepareEdition(source);
    const own = placeCells(exampleDesign({ cells }), single);
    const sizes = sizeResponse(own, single, 1);
    const change: ResponseChange = { phaseRad: 0, logMagnitude: 0 };
    sizes.addChange(0, STEP_M, change);
    expect([sizes.withoutNeighbour, change.phaseRad]).toEqual([400, 0]);
  });
});
