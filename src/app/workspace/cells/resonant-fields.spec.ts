import type { DesignDocument } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { ResonantFields } from './resonant-fields';

const design: DesignDocument = {
  ...STARTING_DESIGN,
  illumination: { kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 0 }, effectiveIndex: 1.6, leakageNpPerM: 6, polarisation: 'x' },
  cells: { kind: 'resonant', rule: 'projection', states: null },
};

describe('ResonantFields', () => {
  it('tells what a rule gives on the average over all target phases', async () => {
    const { choose, text } = await sheetRig(ResonantFields, design);
    expect(text()).toContain('puts 0.500 of the free field into the beam and 50.0 %');
    await choose('Phase only');
    expect(text()).toContain('puts 0.318 of the free field into the beam and 40.5 %');
  });

  it('tunes in states, and drops them for the rule that needs a continuous tuning', async () => {
    const { workspace, choose, enter, text } = await sheetRig(ResonantFields, design);
    await choose('States');
    await enter('Number of states', '2');
    expect(workspace.design().cells).toEqual({ kind: 'resonant', rule: 'projection', states: 2 });
    expect(text()).toContain('20.3 %');
    await choose('Phase only');
    expect(workspace.design().cells).toEqual({ kind: 'resonant', rule: 'phase-only', states: null });
  });
});
