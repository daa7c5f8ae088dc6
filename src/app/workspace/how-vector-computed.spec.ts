import { HOW_VECTOR_COMPUTED } from './how-vector-computed';

describe('HOW_VECTOR_COMPUTED', () => {
  const notes = Object.values(HOW_VECTOR_COMPUTED);

  it('gives formula, meaning, conventions, limits and source of every figure', () => {
    for (const how of notes) expect([how.title, how.formula.length > 0, how.meaning, how.conventions, how.validity, how.source].every(Boolean)).toBe(true);
  });

  it('uses no sign that the figure face lacks', () => {
    const allowed = /^[\u0000-\u00ff\u0391-\u03c9\u2013\u2014\u2032\u2033\u2070-\u209c\u2190-\u2193\u2211\u2212\u221a\u222b\u2260\u2264\u2265]*$/;
    const texts = notes.flatMap((how) => [...how.formula, how.meaning, how.conventions, how.validity, how.source]);
    expect(texts.filter((text) => !allowed.test(text))).toEqual([]);
  });
});
