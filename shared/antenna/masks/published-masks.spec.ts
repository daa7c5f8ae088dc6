import type { MaskFacts } from './mask-segment';
import { maskEnvelope, maskFirstDeg, maskLevelDb, maskPoints } from './mask-envelope';
import { PUBLISHED_MASKS, referencePatternOfF699Dbi } from './published-masks';

const facts = (apertureOverWavelength: number, frequencyGHz: number, peakGainDbi = 45): MaskFacts => ({ apertureOverWavelength, frequencyHz: frequencyGHz * 1e9, peakGainDbi });

function envelope(id: string, given: MaskFacts) {
  const made = maskEnvelope({ kind: 'published', id }, given);
  if ('reason' in made) throw new Error(made.reason);
  return made;
}

function reasonOf(id: string, given: MaskFacts): string {
  const made = maskEnvelope({ kind: 'published', id }, given);
  return 'reason' in made ? String(made.reason) : 'no reason';
}

describe('published envelopes', () => {
  it('say where they come from, what they leave open and how far they were checked', () => {
    for (const mask of PUBLISHED_MASKS) {
      for (const text of [mask.title, mask.edition, mask.undefinedWhere, mask.ruleText, mask.appliesTo, mask.source, mask.status, ...mask.formula]) expect(text.length).toBeGreaterThan(3);
    }
    expect(new Set(PUBLISHED_MASKS.map(({ id }) => id)).size).toBe(5);
  });

  it('are undefined below their first angle and never filled in', () => {
    const s465 = envelope('itu-r-s465-6', facts(40, 12));
    expect(maskFirstDeg(s465)).toBeCloseTo(2.04484, 5);
    expect([maskLevelDb(s465, 2), maskLevelDb(s465, 2.05)]).toEqual([null, expect.closeTo(24.206, 3)]);
    expect(maskPoints(s465)[0][0]).toBe(maskFirstDeg(s465));
    expect(maskLevelDb(envelope('fcc-25-209-a1', facts(60, 6)), 1.49)).toBeNull();
    expect(maskFirstDeg(envelope('itu-r-s580-6', facts(50, 14)))).toBe(2);
  });

  it('refuse a panel or a frequency that they are not written for', () => {
    expect(reasonOf('itu-r-s580-6', facts(49, 12))).toBe('undefined for a panel of 49.0 wavelengths: the text is for D/λ of at least 50');
    expect(reasonOf('itu-r-s465-6', facts(60, 40))).toBe('S.465-6 is for 2 to 31 GHz; the frequency is 40 GHz');
    expect(reasonOf('itu-r-s465-6', facts(1, 12))).toContain('passes 48°');
    expect(reasonOf('fcc-25-209-a1', facts(60, 28))).toBe('25.209(a)(1) is not for 27.5 to 30 GHz; the frequency is 28 GHz');
    expect(reasonOf('fcc-25-209-a1', facts(60, 14.25))).toContain('14 to 14.5 GHz');
    expect(reasonOf('fcc-25-209-a2', facts(60, 28))).toBe('25.209(a)(2) is for 11.7 to 12.2 GHz and 14 to 14.5 GHz; the frequency is 28 GHz');
    expect(reasonOf('itu-r-f699-8', facts(80, 28, 20))).toContain('has no main lobe');
    expect(reasonOf('s-465', facts(60, 12))).toBe(
      'there is no published envelope "s-465"; known are itu-r-s465-6, itu-r-s580-6, itu-r-f699-8, fcc-25-209-a1, fcc-25-209-a2',
    );
  });

  it('stand beside formulas, of which one that cannot be read is no envelope', () => {
    const made = maskEnvelope({ kind: 'formula', segments: [{ fromDeg: 1, toDeg: 9, expression: '3 +' }] }, facts(60, 12));
    expect(made).toEqual({ kind: 'mask-formula', reason: 'the formula "3 +" cannot be read: the formula ends too early, at character 4' });
  });

  it('step up at 7 degrees in 25.209, where the text is not monotonic', () => {
    const fcc = envelope('fcc-25-209-a1', facts(60, 6));
    expect([maskLevelDb(fcc, 7), maskLevelDb(fcc, 7.001)]).toEqual([expect.closeTo(7.87255, 4), 8]);
  });

  it('draw every jump as two points at its place', () => {
    const points = maskPoints(envelope('itu-r-s465-6', facts(60, 12)));
    const at48 = points.filter(([angle]) => Math.abs(angle - 48) < 1e-3);
    expect(at48).toEqual([[expect.closeTo(48, 5), expect.closeTo(-10.031, 3)], [48, -10]]);
    for (let i = 1; i < points.length; i++) expect(points[i][0]).toBeGreaterThan(points[i - 1][0]);
  });

  it('change from one form of F.699 to the other at 100 wavelengths by little', () => {
    const [below, above] = [100, 100.001].map((ratio) => envelope('itu-r-f699-8', facts(ratio, 28, 47.7)));
    for (const angle of [2, 10, 60]) expect(Math.abs((maskLevelDb(below, angle) ?? NaN) - (maskLevelDb(above, angle) ?? NaN))).toBeLessThan(0.01);
  });

  it('hold the main lobe of F.699 for drawing, which is not judged', () => {
    const given = facts(80, 28, 45.7618);
    expect(referencePatternOfF699Dbi(given, 0.5)).toBeCloseTo(41.7618, 4);
    expect(maskLevelDb(envelope('itu-r-f699-8', given), 0.5)).toBeNull();
  });
});
