import { designFaults } from '../../../../shared/antenna/design-faults';
import { STARTING_DESIGN } from '../../../../shared/model/starting-design';
import { SAMPLE_HEAD } from '../sample-prediction';
import type { LivePrediction, PredictedCells } from '../live-prediction-data';
import { sheetRig } from '../fields/sheet-rig';
import { designOfIllumination, illuminationOfKind } from './illumination-choices';
import { amplitudeLayer, cellPlaces, incidenceLayer, incidentPhaseLayer } from './illumination-layers';
import { IlluminationSheet } from './illumination-sheet';

const cells = { xMm: Float64Array.of(-2.5, 2.5), yMm: Float64Array.of(0, 0), amplitude: Float64Array.of(1, 0.5), incidenceDeg: Float64Array.of(10, 42) } as unknown as PredictedCells;
const prediction: LivePrediction = { head: SAMPLE_HEAD, cells, cuts: [], uv: null, of: STARTING_DESIGN };

const guidedDesign = designOfIllumination(STARTING_DESIGN, 'guided-wave');

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

  it('takes the radius of horn and mount, shows what it blocks, and lets it go again', async () => {
    const { workspace, fixture, enter, text } = await sheetRig(IlluminationSheet);
    await enter('Radius of horn and mount', '2 cm');
    expect(workspace.design().illumination).toMatchObject({ blockageRadiusMm: 20 });
    const figures = { ...SAMPLE_HEAD.figures, blockage: { cells: 32, atBeamDb: -0.633, powerDb: -0.31 }, specular: { meanResponseDb: -18.2 } };
    workspace.prediction.set({ ...prediction, cells: { ...cells, xMm: new Float64Array(0) }, head: { ...SAMPLE_HEAD, figures } });
    await fixture.whenStable();
    expect(text()).toContain('Cells in the shadow of the feed32');
    expect(text()).toContain('Blockage, field at the beam−0.63 dB');
    expect(text()).toContain('Specular part against a plate−18.2 dB');
    await enter('Radius of horn and mount', '');
    expect(workspace.design().illumination).not.toHaveProperty('blockageRadiusMm');
  });

  it('keeps the place of the horn in mind when a wave takes over', async () => {
    const { workspace, choose, header } = await sheetRig(IlluminationSheet);
    await choose('Plane wave');
    expect(workspace.design().illumination).toEqual({ kind: 'plane-wave', thetaDeg: 18.4349, phiDeg: 180, polarisation: 'x' });
    expect(header.head().subtitle).toBe('plane wave from θ 18.4349°, φ 180°');
    expect(workspace.stepNames()).toEqual(['Illumination: Plane wave']);
  });

  it('lights by a guided wave from an edge or a point, with what follows from its index', async () => {
    const { workspace, choose, enter, text, header } = await sheetRig(IlluminationSheet);
    await choose('Guided wave');
    // alpha L = 1.2564 over 200 mm
    expect(workspace.design().illumination).toEqual({ kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 0 }, effectiveIndex: 1.6, leakageNpPerM: 6.28, polarisation: 'x' });
    // 10.707 mm / 2.6
    expect(text()).toContain('below λ/(n + 1)4.118 mm');
    await enter('Effective index n', '2.5');
    await choose('Radial, from a point');
    await enter('Launch radius', '12');
    expect(workspace.design().illumination).toMatchObject({ launch: { kind: 'radial', radiusMm: 12 }, effectiveIndex: 2.5 });
    await choose('Plane, from an edge');
    expect(workspace.design().illumination).toMatchObject({ launch: { kind: 'plane', directionDeg: 0 } });
    expect(header.head().subtitle).toBe('guided wave, plane, index 2.5, leakage 6.28 per metre');
    expect(text()).toContain('How computed: a guided wave under the panel');
  });

  it('shows leaked share and modulation instead of spillover, and no angle of incidence', async () => {
    const { workspace, fixture, text } = await sheetRig(IlluminationSheet, guidedDesign);
    const guidedWave = { lengthMm: 200, leakedShare: 0.919, beamRelativeDb: -6.02, modulationEfficiency: 0.5, unmodulatedLobes: [] };
    workspace.prediction.set({ ...prediction, of: guidedDesign, head: { ...SAMPLE_HEAD, figures: { ...SAMPLE_HEAD.figures, guidedWave } } });
    await fixture.whenStable();
    expect(text()).toContain('Leaked share91.9 %, −0.37 dB');
    expect(text()).toContain('Beam against cells of free phase−6.02 dB');
    expect(text()).not.toContain('Spillover−');
    expect(text()).toContain('Incident phase');
    expect(text()).not.toContain('from the normal');
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

describe('designOfIllumination', () => {
  it('changes cells that cannot be lit so, and only those', () => {
    const edition = { kind: 'edition', editionId: '7f7d2f0e-5f0e-4d8e-9b52-000000000000', rule: 'nearest-phase', excludedCells: [] } as const;
    const resonant = designOfIllumination({ ...STARTING_DESIGN, cells: { ...edition, excludedCells: [] } }, 'guided-wave');
    expect(resonant.cells).toEqual({ kind: 'resonant', rule: 'projection', states: null });
    expect(designOfIllumination(resonant, 'horn').cells).toEqual({ kind: 'ideal', levels: null });
    expect(guidedDesign.cells).toBe(STARTING_DESIGN.cells);
    expect(designFaults(resonant)).toEqual([]);
  });

  it('makes a wave from broadside of a guided one', () => {
    expect(illuminationOfKind(guidedDesign, 'plane-wave')).toMatchObject({ thetaDeg: 0, phiDeg: 0 });
    expect(illuminationOfKind(guidedDesign, 'horn')).toMatchObject({ kind: 'horn', positionMm: [0, 0, 180] });
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

  it('has the incident phase of a guided wave fall by its index along its way', () => {
    const { values } = incidentPhaseLayer({ ...prediction, of: guidedDesign });
    // 5 mm at index 1.6 and 10.7069 mm of wavelength: 269 degrees of delay.
    expect((((values[1] - values[0]) % 360) + 360) % 360).toBeCloseTo(360 - (360 * 1.6 * 5) / 10.7068735, 3);
  });

  it('scales incidence to the next ten degrees and places cells by their lattice', () => {
    expect(incidenceLayer(prediction).scale.to).toBe(50);
    expect(cellPlaces(prediction)).toMatchObject({ pitchXMm: 5, pitchYMm: 5 });
  });
});
