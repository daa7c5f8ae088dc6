import { replacedAt } from '../../../../shared/model/design-pointer';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { PanelSheet } from './panel-sheet';

describe('PanelSheet', () => {
  it('counts the cells and names what follows from the size', async () => {
    const { text, header } = await sheetRig(PanelSheet);
    // 200 mm square at 28 GHz: diagonal 282.84 mm, 26.42 wavelengths of 10.707 mm, 2 D^2 / lambda = 14.94 m
    expect(text()).toContain('Cells1 600, at most 1 000 000');
    expect(text()).toContain('282.8 mm, 26.42 λ');
    expect(text()).toContain('14.94 m');
    expect(header.head().subtitle).toBe('reflecting rectangle 200 × 200 mm, rectangular lattice, 1\u00a0600 cells');
  });

  it('holds the spacing against both limits with numbers, as it is typed', async () => {
    const { text, enter } = await sheetRig(PanelSheet);
    // lambda / (1 + sin 20 deg) = 7.978 mm
    expect(text()).toMatch(/no grating lobe of a beam, λ \/ \(1 \+ sin θ\)\s*7\.978 mm\s*5\.000 mm kept/i);
    await enter('Period along x', '8.2 mm');
    expect(text()).toMatch(/7\.978 mm\s*8\.200 mm exceeded/);
  });

  it('keeps the size when the kind of the outline changes', async () => {
    const { workspace, choose, element } = await sheetRig(PanelSheet);
    await choose('Ellipse');
    expect(workspace.design().panel.outline).toEqual({ kind: 'ellipse', widthMm: 200, heightMm: 200 });
    await choose('Polygon');
    expect(element.querySelectorAll('slant-design-table tbody tr')).toHaveLength(4);
    expect(workspace.stepNames()).toEqual(['Outline: Ellipse', 'Outline: Polygon']);
  });

  it('makes the lattice triangular and back', async () => {
    const { workspace, choose, field } = await sheetRig(PanelSheet);
    await choose('Triangular');
    expect(field('Row spacing').value).toBe('4.3301');
    await choose('Rectangular');
    expect(workspace.design().panel.lattice).toEqual({ kind: 'rectangular', periodXMm: 5, periodYMm: 5 });
  });

  it('refuses a lattice with too many cells and keeps the entry', async () => {
    const { workspace, enter, text, field } = await sheetRig(PanelSheet);
    await enter('Period along x', '0.001');
    expect(text()).toContain('Not taken: the panel would have 8000000 cells; the limit is 1000000.');
    expect(field('Period along x').value).toBe('0.001');
    expect(workspace.design().panel.lattice).toMatchObject({ periodXMm: 5 });
  });

  it('adds a keep-out, shapes it and takes it away', async () => {
    const { workspace, press, element, enter } = await sheetRig(PanelSheet);
    await press('Add keep-out');
    expect(workspace.design().panel.keepOuts).toEqual([{ kind: 'rectangle', widthMm: 20, heightMm: 20, centreMm: [0, 0] }]);
    expect(element.querySelectorAll('slant-panel-sketch path.forbidden-edge')).toHaveLength(1);
    await enter('Centre x', '50');
    expect(workspace.design().panel.keepOuts[0].centreMm).toEqual([50, 0]);
    await press('Remove keep-out 1');
    expect(workspace.design().panel.keepOuts).toEqual([]);
  });

  it('draws the panel with the dimensions of its fields', async () => {
    const { element } = await sheetRig(PanelSheet, replacedAt(STARTING_DESIGN, '/panel/outline/widthMm', 120));
    const texts = [...element.querySelectorAll('slant-panel-sketch .dimension-text')].map((one) => one.textContent?.trim());
    expect(texts).toEqual(['x', 'y', '120', '200']);
  });
});
