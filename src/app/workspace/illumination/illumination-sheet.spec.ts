import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { SAMPLE_HEAD } from '../sample-prediction';
import type { LivePrediction, PredictedCells } from '../live-prediction-data';
import { sheetRig } from '../fields/sheet-rig';
import { illuminationOfKind } from './illumination-choices';
import { amplitudeLayer, cellPlaces, incidenceLayer } from './illumination-layers';
import { IlluminationSheet } from './illumination-sheet';

const cells = { xMm: Float64Array.of(-2.5, 2.5), yMm: Float64Array.of(0, 0), amplitude: Float64Array.of(1, 0.5), incidenceDeg: Float64Array.of(10, 42) } as unknown as PredictedCells;
const prediction: LivePrediction = { head: SAMPLE_HEAD, cells, cuts: [], uv: null, of: STARTING_DESIGN };

describe('IlluminationSheet', () => {
  it('shows what follows from the horn at once', async () => {
    const { text, enter } = await sheetRig(IlluminationSheet);
    // 189.74 mm to the aim over a diagonal of 282.84 mm; 2 (2 q + 1) = 28 = 14.47 dBi
    expect(text()).toContain('f/D0.671');
    expect(text()).toContain('14.47 dBi');
    expect(text()).toContain('Offset angle18.4°');
    await enter('Phase centre z', '9 in');
    expect(text()).toContain('Offset angle14.7°');
  });

  it('shows edge taper and spillover of the prediction', async () => {
    const { workspace, fixture, text } = await sheetRig(IlluminationSheet);
    workspace.prediction.set({ ...prediction, cells: { ...cells, xMm: new Float64Array(0) } });
    await fixture.whenStable();
    expect(text()).toContain('Edge taper−9.40 dB');
    expect(text()).toContain('Spillover−0.41 dB');
    expect(text()).toContain('Edge taper: the strongest field of the horn on the edge of the outline against the strongest on the panel');
    expect(text()).toContain('Keep-outs count as hit; a remark says how many dB they take.');
  });

  it('keeps the place of the horn in mind when a wave takes over', async () => {
    const { workspace, choose, header } = await sheetRig(IlluminationSheet);
    await choose('Plane wave');
    expect(workspace.design().illumination).toEqual({ kind: 'plane-wave', thetaDeg: 18.4349, phiDeg: 180, polarisation: 'x' });
    expect(header.head().subtitle).toBe('plane wave from θ 18.4349°, φ 180°');
    expect(workspace.stepNames()).toEqual(['Illumination: Plane wave']);
  });

  it('refuses a horn in the plane of the panel', async () => {
    const { workspace, enter, text } = await sheetRig(IlluminationSheet);
    await enter('Phase centre z', '0');
    expect(text()).toContain('Not taken: the horn must stand off the plane of the panel; got z = 0 mm.');
    expect(workspace.design().illumination).toBe(STARTING_DESIGN.illumination);
  });
});

describe('illuminationOfKind', () => {
  it('puts a horn below a transmitting panel, where the wave came from', () => {
    const design = { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, operation: 'transmit' as const }, illumination: { kind: 'plane-wave' as const, thetaDeg: 0, phiDeg: 0, polarisation: 'y' as const } };
    expect(illuminationOfKind(design, 'horn')).toEqual({ kind: 'horn', positionMm: [0, 0, -180], aimMm: [0, 0, 0], exponentE: 6.5, exponentH: 6.5, polarisation: 'y' });
  });
});

describe('layers of the illumination', () => {
  it('has the brightest cell at 0 dB and half its amplitude at -6.02 dB', () => {
    const layer = amplitudeLayer(prediction);
    expect(layer.values[0]).toBe(0);
    expect(layer.values[1]).toBeCloseTo(-6.0206, 4);
    expect(layer.scale).toEqual({ map: 'sequential', from: -10, to: 0 });
  });

  it('keeps a dark panel on the floor instead of failing', () => {
    const dark = { ...prediction, cells: { ...cells, amplitude: new Float64Array(2) } };
    expect([...Array.from(amplitudeLayer(dark).values)]).toEqual([-40, -40]);
  });

  it('scales incidence to the next ten degrees and places cells by their lattice', () => {
    expect(incidenceLayer(prediction).scale.to).toBe(50);
    expect(cellPlaces(prediction)).toMatchObject({ pitchXMm: 5, pitchYMm: 5 });
  });
});
