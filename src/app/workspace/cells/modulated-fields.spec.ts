import type { DesignDocument } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { ModulatedFields } from './modulated-fields';

const design: DesignDocument = {
  ...STARTING_DESIGN,
  cells: { kind: 'modulated', states: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }], modulationMHz: 1, harmonic: 1 },
};

describe('ModulatedFields', () => {
  it('takes states, parts of the period and the harmonic to steer, and refuses one that is not there', async () => {
    const { workspace, enter, choose, text } = await sheetRig(ModulatedFields, design);
    await enter('Harmonic steered', '2');
    expect(text()).toContain('this sequence has nothing at harmonic 2');
    await choose('Given');
    await enter('State 1 until', '0.3');
    expect(workspace.design().cells).toMatchObject({ edges: [0, 0.3, 1] });
    await enter('Harmonic steered', '-2');
    expect(workspace.design().cells).toMatchObject({ harmonic: -2 });
    await enter('Harmonic steered', '1');
    await choose('Equal parts');
    expect(workspace.design().cells).not.toHaveProperty('edges');
  });
});
