import { predictDesign } from '../../../../shared/antenna/predict-design';
import { SAMPLE_HEAD } from '../sample-prediction';
import { sheetRig } from '../fields/sheet-rig';
import type { FakeWorkspace } from '../fields/fake-workspace';
import { TransmissionSection } from './transmission-section';

/** Predicts what stands in the fake workspace, with cells of any phase. */
function predict(workspace: FakeWorkspace): void {
  const design = { ...workspace.design(), cells: { kind: 'ideal' as const, levels: null } };
  const { figures, verdicts, warnings } = predictDesign(design, { include: {} });
  workspace.prediction.set({ head: { ...SAMPLE_HEAD, figures, verdicts, warnings }, cells: {} as never, cuts: [], uv: null, of: workspace.design() });
}

describe('TransmissionSection', () => {
  it('sets a transmitter whose power may be typed in any unit, and takes it away', async () => {
    const { workspace, press, enter } = await sheetRig(TransmissionSection);
    await press('Set a transmitter');
    await enter('Power', '33 dBm');
    await enter('Occupied bandwidth', '36 MHz');
    expect(workspace.design().requirement.transmitter).toMatchObject({ powerW: expect.closeTo(1.9953, 4), occupiedBandwidthGHz: 0.036, dutyPercent: 100 });
    await press('Remove transmitter');
    expect(workspace.design().requirement).not.toHaveProperty('transmitter');
    expect(workspace.stepNames()).toEqual(['Set transmitter', 'Set Transmitter power', 'Set Occupied bandwidth', 'Remove transmitter']);
  });

  it('refuses a reference bandwidth above the occupied one', async () => {
    const { press, enter, text } = await sheetRig(TransmissionSection);
    await press('Set a transmitter');
    await enter('Occupied bandwidth', '1 MHz');
    await enter('Reference bandwidth', '4 MHz');
    expect(text()).toContain('must not exceed the occupied bandwidth, 0.001 GHz');
  });

  it('takes distances in kilometres and shows the received power', async () => {
    const { workspace, fixture, press, choose, enter, text } = await sheetRig(TransmissionSection);
    await press('Set a transmitter');
    await choose('From the panel');
    await enter('Distance', '2 km');
    expect(workspace.design().requirement.link).toMatchObject({ kind: 'hop', distanceM: 2000 });
    predict(workspace);
    await fixture.whenStable();
    expect(text()).toMatch(/Received power\s?−\d\d\.\d\d\sdBm/);
    await choose('Over the panel');
    expect(workspace.design().requirement.link).toMatchObject({ kind: 'relay' });
    await choose('No link');
    expect(workspace.design().requirement).not.toHaveProperty('link');
  });

  it('sets a receiver and shows its G/T', async () => {
    const { workspace, fixture, press, text } = await sheetRig(TransmissionSection);
    await press('Set a receiver');
    predict(workspace);
    await fixture.whenStable();
    expect(text()).toMatch(/System temperature\s?\d+\.\d\sK/);
    expect(text()).toMatch(/G\/T at the amplifier\s?\d+\.\d\d\sdB\/K/);
  });

  it('offers nothing to press to somebody who may only look', async () => {
    const { workspace, fixture, element } = await sheetRig(TransmissionSection);
    workspace.viewOnlyReason.set('Only designers change panels');
    await fixture.whenStable();
    expect([...element.querySelectorAll('button')]).toEqual([]);
  });
});
