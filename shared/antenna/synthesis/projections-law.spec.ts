import { designDocument, type DesignDocument, type PatternGoal } from '../../model/design-document';
import { figures as figuresSchema } from '../../model/figures';
import { radFromDeg } from '../../units/angles';
import { designFaults } from '../design-faults';
import { planeWaveDesign } from '../example-design';
import { InvalidDesign } from '../invalid-design';
import { placeCells } from '../place-cells';
import { predictDesign } from '../predict-design';
import { maskBounds, sectorBounds } from './projection-bounds';
import { runProjections } from './projection-run';

const flat = (halfDeg: number): PatternGoal => ({
  kind: 'sectors',
  sectors: [{ azimuthDeg: [-halfDeg, halfDeg], elevationDeg: [-halfDeg, halfDeg] }],
  rippleDb: 2,
  transitionDeg: 12,
  outsideDb: -8,
});
const projected = (goal: PatternGoal, iterations = 30, changes: Partial<DesignDocument> = {}): DesignDocument =>
  planeWaveDesign({ requirement: { ...planeWaveDesign().requirement, beams: [{ thetaDeg: 0, phiDeg: 0 }] }, synthesis: { kind: 'projections', goal, iterations }, ...changes });

describe('bounds of a pattern', () => {
  const grid = { columns: 16, rows: 16, uStep: 0.125, vStep: 0.125, radiateExponent: 0, copies: 1 } as const;
  const sector = { azimuthRad: [radFromDeg(-20), radFromDeg(20)], elevationRad: [radFromDeg(-20), radFromDeg(20)] } as const;

  it('take all the power into the sectors, by Parseval', () => {
    const goal = { kind: 'sectors', sectors: [sector], rippleDb: 0, transitionRad: 0, outsideDb: -40 } as const;
    const { lower, heldCount } = sectorBounds(goal, grid, 7);
    expect(lower.reduce((sum, level) => sum + level * level, 0) / lower.length).toBeCloseTo(7, 9);
    // u and v of -2 ... 2 samples, 0.25 at most, lie within sin 20 deg = 0.342.
    expect(heldCount).toBe(25);
  });

  it('ask more of cells that radiate less aside', () => {
    const goal = { kind: 'sectors', sectors: [sector], rippleDb: 0, transitionRad: 0, outsideDb: -40 } as const;
    const { lower } = sectorBounds(goal, { ...grid, radiateExponent: 1 }, 7);
    expect(lower[2 * 16] / lower[0]).toBeCloseTo(1 / Math.sqrt(1 - 0.25 ** 2), 9);
  });

  it('of a mask leave the beam free and hold its peak', () => {
    const goal = { kind: 'mask', points: [{ offAxisRad: 0.2, levelDb: -10 }, { offAxisRad: 0.6, levelDb: -30 }], peakLossDb: 6 } as const;
    const { lower, upper } = maskBounds(goal, grid, { beams: [{ u: 0, v: 0, w: 1 }], fullField: 10 });
    expect(lower[0]).toBeCloseTo(10 * 10 ** (-6 / 20), 9);
    expect(upper[1]).toBe(Infinity);
    expect(20 * Math.log10(upper[6 * 16] / lower[0])).toBeCloseTo(-30, 9);
  });
});

describe('alternating projections', () => {
  it('reach bounds that the start keeps already, at once', () => {
    const open = { lower: new Float64Array(256), upper: new Float64Array(256).fill(Infinity) };
    const run = runProjections({ columnCount: 4, rowCount: 4, columns: 16, rows: 16, amplitude: new Float64Array(16).fill(1), startPhaseRad: new Float64Array(16), ...open }, { iterations: 9, watched: [] });
    expect(run).toMatchObject({ outcome: 'reached', iterations: 0, worstExcessDb: 0 });
  });

  it('say that they have stalled where the bounds are not to be had', () => {
    const impossible = { lower: new Float64Array(16).fill(9), upper: new Float64Array(16).fill(9) };
    const run = runProjections({ columnCount: 1, rowCount: 1, columns: 16, rows: 1, amplitude: Float64Array.of(1), startPhaseRad: Float64Array.of(0), ...impossible }, { iterations: 400, watched: [100, 200, 300] });
    expect(run).toMatchObject({ outcome: 'stalled', iterations: 100 });
    expect(run.worstShortfallDb).toBeCloseTo(20 * Math.log10(9), 9);
  });
});

describe('a panel with phases from projections', () => {
  it('spreads its beam evenly over a sector, and says how near it came', () => {
    const { figures, warnings } = predictDesign(projected(flat(18)), { include: {} });
    expect(figuresSchema.safeParse(figures).success).toBe(true);
    const run = figures.projections;
    if (!run) throw new Error('no projections');
    const shares = run.costs.map(({ share }) => share);
    expect(shares.every((share, i) => i === 0 || share <= shares[i - 1] + 1e-12)).toBe(true);
    expect(shares[shares.length - 1]).toBeLessThan(0.3 * shares[0]);
    // 36 x 36 degrees hold at most about 16 dBi; a pencil beam would have 31.
    expect(Number(figures.directivityAtBeamDbi)).toBeGreaterThan(10);
    expect(Number(figures.directivityAtBeamDbi)).toBeLessThan(19);
    expect(warnings.some(({ code }) => code === 'bounds-not-reached')).toBe(run.outcome !== 'reached');
  });

  it('is found again for the same question, and keeps its phases at another frequency', () => {
    const [first, second] = [placeCells(projected(flat(18))), placeCells(projected(flat(18)))];
    expect(second.law.projections).toBe(first.law.projections);
    expect(first.law.phaseRad(1, 0.0075, 0.0075)).toBe(first.law.phaseRad(2, 0.0075, 0.0075));
  });

  it('lowers the sidelobes of a pencil beam without touching amplitudes', () => {
    const sidelobe = (design: DesignDocument): number => Number(predictDesign(design, { include: {} }).figures.sidelobeDb.along);
    const goal: PatternGoal = { kind: 'mask', points: [[8, -15.5], [90, -15.5]], peakLossDb: 2 };
    expect(sidelobe(projected(goal, 50))).toBeLessThan(sidelobe(projected(goal, 50, { synthesis: { kind: 'direct' } })) - 1);
  });

  it('works on a staggered lattice', () => {
    const panel: DesignDocument['panel'] = { ...planeWaveDesign().panel, lattice: { kind: 'triangular', periodXMm: 16, rowSpacingMm: 14 } };
    const { figures } = predictDesign(projected(flat(18), 40, { panel }), { include: {} });
    expect(figures.projections?.costs.at(-1)?.share).toBeLessThan(0.5 * (figures.projections?.costs[0].share ?? 0));
  });

  it('refuses a sector that no sample lies in, and spans and masks that fall', () => {
    const narrow: PatternGoal = { kind: 'sectors', sectors: [{ azimuthDeg: [1, 1.1], elevationDeg: [1, 1.1] }], rippleDb: 1, transitionDeg: 5, outsideDb: -20 };
    expect(() => placeCells(projected(narrow))).toThrow(InvalidDesign);
    const pointers = (goal: PatternGoal): string[] => designFaults(projected(goal)).map(({ pointer }) => pointer);
    expect(pointers({ kind: 'sectors', sectors: [{ azimuthDeg: [5, 1], elevationDeg: [1, 2] }], rippleDb: 1, transitionDeg: 5, outsideDb: -20 })).toEqual(['#/synthesis/goal/sectors/0/azimuthDeg/1']);
    expect(pointers({ kind: 'mask', points: [[8, -15], [8, -20]], peakLossDb: 1 })).toEqual(['#/synthesis/goal/points/1/0']);
    expect(designDocument.safeParse(projected(flat(18))).success).toBe(true);
  });
});
