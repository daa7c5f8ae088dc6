import * as fc from 'fast-check';
import { radFromDeg } from '../../units/angles';
import { correlatedGainRatio, meanFieldFactor, meanFloorRatio, meanPower, randomPhaseLossDb, reflectorPhaseRad } from './phase-error-laws';

const sigma = fc.double({ min: 0, max: 3, noNaN: true });
const fraction = fc.double({ min: 0, max: 1, noNaN: true });
const cells = { xM: [0, 0.01, 0.02, 0.03], yM: [0, 0, 0.01, 0.01], amplitude: [1, 0.8, 0.8, 0.5] };
const sum = 3.1;
const squares = 1 + 0.64 + 0.64 + 0.25;

describe('laws of random errors', () => {
  it('loses 0.67 dB to a surface off by a thirty-second of a wave', () => {
    expect(randomPhaseLossDb(reflectorPhaseRad(1 / 32, 1))).toBeCloseTo(-10 * Math.log10(Math.E) * (Math.PI / 8) ** 2, 10);
    expect(randomPhaseLossDb(0)).toBeCloseTo(0, 15);
  });

  it('leaves the error-free power without errors and the incoherent one without any phase in common', () => {
    expect(meanPower({ phaseSigmaRad: 0, deadFraction: 0 }, sum * sum, squares)).toBeCloseTo(sum * sum, 12);
    expect(meanPower({ phaseSigmaRad: 20, deadFraction: 0 }, sum * sum, squares)).toBeCloseTo(squares, 12);
    expect(meanPower({ phaseSigmaRad: 0.4, deadFraction: 1 }, sum * sum, squares)).toBeCloseTo(0, 12);
  });

  it('shares the power of the cells that live between beam and floor', () => {
    fc.assert(
      fc.property(sigma, fraction, (phaseSigmaRad, deadFraction) => {
        const m = meanFieldFactor({ phaseSigmaRad, deadFraction });
        // Averaged over all directions |F0|^2 is sum A^2, so the mean power is what the living cells radiate.
        expect(meanPower({ phaseSigmaRad, deadFraction }, squares, squares)).toBeCloseTo((1 - deadFraction) * squares, 12);
        expect(m).toBeLessThanOrEqual(1);
      }),
      { seed: 21 },
    );
  });

  it('puts the floor of a uniform array where the mean power says', () => {
    const errors = { phaseSigmaRad: radFromDeg(10), deadFraction: 0.01 };
    const count = 900;
    const beam = meanFieldFactor(errors) ** 2 * count * count;
    expect(meanFloorRatio(errors, 1, count)).toBeCloseTo(meanPower(errors, 0, count) / beam, 12);
  });

  it('costs less the farther errors are shared', () => {
    const at = (correlationLengthM: number): number => correlatedGainRatio({ sigmaRad: 0.5, correlationLengthM }, cells);
    const independent = meanPower({ phaseSigmaRad: 0.5, deadFraction: 0 }, sum * sum, squares) / (sum * sum);
    expect(at(0)).toBeCloseTo(independent, 12);
    expect(at(1e-6)).toBeCloseTo(independent, 12);
    expect(at(0.01)).toBeGreaterThan(at(0.005));
    expect(at(1e3)).toBeCloseTo(1, 8);
  });
});
