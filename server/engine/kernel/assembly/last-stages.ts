import { add, mul, sub } from './lanes';

/*
 * The last stage of a transform has no twiddles. x is `radix` runs of q units, a unit being `unit` bytes; unit r of run k
 * of the result goes to row r + k q, rows `apart` bytes from one another, so that this stage also puts the result into place.
 */

export function lastRadixFour<T>(xRe: usize, xIm: usize, unit: usize, q: i32, yRe: usize, yIm: usize, apart: usize): void {
  const run = <usize>q * unit, to = <usize>q * apart;
  for (let row = 0; row < q; row++) {
    for (let l: usize = 0; l < unit; l += 16) {
      const r = xRe + l, i = xIm + l, re = yRe + l, im = yIm + l;
      const aRe = v128.load(r), bRe = v128.load(r + run), cRe = v128.load(r + 2 * run), dRe = v128.load(r + 3 * run);
      const aIm = v128.load(i), bIm = v128.load(i + run), cIm = v128.load(i + 2 * run), dIm = v128.load(i + 3 * run);
      const sumAcRe = add<T>(aRe, cRe), sumAcIm = add<T>(aIm, cIm), difAcRe = sub<T>(aRe, cRe), difAcIm = sub<T>(aIm, cIm);
      const sumBdRe = add<T>(bRe, dRe), sumBdIm = add<T>(bIm, dIm), difBdRe = sub<T>(bRe, dRe), difBdIm = sub<T>(bIm, dIm);
      v128.store(re, add<T>(sumAcRe, sumBdRe));
      v128.store(im, add<T>(sumAcIm, sumBdIm));
      v128.store(re + to, sub<T>(difAcRe, difBdIm));
      v128.store(im + to, add<T>(difAcIm, difBdRe));
      v128.store(re + 2 * to, sub<T>(sumAcRe, sumBdRe));
      v128.store(im + 2 * to, sub<T>(sumAcIm, sumBdIm));
      v128.store(re + 3 * to, add<T>(difAcRe, difBdIm));
      v128.store(im + 3 * to, sub<T>(difAcIm, difBdRe));
    }
    xRe += unit;
    xIm += unit;
    yRe += apart;
    yIm += apart;
  }
}

/** Two butterflies of four, of the even and of the odd runs, joined by the eighth roots of one: 1, (1 + j)/sqrt 2, j, (-1 + j)/sqrt 2. */
export function lastRadixEight<T>(xRe: usize, xIm: usize, unit: usize, q: i32, yRe: usize, yIm: usize, apart: usize): void {
  const run = <usize>q * unit, to = <usize>q * apart;
  const root = v128.splat<T>(<T>0.7071067811865476);
  for (let row = 0; row < q; row++) {
    for (let l: usize = 0; l < unit; l += 16) {
      const r = xRe + l, i = xIm + l, re = yRe + l, im = yIm + l;
      let aRe = v128.load(r), bRe = v128.load(r + 2 * run), cRe = v128.load(r + 4 * run), dRe = v128.load(r + 6 * run);
      let aIm = v128.load(i), bIm = v128.load(i + 2 * run), cIm = v128.load(i + 4 * run), dIm = v128.load(i + 6 * run);
      let sumAcRe = add<T>(aRe, cRe), sumAcIm = add<T>(aIm, cIm), difAcRe = sub<T>(aRe, cRe), difAcIm = sub<T>(aIm, cIm);
      let sumBdRe = add<T>(bRe, dRe), sumBdIm = add<T>(bIm, dIm), difBdRe = sub<T>(bRe, dRe), difBdIm = sub<T>(bIm, dIm);
      const e0Re = add<T>(sumAcRe, sumBdRe), e0Im = add<T>(sumAcIm, sumBdIm), e1Re = sub<T>(difAcRe, difBdIm), e1Im = add<T>(difAcIm, difBdRe);
      const e2Re = sub<T>(sumAcRe, sumBdRe), e2Im = sub<T>(sumAcIm, sumBdIm), e3Re = add<T>(difAcRe, difBdIm), e3Im = sub<T>(difAcIm, difBdRe);
      aRe = v128.load(r + run);
      bRe = v128.load(r + 3 * run);
      cRe = v128.load(r + 5 * run);
      dRe = v128.load(r + 7 * run);
      aIm = v128.load(i + run);
      bIm = v128.load(i + 3 * run);
      cIm = v128.load(i + 5 * run);
      dIm = v128.load(i + 7 * run);
      sumAcRe = add<T>(aRe, cRe);
      sumAcIm = add<T>(aIm, cIm);
      difAcRe = sub<T>(aRe, cRe);
      difAcIm = sub<T>(aIm, cIm);
      sumBdRe = add<T>(bRe, dRe);
      sumBdIm = add<T>(bIm, dIm);
      difBdRe = sub<T>(bRe, dRe);
      difBdIm = sub<T>(bIm, dIm);
      let oRe = add<T>(sumAcRe, sumBdRe), oIm = add<T>(sumAcIm, sumBdIm);
      storeSumAndDifference<T>(re, im, 4 * to, e0Re, e0Im, oRe, oIm);
      // (u + jv)(1 + j) = (u - v) + j (u + v)
      let u = sub<T>(difAcRe, difBdIm), v = add<T>(difAcIm, difBdRe);
      oRe = mul<T>(sub<T>(u, v), root);
      oIm = mul<T>(add<T>(u, v), root);
      storeSumAndDifference<T>(re + to, im + to, 4 * to, e1Re, e1Im, oRe, oIm);
      // j (u + jv) = -v + ju: the signs are turned in the store
      u = sub<T>(sumAcRe, sumBdRe);
      v = sub<T>(sumAcIm, sumBdIm);
      storeSumAndDifference<T>(re + 2 * to, im + 2 * to, 4 * to, e2Re, e2Im, v128.neg<T>(v), u);
      // (u + jv)(-1 + j) = -(u + v) + j (u - v)
      u = add<T>(difAcRe, difBdIm);
      v = sub<T>(difAcIm, difBdRe);
      oRe = v128.neg<T>(mul<T>(add<T>(u, v), root));
      oIm = mul<T>(sub<T>(u, v), root);
      storeSumAndDifference<T>(re + 3 * to, im + 3 * to, 4 * to, e3Re, e3Im, oRe, oIm);
    }
    xRe += unit;
    xIm += unit;
    yRe += apart;
    yIm += apart;
  }
}

/** even + odd at the place given, even - odd half the transform later. */
function storeSumAndDifference<T>(re: usize, im: usize, half: usize, evenRe: v128, evenIm: v128, oddRe: v128, oddIm: v128): void {
  v128.store(re, add<T>(evenRe, oddRe));
  v128.store(im, add<T>(evenIm, oddIm));
  v128.store(re + half, sub<T>(evenRe, oddRe));
  v128.store(im + half, sub<T>(evenIm, oddIm));
}
