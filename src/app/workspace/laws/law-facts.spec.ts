import { HOW_LAWS_COMPUTED } from '../how-laws-computed';
import { SAMPLE_FIGURES } from '../sample-prediction';
import { axialFigure, costFigure, lawFacts } from './law-facts';

const focus = {
  distanceMm: 1200,
  maximumMm: 658.7,
  shiftMm: -541.3,
  riseDb: 3.18,
  halfPowerMm: { from: 444.3, to: { kind: 'not-reached', reason: 'the level does not fall to half within the line followed' } },
  profile: { distanceMm: [300, 658.7, 1190], levelDb: [-7, 0, -43] },
};

describe('what a target phase turned out to do', () => {
  it('is nothing for a plain beam', () => {
    expect(lawFacts(SAMPLE_FIGURES)).toEqual([]);
    expect(axialFigure(SAMPLE_FIGURES)).toBeNull();
  });

  it('tells the focal shift with its sign and why a half-power point is missing', () => {
    const facts = new Map(lawFacts({ ...SAMPLE_FIGURES, focus }).map(({ name, value }) => [name, value]));
    expect(facts.get('Focal shift')).toBe('−541.3 mm');
    expect(facts.get('Half power from, to')).toBe('444 mm, – (the level does not fall to half within the line followed)');
    expect(lawFacts({ ...SAMPLE_FIGURES, focus: { kind: 'too-many-cells', reason: 'too many' } })).toEqual([{ name: 'Highest level on the axis', value: '– (too many)' }]);
  });

  it('draws the level from the panel on, marks the focus and cuts at −20 dB', () => {
    const drawn = axialFigure({ ...SAMPLE_FIGURES, focus });
    expect(drawn?.x).toMatchObject({ from: 0, to: 1190 });
    expect(drawn?.chosen).toEqual({ at: 2, label: 'focus' });
    expect(Array.from(drawn?.lines[0].y ?? [])).toEqual([-7, 0, -20]);
  });

  it('tells ring and purity of a vortex', () => {
    const vortex = { order: 2, ringDeg: 6.123, purity: 0.9788, axisDb: { kind: 'null', reason: 'the pattern is zero on the axis' } };
    expect(lawFacts({ ...SAMPLE_FIGURES, vortex }).map(({ value }) => value)).toEqual(['6.12°', '97.9 %', '– (the pattern is zero on the axis)']);
  });
});

describe('projections and boards', () => {
  const projections = { outcome: 'stalled' as const, iterations: 200, costs: [{ iteration: 0, share: 0.1 }, { iteration: 200, share: 0.001 }], worstExcessDb: 8.23, worstShortfallDb: 0.28 };

  it('tell whether the bounds are kept, and how far off they are', () => {
    expect(lawFacts({ ...SAMPLE_FIGURES, projections }).map(({ value }) => value)).toEqual(['stalled: it no longer comes nearer', '200', '0.100 %', '8.23 dB', '0.28 dB']);
  });

  it('draw the cost as a level over the iterations', () => {
    const drawn = costFigure({ ...SAMPLE_FIGURES, projections });
    expect(Array.from(drawn?.lines[0].y ?? [])).toEqual([-10, -30]);
    expect(drawn?.x.to).toBe(200);
    expect(costFigure(SAMPLE_FIGURES)).toBeNull();
  });

  it('tell the peak of a board, its bound and how it was found', () => {
    const diffuse = { peakDb: -9.1, peakThetaDeg: 21.4, peakPhiDeg: 45, boundDb: -12.04, boundBy: 'parseval' as const, boardPeakDb: -9.05, samples: 64, method: 'exhaustive' as const, equals: 64 };
    expect(lawFacts({ ...SAMPLE_FIGURES, diffuse }).map(({ value }) => value)).toEqual(['−9.10 dB at θ 21.4°, φ 45.0°', '−12.04 dB', '−9.05 dB', 'every board tried, 64 with this peak']);
  });
});

describe('how those figures are computed', () => {
  it('is told with formula, conventions, limits and source, in signs that the figure face has', () => {
    const allowed = /^[\u0000-\u00ff\u0391-\u03c9\u2013\u2014\u2032\u2033\u2070-\u209c\u2190-\u2193\u2211\u2212\u221a\u222b\u2260\u2264\u2265]*$/;
    for (const how of Object.values(HOW_LAWS_COMPUTED)) {
      const texts = [...how.formula, how.meaning, how.conventions, how.validity, how.source];
      expect(texts.every(Boolean)).toBe(true);
      expect(texts.filter((text) => !allowed.test(text))).toEqual([]);
    }
  });
});
