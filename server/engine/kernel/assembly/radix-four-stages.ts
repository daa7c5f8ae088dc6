import { add, productIm, productRe, storeProduct, sub } from './lanes';

/*
 * Stockham's self-sorting transform, radix four (C. Van Loan, Computational Frameworks for the Fast Fourier Transform,
 * 1992, section 1.7; from memory), with exp(+j ...): x is read at p, p + m, p + 2m, p + 3m and written at 4p ... 4p + 3.
 * A butterfly of a, b, c, d:
 *   y0 = (a + c) + (b + d)        y1 = ((a - c) + j (b - d)) w
 *   y2 = ((a + c) - (b + d)) w^2  y3 = ((a - c) - j (b - d)) w^3
 */

/** Bytes of one group of six twiddles. */
function groupBytes<T>(): usize {
  return 6 * sizeof<T>();
}

/**
 * One stage. Unit p of x, `stride` bytes of neighbouring lines that take part alike, stands `apart` bytes after unit
 * p - 1; units from `filled` on are zero and neither read nor multiplied. Units of y follow one another.
 */
export function radixFourStage<T>(xRe: usize, xIm: usize, apart: usize, filled: i32, yRe: usize, yIm: usize, stride: usize, m: i32, twiddles: usize): void {
  if (filled <= m) quarterFilled<T>(xRe, xIm, apart, filled, yRe, yIm, stride, m, twiddles);
  else if (filled <= 2 * m) halfFilled<T>(xRe, xIm, apart, filled, yRe, yIm, stride, m, twiddles);
  else fullStage<T>(xRe, xIm, apart, yRe, yIm, stride, m, twiddles);
}

/** b = c = d = 0: every output is a times a twiddle. */
function quarterFilled<T>(xRe: usize, xIm: usize, apart: usize, filled: i32, yRe: usize, yIm: usize, stride: usize, m: i32, twiddles: usize): void {
  const size = sizeof<T>();
  for (let p = 0; p < filled; p++) {
    const c1 = v128.load_splat<T>(twiddles), s1 = v128.load_splat<T>(twiddles + size);
    const c2 = v128.load_splat<T>(twiddles + 2 * size), s2 = v128.load_splat<T>(twiddles + 3 * size);
    const c3 = v128.load_splat<T>(twiddles + 4 * size), s3 = v128.load_splat<T>(twiddles + 5 * size);
    for (let q: usize = 0; q < stride; q += 16) {
      const a = v128.load(xRe + q), b = v128.load(xIm + q), re = yRe + q, im = yIm + q;
      v128.store(re, a);
      v128.store(im, b);
      storeProduct<T>(re + stride, im + stride, a, b, c1, s1);
      storeProduct<T>(re + 2 * stride, im + 2 * stride, a, b, c2, s2);
      storeProduct<T>(re + 3 * stride, im + 3 * stride, a, b, c3, s3);
    }
    xRe += apart;
    xIm += apart;
    yRe += 4 * stride;
    yIm += 4 * stride;
    twiddles += groupBytes<T>();
  }
  const rest = <usize>(m - filled) * 4 * stride;
  memory.fill(yRe, 0, rest);
  memory.fill(yIm, 0, rest);
}

/** c = d = 0, and b = 0 from p = filled - m on. */
function halfFilled<T>(xRe: usize, xIm: usize, apart: usize, filled: i32, yRe: usize, yIm: usize, stride: usize, m: i32, twiddles: usize): void {
  const size = sizeof<T>();
  const toB = <usize>m * apart;
  const zero = f64x2.splat(0);
  for (let p = 0; p < m; p++) {
    const c1 = v128.load_splat<T>(twiddles), s1 = v128.load_splat<T>(twiddles + size);
    const c2 = v128.load_splat<T>(twiddles + 2 * size), s2 = v128.load_splat<T>(twiddles + 3 * size);
    const c3 = v128.load_splat<T>(twiddles + 4 * size), s3 = v128.load_splat<T>(twiddles + 5 * size);
    const both = p < filled - m;
    for (let q: usize = 0; q < stride; q += 16) {
      const aRe = v128.load(xRe + q), aIm = v128.load(xIm + q), re = yRe + q, im = yIm + q;
      let bRe = zero, bIm = zero;
      if (both) {
        bRe = v128.load(xRe + toB + q);
        bIm = v128.load(xIm + toB + q);
      }
      v128.store(re, add<T>(aRe, bRe));
      v128.store(im, add<T>(aIm, bIm));
      let u = sub<T>(aRe, bIm), v = add<T>(aIm, bRe);
      storeProduct<T>(re + stride, im + stride, u, v, c1, s1);
      u = sub<T>(aRe, bRe);
      v = sub<T>(aIm, bIm);
      storeProduct<T>(re + 2 * stride, im + 2 * stride, u, v, c2, s2);
      u = add<T>(aRe, bIm);
      v = sub<T>(aIm, bRe);
      storeProduct<T>(re + 3 * stride, im + 3 * stride, u, v, c3, s3);
    }
    xRe += apart;
    xIm += apart;
    yRe += 4 * stride;
    yIm += 4 * stride;
    twiddles += groupBytes<T>();
  }
}

function fullStage<T>(xRe: usize, xIm: usize, apart: usize, yRe: usize, yIm: usize, stride: usize, m: i32, twiddles: usize): void {
  const size = sizeof<T>();
  const toB = <usize>m * apart, toC = 2 * toB, toD = 3 * toB;
  for (let p = 0; p < m; p++) {
    const c1 = v128.load_splat<T>(twiddles), s1 = v128.load_splat<T>(twiddles + size);
    const c2 = v128.load_splat<T>(twiddles + 2 * size), s2 = v128.load_splat<T>(twiddles + 3 * size);
    const c3 = v128.load_splat<T>(twiddles + 4 * size), s3 = v128.load_splat<T>(twiddles + 5 * size);
    for (let q: usize = 0; q < stride; q += 16) {
      const r = xRe + q, i = xIm + q, re = yRe + q, im = yIm + q;
      const aRe = v128.load(r), bRe = v128.load(r + toB), cRe = v128.load(r + toC), dRe = v128.load(r + toD);
      const aIm = v128.load(i), bIm = v128.load(i + toB), cIm = v128.load(i + toC), dIm = v128.load(i + toD);
      const sumAcRe = add<T>(aRe, cRe), sumAcIm = add<T>(aIm, cIm), difAcRe = sub<T>(aRe, cRe), difAcIm = sub<T>(aIm, cIm);
      const sumBdRe = add<T>(bRe, dRe), sumBdIm = add<T>(bIm, dIm), difBdRe = sub<T>(bRe, dRe), difBdIm = sub<T>(bIm, dIm);
      v128.store(re, add<T>(sumAcRe, sumBdRe));
      v128.store(im, add<T>(sumAcIm, sumBdIm));
      let u = sub<T>(difAcRe, difBdIm), v = add<T>(difAcIm, difBdRe);
      storeProduct<T>(re + stride, im + stride, u, v, c1, s1);
      u = sub<T>(sumAcRe, sumBdRe);
      v = sub<T>(sumAcIm, sumBdIm);
      storeProduct<T>(re + 2 * stride, im + 2 * stride, u, v, c2, s2);
      u = add<T>(difAcRe, difBdIm);
      v = sub<T>(difAcIm, difBdRe);
      storeProduct<T>(re + 3 * stride, im + 3 * stride, u, v, c3, s3);
    }
    xRe += apart;
    xIm += apart;
    yRe += 4 * stride;
    yIm += 4 * stride;
    twiddles += groupBytes<T>();
  }
}

/**
 * First stage of a single line, whose neighbouring numbers are neighbouring p: a vector holds several p, and their four
 * outputs are shuffled into place. The line is zero from `filled` on; memory up to the next quarter must hold zeros.
 */
export function firstLineStage<T>(xRe: usize, xIm: usize, filled: i32, yRe: usize, yIm: usize, m: i32, planes: usize): void {
  const quarter = <usize>m * sizeof<T>();
  const hasB = filled > m, hasCd = filled > 2 * m;
  const zero = f64x2.splat(0);
  for (let p: usize = 0; p < quarter; p += 16) {
    const r = xRe + p, i = xIm + p, t = planes + p;
    const aRe = v128.load(r), aIm = v128.load(i);
    let bRe = zero, bIm = zero, cRe = zero, cIm = zero, dRe = zero, dIm = zero;
    if (hasB) {
      bRe = v128.load(r + quarter);
      bIm = v128.load(i + quarter);
    }
    if (hasCd) {
      cRe = v128.load(r + 2 * quarter);
      cIm = v128.load(i + 2 * quarter);
      dRe = v128.load(r + 3 * quarter);
      dIm = v128.load(i + 3 * quarter);
    }
    const c1 = v128.load(t), s1 = v128.load(t + quarter), c2 = v128.load(t + 2 * quarter), s2 = v128.load(t + 3 * quarter);
    const c3 = v128.load(t + 4 * quarter), s3 = v128.load(t + 5 * quarter);
    const sumAcRe = add<T>(aRe, cRe), sumAcIm = add<T>(aIm, cIm), difAcRe = sub<T>(aRe, cRe), difAcIm = sub<T>(aIm, cIm);
    const sumBdRe = add<T>(bRe, dRe), sumBdIm = add<T>(bIm, dIm), difBdRe = sub<T>(bRe, dRe), difBdIm = sub<T>(bIm, dIm);
    const u1 = sub<T>(difAcRe, difBdIm), v1 = add<T>(difAcIm, difBdRe), u2 = sub<T>(sumAcRe, sumBdRe), v2 = sub<T>(sumAcIm, sumBdIm);
    const u3 = add<T>(difAcRe, difBdIm), v3 = sub<T>(difAcIm, difBdRe);
    storeInterleaved<T>(yRe, add<T>(sumAcRe, sumBdRe), productRe<T>(u1, v1, c1, s1), productRe<T>(u2, v2, c2, s2), productRe<T>(u3, v3, c3, s3));
    storeInterleaved<T>(yIm, add<T>(sumAcIm, sumBdIm), productIm<T>(u1, v1, c1, s1), productIm<T>(u2, v2, c2, s2), productIm<T>(u3, v3, c3, s3));
    yRe += 64;
    yIm += 64;
  }
}

/** Lane l of y0 ... y3 goes to places 4l ... 4l + 3. */
function storeInterleaved<T>(to: usize, y0: v128, y1: v128, y2: v128, y3: v128): void {
  if (sizeof<T>() === 8) {
    v128.store(to, v128.shuffle<f64>(y0, y1, 0, 2));
    v128.store(to + 16, v128.shuffle<f64>(y2, y3, 0, 2));
    v128.store(to + 32, v128.shuffle<f64>(y0, y1, 1, 3));
    v128.store(to + 48, v128.shuffle<f64>(y2, y3, 1, 3));
    return;
  }
  const low01 = v128.shuffle<f32>(y0, y1, 0, 4, 1, 5), low23 = v128.shuffle<f32>(y2, y3, 0, 4, 1, 5);
  const high01 = v128.shuffle<f32>(y0, y1, 2, 6, 3, 7), high23 = v128.shuffle<f32>(y2, y3, 2, 6, 3, 7);
  v128.store(to, v128.shuffle<f64>(low01, low23, 0, 2));
  v128.store(to + 16, v128.shuffle<f64>(low01, low23, 1, 3));
  v128.store(to + 32, v128.shuffle<f64>(high01, high23, 0, 2));
  v128.store(to + 48, v128.shuffle<f64>(high01, high23, 1, 3));
}
