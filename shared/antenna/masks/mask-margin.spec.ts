import { degFromRad, radFromDeg } from '../../units/angles';
import { angleBetweenRad, directionOf, type Direction } from '../../waves/conventions';
import type { Mask } from '../../model/design-document';
import { exampleField } from '../example-field';
import { directivityRatioAt, radiationPattern } from '../radiation-pattern';
import { maskEnvelope, maskFacts } from './mask-envelope';
import { judgeMask } from './mask-margin';
import type { MaskEnvelope } from './mask-envelope';

const pattern = radiationPattern(exampleField({ columnCount: 10, rowCount: 9 }), 210, 0.5);
const beam = directionOf(radFromDeg(20), 0.5);
const facts = maskFacts(1, 210, 20);

function judged(mask: Mask, beams: readonly Direction[] = [beam], gainOffsetDb = 0) {
  return judgeMask({ pattern, envelope: maskEnvelope(mask, facts), beams, gainOffsetDb });
}

function marginOf(outcome: ReturnType<typeof judgeMask>) {
  const { maskMargin } = outcome;
  if (!('offAxisDeg' in maskMargin) || typeof maskMargin.marginDb !== 'number') throw new Error('expected a margin');
  return maskMargin as { marginDb: number; thetaDeg: number; phiDeg: number; offAxisDeg: number; levelDbi: number; allowedDbi: number };
}

/** Highest excess in each degree off the beam, by a fine scan. */
function scan(level: (off: number) => number | null) {
  const excess = new Float64Array(180).fill(-Infinity);
  for (let u = -1; u <= 1; u += 0.008) {
    for (let v = -1; v <= 1; v += 0.008) {
      if (u * u + v * v >= 1) continue;
      const off = degFromRad(angleBetweenRad({ u, v, w: Math.sqrt(1 - u * u - v * v) }, beam));
      const allowed = level(off);
      if (allowed === null) continue;
      const ring = Math.floor(off);
      excess[ring] = Math.max(excess[ring], 10 * Math.log10(directivityRatioAt(pattern, u, v)) - allowed);
    }
  }
  return excess;
}

describe('the margin to a mask', () => {
  it('is the least distance below it that a fine scan of the hemisphere finds', () => {
    const found = marginOf(judged({ kind: 'custom', points: [[10, 12], [40, 2], [60, 1]] }, [beam], -0.7)).marginDb;
    const least = -0.7 + Math.max(...scan((off) => (off < 10 ? null : off < 40 ? 12 - (off - 10) / 3 : off < 60 ? 2 - (off - 40) / 20 : 1)));
    expect(-found).toBeGreaterThanOrEqual(least - 1e-6);
    expect(-found).toBeLessThan(least + 0.06);
  });

  it('says where: the level there, mask less gain, is the margin', () => {
    const margin = marginOf(judged({ kind: 'custom', points: [[0, 5], [180, 5]] }));
    const { u, v } = directionOf(radFromDeg(margin.thetaDeg), radFromDeg(margin.phiDeg));
    expect(5 - 10 * Math.log10(directivityRatioAt(pattern, u, v))).toBeCloseTo(margin.marginDb, 6);
    expect(margin.allowedDbi - margin.levelDbi).toBeCloseTo(margin.marginDb, 9);
  });

  it('leaves out what lies nearer to any wanted beam than the first angle', () => {
    const one = marginOf(judged({ kind: 'custom', points: [[30, 0], [180, 0]] }));
    const peak = directionOf(radFromDeg(one.thetaDeg), radFromDeg(one.phiDeg));
    expect(marginOf(judged({ kind: 'custom', points: [[30, 0], [180, 0]] }, [beam, peak])).marginDb).toBeGreaterThan(one.marginDb);
  });

  it('gives the same for a formula as for the points of the same lines', () => {
    const points = marginOf(judged({ kind: 'custom', points: [[10, 12], [40, 2], [180, 2]] }));
    const formula = marginOf(judged({ kind: 'formula', segments: [{ fromDeg: 10, toDeg: 40, expression: '12 - (theta - 10) / 3' }, { fromDeg: 40, toDeg: 180, expression: '2' }] }));
    expect(formula.marginDb).toBeCloseTo(points.marginDb, 9);
    expect(formula.offAxisDeg).toBeCloseTo(points.offAxisDeg, 6);
  });

  it('has a reason where there is none', () => {
    const reason = { kind: 'x', reason: 'y' };
    expect(judgeMask({ pattern, envelope: reason, beams: [beam], gainOffsetDb: 0 })).toEqual({ maskMargin: reason });
    expect(judged({ kind: 'custom', points: [[150, 0], [180, 0]] })).toEqual({ maskMargin: { kind: 'mask-outside', reason: expect.any(String) } });
  });
});

describe('the stretches above a mask', () => {
  const level = -2;
  const { maskFindings } = judged({ kind: 'custom', points: [[25, level], [180, level]] });
  const violations = maskFindings?.violations ?? [];

  it('hold every degree in which a fine scan finds the gain above it, and no other', () => {
    const excess = scan((off) => (off < 25 ? null : level));
    const held = Array.from(excess, (_, deg) => violations.some(({ fromDeg, toDeg }) => fromDeg < deg + 1 && toDeg > deg));
    excess.forEach((db, deg) => {
      if (db > 0.1) expect({ deg, held: held[deg] }).toEqual({ deg, held: true });
      // A stretch is told in rings, so it may begin and end one ring beside the crossing.
      if (held[deg] && db < 0) expect(Math.max(excess[deg - 1], excess[deg + 1])).toBeGreaterThan(-0.6);
    });
    expect(violations.length).toBeGreaterThan(0);
  });

  it('name their worst direction with level, limit and excess', () => {
    for (const { thetaDeg, phiDeg, levelDbi, allowedDbi, excessDb, offAxisDeg, fromDeg, toDeg } of violations) {
      const { u, v } = directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg));
      expect(levelDbi).toBeCloseTo(10 * Math.log10(directivityRatioAt(pattern, u, v)), 6);
      expect([allowedDbi, excessDb]).toEqual([level, expect.closeTo(levelDbi - level, 9)]);
      expect(offAxisDeg).toBeGreaterThanOrEqual(fromDeg - 1e-9);
      expect(offAxisDeg).toBeLessThanOrEqual(toDeg + 1e-9);
    }
  });

  it('are none under a mask that is kept', () => {
    expect(judged({ kind: 'custom', points: [[0, 90], [180, 90]] }).maskFindings).toEqual({ judgedFromDeg: 0, violationCount: 0, violations: [] });
  });
});

describe('rules that let a part pass', () => {
  const flat = (rule: MaskEnvelope['rule'], level: number, spilloverDeg?: [number, number]): MaskEnvelope => ({
    segments: [{ fromDeg: 15, toDeg: 180, levelDb: () => level }],
    rule,
    ...(spilloverDeg ? { spilloverDeg } : {}),
  });
  const outcome = (envelope: MaskEnvelope) => judgeMask({ pattern, envelope, beams: [beam], gainOffsetDb: 0 });

  it('nine tenths of the peaks: the margin turns where one peak in ten stands above', () => {
    const rule = { kind: 'share-of-peaks', leastFraction: 0.9 } as const;
    const { maskMargin, maskFindings } = outcome(flat(rule, 0));
    const turn = -(maskMargin as { marginDb: number }).marginDb;
    const above = outcome(flat(rule, turn - 1e-6)).maskFindings;
    const below = outcome(flat(rule, turn + 1e-6)).maskFindings;
    const mayPass = Math.floor((maskFindings?.peaksJudged ?? 0) / 10);
    expect(maskFindings?.peaksJudged).toBeGreaterThan(20);
    expect([below?.peaksAbove, above?.peaksAbove]).toEqual([mayPass, mayPass + 1]);
  });

  it('an allowance over a tenth of the angles: 3 dB more, but in no more than that tenth', () => {
    const rule = { kind: 'allowance', excessDb: 3, angleFraction: 0.1, fromDeg: 15, toDeg: 180, spilloverDb: 6 } as const;
    const strict = marginOf(outcome(flat({ kind: 'every-direction' }, 0)));
    const { maskMargin, maskFindings } = outcome(flat(rule, -strict.marginDb + 3));
    // Raised to 3 dB above the highest sidelobe nothing stands above it.
    expect((maskMargin as { marginDb: number }).marginDb).toBeGreaterThan(3);
    expect(maskFindings?.angleFractionAbove).toBe(0);
    const lowered = outcome(flat(rule, -strict.marginDb - 1.5));
    expect(marginOf(lowered).marginDb).toBeLessThanOrEqual(1.5 + 1e-6);
    const everywhere = outcome(flat(rule, -40));
    expect(everywhere.maskFindings?.angleFractionAbove).toBeGreaterThan(0.1);
    expect(marginOf(everywhere).marginDb).toBeLessThan(0);
  });

  it('a declared spillover region: 6 dB more there, and its angles count for no share', () => {
    const rule = { kind: 'allowance', excessDb: 3, angleFraction: 0.1, fromDeg: 15, toDeg: 180, spilloverDb: 6 } as const;
    const strict = marginOf(outcome(flat({ kind: 'every-direction' }, 0)));
    const level = -strict.marginDb - 5;
    expect(marginOf(outcome(flat(rule, level))).marginDb).toBeLessThan(-2 + 1e-6);
    expect(marginOf(outcome(flat(rule, level, [15, 180]))).marginDb).toBeCloseTo(1, 6);
    expect(outcome(flat(rule, level, [15, 180])).maskFindings?.angleFractionAbove).toBe(0);
  });
});
