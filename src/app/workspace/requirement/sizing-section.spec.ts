import { sheetRig } from '../fields/sheet-rig';
import { SizingSection } from './sizing-section';

describe('SizingSection', () => {
  it('starts from the least gain of the requirement and follows what is typed', async () => {
    const { field, text, enter } = await sheetRig(SizingSection);
    expect(field('Gain wanted').value).toBe('34');
    const before = /Outline(rectangle [\d.]+ × [\d.]+ mm)/.exec(text())?.[1];
    await enter('Gain wanted', '37');
    expect(/Outline(rectangle [\d.]+ × [\d.]+ mm)/.exec(text())?.[1]).not.toBe(before);
  });

  it('writes the place of the horn with true minus signs', async () => {
    const { text } = await sheetRig(SizingSection);
    expect(text()).toMatch(/Horn at−[\d.]+, 0, \d+(?:\.\d+)? mm/);
  });

  it('puts outline, period and horn into the design as one step that can be undone', async () => {
    const { workspace, press } = await sheetRig(SizingSection);
    const before = workspace.design();
    await press('Use these');
    const { panel, illumination } = workspace.design();
    expect(workspace.stepNames()).toEqual(['Use sizing advice']);
    expect([panel.outline, panel.lattice, illumination]).not.toEqual([before.panel.outline, before.panel.lattice, before.illumination]);
    expect(illumination).toMatchObject({ kind: 'horn', aimMm: [0, 0, 0] });
    workspace.undo();
    expect(workspace.design()).toBe(before);
  });

  it('says why a proposal cannot be used, and does not offer it', async () => {
    const { workspace, enter, text, element } = await sheetRig(SizingSection);
    const before = workspace.design();
    await enter('Gain wanted', '70');
    expect(text()).toMatch(/Cannot be used: .*\d+.*\./);
    const button = [...element.querySelectorAll('button')].find((one) => one.textContent?.trim() === 'Use these');
    expect(button?.disabled).toBe(true);
    expect(workspace.design()).toBe(before);
  });

  it('refuses a taper that is none', async () => {
    const { enter, text } = await sheetRig(SizingSection);
    await enter('Edge taper', '2');
    expect(text()).toContain('from -30 to -3dB');
  });
});
