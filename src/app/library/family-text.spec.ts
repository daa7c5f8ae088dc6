import { angleText, bandText, editionText, periodText } from './family-text';

describe('words about a family', () => {
  it('say the band and the period with their units', () => {
    expect(bandText({ fromGHz: 24.000000001, toGHz: 32 })).toBe('24 to 32 GHz');
    expect(periodText({ periodXMm: 5, periodYMm: 5 })).toBe('5 mm');
    expect(periodText({ periodXMm: 5, periodYMm: 6.5 })).toBe('5 × 6.5 mm');
  });

  it('say plainly when only normal incidence is covered', () => {
    expect(angleText({ thetasDeg: [0], phisDeg: [0] })).toBe('normal incidence only');
    expect(angleText({ thetasDeg: [0, 15, 30], phisDeg: [0, 22.5, 45] })).toBe('θ 0, 15, 30°, φ 0, 22.5, 45°');
  });

  it('tell a published edition from one that is only accepted', () => {
    expect(editionText({ number: 3 })).toBe('edition 3');
    expect(editionText({ number: null })).toBe('accepted, not published');
  });
});
