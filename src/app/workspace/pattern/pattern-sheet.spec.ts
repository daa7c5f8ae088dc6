import { PlotLibrary } from '../../ui/plots/plot-library';
import { computedPrediction } from '../computed-prediction';
import { sheetRig } from '../fields/sheet-rig';
import { PatternSheet } from './pattern-sheet';
import { MASKED_DESIGN, SAMPLE_PATTERN } from './sample-pattern';

const drawnNothing = { load: async () => ({ react: async (element: HTMLElement) => Object.assign(element, { on: () => undefined }), purge: () => undefined }) };

async function shown() {
  jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
  jest.spyOn(Element.prototype, 'getBoundingClientRect').mockReturnValue({ width: 528, height: 444, left: 0, top: 0 } as DOMRect);
  const rig = await sheetRig(PatternSheet, MASKED_DESIGN, [{ provide: PlotLibrary, useValue: drawnNothing }]);
  rig.workspace.prediction.set({ ...SAMPLE_PATTERN, of: rig.workspace.design() });
  await rig.fixture.whenStable();
  const handle = rig.element.querySelector('.handle') as SVGGElement;
  return { ...rig, handle };
}

describe('PatternSheet', () => {
  afterEach(() => jest.restoreAllMocks());

  it('says what will stand here while nothing is predicted', async () => {
    const { text } = await sheetRig(PatternSheet, MASKED_DESIGN, [{ provide: PlotLibrary, useValue: drawnNothing }]);
    expect(text()).toContain('No prediction yet');
  });
  it('lists lobes and markers of the predicted cut', async () => {
    const { element, text, header } = await shown();
    expect(header.head().subtitle).toBe('10.000 GHz, scalar model, radiate exponent 0.5, after spillover and cell loss');
    expect(text()).toContain('Cut along the beam');
    expect([...element.querySelectorAll('slant-marker-table tbody tr')]).toHaveLength(8);
    expect(text()).toContain('A prediction is array theory, not a measurement.');
  });
  it('steers the beam by keys, at once on the handle and as named steps', async () => {
    const { handle, workspace, fixture } = await shown();
    for (const key of ['ArrowRight', 'ArrowRight', 'ArrowUp']) {
      handle.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true }));
      await fixture.whenStable();
    }
    const [beam] = workspace.design().requirement.beams;
    expect(beam.thetaDeg).toBeGreaterThan(20.3);
    expect(beam.phiDeg).toBeGreaterThan(0);
    expect(workspace.stepNames().at(-1)).toMatch(/^Steer beam 1 to θ \d+\.\d°, φ \d\.\d°$/);
    expect(handle.getAttribute('aria-valuetext')).toBe(`θ ${beam.thetaDeg.toFixed(1)}°, φ ${beam.phiDeg.toFixed(1)}°`);
  });
  it('does not let a reader steer', async () => {
    const { handle, workspace, fixture } = await shown();
    workspace.viewOnlyReason.set('Only a designer changes panels');
    await fixture.whenStable();
    handle.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight', cancelable: true }));
    expect(workspace.stepNames()).toEqual([]);
  });
  it('turns to another cut and to relative levels', async () => {
    const { choose, press, text } = await shown();
    await choose('Across the beam');
    expect(text()).toContain('Cut across the beam');
    await press('Relative');
    expect(text()).toContain('gain relative to the peak, dB against');
  });
  it('sets a marker at the cursor and takes it away again', async () => {
    const { element, fixture, press, text } = await shown();
    const stage = element.querySelector('slant-cut-plot .stage') as HTMLElement;
    stage.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowLeft', shiftKey: true, cancelable: true }));
    stage.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', cancelable: true }));
    await fixture.whenStable();
    expect(text()).toContain('set by you');
    await press('Take marker 9 away');
    expect(text()).not.toContain('set by you');
  });
  it('makes the polar form larger', async () => {
    const { element, press } = await shown();
    await press('Larger');
    expect(element.querySelector('.pair.wide slant-polar-plot .balloon-text')?.textContent).toBe('1');
  });

  it('shows the cross-polar field, its figures and a gain budget that adds up, by the vector model', async () => {
    const design = { ...MASKED_DESIGN, prediction: { ...MASKED_DESIGN.prediction, model: 'vector' as const } };
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    const rig = await sheetRig(PatternSheet, design, [{ provide: PlotLibrary, useValue: drawnNothing }]);
    rig.workspace.prediction.set(computedPrediction(design, { cuts: [{ phiDeg: 0, thetaDeg: [-90, 90, 0.5] }], uvSize: 33 }));
    await rig.fixture.whenStable();
    expect(rig.header.head().subtitle).toContain('vector model, power waves, no cell factor');
    expect(rig.text()).toContain('draft, co-polar');
    expect(rig.element.querySelector('slant-cut-legend')?.textContent).toContain('cross-polar');
    expect(rig.text()).toContain('XPD at the beam');
    expect(rig.text()).toContain('Gain at the beam, dBi');
    await rig.press('Cross');
    expect(rig.text()).toContain('Cross-polar gain below the co-polar peak, dB');
  });

  it('offers no cross-polar field in the scalar model, and says where the other model is chosen', async () => {
    const { element, text } = await shown();
    expect(element.querySelector('slant-vector-tables')).toBeNull();
    expect(text()).toContain('The vector model is chosen on the Illumination sheet.');
  });
});
