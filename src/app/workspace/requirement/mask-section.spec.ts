import { sheetRig } from '../fields/sheet-rig';
import { MaskSection } from './mask-section';

describe('MaskSection', () => {
  it('draws a mask of points once that kind is chosen, and takes it away', async () => {
    const { workspace, choose, element } = await sheetRig(MaskSection);
    expect(element.querySelector('slant-mask-sketch')).toBeNull();
    await choose('Points');
    expect(workspace.design().requirement.mask).toMatchObject({ kind: 'custom' });
    expect(element.querySelector('slant-mask-sketch .forbidden-edge')?.getAttribute('d')).toMatch(/^M/);
    await choose('None');
    expect(workspace.design().requirement).not.toHaveProperty('mask');
    expect(workspace.stepNames()).toEqual(['Set mask', 'Remove mask']);
  });

  it('takes a published envelope by name and shows edition, source and what is not defined', async () => {
    const { workspace, choose, text } = await sheetRig(MaskSection);
    await choose('Published');
    await choose('S.580-6');
    expect(workspace.design().requirement.mask).toEqual({ kind: 'published', id: 'itu-r-s580-6' });
    expect(text()).toContain('Recommendation ITU-R S.580-6 (2004)');
    expect(text()).toContain('90 % of the sidelobe peaks');
    expect(text()).toContain('below max(1°, 100 λ/D), and for D/λ below 50');
  });

  it('takes a declared spillover region where the text knows one', async () => {
    const { workspace, choose, press, enter } = await sheetRig(MaskSection);
    await choose('Published');
    await choose('25.209(a)(1)');
    await press('Declare a spillover region');
    await enter('Spillover from', '70');
    expect(workspace.design().requirement.mask).toEqual({ kind: 'published', id: 'fcc-25-209-a1', spilloverDeg: [70, 120] });
    await choose('S.465-6');
    expect(workspace.design().requirement.mask).toEqual({ kind: 'published', id: 'itu-r-s465-6' });
  });

  it('takes a formula, and keeps one it cannot read in its box with the reason', async () => {
    const { workspace, choose, enter, text, field } = await sheetRig(MaskSection);
    await choose('Formula');
    await enter('Formula 1', '29 - 25*log10(theta)');
    expect(workspace.design().requirement.mask).toMatchObject({ segments: [{ expression: '29 - 25*log10(theta)' }, { expression: '-10' }] });
    await enter('Formula 2', 'process.exit()');
    expect(text()).toContain('"process" is not known; known are theta');
    expect(field('Formula 2').value).toBe('process.exit()');
    expect(workspace.design().requirement.mask).toMatchObject({ segments: [{}, { expression: '-10' }] });
  });

  it('adds and removes stretches', async () => {
    const { workspace, choose, press } = await sheetRig(MaskSection);
    await choose('Formula');
    await press('Add stretch');
    expect(workspace.design().requirement.mask).toMatchObject({ segments: [{ toDeg: 48 }, { toDeg: 179 }, { fromDeg: 179, toDeg: 180 }] });
    await press('Remove stretch 1');
    expect(workspace.design().requirement.mask).toMatchObject({ segments: [{ fromDeg: 48 }, { fromDeg: 179 }] });
  });
});
