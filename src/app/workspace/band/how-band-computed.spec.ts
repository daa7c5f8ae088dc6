import { HOW_BAND_COMPUTED } from './how-band-computed';

describe('HOW_BAND_COMPUTED', () => {
  it('names formula, conventions, limits, source and a covering check of each figure', () => {
    for (const how of Object.values(HOW_BAND_COMPUTED)) {
      expect([how.formula.length > 0, how.meaning, how.conventions, how.validity].every(Boolean)).toBe(true);
      expect(how.source).toMatch(/check|spec/);
    }
  });
});
