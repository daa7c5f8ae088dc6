import fc from 'fast-check';
import type { DesignDocument } from '../../shared/model/design-document';
import { STARTING_DESIGN } from '../../shared/model/starting-design';
import { MAX_PREDICTION_SECONDS, cutSampleCount, predictionCost } from './prediction-cost';

const { panel } = STARTING_DESIGN;
const sized = (widthMm: number, heightMm: number, more: Partial<DesignDocument['panel']> = {}): DesignDocument => ({ ...STARTING_DESIGN, panel: { ...panel, outline: { kind: 'rectangle', widthMm, heightMm }, ...more } });
const seconds = (design: DesignDocument, more: { uvSize?: number } = {}): number => predictionCost({ design, ...more }).seconds;

describe('predictionCost', () => {
  it('counts the cells of the bounding rectangle and every direction asked for', () => {
    const { cellBound, directionCount } = predictionCost({ design: sized(200, 200), uvSize: 64, cuts: [{ phiDeg: 0, thetaDeg: [-90, 90, 1] }, { plane: 'across', angleDeg: [0, 10, 3] }] });
    expect(cellBound).toBeGreaterThanOrEqual(1600);
    expect(directionCount).toBe(64 * 64 + 181 + 4);
  });

  it('never falls when a panel grows, a map grows, or a keep-out is added', () => {
    const side = fc.integer({ min: 20, max: 4000 });
    fc.assert(
      fc.property(side, side, fc.integer({ min: 0, max: 500 }), (widthMm, heightMm, more) => {
        const design = sized(widthMm, heightMm);
        expect(seconds(sized(widthMm + more, heightMm))).toBeGreaterThanOrEqual(seconds(design));
        expect(seconds(design, { uvSize: 16 + more })).toBeGreaterThanOrEqual(seconds(design, { uvSize: 16 }));
        const keepOuts = [{ kind: 'ellipse' as const, widthMm: 10, heightMm: 10, centreMm: [0, 0] as [number, number] }];
        expect(seconds(sized(widthMm, heightMm, { keepOuts }))).toBeGreaterThanOrEqual(seconds(design));
      }),
    );
  });

  it('lets a million cells pass and refuses a polygon of many corners over very many rows', () => {
    expect(seconds({ ...sized(5000, 5000), prediction: { receiveExponent: 0.5, radiateExponent: 0.5 } })).toBeLessThan(MAX_PREDICTION_SECONDS);
    const pointsMm = Array.from({ length: 2000 }, (_, i): [number, number] => [1000 * Math.cos(i / 318), 1e6 * Math.sin(i / 318)]);
    const rows = { ...sized(5, 5), panel: { ...panel, outline: { kind: 'polygon' as const, pointsMm }, lattice: { kind: 'rectangular' as const, periodXMm: 1000, periodYMm: 0.5 } } };
    expect(seconds(rows)).toBeGreaterThan(MAX_PREDICTION_SECONDS);
  });
});

describe('cutSampleCount', () => {
  it.each([
    [[-90, 90, 0.1], 1801],
    [[0, 10, 4], 3],
    [[5, 5, 1], 1],
    [[10, 0, 1], 1],
  ] as const)('of %j is %d', (angleDeg, count) => {
    expect(cutSampleCount({ plane: 'along', angleDeg: [...angleDeg] })).toBe(count);
  });
});
