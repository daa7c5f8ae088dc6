import { randomUUID } from 'node:crypto';
import { readBinaryBlock } from '../../shared/contracts/binary-block';
import { COMPARED_CELL_ARRAY_NAMES, COMPARED_CUT_ARRAY_NAMES, comparisonHead, type Comparison } from '../../shared/contracts/comparisons';
import type { EditionDetail } from '../../shared/contracts/library';
import type { PanelDetail, RevisionDetail } from '../../shared/contracts/projects';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { Api, STRANGER } from '../support/api';
import type { ApiClient } from '../support/api-client';
import { bodyOf, draw, freeze, newPanel } from '../support/panels';
import { expectInvalid, expectNotAllowed, expectNotFound, expectProblem, problemOf } from '../support/problems';
import { onEdition, publishedEdition } from '../support/published-edition';

const steered = (thetaDeg: number, phiDeg = 0): DesignDocument => ({
  ...STARTING_DESIGN,
  requirement: { ...STARTING_DESIGN.requirement, minGainDbi: 34.5, beams: [{ thetaDeg, phiDeg }] },
});

type ComparedCells = Extract<Comparison['cells'], { arrays: object }>;

/** Predictions run in the test's own thread here, several to a test. */
jest.setTimeout(30_000);

describe('comparisons', () => {
  let api: Api;
  let designer: ApiClient;
  let edition: EditionDetail;
  let panel: PanelDetail;
  /** Four states at 19.5 degrees, then ideal cells at 20. */
  let first: RevisionDetail;
  let second: RevisionDetail;
  beforeAll(async () => {
    api = await Api.start();
    designer = await api.signedIn('designer');
    edition = await publishedEdition(api);
    panel = await newPanel(designer, onEdition(edition.id, steered(19.5)));
    first = await freeze(designer, panel.id);
    await draw(designer, panel.id, steered(20));
    second = await freeze(designer, panel.id);
  }, 60_000);
  afterAll(() => api.close());

  const get = (before: string, after: string, client = designer, headers: Record<string, string> = {}) =>
    client.get(`/api/comparisons?before=${encodeURIComponent(before)}&after=${encodeURIComponent(after)}`, { headers });
  const compare = async (before: string, after: string): Promise<Comparison> => bodyOf<Comparison>(await get(before, after), 200);
  const revision = ({ id }: { id: string }): string => `revision:${id}`;
  const cellsOf = ({ cells }: Comparison): ComparedCells => {
    if (!('arrays' in cells)) throw new Error('the cells were not compared');
    return cells as ComparedCells;
  };

  it('tells who the sides are and how they meet their requirements', async () => {
    const { before, after } = await compare(revision(first), revision(second));
    expect(before).toMatchObject({
      reference: revision(first),
      panelId: panel.id,
      panelName: 'Panel',
      projectName: 'Trials',
      hash: first.hash,
      revision: { number: 1 },
      editionName: `${edition.familyName}, edition 1`,
      // Four states lose about 0.8 dB and leave less than 34.5 dBi.
      requirement: { met: 2, short: 1, open: 0 },
    });
    expect(after).toMatchObject({ editionName: null, requirement: { met: 3, short: 0, open: 0 }, revision: { number: 2, parentNumber: 1 } });
  });

  it('names the parameters that differ, with editions by name', async () => {
    const { parameters, parameterCount } = await compare(revision(first), revision(second));
    expect(parameters.map(({ pointer, before, after }) => [pointer, before, after])).toEqual([
      ['/requirement/beams/0/thetaDeg', 19.5, 20],
      ['/cells', `${edition.familyName}, edition 1, nearest-phase`, 'ideal, continuous'],
    ]);
    expect(parameterCount).toBeGreaterThan(20);
  });

  it('shifts the earlier cut so that the beams coincide, and leaves gaps below the floor', async () => {
    const { cuts } = await compare(revision(first), revision(second));
    const [along, across] = cuts;
    expect(along.request).toEqual({ phiDeg: 0, thetaDeg: [-90, 90, 0.1] });
    expect(along.shiftU).toBeCloseTo(Math.sin((20 * Math.PI) / 180) - Math.sin((19.5 * Math.PI) / 180), 12);
    expect(along.floorDbi).toBe(Math.round(Math.max(...along.afterDbi) - 50));
    const at20 = along.angleDeg.findIndex((angle) => Math.abs(angle - 20) < 1e-6);
    // At the beam the difference is that of the gains: four states against ideal cells.
    expect(along.differenceDb[at20]).toBeCloseTo(along.afterDbi[at20] - Math.max(...along.beforeDbi), 1);
    along.differenceDb.forEach((value, i) => {
      if (along.afterDbi[i] < along.floorDbi) expect(value).toBeNull();
    });
    expect(along.differenceDb.filter((value) => value !== null).length).toBeGreaterThan(1000);
    expect(across).toMatchObject({ request: { plane: 'across', angleDeg: [-90, 90, 0.1] }, shiftU: 0, floorDbi: along.floorDbi });
  });

  it('takes for each side its own plane where the beams have none in common', async () => {
    const other = await newPanel(designer, steered(20, 50));
    const [along] = (await compare(revision(second), `draft:${other.id}`)).cuts;
    expect(along).toMatchObject({ request: { plane: 'along', angleDeg: [-90, 90, 0.1] }, shiftU: 0 });
    const centre = along.angleDeg.findIndex((angle) => Math.abs(angle) < 1e-6);
    expect(along.beforeDbi[centre]).toBeGreaterThan(34);
    expect(along.afterDbi[centre]).toBeGreaterThan(34);
  });

  it('moves the earlier map by the direction cosines between beams of different azimuth', async () => {
    const other = await newPanel(designer, steered(20, 50));
    const { uv } = await compare(revision(second), `draft:${other.id}`);
    const [sine, turn] = [Math.sin((20 * Math.PI) / 180), (50 * Math.PI) / 180];
    expect(uv.shiftU).toBeCloseTo(sine * (Math.cos(turn) - 1), 12);
    expect(uv.shiftV).toBeCloseTo(sine * Math.sin(turn), 12);
    // The later beam lies at the sample nearest to it; there beam is held against beam, both of ideal cells.
    const at = (value: number): number => Math.round(((value + 1) * (uv.size - 1)) / 2);
    expect(Math.abs(uv.differenceDb[at(sine * Math.sin(turn)) * uv.size + at(sine * Math.cos(turn))])).toBeLessThan(0.5);
  });

  it('decides by the figure whose verdict changed', async () => {
    const { figures, deciding } = await compare(revision(first), revision(second));
    const gain = figures.find(({ id }) => id === deciding);
    expect(gain).toMatchObject({ id: 'gain', limit: expect.stringContaining('34.5'), verdictBefore: 'falls-short', verdictAfter: 'meets' });
    expect(gain?.change).toBeCloseTo(Number(gain?.after) - Number(gain?.before), 12);
  });

  it('turns every sign when the sides are swapped', async () => {
    const [there, back] = [await compare(revision(first), revision(second)), await compare(revision(second), revision(first))];
    const negated = (values: readonly number[]): number[] => values.map((value) => 0 - value + 0);
    for (const name of ['phaseChangeDeg', 'errorChangeDeg', 'parameterChangeMm'] as const) {
      expect(cellsOf(back).arrays[name].map((value) => value + 0)).toEqual(negated(cellsOf(there).arrays[name]));
    }
    expect([back.uv.shiftU, back.uv.shiftV]).toEqual(negated([there.uv.shiftU, there.uv.shiftV]));
    expect(back.cuts[1].differenceDb.map((value) => (value === null ? null : 0 - value + 0))).toEqual(there.cuts[1].differenceDb.map((value) => (value === null ? null : value + 0)));
    expect(back.cuts[0].shiftU).toBe(-there.cuts[0].shiftU);
    expect([back.before, back.after, back.deciding]).toEqual([there.after, there.before, there.deciding]);
    const numbers = (comparison: Comparison): number[] => comparison.figures.flatMap(({ change }) => (typeof change === 'number' ? [change + 0] : []));
    expect(numbers(back)).toEqual(negated(numbers(there)));
  });

  it('finds nothing different between a revision and the draft that equals it', async () => {
    const { parameters, cells, cuts, uv, figures, deciding, before, after } = await compare(revision(second), `draft:${panel.id}`);
    expect([parameters, deciding, before.hash]).toEqual([[], null, after.hash]);
    expect(after).not.toHaveProperty('revision');
    expect(cells).toMatchObject({ kind: 'compared', total: 1600, changed: 0 });
    for (const { differenceDb } of cuts) expect(differenceDb.every((value) => value === null || value === 0)).toBe(true);
    expect(uv.differenceDb.every((value) => value === 0)).toBe(true);
    expect(figures.every(({ change }) => typeof change !== 'number' || change === 0)).toBe(true);
  });

  it('says why cells of different lattices are not compared', async () => {
    const other = await newPanel(designer, { ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, lattice: { kind: 'rectangular', periodXMm: 4, periodYMm: 5 } } });
    const { cells, figures } = await compare(revision(second), `draft:${other.id}`);
    expect(cells).toEqual({ kind: 'lattices-differ', reason: 'one lattice has 5 × 5 mm, the other 4 × 5 mm' });
    expect(figures.length).toBeGreaterThan(10);
  });

  it('holds the same numbers as a binary block', async () => {
    const json = await compare(revision(first), revision(second));
    const answer = await get(revision(first), revision(second), designer, { accept: 'application/octet-stream' });
    expect(answer.headers.get('content-type')).toBe('application/octet-stream');
    const { head, arrays } = readBinaryBlock(new Uint8Array(answer.bytes).buffer);
    const { arrays: _arrays, ...cells } = cellsOf(json);
    expect(comparisonHead.parse(head)).toEqual({
      ...json,
      cells,
      cuts: json.cuts.map(({ request, shiftU, floorDbi }) => ({ request, shiftU, floorDbi })),
      uv: { size: json.uv.size, shiftU: json.uv.shiftU, shiftV: json.uv.shiftV },
    });
    for (const name of COMPARED_CELL_ARRAY_NAMES) expect(Array.from(arrays[`cells.${name}`])).toEqual(cellsOf(json).arrays[name]);
    json.cuts.forEach((cut, i) => {
      for (const name of COMPARED_CUT_ARRAY_NAMES) {
        expect(Array.from(arrays[`cuts.${i}.${name}`], (value) => (Number.isNaN(value) ? null : value))).toEqual(cut[name]);
      }
    });
    expect(Array.from(arrays['uv.differenceDb'])).toEqual(json.uv.differenceDb);
  });

  it('refuses what is no reference, naming both at once, and what is not there or not yours', async () => {
    const detail = 'must be revision:<id of a revision> or draft:<id of a panel>';
    expectInvalid(await get('revision:7', second.id), [{ pointer: 'before', detail }, { pointer: 'after', detail }]);
    expectInvalid(await designer.get('/api/comparisons?before=draft:x'), [{ pointer: 'after', detail: 'is missing' }]);
    expectNotFound(await get(revision({ id: randomUUID() }), revision(second)), 'revision');
    expectNotFound(await get(revision(first), `draft:${randomUUID()}`), 'panel');
    const stranger = await api.signedIn(STRANGER);
    expectNotFound(await get(revision(first), revision(second), stranger), 'revision');
    expectNotFound(await get(`draft:${panel.id}`, `draft:${panel.id}`, stranger), 'panel');
    expectNotAllowed(await get(revision(first), revision(second), await api.signedIn('fabricator')), 'This needs the role designer or lab or reviewer or range or administrator.');
    expect((await get(revision(first), revision(second), await api.withToken('reviewer', ['read']))).status).toBe(200);
  });

  it('refuses a draft that cannot be predicted, and more numbers than JSON should carry', async () => {
    const sized = (widthMm: number): DesignDocument => ({ ...STARTING_DESIGN, panel: { ...STARTING_DESIGN.panel, outline: { kind: 'rectangle', widthMm, heightMm: 4000 } } });
    const tooLarge = await newPanel(designer, sized(40_000));
    const fault = (side: string) => ({ pointer: '#/design/panel', detail: `${side}: the panel would have 6400000 cells; the limit is 1000000` });
    expectInvalid(await get(revision(second), `draft:${tooLarge.id}`), [fault('after')]);
    expectInvalid(await get(`draft:${tooLarge.id}`, revision(second)), [fault('before')]);
    const asBlock = { accept: 'application/octet-stream' };
    expectInvalid(await get(`draft:${tooLarge.id}`, `draft:${tooLarge.id}`, designer, asBlock), [fault('before'), fault('after')]);
    const large = await newPanel(designer, sized(4000));
    const detail = 'Up to 3856641 numbers are too many for JSON, the limit is 2500000: ask with Accept: application/octet-stream.';
    expectProblem(await get(`draft:${large.id}`, `draft:${large.id}`), problemOf('not-acceptable', 406, detail));
  });
});
