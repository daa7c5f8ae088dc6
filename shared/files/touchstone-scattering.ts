import type { TouchstoneData } from './touchstone-data';

/** S-parameters of a file, or why they cannot be had. */
export type ScatteringResult =
  | { readonly kind: 'scattering'; readonly values: Float64Array }
  | { readonly kind: 'impossible'; readonly reason: string };

type Complex = readonly [re: number, im: number];
type Matrix = readonly [Complex, Complex, Complex, Complex];

const ONE: Complex = [1, 0];
const ZERO: Complex = [0, 0];

/**
 * The S-parameters of a one- or two-port given as S, Z or Y, against the file's own reference resistances.
 * S = (z - 1)(z + 1)^-1 with z the impedance normalised by sqrt(R_i R_j), and S = (1 - y)(1 + y)^-1 likewise
 * (K. Kurokawa, IEEE Trans. MTT 13(2), 1965; from memory, equation number not checked).
 */
export function toScattering(data: TouchstoneData): ScatteringResult {
  if (data.parameter === 'S') return { kind: 'scattering', values: data.values };
  if (data.parameter === 'H' || data.parameter === 'G')
    return { kind: 'impossible', reason: `${data.parameter} terms are not turned into S; export the cell as S, Z or Y` };
  if (data.portCount > 2) return { kind: 'impossible', reason: `${data.parameter} terms of ${data.portCount} ports are not turned into S` };
  const n = data.portCount;
  const values = new Float64Array(data.values.length);
  for (let i = 0; i < data.frequenciesHz.length; i++) {
    const terms = scatteringAt(data, i);
    if (terms === null || !terms.every(([re, im]) => Number.isFinite(re) && Number.isFinite(im)))
      return { kind: 'impossible', reason: `${data.parameter} at ${data.frequenciesHz[i]} Hz has no S-parameters` };
    const kept = n === 1 ? [terms[0]] : terms;
    kept.forEach(([re, im], term) => {
      values[2 * (i * n * n + term)] = re;
      values[2 * (i * n * n + term) + 1] = im;
    });
  }
  return { kind: 'scattering', values };
}

/** A one-port is worked out as the corner of a two-port whose other port is matched. */
function scatteringAt(data: TouchstoneData, index: number): Matrix | null {
  const n = data.portCount;
  const term = (row: number, column: number): Complex => {
    if (row >= n || column >= n) return row === column ? ONE : ZERO;
    const at = 2 * (index * n * n + row * n + column);
    const ohm = Math.sqrt(data.referenceOhm[row] * data.referenceOhm[column]);
    const scale = data.parameter === 'Z' ? 1 / ohm : ohm;
    return [data.values[at] * scale, data.values[at + 1] * scale];
  };
  const [a, b, c, d] = [term(0, 0), term(0, 1), term(1, 0), term(1, 1)];
  const inverse = invert([add(a, ONE), b, c, add(d, ONE)]);
  if (inverse === null) return null;
  const sign = data.parameter === 'Z' ? 1 : -1;
  const scaled = (value: Complex): Complex => [sign * value[0], sign * value[1]];
  return product([scaled(add(a, [-1, 0])), scaled(b), scaled(c), scaled(add(d, [-1, 0]))], inverse);
}

function add(a: Complex, b: Complex): Complex {
  return [a[0] + b[0], a[1] + b[1]];
}

function times(a: Complex, b: Complex): Complex {
  return [a[0] * b[0] - a[1] * b[1], a[0] * b[1] + a[1] * b[0]];
}

function product(a: Matrix, b: Matrix): Matrix {
  return [
    add(times(a[0], b[0]), times(a[1], b[2])),
    add(times(a[0], b[1]), times(a[1], b[3])),
    add(times(a[2], b[0]), times(a[3], b[2])),
    add(times(a[2], b[1]), times(a[3], b[3])),
  ];
}

function invert([a, b, c, d]: Matrix): Matrix | null {
  const cross = times(b, c);
  const determinant = add(times(a, d), [-cross[0], -cross[1]]);
  const size = determinant[0] ** 2 + determinant[1] ** 2;
  if (size === 0) return null;
  const reciprocal: Complex = [determinant[0] / size, -determinant[1] / size];
  const minus = (value: Complex): Complex => [-value[0], -value[1]];
  return [times(d, reciprocal), times(minus(b), reciprocal), times(minus(c), reciprocal), times(a, reciprocal)];
}
