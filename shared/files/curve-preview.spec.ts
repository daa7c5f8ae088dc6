import { previewCurve } from './curve-preview';
import type { FamilyCurve } from './family-inspection';

function delayLine(pointCount: number, portCount: number): FamilyCurve {
  const width = 2 * portCount ** 2;
  const values = new Float64Array(pointCount * width);
  // 40 degrees of lag per point, half the amplitude.
  for (let i = 0; i < pointCount; i++) values.set([0.5 * Math.cos((-40 * i * Math.PI) / 180), 0.5 * Math.sin((-40 * i * Math.PI) / 180)], i * width);
  return { file: 'a.s1p', cellId: 'A', parametersMm: [], thetaDeg: 15, phiDeg: 45, portCount, frequenciesHz: Float64Array.from({ length: pointCount }, (_, i) => 10e9 + i * 1e6), values };
}

describe('previewCurve', () => {
  it('shows the level in dB and the phase unwrapped', () => {
    const preview = previewCurve(delayLine(20, 1));
    expect(preview).toMatchObject({ file: 'a.s1p', cellId: 'A', thetaDeg: 15, phiDeg: 45, pointCount: 20 });
    expect(preview.frequenciesGHz.slice(0, 2)).toEqual([10, 10.001]);
    expect(preview.terms.map(({ term }) => term)).toEqual(['S11']);
    expect(preview.terms[0].magnitudeDb[7]).toBeCloseTo(-6.0206, 4);
    expect(preview.terms[0].phaseDeg[19]).toBeCloseTo(-760, 9);
  });

  it('thins a long curve without wrapping it anew, and keeps its ends', () => {
    const preview = previewCurve(delayLine(2001, 1));
    expect(preview.frequenciesGHz.length).toBe(501);
    expect(preview.frequenciesGHz[500]).toBeCloseTo(12, 9);
    expect(preview.terms[0].phaseDeg[500]).toBeCloseTo(-80_000, 5);
  });

  it('leaves out terms that are zero throughout, and marks single zeros', () => {
    const curve = delayLine(3, 2);
    curve.values.set([0, 0], 8);
    const preview = previewCurve(curve);
    expect(preview.terms.map(({ term }) => term)).toEqual(['S11']);
    expect(preview.terms[0].magnitudeDb[1]).toBeNull();
    expect(JSON.parse(JSON.stringify(preview))).toEqual(preview);
  });
});
