import { exampleDesign } from '../../shared/antenna/example-design';
import { predictDesign, type Prediction } from '../../shared/antenna/predict-design';
import { readBinaryBlock } from '../../shared/contracts/binary-block';
import { COMPARED_CELL_ARRAY_NAMES, comparison, comparisonHead } from '../../shared/contracts/comparisons';
import type { DesignDocument } from '../../shared/model/design-document';
import { InvalidInput, Unavailable } from '../http/problems';
import type { PredictionWish } from '../predictions/prediction-service';
import type { ComparedState } from './compared-state';
import { comparisonBlockOf, comparisonReplyOf } from './comparison-reply';
import { ComparisonService, comparedNumberBound, type ComparisonServiceParts, type ComputedComparison } from './comparison-service';

const ID = '6f9619ff-8b86-4d01-b42d-00cf4fc964ff';
const state = (design: DesignDocument, reference = `draft:${ID}`): ComparedState => ({ reference, panelId: ID, panelName: 'Panel', projectName: 'Project', hash: 'a'.repeat(64), header: null, design, edition: null });
const { requirement, panel } = exampleDesign();
/** Eight cells a side, so that a whole comparison takes little. */
const small: DesignDocument['panel'] = { ...panel, outline: { kind: 'rectangle', widthMm: 120, heightMm: 120 } };
const steered = (thetaDeg: number, phiDeg = 0): DesignDocument => exampleDesign({ panel: small, requirement: { ...requirement, beams: [{ thetaDeg, phiDeg }] } });

/** Predicts in the test's own thread, unless `fails` has something to say of a design. */
function service(fails: (design: DesignDocument) => Error | undefined = () => undefined) {
  const wishes: PredictionWish[] = [];
  const predict = async (_teamId: string, wish: PredictionWish): Promise<Prediction> => {
    wishes.push(wish);
    const error = fails(wish.design);
    if (error !== undefined) throw error;
    return predictDesign(wish.design, { include: { cells: wish.cells, cuts: wish.cuts, uv: wish.uvSize === undefined ? undefined : { size: wish.uvSize, shift: wish.uvShift } } });
  };
  return { wishes, comparisons: new ComparisonService({ predictions: { predict } } as unknown as ComparisonServiceParts) };
}

describe('a comparison', () => {
  const [before, after] = [state(steered(20, 0)), state(steered(20, 90))];
  const { comparisons, wishes } = service();
  let computed: ComputedComparison;
  beforeAll(async () => {
    computed = await comparisons.compare('team', { before, after });
  }, 30_000);

  it('asks for the earlier map moved onto the beam of the later one, and for the later as it is', () => {
    const { uv } = computed;
    expect(wishes.map(({ uvShift }) => uvShift)).toEqual([{ u: uv.shiftU, v: uv.shiftV }, undefined]);
    expect(wishes[0].cuts).toEqual(wishes[1].cuts);
    expect(Math.hypot(uv.shiftU, uv.shiftV)).toBeCloseTo(2 * Math.sin((20 * Math.PI) / 180) * Math.sin((45 * Math.PI) / 180), 12);
  });

  it('has beam against beam in the map, where without the move it would have beam against sidelobe', () => {
    const { uv } = computed;
    const at = (u: number, v: number): number => Math.round(((v + 1) * (uv.size - 1)) / 2) * uv.size + Math.round(((u + 1) * (uv.size - 1)) / 2);
    const [sine, turn] = [Math.sin((20 * Math.PI) / 180), (90 * Math.PI) / 180];
    const difference = uv.differenceDb[at(sine * Math.cos(turn), sine * Math.sin(turn))];
    expect(difference).not.toBe(0);
    expect(Math.abs(difference)).toBeLessThan(0.5);
  });

  it('is as JSON and as a block what the contract says, number for number', () => {
    const json = comparison.parse(JSON.parse(JSON.stringify(comparisonReplyOf(computed))));
    const { head, arrays } = readBinaryBlock(new Uint8Array(comparisonBlockOf(computed)).buffer);
    const parsed = comparisonHead.parse(head);
    expect([parsed.uv, parsed.figures, parsed.deciding]).toEqual([{ size: json.uv.size, shiftU: json.uv.shiftU, shiftV: json.uv.shiftV }, json.figures, json.deciding]);
    if (!('arrays' in json.cells)) throw new Error('the cells were not compared');
    for (const name of COMPARED_CELL_ARRAY_NAMES) expect(Array.from(arrays[`cells.${name}`])).toEqual((json.cells.arrays as Record<string, number[]>)[name]);
    expect(Array.from(arrays['cuts.0.differenceDb'], (value) => (Number.isNaN(value) ? null : value))).toEqual(json.cuts[0].differenceDb);
    expect(Array.from(arrays['uv.differenceDb'])).toEqual(json.uv.differenceDb);
  });

  it('keeps the reason, in both forms, where cells cannot be compared', async () => {
    const finer = state(exampleDesign({ panel: { ...small, lattice: { kind: 'rectangular', periodXMm: 10, periodYMm: 15 } } }));
    const uncompared = await service().comparisons.compare('team', { before, after: finer });
    const reason = { kind: 'lattices-differ', reason: 'one lattice has 15 × 15 mm, the other 10 × 15 mm' };
    expect(comparisonReplyOf(uncompared).cells).toEqual(reason);
    expect((readBinaryBlock(new Uint8Array(comparisonBlockOf(uncompared)).buffer).head as { cells: unknown }).cells).toEqual(reason);
  });
});

describe('a comparison that cannot be made', () => {
  const [left, right] = [steered(10), steered(40)];
  const fault = (design: DesignDocument): Error => new InvalidInput([{ pointer: '#/design/panel', detail: `no beam at ${design.requirement.beams[0].thetaDeg}` }]);
  const compare = (fails: (design: DesignDocument) => Error | undefined) => service(fails).comparisons.compare('team', { before: state(left), after: state(right) });

  it('names the side at fault with every fault', async () => {
    await expect(compare((design) => (design === right ? fault(design) : undefined))).rejects.toMatchObject({ faults: [{ pointer: '#/design/panel', detail: 'after: no beam at 40' }] });
    await expect(compare((design) => (design === left ? fault(design) : undefined))).rejects.toMatchObject({ faults: [{ pointer: '#/design/panel', detail: 'before: no beam at 10' }] });
  });

  it('names both sides where both are at fault', async () => {
    await expect(compare(fault)).rejects.toMatchObject({
      faults: [{ pointer: '#/design/panel', detail: 'before: no beam at 10' }, { pointer: '#/design/panel', detail: 'after: no beam at 40' }],
    });
  });

  it('says before any fault of a design that the engine is away', async () => {
    const away = new Unavailable('The prediction took longer than 120 s.');
    await expect(compare((design) => (design === left ? fault(design) : away))).rejects.toBe(away);
  });

  it('refuses what is no reference, both at once', async () => {
    const detail = 'must be revision:<id of a revision> or draft:<id of a panel>';
    await expect(service().comparisons.pair('team', { before: 'revision:7', after: `panel:${ID}` })).rejects.toMatchObject({ faults: [{ pointer: 'before', detail }, { pointer: 'after', detail }] });
  });
});

describe('the numbers of a comparison', () => {
  it('are bounded by the smaller panel, since only common positions are compared', () => {
    const large = exampleDesign({ panel: { ...panel, outline: { kind: 'rectangle', widthMm: 15_000, heightMm: 15_000 } } });
    const [small, pair] = [comparedNumberBound({ before: state(exampleDesign()), after: state(exampleDesign()) }), comparedNumberBound({ before: state(exampleDesign()), after: state(large) })];
    expect(pair).toBe(small);
    expect(comparedNumberBound({ before: state(large), after: state(large) })).toBeGreaterThan(6 * 1_000_000);
  });
});
