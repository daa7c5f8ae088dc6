import { remarksAt } from './field-remarks';
import type { RemarkSources } from './field-remarks';

const sources: RemarkSources = {
  warnings: [
    { code: 'grating-lobe', pointer: '#/panel/lattice', severity: 'warn', message: 'Repeats every 8 mm', numbers: {} },
    { code: 'behind-panel', pointer: '/illumination', severity: 'serious', message: 'The horn stands behind', numbers: {} },
  ],
  failure: { type: 'about:blank', title: 'Not valid', status: 422, detail: 'One fault', errors: [{ pointer: '#/design/panel', detail: 'no cells' }] },
  faults: [{ pointer: '/panel', detail: 'no cells' }],
};

describe('remarksAt', () => {
  it('finds remarks of a group whatever stands before their pointer', () => {
    expect(remarksAt(['/panel/lattice'], sources)).toEqual([{ weight: 'warn', text: 'Repeats every 8 mm' }]);
    expect(remarksAt(['/illumination'], sources)).toEqual([{ weight: 'serious', text: 'The horn stands behind' }]);
  });

  it('says a fault once that both the draft and the prediction report, before anything else', () => {
    expect(remarksAt(['/panel', '/panel/lattice'], sources)).toEqual([
      { weight: 'fault', text: 'no cells' },
      { weight: 'warn', text: 'Repeats every 8 mm' },
    ]);
  });

  it('has nothing to say of another field', () => {
    expect(remarksAt(['/panel/lattice/periodXMm'], sources)).toEqual([]);
  });
});
