import { levelAt, nearestSample } from './cut-figure';

const trace = { label: 'draft', angleDeg: [-10, 0, 10, 20], levelDb: [-30, 0, -10, -20] };

describe('reading a cut', () => {
  it('gives a sample itself without calling it interpolated', () => {
    expect(levelAt(trace, 10)).toEqual({ levelDb: -10, interpolated: false });
    expect(levelAt(trace, 20)).toEqual({ levelDb: -20, interpolated: false });
  });
  it('lays a straight line in dB between samples and says so', () => {
    expect(levelAt(trace, 5)).toEqual({ levelDb: -5, interpolated: true });
  });
  it('has no level outside the cut', () => {
    expect([levelAt(trace, -10.1), levelAt(trace, 21), levelAt({ ...trace, angleDeg: [] }, 0)]).toEqual([null, null, null]);
  });
  it('finds the nearest sample', () => {
    expect([nearestSample(trace, 6), nearestSample(trace, -99), nearestSample({ ...trace, angleDeg: [] }, 0)]).toEqual([2, 0, -1]);
  });
});
