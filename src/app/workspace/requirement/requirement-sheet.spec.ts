import { SAMPLE_HEAD } from '../sample-prediction';
import { sheetRig } from '../fields/sheet-rig';
import { RequirementSheet } from './requirement-sheet';

describe('RequirementSheet', () => {
  it('shows verdicts in words with their signed margins', async () => {
    const { workspace, fixture, element } = await sheetRig(RequirementSheet);
    workspace.prediction.set({ head: SAMPLE_HEAD, cells: {} as never, cuts: [], uv: null, of: workspace.design() });
    await fixture.whenStable();
    const rows = [...element.querySelectorAll('slant-verdict-table tbody tr')].map((row) => row.textContent?.replace(/\s+/g, ' ').trim());
    expect(rows[0]).toMatch(/^Least gain, dBi≥.*34\.76 dBi\+0\.76 meets$/);
    expect(rows[3]).toMatch(/no limit set$/);
  });

  it('adds a beam on the other side of boresight and takes one away', async () => {
    const { workspace, press } = await sheetRig(RequirementSheet);
    await press('Add beam');
    expect(workspace.design().requirement.beams).toEqual([
      { thetaDeg: 20, phiDeg: 0 },
      { thetaDeg: 20, phiDeg: 180 },
    ]);
    await press('Remove beam 1');
    expect(workspace.design().requirement.beams).toEqual([{ thetaDeg: 20, phiDeg: 180 }]);
    expect(workspace.stepNames()).toEqual(['Add beam 2', 'Remove beam 1']);
  });

  it('follows the tangential wavenumber of a steered beam', async () => {
    const { text, enter } = await sheetRig(RequirementSheet);
    expect(text()).toContain('200.71');
    await enter('Beam 1 θ', '30');
    expect(text()).toContain('293.42');
  });

  it('takes a direction as azimuth and elevation', async () => {
    const { workspace, enter, press } = await sheetRig(RequirementSheet);
    await press('Azimuth and elevation');
    await enter('Beam 1 elevation', '10 deg');
    const [beam] = workspace.design().requirement.beams;
    // cos(theta) = cos(az) cos(el)
    expect(Math.cos((beam.thetaDeg * Math.PI) / 180)).toBeCloseTo(Math.cos(Math.PI / 9) * Math.cos(Math.PI / 18), 9);
    await enter('Beam 1 azimuth', '95');
    expect(workspace.design().requirement.beams[0]).toBe(beam);
  });

  it('sets a band around the design frequency and takes it away', async () => {
    const { workspace, press, field } = await sheetRig(RequirementSheet);
    await press('Set band edges');
    expect(workspace.design().requirement.bandGHz).toEqual([27.44, 28.56]);
    expect(field('Lower band edge').value).toBe('27.44');
    await press('Remove band');
    expect(workspace.design().requirement).not.toHaveProperty('bandGHz');
  });

  it('says what it is in the bar', async () => {
    const { header, enter } = await sheetRig(RequirementSheet);
    expect(header.head()).toMatchObject({ number: 1, title: 'Requirement', subtitle: 'one beam at 28 GHz, 3 limits' });
    await enter('Highest sidelobe', '');
    expect(header.head().subtitle).toBe('one beam at 28 GHz, 2 limits');
  });

  it('offers nothing to press to somebody who may only look', async () => {
    const { workspace, fixture, element } = await sheetRig(RequirementSheet);
    workspace.viewOnlyReason.set('Only designers change panels');
    await fixture.whenStable();
    const names = [...element.querySelectorAll('button')].map((button) => button.textContent?.trim());
    expect(names).toEqual(['θ and φ', 'Azimuth and elevation']);
  });
});
