import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import type { PredictedCells } from '../live-prediction-data';
import { SAMPLE_FIGURES, SAMPLE_HEAD } from '../sample-prediction';
import { TargetPhaseChoice, firstFocus } from './target-phase-choice';

const NO_CELLS = { xMm: new Float64Array(0) } as unknown as PredictedCells;

describe('target phase', () => {
  it('puts the first focus on the wanted beam, at a third of the far-field distance', () => {
    const focus = firstFocus(STARTING_DESIGN);
    if (focus.kind !== 'focus') throw new Error('no focus');
    const [x, y, z] = focus.pointMm;
    // 2 D^2 / lambda with the diagonal of 200 x 200 mm at 28 GHz is 14 943 mm.
    expect(Math.hypot(x, y, z)).toBeCloseTo(14943 / 3, -1);
    expect((Math.atan2(x, z) * 180) / Math.PI).toBeCloseTo(20, 2);
    expect(y).toBe(0);
  });

  it('changes to a focus and back as one named step each, and remembers the focus', async () => {
    const { workspace, choose, enter } = await sheetRig(TargetPhaseChoice, STARTING_DESIGN, []);
    await choose('Near-field focus');
    expect(workspace.design().synthesis.kind).toBe('focus');
    await enter('Focus z', '40 cm');
    expect(workspace.design().synthesis).toMatchObject({ pointMm: [expect.any(Number), 0, 400] });
    await choose('Far beams');
    expect(workspace.design().synthesis).toEqual({ kind: 'direct' });
    await choose('Near-field focus');
    expect(workspace.design().synthesis).toMatchObject({ pointMm: [expect.any(Number), 0, 400] });
  });

  it('makes vortex beams of a whole order, and refuses half a turn', async () => {
    const { workspace, choose, enter, text } = await sheetRig(TargetPhaseChoice, STARTING_DESIGN, []);
    await choose('Vortex beams');
    expect(workspace.design().synthesis).toEqual({ kind: 'vortex', order: 1 });
    await enter('Order', '-3');
    expect(workspace.design().synthesis).toEqual({ kind: 'vortex', order: -3 });
    await enter('Order', '1.5');
    expect(text()).toContain('must be a whole number; got 1.5');
    expect(workspace.stepNames()[0]).toBe('Make vortex beams');
  });

  it('shapes sectors, adds and removes them, and keeps the mask in mind', async () => {
    const { workspace, choose, enter, press, text } = await sheetRig(TargetPhaseChoice, STARTING_DESIGN, []);
    await choose('Shaped pattern');
    await enter('Sector 1 azimuth from', '-30');
    await press('Add sector');
    expect(workspace.design().synthesis).toMatchObject({ goal: { sectors: [{ azimuthDeg: [-30, 15] }, { azimuthDeg: [-30, 15] }] }, iterations: 200 });
    await enter('Sector 2 azimuth to', '-40');
    expect(text()).toContain('must rise; got -30 to -40°');
    await press('Remove sector 1');
    await choose('Beams under a mask');
    expect(workspace.design().synthesis).toMatchObject({ goal: { kind: 'mask', peakLossDb: 1 } });
    await choose('Flat sectors');
    expect(workspace.design().synthesis).toMatchObject({ goal: { kind: 'sectors', sectors: [{ azimuthDeg: [-30, 15] }] } });
  });

  it('scatters from blocks, at first eight along a side', async () => {
    const { workspace, choose, enter } = await sheetRig(TargetPhaseChoice, STARTING_DESIGN, []);
    await choose('Diffuse scattering');
    expect(workspace.design().synthesis).toEqual({ kind: 'diffuse', blockColumns: 5, blockRows: 5, states: 2, seed: 1 });
    await enter('States', '4');
    expect(workspace.design().synthesis).toMatchObject({ states: 4 });
  });

  it('shows what a focus turned out to do, with how it is computed', async () => {
    const { workspace, fixture, text } = await sheetRig(TargetPhaseChoice, STARTING_DESIGN, []);
    expect(text()).not.toContain('What the target phase does');
    const focus = { distanceMm: 1200, maximumMm: 658.7, shiftMm: -541.3, riseDb: 3.18, halfPowerMm: { from: 444, to: 1176 }, profile: { distanceMm: [300, 658.7, 1200], levelDb: [-7, 0, -3.2] } };
    workspace.prediction.set({ head: { ...SAMPLE_HEAD, figures: { ...SAMPLE_FIGURES, focus } }, cells: NO_CELLS, cuts: [], uv: null, of: STARTING_DESIGN });
    await fixture.whenStable();
    expect(text()).toContain('Highest level on the axis at658.7 mm');
    expect(text()).toContain('How computed: level along the axis of a focus');
  });
});
