import { degreesText, directionText } from './angle-text';

describe('angles in sentences', () => {
  it.each([
    [12.345, 1, '12.3°'],
    [-90, 1, '\u221290.0°'],
    [-0.04, 1, '0.0°'],
    [-0.05, 2, '\u22120.05°'],
    [-1e-14, 0, '0°'],
  ])('write %d to %d digits as %s', (angleDeg, digits, text) => {
    expect(degreesText(angleDeg, digits)).toBe(text);
  });

  it('name a direction by θ and φ', () => {
    expect(directionText(48.6, -90)).toBe('θ 48.6°, φ \u221290.0°');
  });
});
