import type { CellEdition, FamilyDescription } from '../model/cell-family';
import { radFromDeg } from '../units/angles';
import { coPolarResponse, incidenceWeigher, type PolarResponse } from './cell-response';
import { exampleDesign } from './example-design';
import { EXAMPLE_EDITION_ID, EXAMPLE_GRID, exampleEdition, exampleResponse } from './example-edition';
import { permittedNodes } from './excluded-nodes';
import { regionFilter } from './excluded-regions';
import { placeCells } from './place-cells';
import { predictDesign } from './predict-design';
import { prepareEdition, type PreparedEdition } from './prepare-edition';

type Region = FamilyDescription['excludedRegions'][number];

const HZ = 10e9;
const ABOVE_40: Region = { reason: 'grating lobe', fromThetaDeg: 40, toThetaDeg: 90 };

/** The example with wild numbers wherever the region lies. */
function spoilt(region: Region, grid = EXAMPLE_GRID): CellEdition {
  const edition = exampleEdition(grid, { excludedRegions: [region] });
  const { values, frequenciesHz, thetasRad, phisRad } = edition.responses;
  const points = frequenciesHz.length;
  for (let at = 0; at < values.length / 8; at++) {
    const theta = grid.thetasDeg[Math.floor(at / (points * phisRad.length)) % thetasRad.length];
    const phi = grid.phisDeg[Math.floor(at / points) % phisRad.length];
    const inside = theta >= (region.fromThetaDeg ?? 0) && theta <= (region.toThetaDeg ?? 90) && (region.phisDeg?.includes(phi) ?? true);
    if (inside) values.subarray(8 * at, 8 * at + 8).set([-0.01, 0.003, 0, 0, 0, 0, 0.02, -0.5]);
  }
  return edition;
}

function responseAt(prepared: PreparedEdition, use: 'given' | 'permitted', angles: { thetaDeg: number; phiDeg: number }, cell = 9): PolarResponse {
  const given = prepared.atFrequency(HZ);
  const regions = regionFilter(prepared.edition, prepared.azimuths, HZ);
  const at = use === 'given' ? given : permittedNodes(prepared, regions, given).at;
  return { ...coPolarResponse(at, cell, incidenceWeigher(prepared, 'x')(radFromDeg(angles.thetaDeg), radFromDeg(angles.phiDeg)), { magnitude: 0, phaseRad: 0 }) };
}

/** In the plane phi = 0 x polarisation is TM. */
const tmPhaseRad = (thetaDeg: number): number => exampleResponse(9 / 24, 10, { thetaDeg, phiDeg: 0, entry: 3 }).phaseRad;
const turns = (rad: number): number => Math.abs(Math.sin(rad / 2));

describe('permittedNodes', () => {
  const prepared = prepareEdition(spoilt(ABOVE_40));

  it('reads no number of the region just below it, where the table as given would', () => {
    const angles = { thetaDeg: 39, phiDeg: 0 };
    // The invented phase is a line in sin^2, so the polynomial through 0, 15 and 30 degrees is exact up to 39.
    expect(turns(responseAt(prepared, 'permitted', angles).phaseRad - tmPhaseRad(39))).toBeLessThan(1e-9);
    expect(responseAt(prepared, 'permitted', angles).magnitude).toBeCloseTo(exampleResponse(9 / 24, 10, { thetaDeg: 39, phiDeg: 0, entry: 3 }).magnitude, 5);
    expect(turns(responseAt(prepared, 'given', angles).phaseRad - tmPhaseRad(39))).toBeGreaterThan(0.05);
  });

  it('gives the same however wild the numbers of the region are', () => {
    const smooth = prepareEdition(exampleEdition(EXAMPLE_GRID, { excludedRegions: [ABOVE_40] }));
    for (const thetaDeg of [0, 10, 22, 31, 39.9]) {
      const angles = { thetaDeg, phiDeg: 13 };
      const [wild, tame] = [responseAt(prepared, 'permitted', angles), responseAt(smooth, 'permitted', angles)];
      expect(wild.magnitude).toBeCloseTo(tame.magnitude, 12);
      expect(turns(wild.phaseRad - tame.phaseRad)).toBeLessThan(1e-12);
    }
  });

  it('does so where a window of angles is taken out of many', () => {
    const fine = { ...EXAMPLE_GRID, thetasDeg: [0, 10, 20, 30, 35, 41, 45, 50, 60] };
    const many = prepareEdition(spoilt(ABOVE_40, fine));
    for (const thetaDeg of [22, 34, 39.5]) expect(turns(responseAt(many, 'permitted', { thetaDeg, phiDeg: 0 }).phaseRad - tmPhaseRad(thetaDeg))).toBeLessThan(1e-9);
  });

  it('fills a region between angles from both sides, whatever turns the excluded phases make', () => {
    const middle = prepareEdition(spoilt({ reason: 'resonance', fromThetaDeg: 25, toThetaDeg: 35 }));
    for (const thetaDeg of [20, 24, 36, 50]) expect(turns(responseAt(middle, 'permitted', { thetaDeg, phiDeg: 0 }).phaseRad - tmPhaseRad(thetaDeg))).toBeLessThan(1e-9);
  });

  it('lets the other azimuths stand in for one that is excluded at every angle', () => {
    const region: Region = { reason: 'odd mode', phisDeg: [0] };
    const [wild, tame] = [spoilt(region), exampleEdition(EXAMPLE_GRID, { excludedRegions: [region] })].map(prepareEdition);
    for (const phiDeg of [16, 20, 30]) {
      const angles = { thetaDeg: 30, phiDeg };
      expect(responseAt(wild, 'permitted', angles).magnitude).toBeCloseTo(responseAt(tame, 'permitted', angles).magnitude, 12);
      expect(Math.abs(responseAt(wild, 'given', angles).magnitude - responseAt(tame, 'given', angles).magnitude)).toBeGreaterThan(0.01);
    }
  });

  it('leaves the table alone without regions, and numbers of a cell with no permitted angle', () => {
    const free = prepareEdition(exampleEdition());
    expect(permittedNodes(free, regionFilter(free.edition, free.azimuths, HZ), free.atFrequency(HZ)).at).toBe(free.atFrequency(HZ));
    const nowhere = prepareEdition(spoilt({ reason: 'broken' }));
    const { at, lowestRad, highestRad } = permittedNodes(nowhere, regionFilter(nowhere.edition, nowhere.azimuths, HZ), nowhere.atFrequency(HZ));
    expect(at.phaseRad).toEqual(nowhere.atFrequency(HZ).phaseRad);
    expect([lowestRad[0], highestRad[0]]).toEqual([Infinity, -Infinity]);
  });
});

describe('a panel of an edition with an excluded region', () => {
  const design = exampleDesign({ cells: { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] } });
  const wild = prepareEdition(spoilt(ABOVE_40));

  it('chooses and predicts as if the region held nothing', () => {
    const tame = prepareEdition(exampleEdition(EXAMPLE_GRID, { excludedRegions: [ABOVE_40] }));
    expect(placeCells(design, wild).assignment.cellIndex).toEqual(placeCells(design, tame).assignment.cellIndex);
    const gain = (edition: PreparedEdition): number => Number(predictDesign(design, { edition, include: {} }).figures.gainDbi);
    expect(gain(wild)).toBeCloseTo(gain(tame), 9);
  });

  it('says how far responses are carried on towards the region', () => {
    const { warnings, cells } = predictDesign(design, { edition: wild, include: { cells: true } });
    const between = Array.from(cells?.incidenceDeg ?? []).filter((deg) => deg > 30 && deg < 40).length;
    const found = warnings.find(({ code }) => code === 'region-excluded');
    expect(found?.numbers['carriedPositions']).toBe(between);
    expect(found?.numbers['carriedDeg']).toBeGreaterThan(9);
    expect(found?.numbers['carriedDeg']).toBeLessThan(10);
    expect(found?.message).toContain(`At ${between} positions the response is carried on from the angles described, by up to `);
  });
});
