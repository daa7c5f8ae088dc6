import { angleBetweenRad, directionOf } from '../waves/conventions';
import { degFromRad, radFromDeg } from '../units/angles';
import { exampleField } from './example-field';
import { maskMargin } from './mask-margin';
import { directivityRatioAt, radiationPattern } from './radiation-pattern';

const pattern = radiationPattern(exampleField({ columnCount: 10, rowCount: 9 }), 210, 0.5);
const beam = directionOf(radFromDeg(20), 0.5);

describe('the margin to a mask', () => {
  it('is the least distance below it that a fine scan of the hemisphere finds', () => {
    const points: [number, number][] = [[10, 12], [40, 2], [60, 1]];
    const margin = maskMargin(pattern, { kind: 'custom', points }, [beam], -0.7);
    let least = Infinity;
    for (let u = -1; u <= 1; u += 0.004) {
      for (let v = -1; v <= 1; v += 0.004) {
        if (u * u + v * v >= 1) continue;
        const off = degFromRad(angleBetweenRad({ u, v, w: Math.sqrt(1 - u * u - v * v) }, beam));
        if (off < 10) continue;
        const level = off < 40 ? 12 - (off - 10) / 3 : off < 60 ? 2 - (off - 40) / 20 : 1;
        least = Math.min(least, level - 10 * Math.log10(directivityRatioAt(pattern, u, v)) + 0.7);
      }
    }
    const found = 'marginDb' in margin ? Number(margin.marginDb) : NaN;
    expect(found).toBeLessThanOrEqual(least + 1e-6);
    expect(found).toBeGreaterThan(least - 0.02);
  });

  it('says where: the level there, mask less gain, is the margin', () => {
    const margin = maskMargin(pattern, { kind: 'custom', points: [[0, 5], [180, 5]] }, [beam], 0);
    if (!('marginDb' in margin)) throw new Error('expected a margin');
    const { u, v } = directionOf(radFromDeg(Number(margin.thetaDeg)), radFromDeg(Number(margin.phiDeg)));
    expect(5 - 10 * Math.log10(directivityRatioAt(pattern, u, v))).toBeCloseTo(Number(margin.marginDb), 6);
  });

  it('leaves out what lies nearer to any wanted beam than the first angle', () => {
    const one = maskMargin(pattern, { kind: 'custom', points: [[30, 0], [180, 0]] }, [beam], 0);
    const peak = directionOf(radFromDeg(Number((one as { thetaDeg: number }).thetaDeg)), radFromDeg(Number((one as { phiDeg: number }).phiDeg)));
    const two = maskMargin(pattern, { kind: 'custom', points: [[30, 0], [180, 0]] }, [beam, peak], 0);
    expect(Number((two as { marginDb: number }).marginDb)).toBeGreaterThan(Number((one as { marginDb: number }).marginDb));
  });

  it('has a reason where there is none', () => {
    expect(maskMargin(pattern, undefined, [beam], 0)).toEqual({ kind: 'no-mask', reason: expect.any(String) });
    expect(maskMargin(pattern, { kind: 'published', id: 'S.465' }, [beam], 0)).toEqual({ kind: 'mask-not-built', reason: expect.stringContaining('S.465') });
    expect(maskMargin(pattern, { kind: 'custom', points: [[150, 0], [180, 0]] }, [beam], 0)).toEqual({ kind: 'mask-outside', reason: expect.any(String) });
  });
});
