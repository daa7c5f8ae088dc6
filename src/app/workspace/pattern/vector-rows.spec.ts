import { exampleDesign } from '../../../../shared/antenna/example-design';
import { predictDesign } from '../../../../shared/antenna/predict-design';
import type { Figures } from '../../../../shared/model/figures';
import { budgetTable, crossPolarRows, modelText } from './vector-rows';

const VECTOR = { receiveExponent: 0.5, radiateExponent: 0.5, model: 'vector' } as const;
/** Skew and of two exponents, so that no symmetry rules the cross-polar field out. */
const skew = { kind: 'horn', positionMm: [-60, -50, 200], aimMm: [8, 5, 0], exponentE: 7, exponentH: 5, polarisation: 'x' } as const;
const base = exampleDesign({ illumination: { ...skew, positionMm: [-60, -50, 200], aimMm: [8, 5, 0] }, prediction: VECTOR, requirement: { ...exampleDesign().requirement, beams: [{ thetaDeg: 20, phiDeg: 30 }] } });
const figures = predictDesign(base, { include: {} }).figures;

const numberIn = (text: string): number => Number(text.replace('−', '-'));

describe('budgetTable', () => {
  it('lists items that add up to the gain at the beam as they are read', () => {
    const table = budgetTable(figures);
    if (!table || !('items' in table)) throw new Error('no table');
    const sum = table.items.reduce((total, { value }) => total + numberIn(value), 0);
    // Nine items and their sum are each rounded to three decimals.
    expect(Math.abs(sum - numberIn(table.sum.value))).toBeLessThan(0.005);
    expect(table.items.map(({ name }) => name)).toContain('Taper of what leaves');
    expect(table.sum.value).toBe((figures.gainAtBeamDbi as number).toFixed(3));
  });

  it('says where blockage counts when the horn throws a shadow', () => {
    const table = budgetTable({ ...figures, blockage: { cells: 3, atBeamDb: -0.1, powerDb: -0.05 } });
    expect(table && 'items' in table && table.items.at(-1)?.name).toBe('Blockage: within cell loss, taper');
  });

  it('gives the reason where there is no budget, and nothing in the scalar model', () => {
    const vector = { ...(figures.vector as NonNullable<Figures['vector']>), budget: { kind: 'nothing-radiated', reason: 'nothing goes there' } };
    expect(budgetTable({ ...figures, vector })).toEqual({ reason: 'nothing goes there' });
    expect(budgetTable(predictDesign(exampleDesign(), { include: {} }).figures)).toBeNull();
  });
});

describe('crossPolarRows', () => {
  it('tells discrimination at the beam and the worst, and no axial ratio of a linear beam', () => {
    const rows = crossPolarRows(figures);
    expect(rows.map(({ name }) => name)).toEqual(['XPD at the beam', 'Worst XPD within half power', 'Highest cross level there, to the peak']);
    expect(numberIn(rows[0].value)).toBeCloseTo(figures.vector?.crossPolarDiscriminationDb[0] as number, 2);
  });

  it('says above 100 where symmetry leaves no cross-polar field', () => {
    const symmetric = predictDesign(exampleDesign({ prediction: VECTOR }), { include: {} }).figures;
    expect(crossPolarRows(symmetric)[0].value).toBe('> 100');
  });

  it('tells the axial ratio of a circular beam', () => {
    const circular = { ...base, illumination: { ...base.illumination, polarisation: 'rhcp' as const }, requirement: { ...base.requirement, polarisation: 'lhcp' as const } };
    const rows = crossPolarRows(predictDesign(circular, { include: {} }).figures);
    expect(rows.at(-1)?.name).toBe('Axial ratio at the beam');
    expect(numberIn(rows.at(-1)?.value ?? '')).toBeGreaterThan(0);
  });
});

describe('modelText', () => {
  it('names model and form', () => {
    expect(modelText(VECTOR)).toBe('vector model, power waves, no cell factor, gain against the power of the source');
    expect(modelText({ ...VECTOR, reradiation: 'aperture', cellFactor: 'normal' })).toContain('aperture form, factor of a uniform cell');
    expect(modelText({ radiateExponent: 0.5 })).toBe('scalar model, radiate exponent 0.5, after spillover and cell loss');
  });
});
