import type { PanelOverview } from '../../../shared/contracts/projects';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { panelOverviewOf } from './project-fixture';
import { panelRow } from './project-rows';

const overview = panelOverviewOf;

describe('line of a panel', () => {
  it('says what it is, where it points, what it gains and by how much it meets', () => {
    expect(panelRow(overview())).toMatchObject({
      kind: 'reflecting, 1\u00a0600 cells, 28 GHz',
      beams: 'θ 20.0°, φ 0.0°',
      gain: '34.76 dBi, margin +0.76 dB',
      state: 'meets',
      revision: 'Draft after 3',
      revisionNote: 'debfe0abb702',
    });
  });

  it('names several beams as short as it can', () => {
    const pointing = (...beams: { thetaDeg: number; phiDeg: number }[]): string =>
      panelRow(overview({ design: { ...STARTING_DESIGN, requirement: { ...STARTING_DESIGN.requirement, beams } } })).beams;
    const [a, b] = [{ thetaDeg: 25, phiDeg: 0 }, { thetaDeg: 25, phiDeg: 180 }];
    expect(pointing(a, b)).toBe('θ 25.0°, φ 0.0° and 180.0°');
    expect(pointing(a, { thetaDeg: 30, phiDeg: 90 })).toBe('θ 25.0°, φ 0.0° and θ 30.0°, φ 90.0°');
    expect(pointing(a, b, a)).toBe('θ 25.0°, φ 0.0° and 2 more');
  });

  it('names the lines that fall short, whatever the others do', () => {
    const verdicts: PanelOverview['summary'] = {
      cellCount: 1600,
      gainDbi: 33,
      overall: 'falls-short',
      verdicts: [
        { line: 'gain', sense: 'at-least', limit: 34, unit: 'dBi', value: 33, margin: -1, verdict: 'falls-short' },
        { line: 'mask', sense: 'at-least', limit: 0, unit: 'dB', value: -0.3, margin: -0.3, verdict: 'falls-short' },
      ],
    };
    expect(panelRow(overview({ summary: verdicts }))).toMatchObject({ state: 'falls-short', stateText: 'falls short: gain, mask', gain: '33.00 dBi, margin −1.00 dB' });
  });

  it('never shows what was not evaluated as met', () => {
    const summary: PanelOverview['summary'] = { cellCount: 4, gainDbi: { kind: 'unlit', reason: 'no cell is lit' }, verdicts: [], overall: 'not-evaluated' };
    expect(panelRow(overview({ summary }))).toMatchObject({ state: 'not-evaluated', gain: 'no cell is lit' });
    expect(panelRow(overview({ summary: null }))).toMatchObject({ state: 'in-work', gain: 'no prediction' });
  });

  it('says when the figures are still being computed', () => {
    expect(panelRow(overview({ summary: null, summaryPending: true }))).toMatchObject({ state: 'not-evaluated', stateText: 'being computed', gain: 'being computed' });
  });

  it('tells a draft without revision from one that is its revision', () => {
    expect(panelRow(overview({ latestRevision: null }))).toMatchObject({ revision: 'Draft', revisionNote: 'no revision' });
    expect(panelRow(overview({ draftIsRevision: true }))).toMatchObject({ revision: 'Revision 3' });
  });
});
