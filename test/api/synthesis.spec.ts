import type { PredictionReply } from '../../shared/contracts/predictions';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { bodyOf } from '../support/panels';
import { onEdition, publishedEdition } from '../support/published-edition';

/** Predictions run in the test's own thread here. */
jest.setTimeout(30_000);

describe('predicting target phases of every kind', () => {
  let api: Api;
  let designer: ApiClient;
  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
  }, 60_000);
  afterAll(() => api.close());

  const figuresOf = async (change: Partial<DesignDocument>): Promise<PredictionReply['figures']> =>
    bodyOf<PredictionReply>(await designer.post('/api/predictions', { design: { ...STARTING_DESIGN, ...change } }), 200).figures;

  it('answers ring and purity of a vortex, and the real maximum of a focus', async () => {
    const vortex = await figuresOf({ synthesis: { kind: 'vortex', order: 2 } });
    expect(vortex.vortex).toMatchObject({ order: 2, purity: expect.any(Number) as number });
    const focus = await figuresOf({ synthesis: { kind: 'focus', pointMm: [0, 0, 400] } });
    expect(focus.focus).toMatchObject({ distanceMm: 400, maximumMm: expect.any(Number) as number });
    expect((await figuresOf({})).focus).toBeUndefined();
  });

  it('answers leaked share and modulation of a guided wave, and refuses cells that it cannot light', async () => {
    const illumination = { kind: 'guided-wave', launch: { kind: 'plane', directionDeg: 0 }, effectiveIndex: 1.6, leakageNpPerM: 6.28, polarisation: 'x' } as const;
    const { guidedWave } = await figuresOf({ illumination, cells: { kind: 'resonant', rule: 'projection', states: 8 } });
    expect(guidedWave).toMatchObject({ lengthMm: expect.closeTo(200, 6) as number, leakedShare: expect.closeTo(1 - Math.exp(-2 * 1.256), 6) as number });
    const answer = await designer.post('/api/predictions', { design: { ...STARTING_DESIGN, cells: { kind: 'resonant', rule: 'projection', states: 8 } } });
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect([answer.status, errors.map(({ pointer }) => pointer)]).toEqual([422, ['#/design/cells/kind']]);
  });

  it('answers how projections went and how a board scatters, and refuses a sector that falls', async () => {
    const goal = { kind: 'sectors', sectors: [{ azimuthDeg: [-15, 15], elevationDeg: [-15, 15] }], rippleDb: 1, transitionDeg: 8, outsideDb: -12 } as const;
    const panel = { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm: 80, heightMm: 80 } } as const;
    const sectors = goal.sectors.map((sector) => ({ azimuthDeg: [...sector.azimuthDeg] as [number, number], elevationDeg: [...sector.elevationDeg] as [number, number] }));
    const { projections } = await figuresOf({ panel, synthesis: { kind: 'projections', goal: { ...goal, sectors }, iterations: 5 } });
    expect(projections).toMatchObject({ iterations: 5, outcome: 'unfinished' });
    const { diffuse } = await figuresOf({ panel, synthesis: { kind: 'diffuse', blockColumns: 4, blockRows: 4, states: 2, seed: 1 } });
    expect(diffuse?.peakDb).toBeLessThan(-5);
    const falling = { ...STARTING_DESIGN, synthesis: { kind: 'projections', goal: { ...goal, sectors: [{ azimuthDeg: [15, -15], elevationDeg: [-15, 15] }] }, iterations: 5 } };
    const { errors } = (await designer.post('/api/predictions', { design: falling })).json as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer)).toEqual(['#/design/synthesis/goal/sectors/0/azimuthDeg/1']);
  });

  it('answers what the feed blocks where its radius is given', async () => {
    const { illumination } = STARTING_DESIGN;
    if (illumination.kind !== 'horn') throw new Error('no horn');
    const { blockage } = await figuresOf({ illumination: { ...illumination, positionMm: [0, 0, 180], blockageRadiusMm: 15 } });
    expect(blockage).toMatchObject({ cells: expect.any(Number) as number, atBeamDb: expect.any(Number) as number });
  });

  it('fits the cells of an edition over a band, with a limit of different cells, and refuses to without a band', async () => {
    const { id } = await publishedEdition(api);
    const base = onEdition(id);
    if (base.cells.kind !== 'edition') throw new Error('no edition');
    const panel = { ...base.panel, outline: { kind: 'rectangle', widthMm: 60, heightMm: 60 } } as const;
    const cells = { ...base.cells, rule: 'band-fit' as const, levels: 2, neighbourStepMm: 0.5 };
    const { assignment } = await figuresOf({ ...base, panel, cells, requirement: { ...base.requirement, bandGHz: [27.9, 28.1] } });
    expect(assignment?.band?.map(({ frequencyGHz }) => frequencyGHz)).toEqual([28, 27.9, 28.1]);
    expect(assignment?.neighbours?.pairs).toBe(2 * 12 * 11);
    const answer = await designer.post('/api/predictions', { design: { ...base, cells } });
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect([answer.status, errors.map(({ pointer }) => pointer)]).toEqual([422, ['#/design/cells/rule']]);
  });

  it('answers each harmonic of time-modulated cells, and refuses one that is not there', async () => {
    const cells = { kind: 'modulated', states: [{ phaseDeg: 0, magnitude: 1 }, { phaseDeg: 180, magnitude: 1 }], modulationMHz: 1, harmonic: 1 } as const;
    const design = { ...STARTING_DESIGN, cells };
    const { figures } = bodyOf<PredictionReply>(await designer.post('/api/predictions', { design, harmonic: 3 }), 200);
    expect(figures.modulation).toMatchObject({ harmonic: 3, offsetMHz: 3, shownShare: expect.closeTo((2 / (3 * Math.PI)) ** 2, 9) as number });
    const answer = await designer.post('/api/predictions', { design: { ...design, cells: { ...cells, harmonic: 2 } } });
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect([answer.status, errors.map(({ pointer }) => pointer)]).toEqual([422, ['#/design/cells/harmonic']]);
  });

  it('refuses a vortex of half an order by its pointer', async () => {
    const answer = await designer.post('/api/predictions', { design: { ...STARTING_DESIGN, synthesis: { kind: 'vortex', order: 0.5 } } });
    const { errors } = answer.json as { errors: { pointer: string }[] };
    expect([answer.status, errors.map(({ pointer }) => pointer)]).toEqual([422, ['#/design/synthesis/order']]);
  });
});
