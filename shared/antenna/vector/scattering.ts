import type { Complex } from '../../waves/polarisation';
import type { LocalWave } from './local-wave';

/** [[s11, s12], [s21, s22]]: between TE (1) and TM (2) of the plane of incidence, or between the x and y axes of the cell. */
export interface ScatteringMatrix {
  readonly s11: Complex;
  readonly s12: Complex;
  readonly s21: Complex;
  readonly s22: Complex;
}

/** Bare metal reverses the tangential field; an empty cell of a transmitting panel leaves it as it is. */
export const METAL: ScatteringMatrix = { s11: { re: -1, im: 0 }, s12: { re: 0, im: 0 }, s21: { re: 0, im: 0 }, s22: { re: -1, im: 0 } };

/** A cell that treats all polarisations alike: the ideal one has magnitude 1. */
export function isotropicMatrix(magnitude: number, phaseRad: number): ScatteringMatrix {
  const response = { re: magnitude * Math.cos(phaseRad), im: magnitude * Math.sin(phaseRad) };
  return { s11: response, s12: { re: 0, im: 0 }, s21: { re: 0, im: 0 }, s22: response };
}

/**
 * Tangential response, between x and y, of a cell with responses first and second along its own axes, turned by psi from x
 * towards y: (first + second)/2 I + (first - second)/2 [[cos 2 psi, sin 2 psi], [sin 2 psi, -cos 2 psi]]. Of a circular wave on
 * a reflector the second part keeps the sense and turns its phase by +2 psi (rhcp) or -2 psi (lhcp); the first part is metal-like,
 * swaps the sense and is not steered.
 */
export function rotatedCellMatrix(first: Complex, second: Complex, psiRad: number): ScatteringMatrix {
  const mean = { re: (first.re + second.re) / 2, im: (first.im + second.im) / 2 };
  const half = { re: (first.re - second.re) / 2, im: (first.im - second.im) / 2 };
  const [c, s] = [Math.cos(2 * psiRad), Math.sin(2 * psiRad)];
  const across = { re: half.re * s, im: half.im * s };
  return {
    s11: { re: mean.re + half.re * c, im: mean.im + half.im * c },
    s12: across,
    s21: across,
    s22: { re: mean.re - half.re * c, im: mean.im - half.im * c },
  };
}

/** S times a pair of amplitudes. */
export function scattered({ s11, s12, s21, s22 }: ScatteringMatrix, first: Complex, second: Complex): [Complex, Complex] {
  return [sumOfProducts(s11, first, s12, second), sumOfProducts(s21, first, s22, second)];
}

function sumOfProducts(a: Complex, x: Complex, b: Complex, y: Complex): Complex {
  return { re: a.re * x.re - a.im * x.im + b.re * y.re - b.im * y.im, im: a.re * x.im + a.im * x.re + b.re * y.im + b.im * y.re };
}

/** The wave b = S a that leaves a cell described between TE and TM. */
export function leavingWave(matrix: ScatteringMatrix, wave: LocalWave): LocalWave {
  const [te, tm] = scattered(matrix, { re: wave.teRe, im: wave.teIm }, { re: wave.tmRe, im: wave.tmIm });
  return { ...wave, teRe: te.re, teIm: te.im, tmRe: tm.re, tmIm: tm.im };
}

/** Largest and smallest singular value: at most 1 where the cell gains no power. */
export function singularValues(matrix: ScatteringMatrix): [number, number] {
  const { s11, s12, s21, s22 } = matrix;
  const squares = [s11, s12, s21, s22].reduce((sum, s) => sum + s.re * s.re + s.im * s.im, 0);
  const determinant = sumOfProducts(s11, s22, { re: -s12.re, im: -s12.im }, s21);
  const size = Math.hypot(determinant.re, determinant.im);
  // sigma1^2 + sigma2^2 = squares and sigma1 sigma2 = size.
  const sum = Math.sqrt(squares + 2 * size);
  const difference = Math.sqrt(Math.max(0, squares - 2 * size));
  return [(sum + difference) / 2, (sum - difference) / 2];
}
