import { delayedPhaseRad, equalEdges, harmonicAmplitude, sequencePower } from './switching-sequence';

const flip = { states: [{ magnitude: 1, phaseRad: 0 }, { magnitude: 1, phaseRad: Math.PI }], edges: equalEdges(2) };

describe('a switching sequence', () => {
  it('puts 2 / pi into each first harmonic of a flip, nothing into the even ones', () => {
    const size = (order: number): number => Math.hypot(harmonicAmplitude(flip, order).re, harmonicAmplitude(flip, order).im);
    expect([size(0), size(1), size(-1), size(2), size(3)]).toEqual([0, 2 / Math.PI, 2 / Math.PI, 0, 2 / (3 * Math.PI)].map((value) => expect.closeTo(value, 12) as number));
  });

  it('loses no power between its harmonics', () => {
    const uneven = { states: [{ magnitude: 0.9, phaseRad: 0.3 }, { magnitude: 0.5, phaseRad: 2 }], edges: [0, 0.3, 1] };
    expect(sequencePower(uneven)).toBeCloseTo(0.3 * 0.81 + 0.7 * 0.25, 12);
    const sum = Array.from({ length: 4001 }, (_, i) => harmonicAmplitude(uneven, i - 2000)).reduce((total, { re, im }) => total + re * re + im * im, 0);
    expect(sum).toBeCloseTo(sequencePower(uneven), 3);
  });

  it('turns each harmonic by its order when it starts later', () => {
    expect(delayedPhaseRad(3, 0.25)).toBeCloseTo(-1.5 * Math.PI, 12);
  });
});
