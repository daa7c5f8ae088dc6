import type { Warning } from '../../../shared/model/figures';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { SAMPLE_FIGURES, SAMPLE_VERDICTS } from './sample-prediction';
import { sheetStates } from './sheet-states';
import type { PanelFacts, SheetState } from './sheet-states';
import type { SheetId } from './sheets';

const facts: PanelFacts = {
  design: { ...STARTING_DESIGN, cells: { kind: 'edition', editionId: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff', rule: 'nearest-phase', excludedCells: [] } },
  predicted: { figures: SAMPLE_FIGURES, verdicts: SAMPLE_VERDICTS, warnings: [] },
  failure: null,
  revisionCount: 0,
  draftIsRevision: false,
};
const state = (id: SheetId, of: PanelFacts): SheetState => {
  const found = sheetStates(of).find((sheet) => sheet.id === id);
  if (!found) throw new Error(`no sheet ${id}`);
  return found;
};
const warned = (pointer: string, severity: Warning['severity'], code: Warning['code'] = 'cell-period'): PanelFacts => ({
  ...facts,
  predicted: { figures: SAMPLE_FIGURES, verdicts: SAMPLE_VERDICTS, warnings: [{ code, pointer, severity, message: 'Period 8.0 mm exceeds 6.2 mm', numbers: {} }] },
});

describe('sheetStates', () => {
  it('meets on every sheet of the prediction when every line is met and nothing is warned of; runs and revisions are still to come', () => {
    const words = sheetStates(facts).map(({ word }) => word);
    expect(words.slice(0, 6)).toEqual(['meets', 'meets', 'meets', 'meets', 'meets', 'meets']);
    expect(words.slice(6)).not.toContain('meets');
  });

  it('falls short in requirement and pattern when a line does, naming it', () => {
    const short: PanelFacts = {
      ...facts,
      predicted: { figures: SAMPLE_FIGURES, warnings: [], verdicts: [{ ...SAMPLE_VERDICTS[1], margin: -0.3, verdict: 'falls-short' }] },
    };
    expect(state('requirement', short)).toMatchObject({ word: 'falls-short', reason: 'Falls short in sidelobe level' });
    expect(state('pattern', short).word).toBe('falls-short');
  });

  it('does not call a requirement met while a line is not evaluated or no limit is set', () => {
    const open: PanelFacts = {
      ...facts,
      predicted: { figures: SAMPLE_FIGURES, warnings: [], verdicts: [...SAMPLE_VERDICTS, { ...SAMPLE_VERDICTS[0], line: 'cross-polar', verdict: 'not-evaluated' }] },
    };
    expect(state('requirement', open)).toMatchObject({ word: 'in-work', reason: 'Not evaluated: cross-polar discrimination' });
    expect(state('requirement', { ...facts, predicted: { figures: SAMPLE_FIGURES, warnings: [], verdicts: [] } })).toMatchObject({ word: 'in-work', reason: 'No limit set' });
  });

  it('takes a serious remark for an objection, which is no verdict, and a mild one for work to do, on the sheet of its field', () => {
    expect(state('panel', warned('#/panel/lattice/periodXMm', 'serious'))).toMatchObject({ word: 'objection', reason: 'Period 8.0 mm exceeds 6.2 mm' });
    expect(state('panel', warned('/panel/lattice/periodXMm', 'warn')).word).toBe('in-work');
    expect(state('panel', warned('/panel/lattice/periodXMm', 'note')).word).toBe('meets');
    expect(state('illumination', warned('/panel/lattice/periodXMm', 'serious')).word).toBe('meets');
  });

  it('keeps ideal cells in work: they cannot be etched', () => {
    expect(state('cells', { ...facts, design: STARTING_DESIGN }).word).toBe('in-work');
  });

  it('marks what stands on an older design as stale and the sheet with the fault as short', () => {
    const failure = {
      type: 'about:blank',
      title: 'The design cannot be predicted',
      status: 422,
      detail: 'One fault',
      errors: [{ pointer: '/design/illumination/aimMm', detail: 'the horn must be aimed at a point other than its own position' }],
    };
    const failed = { ...facts, failure };
    expect(state('pattern', failed).word).toBe('stale');
    expect(state('phase', failed).word).toBe('stale');
    expect(state('illumination', failed)).toMatchObject({ word: 'falls-short', reason: 'the horn must be aimed at a point other than its own position' });
  });

  it('asks for evanescent cells on the phase sheet', () => {
    const evanescent: PanelFacts = { ...facts, predicted: { figures: { ...SAMPLE_FIGURES, evanescentCells: 3 }, verdicts: SAMPLE_VERDICTS, warnings: [] } };
    expect(state('phase', evanescent)).toMatchObject({ word: 'objection', reason: '3 of 1600 cells ask for a wave that does not travel' });
  });

  it('follows the draft and its revisions', () => {
    expect(state('revisions', { ...facts, revisionCount: 2 }).word).toBe('in-work');
    expect(state('revisions', { ...facts, revisionCount: 2, draftIsRevision: true }).word).toBe('meets');
  });

  it('is empty before the first prediction', () => {
    expect(state('pattern', { ...facts, predicted: null })).toMatchObject({ word: 'empty', reason: 'No prediction yet' });
  });
});
