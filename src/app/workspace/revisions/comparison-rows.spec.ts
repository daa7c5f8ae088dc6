import { cellRows, figureRows, parameterRows, sideHead, sideMark, sideName } from './comparison-rows';
import { SAMPLE_COMPARISON } from './sample-comparison';

const { before, after, parameters } = SAMPLE_COMPARISON;

describe('heads of a comparison', () => {
  it('say how the two are related and how each stands to the requirement', () => {
    const [left, right] = [sideHead(before, after), sideHead(after, before)];
    expect([left.name, left.lineage, right.lineage]).toEqual(['Revision 3', 'parent', 'child of 3']);
    expect(left.facts.find(({ label }) => label === 'Requirement')).toMatchObject({ value: '1 falls short, 2 met, 1 open', word: 'falls-short' });
    expect(left.facts.find(({ label }) => label === 'Frozen, UTC')?.value).toBe('2026-11-24 09:12');
  });
  it('name a draft as what it is', () => {
    const { revision: _, ...draft } = after;
    expect([sideName(draft), sideMark(draft), sideHead(draft, before).lineage]).toEqual(['draft', 'D', '']);
  });
  it('name the panel of a side that is of another one', () => {
    expect(sideHead({ ...before, panelId: 'other', panelName: 'Panel C' }, after).lineage).toContain('Panel C');
  });
});

describe('rows of a comparison', () => {
  it('give parameters their unit and say what was not set', () => {
    expect(parameterRows(parameters).map((row) => [row.before, row.after])).toEqual([['19.5°', '20°'], ['not set', '\u221234 dBi'], ['nearest-phase', 'least-error']]);
  });
  it('count cells that differ', () => {
    expect(cellRows(SAMPLE_COMPARISON)).toEqual([
      { label: 'Changed', value: '3 of 4, 75.0\u00a0%' },
      { label: 'Larger ring outer side', value: '2' },
      { label: 'Smaller ring outer side', value: '1' },
      { label: 'Mean |change of ring outer side|', value: '0.549 mm' },
      { label: 'Phase error over 15°', value: '82 → 0' },
      { label: 'RMS phase error', value: '7.90° → 4.48°' },
    ]);
  });
  it('say why cells cannot be matched', () => {
    expect(cellRows({ ...SAMPLE_COMPARISON, cells: { kind: 'other-lattice', reason: 'the lattices differ' } })).toEqual({ reason: 'the lattices differ' });
  });
  it('write figures with the digits of their unit, an equals sign for no change, and mark the deciding one', () => {
    const rows = figureRows(SAMPLE_COMPARISON);
    expect(rows.map(({ label, before: one, after: other, change }) => [label, one, other, change])).toEqual([
      ['Gain at the peak, dBi', '34.74', '34.76', '+0.02'],
      ['Beamwidth along, °', '3.127', '3.127', '='],
      ['Mask margin, dB', '\u22120.29', '0.61', '+0.90'],
      ['Cells', '1\u00a0600', '1\u00a0600', '='],
      ['Cross-polar, dB', '–', '–', '–'],
    ]);
    expect(rows.map(({ deciding }) => deciding)).toEqual([false, false, true, false, false]);
    expect([rows[0].limit, rows[4].reason]).toEqual(['≥ 34.0', 'the scalar model has no cross-polar part']);
  });
});
