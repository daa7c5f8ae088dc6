import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { editField, editValue } from './design-field-edit';
import type { FieldEdit, FieldEntry } from './design-field-edit';

const entry = (text: string, more: Partial<FieldEntry> = {}): FieldEntry => ({
  pointer: '/requirement/designFrequencyGHz',
  text,
  dimension: 'frequency',
  shownUnit: 'GHz',
  optional: false,
  ...more,
});
const period = (text: string): FieldEntry => entry(text, { pointer: '/panel/lattice/periodXMm', dimension: 'length', shownUnit: 'mm' });
const typed = (field: FieldEntry): FieldEdit => editField(STARTING_DESIGN, field);

describe('editField', () => {
  it('takes a quantity with any unit of its kind', () => {
    const edit = typed(entry('28500 MHz'));
    expect(edit.kind === 'changed' && edit.design.requirement.designFrequencyGHz).toBe(28.5);
  });

  it('finds no change in the same value written otherwise', () => {
    expect(typed(entry('28e9 Hz'))).toEqual({ kind: 'same' });
  });

  it('refuses a decimal comma and says what to write', () => {
    expect(typed(entry('28,5 GHz'))).toMatchObject({ kind: 'refused', suggestion: '28.5 GHz' });
  });

  it('refuses a value out of range with the limit and what was given', () => {
    expect(typed(entry('2 THz'))).toEqual({ kind: 'refused', reason: 'must be at most 1\u00a0000 GHz; got 2\u00a0000 GHz', suggestion: null });
    expect(typed(period('-4'))).toEqual({ kind: 'refused', reason: 'must be greater than 0 mm; got \u22124 mm', suggestion: null });
  });

  it('refuses what would break the design elsewhere, with the numbers', () => {
    expect(typed(period('0.0001 mm'))).toMatchObject({ kind: 'refused', reason: expect.stringMatching(/would have \d+ cells; the limit is 1000000/) });
    expect(typed(period('400'))).toMatchObject({ kind: 'refused', reason: expect.stringContaining('smaller than one period') });
  });

  it('takes a limit away when its optional field is emptied, and never a needed one', () => {
    const gain = entry(' ', { pointer: '/requirement/minGainDbi', dimension: 'level', shownUnit: 'dBi', optional: true });
    const edit = typed(gain);
    expect(edit.kind === 'changed' && 'minGainDbi' in edit.design.requirement).toBe(false);
    expect(typed(entry(''))).toMatchObject({ kind: 'refused', reason: 'Nothing was typed' });
  });

  it('passes on how a unit was read', () => {
    expect(typed(entry('28500 mhz'))).toMatchObject({ kind: 'changed', note: '"mhz" read as MHz, megahertz' });
  });

  it('wants whole numbers where only they make sense', () => {
    const levels = entry('3.6', { pointer: '/cells/levels', dimension: 'number', shownUnit: '', whole: true });
    expect(typed(levels)).toEqual({ kind: 'refused', reason: 'must be a whole number; got 3.6', suggestion: '4' });
  });
});

describe('editValue', () => {
  it('does not blame a change for a fault that stood before', () => {
    const faulty = { ...STARTING_DESIGN, synthesis: { kind: 'focus' as const, pointMm: [0, 0, -5] as [number, number, number] } };
    expect(editValue(faulty, '/requirement/minGainDbi', 30).kind).toBe('changed');
  });

  it('lets a person out of a fault', () => {
    const faulty = { ...STARTING_DESIGN, synthesis: { kind: 'focus' as const, pointMm: [0, 0, -5] as [number, number, number] } };
    expect(editValue(faulty, '/synthesis', { kind: 'direct' }).kind).toBe('changed');
  });
});
