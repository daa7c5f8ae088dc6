import { descriptionOf, entriesOf } from './description-form-values';

const parts = { parameters: [{ id: 'side', label: 'Patch side', unit: 'mm' as const }], shapes: [], excludedRegions: [] };
const entries = {
  name: 'Square patch', kind: 'square patch', summary: '', operation: 'reflect', periodXMm: '5', periodYMm: '5',
  'substrate.material': 'PTFE', 'substrate.relativePermittivity': '2.2', 'substrate.lossTangent': '9e-4', 'substrate.thicknessMm': '0.508',
  metal: 'copper', designFrequencyGHz: '28', ports: 'either', referencePlane: 'patch plane', timeConvention: 'exp(+jwt)',
  provenance: 'measured', instrument: 'analyser 3, waveguide simulator', date: '2026-11-30', limits: '',
};

describe('description of a family', () => {
  it('is put together from what was typed', () => {
    const result = descriptionOf(entries, parts);
    expect(result.kind === 'complete' && result.description.substrate).toEqual({ material: 'PTFE', relativePermittivity: 2.2, lossTangent: 0.0009, thicknessMm: 0.508 });
  });

  it('names every field that is missing or wrong, with a hint at a decimal comma', () => {
    const result = descriptionOf({ ...entries, periodXMm: '5,1', 'substrate.thicknessMm': '', designFrequencyGHz: '28GHz' }, parts);
    expect(result.kind === 'incomplete' && result.faults).toEqual({
      periodXMm: 'must be a number; use a point for decimals',
      'substrate.thicknessMm': 'is needed: a number',
      designFrequencyGHz: 'must be a number',
    });
    expect(descriptionOf({ ...entries, name: ' ', instrument: '' }, parts)).toMatchObject({ faults: { name: 'is needed', instrument: 'is needed' } });
  });

  it('is filled from what the files say and left empty where they say nothing', () => {
    const filled = entriesOf({ periodXMm: 5, substrate: { material: '', relativePermittivity: 2.2, lossTangent: 0.001, thicknessMm: 0.5 }, provenance: 'simulated' });
    expect(filled).toMatchObject({ periodXMm: '5', 'substrate.relativePermittivity': '2.2', provenance: 'simulated', name: '', date: '' });
  });
});
