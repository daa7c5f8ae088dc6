/** f64 numbers that describe one direction: lambda = 2 cos - 2, 1 - cos, sin of the step along a line, cos and sin of the step across. */
const NUMBERS: usize = 5;

function splatAt(place: usize, index: usize): v128 {
  return v128.load64_splat(place + (index << 3));
}

/**
 * Exact sums F = sum of p(c, r) exp(j (c alpha + r beta)) over a whole rectangle of cells, and its value at the opposite
 * direction (-alpha, -beta) at no cost: real and imaginary parts of p are summed apart, one in each lane, and conjugate.
 *
 * Along a line by Clenshaw's recurrence in Reinsch's form, stable for steps up to a quarter turn (J. Stoer, R. Bulirsch,
 * Introduction to Numerical Analysis, section 2.3.2; from memory): b' = b + d', d' = p + lambda b + d, one product for
 * both directions; across the lines by Horner's. Four directions run side by side, since each step waits for the one before.
 *
 * cells: pairs (re, im), row by row; `alternating` the same with every odd column negated. table: NUMBERS for each direction;
 * flips: i32 for each, 1 where
 * the alternating pairs are to be taken: a step beyond a quarter turn is one within, and half a turn more. out: per direction the lanes' sums, re and im: 4 f64.
 */
export function latticeSums(cells: usize, alternating: usize, columns: i32, rows: i32, table: usize, flips: usize, out: usize, count: i32): void {
  const line = <usize>columns << 4, last = line - 16;
  for (let k = 0; k < count; k += 4) {
    const t0 = table + (<usize>k * NUMBERS << 3), t1 = t0 + (NUMBERS << 3), t2 = t1 + (NUMBERS << 3), t3 = t2 + (NUMBERS << 3);
    const flip = flips + (<usize>k << 2);
    const from0 = load<i32>(flip) ? alternating : cells, from1 = load<i32>(flip, 4) ? alternating : cells;
    const from2 = load<i32>(flip, 8) ? alternating : cells, from3 = load<i32>(flip, 12) ? alternating : cells;
    const lambda0 = splatAt(t0, 0), lambda1 = splatAt(t1, 0), lambda2 = splatAt(t2, 0), lambda3 = splatAt(t3, 0);
    const to = out + (<usize>k << 5);
    memory.fill(to, 0, 128);
    for (let row = rows - 1; row >= 0; row--) {
      const end = <usize>row * line + last;
      let b0 = f64x2.splat(0), d0 = b0, b1 = b0, d1 = b0, b2 = b0, d2 = b0, b3 = b0, d3 = b0;
      let p0 = from0 + end, p1 = from1 + end, p2 = from2 + end, p3 = from3 + end;
      for (let c = columns; c > 0; c--) {
        d0 = f64x2.add(f64x2.add(v128.load(p0), d0), f64x2.mul(lambda0, b0));
        d1 = f64x2.add(f64x2.add(v128.load(p1), d1), f64x2.mul(lambda1, b1));
        d2 = f64x2.add(f64x2.add(v128.load(p2), d2), f64x2.mul(lambda2, b2));
        d3 = f64x2.add(f64x2.add(v128.load(p3), d3), f64x2.mul(lambda3, b3));
        b0 = f64x2.add(b0, d0);
        b1 = f64x2.add(b1, d1);
        b2 = f64x2.add(b2, d2);
        b3 = f64x2.add(b3, d3);
        p0 -= 16;
        p1 -= 16;
        p2 -= 16;
        p3 -= 16;
      }
      addLine(to, t0, b0, d0);
      addLine(to + 32, t1, b1, d1);
      addLine(to + 64, t2, b2, d2);
      addLine(to + 96, t3, b3, d3);
    }
  }
}

/** The line's sum out of the recurrence, added to the lines above turned by one step across. */
function addLine(to: usize, entry: usize, b: v128, d: v128): void {
  const before = f64x2.sub(b, d);
  const re = f64x2.add(d, f64x2.mul(before, splatAt(entry, 1))), im = f64x2.mul(before, splatAt(entry, 2));
  const c = splatAt(entry, 3), s = splatAt(entry, 4), sumRe = v128.load(to), sumIm = v128.load(to, 16);
  v128.store(to, f64x2.add(re, f64x2.sub(f64x2.mul(sumRe, c), f64x2.mul(sumIm, s))));
  v128.store(to, f64x2.add(im, f64x2.add(f64x2.mul(sumRe, s), f64x2.mul(sumIm, c))), 16);
}
