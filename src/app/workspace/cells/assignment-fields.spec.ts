import type { DesignDocument } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { AssignmentFields } from './assignment-fields';

const design: DesignDocument = {
  ...STARTING_DESIGN,
  requirement: { ...STARTING_DESIGN.requirement, bandGHz: [27.5, 28.5] },
  cells: { kind: 'edition', editionId: '7f7d2f0e-5f0e-4d8e-9b52-000000000000', rule: 'nearest-phase', excludedCells: [] },
};

describe('AssignmentFields', () => {
  it('fits over the edges of the band, or at frequencies of its own', async () => {
    const { workspace, choose, enter, press } = await sheetRig(AssignmentFields, design);
    await choose('Band fit');
    expect(workspace.design().cells).toMatchObject({ rule: 'band-fit' });
    await choose('Given');
    await press('Add frequency');
    await enter('Fit frequency 3', '28.2 GHz');
    expect(workspace.design().cells).toMatchObject({ fitFrequenciesGHz: [27.5, 28.5, 28.2] });
    await press('Remove last frequency');
    await choose('Edges of the band');
    expect(workspace.design().cells).not.toHaveProperty('fitFrequenciesGHz');
  });

  it('limits the number of different cells and the step to a neighbour, and lets both go', async () => {
    const { workspace, enter } = await sheetRig(AssignmentFields, design);
    await enter('Different cells, at most', '8');
    await enter('Neighbour step, at most', '200 um');
    expect(workspace.design().cells).toMatchObject({ levels: 8, neighbourStepMm: 0.2 });
    await enter('Different cells, at most', '');
    expect(workspace.design().cells).not.toHaveProperty('levels');
  });

  it('refuses a band fit where there is no band', async () => {
    const { workspace, choose } = await sheetRig(AssignmentFields, { ...design, requirement: STARTING_DESIGN.requirement });
    await choose('Band fit');
    expect(workspace.design().cells).toMatchObject({ rule: 'nearest-phase' });
  });
});
