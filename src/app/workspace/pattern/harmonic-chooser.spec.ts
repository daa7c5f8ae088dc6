import type { DesignDocument } from '../../../../shared/model/design-document';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { sheetRig } from '../fields/sheet-rig';
import { requestOf } from '../live-prediction';
import type { PredictedCells } from '../live-prediction-data';
import { SAMPLE_FIGURES, SAMPLE_HEAD } from '../sample-prediction';
import { HarmonicChooser } from './harmonic-chooser';

const design: DesignDocument = {
  ...STARTING_DESIGN,
  cells: { kind: 'modulated', states: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }], modulationMHz: 1, harmonic: 1 },
};

describe('HarmonicChooser', () => {
  it('names every harmonic with its level, the steered one first chosen, and tells how much is shown', async () => {
    const { workspace, fixture, element, text } = await sheetRig(HarmonicChooser, design);
    const modulation = { harmonic: 1, offsetMHz: 1, shownShare: 0.4053, harmonics: [{ order: 0, share: 0 }, { order: 1, share: 0.4053 }], wholePower: 1 };
    workspace.prediction.set({ head: { ...SAMPLE_HEAD, figures: { ...SAMPLE_FIGURES, modulation } }, cells: {} as PredictedCells, cuts: [], uv: null, of: design });
    await fixture.whenStable();
    expect(text()).toContain('1 steered, −3.92 dB');
    expect(text()).toContain('carrier, none');
    expect(text()).toContain('1.000 MHz off the carrier, with 40.5 %');
    expect(element.querySelector('select')?.value).toBe('1');
  });

  it('asks for the harmonic chosen, and for the steered one again when it goes', async () => {
    const { workspace, fixture, element } = await sheetRig(HarmonicChooser, design);
    const asked: (number | null)[] = [];
    Object.assign(workspace, { requestHarmonic: (order: number | null) => asked.push(order) });
    const box = element.querySelector('select');
    if (!box) throw new Error('no list');
    box.value = '-1';
    box.dispatchEvent(new Event('change'));
    fixture.destroy();
    expect(asked).toEqual([-1, null]);
  });

  it('is part of the request of modulated cells alone', () => {
    const ask = { design, cuts: [], uvSize: 0, harmonic: 3 };
    expect(requestOf(ask)).toMatchObject({ harmonic: 3 });
    expect(requestOf({ ...ask, design: STARTING_DESIGN })).not.toHaveProperty('harmonic');
    expect(requestOf({ ...ask, harmonic: null })).not.toHaveProperty('harmonic');
  });
});
