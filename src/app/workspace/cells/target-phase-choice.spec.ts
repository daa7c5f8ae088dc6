import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { TargetPhaseChoice, firstFocus } from './target-phase-choice';

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
});
