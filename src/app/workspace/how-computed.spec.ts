import { HOW_COMPUTED } from './how-computed';
import { SAMPLE_FIGURES, SAMPLE_VERDICTS } from './sample-prediction';
import { stripFigures } from './strip-figures';

describe('HOW_COMPUTED', () => {
  it('answers for every figure of the strip with formula, conventions, limits and source', () => {
    for (const { id } of stripFigures({ figures: SAMPLE_FIGURES, verdicts: SAMPLE_VERDICTS }, null)) {
      const how = HOW_COMPUTED[id];
      expect([id, how.formula.length > 0, how.meaning, how.conventions, how.validity, how.source].every(Boolean)).toBe(true);
    }
  });

  it('uses no sign that the figure face lacks', () => {
    const allowed = /^[\u0000-\u00ff\u0391-\u03c9\u2013\u2014\u2032\u2033\u2070-\u209c\u2190-\u2193\u2211\u2212\u221a\u222b\u2260\u2264\u2265]*$/;
    const texts = Object.values(HOW_COMPUTED).flatMap((how) => [...how.formula, how.meaning, how.conventions, how.validity, how.source]);
    expect(texts.filter((text) => !allowed.test(text))).toEqual([]);
  });
});
