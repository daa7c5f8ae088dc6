import type { DesignDocument } from '../model/design-document';
import type { CellEdition, FamilyDescription } from '../model/cell-family';
import type { Warning } from '../model/figures';
import { EXAMPLE_DESIGN, exampleDesign } from './example-design';
import { EXAMPLE_EDITION_ID, EXAMPLE_GRID, exampleEdition } from './example-edition';
import { placeCells, type PlacedDesign } from './place-cells';
import { predictDesign, type Prediction } from './predict-design';
import { prepareEdition } from './prepare-edition';

const withEdition = (changes: Partial<Extract<DesignDocument['cells'], { kind: 'edition' }>> = {}, more: Partial<DesignDocument> = {}): DesignDocument =>
  exampleDesign({ cells: { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [], ...changes }, ...more });
const predict = (design: DesignDocument, edition: CellEdition, frequencyGHz?: number): Prediction =>
  predictDesign(design, { edition: prepareEdition(edition), frequencyGHz, include: { cells: true } });
const described = (description: Partial<FamilyDescription>, grid = EXAMPLE_GRID): CellEdition => exampleEdition(grid, description);
const find = (prediction: Prediction, code: Warning['code']): Warning | undefined => prediction.warnings.find((warning) => warning.code === code);
const place = (design: DesignDocument, edition: CellEdition): PlacedDesign => placeCells(design, prepareEdition(edition));

describe('a panel of an edition', () => {
  it('comes within a few degrees of the targets and loses what its cells lose', () => {
    const { figures, cells } = predict(withEdition(), exampleEdition());
    expect(Number(figures.phaseErrorRmsDeg)).toBeLessThan(8);
    expect(Number(figures.cellLossDb)).toBeLessThan(-0.1);
    expect(Number(figures.cellLossDb)).toBeGreaterThan(-1);
    expect(Math.max(...(cells?.cellIndex ?? []))).toBeLessThan(24);
  });

  it('keeps its cells and recomputes their responses at another frequency', () => {
    const [design, edition] = [withEdition(), exampleEdition()];
    const [at10, at105] = [predict(design, edition), predict(design, edition, 10.5)];
    expect(at105.cells?.cellIndex).toEqual(at10.cells?.cellIndex);
    // The invented phase falls by 0.4 rad per GHz everywhere.
    const step = (at105.cells?.phaseDeg[50] ?? 0) - (at10.cells?.phaseDeg[50] ?? 0);
    expect(step - 360 * Math.round(step / 360)).toBeCloseTo((-0.2 * 180) / Math.PI, 2);
  });

  it('counts loss as well under least-error: never a larger complex error than nearest-phase', () => {
    const edition = exampleEdition();
    const total = (rule: 'nearest-phase' | 'least-error'): number => {
      const { assignment, targetRad } = place(withEdition({ rule }), edition);
      return targetRad.reduce((sum, target, n) => {
        const [size, phase] = [assignment.magnitude[n], assignment.phaseRad[n]];
        return sum + Math.hypot(size * Math.cos(phase) - Math.cos(target), size * Math.sin(phase) - Math.sin(target));
      }, 0);
    };
    expect(total('least-error')).toBeLessThanOrEqual(total('nearest-phase'));
  });

  it('leaves excluded cells out', () => {
    const used = place(withEdition(), exampleEdition()).assignment.cellIndex[0];
    const { cellIndex } = place(withEdition({ excludedCells: [`cell-${used}`] }), exampleEdition()).assignment;
    expect(cellIndex.includes(used)).toBe(false);
  });

  it.each(['nearest-phase', 'least-error'] as const)('finds with the search, by %s, a reference at least as good as any of a coarse scan', (rule) => {
    const edition = exampleEdition({ ...EXAMPLE_GRID, cellCount: 5 });
    const field = (referencePhaseDeg: number | 'search'): number => {
      const placed = place(withEdition({ rule }, { referencePhaseDeg }), edition);
      const { u, v } = placed.si.beams[0].direction;
      let [re, im] = [0, 0];
      placed.assignment.phaseRad.forEach((phase, n) => {
        const size = placed.light.amplitude[n] * placed.assignment.magnitude[n];
        const angle = phase + placed.designWavenumber * (placed.lattice.xM[n] * u + placed.lattice.yM[n] * v - placed.light.pathM[n]);
        re += size * Math.cos(angle);
        im += size * Math.sin(angle);
      });
      return Math.hypot(re, im);
    };
    const best = Math.max(...[0, 40, 80, 120, 160, 200, 240, 280, 320].map(field));
    expect(field('search')).toBeGreaterThanOrEqual(best * (1 - 1e-9));
  });

  it('refuses an edition that is absent, that works the other way, or that has no cell left', () => {
    expect(() => placeCells(withEdition())).toThrow('#/cells/editionId: edition 00000000-0000-4000-8000-000000000001 is not at hand');
    expect(() => place(withEdition(), described({ operation: 'transmit' }))).toThrow('the cells of Invented example cells transmit, the panel is to reflect');
    const everyCell = Array.from({ length: 24 }, (_, k) => `cell-${k}`);
    expect(() => place(withEdition({ excludedCells: ['cell-3', 'cell 3'] }), exampleEdition())).toThrow('#/cells/excludedCells/1: there is no cell "cell 3" in Invented example cells');
    expect(() => place(withEdition({ excludedCells: everyCell }), exampleEdition())).toThrow('#/cells/excludedCells: no cell of Invented example cells is left at 10 GHz: 24 are excluded');
  });
});

describe('what an edition does not cover', () => {
  it('is the incidence of a family described at normal incidence only', () => {
    const normal = described({}, { ...EXAMPLE_GRID, thetasDeg: [0], phisDeg: [0] });
    const warning = find(predict(withEdition(), normal), 'incidence-not-covered');
    expect(warning).toMatchObject({ severity: 'serious', numbers: { cells: 400, coveredDeg: 0, largestDeg: expect.closeTo(49.7, 1) } });
    expect(warning?.message).toContain('described at 0.0° only, but used up to 49.7° of incidence');
  });

  it('is nothing when the table reaches far enough', () => {
    const prediction = predict(withEdition(), exampleEdition());
    expect(prediction.warnings.map((warning) => warning.code)).toEqual(['provenance']);
    expect(find(prediction, 'provenance')?.message).toBe('The cells of Invented example cells are invented, not measured (a formula).');
  });

  it('is a count of cells beyond the largest angle', () => {
    const short = described({}, { ...EXAMPLE_GRID, thetasDeg: [0, 15, 30] });
    const { numbers } = find(predict(withEdition(), short), 'incidence-not-covered') ?? { numbers: {} as Record<string, number> };
    expect(numbers['cells']).toBeGreaterThan(50);
    expect(numbers['cells']).toBeLessThan(400);
  });

  it('is the frequency outside the band: serious for the design itself', () => {
    const design = withEdition({}, { requirement: { ...EXAMPLE_DESIGN.requirement, designFrequencyGHz: 12 } });
    expect(find(predict(design, exampleEdition()), 'frequency-not-covered')).toMatchObject({ severity: 'serious', pointer: '#/requirement/designFrequencyGHz', numbers: { frequencyGHz: 12, fromGHz: 9, toGHz: 11 } });
    expect(find(predict(withEdition(), exampleEdition(), 11.5), 'frequency-not-covered')).toMatchObject({ severity: 'warn' });
  });

  it('is the azimuth where only some planes of incidence are described', () => {
    const onePlane = described({}, { ...EXAMPLE_GRID, phisDeg: [0] });
    expect(find(predict(withEdition(), onePlane), 'azimuth-not-covered')).toMatchObject({ severity: 'note', numbers: { azimuths: 1 } });
  });

  it('is a region that the laboratory excludes: its cells are not chosen there', () => {
    const edition = described({ excludedRegions: [{ reason: 'odd mode', fromThetaDeg: 20, toThetaDeg: 90, fromParameterMm: 2 }] });
    const { cells, warnings } = predict(withEdition(), edition);
    if (!cells) throw new Error('cells were asked for');
    cells.cellIndex.forEach((k, n) => {
      if (cells.incidenceDeg[n] >= 20.001) expect(edition.cells[k].parametersMm[0]).toBeLessThan(2 - 1e-9);
    });
    expect(Array.from(cells.cellIndex).some((k) => k >= 10)).toBe(true);
    expect(warnings.find((warning) => warning.code === 'region-excluded')).toMatchObject({ severity: 'note', numbers: { usedCells: 0, emptyPositions: 0 } });
  });

  it('is an empty place where the region leaves no cell: it returns nothing, and the warning is serious', () => {
    const edition = described({ excludedRegions: [{ reason: 'not computed', fromThetaDeg: 40, toThetaDeg: 90 }] });
    const { cells, warnings, figures } = predict(withEdition(), edition);
    const empty = Array.from(cells?.cellIndex ?? []).filter((k) => k === -1).length;
    expect(empty).toBeGreaterThan(0);
    expect(warnings[0]).toMatchObject({ code: 'region-excluded', severity: 'serious', numbers: { emptyPositions: empty } });
    expect(Number.isFinite(figures.gainDbi)).toBe(true);
  });

  it('is a region met only at another frequency', () => {
    const edition = described({ excludedRegions: [{ reason: 'resonance', fromGHz: 10.4, toGHz: 10.6 }] });
    expect(find(predict(withEdition(), edition), 'region-excluded')).toBeUndefined();
    expect(find(predict(withEdition(), edition, 10.5), 'region-excluded')).toMatchObject({ severity: 'warn', numbers: { usedCells: 400 } });
  });

  it('is a region of some azimuths: only the nearest described plane is concerned', () => {
    const edition = described({ excludedRegions: [{ reason: 'resonance', phisDeg: [0], fromThetaDeg: 0, toThetaDeg: 90, fromParameterMm: 2 }] });
    const { cells } = predict(withEdition(), edition);
    const large = Array.from(cells?.cellIndex ?? []).map((k, n) => [k, cells?.incidenceAzimuthDeg[n] ?? 0]).filter(([k]) => k >= 10);
    expect(large.length).toBeGreaterThan(0);
    // Between the planes 0 and 22.5 the middle in cos 4 phi lies at 15 degrees.
    for (const [, azimuth] of large) expect(Math.min(...[0, 90, 180].map((axis) => Math.abs(Math.abs(azimuth) - axis)))).toBeGreaterThan(14.9);
  });

  it('is another lattice or another polarisation than those described', () => {
    const otherPeriod = predict(withEdition(), described({ periodXMm: 14, periodYMm: 14 }));
    expect(find(otherPeriod, 'period-differs')).toMatchObject({ numbers: { periodXMm: 14, stepXMm: expect.closeTo(15, 9) } });
    const otherPort = predict(withEdition(), described({ ports: 'y' }, { ...EXAMPLE_GRID, phisDeg: [0] }));
    expect(otherPort.warnings.some((warning) => warning.pointer === '#/illumination/polarisation')).toBe(true);
  });
});
