import { crestLines } from './crest-lines';
import type { OutgoingField } from './outgoing-field';

const WAVELENGTH_M = 0.01;

/** A plane wave of one amplitude: off its carrier it is 1 everywhere. */
function planeWave(thetaRad: number): OutgoingField {
  const grid = { fromXM: 0, fromZM: 0, stepM: 0.004, columns: 16, rows: 16 };
  const count = grid.columns * grid.rows;
  return {
    grid,
    real: new Float32Array(count).fill(1),
    imaginary: new Float32Array(count),
    wavenumber: (2 * Math.PI) / WAVELENGTH_M,
    beamU: Math.sin(thetaRad),
    beamW: Math.cos(thetaRad),
    largest: 1,
  };
}

describe('crests of a wave', () => {
  it('lie one wavelength apart along the direction of a plane wave, and nowhere else', () => {
    const thetaRad = 0.35;
    const { count, pieces } = crestLines(planeWave(thetaRad));
    expect(count).toBeGreaterThan(100);
    for (let n = 0; n < count; n++) {
      const along = (pieces[5 * n] * Math.sin(thetaRad) + pieces[5 * n + 1] * Math.cos(thetaRad)) / WAVELENGTH_M;
      // The crossing is found by straight lines between ten points a wavelength.
      expect(Math.abs(along - Math.round(along))).toBeLessThan(0.02);
    }
  });

  it('carry the amplitude of the wave where they are', () => {
    const field = planeWave(0);
    const { pieces } = crestLines({ ...field, largest: 4 });
    expect(pieces[4]).toBeCloseTo(0.25, 2);
  });

  it('are absent where there is no wave', () => {
    const field = planeWave(0);
    expect(crestLines({ ...field, real: new Float32Array(256) }).count).toBe(0);
  });
});
