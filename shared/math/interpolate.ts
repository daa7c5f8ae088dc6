/** Where a value falls in a rising list: between `lower` and `lower + 1`, at `fraction` of the way; clamped to the ends. */
export interface Bracket {
  readonly lower: number;
  readonly fraction: number;
  /** -1 below the list, 1 above it, 0 within. */
  readonly outside: -1 | 0 | 1;
}

/** Finds the interval of a rising list that holds `value`. */
export function bracket(rising: ArrayLike<number>, value: number): Bracket {
  const last = rising.length - 1;
  if (last < 0) throw new RangeError('an empty list has no interval');
  // Reading back a file's own frequency must not count as outside it, so the ends have a relative slack.
  const slack = 1e-9 * Math.max(Math.abs(rising[0]), Math.abs(rising[last]));
  if (last === 0 || value <= rising[0]) return { lower: 0, fraction: 0, outside: outsideOf(rising, value, slack) };
  if (value >= rising[last]) return { lower: last - 1, fraction: 1, outside: outsideOf(rising, value, slack) };
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (rising[middle] <= value) low = middle;
    else high = middle;
  }
  return { lower: low, fraction: (value - rising[low]) / (rising[high] - rising[low]), outside: 0 };
}

function outsideOf(rising: ArrayLike<number>, value: number, slack: number): -1 | 0 | 1 {
  if (value < rising[0] - slack) return -1;
  return value > rising[rising.length - 1] + slack ? 1 : 0;
}

/** Value at `x` of the line through points of rising `xs`; constant beyond both ends. */
export function linearThrough(xs: ArrayLike<number>, ys: ArrayLike<number>, x: number): number {
  const { lower, fraction } = bracket(xs, x);
  return xs.length === 1 ? ys[0] : ys[lower] + fraction * (ys[lower + 1] - ys[lower]);
}

/**
 * Weights that Lagrange's polynomial through `nodes` gives to the values at the nodes, for its value at `x`.
 * One node gives the constant, two the line. Written into `weights`, which needs nodes.length places.
 */
export function lagrangeWeights(nodes: ArrayLike<number>, x: number, weights: Float64Array): Float64Array {
  for (let i = 0; i < nodes.length; i++) {
    let weight = 1;
    for (let j = 0; j < nodes.length; j++) if (j !== i) weight *= (x - nodes[j]) / (nodes[i] - nodes[j]);
    weights[i] = weight;
  }
  return weights;
}

/** The same for many `x` of the same nodes, whose differences are divided by once; written from place `from` on. */
export function lagrangeWeigher(nodes: ArrayLike<number>): (x: number, weights: Float64Array, from?: number) => void {
  const xs = Float64Array.from(nodes);
  const scale = xs.map((node, i) => xs.reduce((product, other, j) => (j === i ? product : product / (node - other)), 1));
  return (x, weights, from = 0) => {
    let before = 1;
    for (let i = 0; i < xs.length; i++) {
      weights[from + i] = before * scale[i];
      before *= x - xs[i];
    }
    let after = 1;
    for (let i = xs.length - 1; i >= 0; i--) {
      weights[from + i] *= after;
      after *= x - xs[i];
    }
  };
}
