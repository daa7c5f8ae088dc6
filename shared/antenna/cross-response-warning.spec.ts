import type { CellEdition } from '../model/cell-family';
import type { Warning } from '../model/figures';
import { exampleDesign } from './example-design';
import { EXAMPLE_EDITION_ID, EXAMPLE_GRID, exampleEdition } from './example-edition';
import { predictDesign } from './predict-design';
import { prepareEdition } from './prepare-edition';

const design = exampleDesign({ cells: { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] } });

/** The example with S12 set in every cell from one angle of incidence on. */
function turning(amplitude: number, fromThetaDeg = 0, description: Partial<CellEdition['description']> = {}): CellEdition {
  const edition = exampleEdition(EXAMPLE_GRID, description);
  const { values, frequenciesHz, phisRad, thetasRad } = edition.responses;
  for (let at = 0; at < values.length / 8; at++) {
    const theta = EXAMPLE_GRID.thetasDeg[Math.floor(at / (frequenciesHz.length * phisRad.length)) % thetasRad.length];
    if (theta >= fromThetaDeg) values[8 * at + 4] = amplitude;
  }
  return edition;
}

const warningOf = (edition: CellEdition, frequencyGHz?: number): Warning | undefined =>
  predictDesign(design, { edition: prepareEdition(edition), frequencyGHz, include: {} }).warnings.find(({ code }) => code === 'cross-response');

describe('crossResponseWarning', () => {
  it('names the largest cross response of the cells in use in decibels, and where', () => {
    const found = warningOf(turning(0.25, 30));
    expect(found).toMatchObject({ severity: 'warn', pointer: '#/cells', numbers: { crossDb: expect.closeTo(20 * Math.log10(0.25), 9), thetaDeg: expect.closeTo(30, 9), positions: 400 } });
    expect(found?.message).toContain('up to -12.0 dB, in cell cell-');
  });

  it('says nothing up to a tenth of the field, nor of one-port data', () => {
    expect(warningOf(turning(0.0999))).toBeUndefined();
    expect(warningOf(turning(0.5, 0, { ports: 'either' }))).toBeUndefined();
  });

  it('looks no further than the angle that covers the steepest incidence', () => {
    // The example is lit up to about 56 degrees, so 60 is read; a horn far away stays below 30.
    expect(warningOf(turning(0.3, 60))?.numbers['thetaDeg']).toBeCloseTo(60, 9);
    const far = { ...design, illumination: { kind: 'horn' as const, positionMm: [0, 0, 900] as [number, number, number], aimMm: [0, 0, 0] as [number, number, number], exponentE: 20, exponentH: 20, polarisation: 'x' as const } };
    const { warnings } = predictDesign(far, { edition: prepareEdition(turning(0.3, 45)), include: {} });
    expect(warnings.some(({ code }) => code === 'cross-response')).toBe(false);
  });
});
