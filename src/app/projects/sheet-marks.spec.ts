import type { DesignDocument } from '../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { panelOverviewOf } from './project-fixture';
import { sheetMarks } from './sheet-marks';

const states = (...more: Parameters<typeof panelOverviewOf>): string[] => sheetMarks(panelOverviewOf(...more)).map(({ title, state }) => `${title}: ${state}`);
const summary = panelOverviewOf().summary;

describe('marks of the sheets of a panel', () => {
  it('stand in the order of the work', () => {
    expect(states()).toEqual(['Requirement: meets', 'Panel: meets', 'Illumination: meets', 'Cells: in-work', 'Phase: meets', 'Pattern: meets', 'Revisions: in-work']);
  });

  it('carry the most serious remark of the part of the design the sheet edits', () => {
    const remarks = [
      { pointer: '/panel/lattice/periodXMm', severity: 'warn' as const, message: 'first remark' },
      { pointer: '#/panel/lattice/periodXMm', severity: 'serious' as const, message: 'a lobe that is not wanted' },
      { pointer: '/panelling', severity: 'serious' as const, message: 'of nothing here' },
      { pointer: '/illumination/position', severity: 'warn' as const, message: 'the horn stands in the beam' },
    ];
    const [, panel, illumination, cells] = sheetMarks(panelOverviewOf({ summary: summary && { ...summary, remarks } }));
    expect(panel).toEqual({ id: 'panel', title: 'Panel', state: 'objection', detail: 'a lobe that is not wanted' });
    expect(illumination).toMatchObject({ state: 'in-work', detail: 'the horn stands in the beam' });
    expect(cells).toMatchObject({ state: 'in-work', detail: 'Ideal cells cannot be etched' });
  });

  it('have no objection to cells of an edition, and none to a draft that is its revision', () => {
    const cells: DesignDocument['cells'] = { kind: 'edition', editionId: '6f1c1b7e-58a4-4f0b-9a53-000000000004', rule: 'nearest-phase', excludedCells: [] };
    const marks = sheetMarks(panelOverviewOf({ design: { ...STARTING_DESIGN, cells }, draftIsRevision: true }));
    expect(marks[3]).toMatchObject({ title: 'Cells', state: 'meets' });
    expect(marks[6]).toEqual({ id: 'revisions', title: 'Revisions', state: 'meets', detail: 'The draft equals revision 3' });
  });

  it('never show as met what has no figures', () => {
    expect(states({ summary: null, latestRevision: null }).filter((text) => text.endsWith(': meets'))).toEqual([]);
    expect(states({ summary: null, summaryPending: true })[1]).toBe('Panel: not-evaluated');
    expect(states({ latestRevision: null })[6]).toBe('Revisions: empty');
  });
});
