import type { DesignDocument } from '../../model/design-document';
import { designDocument } from '../../model/design-document';
import { figures as figuresSchema } from '../../model/figures';
import { wavenumberRadPerM } from '../../waves/conventions';
import { designFaults } from '../design-faults';
import { derivedValues } from '../derived-values';
import { exampleDesign } from '../example-design';
import { placeCells } from '../place-cells';
import { predictDesign } from '../predict-design';
import { leakedShare, planeTaperEfficiency } from './leaked-power';

const wave: Extract<DesignDocument['illumination'], { kind: 'guided-wave' }> = { kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 90 }, effectiveIndex: 1.6, leakageNpPerM: 4, polarisation: 'x' };
const radial: DesignDocument['illumination'] = { ...wave, launch: { kind: 'radial', centreMm: [0, 0], radiusMm: 20 } };
const guided = (changes: Partial<DesignDocument> = {}): DesignDocument =>
  exampleDesign({ illumination: wave, cells: { kind: 'resonant', rule: 'projection', states: null }, ...changes });
const small: DesignDocument['panel'] = { ...exampleDesign().panel, lattice: { kind: 'rectangular', periodXMm: 10, periodYMm: 10 } };

describe('a guided wave under a panel', () => {
  it('starts at the edge and decays along its way, its phase by its own index', () => {
    const { light, lattice } = placeCells(guided());
    const at = (x: number, y: number): number => lattice.xM.findIndex((value, n) => Math.abs(value - x) < 1e-9 && Math.abs(lattice.yM[n] - y) < 1e-9);
    const [first, later] = [at(0.0075, -0.1425), at(0.0075, 0.0075)];
    expect(light.pathM[first]).toBeCloseTo(1.6 * 0.0075, 12);
    expect(light.pathM[later] - light.pathM[first]).toBeCloseTo(1.6 * 0.15, 12);
    expect(light.amplitude[later] / light.amplitude[first]).toBeCloseTo(Math.exp(-4 * 0.15), 12);
    expect(light.azimuthRad[later]).toBeCloseTo(Math.PI / 2, 12);
  });

  it('spreads from a launch, with nothing inside its radius', () => {
    const { light, lattice } = placeCells(guided({ illumination: radial }));
    const near = lattice.xM.findIndex((x, n) => Math.hypot(x, lattice.yM[n]) < 0.02);
    expect(light.amplitude[near]).toBe(0);
    const far = lattice.count - 1;
    const rho = Math.hypot(lattice.xM[far], lattice.yM[far]);
    expect(light.amplitude[far]).toBeCloseTo(Math.exp(-4 * rho) / Math.sqrt(rho), 12);
  });

  it('gains the directivity times the leaked share: no spillover, no loss of the cells', () => {
    const { figures } = predictDesign(guided(), { include: {} });
    expect(figuresSchema.safeParse(figures).success).toBe(true);
    expect(figures.spilloverDb).toMatchObject({ kind: 'guided-wave' });
    expect(figures.cellLossDb).toMatchObject({ kind: 'resonant' });
    expect(figures.maxIncidenceDeg).toMatchObject({ kind: 'guided-wave' });
    expect(Number(figures.gainDbi) - Number(figures.directivityDbi)).toBeCloseTo(10 * Math.log10(leakedShare(4, 0.3)), 9);
    expect(figures.guidedWave?.lengthMm).toBeCloseTo(300, 9);
  });

  it('has the taper of a leaking line', () => {
    const { figures } = predictDesign(guided(), { include: {} });
    // Twenty samples of the exponential, not the exponential itself.
    expect(10 ** (Number(figures.taperDb) / 10)).toBeCloseTo(planeTaperEfficiency(4 * 0.3), 3);
  });

  it('steers: free cells send the beam where it is wanted', () => {
    const { figures } = predictDesign(guided({ cells: { kind: 'ideal', levels: null }, panel: small }), { include: {} });
    expect(figures.peakThetaDeg).toBeCloseTo(20, 0);
    expect(figures.guidedWave?.beamRelativeDb).toBeCloseTo(0, 9);
    expect(figures.guidedWave?.modulationEfficiency).toBeLessThanOrEqual(1);
  });

  it('squints: a wave in a guide of index 1.6 turns its beam with frequency as its phases stay', () => {
    const requirement = { ...exampleDesign().requirement, beams: [{ thetaDeg: 0, phiDeg: 0 }] };
    const design = guided({ requirement, cells: { kind: 'ideal', levels: null }, panel: small, illumination: { ...wave, launch: { kind: 'plane', directionDeg: 0 } } });
    const { figures } = predictDesign(design, { frequencyGHz: 10.5, include: {} });
    // u = n + (f0 / f)(u0 - n), with u0 = 0.
    expect(Math.sin((Number(figures.peakThetaDeg) * Math.PI) / 180)).toBeCloseTo(1.6 * (1 - 1 / 1.05), 2);
  });

  it('warns of the second lobe from lambda / (n + 1) on, and of none below', () => {
    const codes = (design: DesignDocument): string[] => predictDesign(design, { include: {} }).warnings.map(({ code }) => code);
    // lambda / 2.6 = 11.53 mm
    expect(codes(guided())).toContain('unmodulated-lobe');
    expect(codes(guided({ panel: small }))).not.toContain('unmodulated-lobe');
    expect(codes(guided({ illumination: radial }))).toContain('unmodulated-lobe');
    expect(codes(guided())).not.toContain('cell-period');
  });

  it('has its own limit of the period among the derived values, and no incidence', () => {
    const derived = derivedValues(guided());
    expect(derived.largestCellSpacingMm).toBeCloseTo((2 * Math.PI * 1000) / wavenumberRadPerM(10e9) / 2.6, 9);
    expect(derived.maxIncidenceDeg).toMatchObject({ kind: 'guided-wave' });
    expect(derived.hornGainDbi).toMatchObject({ kind: 'guided-wave' });
  });
});

describe('faults of guided waves', () => {
  const pointers = (design: DesignDocument): string[] => designFaults(design).map(({ pointer }) => pointer);

  it('refuses resonant cells without a guided wave, and an edition with one', () => {
    expect(pointers(exampleDesign({ cells: { kind: 'resonant', rule: 'projection', states: 4 } }))).toEqual(['#/cells/kind']);
    const edition: DesignDocument['cells'] = { kind: 'edition', editionId: '7f7d2f0e-5f0e-4d8e-9b52-000000000000', rule: 'nearest-phase', excludedCells: [] };
    expect(pointers(guided({ cells: edition }))).toEqual(['#/cells/kind']);
    expect(pointers(guided())).toEqual([]);
  });

  it('refuses phase only with states', () => {
    expect(pointers(guided({ cells: { kind: 'resonant', rule: 'phase-only', states: 4 } }))).toEqual(['#/cells/states']);
  });

  it('takes a document with a guided wave, and none with leakage 0', () => {
    expect(designDocument.safeParse(guided()).success).toBe(true);
    expect(designDocument.safeParse(guided({ illumination: { ...wave, leakageNpPerM: 0 } })).success).toBe(false);
  });
});
