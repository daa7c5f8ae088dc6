import * as fc from 'fast-check';
import { directionOf } from '../../waves/conventions';
import { cellRotationRad } from './cell-rotation';
import { newLocalWave } from './local-wave';
import { coAndCross, polarisationRows, reradiatedField, sphericalField } from './reradiation';
import { isotropicMatrix, leavingWave, METAL, rotatedCellMatrix, scattered, singularValues } from './scattering';

const angle = fc.double({ min: -Math.PI, max: Math.PI, noNaN: true });
const size = fc.double({ min: 0, max: 1, noNaN: true });
const wave = { ...newLocalWave(), cosIncidence: 0.7, cosAzimuth: 0.6, sinAzimuth: 0.8, teRe: 0.3, teIm: -0.2, tmRe: 0.5, tmIm: 0.9 };

describe('responses of cells', () => {
  it('metal reverses the tangential field at any incidence', () => {
    const [before, after] = [reradiatedField(wave, 'aperture'), reradiatedField(leavingWave(METAL, wave), 'aperture')];
    expect([after.x.re, after.y.im]).toEqual([-before.x.re, -before.y.im]);
  });

  it('keep the power of a lossless cell, rotated or not', () => {
    fc.assert(
      fc.property(angle, angle, angle, (first, second, psi) => {
        const unit = (phase: number): { re: number; im: number } => ({ re: Math.cos(phase), im: Math.sin(phase) });
        const [largest, smallest] = singularValues(rotatedCellMatrix(unit(first), unit(second), psi));
        // The difference of nearly equal values is a root of rounding.
        expect(largest).toBeCloseTo(1, 6);
        expect(smallest).toBeCloseTo(1, 6);
      }),
    );
  });

  it('have the sizes of their axes as singular values', () => {
    fc.assert(
      fc.property(size, size, angle, (a, b, psi) => {
        const [largest, smallest] = singularValues(rotatedCellMatrix({ re: a, im: 0 }, { re: 0, im: b }, psi));
        expect(largest).toBeCloseTo(Math.max(a, b), 6);
        expect(smallest).toBeCloseTo(Math.min(a, b), 6);
      }),
    );
  });

  it('turn a circular wave by twice the rotation of a half-wave cell', () => {
    fc.assert(
      fc.property(angle, (beamPhase) => {
        // rhcp travelling along -z is (x + j y)/sqrt 2.
        const incident = { x: { re: Math.SQRT1_2, im: 0 }, y: { re: 0, im: Math.SQRT1_2 } };
        const psi = cellRotationRad(incident, beamPhase, 'rhcp');
        const [x, y] = scattered(rotatedCellMatrix({ re: 1, im: 0 }, { re: -1, im: 0 }, psi), incident.x, incident.y);
        const { co, cross } = coAndCross(sphericalField({ x, y }, directionOf(0, 0), 'aperture'), directionOf(0, 0), 'rhcp');
        // With the phase of the way to the beam it arrives at 0.
        expect(co.re * Math.cos(beamPhase) - co.im * Math.sin(beamPhase)).toBeCloseTo(1, 9);
        expect(Math.hypot(cross.re, cross.im)).toBeLessThan(1e-9);
      }),
    );
  });

  it('treat all polarisations alike where isotropic', () => {
    const leaving = leavingWave(isotropicMatrix(0.5, Math.PI / 2), wave);
    expect([leaving.teRe, leaving.teIm]).toEqual([expect.closeTo(0.1, 12), expect.closeTo(0.15, 12)]);
  });
});

describe('the far field of one cell', () => {
  const broadside = directionOf(0, 0);

  it('is Ludwig x of f_x alone, at every angle, with power waves', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1.5, noNaN: true }), angle, (theta, phi) => {
        const rows = polarisationRows(directionOf(theta, phi), 'x', 'power-wave');
        expect(rows.coX.re).toBeCloseTo(Math.sqrt(Math.cos(theta)), 9);
        expect(Math.hypot(rows.coY.re, rows.crossX.re)).toBeLessThan(1e-9);
      }),
    );
  });

  it('has rows of equal power for co and cross together, whatever the polarisation asked for', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1.5, noNaN: true }), angle, fc.constantFrom('power-wave' as const, 'aperture' as const), (theta, phi, form) => {
        const power = (polarisation: 'x' | 'y' | 'rhcp' | 'lhcp'): number => {
          const { coX, crossX } = polarisationRows(directionOf(theta, phi), polarisation, form);
          return coX.re ** 2 + coX.im ** 2 + crossX.re ** 2 + crossX.im ** 2;
        };
        expect(power('rhcp')).toBeCloseTo(power('x'), 9);
        expect(power('lhcp')).toBeCloseTo(power('y'), 9);
      }),
    );
  });

  it('does not depend on the form at broadside and normal incidence', () => {
    const normal = { ...wave, cosIncidence: 1 };
    const field = (form: 'power-wave' | 'aperture'): unknown => sphericalField(reradiatedField(normal, form), broadside, form);
    expect(field('aperture')).toEqual(field('power-wave'));
  });
});
