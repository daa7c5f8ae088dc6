import type { FamilyDescription } from '../model/cell-family';
import { radFromDeg } from '../units/angles';
import { exampleEdition } from './example-edition';
import { regionFilter } from './excluded-regions';
import { prepareEdition } from './prepare-edition';

type Region = FamilyDescription['excludedRegions'][number];

/** Cells barred at an angle and a frequency. */
function barredAt(regions: readonly Region[], place: { thetaDeg: number; phiDeg?: number; frequencyGHz?: number }): number[] {
  const prepared = prepareEdition(exampleEdition(undefined, { excludedRegions: [...regions] }));
  const filter = regionFilter(prepared.edition, prepared.azimuths, (place.frequencyGHz ?? 10) * 1e9);
  const barred = new Uint8Array(prepared.edition.cells.length);
  const any = filter.mark(radFromDeg(place.thetaDeg), radFromDeg(place.phiDeg ?? 0), barred);
  const cells = Array.from(barred.keys()).filter((cell) => barred[cell]);
  expect(any).toBe(cells.length > 0);
  return cells;
}

/** The example has 24 cells with parameters from 1 to 3.3 mm. */
const ALL = Array.from({ length: 24 }, (_, cell) => cell);

describe('regionFilter', () => {
  it('bars nothing without a region, and everything in one without bounds', () => {
    expect(barredAt([], { thetaDeg: 10 })).toEqual([]);
    expect(barredAt([{ reason: 'broken' }], { thetaDeg: 10 })).toEqual(ALL);
  });

  it('counts both ends of the angles in', () => {
    const region: Region = { reason: 'odd mode', fromThetaDeg: 20, toThetaDeg: 40 };
    expect([19.9, 20, 30, 40, 40.1].map((thetaDeg) => barredAt([region], { thetaDeg }).length)).toEqual([0, 24, 24, 24, 0]);
  });

  it('counts both ends of the band in, rounding forgiven', () => {
    const region: Region = { reason: 'resonance', fromGHz: 9.9, toGHz: 10.1 };
    expect([9.89, 9.9, 9.9 - 1e-10, 10.1 + 1e-10, 10.11].map((frequencyGHz) => barredAt([region], { thetaDeg: 0, frequencyGHz }).length)).toEqual([0, 24, 24, 24, 0]);
  });

  it('takes cells from a parameter up, that one among them', () => {
    expect(barredAt([{ reason: 'large', fromParameterMm: 3 }], { thetaDeg: 0 })).toEqual([20, 21, 22, 23]);
  });

  it('concerns the nearest described azimuth where azimuths are named', () => {
    const region: Region = { reason: 'odd mode', phisDeg: [22.5] };
    // In cos 4 phi the node of 22.5 degrees reaches from 15 to 30.
    expect([0, 14, 16, 29, 31, 45, 90 - 22.5].map((phiDeg) => barredAt([region], { thetaDeg: 10, phiDeg }).length)).toEqual([0, 0, 24, 24, 0, 0, 24]);
  });

  it('adds several regions up', () => {
    const regions: Region[] = [{ reason: 'large', fromParameterMm: 3.2 }, { reason: 'steep', fromThetaDeg: 50, fromParameterMm: 3 }];
    expect([barredAt(regions, { thetaDeg: 10 }), barredAt(regions, { thetaDeg: 55 })]).toEqual([[22, 23], [20, 21, 22, 23]]);
  });
});
