/** Nodes and weights of a rule on [-1, 1]. */
export interface QuadratureRule {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const rules = new Map<number, QuadratureRule>();

/**
 * Gauss-Legendre rule with `count` nodes, exact for polynomials of degree 2 count - 1.
 * Newton iteration on the Legendre polynomial from the Chebyshev estimate of its roots
 * (Abramowitz and Stegun, Handbook of Mathematical Functions, 1964, chapter 25; equation number not checked).
 */
export function gaussLegendre(count: number): QuadratureRule {
  const known = rules.get(count);
  if (known) return known;
  if (!Number.isInteger(count) || count < 1) throw new RangeError(`a quadrature rule needs at least one node; got ${count}`);
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const { root, slope } = legendreRoot(count, Math.cos((Math.PI * (i + 0.75)) / (count + 0.5)));
    nodes[count - 1 - i] = root;
    weights[count - 1 - i] = 2 / ((1 - root * root) * slope * slope);
  }
  const rule = { nodes, weights };
  rules.set(count, rule);
  return rule;
}

function legendreRoot(degree: number, start: number): { root: number; slope: number } {
  let x = start;
  let slope = 1;
  for (let iteration = 0; iteration < 100; iteration++) {
    let before = 1;
    let value = x;
    for (let n = 2; n <= degree; n++) [before, value] = [value, ((2 * n - 1) * x * value - (n - 1) * before) / n];
    if (degree === 1) before = 1;
    slope = (degree * (x * value - before)) / (x * x - 1);
    const step = value / slope;
    x -= step;
    if (Math.abs(step) < 1e-15) break;
  }
  return { root: x, slope };
}

/** Integral of `f` over [from, to] by one Gauss-Legendre rule on each of `panels` equal parts. */
export function integrate(f: (x: number) => number, from: number, to: number, size: { nodes: number; panels: number }): number {
  const { nodes, weights } = gaussLegendre(size.nodes);
  const half = (to - from) / (2 * size.panels);
  let sum = 0;
  for (let panel = 0; panel < size.panels; panel++) {
    const middle = from + (2 * panel + 1) * half;
    for (let i = 0; i < nodes.length; i++) sum += weights[i] * f(middle + half * nodes[i]);
  }
  return sum * half;
}
