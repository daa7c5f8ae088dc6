import { HOW_TOLERANCE_COMPUTED } from './how-tolerance-computed';

describe('HOW_TOLERANCE_COMPUTED', () => {
  it('names formula, conventions, limits, source and a covering check of each figure', () => {
    for (const how of Object.values(HOW_TOLERANCE_COMPUTED)) {
      expect([how.formula.length > 0, how.meaning, how.conventions, how.validity].every(Boolean)).toBe(true);
      expect(how.source).toMatch(/check|spec/);
    }
  });

  it('uses no sign that the figure face lacks', () => {
    const allowed = /^[\u0000-\u00ff\u0391-\u03c9\u2013\u2014\u2032\u2033\u2070-\u209c\u2190-\u2193\u2211\u2212\u221a\u222b\u2260\u2264\u2265]*$/;
    const texts = Object.values(HOW_TOLERANCE_COMPUTED).flatMap((how) => [...how.formula, how.meaning, how.conventions, how.validity, how.source]);
    expect(texts.filter((text) => !allowed.test(text))).toEqual([]);
  });
});
