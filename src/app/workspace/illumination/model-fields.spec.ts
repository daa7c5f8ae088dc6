import { NEW_PANEL_DESIGN, STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { designOfIllumination } from './illumination-choices';
import { ModelFields } from './model-fields';

describe('ModelFields', () => {
  it('takes a design that names no model as scalar, with its exponents', async () => {
    const { element, field } = await sheetRig(ModelFields, STARTING_DESIGN);
    expect(element.querySelector('.chosen')?.textContent?.trim()).toBe('Scalar');
    expect(field('Receive exponent').value).toBe('0.5');
  });

  it('changes to the vector model and its form in named steps', async () => {
    const { workspace, choose, text } = await sheetRig(ModelFields, STARTING_DESIGN);
    await choose('Vector');
    expect(workspace.design().prediction).toEqual({ ...STARTING_DESIGN.prediction, model: 'vector' });
    expect(text()).toContain('co- and cross-polar gain');
    expect(text()).not.toContain('Receive exponent');
    await choose('Aperture');
    await choose('Uniform cell');
    expect(workspace.design().prediction).toMatchObject({ model: 'vector', reradiation: 'aperture', cellFactor: 'normal' });
  });

  it('goes back to the scalar model under a guided wave, which the vector one cannot take', () => {
    expect(designOfIllumination(NEW_PANEL_DESIGN, 'guided-wave').prediction.model).toBe('scalar');
    expect(designOfIllumination(NEW_PANEL_DESIGN, 'plane-wave').prediction.model).toBe('vector');
  });
});
