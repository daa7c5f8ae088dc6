import { designMask } from '../../../../shared/antenna/masks/design-mask';
import type { MaskMargin } from '../../../../shared/model/mask-figures';
import { forbiddenEdges, leastMargin, maskLevelDbi, offAxisDeg } from './mask-level';
import { MASKED_DESIGN, SAMPLE_PATTERN, sampleCut } from './sample-pattern';

const { beams } = MASKED_DESIGN.requirement;
const mask = designMask(MASKED_DESIGN, SAMPLE_PATTERN.head.figures);

describe('mask', () => {
  it('begins at its first angle, joins points by straight lines and goes on level after the last', () => {
    expect([8.9, 9, 14.5, 20, 55, 120].map((off) => maskLevelDbi(mask, off))).toEqual([null, 18, 14, 10, 4, -2]);
  });
  it('says nothing when it is not set', () => {
    expect(maskLevelDbi(null, 30)).toBeNull();
  });
  it('is measured from the nearest of several beams', () => {
    expect(offAxisDeg({ thetaDeg: 30, phiDeg: 180 }, [{ thetaDeg: 20, phiDeg: 0 }, { thetaDeg: 25, phiDeg: 180 }])).toBeCloseTo(5, 9);
  });
});

describe('mask along a cut', () => {
  const cut = sampleCut();
  it('leaves the beam open and forbids on both sides', () => {
    const edges = forbiddenEdges(mask, beams, cut, 0);
    expect(edges).toHaveLength(2);
    // Rounding decides whether the sample just nine degrees away counts; samples are 0.1 degrees apart.
    expect(edges[0].angleDeg[edges[0].angleDeg.length - 1]).toBeGreaterThan(10.85);
    expect(edges[1].angleDeg[0]).toBeLessThan(29.15);
    expect([edges[1].levelDb[0], edges[0].levelDb[0]]).toEqual([expect.closeTo(18, 0), expect.closeTo(-2, 6)]);
  });
  it('goes down with a relative cut', () => {
    expect(forbiddenEdges(mask, beams, cut, 30)[1].levelDb[0]).toBeCloseTo(-12, 0);
  });
  it('has its least margin where the gain comes nearest; over the hemisphere it can only be smaller', () => {
    const least = leastMargin(mask, beams, cut);
    const whole = SAMPLE_PATTERN.head.figures.maskMargin as MaskMargin;
    expect(least?.marginDb).toBeGreaterThanOrEqual(whole.marginDb - 1e-6);
    for (let i = 0; i < cut.angleDeg.length; i++) {
      const level = maskLevelDbi(mask, Math.abs(cut.angleDeg[i] - 20));
      if (level !== null) expect(level - cut.gainDbi[i]).toBeGreaterThanOrEqual((least?.marginDb ?? 0) - 1e-6);
    }
  });
  it('has none without a mask', () => {
    expect(leastMargin(null, beams, cut)).toBeNull();
  });
});
