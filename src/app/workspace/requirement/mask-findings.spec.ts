import { findingsText, violationRows } from './mask-findings';

const margin = { marginDb: -1.2, thetaDeg: 30, phiDeg: 0 };
const violation = { fromDeg: 12.04, toDeg: 13.5, offAxisDeg: 12.66, thetaDeg: 32.66, phiDeg: -0.02, levelDbi: 6.349, allowedDbi: 5, excessDb: 1.349 };
const findings = { judgedFromDeg: 2.04484, violationCount: 1, violations: [violation] };

describe('what stands above a mask', () => {
  it('is told with angle, level, limit and excess', () => {
    expect(violationRows(findings)).toEqual([{ range: '12.0–13.5', worst: '12.66', direction: '32.7, 0.0', level: '6.35', allowed: '5.00', excess: '+1.35' }]);
  });

  it('begins with what was judged', () => {
    expect(findingsText(margin, findings)).toBe('Judged from 2.04° off the beam outwards, over the whole hemisphere in front of the panel. Where the gain stands above it:');
    expect(findingsText(margin, { ...findings, violationCount: 0, violations: [] })).toMatch(/Nothing stands above it\.$/);
    expect(findingsText(margin, { ...findings, violationCount: 31 })).toContain('The 1 worst of 31 stretches above it:');
  });

  it('names what the rule lets pass', () => {
    expect(findingsText(margin, { ...findings, peaksJudged: 412, peaksAbove: 17 })).toContain('17 of 412 sidelobe peaks stand above it; one in ten may.');
    expect(findingsText(margin, { ...findings, angleFractionAbove: 0.0312 })).toContain('in 3.1 % of the angles');
  });

  it('says why nothing was judged', () => {
    expect(findingsText({ kind: 'mask-not-applicable', reason: 'S.465-6 is for 2 to 31 GHz; the frequency is 40 GHz' }, 'Not evaluated.')).toBe('Not evaluated: S.465-6 is for 2 to 31 GHz; the frequency is 40 GHz.');
  });
});
