import type { DesignDocument } from '../../model/design-document';
import { designDocument } from '../../model/design-document';
import { figures as figuresSchema } from '../../model/figures';
import { designFaults } from '../design-faults';
import { exampleDesign } from '../example-design';
import { EXAMPLE_EDITION_ID, exampleEdition } from '../example-edition';
import { placeCells, type PlacedDesign } from '../place-cells';
import { predictDesign } from '../predict-design';
import { prepareEdition } from '../prepare-edition';
import { neighbourSteps } from './neighbour-steps';

type EditionCells = Extract<DesignDocument['cells'], { kind: 'edition' }>;

const prepared = prepareEdition(exampleEdition());
const requirement = { ...exampleDesign().requirement, bandGHz: [9.5, 10.5] as [number, number] };
const withCells = (changes: Partial<EditionCells>, more: Partial<DesignDocument> = {}): DesignDocument =>
  exampleDesign({ requirement, cells: { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'band-fit', excludedCells: [], ...changes }, ...more });
const place = (design: DesignDocument): PlacedDesign => placeCells(design, prepared);

/** Sum of squared complex errors by power at the frequencies of the band, the common phase taken off at all but the first. */
function leftOver(placed: PlacedDesign, frequenciesHz: readonly number[]): number {
  return frequenciesHz.reduce((sum, hz, f) => {
    const { phaseRad, magnitude } = placed.stock.respond(placed.assignment, hz);
    const k = (2 * Math.PI * hz) / 299_792_458;
    const off = phaseRad.map((phase, n) => phase - placed.law.phaseRad(k, placed.lattice.xM[n], placed.lattice.yM[n]) - k * placed.light.pathM[n]);
    let [re, im] = [0, 0];
    off.forEach((angle, n) => {
      const size = magnitude[n] * placed.light.amplitude[n] ** 2;
      re += size * Math.cos(angle);
      im += size * Math.sin(angle);
    });
    const common = f === 0 ? placed.referencePhaseRad : Math.atan2(im, re);
    return sum + off.reduce((part, angle, n) => part + placed.light.amplitude[n] ** 2 * (1 + magnitude[n] ** 2 - 2 * magnitude[n] * Math.cos(angle - common)), 0);
  }, 0);
}

describe('a band fit', () => {
  const band = [10e9, 9.5e9, 10.5e9];

  it('leaves no more over its frequencies than a choice at the design frequency alone', () => {
    expect(leftOver(place(withCells({})), band)).toBeLessThanOrEqual(leftOver(place(withCells({ rule: 'least-error' })), band) * (1 + 1e-9));
  });

  it('is the least complex error where its only other frequency is the design frequency', () => {
    const fitted = place(withCells({ fitFrequenciesGHz: [10] })).assignment.cellIndex;
    expect([...fitted]).toEqual([...place(withCells({ rule: 'least-error' })).assignment.cellIndex]);
  });

  it('tells what is left at each frequency, the design frequency first', () => {
    const { figures } = predictDesign(withCells({}), { edition: prepared, include: {} });
    expect(figuresSchema.safeParse(figures).success).toBe(true);
    expect(figures.assignment?.band?.map(({ frequencyGHz }) => frequencyGHz)).toEqual([10, 9.5, 10.5]);
    expect(figures.assignment?.band?.every(({ phaseErrorRmsDeg }) => phaseErrorRmsDeg > 0 && phaseErrorRmsDeg < 60)).toBe(true);
  });

  it('searches its reference over the whole band: no worse than reference 0', () => {
    const searched = place(withCells({}, { referencePhaseDeg: 'search' }));
    expect((searched.referencePhaseRad * 180) / Math.PI % 15).toBeCloseTo(0, 9);
    expect(leftOver(searched, band)).toBeLessThanOrEqual(leftOver(place(withCells({})), band) * 1.02);
  });

  it('refuses a design without a band, and the vector model', () => {
    const pointers = (design: DesignDocument): string[] => designFaults(design).map(({ pointer }) => pointer);
    expect(pointers(withCells({}, { requirement: exampleDesign().requirement }))).toEqual(['#/cells/rule']);
    expect(pointers(withCells({}, { prediction: { ...exampleDesign().prediction, model: 'vector' } }))).toEqual(['#/cells/rule']);
    expect(designDocument.safeParse(withCells({ fitFrequenciesGHz: [] })).success).toBe(false);
  });
});

describe('a subset of the cells of an edition', () => {
  it('uses at most so many different cells, with phases about evenly apart', () => {
    const { cellIndex, phaseRad } = place(withCells({ rule: 'nearest-phase', levels: 4 })).assignment;
    const used = [...new Set(cellIndex)];
    expect(used).toHaveLength(4);
    const phases = used.map((k) => (((phaseRad[cellIndex.indexOf(k)] * 180) / Math.PI) % 360 + 360) % 360).sort((a, b) => a - b);
    const gaps = phases.map((phase, i) => (i === 0 ? phase + 360 - phases[3] : phase - phases[i - 1]));
    expect(Math.min(...gaps)).toBeGreaterThan(60);
  });

  it('costs a four-level panel about the 0.9 dB of four ideal levels', () => {
    const loss = Number(predictDesign(withCells({ rule: 'nearest-phase', levels: 4 }), { edition: prepared, include: {} }).figures.phaseLossDb);
    expect(loss).toBeLessThan(-0.6);
    expect(loss).toBeGreaterThan(-1.5);
  });
});

describe('steps between neighbours', () => {
  it('are counted along rows and columns, beyond the limit alone, gaps left out', () => {
    const lattice = { grid: { columnCount: 3, rowCount: 2 }, count: 5, column: Int32Array.of(0, 1, 2, 0, 2), row: Int32Array.of(0, 0, 0, 1, 1) } as unknown as PlacedDesign['lattice'];
    const cells = [{ parametersMm: [1] }, { parametersMm: [1.5] }, { parametersMm: [3] }];
    const found = neighbourSteps({ lattice, cellIndex: Int32Array.of(0, 1, 2, 1, 2), cells, limitMm: 0.5 });
    // 1 - 1.5 - 3 in the first row, 1.5 above 1 and 3 above 3: 0.5, 1.5, 0.5, 0.
    expect(found).toEqual({ pairs: 4, violations: 1, largestMm: 1.5 });
  });

  it('are among the figures where a limit is given', () => {
    const { assignment } = predictDesign(withCells({ rule: 'nearest-phase', neighbourStepMm: 0.2 }), { edition: prepared, include: {} }).figures;
    expect(assignment?.neighbours?.pairs).toBe(2 * 20 * 19);
    expect(assignment?.neighbours?.violations).toBeGreaterThan(0);
  });
});
