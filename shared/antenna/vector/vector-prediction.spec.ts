import * as fc from 'fast-check';
import type { DesignDocument } from '../../model/design-document';
import type { Figures } from '../../model/figures';
import { exampleDesign, planeWaveDesign } from '../example-design';
import { exampleEdition, EXAMPLE_EDITION_ID } from '../example-edition';
import { placeCells } from '../place-cells';
import { predictDesign, predictPlaced, type Prediction } from '../predict-design';
import { prepareEdition } from '../prepare-edition';

const VECTOR: DesignDocument['prediction'] = { receiveExponent: 0.5, radiateExponent: 0.5, model: 'vector' };
const edition = prepareEdition(exampleEdition());
const oblique: DesignDocument['cells'] = { kind: 'edition', editionId: EXAMPLE_EDITION_ID, rule: 'nearest-phase', excludedCells: [] };

const numberOf = (figure: Figures['gainDbi']): number => {
  if (typeof figure !== 'number') throw new Error(figure.reason);
  return figure;
};

const budgetOf = ({ figures }: Prediction): Record<string, number> => {
  const budget = figures.vector?.budget;
  if (!budget || 'reason' in budget) throw new Error('no budget');
  return budget as Record<string, number>;
};

const forms = (['power-wave', 'aperture'] as const).flatMap((reradiation) => (['none', 'normal', 'beam'] as const).map((cellFactor) => ({ reradiation, cellFactor })));

describe('a prediction by the vector model', () => {
  it('agrees with the scalar one to 0.02 dB for ideal cells and power waves, the turn of polarisation apart', () => {
    const scalar = predictDesign(exampleDesign(), { include: {} }).figures;
    const vector = predictDesign(exampleDesign({ prediction: VECTOR }), { include: {} }).figures;
    expect(Math.abs(numberOf(vector.gainAtBeamDbi) - numberOf(scalar.gainAtBeamDbi))).toBeLessThan(0.02);
    expect(numberOf(vector.halfPowerBeamwidthDeg.along)).toBeCloseTo(numberOf(scalar.halfPowerBeamwidthDeg.along), 1);
    expect(numberOf(vector.spilloverDb)).toBeCloseTo(numberOf(scalar.spilloverDb), 9);
  });

  it.each(forms)('has a budget that adds up to the gain at the beam, %p', (form) => {
    const prediction = predictDesign(exampleDesign({ prediction: { ...VECTOR, ...form }, cells: oblique }), { include: {}, edition });
    const { gainAtBeamDbi, ...items } = budgetOf(prediction);
    const sum = Object.values(items).reduce((total, item) => total + item, 0);
    expect(sum).toBeCloseTo(gainAtBeamDbi, 10);
    expect(numberOf(prediction.figures.gainAtBeamDbi)).toBeCloseTo(gainAtBeamDbi, 6);
  });

  it('keeps the power that leaves the cells to 0.05 dB with power waves, at any beam and polarisation', () => {
    const beams = fc.record({ thetaDeg: fc.double({ min: 0, max: 45, noNaN: true }), phiDeg: fc.double({ min: -180, max: 180, noNaN: true }) });
    const polarisations = fc.constantFrom('x', 'y', 'rhcp', 'lhcp') as fc.Arbitrary<DesignDocument['requirement']['polarisation']>;
    fc.assert(
      fc.property(beams, polarisations, (beam, polarisation) => {
        const base = exampleDesign({ prediction: VECTOR });
        const { illumination, requirement } = base;
        const lit = ({ x: 'x', y: 'y', rhcp: 'lhcp', lhcp: 'rhcp' } as const)[polarisation];
        const design = { ...base, requirement: { ...requirement, beams: [beam], polarisation }, illumination: { ...illumination, polarisation: lit } };
        const { figures } = predictDesign(design, { include: {} });
        expect(Math.abs(numberOf(figures.vector?.radiatedOverLeavingDb ?? NaN))).toBeLessThan(0.05);
      }),
      { numRuns: 8 },
    );
  });

  it('answers a cross-polar cut and map on the scale of the co-polar ones', () => {
    const design = exampleDesign({ prediction: VECTOR, cells: oblique, requirement: { ...exampleDesign().requirement, beams: [{ thetaDeg: 20, phiDeg: 30 }], minCrossPolarDiscriminationDb: 10 } });
    const prediction = predictDesign(design, { edition, include: { cuts: [{ plane: 'along', angleDeg: [0, 1, 1] }], uv: { size: 21 } } });
    const [cut] = prediction.cuts ?? [];
    const atBeam = numberOf(prediction.figures.vector?.crossPolarDiscriminationDb[0] ?? NaN);
    expect(cut.gainDbi[0] - (cut.crossGainDbi?.[0] ?? NaN)).toBeCloseTo(atBeam, 6);
    expect(prediction.uv?.crossGainDbi).toHaveLength(441);
    expect(prediction.verdicts).toContainEqual(expect.objectContaining({ line: 'cross-polar', value: atBeam, verdict: atBeam >= 10 ? 'meets' : 'falls-short' }));
  });

  it('leaves scalar answers without cross-polar parts', () => {
    const prediction = predictDesign(exampleDesign(), { include: { cuts: [{ plane: 'along', angleDeg: [0, 1, 1] }], uv: { size: 16 } } });
    expect(prediction.figures.vector).toBeUndefined();
    expect(prediction.cuts?.[0].crossGainDbi).toBeUndefined();
    expect(prediction.uv?.crossGainDbi).toBeUndefined();
  });

  it('swaps the sense of a circular wave on an unrotated cell', () => {
    const base = exampleDesign({ prediction: VECTOR });
    const lit = (polarisation: 'rhcp' | 'lhcp'): Figures =>
      predictDesign({ ...base, illumination: { ...base.illumination, polarisation: 'rhcp' }, requirement: { ...base.requirement, polarisation } }, { include: {} }).figures;
    expect(numberOf(lit('lhcp').vector?.crossPolarDiscriminationDb[0] ?? NaN)).toBeGreaterThan(25);
    expect(numberOf(lit('rhcp').vector?.crossPolarDiscriminationDb[0] ?? NaN)).toBeLessThan(-25);
    expect(lit('rhcp').vector?.axialRatioDb).toMatchObject({ kind: 'other-sense' });
    expect(numberOf(lit('lhcp').vector?.axialRatioDb ?? NaN)).toBeLessThan(1);
  });

  it('reckons the gain of a plane wave against the power it brings to the cells', () => {
    const { figures } = predictDesign(planeWaveDesign({ prediction: VECTOR }), { include: {} });
    expect(figures.spilloverDb).toMatchObject({ kind: 'plane-wave' });
    const area = (4 * Math.PI * 0.09) / (0.299792458 / 10) ** 2;
    expect(numberOf(figures.gainAtBeamDbi)).toBeCloseTo(10 * Math.log10(area * Math.cos(Math.PI / 9)), 2);
  });

  it('refuses a guided wave, which has no plane of incidence', () => {
    const guided: DesignDocument['illumination'] = { kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 0 }, effectiveIndex: 1.5, leakageNpPerM: 5, polarisation: 'x' };
    expect(() => placeCells(exampleDesign({ prediction: VECTOR, illumination: guided }))).toThrow(/plane of incidence/);
  });

  it('refuses time-modulated cells, whose harmonics are of one response', () => {
    const cells: DesignDocument['cells'] = { kind: 'modulated', states: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }], modulationMHz: 1, harmonic: 1 };
    expect(() => placeCells(exampleDesign({ prediction: VECTOR, cells }))).toThrow(/harmonic for one response/);
  });

  it('says what the description of the cells leaves out', () => {
    const messages = (design: DesignDocument, of = edition): string[] =>
      predictDesign(design, { include: {}, edition: of }).warnings.filter(({ code }) => code === 'cross-terms').map(({ message }) => message);
    const inline: DesignDocument['cells'] = { kind: 'inline', cells: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }] };
    expect(messages(exampleDesign({ prediction: VECTOR, cells: inline }))[0]).toContain('what-if table');
    expect(messages(exampleDesign({ prediction: VECTOR, cells: oblique }))[0]).toContain('holds no cross terms');
    const onePort = prepareEdition(exampleEdition({ cellCount: 8, frequenciesGHz: [9, 11], thetasDeg: [0], phisDeg: [0] }, { ports: 'either' }));
    expect(messages(exampleDesign({ prediction: VECTOR, cells: oblique }), onePort)[0]).toContain('one response for every polarisation');
    expect(messages(exampleDesign({ prediction: VECTOR }))).toEqual([]);
    expect(messages(exampleDesign({ cells: inline }))).toEqual([]);
  });

  it('predicts at another frequency what the same cells do there', () => {
    const design = exampleDesign({ prediction: VECTOR, cells: oblique });
    const placed = placeCells(design, edition);
    const [there, here] = [10.4, 10].map((frequencyGHz) => predictPlaced(placed, { include: {}, frequencyGHz }).figures);
    expect(numberOf(there.phaseErrorRmsDeg)).toBeGreaterThan(numberOf(here.phaseErrorRmsDeg) + 2);
  });

  it('warns where the cells cannot return the wanted sense', () => {
    const base = exampleDesign({ prediction: VECTOR });
    const warningsOf = (lit: 'rhcp' | 'lhcp' | 'y', wanted: 'rhcp' | 'x'): string[] =>
      predictDesign({ ...base, illumination: { ...base.illumination, polarisation: lit }, requirement: { ...base.requirement, polarisation: wanted } }, { include: {} })
        .warnings.filter(({ code }) => code === 'polarisation').map(({ message }) => message);
    expect(warningsOf('rhcp', 'rhcp')[0]).toContain('turn its sense');
    expect(warningsOf('y', 'x')[0]).toContain('lit with y');
    expect(warningsOf('lhcp', 'rhcp')).toEqual([]);
  });
});
